//! The language is settled before anything else is said.

use deshielo::words::KNOWN_TAGS;

use super::support::{Bench, run, told};

#[test]
fn the_option_goes_before_the_system() {
    let bench = Bench::new();
    let with = |name: &str, value: &str, arguments: &[&str]| {
        told(bench.command().env(name, value).args(arguments).output().unwrap()).out
    };
    let (english, spanish) = ("Turn a dial", "Gire una perilla");
    assert!(with("LANG", "es_MX.UTF-8", &["--help"]).starts_with(spanish));
    assert!(with("LC_ALL", "es_MX.UTF-8", &["--help", "--lang", "en"]).starts_with(english));
    assert!(with("LANG", "es_MX.UTF-8", &["--lang=en", "--help"]).starts_with(english));
    for other in ["C", "C.UTF-8", "POSIX", "xx_YY", "", "..", "de_AT.UTF-8"] {
        assert!(with("LANG", other, &["--help"]).starts_with(english), "{other}");
    }
}

#[test]
fn a_language_that_is_not_there_is_told_once() {
    let told = run(&["--help", "--lang", "de"]);
    assert_eq!(told.code, 0);
    assert_eq!(told.err.lines().count(), 1);
    assert!(told.err.contains("de") && told.out.contains("Usage"));
}

#[test]
fn a_bare_language_takes_the_region_of_the_place() {
    let told = run(&["tell", "piedranieve", "--lang", "es"]);
    assert!(told.out.contains("Caudal más alto, m³/s") && told.out.contains(','), "{}", told.out);
    assert!(!told.out.contains("presa"));
}

#[test]
fn no_word_of_the_parser_is_left_in_spanish() {
    for arguments in [&["--help"][..], &["tell", "--help"], &["check", "--help"], &["weather", "--help"]] {
        let help = run(&[arguments, &["--lang", "es"]].concat()).out;
        for english in ["Usage", "Options", "Arguments", "Commands", "default", "possible", "Print", "OPTIONS", "FILE"]
        {
            assert!(!help.contains(english), "{arguments:?}: {english}\n{help}");
        }
    }
}

#[test]
fn every_language_can_say_everything() {
    for tag in KNOWN_TAGS {
        let told = run(&["tell", "--set", "warming=3", "--set", "crop_mix=50", "--crops", "--lang", tag]);
        assert_eq!((told.code, told.err.as_str()), (0, ""), "{tag}");
        assert!(told.out.lines().all(|line| line.chars().count() <= 80), "{tag}\n{}", told.out);
    }
}

#[test]
fn more_languages_are_read_from_a_folder() {
    let bench = Bench::new();
    std::fs::create_dir_all(bench.path("more/fr")).unwrap();
    std::fs::write(bench.path("more/fr/command.ftl"), "help-usage = Emploi\n").unwrap();
    let told = bench.run(&["--help", "--lang", "fr", "--locales", "more"]);
    assert_eq!(told.code, 0);
    assert!(told.out.contains("Emploi: deshielo"));
    let lines = told.err.lines().count();
    assert!((2..=21).contains(&lines), "missing messages are told, bounded: {lines}");
    let told = bench.run(&["--help", "--locales", "nowhere"]);
    assert!(told.code == 0 && told.err.contains("nowhere"));
}

#[test]
fn the_version_is_told() {
    assert_eq!(run(&["--version"]).out, format!("deshielo {}\n", env!("CARGO_PKG_VERSION")));
}
