//! A lesson as it is led on one place: its script, and what came out of every step.

use std::path::Path;

use chrono::NaiveDate;

use crate::lesson::{Lesson, Waters, read_lesson};
use crate::place::problem::Problem;
use crate::place::{Place, Text};
use crate::water::canals::RiverFault;

/// A lesson of the list, before it is opened.
#[derive(Clone, Debug, PartialEq)]
pub struct ShelfEntry {
    /// By which it is opened and kept.
    pub key: String,
    /// Its name.
    pub name: Text,
    /// What it is about.
    pub text: Text,
    /// How long it takes, minutes.
    pub minutes: u16,
}

/// A lesson, opened for a place.
#[derive(Clone, Debug, PartialEq)]
pub struct Course {
    /// By which it was opened.
    pub key: String,
    /// Its script.
    pub lesson: Lesson,
    /// What came out of each step's guess; `None` for a step without one.
    pub results: Vec<Option<f64>>,
    /// The first day of each step's water year, to write dates by.
    pub first_days: Vec<NaiveDate>,
    /// Names of all gates in downstream order.
    pub gates: Vec<Text>,
    /// The same gates from the oldest right to the newest.
    pub by_right: Vec<usize>,
    /// Day on which a valley is looked at, counted from 0 in the water year: the day of the snow survey.
    pub survey_day: u16,
}

/// Why a lesson cannot be opened.
#[derive(Clone, Debug, PartialEq)]
pub enum NotOpened {
    /// What is wrong with its file, on this place.
    Problems(Vec<Problem>),
    /// A river that makes no sense; the reader of places lets none through.
    River(RiverFault),
}

impl From<RiverFault> for NotOpened {
    fn from(fault: RiverFault) -> Self {
        NotOpened::River(fault)
    }
}

impl Course {
    /// Reads a lesson's text for a place and runs the water of every step that asks for a guess.
    ///
    /// # Errors
    /// [`NotOpened`].
    pub fn open(key: &str, file: &Path, text: &str, place: &Place) -> Result<Self, NotOpened> {
        let mut waters = Waters::new(place)?;
        let outcome = read_lesson(file, text, &waters);
        let Some(lesson) = outcome.lesson else { return Err(NotOpened::Problems(outcome.problems)) };
        let mut results = Vec::with_capacity(lesson.steps.len());
        let mut first_days = Vec::with_capacity(lesson.steps.len());
        let start_month = place.valley.water_year_start_month;
        for step in &lesson.steps {
            results.push(match &step.guess {
                Some(guess) => waters.read(&guess.reading, step)?,
                None => None,
            });
            let first = waters.as_it_was().get(step.year).map(|report| report.year.first);
            let first = first.and_then(|day| place.calendar.get(day)).map(|day| day.date(start_month));
            first_days.push(first.unwrap_or(place.first_date));
        }
        let mut by_right: Vec<usize> = (0..place.valley.gates.len()).collect();
        by_right.sort_by_key(|gate| place.valley.gates[*gate].right_date);
        let survey = place.calendar.iter().find(|day| day.month_day == place.valley.survey);
        let survey_day = survey.map_or(0, |day| day.day_of_water_year - 1);
        Ok(Self {
            key: key.to_owned(),
            lesson,
            results,
            first_days,
            gates: place.gates.iter().map(|gate| gate.name.clone()).collect(),
            by_right,
            survey_day,
        })
    }
}
