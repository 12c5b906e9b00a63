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
    pub(super) fn share_by_fraction<const WIDTH: usize>(
        &self,
        state: &mut RiverState,
        input: &RiverInput,
        morning: &Morning,
        out: &mut RiverDay,
    ) -> Shared {
        let n = self.gates.len();
        let entering = &out.entering_m3[1..n + 1];
        let wish = &out.wish_m3[..n];
        let arriving_share = if self.any_stored_loss { self.mean_arriving_share(wish) } else { 1.0 };
        let most = least(least(state.pool_m3, positive(self.outlet_m3 - morning.natural_m3)), input.stored_limit_m3);
        let most_arriving = most * arriving_share;

        // The flow below each gate with nothing taken; it limits the fraction where it is tighter than all above.
        let mut fraction = 1.0;
        let (mut flow, mut wished) = (morning.natural_m3, 0.0);
        for (entering, wish) in entering.iter().zip(wish) {
            flow += entering;
            wished += wish;
            if fraction * wished > flow + most_arriving {
                fraction = (flow + most_arriving) / wished;
            }
        }
        flow += out.entering_m3[n + 1];
        let reserved = if self.minimum_at_dam { 0.0 } else { least(flow, input.minimum_m3) };
        let end_flow = flow - reserved;
        if fraction * wished > end_flow + most_arriving {
            fraction = (end_flow + most_arriving) / wished;
        }

        // What the tightest reach has left, or lacks.
        let total = fraction * wished;
        let mut slack = least(morning.natural_m3, end_flow - total);
        (flow, wished) = (morning.natural_m3, 0.0);
        for (entering, wish) in entering.iter().zip(wish) {
            flow += entering;
            wished += wish;
            slack = least(slack, flow - fraction * wished);
        }
        let needed = positive(-slack);
        let (released, arriving) = if needed == 0.0 {
            (0.0, 0.0)
        } else if needed <= most_arriving {
            (needed / arriving_share, needed)
        } else {
            (most, most_arriving)
        };
        // The division above may round up past what there is.
        let released = least(released, most);
        let reservoir_take = least(positive(slack), self.reservoir_want_m3(input, morning));
        state.pool_m3 -= released;

        if morning.any_wish {
            let stored_share = if total > 0.0 { arriving / total } else { 0.0 };
            let released_share = if total > 0.0 { released / total } else { 0.0 };
            let wish = &out.wish_m3;
            let natural = &mut out.natural_take_m3;
            let stored = &mut out.stored_take_m3;
            let canal = &mut out.canal_m3;
            for i in 0..WIDTH {
                let flow = fraction * wish[i];
                canal[i] = flow;
                natural[i] = positive(flow - flow * stored_share);
                stored[i] = flow * released_share;
            }
            self.note_canals::<WIDTH>(state, out);
            out.canal_total_m3 = total;
        }
        out.fraction = Some(fraction);
        Shared {
            reservoir_take_m3: reservoir_take,
            reserved_at_end_m3: reserved,
            stored_release_m3: released,
            stored_arriving_m3: arriving,
            // Zero or more by the choice of the fraction, but for its rounding.
            natural_end_m3: positive(end_flow - total + arriving - reservoir_take) + reserved,
            outlet_left_m3: positive(self.outlet_left_m3(morning, reservoir_take) - released),
        }
    }

    /// The share of stored water that arrives: one less the mean of the gates' loss shares, weighted by wish.
    fn mean_arriving_share(&self, wish_m3: &[f64]) -> f64 {
        let (mut wished, mut lost) = (0.0, 0.0);
        for (wish, loss) in wish_m3.iter().zip(&self.stored_loss_share) {
            wished += wish;
            lost += wish * loss;
        }
        if wished > 0.0 { 1.0 - lost / wished } else { 1.0 }
    }
}
