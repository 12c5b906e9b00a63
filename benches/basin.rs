//! Speed of the basin alone: 30 years and 10 bands, one setting and several side by side.
//!
//! Divide a time by 30 · 365.25 · 10 = 109 575 band-days for the time a band-day.

#[path = "../tests/support/valleys.rs"]
mod valleys;

use criterion::{Criterion, Throughput, criterion_group, criterion_main};
use deshielo::water::basin::{Basin, BasinDay, Basins};
use deshielo::water::dials::Dials;
use deshielo::water::valley::Valley;
use std::hint::black_box;

const YEARS: i32 = 30;

fn one(c: &mut Criterion) {
    let mut group = c.benchmark_group("basin, 30 years, 10 bands");
    for (name, power) in [("power 2.5", 2.5), ("power 3.6", 3.6)] {
        let mut valley = valleys::bare_basin(10);
        valley.soil.recharge_power = power;
        let (calendar, record) = valleys::record(&valley, YEARS, 1);
        let mut out = vec![BasinDay::default(); calendar.len()];
        group.throughput(Throughput::Elements(calendar.len() as u64 * 10));
        let basin = Basin::new(&valley, &Dials::REST);
        group.bench_function(format!("one setting, {name}"), |b| {
            b.iter(|| {
                let mut stores = basin.start();
                basin.run(&mut stores, black_box(&calendar), black_box(&record), &mut out);
            });
        });
    }
    group.finish();
}

fn many<const L: usize>(c: &mut Criterion) {
    let mut group = c.benchmark_group(format!("basin, 30 years, 10 bands, {L} settings side by side"));
    for (name, power) in [("power 2.5", 2.5), ("power 3.6", 3.6)] {
        let mut valley = valleys::bare_basin(10);
        valley.soil.recharge_power = power;
        let (calendar, record) = valleys::record(&valley, YEARS, 1);
        let dials: [Dials; L] = std::array::from_fn(|lane| Dials { warming: lane as f64 * 0.5, ..Dials::REST });
        let basins = Basins::<L>::new([&valley; L] as [&Valley; L], std::array::from_fn(|lane| &dials[lane]));
        let mut out: [Vec<BasinDay>; L] = std::array::from_fn(|_| vec![BasinDay::default(); 366]);
        group.throughput(Throughput::Elements(calendar.len() as u64 * 10 * L as u64));
        group.bench_function(name, |b| {
            b.iter(|| {
                let mut stores = basins.start();
                for (calendar, record) in calendar.chunks(366).zip(record.chunks(366)) {
                    let mut slices = out.each_mut().map(Vec::as_mut_slice);
                    basins.run(&mut stores, black_box(calendar), black_box(record), &mut slices);
                }
            });
        });
    }
    group.finish();
}

criterion_group!(benches, one, many::<2>, many::<4>, many::<8>);
criterion_main!(benches);
