//! What the one knob has in hand, and the ring of everything that it can reach, as plain data.

use super::View;
use super::setting_list::SettingList;
use crate::water::dials::Dial;

/// A thing on the ring.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Item {
    /// A dial; turning it changes the valley.
    Dial(Dial),
    /// Which view is shown.
    View,
    /// Which number the map of two dials is coloured by.
    MapSign,
    /// Which dial the map has from left to right.
    MapAcross,
    /// Which dial the map has from bottom to top.
    MapUp,
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

    /// Whether it is there on the map of two dials alone.
    pub const fn is_of_map(self) -> bool {
        matches!(self, Item::MapSign | Item::MapAcross | Item::MapUp)
    }

    /// The message that names it; dials have names of their own.
    pub(super) const fn message(self) -> Option<&'static str> {
        Some(match self {
            Item::Dial(_) => return None,
            Item::View => "ring-view",
            Item::MapSign => "ring-map-sign",
            Item::MapAcross => "ring-map-across",
            Item::MapUp => "ring-map-up",
            Item::Year => "ring-year",
            Item::Day => "ring-day",
            Item::Play => "ring-play",
            Item::Keep => "ring-keep",
            Item::Settings => "ring-settings",
            Item::Undo => "ring-undo",
            Item::Words => "ring-words",
            Item::Language => "ring-language",
            Item::Units => "ring-units",
            Item::Shade => "ring-shade",
            Item::Help => "ring-help",
        })
    }
}

/// Where the encoder's turns go.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Focus {
    /// Into this thing: turning changes it.
    In(Item),
    /// Along the ring, which lies open at this thing: a press goes in.
    Ring(Item),
}

impl Focus {
    /// Whether a dial is in hand, as it is when nothing else is open.
    pub const fn is_in_dial(self) -> bool {
        matches!(self, Focus::In(Item::Dial(_)))
    }

    /// Whether it is at this thing, in it or on the ring.
    pub fn is_at(self, item: Item) -> bool {
        let (Focus::In(other) | Focus::Ring(other)) = self;
        other == item
    }
}

/// An end of what can be turned through.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum End {
    /// The lowest, or the first.
    First,
    /// The highest, or the last.
    Last,
}

/// What the hand is at, for a frame.
#[derive(Clone, Copy, Debug)]
pub struct Hand<'a> {
    /// Where turns go.
    pub focus: Focus,
    /// The ring in its order; needed while it lies open.
    pub ring: &'a [Item],
    /// The pages that can be shown, in order.
    pub pages: &'a [View],
    /// The last turn wanted to go beyond this end.
    pub end: Option<End>,
    /// How the thing at hand stands, in words; empty for a dial, the year and the day, which the scene has.
    pub stands: &'a str,
    /// The place of the thing at hand in its own list, and how long that is.
    pub place: Option<(usize, usize)>,
    /// What is said at the foot instead of the place's name, in one language or two with a line feed between; empty for
    /// nothing.
    pub note: &'a str,
    /// The list of settings, while it is open.
    pub list: Option<SettingList<'a>>,
}

impl Default for Hand<'_> {
    /// A dial in hand and every page on offer.
    fn default() -> Self {
        Self {
            focus: Focus::In(Item::Dial(Dial::Warming)),
            ring: &[],
            pages: &View::ALL,
            end: None,
            stands: "",
            place: None,
            note: "",
            list: None,
        }
    }
}
