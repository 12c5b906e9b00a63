//! What a warmer, drier or thirstier year does to a valley's own snow, reservoir and canals.
//!
//! `water` and `signs` need neither the standard library nor an allocator; everything that touches files or words is
//! behind the `std` feature. `DEVELOPERS.md` has the map of the house and says what may import what.
#![cfg_attr(not(feature = "std"), no_std)]

pub mod picture;
pub mod signs;
pub mod water;

#[cfg(feature = "std")]
pub mod board;
#[cfg(feature = "std")]
pub mod bundle;
#[cfg(feature = "std")]
pub mod commands;
#[cfg(feature = "std")]
pub mod fit;
#[cfg(feature = "std")]
pub mod generator;
#[cfg(feature = "pdf")]
pub mod handout;
#[cfg(feature = "std")]
pub mod keep;
#[cfg(feature = "std")]
pub mod lesson;
#[cfg(feature = "std")]
pub mod open_data;
#[cfg(feature = "std")]
pub mod place;
#[cfg(feature = "std")]
pub mod session;
#[cfg(feature = "std")]
pub mod whatif;
#[cfg(feature = "std")]
pub mod words;
