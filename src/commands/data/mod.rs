//! `data`: the days and years of both runs as open data, with what every column means.

mod days;
mod dictionary;
mod request;

use clap::ArgMatches;

use super::failure::Failure;
use super::output::{check_target, deliver};
use super::speech::Speech;
use super::spinner::Spinner;
use super::tell::dials::turn;
use super::tell::{Told, yearly_csv};
use super::{places, settings, tell_standard_error};
use crate::open_data::netcdf::NetCdfFault;
use crate::open_data::run_file;
use crate::water::dials::Dials;
use crate::words::Words;
use request::{Form, Request, Target};

/// Runs the place and writes its files.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let request = Request::read(matches, &speech.words)?;
    if let Target::File(path) = &request.target {
        check_target(Some(path), &speech.words)?;
    }
    let reading = speech.words.say("progress-reading", &[("path", request.place.display().to_string().into())]);
    let spinner = Spinner::start(reading);
    let opened = places::open_fitted(&request.place, speech)?;
    let place = &opened.place;
    drop(spinner);
    let words = speech.for_place(&place.region);
    let setting = match &request.setting {
        Some(name) => Some(settings::open(name, &place.dials, &words)?),
        None => None,
    };
    let start = setting.as_ref().map_or(Dials::REST, |setting| setting.dials);
    let dials = turn(start, &request.set, &place.dials, "data", &words)?;
    let asked = request.years.or(setting.as_ref().map(|setting| setting.years));
    let spinner = Spinner::start(words.say("progress-running", &[]));
    let told = Told::run(opened, setting, dials, asked, true, &words)?;
    let days = days::read(&told, &request.history(), speech);
    let files: Vec<(&str, Vec<u8>)> = match request.form {
        Form::NetCdf => {
            let bytes = run_file(&days).bytes().map_err(|fault| refused(&fault, &words))?;
            vec![("", bytes)]
        }
        Form::Csv => vec![
            ("days.csv", days::valley_csv(&days).into_bytes()),
            ("canals.csv", days::canals_csv(&days).into_bytes()),
            ("years.csv", yearly_csv(&told).into_bytes()),
            ("dictionary.csv", dictionary::write(&days, speech).into_bytes()),
        ],
    };
    drop(spinner);
    write(&files, &request.target, &words)
}

fn write(files: &[(&str, Vec<u8>)], target: &Target, words: &Words) -> Result<(), Failure> {
    let path = match target {
        Target::File(path) => {
            for (_, bytes) in files {
                deliver(bytes, Some(path), words)?;
            }
            path
        }
        Target::Folder(folder) => {
            std::fs::create_dir_all(folder).map_err(|error| {
                let reason = super::output::reason(&error, words);
                let arguments = [("path", folder.display().to_string().into()), ("reason", reason.into())];
                Failure::input(words.say("show-folder-unwritable", &arguments))
            })?;
            for (name, bytes) in files {
                deliver(bytes, Some(&folder.join(name)), words)?;
            }
            folder
        }
    };
    let arguments = [("n", files.len().into()), ("path", path.display().to_string().into())];
    tell_standard_error(&[words.say("data-written", &arguments)]);
    Ok(())
}

fn refused(fault: &NetCdfFault, words: &Words) -> Failure {
    let reason = match fault {
        NetCdfFault::Shape(name) => name.clone(),
        NetCdfFault::TooLarge => words.say("reason-too-large", &[]),
    };
    Failure::input(words.say("data-fault", &[("reason", reason.into())]))
}
