//! Fitting: what was put in comes out again, and what cannot be fitted is refused or told.

use crate::sample::{self, mean, monthly, spread, totals};
use chrono::Datelike;
use deshielo::generator::{FitError, FitNote, GeneratorDay, Recipe, Site, YearIndex, fit, fit_at, invented};
use proptest::prelude::*;

#[test]
fn recipes_are_recovered_from_their_own_weather() {
    let years = 200;
    for (truth, site) in [
        (invented::tresnubes(), Site { latitude_degrees: 39.5, elevation_m: 2300.0 }),
        (invented::valle_del_sur(), Site { latitude_degrees: -33.0, elevation_m: 1600.0 }),
    ] {
        let record = sample::years(&truth, years, 31);
        let (found, report) = fit_at(&record, truth.water_year_start_month, Some(site)).unwrap();
        println!("{} {report:?}", truth.about);
        println!("{:?} {:?}", found.years, truth.years);
        assert_eq!((report.full_years, report.depth_step_mm), (years as usize, 0.1));
        assert!(report.years_fitted);

        // Precipitation: the fit meets the record's own months and totals, not only the recipe's.
        let expected = found.expected_precipitation();
        let totals = totals(&record, truth.water_year_start_month);
        assert!((expected.annual_mean_mm / mean(&totals) - 1.0).abs() < 0.005, "{expected:?}");
        assert!((expected.annual_spread_mm / spread(&totals) - 1.0).abs() < 0.01, "{expected:?}");
        let theirs = truth.expected_precipitation();
        for month in 0..12 {
            let days = years as f64 * 30.0;
            let share = theirs.wet_share[month];
            // Wet days come in clumps and years differ: a binomial error widened by (1 + r) / (1 − r) and the index.
            let memory = truth.wetness.wet_to_wet[month] - truth.wetness.dry_to_wet[month];
            let error = (share * (1.0 - share) * (1.0 + memory) / (1.0 - memory) / days
                + (truth.years.wetness_shift * share).powi(2) * 3.0 / years as f64)
                .sqrt();
            assert!((expected.wet_share[month] - share).abs() < 4.0 * error, "{month} {share}");
        }
        let n = years as f64;
        let lag = theirs.annual_lag_one;
        assert!((expected.annual_lag_one - lag).abs() < 4.0 / n.sqrt(), "{} {lag}", expected.annual_lag_one);
        // The shift of wetness from the spread of wet days: half its variance's relative error, carried through.
        let (_, wet_spread) = theirs.annual_wet_days;
        let mut days_only = truth.clone();
        days_only.years.wetness_shift = 0.0;
        let beyond = wet_spread.powi(2) - days_only.expected_precipitation().annual_wet_days.1.powi(2);
        let error = truth.years.wetness_shift * 0.5 * (2.0 / n).sqrt() * wet_spread.powi(2) / beyond;
        let off = found.years.wetness_shift - truth.years.wetness_shift;
        assert!(off.abs() < 4.0 * error, "{off} {error}");

        // Temperature: curves over the year within the errors of their daily memory.
        let t = (&found.temperature, &truth.temperature);
        for (one, other) in [
            (&t.0.tmax_dry_c, &t.1.tmax_dry_c),
            (&t.0.tmin_dry_c, &t.1.tmin_dry_c),
            (&t.0.tmax_wet_c, &t.1.tmax_wet_c),
            (&t.0.tmin_wet_c, &t.1.tmin_wet_c),
        ] {
            // Some 4 °C of spread, a memory of 0.7 (six days tell as much as one) and years of 0.5 °C, over the dry or
            // wet days of 200 years; the bend of small ranges adds at most 0.05 °C.
            let wet_days = report.wet_days as f64;
            let limit = 4.0 * (16.0 * 6.0 / wet_days + 0.25 / n).sqrt() + 0.05;
            assert!((one.mean - other.mean).abs() < limit, "{one:?} {other:?} {limit}");
        }
        for (one, other) in
            [(&t.0.tmax_dry_spread_c, &t.1.tmax_dry_spread_c), (&t.0.tmin_dry_spread_c, &t.1.tmin_dry_spread_c)]
        {
            // Relative error of a spread sqrt(1 / 2 n), three days telling as much as one.
            let limit = 4.0 * (3.0 / (2.0 * 365.0 * n * 0.6_f64)).sqrt();
            assert!((one.mean / other.mean - 1.0).abs() < limit, "{one:?} {other:?} {limit}");
        }
        for row in 0..3 {
            for column in 0..3 {
                let pair = |one: [[f64; 3]; 3], other: [[f64; 3]; 3]| (one[row][column] - other[row][column]).abs();
                // As in the test of the runs themselves, and 0.01 for what the year's warmth leaves behind.
                let limit = 4.0 * (3.0 / (365.0 * n)).sqrt() + 0.01;
                assert!(pair(found.residuals.same_day, truth.residuals.same_day) < limit, "{row} {column}");
                assert!(pair(found.residuals.day_before, truth.residuals.day_before) < limit, "{row} {column}");
            }
        }
        // A spread of yearly warmth: relative error sqrt(1 / 2 n), a little more since days hide part of it.
        let off = found.years.temperature_spread_c / truth.years.temperature_spread_c - 1.0;
        assert!(off.abs() < 4.0 * (1.0 / n).sqrt(), "{off}");
        let (sun, their_sun) = (found.radiation.unwrap(), truth.radiation.unwrap());
        assert!((sun.dry_spread_log_odds / their_sun.dry_spread_log_odds - 1.0).abs() < 0.02);
        let (wind, their_wind) = (found.wind.unwrap(), truth.wind.unwrap());
        // Justus's formula for the shape is itself good to a few per cent.
        assert!((wind.shape / their_wind.shape - 1.0).abs() < 0.04, "{}", wind.shape);
        let (air, their_air) = (found.humidity.unwrap(), truth.humidity.unwrap());
        assert!((air.dry_dewpoint_below_tmin_c - their_air.dry_dewpoint_below_tmin_c).abs() < 1e-6);
    }
}

