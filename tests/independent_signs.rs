//! The signs of the basin against an independent run, fed that run's own daily columns.

mod support;
#[path = "support/valleys.rs"]
mod valleys;

use deshielo::signs::{Sign, YearReader, YearSigns, performance, skill};
use deshielo::water::calendar::CalendarDay;
use deshielo::water::dials::Dials;
use deshielo::water::works::{Evening, Works};
use support::{Columns, assert_check, checks, number, numbers};

/// Reads water years off daily columns of the basin.
fn read(dates: &[String], fill: impl Fn(usize, &mut Evening)) -> Vec<YearSigns> {
    let valley = valleys::bare_basin(1);
    let works = Works::new(&valley, &Dials::REST).unwrap();
    let day = |index: usize| CalendarDay::new(dates[index].parse().unwrap(), 10);
    let stores = works.start(&day(0));
    let mut evening = Evening::default();
    let (mut years, mut reader) = (Vec::new(), YearReader::new(&valley));
    for index in 0..dates.len() {
        evening.today = day(index);
        fill(index, &mut evening);
        reader.day(&evening, &stores);
        if evening.today.is_last_of_water_year(10) {
            years.push(std::mem::replace(&mut reader, YearReader::new(&valley)).close());
        }
    }
    years
}

#[test]
fn annual_table() {
    let (daily, want) = (Columns::read("reference_daily.csv"), Columns::read("reference_annual.csv"));
    let (p, fall, swe) = (daily.numbers("precip_mm"), daily.numbers("snowfall_mm"), daily.numbers("swe_mm"));
    let inflow = daily.numbers("inflow_m3");
    let years = read(&daily.texts("date"), |index, evening| {
        evening.basin.precipitation_mm = p[index];
        evening.basin.snowfall_mm = fall[index];
        evening.basin.snow_water_mm = swe[index];
        evening.basin.inflow_m3 = inflow[index];
    });
    assert_eq!(years.len(), want.len());
    for (sign, column) in [
        (Sign::Precipitation, "precip_mm"),
        (Sign::SnowShare, "snow_fraction"),
        (Sign::SurveySwe, "swe_1apr_mm"),
        (Sign::PeakSwe, "peak_swe_mm"),
        (Sign::CentreOfVolumeDay, "ct_day_of_wy"),
    ] {
        let got: Vec<f64> = years.iter().map(|year| sign.of(year).unwrap()).collect();
        support::assert_column(column, &got, &want.numbers(column), 1e-9, 1e-9);
    }
    for (sign, column) in [(Sign::PeakSweDate, "peak_swe_date"), (Sign::HalfVolumeDate, "half_volume_date")] {
        let got: Vec<String> = years.iter().map(|year| sign.date_of(year).unwrap().date(10).to_string()).collect();
        assert_eq!(got, want.texts(column), "{column}");
    }
}

/// One water year of 365 days with a natural flow that depends on the day.
fn year_of_flow(flow: impl Fn(f64) -> f64) -> YearSigns {
    let start: chrono::NaiveDate = "2000-10-01".parse().unwrap();
    let dates: Vec<String> = start.iter_days().take(365).map(|date| date.to_string()).collect();
    read(&dates, |index, evening| evening.basin.inflow_m3 = flow(index as f64 + 1.0)).remove(0)
}

#[test]
fn centre_of_volume_of_known_hydrographs() {
    let checks = checks("indices");
    let skewed = |t: f64| if t < 150.0 { 1.0 } else { 1.0 + 9.0 * libm::exp(-(t - 150.0) / 40.0) };
    let centre = |year: &YearSigns| year.centre_of_volume_day.unwrap();
    assert_check(&checks["ct_uniform"], centre(&year_of_flow(|_| 1.0)));
    assert_check(&checks["ct_triangle"], centre(&year_of_flow(|t| (1.0 - (t - 230.0).abs() / 60.0).max(0.0))));
    let year = year_of_flow(skewed);
    assert_check(&checks["ct_skewed"], centre(&year));
    assert_check(&checks["half_volume_skewed"], Sign::HalfVolumeDate.of(&year).unwrap());
}

