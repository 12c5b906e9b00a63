//! Lessons on the instrument: the list, opening one, and the frames that they draw.

use std::path::{Path, PathBuf};

use embedded_graphics::geometry::{Point, Size};

use super::drawing::{Drawing, theme};
use super::player::Player;
use crate::board::FrameSize;
use crate::commands::failure::Failure;
use crate::commands::settings::{SettingText, read_text};
use crate::commands::snippets::{Texts, report};
use crate::commands::speech::Speech;
use crate::lesson::{Lesson, lessons};
use crate::picture::views::lesson::{self as page, LessonTouched};
use crate::place::Place;
use crate::session::lesson::{Course, Led, NotOpened, Pass, ShelfEntry, Taken, Voices};
use crate::session::{Command, Event, Focus, Item, View};
use crate::words::{Words, nearest};

/// A lesson's file, before it is read for a place.
#[derive(Clone, Debug)]
pub(in crate::commands) struct LessonText {
    key: String,
    file: PathBuf,
    text: String,
}

impl LessonText {
    /// The lessons that are part of the program.
    pub fn built_in() -> Vec<Self> {
        let of = |(key, text): &(&str, &str)| Self {
            key: (*key).to_owned(),
            file: format!("{key}.toml").into(),
            text: (*text).to_owned(),
        };
        lessons().iter().map(of).collect()
    }

    /// The lesson that a command line names: a file goes before what is part of the program.
    pub fn find(name: &Path, words: &Words) -> Result<Self, Failure> {
        let shown = name.display().to_string();
        if name.is_file() {
            let SettingText { file, text } = read_text(name, words)?;
            return Ok(Self { key: shown, file, text });
        }
        let known = Self::built_in();
        if let Some(found) = known.iter().find(|lesson| lesson.key == shown) {
            return Ok(found.clone());
        }
        if name.extension().is_some() || name.components().count() > 1 {
            return Err(Failure::input(words.say("error-file-not-found", &[("path", shown.into())])));
        }
        let keys: Vec<&str> = known.iter().map(|lesson| lesson.key.as_str()).collect();
        let lesson = ("lesson", shown.as_str().into());
        Err(Failure::input(match nearest(&shown, keys.iter().copied()) {
            Some(near) => words.say("error-lesson-unknown-nearest", &[lesson, ("nearest", near.into())]),
            None => words.say("error-lesson-unknown", &[lesson, ("lessons", keys.join(", ").into())]),
        }))
    }

    /// Reads it for a place and runs its water.
    pub fn open(&self, place: &Place, words: &Words) -> Result<Course, Failure> {
        Course::open(&self.key, &self.file, &self.text, place).map_err(|trouble| match trouble {
            NotOpened::River(fault) => Failure::input(words.say("error-river-fault", &[("value", fault.value.into())])),
            NotOpened::Problems(problems) => {
                let shown = [(self.file.to_string_lossy().into_owned(), self.text.clone())];
                let told = report(&problems, &mut Texts::given(&shown), words);
                let path = self.file.display().to_string();
                let line = words.say("error-lesson-has-problems", &[("path", path.into())]);
                Failure::Input(vec![told, String::new(), line])
            }
        })
    }
}

/// The list of those built-in lessons that this place has the dials for. What each is called and about is read without
/// its water; the few that do not fit are left out.
pub(super) fn shelf(place: &Place, texts: &[LessonText]) -> Vec<(LessonText, ShelfEntry)> {
    let Ok(waters) = crate::lesson::Waters::new(place) else { return Vec::new() };
    let read = |text: &LessonText| {
        let Lesson { name, text: about, minutes, .. } =
            crate::lesson::read_lesson(&text.file, &text.text, &waters).lesson?;
        Some((text.clone(), ShelfEntry { key: text.key.clone(), name, text: about, minutes }))
    };
    texts.iter().filter_map(read).collect()
}

impl Player {
    /// Opens a lesson at its first page.
    pub fn lead(&mut self, lesson: &LessonText, speech: &Speech) -> Result<(), Failure> {
        let course = lesson.open(&self.place, &speech.words)?;
        self.led.begin(course);
        self.stand();
        Ok(())
    }

    /// What is led, for those who ask: a tally, a rehearsal, a store that outlives power cuts.
    pub fn led(&self) -> &Led {
        &self.led
    }

