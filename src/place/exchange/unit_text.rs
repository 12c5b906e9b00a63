//! Units as exchange formats write them (UCUM codes, UDUNITS text), as units that a record can have.

use crate::place::record::{Measure, MeasureUnit};
use crate::water::units::SECONDS_PER_DAY;

/// A unit of a record, and by what a reading in the file's unit is multiplied to be in it.
pub(super) type ScaledUnit = (MeasureUnit, f64);

/// Texts without spaces and powers, in small letters where that loses nothing.
const TEXTS: [(MeasureUnit, f64, &[&str]); 28] = [
    (
        MeasureUnit::Celsius,
        1.0,
        &["cel", "degc", "deg_c", "degree_c", "degrees_c", "degree_celsius", "degrees_celsius", "celsius"],
    ),
    (
        MeasureUnit::Fahrenheit,
        1.0,
        &["[degf]", "degf", "deg_f", "degree_f", "degrees_f", "degree_fahrenheit", "degrees_fahrenheit", "fahrenheit"],
    ),
    (MeasureUnit::Kelvin, 1.0, &["k", "kelvin", "degree_kelvin", "degrees_kelvin", "degk", "deg_k"]),
    (
        MeasureUnit::Millimetre,
        1.0,
        &[
            "mm",
            "mm.d-1",
            "mm.day-1",
            "mm/d",
            "mm/day",
            "kg.m-2",
            "kg/m2",
            "kg.m-2.d-1",
            "kg.m-2.day-1",
            "millimeter",
            "millimeters",
        ],
    ),
    (MeasureUnit::Millimetre, 10.0, &["cm", "cm.d-1", "cm.day-1"]),
    (MeasureUnit::Millimetre, 1_000.0, &["m", "m.d-1", "m.day-1", "meter", "metre"]),
    (MeasureUnit::Millimetre, SECONDS_PER_DAY, &["kg.m-2.s-1", "kg/m2/s", "mm.s-1", "mm/s"]),
    (MeasureUnit::Inch, 1.0, &["in", "[in_i]", "[in_us]", "inch", "inches", "in.d-1", "in/d"]),
    (MeasureUnit::M3PerS, 1.0, &["m3/s", "m3.s-1", "cumec", "cumecs"]),
    (MeasureUnit::Ft3PerS, 1.0, &["ft3/s", "[ft_i]3/s", "[ft_us]3/s", "[cft_i]/s", "ft3.s-1", "cfs"]),
    (MeasureUnit::LitresPerS, 1.0, &["l/s", "l.s-1"]),
    (MeasureUnit::M3PerDay, 1.0, &["m3/d", "m3.d-1", "m3/day", "m3.day-1"]),
    (MeasureUnit::Hm3, 1.0, &["hm3", "mm3", "10*6.m3", "1e6.m3", "million.m3"]),
    (MeasureUnit::M3, 1.0, &["m3"]),
    (
        MeasureUnit::AcreFeet,
        1.0,
        &["[acr_us].[ft_us]", "[acr_us].[ft_i]", "acre-feet", "acre.ft", "ac-ft", "acre.feet", "ac.ft"],
    ),
    (MeasureUnit::MjPerM2, 1.0, &["mj/m2", "mj.m-2", "mj.m-2.d-1", "mj.m-2.day-1", "mj/m2/d", "mj/m2/day"]),
    (MeasureUnit::MjPerM2, 1.0e-6, &["j/m2", "j.m-2", "j.m-2.d-1"]),
    (MeasureUnit::WattPerM2, 1.0, &["w/m2", "w.m-2"]),
    (MeasureUnit::Kilopascal, 1.0, &["kpa"]),
    (MeasureUnit::Kilopascal, 1.0e-3, &["pa"]),
    (MeasureUnit::Hectopascal, 1.0, &["hpa", "mbar", "millibar"]),
    (MeasureUnit::MPerS, 1.0, &["m/s", "m.s-1"]),
    (MeasureUnit::KmPerHour, 1.0, &["km/h", "km.h-1", "km.hr-1"]),
    (MeasureUnit::MilesPerHour, 1.0, &["[mi_i]/h", "mi/h", "mph", "mile/hour"]),
    (MeasureUnit::Knots, 1.0, &["[kn_i]", "knot", "knots", "kt"]),
    (MeasureUnit::Percent, 1.0, &["%", "percent"]),
    (MeasureUnit::Share, 1.0, &["1", "{fraction}"]),
    (MeasureUnit::Hours, 1.0, &["h", "hour", "hours", "hr"]),
];

/// The unit that `text` means for `measure`, of which a record may be written in it; without a measure, for any.
pub(super) fn unit_of(text: &str, measure: Option<Measure>) -> Option<ScaledUnit> {
    let words: Vec<&str> = text.split_whitespace().collect();
    let plain = words.join(".").replace("**", "").replace('^', "").replace('³', "3").replace('²', "2");
    let plain = plain.replace('·', ".").to_lowercase();
    let fits = |unit: MeasureUnit| measure.is_none_or(|measure| measure.accepts(unit));
    let known = TEXTS.iter().find(|(unit, _, texts)| fits(*unit) && texts.contains(&plain.as_str()));
    known
        .map(|(unit, scale, _)| (*unit, *scale))
        .or_else(|| MeasureUnit::from_key(text).filter(|unit| fits(*unit)).map(|unit| (unit, 1.0)))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn texts_of_three_traditions_mean_the_same() {
        let flow = Some(Measure::Flow);
        for text in ["m3/s", "m3 s-1", "m^3/s", "m3.s-1", "m³/s", "m**3 s**-1", "M3/S"] {
            assert_eq!(unit_of(text, flow), Some((MeasureUnit::M3PerS, 1.0)), "{text}");
        }
        assert_eq!(unit_of("[ft_i]3/s", flow), Some((MeasureUnit::Ft3PerS, 1.0)));
        assert_eq!(unit_of("kg m-2 s-1", Some(Measure::Precipitation)), Some((MeasureUnit::Millimetre, 86_400.0)));
        assert_eq!(unit_of("m", Some(Measure::SnowWater)), Some((MeasureUnit::Millimetre, 1_000.0)));
        assert_eq!(unit_of("1", Some(Measure::RelativeHumidityMean)), Some((MeasureUnit::Share, 1.0)));
        assert_eq!(unit_of("K", Some(Measure::TemperatureMin)), Some((MeasureUnit::Kelvin, 1.0)));
        assert_eq!(unit_of("Pa", Some(Measure::VapourPressure)), Some((MeasureUnit::Kilopascal, 1.0e-3)));
        assert_eq!(unit_of("m", flow), None);
        assert_eq!(unit_of("furlong", None), None);
    }
}
