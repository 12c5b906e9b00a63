//! The units that a key of `place.toml` may carry at its end, and what each is in SI.
//!
//! `outlet_m3s` and `outlet_cfs` are the same key in two units; a file gives exactly one of them.

use crate::water::units::{
    FAHRENHEIT_PER_CELSIUS, LITRES_PER_M3, M_PER_FOOT, M2_PER_ACRE, M2_PER_HECTARE, M2_PER_KM2, M2_PER_SQUARE_MILE,
    M3_PER_ACRE_FOOT, M3_PER_HM3, M3S_PER_FT3S, MM_PER_INCH, SECONDS_PER_DAY, celsius_from_fahrenheit,
};

/// One way to write a measured value.
#[derive(Clone, Copy, Debug)]
pub(crate) struct UnitSuffix {
    /// End of the key, with its underscore.
    pub suffix: &'static str,
    /// Value in SI per unit written, except for a Fahrenheit reading.
    pub scale: f64,
    /// Whether the value is a reading on the Fahrenheit scale, which has another zero.
    pub fahrenheit: bool,
}

impl UnitSuffix {
    /// The written value in SI.
    pub fn to_si(self, written: f64) -> f64 {
        if self.fahrenheit { celsius_from_fahrenheit(written) } else { written * self.scale }
    }

    /// A value in SI as it would be written.
    pub fn si_as_written(self, value: f64) -> f64 {
        if self.fahrenheit {
            value * FAHRENHEIT_PER_CELSIUS + crate::water::units::FAHRENHEIT_AT_FREEZING
        } else {
            value / self.scale
        }
    }
}

/// A suffix whose value is `scale` SI units.
const fn unit(suffix: &'static str, scale: f64) -> UnitSuffix {
    UnitSuffix { suffix, scale, fahrenheit: false }
}

/// The ways to write one kind of value, the usual one first.
pub(crate) type Units = &'static [UnitSuffix];

/// A number without a unit.
pub(crate) const PLAIN: Units = &[unit("", 1.0)];
/// A part of a whole.
pub(super) const SHARE: Units = &[unit("_share", 1.0), unit("_percent", 0.01)];
/// Days.
pub(super) const DAYS: Units = &[unit("_days", 1.0)];
/// Heights and lengths, m.
pub(super) const METRES: Units = &[unit("_m", 1.0), unit("_ft", M_PER_FOOT)];
/// Length of a canal, m.
pub(super) const CANAL_LENGTH: Units = &[unit("_km", 1_000.0), unit("_m", 1.0), unit("_ft", M_PER_FOOT)];
/// Areas of land and lake, km².
pub(super) const AREA_KM2: Units = &[
    unit("_km2", 1.0),
    unit("_ha", M2_PER_HECTARE / M2_PER_KM2),
    unit("_acres", M2_PER_ACRE / M2_PER_KM2),
    unit("_square_miles", M2_PER_SQUARE_MILE / M2_PER_KM2),
];
/// Areas of fields, ha.
pub(super) const AREA_HA: Units = &[
    unit("_ha", 1.0),
    unit("_acres", M2_PER_ACRE / M2_PER_HECTARE),
    unit("_km2", M2_PER_KM2 / M2_PER_HECTARE),
    unit("_square_miles", M2_PER_SQUARE_MILE / M2_PER_HECTARE),
];
/// Volumes of water in store, hm³.
pub(super) const VOLUME_HM3: Units =
    &[unit("_hm3", 1.0), unit("_acre_feet", M3_PER_ACRE_FOOT / M3_PER_HM3), unit("_m3", 1.0 / M3_PER_HM3)];
/// Flows, m³/s.
pub(super) const FLOW_M3S: Units =
    &[unit("_m3s", 1.0), unit("_cfs", M3S_PER_FT3S), unit("_litres_per_second", 1.0 / LITRES_PER_M3)];
