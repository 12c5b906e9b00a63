//! Fitting the differences between years: how far yearly totals and temperatures spread beyond what days explain.
//!
//! A generator that knows only days makes every year nearly alike: its yearly totals spread by the law of large numbers
//! alone, often half of what a record shows, and droughts of several years hardly occur (overdispersion: Katz and
//! Parlange 1998, Journal of Climate 11:591–601). So the spread of the number of wet days sets how far the year's index
//! shifts their chance, then the spread of totals sets how far it shifts depths, and the correlation of successive
//! totals, freed of the noise of days, sets the index's memory.

use super::super::climate::{DayWetness, depth_calendar};
use super::super::expected::{Calendar, ExpectedPrecipitation};
use super::super::normal::normal_density;
use super::super::recipe::{Depths, Wetness, YearIndex};
use super::super::season::days_per_year;
use super::precipitation::DepthShape;
use super::record::{Annual, Record, mean_and_variance};
use super::temperature::FittedTemperatures;
use super::{FitNote, LEAST_YEARS_FOR_SPREAD};

/// Largest shift of wetness and of depth that is looked for.
const LARGEST_SHIFT: f64 = 1.0;
/// Largest memory of the index that is taken.
const LARGEST_LAG_ONE: f64 = 0.9;
/// Halvings of a search interval: the answer is then known to a hundred-thousandth.
const HALVINGS: usize = 17;
/// Rounds of bringing monthly mean depths onto the recorded ones.
const DEPTH_ROUNDS: usize = 4;
/// Rounds of the same for the final depths.
const FINAL_DEPTH_ROUNDS: usize = 25;
/// Effect of the index on totals, as a share of the mean total, below which temperature is not tied to it.
const LEAST_EFFECT_SHARE: f64 = 0.05;
/// Spread of yearly temperatures, °C, beyond which a trend or a changed thermometer is likelier than weather: common
/// practice, no source.
const WIDE_SPREAD_C: f64 = 1.0;
/// Rounds of telling apart the warmth of years and the memory of days.
const WARMTH_ROUNDS: usize = 4;
/// Days in a year.
const DAYS: f64 = 365.25;

pub(super) struct FittedYears {
    pub years: YearIndex,
    pub depths: Depths,
    pub from_record: bool,
}

impl YearIndex {
    /// Variance, °C², that years add to the temperature of every day.
    pub(super) fn shared_variance(&self) -> f64 {
        self.wet_year_cooling_c * self.wet_year_cooling_c + self.temperature_spread_c * self.temperature_spread_c
    }
}

pub(super) fn fit(
    record: &Record,
    wetness: &Wetness,
    shapes: &[DepthShape],
    temperature: &FittedTemperatures,
    notes: &mut Vec<FitNote>,
) -> FittedYears {
    let search = Search { record, wetness: DayWetness::calendar(wetness), shapes };
    let full_years = record.full_years.len();
    if full_years < LEAST_YEARS_FOR_SPREAD {
        notes.push(FitNote::YearsNotFitted { full_years, needed: LEAST_YEARS_FOR_SPREAD });
        let years = YearIndex::WHEN_UNKNOWN;
        let (depths, _) = search.matched(&years, FINAL_DEPTH_ROUNDS);
        return FittedYears { years, depths, from_record: false };
    }
    let annual = record.annual();
    let mut years = search.shifts(&annual, notes);
    let (depths, expected) = search.matched(&years, FINAL_DEPTH_ROUNDS);
    years.lag_one = lag_one(&annual, full_years, &expected, notes);
    search.temperatures(&mut years, &annual, &depths, &expected, temperature, notes);
    FittedYears { years, depths, from_record: true }
}

struct Search<'a> {
    record: &'a Record,
    wetness: Vec<DayWetness>,
    shapes: &'a [DepthShape],
}

