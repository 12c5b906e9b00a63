//! What becomes of the water in a canal: used, on its way back to the river, or lost at depth.
//!
//! Source: common practice, no source; the return store is the exact daily form of a linear store.

use super::{Gate, River, RiverState};

/// What becomes of one day's canal flow, m³.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CanalUse {
    /// Lost on the way to the fields or the town.
    pub conveyance_loss_m3: f64,
    /// Used up where it arrives.
    pub used_m3: f64,
    /// All that is lost: on the way, and where it arrives.
    pub lost_m3: f64,
}

impl Gate {
    /// Splits a canal's flow by the gate's conveyance loss and efficiency, without a look at the fields: the way of a
    /// town.
    pub fn plain_canal(&self, canal_m3: f64) -> CanalUse {
        let conveyance_loss_m3 = self.conveyance_loss_share * canal_m3;
        let used_m3 = self.field_efficiency * (canal_m3 - conveyance_loss_m3);
        let lost_m3 = conveyance_loss_m3 + (canal_m3 - conveyance_loss_m3 - used_m3);
        CanalUse { conveyance_loss_m3, used_m3, lost_m3 }
    }
}

impl River {
    /// Puts a canal's losses of the day, m³, into its return store and returns the part that is lost at depth, m³.
    ///
    /// Call it after [`River::day`], so that nothing comes back on the day on which it is lost. Gates are counted from
    /// 0; where there is no such gate nothing can come back, and all of it is lost at depth.
    pub fn settle(&self, state: &mut RiverState, gate: usize, lost_m3: f64) -> f64 {
        let Some(rule) = self.gates.get(gate) else { return lost_m3 };
        let returning = rule.return_share * lost_m3;
        state.return_store_m3[gate] += returning;
        lost_m3 - returning
    }
}
