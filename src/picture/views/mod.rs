//! The pages of the instrument, one file for each: every one answers one question.
//!
//! All pages share the [frame]: the answer as one sentence on top, the day and the year under it, the dials along the
//! bottom. What was is dashed, what is with your changes is solid; colours mean water and lack, and a pattern or a
//! word always says the same.

pub mod about;
pub mod answer;
pub mod canals;
pub mod card;
mod dial_cards;
mod emblem;
pub mod facts;
mod foot;
pub mod frame;
pub mod grid;
pub mod hand;
pub mod help;
pub mod layout;
pub mod ledger;
pub mod lesson;
pub mod many_years;
mod months;
pub mod page_answer;
mod ring_strip;
pub mod scene;
pub mod season;
pub mod setting_list;
mod sheets;
pub mod staff;
pub mod stroll;
pub mod term;
pub mod test_card;
pub mod touch;
pub mod trust;
pub mod valley;
pub mod wording;

use embedded_graphics::geometry::OriginDimensions;

pub use answer::Answer;
pub use layout::{Form, Layout};
pub use scene::Scene;

use super::Canvas;

/// A page of the instrument.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum View {
    /// Where the water is on one day.
    Valley,
    /// How the year goes.
    Season,
    /// Who gets water, and until when.
    Canals,
    /// Where every drop went.
    Ledger,
    /// How all the years went.
    Years,
    /// What warming and rain do together.
    Grid,
    /// How far the model can be believed.
    Trust,
    /// What this is, and is not for.
    About,
    /// A step of a lesson.
    Lesson,
}

impl View {
    /// Every page, in order.
    pub const ALL: [Self; 9] = [
        Self::Valley,
        Self::Season,
        Self::Canals,
        Self::Ledger,
        Self::Years,
        Self::Grid,
        Self::Trust,
        Self::About,
        Self::Lesson,
    ];

    /// Its stable key, also the end of its message `view-…`.
    pub const fn key(self) -> &'static str {
        match self {
            Self::Valley => "valley",
            Self::Season => "season",
            Self::Canals => "canals",
            Self::Ledger => "ledger",
            Self::Years => "years",
            Self::Grid => "grid",
            Self::Trust => "trust",
            Self::Lesson => "lesson",
            Self::About => "about",
        }
    }
}

/// The layout that the pages use on this canvas for this scene.
pub fn layout_of(canvas: &Canvas<'_>, scene: &Scene<'_>) -> Layout {
    Layout::of(canvas.size(), scene.second.is_some())
}
