//! Which cell of a line is which: the header against the plan, and the plan against itself.

use super::cells::{Cell, plain_name};
use super::measure::Measure;
use super::notes::{Notes, shown};
use super::plan::{ColumnPlan, DateOrder, DatePlan, RecordPlan};
use super::table::Sheet;
use crate::place::problem::{Location, Problem};

/// Names of the header that a message repeats.
const MOST_NAMES_SHOWN: usize = 12;

/// The cells that make a row's date.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum DateCells {
    One(usize, DateOrder),
    Parts { year: usize, month: usize, day: usize },
    YearAndDay { year: usize, day_of_year: usize },
}

impl DateCells {
    /// The cell that messages point at.
    pub(super) fn first(self) -> usize {
        match self {
            DateCells::One(cell, _) => cell,
            DateCells::Parts { year, .. } | DateCells::YearAndDay { year, .. } => year,
        }
    }
}

/// What the plan gets wrong by itself: a unit that cannot be the measure's, one measure in two columns.
pub(super) fn check_plan(plan: &RecordPlan, notes: &mut Notes) {
    let place_of = |column: &ColumnPlan, notes: &Notes| column.declared_at.clone().unwrap_or_else(|| notes.line(0));
    if plan.columns.is_empty() {
        notes.add(Problem::error(notes.line(0), "problem-record-no-columns"));
    }
    for (index, column) in plan.columns.iter().enumerate() {
        if !column.measure.accepts(column.unit) {
            let units: Vec<&str> = column.measure.units().iter().map(|unit| unit.key()).collect();
            let problem = Problem::error(place_of(column, notes), "problem-record-unit")
                .with("column", shown(&column.name))
                .with("measure", column.measure.key())
                .with("unit", column.unit.key())
                .with("units", units.join(", "));
            notes.add(problem);
        }
        // One valley has one temperature, but it may have many gauges and canals.
        let many = matches!(column.measure, Measure::Flow | Measure::Diversion);
        let twin = plan.columns[..index].iter().find(|other| other.measure == column.measure);
        if let (Some(twin), false) = (twin, many) {
            let problem = Problem::error(place_of(column, notes), "problem-record-measure-twice")
                .with("column", shown(&column.name))
                .with("other", shown(&twin.name))
                .with("measure", column.measure.key());
            notes.add(problem);
        }
    }
}

/// Every column name that the plan asks for.
pub(super) fn wanted_names(plan: &RecordPlan) -> Vec<&str> {
    let mut names: Vec<&str> = match &plan.date {
        DatePlan::Column { name, .. } => vec![name],
        DatePlan::Parts { year, month, day } => vec![year, month, day],
        DatePlan::YearAndDay { year, day_of_year } => vec![year, day_of_year],
    };
    names.extend(plan.columns.iter().map(|column| column.name.as_str()));
    names
}

/// The cells of the plan's date and columns in the `header` on the line with index `line`; `None` where the date is
/// not there. A column that is not there is noted and left out.
pub(super) fn find_columns<'p>(
    plan: &'p RecordPlan,
    header: &[Cell],
    line: usize,
    sheet: &Sheet,
    notes: &mut Notes,
) -> Option<(DateCells, Vec<(&'p ColumnPlan, usize)>)> {
    let names: Vec<String> = header.iter().map(|cell| plain_name(&cell.text)).collect();
    let mut find = |name: &str, declared_at: Option<&Location>| -> Option<usize> {
        let wanted = plain_name(name);
        let mut found = (0..names.len()).filter(|at| names[*at] == wanted);
        let first = found.next();
        if let Some(second) = found.next() {
            let problem = Problem::error(sheet.at_cell(line, second), "problem-record-column-twice");
            notes.add(problem.with("column", shown(name)));
        }
        if first.is_none() {
            let at = declared_at.cloned().unwrap_or_else(|| notes.line(line + 1));
            let mut there: Vec<String> = header.iter().take(MOST_NAMES_SHOWN).map(|cell| shown(&cell.text)).collect();
            if header.len() > MOST_NAMES_SHOWN {
                there.push("…".to_owned());
            }
            let problem = Problem::error(at, "problem-record-column-missing")
                .with("column", shown(name))
                .with("found", there.join(", "));
            notes.add(problem);
        }
        first
    };
    let date = match &plan.date {
        DatePlan::Column { name, order } => find(name, None).map(|cell| DateCells::One(cell, *order)),
        DatePlan::Parts { year, month, day } => {
            let (year, month, day) = (find(year, None), find(month, None), find(day, None));
            year.zip(month).zip(day).map(|((year, month), day)| DateCells::Parts { year, month, day })
        }
        DatePlan::YearAndDay { year, day_of_year } => {
            let (year, day_of_year) = (find(year, None), find(day_of_year, None));
            year.zip(day_of_year).map(|(year, day_of_year)| DateCells::YearAndDay { year, day_of_year })
        }
    };
    let columns = plan
        .columns
        .iter()
        .filter_map(|column| find(&column.name, column.declared_at.as_ref()).map(|cell| (column, cell)))
        .collect();
    date.map(|date| (date, columns))
}
