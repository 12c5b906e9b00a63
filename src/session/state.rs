//! What the running instrument is in: everything that a picture shows, and the little that it does not.

use super::event::Event;
use super::knob::End;
use super::map::MapChoice;
use super::needs::Needs;
use super::offer::Offer;
use super::ring::{Item, ring};
use super::setting::{Misfit, OwnSettings, Setting, SettingEntry};
use super::view::{Shade, Speed, View};
use super::year::{Third, YearChoice};
use crate::water::dials::{Dial, Dials};
use crate::words::System;

pub use crate::picture::views::hand::Focus;

/// A card that lies over the view.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Card {
    /// How to use the instrument.
    Help {
        /// Counted from 0.
        page: u8,
    },
    /// What a word means.
    Explain(Explained),
}

/// What can be explained on a view: its terms, then the dials.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Explained {
    /// A term of the view, counted from 0.
    Term(u16),
    /// What a dial stands for.
    Dial(Dial),
}

/// What was just done, said until the next event.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Done {
    /// What is dialled was kept beside.
    Kept,
    /// What was kept beside was let go.
    LetGo,
    /// The last act was taken back.
    Undone,
    /// What was taken back was done again.
    DoneAgain,
    /// There was nothing to take back.
    NothingToUndo,
    /// Everything was set back to rest.
    Reset,
    /// A setting was called up, by its entry.
    Recalled(SettingEntry),
    /// What is dialled was saved as one's own, counted from 0.
    Saved(usize),
    /// The last of one's own was forgotten.
    Forgot,
}

/// What an undo takes back.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Act {
    /// A dial was turned: all detents in a row without a pause are one turn.
    Turn(Dial),
    /// Everything was set back to rest.
    Reset,
    /// A named setting was called up.
    Recall,
}

/// What an undo brings back.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Undo {
    /// What was done.
    pub act: Act,
    /// Whether it has been taken back already, so that the next undo does it again.
    pub undone: bool,
    pub(super) dials: Dials,
    pub(super) beside: Option<Dials>,
    pub(super) year: YearChoice,
    pub(super) day: u16,
}

/// Everything that can be seen.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Shown {
    /// Where every dial stands.
    pub dials: Dials,
    /// The dial that turns when nothing else is open; `None` where the place offers none.
    pub chosen: Option<Dial>,
    /// Where the encoder's turns go.
    pub focus: Focus,
    /// A card over the view.
    pub card: Option<Card>,
    /// The last turn wanted to go beyond this end.
    pub at_end: Option<End>,
    /// What the last event did, where it cannot be seen otherwise.
    pub done: Option<Done>,
    /// The view.
    pub view: View,
    /// Its sheet, counted from 0.
    pub sheet: u8,
    /// What the map of two dials shows; `None` where there are no two.
    pub map: Option<MapChoice>,
    /// The year, as it was chosen.
    pub year: YearChoice,
    /// The same year, counted from 0 in the whole water years of the record.
    pub year_index: usize,
    /// Day of that year, counted from 0.
    pub day: u16,
    /// Whether the year plays.
    pub playing: bool,
    /// How fast.
    pub speed: Speed,
    /// The language, as an index of [`Offer::voices`].
    pub voice: usize,
    /// The units.
    pub system: System,
    /// The colours.
    pub shade: Shade,
    /// What was kept to stand beside what is dialled now.
    pub beside: Option<Dials>,
    /// A person's own settings.
    pub own: OwnSettings,
    /// The entry of the list of settings, while that is open.
    pub entry: usize,
    /// What an undo would take back.
    pub undo: Option<Undo>,
}

/// What a finger holds.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) enum Hold {
    Dial { dial: Dial, share: f64, stop: usize },
    Day,
    Other(super::event::Target),
}

/// The state of a session. A value of fixed size: nothing in it grows.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct State {
    pub(super) shown: Shown,
    /// Since a dial was last turned.
    pub(super) quiet_ms: u32,
    /// The dial whose turn is still going on.
    pub(super) gesture: Option<Dial>,
    /// Whether the event at hand turned a dial.
    pub(super) turned: bool,
    /// Thousandths of a day that have played since the last whole one.
    pub(super) played_millidays: u32,
    pub(super) hold: Option<Hold>,
}

/// What is wrong with a state.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Invalid {
    /// A dial stands where it may not.
    Dial(Dial),
    /// What is kept beside could not be dialled.
    Beside,
    /// The chosen dial is not offered, or none is chosen though there are dials.
    Chosen,
    /// The encoder turns something that is not offered, or the settings' entry is not there.
    Focus,
    /// The card shows what is not there.
    Card,
    /// The view is not offered, or has no such sheet.
    View,
    /// The year or the day is not in the record.
    Year,
    /// The language is not offered.
    Voice,
    /// One of the person's own settings does not fit.
    Own,
    /// The map shows what is not offered.
    Map,
    /// An undo would lead to where one may not be.
    Undo,
}

