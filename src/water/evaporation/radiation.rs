//! Radiation at the ground: sunshine through the air, what the grass reflects and what it gives back to the sky.
//!
//! Equation numbers are those of Allen et al. (1998), FAO Irrigation and Drainage Paper 56, chapter 3. Radiation is in
//! MJ/m² a day, temperature in °C, vapour pressure in kPa.

/// Share of sunlight that the reference grass reflects (FAO-56 eq. 38).
pub const GRASS_ALBEDO: f64 = 0.23;
/// Coefficient of the temperature-range rule away from large water (FAO-56 eq. 50, "interior").
pub const INTERIOR_SOLAR_RANGE_COEFFICIENT: f64 = 0.16;
/// Coefficient of the temperature-range rule beside a large water body (FAO-56 eq. 50, "coastal").
pub const COASTAL_SOLAR_RANGE_COEFFICIENT: f64 = 0.19;
/// Stefan–Boltzmann constant in MJ/(K⁴ m²) a day (FAO-56 eq. 39).
pub const STEFAN_BOLTZMANN_MJ_K4_M2: f64 = 4.903e-9;
/// Millimetres of water that a MJ/m² evaporates: 1/2.45 kg/MJ, rounded as FAO-56 rounds it (eq. 20).
pub const MM_PER_MJ_M2: f64 = 0.408;

/// Relative sunshine assumed where the sun does not rise and cloud cannot be judged from it: FAO-56 chapter 3 gives 0.7
/// to 0.8 for nights in dry climates. It matters only beyond the polar circles in winter, when evaporation is near zero.
const RELATIVE_SUN_WITHOUT_DAYLIGHT: f64 = 0.7;
const KELVIN_AT_FREEZING: f64 = 273.16;

/// Solar radiation in MJ/m² from hours of bright sunshine, with the coefficients 0.25 and 0.50 (FAO-56 eq. 35).
///
/// Not a number where both hours are zero (the polar night).
pub fn solar_from_sunshine_mj_m2(sunshine_h: f64, daylight_h: f64, extraterrestrial_mj_m2: f64) -> f64 {
    (0.25 + 0.50 * sunshine_h / daylight_h) * extraterrestrial_mj_m2
}

/// Solar radiation in MJ/m² from the day's temperature range in °C (FAO-56 eq. 50), not above the clear sky's.
///
/// The upper limit is FAO-56's own: high dry valleys with wide ranges would otherwise pass the clear sky. A negative
/// range gives a value that is not a number.
pub fn solar_from_temperature_range_mj_m2(
    range_c: f64,
    solar_range_coefficient: f64,
    extraterrestrial_mj_m2: f64,
    clear_sky_mj_m2: f64,
) -> f64 {
    let solar = solar_range_coefficient * libm::sqrt(range_c) * extraterrestrial_mj_m2;
    if solar > clear_sky_mj_m2 { clear_sky_mj_m2 } else { solar }
}

/// Solar radiation in MJ/m² on a cloudless day at an elevation in metres (FAO-56 eq. 37).
pub fn clear_sky_mj_m2(elevation_m: f64, extraterrestrial_mj_m2: f64) -> f64 {
    (0.75 + 2e-5 * elevation_m) * extraterrestrial_mj_m2
}

/// Sunlight kept by the reference grass in MJ/m² (FAO-56 eq. 38).
pub fn net_shortwave_mj_m2(solar_mj_m2: f64) -> f64 {
    (1.0 - GRASS_ALBEDO) * solar_mj_m2
}

/// Share of the clear sky's sunlight that arrived, at most 1 (FAO-56 eq. 39 sets that limit).
pub fn relative_sun(solar_mj_m2: f64, clear_sky_mj_m2: f64) -> f64 {
    if clear_sky_mj_m2 <= 0.0 {
        return RELATIVE_SUN_WITHOUT_DAYLIGHT;
    }
    let share = solar_mj_m2 / clear_sky_mj_m2;
    if share > 1.0 { 1.0 } else { share }
}

/// Net heat radiation from the ground to the sky in MJ/m² (FAO-56 eq. 39).
pub fn net_longwave_mj_m2(tmin_c: f64, tmax_c: f64, vapour_pressure_kpa: f64, relative_sun: f64) -> f64 {
    let fourth_power = |temperature_c: f64| {
        let square = (temperature_c + KELVIN_AT_FREEZING) * (temperature_c + KELVIN_AT_FREEZING);
        square * square
    };
    STEFAN_BOLTZMANN_MJ_K4_M2
        * ((fourth_power(tmax_c) + fourth_power(tmin_c)) / 2.0)
        * (0.34 - 0.14 * libm::sqrt(vapour_pressure_kpa))
        * (1.35 * relative_sun - 0.35)
}

/// Heat that enters the soil in a month, MJ/m² a day, from the mean temperatures of the months around it (FAO-56 eq. 43).
pub fn soil_heat_of_month_mj_m2(previous_month_c: f64, next_month_c: f64) -> f64 {
    0.07 * (next_month_c - previous_month_c)
}

/// The same when only the month before is known (FAO-56 eq. 44).
pub fn soil_heat_since_last_month_mj_m2(previous_month_c: f64, this_month_c: f64) -> f64 {
    0.14 * (this_month_c - previous_month_c)
}
