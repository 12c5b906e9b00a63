//! The years as CSV: for each run and water year a row for the valley, then one for each canal or town.

use super::canal_signs::{CANAL_SIGNS, Reading};
use super::columns::{LEDGER_SUMS, canal_columns, yearly};
use super::daily::number;
use super::runs::{Run, Told};
use crate::place::Place;
use crate::signs::{CanalSigns, Sign, SignKind, YearReport};
use crate::water::calendar::CalendarDay;
use crate::water::ledger::{FLOWS, Flow, Ledger, STORES, Store};

/// Both runs, a row each for the valley and for every canal of every year shown.
pub(in crate::commands) fn write(told: &Told) -> String {
    let mut rows: Vec<Vec<String>> = vec![yearly().into_iter().map(|(name, _)| name).collect()];
    for (name, run) in [("as_it_was", &told.as_it_was), ("with_changes", &told.with_changes)] {
        rows_of(name, run, &told.place, &mut rows);
    }
    let mut writer = csv::WriterBuilder::new().from_writer(Vec::new());
    for row in &rows {
        // Memory takes every row, and all rows are as wide as the header.
        let _ = writer.write_record(row);
    }
    writer.into_inner().ok().and_then(|bytes| String::from_utf8(bytes).ok()).unwrap_or_default()
}

fn rows_of(name: &str, run: &Run, place: &Place, rows: &mut Vec<Vec<String>>) {
    let start_month = place.valley.water_year_start_month;
    for year in &run.years {
        rows.push(valley_row(name, year, start_month));
        for (canal, gate) in year.signs.canals.iter().zip(&place.gates) {
            let about = [
                name.to_owned(),
                year.year.water_year.to_string(),
                gate.key.clone(),
                gate.name.get("en").to_owned(),
                gate.right_year.map(|year| year.to_string()).unwrap_or_default(),
            ];
            rows.push(canal_row(about, canal, start_month));
        }
    }
}

fn valley_row(name: &str, year: &YearReport, start_month: u8) -> Vec<String> {
    let empty = String::new;
    let mut row = vec![name.to_owned(), year.year.water_year.to_string(), empty(), empty(), empty()];
    row.extend(Sign::ALL.map(|sign| match sign.kind() {
        SignKind::Date => date(sign.date_of(&year.signs), start_month),
        _ => sign.of(&year.signs).map(number).unwrap_or_default(),
    }));
    row.extend(canal_columns().map(|_| empty()));
    row.extend(ledger_numbers(&year.ledger).into_iter().map(number));
    row
}

fn canal_row(about: [String; 5], canal: &CanalSigns, start_month: u8) -> Vec<String> {
    let cell = |reading: Reading| match reading {
        Reading::Date(read) => date(read(canal), start_month),
        Reading::Number(read) => read(canal).map(number).unwrap_or_default(),
    };
    let mut row: Vec<String> = about.into();
    row.extend(Sign::ALL.map(|sign| {
        // The supply ratio has one column for the valley and its canals.
        let own = CANAL_SIGNS.into_iter().find(|(key, _)| *key == sign.key());
        own.map(|(_, reading)| cell(reading)).unwrap_or_default()
    }));
    row.extend(canal_columns().map(|(_, reading)| cell(reading)));
    row.extend((0..FLOWS + 2 * STORES + LEDGER_SUMS.len()).map(|_| String::new()));
    row
}

/// The ledger in the order of its columns.
fn ledger_numbers(ledger: &Ledger) -> Vec<f64> {
    let mut numbers: Vec<f64> = Flow::ALL.map(|flow| ledger.of(flow)).into();
    for store in Store::ALL {
        numbers.extend([ledger.start.of(store), ledger.end.of(store)]);
    }
    numbers.extend([ledger.in_m3(), ledger.out_m3(), ledger.residual_m3(), ledger.residual_share()]);
    numbers
}

fn date(day: Option<CalendarDay>, start_month: u8) -> String {
    day.map(|day| day.date(start_month).to_string()).unwrap_or_default()
}
