//! The station's record, and what the dials make of a day of it.

use super::evaporation::EvaporationDay;

/// One day of the station's record, whole: gaps were filled or refused before.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct StationDay {
    /// Rain and snow at the station, mm.
    pub precipitation_mm: f64,
    /// Temperatures and whatever else reference evaporation takes; NaN where not recorded.
    pub air: EvaporationDay,
}
