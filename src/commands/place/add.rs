//! `place add`: more days for a record that a place has, or a record that it does not have yet.

use std::path::{Path, PathBuf};

use clap::ArgMatches;

use super::files::{MOST_RECORD_BYTES, name_of, read_bytes, refused};
use super::new::{measures, still_open};
use crate::commands::failure::Failure;
use crate::commands::output::deliver;
use crate::commands::speech::Speech;
use crate::commands::usage::{mistake, unknown_choice};
use crate::place::Source;
use crate::place::preparing::{
    PlacedRecord, RecordKind, look_at, placed_record, read_planned, record_table, usual_kind, with_named_columns,
};
use crate::place::record::{ColumnPlan, MeasureUnit};
use crate::place::record::{Peek, RecordPlan, append, with_open_gaps};
use crate::words::{DateStyle, Words};

const KINDS: [&str; 5] = ["weather", "gauge", "snow", "storage", "canal"];
const FILE: &str = "place.toml";

/// Adds the file to the place: whole, or nothing at all.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let (Some(folder), Some(path)) = (matches.get_one::<PathBuf>("place"), matches.get_one::<PathBuf>("file")) else {
        return Ok(());
    };
    if !folder.join(FILE).is_file() {
        let path = folder.display().to_string();
        return Err(Failure::input(words.say("place-add-no-place", &[("path", path.into())])));
    }
    let bytes = read_bytes(path, MOST_RECORD_BYTES, words)?;
    let mut peek = look_at(path, &bytes).map_err(|problems| refused(&problems, words))?;
    let kind = kind(&peek, matches, words)?;
    choose_column(&mut peek, &kind, matches, words)?;
    let placed = placed_record(Source::Folder(folder), &kind).map_err(|problems| refused(&problems, words))?;
    let mut lines = match placed {
        Some(placed) => more_days(folder, &placed, &peek, &bytes, words)?,
        None => new_record(folder, path, &kind, &peek, &bytes, matches.get_flag("replace"), words)?,
    };
    lines.extend(still_open(folder, words));
    deliver(format!("{}\n", lines.join("\n")).as_bytes(), None, words)
}

/// What the record is for: as it is said, or as its columns say.
fn kind(peek: &Peek, matches: &ArgMatches, words: &Words) -> Result<RecordKind, Failure> {
    let gate = matches.get_one::<String>("canal").cloned();
    let usage = |line: &str| mistake(line, Some("place"), words);
    match (matches.get_one::<String>("as").map(String::as_str), gate) {
        (Some("canal") | None, Some(gate)) => Ok(RecordKind::Diversion { gate }),
        (Some("canal"), None) => Err(usage(&words.say("place-add-canal", &[]))),
        (Some("weather"), None) => Ok(RecordKind::Weather),
        (Some("gauge"), None) => Ok(RecordKind::Gauge { measures: measures(matches, words)? }),
        (Some("snow"), None) => Ok(RecordKind::Snow),
        (Some("storage"), None) => Ok(RecordKind::Storage),
        (Some(_), Some(_)) => Err(usage(&words.say("place-add-canal-only", &[]))),
        (Some(other), None) => Err(usage(&unknown_choice("--as", other, &KINDS, words))),
        (None, None) => match usual_kind(peek) {
            Some(RecordKind::Gauge { .. }) if matches.contains_id("measures") => {
                Ok(RecordKind::Gauge { measures: measures(matches, words)? })
            }
            Some(kind) => Ok(kind),
            None => Err(usage(&words.say("place-add-as", &[("choices", KINDS.join(", ").into())]))),
        },
    }
}

/// Takes the column and the unit that are said in place of those that were guessed.
fn choose_column(peek: &mut Peek, kind: &RecordKind, matches: &ArgMatches, words: &Words) -> Result<(), Failure> {
    let usage = |line: &str| mistake(line, Some("place"), words);
    let column = matches.get_one::<String>("column");
    let unit = matches.get_one::<String>("unit");
    let Some(measure) = kind.measure() else {
        return if column.is_some() || unit.is_some() {
            Err(usage(&words.say("place-add-weather-columns", &[])))
        } else {
            Ok(())
        };
    };
    if let Some(name) = column {
        if !peek.columns.iter().any(|known| known.name == *name) {
            let names: Vec<&str> = peek.columns.iter().map(|known| known.name.as_str()).collect();
            return Err(usage(&unknown_choice("--column", name, &names, words)));
        }
        let guessed = peek.plan.columns.iter().find(|known| known.name == *name).map(|known| known.unit);
        let usual = guessed.filter(|unit| measure.accepts(*unit));
        let Some(unit) = usual.or_else(|| unit.map(|_| measure.units()[0])) else {
            return Err(usage(&words.say("place-add-unit", &[("option", "--unit".into())])));
        };
        peek.plan.columns = vec![ColumnPlan::new(name.as_str(), measure, unit)];
    }
    peek.plan.columns.retain(|known| kind.takes(known.measure));
    for known in &mut peek.plan.columns {
        *known = ColumnPlan::new(known.name.as_str(), measure, known.unit);
    }
    let names: Vec<&str> = peek.plan.columns.iter().map(|known| known.name.as_str()).collect();
    match names.len() {
        1 => {}
        0 => return Err(usage(&words.say("place-add-column", &[("option", "--column".into())]))),
        _ => {
            let arguments = [("option", "--column".into()), ("choices", names.join(", ").into())];
            return Err(usage(&words.say("place-add-columns", &arguments)));
        }
    }
    if let (Some(key), Some(known)) = (unit, peek.plan.columns.first_mut()) {
        let found = MeasureUnit::from_key(key).filter(|unit| measure.accepts(*unit));
        known.unit = found.ok_or_else(|| {
            let keys: Vec<&str> = measure.units().iter().map(|unit| unit.key()).collect();
            usage(&unknown_choice("--unit", key, &keys, words))
        })?;
    }
    Ok(())
}

