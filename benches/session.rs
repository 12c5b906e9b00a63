//! From a turn of a dial to the answer: 40 years, 10 bands, 5 gates, from the works on and from the slopes on;
//! and to a finished picture of the demo place.

#[path = "../tests/support/valleys.rs"]
mod valleys;

use criterion::{Criterion, criterion_group, criterion_main};
use deshielo::picture::changes::changes;
use deshielo::picture::views::{Scene, View as Page, canals, season, valley};
use deshielo::picture::{Canvas, Theme};
use deshielo::place::demo::demo_files;
use deshielo::place::{Source as PlaceSource, read};
use deshielo::session::answer::{Asked, Source};
use deshielo::session::hand::{HandTold, Told};
use deshielo::session::scene::{Moment, PlaceTold, Stage, settings};
use deshielo::session::{Answers, Event, Offer, OfferInput, Shade, State, VIEWS, View, Voice, YearList};
use deshielo::water::dials::Dial;
use deshielo::words::{System, Words};
use std::hint::black_box;

const YEARS: i32 = 40;

fn offer(years: YearList) -> Offer {
    Offer::new(OfferInput {
        dials: Dial::ALL.into_iter().map(|dial| (dial, dial.widest())).collect(),
        years,
        views: View::ALL.to_vec(),
        terms: [0; VIEWS],
        voices: vec![Voice { first: "en".into(), second: None }],
        system: System::Metric,
        shade: Shade::Light,
        settings: Vec::new(),
        help_pages: 1,
    })
    .expect("the offer is sound")
}

fn turns(c: &mut Criterion) {
    let valley = valleys::whole_valley();
    let (calendar, record) = valleys::record(&valley, YEARS, 1);
    let source = Source { valley: &valley, calendar: &calendar, record: &record };
    let mut answers = Answers::new(&source).expect("the valley is sound");
    let offer = offer(YearList::of(&answers.rest().run.years).expect("there are whole years"));
    let mut group = c.benchmark_group("turn to answer, 40 years, 10 bands, 5 gates");
    for (name, dial) in [("from the works", Dial::Diversion), ("from the slopes", Dial::Warming)] {
        let mut state = State::new(&offer);
        let mut detents = 1;
        group.bench_function(name, |b| {
            b.iter(|| {
                // To and fro away from rest, which is at hand and would cost nothing.
                let stop = offer.scale(dial).map(|scale| scale.stop_at(state.shown().dials.get(dial)));
                let rest = offer.scale(dial).map(|scale| scale.rest());
                detents = if stop > rest.map(|rest| rest + 4) {
                    -1
                } else if stop <= rest.map(|rest| rest + 1) {
                    1
                } else {
                    detents
                };
                state.step(Event::TurnDial { dial, detents, since_ms: u32::MAX }, &offer);
                answers.ask(Asked::from(state.shown()));
                answers.finish(&source).expect("the river is sound");
                black_box(&answers);
            });
        });
    }
    let mut state = State::new(&offer);
    group.bench_function("another year", |b| {
        b.iter(|| {
            let years = if state.shown().year_index + 1 == offer.years().count() { -100 } else { 1 };
            state.step(Event::Command(deshielo::session::Command::StepYear(years)), &offer);
            answers.ask(Asked::from(state.shown()));
            answers.finish(&source).expect("the river is sound");
            black_box(&answers);
        });
    });
    group.bench_function("an event alone", |b| {
        b.iter(|| black_box(state.step(black_box(Event::Turn { detents: 1, since_ms: 50 }), &offer)));
    });
    group.finish();
}

/// From the turn of a dial to a finished frame of the demo place, at 320×240; and drawing alone.
fn pictures(c: &mut Criterion) {
    let place = read(PlaceSource::Embedded(demo_files())).place.expect("the demo place is sound");
    let source = Source { valley: &place.valley, calendar: &place.calendar, record: &place.days };
    let mut answers = Answers::new(&source).expect("the valley is sound");
    let offer = offer(YearList::of(&answers.rest().run.years).expect("there are whole years"));
    let (words, _) = Words::new("en-US");
    let names: Vec<&str> = place.gates.iter().map(|gate| gate.name.get("en")).collect();
    let told = PlaceTold { name: "Demo", invented: true, fitted: false, gate_names: &names };
    let voices = ["English".to_owned()];
    let mut pixels = vec![Theme::LIGHT.paper; 320 * 240];
    let mut before = pixels.clone();
    let mut draw = |page: Page, state: &State, answers: &Answers| {
        let stage = Stage::new(told, &source, answers);
        let props = stage.props();
        let dials = settings(&offer, &state.shown().dials);
        let scene = stage.scene(&props, Moment::of(state.shown(), &dials, answers, None));
        let told = Told {
            offer: &offer,
            settings: &[],
            voices: &voices,
            gates: &[],
            words: &words,
            second: None,
            stale: false,
        };
        let in_hand = HandTold::of(state, &told);
        let scene = Scene { hand: in_hand.hand(), ..scene };
        let mut canvas = Canvas::new(&mut pixels, 320, 240).expect("the buffer is as long as the frame");
        match page {
            Page::Season => season::draw(&mut canvas, &scene, &Theme::LIGHT, &words),
            Page::Canals => canals::draw(&mut canvas, &scene, &Theme::LIGHT, &words),
            _ => valley::draw(&mut canvas, &scene, &Theme::LIGHT, &words),
        }
        black_box(changes(&before, &pixels, 320));
        before.copy_from_slice(&pixels);
    };
    let mut group = c.benchmark_group("demo place, 320x240");
    let pages = [Page::Valley, Page::Season, Page::Canals];
    for (name, dial) in [("works", Dial::Diversion), ("slopes", Dial::Warming)] {
        for page in pages {
            let mut state = State::new(&offer);
            state.step(Event::TurnDial { dial, detents: 2, since_ms: u32::MAX }, &offer);
            let mut detents = 1;
            group.bench_function(format!("turn to picture, from the {name}, {} page", page.key()), |b| {
                b.iter(|| {
                    detents = -detents;
                    state.step(Event::TurnDial { dial, detents, since_ms: u32::MAX }, &offer);
                    answers.ask(Asked::from(state.shown()));
                    answers.finish(&source).expect("the river is sound");
                    draw(page, &state, &answers);
                });
            });
        }
    }
    for page in pages {
        let mut state = State::new(&offer);
        state.step(Event::TurnDial { dial: Dial::Warming, detents: 4, since_ms: u32::MAX }, &offer);
        answers.ask(Asked::from(state.shown()));
        answers.finish(&source).expect("the river is sound");
        let mut days = 1;
        group.bench_function(format!("redraw alone, another day, {} page", page.key()), |b| {
            b.iter(|| {
                days = if state.shown().day > 300 { -200 } else { days.max(1) };
                state.step(Event::Command(deshielo::session::Command::StepDay(days)), &offer);
                draw(page, &state, &answers);
            });
        });
    }
    group.finish();
}

criterion_group!(benches, turns, pictures);
criterion_main!(benches);
