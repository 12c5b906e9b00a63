//! The map of the house, read off the `use` lines and paths of every source file: arrows only go down.

use std::fs;
use std::path::{Path, PathBuf};

/// What each part of the crate may name of the others: a whole part, or one path within it. A part that is not here may
/// not exist. `commands` and the two roots may name everything.
///
/// * `water` is the ground floor; `signs` read it and change nothing.
/// * `place`, `generator`, `fit`, `whatif` and `lesson` bring values to the water, and never words: what is wrong is told as data.
///   A lesson is read for a place, and with its reader of files.
/// * `place` takes from `words` only the comparing of names that were mistyped.
/// * `words` know units and the keys of what they name, no numbers of a run.
/// * `picture` draws values: plain data of the water and the signs, never what runs them.
/// * `session` is the instrument as a state; `board` is the world outside and knows pixels and events, not
///   water: of a place it has the reader of files, of the water the names of the dials.
const MAY_NAME: [(&str, &[&str]); 15] = [
    ("water", &[]),
    ("signs", &["water"]),
    ("place", &["water", "signs", "words::nearest"]),
    ("generator", &["water", "signs"]),
    ("fit", &["water", "signs", "generator::random"]),
    ("whatif", &["water", "signs"]),
    ("lesson", &["water", "signs", "place"]),
    ("words", &["water::units", "water::dials", "water::ledger", "signs::Sign", "signs::SignKind", "signs::SIGNS"]),
    (
        "picture",
        &["signs", "words", "water::valley", "water::calendar", "water::dials", "water::ledger", "water::units"],
    ),
    ("session", &["picture", "words", "signs", "water", "place", "lesson"]),
    (
        "board",
        &[
            "picture",
            "session",
            "place::Text",
            "place::problem",
            "place::section",
            "place::text",
            "place::tree",
            "place::unit_suffix",
            "water::dials",
        ],
    ),
    ("open_data", &[]),
    ("handout", &["picture", "words", "signs", "water"]),
    ("keep", &["water::dials", "session"]),
    ("bundle", &["keep"]),
];
const ROOTS: [&str; 3] = ["commands", "lib", "main"];

/// Files that are one flat table, and so may be long.
const FLAT_TABLES: [&str; 1] = ["place/crop_table.rs"];
const MOST_LINES: usize = 500;

/// Names that say nothing of what a file is for.
const EMPTY_NAMES: [&str; 6] = ["util", "utils", "manager", "helper", "helpers", "common"];

/// Every source file, by its path below `src`.
fn sources() -> Vec<(String, String)> {
    let root = Path::new(env!("CARGO_MANIFEST_DIR")).join("src");
    let (mut found, mut folders) = (Vec::new(), vec![PathBuf::new()]);
    while let Some(folder) = folders.pop() {
        for entry in fs::read_dir(root.join(&folder)).unwrap() {
            let entry = entry.unwrap();
            let path = folder.join(entry.file_name());
            if entry.path().is_dir() {
                folders.push(path);
            } else if path.extension().is_some_and(|extension| extension == "rs") {
                let name = path.to_str().unwrap().replace('\\', "/");
                found.push((name, fs::read_to_string(entry.path()).unwrap()));
            }
        }
    }
    found.sort();
    found
}

/// The modules that lead to a file: `water/crop/soil.rs` is `water`, `crop`, `soil`; `water/crop/mod.rs` the first two.
fn module_of(file: &str) -> Vec<String> {
    let mut modules: Vec<String> = file.trim_end_matches(".rs").split('/').map(str::to_owned).collect();
    if modules.last().is_some_and(|last| last == "mod") {
        modules.pop();
    }
    if modules.len() == 1 && ["lib", "main"].contains(&modules[0].as_str()) {
        modules.clear();
    }
    modules
}

/// The code alone: comments and what is in quotes left out.
fn code_of(text: &str) -> String {
    let mut code = String::new();
    for line in text.lines() {
        let mut quoted = false;
        let (mut last, mut chars) = (' ', line.chars().peekable());
        while let Some(c) = chars.next() {
            match c {
                '"' if last != '\\' && last != '\'' => quoted = !quoted,
                '/' if !quoted && chars.peek() == Some(&'/') => break,
                _ if !quoted => code.push(c),
                _ => {}
            }
            last = if last == '\\' && c == '\\' { ' ' } else { c };
        }
        code.push('\n');
    }
    code
}