/// Puts the file's days behind those that are there.
fn more_days(
    folder: &Path,
    placed: &PlacedRecord,
    peek: &Peek,
    bytes: &[u8],
    words: &Words,
) -> Result<Vec<String>, Failure> {
    let target = folder.join(&placed.file);
    if crate::place::exchange::recognise(&placed.bytes).is_some() {
        let path = target.display().to_string();
        return Err(Failure::input(words.say("place-add-exchange", &[("path", path.into())])));
    }
    let plan: RecordPlan = with_named_columns(&placed.plan, peek).map_err(|name| {
        let path = peek.plan.file.display().to_string();
        Failure::input(words.say("place-add-lacks", &[("path", path.into()), ("column", name.into())]))
    })?;
    let mut problems = Vec::new();
    let record = read_planned(&with_open_gaps(&plan), bytes, &mut problems).ok_or_else(|| refused(&problems, words))?;
    let appended =
        append(&placed.plan, &placed.bytes, &plan, bytes, &record).map_err(|problems| refused(&problems, words))?;
    deliver(&appended.bytes, Some(&target), words)?;
    let date = |date| words.date(date, DateStyle::Long);
    let mut lines = vec![words.say(
        "place-added-days",
        &[
            ("n", appended.days.into()),
            ("path", target.display().to_string().into()),
            ("first", date(appended.first).into()),
            ("last", date(appended.last).into()),
        ],
    )];
    if appended.same_days > 0 {
        lines.push(words.say("place-added-same", &[("n", appended.same_days.into())]));
    }
    Ok(lines)
}

/// Copies the file into the place and adds its table to `place.toml`.
fn new_record(
    folder: &Path,
    path: &Path,
    kind: &RecordKind,
    peek: &Peek,
    bytes: &[u8],
    replace: bool,
    words: &Words,
) -> Result<Vec<String>, Failure> {
    let name = name_of(path, words)?;
    let target = folder.join(&name);
    let there = std::fs::read(&target).ok();
    if there.as_ref().is_some_and(|there| there != bytes) && !replace || name == FILE {
        let path = target.display().to_string();
        return Err(Failure::input(words.say("place-exists", &[("path", path.into())])));
    }
    if !peek.plan.columns.iter().any(|column| kind.takes(column.measure)) {
        let arguments =
            [("path", path.display().to_string().into()), ("table", kind.table().trim_matches(['[', ']']).into())];
        return Err(Failure::input(words.say("place-no-column", &arguments)));
    }
    if peek.record.is_none() {
        // A record that cannot be read at all would only bring its mistakes into the place.
        return Err(refused(&peek.problems, words));
    }
    let toml = read_bytes(&folder.join(FILE), MOST_RECORD_BYTES, words)?;
    let mut text = String::from_utf8(toml)
        .map_err(|_| Failure::input(words.say("place-add-not-utf8", &[("path", FILE.into())])))?;
    if !text.ends_with('\n') {
        text.push('\n');
    }
    let table = record_table(kind, &peek.plan, &name);
    text.push_str(&format!("\n{table}"));
    deliver(bytes, Some(&target), words)?;
    if let Err(failure) = deliver(text.as_bytes(), Some(&folder.join(FILE)), words) {
        // Whole or nothing: a record that no table names would be left behind.
        let _ = match &there {
            Some(there) => std::fs::write(&target, there),
            None => std::fs::remove_file(&target),
        };
        return Err(failure);
    }
    let arguments = [("file", name.into()), ("path", folder.join(FILE).display().to_string().into())];
    Ok(vec![words.say("place-added-record", &arguments), String::new(), table])
}
