//! What `fit` says when it is done.

use std::path::Path;

use super::request::OBJECTIVES;
use crate::commands::tell::layout::{Column, Side, lay_out, wrapped};
use crate::fit::split::{FAILS_BEYOND, HOLDS_WITHIN};
use crate::fit::{Fit, FitError, FitFile, Half, Parting, SplitTest, Transfer};
use crate::place::Place;
use crate::words::{Value, Words};

/// Letters of a name, of a value and of a heading before they are broken.
const MOST_NAME: usize = 30;
const MOST_VALUE: usize = 12;
const MOST_HEADING: usize = 12;
/// How near to a bound a value lies on it, as a share of the range.
const ON_BOUND: f64 = 0.01;

/// The whole answer.
pub(super) fn table(found: &Fit, file: &FitFile, place: &Place, target: &Path, words: &Words) -> String {
    let name = place.name.get(words.tag());
    let ends = [found.water_years.first(), found.water_years.last()];
    let [first, last] = ends.map(|year| Value::from(year.map_or_else(String::new, |year| words.year(*year))));
    let arguments = [("place", name.into()), ("n", found.water_years.len().into()), ("first", first), ("last", last)];
    let mut text = wrapped(&words.say("fit-title", &arguments), "");
    if found.stopped {
        text.push_str(&wrapped(&words.say("fit-stopped", &[]), ""));
    }
    text.push('\n');
    let objective = OBJECTIVES.iter().find(|(_, objective)| *objective == file.objective).map_or("", |(name, _)| name);
    let score = [("objective", objective.into()), ("score", score(found.scores.objective, words).into())];
    text.push_str(&wrapped(&words.say("fit-score", &score), ""));
    text.push('\n');
    text.push_str(&tests(&found.tests, words));
    text.push_str(&untested(found, words));
    text.push('\n');
    text.push_str(&parameters(file, words));
    text.push('\n');
    let spread = [("n", found.sets.len().into()), ("distance", words.number(found.spread.distance, 3).into())];
    text.push_str(&wrapped(&words.say("fit-ensemble", &spread), ""));
    text.push_str(&wrapped(&words.say("fit-band-is-narrow", &[]), ""));
    text.push('\n');
    let path = target.display().to_string();
    text.push_str(&wrapped(&words.say("fit-written", &[("path", path.into())]), ""));
    text
}

/// Two decimals, or the mark of what is not there.
pub(in crate::commands) fn score(score: Option<f64>, words: &Words) -> String {
    score
        .filter(|score| score.is_finite())
        .map_or_else(|| words.style().missing.clone(), |score| words.number(score, 2))
}

/// Halves judged by the set of the other half.
pub(in crate::commands) fn tests(tests: &[SplitTest], words: &Words) -> String {
    if tests.is_empty() {
        return String::new();
    }
    let heading = |id: &str, side, most| Column { heading: words.say(id, &[]), side, most, heading_most: MOST_HEADING };
    let columns = [
        heading("fit-test-years", Side::Left, MOST_NAME),
        heading("fit-test-own", Side::Right, MOST_VALUE),
        heading("fit-test-other", Side::Right, MOST_VALUE),
        heading("fit-test-usual", Side::Right, MOST_VALUE),
        heading("fit-test-verdict", Side::Left, MOST_VALUE),
    ];
    let mut rows = Vec::new();
    for test in tests {
        for (index, half) in test.halves.iter().enumerate() {
            let years = match (test.parting, index) {
                (Parting::EarlierLater, 0) => "page-trust-earlier",
                (Parting::EarlierLater, _) => "page-trust-later",
                (Parting::ColderWarmer, 0) => "page-trust-colder",
                (Parting::ColderWarmer, _) => "page-trust-warmer",
            };
            rows.push(vec![
                words.say(years, &[("n", half.water_years.len().into())]),
                score(half.fitted.kling_gupta, words),
                score(half.judged.kling_gupta, words),
                score(half.guess_kling_gupta, words),
                words.say(verdict(half), &[]),
            ]);
        }
    }
    let arguments = [("good", words.number(HOLDS_WITHIN, 2).into()), ("bad", words.number(FAILS_BEYOND, 2).into())];
    wrapped(&words.say("fit-tests", &[]), "")
        + &lay_out(&columns, &rows).replace('\u{202f}', " ")
        + &wrapped(&words.say("fit-tests-how", &arguments), "")
}

fn verdict(half: &Half) -> &'static str {
    match half.transfer() {
        Transfer::Holds => "page-trust-holds",
        Transfer::Weakens => "page-trust-weakens",
        Transfer::Fails => "page-trust-fails",
    }
}

fn untested(found: &Fit, words: &Words) -> String {
    match &found.untested {
        Some(FitError::TooFewYears { found, needed }) => {
            let arguments = [("found", (*found).into()), ("needed", (*needed).into())];
            wrapped(&words.say("fit-untested-years", &arguments), "")
        }
        Some(_) => wrapped(&words.say("fit-untested", &[]), ""),
        None if found.tests.is_empty() => wrapped(&words.say("fit-untested-asked", &[]), ""),
        None => String::new(),
    }
}

/// The fitted numbers, their bounds and whether they lie on one.
fn parameters(file: &FitFile, words: &Words) -> String {
    let heading = |id: &str, side, most| Column { heading: words.say(id, &[]), side, most, heading_most: MOST_HEADING };
    let columns = [
        heading("fit-number", Side::Left, MOST_NAME),
        heading("fit-value", Side::Right, MOST_VALUE),
        heading("fit-least", Side::Right, MOST_VALUE),
        heading("fit-most", Side::Right, MOST_VALUE),
        heading("fit-on-bound", Side::Left, MOST_VALUE),
    ];
    let row = |number: &crate::fit::FittedParameter| {
        let range = number.most - number.least;
        let near = (number.value - number.least).min(number.most - number.value) <= ON_BOUND * range;
        let mark = if near { words.say("fit-on-bound-mark", &[]) } else { String::new() };
        let shown = |value: f64| words.significant(value, 3);
        vec![number.key.clone(), shown(number.value), shown(number.least), shown(number.most), mark]
    };
    let rows: Vec<Vec<String>> = file.parameters.iter().map(row).collect();
    lay_out(&columns, &rows).replace('\u{202f}', " ")
}
