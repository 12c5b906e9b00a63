//! Fitting temperatures and the memory of their residuals.

use super::super::recipe::Temperatures;
use super::super::residuals::{Matrix, ResidualCorrelations};
use super::super::season::{PLACES, SeasonalCurve};
use super::record::{Record, RecordDay};
use super::regression::by_kind;
use super::{ByKind, FitNote};

/// Pairs of days with all residuals below which their correlations are not estimated.
const LEAST_PAIRS: usize = 365;

pub(super) struct FittedTemperatures {
    pub curves: Temperatures,
    /// Share of wet days in the record.
    wet_share: f64,
}

/// Means and spreads of the daily extremes.
pub(super) fn fit(record: &Record, notes: &mut Vec<FitNote>) -> FittedTemperatures {
    let mut extreme = |field: &'static str, value: fn(&RecordDay) -> f64| {
        // A record without any spread (every day the same) has no curve; its spread is then too small for the
        // recipe's check, which refuses it.
        let still = SeasonalCurve::flat(0.0);
        by_kind(&record.days, field, |day| Some(value(day)), notes).unwrap_or(ByKind {
            dry: still,
            wet: still,
            dry_spread: still,
            wet_spread: still,
        })
    };
    let tmax = extreme("tmax_c", |day| day.day.tmax_c);
    let tmin = extreme("tmin_c", |day| day.day.tmin_c);
    FittedTemperatures {
        curves: Temperatures {
            tmax_dry_c: tmax.dry,
            tmax_wet_c: tmax.wet,
            tmin_dry_c: tmin.dry,
            tmin_wet_c: tmin.wet,
            tmax_dry_spread_c: tmax.dry_spread,
            tmax_wet_spread_c: tmax.wet_spread,
            tmin_dry_spread_c: tmin.dry_spread,
            tmin_wet_spread_c: tmin.wet_spread,
        },
        wet_share: record.days.iter().filter(|day| day.wet).count() as f64 / record.days.len() as f64,
    }
}

impl FittedTemperatures {
    /// Standardised residuals of maximum and minimum on a day.
    fn residuals(&self, day: &RecordDay) -> [f64; 2] {
        let t = &self.curves;
        let (tmax, tmax_spread, tmin, tmin_spread) = if day.wet {
            (&t.tmax_wet_c, &t.tmax_wet_spread_c, &t.tmin_wet_c, &t.tmin_wet_spread_c)
        } else {
            (&t.tmax_dry_c, &t.tmax_dry_spread_c, &t.tmin_dry_c, &t.tmin_dry_spread_c)
        };
        [
            (day.day.tmax_c - tmax.at(day.place)) / tmax_spread.at(day.place),
            (day.day.tmin_c - tmin.at(day.place)) / tmin_spread.at(day.place),
        ]
    }

    /// Mean variance over the year of maximum and minimum, °C², dry and wet days by their number.
    fn mean_variances(&self) -> [f64; 2] {
        let t = &self.curves;
        let mean = |curve: &SeasonalCurve| {
            (0..PLACES).map(|place| curve.at(place) * curve.at(place)).sum::<f64>() / PLACES as f64
        };
        [(&t.tmax_dry_spread_c, &t.tmax_wet_spread_c), (&t.tmin_dry_spread_c, &t.tmin_wet_spread_c)]
            .map(|(dry, wet)| mean(dry) + self.wet_share * (mean(wet) - mean(dry)))
    }

    /// How much warmer the middle of a wet day is than that of a dry one, °C.
    pub(super) fn wet_minus_dry_c(&self, place: usize) -> f64 {
        let t = &self.curves;
        0.5 * (t.tmax_wet_c.at(place) - t.tmax_dry_c.at(place) + t.tmin_wet_c.at(place) - t.tmin_dry_c.at(place))
    }

