//! A whole run under one setting of the dials: the years, and what is needed to look into any of them.

use std::sync::Arc;

use super::slopes::SlopesRun;
use super::{AnswerFault, Source};
use crate::signs::{YearReport, read_run};
use crate::water::basin::BasinDay;
use crate::water::dials::Dials;
use crate::water::run::{settle_works, water_years};
use crate::water::works::{Evening, Works, WorksStores};

/// A run. The slopes are shared with every other run under the same weather.
#[derive(Clone, Debug)]
pub struct Run {
    /// Where every dial stood.
    pub dials: Dials,
    /// Every whole water year: its signs and its accounts, as [`crate::signs::read_run`] tells them.
    pub years: Vec<YearReport>,
    pub(super) slopes: Arc<SlopesRun>,
    pub(super) works: Works,
    pub(super) mornings: Vec<WorksStores>,
}

impl Run {
    /// Runs the works over slopes that have been run under the same weather.
    ///
    /// # Errors
    /// A river that makes no sense.
    pub(super) fn new(source: &Source<'_>, dials: &Dials, slopes: Arc<SlopesRun>) -> Result<Self, AnswerFault> {
        let Source { valley, calendar, .. } = *source;
        let works = Works::new(valley, dials).map_err(AnswerFault::River)?;
        let mut starts = water_years(calendar, valley.water_year_start_month).map(|year| year.first).peekable();
        let mut mornings = Vec::new();
        if starts.next_if_eq(&0).is_some() {
            mornings.extend(settle_works(valley, &works, calendar, &slopes.days, &mut Evening::default()));
        }
        let (mut years, mut tomorrow) = (Vec::new(), 0);
        read_run(
            valley,
            &works,
            calendar,
            &slopes.days,
            &slopes.before,
            |_, stores| {
                tomorrow += 1;
                if starts.next_if_eq(&tomorrow).is_some() {
                    mornings.push(stores.clone());
                }
            },
            |year| years.push(year),
        );
        Ok(Self { dials: *dials, years, slopes, works, mornings })
    }

    /// Every day of the record, as it came off the slopes.
    pub fn basin_days(&self) -> &[BasinDay] {
        &self.slopes.days
    }

    /// Bytes on the heap, without the slopes.
    pub(super) fn bytes(&self) -> usize {
        size_of::<Self>() + size_of_val(self.years.as_slice()) + size_of_val(self.mornings.as_slice())
    }
}
