//! The running instrument: an event in, a new state out, and the answers that the water gives to it.
//!
//! # One encoder, one button
//!
//! Everything can be reached with three movements, which is all that the help card has to say:
//!
//! - **Turn** changes the thing in hand. At the start that is the first dial, so that the first turn of a stranger
//!   already moves the valley.
//! - **Press** goes out to the *ring*, a circle of everything there is (each dial, then view, year, day, play, keep
//!   beside, settings, undo, words, language, units, colours, help). On the ring a turn goes from thing to thing and a
//!   press takes the one at hand. While the map of two dials is on show, its number and its two sides are on the ring
//!   as well. Four of them act at once (keep beside, undo, words, help) and lead straight back to
//!   the dial in hand. In the list of settings a press does what the entry says; the first entry goes back. A press
//!   closes a card.
//! - **Hold** sets everything back as it was, from anywhere: all dials at rest, nothing beside, no card, the year
//!   paused. View, year, language, units and colours stay, and undo brings the rest back.
//!
//! Fast turns go further ([`knob`]). Dials, days, years and lists stop at their ends and say so ([`Shown::at_end`]);
//! the ring, views, languages and colours go round. Keys are a table ([`keys::KEYS`]); in a list, on a card and
//! on the ring arrows go the way they point. A finger taps to choose and drags to turn ([`point::Finger`]); the picture
//! says what lies under it. What the hand is at, what was just done and how to go on is said at the foot ([`hand`]).
//!
//! # Undo
//!
//! One step back: the last turn of a dial (all detents without a pause of 1.5 s are one turn), the last reset or the
//! last setting called up. Undo twice and it is done again. What else changed since then (the view, the language, the
//! day) stays.
//!
//! # What the host does
//!
//! It makes an [`Offer`] from the place and the run as it was, sends an [`Event::Tick`] with the time gone by before
//! each other event, hands the [`State`] to the picture when [`Needs::redraw`] says so, and asks [`Answers`]
//! when [`Needs::answer`] does. The state is a value of fixed size without clock, words or water: the same events give
//! the same state anywhere. A lesson leads by sending [`Event::Command`]s and by handing in a narrower offer ([`State::refit`]); its guesses
//! and steps are its own and stand beside this state, not in it.

mod act;
pub mod answer;
mod calendar;
mod command;
mod event;
pub mod hand;
pub mod help;
pub mod keys;
pub mod kiosk;
pub mod knob;
pub mod lesson;
mod map;
mod needs;
mod offer;
pub mod point;
mod refit;
mod ring;
mod scale;
pub mod scene;
mod setting;
mod state;
mod touch;
mod turn;
mod view;
mod whereabouts;
mod year;

pub use answer::Answers;
pub use command::Command;
pub use event::{Event, Target};
pub use knob::End;
pub use map::{MapChoice, MapOffer};
pub use needs::Needs;
pub use offer::{Offer, OfferFault, OfferInput, Voice};
pub use refit::Refit;
pub use ring::{Item, MOST_ITEMS};
pub use scale::{DialScale, MOST_STOPS};
pub use setting::{MOST_OWN_SETTINGS, Misfit, NamedSetting, OwnSettings, Setting, SettingEntry};
pub use state::{Act, Card, Done, Explained, Focus, Invalid, Shown, State, Undo};
pub use turn::TURN_ENDS_MS;
pub use view::{Shade, Speed, VIEWS, View};
pub use whereabouts::{Look, Whereabouts};
pub use year::{Third, YearChoice, YearList};
