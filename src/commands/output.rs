//! Where an answer goes: standard output, or a file that is whole or not there at all.

use std::fs::{self, File};
use std::io::{self, ErrorKind, Write};
use std::path::{Path, PathBuf};

use super::failure::Failure;
use crate::words::Words;

/// Writes `answer` to `out`, or to standard output where that is `None`.
pub(super) fn deliver(answer: &[u8], out: Option<&Path>, words: &Words) -> Result<(), Failure> {
    match out {
        None => print(answer, words),
        Some(path) => write_whole(answer, path).map_err(|error| unwritable(path, &error, words)),
    }
}

/// Refuses a target that cannot be a file before any long work is done.
pub(super) fn check_target(out: Option<&Path>, words: &Words) -> Result<(), Failure> {
    match out {
        Some(path) if path.is_dir() => {
            let path = path.display().to_string();
            Err(Failure::input(words.say("error-out-is-folder", &[("path", path.into())])))
        }
        _ => Ok(()),
    }
}

fn print(answer: &[u8], words: &Words) -> Result<(), Failure> {
    let mut out = io::stdout().lock();
    match out.write_all(answer).and_then(|()| out.flush()) {
        Ok(()) => Ok(()),
        Err(error) if error.kind() == ErrorKind::BrokenPipe => Err(Failure::ReaderGone),
        Err(error) => Err(Failure::input(words.say("error-output", &[("reason", reason(&error, words).into())]))),
    }
}

/// A new file beside the old one takes its name only when every byte is on the disk.
fn write_whole(answer: &[u8], path: &Path) -> io::Result<()> {
    // A link stays a link: what it points at is replaced.
    let target = fs::canonicalize(path).unwrap_or_else(|_| path.to_owned());
    if let Ok(about) = fs::metadata(&target) {
        if !about.is_file() {
            // A device or a pipe cannot be replaced; it takes the bytes as they come.
            return fs::OpenOptions::new().write(true).open(&target)?.write_all(answer);
        }
        if about.permissions().readonly() {
            return Err(ErrorKind::PermissionDenied.into());
        }
    }
    let folder = folder_of(&target);
    let mut builder = tempfile::Builder::new();
    builder.prefix(".deshielo-");
    let mode = fs::metadata(&target).map(|about| about.permissions()).ok().or_else(usual_permissions);
    if let Some(mode) = mode {
        builder.permissions(mode);
    }
    let mut file = builder.tempfile_in(&folder)?;
    file.write_all(answer)?;
    file.as_file().sync_all()?;
    file.persist(&target).map_err(|error| error.error)?;
    // The name is on the disk only when the folder is; not every system can do that.
    let _ = File::open(&folder).and_then(|folder| folder.sync_all());
    Ok(())
}

fn folder_of(path: &Path) -> PathBuf {
    match path.parent() {
        Some(parent) if !parent.as_os_str().is_empty() => parent.to_owned(),
        _ => PathBuf::from("."),
    }
}

/// What any new file gets, less what the user's mask takes away; a temporary file would be closed to everybody else.
#[cfg(unix)]
fn usual_permissions() -> Option<fs::Permissions> {
    use std::os::unix::fs::PermissionsExt;
    Some(fs::Permissions::from_mode(0o666))
}

#[cfg(not(unix))]
fn usual_permissions() -> Option<fs::Permissions> {
    None
}

fn unwritable(path: &Path, error: &io::Error, words: &Words) -> Failure {
    let shown = path.display().to_string();
    let line = if is_full(error) {
        words.say("error-disk-full", &[("path", shown.into())])
    } else {
        let reason = reason(error, words);
        words.say("error-file-unwritable", &[("path", shown.into()), ("reason", reason.into())])
    };
    Failure::Input(vec![line, words.say("error-file-nothing-changed", &[])])
}

fn is_full(error: &io::Error) -> bool {
    matches!(error.kind(), ErrorKind::StorageFull | ErrorKind::QuotaExceeded | ErrorKind::FileTooLarge)
}

/// The reason in the reader's language where we know it; the system's own words otherwise.
pub(super) fn reason(error: &io::Error, words: &Words) -> String {
    let id = match error.kind() {
        ErrorKind::NotFound => "reason-not-found",
        ErrorKind::PermissionDenied => "reason-not-allowed",
        ErrorKind::ReadOnlyFilesystem => "reason-read-only",
        ErrorKind::IsADirectory => "reason-is-folder",
        ErrorKind::NotADirectory => "reason-not-folder",
        ErrorKind::InvalidData => "reason-not-text",
        _ if is_full(error) => "reason-full",
        _ => return words.say("reason-other", &[("reason", error.to_string().into())]),
    };
    words.say(id, &[])
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_file_is_replaced_whole_and_leaves_nothing_beside_it() {
        let folder = tempfile::tempdir().unwrap();
        let path = folder.path().join("answer.json");
        write_whole(b"one", &path).unwrap();
        write_whole(b"two", &path).unwrap();
        assert_eq!(fs::read(&path).unwrap(), b"two");
        assert_eq!(fs::read_dir(folder.path()).unwrap().count(), 1);
    }

    #[cfg(unix)]
    #[test]
    fn a_link_stays_a_link() {
        let folder = tempfile::tempdir().unwrap();
        let (real, link) = (folder.path().join("real.csv"), folder.path().join("link.csv"));
        fs::write(&real, "old").unwrap();
        std::os::unix::fs::symlink(&real, &link).unwrap();
        write_whole(b"new", &link).unwrap();
        assert_eq!(fs::read(&real).unwrap(), b"new");
        assert!(fs::symlink_metadata(&link).unwrap().is_symlink());
    }
}
