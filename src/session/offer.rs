//! What a place and the house offer to a session: dials and their stops, years, views, languages, named settings.
//!
//! The host makes it once from the place, the words and the run as it was. A lesson that allows fewer dials or narrower
//! ranges makes a narrower offer; the session itself needs to know nothing of lessons for that.

use super::map::MapOffer;
use super::scale::DialScale;
use super::setting::{Misfit, NamedSetting};
use super::view::{Shade, VIEWS, View};
use super::year::YearList;
use crate::signs::Reading;
use crate::water::dials::{DIALS, Dial, DialRange};
use crate::words::System;

/// A language, or two at once for a mixed room. The tags are for `words` to resolve.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Voice {
    /// Language tag.
    pub first: String,
    /// The other language, where each sentence is given in both.
    pub second: Option<String>,
}

/// What the host knows, unchecked.
#[derive(Clone, Debug)]
pub struct OfferInput {
    /// Dials that may be turned, each with the place's range.
    pub dials: Vec<(Dial, DialRange)>,
    /// The record's whole water years.
    pub years: YearList,
    /// Views that can be shown; the first is shown first.
    pub views: Vec<View>,
    /// How many terms can be explained on each view, in the order of [`View::ALL`].
    pub terms: [u16; VIEWS],
    /// Languages, and pairs of them; the first is spoken first.
    pub voices: Vec<Voice>,
    /// Units to begin with.
    pub system: System,
    /// Colours to begin with.
    pub shade: Shade,
    /// Settings that come as data.
    pub settings: Vec<NamedSetting>,
    /// Pages of the help card.
    pub help_pages: u8,
}

/// Why an offer makes no sense.
#[derive(Clone, Debug, PartialEq)]
pub enum OfferFault {
    /// A dial's range is empty, has no rest in it, is wider than the dial's widest, or has far too many stops.
    Range(Dial),
    /// A dial is named twice.
    DialTwice(Dial),
    /// There is no view.
    NoView,
    /// A view is named twice.
    ViewTwice(View),
    /// There is no language.
    NoVoice,
    /// The help card has no page.
    NoHelp,
    /// A setting, counted from 0, does not go with the rest.
    Setting(usize, Misfit),
}

/// What is offered, checked.
#[derive(Clone, Debug, PartialEq)]
pub struct Offer {
    scales: [Option<DialScale>; DIALS],
    years: YearList,
    views: Vec<View>,
    terms: [u16; VIEWS],
    voices: Vec<Voice>,
    system: System,
    shade: Shade,
    settings: Vec<NamedSetting>,
    help_pages: u8,
    about_sheets: u8,
    opening_day: u16,
    leap_day: Option<u16>,
    trust_sheets: u8,
    map: MapOffer,
}

impl Offer {
    /// Checks what the host knows.
    ///
    /// # Errors
    /// The first [`OfferFault`].
    pub fn new(input: OfferInput) -> Result<Self, OfferFault> {
        let mut scales = [None; DIALS];
        for (dial, range) in input.dials {
            let scale = DialScale::new(dial, range).ok_or(OfferFault::Range(dial))?;
            if scales[dial as usize].replace(scale).is_some() {
                return Err(OfferFault::DialTwice(dial));
            }
        }
        if input.views.is_empty() {
            return Err(OfferFault::NoView);
        }
        for (index, view) in input.views.iter().enumerate() {
            if input.views[..index].contains(view) {
                return Err(OfferFault::ViewTwice(*view));
            }
        }
        if input.voices.is_empty() {
            return Err(OfferFault::NoVoice);
        }
        if input.help_pages == 0 {
            return Err(OfferFault::NoHelp);
        }
        let map = MapOffer::new(scales.iter().flatten().map(DialScale::dial).collect());
        let offer = Self {
            scales,
            years: input.years,
            views: input.views,
            terms: input.terms,
            voices: input.voices,
            system: input.system,
            shade: input.shade,
            settings: input.settings,
            help_pages: input.help_pages,
            about_sheets: 1,
            opening_day: 0,
            leap_day: None,
            trust_sheets: 1,
            map,
        };
        for (index, named) in offer.settings.iter().enumerate() {
            named.setting.fits(&offer).map_err(|misfit| OfferFault::Setting(index, misfit))?;
        }
        Ok(offer)
    }

