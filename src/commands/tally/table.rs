//! The count of use as people read it.

use std::fmt::Write;

use super::Span;
use crate::keep::{Counts, Tally};
use crate::water::dials::Dial;
use crate::words::{DateStyle, Words};

/// Days by themselves only where there are no more of them than this.
const MOST_DAYS: usize = 31;
/// Between columns.
const GAP: usize = 2;

/// The whole answer.
pub(super) fn write(tally: &Tally, span: Span, words: &Words) -> String {
    let say = |id: &str| words.say(id, &[]);
    let sum = tally.sum(span.from, span.to);
    if sum.is_empty() {
        return format!("{}\n", say("tally-nothing"));
    }
    let days: Vec<_> = tally.days().filter(|(date, _)| span.holds(*date)).collect();
    let first = span.from.or(days.first().map(|(date, _)| *date));
    let last = span.to.or(days.last().map(|(date, _)| *date));
    let heading = match first.zip(last) {
        Some((first, last)) if !span.is_open() => {
            let date = |date| words.date(date, DateStyle::Long);
            words.say("tally-span", &[("from", date(first).into()), ("to", date(last).into())])
        }
        _ => say("tally-span-all"),
    };
    let mut text = format!("{heading}\n\n");
    lines(&mut text, vec![(say("tally-visits"), sum.visits), (say("tally-minutes"), sum.minutes)], words);
    let view = |(view, count): (&_, &u32)| (say(&format!("view-{}", crate::commands::show::view_key(*view))), *count);
    section(&mut text, "tally-views", sum.views.iter().map(view).collect(), words);
    let dial = |(key, count): (&String, &u32)| {
        let known = Dial::from_key(key).map(|dial| say(&Words::key_id("dial", dial.key())));
        (known.unwrap_or_else(|| named(key, words)), *count)
    };
    section(&mut text, "tally-dials", sum.dials.iter().map(dial).collect(), words);
    let plain = |(key, count): (&String, &u32)| (named(key, words), *count);
    section(&mut text, "tally-languages", sum.languages.iter().map(plain).collect(), words);
    section(&mut text, "tally-lessons", sum.lessons.iter().map(plain).collect(), words);
    if days.len() <= MOST_DAYS {
        let mut rows: Vec<_> =
            days.iter().map(|(date, counts)| (words.date(*date, DateStyle::Long), counts.visits)).collect();
        if span.is_open() {
            let rest = |id: &str, counts: &Counts| (counts.visits > 0).then(|| (say(id), counts.visits));
            rows.extend(rest("tally-undated", tally.undated()));
            rows.splice(0..0, rest("tally-earlier", tally.earlier()));
        }
        if rows.len() > 1 {
            let _ = write!(text, "\n{}\n", say("tally-visits"));
            lines(&mut text, rows, words);
        }
    }
    let _ = write!(text, "\n{}\n", say("tally-no-names"));
    text
}

fn named(key: &str, words: &Words) -> String {
    if key == "+" { words.say("tally-others", &[]) } else { key.to_owned() }
}

/// The most used first.
fn section(text: &mut String, id: &str, mut rows: Vec<(String, u32)>, words: &Words) {
    if rows.is_empty() {
        return;
    }
    rows.sort_by_key(|(_, count)| std::cmp::Reverse(*count));
    let _ = write!(text, "\n{}\n", words.say(id, &[]));
    lines(text, rows, words);
}

fn lines(text: &mut String, rows: Vec<(String, u32)>, words: &Words) {
    let rows: Vec<(String, String)> =
        rows.into_iter().map(|(name, count)| (name, words.number(count.into(), 0))).collect();
    let width = |text: &str| text.chars().count();
    let name = rows.iter().map(|(name, _)| width(name)).max().unwrap_or(0);
    let number = rows.iter().map(|(_, number)| width(number)).max().unwrap_or(0);
    for (row, count) in &rows {
        let _ = writeln!(text, "  {row}{:fill$}{count:>number$}", "", fill = name - width(row) + GAP);
    }
}
