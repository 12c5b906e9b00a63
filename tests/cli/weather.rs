//! `weather`: records that read back, recipes that make the same again, and a record made longer.

use deshielo::place::record::{ColumnPlan, DateOrder, DatePlan, Measure, MeasureUnit, RecordPlan, read_record};

use super::support::{Bench, run};

fn read_back(bytes: &[u8]) -> (usize, Vec<f64>) {
    let date = DatePlan::Column { name: "date".into(), order: DateOrder::YearMonthDay };
    let columns = vec![
        ColumnPlan::new("tmin_c", Measure::TemperatureMin, MeasureUnit::Celsius),
        ColumnPlan::new("tmax_c", Measure::TemperatureMax, MeasureUnit::Celsius),
        ColumnPlan::new("precipitation_mm", Measure::Precipitation, MeasureUnit::Millimetre),
        ColumnPlan::new("relative_humidity_percent", Measure::RelativeHumidityMean, MeasureUnit::Percent),
    ];
    let plan = RecordPlan::new("made.csv", date, columns);
    let mut problems = Vec::new();
    let record = read_record(&plan, bytes, &mut problems).unwrap_or_else(|| panic!("{problems:?}"));
    assert!(problems.is_empty(), "{problems:?}");
    (record.days, record.columns[2].values.clone())
}

#[test]
fn a_record_reads_back_and_says_that_it_is_invented() {
    let told = run(&["weather", "--recipe", "south", "--years", "5", "--seed", "9", "--from", "2001"]);
    assert_eq!(told.code, 0);
    assert!(told.out.starts_with("# This weather is made up"), "{}", &told.out[..200]);
    assert!(told.out.contains("# Este tiempo salió al azar") && told.out.contains("number 9"));
    assert!(
        told.out.contains("\n2000-04-01,") && told.out.trim_end().lines().last().unwrap().starts_with("2005-03-31,")
    );
    assert_eq!(read_back(told.out.as_bytes()).0, 5 * 365 + 1);
    let again = run(&["weather", "--recipe", "south", "--years", "5", "--seed", "9", "--from", "2001", "--lang", "es"]);
    assert_eq!(told.out, again.out, "the same bytes, whatever the language");
    assert_ne!(told.out, run(&["weather", "--recipe", "south", "--years", "5", "--from", "2001"]).out);
}

#[test]
fn a_recipe_that_was_written_makes_the_same_weather() {
    let bench = Bench::new();
    let told = bench.run(&["weather", "--years", "2", "--recipe-out", "own.toml", "--out", "a.csv"]);
    assert_eq!(told.code, 0, "{}", told.err);
    assert!(told.out.contains("2 years of weather are in a.csv") && told.out.contains("never happened"));
    bench.run(&["weather", "--years", "2", "--recipe", "own.toml", "--out", "b.csv"]);
    let days = |name: &str| {
        let text = std::fs::read_to_string(bench.path(name)).unwrap();
        text.lines().filter(|line| !line.starts_with('#')).map(str::to_owned).collect::<Vec<_>>()
    };
    assert_eq!(days("a.csv"), days("b.csv"));
}

#[test]
fn a_wrong_recipe_is_told_at_its_line_or_by_its_numbers() {
    let bench = Bench::new();
    bench.run(&["weather", "--years", "1", "--recipe-out", "own.toml", "--out", "a.csv"]);
    let good = std::fs::read_to_string(bench.path("own.toml")).unwrap();
    for (from, to, part) in [
        ("lag_one = 0.5", "lag_one = 5", "lag_one is 5"),
        ("lag_one =", "lag =", "own.toml:"),
        ("depth_step_mm = 0.1", "depth_step_mm = \"x\"", "own.toml:"),
        ("about =", "about ", "own.toml:"),
    ] {
        assert!(good.contains(from));
        std::fs::write(bench.path("own.toml"), good.replacen(from, to, 1)).unwrap();
        let told = bench.run(&["weather", "--recipe", "own.toml"]);
        assert_eq!((told.code, told.out.as_str()), (1, ""), "{to}");
        assert!(told.err.contains(part), "{to}: {}", told.err);
    }
}

#[test]
fn a_short_record_is_made_longer_by_its_own_pattern() {
    let bench = Bench::new();
    let told =
        bench.run(&["weather", "demo", "--years", "60", "--seed", "3", "--out", "long.csv", "--recipe-out", "f.toml"]);
    assert_eq!(told.code, 0, "{}", told.err);
    assert!(told.out.contains("whole water years of Tresnubes"), "{}", told.out);
    let bytes = std::fs::read(bench.path("long.csv")).unwrap();
    let date = DatePlan::Column { name: "date".into(), order: DateOrder::YearMonthDay };
    let columns = vec![ColumnPlan::new("precipitation_mm", Measure::Precipitation, MeasureUnit::Millimetre)];
    let mut problems = Vec::new();
    let record = read_record(&RecordPlan::new("long.csv", date, columns), &bytes, &mut problems).unwrap();
    assert_eq!(record.days, 60 * 365 + 15);
    let own =
        deshielo::place::read(deshielo::place::Source::Embedded(deshielo::place::demo::demo_files())).place.unwrap();
    let mean = |values: &mut dyn Iterator<Item = f64>, days: usize| values.sum::<f64>() / days as f64;
    let made = mean(&mut record.columns[0].values.iter().copied(), record.days);
    let measured = mean(&mut own.days.iter().map(|day| day.precipitation_mm), own.days.len());
    assert!((made / measured - 1.0).abs() < 0.12, "{made} and {measured} mm a day");
    assert_eq!(bench.run(&["weather", "--recipe", "f.toml", "--years", "1"]).code, 0);
}
