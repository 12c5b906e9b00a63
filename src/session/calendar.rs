//! The year and the day that are shown, and playing from day to day.

use std::cmp::Ordering;

use super::knob::along;
use super::offer::Offer;
use super::state::State;
use super::year::{Third, YearChoice};

const MILLIDAYS: u64 = 1000;

impl State {
    /// Shows another year. The day stays the same date (or, where nobody told where a leap day lies, the same day of the
    /// water year); a year's last day stays the last.
    pub(super) fn set_year(&mut self, choice: YearChoice, offer: &Offer) {
        let years = offer.years();
        let Some(index) = years.index(choice) else { return };
        let was_last = self.last_day(offer);
        let marked = self.shown.day;
        (self.shown.year, self.shown.year_index) = (choice, index);
        let last = self.last_day(offer);
        if let Some(leap_day) = offer.leap_day() {
            self.shown.day = match last.cmp(&was_last) {
                Ordering::Less if marked > leap_day => marked - 1,
                Ordering::Greater if marked >= leap_day => marked + 1,
                _ => marked,
            };
        }
        if marked == was_last || self.shown.day > last {
            self.shown.day = last;
        }
    }

    /// Goes on in the record, year by year.
    pub(super) fn step_year(&mut self, steps: i64, offer: &Offer) {
        let (index, end) = along(self.shown.year_index, offer.years().count(), steps);
        self.set_year(YearChoice::Any(index), offer);
        self.shown.at_end = end;
    }

    /// Dry, middling, wet and round again; from any other year to the third that it is in.
    pub(super) fn next_third(&mut self, offer: &Offer) {
        let third = match self.shown.year {
            YearChoice::Of(Third::Dry) => Third::Middling,
            YearChoice::Of(Third::Middling) => Third::Wet,
            YearChoice::Of(Third::Wet) => Third::Dry,
            YearChoice::Any(index) => offer.years().third(index).unwrap_or(Third::Middling),
        };
        self.set_year(YearChoice::Of(third), offer);
    }

    /// Goes on in the year, and pauses.
    pub(super) fn step_day(&mut self, steps: i64, offer: &Offer) {
        self.pause();
        let (day, end) = along(self.shown.day.into(), usize::from(self.last_day(offer)) + 1, steps);
        (self.shown.day, self.shown.at_end) = (day as u16, end);
    }

    /// Marks a day of the year, and pauses; a day beyond the last is the last.
    pub(super) fn set_day(&mut self, day: u16, offer: &Offer) {
        self.pause();
        self.shown.day = day.min(self.last_day(offer));
    }

    /// Plays from the marked day on; from the last day, from the first.
    pub(super) fn play(&mut self, offer: &Offer) {
        if !self.shown.playing {
            self.played_millidays = 0;
            if self.shown.day == self.last_day(offer) {
                self.shown.day = 0;
            }
        }
        self.shown.playing = true;
    }

    /// Stops playing.
    pub(super) fn pause(&mut self) {
        self.shown.playing = false;
    }

    /// Time goes by; a playing year stops on its last day.
    pub(super) fn tick(&mut self, elapsed_ms: u32, offer: &Offer) {
        self.quiet_ms = self.quiet_ms.saturating_add(elapsed_ms);
        if !self.shown.playing {
            return;
        }
        let played = u64::from(elapsed_ms) * u64::from(self.shown.speed.days_per_second());
        let played = u64::from(self.played_millidays) + played;
        self.played_millidays = (played % MILLIDAYS) as u32;
        let last = self.last_day(offer);
        let day = u64::from(self.shown.day) + played / MILLIDAYS;
        if day >= last.into() {
            self.shown.day = last;
            self.pause();
        } else {
            self.shown.day = day as u16;
        }
    }

    fn last_day(&self, offer: &Offer) -> u16 {
        offer.years().days(self.shown.year_index).unwrap_or(1) - 1
    }
}
