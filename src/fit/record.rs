//! What a fit is held against: the weather, the gauge and perhaps a snow record, day by day.

use serde::{Deserialize, Serialize};

use super::objective::Objective;
use crate::water::calendar::CalendarDay;
use crate::water::run::{WaterYear, water_years};
use crate::water::weather::StationDay;

/// Fewest days with a measured flow that a span must have to be fitted or judged (about half a year; common practice,
/// no source).
pub const FEWEST_DAYS: usize = 180;
/// Share of a water year's days that must have a flow for the year to count as gauged (common practice, no source).
pub const GAUGED_SHARE: f64 = 0.5;

/// What the gauge measures.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum Measures {
    /// Natural flow.
    Natural,
    /// Flow into a reservoir, worked out from its storage; it may be slightly negative.
    ComputedInflow,
    /// What diversions have left: nothing that a basin could be fitted to.
    BelowDiversions,
}

/// Where snow water was measured.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum SnowAt {
    /// The mean over the bands.
    Basin,
    /// One spot.
    Spot {
        /// Its elevation, m.
        elevation_m: f64,
        /// Its factor on the degree-day factor, as a band has one.
        melt_exposure: f64,
    },
}

/// A record of snow water.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SnowRecord<'r> {
    /// Where.
    pub at: SnowAt,
    /// Snow water equivalent in the evening, mm; NaN where not measured.
    pub swe_mm: &'r [f64],
}

/// All records of a place, as long as each other.
#[derive(Clone, Copy, Debug)]
pub struct Record<'r> {
    /// The days.
    pub calendar: &'r [CalendarDay],
    /// The station's weather, whole.
    pub weather: &'r [StationDay],
    /// What the gauge measures.
    pub measures: Measures,
    /// Daily flow at the dam, m³/s; NaN where not measured.
    pub flow_m3s: &'r [f64],
    /// Snow water, where somebody measured it.
    pub snow: Option<SnowRecord<'r>>,
}

/// Why nothing could be fitted.
#[derive(Clone, Debug, PartialEq)]
pub enum FitError {
    /// The gauge stands below diversions.
    BelowDiversions,
    /// The records are not equally long.
    UnequalLengths,
    /// A measured value is infinite.
    NotFinite {
        /// Index of the day.
        day: usize,
    },
    /// Too few days with a measured value in a span.
    TooFewDays {
        /// Days found.
        found: usize,
        /// Days needed.
        needed: usize,
    },
    /// Too few gauged water years to part into two halves.
    TooFewYears {
        /// Years found after warm-up.
        found: usize,
        /// Years needed.
        needed: usize,
    },
    /// The observed values of a span do not vary, or their mean is zero: no score is defined.
    NoVariation,
    /// The objective asks for snow, and there is no snow record.
    NoSnowRecord,
    /// A setting of the search is out of its range.
    WrongSetting {
        /// Its name.
        name: &'static str,
    },
    /// No point of the search could be scored.
    NothingScored,
}

impl Record<'_> {
    /// Whether the record can be fitted at all.
    ///
    /// # Errors
    /// The gauge below diversions, records of different length, an infinite value, a missing snow record.
    pub fn check(&self, objective: Objective) -> Result<(), FitError> {
        if self.measures == Measures::BelowDiversions {
            return Err(FitError::BelowDiversions);
        }
        let days = self.calendar.len();
        let snow_mm = self.snow.map_or(&[] as &[f64], |snow| snow.swe_mm);
        let snow_fits = self.snow.is_none() || snow_mm.len() == days;
        if self.weather.len() != days || self.flow_m3s.len() != days || !snow_fits {
            return Err(FitError::UnequalLengths);
        }
        if objective.needs_snow() && self.snow.is_none() {
            return Err(FitError::NoSnowRecord);
        }
        match (0..days)
            .find(|&day| self.flow_m3s[day].is_infinite() || snow_mm.get(day).is_some_and(|s| s.is_infinite()))
        {
            Some(day) => Err(FitError::NotFinite { day }),
            None => Ok(()),
        }
    }

    /// The whole water years of the record after `warm_up_years`, with a flow on at least half of their days.
    pub fn gauged_years(&self, start_month: u8, warm_up_years: usize) -> Vec<WaterYear> {
        let gauged = |year: &WaterYear| {
            let flows = &self.flow_m3s[year.first..year.first + year.days];
            let days = flows.iter().filter(|flow| !flow.is_nan()).count();
            days as f64 >= GAUGED_SHARE * year.days as f64
        };
        water_years(self.calendar, start_month).skip(warm_up_years).filter(gauged).collect()
    }

    /// What to score on the days of `years`.
    ///
    /// # Errors
    /// Fewer than [`FEWEST_DAYS`] measured flows (or snow depths, if the objective looks at them), or none that vary.
    pub fn target(&self, years: &[WaterYear], objective: Objective) -> Result<Target, FitError> {
        let days = years.iter().map(|year| year.first + year.days).max().unwrap_or(0);
        let only_those = |values: &[f64]| {
            let mut kept = vec![f64::NAN; days];
            for year in years {
                let span = year.first..year.first + year.days;
                kept[span.clone()].copy_from_slice(&values[span]);
            }
            kept
        };
        let flow_m3s = only_those(self.flow_m3s);
        check_span(&flow_m3s)?;
        let snow_mm = match self.snow {
            Some(snow) if objective.needs_snow() => {
                let snow_mm = only_those(snow.swe_mm);
                check_span(&snow_mm)?;
                Some((snow.at, snow_mm))
            }
            _ => None,
        };
        Ok(Target { flow_m3s, snow_mm })
    }
}

fn check_span(values: &[f64]) -> Result<(), FitError> {
    let mut known = values.iter().filter(|value| !value.is_nan());
    let found = known.clone().count();
    if found < FEWEST_DAYS {
        return Err(FitError::TooFewDays { found, needed: FEWEST_DAYS });
    }
    let first = known.next();
    let varies = known.clone().any(|value| Some(value) != first);
    let sum: f64 = values.iter().filter(|value| !value.is_nan()).sum();
    if varies && sum != 0.0 { Ok(()) } else { Err(FitError::NoVariation) }
}

/// The observed values of the days that count, from the record's first day to the last that counts; NaN on the others.
#[derive(Clone, Debug, PartialEq)]
pub struct Target {
    /// Flow, m³/s.
    pub flow_m3s: Vec<f64>,
    /// Snow water, mm, and where, if the objective looks at it.
    pub snow_mm: Option<(SnowAt, Vec<f64>)>,
}

impl Target {
    /// Days that must be run.
    pub fn days(&self) -> usize {
        self.flow_m3s.len()
    }
}
