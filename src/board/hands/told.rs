//! What the thread of a hand tells: what the hand did, how it is, and what it reads.

use std::fmt;
use std::sync::Arc;

use super::HandEvent;

/// Why a hand that answers says nothing of use.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Stuck {
    /// A button has been down for longer than anybody holds one.
    Button,
    /// Only one contact of an encoder ever changes.
    OneContact,
    /// A potentiometer jumps to and fro faster than a hand can: its wiper hangs in the air.
    Loose,
}

/// How a hand is.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum HandState {
    /// It answers.
    There,
    /// It is not there, or no longer; what the system says. It is looked for again every few seconds.
    Lost(String),
    /// It answers, but cannot be right.
    Stuck(Stuck),
}

/// A reading as it came, for whoever looks for a fault.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Reading {
    /// Whether contact A and contact B of an encoder are closed.
    Contacts(bool, bool),
    /// Whether the contact of a button is closed.
    Contact(bool),
    /// The share of the supply at a potentiometer's wiper, 0 to 1.
    Share(f64),
}

/// What there is to tell.
#[derive(Clone, Debug, PartialEq)]
pub enum What {
    /// The hand did something.
    Did(HandEvent),
    /// The hand is otherwise than before.
    Is(HandState),
    /// The hand reads something else than before.
    Reads(Reading),
}

/// One thing told by one hand.
#[derive(Clone, Debug, PartialEq)]
pub struct HandTold {
    /// Which of [`BoardFile::hands`](crate::board::file::BoardFile::hands), from 0.
    pub hand: usize,
    /// Which part of it: the input of a converter; 1 for the button of an encoder; else 0.
    pub part: u8,
    /// What.
    pub what: What,
}

/// Whom the hands tell; cheap to clone, good in any thread.
#[derive(Clone)]
pub struct Listener(Arc<dyn Fn(HandTold) -> bool + Send + Sync>);

impl Listener {
    /// A listener that calls `take`, which says whether anybody still listens.
    pub fn new(take: impl Fn(HandTold) -> bool + Send + Sync + 'static) -> Self {
        Self(Arc::new(take))
    }

    /// Tells something; `false` where nobody listens any more, so that the hand may stop.
    pub fn tell(&self, hand: usize, part: u8, what: What) -> bool {
        (self.0)(HandTold { hand, part, what })
    }
}

impl fmt::Debug for Listener {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str("Listener")
    }
}
