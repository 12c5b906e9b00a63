//! The instrument that is played: a place, the session on it, the answers of the water, and the frames of the views.

use std::sync::Arc;
use std::time::{Duration, Instant};

use embedded_graphics::geometry::{Point, Size};

use super::doubt::Doubts;
use super::drawing::{Drawing, Shows, VIEWS, page};
use super::droughts::with_droughts;
use super::hands::Clock;
use super::leading::{LessonText, shelf};
use super::mapping::{self, Mapper};
use super::skill::OwnSkill;
use crate::board::{Caption, Frame, FrameSize, HandEvent, Instrument, PointerPhase};
use crate::commands::failure::Failure;
use crate::commands::places::Opened;
use crate::commands::speech::Speech;
use crate::commands::tell::usual_system;
use crate::picture::views::facts::PlaceFacts;
use crate::picture::views::hand::Hand;
use crate::picture::views::{Scene, help, term};
use crate::place::{Place, Setting};
use crate::session::answer::{Asked, Source, YearDetail};
use crate::session::hand::{HandTold, Told};
use crate::session::help::key_lines;
use crate::session::lesson::Led;
use crate::session::point::{Finger, Phase};
use crate::session::scene::{Moment, PlaceTold, Stage, facts_of, settings};
use crate::session::{Answers, Event, Needs, Offer, OfferInput, Shade, State, View, Voice, YearList};
use crate::words::{System, Words};

/// The languages that are offered beside the one asked for.
const LANGUAGES: [&str; 2] = ["en", "es"];

/// A session under way.
pub(in crate::commands) struct Player {
    pub(super) place: Arc<Place>,
    /// Whether the fit in use is stale; `None` without one.
    fit: Option<bool>,
    skill: Option<OwnSkill>,
    /// How far the answer may be off; `None` without an ensemble.
    doubts: Option<Doubts>,
    percent_per_degree: Option<f64>,
    pub(super) offer: Offer,
    /// What the settings of the offer are called.
    settings: Vec<Setting>,
    voice_names: Vec<String>,
    pub(super) state: State,
    pub(super) answers: Answers,
    pub(super) mapper: Mapper,
    /// One entry for each voice of the offer: the first language and the second, if there are two.
    pub(super) voices: Vec<(Words, Option<Words>)>,
    clock: Clock,
    pub(super) drawings: Vec<Drawing>,
    /// Goes up with everything that can be seen.
    pub(super) stamp: u64,
    pub(super) asked_water: bool,
    finger: Finger,
    /// How long the water took for its last answer.
    work_takes: Duration,
    /// An answer that takes longer than this is announced first.
    patience: Duration,
    /// The old answer is, or will be, on the screen with its mark.
    told_stale: bool,
    /// Time went by since, so that the answer may be worked out.
    may_work: bool,
    /// The water could not answer what is asked.
    pub(super) gave_up: bool,
    captions: Vec<[String; 3]>,
    pub(super) led: Led,
    /// The lessons of the list, in its order.
    pub(super) shelf: Vec<LessonText>,
}

impl Player {
    /// A session at rest on that place.
    pub fn new(opened: Opened, speech: &Speech, shade: Shade, units: Option<System>) -> Result<Self, Failure> {
        let Opened { place, fit } = opened;
        let skill = OwnSkill::of(&place, fit.as_ref());
        let doubts = fit.as_ref().and_then(|fit| Doubts::new(&fit.sets, &place.calendar, &place.days));
        let source = Source { valley: &place.valley, calendar: &place.calendar, record: &place.days };
        let no_run = || Failure::input(speech.words.say("show-no-answer", &[]));
        let answers = Answers::new(&source).map_err(|_| no_run())?;
        let years = YearList::of(&answers.rest().run.years).ok_or_else(no_run)?;
        let voices = voices(speech, &place.region);
        let tags = voices.iter().map(|(first, second)| Voice {
            first: first.tag().to_owned(),
            second: second.as_ref().map(|second| second.tag().to_owned()),
        });
        let offer = Offer::new(OfferInput {
            dials: place.dials.open().collect(),
            years,
            views: views(&place),
            terms: View::ALL.map(|view| term::terms(page(view)).len() as u16),
            voices: tags.collect(),
            system: units.unwrap_or_else(|| usual_system(&place)),
            shade,
            settings: Vec::new(),
            help_pages: 1,
        })
        .map_err(|_| no_run())?;
        let (offer, settings) = with_droughts(offer, &place.dials, &answers.rest().run.years);
        let readings = mapping::readings(&place, &answers.rest().run.years);
        let mut offer = offer.with_map_readings(readings).with_opening_day(survey_day(&place, &answers.rest().year));
        if let Some(leap) = place.calendar.iter().find(|day| (day.month_day.month, day.month_day.day) == (2, 29)) {
            offer = offer.with_leap_day(leap.day_of_water_year - 1);
        }
        let captions = voices.iter().map(|(words, _)| caption(&place, words)).collect();
        let percent_per_degree = place.evaporation_percent_per_degree();
        let voice_names = voices.iter().map(voice_name).collect();
        let state = State::new(&offer);
        let (shelf, entries) = shelf(&place, &LessonText::built_in()).into_iter().unzip();
        Ok(Self {
            fit: fit.map(|fit| fit.stale),
            skill,
            doubts,
            place: Arc::new(place),
            percent_per_degree,
            settings,
            voice_names,
            offer,
            state,
            answers,
            mapper: Mapper::default(),
            voices,
            clock: Clock::default(),
            drawings: Vec::new(),
            stamp: 0,
            asked_water: false,
            finger: Finger::default(),
            work_takes: Duration::ZERO,
            patience: PATIENCE,
            told_stale: false,
            may_work: false,
            gave_up: false,
            captions,
            led: Led::new(entries),
            shelf,
        })
    }

