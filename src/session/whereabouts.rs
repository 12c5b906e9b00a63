//! Where the instrument is, as a value that outlives it, and going back there.

use serde::{Deserialize, Serialize};

use super::needs::Needs;
use super::offer::Offer;
use super::setting::{MOST_OWN_SETTINGS, Setting};
use super::state::State;
use super::view::{Shade, Speed, View};
use super::year::YearChoice;
use crate::water::dials::{Dial, Dials};
use crate::words::System;

/// Where the instrument was, and a person's own settings.
#[derive(Clone, Debug, PartialEq, Serialize, Deserialize)]
pub struct Whereabouts {
    /// The view.
    pub view: View,
    /// The year.
    pub year: YearChoice,
    /// The day of the year, counted from 0.
    pub day: u16,
    /// Where every dial stood.
    pub dials: Dials,
    /// What stood beside.
    pub beside: Option<Dials>,
    /// The dial in hand.
    pub chosen: Option<Dial>,
    /// The language, by its tag.
    pub language: String,
    /// The other language, where both were shown.
    pub second_language: Option<String>,
    /// Whether the units were those of the United States.
    pub us_units: bool,
    /// The colours.
    pub shade: Shade,
    /// A person's own settings, oldest first.
    pub own: Vec<Setting>,
}

/// A wish to see something; what is `None` stays as it is.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Look {
    /// A view.
    pub view: Option<View>,
    /// A year.
    pub year: Option<YearChoice>,
    /// A day of the year, counted from 0.
    pub day: Option<u16>,
    /// A language, as an index of [`Offer::voices`].
    pub voice: Option<usize>,
    /// Plays at this speed from the day on.
    pub plays: Option<Speed>,
}

impl State {
    /// Where the instrument is.
    pub fn whereabouts(&self, offer: &Offer) -> Whereabouts {
        let shown = self.shown();
        let voice = offer.voices().get(shown.voice);
        Whereabouts {
            view: shown.view,
            year: shown.year,
            day: shown.day,
            dials: shown.dials,
            beside: shown.beside,
            chosen: shown.chosen,
            language: voice.map(|voice| voice.first.clone()).unwrap_or_default(),
            second_language: voice.and_then(|voice| voice.second.clone()),
            us_units: shown.system == System::Us,
            shade: shown.shade,
            own: shown.own.iter().collect(),
        }
    }

    /// Goes back there, as far as the offer has it; the rest stays as it is.
    pub fn return_to(&mut self, place: &Whereabouts, offer: &Offer) {
        for setting in place.own.iter().take(MOST_OWN_SETTINGS) {
            // One that no longer fits the place is let go.
            let _ = self.adopt(*setting, offer);
        }
        let fits = |dials: Dials| Setting { dials, year: None }.fits(offer).is_ok();
        if fits(place.dials) {
            self.shown.dials = place.dials;
            self.shown.beside = place.beside.filter(|dials| fits(*dials));
        }
        if let Some(dial) = place.chosen.filter(|dial| offer.scale(*dial).is_some()) {
            self.hold_dial(dial);
        }
        let same =
            |first: &str, second: Option<&str>| first == place.language && second == place.second_language.as_deref();
        let voice = offer.voices().iter().position(|voice| same(&voice.first, voice.second.as_deref()));
        (self.shown.system, self.shown.shade) = (if place.us_units { System::Us } else { System::Metric }, place.shade);
        let (view, year, day) = (Some(place.view), Some(place.year), Some(place.day));
        self.look(Look { view, year, day, voice, plays: None }, offer);
    }

    /// Shows what is wished for, as far as the offer has it.
    pub fn look(&mut self, look: Look, offer: &Offer) -> Needs {
        let before = *self.shown();
        if let Some(view) = look.view {
            self.show(view, offer);
        }
        if let Some(year) = look.year {
            self.set_year(year, offer);
        }
        if let Some(day) = look.day {
            self.set_day(day, offer);
        }
        if let Some(voice) = look.voice.filter(|voice| *voice < offer.voices().len()) {
            self.shown.voice = voice;
        }
        if let Some(speed) = look.plays {
            self.shown.speed = speed;
            self.play(offer);
        }
        Needs::between(&before, self.shown())
    }
}
