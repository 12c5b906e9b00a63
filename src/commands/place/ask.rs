//! Answers about a new place: from options, and from questions where they are asked.

use std::io::{BufRead, IsTerminal, Write};

use clap::ArgMatches;

use crate::commands::failure::Failure;
use crate::commands::usage::{mistake, unknown_choice};
use crate::words::{Words, nearest};

/// Longest answer that is taken, letters.
const MOST_LETTERS: usize = 400;
const RULES: [&str; 3] = ["seniority", "proportional", "rotation"];

/// What is known of a new place so far; what is not stays to be filled in.
#[derive(Debug, Default)]
pub(super) struct Answers {
    /// Name in English, and in Spanish where only one is known.
    pub name: Option<String>,
    /// Name in Spanish.
    pub name_es: Option<String>,
    /// Language and country.
    pub region: Option<String>,
    /// Degrees, south with a minus sign.
    pub latitude_deg: Option<f64>,
    /// Height of the station with its unit, `m` or `ft`.
    pub station: Option<(f64, &'static str)>,
    /// Rule of sharing.
    pub rule: Option<String>,
}

impl Answers {
    /// Takes what the options say.
    pub fn from_options(matches: &ArgMatches, words: &Words) -> Result<Self, Failure> {
        let text = |name: &str| matches.get_one::<String>(name).map(|text| text.trim().to_owned());
        let wrong = |option: &str, example: &str| {
            let arguments = [("option", option.into()), ("example", example.into())];
            mistake(&words.say("place-option-wrong", &arguments), Some("place"), words)
        };
        let latitude_deg = match text("latitude") {
            None => None,
            Some(text) => Some(latitude(&text).ok_or_else(|| wrong("--latitude", "-33.4"))?),
        };
        let station = match text("station") {
            None => None,
            Some(text) => Some(height(&text).ok_or_else(|| wrong("--station", "1600m"))?),
        };
        let rule = match text("sharing") {
            Some(rule) if !RULES.contains(&rule.as_str()) => {
                return Err(mistake(&unknown_choice("--sharing", &rule, &RULES, words), Some("place"), words));
            }
            rule => rule,
        };
        let region = match text("region") {
            Some(region) if !is_region(&region) => return Err(wrong("--region", "es-CL")),
            region => region,
        };
        let name = text("name").filter(|name| !name.is_empty());
        Ok(Self { name, name_es: text("name-es").filter(|name| !name.is_empty()), region, latitude_deg, station, rule })
    }

    /// Whether the place is known to lie in the south.
    pub fn is_southern(&self) -> bool {
        self.latitude_deg.is_some_and(|latitude| latitude < 0.0)
    }

    /// Asks for what is not known yet, if a person sits there or `always`; an empty answer leaves it open.
    pub fn ask(&mut self, always: bool, words: &Words) {
        if !always && !(std::io::stdin().is_terminal() && std::io::stderr().is_terminal()) {
            return;
        }
        let mut lines = std::io::stdin().lock().lines();
        say(&words.say("ask-intro", &[]));
        if self.name.is_none() {
            self.name = question("ask-name", &mut lines, words, |text| Some(text.to_owned()));
        }
        if self.region.is_none() {
            self.region = question("ask-region", &mut lines, words, |text| is_region(text).then(|| text.to_owned()));
        }
        if self.latitude_deg.is_none() {
            self.latitude_deg = question("ask-latitude", &mut lines, words, latitude);
        }
        if self.station.is_none() {
            self.station = question("ask-station", &mut lines, words, height);
        }
        if self.rule.is_none() {
            self.rule = question("ask-rule", &mut lines, words, |text| {
                nearest(text, RULES).filter(|_| !text.is_empty()).map(str::to_owned)
            });
        }
    }
}

/// Asks until an answer can be read, or is empty, or nobody answers any more.
fn question<T>(
    id: &str,
    lines: &mut dyn Iterator<Item = std::io::Result<String>>,
    words: &Words,
    read: impl Fn(&str) -> Option<T>,
) -> Option<T> {
    loop {
        say(&words.say(id, &[]));
        let Some(Ok(line)) = lines.next() else { return None };
        let text: String = line.trim().chars().take(MOST_LETTERS).collect();
        if text.is_empty() {
            return None;
        }
        if let Some(answer) = read(&text) {
            return Some(answer);
        }
        say(&words.say("ask-again", &[("text", text.into())]));
    }
}

/// Nothing can be asked of anybody where standard error is gone.
fn say(line: &str) {
    let _ = writeln!(std::io::stderr().lock(), "{line}");
}

fn latitude(text: &str) -> Option<f64> {
    let number: f64 = text.replace(['−', '–'], "-").replace(',', ".").parse().ok()?;
    (number.is_finite() && number.abs() <= 66.0 && number.abs() >= 0.5).then_some(number)
}

/// A height with its unit behind it; metres where there is none.
fn height(text: &str) -> Option<(f64, &'static str)> {
    let end = text.find(|letter: char| letter.is_alphabetic()).unwrap_or(text.len());
    let (number, unit) = text.split_at(end);
    let unit = match unit.trim().to_lowercase().as_str() {
        "" | "m" | "metros" | "meters" => "m",
        "ft" | "feet" | "pies" => "ft",
        _ => return None,
    };
    let number: f64 = number.trim().replace(',', ".").parse().ok()?;
    (number.is_finite() && (-1_700.0..=30_000.0).contains(&number)).then_some((number, unit))
}

/// Language and country, as in `es-CL`.
fn is_region(text: &str) -> bool {
    let Some((language, country)) = text.split_once('-') else { return false };
    let small = |text: &str| matches!(text.len(), 2 | 3) && text.bytes().all(|byte| byte.is_ascii_lowercase());
    let large = |text: &str| text.len() == 2 && text.bytes().all(|byte| byte.is_ascii_uppercase());
    small(language) && (large(country) || (country.len() == 3 && country.bytes().all(|byte| byte.is_ascii_digit())))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn answers_of_people_are_understood() {
        assert_eq!(latitude("−33,4"), Some(-33.4));
        assert_eq!(latitude("95"), None);
        assert_eq!(height("5250 ft"), Some((5250.0, "ft")));
        assert_eq!(height("1600"), Some((1600.0, "m")));
        assert_eq!(height("1600 km"), None);
        assert!(is_region("es-CL") && is_region("es-419") && !is_region("es") && !is_region("ES-cl"));
    }
}