    /// Asks so many groups; `false` where that is no such number.
    pub fn ask_groups(&mut self, groups: u8) -> bool {
        self.led.ask_groups(groups)
    }

    /// Lets the lesson have an event first; gives what the session gets.
    pub(super) fn led_first(&mut self, event: Event) -> Option<Event> {
        let taken = self.led.take(event, &self.state);
        let Taken { pass, open, stand, redraw } = taken;
        if let Some(index) = open {
            self.open_from_shelf(index);
        }
        if stand {
            self.stand();
        }
        if redraw {
            self.stamp += 1;
        }
        match pass {
            Pass::AsItCame => Some(event),
            Pass::Nothing => None,
            Pass::Ring => {
                self.step_session(Event::Command(Command::Show(self.led.view_behind(&self.offer))));
                Some(Event::Press)
            }
            Pass::Page => Some(Event::Command(Command::Show(View::Lesson))),
        }
    }

    fn open_from_shelf(&mut self, index: usize) {
        let opened = self.shelf.get(index).map(|text| {
            let (first, _) = &self.voices[self.state.shown().voice];
            text.open(&self.place, first)
        });
        match opened {
            Some(Ok(course)) => {
                self.led.begin(course);
                self.stand();
            }
            _ => self.led.refuse(),
        }
    }

    /// Brings dials, year and view to where the lesson wants them.
    fn stand(&mut self) {
        self.offer = self.led.arrange(&self.offer, &mut self.state);
        self.asked_water = true;
        self.stamp += 1;
    }

    /// Pixels at the foot of a screen that the lesson's strip takes.
    pub(super) fn strip_px(&self, size: FrameSize) -> u16 {
        if self.state.shown().view == View::Lesson || !self.led.is_looking() {
            return 0;
        }
        let two = self.voices[self.state.shown().voice].1.is_some();
        page::strip_px(Size::new(size.width.into(), size.height.into()), two) as u16
    }

    /// What the foot of a view says while a lesson looks at it: the step, and that a press goes on.
    pub(super) fn led_note(&self) -> Option<String> {
        let opens_nothing = matches!(self.state.shown().focus, Focus::In(item) if item != Item::Settings);
        let (_, step, hint) = self.led.strip(self.spoken()).filter(|_| opens_nothing)?;
        Some(format!("{step} · {hint}"))
    }

    /// Whether the lesson's own page is on the screen, with no card or list over it.
    fn is_lesson_page(&self) -> bool {
        let shown = self.state.shown();
        shown.view == View::Lesson && shown.card.is_none() && shown.focus != Focus::In(Item::Settings)
    }

    /// A finger or a mouse on the lesson's page, as an event; `false` where another page is on the screen.
    pub(super) fn point_at_lesson(&mut self, is_down: bool, is_up: bool, at: Point, size: Size) -> bool {
        if !self.is_lesson_page() {
            return false;
        }
        let touched = page::touched(size, &self.led.scene(self.spoken()), at);
        match touched {
            // The guess follows the finger; whatever acts waits until it is lifted.
            LessonTouched::Guess(share) if !is_up => {
                self.led.guess_at(share);
                self.stamp += 1;
            }
            LessonTouched::Step(steps) if is_down => self.step(Event::Command(Command::Turn(steps))),
            LessonTouched::Take if is_up => self.step(Event::Press),
            _ => {}
        }
        true
    }

    fn spoken(&self) -> Voices<'_> {
        let shown = self.state.shown();
        let (words, second) = &self.voices[shown.voice];
        Voices { words, second: second.as_ref(), system: shown.system }
    }

    /// Draws what the lesson adds to a frame: its own page over the whole of it, or the strip under a view.
    pub(super) fn draw_lesson(&self, drawing: &mut Drawing) {
        let shown = self.state.shown();
        let theme = theme(shown.shade);
        let voices = self.spoken();
        if self.is_lesson_page() {
            let scene = self.led.scene(voices);
            drawing.draw_over(|canvas, _| page::draw(canvas, &scene, theme));
        } else if let Some((saying, step, hint)) = self.led.strip(voices) {
            let beside = (step.as_str(), hint.as_str());
            drawing.draw_foot(|canvas, screen| page::draw_strip(canvas, screen, &saying, beside, theme));
        }
    }
}
