//! Going over to another offer: a lesson that allows less, the same place afterwards, another place.

use super::offer::Offer;
use super::setting::{OwnSettings, Setting};
use super::state::State;
use super::year::{Third, YearChoice};
use crate::water::dials::{DIALS, Dial};

/// What could not stay as it was.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Refit {
    /// Dials that were moved: to the nearest stop of a narrower range, or to rest where they are not offered.
    pub moved: heapless::Vec<Dial, DIALS>,
    /// What was kept beside does not fit and was let go.
    pub beside_gone: bool,
    /// A person's own settings that do not fit; [`State::adopt`] takes them again where they do.
    pub own_gone: OwnSettings,
}

impl State {
    /// Brings the state into `offer` and says what could not stay. Cards and the ring are closed, the year pauses, and
    /// there is nothing to undo. Language, units and colours stay where they are offered; so do view, year and day.
    pub fn refit(&mut self, offer: &Offer) -> Refit {
        let fresh = State::new(offer);
        let (old, start) = (self.shown, fresh.shown);
        let mut refit = Refit::default();
        let mut shown = start;
        shown.dials = old.dials;
        for dial in Dial::ALL {
            let fitted = match offer.scale(dial) {
                Some(scale) if scale.holds(old.dials.get(dial)) => continue,
                Some(scale) => scale.set(shown.dials, scale.stop_at(old.dials.get(dial))),
                None => shown.dials.at_rest(dial),
            };
            if fitted != shown.dials {
                shown.dials = fitted;
                // Each dial comes once, so that there is room.
                let _ = refit.moved.push(dial);
            }
        }
        shown.beside = old.beside.filter(|dials| Setting { dials: *dials, year: None }.fits(offer).is_ok());
        refit.beside_gone = shown.beside != old.beside;
        for own in old.own.iter() {
            let into = if own.fits(offer).is_ok() { &mut shown.own } else { &mut refit.own_gone };
            into.push(own);
        }
        shown.chosen = old.chosen.filter(|dial| offer.scale(*dial).is_some()).or(start.chosen);
        if offer.views().contains(&old.view) {
            shown.view = old.view;
            shown.sheet = old.sheet.min(offer.sheets(old.view) - 1);
        }
        shown.map = old.map.filter(|map| offer.map().holds(*map)).or(start.map);
        if old.voice < offer.voices().len() {
            shown.voice = old.voice;
        }
        (shown.system, shown.shade, shown.speed) = (old.system, old.shade, old.speed);
        *self = State { shown, ..fresh };
        self.go_home();
        let is_there = offer.years().index(old.year).is_some();
        self.set_year(if is_there { old.year } else { YearChoice::Of(Third::Middling) }, offer);
        self.set_day(old.day, offer);
        refit
    }
}
