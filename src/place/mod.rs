//! A place folder in, checked values out: TOML and CSV, with every error at its line.

pub mod crop_table;
pub mod problem;
pub mod record;
