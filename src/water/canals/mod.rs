//! Who gets the water below the dam.
#![allow(missing_docs)]
use serde::{Deserialize, Serialize};
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Serialize, Deserialize)]
pub enum PriorityDate {
    BeforeAll,
    On { year: i16, month: u8, day: u8 },
}
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub enum SharingRule {
    Seniority,
    Proportional,
    Rotation,
}
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub enum MinimumPlace {
    RiverEnd,
    Dam,
}
