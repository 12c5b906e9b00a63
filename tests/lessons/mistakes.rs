//! Every mistake of a lesson stands at its line.

use std::path::Path;

use deshielo::lesson::{LessonOutcome, Waters, check_lesson, read_lesson};
use deshielo::place::demo::piedranieve_files;
use deshielo::place::problem::Argument;
use deshielo::place::{Source, read};

use super::demo;

const GOOD: &str = r#"name = { en = "A test", es = "Una prueba" }
text = { en = "To test with.", es = "Para probar." }

[[step]]
key = "start"
view = "valley"
prompt = { en = "Look.", es = "Mire." }
then = "warm"

[[step]]
key = "warm"
view = "season"
year = "dry"
dials = { warming = 2 }
allow = { warming = { least = 0, most = 4, step = 1 } }
prompt = { en = "What then?", es = "¿Y entonces?" }
reveal = { en = "This.", es = "Esto." }
guess = { sign = "survey_swe_mm", of = "change", least = -200, most = 100, step = 10, usual = 0, if_far = "last" }
expect = [{ sign = "snow_share", of = "change", is = "below", value = -0.01 }]

[[step]]
key = "last"
view = "canals"
prompt = { en = "Talk.", es = "Hablen." }
talk = { en = "Well.", es = "Pues bien." }
expect = [{ canal = "newest", sign = "last_full_date", is = "between", least = "07-01", most = "09-30" }]
"#;

fn check(text: &str) -> LessonOutcome {
    check_lesson(Path::new("test.toml"), text, &mut Waters::new(demo()).unwrap()).unwrap()
}

fn told(text: &str) -> Vec<(&'static str, usize)> {
    let outcome = check(text);
    assert_eq!(outcome.lesson.is_none(), !outcome.problems.is_empty());
    outcome.problems.iter().map(|problem| (problem.message, problem.at.line)).collect()
}

#[test]
fn a_good_lesson_has_no_mistakes() {
    assert_eq!(told(GOOD), []);
}

#[test]
fn every_mistake_stands_at_its_line() {
    // What is good, what it becomes, the problem, and the line of the file.
    let long = format!("en = \"{}\"", "x".repeat(151));
    let cases: [(&str, &str, &str, usize); 31] = [
        ("prompt = { en = \"Look.\", es = \"Mire.\" }", "prompt = { en = \"Look.\" }", "problem-name-language", 7),
        ("reveal = { en = \"This.\", es = \"Esto.\" }", "reveal = \"This.\"", "problem-name-one-language", 17),
        ("reveal = { en = \"This.\", es = \"Esto.\" }\n", "", "problem-key-missing", 10),
        ("en = \"Look.\"", &long, "problem-lesson-text-long", 7),
        ("year = \"dry\"", "year = \"dri\"", "problem-lesson-year", 13),
        ("year = \"dry\"", "year = 1902", "problem-lesson-year", 13),
        ("view = \"season\"", "view = \"seasons\"", "problem-choice", 12),
        ("view = \"season\"\n", "", "problem-key-missing", 10),
        ("dials = { warming = 2 }", "dials = { warning = 2 }", "problem-dial-unknown", 14),
        ("dials = { warming = 2 }", "dials = { warming = 9 }", "problem-number-range", 14),
        ("most = 4", "most = 1", "problem-lesson-dial-outside", 15),
        ("least = 0, most = 4", "least = 4, most = 4", "problem-dial-range", 15),
        ("then = \"warm\"", "then = \"worm\"", "problem-lesson-step-unknown", 8),
        ("then = \"warm\"", "then = \"start\"", "problem-lesson-step-back", 8),
        ("then = \"warm\"", "then = \"last\"", "problem-lesson-unreachable", 11),
        ("then = \"warm\"", "then = \"end\"", "problem-lesson-unreachable", 11),
        ("if_far = \"last\"", "if_far = \"lost\"", "problem-lesson-step-unknown", 18),
        ("key = \"last\"", "key = \"warm\"", "problem-lesson-step-unknown", 18),
        ("sign = \"survey_swe_mm\"", "sign = \"survey_swe\"", "problem-lesson-sign", 18),
        ("of = \"change\", least", "of = \"changes\", least", "problem-choice", 18),
        ("step = 10", "step = 1", "problem-lesson-guess-stops", 18),
        ("step = 10", "step = 0", "problem-number-range", 18),
        ("usual = 0", "usual = 500", "problem-lesson-usual-outside", 18),
        ("usual = 0", "usual = -60", "problem-lesson-usual-right", 18),
        ("least = -200", "least = 0", "problem-lesson-guess-range", 18),
        ("sign = \"snow_share\"", "sign = \"snow_part\"", "problem-lesson-sign", 19),
        ("value = -0.01", "value = -0.5", "problem-lesson-expect-below", 19),
        ("is = \"below\"", "is = \"under\"", "problem-choice", 19),
        ("canal = \"newest\"", "canal = \"norteño\"", "problem-lesson-canal", 26),
        ("sign = \"last_full_date\"", "sign = \"last_day\"", "problem-lesson-canal-sign", 26),
        ("most = \"09-30\"", "most = \"07-02\"", "problem-lesson-expect-between", 26),
    ];
    for (good, bad, problem, line) in cases {
        assert!(GOOD.contains(good), "{good}");
        let found = told(&GOOD.replacen(good, bad, 1));
        assert!(found.contains(&(problem, line)), "{good} → {bad}: {found:?}");
    }
}

