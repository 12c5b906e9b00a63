//! Named settings: dials, and sometimes a year to look at, that can be called up again.
//!
//! A place's or the house's own settings (the droughts) come as data in the [`Offer`](super::Offer); a person's own are
//! kept in the state, a few at most, known by their number since one encoder writes no names.

use serde::{Deserialize, Serialize};

use super::offer::Offer;
use super::year::YearChoice;
use crate::water::dials::{Dial, Dials};

/// Most settings of a person's own.
pub const MOST_OWN_SETTINGS: usize = 6;

/// Dials, and a year to look at.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct Setting {
    /// Where every dial stands.
    pub dials: Dials,
    /// Which year to show; `None` leaves the year as it is.
    pub year: Option<YearChoice>,
}

/// A setting that comes as data.
#[derive(Clone, Debug, PartialEq)]
pub struct NamedSetting {
    /// Its stable key, by which its name is found.
    pub key: String,
    /// What it sets.
    pub setting: Setting,
}

/// Why a setting does not go with a place.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Misfit {
    /// It turns a dial that the place does not offer.
    DialNotOffered(Dial),
    /// It turns a dial further than the place allows, or to no number.
    OutOfRange(Dial),
    /// It shows a year that the record does not have.
    NoSuchYear(usize),
    /// There is no room for another.
    NoRoom,
}

/// An entry of the list of settings, as a person turns through it.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum SettingEntry {
    /// Leave without doing anything.
    Back,
    /// Call up a setting of the offer, counted from 0.
    Offered(usize),
    /// Call up one of a person's own, counted from 0.
    Own(usize),
    /// Save what is dialled now as one's own.
    Save,
    /// Forget the last of one's own.
    ForgetLast,
}

impl Setting {
    /// Whether the setting goes with what is offered.
    ///
    /// # Errors
    /// The first [`Misfit`], dials in their usual order before the year.
    pub fn fits(&self, offer: &Offer) -> Result<(), Misfit> {
        for dial in Dial::ALL {
            match offer.scale(dial) {
                Some(scale) if scale.holds(self.dials.get(dial)) => {}
                Some(_) => return Err(Misfit::OutOfRange(dial)),
                None if self.dials.rests(dial) => {}
                None => return Err(Misfit::DialNotOffered(dial)),
            }
        }
        match self.year {
            Some(YearChoice::Any(index)) if offer.years().index(YearChoice::Any(index)).is_none() => {
                Err(Misfit::NoSuchYear(index))
            }
            _ => Ok(()),
        }
    }
}

/// A person's own settings, oldest first.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct OwnSettings {
    slots: [Option<Setting>; MOST_OWN_SETTINGS],
}

impl OwnSettings {
    /// How many there are.
    pub fn count(&self) -> usize {
        self.slots.iter().flatten().count()
    }

    /// One of them, counted from 0.
    pub fn get(&self, index: usize) -> Option<Setting> {
        self.slots.get(index).copied().flatten()
    }

    /// All of them.
    pub fn iter(&self) -> impl Iterator<Item = Setting> + '_ {
        self.slots.iter().flatten().copied()
    }

    /// Whether another can be saved.
    pub fn has_room(&self) -> bool {
        self.count() < MOST_OWN_SETTINGS
    }

    /// Saves another; `false` without room.
    pub(super) fn push(&mut self, setting: Setting) -> bool {
        let free = self.slots.iter_mut().find(|slot| slot.is_none());
        free.map(|slot| *slot = Some(setting)).is_some()
    }

    /// Forgets the last.
    pub(super) fn pop(&mut self) {
        if let Some(slot) = self.slots.iter_mut().rev().find(|slot| slot.is_some()) {
            *slot = None;
        }
    }

    /// How long the list of entries is.
    pub(super) fn entries(&self, offer: &Offer) -> usize {
        1 + offer.settings().len() + self.count() + usize::from(self.has_room()) + usize::from(self.count() > 0)
    }

    /// The entry at an index of the list: back, what is offered, one's own, save, forget the last.
    pub fn entry(&self, offer: &Offer, index: usize) -> Option<SettingEntry> {
        let Some(index) = index.checked_sub(1) else { return Some(SettingEntry::Back) };
        let Some(own) = index.checked_sub(offer.settings().len()) else { return Some(SettingEntry::Offered(index)) };
        let Some(after) = own.checked_sub(self.count()) else { return Some(SettingEntry::Own(own)) };
        match (after, self.has_room(), self.count() > 0) {
            (0, true, _) => Some(SettingEntry::Save),
            (0, false, true) | (1, true, true) => Some(SettingEntry::ForgetLast),
            _ => None,
        }
    }
}
