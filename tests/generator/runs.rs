//! What holds for every run, whatever the recipe: seeds, beginnings, bounds and refusals.

use crate::sample::{self, totals};
use chrono::{Datelike, NaiveDate};
use deshielo::generator::{
    Generator, GeneratorError, Recipe, RecipeFault, ResidualCorrelations, SeasonalCurve, generate, invented,
};
use proptest::prelude::*;

fn date(year: i32, month: u32, day: u32) -> NaiveDate {
    NaiveDate::from_ymd_opt(year, month, day).unwrap()
}

#[test]
fn a_seed_tells_everything_and_longer_runs_begin_with_shorter_ones() {
    let recipe = invented::tresnubes();
    let short = generate(&recipe, date(1981, 10, 1), 1000, 42).unwrap();
    let again = generate(&recipe, date(1981, 10, 1), 1000, 42).unwrap();
    let long = generate(&recipe, date(1981, 10, 1), 5000, 42).unwrap();
    let other = generate(&recipe, date(1981, 10, 1), 1000, 43).unwrap();
    assert_eq!(short, again);
    assert_eq!(short[..], long[..1000]);
    let same = short.iter().zip(&other).filter(|(one, other)| one.tmax_c == other.tmax_c).count();
    assert!(same < 50, "{same}");
    assert!(generate(&recipe, date(1981, 10, 1), 0, 42).unwrap().is_empty());
}

#[test]
fn the_same_bits_everywhere() {
    // Every bit of ten years folded into one number (FNV-1a, 64 bits). It changes only when the method changes; a
    // target on which it differs draws other weather.
    let days = generate(&Recipe { round_as_station: false, ..invented::tresnubes() }, date(1981, 10, 1), 3653, 1);
    let mut folded = 0xcbf2_9ce4_8422_2325_u64;
    for day in days.unwrap() {
        let optional = [day.solar_mj_m2, day.relative_humidity_percent, day.wind_2m_ms].map(Option::unwrap);
        for value in [day.tmin_c, day.tmax_c, day.precipitation_mm].into_iter().chain(optional) {
            for byte in value.to_bits().to_le_bytes() {
                folded = (folded ^ u64::from(byte)).wrapping_mul(0x0000_0100_0000_01b3);
            }
        }
    }
    assert_eq!(folded, FOLDED, "{folded:#018x}");
}

/// What the fold gave where this was written (x86-64).
const FOLDED: u64 = 0x674d_0852_a8bf_22f1;

#[test]
fn days_follow_one_another_through_leap_years() {
    let days = generate(&invented::valle_del_sur(), date(2023, 12, 30), 430, 3).unwrap();
    assert!(days.windows(2).all(|pair| pair[0].date.succ_opt() == Some(pair[1].date)));
    assert!(days.iter().any(|day| (day.date.month(), day.date.day()) == (2, 29)));
}

#[test]
fn values_are_read_as_a_station_would() {
    for recipe in [invented::tresnubes(), invented::valle_del_sur()] {
        for day in sample::years(&recipe, 20, 5) {
            for value in [day.tmin_c, day.tmax_c, day.precipitation_mm] {
                let tenths = value * 10.0;
                assert!((tenths - tenths.round()).abs() < 1e-9, "{value}");
                assert!(format!("{value}").len() <= 6, "{value}");
            }
            let humidity = day.relative_humidity_percent.unwrap();
            assert!(humidity > 0.0 && humidity <= 100.0);
            assert!(day.wind_2m_ms.unwrap() > 0.0);
        }
    }
}

#[test]
fn radiation_stays_below_the_clear_sky() {
    let recipe = invented::tresnubes();
    let sun = recipe.radiation.clone().unwrap();
    let mut highest: f64 = 0.0;
    for day in sample::years(&recipe, 100, 9) {
        let clear = clear_sky_mj_m2(sun.latitude_degrees, sun.elevation_m, day.date.ordinal());
        let share = day.solar_mj_m2.unwrap() / clear;
        assert!(share > 0.0 && share < 1.0 + 1e-12, "{} {share}", day.date);
        highest = highest.max(share);
    }
    // A bound that is never approached would prove nothing.
    assert!(highest > 0.98, "{highest}");
}

