//! The hands of a board: plain data, as a board file has them.
//!
//! Nothing here reads a device. Whoever does finds in each value all that it needs: where the hand hangs, what it turns
//! or presses, and how its raw readings are to be taken. Pins are numbers of lines on [`BoardFile::gpio_chip`].
//!
//! [`BoardFile::gpio_chip`]: super::BoardFile::gpio_chip

use super::pins::Pin;
use super::screens::SpiAddress;
use crate::water::dials::Dial;

/// Something that people touch.
#[derive(Clone, Debug, PartialEq)]
pub enum HandPart {
    /// A device that the kernel already decodes: an encoder or buttons through an overlay, a keyboard, a mouse wheel.
    InputDevice(InputDevicePart),
    /// A touchscreen.
    Touchscreen(TouchscreenPart),
    /// A rotary encoder on pins, for boards without an overlay.
    Encoder(EncoderPart),
    /// A button on a pin.
    Button(ButtonPart),
    /// Potentiometers on a converter.
    Converter(ConverterPart),
}

/// What a turn turns.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum Turns {
    /// Whatever is chosen on the screen.
    #[default]
    Chosen,
    /// One dial, always.
    Dial(Dial),
}

/// A device below `/dev/input`.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct InputDevicePart {
    /// Its name as the kernel gives it (`EVIOCGNAME`); a device counts whose name holds this text.
    pub name: String,
    /// What its relative axes turn.
    pub turns: Turns,
    /// Whether a turn to the right counts down.
    pub reversed: bool,
    /// How much its axis counts from one detent to the next, 1 to 4.
    pub counts_per_detent: u8,
}

/// A touchscreen below `/dev/input`.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct TouchscreenPart {
    /// Its name as the kernel gives it; a device counts whose name holds this text.
    pub name: String,
    /// Which of [`BoardFile::screens`](super::BoardFile::screens) it lies on, from 0.
    pub screen: usize,
    /// Whether its x axis runs down the unturned glass.
    pub axes_swapped: bool,
    /// Raw values at the edges of the unturned glass; those that the kernel states where the file gives none.
    pub calibration: Option<TouchCalibration>,
}

/// Raw values of a touchscreen at the edges of the unturned glass. A first value above the second means that the axis runs
/// the other way. With [`TouchscreenPart::axes_swapped`], `left` and `right` are values of the y axis.
///
/// A finger at raw `r` is `(r - left) / (right - left)` of the width from the left edge; the same down the height. The
/// picture's rotation ([`PanelPart::turned`](super::PanelPart::turned)) comes after that.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct TouchCalibration {
    /// At the left edge.
    pub left: i32,
    /// At the right edge.
    pub right: i32,
    /// At the top edge.
    pub top: i32,
    /// At the bottom edge.
    pub bottom: i32,
}

impl TouchCalibration {
    /// Where on the unturned glass of `width` × `height` pixels raw values lie; beyond the edges where they do. The caller
    /// has put swapped axes in order. `None` where the calibration has no width or no height.
    pub fn pixel(self, across: i32, down: i32, width: u16, height: u16) -> Option<(i32, i32)> {
        let place = |raw: i32, first: i32, last: i32, length: u16| {
            let span = i64::from(last) - i64::from(first);
            if span == 0 {
                return None;
            }
            let along = (i64::from(raw) - i64::from(first)).checked_mul(i64::from(length))?;
            // Rounded down along the glass, whichever way the raw numbers run.
            i32::try_from((along * span.signum()).div_euclid(span.abs())).ok()
        };
        Some((place(across, self.left, self.right, width)?, place(down, self.top, self.bottom, height)?))
    }
}

/// A rotary encoder with two contacts that close to ground or to 3.3 V.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct EncoderPart {
    /// Contact A: it leads when the knob turns right.
    pub a_pin: Pin,
    /// Contact B.
    pub b_pin: Pin,
    /// The button under its shaft.
    pub button_pin: Option<Pin>,
    /// What it turns.
    pub turns: Turns,
    /// Changes of either contact from one detent to the next: 1, 2 or 4.
    pub edges_per_detent: u8,
    /// Whether a turn to the right counts down.
    pub reversed: bool,
    /// How the pins rest.
    pub pull: Pull,
    /// How long a contact may bounce, ms.
    pub bounce_ms: u16,
}

