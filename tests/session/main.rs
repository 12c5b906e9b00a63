//! The session: what events do, what must always hold, what can be reached, and that answers are those of a fresh run.

mod answers;
mod host;
mod map;
mod pointer;
mod properties;
mod reach;
#[path = "../support/scenes.rs"]
mod scenes;
mod steps;
#[path = "../support/valleys.rs"]
mod valleys;
