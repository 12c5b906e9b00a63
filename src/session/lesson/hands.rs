//! What a turn, a press and a hold do on every page of a lesson.

use super::{Choice, Led, Note, Part, Pass, Taken, WordEntry};
use crate::lesson::{MOST_GROUPS, Moved, Phase, Progress};
use crate::session::command::Command;
use crate::session::event::Event;
use crate::session::keys::{Key, command_of};
use crate::session::knob::{along, around};
use crate::session::ring::Item;
use crate::session::state::{Focus, State};
use crate::session::view::View;

impl Led {
    /// Moves the guess at hand to a share of its axis, 0 to 1, as a finger on it does; nothing where no group guesses.
    pub fn guess_at(&mut self, share: f64) -> Taken {
        let open = self.is_guessing() && share.is_finite();
        if let (Some(course), Some(progress), true) = (&self.course, &mut self.progress, open) {
            let guess = course.lesson.steps.get(progress.step()).and_then(|step| step.guess);
            let last = guess.map_or(0.0, |guess| f64::from(guess.stops) - 1.0);
            let stop = libm::round(share.clamp(0.0, 1.0) * last) as i32;
            progress.turn(&course.lesson, stop - i32::from(progress.hand()));
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
    pub(super) fn turn_page(&mut self) {
        self.looking = false;
        self.bar = None;
        self.word = None;
        self.note = None;
    }
}

fn is_settings(focus: Focus) -> bool {
    matches!(focus, Focus::In(Item::Settings))
}
