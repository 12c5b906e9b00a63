//! `place new`: the starter of a place in a folder, with the records that are at hand.

use std::path::{Path, PathBuf};

use clap::ArgMatches;

use super::ask::Answers;
use super::files::{MOST_RECORD_BYTES, name_of, read_bytes, refused};
use super::heights::{self, HeightOptions};
use super::skeleton::{Known, NewRecord, write};
use crate::commands::failure::Failure;
use crate::commands::output::{deliver, reason};
use crate::commands::snippets::{Texts, report};
use crate::commands::speech::Speech;
use crate::commands::usage::{mistake, unknown_choice};
use crate::place::preparing::{RecordKind, look_at};
use crate::place::problem::Severity;
use crate::place::{Source, read};
use crate::words::{System, Words};

/// What a gauge can measure.
pub(super) const MEASURES: [&str; 3] = ["natural", "computed_inflow", "below_diversions"];
const FILE: &str = "place.toml";

/// Writes the place: all of its files, or nothing.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let Some(folder) = matches.get_one::<PathBuf>("dir") else { return Ok(()) };
    let replace = matches.get_flag("replace");
    if folder.join(FILE).exists() && !replace {
        let path = folder.join(FILE).display().to_string();
        return Err(Failure::input(words.say("place-exists", &[("path", path.into())])));
    }
    if folder.exists() && !folder.is_dir() {
        let path = folder.display().to_string();
        return Err(Failure::input(words.say("place-not-folder", &[("path", path.into())])));
    }
    let mut answers = Answers::from_options(matches, words)?;
    let measures = measures(matches, words)?;
    let options = HeightOptions::read(matches, words)?;
    let grid = matches.get_one::<PathBuf>("grid");
    let curve = grid.map(|grid| options.curve(grid, words)).transpose()?;
    let mut records = Vec::new();
    let mut files: Vec<(String, Vec<u8>)> = Vec::new();
    let kinds = [
        ("weather", RecordKind::Weather),
        ("gauge", RecordKind::Gauge { measures }),
        ("snow", RecordKind::Snow),
        ("storage", RecordKind::Storage),
    ];
    for (option, kind) in kinds {
        let Some(path) = matches.get_one::<PathBuf>(option) else { continue };
        let (record, bytes) = record(path, kind, words)?;
        if record.file == FILE || files.iter().any(|(name, other)| *name == record.file && *other != bytes) {
            let name = record.file;
            return Err(Failure::input(words.say("place-file-twice", &[("file", name.into())])));
        }
        files.push((record.file.clone(), bytes));
        records.push(record);
    }
    answers.ask(matches.get_flag("ask"), words);
    let known =
        Known { answers: &answers, records: &records, curve: curve.as_ref().map(|curve| (curve, options.bands)) };
    files.push((FILE.to_owned(), write(&known, words).into_bytes()));
    store(folder, &files, replace, words)?;
    let mut lines = vec![words.say("place-made", &[("path", folder.join(FILE).display().to_string().into())])];
    if let Some(curve) = &curve {
        lines.extend(heights::say(curve, System::Metric, words));
    }
    lines.extend(still_open(folder, words));
    deliver(format!("{}\n", lines.join("\n")).as_bytes(), None, words)
}

/// What a gauge is said to measure.
pub(super) fn measures(matches: &ArgMatches, words: &Words) -> Result<String, Failure> {
    let asked = matches.get_one::<String>("measures").map_or(MEASURES[0], String::as_str);
    if MEASURES.contains(&asked) {
        return Ok(asked.to_owned());
    }
    Err(mistake(&unknown_choice("--measures", asked, &MEASURES, words), Some("place"), words))
}

fn record(path: &Path, kind: RecordKind, words: &Words) -> Result<(NewRecord, Vec<u8>), Failure> {
    let bytes = read_bytes(path, MOST_RECORD_BYTES, words)?;
    let peek = look_at(path, &bytes).map_err(|problems| refused(&problems, words))?;
    if !peek.plan.columns.iter().any(|column| kind.takes(column.measure)) {
        let arguments =
            [("path", path.display().to_string().into()), ("table", kind.table().trim_matches(['[', ']']).into())];
        return Err(Failure::Input(vec![
            words.say("place-no-column", &arguments),
            words.say("place-see-peek", &[("path", path.display().to_string().into())]),
        ]));
    }
    Ok((NewRecord { kind, file: name_of(path, words)?, peek }, bytes))
}

/// Puts every file into the folder. A new folder takes its name only when all are in it; in an old one nothing is
/// replaced unasked, and `place.toml`, which names the others, comes last.
fn store(folder: &Path, files: &[(String, Vec<u8>)], replace: bool, words: &Words) -> Result<(), Failure> {
    let unwritable = |error: &std::io::Error| {
        let path = folder.display().to_string();
        let line =
            words.say("error-file-unwritable", &[("path", path.into()), ("reason", reason(error, words).into())]);
        Failure::Input(vec![line, words.say("error-file-nothing-changed", &[])])
    };
    if folder.is_dir() {
        for (name, bytes) in files {
            let path = folder.join(name);
            let same = std::fs::read(&path).is_ok_and(|there| there == *bytes);
            if path.exists() && !same && !replace {
                let path = path.display().to_string();
                return Err(Failure::input(words.say("place-exists", &[("path", path.into())])));
            }
        }
        for (name, bytes) in files {
            deliver(bytes, Some(&folder.join(name)), words)?;
        }
        return Ok(());
    }
    let parent = folder.parent().filter(|parent| !parent.as_os_str().is_empty()).unwrap_or(Path::new("."));
    let mut builder = tempfile::Builder::new();
    builder.prefix(".deshielo-");
    let making = builder.tempdir_in(parent).map_err(|error| unwritable(&error))?;
    for (name, bytes) in files {
        deliver(bytes, Some(&making.path().join(name)), words)?;
    }
    open_to_others(making.path());
    std::fs::rename(making.path(), folder).map_err(|error| unwritable(&error))?;
    // It is the place now, and nothing to be cleared away.
    let _ = making.keep();
    Ok(())
}

/// A temporary folder is closed to everybody else; a place is as open as any new folder.
#[cfg(unix)]
fn open_to_others(folder: &Path) {
    use std::os::unix::fs::PermissionsExt;
    // Where this cannot be done the place is there all the same, for its maker.
    let _ = std::fs::set_permissions(folder, std::fs::Permissions::from_mode(0o755));
}

#[cfg(not(unix))]
fn open_to_others(_: &Path) {}

/// What `check` would say of the place.
pub(super) fn still_open(folder: &Path, words: &Words) -> Vec<String> {
    let problems = read(Source::Folder(folder)).problems;
    let errors = problems.iter().filter(|problem| problem.severity == Severity::Error).count();
    let path = || ("path", folder.display().to_string().into());
    if errors == 0 {
        return vec![words.say("place-ready", &[path()])];
    }
    vec![
        words.say("place-still-open", &[("n", errors.into())]),
        String::new(),
        report(&problems, &mut Texts::on_disk(), words),
        String::new(),
        words.say("place-then-check", &[path()]),
    ]
}
