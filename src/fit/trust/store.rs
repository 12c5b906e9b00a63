//! A lake, a canal or snow beside its record.

use super::years::snow_peaks;
use crate::signs::skill::{DayOfYearMean, kling_gupta_2009, nash_sutcliffe, percent_bias};
use crate::water::calendar::CalendarDay;

/// Fewest days with a value that are scored.
pub const FEWEST_DAYS: usize = 60;

/// Scores of a series that is no river; efficiencies of daily values.
#[derive(Clone, Debug, PartialEq)]
pub struct StoreTrust {
    /// Days with both values.
    pub days: usize,
    /// Nash–Sutcliffe efficiency.
    pub nash_sutcliffe: Option<f64>,
    /// Kling–Gupta efficiency of 2009.
    pub kling_gupta: Option<f64>,
    /// Percent bias, positive where the model gives too little, %.
    pub percent_bias: Option<f64>,
    /// Mean size of the daily error, in the unit of the series.
    pub mean_error: f64,
    /// Mean observed value.
    pub mean_observed: f64,
    /// Nash–Sutcliffe efficiency of the day-of-year mean.
    pub guess: Option<f64>,
    /// The most of every year: water year, modelled, observed.
    pub peaks: Vec<(i32, f64, f64)>,
}

impl StoreTrust {
    /// Of two series as long as `calendar`; `None` for fewer than `FEWEST_DAYS` days with both.
    pub fn of(calendar: &[CalendarDay], start_month: u8, modelled: &[f64], observed: &[f64]) -> Option<Self> {
        let pairs = || modelled.iter().zip(observed).filter(|(m, o)| !m.is_nan() && !o.is_nan());
        let days = pairs().count();
        if days < FEWEST_DAYS {
            return None;
        }
        let mean = |value: fn((&f64, &f64)) -> f64| pairs().map(value).sum::<f64>() / days as f64;
        let usual = DayOfYearMean::of(calendar, observed);
        let guessed: Vec<f64> = calendar.iter().map(|day| usual.on(day)).collect();
        Some(Self {
            days,
            nash_sutcliffe: nash_sutcliffe(modelled, observed),
            kling_gupta: kling_gupta_2009(modelled, observed).map(|parts| parts.efficiency),
            percent_bias: percent_bias(modelled, observed),
            mean_error: mean(|(m, o)| (m - o).abs()),
            mean_observed: mean(|(_, o)| *o),
            guess: nash_sutcliffe(&guessed, observed),
            peaks: snow_peaks(calendar, start_month, modelled, observed),
        })
    }
}
