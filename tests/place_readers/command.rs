//! `place new`, `peek` and `add` as people run them, from files to a place without mistakes.

use std::path::Path;
use std::process::{Command, Stdio};

use super::support::{BASIN, FLOW, HEIGHTS_TIFF};

struct Run {
    code: Option<i32>,
    out: String,
    err: String,
}

fn run(folder: &Path, arguments: &[&str]) -> Run {
    let mut command = Command::new(env!("CARGO_BIN_EXE_deshielo"));
    for name in ["LC_ALL", "LC_MESSAGES", "LANG"] {
        command.env_remove(name);
    }
    let output = command.current_dir(folder).args(arguments).stdin(Stdio::null()).output().unwrap();
    let text = |bytes: Vec<u8>| String::from_utf8(bytes).expect("the program writes UTF-8");
    Run { code: output.status.code(), out: text(output.stdout), err: text(output.stderr) }
}

/// Two water years and some days of invented weather, from 1 October.
fn weather(first: (i32, u32, u32), days: u64) -> String {
    let first = chrono::NaiveDate::from_ymd_opt(first.0, first.1, first.2).unwrap();
    let mut text = String::from("Fecha;Tmín °C;Tmáx °C;Lluvia mm\n");
    for day in 0..days {
        let date = first + chrono::Days::new(day);
        // By the calendar, so that two files agree on the days that both have.
        let number = chrono::Datelike::num_days_from_ce(&date);
        let season = libm::cos((chrono::Datelike::ordinal(&date) as f64 - 20.0) / 58.1);
        let (low, rain) = (4.0 - 9.0 * season + (number % 7) as f64 * 0.4, if number % 4 == 0 { 7.5 } else { 0.0 });
        let row =
            format!("{};{low:.1};{:.1};{rain:.1}\n", date.format("%d/%m/%Y"), low + 11.0 + (number % 5) as f64 * 0.3);
        text.push_str(&row.replace('.', ","));
    }
    text
}

#[test]
fn a_valley_from_its_files_to_its_numbers() {
    let folder = tempfile::tempdir().unwrap();
    let at = folder.path();
    std::fs::write(at.join("tiempo.csv"), weather((2001, 10, 1), 730)).unwrap();
    std::fs::write(at.join("nuevo.csv"), weather((2003, 9, 25), 372)).unwrap();
    std::fs::write(at.join("dem.tif"), HEIGHTS_TIFF).unwrap();
    std::fs::write(at.join("basin.geojson"), BASIN).unwrap();
    std::fs::write(at.join("flow.xml"), FLOW).unwrap();

    let peek = run(at, &["place", "peek", "tiempo.csv", "--lang", "es"]);
    assert_eq!((peek.code, peek.err.as_str()), (Some(0), ""));
    for words in ["730 días", "temperature_min", "coma decimal", "[record.columns]", "no tiene errores", "█"] {
        assert!(peek.out.contains(words), "{words}: {}", peek.out);
    }
    let json = run(at, &["place", "peek", "tiempo.csv", "--form", "json"]);
    let value: serde_json::Value = serde_json::from_str(&json.out).unwrap();
    assert_eq!((value["days"].as_u64(), value["columns"][1]["unit"].as_str()), (Some(730), Some("°C")));

    let mut new = vec!["place", "new", "quebrado", "--name", "Quebrado", "--region", "es-MX", "--station", "5250ft"];
    new.extend(["--weather", "tiempo.csv", "--grid", "dem.tif", "--outline", "basin.geojson", "--lang", "es"]);
    let lacking = run(at, &new);
    assert_eq!(lacking.code, Some(0), "{}", lacking.err);
    assert!(lacking.out.contains("latitude_deg") && lacking.out.contains("Falta completar o arreglar 1 cosa"));
    assert!(std::fs::read_to_string(at.join("quebrado/place.toml")).unwrap().contains("# FALTA: latitude_deg ="));
    // Nothing is written over unasked.
    let again = run(at, &new);
    assert_eq!(again.code, Some(1));
    assert!(again.err.contains("--replace"), "{}", again.err);
    new.extend(["--latitude", "31.5", "--replace"]);
    let ready = run(at, &new);
    assert!(ready.out.contains("Ya se puede calcular"), "{}", ready.out);
    assert_eq!(run(at, &["check", "quebrado"]).code, Some(0));

    let more = run(at, &["place", "add", "quebrado", "nuevo.csv"]);
    assert_eq!(more.code, Some(0), "{}", more.err);
    assert!(more.out.contains("366 days were added") && more.out.contains("6 days were there already"), "{}", more.out);
    let record = std::fs::read_to_string(at.join("quebrado/tiempo.csv")).unwrap();
    assert!(record.starts_with(&weather((2001, 10, 1), 730)) && record.lines().count() == 1 + 730 + 366);
    let twice = run(at, &["place", "add", "quebrado", "nuevo.csv", "--lang", "es"]);
    assert_eq!(twice.code, Some(1));
    assert!(twice.err.contains("no tiene ningún día después del"), "{}", twice.err);
    assert_eq!(std::fs::read_to_string(at.join("quebrado/tiempo.csv")).unwrap(), record);

    let gauge = run(at, &["place", "add", "quebrado", "flow.xml", "--measures", "natural"]);
    assert!(gauge.code == Some(0) && gauge.out.contains("[gauge]"), "{}{}", gauge.out, gauge.err);
    assert_eq!(run(at, &["check", "quebrado"]).code, Some(0));
    let tell = run(at, &["tell", "quebrado", "--set", "warming=2", "--form", "json"]);
    assert!(tell.code == Some(0) && tell.out.contains("peak_swe_mm"), "{}", tell.err);
    let names: Vec<_> = std::fs::read_dir(at).unwrap().map(|entry| entry.unwrap().file_name()).collect();
    assert!(!names.iter().any(|name| name.to_string_lossy().starts_with(".deshielo")), "{names:?}");
}

