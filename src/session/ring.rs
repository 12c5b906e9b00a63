//! The ring: everything that one encoder and one button can reach, in a circle.

use super::offer::Offer;
use super::view::View;
pub use crate::picture::views::hand::Item;
use crate::water::dials::DIALS;

/// Most things on the ring.
pub const MOST_ITEMS: usize = DIALS + 15;

/// The things that are offered on a view, in the order of the ring.
pub(super) fn ring(offer: &Offer, view: View) -> heapless::Vec<Item, MOST_ITEMS> {
    let dials = offer.dials().map(Item::Dial);
    let has_map = view == View::Grid && offer.map().usual().is_some();
    let of_map = [Item::MapSign, Item::MapAcross, Item::MapUp].into_iter().filter(|_| has_map);
    let others = [
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
    // A map is of all years: it has neither a year nor a day.
    let others = others.into_iter().filter(|item| !has_map || !matches!(item, Item::Year | Item::Day | Item::Play));
    // There is room for all: ten dials and fifteen others.
    dials.chain([Item::View]).chain(of_map).chain(others).take(MOST_ITEMS).collect()
}
