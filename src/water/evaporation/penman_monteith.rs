//! Penman–Monteith: reference evaporation from the energy and the wind of a day, with FAO-56's rules for missing data.
//!
//! Allen et al. (1998), FAO Irrigation and Drainage Paper 56, eq. 6; missing data after eq. 48 (humidity), eq. 50
//! (sunshine) and chapter 3's 2 m/s (wind).

use super::air::{
    mean_saturation_vapour_pressure_kpa, pressure_kpa, psychrometric_constant_kpa_c, saturation_slope_kpa_c,
    saturation_vapour_pressure_kpa,
};
use super::daily::EvaporationDay;
use super::radiation::{
    MM_PER_MJ_M2, clear_sky_mj_m2, net_longwave_mj_m2, net_shortwave_mj_m2, relative_sun,
    solar_from_temperature_range_mj_m2,
};

/// Wind speed in m/s at 2 m where none is recorded: the mean over 2000 stations (FAO-56 chapter 3).
pub const WIND_WHEN_MISSING_MS: f64 = 2.0;

/// What the equation needs of a day, all of it known.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct PenmanMonteithInputs {
    /// Lowest temperature, °C.
    pub tmin_c: f64,
    /// Highest temperature, °C.
    pub tmax_c: f64,
    /// Actual vapour pressure, kPa.
    pub vapour_pressure_kpa: f64,
    /// Wind speed at 2 m, m/s.
    pub wind_2m_ms: f64,
    /// Net radiation, MJ/m² a day.
    pub net_radiation_mj_m2: f64,
    /// Heat into the soil, MJ/m² a day: 0 for a single day (FAO-56 eq. 42).
    pub soil_heat_mj_m2: f64,
    /// Psychrometric constant, kPa/°C.
    pub psychrometric_kpa_c: f64,
}

/// Reference evaporation in mm a day (FAO-56 eq. 6). It can come out slightly below zero on cold, calm, cloudless days.
pub fn penman_monteith_mm(inputs: &PenmanMonteithInputs) -> f64 {
    let saturation_kpa = mean_saturation_vapour_pressure_kpa(inputs.tmin_c, inputs.tmax_c);
    penman_monteith_with_saturation_mm(inputs, saturation_kpa)
}

/// The equation with the day's saturation vapour pressure already known, so that no exponential is taken twice.
fn penman_monteith_with_saturation_mm(inputs: &PenmanMonteithInputs, saturation_kpa: f64) -> f64 {
    let mean_c = (inputs.tmax_c + inputs.tmin_c) / 2.0;
    let slope = saturation_slope_kpa_c(mean_c);
    let wind = inputs.wind_2m_ms;
    let deficit_kpa = saturation_kpa - inputs.vapour_pressure_kpa;
    let energy_mm = MM_PER_MJ_M2 * slope * (inputs.net_radiation_mj_m2 - inputs.soil_heat_mj_m2);
    let air_mm = inputs.psychrometric_kpa_c * 900.0 / (mean_c + 273.0) * wind * deficit_kpa;
    (energy_mm + air_mm) / (slope + inputs.psychrometric_kpa_c * (1.0 + 0.34 * wind))
}

/// What Penman–Monteith needs to know of a place, with everything that elevation decides worked out once.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct PenmanMonteithTraits {
    elevation_m: f64,
    solar_range_coefficient: f64,
    psychrometric_kpa_c: f64,
}

impl PenmanMonteithTraits {
    /// For a reference elevation in metres and the coefficient of the temperature-range rule for missing sunshine:
    /// [`INTERIOR_SOLAR_RANGE_COEFFICIENT`](super::radiation::INTERIOR_SOLAR_RANGE_COEFFICIENT) or
    /// [`COASTAL_SOLAR_RANGE_COEFFICIENT`](super::radiation::COASTAL_SOLAR_RANGE_COEFFICIENT).
    pub fn new(elevation_m: f64, solar_range_coefficient: f64) -> Self {
        let psychrometric_kpa_c = psychrometric_constant_kpa_c(pressure_kpa(elevation_m));
        Self { elevation_m, solar_range_coefficient, psychrometric_kpa_c }
    }

    /// The reference elevation in metres.
    pub fn elevation_m(&self) -> f64 {
        self.elevation_m
    }

    /// The coefficient that turns a temperature range into sunshine.
    pub fn solar_range_coefficient(&self) -> f64 {
        self.solar_range_coefficient
    }

    /// One day of the record in mm, warmed by `warming_c` at unchanged relative humidity, sunshine and wind.
    pub(super) fn day_mm(&self, extraterrestrial_mj_m2: f64, day: &EvaporationDay, warming_c: f64) -> f64 {
        let recorded_low_kpa = saturation_vapour_pressure_kpa(day.tmin_c);
        let recorded_kpa = (saturation_vapour_pressure_kpa(day.tmax_c) + recorded_low_kpa) / 2.0;
        let tmin_c = day.tmin_c + warming_c;
        let tmax_c = day.tmax_c + warming_c;
        let vapour_kpa = if day.vapour_pressure_kpa.is_nan() { recorded_low_kpa } else { day.vapour_pressure_kpa };
        let (saturation_kpa, vapour_pressure_kpa) = if warming_c == 0.0 {
            (recorded_kpa, vapour_kpa)
        } else {
            let warmed_kpa = mean_saturation_vapour_pressure_kpa(tmin_c, tmax_c);
            (warmed_kpa, vapour_kpa * (warmed_kpa / recorded_kpa))
        };

        let clear_sky = clear_sky_mj_m2(self.elevation_m, extraterrestrial_mj_m2);
        let solar_mj_m2 = if day.solar_mj_m2.is_nan() {
            let range_c = day.tmax_c - day.tmin_c;
            solar_from_temperature_range_mj_m2(range_c, self.solar_range_coefficient, extraterrestrial_mj_m2, clear_sky)
        } else {
            day.solar_mj_m2
        };
        let sun = relative_sun(solar_mj_m2, clear_sky);
        let net_longwave = net_longwave_mj_m2(tmin_c, tmax_c, vapour_pressure_kpa, sun);
        let inputs = PenmanMonteithInputs {
            tmin_c,
            tmax_c,
            vapour_pressure_kpa,
            wind_2m_ms: if day.wind_2m_ms.is_nan() { WIND_WHEN_MISSING_MS } else { day.wind_2m_ms },
            net_radiation_mj_m2: net_shortwave_mj_m2(solar_mj_m2) - net_longwave,
            soil_heat_mj_m2: 0.0,
            psychrometric_kpa_c: self.psychrometric_kpa_c,
        };
        penman_monteith_with_saturation_mm(&inputs, saturation_kpa)
    }
}