    /// Variance, °C², that day-to-day residuals leave in a year's mean temperature.
    pub(super) fn variance_of_mean(&self, record: &Record, variance_of_years: f64) -> f64 {
        // Notes are taken when the recipe's own memory is made.
        let memory = memory(record, self, None, variance_of_years, &mut Vec::new()).memory();
        let Some(covariance) = memory.and_then(|memory| memory.long_run_covariance()) else { return 0.0 };
        let spread = self.mean_variances().map(|variance| (variance - variance_of_years).max(0.0).sqrt());
        let pairs = [(0, 0), (0, 1), (1, 0), (1, 1)];
        pairs.iter().map(|&(one, other)| 0.25 * spread[one] * spread[other] * covariance[one][other]).sum::<f64>()
            / 365.25
    }

    /// Takes out of the daily spreads what differences between years will add again.
    pub(super) fn leave_room_for_years(&mut self, variance_of_years: f64) {
        let room = self.mean_variances().map(|variance| (1.0 - variance_of_years / variance).max(0.0).sqrt());
        let t = &mut self.curves;
        for curve in [&mut t.tmax_dry_spread_c, &mut t.tmax_wet_spread_c] {
            *curve = curve.times(room[0]);
        }
        for curve in [&mut t.tmin_dry_spread_c, &mut t.tmin_wet_spread_c] {
            *curve = curve.times(room[1]);
        }
    }
}

/// Correlations of the residuals, with those of radiation if there are any (one for each day of the record).
pub(super) fn memory(
    record: &Record,
    temperature: &FittedTemperatures,
    radiation: Option<&[Option<f64>]>,
    variance_of_years: f64,
    notes: &mut Vec<FitNote>,
) -> ResidualCorrelations {
    let days: Vec<Option<[f64; 3]>> = record
        .days
        .iter()
        .enumerate()
        .map(|(at, day)| {
            let [tmax, tmin] = temperature.residuals(day);
            match radiation {
                Some(residuals) => residuals[at].map(|sun| [tmax, tmin, sun]),
                None => Some([tmax, tmin, 0.0]),
            }
        })
        .collect();
    let pairs: Vec<([f64; 3], [f64; 3])> = days
        .windows(2)
        .zip(&record.days[1..])
        .filter(|(_, day)| day.follows)
        .filter_map(|(pair, _)| Some((pair[0]?, pair[1]?)))
        .collect();
    let published = ResidualCorrelations::RICHARDSON_WRIGHT_1984;
    if pairs.len() < LEAST_PAIRS {
        notes.push(FitNote::PublishedMemory);
        return published;
    }
    let count = pairs.len() as f64;
    let product = |row: usize, column: usize, lag: bool| {
        pairs.iter().map(|(before, today)| today[row] * if lag { before[column] } else { today[column] }).sum::<f64>()
            / count
    };
    // What a year's warmth adds to every product of two temperatures is not day-to-day memory.
    let spread = temperature.mean_variances().map(f64::sqrt);
    let shared = |row: usize, column: usize| {
        if row < 2 && column < 2 { variance_of_years / (spread[row] * spread[column]) } else { 0.0 }
    };
    let own: [f64; 3] = core::array::from_fn(|row| product(row, row, false) - shared(row, row));
    let correlation = |row: usize, column: usize, lag: bool| {
        if row == column && !lag {
            return 1.0;
        }
        if radiation.is_none() && (row == 2 || column == 2) {
            return if lag { published.day_before[row][column] } else { published.same_day[row][column] };
        }
        (product(row, column, lag) - shared(row, column)) / (own[row] * own[column]).sqrt()
    };
    let matrix = |lag: bool| -> Matrix {
        core::array::from_fn(|row| core::array::from_fn(|column| correlation(row, column, lag)))
    };
    let found = ResidualCorrelations { same_day: matrix(false), day_before: matrix(true) };
    if radiation.is_none() {
        notes.push(FitNote::PublishedRadiationMemory);
    }
    if found.memory().is_some() {
        return found;
    }
    // The record's temperatures and the published radiation may not go together; temperatures alone always do.
    let alone = found.without_radiation_links();
    if radiation.is_none() && alone.memory().is_some() {
        return alone;
    }
    notes.push(FitNote::PublishedMemory);
    published
}
