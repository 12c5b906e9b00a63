//! Lessons: what the shipped ones teach comes out, mistakes stand at their lines, and no result is seen too early.

mod command;
#[path = "../support/goldens.rs"]
mod goldens;
mod leading;
mod mistakes;
mod pictures;
mod rehearse;
mod room;
#[path = "../support/scenes.rs"]
mod scenes;
mod shipped;
mod stepping;
#[path = "../support/valleys.rs"]
mod valleys;
mod voice;

use std::path::Path;
use std::sync::OnceLock;

use deshielo::lesson::{Lesson, Waters, read_lesson};
use deshielo::place::demo::demo_files;
use deshielo::place::{Place, Source, read};

/// The demo place.
fn demo() -> &'static Place {
    static DEMO: OnceLock<Place> = OnceLock::new();
    DEMO.get_or_init(|| read(Source::Embedded(demo_files())).place.expect("the demo place is right"))
}

/// A shipped lesson, read for the demo place.
fn shipped(name: &str) -> Lesson {
    let (_, text) = deshielo::lesson::lessons().iter().find(|(known, _)| *known == name).expect("it is shipped");
    let waters = Waters::new(demo()).unwrap();
    let outcome = read_lesson(Path::new(name), text, &waters);
    outcome.lesson.unwrap_or_else(|| panic!("{name}: {:?}", outcome.problems))
}
