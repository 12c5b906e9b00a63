//! Events of a touchscreen as a pointer in pixels of the picture.
//!
//! One finger is followed: the first. Raw values go through the calibration to the unturned glass, and from there, as the
//! picture is turned, to the picture's own pixels.

use super::input::{Ask, RawInput};
use super::key_codes::*;
use super::{HandEvent, PointerPhase};
use crate::board::file::{TouchCalibration, TouchscreenPart};
use crate::board::placing::Placing;

/// What a touchscreen can do.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct TouchAbilities {
    /// It tells one finger by `ABS_X`, `ABS_Y` and `BTN_TOUCH`; one that does not tells several by slots only.
    pub one_finger: bool,
    /// Least and most of its x axis and of its y axis, as the kernel states them.
    pub ranges: [(i32, i32); 2],
}

/// The decoder of one touchscreen.
#[derive(Clone, Debug)]
pub struct TouchDecoder {
    one_finger: bool,
    axes_swapped: bool,
    calibration: TouchCalibration,
    placing: Placing,
    /// Raw x and y of the latest report.
    raw: [Option<i32>; 2],
    is_down: bool,
    /// The slot that is spoken of, and the one that is followed.
    slot: i32,
    followed: i32,
    /// Where the pointer was last said to be, while it is down.
    told: Option<(i32, i32)>,
    is_dropping: bool,
}

impl TouchDecoder {
    /// The decoder of a touchscreen that lies on glass with that picture.
    pub fn new(part: &TouchscreenPart, abilities: TouchAbilities, placing: Placing) -> Self {
        let [mut across, mut down] = abilities.ranges;
        if part.axes_swapped {
            std::mem::swap(&mut across, &mut down);
        }
        // The greatest value is the last pixel, not the first beyond it.
        let stated = TouchCalibration {
            left: across.0,
            right: across.1.saturating_add(1),
            top: down.0,
            bottom: down.1.saturating_add(1),
        };
        Self {
            one_finger: abilities.one_finger,
            axes_swapped: part.axes_swapped,
            calibration: part.calibration.unwrap_or(stated),
            placing,
            raw: [None; 2],
            is_down: false,
            slot: 0,
            followed: 0,
            told: None,
            is_dropping: false,
        }
    }

    /// Takes an event; what it means is added to `out`.
    pub fn event(&mut self, raw: RawInput, out: &mut Vec<HandEvent>) -> Ask {
        match (raw.kind, raw.code) {
            (SYNCHRONISATION, DROPPED) => self.is_dropping = true,
            (SYNCHRONISATION, REPORT) if self.is_dropping => {
                self.is_dropping = false;
                return Ask::State;
            }
            _ if self.is_dropping => {}
            (SYNCHRONISATION, REPORT) => self.report(out),
            (KEY, TOUCH) if self.one_finger => self.is_down = raw.value != 0,
            (ABSOLUTE, code) => self.axis(code, raw.value),
            _ => {}
        }
        Ask::Nothing
    }

    /// Takes how the device stands, after it was asked: whether a finger is down and where. One that tells slots only says
    /// neither, and the finger counts as lifted.
    pub fn stands(&mut self, is_down: bool, raw: [Option<i32>; 2], out: &mut Vec<HandEvent>) {
        self.is_down = is_down && self.one_finger;
        if self.one_finger {
            self.raw = raw;
        }
        self.report(out);
    }

    /// The device is gone: a finger on it counts as lifted.
    pub fn lost(&mut self, out: &mut Vec<HandEvent>) {
        self.is_down = false;
        self.report(out);
    }

    fn axis(&mut self, code: u16, value: i32) {
        match (code, self.one_finger) {
            (ABS_X, true) => self.raw[0] = Some(value),
            (ABS_Y, true) => self.raw[1] = Some(value),
            (ABS_SLOT, false) => self.slot = value,
            (ABS_TRACKING, false) if value >= 0 && !self.is_down => {
                (self.is_down, self.followed, self.raw) = (true, self.slot, [None; 2]);
            }
            (ABS_TRACKING, false) if value < 0 && self.slot == self.followed => self.is_down = false,
            (ABS_MANY_X, false) if self.slot == self.followed => self.raw[0] = Some(value),
            (ABS_MANY_Y, false) if self.slot == self.followed => self.raw[1] = Some(value),
            _ => {}
        }
    }

    fn report(&mut self, out: &mut Vec<HandEvent>) {
        let at = self.pixel();
        let (phase, (x, y)) = match (self.is_down, self.told, at) {
            (true, None, Some(at)) => (PointerPhase::Down, at),
            (true, Some(before), Some(at)) if before != at => (PointerPhase::Move, at),
            (false, Some(before), _) => (PointerPhase::Up, before),
            _ => return,
        };
        self.told = self.is_down.then_some((x, y));
        out.push(HandEvent::Pointer { phase, x, y, on: self.placing.frame });
    }

    /// The pixel of the picture under the finger; beyond its edges where the finger is.
    fn pixel(&self) -> Option<(i32, i32)> {
        let [Some(x), Some(y)] = self.raw else { return None };
        let (across, down) = if self.axes_swapped { (y, x) } else { (x, y) };
        let width = u16::try_from(self.placing.width).ok()?;
        let height = u16::try_from(self.placing.height).ok()?;
        let (x, y) = self.calibration.pixel(across, down, width, height)?;
        Some(self.placing.under(x, y))
    }
}
