//! What comes in from the hands: turns, presses, touches, keys and time.

use super::command::Command;
use super::keys::Key;
use super::ring::Item;
use super::view::View;
use crate::water::dials::Dial;

/// Something that happened. The world outside sends [`Event::Tick`] with the time gone by before each of the others.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Event {
    /// The one encoder was turned; `since_ms` is the time since its last turn, for acceleration (`u32::MAX` where it
    /// is not known).
    Turn {
        /// Detents, to the right above 0.
        detents: i32,
        /// Milliseconds since the last turn of the same encoder.
        since_ms: u32,
    },
    /// The button was pressed and let go.
    Press,
    /// The button was held.
    LongPress,
    /// A dial with an encoder of its own was turned.
    TurnDial {
        /// Which.
        dial: Dial,
        /// Detents, to the right above 0.
        detents: i32,
        /// Milliseconds since the last turn of the same encoder.
        since_ms: u32,
    },
    /// A dial with a potentiometer of its own stands at a share of its way, 0 to 1.
    SetDial {
        /// Which.
        dial: Dial,
        /// Share of the way from the first stop to the last.
        share: f64,
    },
    /// A key.
    Key(Key),
    /// A finger, or a mouse button, went down on something.
    TouchDown(Target),
    /// It moved. While it holds a dial the picture says where it is along that dial, even beyond its edge.
    TouchMove(Target),
    /// It was lifted.
    TouchUp(Target),
    /// A command from elsewhere: a lesson, a script, a button with one meaning.
    Command(Command),
    /// Time went by.
    Tick {
        /// Milliseconds since the last tick.
        elapsed_ms: u32,
    },
}

/// What lies under a finger, as the picture that drew it knows.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Target {
    /// A dial, and how far along it, 0 to 1. A tap chooses it, a drag turns it.
    Dial {
        /// Which.
        dial: Dial,
        /// Share of the way from the first stop to the last; below 0 and above 1 beyond its edges.
        share: f64,
    },
    /// A day of the season line, counted from 0 on the first day of the water year.
    Day(u16),
    /// A year, counted from 0 in the record's whole water years.
    Year(usize),
    /// The tab of a view.
    View(View),
    /// A thing on the ring.
    Item(Item),
    /// An entry of the list of settings, counted from 0.
    Setting(usize),
    /// A term of the view that can be explained, counted from 0.
    Term(u16),
    /// A button.
    Button(Command),
    /// A card that lies over the view.
    Card,
    /// Nothing that can be touched.
    Nothing,
}
