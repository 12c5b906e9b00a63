//! `tell`: what a run gives in numbers, as it was and with the dials turned.

mod annual_csv;
mod canal_signs;
mod canal_table;
mod columns;
mod crops;
mod daily;
pub(super) mod dials;
mod grid;
mod json;
mod means;
pub(super) mod node;
mod ranges;
mod request;
mod runs;
mod summary_lines;
mod table;
pub(super) mod years;

/// How text and tables of any command are set.
pub(super) mod layout {
    pub(in crate::commands) use super::grid::{Column, Side, lay_out};
    pub(in crate::commands) use super::summary_lines::wrapped;
}

use std::path::Path;

use clap::ArgMatches;

use super::failure::Failure;
use super::output::{check_target, deliver};
use super::places;
use super::speech::Speech;
use super::spinner::Spinner;
use super::usage::mistake;
use crate::water::dials::Dials;
pub(super) use annual_csv::write as yearly_csv;
pub(super) use columns::yearly as yearly_columns;
pub(super) use daily::{EACH_GATE, number};
use request::{Form, Request};
pub(super) use runs::{Told, usual_system, years_at_rest};
#[cfg(feature = "pdf")]
pub(super) use table::{mean_date, sign_rows};

/// Runs the place and tells what came of it.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let request = Request::read(matches, words)?;
    check_target(request.out.as_deref(), words)?;
    if request.columns {
        return deliver(columns::explain(words).as_bytes(), request.out.as_deref(), words);
    }
    let (answer, words) = {
        let reading = words.say("progress-reading", &[("path", request.place.display().to_string().into())]);
        let spinner = Spinner::start(reading);
        let opened = places::open_fitted(&request.place, speech)?;
        drop(spinner);
        let place = &opened.place;
        let words = speech.for_place(&place.region);
        let setting = match &request.setting {
            Some(name) => Some(super::settings::open(name, &place.dials, &words)?),
            None => None,
        };
        let start = setting.as_ref().map_or(Dials::REST, |setting| setting.dials);
        let dials = dials::turn(start, &request.set, &place.dials, "tell", &words)?;
        let asked = request.years.or(setting.as_ref().map(|setting| setting.years));
        let _spinner = Spinner::start(words.say("progress-running", &[]));
        let told = Told::run(opened, setting, dials, asked, request.daily, &words)?;
        let system = request.units.unwrap_or(runs::usual_system(&told.place));
        let answer = match request.form {
            Form::Table if request.crops => {
                table::write(&told, system, &words) + &crops::write(&told.place, system, &words)
            }
            Form::Table => table::write(&told, system, &words),
            Form::Json => json::write(&told),
            Form::Csv if request.daily => daily::write_csv(&told),
            Form::Csv => annual_csv::write(&told),
        };
        (answer, words)
    };
    deliver(answer.as_bytes(), request.out.as_deref(), &words)
}

/// What is said of a place where it cannot be shown: its years at rest, and how to get help.
pub(super) fn summary(speech: &Speech, place: &Path) -> Result<(), Failure> {
    let opened = places::open_fitted(place, speech)?;
    let words = speech.for_place(&opened.place.region);
    let system = runs::usual_system(&opened.place);
    let told = Told::run(opened, None, Dials::REST, None, false, &words)?;
    let mut answer = table::write(&told, system, &words);
    answer.push('\n');
    answer.push_str(&words.say("tell-how-to-go-on", &[]));
    answer.push('\n');
    deliver(answer.as_bytes(), None, &words)
}

/// A mistake in the options of `tell`.
fn refuse(line: &str, words: &crate::words::Words) -> Failure {
    mistake(line, Some("tell"), words)
}
