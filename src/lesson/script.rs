//! What a lesson says, checked: steps with their words, dials, guess and expectations.

use super::measure::Reading;
use crate::place::Text;
use crate::water::dials::{DIALS, Dial, DialRange, Dials};
use crate::water::keyed::keyed;

/// Most steps of a lesson.
pub const MOST_STEPS: usize = 24;
/// Most places where a guess may stand: a turn of the knob goes through them all.
pub const MOST_GUESS_STOPS: usize = 200;
/// Most dials that a step may set and allow.
pub const MOST_ALLOWED: usize = DIALS;

/// Letters that a lesson's name may take in one language: a line of a screen 320 pixels wide.
pub const MOST_NAME: usize = 40;
/// Letters of a prompt in one language. Two languages share a screen 320 × 240: six lines of some 48 letters for both.
pub const MOST_PROMPT: usize = 150;
/// Letters of a reveal in one language: as many as a prompt.
pub const MOST_REVEAL: usize = 150;
/// Letters of a talking point in one language: a short paragraph on a presenter's page.
pub const MOST_TALK: usize = 480;

keyed! {
    /// What a step shows; the session has a view for each.
    Shows, SHOWS {
        /// The valley from mountain to river.
        Valley => "valley",
        /// Snow, inflow, storage and deliveries over the year.
        Season => "season",
        /// Each canal's year as a strip.
        Canals => "canals",
        /// Every drop accounted.
        Ledger => "ledger",
        /// Every year of the record.
        Years => "years",
        /// Two dials against each other.
        Grid => "grid",
        /// How far the model has been right.
        Trust => "trust",
    }
}

/// A lesson, read for a place.
#[derive(Clone, Debug, PartialEq)]
pub struct Lesson {
    /// Its name.
    pub name: Text,
    /// What it is about.
    pub text: Text,
    /// How long it takes, minutes.
    pub minutes: u16,
    /// Its steps; at least one, at most [`MOST_STEPS`].
    pub steps: Vec<Step>,
    /// Tells the words of guesses of this lesson from those of another.
    pub stamp: u8,
}

/// One step.
#[derive(Clone, Debug, PartialEq)]
pub struct Step {
    /// Its short name in the file.
    pub key: String,
    /// What the room reads first.
    pub prompt: Text,
    /// What is shown.
    pub shows: Shows,
    /// The year, counted from 0 in the whole water years of the place.
    pub year: usize,
    /// Where every dial stands when the step's result is shown.
    pub dials: Dials,
    /// What the room may turn.
    pub allowed: Vec<Allowed>,
    /// What each group guesses.
    pub guess: Option<Guess>,
    /// What the room reads with the result.
    pub reveal: Option<Text>,
    /// What the presenter may say.
    pub talk: Option<Text>,
    /// What must come out.
    pub expect: Vec<Expectation>,
    /// The step that follows; `None` ends the lesson.
    pub then: Option<usize>,
}

/// A dial that the room may turn, and how far.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Allowed {
    /// The dial.
    pub dial: Dial,
    /// Its limits, within those of the place.
    pub range: DialRange,
}

/// A guess that is asked for.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Guess {
    /// What is guessed.
    pub reading: Reading,
    /// Lowest guess, in the reading's unit.
    pub least: f64,
    /// Distance between two guesses.
    pub step: f64,
    /// How many guesses there are; at least two, at most [`MOST_GUESS_STOPS`].
    pub stops: u8,
    /// A guess this close counts as close.
    pub near: f64,
    /// What most people say, where the lesson knows it.
    pub usual: Option<f64>,
    /// The step to take when the middle guess was not close.
    pub if_far: Option<usize>,
}

impl Guess {
    /// The value at a stop, counted from 0; `None` beyond the last.
    pub fn value(&self, stop: u8) -> Option<f64> {
        (stop < self.stops).then(|| {
            let value = self.least + f64::from(stop) * self.step;
            // Three steps of a tenth are 0.3 and not 0.30000000000000004.
            libm::round(value * 1e6) / 1e6 + 0.0
        })
    }

    /// The stop in the middle, where the knob starts.
    pub fn middle(&self) -> u8 {
        (self.stops - 1) / 2
    }

    /// Whether a guess is as good as the result.
    pub fn is_near(&self, guess: f64, result: f64) -> bool {
        (guess - result).abs() <= self.near
    }

    /// Highest guess, in the reading's unit.
    pub fn most(&self) -> f64 {
        self.value(self.stops - 1).unwrap_or(self.least)
    }
}

/// What must come out.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Expectation {
    /// What is read.
    pub reading: Reading,
    /// What must hold of it.
    pub relation: Relation,
}

/// What must hold of a reading.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Relation {
    /// More than this.
    Above(f64),
    /// Less than this.
    Below(f64),
    /// From the first to the second, both included.
    Between(f64, f64),
    /// There is no such thing: a reservoir that never fills.
    None,
}

impl Relation {
    /// Whether it holds of what came out.
    pub fn holds(self, value: Option<f64>) -> bool {
        match (self, value) {
            (Relation::None, value) => value.is_none(),
            (_, None) => false,
            (Relation::Above(level), Some(value)) => value > level,
            (Relation::Below(level), Some(value)) => value < level,
            (Relation::Between(least, most), Some(value)) => least <= value && value <= most,
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_relation_needs_something_to_hold_of() {
        for relation in [Relation::Above(0.0), Relation::Below(0.0), Relation::Between(-1.0, 1.0)] {
            assert!(!relation.holds(None) && !relation.holds(Some(f64::NAN)));
        }
        assert!(Relation::None.holds(None) && !Relation::None.holds(Some(0.0)));
        assert!(Relation::Above(1.0).holds(Some(1.5)) && !Relation::Above(1.0).holds(Some(1.0)));
        assert!(Relation::Between(1.0, 2.0).holds(Some(2.0)) && !Relation::Between(1.0, 2.0).holds(Some(2.1)));
    }
}
