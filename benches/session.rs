//! From a turn of a dial to the answer: 40 years, 10 bands, 5 gates, from the works on and from the slopes on.

#[path = "../tests/support/valleys.rs"]
mod valleys;

use criterion::{Criterion, criterion_group, criterion_main};
use deshielo::session::answer::{Asked, Source};
use deshielo::session::{Answers, Event, Offer, OfferInput, Shade, State, VIEWS, View, Voice, YearList};
use deshielo::water::dials::Dial;
use deshielo::words::System;
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

criterion_group!(benches, turns);
criterion_main!(benches);
