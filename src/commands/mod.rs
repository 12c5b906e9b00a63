//! The command line: one thin file a subcommand.
//!
//! Language comes first, so that help and every mistake are told in it. Whatever a command writes is whole or not there
//! at all. Exit codes: 0 well, 1 the input is wrong, 2 usage.

mod built_in;
mod bundle;
mod check;
mod data;
mod failure;
mod fit;
mod fitted;
#[cfg(feature = "pdf")]
mod handout;
mod judged;
mod keep_folder;
mod line;
mod map;
mod measured;
mod output;
mod place;
mod places;
mod problem_words;
mod rehearse;
mod settings;
mod show;
mod snippets;
mod speech;
mod spinner;
mod tally;
mod tell;
mod trust;
mod usage;
mod weather;
mod wiring;

use std::ffi::OsString;
use std::io::Write;
use std::process::ExitCode;

use failure::Failure;
use speech::Speech;

/// Parses `arguments`, runs the subcommand and maps its outcome: 0 well, 1 the input is wrong, 2 usage.
pub fn run(arguments: impl Iterator<Item = OsString>) -> ExitCode {
    let arguments: Vec<OsString> = arguments.collect();
    let speech = Speech::choose(&arguments);
    let outcome = speech.warn().and_then(|()| dispatch(&speech, arguments));
    match outcome {
        Ok(()) | Err(Failure::ReaderGone) => ExitCode::SUCCESS,
        Err(Failure::Usage(lines)) => {
            tell_standard_error(&lines);
            ExitCode::from(2)
        }
        Err(Failure::Input(lines)) => {
            tell_standard_error(&lines);
            ExitCode::from(1)
        }
    }
}

/// The whole command line in a language, for pages about it: manuals and what a shell completes.
pub fn command_line(language: &str) -> clap::Command {
    line::command(&crate::words::Words::new(language).0)
}

fn dispatch(speech: &Speech, arguments: Vec<OsString>) -> Result<(), Failure> {
    let command = line::command(&speech.words);
    let matches = match command.clone().try_get_matches_from(&arguments) {
        Ok(matches) => matches,
        Err(error) => return usage::answer(&error, &command, &arguments, &speech.words),
    };
    match matches.subcommand() {
        Some(("tell", matches)) => tell::run(speech, matches),
        Some(("data", matches)) => data::run(speech, matches),
        Some(("check", matches)) => check::run(speech, matches),
        Some(("show", matches)) => show::run(speech, matches),
        Some(("map", matches)) => map::run(speech, matches),
        Some(("rehearse", matches)) => rehearse::run(speech, matches),
        Some(("weather", matches)) => weather::run(speech, matches),
        Some(("wiring", matches)) => wiring::run(speech, matches),
        Some(("tally", matches)) => tally::run(speech, matches),
        Some(("bundle", matches)) => bundle::run(speech, matches),
        Some(("place", matches)) => place::run(speech, matches),
        #[cfg(feature = "pdf")]
        Some(("handout", matches)) => handout::run(speech, matches),
        Some(("fit", matches)) => fit::run(speech, matches),
        Some(("trust", matches)) => trust::run(speech, matches),
        _ => show::usual(speech),
    }
}

/// Nothing can be told to anybody where standard error itself is gone.
fn tell_standard_error(lines: &[String]) {
    let mut text = lines.join("\n");
    if !text.is_empty() {
        text.push('\n');
    }
    let _ = std::io::stderr().lock().write_all(text.as_bytes());
}
