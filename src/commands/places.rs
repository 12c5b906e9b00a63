//! Opening the place that a command line names: a folder, or one built into the program.

use std::path::{Path, PathBuf};

use super::built_in;
use super::failure::Failure;
use super::fitted::{self, PlaceFit};
use super::snippets::{Texts, report};
use super::speech::Speech;
use crate::place::problem::Severity;
use crate::place::{Outcome, Place, Source, read};

/// What is read where no place is named.
pub(super) const USUAL: &str = "demo";

/// What a command line may name as a place.
pub(super) enum Named {
    /// A folder with a `place.toml`.
    Folder(PathBuf),
    /// One that is part of the program.
    BuiltIn(built_in::BuiltInPlace),
}

impl Named {
    /// Finds it; a folder of that name goes before what is built in.
    pub fn find(name: &Path, speech: &Speech) -> Result<Self, Failure> {
        if name.join("place.toml").is_file() {
            return Ok(Named::Folder(name.to_owned()));
        }
        if name.file_name().is_some_and(|file| file == "place.toml") && name.is_file() {
            let parent = name.parent().filter(|parent| !parent.as_os_str().is_empty());
            return Ok(Named::Folder(parent.unwrap_or(Path::new(".")).to_owned()));
        }
        let built_in = name.to_str().and_then(built_in::place);
        built_in.map(Named::BuiltIn).ok_or_else(|| {
            let path = name.display().to_string();
            Failure::input(speech.words.say("error-place-not-found", &[("path", path.into())]))
        })
    }

    /// Where its files are.
    pub fn source(&self) -> Source<'_> {
        match self {
            Named::Folder(folder) => Source::Folder(folder),
            Named::BuiltIn(place) => Source::Embedded(place.files),
        }
    }

    /// The texts behind its problems.
    pub fn texts(&self) -> Texts<'_> {
        match self {
            Named::Folder(_) => Texts::on_disk(),
            Named::BuiltIn(place) => Texts::built_in(place.files),
        }
    }

    /// Its name as it was asked for.
    pub fn shown(&self) -> String {
        match self {
            Named::Folder(folder) => folder.display().to_string(),
            Named::BuiltIn(place) => place.name.to_owned(),
        }
    }
}

/// A place for a run, and the fit that it runs with.
pub(super) struct Opened {
    /// The place; where there is a fit, its valley is the fitted one.
    pub place: Place,
    /// The fit beside it.
    pub fit: Option<PlaceFit>,
}

/// Opens the place for a run, with the fit that stands beside it; see [`open_fitted`].
pub(super) fn open(name: &Path, speech: &Speech) -> Result<Place, Failure> {
    open_fitted(name, speech).map(|opened| opened.place)
}

/// Opens the place with its fit. A fit that cannot be used is refused, one that is stale is used and told.
pub(super) fn open_fitted(name: &Path, speech: &Speech) -> Result<Opened, Failure> {
    let mut place = open_unfitted(name, speech)?;
    let (fit, problems) = fitted::look(&place);
    let words = &speech.words;
    if !problems.is_empty() {
        let told = report(&problems, &mut Texts::on_disk(), words);
        if problems.iter().any(|problem| problem.severity == Severity::Error) {
            return Err(Failure::Input(vec![told]));
        }
        super::tell_standard_error(&[told]);
    }
    if let Some(fitted) = fit.as_ref().and_then(|fit| fit.sets.first()) {
        place.valley = fitted.clone();
    }
    Ok(Opened { place, fit })
}

/// Opens the place as it is written: with mistakes it is refused and all of them are told; notes are only counted.
pub(super) fn open_unfitted(name: &Path, speech: &Speech) -> Result<Place, Failure> {
    let named = Named::find(name, speech)?;
    let Outcome { place, problems } = read(named.source());
    let words = &speech.words;
    let path = named.shown();
    let Some(place) = place else {
        let mut lines = vec![report(&problems, &mut named.texts(), words), String::new()];
        lines.push(words.say("error-place-has-problems", &[("path", path.into())]));
        return Err(Failure::Input(lines));
    };
    let notes = problems.iter().filter(|problem| problem.severity == Severity::Warning).count();
    if notes > 0 {
        let line = words.say("tell-place-notes", &[("n", notes.into()), ("path", path.into())]);
        super::tell_standard_error(&[line]);
    }
    Ok(place)
}
