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
//! It gives every event to [`Led::take`] first, and to the session only where [`Taken::passes`]. It opens a lesson when
//! [`Taken::open`] asks for one ([`Led::begin`]), and when [`Taken::stands`] says that the instrument has to stand
//! elsewhere, it takes the offer that [`Led::arrange`] makes. What must outlive a power cut is [`Led::kept`], a value
//! that goes through `serde`; [`Led::take_up`] brings it back.

mod choices;
mod course;
mod page;
mod sayings;
mod stand;
mod word_entry;

use serde::{Deserialize, Serialize};

pub use choices::{Choice, MOST_CHOICES};
pub use course::{Course, NotOpened, ShelfEntry};
pub use page::Voices;
pub use word_entry::WordEntry;

use super::command::Command;
use super::event::Event;
use super::keys::{Key, command_of};
use super::knob::{along, around};
use super::setting::NamedSetting;
use super::state::{Focus, State};
use super::view::View;
use crate::lesson::{MOST_GROUPS, Moved, Phase, Progress};
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
    free: Option<(Vec<(Dial, DialRange)>, Vec<NamedSetting>)>,
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

    /// Moves the guess at hand to a share of its axis, 0 to 1, as a finger on it does; nothing where no group guesses.
    pub fn guess_at(&mut self, share: f64) -> Taken {
        if self.is_guessing() && share.is_finite() {
            if let (Some(course), Some(progress)) = (&self.course, &mut self.progress) {
                let guess = course.lesson.steps.get(progress.step()).and_then(|step| step.guess);
                let last = guess.map_or(0.0, |guess| f64::from(guess.stops) - 1.0);
                let stop = libm::round(share.clamp(0.0, 1.0) * last) as i32;
                progress.turn(&course.lesson, stop - i32::from(progress.hand()));
            }
        }
        Taken::here()
    }

    /// Takes an event before the session does.
    pub fn take(&mut self, event: Event, state: &State) -> Taken {
        let shown = state.shown();
        let on_page = shown.view == View::Lesson;
        // A card and the open ring are the session's own.
        if shown.card.is_some() || matches!(shown.focus, Focus::Ring(_)) || is_settings(shown.focus) {
            return Taken::default();
        }
        if matches!(event, Event::Tick { .. }) {
            return Taken::default();
        }
        if !on_page {
            return if self.part == Part::List { Taken::default() } else { self.take_away(event) };
        }
        if let (Some(_), Event::Key(Key::Char(letter))) = (&self.word, event) {
            return self.type_letter(letter);
        }
        let asked = match event {
            Event::Turn { detents, .. } => Command::Turn(detents),
            Event::Press => Command::Press,
            Event::LongPress => Command::Reset,
            Event::Key(key) => match command_of(key) {
                Some(command) => command,
                None => return Taken::default(),
            },
            Event::Command(command) => command,
            _ => return Taken::default(),
        };
        match asked {
            Command::Turn(_) | Command::Press | Command::Reset | Command::StepDial(_) => self.note = None,
            _ => {}
        }
        match asked {
            Command::Turn(steps) => self.turn(steps),
            Command::Press => self.press(),
            Command::Reset => self.hold(),
            Command::StepDial(steps) => self.sideways(steps),
            Command::Close => self.close(),
            Command::Undo => self.undo(),
            _ => Taken::default(),
        }
    }

    /// Away from the lesson's page: a press goes on from the valley, or back to the page.
    fn take_away(&mut self, event: Event) -> Taken {
        match event {
            Event::Press | Event::Key(Key::Enter) | Event::Command(Command::Press) if self.is_looking() => self.on(),
            Event::Press | Event::Key(Key::Enter) | Event::Command(Command::Press) => {
                Taken { pass: Pass::Page, ..Taken::here() }
            }
            Event::LongPress | Event::Command(Command::Reset) => self.clear(),
            _ => Taken::default(),
        }
    }

    fn turn(&mut self, steps: i32) -> Taken {
        let far = i64::from(steps);
        if let Some(word) = &mut self.word {
            word.turn(far);
            return Taken::here();
        }
        match self.part {
            Part::List => self.entry = along(self.entry, self.shelf.len(), far).0,
            Part::Start => {
                let (groups, _) = along(usize::from(self.groups) - 1, MOST_GROUPS, far);
                self.groups = groups as u8 + 1;
            }
            Part::Steps | Part::Over if self.is_guessing() => {
                if let (Some(course), Some(progress)) = (&self.course, &mut self.progress) {
                    progress.turn(&course.lesson, steps);
                }
            }
            Part::Steps | Part::Over => {
                self.bar = Some(around(self.bar.unwrap_or(0), self.choices().len(), far));
            }
        }
        Taken::here()
    }

    fn press(&mut self) -> Taken {
        if let Some(word) = &mut self.word {
            if let Some(whole) = word.press() {
                self.put_word(&whole);
            }
            return Taken::here();
        }
        match self.part {
            Part::List if self.shelf.is_empty() => Taken::here(),
            Part::List => Taken { open: Some(self.entry), ..Taken::here() },
            Part::Start => self.start(),
            _ if self.is_guessing() => self.put(),
            _ => match self.choice() {
                Some(choice) => self.act(choice),
                None => Taken::here(),
            },
        }
    }

    /// Holding: more to choose from while groups guess, a clean page for the next room elsewhere.
    fn hold(&mut self) -> Taken {
        if self.word.take().is_some() {
            return Taken::here();
        }
        match self.part {
            Part::List => Taken { pass: Pass::Ring, ..Taken::here() },
            Part::Start => self.leave(),
            _ if self.is_guessing() => {
                self.bar = Some(0);
                Taken::here()
            }
            _ => self.clear(),
        }
    }

    /// Left and right: another group while groups guess, a page elsewhere.
    fn sideways(&mut self, steps: i32) -> Taken {
        match self.part {
            Part::List | Part::Start => self.turn(steps),
            _ if self.word.is_some() => self.turn(steps),
            _ if self.is_guessing() => self.other_group(steps),
            _ if steps < 0 => self.back(),
            _ => self.on(),
        }
    }

    fn close(&mut self) -> Taken {
        if let Some(word) = &mut self.word {
            if !word.back() {
                self.word = None;
            }
            return Taken::here();
        }
        match (self.part, self.phase()) {
            (Part::Start, _) => self.leave(),
            (Part::Steps, Some(Phase::Guess)) if self.bar.take().is_some() => Taken::here(),
            (Part::Steps | Part::Over, _) => self.back(),
            _ => Taken::default(),
        }
    }

    fn undo(&mut self) -> Taken {
        match self.cleared.take() {
            Some(progress) => {
                self.groups = progress.groups();
                self.progress = Some(progress);
                self.part = Part::Steps;
                self.turn_page();
                Taken::standing()
            }
            None => Taken { pass: Pass::Nothing, ..Taken::default() },
        }
    }

    fn act(&mut self, choice: Choice) -> Taken {
        match choice {
            Choice::On | Choice::Show => self.on(),
            Choice::Skip => {
                if let (Some(course), Some(progress)) = (&self.course, &mut self.progress) {
                    progress.skip(&course.lesson);
                }
                self.turn_page();
                Taken::standing()
            }
            Choice::Guess => {
                self.bar = None;
                Taken::here()
            }
            Choice::Group => {
                self.bar = None;
                self.other_group(1)
            }
            Choice::Word => {
                self.word = Some(WordEntry::default());
                Taken::here()
            }
            Choice::Back => self.back(),
            Choice::More => Taken { pass: Pass::Ring, ..Taken::here() },
            Choice::Again => self.clear(),
            Choice::Leave => self.leave(),
        }
    }

    fn start(&mut self) -> Taken {
        let Some(course) = &self.course else { return Taken::here() };
        self.progress = Progress::new(&course.lesson, self.groups);
        self.part = if self.progress.is_some() { Part::Steps } else { Part::List };
        self.cleared = None;
        self.turn_page();
        Taken::standing()
    }

    fn put(&mut self) -> Taken {
        if let (Some(course), Some(progress)) = (&self.course, &mut self.progress) {
            let group = progress.group();
            if progress.put(&course.lesson) == Moved::Done {
                self.note = Some(Note::In(group));
                let all_in = progress.guesses_of(progress.step()).count() >= usize::from(progress.groups());
                self.bar = all_in.then_some(0);
            }
        }
        Taken::here()
    }

    fn put_word(&mut self, whole: &str) {
        let (Some(course), Some(progress)) = (&self.course, &mut self.progress) else { return };
        let before: Vec<_> = progress.guesses_of(progress.step()).collect();
        match progress.put_word(&course.lesson, whole) {
            Ok(Moved::Done) => {
                let changed = progress.guesses_of(progress.step()).find(|guess| !before.contains(guess));
                self.note = changed.map(|guess| Note::In(guess.group));
                self.word = None;
                self.bar = Some(0);
            }
            _ => {
                self.note = Some(Note::WrongWord);
                self.word = Some(WordEntry::default());
            }
        }
    }

    fn type_letter(&mut self, letter: char) -> Taken {
        self.note = None;
        let Some(word) = &mut self.word else { return Taken::here() };
        match word.letter(letter) {
            Ok(Some(whole)) => self.put_word(&whole),
            Ok(None) => {}
            Err(()) => self.note = Some(Note::WrongLetter),
        }
        Taken::here()
    }

    fn other_group(&mut self, steps: i32) -> Taken {
        if let (Some(course), Some(progress)) = (&self.course, &mut self.progress) {
            let group = around(progress.group().into(), progress.groups().into(), steps.into());
            progress.choose_group(&course.lesson, group as u8);
        }
        Taken::here()
    }

    /// On to the next page.
    fn on(&mut self) -> Taken {
        let Some(course) = &self.course else { return Taken::here() };
        let Some(progress) = &mut self.progress else { return self.start() };
        if self.part == Part::Over {
            return Taken::here();
        }
        let Some(step) = course.lesson.steps.get(progress.step()) else { return Taken::here() };
        let shown = match step.guess {
            Some(_) => Phase::Reveal,
            None => Phase::Prompt,
        };
        if !self.looking && progress.phase() == shown {
            self.turn_page();
            self.looking = true;
            return Taken::standing();
        }
        let result = course.results.get(progress.step()).copied().flatten();
        match progress.forward(&course.lesson, result) {
            Moved::NeedsGuess => self.note = Some(Note::NeedsGuess),
            Moved::AtEnd => {
                self.turn_page();
                self.part = Part::Over;
            }
            _ => self.turn_page(),
        }
        Taken::standing()
    }

    fn back(&mut self) -> Taken {
        let (Some(course), Some(progress)) = (&self.course, &mut self.progress) else { return Taken::here() };
        if self.part == Part::Over {
            self.part = Part::Steps;
            self.turn_page();
            return Taken::standing();
        }
        let was_looking = std::mem::take(&mut self.looking);
        if !was_looking {
            let looks_before = progress.phase() == Phase::Talk;
            if progress.back(&course.lesson) == Moved::AtStart {
                self.part = Part::Start;
            }
            self.turn_page();
            self.looking = looks_before;
        } else {
            self.turn_page();
        }
        Taken::standing()
    }

    /// Everything anew for the next room.
    fn clear(&mut self) -> Taken {
        if let Some(progress) = self.progress.take() {
            self.cleared = Some(progress);
        }
        self.part = Part::Start;
        self.turn_page();
        self.note = self.cleared.is_some().then_some(Note::Cleared);
        Taken::standing()
    }

    fn leave(&mut self) -> Taken {
        (self.course, self.progress, self.cleared) = (None, None, None);
        self.part = Part::List;
        self.turn_page();
        Taken::standing()
    }

    /// A new page has nothing open on it.
    fn turn_page(&mut self) {
        self.looking = false;
        self.bar = None;
        self.word = None;
        self.note = None;
    }
}

fn is_settings(focus: Focus) -> bool {
    matches!(focus, Focus::In(super::ring::Item::Settings))
}
