//! Worksheets and answer keys of every lesson that is part of the program.

use deshielo::lesson::lessons;

use super::command::{Desk, pages_of, said_in};

#[test]
fn every_lesson_has_both_sheets_in_both_languages() {
    let desk = Desk::new();
    for (name, _) in lessons() {
        for sheet in ["work", "key"] {
            let line = format!("handout demo --lesson {name} --sheet {sheet} --lang both --out sheet.pdf");
            let pdf = desk.write(&line, "sheet.pdf");
            let pages = pages_of(&pdf);
            assert!(pdf.len() < 60_000 * pages, "{name} {sheet}: {} bytes on {pages} pages", pdf.len());
        }
    }
}

#[test]
fn the_worksheet_keeps_what_the_key_tells() {
    let desk = Desk::new();
    let sheet = |kind: &str, lang: &str| {
        let line = format!("handout demo --lesson less_snow_more_rain --sheet {kind} --lang {lang} --out sheet.svg");
        said_in(&desk.write_text(&line, "sheet.svg"))
    };
    let (work, key) = (sheet("work", "en"), sheet("key", "en"));
    let reveal = "Most of this valley’s water falls as snow.";
    let reveal_plain = reveal.replace('’', "'");
    let told = |said: &str| said.contains(reveal) || said.contains(&reveal_plain);
    assert!(told(&key) && !told(&work), "{key}");
    for part in ["Group 1", "Group 6", "Names", "We think so because", "What part of it falls as snow?"] {
        assert!(work.contains(part), "{part}: {work}");
    }
    assert!(key.contains("The model says: ") && key.contains("Many people say: 50%"), "{key}");
    assert!(!work.contains("Many people say"));
    let spanish = sheet("work", "es");
    assert!(spanish.contains("Hoja de trabajo") && spanish.contains("Grupo 1"), "{spanish}");
}
