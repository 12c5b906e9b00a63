//! The text that people read, word for word. `DESHIELO_WRITE_GOLDEN=1` writes it anew; then read it as a person.

use std::path::Path;

use super::support::{place, run};

fn assert_golden(name: &str, arguments: &[&str]) {
    let told = run(arguments);
    assert_eq!((told.code, told.err.as_str()), (0, ""), "{name}");
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/cli/golden").join(name);
    if std::env::var_os("DESHIELO_WRITE_GOLDEN").is_some() {
        std::fs::write(&path, &told.out).unwrap();
    }
    let expected = std::fs::read_to_string(&path).unwrap_or_default();
    assert_eq!(told.out, expected, "{name} differs from what was read and found good");
    for line in told.out.lines() {
        assert!(line.chars().count() <= 80, "{name}: too wide: {line}");
        assert_eq!(line.trim_end(), line, "{name}: blanks at the end of {line:?}");
        assert!(!line.contains(['{', '}', '\u{202f}', '\t']), "{name}: {line}");
    }
}

#[test]
fn english_of_the_united_states() {
    let place = place();
    assert_golden("rest-en-US.txt", &["tell", &place, "--lang", "en-US"]);
    let turned = ["tell", &place, "--set", "warming=2", "--set", "winter_precipitation=-20", "--lang", "en-US"];
    assert_golden("turned-en-US.txt", &turned);
}

#[test]
fn spanish_of_mexico() {
    let place = place();
    let turned = ["tell", &place, "--set", "warming=2", "--set", "town_growth=100", "--lang", "es-MX"];
    assert_golden("turned-es-MX.txt", &[&turned[..], &["--units", "metric", "--years", "dry"]].concat());
}

#[test]
fn spanish_of_chile() {
    let place = place();
    let turned = ["tell", &place, "--set", "crop_mix=50", "--set", "starting_storage=40", "--lang", "es-CL"];
    assert_golden("turned-es-CL.txt", &[&turned[..], &["--units", "metric", "--crops"]].concat());
}

#[test]
fn a_setting_and_turns() {
    assert_golden("drought-en.txt", &["tell", "--setting", "one_dry_winter", "--lang", "en"]);
    assert_golden("turns-es.txt", &["tell", "piedranieve", "--set", "warming=2", "--lang", "es"]);
}

#[test]
fn help_and_columns() {
    for language in ["en", "es"] {
        assert_golden(&format!("help-{language}.txt"), &["--help", "--lang", language]);
        for command in ["tell", "check", "map", "weather", "fit", "trust"] {
            assert_golden(&format!("help-{command}-{language}.txt"), &[command, "--help", "--lang", language]);
        }
        assert_golden(&format!("columns-{language}.txt"), &["tell", "--columns", "--lang", language]);
    }
}
