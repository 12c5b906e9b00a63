//! Quantities in the unit that a person thinks in: acre-feet or hm³, cfs or m³/s, °F or °C.

use super::numbers::round_significant;
use super::say::{Value, Words};
use crate::water::units::{
    FAHRENHEIT_AT_FREEZING, FAHRENHEIT_PER_CELSIUS, KM_PER_MILE, LITRES_PER_M3, M_PER_FOOT, M2_PER_ACRE,
    M2_PER_HECTARE, M2_PER_KM2, M2_PER_SQUARE_MILE, M3_PER_ACRE_FOOT, M3_PER_HM3, M3_PER_MEGALITRE, M3S_PER_FT3S,
    MM_PER_INCH, MS_PER_MPH,
};

/// Under this many of the larger metric unit, the smaller one reads better: 50 L/s, not 0.05 m³/s.
const SMALLEST_IN_LARGE_UNIT: f64 = 0.1;

/// What is measured. Each says the unit in which its values come in.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Quantity {
    /// A temperature, in °C.
    Temperature,
    /// A difference of temperatures, in °C: times 1.8 in °F, and no 32.
    TemperatureChange,
    /// Water held in snow, in mm.
    SnowWater,
    /// Rain or precipitation, in mm.
    Rain,
    /// Water given to or used by a field, in mm.
    FieldWater,
    /// A volume of water, in hm³.
    StoredVolume,
    /// A flow, in m³/s.
    Flow,
    /// Farm land, in ha.
    Land,
    /// The area of a basin or a lake, in km².
    Area,
    /// A height, in m.
    Elevation,
    /// A distance along the valley, in km.
    Distance,
    /// Wind, in m/s.
    Speed,
}

/// A family of units.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum System {
    /// Metric units.
    Metric,
    /// US customary units.
    Us,
}

/// One unit, as it is written.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Unit {
    /// °C.
    Celsius,
    /// °F.
    Fahrenheit,
    /// °C of difference.
    CelsiusChange,
    /// °F of difference.
    FahrenheitChange,
    /// mm.
    Millimetres,
    /// inches.
    Inches,
    /// hm³.
    CubicHectometres,
    /// ML.
    Megalitres,
    /// m³.
    CubicMetres,
    /// acre-feet.
    AcreFeet,
    /// m³/s.
    CubicMetresPerSecond,
    /// L/s.
    LitresPerSecond,
    /// ft³/s.
    CubicFeetPerSecond,
    /// ha.
    Hectares,
    /// acres.
    Acres,
    /// km².
    SquareKilometres,
    /// square miles.
    SquareMiles,
    /// m.
    Metres,
    /// feet.
    Feet,
    /// km.
    Kilometres,
    /// miles.
    Miles,
    /// m/s.
    MetresPerSecond,
    /// miles per hour.
    MilesPerHour,
}

impl Quantity {
    /// The usual unit of this quantity in a system.
    pub fn unit(self, system: System) -> Unit {
        match (self, system) {
            (Quantity::Temperature, System::Metric) => Unit::Celsius,
            (Quantity::Temperature, System::Us) => Unit::Fahrenheit,
            (Quantity::TemperatureChange, System::Metric) => Unit::CelsiusChange,
            (Quantity::TemperatureChange, System::Us) => Unit::FahrenheitChange,
            (Quantity::SnowWater | Quantity::Rain | Quantity::FieldWater, System::Metric) => Unit::Millimetres,
            (Quantity::SnowWater | Quantity::Rain | Quantity::FieldWater, System::Us) => Unit::Inches,
            (Quantity::StoredVolume, System::Metric) => Unit::CubicHectometres,
            (Quantity::StoredVolume, System::Us) => Unit::AcreFeet,
            (Quantity::Flow, System::Metric) => Unit::CubicMetresPerSecond,
            (Quantity::Flow, System::Us) => Unit::CubicFeetPerSecond,
            (Quantity::Land, System::Metric) => Unit::Hectares,
            (Quantity::Land, System::Us) => Unit::Acres,
            (Quantity::Area, System::Metric) => Unit::SquareKilometres,
            (Quantity::Area, System::Us) => Unit::SquareMiles,
            (Quantity::Elevation, System::Metric) => Unit::Metres,
            (Quantity::Elevation, System::Us) => Unit::Feet,
            (Quantity::Distance, System::Metric) => Unit::Kilometres,
            (Quantity::Distance, System::Us) => Unit::Miles,
            (Quantity::Speed, System::Metric) => Unit::MetresPerSecond,
            (Quantity::Speed, System::Us) => Unit::MilesPerHour,
        }
    }
}

