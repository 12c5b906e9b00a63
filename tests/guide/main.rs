//! The commands of `README.md`, run one after the other as a newcomer would, on a made-up valley that is not the demo.

mod records;

use std::path::Path;
use std::process::{Command, Output};

const README: &str = include_str!("../../README.md");

/// Flags that only spare time: a search as long as the usual one would take minutes in a test.
const SHORTER: [(&str, &[&str]); 2] = [
    ("fit", &["--starts", "1", "--runs", "40", "--sets", "20"]),
    // A window cannot be closed by a test; the same frames go to pictures.
    ("show", &["--screen", "pictures", "--into", "shown", "--size", "320x240"]),
];

/// The lines of README.md that can be run as they stand, by chapter.
fn commands(chapter: &str) -> Vec<Vec<String>> {
    let (_, text) = README.split_once(&format!("\n## {chapter}\n")).expect("README.md has this chapter");
    let text = text.split_once("\n## ").map_or(text, |(text, _)| text);
    let lines = text.lines().filter_map(|line| line.strip_prefix("    deshielo "));
    lines.map(words).collect()
}

/// The words of a line; double quotes keep some together.
fn words(line: &str) -> Vec<String> {
    let mut words = Vec::new();
    for (at, part) in line.split('"').enumerate() {
        if at % 2 == 1 {
            words.push(part.to_owned());
        } else {
            words.extend(part.split_whitespace().map(str::to_owned));
        }
    }
    words
}

fn run(folder: &Path, words: &[String]) -> Output {
    let mut command = Command::new(env!("CARGO_BIN_EXE_deshielo"));
    command.current_dir(folder).env("LANG", "en_US.UTF-8").args(words);
    if let Some((_, more)) = SHORTER.iter().find(|(name, _)| words.first().is_some_and(|word| word == name)) {
        command.args(more.iter().filter(|more| !words.iter().any(|word| word == *more)));
    }
    command.output().unwrap()
}

#[test]
fn a_newcomers_hour_and_the_day_before_the_meeting() {
    let folder = tempfile::tempdir().unwrap();
    records::write(folder.path());
    let hour = commands("Your own valley in an hour");
    let before = commands("Before the meeting");
    assert!(hour.len() >= 10 && before.len() >= 7, "{} and {} commands", hour.len(), before.len());
    for words in hour.iter().chain(&before) {
        let output = run(folder.path(), words);
        let (out, err) = (String::from_utf8_lossy(&output.stdout), String::from_utf8_lossy(&output.stderr));
        assert!(output.status.success(), "deshielo {}\n{out}\n{err}", words.join(" "));
    }
    for made in [
        "myvalley/place.toml",
        "myvalley/fit.toml",
        "pages/valley-en-US-800x480.png",
        "warmer.pdf",
        "worksheet.pdf",
        "key.pdf",
        "warmer.nc",
        "warmer/days.csv",
        "map.csv",
    ] {
        let path = folder.path().join(made);
        assert!(path.metadata().is_ok_and(|file| file.len() > 0), "{made} was not made");
    }
}

#[test]
fn every_command_of_the_program_is_named() {
    let help = Command::new(env!("CARGO_BIN_EXE_deshielo")).args(["--help", "--lang", "en"]).output().unwrap();
    let help = String::from_utf8(help.stdout).unwrap();
    let (_, listed) = help.split_once("Commands:\n").unwrap();
    let (listed, _) = listed.split_once("\n\n").unwrap();
    let names = listed.lines().filter(|line| line.starts_with("  ") && !line.starts_with("   "));
    let names: Vec<&str> = names.filter_map(|line| line.split_whitespace().next()).collect();
    assert!(names.len() >= 10, "{names:?}");
    for name in names {
        assert!(README.contains(&format!("    deshielo {name} ")), "README.md does not show `{name}`");
    }
}
