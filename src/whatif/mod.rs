//! What if: one number over every combination of two dials.
//!
//! A [`Question`] names two dials with their values, what is read ([`Reading`]) and over which years. [`Question::run`]
//! answers it on all processors: cells that differ only in works dials share the slopes, cells under different weather
//! run side by side in vector lanes, and every cell gets the bits that a run of its own would get. A sketch of every
//! fourth value is run first, then every second, then the rest; each value is told as soon as it is there, and a flag
//! that somebody else sets ends the work within about a water year of one run.
//!
//! # Memory
//!
//! A day off the slopes takes 88 bytes and every processor holds at most [`LANES`] records of them: 5.3 MB for 41 years.
//! That does not grow with the grid.

mod axis;
mod order;
mod run;

use std::sync::atomic::AtomicBool;

pub use axis::{Axis, AxisFault, MOST_STOPS};
pub use run::LANES;

use crate::signs::Reading;
use crate::water::calendar::CalendarDay;
use crate::water::canals::RiverFault;
use crate::water::dials::{Dial, Dials};
use crate::water::run::{WaterYear, water_years};
use crate::water::valley::Valley;
use crate::water::weather::StationDay;

/// Most cells of a grid.
pub const MOST_CELLS: usize = 250_000;

/// Why there is no answer.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum WhatIfFault {
    /// The calendar and the record are not of one length.
    Lengths,
    /// Both sides turn the same dial.
    SameDial,
    /// A dial stands at no number.
    NotFinite(Dial),
    /// More cells than [`MOST_CELLS`].
    TooMany,
    /// No year is asked for, or one that is not in the record, or not in order.
    Years,
    /// The reading is of a gate that is not there.
    NoSuchGate,
    /// The cells asked for are not in the grid.
    NoSuchCells,
    /// The river makes no sense.
    River(RiverFault),
    /// Somebody set the flag.
    Cancelled,
}

/// What the water runs on.
#[derive(Clone, Copy, Debug)]
pub struct Source<'v> {
    /// The valley.
    pub valley: &'v Valley,
    /// The days of the record.
    pub calendar: &'v [CalendarDay],
    /// Their weather, as long.
    pub record: &'v [StationDay],
}

/// A number over two dials.
#[derive(Clone, Debug)]
pub struct Question<'v> {
    source: Source<'v>,
    base: Dials,
    axes: [Axis; 2],
    reading: Reading,
    years: Vec<WaterYear>,
    unbroken: bool,
}

impl<'v> Question<'v> {
    /// Asks for `reading` over the first axis (left to right) and the second (bottom to top), every other dial as in
    /// `base`, over the whole water years with the indexes `years` (rising).
    ///
    /// # Errors
    /// A [`WhatIfFault`] other than `River`, `NoSuchCells` and `Cancelled`.
    pub fn new(
        source: Source<'v>,
        base: Dials,
        axes: [Axis; 2],
        reading: Reading,
        years: &[usize],
    ) -> Result<Self, WhatIfFault> {
        if source.calendar.len() != source.record.len() {
            return Err(WhatIfFault::Lengths);
        }
        if axes[0].dial() == axes[1].dial() {
            return Err(WhatIfFault::SameDial);
        }
        let no_number = |dial: &Dial| base.get(*dial).is_some_and(|value| !value.is_finite());
        if let Some(dial) = Dial::ALL.into_iter().find(no_number) {
            return Err(WhatIfFault::NotFinite(dial));
        }
        if axes[0].values().len() * axes[1].values().len() > MOST_CELLS {
            return Err(WhatIfFault::TooMany);
        }
        if reading.gate().is_some_and(|gate| gate >= source.valley.gates.len()) {
            return Err(WhatIfFault::NoSuchGate);
        }
        let of_record: Vec<WaterYear> = water_years(source.calendar, source.valley.water_year_start_month).collect();
        let chosen: Option<Vec<WaterYear>> = years.iter().map(|index| of_record.get(*index).copied()).collect();
        let years = chosen.filter(|years| !years.is_empty()).ok_or(WhatIfFault::Years)?;
        if !years.windows(2).all(|pair| pair[0].first < pair[1].first) {
            return Err(WhatIfFault::Years);
        }
        let unbroken = years.windows(2).all(|pair| pair[0].water_year + 1 == pair[1].water_year);
        Ok(Self { source, base, axes, reading, years, unbroken })
    }

    /// The dials of the two sides: left to right, bottom to top.
    pub fn axes(&self) -> [&Axis; 2] {
        [&self.axes[0], &self.axes[1]]
    }

    /// What is read.
    pub fn reading(&self) -> Reading {
        self.reading
    }

    /// How many cells there are.
    pub fn cells(&self) -> usize {
        self.axes[0].values().len() * self.axes[1].values().len()
    }

    /// Where every dial stands in a cell. Cells are counted along the first axis from its lowest value, row after row
    /// from the lowest value of the second; beyond the last the dials of the base.
    pub fn dials_of(&self, cell: usize) -> Dials {
        let columns = self.axes[0].values().len();
        let at = |side: usize, index: usize| self.axes[side].values().get(index).copied();
        match (at(0, cell % columns), at(1, cell / columns)) {
            (Some(across), Some(up)) => self.base.with(self.axes[0].dial(), across).with(self.axes[1].dial(), up),
            _ => self.base,
        }
    }

    /// The cells of part `part` of `parts`, both counted from 1: the parts follow one another and leave nothing out.
    /// `None` where there is no such part.
    pub fn part(&self, part: usize, parts: usize) -> Option<std::ops::Range<usize>> {
        let cells = self.cells() as u128;
        let bound = |part: usize| (cells * part as u128 / parts as u128) as usize;
        (part >= 1 && part <= parts).then(|| bound(part - 1)..bound(part))
    }

    /// The answer for `cells`, in their order; `None` where no year has such a number. `tell` hears of every cell with
    /// its number and value as soon as it is there, on whatever thread ran it. Runs on the current thread pool.
    ///
    /// # Errors
    /// `River`, `NoSuchCells`, or `Cancelled` once `cancel` is set.
    pub fn run(
        &self,
        cells: std::ops::Range<usize>,
        cancel: &AtomicBool,
        tell: impl Fn(usize, Option<f64>) + Sync,
    ) -> Result<Vec<Option<f64>>, WhatIfFault> {
        run::run(self, cells, cancel, &tell)
    }

    /// The same number with every dial at rest.
    ///
    /// # Errors
    /// `River` or `Cancelled`.
    pub fn as_it_was(&self, cancel: &AtomicBool) -> Result<Option<f64>, WhatIfFault> {
        run::one(self, &Dials::REST, cancel)
    }
}
