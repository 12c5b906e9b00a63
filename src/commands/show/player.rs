//! The instrument that is played: a place, the session on it, the answers of the water, and the frames of the views.

use std::time::Duration;

use embedded_graphics::geometry::Size;

use super::doubt::Doubts;
use super::drawing::{Drawing, VIEWS, page};
use super::hands::Clock;
use super::skill::OwnSkill;
use crate::board::{Caption, Frame, FrameSize, HandEvent, Instrument};
use crate::commands::failure::Failure;
use crate::commands::places::Opened;
use crate::commands::speech::Speech;
use crate::commands::tell::usual_system;
use crate::picture::views::facts::PlaceFacts;
use crate::picture::views::{Scene, help, term};
use crate::place::Place;
use crate::session::answer::{Asked, Source};
use crate::session::help::key_lines;
use crate::session::scene::{Moment, PlaceTold, Stage, facts_of, settings};
use crate::session::{Answers, Event, Needs, Offer, OfferInput, Shade, State, View, Voice, YearList};
use crate::words::{System, Words};

/// The languages that are offered beside the one asked for.
const LANGUAGES: [&str; 2] = ["en", "es"];

/// A session under way.
pub(super) struct Player {
    place: Place,
    /// Whether the fit in use is stale; `None` without one.
    fit: Option<bool>,
    skill: Option<OwnSkill>,
    /// How far the answer may be off; `None` without an ensemble.
    doubts: Option<Doubts>,
    gate_names: Vec<String>,
    offer: Offer,
    state: State,
    answers: Answers,
    /// One entry for each voice of the offer: the first language and the second, if there are two.
    voices: Vec<(Words, Option<Words>)>,
    clock: Clock,
    drawings: Vec<Drawing>,
    /// Goes up with everything that can be seen.
    stamp: u64,
    asked_water: bool,
    captions: Vec<[String; 3]>,
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
            views: VIEWS.to_vec(),
            terms: View::ALL.map(|view| term::terms(page(view)).len() as u16),
            voices: tags.collect(),
            system: units.unwrap_or_else(|| usual_system(&place)),
            shade,
            settings: Vec::new(),
            help_pages: 1,
        })
        .map_err(|_| no_run())?;
        let captions = voices.iter().map(|(words, _)| caption(&place, words)).collect();
        let gate_names = place.gates.iter().map(|gate| gate.name.get(voices[0].0.tag()).to_owned()).collect();
        let state = State::new(&offer);
        Ok(Self {
            fit: fit.map(|fit| fit.stale),
            skill,
            doubts,
            gate_names,
            place,
            offer,
            state,
            answers,
            voices,
            clock: Clock::default(),
            drawings: Vec::new(),
            stamp: 0,
            asked_water: false,
            captions,
        })
    }

    /// Takes an event of the session.
    pub fn step(&mut self, event: Event) {
        let Needs { redraw, .. } = {
            let needs = self.state.step(event, &self.offer);
            self.asked_water |= needs.answer();
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

    /// Lets the help card have as many pages as it needs on a screen of this size, in any language.
    fn make_room_for_help(&mut self, size: FrameSize) {
        let (size, keys) = (Size::new(size.width.into(), size.height.into()), key_lines());
        let most = self.voices.iter().map(|(words, _)| help::sheet_count(size, &keys, words)).max().unwrap_or(1);
        let most = u8::try_from(most).unwrap_or(u8::MAX);
        if most > self.offer.help_pages() {
            self.offer = self.offer.clone().with_help_pages(most);
        }
    }

    /// Brings the answers to what the state asks.
    fn ask_water(&mut self) {
        if !std::mem::take(&mut self.asked_water) {
            return;
        }
        let source = Source { valley: &self.place.valley, calendar: &self.place.calendar, record: &self.place.days };
        // The offer lets no dial out of its range, so a river that makes no sense cannot come of it; should it, the old
        // answer stands and is marked as old.
        if self.answers.ask(Asked::from(self.state.shown())) {
            let _ = self.answers.finish(&source);
        }
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

    /// How many sheets the trust page has on the last screen that it was drawn for.
    pub fn trust_sheets(&self) -> u8 {
        self.offer.sheets(View::Trust)
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
        if let Some(event) = self.clock.event(event) {
            self.step(event);
        }
    }

    fn frame(&mut self, size: FrameSize, texts: bool) -> Frame<'_> {
        self.ask_water();
        self.look_for_doubts();
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
            let shown = self.state.shown();
            let (words, second) = &self.voices[shown.voice];
            let names: Vec<&str> = self.gate_names.iter().map(String::as_str).collect();
            let told = PlaceTold {
                name: self.place.name.get(words.tag()),
                invented: self.place.invented,
                fitted: self.fit.is_some(),
                gate_names: &names,
            };
            let source =
                Source { valley: &self.place.valley, calendar: &self.place.calendar, record: &self.place.days };
            let stage = Stage::new(told, &source, &self.answers);
            let props = stage.props();
            let dials = settings(&self.offer, &shown.dials);
            let moment = Moment::of(shown, &dials, &self.answers, second.as_ref());
            let doubt = self.doubts.as_ref().and_then(Doubts::shown);
            let scene = stage.scene(&props, Moment { doubt, ..moment });
            let facts = facts_of(&self.place, None, words.tag());
            let facts = PlaceFacts { old_fit: self.fit == Some(true), ..facts };
            let skill = self.skill.as_ref().map(OwnSkill::shown);
            let scene = Scene { facts, skill, sheet: shown.sheet.into(), ..scene };
            let sheets = self.drawings[at].draw(shown.view, shown.card, &scene, shown.shade, words);
            if sheets > self.offer.sheets(shown.view) {
                let offer = self.offer.clone();
                self.offer = match shown.view {
                    View::Trust => offer.with_trust_sheets(sheets),
                    _ => offer.with_about_sheets(sheets),
                };
            }
            self.drawings[at].stamp = Some(self.stamp);
        }
        self.drawings[at].frame()
    }

    fn wants_tick(&self) -> Option<Duration> {
        let shown = self.state.shown();
        if !shown.playing && self.doubts.as_ref().is_some_and(Doubts::is_waiting) {
            return Some(LOOK_AGAIN);
        }
        shown.playing.then(|| Duration::from_millis(1000 / u64::from(shown.speed.days_per_second())))
    }

    fn done(&self) -> bool {
        false
    }

    fn caption(&self) -> Caption<'_> {
        let [title, hint, too_small] = &self.captions[self.state.shown().voice];
        Caption { title, hint, too_small }
    }
}

/// How soon to look again for a range that is on its way.
const LOOK_AGAIN: Duration = Duration::from_millis(150);

/// Frames that are kept: those of a few screens at once.
const MOST_DRAWINGS: usize = 4;

/// The language asked for, the other ones, and both at once.
fn voices(speech: &Speech, region: &str) -> Vec<(Words, Option<Words>)> {
    let asked = speech.for_place(region);
    let other = LANGUAGES.into_iter().find(|language| *language != asked.language());
    let Some(other) = other else { return vec![(asked, None)] };
    let (_, second_region) = region.split_once('-').unzip();
    let words = |tag: &str| Words::for_place(tag, second_region).0;

    vec![(asked, None), (words(other), None), (speech.for_place(region), Some(words(other)))]
}

fn caption(place: &Place, words: &Words) -> [String; 3] {
    let name = place.name.get(words.tag());
    [words.say("show-title", &[("place", name.into())]), words.say("show-hint", &[]), words.say("show-too-small", &[])]
}
