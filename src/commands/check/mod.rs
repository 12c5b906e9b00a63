//! `check`: every mistake of places, settings and lessons at its line, with what would be right.

mod found;
mod lessons;
mod report_json;

pub(super) use lessons::built_in as built_in_lesson;
#[cfg(feature = "pdf")]
pub(super) use lessons::is_lesson;

use std::path::PathBuf;

use clap::ArgMatches;

use super::failure::Failure;
use super::output::deliver;
use super::speech::Speech;
use super::usage::mistake;
use found::is_place;
pub(super) use found::{Checked, check_one};

/// How `check` answers.
#[derive(Clone, Copy, PartialEq, Eq)]
enum Form {
    Table,
    Json,
}

/// Checks everything that is named; fails when anything has a mistake.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let form = form(matches.get_one::<String>("form").map(String::as_str), speech)?;
    let paths: Vec<&PathBuf> = matches.get_many::<PathBuf>("paths").into_iter().flatten().collect();
    // Lessons are tried on the place that is named with them.
    let on = paths.iter().map(|path| path.as_path()).find(|path| is_place(path));
    let mut checked: Vec<Checked> = paths.iter().map(|path| check_one(path, on, speech)).collect();
    let wrong = checked.iter().any(Checked::is_wrong);
    let answer = match form {
        Form::Json => report_json::write(&checked, words),
        Form::Table => {
            let mut parts: Vec<String> = checked.iter_mut().map(|checked| checked.say(words)).collect();
            parts.push(String::new());
            parts.join("\n")
        }
    };
    deliver(answer.as_bytes(), None, words)?;
    if wrong { Err(Failure::Input(Vec::new())) } else { Ok(()) }
}

fn form(asked: Option<&str>, speech: &Speech) -> Result<Form, Failure> {
    match asked {
        None | Some("table") => Ok(Form::Table),
        Some("json") => Ok(Form::Json),
        Some(other) => {
            let line = super::usage::unknown_choice("--form", other, &["table", "json"], &speech.words);
            Err(mistake(&line, Some("check"), &speech.words))
        }
    }
}