/// Written a second time from FAO-56 equations 21–25 and 37, with the standard library's functions.
fn clear_sky_mj_m2(latitude_degrees: f64, elevation_m: f64, day: u32) -> f64 {
    let (latitude, turn) = (latitude_degrees.to_radians(), std::f64::consts::TAU * f64::from(day) / 365.0);
    let declination = 0.409 * (turn - 1.39).sin();
    let sunset = (-latitude.tan() * declination.tan()).acos();
    let above = 37.586_031_360_582_4
        * (1.0 + 0.033 * turn.cos())
        * (sunset * latitude.sin() * declination.sin() + latitude.cos() * declination.cos() * sunset.sin());
    (0.75 + 0.00002 * elevation_m) * above
}

#[test]
fn the_minimum_stays_below_the_maximum_even_where_their_means_cross() {
    let mut recipe = invented::tresnubes();
    recipe.temperature.tmin_wet_c = SeasonalCurve::flat(20.0);
    recipe.temperature.tmax_wet_c = SeasonalCurve::flat(5.0);
    for rounded in [true, false] {
        let days = sample::years(&Recipe { round_as_station: rounded, ..recipe.clone() }, 30, 6);
        assert!(days.iter().all(|day| day.tmin_c < day.tmax_c));
        assert!(days.iter().any(|day| day.tmax_c - day.tmin_c < 0.31));
    }
}

#[test]
fn dry_years_come_in_runs_because_years_remember() {
    let with = invented::tresnubes();
    let mut without = with.clone();
    without.years.lag_one = 0.0;
    let mut days_only = without.clone();
    days_only.years.wetness_shift = 0.0;
    days_only.years.depth_shift = 0.0;
    let in_long_runs = |recipe: &Recipe| {
        let totals = totals(&sample::years(recipe, 1500, 12), recipe.water_year_start_month);
        let mut sorted = totals.clone();
        sorted.sort_by(f64::total_cmp);
        let third = sorted[sorted.len() / 3];
        let runs = totals.chunk_by(|one, next| (*one < third) == (*next < third));
        let long = runs.filter(|run| run[0] < third && run.len() >= 3).map(<[f64]>::len).sum::<usize>();
        (long as f64 / totals.len() as f64, sample::spread(&totals) / sample::mean(&totals))
    };
    let ((long, varied), (long_without, _), (_, varied_days)) =
        (in_long_runs(&with), in_long_runs(&without), in_long_runs(&days_only));
    // For independent years with one chance in three, a year lies in a dry run of three or more with chance
    // p³ (3 − 2 p) = 7/81 = 0.086. Each run of three dry years is about three years of one thing, so the standard
    // error over n years is about sqrt(3 p (1 − p) / n) = 0.013.
    let error = (3.0 * 0.0864 * 0.9136 / 1500.0_f64).sqrt();
    assert!((long_without - 0.0864).abs() < 4.0 * error, "{long_without}");
    assert!(long > long_without + 4.0 * error && long > 1.4 * long_without, "{long} {long_without}");
    // The trap: days alone give far too little spread.
    assert!(varied_days < 0.75 * varied, "{varied_days} {varied}");
}

#[test]
fn recipes_survive_a_file() {
    for recipe in [invented::tresnubes(), invented::valle_del_sur()] {
        let text = toml::to_string_pretty(&recipe).unwrap();
        assert_eq!(toml::from_str::<Recipe>(&text).unwrap(), recipe);
        assert!(text.contains("wet_to_wet"));
        assert!(toml::from_str::<Recipe>(&text.replace("wet_to_wet", "wet_too_wet")).is_err());
    }
}

