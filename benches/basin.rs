//! Speed of the basin alone: 30 years and 10 bands, one setting and several side by side.
//!
//! Divide a time by 30 · 365.25 · 10 = 109 575 band-days for the time a band-day.
//!
//! # What the limit is
//!
//! A baseline x86-64 register holds two `f64`, so a *row* is two bands of one run, or one band of two settings. Counted in
//! the arithmetic, the row of a wet day with snow takes 17 multiplications, one square root, and 39 additions,
//! subtractions, minima and maxima. On a Zen 5 core the last four kinds share two pipes (measured: 2.0 a cycle of any
//! mixture of them, and 2.0 multiplications a cycle beside them; a square root of a pair every 7 cycles): 19.5 cycles a
//! row, where 25 to 27 were measured before days were told apart. The rest is waiting: from precipitation to what is left
//! in the soil a row is a chain of some 25 operations of 2 to 3 cycles, and the chain from one day's soil to the next goes
//! through the square root (19 cycles) besides. Registers more lanes wide gain little here (4 lanes at a time: 3 %, at the
//! price of spills), since the pipes are the same. So what counts is how many additions and minima there are:
//!
//! * Depths of a band are over the basin, so that sums over bands need no weights (six multiplications less).
//! * Freezing and thawing come from one product; what overflows is what a minimum left over (three operations less).
//! * A day without rain or snow, for all lanes, leaves out what precipitation alone would change: ten of the 39. A dry day
//!   on bare ground runs the soil's evaporation only: five. Neither changes a bit of the result; both are branches by the
//!   day, not by the band, and well foretold.
//! * Snow of all rows first, then soil of all rows: two short chains fill the processor better than one long one.
//!
//! Ratios of one sitting, the time before these four being 1: one run 0.78, four side by side 0.64, eight 0.66. The time of
//! any power over that of 2.5 was 1.34 in one run, 1.52 for four side by side, 1.57 for eight: the general curve is one
//! division and some forty more operations, which a day without outflow skips.
//!
//! The fixed cost of a day, whatever the bands, is some two fifths of a run of ten bands (the time falls on a straight line
//! from 32 bands to 10): weather under the dials, two ground stores whose chain from day to day is some 12 cycles long,
//! channel, and 88 bytes to write. Side by side the ground, the channel and the weather share lanes, which is most of what
//! many settings gain over one.
//!
//! On a core that works in order the square root and the general curve's division block for some thirty cycles; dry days and
//! bare ground skip both.

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
