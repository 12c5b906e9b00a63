//! The unit of a column, from its name or from the size of its numbers.
//!
//! The bounds between units are common practice, no source: they lie where one reading would be absurd.

use super::UnitReason;
use crate::place::record::{Measure, MeasureUnit};

/// Words that names write for units, where they differ from what a place file writes.
const WORDS: [(&str, MeasureUnit); 26] = [
    ("cubic feet per second", MeasureUnit::Ft3PerS),
    ("cubic meters per second", MeasureUnit::M3PerS),
    ("metros cubicos por segundo", MeasureUnit::M3PerS),
    ("pies cubicos por segundo", MeasureUnit::Ft3PerS),
    ("degrees celsius", MeasureUnit::Celsius),
    ("degrees fahrenheit", MeasureUnit::Fahrenheit),
    ("acre feet", MeasureUnit::AcreFeet),
    ("acre ft", MeasureUnit::AcreFeet),
    ("acft", MeasureUnit::AcreFeet),
    ("m3s", MeasureUnit::M3PerS),
    ("m3 s", MeasureUnit::M3PerS),
    ("ft3s", MeasureUnit::Ft3PerS),
    ("ft3 s", MeasureUnit::Ft3PerS),
    ("l s", MeasureUnit::LitresPerS),
    ("lps", MeasureUnit::LitresPerS),
    ("m s", MeasureUnit::MPerS),
    ("ms", MeasureUnit::MPerS),
    ("km h", MeasureUnit::KmPerHour),
    ("kmh", MeasureUnit::KmPerHour),
    ("mj m2", MeasureUnit::MjPerM2),
    ("mj", MeasureUnit::MjPerM2),
    ("w m2", MeasureUnit::WattPerM2),
    ("wm2", MeasureUnit::WattPerM2),
    ("pulgadas", MeasureUnit::Inch),
    ("horas", MeasureUnit::Hours),
    ("pct", MeasureUnit::Percent),
];

/// The unit of a column named `name` with these numbers, and why.
pub(super) fn find(name: &str, measure: Measure, numbers: &[f64]) -> (MeasureUnit, UnitReason) {
    if let Some(unit) = named(name, measure) {
        return (unit, UnitReason::Name);
    }
    match by_size(measure, numbers) {
        Some(unit) => (unit, UnitReason::Size),
        None => (measure.units()[0], UnitReason::Usual),
    }
}

fn named(name: &str, measure: Measure) -> Option<MeasureUnit> {
    let fits = |text: &str| MeasureUnit::from_key(text).filter(|unit| measure.accepts(*unit));
    // What stands in brackets is a unit in most offices.
    for (open, close) in [('(', ')'), ('[', ']')] {
        let inside = name.split(open).skip(1).filter_map(|part| part.split(close).next());
        if let Some(unit) = inside.filter_map(|text| fits(text.trim())).last() {
            return Some(unit);
        }
    }
    let plain: String = name
        .to_lowercase()
        .chars()
        .map(|letter| match letter {
            'ú' => 'u',
            'í' => 'i',
            '³' => '3',
            '²' => '2',
            letter if letter.is_alphanumeric() || letter == '%' || letter == '°' => letter,
            _ => ' ',
        })
        .collect();
    let words: Vec<&str> = plain.split_whitespace().collect();
    let joined = format!(" {} ", words.join(" "));
    let spoken = WORDS.iter().find(|(text, unit)| measure.accepts(*unit) && joined.contains(&format!(" {text} ")));
    // A unit stands last; the first word is what is measured, and `p` or `h` there are no units.
    let last = || words.iter().skip(1).rev().find_map(|word| fits(word));
    spoken.map(|(_, unit)| *unit).or_else(last)
}

