//! Runs the cells of a grid: slopes once for each weather, several side by side; then the works of every cell.

use std::ops::Range;
use std::sync::Mutex;
use std::sync::PoisonError;
use std::sync::atomic::{AtomicBool, Ordering};

use rayon::prelude::*;

use super::order::{PASSES, Weather, weathers};
use super::{Question, WhatIfFault};
use crate::signs::{YearReader, YearSigns};
use crate::water::basin::{Basin, BasinDay, Basins};
use crate::water::dials::Dials;
use crate::water::run::{settle_works, settling_days};
use crate::water::works::{Evening, Works, WorksStores};

/// Settings whose slopes run side by side.
pub const LANES: usize = 4;
/// Days between two looks at the flag.
const DAYS_A_LOOK: usize = 122;

/// The slopes of a few weathers, day by day.
type Slopes = [Vec<BasinDay>; LANES];

type Tell<'t> = &'t (dyn Fn(usize, Option<f64>) + Sync);

/// What one call works on.
struct Job<'q> {
    question: &'q Question<'q>,
    cancel: &'q AtomicBool,
    tell: Tell<'q>,
    /// The number of the first cell, and a place for every value.
    first_cell: usize,
    values: Mutex<Vec<Option<f64>>>,
    /// Days that have to be run: to the end of the last year asked for, and whatever settles the works.
    days: usize,
    settling: usize,
}

impl<'q> Job<'q> {
    fn new(question: &'q Question<'q>, cells: &Range<usize>, cancel: &'q AtomicBool, tell: Tell<'q>) -> Self {
        let source = &question.source;
        let settling = settling_days(source.calendar, source.valley.start.settling_years);
        let end = question.years.last().map_or(0, |year| year.first + year.days);
        Self {
            question,
            cancel,
            tell,
            first_cell: cells.start,
            values: Mutex::new(vec![None; cells.len()]),
            days: end.max(settling).min(source.calendar.len()),
            settling,
        }
    }

    fn look(&self) -> Result<(), WhatIfFault> {
        if self.cancel.load(Ordering::Relaxed) { Err(WhatIfFault::Cancelled) } else { Ok(()) }
    }

    fn room(&self) -> Slopes {
        std::array::from_fn(|_| vec![BasinDay::default(); self.days])
    }

    /// Spans of days, first the settling and then the record, short enough to look at the flag between them.
    fn spans(&self) -> impl Iterator<Item = Range<usize>> + use<> {
        let spans = |to: usize| (0..to).step_by(DAYS_A_LOOK).map(move |from| from..(from + DAYS_A_LOOK).min(to));
        spans(self.settling).chain(spans(self.days))
    }

    /// Runs the slopes of up to [`LANES`] weathers.
    fn slopes(&self, group: &[Weather], slopes: &mut Slopes) -> Result<(), WhatIfFault> {
        let source = &self.question.source;
        if let [only] = group {
            return self.slopes_of_one(&only.dials, &mut slopes[0]);
        }
        let Some(last) = group.last() else { return Ok(()) };
        // Lanes that are left over repeat the last weather.
        let dials: [&Dials; LANES] = std::array::from_fn(|lane| &group.get(lane).unwrap_or(last).dials);
        let basins = Basins::<LANES>::new([source.valley; LANES], dials);
        let mut stores = basins.start();
        for span in self.spans() {
            self.look()?;
            let (calendar, record) = (&source.calendar[span.clone()], &source.record[span.clone()]);
            let mut out = slopes.each_mut().map(|days| &mut days[span.clone()]);
            basins.run(&mut stores, calendar, record, &mut out);
        }
        Ok(())
    }

    fn slopes_of_one(&self, dials: &Dials, days: &mut [BasinDay]) -> Result<(), WhatIfFault> {
        let source = &self.question.source;
        let basin = Basin::new(source.valley, dials);
        let mut stores = basin.start();
        for span in self.spans() {
            self.look()?;
            let (calendar, record) = (&source.calendar[span.clone()], &source.record[span.clone()]);
            basin.run(&mut stores, calendar, record, &mut days[span]);
        }
        Ok(())
    }

