//! The views, the themes and the speeds of play: short lists that a person steps through.

use serde::{Deserialize, Serialize};

/// How many views there are.
pub const VIEWS: usize = 9;

/// A page of the picture. Which of them are offered is the host's to say ([`super::Offer`]).
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum View {
    /// The valley from mountain to river.
    Valley,
    /// Snow, inflow, storage and deliveries over the year.
    Season,
    /// Each canal's year as a strip.
    Canals,
    /// Every drop accounted.
    Ledger,
    /// Every year of the record.
    Years,
    /// Two dials against each other.
    Grid,
    /// How far the model has been right.
    Trust,
    /// What this is, what it is not, and the cautions.
    About,
    /// The steps of a lesson.
    Lesson,
}

impl View {
    /// Every view, in the order in which people meet them.
    pub const ALL: [View; VIEWS] = [
        View::Valley,
        View::Season,
        View::Canals,
        View::Ledger,
        View::Years,
        View::Grid,
        View::Trust,
        View::About,
        View::Lesson,
    ];
}

/// A set of colours.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum Shade {
    /// For rooms.
    Light,
    /// For dark rooms.
    Dark,
    /// High contrast, for the sun.
    Sunlight,
}

impl Shade {
    /// Every set.
    pub const ALL: [Shade; 3] = [Shade::Light, Shade::Dark, Shade::Sunlight];
}

/// How fast the year plays.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum Speed {
    /// A year in about a minute and a half.
    Slow,
    /// A year in half a minute.
    Middling,
    /// A year in ten seconds.
    Fast,
}

impl Speed {
    /// Every speed, slowest first.
    pub const ALL: [Speed; 3] = [Speed::Slow, Speed::Middling, Speed::Fast];

    /// Days that pass in a second.
    pub const fn days_per_second(self) -> u32 {
        match self {
            Speed::Slow => 4,
            Speed::Middling => 12,
            Speed::Fast => 36,
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn lists_stand_in_their_own_order() {
        for (index, view) in View::ALL.into_iter().enumerate() {
            assert_eq!(view as usize, index);
        }
        assert!(Speed::ALL.windows(2).all(|pair| pair[0].days_per_second() < pair[1].days_per_second()));
    }
}
