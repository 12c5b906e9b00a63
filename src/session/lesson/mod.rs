//! A lesson that is led: which page is open, what a turn and a press do there, and where the instrument has to stand.
//!
//! Pure, like the session beside which it stands: events in, a new state out, no clock, no words, no water. The pages of
//! a step are the prompt, the guess, the result beside the guesses, the valley itself (with the dials that the step lets
//! the room turn), and what the presenter may say. A step without a guess goes from the prompt straight to the valley.
//!
//! # One encoder, one button
//!
//! - On a page of words a **press** goes on. A **turn** goes through what else can be done: back, everything else, the
//!   end of the lesson.
//! - While a group guesses a **turn** moves its guess and a **press** puts it in; the next group is asked. When all are
//!   in, a press shows the result. To **hold** offers more: show the result with the guesses that are in, go on without
//!   one, another group, the word of another board.
//! - At the valley a **turn** turns the dial in hand and a **press** goes on.
//! - To **hold** anywhere else clears all guesses and begins anew for the next group; undo brings them back.
//!
//! # What the host does
//!
//! It gives every event to [`Led::take`] first, and to the session only where [`Taken::pass`]. It opens a lesson when
//! [`Taken::open`] asks for one ([`Led::begin`]), and when [`Taken::stand`] says that the instrument has to stand
//! elsewhere, it takes the offer that [`Led::arrange`] makes. What must outlive a power cut is [`Led::kept`], a value
//! that goes through `serde`; [`Led::take_up`] brings it back.

mod choices;
mod course;
mod hands;
mod page;
mod sayings;
mod stand;
mod word_entry;

use serde::{Deserialize, Serialize};

pub use choices::{Choice, MOST_CHOICES};
pub use course::{Course, NotOpened, ShelfEntry};
pub use page::Voices;
pub use word_entry::WordEntry;

use super::setting::NamedSetting;
use crate::lesson::{MOST_GROUPS, Phase, Progress};
use crate::water::dials::{Dial, DialRange};

/// Groups that are asked at first; a person turns it to more or fewer.
pub const USUAL_GROUPS: u8 = 4;

/// A part of the hour.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Part {
    /// Which lesson?
    List,
    /// What it is about, and how many groups there are.
    Start,
    /// Its steps.
    Steps,
    /// It is over.
    Over,
}

/// A word to the person at the knob, until the next event.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Note {
    /// No guess is in yet.
    NeedsGuess,
    /// This group's guess is in.
    In(u8),
    /// The word from another board does not fit.
    WrongWord,
    /// This letter cannot stand here.
    WrongLetter,
    /// All guesses were cleared, and undo brings them back.
    Cleared,
    /// The lesson cannot be led on this place.
    NotHere,
}

/// What a place offers without a lesson.
#[derive(Clone, Debug, PartialEq)]
struct Free {
    dials: Vec<(Dial, DialRange)>,
    settings: Vec<NamedSetting>,
}

/// A led lesson, or the list of them.
#[derive(Clone, Debug, PartialEq)]
pub struct Led {
    shelf: Vec<ShelfEntry>,
    part: Part,
    entry: usize,
    groups: u8,
    course: Option<Course>,
    progress: Option<Progress>,
    /// Whether the valley itself is looked at, after the result may be seen.
    looking: bool,
    /// Which choice is at hand, where choices are open.
    bar: Option<usize>,
    word: Option<WordEntry>,
    note: Option<Note>,
    cleared: Option<Progress>,
    /// What the place offers without a lesson.
    free: Option<Free>,
}

/// What outlives a power cut.
#[derive(Clone, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct Kept {
    /// By which the lesson is opened again.
    pub lesson: String,
    /// The lesson's stamp: another one means that the file was changed.
    pub stamp: u8,
    /// Where the room is, and all guesses.
    pub progress: Progress,
    /// Whether the valley itself was looked at.
    pub looking: bool,
}

/// What became of an event.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub struct Taken {
    /// Whether the session gets an event: the same one, or another in its place.
    pub pass: Pass,
    /// A lesson of the list to open, counted from 0.
    pub open: Option<usize>,
    /// Whether the instrument has to stand elsewhere.
    pub stand: bool,
    /// Whether something that can be seen has changed.
    pub redraw: bool,
}

