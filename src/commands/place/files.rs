//! Files that a preparer names: read whole up to a bound, and named in the place.

use std::io::Read;
use std::path::Path;

use crate::commands::failure::Failure;
use crate::commands::output::reason;
use crate::commands::snippets::{Texts, report};
use crate::place::problem::Problem;
use crate::words::Words;

/// Largest record, bytes: what a place reads.
pub(super) const MOST_RECORD_BYTES: u64 = 64 << 20;
/// Largest grid of heights, bytes.
pub(super) const MOST_GRID_BYTES: u64 = 512 << 20;

/// The bytes of a file; refused beyond `most`.
pub(super) fn read_bytes(path: &Path, most: u64, words: &Words) -> Result<Vec<u8>, Failure> {
    let unreadable = |reason: String| {
        let arguments = [("path", path.display().to_string().into()), ("reason", reason.into())];
        Failure::input(words.say("error-file-unreadable", &arguments))
    };
    let mut bytes = Vec::new();
    std::fs::File::open(path)
        .and_then(|file| {
            if file.metadata()?.is_dir() {
                return Err(std::io::ErrorKind::IsADirectory.into());
            }
            file.take(most + 1).read_to_end(&mut bytes)
        })
        .map_err(|error| unreadable(reason(&error, words)))?;
    if bytes.len() as u64 > most {
        return Err(unreadable(words.say("reason-too-large", &[])));
    }
    Ok(bytes)
}

/// The name that a file gets in the place: its own.
pub(super) fn name_of(path: &Path, words: &Words) -> Result<String, Failure> {
    let name = path.file_name().and_then(|name| name.to_str()).filter(|name| !name.contains('\\'));
    name.map(str::to_owned).ok_or_else(|| {
        let path = path.display().to_string();
        Failure::input(words.say("place-file-name", &[("path", path.into())]))
    })
}

/// Problems at their lines, as what ends the command.
pub(super) fn refused(problems: &[Problem], words: &Words) -> Failure {
    Failure::Input(vec![report(problems, &mut Texts::on_disk(), words)])
}
