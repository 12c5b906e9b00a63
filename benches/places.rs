//! Speed of whole places: the demo's record end to end, the costliest legal place, and reading a 40-year record.
//!
//! The demo's target is 3 ms for 40 years, works, signs and ledger included, on one server core. It is not met: about
//! 4.0 ms for 41 years on a shared server core at baseline x86-64, of which the basin takes 0.58, reservoir, canals and
//! fields 2.8, the ledger 0.15 and the signs 0.4 to 0.5.
//!
//! What bounds it: a day of the works is some 3 000 instructions in about 180 ns. Leaving out a tenth of them gained
//! only 3 %, so that it is rather the chain through the day that counts: content, lake, accounts, claims in order of
//! dates, draws, delivery, root zone, and that again next morning, with a division at most of its links.

use criterion::{Criterion, criterion_group, criterion_main};
use deshielo::place::demo::demo_files;
use deshielo::place::{Place, Source, read};
use deshielo::water::basin::{Basin, BasinDay};
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::run::run_basin;
use deshielo::water::works::Works;
use std::hint::black_box;
use std::path::Path;

fn place(source: Source<'_>) -> Place {
    read(source).place.expect("the places of this repository have no mistakes")
}

/// Both stages, signs and ledgers of every year; what a turn of the warming dial costs.
fn whole(place: &Place, dials: &Dials, basin: &mut [BasinDay]) -> usize {
    let valley = &place.valley;
    let before = run_basin(valley, &Basin::new(valley, dials), &place.calendar, &place.days, basin);
    let works = Works::new(valley, dials).expect("a checked place");
    let mut years = 0;
    deshielo::signs::read_run(valley, &works, &place.calendar, basin, &before, |_, _| {}, |_| years += 1);
    years
}

fn runs(c: &mut Criterion) {
    let limits_folder = Path::new(env!("CARGO_MANIFEST_DIR")).join("demo-data/limits");
    let demo = place(Source::Embedded(demo_files()));
    let limits = place(Source::Folder(&limits_folder));
    let warmer = Dials::REST.with(Dial::Warming, 2.0);
    for (name, place) in [("the demo, 41 years", &demo), ("the costliest legal place, 3 years", &limits)] {
        let mut basin = vec![BasinDay::default(); place.days.len()];
        c.bench_function(name, |b| b.iter(|| whole(black_box(place), black_box(&warmer), &mut basin)));
    }
}

fn reading(c: &mut Criterion) {
    c.bench_function("read the demo with its record of 41 years", |b| b.iter(|| place(Source::Embedded(demo_files()))));
}

criterion_group!(benches, runs, reading);
criterion_main!(benches);