/// Two ways to write a place differ in the last digits of its snow; the date must not hang on them.
#[test]
fn a_flat_peak_is_dated_to_its_first_day_whatever_the_last_digits() {
    let start: chrono::NaiveDate = "2000-10-01".parse().unwrap();
    let dates: Vec<String> = start.iter_days().take(365).map(|date| date.to_string()).collect();
    let peak = |wobble: f64| {
        let snow = |day: usize| match day {
            0..100 => day as f64,
            100..120 => 100.0 * (1.0 + wobble * day as f64),
            _ => 0.0,
        };
        let year = read(&dates, |index, evening| evening.basin.snow_water_mm = snow(index)).remove(0);
        (year.peak_swe_date.unwrap().day_of_water_year, year.melt_out_date.unwrap().day_of_water_year)
    };
    assert_eq!(peak(0.0), (101, 120));
    assert_eq!(peak(1e-15), peak(0.0));
    assert_eq!(peak(1e-6).0, 120, "a rise that can be measured is a new peak");
}

#[test]
fn skill_scores_on_the_fixed_series() {
    let checks = checks("indices");
    let inputs = checks["nse"]["inputs"].as_table().unwrap();
    let (modelled, observed) = (numbers(&inputs["sim"]), numbers(&inputs["obs"]));
    let kge = skill::kling_gupta_2009(&modelled, &observed).unwrap();
    let kge_2012 = skill::kling_gupta_2012(&modelled, &observed).unwrap();
    assert_check(&checks["nse"], skill::nash_sutcliffe(&modelled, &observed).unwrap());
    assert_check(&checks["kge2009"], kge.efficiency);
    assert_check(&checks["kge_r"], kge.correlation);
    assert_check(&checks["kge_alpha"], kge.variability);
    assert_check(&checks["kge_beta"], kge.bias);
    assert_check(&checks["kge2012"], kge_2012.efficiency);
    assert_check(&checks["kge_gamma"], kge_2012.variability);
    assert_check(&checks["pbias"], skill::percent_bias(&modelled, &observed).unwrap());
    assert_check(&checks["rmse"], skill::root_mean_square_error(&modelled, &observed).unwrap());
    let mean = observed.iter().sum::<f64>() / observed.len() as f64;
    let flat = vec![mean; observed.len()];
    assert_check(&checks["nse_mean_model"], skill::nash_sutcliffe(&flat, &observed).unwrap());
    assert_eq!(skill::kling_gupta_2009(&flat, &observed), None, "a flat model has no correlation");
    let mut gappy = observed.clone();
    gappy[3] = f64::NAN;
    assert!(skill::nash_sutcliffe(&modelled, &gappy).unwrap().is_finite());
}

#[test]
fn hashimoto_of_hand_worked_series() {
    let checks = checks("indices");
    for id in ["hashimoto_a", "hashimoto_b_ends_in_failure", "hashimoto_c_none", "hashimoto_d_all"] {
        let check = &checks[id];
        let inputs = check["inputs"].as_table().unwrap();
        let years = numbers(&inputs["demand"]).into_iter().zip(numbers(&inputs["supply"]));
        let got = performance(years, 1.0).unwrap();
        let want = check["expected"].as_table().unwrap();
        assert!((got.reliability - number(&want["reliability"])).abs() < 1e-9, "{id}");
        assert!((got.vulnerability_hm3 - number(&want["vulnerability_mean_event_max"])).abs() < 1e-9, "{id}");
        // The table counts recoveries over all failures; here a failure in the last year cannot recover and is left out.
        let failures = number(&want["failures"]);
        let recoveries = number(&want["resilience_transitions"]) * failures;
        let followed =
            if id == "hashimoto_b_ends_in_failure" || id == "hashimoto_d_all" { failures - 1.0 } else { failures };
        let resilience = if failures == 0.0 { 1.0 } else { recoveries / followed };
        assert!((got.resilience.unwrap() - resilience).abs() < 1e-9, "{id}: {:?}", got.resilience);
    }
}
