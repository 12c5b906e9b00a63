//! What is fixed about a river for a whole run: its gates, their rights and the rule by which they share.

use super::{MOST_GATES, PriorityDate};

/// The rule by which gates share the river.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum SharingRule {
    /// Natural flow by priority date, the dam and the river's minimum holding dated rights of their own; stored water
    /// from each gate's own account.
    Seniority,
    /// Everyone gets the same fraction of what is wished for, from natural flow and one pool of stored water. The
    /// minimum comes first; dates, decreed rates and storage shares are not used.
    Proportional,
    /// Gates take turns of whole days, from natural flow and one pool of stored water. The minimum comes first; dates,
    /// decreed rates and storage shares are not used.
    Rotation,
}

/// Where along the river the minimum flow is asked for.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum MinimumPlace {
    /// At the river's end, below every gate and every return.
    RiverEnd,
    /// Just below the dam. What gates take further down does not lessen it, so it claims water from nobody but the
    /// reservoir: where it is the older right, the reservoir takes no more than the natural flow above it.
    Dam,
}

/// One head gate and its right. Rates are m³ per day.
#[derive(Clone, Debug, PartialEq)]
pub struct Gate {
    /// Priority date of the right.
    pub right_date: PriorityDate,
    /// Decreed rate, m³ per day; limits natural flow only. Infinite where none is decreed.
    pub decreed_m3: f64,
    /// Capacity of the canal at its head, m³ per day; infinite where it never limits.
    pub canal_m3: f64,
    /// Share of the reservoir's active volume that this gate owns, 0 to 1.
    pub storage_share: f64,
    /// Share of its stored water that the river loses between the dam and the gate, 0 to less than 1.
    pub stored_loss_share: f64,
    /// Most water in a year at the head gate, natural and stored, m³; infinite where there is no limit.
    pub yearly_limit_m3: f64,
    /// Share of the canal's flow that is lost on the way, 0 to 1.
    pub conveyance_loss_share: f64,
    /// Share of what arrives that the fields use; for a town, the share that it consumes. 0 to 1.
    pub field_efficiency: f64,
    /// Share of the losses that comes back to the river; the rest is lost at depth. 0 to 1.
    pub return_share: f64,
    /// Mean stay of returning water on its way, days; 0 brings all of it back on the next day.
    pub return_days: f64,
    /// The gate, counted downstream from 1, above which the water comes back; one more than the number of gates stands
    /// for below all of them.
    pub return_above: u8,
    /// Days of this gate's turn under rotation; 0 is no turn.
    pub turn_days: u16,
}

impl Gate {
    /// A gate with a right and a canal that loses nothing, limits nothing and owns no storage. Change what differs.
    pub const fn plain(right_date: PriorityDate, return_above: u8) -> Self {
        Self {
            right_date,
            decreed_m3: f64::INFINITY,
            canal_m3: f64::INFINITY,
            storage_share: 0.0,
            stored_loss_share: 0.0,
            yearly_limit_m3: f64::INFINITY,
            conveyance_loss_share: 0.0,
            field_efficiency: 1.0,
            return_share: 0.0,
            return_days: 0.0,
            return_above,
            turn_days: 1,
        }
    }
}

/// A river as the place describes it, checked and made ready by [`River::new`](super::River::new).
#[derive(Clone, Debug, PartialEq)]
pub struct RiverSetup {
    /// How the gates share.
    pub rule: SharingRule,
    /// The head gates in downstream order.
    pub gates: heapless::Vec<Gate, MOST_GATES>,
    /// Active volume of the reservoir (capacity less dead storage), m³; 0 where there is no dam.
    pub active_m3: f64,
    /// Most water that the outlet passes, m³ per day; infinite where there is no dam.
    pub outlet_m3: f64,
    /// Priority date of the reservoir's own right.
    pub reservoir_date: PriorityDate,
    /// Priority date of the river's minimum.
    pub minimum_date: PriorityDate,
    /// Where the minimum is asked for.
    pub minimum_place: MinimumPlace,
    /// Whether the pool of unowned stored water completes the minimum.
    pub pool_serves_minimum: bool,
}
