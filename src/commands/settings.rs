//! The setting that `--setting` names: a file, or one built into the program.

use std::io::Read;
use std::path::{Path, PathBuf};

use super::built_in;
use super::failure::Failure;
use super::output::reason;
use super::snippets::{Texts, report};
use crate::place::problem::Severity;
use crate::place::{DialPlan, Setting, SettingOutcome, read_setting};
use crate::words::{Words, nearest};

/// A setting is a page of text; nothing near this size is one.
const MOST_BYTES: u64 = 1 << 20;

/// The text of a setting and the name of its file.
pub(super) struct SettingText {
    /// The file, as the user would name it.
    pub file: PathBuf,
    /// Its content.
    pub text: String,
}

/// Finds the setting: a file of that name goes before what is built in.
pub(super) fn find(name: &Path, words: &Words) -> Result<SettingText, Failure> {
    let shown = || name.display().to_string();
    if name.is_file() {
        return read_text(name, words);
    }
    let key = name.to_str().unwrap_or_default();
    if let Some(setting) = built_in::setting(key) {
        return Ok(SettingText { file: format!("{key}.toml").into(), text: setting.to_owned() });
    }
    let looks_like_file = name.extension().is_some() || name.components().count() > 1;
    if looks_like_file {
        return Err(Failure::input(words.say("error-file-not-found", &[("path", shown().into())])));
    }
    let near = nearest(key, built_in::setting_names());
    Err(Failure::input(match near {
        Some(near) => {
            let arguments = [("setting", shown().into()), ("nearest", near.into())];
            words.say("error-setting-unknown-nearest", &arguments)
        }
        None => {
            let known: Vec<&str> = built_in::setting_names().collect();
            let arguments = [("setting", shown().into()), ("settings", known.join(", ").into())];
            words.say("error-setting-unknown", &arguments)
        }
    }))
}

/// Reads the setting for a place that offers `plan`; mistakes refuse it, notes are told.
pub(super) fn open(name: &Path, plan: &DialPlan, words: &Words) -> Result<Setting, Failure> {
    let SettingText { file, text } = find(name, words)?;
    let SettingOutcome { setting, problems } = read_setting(&file, &text, plan);
    let shown = [(file.to_string_lossy().into_owned(), text)];
    let told = report(&problems, &mut Texts::given(&shown), words);
    match setting {
        None => Err(Failure::Input(vec![told])),
        Some(setting) => {
            if problems.iter().any(|problem| problem.severity == Severity::Warning) {
                super::tell_standard_error(&[told]);
            }
            Ok(setting)
        }
    }
}

/// Reads a small text file whole.
pub(super) fn read_text(path: &Path, words: &Words) -> Result<SettingText, Failure> {
    let unreadable = |reason: String| {
        let arguments = [("path", path.display().to_string().into()), ("reason", reason.into())];
        Failure::input(words.say("error-file-unreadable", &arguments))
    };
    let mut bytes = Vec::new();
    std::fs::File::open(path)
        .and_then(|file| file.take(MOST_BYTES + 1).read_to_end(&mut bytes))
        .map_err(|error| unreadable(reason(&error, words)))?;
    if bytes.len() as u64 > MOST_BYTES {
        return Err(unreadable(words.say("reason-too-large", &[])));
    }
    let text = String::from_utf8(bytes).map_err(|_| unreadable(words.say("reason-not-text", &[])))?;
    Ok(SettingText { file: path.to_owned(), text })
}
