//! Canals by right: who got how much, on how many days, and until when.

use super::grid::{Column, Side, lay_out};
use super::means::{canal_performance, gates_by_right, of_canal};
use super::runs::{Run, Told};
use super::summary_lines::wrapped;
use super::table::mean_date;
use crate::signs::CanalSigns;
use crate::water::calendar::CalendarDay;
use crate::words::{DateStyle, Words};

/// Letters of a canal's name before it is broken.
const MOST_NAME: usize = 18;
/// Letters of any other cell.
const MOST_CELL: usize = 10;

/// The table of canals and towns; with dials turned, a second line for each.
pub(super) fn write(told: &Told, words: &Words) -> String {
    let many = told.as_it_was.years.len() > 1;
    let heading = |id: &str, side, most| Column { heading: words.say(id, &[]), side, most, heading_most: 0 };
    let mut columns = vec![
        heading("tell-canals-by-right", Side::Left, MOST_NAME),
        heading("tell-canal-since", Side::Right, MOST_CELL),
        heading("tell-canal-share", Side::Right, MOST_CELL),
    ];
    if many {
        columns.push(heading("tell-canal-enough", Side::Right, MOST_CELL));
    }
    for id in ["tell-canal-full", "tell-canal-short", "tell-canal-cut", "tell-canal-last-full", "tell-canal-last-water"]
    {
        columns.push(heading(id, Side::Right, MOST_CELL));
    }
    let mut rows = Vec::new();
    for gate in gates_by_right(&told.place.valley) {
        let Some(names) = told.place.gates.get(gate) else { continue };
        let since = match names.right_year {
            Some(year) => words.year(year),
            None => words.say("tell-right-before-all", &[]),
        };
        rows.push(row(told, &told.as_it_was, gate, names.name.get(words.tag()).to_owned(), since, words));
        if told.is_turned() {
            let label = format!("  {}", words.say("tell-canal-with-changes", &[]));
            rows.push(row(told, &told.with_changes, gate, label, String::new(), words));
        }
    }
    let mut text = lay_out(&columns, &rows).replace('\u{202f}', " ");
    if many {
        let share = words.percent(told.place.valley.enough_share * 100.0, 0);
        text.push_str(&wrapped(&words.say("tell-enough", &[("share", share.into())]), ""));
    }
    text
}

fn row(told: &Told, run: &Run, gate: usize, name: String, since: String, words: &Words) -> Vec<String> {
    let missing = || words.style().missing.clone();
    let mean = |read: fn(&CanalSigns) -> Option<f64>| of_canal(run, gate, read).map(|spread| spread.mean);
    let days = |read: fn(&CanalSigns) -> Option<f64>| mean(read).map_or_else(missing, |days| words.number(days, 0));
    let share = mean(|canal| canal.supply_ratio).map_or_else(missing, |share| words.percent(share * 100.0, 0));
    let mut cells = vec![name, since, share];
    if run.years.len() > 1 {
        let performance = canal_performance(run, gate, told.place.valley.enough_share);
        cells.push(performance.map_or_else(missing, |performance| {
            let enough = libm::round(performance.reliability * performance.years as f64) as usize;
            words.say("tell-years-of", &[("k", enough.into()), ("n", performance.years.into())])
        }));
    }
    cells.push(days(|canal| Some(f64::from(canal.days_full))));
    cells.push(days(|canal| Some(f64::from(canal.days_short))));
    cells.push(days(|canal| Some(f64::from(canal.days_cut))));
    cells.push(date(told, run, gate, |canal| canal.last_full_date, words));
    cells.push(date(told, run, gate, |canal| canal.last_water_date, words));
    cells
}

fn date(told: &Told, run: &Run, gate: usize, read: fn(&CanalSigns) -> Option<CalendarDay>, words: &Words) -> String {
    let start_month = told.place.valley.water_year_start_month;
    let date = match run.years.as_slice() {
        [only] => only.signs.canals.get(gate).and_then(read).map(|day| day.date(start_month)),
        _ => of_canal(run, gate, |canal| read(canal).map(|day| f64::from(day.day_of_water_year)))
            .map(|spread| mean_date(spread.mean, start_month)),
    };
    date.map_or_else(|| words.say("tell-never", &[]), |date| words.date(date, DateStyle::Short))
}
