//! Runs as open data: files that other programs read, with what every number means beside it.

pub mod netcdf;
mod run_file;

pub use run_file::{About, Canal, CanalSeries, RunDays, Series, about, run_file};
