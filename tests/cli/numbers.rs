//! The numbers: JSON against the signs read directly, tables against JSON, CSV against JSON.

use std::collections::BTreeMap;

use deshielo::place::{Source, read};
use deshielo::signs::{Sign, SignKind, YearReport, read_run};
use deshielo::water::basin::{Basin, BasinDay};
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::run::run_basin;
use deshielo::water::works::Works;
use serde_json::Value;

use super::support::{place, place_folder, run};

const TURNED: [&str; 4] = ["--set", "warming=2", "--set", "crop_mix=30"];

fn json(arguments: &[&str]) -> Value {
    let told = run(&[&["tell"], arguments, &["--form", "json"]].concat());
    assert_eq!((told.code, told.err.as_str()), (0, ""));
    serde_json::from_str(&told.out).unwrap()
}

fn directly(dials: &Dials) -> Vec<YearReport> {
    let place = read(Source::Folder(&place_folder())).place.unwrap();
    let valley = &place.valley;
    let mut basin = vec![BasinDay::default(); place.days.len()];
    let before = run_basin(valley, &Basin::new(valley, dials), &place.calendar, &place.days, &mut basin);
    let mut years = Vec::new();
    let works = Works::new(valley, dials).unwrap();
    read_run(valley, &works, &place.calendar, &basin, &before, |_, _| {}, |year| years.push(year));
    years
}

#[test]
fn json_is_what_the_signs_say_to_the_bit() {
    let told = json(&[&[place().as_str()][..], &TURNED].concat());
    let turned = Dials::REST.with(Dial::Warming, 2.0).with(Dial::CropMix, 30.0);
    for (run, dials) in [("as_it_was", Dials::REST), ("with_changes", turned)] {
        let years = directly(&dials);
        let written = told[run]["years"].as_array().unwrap();
        assert_eq!(written.len(), years.len());
        for (written, year) in written.iter().zip(&years) {
            assert_eq!(written["water_year"], year.year.water_year);
            assert_eq!(written["signs"].as_object().unwrap().len(), Sign::ALL.len());
            for sign in Sign::ALL {
                let value = &written["signs"][sign.key()];
                match sign.kind() {
                    SignKind::Date => {
                        let date = sign.date_of(&year.signs).map(|day| day.date(10).to_string());
                        assert_eq!(value.as_str(), date.as_deref(), "{}", sign.key());
                    }
                    _ => assert_eq!(value.as_f64(), sign.of(&year.signs), "{}", sign.key()),
                }
            }
            assert_eq!(written["ledger"]["residual_share"].as_f64(), Some(year.ledger.residual_share()));
            assert!(year.ledger.residual_share().abs() <= 1e-9);
            let canal = &written["canals"][0];
            let signs = &year.signs.canals[0];
            assert_eq!(canal["supply_ratio"].as_f64(), signs.supply_ratio);
            assert_eq!(canal["days_full"], signs.days_full);
            assert_eq!(canal["account_end_hm3"].as_f64(), Some(signs.account_end_hm3));
        }
    }
}

#[test]
fn the_keys_are_those_that_were_promised() {
    let told = json(&[&place()]);
    for key in ["place", "dials", "as_it_was", "with_changes"] {
        assert!(told[key].is_object(), "{key}");
    }
    assert_eq!(told["as_it_was"], told["with_changes"], "at rest both runs are one");
    let canal = told["as_it_was"]["years"][0]["canals"][0].as_object().unwrap();
    let mut keys: Vec<&str> = canal.keys().map(String::as_str).collect();
    keys.sort_unstable();
    let mut promised = [
        "name",
        "right_year",
        "supply_ratio",
        "days_full",
        "days_cut",
        "days_short",
        "first_short_date",
        "last_full_date",
        "last_water_date",
        "stored_draw_hm3",
        "account_end_hm3",
    ];
    promised.sort_unstable();
    assert_eq!(keys, promised);
    let all = &told["as_it_was"]["all"];
    for key in ["reliability", "resilience", "vulnerability_hm3"] {
        assert!(all.get(key).is_some() && all["canals"][0].get(key).is_some(), "{key}");
    }
}

/// The first number of a cell, with the marks of the United States taken away.
fn number(cell: &str) -> f64 {
    let plain = cell.replace(',', "").replace('\u{2212}', "-");
    let digits: String = plain.chars().take_while(|letter| letter.is_ascii_digit() || "-.".contains(*letter)).collect();
    digits.parse().unwrap_or_else(|_| panic!("no number in {cell:?}"))
}

