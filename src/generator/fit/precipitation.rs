//! Fitting wet-day chances and depths to a record, so that the generated months have the recorded means.

use super::super::climate::DayWetness;
use super::super::depth::MixedExponential;
use super::super::normal::{normal_from_probability, normal_probability};
use super::super::recipe::{SMALLEST_CHANCE, Wetness};
use super::super::season::monthly_means;
use super::super::wetness::WetDayChain;
use super::FitNote;
use super::record::Record;

/// Wet days below which a month borrows depths from its neighbours.
const LEAST_WET_DAYS: usize = 30;
/// Rounds of bringing monthly means of an interpolated year onto the recorded ones; the error halves at least each time.
const MATCHING_ROUNDS: usize = 40;

/// Depths of one month, and the mean that its wet days should have.
pub(super) struct DepthShape {
    pub shape: MixedExponential,
    pub mean_mm: f64,
}

/// Wet-day chances at mid-month.
pub(super) fn wetness(record: &Record, notes: &mut Vec<FitNote>) -> Wetness {
    let mut share = [0.0; 12];
    let mut persistence = [0.0; 12];
    for month in 0..12 {
        let name = month as u32 + 1;
        let days = record.days.iter().filter(|day| day.month == month).count() as f64;
        let wet = record.days.iter().filter(|day| day.month == month && day.wet).count() as f64;
        if wet == 0.0 || wet == days {
            notes.push(FitNote::MonthOfOneKind { month: name });
            share[month] = (wet + 0.5) / (days + 1.0);
            continue;
        }
        share[month] = wet / days;
        // Days after dry and after wet days, and the wet ones among them.
        let mut after = [[0.0; 2]; 2];
        for pair in record.days.windows(2).filter(|pair| pair[1].month == month && pair[1].follows) {
            after[usize::from(pair[0].wet)][usize::from(pair[1].wet)] += 1.0;
        }
        let chance = |from: [f64; 2]| (from[0] + from[1] > 0.0).then(|| from[1] / (from[0] + from[1]));
        let estimated = match (chance(after[0]), chance(after[1])) {
            (Some(after_dry), Some(after_wet)) => after_wet - after_dry,
            _ => 0.0,
        };
        let taken = estimated.clamp(0.0, MOST_PERSISTENCE);
        if taken != estimated {
            notes.push(FitNote::WetnessMemoryOutside { month: name, estimated, taken });
        }
        persistence[month] = taken;
    }
    at_mid_month(&share, &persistence)
}

/// Day-to-day correlation of wetness beyond which a month of a short record is taken to have been chance.
const MOST_PERSISTENCE: f64 = 0.95;
/// Smallest mid-month share of wet or of dry days: far below what a month without any is taken to have, so that it only
/// stops the lines between months from running away; with the most persistence, chances stay above the recipe's least.
const SMALLEST_SHARE: f64 = 100.0 * SMALLEST_CHANCE;

/// The mid-month chances whose interpolated months have the given shares of wet days.
fn at_mid_month(share: &[f64; 12], persistence: &[f64; 12]) -> Wetness {
    let target: [f64; 12] = core::array::from_fn(|month| normal_from_probability(share[month]));
    let mut deviates = target;
    let chains = |deviates: &[f64; 12]| -> [WetDayChain; 12] {
        core::array::from_fn(|month| {
            let share = normal_probability(deviates[month]).clamp(SMALLEST_SHARE, 1.0 - SMALLEST_SHARE);
            WetDayChain::from_share(share, persistence[month])
        })
    };
    let as_wetness = |deviates: &[f64; 12]| {
        let chains = chains(deviates);
        Wetness {
            // The chances of a month without memory may differ in the last bit; the smaller is the one after dry days.
            dry_to_wet: core::array::from_fn(|month| chains[month].dry_to_wet.min(chains[month].wet_to_wet)),
            wet_to_wet: core::array::from_fn(|month| chains[month].wet_to_wet),
        }
    };
    for _ in 0..MATCHING_ROUNDS {
        let calendar = DayWetness::calendar(&as_wetness(&deviates));
        let means = monthly_means(|place| normal_probability(calendar[place].deviate));
        for month in 0..12 {
            deviates[month] += target[month] - normal_from_probability(means[month]);
        }
    }
    as_wetness(&deviates)
}

/// The shape of depths in each month, and the mean to be met.
pub(super) fn depth_shapes(record: &Record, notes: &mut Vec<FitNote>) -> Vec<DepthShape> {
    (0..12)
        .map(|month| {
            let own = wet_days_around(record, month, 0).len();
            if own < LEAST_WET_DAYS {
                notes.push(FitNote::DepthsPooled { month: month as u32 + 1, wet_days: own });
            }
            // Six months to each side is the whole year, which has enough wet days by then.
            let steps = (0..=6)
                .map(|reach| wet_days_around(record, month, reach))
                .find(|steps| steps.len() >= LEAST_WET_DAYS)
                .unwrap_or_else(|| wet_days_around(record, month, 6));
            let mean_steps = steps.iter().map(|&count| f64::from(count)).sum::<f64>() / steps.len() as f64;
            let fallback =
                MixedExponential { light_share: 0.5, light_mean_mm: record.step_mm, heavy_mean_mm: record.step_mm };
            DepthShape {
                shape: MixedExponential::fit(&steps, record.step_mm).unwrap_or(fallback),
                mean_mm: mean_steps * record.step_mm,
            }
        })
        .collect()
}

/// Depths in steps on wet days of a month and of so many months to either side.
fn wet_days_around(record: &Record, month: usize, reach: usize) -> Vec<u32> {
    let near = |other: usize| {
        let apart = (other + 12 - month) % 12;
        apart.min(12 - apart) <= reach
    };
    record.days.iter().filter(|day| day.wet && near(day.month)).map(|day| day.steps).collect()
}
