//! What a column of a record measures, and the key that a place file writes for it.

use super::plan::{GapFill, GapRule};
use super::unit::MeasureUnit;

/// What a column of a daily record measures.
///
/// The unit behind each is the one that [`super::Column::values`] carries, whatever the file was written in.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Measure {
    /// Lowest air temperature of the day, °C.
    TemperatureMin,
    /// Highest air temperature of the day, °C.
    TemperatureMax,
    /// Mean air temperature of the day, °C.
    TemperatureMean,
    /// Rain and snow of the day, mm of water.
    Precipitation,
    /// Water held in the snowpack, mm.
    SnowWater,
    /// Mean relative humidity of the day, %.
    RelativeHumidityMean,
    /// Lowest relative humidity of the day, %.
    RelativeHumidityMin,
    /// Highest relative humidity of the day, %.
    RelativeHumidityMax,
    /// Dew point, °C.
    DewPoint,
    /// Actual vapour pressure, kPa.
    VapourPressure,
    /// Mean wind speed of the day at the height of the instrument, m/s.
    Wind,
    /// Solar radiation on a level surface, MJ/m² in the day.
    Solar,
    /// Hours of bright sunshine, h.
    Sunshine,
    /// Reference evaporation, mm in the day.
    ReferenceEvaporation,
    /// Mean flow of the day past a gauge or out of a dam, m³/s.
    Flow,
    /// Inflow that somebody computed from a reservoir's balance, m³/s; may be slightly negative on single days.
    ComputedInflow,
    /// Water stored in a reservoir, hm³.
    Storage,
    /// Mean flow of the day into a canal, m³/s.
    Diversion,
}

impl Measure {
    /// Every measure.
    pub const ALL: [Measure; 18] = [
        Measure::TemperatureMin,
        Measure::TemperatureMax,
        Measure::TemperatureMean,
        Measure::Precipitation,
        Measure::SnowWater,
        Measure::RelativeHumidityMean,
        Measure::RelativeHumidityMin,
        Measure::RelativeHumidityMax,
        Measure::DewPoint,
        Measure::VapourPressure,
        Measure::Wind,
        Measure::Solar,
        Measure::Sunshine,
        Measure::ReferenceEvaporation,
        Measure::Flow,
        Measure::ComputedInflow,
        Measure::Storage,
        Measure::Diversion,
    ];