/// What the session gets.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum Pass {
    /// The event as it came.
    #[default]
    AsItCame,
    /// Nothing.
    Nothing,
    /// A press that opens the ring, over the view behind the page ([`Led::view_behind`]).
    Ring,
    /// The lesson's page.
    Page,
}

impl Taken {
    const fn here() -> Self {
        Taken { pass: Pass::Nothing, open: None, stand: false, redraw: true }
    }

    const fn standing() -> Self {
        Taken { stand: true, ..Taken::here() }
    }
}

impl Led {
    /// The list of lessons, with none open.
    pub fn new(shelf: Vec<ShelfEntry>) -> Self {
        Self {
            shelf,
            part: Part::List,
            entry: 0,
            groups: USUAL_GROUPS,
            course: None,
            progress: None,
            looking: false,
            bar: None,
            word: None,
            note: None,
            cleared: None,
            free: None,
        }
    }

    /// The lessons of the list.
    pub fn shelf(&self) -> &[ShelfEntry] {
        &self.shelf
    }

    /// Which part of the hour it is.
    pub fn part(&self) -> Part {
        self.part
    }

    /// The lesson that is open.
    pub fn course(&self) -> Option<&Course> {
        self.course.as_ref()
    }

    /// Where the room is in it, and its guesses.
    pub fn progress(&self) -> Option<&Progress> {
        self.progress.as_ref()
    }

    /// Whether the valley itself is looked at.
    pub fn is_looking(&self) -> bool {
        self.part == Part::Steps && self.looking
    }

    /// How many groups are asked.
    pub fn groups(&self) -> u8 {
        self.groups
    }

    /// The word that is being typed.
    pub fn word(&self) -> Option<&WordEntry> {
        self.word.as_ref()
    }

    /// What the person at the knob is told.
    pub fn note(&self) -> Option<Note> {
        self.note
    }

    /// Opens a lesson at its first page.
    pub fn begin(&mut self, course: Course) {
        self.course = Some(course);
        (self.part, self.progress, self.cleared) = (Part::Start, None, None);
        self.turn_page();
    }

    /// The lesson that was asked for cannot be led here.
    pub fn refuse(&mut self) {
        self.note = Some(Note::NotHere);
    }

    /// Asks so many groups, 1 to [`MOST_GROUPS`], when the steps begin; `false` where that is no such number.
    pub fn ask_groups(&mut self, groups: u8) -> bool {
        let fine = (1..=MOST_GROUPS).contains(&usize::from(groups));
        if fine {
            self.groups = groups;
        }
        fine
    }

    /// What has to outlive a power cut; `None` while no step is open.
    pub fn kept(&self) -> Option<Kept> {
        let (course, progress) = (self.course.as_ref()?, self.progress.as_ref()?);
        let Course { key, lesson, .. } = course;
        let looking = self.looking;
        Some(Kept { lesson: key.clone(), stamp: lesson.stamp, progress: progress.clone(), looking })
    }

    /// Takes up what was kept, in the lesson opened anew. Where the file was changed meanwhile and nothing fits, the
    /// lesson begins at its first page, and the answer is `false`.
    pub fn take_up(&mut self, course: Course, kept: Kept) -> bool {
        let fits = course.lesson.stamp == kept.stamp && course.key == kept.lesson;
        let progress = if fits { kept.progress.resume(&course.lesson) } else { None };
        self.begin(course);
        let Some(progress) = progress else { return false };
        self.groups = progress.groups();
        let may_look = progress.phase() == Phase::Reveal || self.guess_of(&progress).is_none();
        (self.part, self.progress, self.looking) = (Part::Steps, Some(progress), kept.looking && may_look);
        true
    }

    fn guess_of(&self, progress: &Progress) -> Option<crate::lesson::Guess> {
        self.course.as_ref()?.lesson.steps.get(progress.step())?.guess
    }

    fn phase(&self) -> Option<Phase> {
        self.progress.as_ref().map(Progress::phase)
    }

    /// Whether the step's result was shown already, so that nobody can guess any more.
    fn is_closed(&self) -> bool {
        self.progress.as_ref().is_some_and(|progress| progress.is_revealed(progress.step()))
    }

    fn guesses_in(&self) -> usize {
        self.progress.as_ref().map_or(0, |progress| progress.guesses_of(progress.step()).count())
    }

    fn is_guessing(&self) -> bool {
        self.part == Part::Steps && self.phase() == Some(Phase::Guess) && self.bar.is_none() && !self.is_closed()
    }
}
