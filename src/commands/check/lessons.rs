//! Lessons in `check`: read for a place and held against its water.

use std::path::Path;

use crate::commands::failure::Failure;
use crate::commands::places::{Named, USUAL};
use crate::commands::settings::SettingText;
use crate::commands::speech::Speech;
use crate::lesson::{Waters, check_lesson, lessons};
use crate::place::problem::Problem;
use crate::place::read;

/// Whether a text is a lesson and no setting: only lessons have steps.
pub(in crate::commands) fn is_lesson(text: &str) -> bool {
    text.lines().any(|line| line.trim_start().starts_with("[[step"))
}

/// The lesson of this name that is part of the program.
pub(in crate::commands) fn built_in(name: &str) -> Option<SettingText> {
    let (_, text) = lessons().iter().find(|(known, _)| *known == name)?;
    Some(SettingText { file: format!("{name}.toml").into(), text: (*text).to_owned() })
}

/// Everything that is wrong with the lesson on this place; the demo place where none is named.
pub(super) fn problems(lesson: &SettingText, place: Option<&Path>, speech: &Speech) -> Result<Vec<Problem>, Failure> {
    let words = &speech.words;
    let named = Named::find(place.unwrap_or(Path::new(USUAL)), speech)?;
    let Some(place) = read(named.source()).place else {
        let arguments = [("path", lesson.file.display().to_string().into()), ("place", named.shown().into())];
        return Err(Failure::input(words.say("lesson-check-no-place", &arguments)));
    };
    Waters::new(&place)
        .and_then(|mut waters| check_lesson(&lesson.file, &lesson.text, &mut waters))
        .map(|outcome| outcome.problems)
        .map_err(|fault| Failure::input(words.say("error-river-fault", &[("value", fault.value.into())])))
}
