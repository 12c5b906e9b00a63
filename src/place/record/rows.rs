//! The lines below the header as rows of dates and values.

use chrono::NaiveDate;

use super::cells::{Cell, QuoteFault, plain_name, split_cells};
use super::dates::{DateFault, from_parts, from_year_and_day, parse_date};
use super::header::DateCells;
use super::notes::{Notes, shown};
use super::number::parse_number;
use super::plan::{ColumnPlan, RecordPlan};
use super::table::{CellState, Readings, Sheet, Table};
use crate::place::problem::Problem;

/// Numbers that loggers and archives write for "missing"; outside a measure's bounds they are never a measurement.
pub(super) const USUAL_MISSING: [f64; 14] =
    [-99.0, -99.9, -999.0, -999.9, -9999.0, -9999.9, -6999.0, -99999.0, 999.0, 999.9, 6999.0, 9999.0, 9999.9, 99999.0];

/// The declared marks for a missing value, as text and, where they are numbers, as numbers.
struct MissingMarks {
    texts: Vec<String>,
    numbers: Vec<f64>,
}

impl MissingMarks {
    fn new(plan: &RecordPlan) -> Self {
        let numbers = plan.missing.iter().filter_map(|mark| parse_number(mark, plan.decimal_comma).ok()).collect();
        Self { texts: plan.missing.iter().map(|mark| plain_name(mark)).collect(), numbers }
    }

    fn says(&self, text: &str) -> bool {
        text.is_empty() || (!self.texts.is_empty() && self.texts.contains(&plain_name(text)))
    }
}

/// Whether a line carries nothing: blank, a comment, or delimiters only, as spreadsheets leave below their last row.
pub(super) fn is_idle(line: &str, comment: Option<char>, delimiter: Option<char>) -> bool {
    let line = line.trim();
    line.is_empty()
        || comment.is_some_and(|mark| line.starts_with(mark))
        || delimiter.is_some_and(|mark| line.chars().all(|letter| letter == mark || letter == ' '))
}

/// Reads every line from the one with index `from`, and notes what is wrong with single lines and cells.
///
/// Also returns the rows whose date could not be read, not yet noted: it takes the whole file to tell a typing mistake
/// from a wrong order of day and month.
pub(super) fn read_rows<'t, 'p>(
    plan: &RecordPlan,
    sheet: Sheet<'t>,
    from: usize,
    header_cells: usize,
    date_cells: DateCells,
    columns: Vec<(&'p ColumnPlan, usize)>,
    notes: &mut Notes,
) -> (Table<'t, 'p>, Vec<(usize, DateFault)>) {
    let marks = MissingMarks::new(plan);
    let columns = columns
        .into_iter()
        .map(|(plan, cell)| Readings { plan, cell, values: Vec::new(), states: Vec::new() })
        .collect();
    let mut table = Table { sheet, lines: Vec::new(), dates: Vec::new(), date_cell: date_cells.first(), columns };
    let mut faults = Vec::new();
    let mut cells: Vec<Cell> = Vec::new();
    for index in from..table.sheet.lines.len() {
        let line = table.sheet.lines[index];
        if is_idle(line, plan.comment, Some(table.sheet.delimiter)) {
            continue;
        }
        let split = split_cells(line, table.sheet.delimiter, &mut cells);
        if let Err(fault) = split {
            note_quote(fault, index, &table.sheet, notes);
            cells.clear();
        } else {
            note_cell_count(&cells, header_cells, index, &table.sheet, notes);
        }
        match date_of(&cells, date_cells) {
            Some(Ok(date)) => table.dates.push(Some(date)),
            Some(Err(fault)) => {
                faults.push((table.lines.len(), fault));
                table.dates.push(None);
            }
            None => table.dates.push(None),
        }
        table.lines.push(index);
        for column in &mut table.columns {
            let (value, state) = match cells.get(column.cell) {
                Some(cell) => read_cell(cell, column.plan, &marks, plan.decimal_comma, index, &table.sheet, notes),
                None => (f64::NAN, CellState::Unreadable),
            };
            column.values.push(value);
            column.states.push(state);
        }
    }
    (table, faults)
}

fn date_of(cells: &[Cell], date_cells: DateCells) -> Option<Result<NaiveDate, DateFault>> {
    let text = |at: usize| cells.get(at).map(|cell| cell.text.as_ref());
    Some(match date_cells {
        DateCells::One(cell, order) => parse_date(text(cell)?, order),
        DateCells::Parts { year, month, day } => from_parts(text(year)?, text(month)?, text(day)?),
        DateCells::YearAndDay { year, day_of_year } => from_year_and_day(text(year)?, text(day_of_year)?),
    })
}

fn read_cell(
    cell: &Cell,
    column: &ColumnPlan,
    marks: &MissingMarks,
    decimal_comma: bool,
    line: usize,
    sheet: &Sheet,
    notes: &mut Notes,
) -> (f64, CellState) {
    if marks.says(&cell.text) {
        return (f64::NAN, CellState::Missing);
    }
    let message = match parse_number(&cell.text, decimal_comma) {
        Ok(number) if marks.numbers.contains(&number) => return (f64::NAN, CellState::Missing),
        Ok(number) => {
            let value = column.unit.to_si(number);
            let (low, high) = column.measure.bounds();
            // A computed inflow has no bounds, yet a river never flowed backwards by such a number.
            let odd = value < low || value > high || (low == f64::NEG_INFINITY && number < 0.0);
            if !(odd && USUAL_MISSING.contains(&number)) {
                return (value, CellState::Measured);
            }
            "problem-record-undeclared-missing"
        }
        Err(fault) => fault.message(),
    };
    let problem = Problem::error(sheet.at_bytes(line, cell.start, cell.end), message)
        .with("text", shown(&cell.text))
        .with("column", shown(&column.name));
    notes.add(problem);
    (f64::NAN, CellState::Unreadable)
}

/// Says what is wrong with the quotation marks of a line.
pub(super) fn note_quote(fault: QuoteFault, line: usize, sheet: &Sheet, notes: &mut Notes) {
    let (byte, message) = match fault {
        QuoteFault::Open(byte) => (byte, "problem-record-quote-open"),
        QuoteFault::Behind(byte) => (byte, "problem-record-quote-behind"),
    };
    notes.add(Problem::error(sheet.at_bytes(line, byte, byte), message));
}

/// A row must have a cell for each of the header; empty cells beyond it are the trace of a spreadsheet.
fn note_cell_count(cells: &[Cell], expected: usize, line: usize, sheet: &Sheet, notes: &mut Notes) {
    if cells.len() < expected {
        let problem = Problem::error(notes.line(line + 1), "problem-record-cells-few")
            .with("found", cells.len())
            .with("expected", expected);
        notes.add(problem);
    } else if let Some(extra) = cells[expected..].iter().find(|cell| !cell.text.is_empty()) {
        let problem = Problem::error(sheet.at_bytes(line, extra.start, extra.end), "problem-record-cells-many")
            .with("found", cells.len())
            .with("expected", expected);
        notes.add(problem);
    }
}
