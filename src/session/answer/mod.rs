//! What the water answers to a state: the run as it was, the run as dialled, and the one that was kept beside.
//!
//! A question runs again from the first stage that differs from a run at hand: runs under the same weather share their
//! slopes, and equal settings share everything. Until the new answer is there the old one stands and
//! [`Answers::is_current`] says that it is old. [`Answers::work`] does one run a call, the dialled one first, so that a
//! slow board can look at its knobs in between; a clone shares all runs, so that one thread may draw while another works.
//!
//! # Memory
//!
//! A day off the slopes takes 88 bytes; a whole water year about 15 kB, most of it the stores of its first morning, from
//! which its days are run again when it is looked into; a year that is looked into day by day about 0.2 MB. Three runs
//! under three weathers of 40 years, 10 bands and 5 gates hold under 8 MB together ([`Answers::bytes`]; a test holds it
//! to that).

pub mod compare;
mod run;
mod slopes;
mod strip;
mod year;

use std::sync::Arc;

pub use run::Run;
pub use slopes::SlopesRun;
pub use strip::Supply;
pub use year::{GateDay, ValleyDay, YearDetail};

use super::state::Shown;
use super::year::{Third, YearChoice, YearList};
use crate::water::calendar::CalendarDay;
use crate::water::canals::RiverFault;
use crate::water::dials::{Dial, Dials};
use crate::water::valley::Valley;
use crate::water::weather::StationDay;

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

/// Why there is no answer.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum AnswerFault {
    /// The calendar and the record are not of one length.
    Lengths,
    /// The record holds no whole water year.
    NoWholeYear,
    /// The river makes no sense.
    River(RiverFault),
}

/// A question to the water.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Asked {
    /// Where the dials stand.
    pub dials: Dials,
    /// What is kept beside.
    pub beside: Option<Dials>,
    /// The year that is looked into, counted from 0 in the whole water years.
    pub year: usize,
}

impl From<&Shown> for Asked {
    fn from(shown: &Shown) -> Self {
        Self { dials: shown.dials, beside: shown.beside, year: shown.year_index }
    }
}

/// A run and the year of it that is looked into.
#[derive(Clone, Debug)]
pub struct Answer {
    /// All years.
    pub run: Arc<Run>,
    /// One year, day by day.
    pub year: Arc<YearDetail>,
}

/// The answers at hand and the question that they should answer.
#[derive(Clone, Debug)]
pub struct Answers {
    rest: Answer,
    dialled: Answer,
    beside: Option<Answer>,
    asked: Asked,
}

/// Whether there is more to do.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Progress {
    /// One run is done, another waits.
    More,
    /// The answers are those that were asked for.
    Done,
}

impl Answers {
    /// Runs the valley as it was and looks into its middling year.
    ///
    /// # Errors
    /// An [`AnswerFault`].
    pub fn new(source: &Source<'_>) -> Result<Self, AnswerFault> {
        if source.calendar.len() != source.record.len() {
            return Err(AnswerFault::Lengths);
        }
        let slopes = Arc::new(SlopesRun::new(source, &Dials::REST));
        let run = Arc::new(Run::new(source, &Dials::REST, slopes)?);
        let years = YearList::of(&run.years).ok_or(AnswerFault::NoWholeYear)?;
        let index = years.index(YearChoice::Of(Third::Middling)).ok_or(AnswerFault::NoWholeYear)?;
        let year = Arc::new(YearDetail::new(source, &run, index).ok_or(AnswerFault::NoWholeYear)?);
        let rest = Answer { run, year };
        let asked = Asked { dials: Dials::REST, beside: None, year: index };
        Ok(Self { dialled: rest.clone(), rest, beside: None, asked })
    }

    /// The valley as it was.
    pub fn rest(&self) -> &Answer {
        &self.rest
    }

    /// The valley as dialled; the old answer until the new one is there.
    pub fn dialled(&self) -> &Answer {
        &self.dialled
    }

    /// What was kept beside; the old one until the new one is there.
    pub fn beside(&self) -> Option<&Answer> {
        self.beside.as_ref()
    }

    /// What was last asked.
    pub fn asked(&self) -> &Asked {
        &self.asked
    }

