//! From the slopes to the dam: a triangular unit hydrograph, then a Muskingum reach where the place has one.
//!
//! The hydrograph is an isosceles triangle of area 1, cut into days. The reach is McCarthy's (1938) Muskingum method
//! with a step of one day (Chow, Maidment & Mays 1988, *Applied Hydrology*, equations 8.4.7 to 8.4.10).

use super::lanes::{Lanes, Number};
use super::valley::{ChannelTraits, MOST_HYDROGRAPH_DAYS, ReachTraits};

/// Ordinates of the longest hydrograph.
pub const MOST_ORDINATES: usize = MOST_HYDROGRAPH_DAYS + 1;

/// The channel's constants.
#[derive(Clone, Copy, Debug)]
pub struct Channel<N = f64> {
    weights: [N; MOST_ORDINATES],
    /// Share of a day's flow that is still under way in the evening of that day, of the next, and so on.
    under_way: [N; MOST_ORDINATES],
    ordinates: usize,
    reach: Option<Reach<N>>,
}

/// Water under way, in the unit of what enters.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ChannelStore<N = f64> {
    /// What left the slopes yesterday, the day before, …
    recent: [N; MOST_ORDINATES],
    /// Yesterday's flow into and out of the reach.
    reach_in: N,
    reach_out: N,
}

impl<N: Number> Default for ChannelStore<N> {
    fn default() -> Self {
        let dry = N::splat(0.0);
        Self { recent: [dry; MOST_ORDINATES], reach_in: dry, reach_out: dry }
    }
}

/// Muskingum coefficients for a step of one day.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Reach<N = f64> {
    /// On today's inflow.
    pub on_inflow: N,
    /// On yesterday's inflow.
    pub on_earlier_inflow: N,
    /// On yesterday's outflow.
    pub on_earlier_outflow: N,
    travel_steps: N,
    inflow_weight: N,
}

impl Reach {
    /// No reach at all: what enters leaves, and nothing is held.
    const NONE: Reach = Reach {
        on_inflow: 1.0,
        on_earlier_inflow: 0.0,
        on_earlier_outflow: 0.0,
        travel_steps: 0.0,
        inflow_weight: 0.0,
    };

    /// Coefficients for travel time K and weight X, with K in steps.
    pub fn new(travel_steps: f64, inflow_weight: f64) -> Self {
        let denominator = 2.0 * travel_steps * (1.0 - inflow_weight) + 1.0;
        let twice_weighted = 2.0 * travel_steps * inflow_weight;
        Self {
            on_inflow: (1.0 - twice_weighted) / denominator,
            on_earlier_inflow: (1.0 + twice_weighted) / denominator,
            on_earlier_outflow: (2.0 * travel_steps * (1.0 - inflow_weight) - 1.0) / denominator,
            travel_steps,
            inflow_weight,
        }
    }

    /// Whether no coefficient is negative, so that no flow can be.
    pub fn is_stable(&self) -> bool {
        self.on_inflow >= 0.0 && self.on_earlier_outflow >= 0.0
    }
}

impl<N: Number> Reach<N> {
    /// Outflow of a step.
    #[inline(always)]
    pub fn route(&self, inflow: N, earlier_inflow: N, earlier_outflow: N) -> N {
        self.on_inflow * inflow + self.on_earlier_inflow * earlier_inflow + self.on_earlier_outflow * earlier_outflow
    }

    /// Water in the reach such that day after day its change is inflow less outflow: the method balances the means of
    /// two instants, so half of today's difference is on its way besides the prism and wedge `K (X·I + (1−X)·O)`.
    #[inline(always)]
    pub fn store(&self, inflow: N, outflow: N) -> N {
        let weighted = self.inflow_weight * inflow + (N::splat(1.0) - self.inflow_weight) * outflow;
        self.travel_steps * weighted + N::splat(0.5) * (inflow - outflow)
    }
}

impl From<&ReachTraits> for Reach {
    fn from(traits: &ReachTraits) -> Self {
        Self::new(traits.travel_days, traits.inflow_weight)
    }
}

/// Share of an isosceles triangle of base `base_days` and area 1 that has passed after `days`.
fn triangle_passed(days: f64, base_days: f64) -> f64 {
    let half = base_days / 2.0;
    if days <= 0.0 {
        0.0
    } else if days >= base_days {
        1.0
    } else if days <= half {
        let along = days / half;
        0.5 * along * along
    } else {
        let left = (base_days - days) / half;
        1.0 - 0.5 * left * left
    }
}

impl Channel {
    /// The channel of `traits`; a base beyond [`MOST_HYDROGRAPH_DAYS`] is for `place` to refuse.
    pub fn new(traits: &ChannelTraits) -> Self {
        let base_days = traits.unit_hydrograph_base_days;
        let ordinates = (libm::ceil(base_days) as usize).clamp(1, MOST_ORDINATES);
        let (mut weights, mut under_way) = ([0.0; MOST_ORDINATES], [0.0; MOST_ORDINATES]);
        for (day, weight) in weights.iter_mut().enumerate().take(ordinates) {
            let day = day as f64;
            *weight = triangle_passed(day + 1.0, base_days) - triangle_passed(day, base_days);
        }
        let mut left = 0.0;
        for (under_way, weight) in under_way.iter_mut().zip(&weights).take(ordinates).rev() {
            *under_way = left;
            left += weight;
        }
        Self { weights, under_way, ordinates, reach: traits.reach.as_ref().map(Reach::from) }
    }