#[test]
fn impossible_recipes_are_refused_with_every_fault() {
    let mut recipe = invented::tresnubes();
    recipe.water_year_start_month = 13;
    recipe.wetness.dry_to_wet[4] = 0.9;
    recipe.depths.heavy_mean_mm[0] = f64::NAN;
    recipe.temperature.tmax_dry_spread_c = SeasonalCurve::yearly(1.0, 3.0, 100.0);
    recipe.residuals.same_day[0][1] = 1.5;
    let faults = recipe.check().unwrap_err();
    assert!(faults.contains(&RecipeFault::WetterAfterDry { month: 5 }));
    assert!(faults.contains(&RecipeFault::ImpossibleCorrelations));
    let named = |wanted: &str, in_month: Option<u32>| {
        faults.iter().any(
            |fault| matches!(fault, RecipeFault::OutOfRange { key, month, .. } if *key == wanted && *month == in_month),
        )
    };
    assert!(named("water_year_start_month", None) && named("heavy_mean_mm", Some(1)), "{faults:?}");
    assert!(faults.iter().any(|f| matches!(f, RecipeFault::CurveOutOfRange { key: "tmax_dry_spread_c", .. })));
    assert_eq!(faults.len(), 5, "{faults:?}");
    assert!(Generator::new(&recipe).is_err());
    let far = NaiveDate::MAX.pred_opt().unwrap();
    let past = generate(&invented::tresnubes(), far, 3, 1);
    assert_eq!(past, Err(GeneratorError::PastLastDate { start: far, days: 3 }));
    assert_eq!(generate(&invented::tresnubes(), far, 2, 1).unwrap().len(), 2);
    assert!(generate(&invented::tresnubes(), date(2000, 1, 1), usize::MAX, 1).is_err());
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    /// Any recipe that passes the check gives finite weather inside its bounds; none panics.
    #[test]
    fn any_checked_recipe_runs(
        chances in prop::array::uniform12((0.001..0.9f64, 0.0..0.9f64)),
        step in prop::sample::select(vec![0.1, 0.254, 1.0, 2.54]),
        shifts in (0.0..2.0f64, 0.0..2.0f64, 0.0..0.99f64),
        means in (-60.0..60.0f64, -60.0..60.0f64),
        links in prop::array::uniform3(-1.0..1.0f64),
        rounded: bool,
        start_month in 1u32..=12,
        seed: u64,
    ) {
        let mut recipe = invented::valle_del_sur();
        recipe.wetness.dry_to_wet = chances.map(|(dry, _)| dry);
        recipe.wetness.wet_to_wet = chances.map(|(dry, more)| dry + more * (1.0 - dry) * 0.99);
        recipe.depth_step_mm = step;
        recipe.round_as_station = rounded;
        recipe.water_year_start_month = start_month;
        (recipe.years.wetness_shift, recipe.years.depth_shift, recipe.years.lag_one) = shifts;
        recipe.temperature.tmax_wet_c.mean = means.0;
        recipe.temperature.tmin_wet_c.mean = means.1;
        let [one, two, three] = links;
        recipe.residuals = ResidualCorrelations {
            same_day: [[1.0, one, two], [one, 1.0, three], [two, three, 1.0]],
            day_before: [[one * one, 0.0, 0.0], [0.0, two * two, 0.0], [0.0, 0.0, three * three]],
        };
        if let Ok(generator) = Generator::new(&recipe) {
            for day in generator.generate(date(1999, 11, 3), 800, seed).unwrap() {
                prop_assert!(day.tmin_c < day.tmax_c);
                prop_assert!(day.precipitation_mm == 0.0 || day.precipitation_mm >= 0.499 * step);
                let values = [day.tmin_c, day.tmax_c, day.precipitation_mm, day.solar_mj_m2.unwrap()];
                prop_assert!(values.iter().all(|value| value.is_finite()));
            }
            prop_assert!(recipe.expected_precipitation().annual_mean_mm.is_finite());
        }
    }
}
