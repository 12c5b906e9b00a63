//! The ring: everything that one encoder and one button can reach, in a circle.

use super::offer::Offer;
use crate::water::dials::{DIALS, Dial};

/// Most things on the ring.
pub const MOST_ITEMS: usize = DIALS + 12;

/// A thing on the ring.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Item {
    /// A dial; turning it changes the valley.
    Dial(Dial),
    /// Which view is shown.
    View,
    /// Which year is shown.
    Year,
    /// Which day of the year is marked.
    Day,
    /// Play the year day by day, and how fast.
    Play,
    /// Keep what is dialled now beside what comes, or let it go. Acts at once.
    Keep,
    /// Named settings.
    Settings,
    /// Take back the last turn, reset or recall; once more brings it again. Acts at once.
    Undo,
    /// Explain the words of the view and the dials. Acts at once.
    Words,
    /// The language, or two at once.
    Language,
    /// The units.
    Units,
    /// The colours.
    Shade,
    /// The help card. Acts at once.
    Help,
}

impl Item {
    /// Whether a press on the ring acts at once, with nothing to turn inside.
    pub const fn acts_at_once(self) -> bool {
        matches!(self, Item::Keep | Item::Undo | Item::Words | Item::Help)
    }
}

/// The things that are offered, in the order of the ring.
pub(super) fn ring(offer: &Offer) -> heapless::Vec<Item, MOST_ITEMS> {
    let dials = offer.dials().map(Item::Dial);
    let others = [
        Item::View,
        Item::Year,
        Item::Day,
        Item::Play,
        Item::Keep,
        Item::Settings,
        Item::Undo,
        Item::Words,
        Item::Language,
        Item::Units,
        Item::Shade,
        Item::Help,
    ];
    // There is room for all: ten dials and twelve others.
    dials.chain(others).take(MOST_ITEMS).collect()
}