impl Unit {
    /// A value in the unit of its [`Quantity`] (°C, mm, hm³, m³/s, ha, km², m, km, m/s), in this unit.
    pub fn convert(self, value: f64) -> f64 {
        match self {
            Unit::Fahrenheit => value * FAHRENHEIT_PER_CELSIUS + FAHRENHEIT_AT_FREEZING,
            Unit::FahrenheitChange => value * FAHRENHEIT_PER_CELSIUS,
            Unit::Inches => value / MM_PER_INCH,
            Unit::Megalitres => value * M3_PER_HM3 / M3_PER_MEGALITRE,
            Unit::CubicMetres => value * M3_PER_HM3,
            Unit::AcreFeet => value * M3_PER_HM3 / M3_PER_ACRE_FOOT,
            Unit::LitresPerSecond => value * LITRES_PER_M3,
            Unit::CubicFeetPerSecond => value / M3S_PER_FT3S,
            Unit::Acres => value * M2_PER_HECTARE / M2_PER_ACRE,
            Unit::SquareMiles => value * M2_PER_KM2 / M2_PER_SQUARE_MILE,
            Unit::Feet => value / M_PER_FOOT,
            Unit::Miles => value / KM_PER_MILE,
            Unit::MilesPerHour => value / MS_PER_MPH,
            Unit::Celsius
            | Unit::CelsiusChange
            | Unit::Millimetres
            | Unit::CubicHectometres
            | Unit::CubicMetresPerSecond
            | Unit::Hectares
            | Unit::SquareKilometres
            | Unit::Metres
            | Unit::Kilometres
            | Unit::MetresPerSecond => value,
        }
    }

    /// The message that holds its symbol; its attribute `amount` takes `n`, `words` spells a count out and `name` is
    /// the plural name.
    pub fn id(self) -> &'static str {
        match self {
            Unit::Celsius | Unit::CelsiusChange => "unit-celsius",
            Unit::Fahrenheit | Unit::FahrenheitChange => "unit-fahrenheit",
            Unit::Millimetres => "unit-millimeters",
            Unit::Inches => "unit-inches",
            Unit::CubicHectometres => "unit-cubic-hectometers",
            Unit::Megalitres => "unit-megaliters",
            Unit::CubicMetres => "unit-cubic-meters",
            Unit::AcreFeet => "unit-acre-feet",
            Unit::CubicMetresPerSecond => "unit-cubic-meters-per-second",
            Unit::LitresPerSecond => "unit-liters-per-second",
            Unit::CubicFeetPerSecond => "unit-cubic-feet-per-second",
            Unit::Hectares => "unit-hectares",
            Unit::Acres => "unit-acres",
            Unit::SquareKilometres => "unit-square-kilometers",
            Unit::SquareMiles => "unit-square-miles",
            Unit::Metres => "unit-meters",
            Unit::Feet => "unit-feet",
            Unit::Kilometres => "unit-kilometers",
            Unit::Miles => "unit-miles",
            Unit::MetresPerSecond => "unit-meters-per-second",
            Unit::MilesPerHour => "unit-miles-per-hour",
        }
    }
}

impl Words {
    /// The system of units that people of this region use: US customary in the United States, metric elsewhere.
    pub fn system(&self) -> System {
        if self.region() == Some("US") { System::Us } else { System::Metric }
    }

    /// The usual unit of a quantity for this region (water is stored in ML in British English).
    pub fn unit_of(&self, quantity: Quantity, system: System) -> Unit {
        match (quantity.unit(system), self.region()) {
            (Unit::CubicHectometres, Some("GB")) => Unit::Megalitres,
            (unit, _) => unit,
        }
    }

    /// The symbol of the usual unit, such as `ac-ft`; for the head of a column.
    pub fn unit(&self, quantity: Quantity, system: System) -> String {
        self.say(self.unit_of(quantity, system).id(), &[])
    }

    /// The name of the usual unit in full, in the plural, such as "acre-feet".
    pub fn unit_name(&self, quantity: Quantity, system: System) -> String {
        self.say(&format!("{}.name", self.unit_of(quantity, system).id()), &[])
    }

    /// A quantity with its unit, rounded to that many significant digits.
    ///
    /// `value` is in the unit that [`Quantity`] names. Small metric flows are written in L/s and small volumes in m³;
    /// a column that needs one unit throughout uses [`Words::unit`] and [`Unit::convert`].
    pub fn quantity(&self, value: f64, quantity: Quantity, system: System, digits: u8) -> String {
        let unit = self.unit_of(quantity, system);
        let shown = unit.convert(value);
        let small = shown != 0.0 && shown.abs() < SMALLEST_IN_LARGE_UNIT;
        let unit = match unit {
            Unit::CubicMetresPerSecond if small => Unit::LitresPerSecond,
            Unit::CubicHectometres | Unit::Megalitres if small => Unit::CubicMetres,
            unit => unit,
        };
        self.amount(unit.convert(value), unit, digits)
    }

    /// A number that is already in `unit`, with its symbol.
    pub fn amount(&self, shown: f64, unit: Unit, digits: u8) -> String {
        self.with_unit(shown, unit, "amount", digits)
    }

    /// A number that is already in `unit`, with the unit spelled out: "1 acre-foot", "300 acre-feet".
    pub fn amount_in_words(&self, shown: f64, unit: Unit, digits: u8) -> String {
        self.with_unit(shown, unit, "words", digits)
    }

    fn with_unit(&self, shown: f64, unit: Unit, form: &str, digits: u8) -> String {
        // The plural follows what is written: 0.998 in two digits is "1 acre-foot".
        let (number, decimals) = round_significant(shown, digits);
        let text = self.style().plain(number, decimals).into();
        self.say(&format!("{}.{form}", unit.id()), &[("n", Value::Counted { number, text })])
    }
}