    /// Asks. Nothing is run yet; `false`, and nothing asked, where the year is not in the record or a dial is no number.
    pub fn ask(&mut self, asked: Asked) -> bool {
        let finite =
            |dials: &Dials| Dial::ALL.into_iter().all(|dial| dials.get(dial).is_none_or(|value| value.is_finite()));
        let makes_sense =
            finite(&asked.dials) && asked.beside.as_ref().is_none_or(finite) && asked.year < self.rest.run.years.len();
        if makes_sense {
            self.asked = asked;
            if asked.beside.is_none() {
                self.beside = None;
            }
        }
        makes_sense
    }

    /// Whether the dialled run is the one that was asked for, in the year that was asked for.
    pub fn is_dialled_current(&self) -> bool {
        self.answers(&self.dialled, &self.asked.dials)
    }

    /// Whether everything is as asked.
    pub fn is_current(&self) -> bool {
        let beside = match (&self.beside, &self.asked.beside) {
            (Some(beside), Some(dials)) => self.answers(beside, dials),
            (None, None) => true,
            _ => false,
        };
        self.is_dialled_current() && self.answers(&self.rest, &Dials::REST) && beside
    }

    fn answers(&self, answer: &Answer, dials: &Dials) -> bool {
        answer.run.dials == *dials && answer.year.index == self.asked.year
    }

    /// Does the next thing that was asked for: the dialled run, then the one beside. The year of the run as it was comes
    /// with the first, since it costs little.
    ///
    /// # Errors
    /// A river that makes no sense under these dials; the old answer stands.
    pub fn work(&mut self, source: &Source<'_>) -> Result<Progress, AnswerFault> {
        let asked = self.asked;
        if !self.answers(&self.rest, &Dials::REST) {
            self.rest = self.look_into(source, Arc::clone(&self.rest.run))?;
        }
        if !self.is_dialled_current() {
            self.dialled = self.answer(source, &asked.dials)?;
        } else if let Some(dials) = asked.beside
            && !self.beside.as_ref().is_some_and(|beside| self.answers(beside, &dials))
        {
            self.beside = Some(self.answer(source, &dials)?);
        }
        Ok(if self.is_current() { Progress::Done } else { Progress::More })
    }

    /// Does all that was asked for.
    ///
    /// # Errors
    /// As [`Answers::work`].
    pub fn finish(&mut self, source: &Source<'_>) -> Result<(), AnswerFault> {
        while !self.is_current() {
            self.work(source)?;
        }
        Ok(())
    }

    fn at_hand(&self) -> impl Iterator<Item = &Answer> {
        [&self.rest, &self.dialled].into_iter().chain(&self.beside)
    }

    /// The answer under `dials`, with as much of what is at hand as serves.
    fn answer(&self, source: &Source<'_>, dials: &Dials) -> Result<Answer, AnswerFault> {
        let same = self.at_hand().find(|answer| answer.run.dials == *dials);
        let run = match same {
            Some(answer) => Arc::clone(&answer.run),
            None => {
                let slopes = self.at_hand().map(|answer| &answer.run.slopes).find(|slopes| slopes.serves(dials));
                let slopes = slopes.map_or_else(|| Arc::new(SlopesRun::new(source, dials)), Arc::clone);
                Arc::new(Run::new(source, dials, slopes)?)
            }
        };
        self.look_into(source, run)
    }

    /// The run with the year that was asked for.
    fn look_into(&self, source: &Source<'_>, run: Arc<Run>) -> Result<Answer, AnswerFault> {
        let index = self.asked.year;
        let same = self.at_hand().find(|answer| Arc::ptr_eq(&answer.run, &run) && answer.year.index == index);
        let year = match same {
            Some(answer) => Arc::clone(&answer.year),
            None => Arc::new(YearDetail::new(source, &run, index).ok_or(AnswerFault::NoWholeYear)?),
        };
        Ok(Answer { run, year })
    }

    /// Bytes that the answers hold on the heap; what several share counts once.
    pub fn bytes(&self) -> usize {
        let mut seen: Vec<*const ()> = Vec::new();
        let mut once = |at: *const (), bytes: usize| {
            let first = !seen.contains(&at);
            seen.push(at);
            if first { bytes } else { 0 }
        };
        self.at_hand()
            .map(|Answer { run, year }| {
                once(Arc::as_ptr(run).cast(), run.bytes())
                    + once(Arc::as_ptr(&run.slopes).cast(), run.slopes.bytes())
                    + once(Arc::as_ptr(year).cast(), year.bytes())
            })
            .sum()
    }
}
