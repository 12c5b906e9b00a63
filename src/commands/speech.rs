//! Which language to speak, settled before anything else is parsed.

use std::ffi::OsString;
use std::path::PathBuf;

use super::failure::Failure;
use super::tell_standard_error;
use crate::board::file::read_board;
use crate::words::{Fallback, KNOWN_TAGS, Locales, Words};

/// More faults of a locale folder than this help nobody.
const MOST_LOCALE_FAULTS: usize = 20;

/// A board file is a page of text; nothing near this size is one.
const MOST_BOARD_BYTES: u64 = 1 << 20;

/// The language of this call.
pub(super) struct Speech {
    locales: Locales,
    asked: String,
    /// Words for everything that is said before a place is known.
    pub words: Words,
    fallback: Option<Fallback>,
    locale_faults: Vec<String>,
    /// Whether a page to print is asked for in both languages.
    #[cfg_attr(not(feature = "pdf"), allow(dead_code, reason = "only pages speak two languages"))]
    pub both: bool,
}

impl Speech {
    /// Settles on a language: `--lang`, else what a board file says, else what the system says where there are words for it, else English.
    pub fn choose(arguments: &[OsString]) -> Self {
        let mut locales = Locales::embedded();
        let folder = value_of("--locales", arguments).map(PathBuf::from);
        let faults = folder.map(|folder| locales.add_directory(&folder)).unwrap_or_default();
        let is_handout = arguments.iter().skip(1).any(|argument| argument == "handout");
        let tag = value_of("--lang", arguments);
        let both = is_handout && tag.as_ref().is_some_and(|tag| tag == "both");
        let asked = match tag.filter(|_| !both) {
            Some(tag) => tag.to_string_lossy().into_owned(),
            None => of_the_board(arguments).or_else(|| of_the_system(&locales)).unwrap_or_else(|| "en".to_owned()),
        };
        let (words, fallback) = locales.words(&asked, None);
        let mut locale_faults: Vec<String> =
            faults.iter().take(MOST_LOCALE_FAULTS).map(|fault| fault.say(&words)).collect();
        if faults.len() > MOST_LOCALE_FAULTS {
            let more = faults.len() - MOST_LOCALE_FAULTS;
            locale_faults.push(words.say("check-more", &[("n", more.into())]));
        }
        Self { locales, asked, words, fallback, locale_faults, both }
    }

    /// Tells what could not be met. Never fails: the next best words are used.
    pub fn warn(&self) -> Result<(), Failure> {
        let note = self.words.say("error-warning", &[]);
        let fallback = self.fallback.iter().map(|fallback| fallback.say(&self.words));
        let lines: Vec<String> =
            fallback.chain(self.locale_faults.iter().cloned()).map(|line| format!("{note}: {line}")).collect();
        tell_standard_error(&lines);
        Ok(())
    }

    /// The words for a place: a bare `en` or `es` takes the place's region.
    pub fn for_place(&self, region_tag: &str) -> Words {
        let region = region_tag.rsplit('-').next().filter(|_| region_tag.contains('-'));
        self.locales.words(&self.asked, region).0
    }

    /// The words of a language whatever was asked for; for files that carry both languages.
    pub fn in_language(&self, language: &str) -> Words {
        self.locales.words(language, None).0
    }
}

/// The value of a long option, wherever it stands; the real parser has its say later.
fn value_of(option: &str, arguments: &[OsString]) -> Option<OsString> {
    let mut arguments = arguments.iter().skip(1).take_while(|argument| *argument != "--");
    while let Some(argument) = arguments.next() {
        if argument == option {
            return arguments.next().cloned();
        }
        let text = argument.to_string_lossy();
        if let Some(value) = text.strip_prefix(option).and_then(|rest| rest.strip_prefix('=')) {
            return Some(value.into());
        }
    }
    None
}

/// The language that a board file starts with. What is wrong with the file is told later, by whoever needs it.
fn of_the_board(arguments: &[OsString]) -> Option<String> {
    let file = PathBuf::from(value_of("--board", arguments)?);
    let size = std::fs::metadata(&file).ok().filter(std::fs::Metadata::is_file)?.len();
    let text = (size <= MOST_BOARD_BYTES).then(|| std::fs::read_to_string(&file).ok()).flatten()?;
    read_board(&file, &text, &KNOWN_TAGS).board?.start.language
}

/// The system's language, where there are words for it; `C` and the like are no language.
fn of_the_system(locales: &Locales) -> Option<String> {
    let set = ["LC_ALL", "LC_MESSAGES", "LANG"].into_iter().find_map(|name| {
        let value = std::env::var(name).ok()?;
        (!value.is_empty()).then_some(value)
    })?;
    let tag = set.split(['.', '@']).next()?.replace('_', "-");
    let language = tag.split('-').next()?.to_ascii_lowercase();
    let known = locales.folders().any(|folder| folder == language);
    known.then_some(tag)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn value(option: &str, line: &str) -> Option<String> {
        let arguments: Vec<OsString> = line.split(' ').map(OsString::from).collect();
        value_of(option, &arguments).map(|value| value.into_string().unwrap())
    }

    #[test]
    fn the_language_is_found_wherever_it_stands() {
        assert_eq!(value("--lang", "deshielo tell --lang es demo").as_deref(), Some("es"));
        assert_eq!(value("--lang", "deshielo --lang=es-CL tell").as_deref(), Some("es-CL"));
        assert_eq!(value("--lang", "deshielo tell --language es"), None);
        assert_eq!(value("--lang", "deshielo tell -- --lang es"), None);
        assert_eq!(value("--lang", "deshielo tell --lang"), None);
    }
}
