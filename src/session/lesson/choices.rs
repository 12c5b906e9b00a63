//! What can be done on a page of a lesson, one thing at hand at a time: turning goes through them, a press does it.

use heapless::Vec as FixedVec;

use super::{Led, Part};
use crate::lesson::Phase;

/// Most things to choose from on a page.
pub const MOST_CHOICES: usize = 8;

/// One of them.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Choice {
    /// Go on to the next page.
    On,
    /// Show the result, now that a guess is in.
    Show,
    /// Show the result without a guess, on purpose.
    Skip,
    /// Go on guessing.
    Guess,
    /// Let another group change its guess.
    Group,
    /// Type the word of another board.
    Word,
    /// Go back a page.
    Back,
    /// The ring of everything else: dials, pages, year, language.
    More,
    /// Begin anew for the next group.
    Again,
    /// Back to the list of lessons.
    Leave,
}

impl Choice {
    /// The message that names it.
    pub const fn message(self) -> &'static str {
        match self {
            Choice::On => "lesson-do-on",
            Choice::Show => "lesson-do-show",
            Choice::Skip => "lesson-do-skip",
            Choice::Guess => "lesson-do-guess",
            Choice::Group => "lesson-do-group",
            Choice::Word => "lesson-do-word",
            Choice::Back => "lesson-do-back",
            Choice::More => "lesson-do-more",
            Choice::Again => "lesson-do-again",
            Choice::Leave => "lesson-do-leave",
        }
    }
}

impl Led {
    /// What can be done on the page at hand; empty where turning has another meaning.
    pub fn choices(&self) -> FixedVec<Choice, MOST_CHOICES> {
        let list: &[Choice] = match (self.part, self.phase()) {
            (Part::List | Part::Start, _) => &[],
            (Part::Over, _) => &[Choice::Again, Choice::Back, Choice::Leave, Choice::More],
            (Part::Steps, Some(Phase::Guess)) if self.is_closed() => {
                &[Choice::Show, Choice::Back, Choice::More, Choice::Leave]
            }
            (Part::Steps, Some(Phase::Guess)) if self.bar.is_none() => &[],
            (Part::Steps, Some(Phase::Guess)) if self.guesses_in() == 0 => {
                &[Choice::Guess, Choice::Group, Choice::Word, Choice::Skip, Choice::Back, Choice::More, Choice::Leave]
            }
            (Part::Steps, Some(Phase::Guess)) => {
                &[Choice::Show, Choice::Guess, Choice::Group, Choice::Word, Choice::Back, Choice::More, Choice::Leave]
            }
            (Part::Steps, _) => &[Choice::On, Choice::Back, Choice::More, Choice::Leave],
        };
        list.iter().copied().collect()
    }

    /// The one at hand.
    pub fn choice(&self) -> Option<Choice> {
        self.choices().get(self.bar.unwrap_or(0)).copied()
    }
}
