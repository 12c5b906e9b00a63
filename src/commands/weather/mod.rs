//! `weather`: a long invented record, from a recipe or from the pattern of a place's own record.

mod fault_words;
mod options;
mod recipes;
mod station;
mod write;

use clap::ArgMatches;

use super::failure::Failure;
use super::output::{check_target, deliver};
use super::places;
use super::speech::Speech;
use super::spinner::Spinner;
use super::tell_standard_error;
use crate::generator::{FitReport, Generator, Recipe};
use options::{Options, first_day};
use write::Origin;

/// What the weather is made from.
struct Pattern {
    recipe: Recipe,
    origin: Origin,
    fit: Option<FitReport>,
    /// The first whole water year of the record; `None` for a recipe.
    first_water_year: Option<i32>,
}

/// Makes the weather that is asked for.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let options = Options::read(matches, words)?;
    check_target(options.out.as_deref(), words)?;
    check_target(options.recipe_out.as_deref(), words)?;
    let pattern = match &options.place {
        Some(place) => {
            let reading = words.say("progress-reading", &[("path", place.display().to_string().into())]);
            let _spinner = Spinner::start(reading);
            station::learn(&places::open(place, speech)?, words)?
        }
        None => recipes::find(&options.recipe, words)?,
    };
    if let Some(fit) = &pattern.fit {
        let lines: Vec<String> = fit.notes.iter().map(|note| fault_words::of_note(note, words)).collect();
        tell_standard_error(&lines);
    }
    let from = options.from.or(pattern.first_water_year).unwrap_or(options::USUAL_FIRST_YEAR);
    let csv = {
        let _spinner = Spinner::start(words.say("progress-running", &[]));
        let first = first_day(from, pattern.recipe.water_year_start_month);
        let past = first_day(from + options.years, pattern.recipe.water_year_start_month);
        let days = usize::try_from((past - first).num_days()).unwrap_or(0);
        let made = Generator::new(&pattern.recipe)
            .map_err(|faults| fault_words::refuse(&faults, words))?
            .generate(first, days, options.seed)
            .map_err(|error| fault_words::of_generator(&error, words))?;
        write::csv(&made, &pattern.recipe, &pattern.origin, options.seed, speech)
    };
    if let Some(path) = &options.recipe_out {
        let text = write::recipe(&pattern.recipe, speech);
        deliver(text.as_bytes(), Some(path), words)?;
    }
    deliver(csv.as_bytes(), options.out.as_deref(), words)?;
    if let Some(path) = &options.out {
        let path = path.display().to_string();
        let mut lines = vec![words.say("weather-made", &[("n", options.years.into()), ("path", path.into())])];
        lines.extend(write::about(&pattern.origin, options.seed, words));
        deliver(format!("{}\n", lines.join("\n")).as_bytes(), None, words)?;
    }
    Ok(())
}