impl State {
    /// The state at the start: dials at rest, the first dial in hand, the first view, the middling year's opening day.
    pub fn new(offer: &Offer) -> Self {
        let chosen = offer.dials().next();
        let year = YearChoice::Of(Third::Middling);
        let year_index = offer.years().index(year).unwrap_or(0);
        let last_day = offer.years().days(year_index).unwrap_or(1) - 1;
        let shown = Shown {
            dials: Dials::REST,
            chosen,
            focus: Focus::In(chosen.map_or(Item::View, Item::Dial)),
            card: None,
            at_end: None,
            done: None,
            view: offer.views()[0],
            sheet: 0,
            map: offer.map().usual(),
            year,
            year_index,
            day: offer.opening_day().min(last_day),
            playing: false,
            speed: Speed::Middling,
            voice: 0,
            system: offer.system(),
            shade: offer.shade(),
            beside: None,
            own: OwnSettings::default(),
            entry: 0,
            undo: None,
        };
        Self { shown, quiet_ms: 0, gesture: None, turned: false, played_millidays: 0, hold: None }
    }

    /// Everything that can be seen.
    pub fn shown(&self) -> &Shown {
        &self.shown
    }

    /// The dial that a finger holds: the picture gives shares along it until the finger is lifted.
    pub fn held_dial(&self) -> Option<Dial> {
        match self.hold {
            Some(Hold::Dial { dial, .. }) => Some(dial),
            _ => None,
        }
    }

    /// The things on the ring, in order.
    pub fn ring(&self, offer: &Offer) -> impl Iterator<Item = Item> + use<> {
        ring(offer, self.shown.view).into_iter()
    }

    /// Brings back a setting of a person's own from an earlier session.
    ///
    /// # Errors
    /// A [`Misfit`] where it does not go with the place, or where there is no room.
    pub fn adopt(&mut self, setting: Setting, offer: &Offer) -> Result<(), Misfit> {
        setting.fits(offer)?;
        if self.shown.own.push(setting) { Ok(()) } else { Err(Misfit::NoRoom) }
    }

    /// Takes an event and says what it makes necessary.
    pub fn step(&mut self, event: Event, offer: &Offer) -> Needs {
        let before = self.shown;
        self.apply(event, offer);
        Needs::between(&before, &self.shown)
    }

    /// How long the list of what can be explained on the present view is.
    pub(super) fn explanations(&self, offer: &Offer) -> usize {
        usize::from(offer.terms(self.shown.view)) + offer.dials().count()
    }

    /// The entry of that list at `index`.
    pub(super) fn explanation(&self, offer: &Offer, index: usize) -> Option<Explained> {
        let terms = offer.terms(self.shown.view);
        match index.checked_sub(usize::from(terms)) {
            None => Some(Explained::Term(index as u16)),
            Some(dial) => offer.dials().nth(dial).map(Explained::Dial),
        }
    }

    /// Checks everything that must hold at any time.
    ///
    /// # Errors
    /// The first thing that does not.
    pub fn check(&self, offer: &Offer) -> Result<(), Invalid> {
        let shown = &self.shown;
        for dial in Dial::ALL {
            let fine = match offer.scale(dial) {
                Some(scale) => scale.holds(shown.dials.get(dial)),
                None => shown.dials.rests(dial),
            };
            ensure(fine, Invalid::Dial(dial))?;
        }
        let fits = |dials: Dials, year| Setting { dials, year }.fits(offer).is_ok();
        ensure(shown.beside.is_none_or(|dials| fits(dials, None)), Invalid::Beside)?;
        ensure(
            match shown.chosen {
                Some(dial) => offer.scale(dial).is_some(),
                None => offer.dials().next().is_none(),
            },
            Invalid::Chosen,
        )?;
        let (Focus::In(item) | Focus::Ring(item)) = shown.focus;
        ensure(self.ring(offer).any(|other| other == item), Invalid::Focus)?;
        ensure(!matches!(shown.focus, Focus::In(item) if item.acts_at_once()), Invalid::Focus)?;
        if let Focus::In(Item::Dial(dial)) = shown.focus {
            ensure(shown.chosen == Some(dial), Invalid::Focus)?;
        }
        ensure(shown.entry < shown.own.entries(offer), Invalid::Focus)?;
        ensure(
            match shown.card {
                None => true,
                Some(Card::Help { page }) => page < offer.help_pages(),
                Some(Card::Explain(Explained::Term(term))) => term < offer.terms(shown.view),
                Some(Card::Explain(Explained::Dial(dial))) => offer.scale(dial).is_some(),
            },
            Invalid::Card,
        )?;
        ensure(offer.views().contains(&shown.view) && shown.sheet < offer.sheets(shown.view), Invalid::View)?;
        ensure(shown.map.is_some() == offer.map().usual().is_some(), Invalid::Map)?;
        ensure(shown.map.is_none_or(|map| offer.map().holds(map)), Invalid::Map)?;
        let days = offer.years().days(shown.year_index);
        ensure(offer.years().index(shown.year) == Some(shown.year_index), Invalid::Year)?;
        ensure(days.is_some_and(|days| shown.day < days), Invalid::Year)?;
        ensure(shown.voice < offer.voices().len(), Invalid::Voice)?;
        ensure(shown.own.iter().all(|own| own.fits(offer).is_ok()), Invalid::Own)?;
        ensure(
            shown.undo.is_none_or(|undo| {
                let days = offer.years().index(undo.year).and_then(|year| offer.years().days(year));
                fits(undo.dials, None)
                    && undo.beside.is_none_or(|dials| fits(dials, None))
                    && days.is_some_and(|days| undo.day < days)
            }),
            Invalid::Undo,
        )
    }
}

fn ensure(holds: bool, otherwise: Invalid) -> Result<(), Invalid> {
    if holds { Ok(()) } else { Err(otherwise) }
}
