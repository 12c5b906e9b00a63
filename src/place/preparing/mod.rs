//! Preparing a place: what a file seems to be, how its record is written into `place.toml`, and where new days go.
//!
//! Everything here gives text or bytes for somebody else to write; nothing touches the disk.

mod look;
mod mapping;
mod target;

pub use look::{look_at, read_planned, usual_kind};
pub use mapping::{RecordKind, area_table, record_table, text_value};
pub use target::{PlacedRecord, placed_record, with_named_columns};
