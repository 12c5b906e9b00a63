//! Sun above the air: what latitude and day of year alone decide, and the table that is built from it once.
//!
//! Equation numbers are those of Allen et al. (1998), FAO Irrigation and Drainage Paper 56, chapter 3. Radiation is in
//! MJ/m² a day, angles in radians, days of the year count from 1 on 1 January (29 February is 60).

use core::f64::consts::PI;

const SOLAR_CONSTANT_MJ_M2_MIN: f64 = 0.0820;
const MINUTES_PER_DAY: f64 = 24.0 * 60.0;
/// Days that a sky table holds: a leap year.
pub const DAYS_IN_TABLE: usize = 366;

/// Radians in an angle of degrees, south and west negative (FAO-56 eq. 22).
pub fn radians(degrees: f64) -> f64 {
    degrees * PI / 180.0
}

/// Inverse relative distance from the Earth to the Sun (FAO-56 eq. 23).
pub fn inverse_relative_distance(day_of_year: u16) -> f64 {
    1.0 + 0.033 * libm::cos(2.0 * PI / 365.0 * f64::from(day_of_year))
}

/// Solar declination in radians (FAO-56 eq. 24).
pub fn declination_rad(day_of_year: u16) -> f64 {
    0.409 * libm::sin(2.0 * PI / 365.0 * f64::from(day_of_year) - 1.39)
}

/// Hour angle of sunset in radians (FAO-56 eq. 25): 0 in the polar night, π in the polar day.
///
/// Beyond the polar circles the cosine leaves −1..1 on some days; it is then taken at that limit (common practice).
pub fn sunset_hour_angle_rad(latitude_rad: f64, declination_rad: f64) -> f64 {
    let cosine = -libm::tan(latitude_rad) * libm::tan(declination_rad);
    if cosine >= 1.0 {
        0.0
    } else if cosine <= -1.0 {
        PI
    } else {
        libm::acos(cosine)
    }
}

/// Radiation in MJ/m² a day that reaches a level square metre above the air (FAO-56 eq. 21).
pub fn extraterrestrial_radiation_mj_m2(latitude_rad: f64, day_of_year: u16) -> f64 {
    let declination = declination_rad(day_of_year);
    let sunset = sunset_hour_angle_rad(latitude_rad, declination);
    let height = sunset * libm::sin(latitude_rad) * libm::sin(declination)
        + libm::cos(latitude_rad) * libm::cos(declination) * libm::sin(sunset);
    MINUTES_PER_DAY / PI * SOLAR_CONSTANT_MJ_M2_MIN * inverse_relative_distance(day_of_year) * height
}

/// Longest possible sunshine of a day in hours (FAO-56 eq. 34).
pub fn daylight_h(sunset_hour_angle_rad: f64) -> f64 {
    24.0 / PI * sunset_hour_angle_rad
}

/// What the sky gives at one latitude on every day of a year, built once so that no day needs a sine.
#[derive(Clone, Debug, PartialEq)]
pub struct SkyTable {
    /// Extraterrestrial radiation in MJ/m² a day; the first entry is 1 January.
    pub extraterrestrial_mj_m2: [f64; DAYS_IN_TABLE],
    /// Longest possible sunshine in hours; the first entry is 1 January.
    pub daylight_h: [f64; DAYS_IN_TABLE],
}

impl SkyTable {
    /// The table for a latitude in degrees, north positive; nothing unless it is within −90 to 90.
    pub fn at_latitude(latitude_deg: f64) -> Option<Self> {
        if !(-90.0..=90.0).contains(&latitude_deg) {
            return None;
        }
        let latitude = radians(latitude_deg);
        let mut table = Self { extraterrestrial_mj_m2: [0.0; DAYS_IN_TABLE], daylight_h: [0.0; DAYS_IN_TABLE] };
        let rows = table.extraterrestrial_mj_m2.iter_mut().zip(table.daylight_h.iter_mut());
        for ((radiation, daylight), day_of_year) in rows.zip(1u16..) {
            *radiation = extraterrestrial_radiation_mj_m2(latitude, day_of_year);
            *daylight = daylight_h(sunset_hour_angle_rad(latitude, declination_rad(day_of_year)));
        }
        Some(table)
    }

    /// Extraterrestrial radiation in MJ/m² on a day of the year, 1 to 366; not a number for any other day.
    pub fn extraterrestrial_on_mj_m2(&self, day_of_year: u16) -> f64 {
        let index = usize::from(day_of_year).wrapping_sub(1);
        self.extraterrestrial_mj_m2.get(index).copied().unwrap_or(f64::NAN)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_day_outside_the_year_is_not_a_number() {
        let sky = SkyTable::at_latitude(45.0).unwrap();
        assert!(sky.extraterrestrial_on_mj_m2(0).is_nan());
        assert!(sky.extraterrestrial_on_mj_m2(367).is_nan());
        assert_eq!(sky.extraterrestrial_on_mj_m2(366), extraterrestrial_radiation_mj_m2(radians(45.0), 366));
    }

    #[test]
    fn a_latitude_off_the_globe_is_refused() {
        for latitude_deg in [90.1, -91.0, f64::NAN, f64::INFINITY] {
            assert!(SkyTable::at_latitude(latitude_deg).is_none(), "{latitude_deg}");
        }
        for latitude_deg in [90.0, -90.0, 0.0] {
            let sky = SkyTable::at_latitude(latitude_deg).unwrap();
            assert!(sky.extraterrestrial_mj_m2.iter().all(|value| (0.0..50.0).contains(value)), "{latitude_deg}");
            assert!(sky.daylight_h.iter().all(|hours| (0.0..=24.0).contains(hours)), "{latitude_deg}");
        }
    }

    #[test]
    fn seasons_are_half_a_year_apart_in_the_two_hemispheres() {
        let north = SkyTable::at_latitude(40.0).unwrap();
        let south = SkyTable::at_latitude(-40.0).unwrap();
        assert!(north.daylight_h[171] > 14.5 && south.daylight_h[171] < 9.5);
        assert!(north.daylight_h[354] < 9.5 && south.daylight_h[354] > 14.5);
    }
}
