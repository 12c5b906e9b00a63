//! A named setting of the dials and the years to look at, as a file: a drought to try on any place.

use std::path::Path;

use super::dial_plan::{DialOffer, DialPlan, unknown_dial};
use super::problem::{Location, Problem, Severity};
use super::section::{Limits, Section};
use super::text::{Text, need_names, optional_names};
use super::tree::{Kind, Sheet};
use crate::water::dials::{Dial, Dials};

/// Which water years of the record are looked at.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Years {
    /// All of them.
    All,
    /// A dry one.
    Dry,
    /// A middling one.
    Middling,
    /// A wet one.
    Wet,
    /// From one water year to another, both included.
    Span(i32, i32),
}

impl Years {
    /// Reads `all`, `dry`, `middling`, `wet`, `YYYY` or `YYYY..YYYY`.
    pub fn from_key(key: &str) -> Option<Years> {
        let year = |text: &str| {
            (text.len() == 4 && text.bytes().all(|byte| byte.is_ascii_digit())).then(|| text.parse().ok())?
        };
        match key {
            "all" => Some(Years::All),
            "dry" => Some(Years::Dry),
            "middling" => Some(Years::Middling),
            "wet" => Some(Years::Wet),
            _ => match key.split_once("..") {
                None => year(key).map(|only| Years::Span(only, only)),
                Some((first, last)) => {
                    let (first, last) = (year(first)?, year(last)?);
                    (first <= last).then_some(Years::Span(first, last))
                }
            },
        }
    }
}

/// A named setting.
#[derive(Clone, Debug, PartialEq)]
pub struct Setting {
    /// Its name.
    pub name: Text,
    /// What it stands for.
    pub text: Option<Text>,
    /// Where the dials stand.
    pub dials: Dials,
    /// Which years are looked at.
    pub years: Years,
}

/// A setting, unless it has errors, with everything that was found.
#[derive(Clone, Debug, PartialEq)]
pub struct SettingOutcome {
    /// The setting; only without errors.
    pub setting: Option<Setting>,
    /// Errors and warnings in the order of the file.
    pub problems: Vec<Problem>,
}

/// Reads the setting in `text`, the content of `file`, for a place that offers `plan`; [`DialPlan::WIDEST`] judges it
/// without a place.
pub fn read_setting(file: &Path, text: &str, plan: &DialPlan) -> SettingOutcome {
    let (sheet, table) = Sheet::parse(file, text);
    let setting = {
        let root = Section::root(&sheet, &table);
        Setting {
            name: need_names(&root, "name"),
            text: optional_names(&root, "text"),
            dials: dials(&root, plan),
            years: years(&root),
        }
    };
    let mut problems = sheet.problems.into_inner();
    problems.sort_by(|a, b| a.at.cmp(&b.at));
    let fine = problems.iter().all(|problem| problem.severity < Severity::Error);
    SettingOutcome { setting: fine.then_some(setting), problems }
}

fn dials(root: &Section<'_>, plan: &DialPlan) -> Dials {
    let mut section = root.section("dials");
    let mut dials = Dials::REST;
    for entry in section.free_entries() {
        let Some(dial) = Dial::from_key(&entry.key) else {
            section.sheet.tell(unknown_dial(section.key_at(entry), &entry.key));
            continue;
        };
        let range = match plan.offer(dial) {
            DialOffer::Open(range) => range,
            DialOffer::Hidden | DialOffer::Lacking => {
                // A drought from elsewhere may turn what this valley does not have; its other dials still say something.
                let problem = Problem::warning(section.key_at(entry), "problem-setting-dial-absent");
                section.sheet.tell(problem.with("dial", dial.key()));
                continue;
            }
        };
        let unit = super::unit_suffix::PLAIN[0];
        let value = section.checked_number(&entry.key, &entry.value, unit, Limits(range.least, range.most)).value;
        dials = dials.with(dial, value);
    }
    dials
}

fn years(root: &Section<'_>) -> Years {
    let Some(value) = root.get("years") else { return Years::All };
    let word = match &value.kind {
        Kind::Text(word) => word.clone(),
        Kind::Number(year) => year.to_string(),
        _ => String::new(),
    };
    Years::from_key(&word).unwrap_or_else(|| {
        let at: Location = root.value_at(value);
        root.sheet.tell(
            Problem::error(at, "problem-years")
                .with_nearest(&word, ["all", "dry", "middling", "wet"])
                .with("value", word),
        );
        Years::All
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn years_by_their_keys() {
        assert_eq!(Years::from_key("2012"), Some(Years::Span(2012, 2012)));
        assert_eq!(Years::from_key("1999..2003"), Some(Years::Span(1999, 2003)));
        for wrong in ["", "99", "2003..1999", "2003..", "driest", "+200"] {
            assert_eq!(Years::from_key(wrong), None, "{wrong}");
        }
    }

    #[test]
    fn a_setting_is_checked_line_by_line() {
        let text = "name = { en = \"Dry\", es = \"Seco\" }\nyears = \"dri\"\n[dials]\nwarming = 9\nwarmin = 1\n";
        let read = read_setting(Path::new("dry.toml"), text, &DialPlan::WIDEST);
        let told: Vec<_> =
            read.problems.iter().map(|problem| (problem.message, problem.at.line, problem.at.column)).collect();
        assert_eq!(told, [("problem-years", 2, 9), ("problem-number-range", 4, 11), ("problem-dial-unknown", 5, 1)]);
        assert_eq!(read.setting, None);
    }

    #[test]
    fn a_good_setting_sets_the_dials() {
        let text = "name = { en = \"Dry\", es = \"Seco\" }\n[dials]\nwarming = 2\nstarting_storage = 20\n";
        let read = read_setting(Path::new("dry.toml"), text, &DialPlan::WIDEST);
        let setting = read.setting.unwrap();
        let dials = Dials::REST.with(Dial::Warming, 2.0).with(Dial::StartingStorage, 20.0);
        assert_eq!((setting.dials, setting.years), (dials, Years::All));
        assert_eq!(setting.name.get("es-CL"), "Seco");
    }
}
