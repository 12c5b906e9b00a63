//! The station's days as the water wants them, and the choice of the way to reference evaporation.

use super::problem::{Location, Problem};
use super::record::{Measure, ReadRecord};
use super::section::{Limits, Section};
use super::unit_suffix::{METRES, PLAIN};
use crate::water::calendar::CalendarDay;
use crate::water::evaporation::air::{
    vapour_pressure_from_dew_point_kpa, vapour_pressure_from_humidity_extremes_kpa,
    vapour_pressure_from_mean_humidity_kpa, wind_at_2m_ms,
};
use crate::water::evaporation::radiation::{
    COASTAL_SOLAR_RANGE_COEFFICIENT, INTERIOR_SOLAR_RANGE_COEFFICIENT, solar_from_sunshine_mj_m2,
};
use crate::water::evaporation::{EvaporationDay, Method, PenmanMonteithTraits, SkyTable};
use crate::water::valley::{EvaporationTraits, Valley};
use crate::water::weather::StationDay;

/// A published way to reference evaporation, by its key.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum EvaporationChoice {
    /// Penman–Monteith (FAO-56).
    PenmanMonteith,
    /// Hargreaves–Samani 1985.
    HargreavesSamani,
    /// Oudin and others 2005.
    Oudin,
    /// A column of the record.
    Given,
}

impl EvaporationChoice {
    /// The key that a place file writes and messages are named by.
    pub fn key(self) -> &'static str {
        match self {
            EvaporationChoice::PenmanMonteith => "penman_monteith",
            EvaporationChoice::HargreavesSamani => "hargreaves_samani",
            EvaporationChoice::Oudin => "oudin",
            EvaporationChoice::Given => "given",
        }
    }

    const ALL: [EvaporationChoice; 4] = [
        EvaporationChoice::PenmanMonteith,
        EvaporationChoice::HargreavesSamani,
        EvaporationChoice::Oudin,
        EvaporationChoice::Given,
    ];
}

/// What was chosen, and by whom.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct EvaporationNote {
    /// The way.
    pub choice: EvaporationChoice,
    /// Whether the place left the choice to the record.
    pub best_available: bool,
}

/// Which columns a record has.
#[derive(Clone, Copy, Debug, Default)]
struct Columns {
    extremes: bool,
    air: bool,
    given: bool,
}

/// Reads `[evaporation]`; the reference is worked out at the station unless the place says otherwise.
pub(super) fn evaporation(
    root: &Section<'_>,
    record: Option<&ReadRecord>,
    station_elevation_m: f64,
) -> (EvaporationTraits, EvaporationNote) {
    let section = root.section("evaporation");
    let columns = record.map(columns);
    let choices = [
        ("best_available", None),
        ("penman_monteith", Some(EvaporationChoice::PenmanMonteith)),
        ("hargreaves_samani", Some(EvaporationChoice::HargreavesSamani)),
        ("oudin", Some(EvaporationChoice::Oudin)),
        ("given", Some(EvaporationChoice::Given)),
    ];
    let stated = section.choice("method", &choices);
    let (choice, at) = stated.map_or((None, section.at.clone()), |(choice, at)| (choice, at));
    let method = choice.unwrap_or_else(|| best(columns.unwrap_or_default()));
    if let (Some(choice), Some(columns)) = (choice, columns) {
        check(&section, choice, columns, at);
    }
    let reference = section.number_or("reference_elevation", METRES, super::bands::ELEVATION, station_elevation_m);
    let coefficient = if section.flag_or("near_coast", false) {
        COASTAL_SOLAR_RANGE_COEFFICIENT
    } else {
        INTERIOR_SOLAR_RANGE_COEFFICIENT
    };
    let traits = EvaporationTraits {
        method: match method {
            EvaporationChoice::PenmanMonteith => {
                Method::PenmanMonteith(PenmanMonteithTraits::new(reference.value, coefficient))
            }
            EvaporationChoice::HargreavesSamani => Method::HargreavesSamani,
            EvaporationChoice::Oudin => Method::Oudin,
            EvaporationChoice::Given => Method::Given,
        },
        reference_elevation_m: reference.value,
        lake_factor: section.number_or("lake_factor", PLAIN, Limits(0.2, 2.0), 1.05).value,
    };
    (traits, EvaporationNote { choice: method, best_available: choice.is_none() })
}

/// Whether the record says anything of the air's water.
pub(super) fn has_humidity(record: &ReadRecord) -> bool {
    let has = |measure| record.column(measure).is_some();
    has(Measure::RelativeHumidityMean)
        || (has(Measure::RelativeHumidityMin) && has(Measure::RelativeHumidityMax))
        || has(Measure::DewPoint)
        || has(Measure::VapourPressure)
}

fn columns(record: &ReadRecord) -> Columns {
    let has = |measure| record.column(measure).is_some();
    Columns {
        extremes: has(Measure::TemperatureMin) && has(Measure::TemperatureMax),
        air: has_humidity(record) && (has(Measure::Solar) || has(Measure::Sunshine)),
        given: has(Measure::ReferenceEvaporation),
    }
}

/// What is measured is better than what is estimated: a given column, then Penman–Monteith where humidity and sun are
/// recorded, then Hargreaves–Samani, which FAO-56 (chapter 4) names for records of temperature alone, then Oudin.
fn best(columns: Columns) -> EvaporationChoice {
    match columns {
        Columns { given: true, extremes: true, .. } => EvaporationChoice::Given,
        Columns { extremes: true, air: true, .. } => EvaporationChoice::PenmanMonteith,
        Columns { extremes: true, .. } => EvaporationChoice::HargreavesSamani,
        _ => EvaporationChoice::Oudin,
    }
}

