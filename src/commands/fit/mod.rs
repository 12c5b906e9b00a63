//! `fit`: finds the numbers of the slopes with which a place's river runs like its gauge, and how far they can be trusted.

mod progress;
mod request;
mod stop;
mod told;

use std::io;
use std::path::{Path, PathBuf};

use clap::ArgMatches;

use super::failure::Failure;
use super::fitted::FIT_FILE;
use super::measured::{Measured, checksum};
use super::output::{check_target, deliver, reason};
use super::places;
use super::speech::Speech;
use super::usage::mistake;
use crate::fit::{FitError, FitFile, Watch, fit};
use crate::place::Place;
use crate::words::Words;
use progress::Line;
use request::Request;
pub(super) use told::{score, tests};

/// Fits the place and writes the file.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let request = Request::read(matches, &speech.words)?;
    let place = places::open_unfitted(&request.place, speech)?;
    let words = speech.for_place(&place.region);
    let target = target(&request, &place, &words)?;
    let measured = Measured::of(&place);
    let record = measured.record(&place).ok_or_else(|| {
        Failure::Input(vec![words.say("error-fit-no-gauge", &[]), words.say("error-fit-no-gauge.remedy", &[])])
    })?;
    // Before any long work: a minute's search is not to end at a folder that takes no file.
    check_writable(&target, &words)?;
    let stop = stop::on_interrupt();
    let found = {
        let line = Line::start(&words);
        let watch = Watch { stop: &stop, progress: &|progress| line.tell(progress, &words) };
        fit(&place.valley, &record, &request.settings, &watch).map_err(|error| refused(&error, &place, &words))?
    };
    let file = FitFile::new(&found, &request.settings, &place.valley, checksum(&place));
    let head = words.say("fit-file-head", &[("place", place.name.get(words.tag()).into())]);
    let head: String = head.lines().map(|line| format!("# {line}\n")).collect();
    let text = file.write().map_err(|reason| {
        Failure::input(
            words.say("error-output", &[("reason", words.say("reason-other", &[("reason", reason.into())]).into())]),
        )
    })?;
    deliver(format!("{head}\n{text}").as_bytes(), Some(&target), &words)?;
    deliver(told::table(&found, &file, &place, &target, &words).as_bytes(), None, &words)
}

/// Where the fit goes: what was asked for, else beside `place.toml`.
fn target(request: &Request, place: &Place, words: &Words) -> Result<PathBuf, Failure> {
    if let Some(path) = &request.out {
        check_target(Some(path), words)?;
        return Ok(path.clone());
    }
    let folder = request.into.as_ref().or(place.folder.as_ref());
    folder.map(|folder| folder.join(FIT_FILE)).ok_or_else(|| Failure::input(words.say("error-fit-built-in", &[])))
}

/// Whether a file can be made where the fit is to go.
fn check_writable(target: &Path, words: &Words) -> Result<(), Failure> {
    let folder = target.parent().filter(|folder| !folder.as_os_str().is_empty()).unwrap_or(Path::new("."));
    let locked = std::fs::metadata(target).is_ok_and(|about| about.permissions().readonly());
    let probed = if locked {
        Err(io::ErrorKind::PermissionDenied.into())
    } else {
        tempfile::Builder::new().prefix(".deshielo-").tempfile_in(folder).map(drop)
    };
    probed.map_err(|error| {
        let arguments = [("path", target.display().to_string().into()), ("reason", reason(&error, words).into())];
        Failure::Input(vec![words.say("error-file-unwritable", &arguments), words.say("error-fit-elsewhere", &[])])
    })
}

/// Why there is no fit.
fn refused(error: &FitError, place: &Place, words: &Words) -> Failure {
    let say = |id: &str, arguments: &[(&str, crate::words::Value<'_>)]| {
        let mut lines = vec![words.say(id, arguments)];
        let remedy = format!("{id}.remedy");
        if words.has(&remedy) {
            lines.push(words.say(&remedy, arguments));
        }
        Failure::Input(lines)
    };
    match error {
        FitError::BelowDiversions => say("error-fit-below-diversions", &[]),
        FitError::TooFewDays { found, needed } => {
            say("error-fit-few-days", &[("found", (*found).into()), ("needed", (*needed).into())])
        }
        FitError::TooFewYears { found, needed } => {
            say("error-fit-few-years", &[("found", (*found).into()), ("needed", (*needed).into())])
        }
        FitError::NoVariation => say("error-fit-still", &[]),
        FitError::NoSnowRecord => say("error-fit-no-snow", &[]),
        FitError::NotFinite { day } => {
            let date = place.first_date + chrono::Days::new(*day as u64);
            say("error-fit-infinite", &[("date", words.date(date, crate::words::DateStyle::Long).into())])
        }
        // Options are checked before, and series are as long as the weather.
        FitError::UnequalLengths | FitError::WrongSetting { .. } | FitError::NothingScored => {
            say("error-fit-nothing", &[])
        }
    }
}

/// A mistake in the options of `fit`.
fn refuse(line: &str, words: &Words) -> Failure {
    mistake(line, Some("fit"), words)
}
