//! Numbers that can be read but are hardly what the place says they are.
//!
//! Each doubt is noted once a column, at the line that shows it best. Where a whole column looks like another unit, its
//! single values are not complained of as well. The limits are common practice, no source, unless one is named.

mod air;
mod temperature;
mod water;

use super::measure::Measure;
use super::notes::{Notes, shown};
use super::table::{Readings, Table};
use crate::place::problem::{Problem, Severity};

/// Days that a column needs before its yearly figures mean anything.
const ALMOST_A_YEAR_DAYS: usize = 300;
/// Values beyond all bounds are slips, and no habit of the column, where fewer than one in this many are.
const SLIPS_IN_VALUES: usize = 100;
/// Mean length of a year, days.
const YEAR_DAYS: f64 = 365.25;
/// Days in a row with one and the same reading that look like a stuck instrument.
const STUCK_DAYS: usize = 20;

/// Notes every doubt about the values of `table`.
pub(super) fn doubt(table: &Table, notes: &mut Notes) {
    let mut wrong_scale = false;
    for column in &table.columns {
        if !column.plan.measure.accepts(column.plan.unit) {
            // Already noted; values in a wrong kind of unit say nothing.
            continue;
        }
        let measured = Measured::of(column);
        if measured.count == 0 {
            continue;
        }
        let other_unit = match column.plan.measure {
            measure if measure.is_temperature() => temperature::doubt_unit(table, column, &measured, notes),
            measure if measure.is_humidity() => air::doubt_humidity_unit(table, column, &measured, notes),
            Measure::Precipitation => water::doubt_precipitation(table, column, &measured, notes),
            Measure::ReferenceEvaporation => water::doubt_evaporation(table, column, &measured, notes),
            Measure::Solar => air::doubt_solar_unit(table, column, &measured, notes),
            Measure::VapourPressure => air::doubt_pressure_unit(table, column, &measured, notes),
            Measure::Wind => air::doubt_wind(table, column, &measured, notes),
            _ => false,
        };
        if other_unit {
            wrong_scale |= column.plan.measure.is_temperature();
        } else {
            note_out_of_bounds(table, column, notes);
            note_stuck(table, column, notes);
        }
    }
    temperature::doubt_pairs(table, wrong_scale, notes);
    air::doubt_pairs(table, notes);
}

/// The measured values of a column in a few figures, slips left out.
struct Measured {
    count: usize,
    mean: f64,
    highest: f64,
    /// Row of the highest value.
    highest_row: usize,
    first_row: usize,
}

impl Measured {
    fn of(column: &Readings) -> Self {
        let mut all = Measured { count: 0, mean: 0.0, highest: f64::NEG_INFINITY, highest_row: 0, first_row: 0 };
        for (row, value) in without_slips(column) {
            if all.count == 0 {
                all.first_row = row;
            }
            if value > all.highest {
                (all.highest, all.highest_row) = (value, row);
            }
            all.mean += value;
            all.count += 1;
        }
        all.mean /= all.count.max(1) as f64;
        all
    }

    fn covers_a_year(&self) -> bool {
        self.count >= ALMOST_A_YEAR_DAYS
    }
}

/// The measured values but for slips, which are told one by one.
fn without_slips(column: &Readings) -> impl Iterator<Item = (usize, f64)> {
    let (low, high) = column.plan.measure.bounds();
    let beyond = move |value: f64| value < low || value > high;
    let slips = column.measured().filter(|(_, value)| beyond(*value)).count();
    let few = slips * SLIPS_IN_VALUES < column.measured().count();
    column.measured().filter(move |(_, value)| !(few && beyond(*value)))
}

/// Whether enough values lie over `limit` to be a habit of the column and not a typing mistake: one in a hundred, and
/// three at least.
fn often_over(column: &Readings, measured: &Measured, limit: f64) -> bool {
    let over = column.measured().filter(|(_, value)| *value > limit).count();
    over >= 3 && over * 100 >= measured.count
}

/// A problem that points at the value of `row` and names the column.
fn about(table: &Table, column: &Readings, row: usize, severity: Severity, message: &'static str) -> Problem {
    let at = table.at(column, row);
    let problem = match severity {
        Severity::Error => Problem::error(at, message),
        Severity::Warning => Problem::warning(at, message),
    };
    problem.with("column", shown(&column.plan.name))
}

/// Rounded to about three figures for a message.
fn rounded(value: f64) -> f64 {
    let scale = match libm::fabs(value) {
        size if size >= 100.0 => 1.0,
        size if size >= 10.0 => 10.0,
        _ => 100.0,
    };
    libm::round(value * scale) / scale
}

fn note_out_of_bounds(table: &Table, column: &Readings, notes: &mut Notes) {
    let (low, high) = column.plan.measure.bounds();
    let negative_message = match column.plan.measure {
        Measure::Precipitation => Some("problem-record-precipitation-negative"),
        Measure::SnowWater => Some("problem-record-snow-negative"),
        Measure::Flow | Measure::Diversion => Some("problem-record-flow-negative"),
        Measure::Storage => Some("problem-record-storage-negative"),
        _ => None,
    };
    let below: Vec<usize> = column.measured().filter(|(_, value)| *value < low).map(|(row, _)| row).collect();
    let above: Vec<usize> = column.measured().filter(|(_, value)| *value > high).map(|(row, _)| row).collect();
    if let (Some(message), Some(first)) = (negative_message, below.first()) {
        let problem = about(table, column, *first, Severity::Error, message)
            .with("text", table.text(column, *first))
            .with("count", below.len());
        notes.add(problem);
    }
    let others = if negative_message.is_some() { above } else { [below, above].concat() };
    if let Some(first) = others.iter().min() {
        let unit = column.plan.unit;
        let problem = about(table, column, *first, Severity::Error, "problem-record-out-of-bounds")
            .with("text", table.text(column, *first))
            .with("count", others.len())
            .with("low", rounded(unit.from_si(low)))
            .with("high", rounded(unit.from_si(high)))
            .with("unit", unit.key());
        notes.add(problem);
    }
    let negative = column.measured().filter(|(_, value)| *value < 0.0);
    if column.plan.measure == Measure::ComputedInflow {
        let rows: Vec<usize> = negative.map(|(row, _)| row).collect();
        if let Some(first) = rows.first() {
            let problem = about(table, column, *first, Severity::Warning, "problem-record-inflow-negative")
                .with("text", table.text(column, *first))
                .with("count", rows.len());
            notes.add(problem);
        }
    }
}

/// The longest run of consecutive measured rows on which `same` holds from one to the next: first row and length.
fn longest_run(column: &Readings, same: impl Fn(f64, f64) -> bool) -> (usize, usize) {
    let mut longest = (0, 0);
    let mut run: Option<(usize, usize, f64)> = None;
    for (row, value) in column.measured() {
        let next = match run {
            Some((first, days, before)) if first + days == row && same(before, value) => (first, days + 1, value),
            _ => (row, 1, value),
        };
        if next.1 > longest.1 {
            longest = (next.0, next.1);
        }
        run = Some(next);
    }
    longest
}

fn note_stuck(table: &Table, column: &Readings, notes: &mut Notes) {
    let measure = column.plan.measure;
    let moves_daily =
        measure.is_temperature() || matches!(measure, Measure::DewPoint | Measure::VapourPressure | Measure::Wind);
    if !moves_daily {
        return;
    }
    let (first, days) = longest_run(column, |one, next| one == next);
    if days >= STUCK_DAYS {
        let problem = about(table, column, first, Severity::Warning, "problem-record-stuck")
            .with("text", table.text(column, first))
            .with("days", days);
        notes.add(problem);
    }
}
