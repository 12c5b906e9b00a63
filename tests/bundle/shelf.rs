//! An unattended board takes bundles, tries them, and goes back.

use std::fs;
use std::path::{Path, PathBuf};

use deshielo::bundle::{Began, Fault, Shelf, bundles_on};

use crate::support::{Desk, PLACE, archive, contents, names, sums};

fn bundle(desk: &Desk, mark: &str) -> PathBuf {
    desk.put(&format!("{mark}.zip"), &contents(mark).pack().unwrap())
}

fn mark_of(folder: &Path) -> String {
    fs::read_to_string(folder.join(PLACE)).unwrap().trim_start_matches("# ").trim_end().to_owned()
}

/// A start of the program: the shelf is opened anew.
fn start(desk: &Desk, is_well: bool) -> Began {
    let mut shelf = Shelf::open(desk.path("shelf"));
    let began = shelf.begin().unwrap();
    if is_well {
        shelf.started_well().unwrap();
    }
    began
}

fn marked(began: &Began) -> Option<String> {
    match began {
        Began::With(folder) | Began::WentBack(Some(folder)) => Some(mark_of(folder)),
        Began::Without | Began::WentBack(None) => None,
    }
}

#[test]
fn one_that_starts_well_stays() {
    let desk = Desk::new();
    assert_eq!(start(&desk, false), Began::Without);
    Shelf::open(desk.path("shelf")).take(&bundle(&desk, "one")).unwrap();
    for _ in 0..10 {
        assert_eq!(marked(&start(&desk, true)).as_deref(), Some("one"));
    }
    // From then on a start that fails is not the bundle's fault.
    for _ in 0..10 {
        assert_eq!(marked(&start(&desk, false)).as_deref(), Some("one"));
    }
}

#[test]
fn one_that_does_not_start_gives_way_to_the_one_before() {
    let desk = Desk::new();
    Shelf::open(desk.path("shelf")).take(&bundle(&desk, "one")).unwrap();
    start(&desk, true);
    Shelf::open(desk.path("shelf")).take(&bundle(&desk, "two")).unwrap();
    assert_eq!(marked(&start(&desk, false)).as_deref(), Some("two"));
    assert_eq!(marked(&start(&desk, false)).as_deref(), Some("two"));
    let third = start(&desk, true);
    assert!(matches!(third, Began::WentBack(Some(_))), "{third:?}");
    assert_eq!(marked(&third).as_deref(), Some("one"));
    assert_eq!(marked(&start(&desk, true)).as_deref(), Some("one"));
    assert_eq!(names(&desk.path("shelf")).iter().filter(|name| name.starts_with("bundle-")).count(), 1);
}

#[test]
fn the_first_that_does_not_start_leaves_what_the_command_line_says() {
    let desk = Desk::new();
    Shelf::open(desk.path("shelf")).take(&bundle(&desk, "one")).unwrap();
    assert_eq!((marked(&start(&desk, false)).is_some(), marked(&start(&desk, false)).is_some()), (true, true));
    assert_eq!(start(&desk, false), Began::WentBack(None));
    assert_eq!(start(&desk, false), Began::Without);
}

#[test]
fn two_in_a_row_that_do_not_start_lead_to_the_last_that_did() {
    let desk = Desk::new();
    Shelf::open(desk.path("shelf")).take(&bundle(&desk, "good")).unwrap();
    start(&desk, true);
    Shelf::open(desk.path("shelf")).take(&bundle(&desk, "bad")).unwrap();
    start(&desk, false);
    Shelf::open(desk.path("shelf")).take(&bundle(&desk, "worse")).unwrap();
    let marks: Vec<_> = (0..3).map(|_| marked(&start(&desk, false)).unwrap()).collect();
    assert_eq!(marks, ["worse", "worse", "good"]);
}

#[test]
fn a_crafted_bundle_changes_nothing() {
    let desk = Desk::new();
    let mut shelf = Shelf::open(desk.path("shelf"));
    shelf.take(&bundle(&desk, "one")).unwrap();
    start(&desk, true);
    let before = names(&desk.path("shelf"));
    let evil: [(&str, &[u8]); 2] = [(PLACE, b"#"), ("../evil", b"evil")];
    let file = desk.put("evil.zip", &archive(&sums(&evil), &evil));
    let mut shelf = Shelf::open(desk.path("shelf"));
    assert_eq!(shelf.take(&file), Err(Fault::Name("../evil".to_owned())));
    assert_eq!(names(&desk.path("shelf")), before);
    assert_eq!(marked(&start(&desk, false)).as_deref(), Some("one"));
}

#[test]
fn a_person_may_go_back_and_forth() {
    let desk = Desk::new();
    for mark in ["one", "two"] {
        Shelf::open(desk.path("shelf")).take(&bundle(&desk, mark)).unwrap();
        start(&desk, true);
    }
    let mut shelf = Shelf::open(desk.path("shelf"));
    assert_eq!(mark_of(&shelf.before().unwrap()), "one");
    assert_eq!(shelf.go_back(), Ok(true));
    assert_eq!((mark_of(&shelf.in_use().unwrap()), mark_of(&shelf.before().unwrap())), ("one".into(), "two".into()));
    assert_eq!(shelf.go_back(), Ok(true));
    assert_eq!(mark_of(&shelf.in_use().unwrap()), "two");
}

/// The power goes between unpacking and saying so, or a card loses a folder.
#[test]
fn what_a_power_cut_leaves_is_cleared_and_what_is_lost_is_noticed() {
    let desk = Desk::new();
    Shelf::open(desk.path("shelf")).take(&bundle(&desk, "one")).unwrap();
    start(&desk, true);
    fs::create_dir_all(desk.path("shelf/.deshielo-half/place")).unwrap();
    fs::create_dir_all(desk.path("shelf/bundle-9/place")).unwrap();
    assert_eq!(marked(&start(&desk, true)).as_deref(), Some("one"));
    let mut shelf = Shelf::open(desk.path("shelf"));
    shelf.take(&bundle(&desk, "two")).unwrap();
    start(&desk, true);
    assert!(!desk.path("shelf/.deshielo-half").exists());
    let two = Shelf::open(desk.path("shelf")).in_use().unwrap();
    fs::remove_dir_all(two).unwrap();
    assert_eq!(marked(&start(&desk, true)).as_deref(), Some("one"));
}

#[test]
fn a_stick_is_looked_through_by_name() {
    let desk = Desk::new();
    for name in ["b.zip", "a.ZIP", ".hidden.zip", "photo.jpg"] {
        desk.put(name, b"");
    }
    fs::create_dir(desk.path("folder.zip")).unwrap();
    assert_eq!(bundles_on(&desk.path("")), [desk.path("a.ZIP"), desk.path("b.zip")]);
    assert!(bundles_on(&desk.path("nowhere")).is_empty());
}
