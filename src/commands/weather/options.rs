//! The options of `weather`, checked.

use std::path::PathBuf;
use std::str::FromStr;

use chrono::NaiveDate;
use clap::ArgMatches;

use crate::commands::failure::Failure;
use crate::commands::usage::mistake;
use crate::words::Words;

/// The first water year where nobody says.
pub(super) const USUAL_FIRST_YEAR: i32 = 1981;
/// Years that are made where nobody says; what a demo place needs.
const USUAL_YEARS: i32 = 40;
/// Most years: a millennium of days is a file of some 20 MB.
const MOST_YEARS: i32 = 1000;
/// Years that records can write: four digits, with room for the length.
const FIRST_YEARS: (i32, i32) = (1000, 8999);
/// The recipe where neither a place nor a recipe is named.
const USUAL_RECIPE: &str = "tresnubes";

/// What is asked for.
pub(super) struct Options {
    /// The place whose record is to be learnt from.
    pub place: Option<PathBuf>,
    /// The recipe, where there is no place.
    pub recipe: PathBuf,
    /// How many water years to make.
    pub years: i32,
    /// The first of them, where it was given.
    pub from: Option<i32>,
    /// Where the random weather starts.
    pub seed: u64,
    /// Where the record goes.
    pub out: Option<PathBuf>,
    /// Where the recipe goes.
    pub recipe_out: Option<PathBuf>,
}

impl Options {
    /// Reads the options.
    pub fn read(matches: &ArgMatches, words: &Words) -> Result<Self, Failure> {
        let path = |name: &str| matches.get_one::<PathBuf>(name).cloned();
        let (place, recipe) = (path("place"), path("recipe"));
        if place.is_some() && recipe.is_some() {
            let line = words.say("error-place-and-recipe", &[("option", "--recipe".into())]);
            return Err(mistake(&line, Some("weather"), words));
        }
        let years = whole(matches, "years", (1, MOST_YEARS), words)?.unwrap_or(USUAL_YEARS);
        Ok(Options {
            place,
            recipe: recipe.unwrap_or_else(|| USUAL_RECIPE.into()),
            years,
            from: whole(matches, "from", FIRST_YEARS, words)?,
            seed: whole(matches, "seed", (0, u64::MAX), words)?.unwrap_or(1),
            out: path("out"),
            recipe_out: path("recipe-out"),
        })
    }
}

/// A whole number between two others.
fn whole<T: FromStr + PartialOrd + ToString + Copy>(
    matches: &ArgMatches,
    name: &str,
    within: (T, T),
    words: &Words,
) -> Result<Option<T>, Failure> {
    let Some(text) = matches.get_one::<String>(name) else { return Ok(None) };
    let number = text.parse::<T>().ok().filter(|number| within.0 <= *number && *number <= within.1);
    number.map(Some).ok_or_else(|| {
        let [low, high] = [within.0, within.1].map(|end| end.to_string());
        let option = format!("--{name}");
        let arguments = [("option", option.into()), ("low", low.into()), ("high", high.into())];
        mistake(&words.say("error-option-number", &arguments), Some("weather"), words)
    })
}

/// The first day of a water year, named for the calendar year in which it ends.
pub(super) fn first_day(water_year: i32, start_month: u32) -> NaiveDate {
    let year = if start_month > 1 { water_year - 1 } else { water_year };
    NaiveDate::from_ymd_opt(year, start_month.clamp(1, 12), 1).unwrap_or_default()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_water_year_starts_in_the_year_before_its_name() {
        assert_eq!(first_day(1981, 10).to_string(), "1980-10-01");
        assert_eq!(first_day(1981, 1).to_string(), "1981-01-01");
    }
}
