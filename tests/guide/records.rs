//! Records of a made-up valley, in the units and the dates of an American office: invented by the few lines below.

use std::fmt::Write as _;
use std::fs;
use std::path::Path;

use chrono::{Datelike, Days, NaiveDate};

const HEIGHTS: &[u8] = include_bytes!("../place_readers/files/heights.tif");
const BASIN: &[u8] = include_bytes!("../place_readers/files/basin.geojson");
const YEARS: u64 = 6;

/// A day of the station, °F and inches, and what a bucket of snow and ground gives to the river, ft³/s.
struct Day {
    date: NaiveDate,
    low_f: f64,
    high_f: f64,
    rain_in: f64,
    snow_in: f64,
    flow_cfs: f64,
}

/// The next number between 0 and 1 (Park and Miller 1988, the minimal standard generator).
fn draw(seed: &mut u64) -> f64 {
    *seed = *seed * 48_271 % 2_147_483_647;
    *seed as f64 / 2_147_483_647.0
}

fn days(count: u64) -> Vec<Day> {
    let first = NaiveDate::from_ymd_opt(2010, 10, 1).unwrap();
    let (mut seed, mut snow_in, mut ground_in, mut warmth) = (20_101_001, 0.0, 1.0, 0.0);
    let day = |at| {
        let date = first + Days::new(at);
        let season = (std::f64::consts::TAU * (f64::from(date.ordinal0()) - 200.0) / 365.25).cos();
        warmth = 0.8 * warmth + 10.0 * (draw(&mut seed) - 0.5);
        let mean_f = 38.0 + 22.0 * season + warmth;
        let wet = draw(&mut seed) < 0.3 - 0.1 * season;
        let rain_in = if wet { (-0.35 * draw(&mut seed).max(1e-6).ln() * 100.0).round() / 100.0 } else { 0.0 };
        let melt_in = (0.07 * (mean_f - 34.0)).clamp(0.0, snow_in);
        snow_in += if mean_f < 34.0 { rain_in } else { 0.0 } - melt_in;
        let wetting_in = melt_in + if mean_f < 34.0 { 0.0 } else { 0.6 * rain_in };
        ground_in += wetting_in;
        let drained_in = 0.04 * ground_in;
        ground_in -= drained_in;
        // An inch from one square mile in a day is 26.9 ft³/s; the basin has some 3.6.
        let flow_cfs = 3.6 * 26.9 * drained_in * (0.97 + 0.06 * draw(&mut seed));
        Day { date, low_f: mean_f - 14.0, high_f: mean_f + 14.0, rain_in, snow_in, flow_cfs }
    };
    (0..count).map(day).collect()
}

/// What a newcomer has on the desk.
pub fn write(folder: &Path) {
    let all = days((YEARS + 1) * 365 + 2);
    let (old, new) = all.split_at(YEARS as usize * 365 + 2);
    let weather = |days: &[Day]| {
        let mut text = "Date,Low (F),High (F),Precip (in)\n".to_owned();
        for day in days {
            let date = day.date.format("%m/%d/%Y");
            writeln!(text, "{date},{:.0},{:.0},{:.2}", day.low_f, day.high_f, day.rain_in).unwrap();
        }
        text
    };
    let column = |days: &[Day], head: &str, value: fn(&Day) -> f64| {
        let mut text = format!("Date,{head}\n");
        days.iter().for_each(|day| writeln!(text, "{},{:.2}", day.date.format("%m/%d/%Y"), value(day)).unwrap());
        text
    };
    fs::write(folder.join("weather.csv"), weather(old)).unwrap();
    fs::write(folder.join("newyear.csv"), weather(new)).unwrap();
    fs::write(folder.join("gauge.csv"), column(old, "Flow (cfs)", |day| day.flow_cfs)).unwrap();
    fs::write(folder.join("snow.csv"), column(old, "SWE (in)", |day| day.snow_in)).unwrap();
    fs::write(folder.join("heights.tif"), HEIGHTS).unwrap();
    fs::write(folder.join("basin.geojson"), BASIN).unwrap();
}
