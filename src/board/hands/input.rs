//! Events of the kernel's input devices as turns, presses and keys: encoders, wheels, buttons and keyboards.
//!
//! A knob that the kernel decodes speaks in one of two ways: by relative steps, or by a place on a circle or scale, whose
//! differences are the steps. On a keyboard every key is a key; on anything else Enter, the space bar and keys without a
//! meaning are the button of a knob, with short and long presses. Letters are known by their place on a keyboard of the
//! United States.
//!
//! When the kernel had to drop events it says so. What came before its next report is not believed, and the device is
//! asked how it stands: keys that came up meanwhile are up and pressed nothing, and a knob with places tells how far it
//! was turned. Relative steps that were dropped are lost.

use std::time::Duration;

use super::button::STUCK_AFTER;
use super::key_codes::*;
use super::{HandEvent, press};
use crate::board::file::{InputDevicePart, Turns};

/// An event as the kernel gives it.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct RawInput {
    /// When it happened, by the device's clock.
    pub at: Duration,
    /// Its kind: 1 is a key, 2 a relative axis, 3 an absolute one, 0 a synchronisation.
    pub kind: u16,
    /// Which key or axis.
    pub code: u16,
    /// The step, the place, or 1 for down, 0 for up and 2 for a repeat.
    pub value: i32,
}

/// What a device can do, as far as it matters here.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub struct Abilities {
    /// It has letters.
    pub is_keyboard: bool,
    /// It moves in two directions, so that x is no knob.
    pub is_mouse: bool,
    /// Least and most place of its x axis, where it has an absolute one.
    pub places: Option<(i32, i32)>,
}

/// What the decoder asks of whoever reads the device.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
#[must_use]
pub enum Ask {
    /// Nothing.
    Nothing,
    /// How the device stands now: events were dropped.
    State,
}

/// The decoder of one input device.
#[derive(Clone, Debug)]
pub struct InputDecoder {
    turns: Turns,
    reversed: bool,
    counts_per_detent: i32,
    abilities: Abilities,
    /// Counts since the last whole detent.
    rest: i32,
    place: Option<i32>,
    /// Keys that are down; those that were before anybody looked have no time.
    down: Vec<(u16, Option<Duration>)>,
    is_dropping: bool,
}

/// No hand has more fingers; a device that says otherwise is not believed.
const MOST_DOWN: usize = 16;

impl InputDecoder {
    /// The decoder of a device of a board file that was just opened: where its x axis is, and which keys are down.
    pub fn new(part: &InputDevicePart, abilities: Abilities, place: Option<i32>, down: &[u16]) -> Self {
        Self {
            turns: part.turns,
            reversed: part.reversed,
            counts_per_detent: i32::from(part.counts_per_detent.max(1)),
            abilities,
            rest: 0,
            place,
            down: down.iter().take(MOST_DOWN).map(|code| (*code, None)).collect(),
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
            (RELATIVE, REL_X) if self.abilities.is_mouse => {}
            (RELATIVE, REL_X | REL_DIAL | REL_WHEEL | REL_HORIZONTAL_WHEEL) => self.turn(raw.value, out),
            (ABSOLUTE, ABS_X) if self.abilities.places.is_some() => self.turn_to(raw.value, out),
            (KEY, code) => self.key(code, raw.value, raw.at, out),
            _ => {}
        }
        Ask::Nothing
    }

    /// Takes how the device stands, after it was asked.
    pub fn stands(&mut self, place: Option<i32>, down: &[u16], out: &mut Vec<HandEvent>) {
        self.down.retain(|(code, _)| down.contains(code));
        for code in down.iter().take(MOST_DOWN) {
            if !self.down.iter().any(|(other, _)| other == code) {
                self.down.push((*code, None));
            }
        }
        if let Some(place) = place.filter(|_| self.abilities.places.is_some()) {
            self.turn_to(place, out);
        }
    }

    /// When the longest held button counts as stuck, by the device's clock. Keys of a keyboard never do: something heavy
    /// may lie on one, and the others still work.
    pub fn stuck_at(&self) -> Option<Duration> {
        if self.abilities.is_keyboard {
            return None;
        }
        self.down.iter().filter_map(|(_, since)| since.map(|since| since.saturating_add(STUCK_AFTER))).min()
    }

    fn key(&mut self, code: u16, value: i32, at: Duration, out: &mut Vec<HandEvent>) {
        if code == LEFT_SHIFT || code == RIGHT_SHIFT {
            self.note(code, value, at);
            return;
        }
        let shift = self.down.iter().any(|(code, _)| [LEFT_SHIFT, RIGHT_SHIFT].contains(code));
        let key = key_of(code, shift);
        if !self.abilities.is_keyboard && is_button(code) {
            if let Some(held) = self.note(code, value, at).filter(|held| *held < STUCK_AFTER) {
                out.push(press(held));
            }
            return;
        }
        let again = value == 2;
        self.note(code, value, at);
        if let Some(key) = key.filter(|key| value == 1 || (again && repeats(*key))) {
            out.push(HandEvent::Key(key));
        }
    }

    /// Notes a key as down or up; gives how long it was down, where that is known.
    fn note(&mut self, code: u16, value: i32, at: Duration) -> Option<Duration> {
        let before = self.down.iter().position(|(other, _)| *other == code);
        match (value, before) {
            (0, Some(index)) => {
                let (_, since) = self.down.swap_remove(index);
                since.map(|since| at.saturating_sub(since))
            }
            (1, None) if self.down.len() < MOST_DOWN => {
                self.down.push((code, Some(at)));
                None
            }
            _ => None,
        }
    }

    /// A knob with places is at one.
    fn turn_to(&mut self, place: i32, out: &mut Vec<HandEvent>) {
        let Some(before) = self.place.replace(place) else { return };
        let Some((least, most)) = self.abilities.places else { return };
        let mut moved = i64::from(place) - i64::from(before);
        let around = i64::from(most) - i64::from(least) + 1;
        // On a circle the shorter way is the one it went.
        if moved.abs() * 2 > around {
            moved -= around * moved.signum();
        }
        self.turn(i32::try_from(moved).unwrap_or(0), out);
    }

    fn turn(&mut self, counts: i32, out: &mut Vec<HandEvent>) {
        self.rest = self.rest.saturating_add(counts);
        let detents = self.rest / self.counts_per_detent;
        self.rest -= detents * self.counts_per_detent;
        let detents = if self.reversed { detents.saturating_neg() } else { detents };
        if detents != 0 {
            out.push(turned(self.turns, detents));
        }
    }
}

/// So many detents of a hand that turns that.
pub(super) const fn turned(turns: Turns, detents: i32) -> HandEvent {
    match turns {
        Turns::Chosen => HandEvent::Turn(detents),
        Turns::Dial(dial) => HandEvent::TurnDial { dial, detents },
    }
}
