//! The eight lessons on the demo place: every expectation holds, and the usual answers are wrong.

use std::collections::BTreeSet;
use std::fs;
use std::path::Path;

use deshielo::lesson::{Waters, check_lesson, lessons};
use deshielo::session::{Third, YearChoice, YearList};

use super::{demo, shipped};

/// An hour with a room is at least so many steps.
const FEWEST_STEPS: usize = 8;
/// Guesses of a lesson whose usual answer is wrong.
const FEWEST_SURPRISES: usize = 2;

#[test]
fn every_lesson_of_the_folder_is_part_of_the_program() {
    let mut on_disk = BTreeSet::new();
    for entry in fs::read_dir(Path::new(env!("CARGO_MANIFEST_DIR")).join("scenarios")).unwrap() {
        let path = entry.unwrap().path();
        if path.extension().is_some_and(|ending| ending == "toml") {
            on_disk.insert(path.file_stem().unwrap().to_str().unwrap().to_owned());
        }
    }
    let known: BTreeSet<String> = lessons().iter().map(|(name, _)| (*name).to_owned()).collect();
    assert_eq!(known, on_disk);
    assert_eq!(known.len(), 8);
}

#[test]
fn what_every_lesson_teaches_comes_out_on_the_demo() {
    let mut waters = Waters::new(demo()).unwrap();
    for (name, text) in lessons() {
        let outcome = check_lesson(Path::new(name), text, &mut waters).unwrap();
        assert_eq!(outcome.problems, [], "{name}");
        let lesson = outcome.lesson.unwrap();
        assert!(lesson.steps.len() >= FEWEST_STEPS, "{name} has {} steps", lesson.steps.len());
        assert!(lesson.minutes >= 45, "{name}");
        let (mut surprises, mut expectations) = (0, 0);
        for step in &lesson.steps {
            expectations += step.expect.len();
            let Some(guess) = &step.guess else { continue };
            let result = waters.read(&guess.reading, step).unwrap();
            if let Some(usual) = guess.usual {
                assert!(!guess.is_near(usual, result.unwrap()), "{name}, {}: {usual} is right", step.key);
                let why = step.talk.as_ref().unwrap_or_else(|| panic!("{name}, {}: nobody says why", step.key));
                let (en, es) = (why.get("en"), why.get("es"));
                let of_many = ["any people", "verybody", "Some say", "expect"].iter().any(|start| en.contains(start));
                assert!(of_many && (es.contains("uchos") || es.contains("asi todos") || es.contains("Unos dicen")));
                surprises += 1;
            }
            // The step itself must also say what is expected of what is guessed.
            let held = step.expect.iter().any(|expected| expected.reading.measure == guess.reading.measure);
            assert!(held, "{name}, {}: nothing holds the guess", step.key);
        }
        assert!(surprises >= FEWEST_SURPRISES, "{name}: {surprises} usual answers are wrong");
        assert!(expectations >= FEWEST_STEPS - 1, "{name}: {expectations} expectations");
    }
}

#[test]
fn readings_are_those_of_the_run() {
    // The share of snow at 2 °C, read by hand from a run of the same dials.
    let lesson = shipped("less_snow_more_rain");
    let mut waters = Waters::new(demo()).unwrap();
    let step = lesson.steps.iter().find(|step| step.key == "survey").unwrap();
    let guess = step.guess.unwrap();
    let got = waters.read(&guess.reading, step).unwrap().unwrap();
    let after = waters.years(&step.dials).unwrap()[step.year].signs.survey_swe_mm.unwrap();
    let before = waters.as_it_was()[step.year].signs.survey_swe_mm.unwrap();
    assert_eq!(got.to_bits(), (after - before).to_bits());

    let step = lesson.steps.iter().find(|step| step.key == "enough").unwrap();
    let got = waters.read(&step.guess.unwrap().reading, step).unwrap().unwrap();
    let enough_share = demo().valley.enough_share;
    let years = waters.years(&step.dials).unwrap();
    let enough = years.iter().filter(|year| year.signs.supply_ratio.unwrap() >= enough_share).count();
    assert_eq!(got, enough as f64);
}

#[test]
fn a_kind_of_year_is_the_one_that_the_year_chooser_shows() {
    let waters = Waters::new(demo()).unwrap();
    let list = YearList::of(waters.as_it_was()).unwrap();
    let of = |third| list.index(YearChoice::Of(third)).unwrap();
    let lesson = shipped("dry_year_full_reservoir");
    assert_eq!(lesson.steps[0].year, of(Third::Dry));
    assert_eq!(shipped("earlier_water").steps[0].year, of(Third::Middling));
    let driest = lesson.steps.iter().find(|step| step.key == "driest").unwrap().year;
    let flow = |year: usize| waters.as_it_was()[year].signs.natural_flow_hm3;
    assert!((0..list.count()).all(|year| flow(driest) <= flow(year)));
}
