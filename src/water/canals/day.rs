//! One day on the river, in the order that the module above describes.

use super::accounts::Stored;
use super::bounds::{least, positive};
use super::width::sum;
use super::{MOST_GATES, River, RiverDay, RiverInput, RiverState, SharingRule};

/// Share of the minimum by which rounding may miss it.
const MINIMUM_TOLERANCE: f64 = 1e-9;

/// What the sharing of a day starts from, m³.
pub(super) struct Morning {
    /// Natural flow at the dam.
    pub(super) natural_m3: f64,
    /// Room in the reservoir that its right may fill.
    pub(super) space_m3: f64,
    /// Whether any gate wishes for water; not asked under rotation.
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
    /// [`River::settle`]. Inputs are not checked here; values without sense give a day without sense.
    pub fn day(&self, state: &mut RiverState, input: &RiverInput, out: &mut RiverDay) {
        match self.gates.len() {
            0..=4 => self.day_of_width::<4>(state, input, out),
            5..=6 => self.day_of_width::<6>(state, input, out),
            7..=8 => self.day_of_width::<8>(state, input, out),
            9..=12 => self.day_of_width::<12>(state, input, out),
            _ => self.day_of_width::<MOST_GATES>(state, input, out),
        }
    }

    fn day_of_width<const WIDTH: usize>(&self, state: &mut RiverState, input: &RiverInput, out: &mut RiverDay) {
        self.take_returns::<WIDTH>(state, out);
        if self.rule != SharingRule::Seniority {
            let owned = sum::<WIDTH>(&state.account_m3);
            if owned != 0.0 {
                state.pool_m3 += owned;
                state.account_m3 = [0.0; MOST_GATES];
            }
        }
        let mut stored = self.stored(state);
        let mut content = stored.content_m3::<WIDTH>();
        out.content_start_m3 = content;

        // Lake.
        let net = input.lake_evaporation_m3 - input.lake_rain_m3;
        if net >= 0.0 {
            let lost = least(net, content);
            stored.debit::<WIDTH>(content, lost);
            content -= lost;
            out.evaporation_m3 = input.lake_rain_m3 + lost;
            out.rain_passed_m3 = 0.0;
        } else {
            let gained = least(-net, positive(self.active_m3 - content));
            stored.fill::<WIDTH>(gained);
            content += gained;
            out.evaporation_m3 = input.lake_evaporation_m3;
            out.rain_passed_m3 = -net - gained;
        }

        // Detention: the outlet cannot pass it, so it is stored whatever the dates say.
        let mut natural = input.inflow_m3 + out.rain_passed_m3;
        let detained = least(positive(natural - self.outlet_m3), positive(self.active_m3 - content));
        stored.fill::<WIDTH>(detained);
        content += detained;
        natural -= detained;
        out.detained_m3 = detained;
        out.natural_flow_m3 = natural;

        out.canal_total_m3 = 0.0;
        out.fraction = None;
        out.turn_gate = None;

        // Natural flow and stored water. The right fills to the flood limit only, so that it does not take water from
        // juniors that would be let go in the evening.
        out.entering_m3[0] = natural;
        let morning = Morning {
            natural_m3: natural,
            space_m3: positive(least(self.active_m3, input.flood_limit_m3) - content),
            any_wish: self.rule != SharingRule::Rotation && self.wish::<WIDTH>(state, input, out),
        };
        let shared = match self.rule {
            SharingRule::Seniority => self.share_by_date::<WIDTH>(state, input, &morning, out),
            SharingRule::Proportional => self.share_by_fraction::<WIDTH>(state, input, &morning, out),
            SharingRule::Rotation => self.share_by_turn::<WIDTH>(state, input, &morning, out),
        };
        self.evening::<WIDTH>(state, input, &shared, out);
    }

