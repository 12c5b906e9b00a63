//! The weather generator against published values, sampling theory and, where present, a real record.

mod fitting;
mod observed;
mod reference;
mod runs;
mod sample;
mod statistics;
