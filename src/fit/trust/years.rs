//! Skill year by year, and whether the error of a year came with the snow or after it.

use crate::signs::skill::{kling_gupta_2009, nash_sutcliffe};
use crate::water::calendar::CalendarDay;
use crate::water::run::water_years;
use crate::water::units::{M3_PER_HM3, SECONDS_PER_DAY};

/// Share of a year's days that must have both values for its volume and timing to be told (common practice, no source).
const LEAST_SHARE: f64 = 0.95;
/// Fewest years from which a link is read (common practice, no source).
const FEWEST_YEARS: usize = 5;

/// A whole water year.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct YearSkill {
    /// Its name.
    pub water_year: i32,
    /// Observed volume on the days that have both, hm³.
    pub observed_hm3: f64,
    /// Modelled volume on the same days.
    pub modelled_hm3: f64,
    /// Observed volume of late summer, hm³.
    pub observed_late_hm3: f64,
    /// Modelled volume of late summer on the same days.
    pub modelled_late_hm3: f64,
    /// Nash–Sutcliffe efficiency of the year's days.
    pub nash_sutcliffe: Option<f64>,
    /// Kling–Gupta efficiency of 2009 of the year's days.
    pub kling_gupta: Option<f64>,
    /// Day of the water year with half of the observed volume past.
    pub observed_half_day: u16,
    /// The same, modelled.
    pub modelled_half_day: u16,
}

/// The years with a value on nearly all days; months of `late` are late summer.
pub(super) fn years(
    calendar: &[CalendarDay],
    start_month: u8,
    modelled: &[f64],
    observed: &[f64],
    late: [u8; 2],
) -> Vec<YearSkill> {
    let skill = |first: usize, days: usize, water_year: i32| {
        let span = first..first + days;
        let (modelled, observed) = (modelled.get(span.clone())?, observed.get(span.clone())?);
        let pairs = || modelled.iter().zip(observed).zip(&calendar[span.clone()]).filter(both);
        if (pairs().count() as f64) < LEAST_SHARE * days as f64 {
            return None;
        }
        let volumes = |counts: &dyn Fn(&CalendarDay) -> bool| {
            let days = pairs().filter(|(_, day)| counts(day));
            let (m, o) = days.fold((0.0, 0.0), |sum, ((m, o), _)| (sum.0 + m, sum.1 + o));
            (m * SECONDS_PER_DAY / M3_PER_HM3, o * SECONDS_PER_DAY / M3_PER_HM3)
        };
        let (modelled_hm3, observed_hm3) = volumes(&|_| true);
        let (modelled_late_hm3, observed_late_hm3) = volumes(&|day| late.contains(&day.month_day.month));
        let half_day = |value: fn((&f64, &f64)) -> f64| {
            let total: f64 = pairs().map(|(pair, _)| value(pair)).sum();
            let mut past = 0.0;
            let passes = |(pair, day): ((&f64, &f64), &CalendarDay)| {
                past += value(pair);
                (past >= 0.5 * total).then_some(day.day_of_water_year)
            };
            pairs().find_map(passes).unwrap_or(0)
        };
        Some(YearSkill {
            water_year,
            observed_hm3,
            modelled_hm3,
            observed_late_hm3,
            modelled_late_hm3,
            nash_sutcliffe: nash_sutcliffe(modelled, observed),
            kling_gupta: kling_gupta_2009(modelled, observed).map(|parts| parts.efficiency),
            observed_half_day: half_day(|(_, o)| *o),
            modelled_half_day: half_day(|(m, _)| *m),
        })
    };
    water_years(calendar, start_month).filter_map(|year| skill(year.first, year.days, year.water_year)).collect()
}

fn both(((m, o), _): &((&f64, &f64), &CalendarDay)) -> bool {
    !m.is_nan() && !o.is_nan()
}

/// How the error of the year's volume goes with the error of its most snow water.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SnowLink {
    /// Years with both.
    pub years: usize,
    /// Correlation of the two errors, −1 to 1.
    pub correlation: f64,
    /// Mean error of the most snow water, modelled less observed, as a share of the observed mean.
    pub snow_error_share: f64,
    /// Mean error of the volume, likewise.
    pub volume_error_share: f64,
}

impl SnowLink {
    /// Of yearly peaks of snow water (water year, modelled, observed; mm) and the years' volumes. `None` for fewer than
    /// five years, or where one of the errors does not vary.
    pub fn of(peaks: &[(i32, f64, f64)], years: &[YearSkill]) -> Option<Self> {
        let pair = |year: &YearSkill| {
            let (_, m, o) = peaks.iter().find(|peak| peak.0 == year.water_year)?;
            Some((m - o, year.modelled_hm3 - year.observed_hm3, *o, year.observed_hm3))
        };
        let pairs: Vec<(f64, f64, f64, f64)> = years.iter().filter_map(pair).collect();
        let count = pairs.len() as f64;
        let mean = |value: fn(&(f64, f64, f64, f64)) -> f64| pairs.iter().map(value).sum::<f64>() / count;
        let (snow, volume) = (mean(|pair| pair.0), mean(|pair| pair.1));
        let (mut product, mut of_snow, mut of_volume) = (0.0, 0.0, 0.0);
        for pair in &pairs {
            let (a, b) = (pair.0 - snow, pair.1 - volume);
            (product, of_snow, of_volume) = (product + a * b, of_snow + a * a, of_volume + b * b);
        }
        let observed = (mean(|pair| pair.2), mean(|pair| pair.3));
        let varies = of_snow > 0.0 && of_volume > 0.0 && observed.0 > 0.0 && observed.1 > 0.0;
        (pairs.len() >= FEWEST_YEARS && varies).then(|| Self {
            years: pairs.len(),
            correlation: product / libm::sqrt(of_snow * of_volume),
            snow_error_share: snow / observed.0,
            volume_error_share: volume / observed.1,
        })
    }
}

/// The most snow water of every whole water year, modelled and observed on the same days, mm; years in which fewer than
/// half of the days were observed are left out.
pub(super) fn snow_peaks(
    calendar: &[CalendarDay],
    start_month: u8,
    modelled: &[f64],
    observed: &[f64],
) -> Vec<(i32, f64, f64)> {
    let peak = |first: usize, days: usize, water_year: i32| {
        let span = first..first + days;
        let pairs = modelled.get(span.clone())?.iter().zip(observed.get(span)?);
        let known: Vec<(f64, f64)> = pairs.filter(|(m, o)| !m.is_nan() && !o.is_nan()).map(|(m, o)| (*m, *o)).collect();
        let most = |value: fn(&(f64, f64)) -> f64| known.iter().map(value).fold(0.0, f64::max);
        (2 * known.len() >= days).then(|| (water_year, most(|pair| pair.0), most(|pair| pair.1)))
    };
    water_years(calendar, start_month).filter_map(|year| peak(year.first, year.days, year.water_year)).collect()
}
