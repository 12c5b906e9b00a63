//! The first stage of an answer: the slopes over the whole record, with the stores of every whole water year's morning.

use super::Source;
use crate::water::basin::{Basin, BasinDay, BasinStores};
use crate::water::dials::{Dials, Stage};
use crate::water::run::{settling_days, water_years};

/// The slopes under one setting of the weather dials.
#[derive(Clone, Debug)]
pub struct SlopesRun {
    dials: Dials,
    /// The evening before the first day.
    pub before: BasinDay,
    /// Every day of the record.
    pub days: Vec<BasinDay>,
    mornings: Vec<BasinStores<2>>,
}

impl SlopesRun {
    /// Runs the slopes; the days are those of [`crate::water::run::run_basin`] to the bit.
    pub fn new(source: &Source<'_>, dials: &Dials) -> Self {
        let Source { valley, calendar, record } = *source;
        let basin = Basin::new(valley, dials);
        let mut days = vec![BasinDay::default(); calendar.len().min(record.len())];
        let mut mornings = Vec::new();
        let mut stores = basin.start();
        let settle = settling_days(calendar, valley.start.settling_years).min(days.len());
        basin.run(&mut stores, &calendar[..settle], &record[..settle], &mut days);
        let before = basin.evening(&stores);
        let mut done = 0;
        for year in water_years(calendar, valley.water_year_start_month) {
            let first = year.first.min(days.len());
            basin.run(&mut stores, &calendar[done..first], &record[done..first], &mut days[done..first]);
            mornings.push(stores.clone());
            done = first;
        }
        let to = days.len();
        basin.run(&mut stores, &calendar[done..to], &record[done..to], &mut days[done..]);
        Self { dials: *dials, before, days, mornings }
    }

    /// Whether the slopes are the same under `dials`: none that touches the weather differs.
    pub fn serves(&self, dials: &Dials) -> bool {
        dials.first_stage_since(&self.dials) != Some(Stage::Basin)
    }

    /// Snow water of every band on every day of a whole water year, mm: day after day, the bands side by side.
    pub(super) fn band_snow_mm(&self, source: &Source<'_>, index: usize) -> Vec<f64> {
        let Source { valley, calendar, record } = *source;
        let year = water_years(calendar, valley.water_year_start_month).nth(index);
        let (Some(year), Some(morning)) = (year, self.mornings.get(index)) else { return Vec::new() };
        let bands = valley.bands.len();
        let mut out = Vec::with_capacity(year.days * bands);
        let (from, to) = (year.first, (year.first + year.days).min(self.days.len()));
        let mut again = vec![BasinDay::default(); to - from];
        let mut stores = morning.clone();
        Basin::new(valley, &self.dials).run_telling(
            &mut stores,
            &calendar[from..to],
            &record[from..to],
            |_, bands_mm| out.extend_from_slice(bands_mm),
            &mut again,
        );
        out
    }

    /// Bytes on the heap.
    pub(super) fn bytes(&self) -> usize {
        size_of_val(self.days.as_slice()) + size_of_val(self.mornings.as_slice())
    }
}
