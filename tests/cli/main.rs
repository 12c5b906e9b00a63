//! Drives the real program, each test in a fresh folder.

mod checking;
mod fit;
mod golden;
mod languages;
mod map;
mod numbers;
mod output;
mod refusals;
mod support;
mod weather;
