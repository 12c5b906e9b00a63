//! What survives a power cut: settings, guesses and the tally, each a file that is whole or as it was.
//!
//! # A file
//!
//! Every file begins with one line, `deshielo-keep FORMAT SERIAL LENGTH SUM`: the format, a number that goes up with every
//! save, the length of what follows in bytes and its CRC-32. What follows is JSON that a person can read. A file that does
//! not fit its first line is damaged, whatever the reason.
//!
//! # A save ([`Slot::save`])
//!
//! 1. The new text is written whole to `NAME.new`, and file and folder are brought to the card.
//! 2. The good `NAME` becomes `NAME.last`, and the folder is brought to the card.
//! 3. `NAME.new` becomes `NAME`, and the folder is brought to the card again.
//!
//! # A start ([`Slot::open`])
//!
//! Of `NAME`, `NAME.new` and `NAME.last` the whole one with the highest serial is taken. At whatever operation the power
//! goes, that is the old state or the new one; `tests/kiosk/cuts.rs` cuts at every operation in turn, loses every part of
//! what had not been brought to the card, and tears renames apart as a file system without a journal may. A damaged
//! `NAME` is set aside as `NAME.damaged`, said, and the instrument goes on with the last good copy, or afresh.
//!
//! A full card, a card that can only be read and a folder that is not there are told by [`Trouble`] and change nothing
//! that was kept: the instrument goes on with what it has in memory and tries again later.

mod folder;
mod keeper;
mod layer;
mod pin;
mod seal;
mod settings;
mod slot;
mod tally;

pub use crate::session::lesson::Kept as Guesses;
pub use folder::Folder;
pub use keeper::{Keep, Kept, Note, Trouble};
pub use layer::FileLayer;
pub use pin::{LEAST_PIN_DIGITS, MOST_PIN_DIGITS, PinFault, PinHash};
pub use seal::{Damage, FORMAT, MOST_BYTES, seal, unseal};
pub use settings::{MOST_MESSAGE_LETTERS, Messages, Settings};
pub use slot::{Opened, Slot};
pub use tally::{Counts, DayCount, MOST_DAYS, MOST_NAMES, Tally};
