//! Doubts about rain, snow and evaporation: the wrong unit, a gauge that adds up, a gauge that stopped.

use super::{ALMOST_A_YEAR_DAYS, Measured, YEAR_DAYS, about, longest_run, rounded, without_slips};
use crate::place::problem::Severity;
use crate::place::record::notes::Notes;
use crate::place::record::table::{Readings, Table};
use crate::place::record::unit::MeasureUnit;

/// Rises that a gauge must show before it can be said to add up.
const RISES_OF_A_SUM: usize = 20;
/// Less than this a year is drier than any valley with a snowpack, mm.
const DRY_YEAR_MM: f64 = 120.0;
/// A wet day brings more than this on average anywhere, mm.
const LIGHT_WET_DAY_MM: f64 = 0.8;
/// A wet day brings less than this on average anywhere, mm.
const HEAVY_WET_DAY_MM: f64 = 40.0;
/// More than this a year falls in no valley that has a canal, mm.
const WET_YEAR_MM: f64 = 8_000.0;
/// So little a year is possible, and worth a look, mm.
const DESERT_YEAR_MM: f64 = 100.0;
/// Where more than this falls in a year, a long dry run is worth a look, mm.
const MOIST_YEAR_MM: f64 = 400.0;
/// A dry run that is worth a look there, days.
const LONG_DRY_RUN_DAYS: usize = 200;
/// Reference evaporation has a higher mean than this anywhere that crops grow, mm a day.
const LOW_EVAPORATION_MM: f64 = 0.4;

/// Whether a precipitation column looks like something else; notes it if so.
pub(super) fn doubt_precipitation(table: &Table, column: &Readings, measured: &Measured, notes: &mut Notes) -> bool {
    if let Some(row) = sum_shows_at(column, measured) {
        notes.add(about(table, column, row, Severity::Error, "problem-record-precipitation-adds-up"));
        return true;
    }
    let (wet_days, wet_sum) = without_slips(column)
        .filter(|(_, value)| *value > 0.0)
        .fold((0usize, 0.0), |(days, sum), (_, value)| (days + 1, sum + value));
    let wet_day_mm = wet_sum / wet_days.max(1) as f64;
    let year_mm = measured.mean * YEAR_DAYS;
    let year = rounded(column.plan.unit.from_si(year_mm));
    let unit = column.plan.unit.key();
    let say = |severity, message| about(table, column, measured.highest_row, severity, message).with("year", year);
    let heavy = wet_days >= 30 && wet_day_mm > HEAVY_WET_DAY_MM;
    if heavy || (measured.covers_a_year() && year_mm > WET_YEAR_MM) {
        notes.add(say(Severity::Error, "problem-record-precipitation-much").with("unit", unit));
        return true;
    }
    if !measured.covers_a_year() || wet_days == 0 {
        return false;
    }
    let in_mm = column.plan.unit == MeasureUnit::Millimetre;
    if in_mm && year_mm < DRY_YEAR_MM && wet_day_mm < LIGHT_WET_DAY_MM {
        notes.add(say(Severity::Error, "problem-record-precipitation-inches"));
        return true;
    }
    if year_mm < DESERT_YEAR_MM {
        notes.add(say(Severity::Warning, "problem-record-precipitation-little").with("unit", unit));
    }
    let (first, days) = longest_run(column, |one, next| one == 0.0 && next == 0.0);
    if year_mm > MOIST_YEAR_MM && days > LONG_DRY_RUN_DAYS {
        let problem = about(table, column, first, Severity::Warning, "problem-record-precipitation-dry-run");
        notes.add(problem.with("days", days));
    }
    false
}

/// The row of the first rise after the first rise, if the column only rises (but for a reset a year).
fn sum_shows_at(column: &Readings, measured: &Measured) -> Option<usize> {
    let mut before = None;
    let (mut rises, mut falls, mut second_rise) = (0usize, 0usize, None);
    for (row, value) in column.measured() {
        if let Some(before) = before {
            rises += usize::from(value > before);
            falls += usize::from(value < before);
            if rises == 2 && second_rise.is_none() {
                second_rise = Some(row);
            }
        }
        before = Some(value);
    }
    let only_rises = rises >= RISES_OF_A_SUM && falls <= 1 + measured.count / ALMOST_A_YEAR_DAYS;
    if only_rises { second_rise } else { None }
}

/// Whether a column of reference evaporation looks like inches; notes it if so.
pub(super) fn doubt_evaporation(table: &Table, column: &Readings, measured: &Measured, notes: &mut Notes) -> bool {
    let low = column.plan.unit == MeasureUnit::Millimetre && measured.covers_a_year();
    if !low || measured.mean >= LOW_EVAPORATION_MM {
        return false;
    }
    let problem = about(table, column, measured.highest_row, Severity::Error, "problem-record-evaporation-little")
        .with("year", rounded(measured.mean * YEAR_DAYS));
    notes.add(problem);
    true
}