/// Volumes used in a day, m³/day.
pub(super) const DAILY_M3: Units = &[
    unit("_m3_day", 1.0),
    unit("_acre_feet_day", M3_PER_ACRE_FOOT),
    unit("_cfs", M3S_PER_FT3S * SECONDS_PER_DAY),
    unit("_litres_per_second", SECONDS_PER_DAY / LITRES_PER_M3),
];
/// Depths of water, mm.
pub(super) const DEPTH_MM: Units = &[unit("_mm", 1.0), unit("_in", MM_PER_INCH)];
/// Depths of water in a day, mm/day.
pub(super) const DEPTH_MM_DAY: Units = &[unit("_mm_day", 1.0), unit("_in_day", MM_PER_INCH)];
/// Temperatures, °C.
pub(super) const CELSIUS: Units = &[unit("_c", 1.0), UnitSuffix { suffix: "_f", scale: 1.0, fahrenheit: true }];
/// Change of temperature with height, °C per km.
pub(super) const LAPSE: Units =
    &[unit("_c_per_km", 1.0), unit("_f_per_1000ft", 1.0 / (FAHRENHEIT_PER_CELSIUS * M_PER_FOOT))];
/// Share of precipitation added per 100 m of climb.
pub(super) const GRADIENT: Units = &[unit("_per_100m", 1.0), unit("_per_1000ft", 0.1 / M_PER_FOOT)];
/// Degree-day factors, mm/°C/day.
pub(super) const DEGREE_DAY: Units = &[unit("_mm_c_day", 1.0), unit("_in_f_day", MM_PER_INCH * FAHRENHEIT_PER_CELSIUS)];
/// Water held by a depth of soil, mm per m.
pub(super) const SOIL_HOLDS: Units = &[unit("_mm_per_m", 1.0), unit("_in_per_ft", MM_PER_INCH / M_PER_FOOT)];
/// Seepage through a canal's bed, m/day.
pub(super) const SEEPAGE: Units = &[unit("_m_day", 1.0), unit("_ft_day", M_PER_FOOT)];

/// Ends of keys that are units, right or wrong for the key at hand; with them a key is told to lack its right unit and
/// not to be unknown.
pub(super) const OTHER_SUFFIXES: [&str; 48] = [
    "_share",
    "_percent",
    "_days",
    "_day",
    "_hours",
    "_m",
    "_ft",
    "_feet",
    "_km",
    "_miles",
    "_mi",
    "_km2",
    "_m2",
    "_ha",
    "_acres",
    "_ac",
    "_square_miles",
    "_hm3",
    "_m3",
    "_acre_feet",
    "_acre_ft",
    "_ac_ft",
    "_af",
    "_m3s",
    "_m3_s",
    "_cms",
    "_cfs",
    "_ft3s",
    "_ft3_s",
    "_ls",
    "_l_s",
    "_litres_per_second",
    "_m3_day",
    "_acre_feet_day",
    "_mm",
    "_in",
    "_inches",
    "_cm",
    "_mm_day",
    "_in_day",
    "_c",
    "_f",
    "_c_per_km",
    "_f_per_1000ft",
    "_c_per_100m",
    "_mm_c_day",
    "_in_f_day",
    "_mm_per_m",
];

#[cfg(test)]
mod tests {
    use super::*;

    fn si(units: Units, suffix: &str, written: f64) -> f64 {
        units.iter().find(|unit| unit.suffix == suffix).unwrap().to_si(written)
    }

    #[test]
    fn known_conversions() {
        // Arithmetic from the exact foot, inch and acre; the factors are in every conversion table.
        approx::assert_relative_eq!(si(VOLUME_HM3, "_acre_feet", 1000.0), 1.233_481_837_547_52, max_relative = 1e-14);
        approx::assert_relative_eq!(si(FLOW_M3S, "_cfs", 1.0), 0.028_316_846_592, max_relative = 1e-14);
        approx::assert_relative_eq!(si(AREA_HA, "_acres", 1.0), 0.404_685_642_24, max_relative = 1e-14);
        approx::assert_relative_eq!(si(LAPSE, "_f_per_1000ft", -3.5), -6.379_410_906, max_relative = 1e-9);
        approx::assert_relative_eq!(si(GRADIENT, "_per_1000ft", 0.1524), 0.05, max_relative = 1e-14);
        assert_eq!(si(CELSIUS, "_f", 212.0), 100.0);
    }

    #[test]
    fn every_unit_goes_there_and_back() {
        for units in [
            AREA_KM2, AREA_HA, VOLUME_HM3, FLOW_M3S, DAILY_M3, DEPTH_MM, CELSIUS, LAPSE, GRADIENT, DEGREE_DAY,
            SOIL_HOLDS, SEEPAGE, METRES, SHARE,
        ] {
            for unit in units {
                approx::assert_relative_eq!(unit.si_as_written(unit.to_si(7.25)), 7.25, max_relative = 1e-14);
            }
        }
    }
}