#[test]
fn a_failed_expectation_says_what_came_out() {
    let outcome = check(&GOOD.replace("value = -0.01", "value = -0.5"));
    let came = outcome.problems[0].arguments.iter().find(|(name, _)| *name == "came").unwrap();
    let Argument::Text(came) = &came.1 else { panic!("text") };
    let came: f64 = came.parse().unwrap();
    assert!((-0.2..-0.01).contains(&came), "{came}");
    // The value of a date is told as the file would write it.
    let outcome = check(&GOOD.replace("most = \"09-30\"", "most = \"07-02\""));
    let Argument::Text(came) = &outcome.problems[0].arguments.iter().find(|(name, _)| *name == "came").unwrap().1
    else {
        panic!("text")
    };
    assert!(came.starts_with("08-") || came.starts_with("09-"), "{came}");
    let never = GOOD.replace(
        "sign = \"snow_share\", of = \"change\", is = \"below\", value = -0.01",
        "sign = \"fill_date\", is = \"none\"",
    );
    let never = never.replace("dials = { warming = 2 }", "dials = { winter_precipitation = -50 }");
    let never = never.replace("allow = { warming = { least = 0, most = 4, step = 1 } }\n", "");
    assert_eq!(told(&never), [], "the reservoir does not fill");
    assert_eq!(
        told(&never.replace("-50", "0")),
        [("problem-lesson-usual-right", 17), ("problem-lesson-expect-none", 18)]
    );
}

#[test]
fn a_place_without_the_dial_refuses_the_step_at_its_line() {
    let place = read(Source::Embedded(piedranieve_files())).place.unwrap();
    let waters = Waters::new(&place).unwrap();
    let text = GOOD.replace("dials = { warming = 2 }", "dials = { starting_storage = 50 }");
    let outcome = read_lesson(Path::new("test.toml"), &text, &waters);
    let told: Vec<_> = outcome.problems.iter().map(|problem| (problem.message, problem.at.line)).collect();
    assert_eq!(told, [("problem-lesson-dial-absent", 14)]);
    assert!(outcome.lesson.is_none());
    // With the dials that it has the same lesson is read.
    assert_eq!(read_lesson(Path::new("test.toml"), GOOD, &waters).problems, []);
}

#[test]
fn files_of_any_bytes_break_nothing() {
    let waters = Waters::new(demo()).unwrap();
    let mut state = 11_u64;
    for round in 0..300 {
        let mut bytes = GOOD.as_bytes().to_vec();
        for _ in 0..=round % 5 {
            // A plain generator of numbers (Knuth's constants, from memory) is enough to spread damage about.
            state = state.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
            let at = (state >> 33) as usize % bytes.len();
            if state >> 60 & 1 == 0 {
                bytes[at] = 0x20 + (state >> 20) as u8 % 0x5f;
            } else {
                bytes.truncate(at.max(1));
            }
        }
        let text = String::from_utf8_lossy(&bytes);
        let outcome = read_lesson(Path::new("test.toml"), &text, &waters);
        if let Some(lesson) = outcome.lesson {
            assert!(!lesson.steps.is_empty());
        }
    }
}
