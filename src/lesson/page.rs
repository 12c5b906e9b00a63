//! What a picture needs to draw a step: plain data, with nothing in it that must not be seen yet.

use super::measure::Reading;
use super::progress::{Phase, Progress};
use super::script::Lesson;
use super::spread::{GuessSpread, guess_spread};
use crate::place::Text;

/// A page of a lesson.
#[derive(Clone, Debug, PartialEq)]
pub struct Page<'l> {
    /// The lesson's name.
    pub name: &'l Text,
    /// The step, counted from 1.
    pub step: usize,
    /// How many steps the lesson has.
    pub steps: usize,
    /// The part of the step.
    pub phase: Phase,
    /// What the room reads first; stays while it guesses.
    pub prompt: &'l Text,
    /// What it reads with the result; `None` until that is shown.
    pub reveal: Option<&'l Text>,
    /// What the presenter may say; only at the end of the step.
    pub talk: Option<&'l Text>,
    /// The guess, in steps that have one.
    pub guess: Option<GuessPage>,
    /// Whether the lesson ends with this page, as far as its file goes.
    pub is_last: bool,
}

/// The guess of a step. All numbers are in the reading's unit.
#[derive(Clone, Debug, PartialEq)]
pub struct GuessPage {
    /// What is guessed.
    pub reading: Reading,
    /// Lowest guess.
    pub least: f64,
    /// Highest guess.
    pub most: f64,
    /// Distance between two guesses.
    pub step: f64,
    /// The group that guesses now, counted from 0.
    pub group: u8,
    /// Where the knob stands, while a group guesses.
    pub hand: Option<f64>,
    /// Each group in its order: whether its guess is in, and from the reveal on the guess.
    pub groups: Vec<GroupPage>,
    /// Whether the guess was skipped on purpose.
    pub skipped: bool,
    /// What came out; only from the reveal on.
    pub result: Option<f64>,
    /// What most people say; only from the reveal on, and only where the lesson knows it.
    pub usual: Option<f64>,
    /// All guesses together, against the result; only from the reveal on.
    pub spread: Option<GuessSpread>,
}

/// A group and its guess.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct GroupPage {
    /// Whether its guess is in.
    pub is_in: bool,
    /// The guess; hidden until the reveal, so that no group copies another.
    pub value: Option<f64>,
}

impl<'l> Page<'l> {
    /// The page where a room is. `result` is what came out of the step; it is held back until the reveal. `None` where the
    /// progress is not of this lesson.
    pub fn of(lesson: &'l Lesson, progress: &Progress, result: Option<f64>) -> Option<Self> {
        let index = progress.step();
        let step = lesson.steps.get(index)?;
        let phase = progress.phase();
        let shown = phase >= Phase::Reveal;
        let guess = step.guess.map(|guess| {
            let of_group = |group: u8| {
                let kept = progress.guesses_of(index).find(|kept| kept.group == group);
                let value = kept.and_then(|kept| guess.value(kept.stop));
                GroupPage { is_in: kept.is_some(), value: value.filter(|_| shown) }
            };
            let values = progress.guesses_of(index).filter_map(|kept| guess.value(kept.stop));
            GuessPage {
                reading: guess.reading,
                least: guess.least,
                most: guess.most(),
                step: guess.step,
                group: progress.group(),
                hand: if phase == Phase::Guess { guess.value(progress.hand()) } else { None },
                groups: (0..progress.groups()).map(of_group).collect(),
                skipped: progress.is_skipped(index),
                result: result.filter(|_| shown),
                usual: guess.usual.filter(|_| shown),
                spread: if shown { guess_spread(values, result) } else { None },
            }
        });
        let last_phase = match (&step.talk, &step.reveal) {
            (Some(_), _) => Phase::Talk,
            (None, Some(_)) => Phase::Reveal,
            (None, None) => Phase::Prompt,
        };
        Some(Page {
            name: &lesson.name,
            step: index + 1,
            steps: lesson.steps.len(),
            phase,
            prompt: &step.prompt,
            reveal: step.reveal.as_ref().filter(|_| shown),
            talk: step.talk.as_ref().filter(|_| phase == Phase::Talk),
            guess,
            is_last: step.then.is_none() && phase == last_phase,
        })
    }
}
