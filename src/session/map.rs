//! The map of two dials: which two, and which number it is coloured by.

use super::knob::around;
use super::offer::Offer;
use super::ring::Item;
use super::state::{Focus, State};
use crate::signs::{Reading, Sign};
use crate::water::dials::{Dial, Dials};

/// What a map is coloured by where the host names nothing.
const USUAL: Reading = Reading::Year(Sign::SupplyRatio);

/// What the map shows.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct MapChoice {
    /// The dial from left to right.
    pub across: Dial,
    /// The dial from bottom to top; another one.
    pub up: Dial,
    /// The number, as an index of [`MapOffer::readings`].
    pub reading: usize,
}

/// What a map can be made of. It stays the place's own where a lesson lets fewer dials be turned: a map turns none.
#[derive(Clone, Debug, PartialEq)]
pub struct MapOffer {
    dials: Vec<Dial>,
    readings: Vec<Reading>,
}

impl MapOffer {
    /// A map over any two of `dials`, coloured by how much of the water asked for came.
    pub(super) fn new(dials: Vec<Dial>) -> Self {
        Self { dials, readings: vec![USUAL] }
    }

    /// The same with these numbers to choose from, the first shown first; none leaves them as they are.
    pub(super) fn with_readings(self, readings: Vec<Reading>) -> Self {
        if readings.is_empty() { self } else { Self { readings, ..self } }
    }

    /// The dials that a side can be of.
    pub fn dials(&self) -> &[Dial] {
        &self.dials
    }

    /// The numbers that it can be coloured by; at least one.
    pub fn readings(&self) -> &[Reading] {
        &self.readings
    }

    /// The number that a choice names.
    pub fn reading(&self, choice: MapChoice) -> Reading {
        self.readings.get(choice.reading).copied().unwrap_or(USUAL)
    }

    /// What is shown first: warming against the winter's rain and snow where both can be turned; `None` where there are
    /// no two dials.
    pub fn usual(&self) -> Option<MapChoice> {
        let wanted = [Dial::Warming, Dial::WinterPrecipitation].into_iter().filter(|dial| self.dials.contains(dial));
        let others =
            self.dials.iter().copied().filter(|dial| !matches!(dial, Dial::Warming | Dial::WinterPrecipitation));
        let mut sides = wanted.chain(others);
        Some(MapChoice { across: sides.next()?, up: sides.next()?, reading: 0 })
    }

    /// Whether a choice is one of those on offer.
    pub fn holds(&self, choice: MapChoice) -> bool {
        let is_there = |dial| self.dials.contains(&dial);
        choice.across != choice.up
            && is_there(choice.across)
            && is_there(choice.up)
            && choice.reading < self.readings.len()
    }

    /// The dials that a side can go over to: all but that of the other side.
    pub(super) fn sides(&self, other: Dial) -> impl Iterator<Item = Dial> + Clone + '_ {
        self.dials.iter().copied().filter(move |dial| *dial != other)
    }
}

impl MapChoice {
    /// The dials that a whole map shares: those of its two sides at rest, so that a turn of either only moves the mark.
    pub fn base(self, dials: &Dials) -> Dials {
        dials.at_rest(self.across).at_rest(self.up)
    }

    /// Where one of its things stands in its list, and how long that is.
    pub(super) fn place(self, item: Item, offer: &MapOffer) -> Option<(usize, usize)> {
        let (dial, other) = match item {
            Item::MapSign => return Some((self.reading, offer.readings.len())),
            Item::MapAcross => (self.across, self.up),
            Item::MapUp => (self.up, self.across),
            _ => return None,
        };
        Some((offer.sides(other).position(|side| side == dial)?, offer.sides(other).count()))
    }
}

impl State {
    /// Turns one of the things that the map is made of.
    pub(super) fn turn_map(&mut self, item: Item, steps: i64, offer: &Offer) {
        let Some(map) = &mut self.shown.map else { return };
        let Some((place, count)) = map.place(item, offer.map()) else { return };
        let place = around(place, count, steps);
        let side = |other| offer.map().sides(other).nth(place);
        match item {
            Item::MapAcross => map.across = side(map.up).unwrap_or(map.across),
            Item::MapUp => map.up = side(map.across).unwrap_or(map.up),
            _ => map.reading = place,
        }
    }

    /// Leaves a thing that is no longer on the ring: those of the map elsewhere, year and day on the map.
    pub(super) fn stay_on_ring(&mut self, offer: &Offer) {
        let (Focus::In(item) | Focus::Ring(item)) = self.shown.focus;
        if !self.ring(offer).any(|other| other == item) {
            self.go_home();
        }
    }
}
