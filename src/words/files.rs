//! The table of locale files that are part of the program.

/// One locale file.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct LocaleFile {
    /// Its folder under `locales/`: a language, or a language and region.
    pub folder: &'static str,
    /// Its name.
    pub name: &'static str,
    /// Its text.
    pub text: &'static str,
}

macro_rules! embedded {
    ($($folder:literal: $($name:literal),+;)+) => {
        &[$($(LocaleFile {
            folder: $folder,
            name: $name,
            text: include_str!(concat!("../../locales/", $folder, "/", $name)),
        },)+)+]
    };
}

/// Every `.ftl` file under `locales/`; a test holds this against the folder.
pub const EMBEDDED: &[LocaleFile] = embedded! {
    "en":
        "board-problems.ftl",
        "board.ftl",
        "bundle.ftl",
        "cautions.ftl",
        "columns.ftl",
        "command.ftl",
        "crops.ftl",
        "dates.ftl",
        "dials.ftl",
        "fit.ftl",
        "grid.ftl",
        "handout.ftl",
        "kiosk.ftl",
        "languages.ftl",
        "ledger.ftl",
        "lesson-pages.ftl",
        "lesson-problems.ftl",
        "lesson.ftl",
        "map.ftl",
        "numbers.ftl",
        "pages.ftl",
        "patterns.ftl",
        "picture.ftl",
        "preparing.ftl",
        "problems.ftl",
        "readers.ftl",
        "record-problems.ftl",
        "ring.ftl",
        "show.ftl",
        "signs.ftl",
        "tell.ftl",
        "terms.ftl",
        "units.ftl",
        "weather.ftl",
        "wiring.ftl";
    "en-GB":
        "dates.ftl",
        "ledger.ftl",
        "pages.ftl",
        "tell.ftl",
        "terms.ftl",
        "units.ftl";
    "es":
        "board-problems.ftl",
        "board.ftl",
        "bundle.ftl",
        "cautions.ftl",
        "columns.ftl",
        "command.ftl",
        "crops.ftl",
        "dates.ftl",
        "dials.ftl",
        "fit.ftl",
        "grid.ftl",
        "handout.ftl",
        "kiosk.ftl",
        "languages.ftl",
        "ledger.ftl",
        "lesson-pages.ftl",
        "lesson-problems.ftl",
        "lesson.ftl",
        "map.ftl",
        "numbers.ftl",
        "pages.ftl",
        "patterns.ftl",
        "picture.ftl",
        "preparing.ftl",
        "problems.ftl",
        "readers.ftl",
        "record-problems.ftl",
        "ring.ftl",
        "show.ftl",
        "signs.ftl",
        "tell.ftl",
        "terms.ftl",
        "units.ftl",
        "weather.ftl",
        "wiring.ftl";
    "es-AR":
        "numbers.ftl",
        "terms.ftl";
    "es-CL":
        "crops.ftl",
        "ledger.ftl",
        "numbers.ftl",
        "signs.ftl",
        "terms.ftl";
    "es-ES":
        "cautions.ftl",
        "command.ftl",
        "crops.ftl",
        "ledger.ftl",
        "numbers.ftl",
        "pages.ftl",
        "signs.ftl",
        "tell.ftl",
        "terms.ftl";
    "es-MX":
        "crops.ftl",
        "signs.ftl",
        "tell.ftl",
        "terms.ftl";
    "es-embalse":
        "cautions.ftl",
        "command.ftl",
        "dials.ftl",
        "ledger.ftl",
        "lesson.ftl",
        "map.ftl",
        "pages.ftl",
        "problems.ftl",
        "signs.ftl",
        "tell.ftl",
        "terms.ftl";
};
