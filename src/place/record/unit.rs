//! The units that a record may be written in, and the way from each to the unit that the water uses.

use crate::water::units::{
    LITRES_PER_M3, M_PER_FOOT, M3_PER_ACRE_FOOT, M3_PER_HM3, M3S_PER_FT3S, MM_PER_INCH, SECONDS_PER_DAY,
    celsius_from_fahrenheit,
};

/// Metres in a mile (international foot).
const M_PER_MILE: f64 = 5_280.0 * M_PER_FOOT;
/// Metres in a nautical mile (exact; from memory).
const M_PER_NAUTICAL_MILE: f64 = 1_852.0;
const SECONDS_PER_HOUR: f64 = 3_600.0;
/// The kelvin reading at 0 °C (exact; from memory).
const KELVIN_AT_FREEZING: f64 = 273.15;
/// MJ/m² in a langley, one thermochemical calorie on a square centimetre (from memory).
const MJ_PER_LANGLEY: f64 = 0.041_84;

/// The unit that a column is written in.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum MeasureUnit {
    /// °C.
    Celsius,
    /// °F.
    Fahrenheit,
    /// K.
    Kelvin,
    /// Tenths of a °C, as some archives keep whole numbers.
    TenthCelsius,
    /// mm (of a day's rain, snow or evaporation: mm in the day).
    Millimetre,
    /// Inches.
    Inch,
    /// cm.
    Centimetre,
    /// Tenths of a mm, as some archives keep whole numbers.
    TenthMillimetre,
    /// m³/s.
    M3PerS,
    /// L/s.
    LitresPerS,
    /// ft³/s.
    Ft3PerS,
    /// Acre-feet in the day.
    AcreFeetPerDay,
    /// m³ in the day.
    M3PerDay,
    /// hm³ in the day.
    Hm3PerDay,
    /// hm³, one million m³.
    Hm3,
    /// m³.
    M3,
    /// Acre-feet.
    AcreFeet,
    /// MJ/m² in the day.
    MjPerM2,
    /// W/m², mean of the 24 hours.
    WattPerM2,
    /// kWh/m² in the day.
    KilowattHourPerM2,
    /// Langleys (cal/cm²) in the day.
    Langley,
    /// kPa.
    Kilopascal,
    /// hPa, the same as a millibar.
    Hectopascal,
    /// m/s.
    MPerS,
    /// km/h.
    KmPerHour,
    /// Miles in the hour.
    MilesPerHour,
    /// Knots.
    Knots,
    /// Wind run, km in the day.
    KmPerDay,
    /// Parts of a hundred.
    Percent,
    /// A share of one.
    Share,
    /// Hours.
    Hours,
}

/// Each unit with the words that a place file may write for it; the first is the one that messages say.
const KEYS: [(MeasureUnit, &[&str]); 31] = [
    (MeasureUnit::Celsius, &["°C", "C", "celsius", "degC"]),
    (MeasureUnit::Fahrenheit, &["°F", "F", "fahrenheit", "degF"]),
    (MeasureUnit::Kelvin, &["K", "kelvin"]),
    (MeasureUnit::TenthCelsius, &["0.1 °C", "0.1 C", "tenths of °C"]),
    (MeasureUnit::Millimetre, &["mm", "mm/day", "mm/d", "kg/m²", "kg/m2"]),
    (MeasureUnit::Inch, &["in", "inch", "inches", "in/day"]),
    (MeasureUnit::Centimetre, &["cm", "cm/day"]),
    (MeasureUnit::TenthMillimetre, &["0.1 mm", "tenths of mm"]),
    (MeasureUnit::M3PerS, &["m³/s", "m3/s", "cms"]),
    (MeasureUnit::LitresPerS, &["L/s", "l/s"]),
    (MeasureUnit::Ft3PerS, &["ft³/s", "ft3/s", "cfs", "pcs"]),
    (MeasureUnit::AcreFeetPerDay, &["acre-feet/day", "ac-ft/day", "acre-feet per day"]),
    (MeasureUnit::M3PerDay, &["m³/day", "m3/day", "m³/d", "m3/d"]),
    (MeasureUnit::Hm3PerDay, &["hm³/day", "hm3/day", "hm³/d", "hm3/d"]),
    (MeasureUnit::Hm3, &["hm³", "hm3", "million m³", "million m3"]),
    (MeasureUnit::M3, &["m³", "m3"]),
    (MeasureUnit::AcreFeet, &["acre-feet", "ac-ft", "acre-foot", "acre-pies", "af"]),
    (MeasureUnit::MjPerM2, &["MJ/m²", "MJ/m2", "MJ/m²/day", "MJ/m2/day"]),
    (MeasureUnit::WattPerM2, &["W/m²", "W/m2"]),
    (MeasureUnit::KilowattHourPerM2, &["kWh/m²", "kWh/m2", "kWh/m²/day", "kWh/m2/day"]),
    (MeasureUnit::Langley, &["langley", "langleys", "cal/cm²", "cal/cm2"]),
    (MeasureUnit::Kilopascal, &["kPa"]),
    (MeasureUnit::Hectopascal, &["hPa", "mbar", "mb"]),
    (MeasureUnit::MPerS, &["m/s"]),
    (MeasureUnit::KmPerHour, &["km/h"]),
    (MeasureUnit::MilesPerHour, &["mph", "mi/h"]),
    (MeasureUnit::Knots, &["kt", "knots", "kn"]),
    (MeasureUnit::KmPerDay, &["km/day", "km/d"]),
    (MeasureUnit::Percent, &["%", "percent"]),
    (MeasureUnit::Share, &["share", "0-1", "fraction"]),
    (MeasureUnit::Hours, &["h", "hours"]),
];

