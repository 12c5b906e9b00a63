//! Missing cells: filled by the column's rule, counted, or refused.

use chrono::{Datelike, NaiveDate};

use super::measure::Measure;
use super::notes::{Notes, shown};
use super::plan::{GapFill, GapRule};
use super::table::{CellState, Readings, Table};
use crate::place::problem::{Location, Problem};

/// What became of a column's missing cells.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Default)]
pub(super) struct Gaps {
    pub(super) missing: usize,
    pub(super) filled: usize,
    pub(super) longest_days: usize,
}

/// Fills the gaps of the column at `index` as its rule says and notes those that it refuses.
pub(super) fn close_gaps(table: &mut Table, index: usize, notes: &mut Notes) -> Gaps {
    let column = &table.columns[index];
    let rule = column.plan.gaps;
    let mut gaps = Gaps::default();
    let runs = missing_runs(column);
    let unread = column.states.contains(&CellState::Unreadable);
    if !runs.is_empty() && column.measured().next().is_none() && !unread {
        let at = table.at(column, 0);
        let problem = if rule.how == GapFill::Keep {
            Problem::warning(at, "problem-record-column-empty")
        } else {
            Problem::error(at, "problem-record-column-empty")
        };
        notes.add(problem.with("column", shown(&column.plan.name)));
        return Gaps { missing: column.states.len(), filled: 0, longest_days: column.states.len() };
    }
    let means = if rule.how == GapFill::Mean { monthly_means(column, &table.dates) } else { [None; 12] };
    let mut fills = Vec::new();
    for (first, days) in runs {
        gaps.missing += days;
        gaps.longest_days = gaps.longest_days.max(days);
        let outcome = match rule.how {
            GapFill::Keep => continue,
            GapFill::Refuse => Err("problem-record-gap-refused"),
            _ if days > rule.longest_days => Err("problem-record-gap-long"),
            GapFill::Linear => bridge(column, first, days, &mut fills),
            GapFill::Zero => {
                fills.extend((first..first + days).map(|row| (row, 0.0)));
                Ok(())
            }
            GapFill::Mean => fill_with(&means, &table.dates, first, days, &mut fills),
        };
        match outcome {
            Ok(()) => gaps.filled += days,
            Err(message) => {
                let at = table.at(column, first);
                notes.add(refusal(at, message, &column.plan.name, days, rule));
            }
        }
    }
    for (row, value) in fills {
        table.columns[index].values[row] = value;
    }
    gaps
}

/// Notes days on which filling one column of a pair put it on the wrong side of the other.
pub(super) fn check_filled_pairs(table: &Table, notes: &mut Notes) {
    let pairs = [
        (Measure::TemperatureMin, Measure::TemperatureMax),
        (Measure::RelativeHumidityMin, Measure::RelativeHumidityMax),
    ];
    for (low, high) in pairs {
        let find = |measure| table.columns.iter().find(|column| column.plan.measure == measure);
        let (Some(low), Some(high)) = (find(low), find(high)) else { continue };
        for row in 0..table.lines.len() {
            let filled = if low.states[row] == CellState::Missing { low } else { high };
            // Days measured on both sides were judged before.
            if filled.states[row] == CellState::Missing && low.values[row] > high.values[row] {
                let problem = Problem::error(table.at(filled, row), "problem-record-filled-across")
                    .with("column", shown(&low.plan.name))
                    .with("other", shown(&high.plan.name));
                notes.add(problem);
            }
        }
    }
}

fn refusal(at: Location, message: &'static str, name: &str, days: usize, rule: GapRule) -> Problem {
    let problem = Problem::error(at, message).with("column", shown(name)).with("days", days);
    if message == "problem-record-gap-long" { problem.with("limit", rule.longest_days) } else { problem }
}

/// First row and length of each run of missing cells.
fn missing_runs(column: &Readings) -> Vec<(usize, usize)> {
    let mut runs: Vec<(usize, usize)> = Vec::new();
    for (row, state) in column.states.iter().enumerate() {
        if *state != CellState::Missing {
            continue;
        }
        match runs.last_mut() {
            Some((first, days)) if *first + *days == row => *days += 1,
            _ => runs.push((row, 1)),
        }
    }
    runs
}

/// A straight line from the day before to the day after.
fn bridge(column: &Readings, first: usize, days: usize, fills: &mut Vec<(usize, f64)>) -> Result<(), &'static str> {
    let behind = first + days;
    if first == 0 || behind >= column.values.len() {
        return Err("problem-record-gap-at-end");
    }
    let (left, right) = (column.values[first - 1], column.values[behind]);
    for step in 1..=days {
        let share = step as f64 / (days + 1) as f64;
        fills.push((first + step - 1, left + (right - left) * share));
    }
    Ok(())
}

fn monthly_means(column: &Readings, dates: &[Option<NaiveDate>]) -> [Option<f64>; 12] {
    let mut sums = [(0.0, 0usize); 12];
    for (row, value) in column.measured() {
        if let Some(date) = dates[row] {
            let (sum, count) = &mut sums[date.month0() as usize];
            *sum += value;
            *count += 1;
        }
    }
    sums.map(|(sum, count)| (count > 0).then(|| sum / count as f64))
}

fn fill_with(
    means: &[Option<f64>; 12],
    dates: &[Option<NaiveDate>],
    first: usize,
    days: usize,
    fills: &mut Vec<(usize, f64)>,
) -> Result<(), &'static str> {
    for (row, date) in dates.iter().enumerate().skip(first).take(days) {
        // Without a date the record is refused anyway, and its gap needs no message of its own.
        let Some(date) = date else { continue };
        let mean = means[date.month0() as usize].ok_or("problem-record-gap-no-mean")?;
        fills.push((row, mean));
    }
    Ok(())
}
