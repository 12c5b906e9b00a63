//! Every wire of a board file: which pin of a part goes to which pin of the board.

use super::chips::Processor;
use super::hands::{ConverterChip, HandPart, Pull};
use super::pins::Pin;
use super::screens::{Backlight, ScreenPart, SpiAddress};
use super::{BoardFile, DialInput};
use crate::water::dials::Dial;

/// A pin of a part.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum WireEnd {
    /// Its supply.
    Supply,
    /// Its ground.
    Ground,
    /// Clock of SPI.
    Clock,
    /// Data of SPI to the part.
    DataIn,
    /// Data of SPI from the part.
    DataOut,
    /// Chip select of SPI.
    ChipSelect,
    /// Tells commands from data.
    DataCommand,
    /// Resets it.
    Reset,
    /// Its backlight.
    Backlight,
    /// Data of I²C.
    SerialData,
    /// Clock of I²C.
    SerialClock,
    /// Chooses its address on I²C.
    AddressChoice,
    /// Contact A of an encoder.
    ContactA,
    /// Contact B of an encoder.
    ContactB,
    /// One side of a button under a shaft.
    ShaftButton,
    /// One side of a button.
    Contact,
    /// The other side of every contact.
    Common,
    /// An input of a converter.
    Input(u8),
    /// The end pin of all potentiometers that is the left stop.
    LeftEnds,
    /// The end pin of all potentiometers that is the right stop.
    RightEnds,
}

/// Where a wire goes.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum WireTo {
    /// A pin of the board, and its place on the header where that is known.
    Pin(Pin, Option<u8>),
    /// A line of a bus whose pin only the maker of the board knows.
    BusLine(String),
    /// 3.3 V.
    Supply,
    /// Ground.
    Ground,
    /// The middle pin of the potentiometer of a dial.
    Wiper(Dial),
}

/// A part that has wires.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum WiredPart {
    /// A screen, from 0.
    Screen(usize),
    /// A hand, from 0.
    Hand(usize),
}

/// The wires of one part.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Wiring {
    /// The part.
    pub part: WiredPart,
    /// Its wires; none where it is plugged in, or the kernel's own settings say how it is wired.
    pub wires: Vec<(WireEnd, WireTo)>,
}

/// Places on the 40-pin header of GPIO 0 to 27 (from memory).
const HEADER: [u8; 28] =
    [27, 28, 3, 5, 7, 29, 31, 26, 24, 21, 19, 23, 32, 33, 8, 10, 36, 11, 12, 35, 38, 40, 15, 16, 18, 22, 37, 13];

impl BoardFile {
    /// The wires of every part, screens first.
    pub fn wiring(&self) -> Vec<Wiring> {
        let screens =
            self.screens.iter().enumerate().map(|(index, part)| (WiredPart::Screen(index), self.of_screen(part)));
        let hands = self.hands.iter().enumerate().map(|(index, part)| (WiredPart::Hand(index), self.of_hand(part)));
        screens.chain(hands).map(|(part, wires)| Wiring { part, wires }).collect()
    }

    /// Places of 3.3 V on the header, where it is known, and of ground (from memory).
    pub fn supply_places(&self) -> Option<(&'static [u8], &'static [u8])> {
        (self.processor == Processor::Bcm2835).then_some((&[1, 17], &[6, 9, 14, 20, 25, 30, 34, 39]))
    }

    fn pin(&self, pin: Pin) -> WireTo {
        let known = self.processor == Processor::Bcm2835;
        WireTo::Pin(pin, HEADER.get(usize::from(pin.0)).copied().filter(|_| known))
    }

    fn bus_line(&self, pins: &[(u16, &str)], name: &str, bus: String) -> WireTo {
        match pins.iter().find(|(_, line)| *line == name) {
            Some((pin, _)) => self.pin(Pin(*pin)),
            None => WireTo::BusLine(format!("{bus} {name}")),
        }
    }

