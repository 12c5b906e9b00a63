//! A run of 400 years against what its recipe says, within four standard errors.

use crate::sample::{self, by_year, correlation, error_of_mean, mean, monthly, spread, totals};
use chrono::Datelike;
use deshielo::generator::{GeneratorDay, Recipe, ResidualCorrelations, SeasonalCurve, WetDayChain, invented};

const YEARS: i32 = 400;

fn cases() -> [(Recipe, u64); 2] {
    [(invented::tresnubes(), 2024), (invented::valle_del_sur(), 2025)]
}

#[test]
fn months_have_the_wet_days_and_depths_of_the_recipe() {
    for (recipe, seed) in cases() {
        let days = sample::years(&recipe, YEARS, seed);
        let (start, lag) = (recipe.water_year_start_month, recipe.years.lag_one);
        let expected = recipe.expected_precipitation();
        for month in 1..=12 {
            let at = month as usize - 1;
            let share = |days: &[&GeneratorDay]| {
                Some(days.iter().filter(|day| day.precipitation_mm > 0.0).count() as f64 / days.len() as f64)
            };
            let shares = monthly(&days, start, month, share);
            let off = mean(&shares) - expected.wet_share[at];
            assert!(off.abs() < 4.0 * error_of_mean(&shares, lag), "{} wet {month} {off}", recipe.about);
            // Depth of wet days as a ratio of means; its error from the departures of each month's total from its
            // wet days times the mean depth (Cochran 1977, Sampling Techniques, section 2.11).
            let depth = expected.wet_day_depth_mm[at];
            let departure = |days: &[&GeneratorDay]| {
                let wet = days.iter().filter(|day| day.precipitation_mm > 0.0);
                Some(wet.map(|day| day.precipitation_mm - depth).sum::<f64>())
            };
            let departures = monthly(&days, start, month, departure);
            let off = mean(&departures);
            assert!(off.abs() < 4.0 * error_of_mean(&departures, lag), "{} depth {month} {off}", recipe.about);
        }
    }
}

#[test]
fn years_have_the_mean_spread_and_memory_of_the_recipe() {
    for (recipe, seed) in cases() {
        let days = sample::years(&recipe, YEARS, seed);
        let totals = totals(&days, recipe.water_year_start_month);
        let expected = recipe.expected_precipitation();
        let count = f64::from(YEARS);
        let off = mean(&totals) - expected.annual_mean_mm;
        assert!(off.abs() < 4.0 * error_of_mean(&totals, recipe.years.lag_one), "{} mean {off}", recipe.about);
        // Standard error of a standard deviation: s sqrt((kurtosis − 1) / 4 n), the kurtosis from the sample.
        let middle = mean(&totals);
        let kurtosis =
            totals.iter().map(|total| (total - middle).powi(4)).sum::<f64>() / count / spread(&totals).powi(4);
        let lag = expected.annual_lag_one;
        let error = expected.annual_spread_mm
            * ((kurtosis - 1.0) / (4.0 * count) * (1.0 + lag * lag) / (1.0 - lag * lag)).sqrt();
        let off = spread(&totals) - expected.annual_spread_mm;
        assert!(off.abs() < 4.0 * error, "{} spread {off} {error}", recipe.about);
        assert!(expected.annual_spread_mm > 1.3 * expected.annual_spread_of_days_mm);
        // Bartlett (1946): the standard error of a lag-one correlation is at most 1/sqrt(n) for a small memory.
        let off = sample::lag_one(&totals) - lag;
        assert!(off.abs() < 4.0 / count.sqrt(), "{} memory {off} of {lag}", recipe.about);
        let wet: Vec<f64> = by_year(&days, recipe.water_year_start_month)
            .iter()
            .map(|year| year.iter().filter(|day| day.precipitation_mm > 0.0).count() as f64)
            .collect();
        let (wet_mean, wet_spread) = expected.annual_wet_days;
        assert!((mean(&wet) - wet_mean).abs() < 4.0 * error_of_mean(&wet, recipe.years.lag_one));
        let error = wet_spread * ((1.0 + lag * lag) / (1.0 - lag * lag) / (2.0 * count)).sqrt();
        assert!((spread(&wet) - wet_spread).abs() < 4.0 * error, "{} {}", spread(&wet), wet_spread);
        // Wet years are the cooler ones.
        let warmth: Vec<f64> = by_year(&days, recipe.water_year_start_month)
            .iter()
            .map(|year| mean(&year.iter().map(|day| 0.5 * (day.tmin_c + day.tmax_c)).collect::<Vec<_>>()))
            .collect();
        let pairs: Vec<(f64, f64)> = totals.iter().copied().zip(warmth).collect();
        assert!(correlation(&pairs) < -4.0 / count.sqrt(), "{}", correlation(&pairs));
    }
}

