//! One delimited text file of daily values, read by a declared mapping into columns in the water's own units.
//!
//! A record is read whole and every mistake in it is noted at its line and column, all at once: what cannot be read,
//! days that come twice or not at all, gaps that the place's rule does not close, and numbers that can be read but are
//! hardly what the place says they are (°F given as °C, inches as mm, day and month swapped, a gauge that adds up).
//! Nothing is corrected in silence: the values that come back are the file's own, converted, plus the filled gaps,
//! which are counted.
//!
//! ```
//! use deshielo::place::record::{ColumnPlan, DateOrder, DatePlan, Measure, MeasureUnit, RecordPlan, read_record};
//!
//! let date = DatePlan::Column { name: "day".into(), order: DateOrder::DayMonthYear };
//! let columns = vec![ColumnPlan::new("coldest", Measure::TemperatureMin, MeasureUnit::Fahrenheit)];
//! let plan = RecordPlan::new("days.csv", date, columns);
//! let mut problems = Vec::new();
//! let record = read_record(&plan, b"day;coldest\n30/09/2004;32\n01/10/2004;50\n", &mut problems).unwrap();
//! assert!(problems.is_empty());
//! assert_eq!((record.days, record.columns[0].values[1]), (2, 10.0));
//! ```

mod append;
mod cells;
mod checksum;
mod dates;
mod days;
mod doubts;
mod gaps;
mod header;
mod look;
mod measure;
mod notes;
mod number;
mod peek;
mod plan;
mod rows;
mod table;
mod text;
mod unit;

use chrono::NaiveDate;

pub use append::{Appended, append, with_open_gaps};
pub use checksum::checksum_of;
pub use look::{ColumnLook, RecordLook, Spread};
pub use measure::Measure;
pub use peek::{ColumnRole, DateReason, Peek, PeekColumn, UnitReason, peek};
pub use plan::{ColumnPlan, DateOrder, DatePlan, Encoding, GapFill, GapRule, RecordPlan};
pub use unit::MeasureUnit;

use super::problem::Problem;
pub(super) use cells::plain_name;
use cells::{recognise_delimiter, split_cells};
use notes::Notes;
use table::Sheet;

/// A record that was read without an error.
#[derive(Clone, Debug, PartialEq)]
pub struct ReadRecord {
    /// The first day; every later day follows without a hole.
    pub first_date: NaiveDate,
    /// How many days.
    pub days: usize,
    /// The columns in the order of the plan, each with one value a day.
    pub columns: Vec<Column>,
    /// Fingerprint of the file's bytes, see [`checksum_of`].
    pub checksum: u64,
}

/// One column of a record.
#[derive(Clone, Debug, PartialEq)]
pub struct Column {
    /// Its name in the plan.
    pub name: String,
    /// What it measures, which also says the unit of `values`.
    pub measure: Measure,
    /// One value a day in the measure's own unit; NaN only in gaps that the plan keeps.
    pub values: Vec<f64>,
    /// Missing days that were filled.
    pub filled: usize,
    /// Days that were missing in the file.
    pub missing: usize,
    /// The longest gap in the file, days.
    pub longest_gap_days: usize,
}

impl ReadRecord {
    /// The first column that measures `measure`.
    pub fn column(&self, measure: Measure) -> Option<&Column> {
        self.columns.iter().find(|column| column.measure == measure)
    }

    /// The column of this name in the plan.
    pub fn column_named(&self, name: &str) -> Option<&Column> {
        self.columns.iter().find(|column| column.name == name)
    }
}

/// Reads the record in `bytes` by `plan`.
///
/// Every mistake goes to `problems`, warnings too; `None` if any of them is an error. More than twenty of one kind are
/// shown as twenty and a count. Takes memory in proportion to the file, whatever its bytes are.
pub fn read_record(plan: &RecordPlan, bytes: &[u8], problems: &mut Vec<Problem>) -> Option<ReadRecord> {
    let mut notes = Notes::new(&plan.file, problems);
    let read = read_noted(plan, bytes, &mut notes);
    if notes.finish() { read } else { None }
}

fn read_noted(plan: &RecordPlan, bytes: &[u8], notes: &mut Notes) -> Option<ReadRecord> {
    header::check_plan(plan, notes);
    let text = text::decode(bytes, plan.encoding, notes)?;
    let lines = text::lines_of(&text);
    let header_line = (plan.skip_lines..lines.len()).find(|line| !rows::is_idle(lines[*line], plan.comment, None));
    let Some(header_line) = header_line else {
        notes.add(Problem::error(notes.line(0), "problem-record-empty"));
        return None;
    };
    let wanted = header::wanted_names(plan);
    let recognised = plan.delimiter.or_else(|| recognise_delimiter(lines[header_line], &wanted));
    let Some(delimiter) = recognised else {
        notes.add(Problem::error(notes.line(header_line + 1), "problem-record-delimiter"));
        return None;
    };
    let sheet = Sheet { file: &plan.file, lines, delimiter };
    let mut cells = Vec::new();
    if let Err(fault) = split_cells(sheet.lines[header_line], delimiter, &mut cells) {
        rows::note_quote(fault, header_line, &sheet, notes);
        return None;
    }
    // A header may end in delimiters with no name behind them.
    let named = cells.iter().rposition(|cell| !cell.text.is_empty()).map_or(0, |last| last + 1);
    let (date_cells, columns) = header::find_columns(plan, &cells, header_line, &sheet, notes)?;
    let (mut table, date_faults) = rows::read_rows(plan, sheet, header_line + 1, named, date_cells, columns, notes);
    if table.lines.is_empty() {
        notes.add(Problem::error(notes.line(header_line + 1), "problem-record-no-days"));
        return None;
    }
    days::settle_dates(&mut table, date_cells, date_faults, notes);
    days::check_days(&table, notes);
    doubts::doubt(&table, notes);
    let gaps: Vec<gaps::Gaps> =
        (0..table.columns.len()).map(|index| gaps::close_gaps(&mut table, index, notes)).collect();
    gaps::check_filled_pairs(&table, notes);
    let first_date = (*table.dates.first()?)?;
    let columns = table.columns.into_iter().zip(gaps).map(|(readings, gaps)| Column {
        name: readings.plan.name.clone(),
        measure: readings.plan.measure,
        values: readings.values,
        filled: gaps.filled,
        missing: gaps.missing,
        longest_gap_days: gaps.longest_days,
    });
    Some(ReadRecord { first_date, days: table.lines.len(), columns: columns.collect(), checksum: checksum_of(bytes) })
}