#[test]
fn fitted_weather_has_the_records_months() {
    let record = sample::years(&invented::tresnubes(), 40, 5);
    let (recipe, _) = fit(&record, 10).unwrap();
    let expected = recipe.expected_precipitation();
    for month in 1..=12 {
        let at = month as usize - 1;
        let days: Vec<&GeneratorDay> = record.iter().filter(|day| day.date.month() == month).collect();
        let wet: Vec<f64> = days.iter().map(|day| day.precipitation_mm).filter(|depth| *depth > 0.0).collect();
        let share = wet.len() as f64 / days.len() as f64;
        // By construction, up to where 29 February falls in these forty years and the rounds of matching end.
        assert!((expected.wet_share[at] / share - 1.0).abs() < 1e-3, "{month}");
        assert!((expected.wet_day_depth_mm[at] / mean(&wet) - 1.0).abs() < 5e-3, "{month}");
    }
}

#[test]
fn coarse_gauges_are_recognised() {
    let truth = Recipe { depth_step_mm: 2.54, ..invented::tresnubes() };
    let record = sample::years(&truth, 60, 17);
    let (recipe, report) = fit(&record, 10).unwrap();
    assert_eq!(report.depth_step_mm, 2.54);
    let again = sample::years(&recipe, 60, 18);
    assert!(again.iter().all(|day| day.precipitation_mm == 0.0 || day.precipitation_mm >= 2.53));
    let share = |days: &[GeneratorDay]| {
        monthly(days, 10, 1, |days| Some(days.iter().filter(|day| day.precipitation_mm > 0.0).count() as f64))
    };
    let (one, other) = (share(&record), share(&again));
    let error = (sample::error_of_mean(&one, 0.3).powi(2) + sample::error_of_mean(&other, 0.3).powi(2)).sqrt();
    assert!((mean(&one) - mean(&other)).abs() < 4.0 * error);
}

