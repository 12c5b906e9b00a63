//! One file that carries a place, its lessons, more languages and a board file to another computer, checked by sums.
//!
//! # The file
//!
//! A zip archive that any computer can look into. Its first member, `SUMS`, begins with `deshielo-bundle FORMAT` and then
//! lists every other member: SHA-256, length in bytes, name. Times and owners are not kept and members are in the order
//! of their names, so the same content is always the same bytes.
//!
//! | member | what it is |
//! |---|---|
//! | `place/...` | the folder of a place |
//! | `lessons/NAME.toml` | lessons |
//! | `locales/TAG/NAME.ftl` | words that go before those of the program |
//! | `board.toml` | which screens and hands the board has |
//!
//! # Opening ([`unpack`])
//!
//! A stick may hold anything. Nothing is taken from a bundle but what `SUMS` lists, under names that can lead nowhere else
//! ([`MemberName`]), in sizes that a small board can bear; links, doubled names, hidden members and what only looks like
//! one archive to one program and another to the next are refused. All of it arrives or nothing does.
//!
//! # On an unattended board ([`Shelf`])
//!
//! A new bundle is on trial until it has started well. One that does not start twice is left, and the one before is back.

mod contents;
mod fault;
mod name;
mod pack;
mod shelf;
mod sums;
mod unpack;

pub use contents::Contents;
pub use fault::Fault;
pub use name::{MemberName, Part};
pub use shelf::{Began, Shelf, bundles_on};
pub use unpack::unpack;

/// The format that this program writes and the newest that it opens.
pub const FORMAT: u32 = 1;
/// What a bundle's file name ends in.
pub const EXTENSION: &str = "zip";
/// Most members beside the list of sums.
pub const MOST_MEMBERS: usize = 400;
/// Longest member, bytes: a century of daily records takes a third of it.
pub const MOST_MEMBER_BYTES: u64 = 16 << 20;
/// All members together, bytes.
pub const MOST_BYTES: u64 = 48 << 20;
/// Longest file of a bundle, bytes.
pub const MOST_FILE_BYTES: u64 = 24 << 20;
/// The member that lists the others.
const SUMS: &str = "SUMS";
