//! One day on the river, in the order that the module above describes.

use super::accounts::{content_m3, debit, fill};
use super::bounds::{least, positive};
use super::{River, RiverDay, RiverInput, RiverState, SharingRule};

/// Share of the minimum by which rounding may miss it.
const MINIMUM_TOLERANCE: f64 = 1e-9;

/// What the sharing of a day starts from, m³.
pub(super) struct Morning {
    /// Natural flow at the dam.
    pub(super) natural_m3: f64,
    /// Room in the reservoir that its right may fill.
    pub(super) space_m3: f64,
    /// Whether any gate wishes for water.
    pub(super) any_wish: bool,
}

/// What the sharing of a day leaves, m³.
pub(super) struct Shared {
    /// Natural flow to the reservoir.
    pub(super) reservoir_take_m3: f64,
    /// Natural flow kept for the minimum at the river's end; not used with the minimum at the dam.
    pub(super) reserved_at_end_m3: f64,
    /// Stored water let go at the dam for gates, and what of it arrives.
    pub(super) stored_release_m3: f64,
    pub(super) stored_arriving_m3: f64,
    /// Natural flow at the river's end.
    pub(super) natural_end_m3: f64,
    /// What the outlet can still pass.
    pub(super) outlet_left_m3: f64,
}

impl River {
    /// Runs one day: changes the state and writes what came of it. Losses of the canals come after, by
    /// [`River::settle`].
    pub fn day(&self, state: &mut RiverState, input: &RiverInput, out: &mut RiverDay) {
        let n = self.gates.len();
        self.take_returns(state, out);
        if self.rule != SharingRule::Seniority {
            for held in &mut state.account_m3[..n] {
                state.pool_m3 += *held;
                *held = 0.0;
            }
        }
        let accounts = self.shares.share.len();
        let mut content = content_m3(&state.account_m3[..accounts], state.pool_m3);
        out.content_start_m3 = content;

        // Lake.
        let net = input.lake_evaporation_m3 - input.lake_rain_m3;
        if net >= 0.0 {
            let lost = least(net, content);
            debit(&mut state.account_m3[..accounts], &mut state.pool_m3, content, lost);
            content -= lost;
            out.evaporation_m3 = input.lake_rain_m3 + lost;
            out.rain_passed_m3 = 0.0;
        } else {
            let gained = least(-net, positive(self.active_m3 - content));
            fill(&mut state.account_m3[..accounts], &mut state.pool_m3, &self.shares, gained);
            content += gained;
            out.evaporation_m3 = input.lake_evaporation_m3;
            out.rain_passed_m3 = -net - gained;
        }

        // Detention: the outlet cannot pass it, so it is stored whatever the dates say.
        let mut natural = input.inflow_m3 + out.rain_passed_m3;
        let detained = least(positive(natural - self.outlet_m3), positive(self.active_m3 - content));
        fill(&mut state.account_m3[..accounts], &mut state.pool_m3, &self.shares, detained);
        content += detained;
        natural -= detained;
        out.detained_m3 = detained;
        out.natural_flow_m3 = natural;

        // Natural flow and stored water. The right fills to the flood limit only, so that it does not take water from
        // juniors that would be let go in the evening.
        for room in &mut out.room_m3[..n + 2] {
            *room += natural;
        }
        let morning = Morning {
            natural_m3: natural,
            space_m3: positive(least(self.active_m3, input.flood_limit_m3) - content),
            any_wish: self.wish(state, input, out),
        };
        let shared = match self.rule {
            SharingRule::Seniority => self.share_by_date(state, input, &morning, out),
            SharingRule::Proportional => self.share_by_fraction(state, input, &morning, out),
            SharingRule::Rotation => self.share_by_turn(state, input, &morning, out),
        };
        self.evening(state, input, &shared, out);
    }

