//! What is part of the program: places and settings that work from anywhere.

use crate::place::demo::{EmbeddedFiles, demo_files, droughts, piedranieve_files};

/// A place built into the program.
#[derive(Clone, Copy)]
pub(super) struct BuiltInPlace {
    /// The name by which a command line asks for it.
    pub name: &'static str,
    /// Its files with their texts.
    pub files: EmbeddedFiles,
}

/// The place of this name; `demo` is what every command takes where no place is named.
pub(super) fn place(name: &str) -> Option<BuiltInPlace> {
    let files = match name {
        "demo" | "tresnubes" => demo_files(),
        "piedranieve" => piedranieve_files(),
        _ => return None,
    };
    let name = if name == "piedranieve" { "piedranieve" } else { "demo" };
    Some(BuiltInPlace { name, files })
}

/// The text of the setting of this name.
pub(super) fn setting(name: &str) -> Option<&'static str> {
    droughts().iter().find(|(known, _)| *known == name).map(|(_, text)| *text)
}

/// The names of all settings.
pub(super) fn setting_names() -> impl Iterator<Item = &'static str> {
    droughts().iter().map(|(name, _)| *name)
}
