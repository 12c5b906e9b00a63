//! Daily records as people really have them: good ones in several shapes, broken ones, and any bytes at all.

#[path = "records/broken.rs"]
mod broken;
#[path = "records/broken_values.rs"]
mod broken_values;

use std::collections::BTreeSet;
use std::fs;
use std::path::Path;

use approx::assert_relative_eq;
use chrono::NaiveDate;
use deshielo::place::problem::{Argument, Problem, Severity};
use deshielo::place::record::{
    ColumnPlan, DateOrder, DatePlan, Encoding, GapFill, GapRule, Measure, MeasureUnit, ReadRecord, RecordPlan,
    read_record,
};
use fluent::{FluentArgs, FluentBundle, FluentResource};
use proptest::prelude::*;

fn one_column(name: &str, order: DateOrder) -> DatePlan {
    DatePlan::Column { name: name.into(), order }
}

fn columns<const N: usize>(columns: [(&str, Measure, MeasureUnit); N]) -> Vec<ColumnPlan> {
    columns.into_iter().map(|(name, measure, unit)| ColumnPlan::new(name, measure, unit)).collect()
}

fn read_file(plan: &RecordPlan) -> ReadRecord {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/records").join(&plan.file);
    let mut problems = Vec::new();
    let record = read_record(plan, &fs::read(path).unwrap(), &mut problems);
    assert!(problems.is_empty(), "{:?}: {problems:#?}", plan.file);
    record.unwrap()
}

