//! A place folder in, checked values out: TOML and CSV, with every error at its line.
//!
//! A place is a folder with `place.toml` and the daily records that it names. [`read`] gives the whole place or every
//! problem in it, never the first one only. [`file_format`] (the page `demo-data/PLACE.md`) explains each table and key to
//! the people who write one.
//!
//! Every measured value carries its unit in its key (`outlet_m3s`, `outlet_cfs`) and is kept in SI. A key that nobody
//! asks for is an error and is answered with the nearest known one. Problems are data; their words are in `locales`.

/// How `place.toml` is written: every table and key with its units, usual values, limits and sources.
#[doc = include_str!("../../demo-data/PLACE.md")]
pub mod file_format {}

mod bands;
mod checks;
pub mod crop_table;
mod crops;
pub(crate) mod dated;
pub mod demo;
pub(crate) mod dial_plan;
pub mod exchange;
mod fields;
mod gates;
mod measure_words;
pub mod preparing;
pub mod problem;
mod reading;
pub mod record;
mod record_file;
mod records;
mod reservoir;
mod rights_file;
pub(crate) mod section;
mod setting;
mod slopes;
mod small_table;
mod source;
mod station_days;
pub mod terrain;
pub(crate) mod text;
pub(crate) mod tree;
pub(crate) mod unit_suffix;

use std::path::PathBuf;

use chrono::NaiveDate;

use crate::water::calendar::CalendarDay;
use crate::water::evaporation::{SkyTable, percent_per_degree};
use crate::water::valley::Valley;
use crate::water::weather::StationDay;

pub use crops::PlaceCrop;
pub use dial_plan::{DialOffer, DialPlan};
pub use fields::FieldNames;
pub use gates::GateNames;
pub use reading::read;
pub use records::{Gauge, GaugeMeasures, Series};
pub use setting::{Setting, SettingOutcome, Years, read_setting};
pub use source::Source;
pub use station_days::{EvaporationChoice, EvaporationNote};
pub use text::Text;

/// A place that has been read and checked.
#[derive(Clone, Debug, PartialEq)]
pub struct Place {
    /// Its folder; `None` for one built into the program.
    pub folder: Option<PathBuf>,
    /// Its name.
    pub name: Text,
    /// Its region, as a full language tag (`es-CL`): decides decimal mark and regional words.
    pub region: String,
    /// The units that its people are used to.
    pub units: UnitSystem,
    /// Where the description comes from, for people.
    pub source: Option<Text>,
    /// Whether the valley is invented; shown wherever the place is.
    pub invented: bool,
    /// What the water runs on.
    pub valley: Valley,
    /// One entry a day of the record.
    pub calendar: Vec<CalendarDay>,
    /// The station's weather, one entry a day.
    pub days: Vec<StationDay>,
    /// First day of the record.
    pub first_date: NaiveDate,
    /// What people read of each gate, in the order of the valley's gates.
    pub gates: Vec<GateNames>,
    /// What each dial may do here.
    pub dials: DialPlan,
    /// The river gauge.
    pub gauge: Option<Gauge>,
    /// Snow water at a snow station, mm.
    pub snow_record: Option<Series>,
    /// Elevation of the snow station, m; `None` where the record stands for the whole basin.
    pub snow_elevation_m: Option<f64>,
    /// Observed storage, hm³.
    pub storage_record: Option<Series>,
    /// Observed flow into canals, m³/s.
    pub diversions: Vec<Diversion>,
    /// What the about view tells of how the place was read.
    pub notes: Notes,
}

impl Place {
    /// By how many percent reference evaporation grows with the first degree of warming, over the record; `None` where
    /// nothing evaporates or the latitude is none.
    pub fn evaporation_percent_per_degree(&self) -> Option<f64> {
        let sky = SkyTable::at_latitude(self.valley.latitude_deg)?;
        let record = self.calendar.iter().zip(&self.days).map(|(day, record)| (day.day_of_year, record.air));
        percent_per_degree(&self.valley.evaporation.method, &sky, record)
    }
}

/// The units that people are shown.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum UnitSystem {
    /// °C, mm, m³/s, hm³, ha.
    Metric,
    /// °F, inches, ft³/s, acre-feet, acres.
    Us,
}

/// Observed flow into one canal.
#[derive(Clone, Debug, PartialEq)]
pub struct Diversion {
    /// The gate, as an index into the valley's.
    pub gate: usize,
    /// The record, m³/s.
    pub series: Series,
}

/// How a place was read.
#[derive(Clone, Debug, PartialEq)]
pub struct Notes {
    /// How reference evaporation is had.
    pub evaporation: EvaporationNote,
    /// Gaps of the weather record that were filled by the stated rule.
    pub filled_gaps: Vec<FilledGaps>,
    /// The files that were read, with their fingerprints; the weather first.
    pub records: Vec<RecordNote>,
}

/// Days of one column that were filled.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct FilledGaps {
    /// What the column measures.
    pub measure: record::Measure,
    /// How many days were filled.
    pub days: usize,
    /// The longest gap, days.
    pub longest_days: usize,
}

/// A file that was read.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct RecordNote {
    /// Its name in the place.
    pub file: String,
    /// Fingerprint of its bytes, see [`record::checksum_of`].
    pub checksum: u64,
}

/// A place, unless it has errors, with everything that was found.
#[derive(Clone, Debug, PartialEq)]
pub struct Outcome {
    /// The place; only without errors.
    pub place: Option<Place>,
    /// Errors and warnings in the order of the files and their lines.
    pub problems: Vec<problem::Problem>,
}
