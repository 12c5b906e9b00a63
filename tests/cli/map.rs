//! `map`: cells are what `tell` says, parts make the whole byte for byte, and no half-written file is ever there.

use super::support::{Bench, place, run};

/// A map of the small place.
const SIDES: [&str; 4] = ["--over", "warming=0..4:1", "--over", "winter_precipitation=-20..20:20"];

fn map(bench: &Bench, more: &[&str]) -> super::support::Run {
    bench.run(&[&["map", &place()], &SIDES[..], more].concat())
}

fn json(text: &str) -> serde_json::Value {
    serde_json::from_str(text).unwrap()
}

#[test]
fn every_cell_is_what_tell_says_to_the_last_figure() {
    let bench = Bench::new();
    for (sign, at) in [
        ("supply_ratio", "/with_changes/all/signs/supply_ratio/mean"),
        ("peak_swe_date", "/with_changes/all/signs/peak_swe_date/mean"),
        ("reliability", "/with_changes/all/reliability"),
    ] {
        let told = map(&bench, &["--sign", sign, "--set", "canal_lining=50"]);
        assert_eq!((told.code, told.err.as_str()), (0, ""));
        let mut rows = told.out.lines();
        assert_eq!(rows.next(), Some(format!("warming,winter_precipitation,{sign}").as_str()));
        for row in rows.clone().step_by(4) {
            let cells: Vec<&str> = row.split(',').collect();
            let (warming, winter) = (format!("warming={}", cells[0]), format!("winter_precipitation={}", cells[1]));
            let alone = ["--set", &warming, "--set", &winter, "--set", "canal_lining=50", "--form", "json"];
            let alone = json(&run(&[&["tell", &place()], &alone[..]].concat()).out);
            let expected = alone.pointer(at).unwrap().as_f64().unwrap();
            assert_eq!(cells[2].parse::<f64>().unwrap().to_bits(), expected.to_bits(), "{sign}: {row}");
        }
        assert_eq!(rows.count(), 15);
    }
    let canal = json(&map(&bench, &["--canal", "north", "--sign", "days_full", "--form", "json"]).out);
    let alone = json(&run(&["tell", &place(), "--set", "winter_precipitation=-20", "--form", "json"]).out);
    assert_eq!(canal["values"][0], alone["with_changes"]["all"]["canals"][0]["days_full"]["mean"]);
    assert_eq!(canal["as_it_was"], alone["as_it_was"]["all"]["canals"][0]["days_full"]["mean"]);
}

#[test]
fn parts_make_the_whole_byte_for_byte_however_many() {
    let bench = Bench::new();
    for form in ["json", "csv", "png"] {
        let name = format!("whole.{form}");
        assert_eq!(map(&bench, &["--form", form, "--out", &name]).code, 0);
    }
    let whole = |form: &str| std::fs::read(bench.path(&format!("whole.{form}"))).unwrap();
    assert!(whole("png").starts_with(b"\x89PNG"));
    for parts in [1, 2, 4, 15, 17] {
        let mut names: Vec<String> = Vec::new();
        for part in (1..=parts).rev() {
            let (name, part) = (format!("{part}-of-{parts}.json"), format!("{part}/{parts}"));
            let told = map(&bench, &["--form", "json", "--part", &part, "--out", &name]);
            assert_eq!((told.code, told.out.as_str(), told.err.as_str()), (0, "", ""));
            names.push(name);
        }
        for form in ["json", "csv", "png"] {
            let mut line = vec!["map".to_owned(), place(), "--form".into(), form.into(), "--out".into(), "m".into()];
            line.push("--merge".into());
            line.extend(names.iter().cloned());
            let told = bench.run(&line.iter().map(String::as_str).collect::<Vec<_>>());
            assert_eq!((told.code, told.err.as_str()), (0, ""), "{form} of {parts}");
            assert_eq!(std::fs::read(bench.path("m")).unwrap(), whole(form), "{form} of {parts} parts");
        }
    }
}

#[test]
fn parts_that_do_not_belong_together_are_refused() {
    let bench = Bench::new();
    let part = |name: &str, part: &str, more: &[&str]| {
        let told = map(&bench, &[&["--form", "json", "--part", part, "--out", name], more].concat());
        assert_eq!(told.code, 0, "{}", told.err);
    };
    part("a", "1/3", &[]);
    part("b", "2/3", &[]);
    part("c", "3/3", &[]);
    part("other", "2/3", &["--set", "canal_lining=50"]);
    part("of_two", "2/2", &[]);
    std::fs::write(bench.path("half"), &std::fs::read(bench.path("b")).unwrap()[..200]).unwrap();
    let text = std::fs::read_to_string(bench.path("b")).unwrap();
    std::fs::write(bench.path("shifted"), text.replace("\"first_cell\":5", "\"first_cell\":4")).unwrap();
    let refused = |files: &[&str], english: &str, spanish: &str| {
        for (language, words) in [("en", english), ("es", spanish)] {
            let told = bench.run(&[&["map", &place(), "--lang", language, "--out", "m", "--merge"], files].concat());
            assert_eq!((told.code, told.out.as_str()), (1, ""), "{files:?}");
            assert!(told.err.contains(words), "{files:?}: {}", told.err);
            assert!(!bench.path("m").exists());
        }
    };
    refused(&["a", "c"], "Parts are missing: 2 of 3", "Faltan partes: 2 de 3");
    refused(&["a", "b", "b", "c"], "is the same part as", "es la misma parte que");
    refused(&["a", "other", "c"], "is part of another map", "es parte de otro mapa");
    refused(&["a", "of_two"], "is part of another map", "es parte de otro mapa");
    refused(&["a", "half", "c"], "is not a part of a map", "no es parte de un mapa");
    refused(&["a", "shifted", "c"], "do not fit its dials", "no corresponden a sus perillas");
    refused(&["a", "nowhere", "c"], "it is not there", "no es parte de un mapa");
    let told = bench.run(&["map", "piedranieve", "--merge", "a", "b", "c"]);
    assert_eq!(told.code, 1);
    assert!(told.err.contains("Name the place that they were made of"), "{}", told.err);
}

