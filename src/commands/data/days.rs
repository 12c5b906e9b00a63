//! The days of both runs, column by column, and their tables.

use crate::commands::speech::Speech;
use crate::commands::tell::{EACH_GATE, Told, number};
use crate::open_data::{Canal, CanalSeries, RunDays, Series};
use crate::words::Words;

/// The names of the runs.
const RUNS: [&str; 2] = ["as_it_was", "with_changes"];

/// Puts the days together.
pub(super) fn read(told: &Told, history: &str, speech: &Speech) -> RunDays {
    let languages = ["en", "es"].map(|language| speech.in_language(language));
    let meaning =
        |topic: &str, key: &str| [0, 1].map(|index: usize| languages[index].say(&Words::key_id(topic, key), &[]));
    let place = &told.place;
    let both = [&told.as_it_was.days, &told.with_changes.days].map(Option::as_ref);
    let [Some(was), Some(with)] = both else { return RunDays::default() };
    let valley = was.day_keys().into_iter().enumerate().map(|(column, key)| Series {
        key: key.to_owned(),
        meaning: meaning("column-day", key),
        runs: [was.column(column), with.column(column)],
    });
    let of_canals = EACH_GATE.iter().enumerate().map(|(index, column)| CanalSeries {
        key: column.key.to_owned(),
        meaning: meaning("column-gate", column.key),
        canals: (0..place.gates.len())
            .map(|gate| [was.column(was.gate_column(gate, index)), with.column(with.gate_column(gate, index))])
            .collect(),
    });
    let english = &languages[0];
    RunDays {
        title: english.say("data-title", &[("place", place.name.get("en").into())]),
        source: format!("deshielo {}", env!("CARGO_PKG_VERSION")),
        history: history.to_owned(),
        comment: english.say("caution-not-a-forecast", &[]),
        dates: was.dates().to_vec(),
        water_years: was.water_years().to_vec(),
        canals: place
            .gates
            .iter()
            .map(|gate| Canal { key: gate.key.clone(), name: gate.name.get("en").to_owned() })
            .collect(),
        valley: valley.collect(),
        of_canals: of_canals.collect(),
    }
}

/// One row for each run and day.
pub(super) fn valley_csv(days: &RunDays) -> String {
    let mut text = String::from("run,date,water_year");
    for series in &days.valley {
        text.push(',');
        text.push_str(&series.key);
    }
    text.push('\n');
    for (run, name) in RUNS.iter().enumerate() {
        for (day, (date, year)) in days.dates.iter().zip(&days.water_years).enumerate() {
            text.push_str(&format!("{name},{date},{year}"));
            for series in &days.valley {
                text.push(',');
                text.push_str(&series.runs[run].get(day).copied().map(number).unwrap_or_default());
            }
            text.push('\n');
        }
    }
    text
}

/// One row for each run, day and canal or town.
pub(super) fn canals_csv(days: &RunDays) -> String {
    let mut text = String::from("run,date,water_year,canal");
    for series in &days.of_canals {
        text.push(',');
        text.push_str(&series.key);
    }
    text.push('\n');
    for (run, name) in RUNS.iter().enumerate() {
        for (day, (date, year)) in days.dates.iter().zip(&days.water_years).enumerate() {
            for (canal, about) in days.canals.iter().enumerate() {
                text.push_str(&format!("{name},{date},{year},{}", about.key));
                for series in &days.of_canals {
                    text.push(',');
                    let value = series.canals.get(canal).and_then(|runs| runs[run].get(day)).copied();
                    text.push_str(&value.map(number).unwrap_or_default());
                }
                text.push('\n');
            }
        }
    }
    text
}
