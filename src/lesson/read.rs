//! A lesson's file as a script: the lesson itself, where its steps lead, and what never comes.

use super::read_step::{Around, read_step};
use super::script::{Lesson, MOST_NAME, MOST_PROMPT, MOST_STEPS, Step};
use super::waters::Waters;
use crate::place::Text;
use crate::place::problem::{Location, Problem};
use crate::place::section::{Limits, Section};
use crate::place::text::need_names;
use crate::place::unit_suffix::PLAIN;
use crate::water::calendar::{CalendarDay, MonthDay};
use chrono::{Days, NaiveDate};

/// How long a lesson may take, minutes.
const MINUTES: Limits = Limits(5.0, 180.0);
/// How long one takes where it does not say.
const USUAL_MINUTES: f64 = 60.0;
/// The word that ends a lesson.
const END: &str = "end";

/// A lesson as read, with the places that later checks point at.
pub(super) struct ReadLesson {
    name: Text,
    text: Text,
    minutes: u16,
    /// The steps.
    pub steps: Vec<ReadStep>,
}

/// A step as read.
pub(super) struct ReadStep {
    /// The step; it leads to the one below it until its own words are looked up.
    pub step: Step,
    /// Where its key stands.
    pub at: Location,
    /// Where its guess stands.
    pub guess_at: Option<Location>,
    /// Where each expectation stands.
    pub expect_at: Vec<Location>,
    /// The key of the step that follows, as written.
    pub then: Option<(String, Location)>,
    /// The key of the step after a guess that was not close, as written.
    pub if_far: Option<(String, Location)>,
}

impl ReadLesson {
    /// The lesson alone.
    pub fn into_lesson(self) -> Lesson {
        let stamp = self.name.get("en").bytes().fold(0_u32, |sum, byte| (sum * 31 + u32::from(byte)) % 11) as u8;
        let steps = self.steps.into_iter().map(|read| read.step).collect();
        Lesson { name: self.name, text: self.text, minutes: self.minutes, steps, stamp }
    }
}

/// Reads the whole file.
pub(super) fn lesson(root: &Section<'_>, waters: &Waters<'_>) -> ReadLesson {
    let name = words(root, "name", MOST_NAME);
    let text = words(root, "text", MOST_PROMPT);
    let minutes = root.number_or("minutes", PLAIN, MINUTES, USUAL_MINUTES).value as u16;
    let sections = root.sections("step");
    if sections.is_empty() {
        root.tell_missing("step");
    }
    if let Some(extra) = sections.get(MOST_STEPS) {
        root.sheet.tell(Problem::error(extra.at.clone(), "problem-lesson-long").with("most", MOST_STEPS));
    }
    let around = Around { waters, plan: &waters.place().dials };
    let mut steps: Vec<ReadStep> =
        sections.iter().take(MOST_STEPS).map(|section| read_step(section, &around)).collect();
    lead_on(&mut steps, root);
    ReadLesson { name, text, minutes, steps }
}

/// Looks up where each step leads, and tells of steps that no other leads to.
fn lead_on(steps: &mut [ReadStep], root: &Section<'_>) {
    let keys: Vec<String> = steps.iter().map(|read| read.step.key.clone()).collect();
    for (index, read) in steps.iter_mut().enumerate() {
        if !keys[index].is_empty() && keys[..index].contains(&keys[index]) {
            root.sheet.tell(Problem::error(read.at.clone(), "problem-key-twice").with("key", keys[index].clone()));
        }
        read.step.then = match &read.then {
            None => (index + 1 < keys.len()).then_some(index + 1),
            Some((key, _)) if key == END => None,
            Some((key, at)) => later_step(&keys, index, key, at, root),
        };
        let if_far = read.if_far.as_ref().and_then(|(key, at)| later_step(&keys, index, key, at, root));
        if let Some(guess) = &mut read.step.guess {
            guess.if_far = if_far;
        }
    }
    let mut reached = vec![false; steps.len()];
    // Steps lead down the file only, so that one pass sees every way.
    for (index, read) in steps.iter().enumerate() {
        if index > 0 && !reached[index] {
            let told = Problem::error(read.at.clone(), "problem-lesson-unreachable");
            root.sheet.tell(told.with("key", read.step.key.clone()));
            continue;
        }
        let if_far = read.step.guess.and_then(|guess| guess.if_far);
        for next in [read.step.then, if_far].into_iter().flatten() {
            reached[next] = true;
        }
    }
}

fn later_step(keys: &[String], index: usize, key: &str, at: &Location, root: &Section<'_>) -> Option<usize> {
    let found = keys.iter().position(|other| other == key);
    let problem = |message| Problem::error(at.clone(), message).with("key", key);
    match found {
        Some(later) if later > index => return Some(later),
        Some(_) => root.sheet.tell(problem("problem-lesson-step-back")),
        None => {
            let later = keys.iter().skip(index + 1).cloned().chain([END.to_owned()]);
            root.sheet.tell(problem("problem-lesson-step-unknown").with_nearest(key, later));
        }
    }
    None
}

/// Text in both languages, each within the room that the screen has for it.
pub(super) fn words(section: &Section<'_>, key: &'static str, most: usize) -> Text {
    let text = need_names(section, key);
    for (tag, words) in text.all() {
        let letters = words.chars().count();
        if letters > most {
            let at = section.peek(key).map_or_else(|| section.at.clone(), |value| section.value_at(value));
            let told = Problem::error(at, "problem-lesson-text-long").with("key", key).with("language", tag);
            section.sheet.tell(told.with("letters", letters).with("most", most));
        }
    }
    text
}

/// The day of the water year that a month and day are in a water year; 29 February of a common year is 1 March.
pub(super) fn day_of_water_year(day: MonthDay, water_year: i32, start_month: u8) -> f64 {
    let later = start_month > 1 && day.month >= start_month;
    let year = if later { water_year - 1 } else { water_year };
    let (month, day) = (u32::from(day.month), u32::from(day.day));
    let date = NaiveDate::from_ymd_opt(year, month, day).or_else(|| NaiveDate::from_ymd_opt(year, 3, 1));
    date.map_or(f64::NAN, |date| f64::from(CalendarDay::new(date, start_month).day_of_water_year))
}

/// The month and day of a day of the water year, as a file writes them.
pub(super) fn date_of_day(day: f64, water_year: i32, start_month: u8) -> String {
    let first_year = if start_month > 1 { water_year - 1 } else { water_year };
    let first = NaiveDate::from_ymd_opt(first_year, u32::from(start_month.clamp(1, 12)), 1).unwrap_or_default();
    let after = libm::round(day).clamp(1.0, 366.0) as u64 - 1;
    let date = first.checked_add_days(Days::new(after)).unwrap_or(first);
    date.format("%m-%d").to_string()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn days_of_the_water_year_go_there_and_back() {
        for (start, water_year) in [(10, 2019), (10, 2020), (4, 2020), (1, 2020), (7, 2021)] {
            for (month, day) in [(10, 1), (9, 30), (2, 28), (3, 1), (6, 30), (1, 1), (4, 1)] {
                let month_day = MonthDay::new(month, day).unwrap();
                let number = day_of_water_year(month_day, water_year, start);
                assert!((1.0..=366.0).contains(&number));
                assert_eq!(date_of_day(number, water_year, start), format!("{month:02}-{day:02}"));
            }
        }
        assert_eq!(day_of_water_year(MonthDay::new(2, 29).unwrap(), 2019, 10), 152.0);
        assert_eq!(day_of_water_year(MonthDay::new(2, 29).unwrap(), 2020, 10), 152.0);
    }
}