impl MeasureUnit {
    /// How a place file writes it, and how messages name it.
    pub fn key(self) -> &'static str {
        KEYS.iter().find(|(unit, _)| *unit == self).map_or("", |(_, keys)| keys[0])
    }

    /// The unit that `key` names (`°F`, `in`, `ft3/s`, `acre-feet` …; capitals count only for m and M, k and K).
    pub fn from_key(key: &str) -> Option<Self> {
        let key = key.trim();
        let exact = KEYS.iter().find(|(_, keys)| keys.contains(&key));
        let any_case = || KEYS.iter().find(|(_, keys)| keys.iter().any(|known| known.eq_ignore_ascii_case(key)));
        exact.or_else(any_case).map(|(unit, _)| *unit)
    }

    /// Every unit's key, the one that messages say.
    pub fn keys() -> impl Iterator<Item = &'static str> {
        KEYS.iter().map(|(_, keys)| keys[0])
    }

    /// A reading in this unit as the value that the water uses: °C, mm, %, kPa, m/s, MJ/m², h, m³/s or hm³.
    pub fn to_si(self, reading: f64) -> f64 {
        match self {
            MeasureUnit::Fahrenheit => celsius_from_fahrenheit(reading),
            MeasureUnit::Kelvin => reading - KELVIN_AT_FREEZING,
            MeasureUnit::TenthCelsius | MeasureUnit::TenthMillimetre | MeasureUnit::Hectopascal => reading / 10.0,
            MeasureUnit::Inch => reading * MM_PER_INCH,
            MeasureUnit::Centimetre => reading * 10.0,
            MeasureUnit::LitresPerS => reading / LITRES_PER_M3,
            MeasureUnit::Ft3PerS => reading * M3S_PER_FT3S,
            MeasureUnit::AcreFeetPerDay => reading * M3_PER_ACRE_FOOT / SECONDS_PER_DAY,
            MeasureUnit::M3PerDay => reading / SECONDS_PER_DAY,
            MeasureUnit::Hm3PerDay => reading * M3_PER_HM3 / SECONDS_PER_DAY,
            MeasureUnit::M3 => reading / M3_PER_HM3,
            MeasureUnit::AcreFeet => reading * M3_PER_ACRE_FOOT / M3_PER_HM3,
            MeasureUnit::WattPerM2 => reading * SECONDS_PER_DAY / 1.0e6,
            MeasureUnit::KilowattHourPerM2 => reading * SECONDS_PER_HOUR / 1_000.0,
            MeasureUnit::Langley => reading * MJ_PER_LANGLEY,
            MeasureUnit::KmPerHour => reading * 1_000.0 / SECONDS_PER_HOUR,
            MeasureUnit::MilesPerHour => reading * M_PER_MILE / SECONDS_PER_HOUR,
            MeasureUnit::Knots => reading * M_PER_NAUTICAL_MILE / SECONDS_PER_HOUR,
            MeasureUnit::KmPerDay => reading * 1_000.0 / SECONDS_PER_DAY,
            MeasureUnit::Share => reading * 100.0,
            MeasureUnit::Celsius
            | MeasureUnit::Millimetre
            | MeasureUnit::M3PerS
            | MeasureUnit::Hm3
            | MeasureUnit::MjPerM2
            | MeasureUnit::Kilopascal
            | MeasureUnit::MPerS
            | MeasureUnit::Percent
            | MeasureUnit::Hours => reading,
        }
    }

    /// The reading in this unit that means `value_si`, for messages: every unit here is a straight line.
    pub fn from_si(self, value_si: f64) -> f64 {
        let zero = self.to_si(0.0);
        (value_si - zero) / (self.to_si(1.0) - zero)
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    #[test]
    fn every_unit_is_found_by_its_key_and_comes_back_from_si() {
        for (unit, keys) in KEYS {
            for key in keys {
                assert_eq!(MeasureUnit::from_key(key), Some(unit), "{key}");
            }
            for reading in [-40.0, 0.0, 12.5, 3000.0] {
                assert_relative_eq!(unit.from_si(unit.to_si(reading)), reading, epsilon = 1e-9, max_relative = 1e-12);
            }
        }
        assert_eq!(MeasureUnit::from_key("FT3/S"), Some(MeasureUnit::Ft3PerS));
        assert_eq!(MeasureUnit::from_key("furlong"), None);
    }

    #[test]
    fn known_conversions_hold() {
        // US NIST Special Publication 811, appendix B (from memory): foot, acre-foot, mile, knot.
        assert_relative_eq!(MeasureUnit::Fahrenheit.to_si(95.0), 35.0, max_relative = 1e-15);
        assert_relative_eq!(MeasureUnit::Ft3PerS.to_si(1.0), 0.028_316_846_592, max_relative = 1e-12);
        assert_relative_eq!(MeasureUnit::AcreFeet.to_si(1.0), 1.233_481_837_547_52e-3, max_relative = 1e-12);
        assert_relative_eq!(MeasureUnit::MilesPerHour.to_si(1.0), 0.447_04, max_relative = 1e-12);
        assert_relative_eq!(MeasureUnit::Knots.to_si(1.0), 0.514_444_444, max_relative = 1e-8);
        // One cubic foot a second for a day is 1.98347 acre-feet (exact ratio 86400/43560).
        let one_day = MeasureUnit::AcreFeetPerDay.to_si(86_400.0 / 43_560.0);
        assert_relative_eq!(one_day, MeasureUnit::Ft3PerS.to_si(1.0), max_relative = 1e-14);
        // FAO-56 (Allen et al. 1998), table 3: 1 W/m² for a day is 0.0864 MJ/m² (from memory).
        assert_relative_eq!(MeasureUnit::WattPerM2.to_si(1.0), 0.0864, max_relative = 1e-14);
    }
}
