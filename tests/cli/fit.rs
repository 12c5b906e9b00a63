//! Fitting a place and judging it from the command line.

use super::support::{Bench, Run, place, run};

const QUICK: [&str; 7] = ["--starts", "2", "--runs", "12", "--warm-up", "0", "--no-test"];

fn fit(bench: &Bench, more: &[&str]) -> Run {
    bench.run(&[&["fit", "place", "--lang", "en"], &QUICK[..], more].concat())
}

#[test]
fn a_fit_is_written_beside_the_place_and_used_by_every_command() {
    let bench = Bench::new().with_place("place");
    let before = bench.run(&["tell", "place", "--lang", "en"]);
    assert!(before.out.contains("Not fitted to the river gauge yet"), "{}", before.out);
    let told = fit(&bench, &[]);
    assert_eq!((told.code, told.err.as_str()), (0, ""));
    assert!(told.out.contains("melt_factor_mm_c_day") && told.out.contains("fit.toml"), "{}", told.out);
    let text = std::fs::read_to_string(bench.path("place/fit.toml")).unwrap();
    assert!(text.starts_with("# What"), "{text}");
    let after = bench.run(&["tell", "place", "--set", "warming=3", "--lang", "en"]);
    assert_eq!(after.err, "");
    assert!(after.out.contains("Fitted to the river gauge, water years"), "{}", after.out);
    assert!(after.out.contains("sets of numbers say"), "ranges: {}", after.out);
    let json = bench.run(&["tell", "place", "--set", "warming=3", "--form", "json"]);
    let json: serde_json::Value = serde_json::from_str(&json.out).unwrap();
    let range = &json["ranges"]["signs"]["half_volume_date"]["change"];
    assert!(range["low"].as_f64().unwrap() <= range["high"].as_f64().unwrap());
    assert_eq!((json["place"]["fitted"].as_bool(), json["place"]["fit_is_stale"].as_bool()), (Some(true), Some(false)));

    // The same seed gives the same file, another one another.
    fit(&bench, &["--out", "again.toml"]);
    assert_eq!(std::fs::read_to_string(bench.path("again.toml")).unwrap(), text);
    fit(&bench, &["--seed", "2", "--into", "."]);
    assert_ne!(std::fs::read_to_string(bench.path("fit.toml")).unwrap(), text);

    // A changed record makes the fit stale, and everybody says so.
    let gauge = bench.path("place/gauge.csv");
    let changed = std::fs::read_to_string(&gauge).unwrap();
    std::fs::write(&gauge, changed + "\n").unwrap();
    let check = bench.run(&["check", "place", "--lang", "en"]);
    assert_eq!(check.code, 0);
    assert!(check.out.contains("The records have changed since this fit was made"), "{}", check.out);
    let tell = bench.run(&["tell", "place", "--lang", "es"]);
    assert!(
        tell.err.contains("Los registros cambiaron") && tell.out.replace('\n', " ").contains("Ajuste otra vez"),
        "{}",
        tell.err
    );
    let trust = bench.run(&["trust", "place", "--lang", "en"]);
    assert!(trust.out.contains("The fit is from older records"), "{}", trust.out);
}

#[test]
fn a_fit_that_cannot_be_used_is_refused() {
    let bench = Bench::new().with_place("place");
    let file = bench.path("place/fit.toml");
    for (text, said) in [("seed = [", "cannot be read as a fit"), ("", "cannot be read as a fit")] {
        std::fs::write(&file, text).unwrap();
        for command in ["tell", "check", "trust"] {
            let told = bench.run(&[command, "place", "--lang", "en"]);
            assert_eq!(told.code, 1, "{command}");
            assert!((told.out + &told.err).contains(said), "{command}");
        }
    }
    fit(&bench, &[]);
    let good = std::fs::read_to_string(&file).unwrap();
    std::fs::write(&file, good.replace("key = \"quick_days\"", "key = \"quick\"")).unwrap();
    let told = bench.run(&["check", "place", "--lang", "en"]);
    assert!(told.code == 1 && told.out.contains("“quick”"), "{}", told.out);
}

