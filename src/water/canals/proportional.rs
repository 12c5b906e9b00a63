//! Sharing by one fraction for everyone.
//!
//! The minimum comes first. Then every gate gets the same fraction of its wish: the largest that natural flow and the
//! one pool can carry in every reach. The pool gives no more than that needs, and the reservoir takes what no reach
//! needs. It is strictly one fraction: where an upper reach is the tightest, returns that come in lower pass unused.
//!
//! All canals carry the same mix of natural and stored water. Stored water loses, on its way, the day's mean of the
//! gates' loss shares weighted by their wishes; which drop goes to which gate cannot be told in a pool.
//!
//! Source: common practice, no source.

use super::bounds::{least, positive};
use super::day::{Morning, Shared};
use super::{River, RiverDay, RiverInput, RiverState};

impl River {
    /// Shares the day's water by one fraction.
    pub(super) fn share_by_fraction(
        &self,
        state: &mut RiverState,
        input: &RiverInput,
        morning: &Morning,
        out: &mut RiverDay,
    ) -> Shared {
        let n = self.gates.len();
        let flow = &mut out.room_m3[..n + 2];
        let mut reserved = 0.0;
        if !self.minimum_at_dam {
            reserved = least(flow[n + 1], input.minimum_m3);
            flow[n + 1] -= reserved;
        }
        let wish = &out.wish_m3[..n];
        let arriving_share = self.mean_arriving_share(wish);
        let most = least(least(state.pool_m3, positive(self.outlet_m3 - morning.natural_m3)), input.stored_limit_m3);
        let most_arriving = most * arriving_share;

        // A reach limits the fraction only where it is tighter than all before; the last one adds no wish.
        let mut fraction = 1.0;
        let mut wished = 0.0;
        for (flow, wish) in flow[1..].iter().zip(wish.iter().chain(&[0.0])) {
            wished += wish;
            let carried = flow + most_arriving;
            if fraction * wished > carried {
                fraction = carried / wished;
            }
        }
        let mut slack = flow[0];
        wished = 0.0;
        for (flow, wish) in flow[1..].iter().zip(wish.iter().chain(&[0.0])) {
            wished += wish;
            slack = least(slack, flow - fraction * wished);
        }
        let needed = positive(-slack);
        let (released, arriving) =
            if needed <= most_arriving { (needed / arriving_share, needed) } else { (most, most_arriving) };
        // The division above may round up past what there is.
        let released = least(released, most);
        let reservoir_take = least(positive(slack), self.reservoir_want_m3(input, morning));
        state.pool_m3 -= released;

        let total = fraction * wished;
        let stored_share = if total > 0.0 { arriving / total } else { 0.0 };
        let released_share = if total > 0.0 { released / total } else { 0.0 };
        for (i, wish) in wish.iter().enumerate() {
            let canal = fraction * wish;
            out.canal_m3[i] = canal;
            out.natural_take_m3[i] = positive(canal - canal * stored_share);
            out.stored_take_m3[i] = canal * released_share;
            state.drawn_this_year_m3[i] += canal;
        }
        out.canal_total_m3 = total;
        out.fraction = Some(fraction);
        Shared {
            reservoir_take_m3: reservoir_take,
            reserved_at_end_m3: reserved,
            stored_release_m3: released,
            stored_arriving_m3: arriving,
            // Zero or more by the choice of the fraction, but for its rounding.
            natural_end_m3: positive(flow[n + 1] - total + arriving - reservoir_take) + reserved,
            outlet_left_m3: positive(self.outlet_left_m3(morning, reservoir_take) - released),
        }
    }

    /// The share of stored water that arrives: one less the mean of the gates' loss shares, weighted by wish.
    #[inline(always)]
    fn mean_arriving_share(&self, wish_m3: &[f64]) -> f64 {
        if !self.any_stored_loss {
            return 1.0;
        }
        let (mut wished, mut lost) = (0.0, 0.0);
        for (wish, gate) in wish_m3.iter().zip(&self.gates) {
            wished += wish;
            lost += wish * gate.stored_loss_share;
        }
        if wished > 0.0 { 1.0 - lost / wished } else { 1.0 }
    }
}