    /// Fill, minimum, flood space and spill, and what the day comes to.
    #[inline(always)]
    fn evening<const WIDTH: usize>(
        &self,
        state: &mut RiverState,
        input: &RiverInput,
        shared: &Shared,
        out: &mut RiverDay,
    ) {
        let mut stored = self.stored(state);
        // After the draws, so that today's fill is not used today.
        stored.fill::<WIDTH>(shared.reservoir_take_m3);
        let natural_passing = out.natural_flow_m3 - shared.reservoir_take_m3;
        let mut outlet_left = shared.outlet_left_m3;
        let mut pool_release = 0.0;
        if self.pool_serves_minimum {
            let flow =
                if self.minimum_at_dam { natural_passing + shared.stored_release_m3 } else { shared.natural_end_m3 };
            pool_release = least(least(positive(input.minimum_m3 - flow), *stored.pool_m3), outlet_left);
            *stored.pool_m3 -= pool_release;
            outlet_left -= pool_release;
        }

        let mut content = stored.content_m3::<WIDTH>();
        let flood_release = least(positive(content - input.flood_limit_m3), outlet_left);
        let spill = positive(content - flood_release - self.active_m3);
        if flood_release + spill > 0.0 {
            stored.debit::<WIDTH>(content, flood_release + spill);
            content = stored.content_m3::<WIDTH>();
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

    /// The stored water of a state.
    #[inline(always)]
    fn stored<'a>(&'a self, state: &'a mut RiverState) -> Stored<'a> {
        Stored { account_m3: &mut state.account_m3, pool_m3: &mut state.pool_m3, shares: &self.shares }
    }

    /// Takes the day's returns out of the stores and notes where they come in.
    #[inline(always)]
    fn take_returns<const WIDTH: usize>(&self, state: &mut RiverState, out: &mut RiverDay) {
        let stores = &mut state.return_store_m3;
        let flows = &mut out.return_flow_m3;
        let shares = &self.daily_return_share;
        for i in 0..WIDTH {
            flows[i] = stores[i] * shares[i];
            stores[i] -= flows[i];
        }
        for i in 0..WIDTH + 2 {
            out.entering_m3[i] = 0.0;
        }
        // What lies beyond the last gate brings nothing to position 0, where natural flow is yet to be written.
        for i in 0..WIDTH {
            out.entering_m3[usize::from(self.return_above[i])] += out.return_flow_m3[i];
        }
        out.return_flow_total_m3 = sum::<WIDTH>(&out.return_flow_m3);
    }

    /// Writes each gate's wish and says whether there is any; without one, yesterday's takes are cleared.
    #[inline(always)]
    fn wish<const WIDTH: usize>(&self, state: &RiverState, input: &RiverInput, out: &mut RiverDay) -> bool {
        let (demand, canal) = (input.demand_m3, &self.canal_m3);
        let wish = &mut out.wish_m3;
        for i in 0..WIDTH {
            wish[i] = least(demand[i], canal[i]);
        }
        let any = sum::<WIDTH>(&out.wish_m3) > 0.0;
        if self.any_yearly_limit {
            let wishes = out.wish_m3.iter_mut().zip(&self.yearly_limit_m3).zip(&state.drawn_this_year_m3);
            for ((wish, limit), drawn) in wishes.take(self.gates.len()) {
                *wish = least(*wish, positive(limit - drawn));
            }
        }
        if !any {
            out.clear_takes();
        }
        out.takes_written = any;
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

    /// Adds the day's canal flows to what each gate has drawn this year, and returns their sum, m³.
    #[inline(always)]
    pub(super) fn note_canals<const WIDTH: usize>(&self, state: &mut RiverState, out: &RiverDay) -> f64 {
        let (drawn, canal) = (&mut state.drawn_this_year_m3, &out.canal_m3);
        for i in 0..WIDTH {
            drawn[i] += canal[i];
        }
        sum::<WIDTH>(&out.canal_m3)
    }

    /// Natural flow at the river's end, when the gates' takes are written.
    #[inline(always)]
    pub(super) fn natural_end_m3<const WIDTH: usize>(
        &self,
        morning: &Morning,
        out: &RiverDay,
        reservoir_take_m3: f64,
    ) -> f64 {
        let taken = reservoir_take_m3 + if out.takes_written { sum::<WIDTH>(&out.natural_take_m3) } else { 0.0 };
        // Claims are met from what there is, so that only rounding could bring this below zero.
        positive(morning.natural_m3 + out.return_flow_total_m3 - taken)
    }
}
