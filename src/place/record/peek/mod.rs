//! A first look at a delimited text file that nobody has described: what it seems to be, and why.
//!
//! Everything here is a proposal for people to look at: [`peek`] gives a [`RecordPlan`] with the reason of every guess and
//! reads the file by it, so that the checks of a record have their say at once.

mod dates;
mod layout;
mod units;

use std::path::Path;

use super::append::with_open_gaps;
use super::measure::Measure;
use super::number::parse_number;
use super::plan::{ColumnPlan, DateOrder, DatePlan, RecordPlan};
use super::rows::USUAL_MISSING;
use super::unit::MeasureUnit;
use super::{ReadRecord, read_record};
use crate::place::measure_words::measure_of_words;
use crate::place::problem::{Location, Problem};
use layout::Layout;

/// Rows of which every cell is looked at.
const MOST_ROWS: usize = 40_000;
/// Marks of missing values that are proposed.
const MOST_MARKS: usize = 8;
/// Letters of such a mark.
const LONGEST_MARK: usize = 8;

/// What a file seems to be.
#[derive(Clone, Debug, PartialEq)]
pub struct Peek {
    /// How it could be read. Its delimiter is always given.
    pub plan: RecordPlan,
    /// Line of the header, from 1.
    pub header_line: usize,
    /// Why the dates are read as the plan says.
    pub date_reason: DateReason,
    /// Every named column in the order of the file.
    pub columns: Vec<PeekColumn>,
    /// The file as it was read, with every gap left open; `None` where it cannot be read at all.
    pub record: Option<ReadRecord>,
    /// What is wrong with the file under the plan and the usual rules for gaps.
    pub problems: Vec<Problem>,
}

/// A column of the file.
#[derive(Clone, Debug, PartialEq)]
pub struct PeekColumn {
    /// Its name in the header.
    pub name: String,
    /// What it seems to be.
    pub role: ColumnRole,
}

/// What a column seems to be.
#[derive(Clone, Debug, PartialEq)]
pub enum ColumnRole {
    /// The date, or a part of it.
    Date,
    /// A measure.
    Measured {
        /// What is measured.
        measure: Measure,
        /// In which unit.
        unit: MeasureUnit,
        /// Why in that.
        reason: UnitReason,
    },
    /// The measure of a column before it.
    Again(Measure),
    /// Numbers, of which nothing is known.
    Numbers,
    /// Text.
    Text,
}

/// Why a unit was proposed.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum UnitReason {
    /// The name of the column says it.
    Name,
    /// The size of the numbers does.
    Size,
    /// Nothing does: it is the usual one.
    Usual,
}

/// Why an order of day and month was proposed.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum DateReason {
    /// No other order gives days of the calendar.
    Only,
    /// Only in this order each row is the day after the one before.
    Daily,
    /// Several orders fit; this one is the most usual.
    Usual,
    /// Columns named after the parts of a date.
    Parts,
}

/// Looks at the bytes of a text file. `Err` holds why it does not look like a daily record at all.
pub fn peek(file: &Path, bytes: &[u8]) -> Result<Peek, Vec<Problem>> {
    let layout = Layout::find(file, bytes)?;
    let rows = layout.rows(MOST_ROWS);
    let Some((date, date_reason)) = dates::find(&layout, &rows) else {
        let at = Location { file: file.to_path_buf(), line: layout.header_line + 1, column: 0, length: 0 };
        return Err(vec![Problem::error(at, "problem-peek-date")]);
    };
    let decimal_comma = has_decimal_commas(&rows, layout.names.len());
    let mut columns = Vec::new();
    let mut plans: Vec<ColumnPlan> = Vec::new();
    let mut marks: Vec<String> = Vec::new();
    for (index, name) in layout.names.iter().enumerate() {
        let role = if is_of_date(name, &date) {
            ColumnRole::Date
        } else {
            let cells = rows.iter().filter_map(|row| row.get(index).map(String::as_str));
            role_of(name, cells, decimal_comma, &plans, &mut marks)
        };
        if let ColumnRole::Measured { measure, unit, .. } = &role {
            plans.push(ColumnPlan::new(name.as_str(), *measure, *unit));
        }
        columns.push(PeekColumn { name: name.clone(), role });
    }
    marks.truncate(MOST_MARKS);
    let plan = RecordPlan {
        encoding: layout.encoding,
        delimiter: Some(layout.delimiter),
        decimal_comma,
        skip_lines: layout.skip_lines,
        missing: marks,
        ..RecordPlan::new(file, date, plans)
    };
    let (record, problems) = try_plan(&plan, bytes);
    Ok(Peek { plan, header_line: layout.header_line + 1, date_reason, columns, record, problems })
}

