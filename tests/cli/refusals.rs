//! What is wrong with a command line is told in words, with the nearest right one, and ends with 2; wrong input with 1.

use super::support::{Bench, place, run};

fn assert_refused(arguments: &[&str], code: i32, parts: &[&str]) {
    for (language, index) in [("en", 0), ("es", 1)] {
        let told = run(&[arguments, &["--lang", language]].concat());
        assert_eq!(told.code, code, "{arguments:?}: {}", told.err);
        assert_eq!(told.out, "", "{arguments:?}");
        assert!(told.err.contains(parts[index]), "{arguments:?} {language}: {}", told.err);
        assert!(!told.err.contains("panicked") && !told.err.contains("error:"), "{}", told.err);
    }
}

#[test]
fn dials() {
    let place = place();
    let set = |text: &'static str, english: &'static str, spanish: &'static str| {
        assert_refused(&["tell", &place, "--set", text], 2, &[english, spanish]);
    };
    set("warming=4.5", "goes from 0 to 4. 4.5 is outside", "va de 0 a 4. 4.5 queda fuera");
    set("warming=-0.1", "goes from 0 to 4", "va de 0 a 4");
    set("warmin=1", "Did you mean “warming”?", "¿Quiso decir «warming»?");
    set("Winter-Precipitation=1", "“winter_precipitation”", "«winter_precipitation»");
    set("zzzzzz=1", "The dials are: warming", "Las perillas son: warming");
    set("reservoir_size=10", "does not have the dial", "no tiene la perilla");
    set("warming", "does not say how far", "no dice cuánto girar");
    set("warming=", "is not a number", "no es un número");
    set("warming=NaN", "“NaN” is not a number", "«NaN» no es un número");
    set("warming=inf", "“inf” is not a number", "«inf» no es un número");
    set("warming=1,5", "is not a number", "no es un número");
    set("=1", "There is no dial", "No hay ninguna perilla");
    assert_refused(&["tell", &place, "--set", "warming=1", "--set", "warming=2"], 2, &["twice", "dos veces"]);
    assert_refused(
        &["tell", "piedranieve", "--set", "reservoir_size=10"],
        2,
        &["this place has no reservoir", "este lugar no tiene"],
    );
}

#[test]
fn choices_and_years() {
    let place = place();
    assert_refused(&["tell", "--form", "jsn"], 2, &["Did you mean “json”", "¿Quiso decir «json»"]);
    assert_refused(&["tell", "--form", "xml"], 2, &["table, csv, json", "table, csv, json"]);
    assert_refused(&["tell", "--units", "imperial"], 2, &["metric, us", "metric, us"]);
    assert_refused(&["check", "--form", "csv", "."], 2, &["table, json", "table, json"]);
    assert_refused(&["tell", &place, "--years", "1990"], 2, &["2002 to 2003", "2002 a 2003"]);
    assert_refused(&["tell", &place, "--years", "2003..2002"], 2, &["runs backward", "va al revés"]);
    assert_refused(&["tell", &place, "--years", "driest"], 2, &["does not name years", "no dice qué años"]);
    assert_refused(&["tell", "--daily"], 2, &["--form csv", "--form csv"]);
    assert_refused(&["tell", "--crops", "--form", "json"], 2, &["--form table", "--form table"]);
}

#[test]
fn options_and_commands() {
    assert_refused(&["tel"], 2, &["Did you mean “tell”", "¿Quiso decir «tell»"]);
    assert_refused(&["tell", "--yers", "all"], 2, &["Did you mean --years", "¿Quiso decir --years"]);
    assert_refused(&["tell", "--zzzzzzzz"], 2, &["no option --zzzzzzzz", "ninguna opción --zzzzzzzz"]);
    assert_refused(&["tell", "a", "b"], 2, &["“b” is one thing too many", "«b» está de más"]);
    assert_refused(&["check"], 2, &["Something is missing: PATH", "Falta algo: RUTA"]);
    assert_refused(&["tell", "--form", "csv", "--form", "json"], 2, &["--form is given twice", "--form aparece dos"]);
    assert_refused(&["weather", "--years", "0"], 2, &["from 1 to 1000", "de 1 a 1000"]);
    assert_refused(&["weather", "--seed", "-1"], 2, &["--seed needs a whole number", "--seed lleva un número"]);
    assert_refused(&["weather", "x", "--recipe", "south"], 2, &["not both", "no los dos"]);
    let told = run(&["tell", "--years"]);
    assert_eq!(told.code, 2);
    assert!(told.err.contains("--years needs a value") && told.err.contains("deshielo tell --help"));
}

