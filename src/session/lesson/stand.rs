//! Where a lesson makes the instrument stand: dials and their limits, year, day and view, all at once.

use super::{Course, Free, Led, Part};
use crate::lesson::Shows;
use crate::session::command::Command;
use crate::session::event::Event;
use crate::session::offer::Offer;
use crate::session::ring::Item;
use crate::session::setting::Setting;
use crate::session::state::State;
use crate::session::view::View;
use crate::session::year::{Third, YearChoice};

impl Led {
    /// Brings the state to where the page at hand wants it and gives what is offered there: the dials that the step sets
    /// or lets the room turn. Language, units and colours stay as they are. Without a lesson everything is offered again.
    pub fn arrange(&mut self, offer: &Offer, state: &mut State) -> Offer {
        let Free { dials, settings } = self.free.get_or_insert_with(|| {
            let dials = offer.dials().filter_map(|dial| offer.scale(dial).map(|scale| (dial, scale.range())));
            Free { dials: dials.collect(), settings: offer.settings().to_vec() }
        });
        let staged = match (self.part, &self.course, &self.progress) {
            (Part::Steps, Some(course), Some(progress)) => progress.stage(&course.lesson).map(|stage| (course, stage)),
            _ => None,
        };
        let Some((course, stage)) = staged else {
            let free = offer.clone().with_dials(dials, settings).unwrap_or_else(|| offer.clone());
            state.refit(&free);
            state.step(Event::Command(Command::Reset), &free);
            state.step(Event::Command(Command::Show(View::Lesson)), &free);
            return free;
        };
        // The lesson was read for this place, whose dials hold what it sets.
        let narrow = offer.clone().with_dials(&stage.ranges, &[]).unwrap_or_else(|| offer.clone());
        state.refit(&narrow);
        let setting = Setting { dials: stage.dials, year: Some(choice(&narrow, stage.year)) };
        state.step(Event::Command(Command::Set(setting)), &narrow);
        let view = if self.looking { view_of(stage.shows, &narrow) } else { View::Lesson };
        state.step(Event::Command(Command::Show(view)), &narrow);
        if self.looking && narrow.dials().next().is_none() {
            // Without a dial the knob goes through the days, which moves what is looked at.
            state.step(Event::Command(Command::Choose(Item::Day)), &narrow);
        }
        if view == View::Valley && state.shown().day == 0 {
            look_from(state, course, &narrow);
        }
        narrow
    }

    /// Closes the lesson, as when everybody has left; [`Led::arrange`] then offers everything again.
    pub fn close_for_all(&mut self) {
        let (shelf, free) = (std::mem::take(&mut self.shelf), self.free.take());
        *self = Self { free, ..Self::new(shelf) };
    }

    /// The view of the step at hand, where the ring of everything else is shown.
    pub fn view_behind(&self, offer: &Offer) -> View {
        let step = self.course.as_ref().zip(self.progress.as_ref());
        let step = step.and_then(|(course, progress)| course.lesson.steps.get(progress.step()));
        view_of(step.map_or(Shows::Valley, |step| step.shows), offer)
    }
}

/// A valley on the first day of the water year has neither snow nor crops to look at.
fn look_from(state: &mut State, course: &Course, offer: &Offer) {
    state.step(Event::Command(Command::StepDay(course.survey_day.into())), offer);
}

/// The year by its third where it is the one that stands for it, so that the page says "a dry year".
fn choice(offer: &Offer, year: usize) -> YearChoice {
    let third = Third::ALL.into_iter().find(|third| offer.years().index(YearChoice::Of(*third)) == Some(year));
    third.map_or(YearChoice::Any(year), YearChoice::Of)
}

/// The view of a step; the valley where this screen does not have it.
fn view_of(shows: Shows, offer: &Offer) -> View {
    let view = match shows {
        Shows::Valley => View::Valley,
        Shows::Season => View::Season,
        Shows::Canals => View::Canals,
        Shows::Ledger => View::Ledger,
        Shows::Years => View::Years,
        Shows::Grid => View::Grid,
        Shows::Trust => View::Trust,
    };
    if offer.views().contains(&view) { view } else { View::Valley }
}

impl State {
    /// Stands as a lesson says, with nothing to undo; a setting that does not fit changes nothing.
    pub(in crate::session) fn stand(&mut self, setting: Setting, offer: &Offer) {
        if setting.fits(offer).is_err() {
            return;
        }
        self.shown.dials = setting.dials;
        if let Some(year) = setting.year {
            self.set_year(year, offer);
        }
        self.shown.undo = None;
        self.gesture = None;
        self.pause();
    }
}
