//! What the river carries from day to day, what a day brings, and what comes of it.

use super::{MOST_GATES, MOST_POSITIONS};

/// What is carried from one day to the next. Gates are counted from 0; entries beyond the last gate must be zero, and
/// stay so.
#[derive(Clone, Debug, PartialEq)]
pub struct RiverState {
    /// Stored water in each gate's account, m³. Under one-pool rules the first day moves it into the pool.
    pub account_m3: [f64; MOST_GATES],
    /// Stored water that no gate owns, m³; all of it under one-pool rules.
    pub pool_m3: f64,
    /// Water on its way back to the river from each canal, m³.
    pub return_store_m3: [f64; MOST_GATES],
    /// Water that each gate has had since the year began, m³.
    pub drawn_this_year_m3: [f64; MOST_GATES],
}

impl Default for RiverState {
    /// An empty reservoir, empty return stores, nothing drawn.
    fn default() -> Self {
        Self {
            account_m3: [0.0; MOST_GATES],
            pool_m3: 0.0,
            return_store_m3: [0.0; MOST_GATES],
            drawn_this_year_m3: [0.0; MOST_GATES],
        }
    }
}

/// What one day brings. Every volume is zero or more and finite, except where infinity is named.
#[derive(Clone, Copy, Debug)]
pub struct RiverInput<'a> {
    /// Natural inflow at the dam, m³.
    pub inflow_m3: f64,
    /// Evaporation that the lake asks for, m³.
    pub lake_evaporation_m3: f64,
    /// Rain on the lake, m³.
    pub lake_rain_m3: f64,
    /// Active content above which water is let go for flood space, m³; infinite where there is no such limit.
    pub flood_limit_m3: f64,
    /// The river's minimum, m³.
    pub minimum_m3: f64,
    /// Most stored water that may leave the dam for all gates together, m³; infinite where nothing is held back.
    pub stored_limit_m3: f64,
    /// Day of the rotation, 0 on the day on which the canals open.
    pub rotation_day: u32,
    /// What each gate asks for at its head, m³, counted from 0; entries beyond the last gate do not matter.
    pub demand_m3: &'a [f64; MOST_GATES],
}

/// What came of one day, m³. Gates are counted from 0; entries beyond the last gate are zero, as long as a day is used
/// with one river only.
///
/// The terms close: `inflow + rain + content_start + return_flow_total = evaporation + canal_total + river_loss +
/// river_out + content`, to rounding; see [`RiverDay::residual_m3`].
#[derive(Clone, Debug, PartialEq)]
pub struct RiverDay {
    /// Natural flow at the dam after rain passed on and detention.
    pub natural_flow_m3: f64,
    /// Rain on a full lake, passed on as natural flow.
    pub rain_passed_m3: f64,
    /// Evaporation from the lake; less than asked for when the reservoir runs empty.
    pub evaporation_m3: f64,
    /// Natural flow held back because the outlet could not pass it.
    pub detained_m3: f64,
    /// Natural flow that the reservoir took under its right.
    pub reservoir_take_m3: f64,
    /// The part of the minimum that natural flow covers: reserved from juniors at the river's end, or, with the minimum
    /// at the dam, the natural flow that passes the dam, up to the minimum.
    pub minimum_reserved_m3: f64,
    /// What each gate could take at most today: the least of demand, canal and what is left of the yearly limit. Under
    /// rotation the gate on turn asks for the whole cycle's demand, and the others for nothing.
    pub wish_m3: [f64; MOST_GATES],
    /// Natural flow taken by each gate. Under the proportional rule every canal carries the same mix of natural and
    /// stored water.
    pub natural_take_m3: [f64; MOST_GATES],
    /// Stored water let go at the dam for each gate, before the river's loss.
    pub stored_take_m3: [f64; MOST_GATES],
    /// Flow into each canal at its head gate.
    pub canal_m3: [f64; MOST_GATES],
    /// Flow into all canals.
    pub canal_total_m3: f64,
    /// Stored water lost in the river between the dam and the gates.
    pub river_loss_m3: f64,
    /// Stored water let go at the dam for all gates.
    pub stored_release_m3: f64,
    /// Fraction of every wish that was met; proportional rule only.
    pub fraction: Option<f64>,
    /// The gate, counted from 0, whose turn it was; rotation only.
    pub turn_gate: Option<usize>,
    /// Water that came back to the river from each canal.
    pub return_flow_m3: [f64; MOST_GATES],
    /// Water that came back to the river from all canals.
    pub return_flow_total_m3: f64,
    /// Pool water let go to complete the minimum.
    pub pool_release_m3: f64,
    /// Stored water let go to make flood space.
    pub flood_release_m3: f64,
    /// Stored water above the active volume, over the spillway. Natural flow above the outlet's capacity is not in it.
    pub spill_m3: f64,
    /// All that passed the dam.
    pub dam_outflow_m3: f64,
    /// Flow at the river's end.
    pub river_out_m3: f64,
    /// Whether the minimum was met where it is asked for.
    pub minimum_met: bool,
    /// Active content in the morning.
    pub content_start_m3: f64,
    /// Active content in the evening.
    pub content_m3: f64,
    /// Unclaimed water by where it comes in, while natural flow is shared out; here so that it need not be made anew.
    pub(super) entering_m3: [f64; MOST_POSITIONS],
    /// Whether any entry of wishes, takes and canal flows may differ from zero.
    pub(super) takes_written: bool,
}

impl RiverDay {
    /// What the day's terms leave unexplained, m³: rounding only. `input` is the one that the day was run with.
    pub fn residual_m3(&self, input: &RiverInput) -> f64 {
        let came = input.inflow_m3 + input.lake_rain_m3 + self.content_start_m3 + self.return_flow_total_m3;
        let went = self.evaporation_m3 + self.canal_total_m3 + self.river_loss_m3 + self.river_out_m3 + self.content_m3;
        came - went
    }

    /// Clears what gates wished for and got. Most of the year there is nothing to clear.
    #[inline(always)]
    pub(super) fn clear_takes(&mut self) {
        if self.takes_written {
            self.wish_m3 = [0.0; MOST_GATES];
            self.natural_take_m3 = [0.0; MOST_GATES];
            self.stored_take_m3 = [0.0; MOST_GATES];
            self.canal_m3 = [0.0; MOST_GATES];
            self.takes_written = false;
        }
    }
}

impl Default for RiverDay {
    /// A day on which nothing happened, for [`River::day`](super::River::day) to write over.
    fn default() -> Self {
        Self {
            natural_flow_m3: 0.0,
            rain_passed_m3: 0.0,
            evaporation_m3: 0.0,
            detained_m3: 0.0,
            reservoir_take_m3: 0.0,
            minimum_reserved_m3: 0.0,
            wish_m3: [0.0; MOST_GATES],
            natural_take_m3: [0.0; MOST_GATES],
            stored_take_m3: [0.0; MOST_GATES],
            canal_m3: [0.0; MOST_GATES],
            canal_total_m3: 0.0,
            river_loss_m3: 0.0,
            stored_release_m3: 0.0,
            fraction: None,
            turn_gate: None,
            return_flow_m3: [0.0; MOST_GATES],
            return_flow_total_m3: 0.0,
            pool_release_m3: 0.0,
            flood_release_m3: 0.0,
            spill_m3: 0.0,
            dam_outflow_m3: 0.0,
            river_out_m3: 0.0,
            minimum_met: true,
            content_start_m3: 0.0,
            content_m3: 0.0,
            entering_m3: [0.0; MOST_POSITIONS],
            takes_written: false,
        }
    }
}
