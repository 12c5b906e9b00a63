//! The days of a record: in the declared order of day and month, one row each, none twice, none left out.

use chrono::{Datelike, Days, NaiveDate};

use super::dates::{DateFault, parse_date};
use super::header::DateCells;
use super::notes::Notes;
use super::plan::DateOrder;
use super::table::Table;
use crate::place::problem::Problem;

/// Steps from row to row that it takes to say that a file is not of days.
const FEWEST_STEPS: usize = 5;

/// Notes dates that could not be read. Where another order of year, month and day fits the file, that one mistake is
/// noted in place of them all, and the dates are read again in it so that the rest can still be checked.
pub(super) fn settle_dates(
    table: &mut Table,
    date_cells: DateCells,
    mut faults: Vec<(usize, DateFault)>,
    notes: &mut Notes,
) {
    if let DateCells::One(cell, declared) = date_cells {
        let suspect = !faults.is_empty() || !is_daily(&table.dates);
        let other = if suspect { better_order(table, cell, declared, faults.len()) } else { None };
        if let Some((order, dates, other_faults)) = other {
            // The first date that gives the order away: one that could not be read, or the one that breaks the days.
            let row = faults.first().map_or_else(|| first_break(&table.dates), |(row, _)| *row);
            let problem = Problem::error(table.at_date(row), "problem-record-date-order")
                .with("text", table.date_text(row))
                .with("declared", declared.key())
                .with("found", order.key());
            notes.add(problem);
            table.dates = dates;
            faults = other_faults;
        }
    }
    for (row, fault) in faults {
        notes.add(Problem::error(table.at_date(row), fault.message()).with("text", table.date_text(row)));
    }
}

type Reread = (DateOrder, Vec<Option<NaiveDate>>, Vec<(usize, DateFault)>);

/// Another order that fits clearly better: hardly any faults where the declared one has many, or every day in turn.
fn better_order(table: &Table, cell: usize, declared: DateOrder, declared_faults: usize) -> Option<Reread> {
    for order in DateOrder::ALL {
        if order == declared {
            continue;
        }
        let mut dates = Vec::with_capacity(table.lines.len());
        let mut faults = Vec::new();
        for (row, line) in table.lines.iter().enumerate() {
            let date = table.sheet.cell(*line, cell).map(|cell| parse_date(&cell.text, order));
            if let Some(Err(fault)) = date {
                faults.push((row, fault));
            }
            dates.push(date.and_then(Result::ok));
        }
        let fewer = declared_faults > 0 && faults.len() * 10 < declared_faults;
        let in_turn = declared_faults == 0 && faults.is_empty() && is_daily(&dates);
        if fewer || in_turn {
            return Some((order, dates, faults));
        }
    }
    None
}

fn is_daily(dates: &[Option<NaiveDate>]) -> bool {
    dates.windows(2).all(|pair| pair[1].is_some() && pair[0].and_then(|date| date.succ_opt()) == pair[1])
}

fn first_break(dates: &[Option<NaiveDate>]) -> usize {
    let broken = |pair: &[Option<NaiveDate>]| pair[0].and_then(|date| date.succ_opt()) != pair[1];
    dates.windows(2).position(broken).map_or(0, |row| row + 1)
}

/// Notes days that come twice, out of order or not at all.
pub(super) fn check_days(table: &Table, notes: &mut Notes) {
    let mut sorted: Vec<(NaiveDate, usize)> =
        table.dates.iter().enumerate().filter_map(|(row, date)| date.map(|date| (date, row))).collect();
    let newest_first = sorted.len() > 1 && sorted.windows(2).all(|pair| pair[1].0 < pair[0].0);
    if newest_first {
        let row = sorted[1].1;
        notes.add(Problem::error(table.at_date(row), "problem-record-newest-first").with("date", sorted[1].0));
    }
    let mut latest: Option<NaiveDate> = None;
    let mut late = Vec::new();
    for (date, row) in &sorted {
        if latest.is_some_and(|latest| *date < latest) {
            late.push((*row, *date));
        }
        latest = latest.max(Some(*date));
    }
    sorted.sort_unstable();
    let mut twice = vec![false; table.lines.len()];
    for pair in sorted.chunk_by(|one, next| one.0 == next.0) {
        for (date, row) in &pair[1..] {
            twice[*row] = true;
            let problem = Problem::error(table.at_date(*row), "problem-record-day-twice")
                .with("date", *date)
                .with("first", table.line_number(pair[0].1));
            notes.add(problem);
        }
    }
    // A day that is there already is said once, as a double.
    for (row, date) in late.into_iter().filter(|(row, _)| !newest_first && !twice[*row]) {
        notes.add(Problem::error(table.at_date(row), "problem-record-day-out-of-order").with("date", date));
    }
    note_holes(table, &sorted, newest_first, notes);
}

fn note_holes(table: &Table, sorted: &[(NaiveDate, usize)], newest_first: bool, notes: &mut Notes) {
    // Rows without a readable date may be the very days that seem to be missing.
    let mut undated_before = Vec::with_capacity(table.dates.len());
    let mut undated = 0;
    for date in &table.dates {
        undated_before.push(undated);
        undated += usize::from(date.is_none());
    }
    let steps = sorted.windows(2).filter(|pair| pair[1].0 > pair[0].0).count();
    let wide = sorted.windows(2).filter(|pair| (pair[1].0 - pair[0].0).num_days() > 1).count();
    if steps >= FEWEST_STEPS && wide * 2 > steps {
        // Months or weeks: one mistake, not a hole behind every row.
        let problem = Problem::error(table.at_date(sorted[1].1), "problem-record-not-daily");
        notes.add(problem.with("count", wide).with("rows", table.lines.len()));
        return;
    }
    for pair in sorted.windows(2) {
        let ((before, row_before), (after, row)) = (pair[0], pair[1]);
        let missing = usize::try_from((after - before).num_days() - 1).unwrap_or(0);
        let between = undated_before[row].abs_diff(undated_before[row_before]);
        if missing == 0 || missing <= between {
            continue;
        }
        let row = if newest_first { row_before } else { row };
        let at = table.at_date(row);
        let first = before + Days::new(1);
        let problem = if missing == 1 && first.month() == 2 && first.day() == 29 {
            Problem::error(at, "problem-record-leap-day-missing").with("date", first)
        } else {
            Problem::error(at, "problem-record-days-missing")
                .with("days", missing)
                .with("first", first)
                .with("last", after - Days::new(1))
        };
        notes.add(problem);
    }
}