    fn spi(&self, at: SpiAddress, answers: bool) -> Vec<(WireEnd, WireTo)> {
        let pins = self.processor.spi_pins(at.bus);
        let line = |name| self.bus_line(pins, name, format!("spi{}", at.bus));
        let select = match self.processor.chip_select_pin(at.bus, at.chip_select) {
            Some(pin) => self.pin(Pin(pin)),
            None => WireTo::BusLine(format!("spi{} CE{}", at.bus, at.chip_select)),
        };
        let mut wires = vec![
            (WireEnd::Supply, WireTo::Supply),
            (WireEnd::Ground, WireTo::Ground),
            (WireEnd::Clock, line("SCLK")),
            (WireEnd::DataIn, line("MOSI")),
        ];
        if answers {
            wires.push((WireEnd::DataOut, line("MISO")));
        }
        wires.push((WireEnd::ChipSelect, select));
        wires
    }

    fn of_screen(&self, part: &ScreenPart) -> Vec<(WireEnd, WireTo)> {
        let ScreenPart::Panel(panel) = part else { return Vec::new() };
        let mut wires = self.spi(panel.at, false);
        wires.push((WireEnd::DataCommand, self.pin(panel.data_command_pin)));
        wires.extend(panel.reset_pin.map(|pin| (WireEnd::Reset, self.pin(pin))));
        if let Some(Backlight::Pin { pin, .. }) = &panel.backlight {
            wires.push((WireEnd::Backlight, self.pin(*pin)));
        }
        wires
    }

    fn of_hand(&self, part: &HandPart) -> Vec<(WireEnd, WireTo)> {
        let common = |pull: Pull| (WireEnd::Common, if pull.closed_is_low() { WireTo::Ground } else { WireTo::Supply });
        match part {
            HandPart::InputDevice(_) | HandPart::Touchscreen(_) => Vec::new(),
            HandPart::Encoder(part) => {
                let mut wires =
                    vec![(WireEnd::ContactA, self.pin(part.a_pin)), (WireEnd::ContactB, self.pin(part.b_pin))];
                wires.extend(part.button_pin.map(|pin| (WireEnd::ShaftButton, self.pin(pin))));
                wires.push(common(part.pull));
                wires
            }
            HandPart::Button(part) => vec![(WireEnd::Contact, self.pin(part.pin)), common(part.pull)],
            HandPart::Converter(part) => {
                let mut wires = match part.chip {
                    ConverterChip::Mcp3008 { at, .. } => self.spi(at, true),
                    ConverterChip::Ads1115 { bus, address } => self.i2c(bus, address),
                };
                let input = |input: &DialInput| (WireEnd::Input(input.input), WireTo::Wiper(input.dial));
                wires.extend(part.inputs.iter().map(input));
                wires.extend([(WireEnd::LeftEnds, WireTo::Ground), (WireEnd::RightEnds, WireTo::Supply)]);
                wires
            }
        }
    }

    fn i2c(&self, bus: u8, address: u8) -> Vec<(WireEnd, WireTo)> {
        let pins = self.processor.i2c_pins(bus);
        let line = |name| self.bus_line(pins, name, format!("i2c{bus}"));
        // (Texas Instruments, ADS111x data sheet, table of addresses, from memory)
        let choice = match address {
            0x48 => WireTo::Ground,
            0x49 => WireTo::Supply,
            0x4a => line("SDA"),
            _ => line("SCL"),
        };
        vec![
            (WireEnd::Supply, WireTo::Supply),
            (WireEnd::Ground, WireTo::Ground),
            (WireEnd::SerialData, line("SDA")),
            (WireEnd::SerialClock, line("SCL")),
            (WireEnd::AddressChoice, choice),
        ]
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_place_on_the_header_is_a_pin_once() {
        let mut places = HEADER.to_vec();
        places.extend([1, 17, 2, 4, 6, 9, 14, 20, 25, 30, 34, 39]);
        places.sort_unstable();
        assert_eq!(places, (1..=40).collect::<Vec<u8>>());
    }
}