#[test]
fn one_record_in_five_shapes_gives_the_same_values() {
    use Measure::{Flow, Precipitation, TemperatureMax, TemperatureMin};
    use MeasureUnit::*;
    let us = read_file(&RecordPlan::new(
        "us.csv",
        one_column("date", DateOrder::YearMonthDay),
        columns([
            ("Low", TemperatureMin, Fahrenheit),
            ("High", TemperatureMax, Fahrenheit),
            ("rain and snow", Precipitation, Inch),
            ("river", Flow, Ft3PerS),
        ]),
    ));
    assert_eq!((us.first_date, us.days), (NaiveDate::from_ymd_opt(2003, 12, 10).unwrap(), 60));
    let metric = read_file(&RecordPlan::new(
        "metric.csv",
        one_column("date", DateOrder::YearMonthDay),
        columns([
            ("tmin", TemperatureMin, Celsius),
            ("tmax", TemperatureMax, Celsius),
            ("precipitation", Precipitation, Millimetre),
            ("river", Flow, M3PerS),
        ]),
    ));
    let decimal_comma = read_file(&RecordPlan {
        decimal_comma: true,
        skip_lines: 1,
        ..RecordPlan::new(
            "decimal_comma.csv",
            one_column("FECHA", DateOrder::DayMonthYear),
            columns([
                ("mínima (°c)", TemperatureMin, Celsius),
                ("Máxima (°C)", TemperatureMax, Celsius),
                ("lluvia y nieve", Precipitation, Millimetre),
                ("río", Flow, M3PerS),
            ]),
        )
    });
    let latin1 = read_file(&RecordPlan {
        encoding: Encoding::Latin1,
        delimiter: Some('\t'),
        ..RecordPlan::new(
            "latin1.csv",
            DatePlan::Parts { year: "año".into(), month: "mes".into(), day: "día".into() },
            columns([
                ("mín", TemperatureMin, Kelvin),
                ("máx", TemperatureMax, Kelvin),
                ("lluvia", Precipitation, Centimetre),
                ("río", Flow, LitresPerS),
            ]),
        )
    });
    let day_of_year = read_file(&RecordPlan::new(
        "day_of_year.csv",
        DatePlan::YearAndDay { year: "year".into(), day_of_year: "day of year".into() },
        columns([
            ("low", TemperatureMin, Celsius),
            ("high", TemperatureMax, Celsius),
            ("rain", Precipitation, Millimetre),
            ("river", Flow, AcreFeetPerDay),
        ]),
    ));
    for other in [&metric, &decimal_comma, &latin1, &day_of_year] {
        assert_eq!((other.first_date, other.days), (us.first_date, us.days));
        for (one, two) in us.columns.iter().zip(&other.columns) {
            assert_eq!(one.measure, two.measure);
            for (a, b) in one.values.iter().zip(&two.values) {
                assert_relative_eq!(a, b, epsilon = 1e-12, max_relative = 1e-12);
            }
        }
    }
    // The first row of us.csv, by hand: 32 °F is freezing and an inch is 25.4 mm.
    let text = fs::read_to_string(Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/records/us.csv")).unwrap();
    let first: Vec<f64> = text.lines().nth(2).unwrap().split(',').skip(1).map(|cell| cell.parse().unwrap()).collect();
    assert_relative_eq!(us.columns[0].values[0], (first[0] - 32.0) * 5.0 / 9.0, max_relative = 1e-14);
    assert_relative_eq!(us.columns[2].values[0], first[2] * 25.4, max_relative = 1e-14);
    assert_ne!(us.checksum, metric.checksum);
}

#[test]
fn gaps_are_filled_by_their_rule_and_counted() {
    let text = b"date,t,p,q\n2001-01-30,1,2,7\n2001-01-31,-99,4,\n2001-02-01,M,,\n2001-02-02,7,10,8\n";
    let date = one_column("date", DateOrder::YearMonthDay);
    let mut plan = RecordPlan::new(
        "days.csv",
        date,
        columns([
            ("t", Measure::TemperatureMean, MeasureUnit::Celsius),
            ("p", Measure::Precipitation, MeasureUnit::Millimetre),
            ("q", Measure::Flow, MeasureUnit::M3PerS),
        ]),
    );
    plan.missing = vec!["m".into(), "-99.0".into()];
    let mut read = |how, longest_days| {
        plan.columns[1].gaps = GapRule { how, longest_days };
        let mut problems = Vec::new();
        (read_record(&plan, text, &mut problems), problems)
    };
    let (zero, problems) = read(GapFill::Zero, 1);
    let zero = zero.unwrap_or_else(|| panic!("{problems:?}"));
    let temperature = zero.column(Measure::TemperatureMean).unwrap();
    assert_eq!(temperature.values, [1.0, 3.0, 5.0, 7.0]);
    assert_eq!((temperature.filled, temperature.missing, temperature.longest_gap_days), (2, 2, 2));
    assert_eq!(zero.column_named("p").unwrap().values, [2.0, 4.0, 0.0, 10.0]);
    let flow = zero.column(Measure::Flow).unwrap();
    assert!(flow.values[1].is_nan() && flow.values[2].is_nan());
    assert_eq!((flow.filled, flow.missing), (0, 2));
    // February has one measured day, so its mean is that day.
    assert_eq!(read(GapFill::Mean, 1).0.unwrap().columns[1].values[2], 10.0);
    assert_eq!(read(GapFill::Linear, 1).0.unwrap().columns[1].values[2], 7.0);
    let (refused, problems) = read(GapFill::Refuse, 9);
    assert!(refused.is_none());
    assert_eq!((problems[0].message, problems[0].at.line), ("problem-record-gap-refused", 4));

    let look = zero.look();
    assert_eq!((look.days, look.last_date), (4, NaiveDate::from_ymd_opt(2001, 2, 2).unwrap()));
    let spread = look.columns[0].spread.unwrap();
    assert_eq!((spread.lowest, spread.mean, spread.highest), (1.0, 4.0, 7.0));
    assert_eq!(look.columns[2].spread.unwrap().mean, 7.5);
}

#[test]
fn every_broken_record_is_told_at_its_line_and_column() {
    let cases: Vec<broken::Broken> = broken::all().into_iter().chain(broken_values::all()).collect();
    assert!(cases.len() >= 40, "{}", cases.len());
    let mut said = BTreeSet::new();
    let mut wrong = Vec::new();
    for case in cases {
        let mut problems = Vec::new();
        let record = read_record(&case.plan, &case.bytes, &mut problems);
        let found: Vec<_> = problems.iter().map(|one| (one.message, one.at.line, one.at.column)).collect();
        if found != case.expected {
            wrong.push(format!("{}: {found:?} and not {:?}", case.name, case.expected));
        }
        let has_error = problems.iter().any(|problem| problem.severity == Severity::Error);
        assert_eq!(record.is_none(), has_error, "{}", case.name);
        for problem in &problems {
            for language in ["en", "es"] {
                say(problem, language);
            }
            said.insert(problem.message);
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
    for message in ids_in_source() {
        assert!(said.contains(message.as_str()), "no broken record brings out {message}");
    }
}

/// Every message id that the source names.
fn ids_in_source() -> BTreeSet<String> {
    let mut ids = BTreeSet::new();
    let mut folders = vec![Path::new(env!("CARGO_MANIFEST_DIR")).join("src/place/record")];
    while let Some(folder) = folders.pop() {
        for entry in fs::read_dir(folder).unwrap() {
            let path = entry.unwrap().path();
            if path.is_dir() {
                folders.push(path);
                continue;
            }
            let text = fs::read_to_string(path).unwrap();
            for piece in text.split("\"problem-record-").skip(1) {
                ids.insert(format!("problem-record-{}", piece.split('"').next().unwrap()));
            }
        }
    }
    ids
}

#[test]
fn the_words_have_every_message_and_no_other() {
    let ids = ids_in_source();
    for language in ["en", "es"] {
        let there: BTreeSet<String> = words(language)
            .lines()
            .filter(|line| line.starts_with("problem-"))
            .map(|line| line.split(' ').next().unwrap().to_owned())
            .collect();
        assert_eq!(there, ids, "{language}");
    }
}

fn words(language: &str) -> String {
    let path = format!("{}/locales/{language}/record-problems.ftl", env!("CARGO_MANIFEST_DIR"));
    fs::read_to_string(path).unwrap()
}

/// The message and its remedy in a language; fails on anything that is missing in them.
fn say(problem: &Problem, language: &str) -> String {
    let resource = FluentResource::try_new(words(language)).unwrap();
    let mut bundle = FluentBundle::new(vec![language.parse().unwrap()]);
    bundle.set_use_isolating(false);
    bundle.add_resource(resource).unwrap();
    let mut arguments = FluentArgs::new();
    for (name, argument) in &problem.arguments {
        match argument {
            Argument::Text(text) => arguments.set(*name, text.as_str()),
            Argument::Count(count) => arguments.set(*name, *count),
            Argument::Number(number) => arguments.set(*name, *number),
            Argument::Date(date) => arguments.set(*name, date.to_string()),
        }
    }
    let message = bundle.get_message(problem.message).unwrap_or_else(|| panic!("{} {language}", problem.message));
    let patterns = [message.value(), message.get_attribute("remedy").map(|remedy| remedy.value())];
    let said = patterns.map(|pattern| {
        let mut errors = Vec::new();
        let said = bundle.format_pattern(pattern.unwrap(), Some(&arguments), &mut errors).into_owned();
        assert!(errors.is_empty(), "{} {language}: {errors:?}", problem.message);
        said
    });
    said.join(" ")
}

/// The real records beside the project, where they are there.
#[test]
fn real_records_are_read() {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR")).join("../shared/observed");
    let snow_file = folder.join("snow_station_daily.csv");
    if !snow_file.exists() {
        println!("skipped: no observed records beside the project");
        return;
    }
    let date = || one_column("date", DateOrder::YearMonthDay);
    let snow = RecordPlan::new(
        "snow_station_daily.csv",
        date(),
        columns([
            ("tmin_c", Measure::TemperatureMin, MeasureUnit::Celsius),
            ("tmax_c", Measure::TemperatureMax, MeasureUnit::Celsius),
            ("tmean_c", Measure::TemperatureMean, MeasureUnit::Celsius),
            ("precip_mm", Measure::Precipitation, MeasureUnit::Millimetre),
            ("swe_mm", Measure::SnowWater, MeasureUnit::Millimetre),
        ]),
    );
    let mut problems = Vec::new();
    let record = read_record(&snow, &fs::read(&snow_file).unwrap(), &mut problems).unwrap();
    assert!(problems.is_empty(), "{problems:#?}");
    // 25 years with seven leap days; the blank cells as counted in the file, none in a gap of more than five days.
    assert_eq!((record.days, record.last_date().to_string().as_str()), (25 * 365 + 7, "2024-12-31"));
    let missing: Vec<usize> = record.columns.iter().map(|column| column.missing).collect();
    assert_eq!(missing, [24, 74, 14, 0, 0]);
    assert!(record.columns.iter().all(|column| column.filled == column.missing));

    let reservoir = RecordPlan::new(
        "reservoir_daily.csv",
        date(),
        columns([
            ("storage_acre_feet", Measure::Storage, MeasureUnit::AcreFeet),
            ("inflow_cfs", Measure::ComputedInflow, MeasureUnit::Ft3PerS),
            ("release_cfs", Measure::Flow, MeasureUnit::Ft3PerS),
        ]),
    );
    let mut problems = Vec::new();
    let bytes = fs::read(folder.join("reservoir_daily.csv")).unwrap();
    let record = read_record(&reservoir, &bytes, &mut problems).unwrap();
    assert_eq!(record.days, 19_731);
    let told: Vec<_> = problems.iter().map(|one| (one.message, one.severity, one.arguments.last())).collect();
    let fourteen = ("count", Argument::Count(14));
    assert_eq!(told, [("problem-record-inflow-negative", Severity::Warning, Some(&fourteen))]);
    assert_relative_eq!(record.columns[0].values[0], 523.14 * 1_233.481_837_547_52e-6, max_relative = 1e-12);
}

/// The real station's numbers under a wrong unit, every single year of them: °F for °C and back, inches for mm and
/// back, and a gauge that adds up.
#[test]
fn real_numbers_under_a_wrong_unit_are_found_out() {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("../shared/observed/snow_station_daily.csv");
    let Ok(text) = fs::read_to_string(path) else {
        println!("skipped: no observed records beside the project");
        return;
    };
    let fahrenheit = |value: f64| (value * 1.8 + 32.0).round();
    let inches = |value: f64| (value / 25.4 * 10.0).round() / 10.0;
    for year in 2000..2025 {
        let rows = || text.lines().filter(|line| line.starts_with(&format!("{year}-")));
        let written = |cell: usize, change: &dyn Fn(f64) -> f64| -> String {
            let days = rows().map(|line| {
                let cells: Vec<&str> = line.split(',').collect();
                let value = cells[cell].parse().map(|value| format!("{}", change(value))).unwrap_or_default();
                format!("{},{value}\n", cells[0])
            });
            format!("date,x\n{}", days.collect::<String>())
        };
        let told = |measure, unit, text: String| -> Vec<&'static str> {
            let date = one_column("date", DateOrder::YearMonthDay);
            let mut problems = Vec::new();
            read_record(
                &RecordPlan::new("x.csv", date, columns([("x", measure, unit)])),
                text.as_bytes(),
                &mut problems,
            );
            problems.iter().map(|problem| problem.message).filter(|message| !message.contains("-gap-")).collect()
        };
        for (cell, measure) in
            [(1, Measure::TemperatureMin), (2, Measure::TemperatureMax), (3, Measure::TemperatureMean)]
        {
            let found = told(measure, MeasureUnit::Fahrenheit, written(cell, &|value| value));
            assert_eq!(found, ["problem-record-celsius"], "{year} {measure:?}");
            assert!(
                told(measure, MeasureUnit::Fahrenheit, written(cell, &fahrenheit)).is_empty(),
                "{year} {measure:?}"
            );
            assert!(
                told(measure, MeasureUnit::Celsius, written(cell, &|value| value)).is_empty(),
                "{year} {measure:?}"
            );
        }
        let found = told(Measure::TemperatureMax, MeasureUnit::Celsius, written(2, &fahrenheit));
        assert_eq!(found, ["problem-record-fahrenheit"], "{year}");
        let rain = |unit, change: &dyn Fn(f64) -> f64| told(Measure::Precipitation, unit, written(4, change));
        assert_eq!(rain(MeasureUnit::Millimetre, &inches), ["problem-record-precipitation-inches"], "{year}");
        assert_eq!(rain(MeasureUnit::Inch, &|value| value), ["problem-record-precipitation-much"], "{year}");
        let sum = std::cell::Cell::new(0.0);
        let add = |value: f64| {
            sum.set(sum.get() + value);
            sum.get()
        };
        assert_eq!(rain(MeasureUnit::Millimetre, &add), ["problem-record-precipitation-adds-up"], "{year}");
        assert!(rain(MeasureUnit::Inch, &inches).is_empty(), "{year}");
    }
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 300, failure_persistence: None, ..ProptestConfig::default() })]

    /// Whatever happens to the bytes of a record, reading it ends, and ends without a value that nobody measured.
    #[test]
    fn no_bytes_bring_it_down(
        changes in prop::collection::vec((any::<prop::sample::Index>(), any::<u8>()), 0..40),
        cut in any::<prop::sample::Index>(),
        decimal_comma: bool,
        latin1: bool,
        order in 0usize..3,
    ) {
        let mut bytes = fs::read(Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/records/us.csv")).unwrap();
        for (at, byte) in changes {
            let at = at.index(bytes.len());
            bytes[at] = byte;
        }
        bytes.truncate(cut.index(bytes.len()) + 1);
        let mut plan = RecordPlan::new(
            "us.csv",
            one_column("date", DateOrder::ALL[order]),
            columns([
                ("low", Measure::TemperatureMin, MeasureUnit::Fahrenheit),
                ("high", Measure::TemperatureMax, MeasureUnit::Fahrenheit),
                ("rain and snow", Measure::Precipitation, MeasureUnit::Inch),
                ("river", Measure::Flow, MeasureUnit::Ft3PerS),
            ]),
        );
        plan.decimal_comma = decimal_comma;
        plan.encoding = if latin1 { Encoding::Latin1 } else { Encoding::Utf8 };
        let mut problems = Vec::new();
        match read_record(&plan, &bytes, &mut problems) {
            Some(record) => {
                prop_assert!(record.columns.iter().all(|column| column.values.len() == record.days));
                prop_assert!(record.columns[..3].iter().all(|column| column.values.iter().all(|value| value.is_finite())));
            }
            None => prop_assert!(problems.iter().any(|problem| problem.severity == Severity::Error)),
        }
    }

    /// Nor do bytes that never were a record, under plans that fit nothing.
    #[test]
    fn nor_does_any_plan(
        bytes in prop::collection::vec(any::<u8>(), 0..300),
        cells in "([0-9]{1,4}[-/,;.\" ]{0,2}){0,60}",
        delimiter: Option<char>,
        comment: Option<char>,
        mark in ".{0,5}",
        parts: bool,
    ) {
        let date = if parts {
            DatePlan::Parts { year: "a".into(), month: "b".into(), day: "c".into() }
        } else {
            DatePlan::YearAndDay { year: "a".into(), day_of_year: "b".into() }
        };
        let mut plan = RecordPlan::new("noise", date, columns([("c", Measure::Flow, MeasureUnit::M3PerS)]));
        (plan.delimiter, plan.comment, plan.missing) = (delimiter, comment, vec![mark]);
        let between = delimiter.unwrap_or(',');
        for noise in [bytes, cells.into_bytes()] {
            let mut text = format!("a{between}b{between}c\n2001{between}1{between}1\n").into_bytes();
            text.extend(noise);
            let mut problems = Vec::new();
            let record = read_record(&plan, &text, &mut problems);
            prop_assert_eq!(record.is_none(), problems.iter().any(|problem| problem.severity == Severity::Error));
        }
    }
}
