//! The lessons that are part of the program: the files of `scenarios/`, word for word.
//!
//! Their usual answers are what we expect a room to say (no source; nobody has been asked yet). That they are wrong is tested.

/// Every lesson by its name, easiest first.
pub fn lessons() -> &'static [(&'static str, &'static str)] {
    &[
        ("less_snow_more_rain", include_str!("../../scenarios/less_snow_more_rain.toml")),
        ("earlier_water", include_str!("../../scenarios/earlier_water.toml")),
        ("dry_year_full_reservoir", include_str!("../../scenarios/dry_year_full_reservoir.toml")),
        ("who_is_cut_first", include_str!("../../scenarios/who_is_cut_first.toml")),
        ("line_the_canal", include_str!("../../scenarios/line_the_canal.toml")),
        ("change_the_crops", include_str!("../../scenarios/change_the_crops.toml")),
        ("dry_years_in_a_row", include_str!("../../scenarios/dry_years_in_a_row.toml")),
        ("grow_the_town", include_str!("../../scenarios/grow_the_town.toml")),
    ]
}