    /// Share of a day's flow that arrives on the same day, the next, and so on.
    pub fn weights(&self) -> &[f64] {
        &self.weights[..self.ordinates]
    }
}

impl<const L: usize> Channel<Lanes<L>> {
    /// The channel of traits that differ from lane to lane.
    pub fn by_lane(traits: [&ChannelTraits; L]) -> Self {
        let lanes = traits.map(Channel::new);
        let reaches = lanes.map(|lane| lane.reach.unwrap_or(Reach::NONE));
        let of_reach = |read: fn(&Reach) -> f64| Lanes(reaches.each_ref().map(read));
        let reach = Reach {
            on_inflow: of_reach(|reach| reach.on_inflow),
            on_earlier_inflow: of_reach(|reach| reach.on_earlier_inflow),
            on_earlier_outflow: of_reach(|reach| reach.on_earlier_outflow),
            travel_steps: of_reach(|reach| reach.travel_steps),
            inflow_weight: of_reach(|reach| reach.inflow_weight),
        };
        Self {
            weights: core::array::from_fn(|day| Lanes(lanes.map(|lane| lane.weights[day]))),
            under_way: core::array::from_fn(|day| Lanes(lanes.map(|lane| lane.under_way[day]))),
            // A shorter hydrograph has weights of zero at its end, which add nothing.
            ordinates: lanes.iter().map(|lane| lane.ordinates).max().unwrap_or(1),
            reach: lanes.iter().any(|lane| lane.reach.is_some()).then_some(reach),
        }
    }
}

impl<N: Number> Channel<N> {
    /// One day: `generated` leaves the slopes, the result arrives at the dam.
    #[inline(always)]
    pub fn day(&self, store: &mut ChannelStore<N>, generated: N) -> N {
        let mut arrived = N::splat(0.0);
        for day in (1..self.ordinates.min(MOST_ORDINATES)).rev() {
            // The oldest flow first; each then grows a day older.
            arrived = arrived + self.weights[day] * store.recent[day - 1];
            store.recent[day] = store.recent[day - 1];
        }
        arrived = arrived + self.weights[0] * generated;
        store.recent[0] = generated;
        let Some(reach) = &self.reach else { return arrived };
        // The coefficients are not negative; rounding alone could leave a trace below zero.
        let outflow = reach.route(arrived, store.reach_in, store.reach_out).positive();
        store.reach_in = arrived;
        store.reach_out = outflow;
        outflow
    }

    /// Water under way.
    #[inline(always)]
    pub fn in_transit(&self, store: &ChannelStore<N>) -> N {
        let mut under_way = self.under_way[0] * store.recent[0];
        for day in 1..self.ordinates.saturating_sub(1).min(MOST_ORDINATES) {
            under_way = under_way + self.under_way[day] * store.recent[day];
        }
        match &self.reach {
            Some(reach) => under_way + reach.store(store.reach_in, store.reach_out),
            None => under_way,
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn channel(base_days: f64, reach: Option<ReachTraits>) -> Channel {
        Channel::new(&ChannelTraits { unit_hydrograph_base_days: base_days, reach })
    }

    #[test]
    fn weights_add_to_one_for_every_base() {
        for tenths in 1..=200 {
            let sum: f64 = channel(f64::from(tenths) / 10.0, None).weights().iter().sum();
            assert!((sum - 1.0).abs() < 1e-14, "base {tenths}/10 days: {sum}");
        }
        let weights = channel(2.5, None);
        for (got, want) in weights.weights().iter().zip([0.32, 0.60, 0.08]) {
            assert!((got - want).abs() < 1e-15);
        }
    }

    #[test]
    fn every_drop_in_comes_out_or_is_under_way() {
        let reach = ReachTraits { travel_days: 1.4, inflow_weight: 0.2 };
        let channel = channel(6.3, Some(reach));
        let mut store = ChannelStore::default();
        let (mut entered, mut left) = (0.0, 0.0);
        for day in 0..200 {
            let generated = if day % 7 < 3 { 5.0 + f64::from(day % 11) } else { 0.0 };
            entered += generated;
            left += channel.day(&mut store, generated);
            assert!((entered - left - channel.in_transit(&store)).abs() < 1e-9);
        }
    }

    #[test]
    fn a_reach_that_is_too_short_for_a_day_is_not_stable() {
        assert!(Reach::new(1.0, 0.2).is_stable());
        assert!(!Reach::new(0.4, 0.2).is_stable());
        assert!(!Reach::new(3.0, 0.4).is_stable());
    }
}