/// Reads what follows `::`: names, and braces with several of them. Every path found is `before` and more.
fn paths_after(before: &[String], code: &str, found: &mut Vec<Vec<String>>) {
    let code = code.trim_start();
    if let Some(inside) = code.strip_prefix('{') {
        let (mut depth, mut start) = (0, 0);
        for (at, c) in inside.char_indices() {
            match c {
                '{' => depth += 1,
                '}' if depth > 0 => depth -= 1,
                ',' | '}' if depth == 0 => {
                    paths_after(before, &inside[start..at], found);
                    start = at + 1;
                    if c == '}' {
                        return;
                    }
                }
                _ => {}
            }
        }
        return;
    }
    let end = code.find(|c: char| !(c.is_alphanumeric() || c == '_')).unwrap_or(code.len());
    let (name, rest) = code.split_at(end);
    let mut path = before.to_vec();
    match name {
        "" | "self" => {}
        "super" => {
            path.pop();
        }
        name => path.push(name.to_owned()),
    }
    match rest.trim_start().strip_prefix("::") {
        Some(more) if !name.is_empty() => paths_after(&path, more, found),
        _ => found.push(path),
    }
}

/// Every path of our own crate that a file names, from the crate's root.
fn named(file: &str, text: &str) -> Vec<Vec<String>> {
    let mut found = Vec::new();
    let module = module_of(file);
    // A file's own tests are a module deeper.
    let code = code_of(text);
    let (body, tests) = code.split_once("#[cfg(test)]").unwrap_or((&code, ""));
    let mut tests_module = module.clone();
    tests_module.push("tests".to_owned());
    for (code, module) in [(body, &module), (tests, &tests_module)] {
        for (at, _) in code.match_indices("::") {
            let word_start = code[..at].rfind(|c: char| !(c.is_alphanumeric() || c == '_')).map_or(0, |end| end + 1);
            // Only where a path begins: what comes before its first word is no `::`.
            if code[..word_start].ends_with("::") {
                continue;
            }
            match &code[word_start..at] {
                "crate" | "deshielo" | "$crate" => paths_after(&[], &code[at + 2..], &mut found),
                "super" => paths_after(&module[..module.len().saturating_sub(1)], &code[at + 2..], &mut found),
                _ => {}
            }
        }
    }
    found.retain(|path| !path.is_empty());
    found
}

fn may_name(part: &str, path: &[String]) -> bool {
    if path[0] == part {
        return true;
    }
    let Some((_, allowed)) = MAY_NAME.iter().find(|(name, _)| *name == part) else { return false };
    allowed.iter().any(|allowed| {
        let mut wanted = allowed.split("::");
        wanted.by_ref().zip(path).all(|(wanted, got)| wanted == got) && path.len() >= allowed.split("::").count()
    })
}

#[test]
fn arrows_only_go_down() {
    let sources = sources();
    assert!(sources.len() > 50, "only {} files were read", sources.len());
    let (mut across, mut wrong) = (0, Vec::new());
    for (file, text) in &sources {
        let module = module_of(file);
        let part = module.first().map_or("lib", String::as_str);
        if ROOTS.contains(&part) {
            continue;
        }
        if !MAY_NAME.iter().any(|(name, _)| *name == part) {
            wrong.push(format!("src/{file}: the part `{part}` is not on the map"));
        }
        for path in named(file, text) {
            across += usize::from(path[0] != part);
            if !may_name(part, &path) {
                wrong.push(format!("src/{file}: `{part}` may not name `{}`", path.join("::")));
            }
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
    assert!(across > 30, "only {across} paths from one part to another were seen");
}

#[test]
fn the_reader_of_paths_sees_what_it_should() {
    let text = "use crate::{water::{units, lake::Vessel}, words};\n// crate::keep::Never\nlet a = \"crate::keep\";\n\
                fn f() -> super::super::signs::Sign {}\n#[cfg(test)]\nmod tests { use super::*; use super::super::x; }";
    let mut got: Vec<String> = named("picture/chart/line.rs", text).iter().map(|path| path.join("::")).collect();
    got.sort();
    let want = ["picture::chart::line", "picture::chart::x", "picture::signs::Sign"];
    let more = ["water::lake::Vessel", "water::units", "words"];
    assert_eq!(got, want.into_iter().chain(more).collect::<Vec<_>>());
    let path = |text: &str| text.split("::").map(str::to_owned).collect::<Vec<_>>();
    assert!(may_name("words", &path("water::units::MM_PER_INCH")) && !may_name("words", &path("water::basin::Basin")));
    assert!(!may_name("words", &path("water")) && !may_name("water", &path("signs::Sign")));
    assert!(!may_name("attic", &path("water")) && may_name("session", &path("picture")));
}

#[test]
fn files_are_short_and_say_what_they_are() {
    for (file, text) in sources() {
        let lines = text.lines().count();
        assert!(lines <= MOST_LINES || FLAT_TABLES.contains(&file.as_str()), "src/{file} has {lines} lines");
        assert!(text.starts_with("//! ") || file == "main.rs", "src/{file} does not begin with a sentence");
        for name in module_of(&file) {
            assert!(!EMPTY_NAMES.contains(&name.as_str()), "src/{file}: {name} says nothing");
        }
    }
}
