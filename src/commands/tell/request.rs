//! The options of `tell`, checked as far as that is possible without the place.

use std::path::PathBuf;

use clap::ArgMatches;

use super::refuse;
use super::years::read_years;
use crate::commands::failure::Failure;
use crate::commands::places;
use crate::commands::usage::unknown_choice;
use crate::place::Years;
use crate::words::{System, Words};

/// How the answer is written.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Form {
    /// For people.
    Table,
    /// One row a year, or a day.
    Csv,
    /// Everything.
    Json,
}

/// What is asked for.
pub(super) struct Request {
    /// The place.
    pub place: PathBuf,
    /// Every `--set`, as it was written.
    pub set: Vec<String>,
    /// The setting.
    pub setting: Option<PathBuf>,
    /// Which years to show; `None` leaves it to the setting.
    pub years: Option<Years>,
    /// Whether every day is told.
    pub daily: bool,
    /// Whether the crops are shown.
    pub crops: bool,
    /// Whether only the columns are explained.
    pub columns: bool,
    /// How the answer is written.
    pub form: Form,
    /// Units for people; `None` leaves it to the place.
    pub units: Option<System>,
    /// Where the answer goes.
    pub out: Option<PathBuf>,
}

impl Request {
    /// Reads the options.
    pub fn read(matches: &ArgMatches, words: &Words) -> Result<Self, Failure> {
        let text = |name: &str| matches.get_one::<String>(name).map(String::as_str);
        let path = |name: &str| matches.get_one::<PathBuf>(name).cloned();
        let form = match text("form") {
            None | Some("table") => Form::Table,
            Some("csv") => Form::Csv,
            Some("json") => Form::Json,
            Some(other) => {
                return Err(refuse(&unknown_choice("--form", other, &["table", "csv", "json"], words), words));
            }
        };
        let units = match text("units") {
            None => None,
            Some("metric") => Some(System::Metric),
            Some("us") => Some(System::Us),
            Some(other) => return Err(refuse(&unknown_choice("--units", other, &["metric", "us"], words), words)),
        };
        let years = match text("years") {
            None => None,
            Some(text) => Some(read_years(text, "tell", words)?),
        };
        let request = Request {
            place: path("place").unwrap_or_else(|| places::USUAL.into()),
            set: matches.get_many::<String>("set").into_iter().flatten().cloned().collect(),
            setting: path("setting"),
            years,
            daily: matches.get_flag("daily"),
            crops: matches.get_flag("crops"),
            columns: matches.get_flag("columns"),
            form,
            units,
            out: path("out"),
        };
        let goes_with = |option: &str, forms: &str| {
            let arguments = [("option", option.into()), ("forms", forms.into())];
            Err(refuse(&words.say("error-option-form", &arguments), words))
        };
        match request.form {
            Form::Table if request.daily => goes_with("--daily", "--form csv, --form json"),
            Form::Csv | Form::Json if request.crops => goes_with("--crops", "--form table"),
            _ => Ok(request),
        }
    }
}
