//! `place peek`: what a file seems to be, why, and the lines that `place.toml` would have for it.

use std::path::{Path, PathBuf};

use clap::ArgMatches;

use super::files::{MOST_GRID_BYTES, MOST_RECORD_BYTES, name_of, read_bytes, refused};
use super::heights::{self, HeightOptions};
use super::peek_json;
use super::picture::{of_months, of_years, padded};
use crate::commands::failure::Failure;
use crate::commands::output::deliver;
use crate::commands::snippets::{Texts, report};
use crate::commands::speech::Speech;
use crate::commands::usage::{mistake, unknown_choice};
use crate::place::preparing::{RecordKind, area_table, look_at, record_table, usual_kind};
use crate::place::record::{ColumnRole, DatePlan, DateReason, Encoding, Peek, Spread, UnitReason};
use crate::words::{DateStyle, System, Words};

/// Letters of a column's name before it is cut.
const MOST_NAME: usize = 26;
/// Problems that are shown.
const MOST_PROBLEMS: usize = 5;
/// Decimals of a value in the table.
const DECIMALS: u8 = 2;

/// Looks at the file.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let Some(file) = matches.get_one::<PathBuf>("file") else { return Ok(()) };
    let as_json = match matches.get_one::<String>("form").map(String::as_str) {
        None | Some("table") => false,
        Some("json") => true,
        Some(other) => {
            let line = unknown_choice("--form", other, &["table", "json"], words);
            return Err(mistake(&line, Some("place"), words));
        }
    };
    let options = HeightOptions::read(matches, words)?;
    let bytes = read_bytes(file, MOST_GRID_BYTES, words)?;
    if heights::is_grid(&bytes) {
        let curve = options.curve(file, words)?;
        let table = area_table(&curve, options.bands);
        let answer = if as_json {
            peek_json::of_curve(&curve, &table)
        } else {
            let mut lines = heights::say(&curve, System::Metric, words);
            lines.extend([String::new(), words.say("peek-propose", &[]), String::new(), table]);
            lines.join("\n")
        };
        return deliver(answer.as_bytes(), None, words);
    }
    if bytes.len() as u64 > MOST_RECORD_BYTES {
        // Nothing that large is a record; the bound is told as for any other file.
        read_bytes(file, MOST_RECORD_BYTES, words)?;
    }
    let peek = look_at(file, &bytes).map_err(|problems| refused(&problems, words))?;
    let kind = usual_kind(&peek);
    let name = name_of(file, words)?;
    let mapping = kind.as_ref().map(|kind| record_table(kind, &peek.plan, &name));
    let answer = if as_json {
        peek_json::of_record(&peek, mapping.as_deref(), words)
    } else {
        say(file, &peek, kind.as_ref(), mapping.as_deref(), words)
    };
    deliver(answer.as_bytes(), None, words)
}

fn say(file: &Path, peek: &Peek, kind: Option<&RecordKind>, mapping: Option<&str>, words: &Words) -> String {
    let mut lines = about(file, peek, words);
    lines.push(String::new());
    lines.extend(columns(peek, words));
    if let Some(record) = &peek.record {
        let width = record.columns.iter().map(|column| column.name.chars().count()).max().unwrap_or(0).min(MOST_NAME);
        lines.extend([String::new(), words.say("peek-months", &[])]);
        lines.extend(of_months(record, width, words));
        lines.extend([String::new(), words.say("peek-years", &[])]);
        lines.extend(of_years(record, width, words));
    }
    lines.push(String::new());
    match (mapping, kind) {
        (Some(mapping), Some(kind)) => {
            lines.push(words.say("peek-propose", &[]));
            lines.extend([String::new(), mapping.to_owned()]);
            if matches!(kind, RecordKind::Gauge { .. }) {
                lines.extend([words.say("peek-gauge", &[]), String::new()]);
            }
        }
        _ => lines.extend([words.say("peek-no-kind", &[]), String::new()]),
    }
    if peek.problems.is_empty() {
        lines.push(words.say("peek-fine", &[]));
    } else {
        lines.push(words.say("peek-problems", &[("n", peek.problems.len().into())]));
        let first = &peek.problems[..peek.problems.len().min(MOST_PROBLEMS)];
        lines.extend([String::new(), report(first, &mut Texts::on_disk(), words)]);
    }
    lines.join("\n") + "\n"
}

