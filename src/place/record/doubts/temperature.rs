//! Doubts about temperatures: the wrong scale, columns swapped, the coldest warmer than the warmest.

use super::{Measured, about, often_over, rounded, without_slips};
use crate::place::problem::Severity;
use crate::place::record::measure::Measure;
use crate::place::record::notes::{Notes, shown};
use crate::place::record::table::{Readings, Table};
use crate::place::record::unit::MeasureUnit;

/// Rounding to whole °F on both sides can push a mean this far out of its day's range, °C.
const MEAN_SLACK_C: f64 = 0.6;
/// A dew point over the day's warmest by more than this is no rounding, °C.
const DEW_SLACK_C: f64 = 1.0;
/// No settled place has a wider mean range of the day, °C.
const WIDEST_MEAN_RANGE_C: f64 = 22.0;

/// Whether a temperature column looks like the other scale; notes it if so.
pub(super) fn doubt_unit(table: &Table, column: &Readings, measured: &Measured, notes: &mut Notes) -> bool {
    // Highest believable mean and reading in °C, and the reading in °F that nearly every place passes on one day in a
    // hundred.
    let (mean_c, highest_c, warm_day_f) = match column.plan.measure {
        Measure::TemperatureMin => (30.0, 45.0, 25.0),
        Measure::TemperatureMax => (42.0, 57.0, 48.0),
        _ => (36.0, 50.0, 40.0),
    };
    match column.plan.unit {
        MeasureUnit::Celsius => {
            let too_warm = measured.count >= 30 && measured.mean > mean_c;
            if !too_warm && !often_over(column, measured, highest_c) {
                return false;
            }
            let problem = about(table, column, measured.highest_row, Severity::Error, "problem-record-fahrenheit")
                .with("highest", rounded(measured.highest))
                .with("mean", rounded(measured.mean));
            notes.add(problem);
            true
        }
        MeasureUnit::Fahrenheit => {
            let warm_day_c = MeasureUnit::Fahrenheit.to_si(warm_day_f);
            if !measured.covers_a_year() || often_over(column, measured, warm_day_c) {
                return false;
            }
            let problem = about(table, column, measured.highest_row, Severity::Error, "problem-record-celsius")
                .with("highest", rounded(MeasureUnit::Fahrenheit.from_si(measured.highest)));
            notes.add(problem);
            true
        }
        _ => false,
    }
}

/// Notes what is wrong between the temperature columns. Where one of them has the wrong scale (`wrong_scale`), a wide
/// range of the day says nothing new.
pub(super) fn doubt_pairs(table: &Table, wrong_scale: bool, notes: &mut Notes) {
    let find = |measure| table.columns.iter().find(|column| column.plan.measure == measure);
    let (tmin, tmax) = (find(Measure::TemperatureMin), find(Measure::TemperatureMax));
    if let (Some(tmin), Some(tmax)) = (tmin, tmax) {
        let same_kind = tmin.plan.measure.accepts(tmin.plan.unit) && tmax.plan.measure.accepts(tmax.plan.unit);
        if same_kind {
            doubt_range(table, tmin, tmax, wrong_scale, notes);
        }
    }
    if let Some(tmean) = find(Measure::TemperatureMean) {
        let outside = rows_where(tmean, |row, mean| {
            let low = tmin.map_or(f64::NAN, |column| column.values[row]);
            let high = tmax.map_or(f64::NAN, |column| column.values[row]);
            mean < low - MEAN_SLACK_C || mean > high + MEAN_SLACK_C
        });
        note_count(table, tmean, &outside, "problem-record-mean-outside", notes);
    }
    if let (Some(dew), Some(tmax)) = (find(Measure::DewPoint), tmax) {
        let over = rows_where(dew, |row, dew_point| dew_point > tmax.values[row] + DEW_SLACK_C);
        note_count(table, dew, &over, "problem-record-dew-over-warmest", notes);
    }
}

fn doubt_range(table: &Table, tmin: &Readings, tmax: &Readings, wrong_scale: bool, notes: &mut Notes) {
    let crossed = rows_where(tmin, |row, low| low > tmax.values[row]);
    let mut warmest = without_slips(tmax).peekable();
    let (mut days, mut range_sum) = (0usize, 0.0);
    for (row, low) in without_slips(tmin) {
        while warmest.next_if(|(at, _)| *at < row).is_some() {}
        if let Some((_, high)) = warmest.next_if(|(at, _)| *at == row) {
            days += 1;
            range_sum += high - low;
        }
    }
    if let Some(first) = crossed.first() {
        let swapped = days >= 10 && crossed.len() * 2 > days;
        let message =
            if swapped { "problem-record-temperatures-swapped" } else { "problem-record-coldest-over-warmest" };
        let problem = about(table, tmin, *first, Severity::Error, message)
            .with("other", shown(&tmax.plan.name))
            .with("coldest", table.text(tmin, *first))
            .with("warmest", table.text(tmax, *first))
            .with("count", crossed.len());
        notes.add(problem);
    }
    let celsius = tmin.plan.unit == MeasureUnit::Celsius && tmax.plan.unit == MeasureUnit::Celsius;
    let mean_range = range_sum / days.max(1) as f64;
    let wide = days >= super::ALMOST_A_YEAR_DAYS && mean_range > WIDEST_MEAN_RANGE_C;
    if celsius && wide && !wrong_scale {
        // The pair as a whole is meant: its first day stands for it.
        let first = tmin.measured().next().map_or(0, |(row, _)| row);
        let problem = about(table, tmin, first, Severity::Warning, "problem-record-range-wide")
            .with("other", shown(&tmax.plan.name))
            .with("range", rounded(mean_range));
        notes.add(problem);
    }
}

/// Rows whose measured value is wrong; a comparison with NaN is never wrong.
fn rows_where(column: &Readings, wrong: impl Fn(usize, f64) -> bool) -> Vec<usize> {
    column.measured().filter(|(row, value)| wrong(*row, *value)).map(|(row, _)| row).collect()
}

fn note_count(table: &Table, column: &Readings, rows: &[usize], message: &'static str, notes: &mut Notes) {
    if let Some(first) = rows.first() {
        let problem = about(table, column, *first, Severity::Warning, message)
            .with("text", table.text(column, *first))
            .with("count", rows.len());
        notes.add(problem);
    }
}
