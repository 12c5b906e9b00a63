//! Two ground stores that empty exponentially: the quick one feeds the river and, up to a limit, the slow one.
//!
//! Linear stores in exact exponential form: over a day without inflow a store of residence time T gives
//! `store · (1 − exp(−1/T))`. The day's input enters first.

use super::lanes::{Lanes, Number};
use super::valley::GroundTraits;

/// Water in the two stores, mm.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct GroundStores<N = f64> {
    /// Quick store, mm.
    pub quick_mm: N,
    /// Slow store, mm.
    pub slow_mm: N,
}

/// What the ground gives in a day, mm.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct GroundDay<N = f64> {
    /// Water passed from the quick to the slow store.
    pub percolation_mm: N,
    /// Flow of the quick store.
    pub quick_flow_mm: N,
    /// Flow of the slow store.
    pub slow_flow_mm: N,
}

/// The stores' constants.
#[derive(Clone, Copy, Debug)]
pub struct Ground<N = f64> {
    quick_share: N,
    slow_share: N,
    percolation_mm_day: N,
}

/// Share of a linear store that flows out in a day; 1 for a residence time of 0.
pub fn daily_share(residence_days: f64) -> f64 {
    if residence_days > 0.0 { -libm::expm1(-1.0 / residence_days) } else { 1.0 }
}

impl Ground {
    /// The stores of `traits`.
    pub fn new(traits: &GroundTraits) -> Self {
        Self {
            quick_share: daily_share(traits.quick_days),
            slow_share: daily_share(traits.slow_days),
            percolation_mm_day: traits.percolation_mm_day,
        }
    }
}

impl<const L: usize> Ground<Lanes<L>> {
    /// The stores of traits that differ from lane to lane.
    pub fn by_lane(traits: [&GroundTraits; L]) -> Self {
        let lanes = traits.map(Ground::new);
        Self {
            quick_share: Lanes(lanes.map(|lane| lane.quick_share)),
            slow_share: Lanes(lanes.map(|lane| lane.slow_share)),
            percolation_mm_day: Lanes(lanes.map(|lane| lane.percolation_mm_day)),
        }
    }
}

impl<N: Number> Ground<N> {
    /// One day with `recharge_mm` from the soil.
    #[inline(always)]
    pub fn day(&self, stores: &mut GroundStores<N>, recharge_mm: N) -> GroundDay<N> {
        let quick_mm = stores.quick_mm + recharge_mm;
        let percolation_mm = self.percolation_mm_day.least(quick_mm);
        let quick_mm = quick_mm - percolation_mm;
        let quick_flow_mm = self.quick_share * quick_mm;
        let slow_mm = stores.slow_mm + percolation_mm;
        let slow_flow_mm = self.slow_share * slow_mm;
        // A share of at most 1 leaves nothing below zero, rounded or not.
        *stores = GroundStores { quick_mm: quick_mm - quick_flow_mm, slow_mm: slow_mm - slow_flow_mm };
        GroundDay { percolation_mm, quick_flow_mm, slow_flow_mm }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_daily_share_is_the_exponential_one() {
        // 1 − exp(−1/10); the worked return store of the river accounting gives 16 × this = 1.5226013114246477.
        assert!((16.0 * daily_share(10.0) - 1.522_601_311_424_647_7).abs() < 1e-14);
        assert_eq!(daily_share(0.0), 1.0);
    }

    #[test]
    fn half_a_day_twice_is_a_day_once() {
        // The exact form does not depend on the length of the step: exp(−1/(2T))² = exp(−1/T).
        let half = 1.0 - daily_share(2.0 * 7.0);
        assert!((half * half - (1.0 - daily_share(7.0))).abs() < 1e-15);
    }
}