/// What the file is as a whole.
fn about(file: &Path, peek: &Peek, words: &Words) -> Vec<String> {
    let mut lines = vec![file.display().to_string()];
    if peek.header_line > 0 {
        let mark = match peek.plan.delimiter {
            Some('\t') => words.say("peek-tab", &[]),
            Some(mark) => mark.to_string(),
            None => String::new(),
        };
        let line = peek.header_line.to_string();
        lines.push(words.say("peek-text", &[("mark", mark.into()), ("line", line.into())]));
        if peek.plan.decimal_comma {
            lines.push(words.say("peek-comma", &[]));
        }
        if peek.plan.encoding == Encoding::Latin1 {
            lines.push(words.say("peek-latin", &[]));
        }
        lines.push(dates(peek, words));
    } else {
        lines.push(words.say("peek-exchange", &[]));
    }
    if !peek.plan.missing.is_empty() {
        lines.push(words.say("peek-marks", &[("marks", peek.plan.missing.join("  ").into())]));
    }
    if let Some(record) = &peek.record {
        let date = |date| words.date(date, DateStyle::Long);
        let arguments = [
            ("first", date(record.first_date).into()),
            ("last", date(record.last_date()).into()),
            ("n", record.days.into()),
        ];
        lines.push(words.say("peek-days", &arguments));
    }
    lines
}

fn dates(peek: &Peek, words: &Words) -> String {
    let reason = words.say(
        match peek.date_reason {
            DateReason::Only => "peek-date-only",
            DateReason::Daily => "peek-date-daily",
            DateReason::Usual => "peek-date-usual",
            DateReason::Parts => "peek-date-parts",
        },
        &[],
    );
    match &peek.plan.date {
        DatePlan::Column { name, order } => {
            let arguments =
                [("column", name.as_str().into()), ("order", order.key().into()), ("reason", reason.into())];
            words.say("peek-date", &arguments)
        }
        DatePlan::Parts { year, month, day } => {
            let names = [year, month, day].map(String::as_str).join(", ");
            words.say("peek-date-columns", &[("columns", names.into())])
        }
        DatePlan::YearAndDay { year, day_of_year } => {
            let names = [year, day_of_year].map(String::as_str).join(", ");
            words.say("peek-date-columns", &[("columns", names.into())])
        }
    }
}

/// The table of columns.
fn columns(peek: &Peek, words: &Words) -> Vec<String> {
    let say = |id: &str| words.say(id, &[]);
    let mut rows = vec![[
        say("peek-column"),
        say("peek-is"),
        say("peek-unit"),
        say("peek-missing"),
        say("peek-lowest"),
        say("peek-mean"),
        say("peek-highest"),
        say("peek-why"),
    ]];
    for column in &peek.columns {
        let empty = String::new;
        let row = match &column.role {
            ColumnRole::Date => {
                [column.name.clone(), say("peek-role-date"), empty(), empty(), empty(), empty(), empty(), empty()]
            }
            ColumnRole::Measured { measure, unit, reason } => {
                let why = say(match reason {
                    UnitReason::Name => "peek-unit-name",
                    UnitReason::Size => "peek-unit-size",
                    UnitReason::Usual => "peek-unit-usual",
                });
                let read = peek.record.as_ref().and_then(|record| {
                    record.columns.iter().find(|read| read.name == column.name && read.measure == *measure)
                });
                let spread = read.and_then(|read| Spread::of(read.values.iter().copied()));
                // As the file writes it: that is what people can compare.
                let number = |value: fn(&Spread) -> f64| {
                    spread.as_ref().map_or_else(empty, |spread| words.number(unit.from_si(value(spread)), DECIMALS))
                };
                [
                    column.name.clone(),
                    measure.key().to_owned(),
                    unit.key().to_owned(),
                    read.map_or_else(empty, |read| words.number(read.missing as f64, 0)),
                    number(|spread| spread.lowest),
                    number(|spread| spread.mean),
                    number(|spread| spread.highest),
                    why,
                ]
            }
            ColumnRole::Again(measure) => {
                let why = words.say("peek-role-again", &[("measure", measure.key().into())]);
                [column.name.clone(), "–".into(), empty(), empty(), empty(), empty(), empty(), why]
            }
            ColumnRole::Numbers => {
                [column.name.clone(), "–".into(), empty(), empty(), empty(), empty(), empty(), say("peek-role-numbers")]
            }
            ColumnRole::Text => {
                [column.name.clone(), "–".into(), empty(), empty(), empty(), empty(), empty(), say("peek-role-text")]
            }
        };
        rows.push(row);
    }
    let widths: [usize; 8] = std::array::from_fn(|place| {
        let most = rows.iter().map(|row| row[place].chars().count()).max().unwrap_or(0);
        if place == 0 { most.min(MOST_NAME) } else { most }
    });
    rows.iter()
        .map(|row| {
            let cells: Vec<String> = row
                .iter()
                .enumerate()
                .map(|(place, cell)| {
                    let is_number = (3..=6).contains(&place);
                    let room = widths[place].saturating_sub(cell.chars().count());
                    if is_number { " ".repeat(room) + cell } else { padded(cell, widths[place]) }
                })
                .collect();
            cells.join("  ").trim_end().to_owned()
        })
        .collect()
}
