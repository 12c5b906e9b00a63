//! The physics and the works: pure, no input or output, no clock, no allocation inside a day, no words.

pub mod basin;
pub mod calendar;
pub mod canals;
pub mod channel;
pub mod crop;
pub mod dials;
pub mod evaporation;
pub mod fields;
pub mod ground;
pub(crate) mod keyed;
pub mod lake;
pub mod lanes;
pub mod ledger;
pub mod power;
pub mod run;
pub mod slopes;
pub mod snow;
pub mod soil;
pub mod units;
pub mod valley;
pub mod weather;
pub mod works;
