//! What a recipe leads to in the long run, worked out rather than drawn.

use super::climate::{DayWetness, depth_calendar, depth_factor};
use super::depth::MixedExponential;
use super::normal::normal_density;
use super::recipe::{Recipe, YearIndex};
use super::season::{LEAP_DAY_SHARE, PLACES, days_per_year, monthly_means, place_of};

/// Long-run precipitation of a recipe.
#[derive(Debug, Clone, PartialEq)]
pub struct ExpectedPrecipitation {
    /// Share of wet days by month.
    pub wet_share: [f64; 12],
    /// Mean depth of a wet day by month, mm.
    pub wet_day_depth_mm: [f64; 12],
    /// Mean of the water year's total, mm.
    pub annual_mean_mm: f64,
    /// Standard deviation of the water year's total, mm.
    pub annual_spread_mm: f64,
    /// Standard deviation of the total that days alone would give were every year's index 0, mm: much too small in
    /// most climates, which is why the index is there.
    pub annual_spread_of_days_mm: f64,
    /// Correlation of a water year's total with that of the year before.
    pub annual_lag_one: f64,
    /// Mean and standard deviation of the number of wet days in a water year.
    pub annual_wet_days: (f64, f64),
    /// How the mean total changes with the index, mm per unit: mean over years of index times total.
    pub(super) annual_mm_per_index: f64,
}

impl Recipe {
    /// The long-run precipitation of this recipe, by summing over the index of the year (variance of a chain-dependent
    /// process after Katz 1977, Journal of Applied Probability 14:598–603, with day-by-day chances).
    ///
    /// Meaningful for a recipe that passes [`Recipe::check`].
    pub fn expected_precipitation(&self) -> ExpectedPrecipitation {
        Calendar {
            wetness: &DayWetness::calendar(&self.wetness),
            depths: &depth_calendar(&self.depths),
            first_place: place_of(self.water_year_start_month, 1),
            step_mm: self.depth_step_mm,
            rounded: self.round_as_station,
        }
        .expected(&self.years)
    }
}

/// Precipitation of the calendar, without the years.
pub(super) struct Calendar<'a> {
    pub wetness: &'a [DayWetness],
    pub depths: &'a [MixedExponential],
    pub first_place: usize,
    pub step_mm: f64,
    pub rounded: bool,
}

/// Totals of one year's index.
#[derive(Clone, Copy)]
struct YearMoments {
    total_mm: f64,
    total_variance: f64,
    wet_days: f64,
    wet_days_variance: f64,
}

/// Spacing of the indices that stand for all years. The trapezoid rule is exact to rounding for smooth integrands
/// against the normal density at this spacing.
const INDEX_STEP: f64 = 0.25;
/// Indices on each side of 0: six standard deviations.
const INDEX_REACH: i32 = 24;

impl Calendar<'_> {
    pub(super) fn expected(&self, years: &YearIndex) -> ExpectedPrecipitation {
        let (mut share, mut depth) = (vec![0.0; PLACES], vec![0.0; PLACES]);
        let mut by_index = Vec::with_capacity(2 * INDEX_REACH as usize + 1);
        for at in -INDEX_REACH..=INDEX_REACH {
            let index = f64::from(at) * INDEX_STEP;
            let weight = INDEX_STEP * normal_density(index);
            let factor = depth_factor(years.depth_shift, index);
            let days: Vec<(f64, f64, f64)> = (0..PLACES)
                .map(|place| {
                    let chance = self.wetness[place].in_year(years.wetness_shift, index).wet_share();
                    let (mean, square) = self.depths[place].times(factor).moments(self.step_mm, self.rounded);
                    (chance, mean, square)
                })
                .collect();
            for (place, (chance, mean, _)) in days.iter().enumerate() {
                share[place] += weight * chance;
                depth[place] += weight * chance * mean;
            }
            by_index.push((index, weight, self.year(&days)));
        }
        let mean_of = |value: &dyn Fn(f64, &YearMoments) -> f64| -> f64 {
            by_index.iter().map(|(index, weight, year)| weight * value(*index, year)).sum()
        };
        let mean = mean_of(&|_, year| year.total_mm);
        let within = mean_of(&|_, year| year.total_variance);
        let between = mean_of(&|_, year| (year.total_mm - mean) * (year.total_mm - mean));
        let wet_days = mean_of(&|_, year| year.wet_days);
        let wet_days_variance =
            mean_of(&|_, year| year.wet_days_variance + (year.wet_days - wet_days) * (year.wet_days - wet_days));
        // Correlation of two years' totals through the index, by Hermite polynomials (Mehler's formula), first two.
        let first = mean_of(&|index, year| index * year.total_mm);
        let second = mean_of(&|index, year| (index * index - 1.0) * year.total_mm);
        let lag = years.lag_one;
        let wet_share = monthly_means(|place| share[place]);
        let monthly_mm = monthly_means(|place| depth[place]);
        let middle = by_index[INDEX_REACH as usize].2;
        ExpectedPrecipitation {
            wet_day_depth_mm: core::array::from_fn(|month| monthly_mm[month] / wet_share[month]),
            wet_share,
            annual_mean_mm: mean,
            annual_spread_mm: (within + between).sqrt(),
            annual_spread_of_days_mm: middle.total_variance.sqrt(),
            annual_lag_one: (first * first * lag + 0.5 * second * second * lag * lag) / (within + between),
            annual_wet_days: (wet_days, wet_days_variance.sqrt()),
            annual_mm_per_index: first,
        }
    }

    /// Mean and variance of a year's total and wet days, from each day's chance, mean depth and mean square depth.
    fn year(&self, days: &[(f64, f64, f64)]) -> YearMoments {
        let mut year = YearMoments { total_mm: 0.0, total_variance: 0.0, wet_days: 0.0, wet_days_variance: 0.0 };
        // From the last day back: what the later days add to a sum for a wet rather than a dry day now.
        let (mut later_mm, mut later_days) = (0.0, 0.0);
        let leap_day = place_of(2, 29);
        for back in 1..=PLACES {
            let place = (self.first_place + PLACES - back) % PLACES;
            let (chance, mean, square) = days[place];
            year.total_mm += days_per_year(place) * chance * mean;
            year.wet_days += days_per_year(place) * chance;
            let own = (chance * (square - chance * mean * mean), chance * (1.0 - chance));
            if place == leap_day {
                year.total_variance += LEAP_DAY_SHARE * own.0;
                year.wet_days_variance += LEAP_DAY_SHARE * own.1;
                continue;
            }
            year.total_variance += own.0 + 2.0 * own.1 * mean * later_mm;
            year.wet_days_variance += own.1 + 2.0 * own.1 * later_days;
            let persistence = self.wetness[place].persistence;
            later_mm = persistence * (mean + later_mm);
            later_days = persistence * (1.0 + later_days);
        }
        year
    }
}
