//! The options of `fit`.

use std::path::PathBuf;

use clap::ArgMatches;

use super::refuse;
use crate::commands::failure::Failure;
use crate::commands::places;
use crate::commands::tell::years::read_years;
use crate::commands::usage::unknown_choice;
use crate::fit::{Objective, PrecipitationCorrection, Settings};
use crate::place::Years;
use crate::words::Words;

/// What can be made large, by the name that the command line gives it.
pub(super) const OBJECTIVES: [(&str, Objective); 4] = [
    ("kge", Objective::KlingGupta),
    ("nse", Objective::NashSutcliffe),
    ("nse-of-roots", Objective::NashSutcliffeOfRoots),
    ("kge-with-snow", Objective::KlingGuptaWithSnow),
];
const CORRECTIONS: [(&str, PrecipitationCorrection); 4] = [
    ("factor", PrecipitationCorrection::Factor),
    ("rain-and-snow", PrecipitationCorrection::RainAndSnow),
    ("snow", PrecipitationCorrection::SnowCatch),
    ("gradient", PrecipitationCorrection::Gradient),
];
/// Most runs of a start and most starts: more would take days.
const MOST_RUNS: u64 = 1_000_000;
const MOST_STARTS: u64 = 1000;

/// What is asked for.
pub(super) struct Request {
    /// The place.
    pub place: PathBuf,
    /// How to fit.
    pub settings: Settings,
    /// The file to write.
    pub out: Option<PathBuf>,
    /// The folder to write it into.
    pub into: Option<PathBuf>,
}

impl Request {
    /// Reads the options.
    pub fn read(matches: &ArgMatches, words: &Words) -> Result<Self, Failure> {
        let text = |name: &str| matches.get_one::<String>(name).map(String::as_str);
        let path = |name: &str| matches.get_one::<PathBuf>(name).cloned();
        let usual = Settings::default();
        let number = |name: &str, low: u64, high: u64, usual: u64| match text(name) {
            None => Ok(usual),
            Some(text) => text.parse().ok().filter(|number| (low..=high).contains(number)).ok_or_else(|| {
                let bound = |number: u64| number.to_string().into();
                let arguments = [("option", format!("--{name}").into()), ("low", bound(low)), ("high", bound(high))];
                refuse(&words.say("error-option-number", &arguments), words)
            }),
        };
        let years = match text("years") {
            None => None,
            Some(text) => match read_years(text, "fit", words)? {
                Years::All => None,
                Years::Span(first, last) => Some((first, last)),
                Years::Dry | Years::Middling | Years::Wet => {
                    return Err(refuse(&words.say("error-fit-years", &[("text", text.into())]), words));
                }
            },
        };
        let settings = Settings {
            seed: number("seed", 0, u64::from(u32::MAX), usual.seed)?,
            starts: number("starts", 1, MOST_STARTS, usual.starts as u64)? as usize,
            runs_per_start: number("runs", 1, MOST_RUNS, usual.runs_per_start as u64)? as usize,
            objective: choice("objective", text("objective"), &OBJECTIVES, words)?,
            correction: choice("correction", text("correction"), &CORRECTIONS, words)?,
            warm_up_years: number("warm-up", 0, 50, usual.warm_up_years as u64)? as usize,
            years,
            split: !matches.get_flag("no-test"),
            sets: number("sets", crate::fit::ensemble::FEWEST_SETS as u64, 500, usual.sets as u64)? as usize,
            ..usual
        };
        Ok(Self {
            place: path("place").unwrap_or_else(|| places::USUAL.into()),
            settings,
            out: path("out"),
            into: path("into"),
        })
    }
}

/// The first is the usual one.
fn choice<T: Copy>(
    name: &str,
    asked: Option<&str>,
    choices: &[(&'static str, T)],
    words: &Words,
) -> Result<T, Failure> {
    let Some(asked) = asked else { return Ok(choices[0].1) };
    choices.iter().find(|(known, _)| *known == asked).map(|(_, value)| *value).ok_or_else(|| {
        let known: Vec<&str> = choices.iter().map(|(known, _)| *known).collect();
        refuse(&unknown_choice(&format!("--{name}"), asked, &known, words), words)
    })
}
