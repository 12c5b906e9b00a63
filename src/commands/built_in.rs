//! What is part of the program: places and settings that work from anywhere.

/// A place built into the program.
pub(super) struct BuiltInPlace {
    /// The name by which a command line asks for it.
    pub name: &'static str,
    /// Its files with their texts.
    pub files: &'static [(&'static str, &'static str)],
}

/// A setting built into the program.
pub(super) struct BuiltInSetting {
    /// The name by which a command line asks for it.
    pub name: &'static str,
    /// Its text.
    pub text: &'static str,
}

/// The places; `demo` is what every command takes where no place is named.
pub(super) const PLACES: &[BuiltInPlace] = &[];

/// The settings.
pub(super) const SETTINGS: &[BuiltInSetting] = &[];

/// The place of this name.
pub(super) fn place(name: &str) -> Option<&'static BuiltInPlace> {
    PLACES.iter().find(|place| place.name == name)
}

/// The setting of this name.
pub(super) fn setting(name: &str) -> Option<&'static BuiltInSetting> {
    SETTINGS.iter().find(|setting| setting.name == name)
}
