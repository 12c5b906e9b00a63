//! Fitting radiation, humidity and wind where the record has them.

use super::super::recipe::{Humidity, Radiation, Wind};
use super::super::sky::{clear_sky_mj_m2, dewpoint_c, saturation_kpa};
use super::record::{Record, mean_and_variance};
use super::regression::by_kind;
use super::{FitNote, Site};
use chrono::Datelike;

/// Usable days below which an optional value is not fitted: two years.
const LEAST_DAYS: usize = 730;
/// Coefficient of variation of daily wind below which a column is taken to be no measurement.
const LEAST_VARIATION: f64 = 0.05;
/// Name of the radiation field.
const SOLAR: &str = "solar_mj_m2";

pub(super) struct FittedRadiation {
    pub recipe: Radiation,
    /// Standardised residual of each day of the record that has usable radiation.
    pub residuals: Vec<Option<f64>>,
}

/// Radiation as log odds of its share of the clear sky.
pub(super) fn radiation(record: &Record, site: Option<Site>, notes: &mut Vec<FitNote>) -> Option<FittedRadiation> {
    let recorded = record.days.iter().filter(|day| day.day.solar_mj_m2.is_some()).count();
    if recorded == 0 {
        return None;
    }
    let Some(site) = site else {
        notes.push(FitNote::LeftOut { field: SOLAR, days: recorded });
        return None;
    };
    let log_odds = |day: &super::record::RecordDay| {
        let clear = clear_sky_mj_m2(site.latitude_degrees, site.elevation_m, day.day.date.ordinal());
        let share = day.day.solar_mj_m2? / clear;
        (share > 0.0 && share < 1.0).then(|| libm::log(share / (1.0 - share)))
    };
    let usable = record.days.iter().filter(|day| log_odds(day).is_some()).count();
    if usable < recorded {
        notes.push(FitNote::RadiationAboveClearSky { days: recorded - usable });
    }
    let kinds = if usable < LEAST_DAYS { None } else { by_kind(&record.days, SOLAR, log_odds, notes) };
    let Some(kinds) = kinds else {
        notes.push(FitNote::LeftOut { field: SOLAR, days: usable });
        return None;
    };
    let scaled = |wet: bool| -> f64 {
        let mean = if wet { &kinds.wet } else { &kinds.dry };
        let squares: Vec<f64> = record
            .days
            .iter()
            .filter(|day| day.wet == wet)
            .filter_map(|day| {
                let beyond = log_odds(day)? - mean.at(day.place);
                Some(beyond * beyond)
            })
            .collect();
        (squares.iter().sum::<f64>() / squares.len() as f64).sqrt()
    };
    let (dry_spread, wet_spread) = (scaled(false), scaled(true));
    let residuals = record
        .days
        .iter()
        .map(|day| {
            let (mean, spread) = if day.wet { (&kinds.wet, wet_spread) } else { (&kinds.dry, dry_spread) };
            Some((log_odds(day)? - mean.at(day.place)) / spread)
        })
        .collect();
    Some(FittedRadiation {
        recipe: Radiation {
            latitude_degrees: site.latitude_degrees,
            elevation_m: site.elevation_m,
            dry_clear_log_odds: kinds.dry,
            wet_clear_log_odds: kinds.wet,
            dry_spread_log_odds: dry_spread,
            wet_spread_log_odds: wet_spread,
        },
        residuals,
    })
}

/// Mean step of the dewpoint below the minimum, from FAO-56 equation 19 turned round.
pub(super) fn humidity(record: &Record, notes: &mut Vec<FitNote>) -> Option<Humidity> {
    let below = |wet: bool| -> Vec<f64> {
        record
            .days
            .iter()
            .filter(|day| day.wet == wet)
            .filter_map(|day| {
                let percent = day.day.relative_humidity_percent.filter(|percent| *percent > 0.0)?;
                let saturated = 0.5 * (saturation_kpa(day.day.tmax_c) + saturation_kpa(day.day.tmin_c));
                Some(day.day.tmin_c - dewpoint_c(percent / 100.0 * saturated))
            })
            .collect()
    };
    let (dry, wet) = (below(false), below(true));
    if dry.len() + wet.len() < LEAST_DAYS || dry.is_empty() || wet.is_empty() {
        if dry.len() + wet.len() > 0 {
            notes.push(FitNote::LeftOut { field: "relative_humidity_percent", days: dry.len() + wet.len() });
        }
        return None;
    }
    let (dry, wet) = (mean_and_variance(&dry).0, mean_and_variance(&wet).0);
    if dry < 0.0 || wet < 0.0 {
        notes.push(FitNote::DewpointAtMinimum);
    }
    Some(Humidity { dry_dewpoint_below_tmin_c: dry.max(0.0), wet_dewpoint_below_tmin_c: wet.max(0.0) })
}

/// Monthly mean wind, and the Weibull shape from the coefficient of variation (Justus et al. 1978, Journal of Applied
/// Meteorology 17:350–353: shape = cv^−1.086).
pub(super) fn wind(record: &Record, notes: &mut Vec<FitNote>) -> Option<Wind> {
    let months: Vec<Vec<f64>> = (0..12)
        .map(|month| record.days.iter().filter(|day| day.month == month).filter_map(|day| day.day.wind_2m_ms).collect())
        .collect();
    let days: usize = months.iter().map(Vec::len).sum();
    if days == 0 {
        return None;
    }
    let moments: Vec<(f64, f64)> = months.iter().map(|values| mean_and_variance(values)).collect();
    let squared_variation = moments
        .iter()
        .zip(&months)
        .map(|((mean, variance), values)| variance / (mean * mean) * values.len() as f64)
        .sum::<f64>()
        / days as f64;
    // A month without wind, or a wind that never changes, leads to no number here.
    let usable = days >= LEAST_DAYS && squared_variation > LEAST_VARIATION * LEAST_VARIATION;
    if !usable {
        notes.push(FitNote::LeftOut { field: "wind_2m_ms", days });
        return None;
    }
    Some(Wind {
        mean_2m_ms: core::array::from_fn(|month| moments[month].0),
        shape: libm::pow(squared_variation.sqrt(), -1.086),
    })
}
