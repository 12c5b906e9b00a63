//! The generator fitted to a real mountain station, where the record is present; else skipped.

use crate::sample::{self, error_of_mean, mean, monthly, spread, totals};
use chrono::{Datelike, NaiveDate};
use deshielo::generator::{GeneratorDay, fit};
use std::path::Path;

/// Reads the record; a missing temperature takes the last one before it (98 of 9132 days), which no statistic here feels.
fn record() -> Option<Vec<GeneratorDay>> {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("../shared/observed/snow_station_daily.csv");
    let text = std::fs::read_to_string(path).ok()?;
    let (mut tmin_c, mut tmax_c) = (0.0, 0.0);
    let days = text.lines().skip(1).map(|line| {
        let cells: Vec<&str> = line.split(',').collect();
        if let (Ok(low), Ok(high)) = (cells[1].parse(), cells[2].parse()) {
            (tmin_c, tmax_c) = (low, high);
        }
        GeneratorDay {
            date: NaiveDate::parse_from_str(cells[0], "%Y-%m-%d").unwrap(),
            tmin_c,
            tmax_c,
            precipitation_mm: cells[4].parse().unwrap(),
            solar_mj_m2: None,
            relative_humidity_percent: None,
            wind_2m_ms: None,
        }
    });
    Some(days.collect())
}

#[test]
fn a_mountain_station_is_imitated_month_by_month() {
    let Some(record) = record() else {
        println!("skipped: no observed record");
        return;
    };
    let (recipe, report) = fit(&record, 10).unwrap();
    println!("{report:#?}\n{:?}", recipe.years);
    assert_eq!((report.full_years, report.depth_step_mm), (24, 2.54));
    assert!(report.years_fitted);
    let made = sample::years(&recipe, 240, 99);

    let wet = |days: &[&GeneratorDay]| {
        Some(days.iter().filter(|day| day.precipitation_mm > 0.0).count() as f64 / days.len() as f64)
    };
    let fall = |days: &[&GeneratorDay]| Some(days.iter().map(|day| day.precipitation_mm).sum::<f64>());
    let high = |days: &[&GeneratorDay]| Some(days.iter().map(|day| day.tmax_c).sum::<f64>() / days.len() as f64);
    let low = |days: &[&GeneratorDay]| Some(days.iter().map(|day| day.tmin_c).sum::<f64>() / days.len() as f64);
    type Statistic<'a> = (&'a str, &'a dyn Fn(&[&GeneratorDay]) -> Option<f64>, f64);
    // The last number: what two waves a year cannot follow of the real seasons, °C.
    let statistics: [Statistic; 4] =
        [("wet share", &wet, 0.0), ("fall mm", &fall, 0.0), ("tmax", &high, 0.6), ("tmin", &low, 0.6)];
    for (name, statistic, smooth) in statistics {
        for month in 1..=12 {
            let real = monthly(&record, 10, month, statistic);
            let ours = monthly(&made, 10, month, statistic);
            let error = (error_of_mean(&real, 0.0).powi(2) + error_of_mean(&ours, recipe.years.lag_one).powi(2)).sqrt();
            let off = mean(&ours) - mean(&real);
            println!(
                "{name:9} {month:2}: {:8.3} record, {:8.3} made, {:5.2} errors",
                mean(&real),
                mean(&ours),
                off / error
            );
            assert!(off.abs() < 4.0 * error + smooth, "{name} {month}: {off} {error}");
        }
    }
    // Day-to-day spread of temperatures in a month.
    for month in 1..=12 {
        for value in [|day: &GeneratorDay| day.tmax_c, |day: &GeneratorDay| day.tmin_c] {
            let of = |days: &[GeneratorDay]| {
                spread(&days.iter().filter(|day| day.date.month() == month).map(value).collect::<Vec<_>>())
            };
            // Some 750 days, six of which tell as much as one: a spread is known to about a sixteenth.
            let ratio = of(&made) / of(&record);
            println!("spread {month:2}: {ratio:.3}");
            assert!((ratio - 1.0).abs() < 4.0 / 16.0, "{month} {ratio}");
        }
    }
    // Yearly totals of the full water years: mean within four errors, spread within four (24 years: 15 %).
    let real: Vec<f64> = totals(&record, 10)[1..25].to_vec();
    let ours = totals(&made, 10);
    // The fit meets the record's months by construction; the record's first and last months, outside its full years, and
    // the leap days move the year's mean a little.
    let expected = recipe.expected_precipitation();
    println!("expected: {:.0} ± {:.0}", expected.annual_mean_mm, expected.annual_spread_mm);
    assert!((expected.annual_mean_mm / mean(&real) - 1.0).abs() < 0.02, "{}", expected.annual_mean_mm);
    assert!((expected.annual_spread_mm / spread(&real) - 1.0).abs() < 0.01, "{}", expected.annual_spread_mm);
    println!(
        "totals: {:.0} ± {:.0} record, {:.0} ± {:.0} made",
        mean(&real),
        spread(&real),
        mean(&ours),
        spread(&ours)
    );
    assert!((mean(&ours) - mean(&real)).abs() < 4.0 * error_of_mean(&real, 0.0));
    assert!((spread(&ours) / spread(&real) - 1.0).abs() < 4.0 / (2.0 * 24.0_f64).sqrt());
    assert!(expected.annual_spread_mm > expected.annual_spread_of_days_mm);
    assert!(made.iter().all(|day| day.tmin_c < day.tmax_c));
}
