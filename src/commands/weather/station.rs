//! Learning the pattern of a place's own record.

use super::Pattern;
use super::fault_words::of_fit;
use super::write::Origin;
use crate::commands::failure::Failure;
use crate::generator::{GeneratorDay, Site, fit_at};
use crate::place::Place;
use crate::water::run::water_years;
use crate::words::Words;

/// Fits the generator to the weather of `place`.
pub(super) fn learn(place: &Place, words: &Words) -> Result<Pattern, Failure> {
    let valley = &place.valley;
    let site = Site { latitude_degrees: valley.latitude_deg, elevation_m: valley.station_elevation_m };
    let start_month = u32::from(valley.water_year_start_month);
    let (recipe, report) = fit_at(&record(place), start_month, Some(site)).map_err(|error| of_fit(&error, words))?;
    let first_water_year =
        water_years(&place.calendar, valley.water_year_start_month).next().map(|year| year.water_year);
    let origin = Origin::Place { name: place.name.clone(), full_years: report.full_years };
    Ok(Pattern { recipe, origin, fit: Some(report), first_water_year })
}

/// The record as the station wrote it. A place keeps the day's extremes at the height of its reference evaporation; the
/// way there is undone.
fn record(place: &Place) -> Vec<GeneratorDay> {
    let valley = &place.valley;
    let climb_km = (valley.evaporation.reference_elevation_m - valley.station_elevation_m) / 1000.0;
    let recorded = |value: f64| Some(value).filter(|value| !value.is_nan());
    let dates = place.first_date.iter_days();
    place
        .days
        .iter()
        .zip(&place.calendar)
        .zip(dates)
        .map(|((day, calendar), date)| {
            let warmer_c = valley.climb.lapse_c_per_km[calendar.month_index()] * climb_km;
            GeneratorDay {
                date,
                tmin_c: day.air.tmin_c - warmer_c,
                tmax_c: day.air.tmax_c - warmer_c,
                precipitation_mm: day.precipitation_mm,
                solar_mj_m2: recorded(day.air.solar_mj_m2),
                relative_humidity_percent: recorded(day.relative_humidity_percent),
                wind_2m_ms: recorded(day.air.wind_2m_ms),
            }
        })
        .collect()
}
