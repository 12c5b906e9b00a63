//! The ring: everything that one encoder and one button can reach, in a circle.

use super::offer::Offer;
pub use crate::picture::views::hand::Item;
use crate::water::dials::DIALS;

/// Most things on the ring.
pub const MOST_ITEMS: usize = DIALS + 12;

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
