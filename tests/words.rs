//! The words: every locale is whole, and numbers, units and dates are written as each region writes them.
#![cfg(feature = "std")]

#[path = "words/locales.rs"]
mod locales;
#[path = "words/voice.rs"]
mod voice;
#[path = "words/writing.rs"]
mod writing;
