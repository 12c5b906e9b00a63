//! `check`: every mistake at its line, for people and for tools.

use serde_json::Value;

use super::support::{Bench, place, run};

fn broken() -> Bench {
    let bench = Bench::new().with_place("valley");
    let path = bench.path("valley/place.toml");
    let text = std::fs::read_to_string(&path).unwrap();
    let text = text.replace("capacity_hm3 = 22", "capacity_hm3 = 1").replace("survey_day", "surveyday");
    std::fs::write(&path, text).unwrap();
    let path = bench.path("valley/weather.csv");
    let mut lines: Vec<String> = std::fs::read_to_string(&path).unwrap().lines().map(str::to_owned).collect();
    lines[9] = "2001-10-08,45,12,0.0,50,2,10".into();
    lines.remove(20);
    std::fs::write(&path, lines.join("\n")).unwrap();
    bench
}

#[test]
fn what_is_good_is_said_to_be_good() {
    let told = run(&["check", &place(), "demo", "early_heat"]);
    assert_eq!((told.code, told.err.as_str()), (0, ""));
    assert_eq!(told.out.matches("no mistakes").count(), 3, "{}", told.out);
    assert_eq!(run(&["check", &place(), "--form", "json"]).out.trim(), "[]");
}

#[test]
fn all_mistakes_stand_at_their_lines_in_order() {
    let bench = broken();
    let told = bench.run(&["check", "valley"]);
    assert_eq!((told.code, told.err.as_str()), (1, ""));
    for part in ["valley/place.toml:", "valley/weather.csv:10:12", "2001-10-08,45,12", "What to do:", "^^"] {
        assert!(told.out.contains(part), "{part}\n{}", told.out);
    }
    let spanish = bench.run(&["check", "valley", "--lang", "es"]).out;
    assert!(spanish.contains("Qué hacer:") && !spanish.contains("Mistake") && !spanish.contains("help"), "{spanish}");

    let told = bench.run(&["check", "valley", "--form", "json"]);
    assert_eq!(told.code, 1);
    let entries: Vec<Value> = serde_json::from_str(&told.out).unwrap();
    assert!(entries.len() >= 4, "{entries:?}");
    let places: Vec<(String, u64)> = entries
        .iter()
        .map(|entry| (entry["file"].as_str().unwrap().to_owned(), entry["line"].as_u64().unwrap()))
        .collect();
    assert!(places.is_sorted(), "{places:?}");
    for entry in &entries {
        for key in ["file", "line", "column", "length", "severity", "code", "message", "remedy"] {
            assert!(entry.get(key).is_some(), "{key}");
        }
        assert!(entry["code"].as_str().unwrap().starts_with("problem-"));
        assert!(!entry["message"].as_str().unwrap().is_empty());
    }
}

#[test]
fn what_is_not_there_or_not_ours_is_told() {
    let bench = Bench::new();
    std::fs::write(bench.path("notes.txt"), "x").unwrap();
    std::fs::write(bench.path("odd.toml"), [0xff, 0xfe]).unwrap();
    std::fs::create_dir(bench.path("empty")).unwrap();
    for (path, part) in [
        ("nowhere", "no place at nowhere"),
        ("notes.txt", "not a place, a setting, a lesson or a board file"),
        ("odd.toml", "not text in UTF-8"),
        ("empty", "no place at empty"),
    ] {
        let told = bench.run(&["check", path]);
        assert_eq!(told.code, 1, "{path}");
        assert!(told.out.contains(part), "{path}: {}", told.out);
        let entries: Value = serde_json::from_str(&bench.run(&["check", path, "--form", "json"]).out).unwrap();
        assert_eq!(entries[0]["code"], "unreadable");
    }
}

#[test]
fn board_files_are_checked_too_and_say_the_language() {
    let bench = Bench::new();
    let good = include_str!("../../cross/boards/ili9341-320x240.toml");
    std::fs::write(bench.path("board.toml"), good).unwrap();
    std::fs::write(bench.path("bad.toml"), good.replace("reset_pin = 24", "reset_pin = 11")).unwrap();
    assert_eq!(bench.run(&["check", "board.toml"]).code, 0);
    let told = bench.run(&["check", "bad.toml"]);
    assert_eq!((told.code, told.err.as_str()), (1, ""));
    for part in ["bad.toml:27:13", "Pin 11 cannot be “reset_pin”: it is spi0 SCLK, and line 23 uses that bus."] {
        assert!(told.out.contains(part), "{part}\n{}", told.out);
    }
    assert!(bench.run(&["check", "bad.toml", "--lang", "es"]).out.contains("La patilla 11 no puede ser «reset_pin»"));
    // Nothing is opened with a board file that is wrong, and what is said of it is said in the language at hand.
    let told = bench.run(&["show", "--board", "bad.toml"]);
    assert!(told.code == 1 && told.err.contains("Pin 11"), "{}", told.err);
    // This board speaks Spanish; here is no panel, whether this build knows panels or not.
    let told = bench.run(&["show", "--board", "board.toml"]);
    assert!(told.code == 1 && told.err.contains("pantalla pequeña"), "{}", told.err);
}

#[test]
fn files_of_any_bytes_break_nothing() {
    let bench = Bench::new().with_place("valley");
    let good = std::fs::read(bench.path("valley/place.toml")).unwrap();
    let mut state = 7_u64;
    for round in 0..40 {
        let mut bytes = good.clone();
        for _ in 0..=round % 7 {
            // A plain generator of numbers (Knuth's constants, from memory) is enough to spread damage about.
            state = state.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
            let at = (state >> 33) as usize % bytes.len();
            bytes[at] = (state >> 20) as u8;
        }
        std::fs::write(bench.path("valley/place.toml"), &bytes).unwrap();
        let told = bench.run(&["check", "valley", "--form", "json"]);
        assert!(told.code == 0 || told.code == 1, "{}", told.err);
        serde_json::from_str::<Value>(&told.out).unwrap();
        let told = bench.run(&["check", "valley"]);
        assert!(told.code == 0 || told.code == 1 && told.err.is_empty(), "{}", told.err);
    }
}

#[test]
fn a_file_cannot_paint_on_the_terminal() {
    let bench = Bench::new();
    std::fs::write(bench.path("s.toml"), "name = \"\u{1b}[2Jx\"\n\u{1b}]0;title\u{7} = 1\n").unwrap();
    let told = bench.run(&["check", "s.toml"]);
    assert_eq!(told.code, 1);
    assert!(!told.out.contains('\u{1b}') && !told.out.contains('\u{7}'), "{:?}", told.out);
}
