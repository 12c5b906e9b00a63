//! Sharing by turns.
//!
//! Each gate has the river for whole days in turn. The turn carries the demand of the whole cycle, as far as the canal
//! holds it; water missed in one turn is not made up in the next. The minimum comes first, then the gate on turn, then
//! the reservoir. What natural flow leaves missing comes from the one pool.
//!
//! Source: common practice, no source.

use super::bounds::{least, positive};
use super::day::{Morning, Shared};
use super::reaches::Reaches;
use super::seniority::draw;
use super::{River, RiverDay, RiverInput, RiverState};

impl River {
    /// Shares the day's water with the gate on turn.
    pub(super) fn share_by_turn<const WIDTH: usize>(
        &self,
        state: &mut RiverState,
        input: &RiverInput,
        morning: &Morning,
        out: &mut RiverDay,
    ) -> Shared {
        let n = self.gates.len();
        let turn = self.gate_on_turn(input.rotation_day);
        out.turn_gate = turn;
        out.clear_takes();
        let mut reaches = Reaches(&mut out.entering_m3);
        let reserved = if self.minimum_at_dam { 0.0 } else { reaches.claim(n + 1, input.minimum_m3) };
        let mut asked = 0.0;
        let mut natural_take = 0.0;
        if let Some(i) = turn {
            let gate = &self.gates[i];
            let left_this_year = positive(self.yearly_limit_m3[i] - state.drawn_this_year_m3[i]);
            asked = least(least(input.demand_m3[i] * gate.cycle_per_turn, self.canal_m3[i]), left_this_year);
            natural_take = reaches.claim(i + 1, asked);
        }
        let reservoir_take = reaches.claim(0, self.reservoir_want_m3(input, morning));

        let mut outlet_left = self.outlet_left_m3(morning, reservoir_take);
        let (mut released, mut arriving) = (0.0, 0.0);
        if let Some(i) = turn.filter(|_| asked > 0.0) {
            let available = least(outlet_left, input.stored_limit_m3);
            (released, arriving) = draw(&self.gates[i], positive(asked - natural_take), state.pool_m3, available);
            state.pool_m3 -= released;
            outlet_left -= released;
            let canal = natural_take + arriving;
            out.takes_written = true;
            out.wish_m3[i] = asked;
            out.natural_take_m3[i] = natural_take;
            out.stored_take_m3[i] = released;
            out.canal_m3[i] = canal;
            out.canal_total_m3 = canal;
            state.drawn_this_year_m3[i] += canal;
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
