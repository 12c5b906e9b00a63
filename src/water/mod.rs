//! The physics and the works: pure, no input or output, no clock, no allocation inside a day, no words.

pub mod calendar;
pub mod canals;
pub mod crop;
pub mod dials;
pub mod evaporation;
pub mod units;
pub mod valley;
pub mod weather;
