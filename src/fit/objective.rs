//! What the search tries to make as large as it can.

use serde::{Deserialize, Serialize};

use super::record::Target;
use crate::signs::skill::{kling_gupta_2009, nash_sutcliffe, nash_sutcliffe_of_roots};

/// Weight of flow where snow is looked at too; snow has the rest (common practice, no source: the river is what people
/// ask about, and one snow spot stands for little ground).
pub const FLOW_WEIGHT: f64 = 0.75;

/// A score to be made large; 1 is a perfect fit in each.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum Objective {
    /// Kling–Gupta efficiency of 2009 of daily flow.
    #[default]
    KlingGupta,
    /// Nash–Sutcliffe efficiency of daily flow: the floods count most.
    NashSutcliffe,
    /// Nash–Sutcliffe efficiency of the square roots of daily flow: low flows count for more.
    NashSutcliffeOfRoots,
    /// Kling–Gupta efficiency of flow and of snow water, weighted [`FLOW_WEIGHT`] and the rest.
    KlingGuptaWithSnow,
}

impl Objective {
    /// Whether a snow record is needed.
    pub fn needs_snow(self) -> bool {
        self == Objective::KlingGuptaWithSnow
    }

    /// The score of a modelled flow, m³/s, and snow water, mm, against the target. `None` where it is not defined, as for
    /// a modelled flow that does not vary.
    pub fn score(self, flow_m3s: &[f64], snow_mm: &[f64], target: &Target) -> Option<f64> {
        let observed = &target.flow_m3s;
        let kling_gupta =
            |modelled: &[f64], observed: &[f64]| kling_gupta_2009(modelled, observed).map(|k| k.efficiency);
        match self {
            Objective::KlingGupta => kling_gupta(flow_m3s, observed),
            Objective::NashSutcliffe => nash_sutcliffe(flow_m3s, observed),
            Objective::NashSutcliffeOfRoots => nash_sutcliffe_of_roots(flow_m3s, observed),
            Objective::KlingGuptaWithSnow => {
                let (_, observed_snow) = target.snow_mm.as_ref()?;
                let (flow, snow) = (kling_gupta(flow_m3s, observed)?, kling_gupta(snow_mm, observed_snow)?);
                Some(FLOW_WEIGHT * flow + (1.0 - FLOW_WEIGHT) * snow)
            }
        }
    }
}