/// A curve's value on a date, written a second time.
fn on(curve: &SeasonalCurve, day: &GeneratorDay) -> f64 {
    const BEFORE: [u32; 12] = [0, 31, 60, 91, 121, 152, 182, 213, 244, 274, 305, 335];
    let number = f64::from(BEFORE[day.date.month0() as usize] + day.date.day());
    let wave = |peak: f64, waves: f64| (std::f64::consts::TAU * waves * (number - peak) / 366.0).cos();
    curve.mean
        + curve.yearly_swing * wave(curve.yearly_peak_day, 1.0)
        + curve.half_yearly_swing * wave(curve.half_yearly_peak_day, 2.0)
}

/// Mean and spread of maximum and minimum that the recipe gives a day of the sample.
fn expected_temperature(recipe: &Recipe, day: &GeneratorDay) -> [(f64, f64); 2] {
    let t = &recipe.temperature;
    let pair = |mean: &SeasonalCurve, spread: &SeasonalCurve| (on(mean, day), on(spread, day));
    if day.precipitation_mm > 0.0 {
        [pair(&t.tmax_wet_c, &t.tmax_wet_spread_c), pair(&t.tmin_wet_c, &t.tmin_wet_spread_c)]
    } else {
        [pair(&t.tmax_dry_c, &t.tmax_dry_spread_c), pair(&t.tmin_dry_c, &t.tmin_dry_spread_c)]
    }
}

#[test]
fn temperatures_have_the_means_and_spreads_of_the_recipe() {
    for (recipe, seed) in cases() {
        let days = sample::years(&recipe, YEARS, seed);
        let years = recipe.years.temperature_spread_c.powi(2) + recipe.years.wet_year_cooling_c.powi(2);
        for month in 1..=12 {
            for which in 0..2 {
                let actual = |day: &GeneratorDay| if which == 0 { day.tmax_c } else { day.tmin_c };
                let off = |days: &[&GeneratorDay]| {
                    let sum: f64 =
                        days.iter().map(|day| actual(day) - expected_temperature(&recipe, day)[which].0).sum();
                    Some(sum / days.len() as f64)
                };
                let means = monthly(&days, recipe.water_year_start_month, month, off);
                // The bend of small ranges moves means by up to 0.05 °C where wet days have a small range.
                let limit = 4.0 * error_of_mean(&means, recipe.years.lag_one) + 0.05;
                assert!(mean(&means).abs() < limit, "{} {which} {month} {}", recipe.about, mean(&means));
                // Mean square departure over its expectation is 1.
                let squares = |days: &[&GeneratorDay]| {
                    let ratio = |day: &&GeneratorDay| {
                        let (middle, spread) = expected_temperature(&recipe, day)[which];
                        (actual(day) - middle).powi(2) / (spread * spread + years)
                    };
                    Some(days.iter().map(ratio).sum::<f64>() / days.len() as f64)
                };
                let ratios = monthly(&days, recipe.water_year_start_month, month, squares);
                let limit = 4.0 * error_of_mean(&ratios, 0.0) + 0.02;
                assert!((mean(&ratios) - 1.0).abs() < limit, "{} {which} {month} {}", recipe.about, mean(&ratios));
            }
        }
    }
}

#[test]
fn residuals_have_the_correlations_of_the_recipe() {
    // Without differences between years, without rounding and with a wide range, residuals can be read back exactly.
    let mut recipe = invented::tresnubes();
    recipe.round_as_station = false;
    recipe.years.wet_year_cooling_c = 0.0;
    recipe.years.temperature_spread_c = 0.0;
    recipe.temperature.tmin_dry_c.mean -= 40.0;
    recipe.temperature.tmin_wet_c.mean -= 40.0;
    let days = sample::years(&recipe, YEARS, 77);
    let sun = recipe.radiation.clone().unwrap();
    let clear_sky = clear_sky_of_each_day(&days, &recipe);
    let residuals: Vec<[f64; 3]> = days
        .iter()
        .zip(clear_sky)
        .map(|(day, clear)| {
            let [(tmax, tmax_spread), (tmin, tmin_spread)] = expected_temperature(&recipe, day);
            let wet = day.precipitation_mm > 0.0;
            let share = day.solar_mj_m2.unwrap() / clear;
            let odds = (share / (1.0 - share)).ln();
            let sky = if wet { on(&sun.wet_clear_log_odds, day) } else { on(&sun.dry_clear_log_odds, day) };
            let sky_spread = if wet { sun.wet_spread_log_odds } else { sun.dry_spread_log_odds };
            [(day.tmax_c - tmax) / tmax_spread, (day.tmin_c - tmin) / tmin_spread, (odds - sky) / sky_spread]
        })
        .collect();
    let ResidualCorrelations { same_day, day_before } = recipe.residuals;
    // Bartlett (1946): the variance of a correlation between two such series is at most about
    // (1 + 2 sum of products of their own correlations) / n, here below (1 + a²) / (1 − a²) / n with a = 0.7.
    let limit = 4.0 * ((1.0 + 0.49) / (1.0 - 0.49) / days.len() as f64).sqrt();
    for row in 0..3 {
        for column in 0..3 {
            let same: Vec<(f64, f64)> = residuals.iter().map(|day| (day[row], day[column])).collect();
            let lagged: Vec<(f64, f64)> = residuals.windows(2).map(|pair| (pair[1][row], pair[0][column])).collect();
            assert!((correlation(&same) - same_day[row][column]).abs() < limit, "{row} {column}");
            assert!((correlation(&lagged) - day_before[row][column]).abs() < limit, "{row} {column}");
        }
    }
}