#[test]
fn what_cannot_be_fitted_is_told_before_any_search() {
    let bench = Bench::new().with_place("place");
    let told = bench.run(&["fit", "demo", "--into", ".", "--lang", "en"]);
    assert!(told.code == 1 && told.err.contains("no river gauge"), "{}", told.err);
    assert!(!bench.path("fit.toml").exists());
    let told = fit(&bench, &["--into", "nowhere/at/all"]);
    assert!(told.code == 1 && told.err.contains("--out"), "{}", told.err);
    // A file that may not be written is left alone.
    let file = bench.path("place/fit.toml");
    std::fs::write(&file, "mine").unwrap();
    let mut locked = std::fs::metadata(&file).unwrap().permissions();
    locked.set_readonly(true);
    std::fs::set_permissions(&file, locked).unwrap();
    let told = fit(&bench, &[]);
    assert!(told.code == 1 && told.err.contains("--into"), "{}", told.err);
    assert_eq!(std::fs::read_to_string(&file).unwrap(), "mine");
    for options in [["--objective", "beauty"], ["--runs", "0"], ["--sets", "3"], ["--years", "dry"]] {
        assert_eq!(bench.run(&["fit", "place", options[0], options[1]]).code, 2, "{options:?}");
    }
    let toml = bench.path("place/place.toml");
    let text = std::fs::read_to_string(&toml).unwrap();
    assert!(text.contains("measures = \"natural\""));
    std::fs::write(&toml, text.replace("measures = \"natural\"", "measures = \"below_diversions\"")).unwrap();
    let told = bench.run(&["fit", "place", "--out", "x.toml", "--lang", "es"]);
    assert!(told.code == 1 && told.err.contains("debajo de los canales"), "{}", told.err);
}

#[test]
fn trust_tells_every_score_and_a_verdict_for_every_use() {
    let told = run(&["trust", &place(), "--form", "json"]);
    assert_eq!(told.code, 0, "{}", told.err);
    let json: serde_json::Value = serde_json::from_str(&told.out).unwrap();
    let uses: Vec<&str> = json["uses"].as_array().unwrap().iter().map(|one| one["use"].as_str().unwrap()).collect();
    assert_eq!(uses, ["direction", "timing", "volume", "late_summer", "storage", "deliveries"]);
    assert_eq!(json["uses"][0]["verdict"], "unknown", "nobody tested it");
    assert!(json["flow"]["daily"]["kling_gupta"].is_number() && json["flow"]["day_of_year_mean"].is_object());
    assert_eq!(json["flow"]["season"].as_array().unwrap().len(), 12);
    assert!(json["flow_in_unseen_years"].is_null() && json["snow"]["nash_sutcliffe"].is_number());
    for (language, said) in [("en", "no river gauge"), ("es", "no tiene estación de aforo")] {
        let told = run(&["trust", "demo", "--lang", language]);
        assert!(told.code == 0 && told.out.contains(said), "{}", told.out);
        assert!(told.out.lines().all(|line| line.chars().count() <= 80), "{}", told.out);
    }
}

#[cfg(unix)]
#[test]
fn an_interrupt_keeps_the_best_so_far() {
    use rustix::process::{Pid, Signal, kill_process};
    use std::process::Stdio;
    use std::time::Duration;

    let bench = Bench::new().with_place("place");
    let mut command = bench.command();
    command.args(["fit", "place", "--runs", "500000", "--warm-up", "0", "--lang", "en"]);
    let child = command.stdout(Stdio::piped()).stderr(Stdio::piped()).spawn().unwrap();
    // Long enough for the record to be read; an interrupt before that would end the program as ever.
    std::thread::sleep(Duration::from_secs(4));
    kill_process(Pid::from_child(&child), Signal::INT).unwrap();
    let told = super::support::told(child.wait_with_output().unwrap());
    assert_eq!(told.code, 0, "{}", told.err);
    assert!(told.out.contains("stopped before the end"), "{}", told.out);
    assert!(std::fs::read_to_string(bench.path("place/fit.toml")).unwrap().contains("stopped = true"));
}
