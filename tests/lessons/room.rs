//! A room with one board: a led lesson and the session beside it, without water or screens.

use std::path::Path;
use std::sync::Mutex;

use deshielo::lesson::lessons;
use deshielo::picture::views::lesson::LessonScene;
use deshielo::session::answer::Source;
use deshielo::session::lesson::{Course, Led, Pass, Voices};
use deshielo::session::{Answers, Command, Event, Offer, OfferInput, Shade, State, View, Voice, YearList};
use deshielo::words::{System, Words};

use super::demo;

/// A lesson, the session that it leads, and what is offered.
pub struct Room {
    pub led: Led,
    pub state: State,
    pub offer: Offer,
}

/// Everything that the demo place offers.
pub fn offer() -> Offer {
    use std::sync::OnceLock;
    static OFFER: OnceLock<Offer> = OnceLock::new();
    OFFER
        .get_or_init(|| {
            let place = demo();
            let source = Source { valley: &place.valley, calendar: &place.calendar, record: &place.days };
            let answers = Answers::new(&source).unwrap();
            let voice =
                |first: &str, second: Option<&str>| Voice { first: first.into(), second: second.map(Into::into) };
            Offer::new(OfferInput {
                dials: place.dials.open().collect(),
                years: YearList::of(&answers.rest().run.years).unwrap(),
                views: View::ALL.into_iter().filter(|view| *view != View::Grid).collect(),
                terms: [1; 9],
                voices: vec![voice("en-US", None), voice("es-US", None), voice("en-US", Some("es-US"))],
                system: System::Us,
                shade: Shade::Light,
                settings: Vec::new(),
                help_pages: 1,
            })
            .unwrap()
        })
        .clone()
}

/// A lesson that is part of the program, opened for the demo place; each is opened once.
pub fn course(name: &str) -> Course {
    static OPENED: Mutex<Vec<Course>> = Mutex::new(Vec::new());
    let mut opened = OPENED.lock().unwrap();
    if let Some(course) = opened.iter().find(|course| course.key == name) {
        return course.clone();
    }
    let (_, text) = lessons().iter().find(|(known, _)| *known == name).unwrap();
    let course = Course::open(name, Path::new(name), text, demo()).unwrap();
    opened.push(course.clone());
    course
}

impl Room {
    /// A lesson at its first page.
    pub fn new(course: Course) -> Self {
        let offer = offer();
        let mut room = Room { led: Led::new(Vec::new()), state: State::new(&offer), offer };
        room.led.begin(course);
        room.stand();
        room
    }

    fn stand(&mut self) {
        self.offer = self.led.arrange(&self.offer, &mut self.state);
        assert_eq!(self.state.check(&self.offer), Ok(()));
    }

    /// Takes an event as the program does.
    pub fn step(&mut self, event: Event) {
        let taken = self.led.take(event, &self.state);
        assert_eq!(taken.open, None);
        if taken.stand {
            self.stand();
        }
        let passed = match taken.pass {
            Pass::AsItCame => Some(event),
            Pass::Nothing => None,
            Pass::Page => Some(Event::Command(Command::Show(View::Lesson))),
            Pass::Ring => {
                let view = self.led.view_behind(&self.offer);
                self.state.step(Event::Command(Command::Show(view)), &self.offer);
                Some(Event::Press)
            }
        };
        if let Some(event) = passed {
            self.state.step(event, &self.offer);
        }
        assert_eq!(self.state.check(&self.offer), Ok(()), "after {event:?}");
    }

    pub fn turn(&mut self, steps: i32) {
        self.step(Event::Command(Command::Turn(steps)));
    }

    pub fn press(&mut self) {
        self.step(Event::Press);
    }

    pub fn hold(&mut self) {
        self.step(Event::LongPress);
    }

    /// Presses until a guess is asked for.
    pub fn until_guess(&mut self) {
        for _ in 0..40 {
            if self.led.progress().is_some_and(|progress| progress.phase() == deshielo::lesson::Phase::Guess) {
                return;
            }
            self.press();
        }
        panic!("no guess is asked for");
    }

    pub fn scene(&self, words: &Words, second: Option<&Words>) -> LessonScene {
        self.led.scene(Voices { words, second, system: words.system() })
    }
}
