//! `place`: preparing a valley of one's own: a look at a record, a starter, and more records or more days.

mod add;
mod ask;
mod files;
mod heights;
pub(super) mod line;
mod new;
mod peek;
mod peek_json;
mod picture;
mod skeleton;

use clap::ArgMatches;

use super::failure::Failure;
use super::speech::Speech;
use super::usage::mistake;

/// Runs the part of `place` that is asked for.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    match matches.subcommand() {
        Some(("new", matches)) => new::run(speech, matches),
        Some(("peek", matches)) => peek::run(speech, matches),
        Some(("add", matches)) => add::run(speech, matches),
        _ => Err(mistake(&speech.words.say("place-which", &[]), Some("place"), &speech.words)),
    }
}