#[test]
fn input() {
    assert_refused(&["tell", "nowhere"], 1, &["no place at nowhere", "ningún lugar en nowhere"]);
    assert_refused(&["tell", "--setting", "one_dry_wintr"], 1, &["“one_dry_winter”", "«one_dry_winter»"]);
    assert_refused(&["tell", "--setting", "no/such.toml"], 1, &["There is no file", "No existe el archivo"]);
    assert_refused(&["weather", "--recipe", "souht"], 1, &["Did you mean “south”", "¿Quiso decir «south»"]);
    assert_refused(&["weather", &place()], 1, &["At least 3 are needed", "hacen falta al menos 3"]);
}

#[test]
fn a_place_with_mistakes_is_not_run_and_shows_all_of_them() {
    let bench = Bench::new().with_place("valley");
    let path = bench.path("valley/place.toml");
    let text = std::fs::read_to_string(&path).unwrap();
    std::fs::write(&path, text.replace("dead_hm3 = 1.5", "dead_hm3 = 99").replace("closes =", "closs =")).unwrap();
    let told = bench.run(&["tell", "valley"]);
    assert_eq!((told.code, told.out.as_str()), (1, ""));
    assert!(told.err.matches("Mistake:").count() >= 3, "{}", told.err);
    assert!(told.err.contains("valley/place.toml:") && told.err.contains("^^^^^"), "{}", told.err);
}

#[test]
fn a_setting_with_mistakes_shows_its_lines_and_set_goes_before_it() {
    let bench = Bench::new();
    let write = |text: &str| std::fs::write(bench.path("mine.toml"), text).unwrap();
    write("name = { en = \"Mine\", es = \"Mío\" }\n[dials]\nwarming = 99\nwarmin = 2\n");
    let told = bench.run(&["tell", "--setting", "mine.toml"]);
    assert_eq!((told.code, told.out.as_str()), (1, ""));
    assert!(told.err.contains("mine.toml:3:11") && told.err.contains("mine.toml:4:1"), "{}", told.err);
    write("name = { en = \"Mine\", es = \"Mío\" }\nyears = \"1990\"\n[dials]\nwarming = 1\ndiversion = 10\n");
    let told = bench.run(&["tell", "--setting", "mine.toml", "--set", "warming=3", "--form", "json"]);
    let told: serde_json::Value = serde_json::from_str(&told.out).unwrap();
    assert_eq!((told["dials"]["warming"].as_f64(), told["dials"]["diversion"].as_f64()), (Some(3.0), Some(10.0)));
    assert_eq!((told["years_shown"].as_str(), told["setting"]["name"]["es"].as_str()), (Some("1990"), Some("Mío")));
}

#[cfg(unix)]
#[test]
fn letters_that_are_not_unicode_break_nothing() {
    use std::os::unix::ffi::OsStrExt;
    let odd = std::ffi::OsStr::from_bytes(b"\xff\xfe");
    let bench = Bench::new();
    for arguments in [["tell", "--set"], ["tell", "--lang"], ["tell", "--setting"], ["check", "--form"]] {
        let output = bench.command().args(arguments).arg(odd).output().unwrap();
        let code = output.status.code().unwrap();
        assert!(code == 1 || code == 2, "{arguments:?}: {code}");
        assert!(!output.stderr.is_empty());
    }
    let output = bench.command().arg("tell").arg(odd).output().unwrap();
    assert_eq!(output.status.code(), Some(1));
}
