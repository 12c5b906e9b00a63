//! Every problem of a place has its words in both languages, with the same arguments.

use std::collections::{BTreeMap, BTreeSet};
use std::fs;

/// Messages of a file by id, each with its text and that of its attributes.
fn messages(path: &str) -> BTreeMap<String, String> {
    let text = fs::read_to_string(path).unwrap_or_else(|_| panic!("{path} is there"));
    let mut messages: BTreeMap<String, String> = BTreeMap::new();
    let mut current = String::new();
    for line in text.lines() {
        if let Some((id, _)) = line.split_once(" =").filter(|_| line.starts_with("problem-")) {
            current = id.to_owned();
            assert!(!messages.contains_key(id), "{path}: {id} twice");
            messages.insert(current.clone(), String::new());
        }
        if line.starts_with('#') || line.trim().is_empty() {
            current.clear();
        }
        if let Some(message) = messages.get_mut(&current) {
            message.push_str(line);
            message.push('\n');
        }
    }
    messages
}

fn arguments(text: &str) -> BTreeSet<&str> {
    text.split('$')
        .skip(1)
        .map(|rest| rest.split(|c: char| !c.is_ascii_alphanumeric() && c != '_').next().unwrap_or(""))
        .collect()
}

/// Ids of messages in the code of `src/place` outside of the records, which have a test of their own.
fn ids_in_code() -> BTreeSet<String> {
    let mut ids = BTreeSet::new();
    for file in fs::read_dir("src/place").unwrap() {
        let path = file.unwrap().path();
        if path.extension().is_some_and(|ending| ending == "rs") {
            let code = fs::read_to_string(path).unwrap();
            let tests = code.find("#[cfg(test)]").unwrap_or(code.len());
            for part in code[..tests].split("\"problem-").skip(1) {
                let id = part.split('"').next().unwrap();
                ids.insert(format!("problem-{id}"));
            }
        }
    }
    ids
}

#[test]
fn both_languages_say_every_problem_with_the_same_arguments() {
    let (english, spanish) = (messages("locales/en/problems.ftl"), messages("locales/es/problems.ftl"));
    let code = ids_in_code();
    assert!(code.len() > 90, "the ids were found: {}", code.len());
    assert_eq!(english.keys().cloned().collect::<BTreeSet<_>>(), code);
    assert_eq!(spanish.keys().cloned().collect::<BTreeSet<_>>(), code);
    for (id, text) in &english {
        assert_eq!(arguments(text), arguments(&spanish[id]), "{id}");
        assert_eq!(text.matches(".remedy =").count(), 1, "{id}");
        assert_eq!(spanish[id].matches(".remedy =").count(), 1, "{id}");
        assert_ne!(text, &spanish[id], "{id} is translated");
    }
}

#[test]
fn the_page_for_people_explains_every_key() {
    let page = include_str!("../demo-data/PLACE.md");
    let mut asked: BTreeSet<String> = BTreeSet::new();
    for file in fs::read_dir("src/place").unwrap() {
        let path = file.unwrap().path();
        if path.extension().is_none_or(|ending| ending != "rs") || path.ends_with("setting.rs") {
            continue;
        }
        let code = fs::read_to_string(path).unwrap();
        let code = code.split("#[cfg(test)]").next().unwrap();
        for question in [
            "number",
            "number_or",
            "need_number",
            "numbers",
            "text",
            "need_text",
            "list",
            "flag_or",
            "choice",
            "section",
            "sections",
            "get",
        ] {
            let call = format!(".{question}(\"");
            let asks = code.split(call.as_str()).skip(1);
            asked.extend(asks.map(|rest| rest.split('"').next().unwrap().to_owned()));
        }
    }
    assert!(asked.len() > 80, "{asked:?}");
    let words: BTreeSet<&str> = page.split(|c: char| !c.is_ascii_alphanumeric() && c != '_').collect();
    let silent: Vec<&String> = asked
        .iter()
        .filter(|key| !words.iter().any(|word| word == key || word.starts_with(&format!("{key}_"))))
        .collect();
    assert!(silent.is_empty(), "PLACE.md says nothing of {silent:?}");
}

#[test]
fn regional_words_only_replace_messages_that_exist() {
    let spanish = messages("locales/es/problems.ftl");
    for region in ["es-embalse"] {
        for (id, text) in messages(&format!("locales/{region}/problems.ftl")) {
            let known = spanish.get(&id).unwrap_or_else(|| panic!("{region}: {id}"));
            assert_eq!(arguments(&text), arguments(known), "{region}: {id}");
            assert!(known.contains("presa") && !text.contains("la presa"), "{region}: {id}");
        }
    }
}