    /// Takes an event: the lesson first, then the session.
    pub fn step(&mut self, event: Event) {
        if let Some(event) = self.led_first(event) {
            self.step_session(event);
        }
    }

    /// Takes an event of the session.
    pub(super) fn step_session(&mut self, event: Event) {
        let Needs { redraw, .. } = {
            let needs = self.state.step(event, &self.offer);
            if needs.answer() {
                (self.asked_water, self.gave_up) = (true, false);
            }
            needs
        };
        if redraw {
            self.stamp += 1;
        }
    }

    /// The languages in which it can speak, by their tags; pairs are left out.
    pub fn languages(&self) -> Vec<String> {
        let single = self.voices.iter().filter(|(_, second)| second.is_none());
        single.map(|(words, _)| words.tag().to_owned()).collect()
    }

    /// Whether it can show that view.
    pub fn offers(&self, view: View) -> bool {
        self.offer.views().contains(&view)
    }

    /// How many sheets the view on show has, as it was last drawn in this size.
    pub fn sheets(&self, size: FrameSize) -> u8 {
        self.drawings.iter().find(|drawing| drawing.is(size, false)).map_or(1, |drawing| drawing.sheets)
    }

    /// Lets the help card have as many pages as it needs on a screen of this size, in any language.
    fn make_room_for_help(&mut self, size: FrameSize) {
        let (size, keys) = (Size::new(size.width.into(), size.height.into()), key_lines());
        let sheets =
            |(words, second): &(Words, Option<Words>)| help::sheet_count(size, &keys, (words, second.as_ref()));
        let most = self.voices.iter().map(sheets).max().unwrap_or(1);
        let most = u8::try_from(most).unwrap_or(u8::MAX);
        if most > self.offer.help_pages() {
            self.offer = self.offer.clone().with_help_pages(most);
        }
    }

    /// Asks the water what the state asks, and answers at once where that is quick. Where it is not, the old answer is
    /// shown once, marked as old, and the new one is worked out before the next frame.
    fn ask_water(&mut self) {
        if std::mem::take(&mut self.asked_water) {
            self.answers.ask(Asked::from(self.state.shown()));
        }
        if self.answers.is_current() || self.gave_up {
            // The hand may have gone back to what the old answer is for.
            self.told_stale = false;
            return;
        }
        if self.work_takes > self.patience && !std::mem::take(&mut self.may_work) {
            if !std::mem::replace(&mut self.told_stale, true) {
                self.stamp += 1;
            }
            return;
        }
        let begun = Instant::now();
        let source = Source { valley: &self.place.valley, calendar: &self.place.calendar, record: &self.place.days };
        // The offer lets no dial out of its range, so a river that makes no sense cannot come of it; should it, the old
        // answer stands and is marked as old.
        self.gave_up = self.answers.finish(&source).is_err();
        self.work_takes = begun.elapsed();
        self.told_stale = false;
        self.stamp += 1;
    }

    /// Answers whatever is asked before the next frame, however long it takes.
    pub fn settle(&mut self) {
        self.may_work = true;
        self.ask_water();
        self.ask_map();
        if self.mapper.wait() {
            self.stamp += 1;
        }
    }

