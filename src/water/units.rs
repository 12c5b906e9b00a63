//! Unit constants, each written once; everything else in the crate refers to these.
//!
//! Sources: international foot and acre (US NIST Special Publication 811, appendix B, from memory); the rest follow
//! from them by arithmetic.

/// Seconds in a day.
pub const SECONDS_PER_DAY: f64 = 86_400.0;
/// Metres in an international foot (exact).
pub const M_PER_FOOT: f64 = 0.3048;
/// Millimetres in an inch (exact).
pub const MM_PER_INCH: f64 = 25.4;
/// Square feet in an acre (exact).
pub const SQUARE_FEET_PER_ACRE: f64 = 43_560.0;
/// Square metres in an acre (international foot).
pub const M2_PER_ACRE: f64 = SQUARE_FEET_PER_ACRE * M_PER_FOOT * M_PER_FOOT;
/// Cubic metres in an acre-foot (international foot).
pub const M3_PER_ACRE_FOOT: f64 = M2_PER_ACRE * M_PER_FOOT;
/// Cubic metres per second in one cubic foot per second.
pub const M3S_PER_FT3S: f64 = M_PER_FOOT * M_PER_FOOT * M_PER_FOOT;
/// Kilometres in a mile (international foot).
pub const KM_PER_MILE: f64 = 5_280.0 * M_PER_FOOT / 1_000.0;
/// Metres per second in one mile per hour.
pub const MS_PER_MPH: f64 = KM_PER_MILE * 1_000.0 / 3_600.0;
/// Square metres in a hectare.
pub const M2_PER_HECTARE: f64 = 10_000.0;
/// Square metres in a square kilometre.
pub const M2_PER_KM2: f64 = 1.0e6;
/// Square metres in a square mile (international foot).
pub const M2_PER_SQUARE_MILE: f64 = 640.0 * M2_PER_ACRE;
/// Cubic metres in a cubic hectometre (one million cubic metres).
pub const M3_PER_HM3: f64 = 1.0e6;
/// Cubic metres in one millimetre of water over one square kilometre.
pub const M3_PER_MM_KM2: f64 = 1_000.0;
/// Cubic metres in one millimetre of water over one hectare.
pub const M3_PER_MM_HECTARE: f64 = 10.0;
/// Cubic metres in a megalitre.
pub const M3_PER_MEGALITRE: f64 = 1_000.0;
/// Litres in a cubic metre.
pub const LITRES_PER_M3: f64 = 1_000.0;
/// Fahrenheit degrees in one Celsius degree, for differences of temperature.
pub const FAHRENHEIT_PER_CELSIUS: f64 = 1.8;
/// The Fahrenheit reading at 0 °C.
pub const FAHRENHEIT_AT_FREEZING: f64 = 32.0;

/// A Fahrenheit reading in degrees Celsius.
pub fn celsius_from_fahrenheit(reading_f: f64) -> f64 {
    (reading_f - FAHRENHEIT_AT_FREEZING) / FAHRENHEIT_PER_CELSIUS
}

/// A flow in cubic metres per second as cubic metres in a day.
pub fn m3_per_day(flow_m3s: f64) -> f64 {
    flow_m3s * SECONDS_PER_DAY
}
