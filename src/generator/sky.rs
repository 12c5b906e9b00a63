//! What the clear sky and the air's vapour allow: bounds that invented weather may not pass.
//!
//! Allen et al. (1998), FAO Irrigation and Drainage Paper 56: equations 21–25 (radiation above the air), 37 (clear sky)
//! and 11 (saturation vapour pressure).

use core::f64::consts::PI;

/// Solar constant, MJ m⁻² min⁻¹ (FAO-56, equation 21).
const SOLAR_CONSTANT_MJ_M2_MIN: f64 = 0.0820;

/// Radiation above the air, MJ m⁻² d⁻¹, on a day of the year (1–366) at a latitude in degrees (south negative).
pub(super) fn extraterrestrial_mj_m2(latitude_degrees: f64, day_of_year: u32) -> f64 {
    let latitude = latitude_degrees * PI / 180.0;
    let angle = 2.0 * PI * f64::from(day_of_year) / 365.0;
    let nearness = 1.0 + 0.033 * libm::cos(angle);
    let declination = 0.409 * libm::sin(angle - 1.39);
    let lean = libm::sin(latitude) * libm::sin(declination);
    let cosines = libm::cos(latitude) * libm::cos(declination);
    // Beyond the polar circles the sun may not rise, or not set; the half-day angle is then 0 or half a turn.
    let cosine = -lean / cosines;
    let sunset = if cosine >= 1.0 {
        0.0
    } else if cosine <= -1.0 {
        PI
    } else {
        libm::acos(cosine)
    };
    24.0 * 60.0 / PI * SOLAR_CONSTANT_MJ_M2_MIN * nearness * (sunset * lean + cosines * libm::sin(sunset))
}

/// Radiation under a clear sky, MJ m⁻² d⁻¹ (FAO-56, equation 37).
pub(super) fn clear_sky_mj_m2(latitude_degrees: f64, elevation_m: f64, day_of_year: u32) -> f64 {
    (0.75 + 2.0e-5 * elevation_m) * extraterrestrial_mj_m2(latitude_degrees, day_of_year)
}

/// Saturation vapour pressure, kPa (FAO-56, equation 11).
pub(super) fn saturation_kpa(temperature_c: f64) -> f64 {
    0.6108 * libm::exp(17.27 * temperature_c / (temperature_c + 237.3))
}

/// Temperature, °C, at which a vapour pressure in kPa would saturate the air (equation 11 turned round).
pub(super) fn dewpoint_c(vapour_kpa: f64) -> f64 {
    let log = libm::log(vapour_kpa / 0.6108);
    237.3 * log / (17.27 - log)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn published_examples() {
        // FAO-56, example 8: 3 September at 20° S, 32.2 MJ m⁻² d⁻¹; from memory.
        assert!((extraterrestrial_mj_m2(-20.0, 246) - 32.2).abs() < 0.05);
        // FAO-56, example 10 with 18: 22°54' S, 15 May, sea level: 25.1 above the air, 18.8 under a clear sky; from memory.
        assert!((extraterrestrial_mj_m2(-22.9, 135) - 25.1).abs() < 0.05);
        assert!((clear_sky_mj_m2(-22.9, 0.0, 135) - 18.8).abs() < 0.06);
        // FAO-56, table 2.3: 2.338 kPa at 20 °C; from memory.
        assert!((saturation_kpa(20.0) - 2.338).abs() < 0.0006);
        assert!((dewpoint_c(saturation_kpa(-7.25)) + 7.25).abs() < 1e-9);
        assert_eq!(extraterrestrial_mj_m2(80.0, 355), 0.0);
    }
}
