//! The instrument that is played: a place, the session on it, the answers of the water, and the frames of the views.

use std::time::Duration;

use embedded_graphics::geometry::Size;

use super::drawing::{Drawing, VIEWS, page, theme};
use super::hands::Clock;
use crate::board::{Caption, Frame, FrameSize, HandEvent, Instrument};
use crate::commands::failure::Failure;
use crate::commands::speech::Speech;
use crate::commands::tell::usual_system;
use crate::picture::Theme;
use crate::picture::views::{Scene, help, term};
use crate::place::Place;
use crate::session::answer::{Asked, Source};
use crate::session::help::key_lines;
use crate::session::scene::{Moment, PlaceTold, Stage, facts_of, settings};
use crate::session::{Answers, Event, Needs, Offer, OfferInput, Shade, State, View, Voice, YearList};
use crate::session::{Look, Shown, Whereabouts};
use crate::words::{System, Words};

/// The languages that are offered beside the one asked for.
const LANGUAGES: [&str; 2] = ["en", "es"];

/// A session under way.
pub(super) struct Player {
    place: Place,
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
    pub fn new(place: Place, speech: &Speech, shade: Shade, units: Option<System>) -> Result<Self, Failure> {
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
}

/// What an unattended instrument asks of it.
impl Player {
    /// What is offered.
    pub fn offer(&self) -> &Offer {
        &self.offer
    }

    /// What the session shows.
    pub fn shown(&self) -> &Shown {
        self.state.shown()
    }

    /// Goes up with everything that can be seen.
    pub fn stamp(&self) -> u64 {
        self.stamp
    }

    /// The words of the language on show.
    pub fn words(&self) -> &Words {
        &self.voices[self.state.shown().voice].0
    }

    /// The colours on show.
    pub fn theme(&self) -> &'static Theme {
        theme(self.state.shown().shade)
    }

    /// Where it is, to go back there.
    pub fn whereabouts(&self) -> Whereabouts {
        self.state.whereabouts(&self.offer)
    }

    /// Goes back there.
    pub fn return_to(&mut self, place: &Whereabouts) {
        self.state.return_to(place, &self.offer);
        self.seen_anew();
    }

    /// Shows what is wished for.
    pub fn look(&mut self, look: Look) {
        let needs = self.state.look(look, &self.offer);
        if needs.redraw {
            self.seen_anew();
        }
    }

    /// Begins as at the first start.
    pub fn start_again(&mut self) {
        self.state = State::new(&self.offer);
        self.seen_anew();
    }

    fn seen_anew(&mut self) {
        self.asked_water = true;
        self.stamp += 1;
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
                // No place holds a fit to its gauge yet.
                fitted: false,
                gate_names: &names,
            };
            let source =
                Source { valley: &self.place.valley, calendar: &self.place.calendar, record: &self.place.days };
            let stage = Stage::new(told, &source, &self.answers);
            let props = stage.props();
            let dials = settings(&self.offer, &shown.dials);
            let scene = stage.scene(&props, Moment::of(shown, &dials, &self.answers, second.as_ref()));
            let facts = facts_of(&self.place, None, words.tag());
            let scene = Scene { facts, sheet: shown.sheet.into(), ..scene };
            let sheets = self.drawings[at].draw(shown.view, shown.card, &scene, shown.shade, words);
            if sheets > self.offer.sheets(shown.view) {
                self.offer = self.offer.clone().with_about_sheets(sheets);
            }
            self.drawings[at].stamp = Some(self.stamp);
        }
        self.drawings[at].frame()
    }

    fn wants_tick(&self) -> Option<Duration> {
        let shown = self.state.shown();
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