    /// The same with the day of the water year that a session opens on, counted from 0: one on which a turn of a dial
    /// shows.
    #[must_use]
    pub fn with_opening_day(self, opening_day: u16) -> Self {
        Self { opening_day, ..self }
    }

    /// The same with the place of 29 February in a water year of 366 days, counted from 0: the marked day then stays the
    /// same date from year to year.
    #[must_use]
    pub fn with_leap_day(self, leap_day: u16) -> Self {
        Self { leap_day: Some(leap_day), ..self }
    }

    /// The same with these numbers for the map of two dials, the first shown first; none leaves them as they are.
    #[must_use]
    pub fn with_map_readings(self, readings: Vec<Reading>) -> Self {
        Self { map: self.map.with_readings(readings), ..self }
    }

    /// The same with those of `settings` that go with it, beside those that it has.
    #[must_use]
    pub fn with_settings(mut self, settings: Vec<NamedSetting>) -> Self {
        let fitting: Vec<NamedSetting> =
            settings.into_iter().filter(|named| named.setting.fits(&self).is_ok()).collect();
        self.settings.extend(fitting);
        self
    }

    /// The same with so many sheets of the about view, as the picture counts them for a screen; 0 counts as 1.
    #[must_use]
    pub fn with_about_sheets(self, sheets: u8) -> Self {
        Self { about_sheets: sheets.max(1), ..self }
    }

    /// The same with so many sheets of the trust view, likewise.
    #[must_use]
    pub fn with_trust_sheets(self, sheets: u8) -> Self {
        Self { trust_sheets: sheets.max(1), ..self }
    }

    /// The same with so many pages of the help card, as the picture counts them for a screen; 0 counts as 1.
    #[must_use]
    pub fn with_help_pages(self, pages: u8) -> Self {
        Self { help_pages: pages.max(1), ..self }
    }

    /// The same with these dials and settings alone, as a lesson allows them; `None` where they make no sense.
    pub fn with_dials(self, dials: &[(Dial, DialRange)], settings: &[NamedSetting]) -> Option<Self> {
        let mut scales = [None; DIALS];
        for &(dial, range) in dials {
            scales[dial as usize] = Some(DialScale::new(dial, range)?);
        }
        let offer = Self { scales, settings: settings.to_vec(), ..self };
        offer.settings.iter().all(|named| named.setting.fits(&offer).is_ok()).then_some(offer)
    }

    /// The stops of a dial; `None` where the place does not offer it.
    pub fn scale(&self, dial: Dial) -> Option<&DialScale> {
        self.scales[dial as usize].as_ref()
    }

    /// The dials that are offered, in their usual order.
    pub fn dials(&self) -> impl DoubleEndedIterator<Item = Dial> + '_ {
        self.scales.iter().flatten().map(DialScale::dial)
    }

    /// What the map of two dials can be made of.
    pub fn map(&self) -> &MapOffer {
        &self.map
    }

    /// The years.
    pub fn years(&self) -> &YearList {
        &self.years
    }

    /// The views; at least one.
    pub fn views(&self) -> &[View] {
        &self.views
    }

    /// How many sheets a view has; all but trust and about have one.
    pub fn sheets(&self, view: View) -> u8 {
        match view {
            View::About => self.about_sheets,
            View::Trust => self.trust_sheets,
            _ => 1,
        }
    }

    /// How many terms can be explained on a view.
    pub fn terms(&self, view: View) -> u16 {
        self.terms[view as usize]
    }

    /// The languages; at least one.
    pub fn voices(&self) -> &[Voice] {
        &self.voices
    }

    /// Units to begin with.
    pub fn system(&self) -> System {
        self.system
    }

    /// Colours to begin with.
    pub fn shade(&self) -> Shade {
        self.shade
    }

    /// Settings that come as data.
    pub fn settings(&self) -> &[NamedSetting] {
        &self.settings
    }

    /// The day of the water year that a session opens on, counted from 0.
    pub fn opening_day(&self) -> u16 {
        self.opening_day
    }

    /// The place of 29 February in a water year of 366 days, counted from 0, where it is known.
    pub fn leap_day(&self) -> Option<u16> {
        self.leap_day
    }

    /// Pages of the help card; at least one.
    pub fn help_pages(&self) -> u8 {
        self.help_pages
    }
}
