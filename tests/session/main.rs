//! The session: what events do, what must always hold, what can be reached, and that answers are those of a fresh run.

mod answers;
mod host;
mod properties;
mod reach;
mod steps;
#[path = "../support/valleys.rs"]
mod valleys;
