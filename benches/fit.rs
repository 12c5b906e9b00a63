//! Speed of fitting: 3 000 runs of 15 years and 10 bands on all cores, beside the bare engine in one sitting.

#[path = "../tests/support/valleys.rs"]
mod valleys;

use std::hint::black_box;
use std::sync::atomic::AtomicBool;

use criterion::{Criterion, criterion_group, criterion_main};
use deshielo::fit::starts::search;
use deshielo::fit::trial::{LANES, Trial};
use deshielo::fit::{Measures, Objective, Parameter, PrecipitationCorrection, Record};
use deshielo::water::basin::{Basin, BasinDay, Basins};
use deshielo::water::dials::Dials;

const YEARS: i32 = 15;

fn fit(c: &mut Criterion) {
    let mut group = c.benchmark_group("fit, 15 years, 10 bands");
    group.sample_size(10);
    let valley = valleys::bare_basin(10);
    let (calendar, weather) = valleys::record(&valley, YEARS, 1);
    let mut days = vec![BasinDay::default(); calendar.len()];
    let basin = Basin::new(&valley, &Dials::REST);
    let mut stores = basin.start();
    basin.run(&mut stores, &calendar, &weather, &mut days);
    let flow_m3s: Vec<f64> = days.iter().map(|day| day.inflow_m3 / 86_400.0).collect();

    group.bench_function("bare engine, one run", |b| {
        b.iter(|| {
            let basin = Basin::new(&valley, &Dials::REST);
            basin.run(&mut basin.start(), black_box(&calendar), black_box(&weather), &mut days);
        });
    });
    let mut out: [Vec<BasinDay>; LANES] = std::array::from_fn(|_| vec![BasinDay::default(); 366]);
    group.bench_function("bare engine, runs side by side", |b| {
        b.iter(|| {
            let basins = Basins::<LANES>::new([&valley; LANES], [&Dials::REST; LANES]);
            let mut stores = basins.start();
            for (calendar, weather) in calendar.chunks(366).zip(weather.chunks(366)) {
                let mut slices = out.each_mut().map(Vec::as_mut_slice);
                basins.run(&mut stores, black_box(calendar), black_box(weather), &mut slices);
            }
        });
    });

    let record =
        Record { calendar: &calendar, weather: &weather, measures: Measures::Natural, flow_m3s: &flow_m3s, snow: None };
    let years = record.gauged_years(10, 1);
    let target = record.target(&years, Objective::KlingGupta).unwrap();
    let parameters = Parameter::fitted(&valley, PrecipitationCorrection::Factor);
    let trial = Trial::new(&valley, &parameters, record, &target, Objective::KlingGupta);
    let mut room = trial.room();
    let mut scores = [0.0; LANES];
    let points = [vec![0.3; parameters.len()], vec![0.5; parameters.len()]];
    group.bench_function("trial, sets side by side", |b| {
        b.iter(|| trial.score((0..LANES).map(|lane| points[lane % 2].as_slice()), &mut room, black_box(&mut scores)));
    });
    let stop = AtomicBool::new(false);
    group.bench_function("search, 3000 runs", |b| {
        b.iter(|| search(&trial, 8, 375, black_box(1), &stop, &|_, _| {}).unwrap());
    });
    group.finish();
}

criterion_group!(benches, fit);
criterion_main!(benches);
