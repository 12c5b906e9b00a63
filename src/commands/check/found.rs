//! What was found in one path.

use std::ffi::OsStr;
use std::path::Path;

use super::lessons;
use crate::board::file::{is_board_file, read_board};
use crate::commands::built_in;
use crate::commands::failure::Failure;
use crate::commands::fitted;
use crate::commands::places::Named;
use crate::commands::settings::{self, SettingText};
use crate::commands::snippets::{Texts, report};
use crate::commands::speech::Speech;
use crate::place::problem::{Problem, Severity};
use crate::place::{DialPlan, Outcome, read, read_setting};
use crate::words::{KNOWN_TAGS, Words};

/// A path with everything that was found in it.
pub(in crate::commands) struct Checked {
    /// The path as it was asked for.
    pub path: String,
    /// Problems in the order of files and lines.
    pub problems: Vec<Problem>,
    /// Why nothing could be read at all, in words.
    pub unreadable: Vec<String>,
    /// Texts in memory that problems point into; empty where they are on the disk.
    texts: Vec<(String, String)>,
}

/// Checks a place, a setting, a lesson or a board file, on the disk or built in. A lesson is tried on the place `on`, else on the demo.
pub(in crate::commands) fn check_one(path: &Path, on: Option<&Path>, speech: &Speech) -> Checked {
    let shown = path.display().to_string();
    let name = path.to_str().unwrap_or_default();
    let is_toml = path.extension() == Some(OsStr::new("toml"));
    let is_place = path.is_dir() || path.file_name() == Some(OsStr::new("place.toml"));
    let is_setting = !is_place && (path.is_file() && is_toml || !path.exists() && built_in::setting(name).is_some());
    if is_setting {
        return match settings::find(path, &speech.words) {
            Ok(lesson) if lessons::is_lesson(&lesson.text) => of_lesson(shown, lesson, on, speech),
            Ok(board) if is_board_file(&board.text) => of_board(shown, board),
            Ok(setting) => of_setting(shown, setting),
            Err(failure) => unreadable(shown, failure),
        };
    }
    if let Some(lesson) = lessons::built_in(name).filter(|_| !path.exists()) {
        return of_lesson(shown, lesson, on, speech);
    }
    if path.is_file() && !is_place {
        let line = speech.words.say("check-not-known", &[("path", shown.as_str().into())]);
        return unreadable(shown, Failure::input(line));
    }
    match Named::find(path, speech) {
        Ok(named) => {
            let texts = match &named {
                Named::Folder(_) => Vec::new(),
                Named::BuiltIn(place) => {
                    place.files.iter().map(|(file, text)| ((*file).to_owned(), (*text).to_owned())).collect()
                }
            };
            let Outcome { place, mut problems } = read(named.source());
            problems.extend(place.iter().flat_map(|place| fitted::look(place).1));
            Checked { path: shown, problems, unreadable: Vec::new(), texts }
        }
        Err(failure) => unreadable(shown, failure),
    }
}

fn of_setting(path: String, setting: SettingText) -> Checked {
    let outcome = read_setting(&setting.file, &setting.text, &DialPlan::WIDEST);
    let texts = vec![(setting.file.to_string_lossy().into_owned(), setting.text)];
    Checked { path, problems: outcome.problems, unreadable: Vec::new(), texts }
}

fn of_board(path: String, board: SettingText) -> Checked {
    let problems = read_board(&board.file, &board.text, &KNOWN_TAGS).problems;
    let texts = vec![(board.file.to_string_lossy().into_owned(), board.text)];
    Checked { path, problems, unreadable: Vec::new(), texts }
}

fn of_lesson(path: String, lesson: SettingText, on: Option<&Path>, speech: &Speech) -> Checked {
    match lessons::problems(&lesson, on, speech) {
        Ok(problems) => {
            let texts = vec![(lesson.file.to_string_lossy().into_owned(), lesson.text)];
            Checked { path, problems, unreadable: Vec::new(), texts }
        }
        Err(failure) => unreadable(path, failure),
    }
}

fn unreadable(path: String, failure: Failure) -> Checked {
    let lines = match failure {
        Failure::Input(lines) | Failure::Usage(lines) => lines,
        Failure::ReaderGone => Vec::new(),
    };
    Checked { path, problems: Vec::new(), unreadable: lines, texts: Vec::new() }
}

/// Whether a path names a place, on the disk or built in.
pub(super) fn is_place(path: &Path) -> bool {
    path.is_dir()
        || path.file_name() == Some(OsStr::new("place.toml"))
        || !path.exists() && path.to_str().and_then(built_in::place).is_some()
}

impl Checked {
    /// Whether it cannot be used.
    pub fn is_wrong(&self) -> bool {
        !self.unreadable.is_empty() || self.count(Severity::Error) > 0
    }

    fn count(&self, severity: Severity) -> usize {
        self.problems.iter().filter(|problem| problem.severity == severity).count()
    }

    /// Everything that was found, and a line that sums it up.
    pub fn say(&mut self, words: &Words) -> String {
        if !self.unreadable.is_empty() {
            return self.unreadable.join("\n");
        }
        let mut parts = Vec::new();
        if !self.problems.is_empty() {
            let mut texts = if self.texts.is_empty() { Texts::on_disk() } else { Texts::given(&self.texts) };
            parts.push(report(&self.problems, &mut texts, words));
            parts.push(String::new());
        }
        let (errors, notes) = (self.count(Severity::Error), self.count(Severity::Warning));
        let path = || ("path", self.path.as_str().into());
        parts.push(match errors {
            0 => words.say("check-fine", &[path()]),
            _ => words.say("check-found", &[path(), ("n", errors.into())]),
        });
        if notes > 0 {
            parts.push(words.say("check-notes", &[path(), ("n", notes.into())]));
        }
        parts.join("\n")
    }
}
