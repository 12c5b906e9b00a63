//! What an event makes necessary: running some of the water again, drawing again, or nothing.

use super::state::Shown;
use crate::water::dials::Stage;

/// What has to be done. Needs of several events join with [`Needs::and`], so that a slow board may take a burst at once.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub struct Needs {
    /// The first stage of the dialled run that was touched; `None`: the answer stands.
    pub stage: Option<Stage>,
    /// Another year is shown.
    pub year: bool,
    /// Something else is kept beside.
    pub beside: bool,
    /// Something that can be seen has changed.
    pub redraw: bool,
}

impl Needs {
    /// What lies between two states.
    pub fn between(before: &Shown, after: &Shown) -> Self {
        Self {
            stage: after.dials.first_stage_since(&before.dials),
            year: after.year_index != before.year_index,
            beside: after.beside != before.beside,
            redraw: after != before,
        }
    }

    /// The needs of both.
    #[must_use]
    pub fn and(self, later: Self) -> Self {
        Self {
            stage: [self.stage, later.stage].into_iter().flatten().min(),
            year: self.year || later.year,
            beside: self.beside || later.beside,
            redraw: self.redraw || later.redraw,
        }
    }

    /// Whether the water has to be asked again.
    pub fn answer(self) -> bool {
        self.stage.is_some() || self.year || self.beside
    }
}
