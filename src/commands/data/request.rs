//! The options of `data`, checked as far as that is possible without the place.

use std::path::PathBuf;

use clap::ArgMatches;

use crate::commands::failure::Failure;
use crate::commands::places;
use crate::commands::tell::years::read_years;
use crate::commands::usage::{mistake, unknown_choice};
use crate::place::Years;
use crate::words::Words;

/// What is written.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Form {
    /// Four tables: days, days of canals, years, and what the columns mean.
    Csv,
    /// One file of the days.
    NetCdf,
}

/// Where it goes.
#[derive(Clone, Debug, PartialEq, Eq)]
pub(super) enum Target {
    /// One file.
    File(PathBuf),
    /// Several files in a folder.
    Folder(PathBuf),
}

/// Where files go when nobody says.
const USUAL_FOLDER: &str = "deshielo-data";
const USUAL_FILE: &str = "deshielo-data.nc";

/// What is asked for.
pub(super) struct Request {
    /// The place.
    pub place: PathBuf,
    /// Every `--set`, as it was written.
    pub set: Vec<String>,
    /// The setting.
    pub setting: Option<PathBuf>,
    /// Which years to write; `None` leaves it to the setting.
    pub years: Option<Years>,
    /// What is written.
    pub form: Form,
    /// Where it goes.
    pub target: Target,
    years_text: Option<String>,
}

impl Request {
    /// Reads the options.
    pub fn read(matches: &ArgMatches, words: &Words) -> Result<Self, Failure> {
        let text = |name: &str| matches.get_one::<String>(name).map(String::as_str);
        let path = |name: &str| matches.get_one::<PathBuf>(name).cloned();
        let refuse = |line: String| Err(mistake(&line, Some("data"), words));
        let form = match text("form") {
            None | Some("csv") => Form::Csv,
            Some("netcdf") => Form::NetCdf,
            Some(other) => return refuse(unknown_choice("--form", other, &["csv", "netcdf"], words)),
        };
        let years = match text("years") {
            None => None,
            Some(text) => Some(read_years(text, "data", words)?),
        };
        let goes_with = |option: &str, form: &str| {
            let arguments = [("option", option.to_owned().into()), ("forms", form.to_owned().into())];
            words.say("error-option-form", &arguments)
        };
        let target = match (form, path("out"), path("into")) {
            (Form::Csv, Some(_), _) => return refuse(goes_with("--out", "--form netcdf")),
            (Form::NetCdf, _, Some(_)) => return refuse(goes_with("--into", "--form csv")),
            (Form::Csv, None, into) => Target::Folder(into.unwrap_or_else(|| USUAL_FOLDER.into())),
            (Form::NetCdf, out, None) => Target::File(out.unwrap_or_else(|| USUAL_FILE.into())),
        };
        Ok(Request {
            place: path("place").unwrap_or_else(|| places::USUAL.into()),
            set: matches.get_many::<String>("set").into_iter().flatten().cloned().collect(),
            setting: path("setting"),
            years,
            form,
            target,
            years_text: text("years").map(str::to_owned),
        })
    }

    /// The command that makes the same numbers again; the name of a folder stays behind.
    pub fn history(&self) -> String {
        let mut line = format!("deshielo {}: deshielo data", env!("CARGO_PKG_VERSION"));
        if let Some(name) = self.place.file_name().and_then(|name| name.to_str()) {
            line.push_str(&format!(" {name}"));
        }
        self.set.iter().for_each(|set| line.push_str(&format!(" --set {set}")));
        if let Some(name) = self.setting.as_ref().and_then(|setting| setting.file_name()?.to_str()) {
            line.push_str(&format!(" --setting {name}"));
        }
        if let Some(years) = &self.years_text {
            line.push_str(&format!(" --years {years}"));
        }
        line
    }
}
