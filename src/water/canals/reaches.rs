//! How much natural flow a position along the river may take.
//!
//! Nobody may take more than the flow in the reach at the own position or in any reach further down, for what is taken
//! upstream is missing below. There is a reach below every position, the dam and the river's end included; without the
//! one at the dam the reservoir would store returns that enter below it.
//!
//! What is kept is not the flow in each reach but the unclaimed part of the water that comes in at each position: natural
//! flow at the dam, returns further down. What a position may take is the sum of that at and above it, and a claim is met
//! from the water that comes in nearest above it first. The two reckonings agree: the running smallest flow downstream
//! rises along the river by just these parts, and a claim lowers it from its position on by what is taken, and further
//! up to its new value at most. Nothing falls below zero here, not even by rounding.
//!
//! Source: common practice, no source. That no reach runs dry below zero is a set of nested limits, for which taking the
//! most in order of dates gives the largest outcome for each right in turn.

use super::MOST_POSITIONS;

/// The unclaimed part of the water that comes in at each position, m³.
pub(super) struct Reaches<'a>(pub(super) &'a mut [f64; MOST_POSITIONS]);

impl Reaches<'_> {
    /// Takes what a position wants as far as there is water for it, and returns it.
    #[inline(always)]
    pub(super) fn claim(&mut self, position: usize, want_m3: f64) -> f64 {
        let mut met = 0.0;
        let mut left = want_m3;
        for unclaimed in self.0[..=position].iter_mut().rev() {
            if left <= *unclaimed {
                *unclaimed -= left;
                return want_m3;
            }
            met += *unclaimed;
            left -= *unclaimed;
            *unclaimed = 0.0;
        }
        met
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    /// The same claims on plain flows, searching every reach every time.
    fn searched(entering: &[f64], claims: &[(usize, f64)]) -> Vec<f64> {
        let mut flow: Vec<f64> = (0..entering.len()).map(|j| entering[..=j].iter().sum()).collect();
        let mut takes = Vec::new();
        for &(position, want) in claims {
            let room = flow[position..].iter().copied().fold(f64::INFINITY, f64::min);
            let take = room.min(want).max(0.0);
            flow[position..].iter_mut().for_each(|f| *f -= take);
            takes.push(take);
        }
        takes
    }

    #[test]
    fn parts_agree_with_a_search_of_the_flows() {
        // All volumes are whole, so both are exact.
        let entering = [60.0, 0.0, 25.0, 0.0, 25.0, 7.0];
        let claims = [(3, 40.0), (1, 30.0), (5, 25.0), (4, 3.0), (0, 70.0), (2, 90.0)];
        for turn in 0..claims.len() {
            let mut order = claims;
            order.rotate_left(turn);
            let mut unclaimed = [0.0; MOST_POSITIONS];
            unclaimed[..6].copy_from_slice(&entering);
            let mut reaches = Reaches(&mut unclaimed);
            let takes: Vec<f64> = order.iter().map(|&(position, want)| reaches.claim(position, want)).collect();
            assert_eq!(takes, searched(&entering, &order));
            assert_eq!(unclaimed.iter().sum::<f64>(), 117.0 - takes.iter().sum::<f64>());
        }
    }
}
