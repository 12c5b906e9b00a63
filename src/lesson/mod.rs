//! Lessons: a script of steps that leads a room through an hour, with a guess before every answer.
//!
//! A lesson is a file of `scenarios/`. It is read for a place ([`read_lesson`]), which must have the dials that it turns,
//! and checked against that place's water ([`check_lesson`]): each expectation in it must come out, and each guess must be
//! one that the knob can reach. [`Progress`] steps through it, keeps the guesses of every group and shows no result
//! before a guess is in. [`Page`] is what a picture needs to draw a step.
//!
//! # How a lesson is written
//!
//! ```toml
//! name = { en = "Less snow, more rain", es = "Menos nieve, más lluvia" }
//! text = { en = "...", es = "..." }     # what it is about, for a list of lessons
//! minutes = 60
//!
//! [[step]]
//! key = "warmer"                        # any short word; `then` and `if_far` point to it
//! view = "valley"                       # valley, season, canals, ledger, years, grid or trust
//! year = "middling"                     # dry, middling, wet, driest, wettest, or a water year of the record
//! dials = { warming = 2 }               # every dial that is not named rests
//! allow = { warming = { least = 0, most = 3, step = 1 } }  # what the room may turn; without it, nothing
//! then = "wetter"                       # the step that follows; the next in the file where it is not said
//! [step.prompt]                         # what the room reads first
//! en = "..."
//! es = "..."
//! [step.guess]                          # what each group guesses before anything moves
//! sign = "melt_out_date"                # with `canal = "newest"`, "oldest" or a canal's key: a sign of that canal
//! of = "change"                         # the change from as it was, or the "value" itself
//! over = "year"                         # the year that is shown, or the mean of "all_years"
//! least = -40
//! most = 20
//! step = 5
//! near = 5                              # a guess this close is close; one step where it is not said
//! usual = 0                             # what most people say, where that is known to be wrong
//! if_far = "again"                      # the step to take when the middle guess was not close
//! [step.reveal]                         # what the room reads when the result is shown
//! [step.talk]                           # what the presenter may say
//! [[step.expect]]                       # what must come out on the demo place; `check` and the tests hold it
//! sign = "melt_out_date"
//! of = "change"
//! is = "below"                          # above, below (value), between (least, most), or none
//! value = -7
//! ```
//!
//! The value of a date is written as month and day (`"05-20"`), its change in days. In a step with a guess the dials
//! stand as in the step before until the result is shown.

mod check;
mod measure;
mod page;
mod progress;
mod read;
mod read_step;
mod script;
mod shipped;
mod spread;
mod waters;
mod word;

pub use check::{LessonOutcome, check_lesson, read_lesson};
pub use measure::{CANAL_SIGNS, CanalSign, LESSON_SIGNS, LessonSign, Measure, Over, Quantity, Reading, Shape};
pub use page::{GroupPage, GuessPage, Page};
pub use progress::{GroupGuess, MOST_GROUPS, MOST_KEPT, Moved, Phase, Progress, Stage};
pub use script::{
    Allowed, Expectation, Guess, Lesson, MOST_ALLOWED, MOST_GUESS_STOPS, MOST_NAME, MOST_PROMPT, MOST_REVEAL,
    MOST_STEPS, MOST_TALK, Relation, SHOWS, Shows, Step,
};
pub use shipped::lessons;
pub use spread::{GuessSpread, guess_spread};
pub use waters::Waters;
pub use word::{WORD_LETTERS, WordFault, guess_of_word, word_letter, word_letters, word_of_guess};