#[test]
fn short_records_take_the_years_from_elsewhere_and_say_so() {
    let record = sample::years(&invented::tresnubes(), 5, 4);
    let (recipe, report) = fit(&record, 10).unwrap();
    assert_eq!(recipe.years, YearIndex::WHEN_UNKNOWN);
    assert!(!report.years_fitted && report.annual_lag_one.is_none());
    assert!(report.notes.contains(&FitNote::YearsNotFitted { full_years: 5, needed: 15 }));
    assert!(
        report.notes.iter().any(|note| matches!(note, FitNote::LeftOut { field: "solar_mj_m2", days } if *days > 1800))
    );
    assert!(recipe.radiation.is_none() && recipe.humidity.is_some());
    let expected = recipe.expected_precipitation();
    assert!((expected.annual_mean_mm / report.annual_mean_mm - 1.0).abs() < 0.01);
}

#[test]
fn years_alike_are_told() {
    let mut truth = invented::tresnubes();
    (truth.years.wetness_shift, truth.years.depth_shift) = (0.0, 0.0);
    truth.years.temperature_spread_c = 0.0;
    let alike = (0..6).filter(|&seed| {
        let (recipe, report) = fit(&sample::years(&truth, 30, seed), 10).unwrap();
        // Thirty years tell a spread to an eighth, so a little index may be seen where there is none.
        assert!(recipe.years.wetness_shift < 0.1 && recipe.years.depth_shift < 0.1, "{:?}", recipe.years);
        report.notes.contains(&FitNote::TotalsSpreadNoMoreThanDays)
    });
    assert!(alike.count() >= 1);
}

#[test]
fn dry_summers_are_fitted_without_wild_curves() {
    let (recipe, report) = fit(&sample::years(&invented::valle_del_sur(), 8, 3), 4).unwrap();
    assert!(report.notes.contains(&FitNote::SameStepAllYear { field: "tmax_c" }));
    assert!(report.notes.iter().any(|note| matches!(note, FitNote::DepthsPooled { month: 1, .. })));
    let days = sample::years(&recipe, 50, 3);
    assert!(days.iter().all(|day| day.tmax_c < 50.0 && day.tmin_c > -25.0));
    assert!(days.iter().map(|day| day.precipitation_mm).fold(0.0, f64::max) < 250.0);
}

#[test]
fn radiation_above_the_clear_sky_is_left_out_and_told() {
    let truth = invented::tresnubes();
    let mut record = sample::years(&truth, 4, 21);
    for day in record.iter_mut().step_by(10) {
        day.solar_mj_m2 = Some(60.0);
    }
    let site = Site { latitude_degrees: 39.5, elevation_m: 2300.0 };
    let (recipe, report) = fit_at(&record, 10, Some(site)).unwrap();
    let wrong = record.len().div_ceil(10);
    assert!(report.notes.contains(&FitNote::RadiationAboveClearSky { days: wrong }), "{:?}", report.notes);
    let (found, wanted) = (recipe.radiation.unwrap(), truth.radiation.unwrap());
    // 800 dry days with a memory of a quarter from day to day: a mean is known to 0.9 sqrt(1.7 / 800) = 0.04.
    let off = found.dry_clear_log_odds.mean - wanted.dry_clear_log_odds.mean;
    assert!(off.abs() < 4.0 * 0.04, "{off}");
    // A column that never changes is no measurement.
    record.iter_mut().for_each(|day| day.wind_2m_ms = Some(2.0));
    let (recipe, report) = fit_at(&record, 10, Some(site)).unwrap();
    assert!(recipe.wind.is_none());
    assert!(report.notes.contains(&FitNote::LeftOut { field: "wind_2m_ms", days: record.len() }));
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(48))]

    /// Whatever stands in a record, fitting gives a recipe that runs, or an error; it never panics.
    #[test]
    fn any_record_is_fitted_or_refused(
        years in 3i32..20,
        start_month in 1u32..=12,
        seed: u64,
        scale in prop::sample::select(vec![0.0, 1e-9, 0.01, 1.0, 25.4, 1e6, 1e300]),
        warmth in prop::sample::select(vec![0.0, 1e-6, 1.0, 50.0, 1e200]),
        gaps in 0.0..0.01f64,
        dry_months in prop::collection::btree_set(1u32..=12, 0..10),
        extras: bool,
    ) {
        let mut record = sample::years(&invented::tresnubes(), years, seed);
        for (at, day) in record.iter_mut().enumerate() {
            day.precipitation_mm *= if dry_months.contains(&day.date.month()) { 0.0 } else { scale };
            (day.tmin_c, day.tmax_c) = (day.tmin_c * warmth, day.tmax_c * warmth);
            if !extras || at % 3 == 0 {
                (day.solar_mj_m2, day.relative_humidity_percent, day.wind_2m_ms) = (None, Some(0.0), Some(0.0));
            }
        }
        let mut count = 0.0;
        record.retain(|_| {
            count += gaps;
            let keep = count < 1.0;
            count -= f64::from(!keep);
            keep
        });
        let site = Site { latitude_degrees: 39.5, elevation_m: 2300.0 };
        if let Ok((recipe, _)) = fit_at(&record, start_month, Some(site)) {
            prop_assert_eq!(recipe.check(), Ok(()));
            let days = sample::years(&recipe, 2, seed);
            prop_assert!(days.iter().all(|day| day.tmin_c < day.tmax_c && day.precipitation_mm.is_finite()));
        }
    }
}

