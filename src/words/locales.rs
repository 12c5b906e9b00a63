//! The set of locale folders: those in the program, and others read from a directory.

use std::collections::BTreeMap;
use std::path::Path;

use unic_langid::LanguageIdentifier;

use super::files::EMBEDDED;
use super::language::{self, Fallback};
use super::parity::{Shape, shapes};
use super::say::Words;

/// No locale file comes near this; a larger one is not read, to bound memory.
const LARGEST_FILE_BYTES: u64 = 1 << 20;
/// The language that every other is held against.
const BASE: &str = "en";

/// Locale folders by name, each with its files.
#[derive(Clone, Debug, Default)]
pub struct Locales {
    folders: BTreeMap<String, BTreeMap<String, String>>,
}

/// Something wrong with a locale that was read from a directory.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct LocaleProblem {
    /// The folder, such as `fr`.
    pub folder: String,
    /// The file in it, where one is to blame.
    pub file: Option<String>,
    /// What is wrong.
    pub kind: LocaleProblemKind,
}

/// What can be wrong with a locale.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum LocaleProblemKind {
    /// The file or folder cannot be read; the system's own reason.
    Unreadable(String),
    /// The file is larger than any locale file may be.
    TooLarge,
    /// The name of the folder is not a language tag.
    NotATag,
    /// A line is not Fluent.
    Syntax {
        /// Counted from 1.
        line: usize,
    },
    /// English has the message (or `message.attribute`), this language has not.
    Missing {
        /// The message.
        id: String,
    },
    /// This folder has a message (or `message.attribute`) that nothing asks for.
    Unknown {
        /// The message.
        id: String,
    },
    /// The message is written twice in this folder.
    Twice {
        /// The message.
        id: String,
    },
    /// The message takes other arguments than the English one.
    Arguments {
        /// The message.
        id: String,
        /// What the English message takes.
        expected: Vec<String>,
        /// What this one takes.
        found: Vec<String>,
    },
}

impl LocaleProblem {
    /// The problem in words.
    pub fn say(&self, words: &Words) -> String {
        let place = match &self.file {
            Some(file) => format!("{}/{file}", self.folder),
            None => self.folder.clone(),
        };
        let place = ("where", place.into());
        match &self.kind {
            LocaleProblemKind::Unreadable(reason) => {
                words.say("locale-unreadable", &[place, ("reason", reason.as_str().into())])
            }
            LocaleProblemKind::TooLarge => words.say("locale-too-large", &[place]),
            LocaleProblemKind::NotATag => words.say("locale-not-a-tag", &[place]),
            // A line number is a name, not an amount: no thousands mark.
            LocaleProblemKind::Syntax { line } => {
                words.say("locale-syntax", &[place, ("line", line.to_string().into())])
            }
            LocaleProblemKind::Missing { id } => words.say("locale-missing", &[place, ("id", id.as_str().into())]),
            LocaleProblemKind::Unknown { id } => words.say("locale-unknown", &[place, ("id", id.as_str().into())]),
            LocaleProblemKind::Twice { id } => words.say("locale-twice", &[place, ("id", id.as_str().into())]),
            LocaleProblemKind::Arguments { id, expected, found } => {
                let list = |names: &[String]| match names {
                    [] => words.say("locale-no-arguments", &[]),
                    names => names.join(", "),
                };
                let (expected, found) = (list(expected), list(found));
                let args = [place, ("id", id.as_str().into()), ("expected", expected.into()), ("found", found.into())];
                words.say("locale-arguments", &args)
            }
        }
    }
}

impl Locales {
    /// The locales that are part of the program.
    pub fn embedded() -> Locales {
        let mut locales = Locales::default();
        for file in EMBEDDED {
            locales.add(file.folder, file.name, file.text);
        }
        locales
    }

    /// Adds or replaces one file: the folder (`fr`, `es-PE`), the file name, its text.
    pub fn add(&mut self, folder: &str, name: &str, text: &str) {
        self.folders.entry(folder.to_owned()).or_default().insert(name.to_owned(), text.to_owned());
    }

