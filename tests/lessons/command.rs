//! `deshielo check` on lessons, and the words for everything that lessons say.

use std::collections::BTreeSet;
use std::fs;
use std::path::Path;
use std::process::Command;

use deshielo::lesson::{LessonSign, lessons};
use deshielo::words::{KNOWN_TAGS, Words};

/// Runs the program and gives its exit code and what it wrote.
fn check(arguments: &[&str]) -> (i32, String) {
    let mut command = Command::new(env!("CARGO_BIN_EXE_deshielo"));
    let output = command.arg("check").args(arguments).output().unwrap();
    assert!(output.stderr.is_empty(), "{}", String::from_utf8_lossy(&output.stderr));
    (output.status.code().unwrap(), String::from_utf8(output.stdout).unwrap())
}

#[test]
fn shipped_lessons_are_checked_by_file_and_by_name() {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR")).join("scenarios");
    let files: Vec<String> =
        lessons().iter().map(|(name, _)| folder.join(format!("{name}.toml")).to_str().unwrap().to_owned()).collect();
    let paths: Vec<&str> = files.iter().map(String::as_str).chain(["line_the_canal", "early_heat"]).collect();
    let (code, out) = check(&[paths.as_slice(), &["--lang", "en"]].concat());
    assert_eq!((code, out.matches("no mistakes").count()), (0, 10), "{out}");
}

#[test]
fn a_mistake_in_a_lesson_is_shown_at_its_line_in_both_languages() {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("mine.toml");
    let (_, text) = lessons()[0];
    fs::write(&path, text.replacen("value = 0.7\n", "value = 0.97\n", 1)).unwrap();
    let line = text.lines().position(|line| line == "value = 0.7").unwrap();
    let path = path.to_str().unwrap();
    let (code, out) = check(&[path, "--lang", "en"]);
    assert_eq!(code, 1);
    assert!(out.contains("should be above 0.97") && out.contains("What came out is 0.788"), "{out}");
    let (code, out) = check(&[path, "--lang", "es", "--form", "json"]);
    assert_eq!(code, 1);
    let found: serde_json::Value = serde_json::from_str(&out).unwrap();
    assert_eq!(found[0]["code"], "problem-lesson-expect-above");
    // The expectation starts three lines above its value.
    assert!((line - 3..=line).contains(&(found[0]["line"].as_u64().unwrap() as usize)), "{out}");
    assert!(found[0]["message"].as_str().unwrap().starts_with("Esto debería pasar de 0.97"), "{out}");
}

#[test]
fn a_lesson_is_tried_on_the_place_that_is_named_with_it() {
    let (code, out) = check(&["piedranieve", "dry_year_full_reservoir", "--lang", "en"]);
    assert_eq!(code, 1);
    assert!(out.contains("piedranieve: no mistakes"), "{out}");
    assert!(out.contains("does not have the dial “starting_storage”"), "{out}");
}

#[test]
fn every_problem_of_a_lesson_and_every_sign_has_its_words() {
    let mut ids = BTreeSet::new();
    for entry in fs::read_dir(Path::new(env!("CARGO_MANIFEST_DIR")).join("src/lesson")).unwrap() {
        let code = fs::read_to_string(entry.unwrap().path()).unwrap();
        for part in code.split("\"problem-lesson").skip(1) {
            ids.insert(format!("problem-lesson{}", part.split('"').next().unwrap()));
        }
    }
    assert!(ids.len() > 18, "{ids:?}");
    for language in ["en", "es"] {
        let file = format!("{}/locales/{language}/lesson-problems.ftl", env!("CARGO_MANIFEST_DIR"));
        let text = fs::read_to_string(file).unwrap();
        let said: BTreeSet<String> =
            text.lines().filter_map(|line| line.split_once(" = ")).map(|(id, _)| id.to_owned()).collect();
        let said: BTreeSet<String> = said.into_iter().filter(|id| id.starts_with("problem-")).collect();
        assert_eq!(said, ids, "{language}");
        assert_eq!(text.matches(".remedy = ").count(), ids.len(), "{language}");
    }
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        for sign in LessonSign::ALL {
            let id = format!("lesson-{}", sign.key().replace('_', "-"));
            for id in [id.clone(), format!("{id}.short"), format!("{id}.plain")] {
                assert!(words.has(&id), "{tag}: {id}");
            }
        }
    }
}
