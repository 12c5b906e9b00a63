//! The command itself, in a fresh folder.

use std::fs;
use std::process::{Command, Output};

use crate::support::{Desk, PLACE};

fn deshielo(desk: &Desk, arguments: &[&str]) -> Output {
    let mut command = Command::new(env!("CARGO_BIN_EXE_deshielo"));
    for name in ["LC_ALL", "LC_MESSAGES", "LANG"] {
        command.env_remove(name);
    }
    command.current_dir(desk.path("")).args(["bundle"]).args(arguments).output().unwrap()
}

fn said(output: &Output) -> String {
    String::from_utf8(output.stderr.clone()).unwrap()
}

#[test]
fn a_valley_travels_with_its_lesson_and_its_board() {
    let desk = Desk::new();
    let board = concat!(env!("CARGO_MANIFEST_DIR"), "/cross/boards/st7789-240x240.toml");
    let make = ["demo", "--lesson", "line_the_canal", "--board", board, "--out", "valley.zip"];
    let made = deshielo(&desk, &make);
    assert!(made.status.success(), "{}", said(&made));
    let bytes = fs::read(desk.path("valley.zip")).unwrap();
    deshielo(&desk, &make);
    assert_eq!(fs::read(desk.path("valley.zip")).unwrap(), bytes, "the same bytes again");
    let opened = deshielo(&desk, &["--open", "valley.zip", "--into", "valley"]);
    assert!(opened.status.success(), "{}", said(&opened));
    let source = concat!(env!("CARGO_MANIFEST_DIR"), "/demo-data/tresnubes/place.toml");
    assert_eq!(fs::read(desk.path("valley").join(PLACE)).unwrap(), fs::read(source).unwrap());
    assert!(desk.path("valley/lessons/line_the_canal.toml").is_file());
    assert_eq!(fs::read(desk.path("valley/board.toml")).unwrap(), fs::read(board).unwrap());
}

#[test]
fn a_place_with_a_mistake_is_not_carried() {
    let desk = Desk::new();
    fs::create_dir(desk.path("valley")).unwrap();
    desk.put("valley/place.toml", b"[place]\n");
    let made = deshielo(&desk, &["valley", "--out", "valley.zip"]);
    assert_eq!(made.status.code(), Some(1));
    assert!(said(&made).contains("valley/place.toml"), "{}", said(&made));
    assert_eq!(desk.names(), ["valley"]);
}

#[test]
fn every_refusal_says_what_to_do_in_both_languages() {
    let desk = Desk::new();
    desk.put("not.zip", b"hello");
    for (arguments, code, english, spanish) in [
        (&["--open", "not.zip", "--into", "x"][..], 1, "is not a bundle", "no es un paquete"),
        (&["--open", "not.zip"], 2, "--into", "--into"),
        (&["--into", "x"], 2, "--open", "--open"),
        (&[], 2, "--out", "--out"),
        (&["demo", "--open", "not.zip", "--into", "x"], 2, "not both", "no las dos"),
        (&["--open", "none.zip", "--into", "x"], 1, "cannot be used", "No se puede usar"),
    ] {
        for (language, part) in [("en", english), ("es", spanish)] {
            let output = deshielo(&desk, &[arguments, &["--lang", language]].concat());
            assert_eq!(output.status.code(), Some(code), "{arguments:?}: {}", said(&output));
            assert!(said(&output).contains(part), "{arguments:?}: {}", said(&output));
        }
    }
    assert_eq!(desk.names(), ["not.zip"]);
}
