//! The page of a lesson: a question in large letters, a guess on an axis, the result beside all guesses, a word for
//! whoever leads.
//!
//! Everything comes as words and as shares along an axis; nothing is read off a run here. What must not be seen yet is
//! not in the data.

mod axis;
mod marks;
mod openers;
mod pages;
mod strip;
mod touch;

use embedded_graphics::geometry::{OriginDimensions, Size};

use super::layout::Layout;
use crate::picture::{Canvas, Theme};

pub use strip::{draw_strip, strip_px};
pub use touch::{LessonTouched, touched};

/// A sentence in the room's one or two languages.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct Saying {
    /// In the first.
    pub first: String,
    /// In the second, where two are spoken.
    pub second: Option<String>,
}

/// What the page shows.
#[derive(Clone, Debug, PartialEq)]
pub struct LessonScene {
    /// The lesson's name, or what the list is called.
    pub title: String,
    /// "Step 3 of 10".
    pub step: String,
    /// How far the lesson has come: steps done and steps in all; `None` where no steps are counted.
    pub done: Option<(usize, usize)>,
    /// The page itself.
    pub body: Body,
    /// What a turn and a press do.
    pub foot: Foot,
}

/// The page itself.
#[derive(Clone, Debug, PartialEq)]
pub enum Body {
    /// Lessons to choose from; each with what it is about.
    List {
        /// Name, and what it is about.
        entries: Vec<(String, String)>,
        /// The one at hand.
        open: usize,
    },
    /// A lesson before its first step.
    Start {
        /// What it is about.
        about: Saying,
        /// How long it takes.
        minutes: String,
        /// "How many groups?".
        ask: String,
        /// How many; each has its mark.
        groups: u8,
    },
    /// A sentence to read, and a smaller one under it.
    Prompt {
        /// The question.
        prompt: Saying,
        /// What the room may turn, or where to look.
        hint: String,
    },
    /// A group guesses.
    Guess(GuessShown),
    /// The result beside the guesses.
    Reveal(RevealShown),
    /// For whoever leads.
    Talk {
        /// What this is.
        kicker: String,
        /// The question of the step.
        prompt: String,
        /// What may be said.
        talk: Saying,
    },
    /// Nothing more to do here.
    Over {
        /// The farewell.
        text: Saying,
    },
    /// A word from another board is typed.
    Word {
        /// What to do.
        ask: String,
        /// The letters so far.
        typed: String,
        /// The letter at hand.
        hand: Option<char>,
        /// Letters of a whole word.
        letters: usize,
    },
}

/// An axis and its marks.
#[derive(Clone, Debug, PartialEq)]
pub struct Axis {
    /// What is read along it, with its unit.
    pub title: String,
    /// Share of the way, 0 to 1, and what stands there.
    pub ticks: Vec<(f64, String)>,
    /// Where it is as it was, and how that is said; only for changes.
    pub rest: Option<(f64, String)>,
}

/// A guess that is made.
#[derive(Clone, Debug, PartialEq)]
pub struct GuessShown {
    /// The question.
    pub prompt: Saying,
    /// The axis.
    pub axis: Axis,
    /// The group that guesses, counted from 0.
    pub group: u8,
    /// "Group C".
    pub group_name: String,
    /// Where its guess stands, 0 to 1; `None` once guesses are closed.
    pub hand: Option<f64>,
    /// The same in words.
    pub value: String,
    /// For every group, whether its guess is in.
    pub is_in: Vec<bool>,
}

/// The result beside the guesses.
#[derive(Clone, Debug, PartialEq)]
pub struct RevealShown {
    /// What the room reads.
    pub reveal: Saying,
    /// "The model says".
    pub says: String,
    /// The result in words.
    pub result_text: String,
    /// The axis.
    pub axis: Axis,
    /// Where the result lies, a little beyond the axis where it has to; `None` where nothing came out.
    pub result: Option<f64>,
    /// Group and place of every guess that came in.
    pub guesses: Vec<(u8, f64)>,
    /// Lowest, middle and highest guess.
    pub spread: Option<(f64, f64, f64)>,
    /// What most people say, and how that is said.
    pub usual: Option<(f64, String)>,
    /// The guesses in a sentence.
    pub verdict: String,
}

/// The foot of the page.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct Foot {
    /// What is at hand to be done, between the others: its name, its place and how many there are.
    pub choice: Option<(String, usize, usize)>,
    /// What a turn and a press do.
    pub hint: String,
    /// The same in short, for a small screen.
    pub hint_short: String,
    /// A note to the person at the knob.
    pub note: Option<String>,
}

/// Draws the page.
pub fn draw(canvas: &mut Canvas<'_>, scene: &LessonScene, theme: &Theme) {
    let layout = layout_of(canvas.size());
    pages::draw(canvas, &layout, scene, theme);
}

fn layout_of(size: Size) -> Layout {
    Layout::of(size, false)
}