    /// Asks for the map where it is on show, and takes what has come of it.
    fn ask_map(&mut self) {
        let shown = self.state.shown();
        if shown.view != View::Grid {
            self.mapper.stop();
            return;
        }
        let is_new = self.mapper.ask(shown, self.offer.map(), &self.place, &self.answers.rest().run.years);
        if self.mapper.take() || is_new {
            self.stamp += 1;
        }
    }

    /// Puts the scene of the moment together.
    fn with_scene<T>(&self, look: impl FnOnce(&Scene<'_>, (&Words, Option<&Words>)) -> T) -> T {
        let shown = self.state.shown();
        let (words, second) = &self.voices[shown.voice];
        let tag = words.tag();
        let names: Vec<&str> = self.place.gates.iter().map(|gate| gate.name.get(tag)).collect();
        let told = PlaceTold {
            name: self.place.name.get(tag),
            invented: self.place.invented,
            fitted: self.fit.is_some(),
            gate_names: &names,
        };
        let source = Source { valley: &self.place.valley, calendar: &self.place.calendar, record: &self.place.days };
        let stage = Stage::new(told, &source, &self.answers);
        let props = stage.props();
        let dials = settings(&self.offer, &shown.dials);
        let moment = Moment::of(shown, &dials, &self.answers, second.as_ref());
        let doubt = self.doubts.as_ref().and_then(Doubts::shown);
        let scene = stage.scene(&props, Moment { doubt, ..moment });
        let in_hand = HandTold::of(
            &self.state,
            &Told {
                offer: &self.offer,
                settings: &self.settings,
                voices: &self.voice_names,
                gates: &names,
                words,
                second: second.as_ref(),
                stale: moment.stale,
            },
        );
        let facts = facts_of(&self.place, self.percent_per_degree, tag);
        let facts = PlaceFacts { old_fit: self.fit == Some(true), ..facts };
        let skill = self.skill.as_ref().map(OwnSkill::shown);
        let note = self.led_note();
        let hand = in_hand.hand();
        let hand = Hand { note: note.as_deref().unwrap_or(hand.note), ..hand };
        let scene = Scene { facts, skill, sheet: shown.sheet.into(), hand, ..scene };
        look(&scene, (words, second.as_ref()))
    }

    /// A finger or a mouse on a screen.
    fn point(&mut self, phase: PointerPhase, at: Point, on: FrameSize) {
        let phase = match phase {
            PointerPhase::Down => Phase::Down,
            PointerPhase::Move => Phase::Move,
            PointerPhase::Up => Phase::Up,
        };
        let size = Size::new(on.width.into(), on.height.into());
        if self.point_at_lesson(phase == Phase::Down, phase == Phase::Up, at, size) {
            return;
        }
        // The view ends where the lesson's strip begins; a tap on the strip goes on.
        let size = Size::new(size.width, size.height - u32::from(self.strip_px(on)));
        if at.y >= size.height as i32 && size.height < u32::from(on.height) {
            if phase == Phase::Up {
                self.step(Event::Press);
            }
            return;
        }
        let mut finger = self.finger;
        let event = self.with_scene(|scene, (words, _)| finger.event((phase, at), size, &self.state, scene, words));
        self.finger = finger;
        self.step(event);
    }

    /// Shows the range once it has come.
    fn look_for_doubts(&mut self) {
        let asked = self.answers.asked();
        let (dials, year) = (asked.dials, asked.year);
        if let Some(doubts) = &mut self.doubts
            && doubts.look(dials, year)
        {
            self.stamp += 1;
        }
    }

    /// Waits until the answer on show has its range.
    pub fn wait_for_doubts(&mut self) {
        self.ask_water();
        self.look_for_doubts();
        if let Some(doubts) = &mut self.doubts {
            doubts.wait();
            self.stamp += 1;
        }
    }
}

impl Instrument for Player {
    fn event(&mut self, event: HandEvent) {
        match event {
            HandEvent::Time(_) => self.may_work |= self.told_stale,
            HandEvent::Pointer { phase, x, y, on } => return self.point(phase, Point::new(x, y), on),
            _ => {}
        }
        if let Some(event) = self.clock.event(event) {
            self.step(event);
        }
    }

