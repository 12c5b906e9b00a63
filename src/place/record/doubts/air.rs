//! Doubts about humidity, sun, wind and vapour pressure: mostly the wrong unit.

use super::{Measured, about, often_over, rounded};
use crate::place::problem::Severity;
use crate::place::record::measure::Measure;
use crate::place::record::notes::{Notes, shown};
use crate::place::record::table::{Readings, Table};
use crate::place::record::unit::MeasureUnit;

/// Days that a column needs before a unit is doubted from its values.
const A_MONTH_DAYS: usize = 30;
/// More sun than this falls on no level surface in a day, MJ/m²; less than the top of the atmosphere at midsummer.
const MOST_SUN_MJ_M2: f64 = 45.0;
/// No settled place has a stronger mean wind, m/s.
const STRONG_MEAN_WIND_MS: f64 = 12.0;
/// No settled place has a higher mean vapour pressure, kPa.
const HIGH_MEAN_PRESSURE_KPA: f64 = 4.0;
/// Nor a lower one, kPa.
const LOW_MEAN_PRESSURE_KPA: f64 = 0.1;

/// Whether a humidity column mixes up shares and percent; notes it if so.
pub(super) fn doubt_humidity_unit(table: &Table, column: &Readings, measured: &Measured, notes: &mut Notes) -> bool {
    let message = match column.plan.unit {
        MeasureUnit::Percent if measured.count >= A_MONTH_DAYS && measured.highest <= 1.0 => {
            "problem-record-humidity-share"
        }
        MeasureUnit::Share if often_over(column, measured, 150.0) => "problem-record-humidity-percent",
        _ => return false,
    };
    let highest = rounded(column.plan.unit.from_si(measured.highest));
    notes.add(about(table, column, measured.highest_row, Severity::Error, message).with("highest", highest));
    true
}

/// Whether a radiation column mixes up W/m² and MJ/m²; notes it if so.
pub(super) fn doubt_solar_unit(table: &Table, column: &Readings, measured: &Measured, notes: &mut Notes) -> bool {
    let highest = column.plan.unit.from_si(measured.highest);
    let message = match column.plan.unit {
        MeasureUnit::MjPerM2 if often_over(column, measured, MOST_SUN_MJ_M2) => "problem-record-solar-watts",
        MeasureUnit::WattPerM2 if measured.covers_a_year() && highest <= MOST_SUN_MJ_M2 => {
            "problem-record-solar-megajoules"
        }
        _ => return false,
    };
    notes.add(about(table, column, measured.highest_row, Severity::Error, message).with("highest", rounded(highest)));
    true
}

/// Whether a pressure column mixes up hPa and kPa; notes it if so.
pub(super) fn doubt_pressure_unit(table: &Table, column: &Readings, measured: &Measured, notes: &mut Notes) -> bool {
    if measured.count < A_MONTH_DAYS {
        return false;
    }
    let message = match column.plan.unit {
        MeasureUnit::Kilopascal if measured.mean > HIGH_MEAN_PRESSURE_KPA => "problem-record-pressure-hectopascals",
        MeasureUnit::Hectopascal if measured.covers_a_year() && measured.mean < LOW_MEAN_PRESSURE_KPA => {
            "problem-record-pressure-kilopascals"
        }
        _ => return false,
    };
    let mean = rounded(column.plan.unit.from_si(measured.mean));
    notes.add(about(table, column, measured.highest_row, Severity::Error, message).with("mean", mean));
    true
}

/// Notes a wind that is too strong on average; the column is still taken for wind.
pub(super) fn doubt_wind(table: &Table, column: &Readings, measured: &Measured, notes: &mut Notes) -> bool {
    if measured.count >= A_MONTH_DAYS && measured.mean > STRONG_MEAN_WIND_MS {
        let unit = column.plan.unit;
        let problem = about(table, column, measured.first_row, Severity::Warning, "problem-record-wind-strong")
            .with("mean", rounded(unit.from_si(measured.mean)))
            .with("unit", unit.key());
        notes.add(problem);
    }
    false
}

/// Notes days on which the lowest humidity is over the highest.
pub(super) fn doubt_pairs(table: &Table, notes: &mut Notes) {
    let find = |measure| table.columns.iter().find(|column| column.plan.measure == measure);
    let (Some(low), Some(high)) = (find(Measure::RelativeHumidityMin), find(Measure::RelativeHumidityMax)) else {
        return;
    };
    let crossed: Vec<usize> =
        low.measured().filter(|(row, value)| *value > high.values[*row]).map(|(row, _)| row).collect();
    if let Some(first) = crossed.first() {
        let problem = about(table, low, *first, Severity::Error, "problem-record-humidity-crossed")
            .with("other", shown(&high.plan.name))
            .with("lowest", table.text(low, *first))
            .with("highest", table.text(high, *first))
            .with("count", crossed.len());
        notes.add(problem);
    }
}
