//! `tally`: how often an unattended screen was used, as a table or as CSV.

mod table;

use std::path::PathBuf;

use chrono::NaiveDate;
use clap::ArgMatches;

use super::failure::Failure;
use super::keep_folder::keep_folder;
use super::output::{check_target, deliver, reason};
use super::show::note_words;
use super::speech::Speech;
use super::usage::{mistake, unknown_choice};
use crate::keep::{Counts, Folder, Keep, Tally};
use crate::words::Words;

/// The days that were asked for; open where an end was not named.
#[derive(Clone, Copy, Debug)]
struct Span {
    from: Option<NaiveDate>,
    to: Option<NaiveDate>,
}

/// Reads the tally and tells it.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let text = |name: &str| matches.get_one::<String>(name).map(String::as_str);
    let path = |name: &str| matches.get_one::<PathBuf>(name).map(PathBuf::as_path);
    let form = text("form").unwrap_or("table");
    if !["table", "csv"].contains(&form) {
        return Err(mistake(&unknown_choice("--form", form, &["table", "csv"], words), Some("tally"), words));
    }
    let span = Span { from: date(text("from"), words)?, to: date(text("to"), words)? };
    if span.from.zip(span.to).is_some_and(|(from, to)| from > to) {
        return Err(mistake(&words.say("tally-dates-backward", &[]), Some("tally"), words));
    }
    check_target(path("out"), words)?;
    let folder = keep_folder(path("keep")).ok_or_else(|| Failure::input(words.say("keep-no-folder", &[])))?;
    if path("keep").is_some() && !folder.is_dir() {
        let arguments = [("path", folder.display().to_string().into()), ("reason", not_there(words).into())];
        return Err(Failure::input(words.say("error-file-unreadable", &arguments)));
    }
    // A screen may be running on these files: they are looked at and left alone.
    let (tally, notes) = Keep::new(Folder::new(folder)).look_at_tally();
    super::tell_standard_error(&notes.iter().map(|note| note_words(note, words)).collect::<Vec<_>>());
    let answer = if form == "csv" { csv(&tally, span) } else { table::write(&tally, span, words) };
    deliver(answer.as_bytes(), path("out"), words)
}

fn not_there(words: &Words) -> String {
    reason(&std::io::ErrorKind::NotFound.into(), words)
}

fn date(text: Option<&str>, words: &Words) -> Result<Option<NaiveDate>, Failure> {
    let Some(text) = text else { return Ok(None) };
    match NaiveDate::parse_from_str(text, "%Y-%m-%d") {
        Ok(date) => Ok(Some(date)),
        Err(_) => Err(mistake(&words.say("tally-date-wrong", &[("text", text.into())]), Some("tally"), words)),
    }
}

impl Span {
    fn holds(self, date: NaiveDate) -> bool {
        self.from.is_none_or(|from| from <= date) && self.to.is_none_or(|to| date <= to)
    }

    fn is_open(self) -> bool {
        self.from.is_none() && self.to.is_none()
    }
}

/// One row a count: the day (empty without one), what is counted, its key, how often. Keys and dates are the same in
/// every language.
fn csv(tally: &Tally, span: Span) -> String {
    let mut rows = vec![["date", "kind", "key", "count"].map(str::to_owned)];
    if span.is_open() {
        rows_of("before", tally.earlier(), &mut rows);
        rows_of("", tally.undated(), &mut rows);
    }
    for (date, counts) in tally.days().filter(|(date, _)| span.holds(*date)) {
        rows_of(&date.format("%Y-%m-%d").to_string(), counts, &mut rows);
    }
    let mut writer = csv::WriterBuilder::new().from_writer(Vec::new());
    for row in &rows {
        // Memory takes every row, and all rows are as wide as the header.
        let _ = writer.write_record(row);
    }
    writer.into_inner().ok().and_then(|bytes| String::from_utf8(bytes).ok()).unwrap_or_default()
}

fn rows_of(date: &str, counts: &Counts, rows: &mut Vec<[String; 4]>) {
    let mut row = |kind: &str, key: &str, count: u32| {
        if count > 0 {
            rows.push([date.to_owned(), kind.to_owned(), key.to_owned(), count.to_string()]);
        }
    };
    row("visits", "", counts.visits);
    row("minutes", "", counts.minutes);
    counts.views.iter().for_each(|(view, count)| row("view", super::show::view_key(*view), *count));
    counts.dials.iter().for_each(|(dial, count)| row("dial", dial, *count));
    counts.languages.iter().for_each(|(tag, count)| row("language", tag, *count));
    counts.lessons.iter().for_each(|(lesson, count)| row("lesson", lesson, *count));
}