    /// Adds every `FOLDER/*.ftl` under `directory` and checks what was added against English.
    ///
    /// What can be used is used, whatever the problems: a missing message is said in English. The problems come sorted
    /// by folder and file.
    pub fn add_directory(&mut self, directory: &Path) -> Vec<LocaleProblem> {
        let mut problems = Vec::new();
        let mut added = Vec::new();
        let at = |folder: &str, file: Option<&str>, kind| LocaleProblem {
            folder: folder.to_owned(),
            file: file.map(str::to_owned),
            kind,
        };
        let unreadable = |error: std::io::Error| LocaleProblemKind::Unreadable(error.to_string());
        let folders = match names_in(directory) {
            Ok(names) => names,
            Err(error) => {
                problems.push(at(&directory.display().to_string(), None, unreadable(error)));
                return problems;
            }
        };
        for folder in folders.iter().filter(|name| directory.join(name).is_dir()) {
            if folder.parse::<LanguageIdentifier>().is_err() {
                problems.push(at(folder, None, LocaleProblemKind::NotATag));
                continue;
            }
            let path = directory.join(folder);
            let files = match names_in(&path) {
                Ok(names) => names,
                Err(error) => {
                    problems.push(at(folder, None, unreadable(error)));
                    continue;
                }
            };
            for file in files.iter().filter(|name| name.ends_with(".ftl")) {
                match read_bounded(&path.join(file)) {
                    Ok(Some(text)) => {
                        let (_, errors) = shapes(&text);
                        let syntax = errors.iter().map(|error| LocaleProblemKind::Syntax { line: error.line });
                        problems.extend(syntax.map(|kind| at(folder, Some(file), kind)));
                        self.add(folder, file, &text);
                    }
                    Ok(None) => problems.push(at(folder, Some(file), LocaleProblemKind::TooLarge)),
                    Err(error) => problems.push(at(folder, Some(file), unreadable(error))),
                }
            }
            added.push(folder.clone());
        }
        for folder in added {
            problems.extend(self.check(&folder));
        }
        problems
    }

    /// Holds one folder against English (a language) or against its language (a region).
    pub fn check(&self, folder: &str) -> Vec<LocaleProblem> {
        let mut problems = Vec::new();
        let expected = self.all_shapes(BASE);
        let found = self.all_shapes(folder);
        let mut push = |kind, file: Option<&str>| {
            problems.push(LocaleProblem { folder: folder.to_owned(), file: file.map(str::to_owned), kind });
        };
        let is_language = !folder.contains('-');
        let mut merged: BTreeMap<&str, &Shape> = BTreeMap::new();
        for (file, id, shape) in &found {
            if merged.insert(id, shape).is_some() {
                push(LocaleProblemKind::Twice { id: id.clone() }, Some(file));
            }
        }
        for (file, id, shape) in &expected {
            match merged.get(id.as_str()) {
                Some(other) => compare(id, shape, other, &mut |kind| push(kind, None)),
                None if is_language => push(LocaleProblemKind::Missing { id: id.clone() }, Some(file)),
                None => {}
            }
        }
        for (file, id, _) in &found {
            if !expected.iter().any(|(_, known, _)| known == id) {
                push(LocaleProblemKind::Unknown { id: id.clone() }, Some(file));
            }
        }
        problems
    }

    /// The words for a tag and, for a bare language, the region of the place; and what could not be met.
    pub fn words(&self, tag: &str, place_region: Option<&str>) -> (Words, Option<Fallback>) {
        let folders: Vec<&str> = self.folders.keys().map(String::as_str).collect();
        Words::build(language::choose(tag, place_region, &folders), self)
    }

    /// The names of the folders, sorted.
    pub fn folders(&self) -> impl Iterator<Item = &str> {
        self.folders.keys().map(String::as_str)
    }

    /// The texts of a folder that parse safely, in the order of their file names.
    pub(super) fn texts(&self, folder: &str) -> impl Iterator<Item = &str> {
        let files = self.folders.get(folder).into_iter().flat_map(BTreeMap::values);
        files.map(String::as_str).filter(|text| !super::parity::is_too_deep(text))
    }

    fn all_shapes(&self, folder: &str) -> Vec<(String, String, Shape)> {
        let mut all = Vec::new();
        for (name, text) in self.folders.get(folder).into_iter().flatten() {
            let (found, _) = shapes(text);
            all.extend(found.into_iter().map(|(id, shape)| (name.clone(), id, shape)));
        }
        all
    }
}

fn compare(id: &str, expected: &Shape, found: &Shape, push: &mut dyn FnMut(LocaleProblemKind)) {
    let full = |part: &str| if part.is_empty() { id.to_owned() } else { format!("{id}.{part}") };
    for (part, names) in expected {
        match found.get(part) {
            None => push(LocaleProblemKind::Missing { id: full(part) }),
            Some(others) if others != names => push(LocaleProblemKind::Arguments {
                id: full(part),
                expected: names.iter().cloned().collect(),
                found: others.iter().cloned().collect(),
            }),
            Some(_) => {}
        }
    }
    for part in found.keys().filter(|part| !expected.contains_key(*part)) {
        push(LocaleProblemKind::Unknown { id: full(part) });
    }
}

/// The names in a directory, sorted; names that are not Unicode cannot be tags or locale files.
fn names_in(directory: &Path) -> std::io::Result<Vec<String>> {
    let mut names = Vec::new();
    for entry in std::fs::read_dir(directory)? {
        if let Ok(name) = entry?.file_name().into_string() {
            names.push(name);
        }
    }
    names.sort();
    Ok(names)
}

/// The text of a file, or `None` where it is too large.
fn read_bounded(path: &Path) -> std::io::Result<Option<String>> {
    if std::fs::metadata(path)?.len() > LARGEST_FILE_BYTES {
        return Ok(None);
    }
    std::fs::read_to_string(path).map(Some)
}
