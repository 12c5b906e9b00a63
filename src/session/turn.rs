//! Turning: dials, the ring, lists, cards.

use super::knob::{DAYS, LIST, STEPS, Turn, along, around};
use super::offer::Offer;
use super::ring::{Item, ring};
use super::state::{Act, Card, Focus, State, Undo};
use super::view::{Shade, Speed};
use crate::water::dials::{Dial, Dials};
use crate::words::System;

/// A pause of this length ends a turn of a dial, ms.
pub const TURN_ENDS_MS: u32 = 1500;

/// A potentiometer must leave its stop by more than this share of a step to count: half a step and a little, so that a
/// reading that trembles between two stops does not.
const LEAVES_STOP_SHARE: f64 = 0.6;

impl State {
    /// A turn of the one encoder.
    pub(super) fn turn(&mut self, turn: Turn, offer: &Offer) {
        if turn.detents == 0 {
            return;
        }
        if let Some(card) = self.shown.card {
            self.turn_card(card, turn, offer);
            return;
        }
        let item = match self.shown.focus {
            Focus::Ring(item) => {
                let ring = ring(offer, self.shown.view);
                let place = ring.iter().position(|other| *other == item).unwrap_or(0);
                let item = ring.get(around(place, ring.len(), turn.steps(LIST))).copied().unwrap_or(item);
                self.shown.focus = Focus::Ring(item);
                return;
            }
            Focus::In(item) => item,
        };
        match item {
            Item::Dial(dial) => self.turn_dial(dial, turn, offer),
            Item::View => self.step_view(turn.steps(LIST), offer),
            Item::Year => {
                let (years, place) = (offer.years(), offer.years().place(self.shown.year));
                let (place, end) = along(place, years.count() + 3, turn.steps(STEPS));
                if let Some(choice) = years.at_place(place) {
                    self.set_year(choice, offer);
                }
                self.shown.at_end = end;
            }
            Item::Day => self.step_day(turn.steps(DAYS), offer),
            Item::Play => self.turn_play(turn, offer),
            Item::Settings => {
                let (entry, end) = along(self.shown.entry, self.shown.own.entries(offer), turn.steps(LIST));
                (self.shown.entry, self.shown.at_end) = (entry, end);
            }
            Item::Language => {
                self.shown.voice = around(self.shown.voice, offer.voices().len(), turn.steps(LIST));
            }
            Item::Units if turn.detents % 2 != 0 => self.other_units(),
            Item::Shade => self.step_shade(turn.steps(LIST)),
            Item::MapSign | Item::MapAcross | Item::MapUp => self.turn_map(item, turn.steps(LIST), offer),
            Item::Units | Item::Keep | Item::Undo | Item::Words | Item::Help => {}
        }
    }

    fn turn_card(&mut self, card: Card, turn: Turn, offer: &Offer) {
        match card {
            Card::Help { page } => {
                let (page, end) = along(page.into(), offer.help_pages().into(), turn.steps(LIST));
                self.shown.card = Some(Card::Help { page: page as u8 });
                self.shown.at_end = end;
            }
            Card::Explain(explained) => {
                let count = self.explanations(offer);
                let place = (0..count).find(|place| self.explanation(offer, *place) == Some(explained)).unwrap_or(0);
                let place = around(place, count, turn.steps(LIST));
                self.shown.card = self.explanation(offer, place).map(Card::Explain);
            }
        }
    }

    /// Paused, then the speeds, slowest first.
    fn turn_play(&mut self, turn: Turn, offer: &Offer) {
        let place = if self.shown.playing { 1 + self.shown.speed as usize } else { 0 };
        let (place, end) = along(place, 1 + Speed::ALL.len(), turn.steps(LIST));
        match place.checked_sub(1).and_then(|speed| Speed::ALL.get(speed)) {
            None => self.pause(),
            Some(speed) => {
                self.shown.speed = *speed;
                self.play(offer);
            }
        }
        self.shown.at_end = end;
    }

    /// Turns a dial, which becomes the chosen one.
    pub(super) fn turn_dial(&mut self, dial: Dial, turn: Turn, offer: &Offer) {
        let Some(scale) = offer.scale(dial) else { return };
        let value = self.shown.dials.get(dial);
        let below = scale.stop_at(value);
        let steps = turn.steps(STEPS);
        // From between two stops the first step down is to the one below.
        let between = scale.value(below) != Some(value);
        let from = if between && steps < 0 { below + 1 } else { below };
        let (stop, end) = along(from, scale.stops(), steps);
        if turn.since_ms >= TURN_ENDS_MS && turn.since_ms != u32::MAX {
            self.gesture = None;
        }
        self.hold_dial(dial);
        self.turn_to(dial, scale.set(self.shown.dials, stop));
        self.shown.at_end = end;
    }

    /// Moves a dial to a share of its way, as a potentiometer stands.
    pub(super) fn set_dial(&mut self, dial: Dial, share: f64, offer: &Offer) {
        let Some(scale) = offer.scale(dial) else { return };
        let Some(stop) = scale.stop_at_share(share) else { return };
        let stands = scale.stop_at(self.shown.dials.get(dial)) as f64;
        let wanted = share.clamp(0.0, 1.0) * (scale.stops() - 1) as f64;
        if (wanted - stands).abs() > LEAVES_STOP_SHARE {
            self.hold_dial(dial);
            self.turn_to(dial, scale.set(self.shown.dials, stop));
            self.shown.at_end = None;
        }
    }

    /// Takes a dial in hand: whatever lies over it is closed.
    pub(super) fn hold_dial(&mut self, dial: Dial) {
        self.shown.chosen = Some(dial);
        self.shown.focus = Focus::In(Item::Dial(dial));
        self.shown.card = None;
    }

    /// The dials after a turn of `dial`; remembers what they were before it.
    pub(super) fn turn_to(&mut self, dial: Dial, dials: Dials) {
        let goes_on = self.gesture == Some(dial) && (self.quiet_ms < TURN_ENDS_MS || self.held_dial() == Some(dial));
        (self.quiet_ms, self.turned) = (0, true);
        if dials == self.shown.dials {
            return;
        }
        if !goes_on {
            self.remember(Act::Turn(dial));
        }
        self.gesture = Some(dial);
        self.shown.dials = dials;
    }

    /// Notes what is about to change, for an undo.
    pub(super) fn remember(&mut self, act: Act) {
        let shown = &self.shown;
        let (dials, beside, year, day) = (shown.dials, shown.beside, shown.year, shown.day);
        self.shown.undo = Some(Undo { act, undone: false, dials, beside, year, day });
    }

    /// Changes between the two systems of units.
    pub(super) fn other_units(&mut self) {
        self.shown.system = match self.shown.system {
            System::Metric => System::Us,
            System::Us => System::Metric,
        };
    }

    /// Goes on through the sets of colours.
    pub(super) fn step_shade(&mut self, steps: i64) {
        self.shown.shade = Shade::ALL[around(self.shown.shade as usize, Shade::ALL.len(), steps)];
    }
}
