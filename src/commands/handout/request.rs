//! The options of `handout`, checked as far as that is possible without the place.

use std::path::{Path, PathBuf};

use clap::ArgMatches;

use crate::commands::failure::Failure;
use crate::commands::places;
use crate::commands::tell::years::read_years;
use crate::commands::usage::{mistake, unknown_choice};
use crate::handout::{Paper, SheetKind};
use crate::place::Years;
use crate::words::{System, Words};

/// Where the page goes when nobody says.
const USUAL_OUT: &str = "deshielo-handout.pdf";

/// What the page is written as.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Form {
    /// For printing.
    Pdf,
    /// For drawing on.
    Svg,
    /// For sending.
    Png,
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
    /// The lesson whose sheet is asked for.
    pub lesson: Option<PathBuf>,
    /// Which sheet of it.
    pub sheet: SheetKind,
    /// The paper; `None` leaves it to the place.
    pub paper: Option<Paper>,
    /// Units for people; `None` leaves it to the place.
    pub units: Option<System>,
    /// Where the page goes.
    pub out: PathBuf,
    /// What it is written as.
    pub form: Form,
}

impl Request {
    /// Reads the options.
    pub fn read(matches: &ArgMatches, words: &Words) -> Result<Self, Failure> {
        let text = |name: &str| matches.get_one::<String>(name).map(String::as_str);
        let path = |name: &str| matches.get_one::<PathBuf>(name).cloned();
        let refuse = |line: String| Err(mistake(&line, Some("handout"), words));
        let paper = match text("paper") {
            None => None,
            Some("a4") => Some(Paper::A4),
            Some("letter") => Some(Paper::Letter),
            Some(other) => return refuse(unknown_choice("--paper", other, &["a4", "letter"], words)),
        };
        let units = match text("units") {
            None => None,
            Some("metric") => Some(System::Metric),
            Some("us") => Some(System::Us),
            Some(other) => return refuse(unknown_choice("--units", other, &["metric", "us"], words)),
        };
        let years = match text("years") {
            None => None,
            Some(text) => Some(read_years(text, "handout", words)?),
        };
        let sheet = match text("sheet") {
            None | Some("work") => SheetKind::Work,
            Some("key") => SheetKind::Key,
            Some(other) => return refuse(unknown_choice("--sheet", other, &["work", "key"], words)),
        };
        let lesson = path("lesson");
        if lesson.is_none() && text("sheet").is_some() {
            return refuse(words.say("handout-sheet-of-nothing", &[]));
        }
        let of_result = [("set", matches.get_many::<String>("set").is_some()), ("setting", path("setting").is_some())];
        if let (Some(_), Some((option, _))) = (&lesson, of_result.iter().find(|(_, given)| *given)) {
            return refuse(words.say("handout-lesson-alone", &[("option", format!("--{option}").into())]));
        }
        let out = path("out").unwrap_or_else(|| USUAL_OUT.into());
        let Some(form) = form_of(&out) else {
            let path = out.display().to_string();
            return refuse(words.say("handout-out-unknown", &[("path", path.into())]));
        };
        Ok(Request {
            place: path("place").unwrap_or_else(|| places::USUAL.into()),
            set: matches.get_many::<String>("set").into_iter().flatten().cloned().collect(),
            setting: path("setting"),
            years,
            lesson,
            sheet,
            paper,
            units,
            out,
            form,
        })
    }
}

/// By the end of the file's name, large or small.
fn form_of(out: &Path) -> Option<Form> {
    let end = out.extension()?.to_str()?.to_ascii_lowercase();
    match end.as_str() {
        "pdf" => Some(Form::Pdf),
        "svg" => Some(Form::Svg),
        "png" => Some(Form::Png),
        _ => None,
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_name_says_the_form() {
        let form = |name: &str| form_of(Path::new(name));
        assert_eq!(
            (form("a.pdf"), form("b/c.PNG"), form("d.svg")),
            (Some(Form::Pdf), Some(Form::Png), Some(Form::Svg))
        );
        assert_eq!((form("a"), form("a.doc"), form(".pdf")), (None, None, None));
    }
}
