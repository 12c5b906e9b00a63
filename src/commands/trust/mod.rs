//! `trust`: how far a place's model can be believed, score by score, and what it may be used for.

mod json;
mod rows;
mod table;

use std::path::PathBuf;

use clap::ArgMatches;

use super::failure::Failure;
use super::judged::Judged;
use super::output::{check_target, deliver};
use super::places::{self, Opened};
use super::speech::Speech;
use super::spinner::Spinner;
use super::tell::usual_system;
use super::usage::{mistake, unknown_choice};
use crate::words::System;

/// How the answer is written.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
enum Form {
    Table,
    Json,
}

/// Judges the place and tells.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let text = |name: &str| matches.get_one::<String>(name).map(String::as_str);
    let refuse = |option: &str, value: &str, choices: &[&str]| {
        Err(mistake(&unknown_choice(option, value, choices, words), Some("trust"), words))
    };
    let form = match text("form") {
        None | Some("table") => Form::Table,
        Some("json") => Form::Json,
        Some(other) => return refuse("--form", other, &["table", "json"]),
    };
    let units = match text("units") {
        None => None,
        Some("metric") => Some(System::Metric),
        Some("us") => Some(System::Us),
        Some(other) => return refuse("--units", other, &["metric", "us"]),
    };
    let out = matches.get_one::<PathBuf>("out").cloned();
    check_target(out.as_deref(), words)?;
    let name = matches.get_one::<PathBuf>("place").cloned().unwrap_or_else(|| places::USUAL.into());
    let Opened { place, fit } = places::open_fitted(&name, speech)?;
    let words = speech.for_place(&place.region);
    let judged = {
        let _spinner = Spinner::start(words.say("progress-running", &[]));
        Judged::of(&place, fit.as_ref())
            .map_err(|fault| Failure::input(words.say("error-river-fault", &[("value", fault.value.into())])))?
    };
    let system = units.unwrap_or(usual_system(&place));
    let answer = match form {
        Form::Table => table::write(&judged, &place, fit.as_ref(), system, &words),
        Form::Json => json::write(&judged, &place, fit.as_ref()),
    };
    deliver(answer.as_bytes(), out.as_deref(), &words)
}