/// How an open contact rests.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum Pull {
    /// The board pulls it up; the contact closes to ground, so that low is pressed.
    #[default]
    Up,
    /// The board pulls it down; the contact closes to 3.3 V, so that high is pressed.
    Down,
    /// A resistor outside pulls it up; low is pressed.
    OutsideUp,
    /// A resistor outside pulls it down; high is pressed.
    OutsideDown,
}

impl Pull {
    /// Whether a low pin means a closed contact.
    pub const fn closed_is_low(self) -> bool {
        matches!(self, Self::Up | Self::OutsideUp)
    }
}

/// A button on a pin.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct ButtonPart {
    /// The pin.
    pub pin: Pin,
    /// What it does.
    pub does: ButtonDoes,
    /// How the pin rests.
    pub pull: Pull,
    /// How long the contact may bounce, ms.
    pub bounce_ms: u16,
}

/// What a button does.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum ButtonDoes {
    /// What the encoder's button does: short and long presses.
    #[default]
    Press,
    /// The next view.
    View,
    /// The other language.
    Language,
    /// Plays the year day by day, and stops.
    Play,
    /// Help.
    Help,
    /// One step to the right, as a detent of the encoder.
    More,
    /// One step to the left.
    Less,
    /// One step back, as Escape.
    Back,
}

impl ButtonDoes {
    /// All with their names in a board file.
    pub const ALL: [(&'static str, Self); 8] = [
        ("press", Self::Press),
        ("view", Self::View),
        ("language", Self::Language),
        ("play", Self::Play),
        ("help", Self::Help),
        ("more", Self::More),
        ("less", Self::Less),
        ("back", Self::Back),
    ];
}

/// An analogue-to-digital converter with potentiometers on it.
#[derive(Clone, Debug, PartialEq)]
pub struct ConverterPart {
    /// The chip and where it hangs.
    pub chip: ConverterChip,
    /// How often each potentiometer is read, times a second.
    pub reads_per_s: u16,
    /// Its potentiometers, each on an input of its own.
    pub inputs: Vec<DialInput>,
}

/// A converter chip and where it hangs.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum ConverterChip {
    /// Four inputs, 16 bits, on I²C; potentiometers lie between ground and 3.3 V.
    Ads1115 {
        /// Number of the bus: 1 is `/dev/i2c-1`.
        bus: u8,
        /// Its address: 0x48 to 0x4b.
        address: u8,
    },
    /// Eight inputs, 10 bits, on SPI.
    Mcp3008 {
        /// The bus and the chip-select line.
        at: SpiAddress,
        /// Clock of the bus, Hz.
        speed_hz: u32,
    },
}

impl ConverterChip {
    /// How many inputs it has.
    pub const fn inputs(self) -> u8 {
        match self {
            Self::Ads1115 { .. } => 4,
            Self::Mcp3008 { .. } => 8,
        }
    }
}

/// A potentiometer: where it stands is where the dial stands.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DialInput {
    /// The input of the chip, from 0.
    pub input: u8,
    /// The dial that it turns.
    pub dial: Dial,
    /// Whether a turn to the right makes the dial's value smaller.
    pub reversed: bool,
    /// Share of the supply, 0 to 1, at and below which the potentiometer is at its left end.
    pub low_end_share: f64,
    /// Share of the supply at and above which it is at its right end.
    pub high_end_share: f64,
    /// Share of the whole turn that a reading must move before it counts, so that noise at a step's edge changes nothing.
    pub hysteresis_share: f64,
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_touch_lands_where_the_finger_is() {
        let mirrored = TouchCalibration { left: 3900, right: 100, top: 200, bottom: 3800 };
        assert_eq!(mirrored.pixel(3900, 200, 240, 320), Some((0, 0)));
        assert_eq!(mirrored.pixel(2000, 2000, 240, 320), Some((120, 160)));
        assert_eq!(mirrored.pixel(4000, 100, 240, 320), Some((-7, -9)));
        let flat = TouchCalibration { left: 7, right: 7, top: 0, bottom: 1 };
        assert_eq!(flat.pixel(7, 0, 240, 320), None);
        let wide = TouchCalibration { left: i32::MIN, right: i32::MIN + 1, top: 0, bottom: 1 };
        assert_eq!(wide.pixel(i32::MAX, 0, u16::MAX, 320), None);
    }
}
