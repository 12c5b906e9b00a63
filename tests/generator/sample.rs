//! Sample statistics that the tests share, each with its standard error where it has one.

use chrono::{Datelike, NaiveDate};
use deshielo::generator::{GeneratorDay, Recipe, generate};

/// A run of whole water years from the recipe's first month in 1601 on.
pub fn years(recipe: &Recipe, years: i32, seed: u64) -> Vec<GeneratorDay> {
    let month = recipe.water_year_start_month;
    let start = NaiveDate::from_ymd_opt(1600, month, 1).unwrap();
    let end = NaiveDate::from_ymd_opt(1600 + years, month, 1).unwrap();
    generate(recipe, start, (end - start).num_days() as usize, seed).unwrap()
}

/// Days cut into water years.
pub fn by_year(days: &[GeneratorDay], start_month: u32) -> Vec<&[GeneratorDay]> {
    let year = |day: &GeneratorDay| day.date.year() + i32::from(day.date.month() >= start_month);
    days.chunk_by(|one, next| year(one) == year(next)).collect()
}

pub fn mean(values: &[f64]) -> f64 {
    values.iter().sum::<f64>() / values.len() as f64
}

/// Standard deviation with divisor n − 1.
pub fn spread(values: &[f64]) -> f64 {
    let middle = mean(values);
    (values.iter().map(|value| (value - middle).powi(2)).sum::<f64>() / (values.len() as f64 - 1.0)).sqrt()
}

pub fn correlation(pairs: &[(f64, f64)]) -> f64 {
    let (one, other): (Vec<f64>, Vec<f64>) = pairs.iter().copied().unzip();
    let (mean_one, mean_other) = (mean(&one), mean(&other));
    let product: f64 = pairs.iter().map(|(a, b)| (a - mean_one) * (b - mean_other)).sum();
    product / (pairs.len() as f64 - 1.0) / spread(&one) / spread(&other)
}

pub fn lag_one(values: &[f64]) -> f64 {
    correlation(&values.windows(2).map(|pair| (pair[0], pair[1])).collect::<Vec<_>>())
}

/// Water years' totals, mm.
pub fn totals(days: &[GeneratorDay], start_month: u32) -> Vec<f64> {
    by_year(days, start_month).iter().map(|year| year.iter().map(|day| day.precipitation_mm).sum()).collect()
}

/// A value for one month of every water year that has the month and for which it is defined.
pub fn monthly(
    days: &[GeneratorDay],
    start_month: u32,
    month: u32,
    value: impl Fn(&[&GeneratorDay]) -> Option<f64>,
) -> Vec<f64> {
    by_year(days, start_month)
        .iter()
        .filter_map(|year| {
            let days: Vec<&GeneratorDay> = year.iter().filter(|day| day.date.month() == month).collect();
            if days.is_empty() { None } else { value(&days) }
        })
        .collect()
}

/// Standard error of the mean of yearly values; years that remember one another tell less than their number.
pub fn error_of_mean(values: &[f64], lag_one: f64) -> f64 {
    spread(values) * ((1.0 + lag_one) / (1.0 - lag_one) / values.len() as f64).sqrt()
}
