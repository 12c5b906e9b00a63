//! Fit on one half of the years, judge on the other, then the other way round.
//!
//! The split-sample test and the differential split-sample test of Klemeš (1986), *Hydrological Sciences Journal* 31(1),
//! 13–24: earlier against later years, and cold against warm years, because warming is what people ask about. What a
//! half costs is told by the *loss*: the score that the half's own fit reaches there less the score of the set that never
//! saw it. A hard half alone is no loss.

use serde::{Deserialize, Serialize};

use super::objective::Objective;
use super::record::{FitError, Record, Target};
use crate::signs::skill::{DayOfYearMean, kling_gupta_2009, nash_sutcliffe, percent_bias};
use crate::water::run::WaterYear;

/// Fewest gauged years of a half (common practice, no source).
pub const FEWEST_YEARS_OF_HALF: usize = 2;
/// Up to this loss the fit holds (common practice, no source).
pub const HOLDS_WITHIN: f64 = 0.1;
/// Beyond this loss it fails (common practice, no source).
pub const FAILS_BEYOND: f64 = 0.25;

/// How the years are parted.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum Parting {
    /// Earlier years, then later years.
    EarlierLater,
    /// Colder years, then warmer years, by the station's mean temperature.
    ColderWarmer,
}

/// Scores of one set on one span of years; `None` where a score is not defined.
#[derive(Clone, Copy, Debug, Default, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct Scores {
    /// Of the objective.
    pub objective: Option<f64>,
    /// Kling–Gupta efficiency of 2009 of daily flow.
    pub kling_gupta: Option<f64>,
    /// Its correlation.
    pub correlation: Option<f64>,
    /// Its ratio of standard deviations.
    pub variability: Option<f64>,
    /// Its ratio of means.
    pub bias: Option<f64>,
    /// Nash–Sutcliffe efficiency of daily flow.
    pub nash_sutcliffe: Option<f64>,
    /// Percent bias of daily flow, %, positive where the model gives too little.
    pub percent_bias: Option<f64>,
}

impl Scores {
    /// Scores of a modelled flow, m³/s, and snow water, mm, from the first day of the record on.
    pub fn of(objective: Objective, flow_m3s: &[f64], snow_mm: &[f64], target: &Target) -> Self {
        let days = target.days();
        let observed = &target.flow_m3s;
        let flow_m3s = &flow_m3s[..days.min(flow_m3s.len())];
        let snow_mm = &snow_mm[..days.min(snow_mm.len())];
        let parts = kling_gupta_2009(flow_m3s, observed);
        Self {
            objective: objective.score(flow_m3s, snow_mm, target),
            kling_gupta: parts.map(|parts| parts.efficiency),
            correlation: parts.map(|parts| parts.correlation),
            variability: parts.map(|parts| parts.variability),
            bias: parts.map(|parts| parts.bias),
            nash_sutcliffe: nash_sutcliffe(flow_m3s, observed),
            percent_bias: percent_bias(flow_m3s, observed),
        }
    }
}

/// One half of a test.
#[derive(Clone, Debug, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct Half {
    /// Its water years.
    pub water_years: Vec<i32>,
    /// Mean temperature of those years at the station, °C.
    pub mean_temperature_c: f64,
    /// The set fitted on this half, its values in the order of the parameters.
    pub values: Vec<f64>,
    /// Of the set fitted on this half.
    pub fitted: Scores,
    /// Of the set fitted on the other half.
    pub judged: Scores,
    /// What the day-of-year mean of the other half's observed flow reaches here: Kling–Gupta efficiency of daily flow.
    pub guess_kling_gupta: Option<f64>,
}

/// What a set that never saw a half is worth there.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Transfer {
    /// Nearly as good as a set fitted there.
    Holds,
    /// Clearly worse than a set fitted there.
    Weakens,
    /// Far worse than a set fitted there, worse than the guess, or without a score: the years differ in a way that the
    /// model does not know.
    Fails,
}

impl Half {
    /// Score lost by not having seen this half; `None` where a score is not defined.
    pub fn loss(&self) -> Option<f64> {
        Some(self.fitted.objective? - self.judged.objective?)
    }

    /// What the other half's set is worth here.
    pub fn transfer(&self) -> Transfer {
        let Some(loss) = self.loss() else { return Transfer::Fails };
        let beaten = match (self.judged.kling_gupta, self.guess_kling_gupta) {
            (Some(judged), Some(guess)) => judged < guess,
            (None, _) => true,
            (Some(_), None) => false,
        };
        if loss > FAILS_BEYOND || beaten {
            Transfer::Fails
        } else if loss > HOLDS_WITHIN {
            Transfer::Weakens
        } else {
            Transfer::Holds
        }
    }
}

/// A test with both of its halves.
#[derive(Clone, Debug, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct SplitTest {
    /// How the years were parted.
    pub parting: Parting,
    /// The earlier or colder half, then the other.
    pub halves: [Half; 2],
}

impl SplitTest {
    /// The worse of the two halves.
    pub fn transfer(&self) -> Transfer {
        self.halves[0].transfer().max(self.halves[1].transfer())
    }
}

/// The two halves of `years`; the middle one of an odd number is with the first.
///
/// # Errors
/// [`FitError::TooFewYears`] under [`FEWEST_YEARS_OF_HALF`] a half.
pub fn part(record: &Record<'_>, years: &[WaterYear], parting: Parting) -> Result<[Vec<WaterYear>; 2], FitError> {
    let needed = 2 * FEWEST_YEARS_OF_HALF;
    if years.len() < needed {
        return Err(FitError::TooFewYears { found: years.len(), needed });
    }
    let mut ordered = years.to_vec();
    if parting == Parting::ColderWarmer {
        ordered.sort_by(|a, b| mean_temperature_c(record, &[*a]).total_cmp(&mean_temperature_c(record, &[*b])));
    }
    let mut second = ordered.split_off(ordered.len().div_ceil(2));
    ordered.sort_by_key(|year| year.first);
    second.sort_by_key(|year| year.first);
    Ok([ordered, second])
}

/// Mean temperature of `years` at the station, °C; NaN for no years.
pub fn mean_temperature_c(record: &Record<'_>, years: &[WaterYear]) -> f64 {
    let (mut sum_c, mut count) = (0.0, 0.0);
    for year in years {
        for day in &record.weather[year.first..year.first + year.days] {
            sum_c += day.mean_temperature_c;
            count += 1.0;
        }
    }
    sum_c / count
}

/// What the day-of-year mean of `seen` reaches on `unseen`: Kling–Gupta efficiency of daily flow.
pub fn guess(record: &Record<'_>, seen: &Target, unseen: &Target) -> Option<f64> {
    let means = DayOfYearMean::of(record.calendar, &seen.flow_m3s);
    let guessed: Vec<f64> = record.calendar[..unseen.days()].iter().map(|day| means.on(day)).collect();
    kling_gupta_2009(&guessed, &unseen.flow_m3s).map(|parts| parts.efficiency)
}
