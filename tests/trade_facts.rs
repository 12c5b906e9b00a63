//! What the trade knows of snowmelt valleys, seen in an invented one. Common practice, no source, for all of it.
//!
//! The whole valley of the other tests at 39.5° N, under forty years of the invented Tresnubes weather.

#[path = "support/valleys.rs"]
mod valleys;

use chrono::NaiveDate;
use deshielo::generator::{generate, invented};
use deshielo::signs::{YearReport, YearSigns};
use deshielo::water::calendar::{CalendarDay, fill_calendar};
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::evaporation::EvaporationDay;
use deshielo::water::ledger::Flow;
use deshielo::water::valley::Valley;
use deshielo::water::weather::StationDay;

const YEARS: i32 = 40;

fn place() -> (Valley, Vec<CalendarDay>, Vec<StationDay>) {
    let mut valley = valleys::whole_valley();
    valley.latitude_deg = 39.5;
    let start = NaiveDate::from_ymd_opt(1980, 10, 1).unwrap();
    let days = (NaiveDate::from_ymd_opt(1980 + YEARS, 10, 1).unwrap() - start).num_days() as usize;
    let weather = generate(&invented::tresnubes(), start, days, 1980).unwrap();
    let mut calendar = vec![CalendarDay::new(start, 10); days];
    fill_calendar(start, 10, &mut calendar);
    let record = calendar
        .iter()
        .zip(&weather)
        .map(|(today, day)| {
            let air = EvaporationDay::from_extremes(day.tmin_c, day.tmax_c);
            StationDay::at_station(&valley, today.month_index(), day.precipitation_mm, air)
        })
        .collect();
    (valley, calendar, record)
}

fn run(dials: &Dials) -> Vec<YearReport> {
    let (valley, calendar, record) = place();
    let years = valleys::run(&valley, dials, &calendar, &record).years;
    assert_eq!(years.len(), YEARS as usize);
    years
}

fn mean(years: &[YearReport], of: impl Fn(&YearSigns) -> f64) -> f64 {
    years.iter().map(|year| of(&year.signs)).sum::<f64>() / years.len() as f64
}

/// Day of the water year of 1 April, in a common year.
const FIRST_OF_APRIL: f64 = 183.0;

fn peak_day(signs: &YearSigns) -> f64 {
    f64::from(signs.peak_swe_date.unwrap().day_of_water_year)
}

#[test]
fn snow_peaks_near_the_first_of_april() {
    let years = run(&Dials::REST);
    let day = mean(&years, peak_day);
    println!("mean day of peak snow: {:.1} days after 1 April", day - FIRST_OF_APRIL);
    assert!((day - FIRST_OF_APRIL).abs() <= 21.0, "day {day} of the water year");
    let near = years.iter().filter(|year| (peak_day(&year.signs) - FIRST_OF_APRIL).abs() <= 45.0).count();
    assert!(near * 10 >= years.len() * 9, "{near} of {YEARS} years within a month and a half");
    // That is why the first of April is surveyed: it sees most of the peak.
    let seen = mean(&years, |signs| signs.survey_swe_mm.unwrap() / signs.peak_swe_mm);
    assert!(seen > 0.8, "the survey sees {seen} of the peak");
}

#[test]
fn warming_lowers_the_snow_and_brings_the_water_earlier() {
    let as_it_was = run(&Dials::REST);
    let runs = [1.0, 2.0, 4.0].map(|warming| run(&Dials::REST.with(Dial::Warming, warming)));
    let mut before = &as_it_was;
    for after in &runs {
        let shares = [before, after].map(|years| mean(years, |signs| signs.snow_share.unwrap()));
        let survey = [before, after].map(|years| mean(years, |signs| signs.survey_swe_mm.unwrap()));
        let centre = [before, after].map(|years| mean(years, |signs| signs.centre_of_volume_day.unwrap()));
        println!("snow share {shares:.3?}, survey {survey:.0?} mm, centre of volume {centre:.1?}");
        assert!(shares[1] < shares[0] && survey[1] < survey[0] && centre[1] < centre[0] - 1.0);
        before = after;
    }
    // Not only in the mean: in every year snow is a smaller share, and in nearly every year half the water is earlier.
    let earlier = as_it_was.iter().zip(&runs[1]).filter(|(was, is)| {
        assert!(is.signs.snow_share < was.signs.snow_share);
        assert!(is.signs.survey_swe_mm < was.signs.survey_swe_mm);
        let day = |year: &YearReport| year.signs.half_volume_date.unwrap().day_of_water_year;
        day(is) < day(was)
    });
    assert!(earlier.count() * 10 >= as_it_was.len() * 9, "half of the flow is earlier");
}

#[test]
fn a_snowmelt_river_carries_most_of_its_year_in_april_to_july() {
    let years = run(&Dials::REST);
    let spring = mean(&years, |signs| signs.spring_volume_hm3);
    let whole = mean(&years, |signs| signs.natural_flow_hm3);
    println!("April to July: {:.1} % of the year", 100.0 * spring / whole);
    assert!(spring > 0.5 * whole && spring < 0.95 * whole, "{spring} of {whole} hm³");
    let most = years.iter().filter(|year| year.signs.spring_volume_hm3 > 0.5 * year.signs.natural_flow_hm3).count();
    assert!(most * 10 >= years.len() * 9, "{most} of {YEARS} years");
    // The peak of the flow follows the peak of the snow, and low flow is out of the melt.
    assert!(
        years.iter().filter(|year| peak_day(&year.signs) < flow_peak_day(&year.signs)).count() * 10 >= 9 * years.len()
    );
}

fn flow_peak_day(signs: &YearSigns) -> f64 {
    f64::from(signs.peak_flow_date.unwrap().day_of_water_year)
}

#[test]
fn the_valley_is_a_believable_mountain_valley() {
    let years = run(&Dials::REST);
    let share = mean(&years, |signs| signs.snow_share.unwrap());
    let flow: f64 = years.iter().map(|year| year.ledger.of(Flow::NaturalInflow)).sum();
    let fall: f64 = years.iter().map(|year| year.ledger.of(Flow::BasinPrecipitation)).sum();
    println!("snow share {share:.2}, runoff ratio {:.2}", flow / fall);
    assert!((0.5..0.85).contains(&share), "snow share {share}");
    assert!((0.3..0.65).contains(&(flow / fall)), "runoff ratio {}", flow / fall);
}