/// The clear sky of each day, read from a run whose sky is always clear.
fn clear_sky_of_each_day(days: &[GeneratorDay], recipe: &Recipe) -> Vec<f64> {
    let mut clear = recipe.clone();
    let sun = clear.radiation.as_mut().unwrap();
    sun.dry_clear_log_odds = SeasonalCurve::flat(20.0);
    sun.wet_clear_log_odds = SeasonalCurve::flat(20.0);
    (sun.dry_spread_log_odds, sun.wet_spread_log_odds) = (0.0, 0.0);
    // 1 / (1 + exp(−20)) is 1 less two parts in a thousand million.
    let scale = 1.0 + (-20.0_f64).exp();
    let sky = sample::years(&clear, YEARS, 77);
    assert_eq!(sky.len(), days.len());
    sky.iter().map(|day| day.solar_mj_m2.unwrap() * scale).collect()
}

#[test]
fn wet_days_remember_the_day_before() {
    let mut recipe = invented::tresnubes();
    recipe.years.wetness_shift = 0.0;
    let chain = WetDayChain { dry_to_wet: 0.2, wet_to_wet: 0.55 };
    recipe.wetness.dry_to_wet = [chain.dry_to_wet; 12];
    recipe.wetness.wet_to_wet = [chain.wet_to_wet; 12];
    let wet: Vec<bool> = sample::years(&recipe, 100, 8).iter().map(|day| day.precipitation_mm > 0.0).collect();
    for (after, chance) in [(false, chain.dry_to_wet), (true, chain.wet_to_wet)] {
        let next: Vec<bool> = wet.windows(2).filter(|pair| pair[0] == after).map(|pair| pair[1]).collect();
        let share = next.iter().filter(|wet| **wet).count() as f64 / next.len() as f64;
        let error = (chance * (1.0 - chance) / next.len() as f64).sqrt();
        assert!((share - chance).abs() < 4.0 * error, "{after} {share}");
    }
    let spells: Vec<f64> = wet.chunk_by(|a, b| a == b).filter(|run| run[0]).map(|run| run.len() as f64).collect();
    assert!((mean(&spells) - chain.mean_wet_spell_days()).abs() < 4.0 * error_of_mean(&spells, 0.0));
}

#[test]
fn invented_valleys_are_as_described() {
    let north = invented::tresnubes();
    let days = sample::years(&north, 200, 1);
    let middle = |month: u32| {
        mean(&monthly(&days, 10, month, |days| {
            Some(days.iter().map(|day| 0.5 * (day.tmin_c + day.tmax_c)).sum::<f64>() / days.len() as f64)
        }))
    };
    let expected = north.expected_precipitation();
    let mm = |expected: &deshielo::generator::ExpectedPrecipitation, month: usize| {
        expected.wet_share[month - 1] * expected.wet_day_depth_mm[month - 1]
    };
    assert!((450.0..=550.0).contains(&expected.annual_mean_mm), "{}", expected.annual_mean_mm);
    assert!((middle(1) + 6.0).abs() < 0.5 && (middle(7) - 17.0).abs() < 0.5, "{} {}", middle(1), middle(7));
    assert!(mm(&expected, 1) > 2.0 * mm(&expected, 7));
    assert!(mm(&expected, 8) > 1.3 * mm(&expected, 6) && mm(&expected, 8) > mm(&expected, 9));
    let range = mean(&days.iter().map(|day| day.tmax_c - day.tmin_c).collect::<Vec<_>>());
    assert!((12.0..=16.0).contains(&range), "{range}");

    let south = invented::valle_del_sur();
    let expected = south.expected_precipitation();
    assert!((310.0..=390.0).contains(&expected.annual_mean_mm), "{}", expected.annual_mean_mm);
    assert!(mm(&expected, 1) < 0.05 * mm(&expected, 7));
    for recipe in [north, south] {
        assert!(recipe.about.starts_with("Invented"));
    }
}