#[test]
fn the_table_is_the_json_rounded() {
    let place = place();
    let arguments = [&[place.as_str()][..], &TURNED].concat();
    let told = json(&arguments);
    let table = run(&[&["tell"], &arguments[..], &["--units", "metric", "--lang", "en-US"]].concat()).out;
    let rows = [
        ("Share that fell as snow", "snow_share", 100.0),
        ("Snow water on survey day, mm", "survey_swe_mm", 1.0),
        ("Spring water, hm³", "spring_volume_hm3", 1.0),
        ("Highest flow, m³/s", "peak_flow_m3s", 1.0),
        ("Carryover, hm³", "carryover_hm3", 1.0),
        ("Water used by crops, hm³", "crop_evaporation_hm3", 1.0),
        ("Share of the water asked for that arrived", "supply_ratio", 100.0),
        ("Days with enough water in the river", "river_minimum_days_met", 1.0),
    ];
    for (name, key, scale) in rows {
        let line = table.lines().find(|line| line.starts_with(name)).unwrap_or_else(|| panic!("{name}\n{table}"));
        let cells: Vec<&str> = line[name.len()..].split("  ").map(str::trim).filter(|cell| !cell.is_empty()).collect();
        let mean = |part: &Value| part["signs"][key]["mean"].as_f64().unwrap() * scale;
        let expected =
            [mean(&told["as_it_was"]["all"]), mean(&told["with_changes"]["all"]), mean(&told["change"]).abs()];
        for (cell, expected) in cells.iter().zip(expected) {
            if *cell == "no change" {
                assert!(expected.abs() < 0.5, "{name}: {expected}");
                continue;
            }
            let decimals = number(cell).to_string().split_once('.').map_or(0, |(_, decimals)| decimals.len());
            let written = cell
                .split_once('.')
                .map_or(decimals, |(_, rest)| rest.chars().take_while(char::is_ascii_digit).count());
            let half = 0.5 * 10.0_f64.powi(-(written as i32)) * (1.0 + 1e-9);
            assert!((number(cell) - expected).abs() <= half, "{name}: {cell} and {expected}");
        }
        assert_eq!(cells.len(), 3, "{line}");
    }
}

#[test]
fn dates_of_means_are_dates() {
    let place = place();
    let told = json(&[&place]);
    let table = run(&["tell", &place, "--lang", "en-US"]).out;
    let date = told["as_it_was"]["all"]["signs"]["half_volume_date"]["mean_month_day"].as_str().unwrap();
    let date = chrono::NaiveDate::parse_from_str(&format!("2001-{date}"), "%Y-%m-%d").unwrap();
    let line = table.lines().find(|line| line.starts_with("Day when half")).unwrap();
    assert!(line.ends_with(&date.format("%b %-d").to_string()), "{line} and {date}");
}

#[test]
fn units_and_language_change_the_text_only() {
    let place = place();
    for form in ["json", "csv"] {
        let plain = run(&["tell", &place, "--form", form, "--set", "warming=1"]).out;
        let other =
            run(&["tell", &place, "--form", form, "--set", "warming=1", "--lang", "es-CL", "--units", "us"]).out;
        assert_eq!(plain, other, "{form}");
    }
    let lines = |units| run(&["tell", &place, "--units", units]).out;
    let cell = |text: &str, name: &str| {
        number(text.lines().find(|line| line.starts_with(name)).unwrap().rsplit(' ').next().unwrap())
    };
    let (metric, us) = (lines("metric"), lines("us"));
    let acre_feet_per_hm3 = 1.0e6 / 1_233.481_837_547_52;
    let ratio = cell(&us, "Spring water") / cell(&metric, "Spring water");
    assert!((ratio / acre_feet_per_hm3 - 1.0).abs() < 0.01, "{ratio}");
}

fn rows(text: &str) -> Vec<BTreeMap<String, String>> {
    let mut reader = csv::Reader::from_reader(text.as_bytes());
    let names = reader.headers().unwrap().clone();
    let row = |row: csv::StringRecord| names.iter().zip(&row).map(|(a, b)| (a.to_owned(), b.to_owned())).collect();
    reader.records().map(|record| row(record.unwrap())).collect()
}

#[test]
fn csv_says_what_json_says() {
    let arguments = [&["tell".to_owned(), place()][..], &TURNED.map(str::to_owned)].concat();
    let arguments: Vec<&str> = arguments.iter().map(String::as_str).collect();
    let told = json(&arguments[1..]);
    let rows = rows(&run(&[&arguments[..], &["--form", "csv"]].concat()).out);
    assert_eq!(rows.len(), 2 * 2 * (1 + 3));
    for row in &rows {
        let years = told[&row["run"]]["years"].as_array().unwrap();
        let water_year: i64 = row["water_year"].parse().unwrap();
        let year = years.iter().find(|year| year["water_year"] == water_year).unwrap();
        if row["canal"].is_empty() {
            assert_eq!(row["spring_volume_hm3"].parse().ok(), year["signs"]["spring_volume_hm3"].as_f64());
            assert_eq!(row["half_volume_date"], year["signs"]["half_volume_date"].as_str().unwrap());
            assert_eq!(row["river_out_m3"].parse().ok(), year["ledger"]["river_out_m3"].as_f64());
            assert_eq!(row["residual_share"].parse().ok(), year["ledger"]["residual_share"].as_f64());
            assert_eq!(row["days_full"], "");
        } else {
            let canals = year["canals"].as_array().unwrap();
            let canal = canals.iter().find(|canal| canal["name"] == row["canal_name"].as_str()).unwrap();
            assert_eq!(row["supply_ratio"].parse().ok(), canal["supply_ratio"].as_f64());
            assert_eq!(row["days_cut"].parse().ok(), canal["days_cut"].as_f64());
            assert_eq!(row["snow_share"], "");
        }
    }
}

