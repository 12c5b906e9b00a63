//! The water that a lesson is held against: runs of a place, each made once.

use super::measure::Reading;
use super::script::Step;
use crate::place::Place;
use crate::signs::{YearReport, read_run};
use crate::water::basin::{Basin, BasinDay};
use crate::water::canals::RiverFault;
use crate::water::dials::{Dials, Stage};
use crate::water::run::run_basin;
use crate::water::works::Works;

struct Slopes {
    dials: Dials,
    before: BasinDay,
    days: Vec<BasinDay>,
}

/// A place and its runs so far.
pub struct Waters<'p> {
    place: &'p Place,
    slopes: Vec<Slopes>,
    runs: Vec<(Dials, Vec<YearReport>)>,
}

impl<'p> Waters<'p> {
    /// Runs the place as it was.
    ///
    /// # Errors
    /// A river that makes no sense; the reader of places lets none through.
    pub fn new(place: &'p Place) -> Result<Self, RiverFault> {
        let mut waters = Self { place, slopes: Vec::new(), runs: Vec::new() };
        waters.run(&Dials::REST)?;
        Ok(waters)
    }

    /// The place.
    pub fn place(&self) -> &'p Place {
        self.place
    }

    /// Every whole water year as it was.
    pub fn as_it_was(&self) -> &[YearReport] {
        &self.runs[0].1
    }

    /// Every whole water year with these dials.
    ///
    /// # Errors
    /// A river that makes no sense.
    pub fn years(&mut self, dials: &Dials) -> Result<&[YearReport], RiverFault> {
        let run = self.run(dials)?;
        Ok(&self.runs[run].1)
    }

    /// What comes out of a step.
    ///
    /// # Errors
    /// A river that makes no sense.
    pub fn read(&mut self, reading: &Reading, step: &Step) -> Result<Option<f64>, RiverFault> {
        let run = self.run(&step.dials)?;
        Ok(reading.of(self.as_it_was(), &self.runs[run].1, step.year, &self.place.valley))
    }

    fn run(&mut self, dials: &Dials) -> Result<usize, RiverFault> {
        if let Some(known) = self.runs.iter().position(|(known, _)| known == dials) {
            return Ok(known);
        }
        let Place { valley, calendar, days: record, .. } = self.place;
        let works = Works::new(valley, dials)?;
        let slopes = match self.slopes.iter().position(|slopes| serves(&slopes.dials, dials)) {
            Some(known) => known,
            None => {
                let mut days = vec![BasinDay::default(); record.len()];
                let before = run_basin(valley, &Basin::new(valley, dials), calendar, record, &mut days);
                self.slopes.push(Slopes { dials: *dials, before, days });
                self.slopes.len() - 1
            }
        };
        let Slopes { before, days, .. } = &self.slopes[slopes];
        let mut years = Vec::new();
        read_run(valley, &works, calendar, days, before, |_, _| {}, |year| years.push(year));
        self.runs.push((*dials, years));
        Ok(self.runs.len() - 1)
    }
}

/// Whether slopes that were run under the first dials are the same under the second.
fn serves(run: &Dials, dials: &Dials) -> bool {
    dials.first_stage_since(run) != Some(Stage::Basin)
}
