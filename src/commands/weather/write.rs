//! Writing an invented record and its recipe, with where they come from on top.

use crate::commands::speech::Speech;
use crate::generator::{GeneratorDay, Recipe};
use crate::place::Text;
use crate::words::Words;

/// Where a pattern comes from.
pub(super) enum Origin {
    /// A recipe of this name.
    Recipe(String),
    /// The record of a place.
    Place {
        /// The place.
        name: Text,
        /// Whole water years of its record.
        full_years: usize,
    },
}

/// What people should know of an invented record, line by line.
pub(super) fn about(origin: &Origin, seed: u64, words: &Words) -> Vec<String> {
    let mut lines = vec![words.say("weather-invented", &[])];
    lines.push(match origin {
        Origin::Recipe(name) => words.say("weather-from-recipe", &[("recipe", name.as_str().into())]),
        Origin::Place { name, full_years } => {
            let name = name.get(words.tag()).to_owned();
            words.say("weather-fitted-to", &[("place", name.into()), ("n", (*full_years).into())])
        }
    });
    // A seed is a name: no thousands mark.
    lines.push(words.say("weather-from-seed", &[("seed", seed.to_string().into())]));
    lines
}

/// The record as CSV. Its head says in both languages that it is invented: files travel further than people.
pub(super) fn csv(days: &[GeneratorDay], recipe: &Recipe, origin: &Origin, seed: u64, speech: &Speech) -> String {
    let mut text = String::new();
    for language in ["en", "es"] {
        let words = speech.in_language(language);
        let mut lines = about(origin, seed, &words);
        lines.push(words.say("weather-columns", &[]));
        for line in lines {
            text.push_str(&format!("# {line}\n"));
        }
    }
    let optional: [(&str, usize, Optional); 3] = [
        ("solar_mj_m2", 2, |day| day.solar_mj_m2),
        ("relative_humidity_percent", 1, |day| day.relative_humidity_percent),
        ("wind_2m_ms", 1, |day| day.wind_2m_ms),
    ];
    let there = optional.map(|(_, _, read)| days.iter().any(|day| read(day).is_some()));
    text.push_str("date,tmin_c,tmax_c,precipitation_mm");
    for ((name, ..), there) in optional.iter().zip(there) {
        if there {
            text.push(',');
            text.push_str(name);
        }
    }
    text.push('\n');
    let temperature = decimals_of(recipe.temperature_step_c, recipe.round_as_station);
    let depth = decimals_of(recipe.depth_step_mm, recipe.round_as_station);
    for day in days {
        text.push_str(&day.date.to_string());
        for (value, decimals) in [(day.tmin_c, temperature), (day.tmax_c, temperature), (day.precipitation_mm, depth)] {
            text.push(',');
            text.push_str(&fixed(value, decimals));
        }
        for ((_, decimals, read), there) in optional.iter().zip(there) {
            if there {
                text.push(',');
                text.push_str(&read(day).map(|value| fixed(value, *decimals)).unwrap_or_default());
            }
        }
        text.push('\n');
    }
    text
}

type Optional = fn(&GeneratorDay) -> Option<f64>;

/// Decimals that a step of the instrument needs; three where days are not rounded to it.
fn decimals_of(step: f64, rounded: bool) -> usize {
    let needed = (0..=3).find(|decimals| {
        let shown = format!("{step:.decimals$}");
        shown.parse::<f64>().is_ok_and(|read| (read - step).abs() < 1e-9)
    });
    needed.filter(|_| rounded).unwrap_or(3)
}

/// A number with that many decimals; never −0.
fn fixed(value: f64, decimals: usize) -> String {
    let text = format!("{value:.decimals$}");
    let is_zero = text.bytes().all(|byte| matches!(byte, b'-' | b'0' | b'.'));
    if is_zero { text.trim_start_matches('-').to_owned() } else { text }
}

/// The recipe as a file that `--recipe` reads.
pub(super) fn recipe(recipe: &Recipe, speech: &Speech) -> String {
    let mut text = String::new();
    for language in ["en", "es"] {
        text.push_str(&format!("# {}\n", speech.in_language(language).say("weather-recipe-head", &[])));
    }
    // Numbers, lists and tables always have a TOML form.
    text.push_str(&toml::to_string_pretty(recipe).unwrap_or_default());
    text
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn numbers_have_the_decimals_of_the_instrument() {
        assert_eq!([0.1, 0.2, 0.25, 1.0, 0.254].map(|step| decimals_of(step, true)), [1, 1, 2, 0, 3]);
        assert_eq!(decimals_of(0.1, false), 3);
        assert_eq!((fixed(-0.04, 1), fixed(-0.06, 1)), ("0.0".to_owned(), "-0.1".to_owned()));
    }
}
