//! What an unattended instrument asks of its player.

use std::path::Path;

use super::super::drawing::theme;
use super::super::leading::LessonText;
use super::super::player::Player;
use crate::picture::Theme;
use crate::session::lesson::Kept;
use crate::session::{Event, Look, Offer, Shown, State, Whereabouts};
use crate::words::Words;

impl Player {
    /// What is offered.
    pub fn offer(&self) -> &Offer {
        &self.offer
    }

    /// What the session shows.
    pub fn shown(&self) -> &Shown {
        self.state.shown()
    }

    /// Goes up with everything that can be seen.
    pub fn stamp(&self) -> u64 {
        self.stamp
    }

    /// The words of the language on show.
    pub fn words(&self) -> &Words {
        &self.voices[self.state.shown().voice].0
    }

    /// The colours on show.
    pub fn theme(&self) -> &'static Theme {
        theme(self.state.shown().shade)
    }

    /// Where it is, to go back there.
    pub fn whereabouts(&self) -> Whereabouts {
        self.state.whereabouts(&self.offer)
    }

    /// Goes back there.
    pub fn return_to(&mut self, place: &Whereabouts) {
        self.state.return_to(place, &self.offer);
        self.seen_anew();
    }

    /// Shows what is wished for.
    pub fn look(&mut self, look: Look) {
        let needs = self.state.look(look, &self.offer);
        if needs.redraw {
            self.seen_anew();
        }
    }

    /// A visit is over: any lesson is closed, and everything goes back to rest.
    pub fn leave(&mut self) {
        if self.has_lesson() {
            self.led.close_for_all();
            self.offer = self.led.arrange(&self.offer, &mut self.state);
            self.seen_anew();
        }
        self.step_session(Event::LongPress);
    }

    /// Whether a lesson is open.
    pub fn has_lesson(&self) -> bool {
        self.led.course().is_some()
    }

    /// The key of the lesson that is open.
    pub fn lesson_key(&self) -> Option<&str> {
        self.led.course().map(|course| course.key.as_str())
    }

    /// Takes up the lesson that was kept, where it still is what it was; `false` where not.
    pub fn take_up(&mut self, kept: &Kept, words: &Words) -> bool {
        let found = LessonText::find(Path::new(&kept.lesson), words);
        let Ok(course) = found.and_then(|text| text.open(&self.place, words)) else { return false };
        let taken = self.led.take_up(course, kept.clone());
        self.offer = self.led.arrange(&self.offer, &mut self.state);
        self.seen_anew();
        taken
    }

    /// Begins as at the first start.
    pub fn start_again(&mut self) {
        self.leave();
        self.state = State::new(&self.offer);
        self.seen_anew();
    }

    fn seen_anew(&mut self) {
        (self.asked_water, self.gave_up) = (true, false);
        self.stamp += 1;
    }
}
