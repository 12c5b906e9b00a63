//! Wet and dry days: a two-state Markov chain of first order (as in Richardson 1981).

/// A chain of wet and dry days with constant chances.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct WetDayChain {
    /// Chance of a wet day after a dry one (0–1).
    pub dry_to_wet: f64,
    /// Chance of a wet day after a wet one (0–1).
    pub wet_to_wet: f64,
}

impl WetDayChain {
    /// The chain with a given long-run share of wet days and a given day-to-day correlation of wetness.
    pub fn from_share(wet_share: f64, persistence: f64) -> Self {
        Self { dry_to_wet: wet_share * (1.0 - persistence), wet_to_wet: wet_share + persistence * (1.0 - wet_share) }
    }

    /// Share of wet days in the long run: p01 / (1 + p01 − p11).
    pub fn wet_share(&self) -> f64 {
        self.dry_to_wet / (1.0 + self.dry_to_wet - self.wet_to_wet)
    }

    /// Correlation between the wetness of one day and of the next: p11 − p01.
    pub fn persistence(&self) -> f64 {
        self.wet_to_wet - self.dry_to_wet
    }

    /// Mean length of a run of wet days, in days.
    pub fn mean_wet_spell_days(&self) -> f64 {
        1.0 / (1.0 - self.wet_to_wet)
    }

    /// Mean length of a run of dry days, in days.
    pub fn mean_dry_spell_days(&self) -> f64 {
        1.0 / self.dry_to_wet
    }

    /// Chance of a wet day after the given kind of day.
    pub fn chance_after(&self, wet_yesterday: bool) -> f64 {
        if wet_yesterday { self.wet_to_wet } else { self.dry_to_wet }
    }
}
