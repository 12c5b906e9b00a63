//! The recipe that `--recipe` names: built in, or a file.

use std::path::Path;

use super::Pattern;
use super::fault_words::refuse;
use super::write::Origin;
use crate::commands::failure::Failure;
use crate::commands::settings::{SettingText, read_text};
use crate::commands::snippets::{Texts, report};
use crate::generator::{Recipe, invented};
use crate::place::problem::{Location, Problem};
use crate::words::{Words, nearest};

/// A recipe by its name.
type BuiltIn = (&'static str, fn() -> Recipe);

/// The recipes that are part of the program.
const BUILT_IN: [BuiltIn; 2] = [("tresnubes", invented::tresnubes), ("south", invented::valle_del_sur)];

/// Finds and checks the recipe; a file of that name goes before what is built in.
pub(super) fn find(name: &Path, words: &Words) -> Result<Pattern, Failure> {
    let shown = name.display().to_string();
    let pattern = |recipe| Pattern { recipe, origin: Origin::Recipe(shown.clone()), fit: None, first_water_year: None };
    if name.is_file() {
        let recipe = parse(&read_text(name, words)?, words)?;
        return match recipe.check() {
            Ok(()) => Ok(pattern(recipe)),
            Err(faults) => Err(refuse(&faults, words)),
        };
    }
    if let Some((_, recipe)) = BUILT_IN.iter().find(|(key, _)| Path::new(key) == name) {
        return Ok(pattern(recipe()));
    }
    let known: Vec<&str> = BUILT_IN.iter().map(|(key, _)| *key).collect();
    let line = match nearest(&shown, known.iter().copied()) {
        Some(near) => {
            words.say("error-recipe-unknown-nearest", &[("recipe", shown.as_str().into()), ("nearest", near.into())])
        }
        None => {
            let arguments = [("recipe", shown.as_str().into()), ("recipes", known.join(", ").into())];
            words.say("error-recipe-unknown", &arguments)
        }
    };
    Err(Failure::input(line))
}

fn parse(file: &SettingText, words: &Words) -> Result<Recipe, Failure> {
    toml::from_str(&file.text).map_err(|error| {
        let at = match error.span() {
            Some(span) => Location::of_span(&file.file, &file.text, span),
            None => Location::whole_file(&file.file),
        };
        // The reader of TOML speaks English only; the name that it quotes is the same in every language.
        let problem = match error.message().split('`').nth(1) {
            Some(name) => Problem::error(at, "problem-recipe-key").with("key", name),
            None => Problem::error(at, "problem-recipe"),
        };
        let texts = [(file.file.to_string_lossy().into_owned(), file.text.clone())];
        Failure::input(report(&[problem], &mut Texts::given(&texts), words))
    })
}