    /// Runs the works under `dials` over slopes of the same weather and reads the number off the years asked for: as
    /// [`crate::signs::read_run`] without its accounts.
    fn read(&self, dials: &Dials, slopes: &[BasinDay]) -> Result<Option<f64>, WhatIfFault> {
        let Question { source, reading, years, unbroken, .. } = self.question;
        let (valley, calendar) = (source.valley, source.calendar);
        let works = Works::new(valley, dials).map_err(WhatIfFault::River)?;
        let mut evening = Evening::default();
        self.look()?;
        let Some(mut stores) = settle_works(valley, &works, calendar, slopes, &mut evening) else { return Ok(None) };
        let mut signs: Vec<YearSigns> = Vec::with_capacity(years.len());
        let mut reader = YearReader::new(valley);
        let of_supply = reading.is_of_supply();
        let mut done = 0;
        for year in years {
            let end = year.first + year.days;
            for from in (done..year.first).step_by(DAYS_A_LOOK) {
                self.look()?;
                let to = (from + DAYS_A_LOOK).min(year.first);
                works.run(&mut stores, &calendar[from..to], &slopes[from..to], &mut evening, |_, _| {});
            }
            self.look()?;
            reader.start_over();
            let days = year.first..end;
            let (calendar, slopes) = (&calendar[days.clone()], &slopes[days]);
            if of_supply {
                let read = |evening: &Evening, stores: &WorksStores| reader.supply_day(evening, stores);
                works.run(&mut stores, calendar, slopes, &mut evening, read);
            } else {
                let read = |evening: &Evening, stores: &WorksStores| reader.day(evening, stores);
                works.run(&mut stores, calendar, slopes, &mut evening, read);
            }
            signs.push(reader.close());
            done = end;
        }
        Ok(reading.of(&signs, valley.enough_share, *unbroken))
    }

    fn cell(&self, cell: usize, slopes: &[BasinDay]) -> Result<(), WhatIfFault> {
        let value = self.read(&self.question.dials_of(cell), slopes)?;
        let mut values = self.values.lock().unwrap_or_else(PoisonError::into_inner);
        if let Some(place) = values.get_mut(cell - self.first_cell) {
            *place = value;
        }
        drop(values);
        (self.tell)(cell, value);
        Ok(())
    }

    /// Weathers with one cell each: a group of lanes is one piece of work, from the slopes to the values.
    fn one_cell_each(&self, due: &[Weather]) -> Result<(), WhatIfFault> {
        due.par_chunks(LANES).try_for_each_init(
            || self.room(),
            |slopes, group| {
                self.slopes(group, slopes)?;
                let cells = group.iter().zip(&*slopes);
                cells
                    .flat_map(|(weather, days)| weather.cells.iter().map(move |cell| (*cell, days)))
                    .try_for_each(|(cell, days)| self.cell(cell, days))
            },
        )
    }

    /// Weathers that many cells share: as many groups of lanes as there are processors, then all their cells.
    fn shared(&self, due: &[Weather]) -> Result<(), WhatIfFault> {
        let groups: Vec<&[Weather]> = due.chunks(LANES).collect();
        let processors = rayon::current_num_threads().max(1);
        let mut rooms: Vec<Slopes> = (0..processors.min(groups.len())).map(|_| self.room()).collect();
        for batch in groups.chunks(processors) {
            batch.par_iter().zip(&mut rooms).try_for_each(|(group, slopes)| self.slopes(group, slopes))?;
            let mut cells: Vec<(usize, &[BasinDay])> = Vec::new();
            for (group, slopes) in batch.iter().zip(&rooms) {
                for (weather, days) in group.iter().zip(slopes) {
                    cells.extend(weather.cells.iter().map(|cell| (*cell, days.as_slice())));
                }
            }
            cells.par_iter().with_max_len(1).try_for_each(|(cell, days)| self.cell(*cell, days))?;
        }
        Ok(())
    }
}

/// Runs `cells`, coarse first.
pub(super) fn run(
    question: &Question<'_>,
    cells: Range<usize>,
    cancel: &AtomicBool,
    tell: Tell<'_>,
) -> Result<Vec<Option<f64>>, WhatIfFault> {
    if cells.start > cells.end || cells.end > question.cells() {
        return Err(WhatIfFault::NoSuchCells);
    }
    let job = Job::new(question, &cells, cancel, tell);
    let weathers = weathers(question, cells);
    for pass in 0..PASSES {
        let due: Vec<Weather> = weathers.iter().filter(|weather| weather.pass == pass).cloned().collect();
        if due.iter().all(|weather| weather.cells.len() == 1) {
            job.one_cell_each(&due)?;
        } else {
            job.shared(&due)?;
        }
    }
    job.look()?;
    Ok(job.values.into_inner().unwrap_or_else(PoisonError::into_inner))
}

/// The number under one setting alone.
pub(super) fn one(question: &Question<'_>, dials: &Dials, cancel: &AtomicBool) -> Result<Option<f64>, WhatIfFault> {
    let job = Job::new(question, &(0..0), cancel, &|_, _| {});
    let mut days = vec![BasinDay::default(); job.days];
    job.slopes_of_one(dials, &mut days)?;
    job.read(dials, &days)
}