#[test]
fn a_part_that_is_killed_leaves_no_file_and_the_old_one_stays() {
    let bench = Bench::new();
    std::fs::write(bench.path("old.json"), "as it was").unwrap();
    let sides = ["--over", "warming=0..6:0.01", "--over", "winter_precipitation=-50..50:1"];
    for name in ["new.json", "old.json"] {
        let line = [&["map", "demo"], &sides[..], &["--form", "json", "--part", "1/2", "--out", name]].concat();
        let mut child = bench.command().args(line).spawn().unwrap();
        std::thread::sleep(std::time::Duration::from_millis(700));
        assert_eq!(child.try_wait().unwrap(), None, "it ended before it could be killed");
        child.kill().unwrap();
        child.wait().unwrap();
    }
    assert_eq!(bench.names(), ["old.json"]);
    assert_eq!(std::fs::read_to_string(bench.path("old.json")).unwrap(), "as it was");
}

#[test]
fn what_is_wrong_with_the_options_is_told_in_both_languages() {
    let place = place();
    let refused = |more: &[&str], english: &str, spanish: &str| {
        for (language, words) in [("en", english), ("es", spanish)] {
            let told = run(&[&["map", &place, "--lang", language], more].concat());
            assert_eq!((told.code, told.out.as_str()), (2, ""), "{more:?}: {}", told.err);
            assert!(told.err.contains(words), "{more:?}: {}", told.err);
            assert!(told.err.contains("deshielo map --help"), "{}", told.err);
        }
    };
    let over = |text: &'static str, english: &str, spanish: &str| {
        refused(&["--over", text, "--over", "canal_lining=0..100"], english, spanish);
    };
    over("warming=0..5:1", "goes from 0 to 4. 5 is outside", "va de 0 a 4. 5 queda fuera");
    over("warming=0..4:1.5", "The last value before it is 3", "El último valor antes es 3");
    over("warming=2..2", "must go up", "tienen que subir");
    over("warming=0..4:0", "must be more than 0", "mayor que 0");
    over("warming=0..4:0.0001", "1,000 are the most", "Caben 1000");
    over("warming=0-4", "does not say from where to where", "no dice de dónde a dónde");
    over("warming", "does not say from where to where", "no dice de dónde a dónde");
    over("warming=x..4", "is not a number", "no es un número");
    over("warmth=0..4", "There is no dial", "No hay ninguna perilla");
    over("reservoir_size=0..50", "does not have the dial", "no tiene la perilla");
    over("canal_lining=0..50", "Both sides", "Los dos lados");
    refused(&["--over", "warming=0..4"], "A map has two dials", "Un mapa lleva dos");
    refused(&["--sign", "suply_ratio"], "Did you mean “supply_ratio”", "¿Quiso decir «supply_ratio»");
    refused(&["--sign", "zzzzzzzz"], "There are: precipitation_mm", "Hay: precipitation_mm");
    refused(&["--canal", "south"], "There are: north", "Hay: north");
    refused(&["--canal", "north", "--sign", "fill_date"], "There are: supply_ratio", "Hay: supply_ratio");
    refused(&["--part", "3/2", "--form", "json"], "is no part", "no es una parte");
    refused(&["--part", "0/0", "--form", "json"], "is no part", "no es una parte");
    refused(&["--part", "1/2"], "goes with --form json", "--form json");
    refused(&["--form", "png"], "Add --out FILE", "Agregue --out ARCHIVO");
    refused(&["--form", "pgn"], "Did you mean “png”", "¿Quiso decir «png»");
    refused(&["--size", "80x60"], "goes from 240 to 4096", "va de 240 a 4096");
    refused(&["--years", "1990"], "2002 to 2003", "2002 a 2003");
    refused(&["--set", "warming=9"], "goes from 0 to 4", "va de 0 a 4");
    refused(&["--merge", "a", "--sign", "reliability"], "does not go with --sign", "no va con --sign");
}

#[test]
fn a_place_with_narrow_dials_has_a_map_too() {
    let told = run(&["map", &place(), "--years", "2003"]);
    assert_eq!((told.code, told.err.as_str()), (0, ""));
    assert_eq!(told.out.lines().count(), 1 + 9 * 9);
}
