//! Scenes for tests of the pages: a valley run over its record, as it was and under some dials.
#![allow(dead_code, reason = "each test takes what it needs")]

use deshielo::picture::views::scene::*;
use deshielo::picture::views::year_log::{YearLog, snow_line_m, titles};
use deshielo::signs::{YearReport, read_run};
use deshielo::water::basin::{Basin, BasinDay};
use deshielo::water::calendar::CalendarDay;
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::run::run_basin;
use deshielo::water::valley::Valley;
use deshielo::water::weather::StationDay;
use deshielo::water::works::Works;
use deshielo::words::System;

/// A run with everything that a scene borrows.
pub struct Held {
    pub years: Vec<YearReport>,
    pub log: YearLog,
    /// Snow water of each band, day by day, mm.
    pub band_snow_mm: Vec<Vec<f64>>,
}

/// A valley with its runs for one chosen year.
pub struct Stage {
    pub valley: Valley,
    pub names: Vec<String>,
    pub dials: Dials,
    pub calendar: Vec<CalendarDay>,
    pub chosen_year: usize,
    pub was: Held,
    pub now: Held,
    pub settings: Vec<DialSetting>,
}

/// What of a stage is borrowed and not kept by it.
pub struct Props<'a> {
    titles: Vec<CanalTitle<'a>>,
    was_canals: Vec<CanalShown<'a>>,
    now_canals: Vec<CanalShown<'a>>,
}

fn hold(valley: &Valley, dials: &Dials, calendar: &[CalendarDay], record: &[StationDay], year: usize) -> Held {
    let mut basin_days = vec![BasinDay::default(); record.len()];
    let basin = Basin::new(valley, dials);
    let before = run_basin(valley, &basin, calendar, record, &mut basin_days);
    let works = Works::new(valley, dials).unwrap();
    let mut years = Vec::new();
    let mut logs = vec![YearLog::new(valley)];
    let water_year = year_of(calendar, year);
    read_run(
        valley,
        &works,
        calendar,
        &basin_days,
        &before,
        |evening, _| {
            if evening.today.water_year == water_year {
                logs[0].day(evening);
            }
        },
        |report| years.push(report),
    );
    let mut log = logs.remove(0);
    log.close();
    // The bands' snow of the chosen year, from a run that is told it.
    let mut stores = basin.start();
    let settle = settling(calendar, valley.start.settling_years);
    let mut scratch = basin_days.clone();
    basin.run(&mut stores, &calendar[..settle], &record[..settle], &mut scratch);
    let mut band_snow_mm = Vec::new();
    for (at, day) in calendar.iter().enumerate() {
        basin.run(&mut stores, &calendar[at..=at], &record[at..=at], &mut scratch[at..=at]);
        if day.water_year == water_year {
            band_snow_mm.push(basin.band_snow_mm(&stores));
        }
    }
    Held { years, log, band_snow_mm }
}