impl Search<'_> {
    /// Depths whose months have the recorded means under the given years, and what follows from them.
    fn matched(&self, years: &YearIndex, rounds: usize) -> (Depths, ExpectedPrecipitation) {
        let mut factors = [1.0; 12];
        let mut round = 0;
        loop {
            let depths = Depths {
                light_share: core::array::from_fn(|month| self.shapes[month].shape.light_share),
                light_mean_mm: core::array::from_fn(|month| self.shapes[month].shape.light_mean_mm * factors[month]),
                heavy_mean_mm: core::array::from_fn(|month| self.shapes[month].shape.heavy_mean_mm * factors[month]),
            };
            let expected = Calendar {
                wetness: &self.wetness,
                depths: &depth_calendar(&depths),
                first_place: self.record.first_place,
                step_mm: self.record.step_mm,
                rounded: true,
            }
            .expected(years);
            if round == rounds {
                return (depths, expected);
            }
            for (month, factor) in factors.iter_mut().enumerate() {
                *factor *= self.shapes[month].mean_mm / expected.wet_day_depth_mm[month];
            }
            round += 1;
        }
    }

    /// The shifts of wetness and depth that give wet days and totals the recorded spread.
    fn shifts(&self, annual: &Annual, notes: &mut Vec<FitNote>) -> YearIndex {
        let wet_days: Vec<f64> = self.record.full_years.iter().map(|year| year.wet_days).collect();
        let (_, wet_days_variance) = mean_and_variance(&wet_days);
        let with = |wetness_shift: f64, depth_shift: f64| YearIndex {
            lag_one: 0.0,
            wetness_shift,
            depth_shift,
            wet_year_cooling_c: 0.0,
            temperature_spread_c: 0.0,
        };
        let wet_days_beyond = |shift: f64| {
            let (_, spread) = self.matched(&with(shift, 0.0), 0).1.annual_wet_days;
            spread * spread - wet_days_variance
        };
        let totals_beyond = |wetness_shift: f64, depth_shift: f64| {
            let spread = self.matched(&with(wetness_shift, depth_shift), DEPTH_ROUNDS).1.annual_spread_mm;
            spread * spread - annual.variance_mm2
        };
        if totals_beyond(0.0, 0.0) >= 0.0 {
            notes.push(FitNote::TotalsSpreadNoMoreThanDays);
            return with(0.0, 0.0);
        }
        let wetness_shift = root(wet_days_beyond);
        if totals_beyond(wetness_shift, 0.0) >= 0.0 {
            // Wet days alone would spread totals too far; totals are what droughts are made of, so they decide.
            return with(root(|shift| totals_beyond(shift, 0.0)), 0.0);
        }
        let depth_shift = root(|shift| totals_beyond(wetness_shift, shift));
        if depth_shift >= LARGEST_SHIFT || wetness_shift >= LARGEST_SHIFT {
            notes.push(FitNote::TotalsSpreadTooWide);
        }
        with(wetness_shift, depth_shift)
    }

    /// How much cooler wet years are, and how far temperatures of years spread besides.
    fn temperatures(
        &self,
        years: &mut YearIndex,
        annual: &Annual,
        depths: &Depths,
        expected: &ExpectedPrecipitation,
        temperature: &FittedTemperatures,
        notes: &mut Vec<FitNote>,
    ) {
        let full = &self.record.full_years;
        let warmth: Vec<f64> = full.iter().map(|year| year.mean_temperature_c).collect();
        let (mean_warmth, warmth_variance) = mean_and_variance(&warmth);
        let covariance = full
            .iter()
            .map(|year| (year.mean_temperature_c - mean_warmth) * (year.total_mm - annual.mean_mm))
            .sum::<f64>()
            / (full.len() as f64 - 1.0);
        let days = self.through_wet_days(years, depths, temperature);
        let effect_mm = expected.annual_mm_per_index;
        if effect_mm > LEAST_EFFECT_SHARE * annual.mean_mm {
            years.wet_year_cooling_c = days.warmth_per_index - (covariance - days.covariance) / effect_mm;
        }
        let through_index = years.wet_year_cooling_c - days.warmth_per_index;
        let beyond_wet_days = warmth_variance - through_index * through_index - days.variance;
        // Warm years look like memory from day to day, so what days explain depends on what years do: a few rounds.
        let mut rest = 0.0;
        for _ in 0..WARMTH_ROUNDS {
            rest = beyond_wet_days - temperature.variance_of_mean(self.record, years.shared_variance());
            years.temperature_spread_c = rest.max(0.0).sqrt();
        }
        if years.temperature_spread_c > WIDE_SPREAD_C {
            notes.push(FitNote::TemperaturesSpreadWide { spread_c: years.temperature_spread_c });
        }
        if rest <= 0.0 {
            notes.push(FitNote::TemperaturesSpreadNoMoreThanDays);
        }
    }

    /// What the coming and going of wet days alone does to the mean temperature of a year.
    fn through_wet_days(&self, years: &YearIndex, depths: &Depths, temperature: &FittedTemperatures) -> WetDayEffect {
        let depths = depth_calendar(depths);
        let shift = years.wetness_shift;
        let mut effect = WetDayEffect { warmth_per_index: 0.0, covariance: 0.0, variance: 0.0 };
        for (place, depth) in depths.iter().enumerate() {
            let weight = days_per_year(place) / DAYS;
            let warmer = temperature.wet_minus_dry_c(place);
            let DayWetness { deviate, persistence } = self.wetness[place];
            let share = self.wetness[place].in_year(0.0, 0.0).wet_share();
            // Mean over years of index times share of wet days, in closed form.
            effect.warmth_per_index += weight * warmer * normal_density(deviate) * shift / (1.0 + shift * shift).sqrt();
            let memory = share * (1.0 - share) * (1.0 + persistence) / (1.0 - persistence);
            let (depth_mm, _) = depth.moments(self.record.step_mm, true);
            effect.covariance += weight * warmer * depth_mm * memory;
            effect.variance += weight * warmer * warmer * memory / DAYS;
        }
        effect
    }
}