/// Reads the file by the plan, twice: as it would be read in a place, and with all gaps left open, for a look at it.
fn try_plan(plan: &RecordPlan, bytes: &[u8]) -> (Option<ReadRecord>, Vec<Problem>) {
    let mut problems = Vec::new();
    if plan.columns.is_empty() {
        problems.push(Problem::error(Location::whole_file(plan.file.clone()), "problem-peek-columns"));
        return (None, problems);
    }
    read_record(plan, bytes, &mut problems);
    (read_record(&with_open_gaps(plan), bytes, &mut Vec::new()), problems)
}

fn is_of_date(name: &str, date: &DatePlan) -> bool {
    match date {
        DatePlan::Column { name: date, .. } => name == date,
        DatePlan::Parts { year, month, day } => [year, month, day].iter().any(|part| *part == name),
        DatePlan::YearAndDay { year, day_of_year } => name == year || name == day_of_year,
    }
}

/// Whether numbers are written with a comma: some cells are numbers so and not otherwise, and none the other way round.
fn has_decimal_commas(rows: &[Vec<String>], columns: usize) -> bool {
    let (mut commas, mut points) = (0usize, 0usize);
    for cell in rows.iter().take(2_000).flat_map(|row| row.iter().take(columns)) {
        let with_point = parse_number(cell, false).is_ok();
        let with_comma = parse_number(cell, true).is_ok();
        commas += usize::from(with_comma && !with_point);
        points += usize::from(with_point && !with_comma);
    }
    commas > 0 && points == 0
}

fn role_of<'c>(
    name: &str,
    cells: impl Iterator<Item = &'c str>,
    decimal_comma: bool,
    plans: &[ColumnPlan],
    marks: &mut Vec<String>,
) -> ColumnRole {
    let (mut numbers, mut others): (Vec<f64>, Vec<&str>) = (Vec::new(), Vec::new());
    // Numbers that are usual marks, as the file writes them: a plan compares what is written.
    let mut suspects: Vec<(f64, &str)> = Vec::new();
    for cell in cells.filter(|cell| !cell.is_empty()) {
        match parse_number(cell, decimal_comma) {
            Ok(number) => {
                numbers.push(number);
                if USUAL_MISSING.contains(&number) && !suspects.iter().any(|(_, text)| *text == cell) {
                    suspects.push((number, cell));
                }
            }
            Err(_) => others.push(cell),
        }
    }
    if numbers.is_empty() || others.len() > numbers.len() {
        return ColumnRole::Text;
    }
    let Some(measure) = measure_of_words(name) else { return ColumnRole::Numbers };
    let many = matches!(measure, Measure::Flow | Measure::Diversion);
    if !many && plans.iter().any(|plan| plan.measure == measure) {
        return ColumnRole::Again(measure);
    }
    let plain: Vec<f64> = numbers.iter().copied().filter(|number| !USUAL_MISSING.contains(number)).collect();
    let (unit, reason) = units::find(name, measure, &plain);
    for mark in others.iter().filter(|text| is_mark(text)) {
        note_mark(mark, marks);
    }
    let (low, high) = measure.bounds();
    for (number, text) in suspects {
        let value = unit.to_si(number);
        if value < low || value > high || (number < 0.0 && low == f64::NEG_INFINITY) {
            note_mark(text, marks);
        }
    }
    ColumnRole::Measured { measure, unit, reason }
}

/// Whether a text that is no number can stand for a missing one: short, without digits, and not the T of a trace.
fn is_mark(text: &str) -> bool {
    let short = text.chars().count() <= LONGEST_MARK && !text.bytes().any(|byte| byte.is_ascii_digit());
    short && !text.eq_ignore_ascii_case("t") && !text.chars().any(char::is_control)
}

fn note_mark(mark: &str, marks: &mut Vec<String>) {
    if marks.len() < MOST_MARKS && !marks.iter().any(|known| known == mark) {
        marks.push(mark.to_owned());
    }
}

impl DatePlan {
    /// The order of its date, where that is in one column.
    pub fn order(&self) -> Option<DateOrder> {
        match self {
            DatePlan::Column { order, .. } => Some(*order),
            _ => None,
        }
    }
}