    /// Fill, minimum, flood space and spill, and what the day comes to.
    #[inline(always)]
    fn evening(&self, state: &mut RiverState, input: &RiverInput, shared: &Shared, out: &mut RiverDay) {
        let accounts = self.shares.share.len();
        // After the draws, so that today's fill is not used today.
        fill(&mut state.account_m3[..accounts], &mut state.pool_m3, &self.shares, shared.reservoir_take_m3);
        let natural_passing = out.natural_flow_m3 - shared.reservoir_take_m3;
        let mut outlet_left = shared.outlet_left_m3;
        let mut pool_release = 0.0;
        if self.pool_serves_minimum {
            let flow =
                if self.minimum_at_dam { natural_passing + shared.stored_release_m3 } else { shared.natural_end_m3 };
            pool_release = least(least(positive(input.minimum_m3 - flow), state.pool_m3), outlet_left);
            state.pool_m3 -= pool_release;
            outlet_left -= pool_release;
        }

        let mut content = content_m3(&state.account_m3[..accounts], state.pool_m3);
        let flood_release = least(positive(content - input.flood_limit_m3), outlet_left);
        let spill = positive(content - flood_release - self.active_m3);
        if flood_release + spill > 0.0 {
            debit(&mut state.account_m3[..accounts], &mut state.pool_m3, content, flood_release + spill);
            content = content_m3(&state.account_m3[..accounts], state.pool_m3);
        }

        let beyond_gates = pool_release + flood_release + spill;
        out.reservoir_take_m3 = shared.reservoir_take_m3;
        out.minimum_reserved_m3 =
            if self.minimum_at_dam { least(input.minimum_m3, natural_passing) } else { shared.reserved_at_end_m3 };
        out.stored_release_m3 = shared.stored_release_m3;
        out.river_loss_m3 = shared.stored_release_m3 - shared.stored_arriving_m3;
        out.pool_release_m3 = pool_release;
        out.flood_release_m3 = flood_release;
        out.spill_m3 = spill;
        out.dam_outflow_m3 = natural_passing + shared.stored_release_m3 + beyond_gates;
        out.river_out_m3 = shared.natural_end_m3 + beyond_gates;
        out.content_m3 = content;
        let flow = if self.minimum_at_dam { out.dam_outflow_m3 } else { out.river_out_m3 };
        let one_or_more = if input.minimum_m3 > 1.0 { input.minimum_m3 } else { 1.0 };
        out.minimum_met = flow >= input.minimum_m3 - MINIMUM_TOLERANCE * one_or_more;
    }

    /// Takes the day's returns out of the stores and leaves their running sum in the room of each reach.
    #[inline(always)]
    fn take_returns(&self, state: &mut RiverState, out: &mut RiverDay) {
        let n = self.gates.len();
        let stores = &mut state.return_store_m3[..n];
        let flows = &mut out.return_flow_m3[..n];
        for ((store, flow), gate) in stores.iter_mut().zip(flows.iter_mut()).zip(&self.gates) {
            *flow = *store * gate.daily_return_share;
            *store -= *flow;
        }
        let mut sum = 0.0;
        let mut returns = self.return_order.iter().peekable();
        for (position, room) in out.room_m3[..n + 2].iter_mut().enumerate() {
            while let Some(&(_, gate)) = returns.next_if(|(above, _)| usize::from(*above) == position) {
                sum += flows[usize::from(gate)];
            }
            *room = sum;
        }
        out.return_flow_total_m3 = sum;
    }

    /// Writes each gate's wish, clears the day's takes, and says whether there is any wish at all.
    #[inline(always)]
    fn wish(&self, state: &RiverState, input: &RiverInput, out: &mut RiverDay) -> bool {
        let n = self.gates.len();
        let mut any = false;
        let wishes = out.wish_m3[..n].iter_mut().zip(&input.demand_m3[..n]).zip(&self.gates);
        for ((wish, demand), gate) in wishes {
            *wish = least(*demand, gate.canal_m3);
            any |= *wish > 0.0;
        }
        if self.any_yearly_limit {
            let wishes = out.wish_m3[..n].iter_mut().zip(&state.drawn_this_year_m3[..n]).zip(&self.gates);
            for ((wish, drawn), gate) in wishes {
                *wish = least(*wish, positive(gate.yearly_limit_m3 - drawn));
            }
        }
        out.natural_take_m3[..n].fill(0.0);
        out.stored_take_m3[..n].fill(0.0);
        out.canal_m3[..n].fill(0.0);
        out.canal_total_m3 = 0.0;
        out.fraction = None;
        out.turn_gate = None;
        any
    }

    /// The most that the reservoir may take of the natural flow: its room, less what the minimum at the dam forbids.
    #[inline(always)]
    pub(super) fn reservoir_want_m3(&self, input: &RiverInput, morning: &Morning) -> f64 {
        if self.minimum_at_dam && self.minimum_before_reservoir {
            least(morning.space_m3, positive(morning.natural_m3 - input.minimum_m3))
        } else {
            morning.space_m3
        }
    }

    /// The outlet's capacity beyond the natural flow that passes; natural flow uses the outlet first.
    #[inline(always)]
    pub(super) fn outlet_left_m3(&self, morning: &Morning, reservoir_take_m3: f64) -> f64 {
        positive(self.outlet_m3 - (morning.natural_m3 - reservoir_take_m3))
    }
}
