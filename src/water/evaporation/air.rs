//! Air: pressure, water vapour and wind, after FAO Irrigation and Drainage Paper 56.
//!
//! All equation, table and example numbers are those of Allen, Pereira, Raes & Smith (1998), *Crop evapotranspiration*,
//! FAO Irrigation and Drainage Paper 56, chapter 3 ("FAO-56" below). Temperatures are in °C, pressures in kPa. A value
//! that is not a number gives a result that is not a number; nothing here fails in another way.

/// Fall of temperature with height in the standard atmosphere, °C per metre (ICAO Doc 7488; also inside FAO-56 eq. 7).
pub const STANDARD_LAPSE_C_PER_M: f64 = 0.0065;

/// Psychrometer coefficient of a ventilated (Asmann) instrument, 1/°C (FAO-56 eq. 16).
pub const VENTILATED_PSYCHROMETER_PER_C: f64 = 0.000_662;

const SEA_LEVEL_PRESSURE_KPA: f64 = 101.3;
const STANDARD_TEMPERATURE_K: f64 = 293.0;

/// Mean air pressure in kPa at `elevation_m` metres above the sea (FAO-56 eq. 7).
pub fn pressure_kpa(elevation_m: f64) -> f64 {
    let warmth_share = (STANDARD_TEMPERATURE_K - STANDARD_LAPSE_C_PER_M * elevation_m) / STANDARD_TEMPERATURE_K;
    SEA_LEVEL_PRESSURE_KPA * libm::pow(warmth_share, 5.26)
}

/// Psychrometric constant in kPa/°C at an air pressure in kPa (FAO-56 eq. 8).
pub fn psychrometric_constant_kpa_c(pressure_kpa: f64) -> f64 {
    0.000_665 * pressure_kpa
}

/// Saturation vapour pressure in kPa over water at `temperature_c` (FAO-56 eq. 11; the same curve is used below 0 °C).
pub fn saturation_vapour_pressure_kpa(temperature_c: f64) -> f64 {
    0.6108 * libm::exp(17.27 * temperature_c / (temperature_c + 237.3))
}

/// Slope in kPa/°C of the saturation vapour pressure curve at `temperature_c` (FAO-56 eq. 13).
pub fn saturation_slope_kpa_c(temperature_c: f64) -> f64 {
    let base = temperature_c + 237.3;
    4098.0 * saturation_vapour_pressure_kpa(temperature_c) / (base * base)
}

/// Saturation vapour pressure of a day in kPa: the mean of those at its highest and lowest temperature (FAO-56 eq. 12).
pub fn mean_saturation_vapour_pressure_kpa(tmin_c: f64, tmax_c: f64) -> f64 {
    (saturation_vapour_pressure_kpa(tmax_c) + saturation_vapour_pressure_kpa(tmin_c)) / 2.0
}

/// Actual vapour pressure in kPa from the day's extremes of temperature (°C) and relative humidity (%) (FAO-56 eq. 17).
pub fn vapour_pressure_from_humidity_extremes_kpa(
    tmin_c: f64,
    tmax_c: f64,
    rhmin_percent: f64,
    rhmax_percent: f64,
) -> f64 {
    (saturation_vapour_pressure_kpa(tmin_c) * rhmax_percent + saturation_vapour_pressure_kpa(tmax_c) * rhmin_percent)
        / 200.0
}

/// Actual vapour pressure in kPa from the day's mean relative humidity in % (FAO-56 eq. 19).
pub fn vapour_pressure_from_mean_humidity_kpa(tmin_c: f64, tmax_c: f64, rhmean_percent: f64) -> f64 {
    rhmean_percent / 100.0 * mean_saturation_vapour_pressure_kpa(tmin_c, tmax_c)
}

/// Actual vapour pressure in kPa from the dew point in °C (FAO-56 eq. 14).
///
/// With the day's lowest temperature as `dew_point_c` this is the rule for records without humidity (FAO-56 eq. 48).
pub fn vapour_pressure_from_dew_point_kpa(dew_point_c: f64) -> f64 {
    saturation_vapour_pressure_kpa(dew_point_c)
}

/// Actual vapour pressure in kPa from a psychrometer's dry and wet bulb in °C (FAO-56 eq. 15 and 16).
///
/// `psychrometer_per_c` is the instrument's coefficient, for instance [`VENTILATED_PSYCHROMETER_PER_C`].
pub fn vapour_pressure_from_psychrometer_kpa(
    dry_bulb_c: f64,
    wet_bulb_c: f64,
    pressure_kpa: f64,
    psychrometer_per_c: f64,
) -> f64 {
    saturation_vapour_pressure_kpa(wet_bulb_c) - psychrometer_per_c * pressure_kpa * (dry_bulb_c - wet_bulb_c)
}

/// Dew point in °C of air with a vapour pressure in kPa (FAO-56 annex 3, eq. 3-11). Not a number unless it is above zero.
pub fn dew_point_c(vapour_pressure_kpa: f64) -> f64 {
    let log = libm::log(vapour_pressure_kpa);
    (116.91 + 237.3 * log) / (16.78 - log)
}

/// Wind speed in m/s at 2 m from one measured at `height_m` over short grass (FAO-56 eq. 47).
pub fn wind_at_2m_ms(wind_ms: f64, height_m: f64) -> f64 {
    wind_ms * 4.87 / libm::log(67.8 * height_m - 5.42)
}

/// Wet-bulb temperature in °C from air temperature (°C) and relative humidity (%) near sea-level pressure.
///
/// Stull (2011), *Journal of Applied Meteorology and Climatology* 50, 2267–2269, eq. 1. Meant for 5 to 99 % and −20 to
/// 50 °C (figure 2 there cuts off the cold dry corner); outside that the result is an extrapolation.
pub fn wet_bulb_c(air_c: f64, relative_humidity_percent: f64) -> f64 {
    let rh = relative_humidity_percent;
    air_c * libm::atan(0.151_977 * libm::sqrt(rh + 8.313_659)) + libm::atan(air_c + rh) - libm::atan(rh - 1.676_331)
        + 0.003_918_38 * rh * libm::sqrt(rh) * libm::atan(0.023_101 * rh)
        - 4.686_035
}