fn check(section: &Section<'_>, choice: EvaporationChoice, columns: Columns, at: Location) {
    let lacking = match choice {
        EvaporationChoice::Oudin => return,
        EvaporationChoice::Given if !columns.given => "reference_evaporation",
        // Under warming a given column is scaled by Hargreaves–Samani, which needs both extremes.
        _ if !columns.extremes => "temperature_min, temperature_max",
        _ => return,
    };
    let problem = Problem::error(at, "problem-method-columns").with("method", choice.key());
    let can: Vec<&str> = EvaporationChoice::ALL
        .into_iter()
        .filter(|way| match way {
            EvaporationChoice::Oudin => true,
            EvaporationChoice::Given => columns.given && columns.extremes,
            _ => columns.extremes,
        })
        .map(EvaporationChoice::key)
        .collect();
    section.sheet.tell(problem.with("columns", lacking).with("choices", can.join(", ")));
}

/// Puts the columns of the record together by days.
pub(super) fn station_days(
    record: &ReadRecord,
    calendar: &[CalendarDay],
    valley: &Valley,
    wind_height_m: f64,
) -> Vec<StationDay> {
    let sky = SkyTable::at_latitude(valley.latitude_deg);
    let column = |measure| record.column(measure).map(|column| column.values.as_slice());
    let columns = WeatherColumns {
        tmin: column(Measure::TemperatureMin),
        tmax: column(Measure::TemperatureMax),
        tmean: column(Measure::TemperatureMean),
        rh_mean: column(Measure::RelativeHumidityMean),
        rh_min: column(Measure::RelativeHumidityMin),
        rh_max: column(Measure::RelativeHumidityMax),
        dew_point: column(Measure::DewPoint),
        vapour_pressure: column(Measure::VapourPressure),
        solar: column(Measure::Solar),
        sunshine: column(Measure::Sunshine),
    };
    let precipitation = column(Measure::Precipitation);
    let wind = column(Measure::Wind);
    let given = column(Measure::ReferenceEvaporation);
    calendar
        .iter()
        .enumerate()
        .map(|(day, date)| {
            let (tmin_c, tmax_c) = (value(columns.tmin, day), value(columns.tmax, day));
            let air = EvaporationDay {
                tmin_c,
                tmax_c,
                tmean_c: value(columns.tmean, day),
                vapour_pressure_kpa: columns.vapour_pressure_kpa(day, tmin_c, tmax_c),
                wind_2m_ms: match wind {
                    // The logarithmic profile is 1 at 2 m only up to rounding of its constants.
                    Some(_) if wind_height_m != 2.0 => wind_at_2m_ms(value(wind, day), wind_height_m),
                    _ => value(wind, day),
                },
                solar_mj_m2: columns.solar_mj_m2(day, date.day_of_year, sky.as_ref()),
                given_mm: value(given, day),
            };
            StationDay::at_station(valley, date.month_index(), value(precipitation, day), air)
        })
        .collect()
}

/// Columns from which one value of the air is put together.
struct WeatherColumns<'r> {
    tmin: Option<&'r [f64]>,
    tmax: Option<&'r [f64]>,
    tmean: Option<&'r [f64]>,
    rh_mean: Option<&'r [f64]>,
    rh_min: Option<&'r [f64]>,
    rh_max: Option<&'r [f64]>,
    dew_point: Option<&'r [f64]>,
    vapour_pressure: Option<&'r [f64]>,
    solar: Option<&'r [f64]>,
    sunshine: Option<&'r [f64]>,
}

impl WeatherColumns<'_> {
    /// FAO-56 prefers the dew point, then both extremes of humidity, then its mean (chapter 3, "actual vapour
    /// pressure").
    fn vapour_pressure_kpa(&self, day: usize, tmin_c: f64, tmax_c: f64) -> f64 {
        let (low, high) = (value(self.rh_min, day), value(self.rh_max, day));
        [
            value(self.vapour_pressure, day),
            vapour_pressure_from_dew_point_kpa(value(self.dew_point, day)),
            vapour_pressure_from_humidity_extremes_kpa(tmin_c, tmax_c, low, high),
            vapour_pressure_from_mean_humidity_kpa(tmin_c, tmax_c, value(self.rh_mean, day)),
        ]
        .into_iter()
        .find(|pressure| !pressure.is_nan())
        .unwrap_or(f64::NAN)
    }

    fn solar_mj_m2(&self, day: usize, day_of_year: u16, sky: Option<&SkyTable>) -> f64 {
        let measured = value(self.solar, day);
        let (Some(sky), true) = (sky, measured.is_nan()) else { return measured };
        let daylight_h = sky.daylight_h.get(usize::from(day_of_year).wrapping_sub(1)).copied().unwrap_or(f64::NAN);
        let extraterrestrial = sky.extraterrestrial_on_mj_m2(day_of_year);
        solar_from_sunshine_mj_m2(value(self.sunshine, day), daylight_h, extraterrestrial)
    }
}

fn value(column: Option<&[f64]>, day: usize) -> f64 {
    column.and_then(|values| values.get(day)).copied().unwrap_or(f64::NAN)
}
