//! Every column that `tell` writes, with where its plain words are; what is written and what is explained is one list.

use super::canal_signs::CANAL_SIGNS;
use super::daily::{EACH_DAY, EACH_GATE};
use super::summary_lines::wrapped;
use crate::signs::Sign;
use crate::water::ledger::{Flow, Store};
use crate::words::Words;

/// Columns that say what a row of the yearly table is about.
pub(super) const ROW_NAMES: [&str; 5] = ["run", "water_year", "canal", "canal_name", "right_year"];
/// Sums of the ledger.
pub(super) const LEDGER_SUMS: [&str; 4] = ["in_m3", "out_m3", "residual_m3", "residual_share"];

/// The column of a flow of the ledger.
pub(super) fn flow_key(flow: Flow) -> String {
    format!("{}_m3", flow.key())
}

/// The columns of a store of the ledger: at the start and at the end.
pub(super) fn store_keys(store: Store) -> [String; 2] {
    [format!("{}_start_m3", store.key()), format!("{}_end_m3", store.key())]
}

/// The signs of a canal that have a column of their own; the supply ratio shares that of the valley.
pub(super) fn canal_columns() -> impl Iterator<Item = (&'static str, super::canal_signs::Reading)> {
    CANAL_SIGNS.into_iter().filter(|(key, _)| Sign::from_key(key).is_none())
}

/// Every column of the yearly CSV, in order, with the message that explains it.
pub(in crate::commands) fn yearly() -> Vec<(String, String)> {
    let mut columns: Vec<(String, String)> = Vec::new();
    let named = |key: &str| (key.to_owned(), Words::key_id("column", key));
    columns.extend(ROW_NAMES.map(named));
    columns
        .extend(Sign::ALL.map(|sign| (sign.key().to_owned(), format!("{}.plain", Words::key_id("sign", sign.key())))));
    columns.extend(
        canal_columns().map(|(key, _)| (key.to_owned(), format!("{}.plain", Words::key_id("sign-canal", key)))),
    );
    for flow in Flow::ALL {
        columns.push((flow_key(flow), Words::key_id("column-flow", flow.key())));
    }
    for store in Store::ALL {
        let [start, end] = store_keys(store);
        columns.push((start, Words::key_id("column-store-start", store.key())));
        columns.push((end, Words::key_id("column-store-end", store.key())));
    }
    columns.extend(LEDGER_SUMS.map(|key| (key.to_owned(), Words::key_id("column-ledger", key))));
    columns
}

/// Every column of the daily CSV, in order, with the message that explains it; those of a gate once, with `GATE` for
/// its key.
fn daily() -> Vec<(String, String)> {
    let mut columns: Vec<(String, String)> =
        ["run", "date", "water_year"].map(|key| (key.to_owned(), Words::key_id("column", key))).into();
    columns.extend(EACH_DAY.iter().map(|column| (column.key.to_owned(), Words::key_id("column-day", column.key))));
    columns.extend(
        EACH_GATE.iter().map(|column| (format!("GATE_{}", column.key), Words::key_id("column-gate", column.key))),
    );
    columns
}

/// All columns with what they mean, for `--columns`.
pub(super) fn explain(words: &Words) -> String {
    let mut text = wrapped(&words.say("columns-yearly", &[]), "");
    text.push('\n');
    list(&yearly(), words, &mut text);
    text.push('\n');
    text.push_str(&wrapped(&words.say("columns-daily", &[]), ""));
    text.push('\n');
    list(&daily(), words, &mut text);
    text.push('\n');
    for id in ["columns-units", "columns-dates", "columns-missing", "columns-json", "columns-all", "columns-change"] {
        text.push_str(&wrapped(&words.say(id, &[]), ""));
    }
    text
}

fn list(columns: &[(String, String)], words: &Words, text: &mut String) {
    for (name, id) in columns {
        text.push_str(name);
        text.push('\n');
        text.push_str(&wrapped(&words.say(id, &[]), "    "));
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use std::collections::BTreeSet;

    #[test]
    fn every_column_is_explained_in_every_language() {
        for tag in crate::words::KNOWN_TAGS {
            let (words, _) = Words::new(tag);
            let text = explain(&words);
            assert_eq!(words.take_errors(), [], "{tag}");
            assert!(text.lines().all(|line| line.chars().count() <= 80), "{tag}");
        }
    }

    #[test]
    fn no_column_comes_twice() {
        for columns in [yearly(), daily()] {
            let names: BTreeSet<_> = columns.iter().map(|(name, _)| name).collect();
            assert_eq!(names.len(), columns.len());
        }
    }
}
