//! Languages, numbers, units and dates: every word that a person can see.
//!
//! The words themselves live in `locales/` as Fluent messages; this module picks the language, fills in the arguments
//! and writes numbers, quantities and dates the way people of that region write them. `locales/README.md` says how the
//! folders are laid out and how to add a language.
//!
//! ```
//! use deshielo::words::{Quantity, Words};
//!
//! let (words, fallback) = Words::new("es-CL");
//! assert!(fallback.is_none());
//! assert_eq!(words.say("days-sooner", &[("n", 18.into())]), "18 días antes");
//! assert_eq!(words.number(12_345.6, 1), "12\u{202F}345,6");
//! let change = words.quantity(2.0, Quantity::TemperatureChange, words.system(), 2);
//! assert_eq!(change, "2\u{202F}°C");
//! ```

mod changes;
mod dates;
mod files;
mod language;
mod locales;
mod nearest;
mod numbers;
mod parity;
mod say;
mod units;

pub use dates::DateStyle;
pub use files::{EMBEDDED, LocaleFile};
pub use language::{Fallback, FallbackKind, KNOWN_TAGS};
pub use locales::{LocaleProblem, LocaleProblemKind, Locales};
pub use nearest::nearest;
pub use numbers::NumberStyle;
pub use parity::{Shape, SyntaxError, shapes};
pub use say::{SayError, Value, Words};
pub use units::{Quantity, System, Unit};