struct WetDayEffect {
    warmth_per_index: f64,
    covariance: f64,
    variance: f64,
}

/// Where a rising function crosses zero between 0 and the largest shift; the end of the interval if it does not.
fn root(beyond: impl Fn(f64) -> f64) -> f64 {
    let (mut low, mut high) = (0.0, LARGEST_SHIFT);
    if beyond(low) >= 0.0 {
        return low;
    }
    if beyond(high) <= 0.0 {
        return high;
    }
    for _ in 0..HALVINGS {
        let middle = 0.5 * (low + high);
        if beyond(middle) < 0.0 {
            low = middle;
        } else {
            high = middle;
        }
    }
    0.5 * (low + high)
}

/// The index's memory from the correlation of successive totals.
fn lag_one(annual: &Annual, full_years: usize, expected: &ExpectedPrecipitation, notes: &mut Vec<FitNote>) -> f64 {
    let Some(of_totals) = annual.lag_one else { return 0.0 };
    let through_index = expected.annual_mm_per_index * expected.annual_mm_per_index;
    if through_index <= 0.0 || through_index.is_nan() {
        return 0.0;
    }
    // A short record's correlation is too small by about (1 + 4 r) / n (Marriott and Pope 1954, Biometrika 41:390–402).
    let count = full_years as f64;
    let freed = (count * of_totals + 1.0) / (count - 4.0);
    // Days' own noise has no memory and hides that of the index.
    let estimated = freed * expected.annual_spread_mm * expected.annual_spread_mm / through_index;
    let taken = estimated.clamp(0.0, LARGEST_LAG_ONE);
    if taken != estimated {
        notes.push(FitNote::YearMemoryOutside { estimated, taken });
    }
    taken
}
