//! How much natural flow a position along the river may still take.
//!
//! A claimant may take no more than the smallest flow in the reach at its position or in any reach further down: with
//! fewer reaches looked at, an upstream junior could take water that a senior below has been given. There is a reach
//! below every position, the dam and the river's end included; without the one at the dam the reservoir would store
//! returns that enter below it.
//!
//! Source: common practice, no source. Nonnegative flow in every reach is a set of nested limits, for which taking the
//! most in order of dates gives the largest outcome for each right in turn.

use super::bounds::least;

/// The smallest flow from each position down to the river's end, m³, kept current while claims are met.
///
/// Only that running minimum is kept, not the flows: a claim lowers it by the same amount from its position down, and
/// further up to the new minimum at most, since upstream flows have not changed. It never falls below zero, not even
/// by rounding, as no claim exceeds it.
pub(super) struct Reaches<'a> {
    room_m3: &'a mut [f64],
}

impl<'a> Reaches<'a> {
    /// Starts from the flows in each reach, which must not fall from one to the next: natural flow and what has come
    /// in so far.
    pub(super) fn new(flow_m3: &'a mut [f64]) -> Self {
        Self { room_m3: flow_m3 }
    }

    /// Takes what a position wants as far as there is room, and returns it.
    #[inline(always)]
    pub(super) fn claim(&mut self, position: usize, want_m3: f64) -> f64 {
        let (above, below) = self.room_m3.split_at_mut(position);
        let take = least(below[0], want_m3);
        if take > 0.0 {
            for room in below.iter_mut() {
                *room -= take;
            }
            let smallest = below[0];
            for room in above.iter_mut().rev() {
                // Room does not grow upstream, so the rest is no larger.
                if *room <= smallest {
                    break;
                }
                *room = smallest;
            }
            take
        } else {
            0.0
        }
    }

    /// Flow at the river's end that nobody has claimed, m³.
    #[inline(always)]
    pub(super) fn unclaimed_at_end_m3(&self) -> f64 {
        self.room_m3[self.room_m3.len() - 1]
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    /// The same claims on plain flows, searching every reach every time.
    fn naive(mut flow: Vec<f64>, claims: &[(usize, f64)]) -> Vec<f64> {
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
    fn running_minimum_agrees_with_a_search() {
        let flow = [60.0, 60.0, 85.0, 85.0, 110.0];
        let claims = [(3, 40.0), (1, 30.0), (4, 25.0), (0, 70.0), (2, 90.0)];
        let mut room = flow;
        let mut reaches = Reaches::new(&mut room);
        let takes: Vec<f64> = claims.iter().map(|&(position, want)| reaches.claim(position, want)).collect();
        assert_eq!(takes, naive(flow.to_vec(), &claims));
        assert_eq!(takes, [40.0, 30.0, 25.0, 15.0, 0.0]);
    }
}