    /// The key that a place file writes for it.
    pub fn key(self) -> &'static str {
        match self {
            Measure::TemperatureMin => "temperature_min",
            Measure::TemperatureMax => "temperature_max",
            Measure::TemperatureMean => "temperature_mean",
            Measure::Precipitation => "precipitation",
            Measure::SnowWater => "snow_water",
            Measure::RelativeHumidityMean => "relative_humidity_mean",
            Measure::RelativeHumidityMin => "relative_humidity_min",
            Measure::RelativeHumidityMax => "relative_humidity_max",
            Measure::DewPoint => "dew_point",
            Measure::VapourPressure => "vapour_pressure",
            Measure::Wind => "wind",
            Measure::Solar => "solar",
            Measure::Sunshine => "sunshine",
            Measure::ReferenceEvaporation => "reference_evaporation",
            Measure::Flow => "flow",
            Measure::ComputedInflow => "computed_inflow",
            Measure::Storage => "storage",
            Measure::Diversion => "diversion",
        }
    }

    /// The measure that `key` names.
    pub fn from_key(key: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|measure| measure.key() == key)
    }

    /// Whether a column of this measure can be written in `unit`.
    pub fn accepts(self, unit: MeasureUnit) -> bool {
        self.units().contains(&unit)
    }

    /// The units that a column of this measure can be written in.
    pub fn units(self) -> &'static [MeasureUnit] {
        use MeasureUnit as U;
        match self {
            Measure::TemperatureMin | Measure::TemperatureMax | Measure::TemperatureMean | Measure::DewPoint => {
                &[U::Celsius, U::Fahrenheit, U::Kelvin, U::TenthCelsius]
            }
            Measure::Precipitation | Measure::SnowWater | Measure::ReferenceEvaporation => {
                &[U::Millimetre, U::Inch, U::Centimetre, U::TenthMillimetre]
            }
            Measure::RelativeHumidityMean | Measure::RelativeHumidityMin | Measure::RelativeHumidityMax => {
                &[U::Percent, U::Share]
            }
            Measure::VapourPressure => &[U::Kilopascal, U::Hectopascal],
            Measure::Wind => &[U::MPerS, U::KmPerHour, U::MilesPerHour, U::Knots, U::KmPerDay],
            Measure::Solar => &[U::MjPerM2, U::WattPerM2, U::KilowattHourPerM2, U::Langley],
            Measure::Sunshine => &[U::Hours],
            Measure::Flow | Measure::ComputedInflow | Measure::Diversion => {
                &[U::M3PerS, U::LitresPerS, U::Ft3PerS, U::AcreFeetPerDay, U::M3PerDay, U::Hm3PerDay]
            }
            Measure::Storage => &[U::Hm3, U::M3, U::AcreFeet],
        }
    }

    /// The lowest and highest value, in the measure's own unit, that a day on Earth can have in settled country.
    ///
    /// Common practice, no source: wide enough for every record value known to the writers, narrow enough for typing
    /// mistakes. A computed inflow has no bounds, since the noise of a stage reading goes both ways.
    pub fn bounds(self) -> (f64, f64) {
        match self {
            Measure::TemperatureMin | Measure::TemperatureMax | Measure::TemperatureMean => (-70.0, 57.0),
            Measure::DewPoint => (-80.0, 40.0),
            Measure::Precipitation => (0.0, 2_000.0),
            Measure::SnowWater => (0.0, 15_000.0),
            Measure::RelativeHumidityMean | Measure::RelativeHumidityMin | Measure::RelativeHumidityMax => (0.0, 100.0),
            Measure::VapourPressure => (0.0, 6.0),
            Measure::Wind => (0.0, 75.0),
            Measure::Solar => (0.0, 45.0),
            Measure::Sunshine => (0.0, 24.0),
            Measure::ReferenceEvaporation => (0.0, 25.0),
            Measure::Flow | Measure::Diversion | Measure::Storage => (0.0, f64::INFINITY),
            Measure::ComputedInflow => (f64::NEG_INFINITY, f64::INFINITY),
        }
    }

    /// Whether it is an air temperature of the day.
    pub fn is_temperature(self) -> bool {
        matches!(self, Measure::TemperatureMin | Measure::TemperatureMax | Measure::TemperatureMean)
    }

    /// Whether it is a relative humidity.
    pub fn is_humidity(self) -> bool {
        matches!(self, Measure::RelativeHumidityMean | Measure::RelativeHumidityMin | Measure::RelativeHumidityMax)
    }

    /// What becomes of gaps unless the place says otherwise: what changes slowly is bridged for up to five days; rain
    /// and snow are never invented; what is only compared with (river, snow, storage, canals) keeps its gaps.
    pub fn default_gap_rule(self) -> GapRule {
        match self {
            Measure::Precipitation => GapRule { how: GapFill::Refuse, longest_days: 0 },
            Measure::SnowWater | Measure::Flow | Measure::ComputedInflow | Measure::Storage | Measure::Diversion => {
                GapRule { how: GapFill::Keep, longest_days: 0 }
            }
            _ => GapRule { how: GapFill::Linear, longest_days: 5 },
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_measure_is_found_by_its_key_and_takes_its_own_unit() {
        for measure in Measure::ALL {
            assert_eq!(Measure::from_key(measure.key()), Some(measure));
            assert!(measure.units().iter().all(|unit| measure.accepts(*unit)));
        }
        assert_eq!(Measure::from_key("tmax"), None);
        assert!(!Measure::Precipitation.accepts(MeasureUnit::Celsius));
    }
}
