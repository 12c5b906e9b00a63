//! A record made ready for fitting: checked, sorted into wet and dry days, months and water years.

use super::super::GeneratorDay;
use super::super::run::water_year;
use super::super::season::{month_of, place_of};
use super::{FitError, LEAST_DAYS_OF_A_KIND, LEAST_FULL_YEARS, LEAST_YEARS_FOR_SPREAD};
use chrono::{Datelike, NaiveDate};

/// Steps in which gauges are read, mm, coarsest first: tenths and hundredths of an inch, and metric ones.
const GAUGE_STEPS_MM: [f64; 6] = [2.54, 1.0, 0.5, 0.254, 0.2, 0.1];
/// How far, mm, a depth may lie from a whole step: records are often written with two decimals.
const STEP_TOLERANCE_MM: f64 = 0.0055;

/// One day of the record.
pub(super) struct RecordDay {
    pub day: GeneratorDay,
    /// Place in the leap-year calendar.
    pub place: usize,
    /// Month, 0–11.
    pub month: usize,
    /// Whether at least half a step fell.
    pub wet: bool,
    /// Depth in whole steps.
    pub steps: u32,
    /// Whether the day before is in the record.
    pub follows: bool,
}

/// One water year without a missing day.
pub(super) struct FullYear {
    pub water_year: i32,
    pub total_mm: f64,
    pub wet_days: f64,
    pub mean_temperature_c: f64,
}

/// Statistics of the full years' totals.
pub(super) struct Annual {
    pub mean_mm: f64,
    pub variance_mm2: f64,
    pub lag_one: Option<f64>,
}

pub(super) struct Record {
    pub days: Vec<RecordDay>,
    pub full_years: Vec<FullYear>,
    pub step_mm: f64,
    pub first_place: usize,
}

impl Record {
    pub(super) fn read(record: &[GeneratorDay], start_month: u32) -> Result<Self, FitError> {
        if !(1..=12).contains(&start_month) {
            return Err(FitError::WrongMonth { month: start_month });
        }
        check_days(record)?;
        let step_mm = gauge_step_mm(record);
        let mut before: Option<NaiveDate> = None;
        let days: Vec<RecordDay> = record
            .iter()
            .map(|day| {
                let place = place_of(day.date.month(), day.date.day());
                // A depth beyond four thousand million steps cannot be; the cast then stops at the largest whole number.
                let steps = libm::floor(day.precipitation_mm / step_mm + 0.5) as u32;
                let follows = before.is_some_and(|before| before.succ_opt() == Some(day.date));
                before = Some(day.date);
                RecordDay { day: *day, place, month: month_of(place), wet: steps > 0, steps, follows }
            })
            .collect();
        let full_years = full_years(&days, start_month);
        if full_years.len() < LEAST_FULL_YEARS {
            return Err(FitError::TooFewYears { full_years: full_years.len(), needed: LEAST_FULL_YEARS });
        }
        let wet_days = days.iter().filter(|day| day.wet).count();
        let dry_days = days.len() - wet_days;
        if wet_days < LEAST_DAYS_OF_A_KIND || dry_days < LEAST_DAYS_OF_A_KIND {
            return Err(FitError::TooFewDaysOfAKind { wet_days, dry_days, needed: LEAST_DAYS_OF_A_KIND });
        }
        Ok(Self { days, full_years, step_mm, first_place: place_of(start_month, 1) })
    }

    pub(super) fn annual(&self) -> Annual {
        let totals: Vec<f64> = self.full_years.iter().map(|year| year.total_mm).collect();
        let (mean_mm, variance_mm2) = mean_and_variance(&totals);
        let enough = totals.len() >= LEAST_YEARS_FOR_SPREAD && variance_mm2 > 0.0;
        let products: Vec<f64> = self
            .full_years
            .windows(2)
            .filter(|pair| pair[1].water_year == pair[0].water_year + 1)
            .map(|pair| (pair[0].total_mm - mean_mm) * (pair[1].total_mm - mean_mm))
            .collect();
        let lag_one = (enough && !products.is_empty())
            .then(|| products.iter().sum::<f64>() / products.len() as f64 / variance_mm2);
        Annual { mean_mm, variance_mm2, lag_one }
    }
}

/// Mean and variance (divisor n − 1) of some values; a single value has no variance.
pub(super) fn mean_and_variance(values: &[f64]) -> (f64, f64) {
    let count = values.len() as f64;
    let mean = values.iter().sum::<f64>() / count;
    let squares: f64 = values.iter().map(|value| (value - mean) * (value - mean)).sum();
    (mean, if values.len() > 1 { squares / (count - 1.0) } else { 0.0 })
}

fn check_days(record: &[GeneratorDay]) -> Result<(), FitError> {
    for pair in record.windows(2) {
        if pair[1].date <= pair[0].date {
            return Err(FitError::DatesNotAscending { date: pair[1].date });
        }
    }
    for day in record {
        let date = day.date;
        let optional = |value: Option<f64>| value.unwrap_or(0.0);
        let fields = [
            ("tmin_c", day.tmin_c),
            ("tmax_c", day.tmax_c),
            ("precipitation_mm", day.precipitation_mm),
            ("solar_mj_m2", optional(day.solar_mj_m2)),
            ("relative_humidity_percent", optional(day.relative_humidity_percent)),
            ("wind_2m_ms", optional(day.wind_2m_ms)),
        ];
        if let Some(&(field, _)) = fields.iter().find(|(_, value)| !value.is_finite()) {
            return Err(FitError::NotANumber { date, field });
        }
        if day.precipitation_mm < 0.0 {
            return Err(FitError::NegativePrecipitation { date, precipitation_mm: day.precipitation_mm });
        }
        if day.tmin_c > day.tmax_c {
            return Err(FitError::TminAboveTmax { date, tmin_c: day.tmin_c, tmax_c: day.tmax_c });
        }
    }
    Ok(())
}

/// The coarsest known step of which every depth is a multiple; 0.1 mm if there is none.
fn gauge_step_mm(record: &[GeneratorDay]) -> f64 {
    let fits = |step: f64| {
        record.iter().map(|day| day.precipitation_mm).all(|depth| {
            let nearest = libm::floor(depth / step + 0.5) * step;
            (depth - nearest).abs() <= STEP_TOLERANCE_MM
        })
    };
    GAUGE_STEPS_MM.into_iter().find(|&step| fits(step)).unwrap_or(0.1)
}

fn full_years(days: &[RecordDay], start_month: u32) -> Vec<FullYear> {
    days.chunk_by(|one, next| water_year(one.day.date, start_month) == water_year(next.day.date, start_month))
        .filter_map(|days| {
            let first = days.first()?.day.date;
            let year = water_year(first, start_month);
            let begins = if start_month > 1 { year - 1 } else { year };
            let start = NaiveDate::from_ymd_opt(begins, start_month, 1)?;
            let end = NaiveDate::from_ymd_opt(begins + 1, start_month, 1)?;
            let length = (end - start).num_days();
            (days.len() as i64 == length).then(|| FullYear {
                water_year: year,
                total_mm: days.iter().map(|day| day.day.precipitation_mm).sum(),
                wet_days: days.iter().filter(|day| day.wet).count() as f64,
                mean_temperature_c: days.iter().map(|day| 0.5 * (day.day.tmin_c + day.day.tmax_c)).sum::<f64>()
                    / length as f64,
            })
        })
        .collect()
}
