//! Sharing by priority date.
//!
//! In order of dates each right takes what it wants from the natural flow as far as older rights leave room; a gate
//! wants no more than its decreed rate, the reservoir wants its room, the minimum wants its flow at the river's end.
//! Then, in the same order, each gate draws on its own account for what is still missing. The decreed rate limits
//! natural flow only; the canal limits the sum. Of two rights of one date the one further upstream comes first.
//!
//! Stored water loses a share of itself on its way from the dam to the gate: the account is debited for what leaves the
//! dam, which also is what uses the outlet.
//!
//! Source: common practice, no source.

use super::bounds::{least, positive};
use super::day::{Morning, Shared};
use super::reaches::Reaches;
use super::river::GateRule;
use super::{River, RiverDay, RiverInput, RiverState};

/// Stored water let go for one gate, and what of it arrives, m³.
#[inline(always)]
pub(super) fn draw(gate: &GateRule, short_m3: f64, held_m3: f64, available_m3: f64) -> (f64, f64) {
    let most = least(held_m3, available_m3);
    let wanted = short_m3 * gate.release_per_arriving;
    // What is missing arrives exactly, not but for rounding.
    if wanted <= most { (wanted, short_m3) } else { (most, most * gate.arriving_share) }
}

impl River {
    /// Shares the day's water by date.
    #[inline(always)]
    pub(super) fn share_by_date<const WIDTH: usize>(
        &self,
        state: &mut RiverState,
        input: &RiverInput,
        morning: &Morning,
        out: &mut RiverDay,
    ) -> Shared {
        let n = self.gates.len();
        let end = n + 1;
        let mut reaches = Reaches(&mut out.entering_m3);
        let reservoir_want = self.reservoir_want_m3(input, morning);
        let minimum_want = if self.minimum_at_dam { 0.0 } else { input.minimum_m3 };
        let (mut reservoir_take, mut reserved) = (0.0, 0.0);
        if morning.any_wish {
            // Most of the year only a town wishes for water: who wishes for none gets none, without a claim.
            for i in 0..WIDTH {
                out.natural_take_m3[i] = 0.0;
                out.stored_take_m3[i] = 0.0;
                out.canal_m3[i] = 0.0;
            }
            for &position in &self.date_order {
                let position = usize::from(position);
                if position == 0 {
                    reservoir_take = reaches.claim(0, reservoir_want);
                } else if position == end {
                    reserved = reaches.claim(end, minimum_want);
                } else if out.wish_m3[position - 1] > 0.0 {
                    let want = least(out.wish_m3[position - 1], self.gates[position - 1].decreed_m3);
                    out.natural_take_m3[position - 1] = reaches.claim(position, want);
                }
            }
        } else if self.minimum_before_reservoir {
            reserved = reaches.claim(end, minimum_want);
            reservoir_take = reaches.claim(0, reservoir_want);
        } else {
            reservoir_take = reaches.claim(0, reservoir_want);
            reserved = reaches.claim(end, minimum_want);
        }

        let mut outlet_left = self.outlet_left_m3(morning, reservoir_take);
        let (mut released, mut arriving) = (0.0, 0.0);
        if morning.any_wish {
            let mut available = least(outlet_left, input.stored_limit_m3);
            for &position in &self.date_order {
                let wishes = |&i: &usize| i < n && out.wish_m3[i] > 0.0;
                let Some(i) = usize::from(position).checked_sub(1).filter(wishes) else { continue };
                let short = positive(out.wish_m3[i] - out.natural_take_m3[i]);
                let (debited, arrived) = draw(&self.gates[i], short, state.account_m3[i], available);
                state.account_m3[i] -= debited;
                available -= debited;
                released += debited;
                arriving += arrived;
                out.stored_take_m3[i] = debited;
                out.canal_m3[i] = out.natural_take_m3[i] + arrived;
            }
            outlet_left = positive(outlet_left - released);
            out.canal_total_m3 = self.note_canals::<WIDTH>(state, out);
        }
        Shared {
            reservoir_take_m3: reservoir_take,
            reserved_at_end_m3: reserved,
            stored_release_m3: released,
            stored_arriving_m3: arriving,
            natural_end_m3: self.natural_end_m3::<WIDTH>(morning, out, reservoir_take),
            outlet_left_m3: outlet_left,
        }
    }
}
