//! Who uses which pin, so that no two do.

use std::cell::RefCell;

use super::chips::Processor;
use crate::place::problem::{Location, Problem};
use crate::place::section::{Limits, Number, Section};
use crate::place::unit_suffix::PLAIN;

/// A line of the board's GPIO chip, by its number there: the GPIO number, not the place on the header.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct Pin(pub u16);

/// Every use of a pin and of a place on a bus so far.
pub(super) struct Uses {
    processor: Processor,
    pins: RefCell<Vec<Use>>,
    places: RefCell<Vec<(Place, Location)>>,
}

struct Use {
    pin: u16,
    /// What the user reads: a key of the file, or the name of the bus's line.
    what: String,
    at: Location,
    /// Whether it is a line of a bus, which several parts share.
    bus: bool,
}

/// A place that only one part can have.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Place {
    /// Bus and chip-select line.
    Spi(u8, u8),
    /// Bus and address.
    I2c(u8, u8),
}

impl Uses {
    pub fn new(processor: Processor) -> Self {
        Self { processor, pins: RefCell::default(), places: RefCell::default() }
    }

    /// A pin that the file may name under `key`.
    pub fn pin(&self, section: &Section<'_>, key: &'static str) -> Option<Pin> {
        let number = section.number(key, PLAIN, self.limits())?;
        self.number_as_pin(section, key, &number)
    }

    /// A pin that the file must name.
    pub fn need_pin(&self, section: &Section<'_>, key: &'static str) -> Option<Pin> {
        let number = section.need_number(key, PLAIN, self.limits());
        self.number_as_pin(section, key, &number)
    }

    fn limits(&self) -> Limits {
        Limits(0.0, f64::from(self.processor.last_pin()))
    }

    fn number_as_pin(&self, section: &Section<'_>, key: &'static str, number: &Number) -> Option<Pin> {
        let pin = whole(section, key, number)? as u16;
        self.take(section, pin, key, number.at.clone(), false);
        Some(Pin(pin))
    }

    /// Takes the lines of an SPI bus, and its chip-select line for one part alone.
    pub fn take_spi(&self, section: &Section<'_>, bus: u8, line: u8, at: &Location) {
        for (pin, name) in self.processor.spi_pins(bus) {
            self.take(section, *pin, &format!("spi{bus} {name}"), at.clone(), true);
        }
        if let Some(pin) = self.processor.chip_select_pin(bus, line) {
            self.take(section, pin, &format!("spi{bus} CE{line}"), at.clone(), true);
        }
        self.take_place(section, Place::Spi(bus, line), format!("spi{bus}, chip_select {line}"), at);
    }

    /// Takes the lines of an I²C bus, and an address on it for one part alone.
    pub fn take_i2c(&self, section: &Section<'_>, bus: u8, address: u8, at: &Location) {
        for (pin, name) in self.processor.i2c_pins(bus) {
            self.take(section, *pin, &format!("i2c{bus} {name}"), at.clone(), true);
        }
        self.take_place(section, Place::I2c(bus, address), format!("i2c{bus}, {address:#x}"), at);
    }

    /// Takes pins that the file says are taken by something else.
    pub fn reserve(&self, section: &Section<'_>, key: &'static str) -> Vec<Pin> {
        let mut reserved = Vec::new();
        for number in section.numbers(key, PLAIN, self.limits()).unwrap_or_default() {
            reserved.extend(self.number_as_pin(section, key, &number));
        }
        reserved
    }

    fn take(&self, section: &Section<'_>, pin: u16, what: &str, at: Location, bus: bool) {
        let mut pins = self.pins.borrow_mut();
        let before = pins.iter().find(|other| other.pin == pin && !(other.bus && bus));
        if let Some(other) = before {
            let message = if other.bus || bus { "problem-board-pin-of-bus" } else { "problem-board-pin-twice" };
            // A line of a bus cannot be moved: point at the pin that can.
            let (key, free_at, taken, line) = match bus {
                true => (other.what.as_str(), &other.at, what, at.line),
                false => (what, &at, other.what.as_str(), other.at.line),
            };
            let told = Problem::error(free_at.clone(), message).with("pin", usize::from(pin)).with("key", key);
            section.sheet.tell(told.with("other", taken).with("line", line));
        }
        pins.push(Use { pin, what: what.to_owned(), at, bus });
    }

    fn take_place(&self, section: &Section<'_>, place: Place, shown: String, at: &Location) {
        let mut places = self.places.borrow_mut();
        if let Some((_, before)) = places.iter().find(|(other, _)| *other == place) {
            let told = Problem::error(at.clone(), "problem-board-place-twice").with("place", shown);
            section.sheet.tell(told.with("line", before.line));
        }
        places.push((place, at.clone()));
    }
}

/// A number that must be whole; `None` where it is not, or was wrong already.
pub(super) fn whole(section: &Section<'_>, key: &str, number: &Number) -> Option<f64> {
    if number.value.is_nan() {
        return None;
    }
    if number.value % 1.0 != 0.0 {
        let told = Problem::error(number.at.clone(), "problem-not-whole").with("key", key);
        section.sheet.tell(told.with("value", number.value));
        return None;
    }
    Some(number.value)
}
