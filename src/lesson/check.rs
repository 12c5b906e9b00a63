//! Reading a lesson for a place, and holding it against that place's water.

use std::path::Path;

use super::measure::{Quantity, Shape};
use super::read::{ReadLesson, ReadStep, date_of_day, lesson};
use super::script::{Lesson, Relation};
use super::waters::Waters;
use crate::place::problem::{Location, Problem, Severity};
use crate::place::section::Section;
use crate::place::tree::Sheet;
use crate::water::canals::RiverFault;

/// A lesson, unless it has errors, with everything that was found.
#[derive(Clone, Debug, PartialEq)]
pub struct LessonOutcome {
    /// The lesson; only without errors.
    pub lesson: Option<Lesson>,
    /// Errors and warnings in the order of the file.
    pub problems: Vec<Problem>,
}

/// Reads the lesson in `text`, the content of `file`, for the place of `waters`. Its expectations are read and not tried.
pub fn read_lesson(file: &Path, text: &str, waters: &Waters<'_>) -> LessonOutcome {
    let (read, problems) = read(file, text, waters);
    outcome(read, problems)
}

/// Reads the lesson and tries every expectation and every guess of it on the place's water.
///
/// # Errors
/// A river that makes no sense; the reader of places lets none through.
pub fn check_lesson(file: &Path, text: &str, waters: &mut Waters<'_>) -> Result<LessonOutcome, RiverFault> {
    let (read, mut problems) = read(file, text, waters);
    if problems.iter().all(|problem| problem.severity < Severity::Error) {
        for step in &read.steps {
            try_guess(step, waters, &mut problems)?;
            try_expectations(step, waters, &mut problems)?;
        }
        problems.sort_by(|a, b| a.at.cmp(&b.at));
    }
    Ok(outcome(read, problems))
}

fn read(file: &Path, text: &str, waters: &Waters<'_>) -> (ReadLesson, Vec<Problem>) {
    let (sheet, table) = Sheet::parse(file, text);
    // The root is judged when it ends, before the problems are taken out.
    let read = lesson(&Section::root(&sheet, &table), waters);
    let mut problems = sheet.problems.take();
    problems.sort_by(|a, b| a.at.cmp(&b.at));
    (read, problems)
}

fn outcome(read: ReadLesson, problems: Vec<Problem>) -> LessonOutcome {
    let fine = problems.iter().all(|problem| problem.severity < Severity::Error);
    LessonOutcome { lesson: fine.then(|| read.into_lesson()), problems }
}

fn try_guess(read: &ReadStep, waters: &mut Waters<'_>, problems: &mut Vec<Problem>) -> Result<(), RiverFault> {
    let (Some(guess), Some(at)) = (&read.step.guess, &read.guess_at) else { return Ok(()) };
    let reading = guess.reading;
    let problem = |message| Problem::error(at.clone(), message);
    let Some(result) = waters.read(&reading, &read.step)? else {
        problems.push(problem("problem-lesson-guess-nothing"));
        return Ok(());
    };
    let shown = |value| written(value, reading.quantity(), reading.shape, read, waters);
    // The knob stands a step apart; a result beyond its ends by less than that is still the end.
    if result < guess.least - guess.step || result > guess.most() + guess.step {
        let told = problem("problem-lesson-guess-range").with("came", shown(result));
        problems.push(told.with("least", shown(guess.least)).with("most", shown(guess.most())));
    }
    if guess.usual.is_some_and(|usual| guess.is_near(usual, result)) {
        problems.push(problem("problem-lesson-usual-right").with("came", shown(result)));
    }
    Ok(())
}

fn try_expectations(read: &ReadStep, waters: &mut Waters<'_>, problems: &mut Vec<Problem>) -> Result<(), RiverFault> {
    for (expected, at) in read.step.expect.iter().zip(&read.expect_at) {
        let reading = expected.reading;
        let came = waters.read(&reading, &read.step)?;
        if !expected.relation.holds(came) {
            let shown = |value| written(value, reading.quantity(), reading.shape, read, waters);
            problems.push(failed(at, expected.relation, came, shown));
        }
    }
    Ok(())
}

/// Tells what was expected and what came out.
fn failed(at: &Location, relation: Relation, came: Option<f64>, shown: impl Fn(f64) -> String) -> Problem {
    let problem = |message| Problem::error(at.clone(), message);
    let Some(came) = came else { return problem("problem-lesson-expect-nothing") };
    let told = match relation {
        Relation::Above(level) => problem("problem-lesson-expect-above").with("level", shown(level)),
        Relation::Below(level) => problem("problem-lesson-expect-below").with("level", shown(level)),
        Relation::Between(least, most) => {
            problem("problem-lesson-expect-between").with("least", shown(least)).with("most", shown(most))
        }
        Relation::None => problem("problem-lesson-expect-none"),
    };
    told.with("came", shown(came))
}

/// A value as the file would write it.
fn written(value: f64, quantity: Quantity, shape: Shape, read: &ReadStep, waters: &Waters<'_>) -> String {
    if quantity == Quantity::Date && shape == Shape::Value {
        let water_year = waters.as_it_was().get(read.step.year).map_or(0, |year| year.year.water_year);
        return date_of_day(value, water_year, waters.place().valley.water_year_start_month);
    }
    let text = format!("{value:.3}");
    let text = text.trim_end_matches('0').trim_end_matches('.');
    if text == "-0" { "0".to_owned() } else { text.to_owned() }
}
