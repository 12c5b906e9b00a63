//! The fit that stands beside a place: read, held against the place as it is today, and put to use.

use std::path::Path;

use super::measured::checksum;
use crate::fit::{FitFile, FitFileError};
use crate::place::Place;
use crate::place::problem::{Location, Problem};
use crate::water::valley::Valley;

/// The file beside `place.toml`.
pub(super) const FIT_FILE: &str = "fit.toml";
/// No fit is larger than this, bytes.
const MOST_BYTES: u64 = 4 << 20;

/// A fit in use.
pub(super) struct PlaceFit {
    /// What is in its file.
    pub file: FitFile,
    /// The place with every set of the ensemble, the fitted one first.
    pub sets: Vec<Valley>,
    /// The place as it stands in `place.toml`.
    pub before: Valley,
    /// Whether the records or the land are no longer those that it was fitted to.
    pub stale: bool,
}

/// The fit beside a place, and what is wrong with it: warnings where it is stale, an error where it cannot be used.
pub(super) fn look(place: &Place) -> (Option<PlaceFit>, Vec<Problem>) {
    let Some(path) = place.folder.as_ref().map(|folder| folder.join(FIT_FILE)).filter(|path| path.exists()) else {
        return (None, Vec::new());
    };
    let text = match read_small(&path) {
        Ok(text) => text,
        Err(message) => return (None, vec![Problem::error(Location::whole_file(path), message)]),
    };
    let file = match FitFile::read(&text) {
        Ok(file) => file,
        Err(error) => return (None, vec![problem(&path, &text, error)]),
    };
    let (Ok(fitted), Ok(mut sets)) = (file.apply(&place.valley), file.apply_sets(&place.valley)) else {
        return (None, vec![Problem::error(Location::whole_file(path), "problem-fit-unreadable")]);
    };
    if sets.first() != Some(&fitted) {
        sets.insert(0, fitted);
    }
    let mut problems = Vec::new();
    if file.is_stale(&checksum(place)) {
        problems.push(Problem::warning(Location::whole_file(&path), "problem-fit-old-records"));
    }
    if file.is_of_another_land(&place.valley) {
        problems.push(Problem::warning(Location::whole_file(&path), "problem-fit-old-land"));
    }
    let stale = !problems.is_empty();
    (Some(PlaceFit { file, sets, before: place.valley.clone(), stale }), problems)
}

fn read_small(path: &Path) -> Result<String, &'static str> {
    let about = std::fs::metadata(path).map_err(|_| "problem-file-unreadable-here")?;
    if !about.is_file() || about.len() > MOST_BYTES {
        return Err("problem-fit-unreadable");
    }
    let bytes = std::fs::read(path).map_err(|_| "problem-file-unreadable-here")?;
    String::from_utf8(bytes).map_err(|_| "problem-fit-unreadable")
}

fn problem(path: &Path, text: &str, error: FitFileError) -> Problem {
    let whole = || Location::whole_file(path);
    match error {
        FitFileError::Unreadable { span, .. } => {
            let at = span.map_or_else(whole, |span| Location::of_span(path, text, span));
            Problem::error(at, "problem-fit-unreadable")
        }
        FitFileError::WrongParameter { key } => Problem::error(whole(), "problem-fit-parameter").with("key", key),
        FitFileError::OutOfBounds { key, value, .. } => {
            Problem::error(whole(), "problem-fit-bounds").with("key", key).with("value", value)
        }
        FitFileError::WrongCount { found, needed, .. } => {
            Problem::error(whole(), "problem-fit-count").with("found", found).with("needed", needed)
        }
    }
}
