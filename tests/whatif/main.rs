//! The what-if grid: every cell is a run of its own to the bit, in any order, in any number of parts.

mod cells;
#[path = "../support/valleys.rs"]
mod valleys;