#[test]
fn what_cannot_be_fitted_is_refused() {
    let record = sample::years(&invented::tresnubes(), 4, 1);
    let date = record[100].date;
    let changed = |change: &dyn Fn(&mut Vec<GeneratorDay>)| {
        let mut record = record.clone();
        change(&mut record);
        fit(&record, 10).map(|(recipe, _)| recipe)
    };
    assert_eq!(fit(&record, 0).unwrap_err(), FitError::WrongMonth { month: 0 });
    assert_eq!(fit(&[], 10).unwrap_err(), FitError::TooFewYears { full_years: 0, needed: 3 });
    assert_eq!(changed(&|record| record[100].tmax_c = f64::NAN), Err(FitError::NotANumber { date, field: "tmax_c" }));
    assert_eq!(
        changed(&|record| record[100].precipitation_mm = -1.0),
        Err(FitError::NegativePrecipitation { date, precipitation_mm: -1.0 })
    );
    assert!(matches!(changed(&|record| record[100].tmin_c = 99.0), Err(FitError::TminAboveTmax { .. })));
    assert!(matches!(changed(&|record| record.swap(100, 101)), Err(FitError::DatesNotAscending { .. })));
    assert!(matches!(
        changed(&|record| record.iter_mut().for_each(|day| day.precipitation_mm = 0.0)),
        Err(FitError::TooFewDaysOfAKind { wet_days: 0, .. })
    ));
    // One missing day at the end: that year is no full year, the rest still is.
    assert!(changed(&|record| record.truncate(record.len() - 1)).is_ok());
    assert!(matches!(
        changed(&|record| {
            record.remove(800);
            record.remove(100);
        }),
        Err(FitError::TooFewYears { full_years: 2, needed: 3 })
    ));
    // Every day the same: nothing to learn a spread from.
    let still = |record: &mut Vec<GeneratorDay>| {
        for day in record.iter_mut() {
            (day.tmin_c, day.tmax_c) = (0.0, 10.0);
        }
    };
    assert!(matches!(changed(&still), Err(FitError::Unusable(_))));
    // Kelvin by mistake.
    let kelvin = |record: &mut Vec<GeneratorDay>| {
        for day in record.iter_mut() {
            day.tmin_c += 273.15;
            day.tmax_c += 273.15;
        }
    };
    assert!(matches!(changed(&kelvin), Err(FitError::Unusable(_))));
}