    fn frame(&mut self, size: FrameSize, texts: bool) -> Frame<'_> {
        self.ask_water();
        self.look_for_doubts();
        self.ask_map();
        let at = match self.drawings.iter().position(|drawing| drawing.is(size, texts)) {
            Some(at) => at,
            None => {
                // A window that is drawn larger and smaller must not leave all its sizes behind.
                if self.drawings.len() >= MOST_DRAWINGS {
                    self.drawings.remove(0);
                }
                self.drawings.push(Drawing::new(size, texts));
                self.make_room_for_help(size);
                self.drawings.len() - 1
            }
        };
        if self.drawings[at].stamp != Some(self.stamp) {
            let shown = *self.state.shown();
            // Taken out while the scene borrows everything else.
            let mut drawing = std::mem::replace(&mut self.drawings[at], Drawing::none());
            drawing.foot = self.strip_px(size);
            let tag = self.words().tag();
            let names: Vec<&str> = self.place.gates.iter().map(|gate| gate.name.get(tag)).collect();
            let map = self.mapper.shown(shown.dials, &names, &self.place);
            let page = Shows { view: shown.view, card: shown.card, map: map.as_ref() };
            self.with_scene(|scene, speech| drawing.draw(page, scene, shown.shade, speech));
            self.draw_lesson(&mut drawing);
            drawing.stamp = Some(self.stamp);
            let sheets = drawing.sheets;
            self.drawings[at] = drawing;
            if sheets > self.offer.sheets(shown.view) {
                let offer = self.offer.clone();
                self.offer = match shown.view {
                    View::Trust => offer.with_trust_sheets(sheets),
                    _ => offer.with_about_sheets(sheets),
                };
            }
        }
        self.drawings[at].frame()
    }

    fn wants_tick(&self) -> Option<Duration> {
        let shown = self.state.shown();
        if self.told_stale {
            // As soon as the old answer is on the screen.
            return Some(Duration::ZERO);
        }
        let plays = shown.playing.then(|| Duration::from_millis(1000 / u64::from(shown.speed.days_per_second())));
        let ranges = self.doubts.as_ref().is_some_and(Doubts::is_waiting).then_some(LOOK_AGAIN);
        let map = self.mapper.is_working().then_some(mapping::LOOKS);
        [plays, ranges, map].into_iter().flatten().min()
    }

    fn done(&self) -> bool {
        false
    }

    fn caption(&self) -> Caption<'_> {
        let [title, hint, too_small] = &self.captions[self.state.shown().voice];
        Caption { title, hint, too_small }
    }
}

/// Longer than this and a hand would think that nothing happens.
const PATIENCE: Duration = Duration::from_millis(40);
/// How soon to look again for a range that is on its way.
const LOOK_AGAIN: Duration = Duration::from_millis(150);

/// Frames that are kept: those of a few screens at once.
const MOST_DRAWINGS: usize = 4;

/// The views on offer: the map needs two dials.
fn views(place: &Place) -> Vec<View> {
    let has_map = place.dials.open().nth(1).is_some();
    VIEWS.into_iter().chain([View::Lesson]).filter(|view| has_map || *view != View::Grid).collect()
}

/// The language asked for, the other ones, and both at once.
fn voices(speech: &Speech, region: &str) -> Vec<(Words, Option<Words>)> {
    let asked = speech.for_place(region);
    let other = LANGUAGES.into_iter().find(|language| *language != asked.language());
    let Some(other) = other else { return vec![(asked, None)] };
    let (_, second_region) = region.split_once('-').unzip();
    let words = |tag: &str| Words::for_place(tag, second_region).0;

    vec![(asked, None), (words(other), None), (speech.for_place(region), Some(words(other)))]
}

/// The day of the snow survey in a year, counted from 0: snow lies, the river rises, and a turn of a dial shows.
fn survey_day(place: &Place, year: &YearDetail) -> u16 {
    let days = place.calendar.get(year.year.first..year.year.first + year.year.days).unwrap_or_default();
    let at = days.iter().position(|day| day.month_day == place.valley.survey);
    at.and_then(|at| u16::try_from(at).ok()).unwrap_or(0)
}

fn voice_name((first, second): &(Words, Option<Words>)) -> String {
    let name = |words: &Words| words.say("language-name", &[]);
    match second {
        None => name(first),
        Some(second) => format!("{} + {}", name(first), name(second)),
    }
}

fn caption(place: &Place, words: &Words) -> [String; 3] {
    let name = place.name.get(words.tag());
    [words.say("show-title", &[("place", name.into())]), words.say("show-hint", &[]), words.say("show-too-small", &[])]
}

#[cfg(test)]
mod tests;
