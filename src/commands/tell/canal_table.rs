//! Canals by right: who got how much, on how many days, and until when.

use super::grid::{Column, Side, lay_out};
use super::means::{canal_performance, gates_by_right, of_canal};
use super::runs::{Run, Told};
use super::summary_lines::wrapped;
use super::table::mean_date;
use crate::signs::CanalSigns;
use crate::water::calendar::CalendarDay;
use crate::water::canals::SharingRule;
use crate::words::{DateStyle, Words};

/// Letters of a canal's name before it is broken.
const MOST_NAME: usize = 18;
/// Letters of any other cell.
const MOST_CELL: usize = 10;

/// The table of canals and towns; with dials turned, a second line for each.
pub(super) fn write(told: &Told, words: &Words) -> String {
    let many = told.as_it_was.years.len() > 1;
    let heading = |id: &str, side, most| Column { heading: words.say(id, &[]), side, most, heading_most: 0 };
    let valley = &told.place.valley;
    // Where everybody has the same share or a turn, dates of rights say nothing.
    let by_right = valley.rule == SharingRule::Seniority;
    let (title, order) = if by_right {
        ("tell-canals-by-right", gates_by_right(valley))
    } else {
        ("tell-canals-downstream", (0..valley.gates.len()).collect())
    };
    let mut columns = vec![heading(title, Side::Left, MOST_NAME)];
    if by_right {
        columns.push(heading("tell-canal-since", Side::Right, MOST_CELL));
    }
    columns.push(heading("tell-canal-share", Side::Right, MOST_CELL));
    if many {
        columns.push(heading("tell-canal-enough", Side::Right, MOST_CELL));
    }
    for id in ["tell-canal-full", "tell-canal-short", "tell-canal-cut", "tell-canal-last-full", "tell-canal-last-water"]
    {
        columns.push(heading(id, Side::Right, MOST_CELL));
    }
    let mut rows = Vec::new();
    for gate in order {
        let Some(names) = told.place.gates.get(gate) else { continue };
        let since = match names.right_year {
            Some(year) => words.year(year),
            None => words.say("tell-canal-before-all", &[]),
        };
        let mut begin = |run: &Run, name: String, since: String| {
            let mut cells = vec![name];
            cells.extend(Some(since).filter(|_| by_right));
            cells.extend(row(told, run, gate, words));
            rows.push(cells);
        };
        begin(&told.as_it_was, names.name.get(words.tag()).to_owned(), since);
        if told.is_turned() {
            begin(&told.with_changes, format!("  {}", words.say("tell-canal-with-changes", &[])), String::new());
        }
    }
    let mut text = lay_out(&columns, &rows).replace('\u{202f}', " ");
    if many {
        let share = words.percent(told.place.valley.enough_share * 100.0, 0);
        text.push_str(&wrapped(&words.say("tell-enough", &[("share", share.into())]), ""));
    }
    text
}

/// Share met, enough years, days, dates.
fn row(told: &Told, run: &Run, gate: usize, words: &Words) -> Vec<String> {
    let missing = || words.style().missing.clone();
    let mean = |read: fn(&CanalSigns) -> Option<f64>| of_canal(run, gate, read).map(|spread| spread.mean);
    let days = |read: fn(&CanalSigns) -> Option<f64>| mean(read).map_or_else(missing, |days| words.number(days, 0));
    let share = mean(|canal| canal.supply_ratio).map_or_else(missing, |share| words.percent(share * 100.0, 0));
    let mut cells = vec![share];
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