#[test]
fn questions_are_asked_and_answered() {
    use std::io::Write;
    let folder = tempfile::tempdir().unwrap();
    let mut command = Command::new(env!("CARGO_BIN_EXE_deshielo"));
    command.current_dir(folder.path()).args(["place", "new", "valle", "--ask", "--lang", "es"]);
    let mut child = command.stdin(Stdio::piped()).stderr(Stdio::piped()).stdout(Stdio::piped()).spawn().unwrap();
    child.stdin.take().unwrap().write_all("Tres Álamos\nes-CL\nmucha\n-33,4\n\nturnos\nrotation\n".as_bytes()).unwrap();
    let output = child.wait_with_output().unwrap();
    assert!(output.status.success());
    let asked = String::from_utf8(output.stderr).unwrap();
    assert!(asked.contains("¿Cómo se llama el valle?") && asked.contains("no se entiende «mucha»"), "{asked}");
    let toml = std::fs::read_to_string(folder.path().join("valle/place.toml")).unwrap();
    for line in ["es = \"Tres Álamos\"", "latitude_deg = -33.4", "rule = \"rotation\"", "# FALTA: elevation_m"] {
        assert!(toml.contains(line), "{line}: {toml}");
    }
}

#[test]
fn mistakes_end_with_two_and_wrong_files_with_one() {
    let folder = tempfile::tempdir().unwrap();
    let at = folder.path();
    std::fs::write(at.join("letter.txt"), "Dear all,\nsee you\n").unwrap();
    for (arguments, code, words) in [
        (&["place"][..], 2, "new, peek or add"),
        (&["place", "pek", "x"], 2, "Did you mean “peek”"),
        (&["place", "new", "x", "--latitude", "far"], 2, "--latitude"),
        (&["place", "new", "x", "--sharing", "senority"], 2, "Did you mean “seniority”"),
        (&["place", "peek", "no.csv"], 1, "it is not there"),
        (&["place", "peek", "letter.txt"], 1, "table of days"),
        (&["place", "add", "nowhere", "letter.txt"], 1, "no place.toml"),
        (&["place", "new", "x", "--weather", "letter.txt"], 1, "table of days"),
    ] {
        let run = run(at, arguments);
        assert_eq!(run.code, Some(code), "{arguments:?}: {}", run.err);
        assert!(run.err.contains(words), "{arguments:?}: {}", run.err);
    }
    assert!(!at.join("x").exists(), "nothing was made");
}
