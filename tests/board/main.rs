//! The board: its file, its screens byte by byte, and what happens when they are lost.

#[path = "../support/goldens.rs"]
mod goldens;
#[path = "../support/scenes.rs"]
mod scenes;
#[path = "../support/valleys.rs"]
mod valleys;

#[cfg(all(feature = "board", target_os = "linux"))]
mod dial_turn;
mod examples;
#[cfg(all(feature = "board", target_os = "linux"))]
mod fake_panel;
mod frames;
mod inputs;
mod knobs;
mod losing;
mod memory;
mod mistakes;
#[cfg(all(feature = "board", target_os = "linux"))]
mod panels;
mod wiring;
