//! Places and settings that are part of the program, so that it works from anywhere.
//!
//! All of them are invented. They are the files of `demo-data/` and `scenarios/droughts/`, word for word.

/// Files by their names, with their texts.
pub type EmbeddedFiles = &'static [(&'static str, &'static str)];

/// The demo place Tresnubes, for [`Source::Embedded`](super::Source::Embedded): a northern valley with a reservoir, five
/// canals and a town, shared by the date of the right.
pub fn demo_files() -> EmbeddedFiles {
    &[
        ("place.toml", include_str!("../../demo-data/tresnubes/place.toml")),
        ("weather.csv", include_str!("../../demo-data/tresnubes/weather.csv")),
    ]
}

/// The small southern place Piedranieve: a stream without a reservoir, four canals that take turns.
pub fn piedranieve_files() -> EmbeddedFiles {
    &[
        ("place.toml", include_str!("../../demo-data/piedranieve/place.toml")),
        ("weather.csv", include_str!("../../demo-data/piedranieve/weather.csv")),
    ]
}

/// The four droughts, each a setting for [`read_setting`](super::read_setting), by the names that people give them.
pub fn droughts() -> EmbeddedFiles {
    &[
        ("one_dry_winter", include_str!("../../scenarios/droughts/one_dry_winter.toml")),
        ("three_dry_years", include_str!("../../scenarios/droughts/three_dry_years.toml")),
        ("early_heat", include_str!("../../scenarios/droughts/early_heat.toml")),
        ("dry_and_thirsty", include_str!("../../scenarios/droughts/dry_and_thirsty.toml")),
    ]
}