#[test]
fn days_add_up_to_their_years() {
    let place = place();
    let told = json(&[&place, "--daily", "--years", "2003", "--set", "diversion=20"]);
    for run in ["as_it_was", "with_changes"] {
        let days = &told[run]["days"];
        let column = |name: &str| -> Vec<f64> {
            days[name].as_array().unwrap().iter().map(|value| value.as_f64().unwrap()).collect()
        };
        assert_eq!(days["date"].as_array().unwrap().len(), 365);
        let year = &told[run]["years"][0];
        let rain: f64 = column("precipitation_mm").iter().sum();
        assert!((rain - year["signs"]["precipitation_mm"].as_f64().unwrap()).abs() < 1e-6);
        let delivered_m3: f64 = ["north", "town", "meadow"]
            .map(|gate| column(&format!("{gate}_delivered_m3s")).iter().sum::<f64>() * 86_400.0)
            .iter()
            .sum();
        let canals_m3 = year["ledger"]["canals_m3"].as_f64().unwrap();
        assert!((delivered_m3 / canals_m3 - 1.0).abs() < 1e-9);
    }
    let text = self::run(&["tell", &place, "--daily", "--years", "2003", "--form", "csv"]).out;
    let rows = rows(&text);
    assert_eq!(rows.len(), 2 * 365);
    assert_eq!((rows[0]["date"].as_str(), rows[365]["run"].as_str()), ("2002-10-01", "with_changes"));
}

#[test]
fn every_written_column_is_explained() {
    let place = place();
    let explained = run(&["tell", "--columns"]).out;
    let names: Vec<&str> = explained.lines().filter(|line| !line.starts_with(' ')).collect();
    for daily in [&[][..], &["--daily"]] {
        let text = run(&[&["tell", &place, "--form", "csv"], daily].concat()).out;
        for column in text.lines().next().unwrap().split(',') {
            let of_gate = ["north", "town", "meadow"].iter().find_map(|gate| {
                let name = format!("GATE{}", column.strip_prefix(gate)?);
                names.iter().any(|known| *known == name).then_some(name)
            });
            let name = of_gate.unwrap_or_else(|| column.to_owned());
            assert!(names.contains(&name.as_str()), "{column}");
        }
    }
}

#[test]
fn years_choose_what_is_shown_and_change_nothing_else() {
    let all = json(&["demo"]);
    let all_years = all["as_it_was"]["years"].as_array().unwrap();
    let mut shown = Vec::new();
    for kind in ["dry", "middling", "wet"] {
        let told = json(&["demo", "--years", kind]);
        let years = told["as_it_was"]["years"].as_array().unwrap();
        assert!(years.iter().all(|year| all_years.contains(year)), "{kind}");
        assert!(told["as_it_was"]["all"]["ledger"].is_null(), "scattered years have no one ledger");
        shown.extend(years.iter().map(|year| year["water_year"].as_i64().unwrap()));
    }
    shown.sort_unstable();
    let whole: Vec<i64> = all_years.iter().map(|year| year["water_year"].as_i64().unwrap()).collect();
    assert_eq!(shown, whole, "dry, middling and wet years are all years, each once");
    let span = json(&["demo", "--years", "1990..1992"]);
    assert_eq!(span["as_it_was"]["years"].as_array().unwrap().len(), 3);
    assert!(span["as_it_was"]["all"]["ledger"].is_object());
}

#[test]
fn the_same_call_gives_the_same_bytes() {
    for form in ["table", "csv", "json"] {
        let call = || run(&["tell", "--set", "warming=2.5", "--form", form]).out;
        assert_eq!(call(), call(), "{form}");
    }
}

#[test]
fn the_demo_answers_within_a_second() {
    let start = std::time::Instant::now();
    assert_eq!(run(&["tell", "demo", "--form", "json", "--set", "warming=2"]).code, 0);
    let took = start.elapsed();
    // One second is the promise on an idle machine; tests share theirs.
    assert!(took.as_secs_f64() < 5.0, "{took:?}");
}
