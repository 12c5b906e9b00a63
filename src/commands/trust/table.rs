//! What `trust` says to people: first what the model may be used for, then every score behind it.

use super::rows;
use crate::commands::fit::tests;
use crate::commands::fitted::PlaceFit;
use crate::commands::judged::Judged;
use crate::commands::tell::layout::wrapped;
use crate::fit::trust::{FlowTrust, SnowLink};
use crate::place::Place;
use crate::signs::skill::{ErrorShape, Rating, SHAPE_POINTS};
use crate::words::{System, Words};

/// From this correlation on, the error of a year is said to come with its snow, and below the other not (common
/// practice, no source).
const GOES_WITH_SNOW: f64 = 0.6;
const NOT_WITH_SNOW: f64 = 0.3;
/// Letters of the shape, and how it is drawn from low to high.
const SHAPE_LETTERS: usize = 51;
const HEIGHTS: [&str; 6] = [" ", ".", ":", "+", "*", "#"];

/// The whole answer.
pub(super) fn write(judged: &Judged, place: &Place, fit: Option<&PlaceFit>, system: System, words: &Words) -> String {
    let mut text = wrapped(&words.say("trust-title", &[("place", place.name.get(words.tag()).into())]), "");
    if place.invented {
        text.push_str(&wrapped(&words.say("tell-invented", &[]), ""));
    }
    for line in standing(judged, place, fit, words) {
        text.push_str(&wrapped(&line, ""));
    }
    text.push('\n');
    text.push_str(&wrapped(&words.say("trust-uses", &[]), ""));
    text.push_str(&rows::rulings(&judged.rulings, words));
    let mut part = |table: String| {
        if !table.is_empty() {
            text.push('\n');
            text.push_str(&table);
        }
    };
    part(tests(&judged.tests, words));
    if let Some(flow) = judged.best_evidence() {
        part(rows::scores(judged, words) + &wrapped(&words.say("trust-scores-how", &[]), ""));
        part(monthly(flow, words));
        part(rows::season(flow, system, words));
        part(rows::duration(flow, system, words));
        part(ends(flow, words));
        part(flow.errors.as_ref().map(|shape| errors(shape, words)).unwrap_or_default());
        part(rows::years(flow, system, words));
    }
    part(judged.snow_link.as_ref().map(|link| snow_link(link, words)).unwrap_or_default());
    part(rows::stores(judged, place, words));
    text
}

/// Whether it was fitted, to what, and what the scores below are about.
fn standing(judged: &Judged, place: &Place, fit: Option<&PlaceFit>, words: &Words) -> Vec<String> {
    let mut lines = Vec::new();
    if judged.below_diversions {
        lines.push(words.say("trust-below-diversions", &[]));
    } else if place.gauge.is_none() {
        lines.push(words.say("trust-no-gauge", &[]));
    } else if judged.flow.is_none() {
        lines.push(words.say("trust-gauge-apart", &[]));
    }
    match fit {
        None if judged.flow.is_some() => lines.push(words.say("trust-not-fitted", &[])),
        None => {}
        Some(fit) => {
            let years = &fit.file.water_years;
            let [first, last] = [years.first(), years.last()].map(|year| year.map_or(0, |year| *year));
            let arguments = [("first", words.year(first).into()), ("last", words.year(last).into())];
            lines.push(words.say("page-trust-fitted-to", &arguments));
            if fit.stale {
                lines.push(words.say("trust-stale", &[]));
            }
            let id = if judged.unseen.is_some() { "trust-judged-unseen" } else { "trust-judged-seen" };
            lines.push(words.say(id, &[]));
        }
    }
    lines
}

fn monthly(flow: &FlowTrust, words: &Words) -> String {
    let Some(monthly) = &flow.monthly else { return String::new() };
    let rated = |rating: Rating| words.say(rating_id(rating), &[]).into();
    let arguments = [
        ("nse", words.number(monthly.nash_sutcliffe.0, 2).into()),
        ("nse_rating", rated(monthly.nash_sutcliffe.1)),
        ("rsr", words.number(monthly.rsr.0, 2).into()),
        ("rsr_rating", rated(monthly.rsr.1)),
        ("bias", words.percent(-monthly.percent_bias.0, 0).into()),
        ("bias_rating", rated(monthly.percent_bias.1)),
    ];
    wrapped(&words.say("trust-monthly", &arguments), "")
        + &wrapped(&words.say("trust-monthly-worst", &[("rating", rated(monthly.worst()))]), "")
}

/// The message of a published band.
pub(super) fn rating_id(rating: Rating) -> &'static str {
    match rating {
        Rating::VeryGood => "trust-rating-very-good",
        Rating::Good => "trust-rating-good",
        Rating::Satisfactory => "trust-rating-satisfactory",
        Rating::Unsatisfactory => "trust-rating-unsatisfactory",
    }
}

/// Low flow, floods, flood season and late summer, each by itself.
fn ends(flow: &FlowTrust, words: &Words) -> String {
    let lines = [
        ("trust-high-flow", flow.high_flow_bias),
        ("trust-flood-season", flow.flood_season_bias),
        ("trust-late-summer", flow.late_summer_bias),
        ("trust-low-flow", flow.low_flow_bias),
    ];
    lines.into_iter().filter_map(|(id, bias)| rows::bias(id, bias, words)).map(|line| wrapped(&line, "")).collect()
}

/// The shape of the daily errors, and whether it has one hump or more.
fn errors(shape: &ErrorShape, words: &Words) -> String {
    let times = |log: f64| words.number(libm::exp(log), 2);
    let highest = shape.density.iter().copied().fold(0.0, f64::max);
    let mut drawn = String::new();
    for letter in 0..SHAPE_LETTERS {
        let point = letter * (SHAPE_POINTS - 1) / (SHAPE_LETTERS - 1);
        let height = shape.density[point] / highest * (HEIGHTS.len() - 1) as f64;
        // The density is never below zero nor above its highest.
        drawn.push_str(HEIGHTS[(libm::ceil(height) as usize).min(HEIGHTS.len() - 1)]);
    }
    let ends = [("from", times(shape.from).into()), ("to", times(shape.to).into()), ("shape", drawn.into())];
    let mut text = wrapped(&words.say("trust-errors", &[]), "");
    text.push_str(&words.say("trust-errors-shape", &ends));
    text.push('\n');
    match shape.humps.as_slice() {
        [only] => {
            let at = [("at", times(only.at).into())];
            text.push_str(&wrapped(&words.say("trust-one-hump", &at), ""));
        }
        humps => {
            let at: Vec<String> = humps.iter().map(|hump| times(hump.at)).collect();
            let arguments = [("n", humps.len().into()), ("at", at.join(", ").into())];
            text.push_str(&wrapped(&words.say("trust-several-humps", &arguments), ""));
        }
    }
    text
}

fn snow_link(link: &SnowLink, words: &Words) -> String {
    let id = match link.correlation {
        r if r >= GOES_WITH_SNOW => "trust-link-snow",
        r if r <= NOT_WITH_SNOW => "trust-link-model",
        _ => "trust-link-both",
    };
    let arguments = [("r", words.number(link.correlation, 2).into()), ("n", link.years.into())];
    wrapped(&words.say(id, &arguments), "")
}