fn by_size(measure: Measure, numbers: &[f64]) -> Option<MeasureUnit> {
    if numbers.len() < 30 {
        return None;
    }
    let highest = numbers.iter().copied().fold(f64::NEG_INFINITY, f64::max);
    let lowest = numbers.iter().copied().fold(f64::INFINITY, f64::min);
    let mean = numbers.iter().sum::<f64>() / numbers.len() as f64;
    let year = mean * 365.25;
    let whole = numbers.iter().all(|number| number % 1.0 == 0.0);
    // A year whose warmest day stays under 50 °F grows no crops, and few valleys have many days under 0 °F.
    let often_below_zero = numbers.iter().filter(|number| **number < 0.0).count() * 7 > numbers.len();
    let warm_days_of_a_year = measure == Measure::TemperatureMax && numbers.len() >= 330;
    if measure.is_temperature() || measure == Measure::DewPoint {
        return match (lowest, highest) {
            (lowest, highest) if lowest > 150.0 && highest < 340.0 => Some(MeasureUnit::Kelvin),
            (_, highest) if highest > 140.0 && whole => Some(MeasureUnit::TenthCelsius),
            (_, highest) if highest > 57.0 && highest < 140.0 => Some(MeasureUnit::Fahrenheit),
            (_, highest) if highest < 50.0 && (often_below_zero || warm_days_of_a_year) => Some(MeasureUnit::Celsius),
            _ => None,
        };
    }
    match measure {
        Measure::Precipitation if year > 6_000.0 && whole => Some(MeasureUnit::TenthMillimetre),
        Measure::Precipitation if highest < 20.0 && year < 90.0 => Some(MeasureUnit::Inch),
        Measure::Precipitation if year > 120.0 && year < 5_000.0 && highest > 15.0 => Some(MeasureUnit::Millimetre),
        Measure::RelativeHumidityMean | Measure::RelativeHumidityMin | Measure::RelativeHumidityMax => {
            Some(if highest <= 1.0 { MeasureUnit::Share } else { MeasureUnit::Percent })
        }
        Measure::Solar if highest > 50.0 => Some(MeasureUnit::WattPerM2),
        Measure::Solar if highest > 12.0 => Some(MeasureUnit::MjPerM2),
        Measure::VapourPressure if highest > 6.0 => Some(MeasureUnit::Hectopascal),
        _ => None,
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn names_say_their_unit_in_many_ways() {
        use MeasureUnit as U;
        for (name, measure, unit) in [
            ("tmin_c", Measure::TemperatureMin, Some(U::Celsius)),
            ("TMAX (°F)", Measure::TemperatureMax, Some(U::Fahrenheit)),
            ("Temp max [degF]", Measure::TemperatureMax, Some(U::Fahrenheit)),
            ("prcp_in", Measure::Precipitation, Some(U::Inch)),
            ("Lluvia (mm)", Measure::Precipitation, Some(U::Millimetre)),
            ("Caudal m³/s", Measure::Flow, Some(U::M3PerS)),
            ("flow_cfs", Measure::Flow, Some(U::Ft3PerS)),
            ("Discharge, cubic feet per second (Mean)", Measure::Flow, Some(U::Ft3PerS)),
            ("Storage (af)", Measure::Storage, Some(U::AcreFeet)),
            ("Almacenamiento hm3", Measure::Storage, Some(U::Hm3)),
            ("viento_ms", Measure::Wind, Some(U::MPerS)),
            ("HR %", Measure::RelativeHumidityMean, Some(U::Percent)),
            ("tmin", Measure::TemperatureMin, None),
            ("flow", Measure::Flow, None),
        ] {
            assert_eq!(named(name, measure), unit, "{name}");
        }
    }

    #[test]
    fn sizes_say_it_only_where_the_other_would_be_absurd() {
        let year = |low: f64, high: f64| -> Vec<f64> {
            (0..365).map(|day| low + (high - low) * f64::from(day) / 364.0).collect()
        };
        let size = |measure, numbers: &[f64]| by_size(measure, numbers);
        assert_eq!(size(Measure::TemperatureMax, &year(20.0, 95.0)), Some(MeasureUnit::Fahrenheit));
        assert_eq!(size(Measure::TemperatureMax, &year(-8.0, 33.0)), Some(MeasureUnit::Celsius));
        assert_eq!(size(Measure::TemperatureMax, &year(260.0, 305.0)), Some(MeasureUnit::Kelvin));
        assert_eq!(size(Measure::TemperatureMin, &year(10.0, 54.0)), None);
        assert_eq!(size(Measure::Flow, &year(1.0, 90.0)), None);
        assert_eq!(size(Measure::RelativeHumidityMean, &year(0.1, 0.9)), Some(MeasureUnit::Share));
    }
}
