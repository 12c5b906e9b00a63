//! WaterML 2.0 and NetCDF classic: values as an independent writer meant them, and a place that names such files.

use std::path::Path;

use deshielo::place::exchange::{ExchangeFile, read_exchange};
use deshielo::place::record::{Measure, MeasureUnit};
use deshielo::place::{Source, read};

use super::support::{FLOW, STATION, STATION_64, told};

fn read_ok(bytes: &[u8]) -> ExchangeFile {
    let mut problems = Vec::new();
    let file = read_exchange(Path::new("file"), bytes, &mut problems);
    assert_eq!(told(&problems), []);
    file.expect("it was read without a problem")
}

fn refused(bytes: &[u8]) -> Vec<(&'static str, usize)> {
    let mut problems = Vec::new();
    assert!(read_exchange(Path::new("file"), bytes, &mut problems).is_none());
    told(&problems)
}

#[test]
fn netcdf_has_the_days_and_values_that_were_written() {
    for (bytes, packed) in [(STATION, false), (STATION_64, true)] {
        let file = read_ok(bytes);
        let names: Vec<_> = file.series.iter().map(|one| (one.name.as_str(), one.measure, one.unit)).collect();
        assert_eq!(
            names,
            [
                ("tasmin", Some(Measure::TemperatureMin), Some(MeasureUnit::Kelvin)),
                ("pr", Some(Measure::Precipitation), Some(MeasureUnit::Millimetre)),
            ]
        );
        let tmin = &file.series[0];
        assert_eq!(tmin.days.len(), 400);
        // The stamp says the second of January; the ends of the step say the first.
        assert_eq!(tmin.days[0].date.to_string(), "2000-01-01");
        assert_eq!(tmin.days[399].date.to_string(), "2001-02-03");
        for (index, day) in tmin.days.iter().enumerate() {
            let kelvin = 273.15 + 5.0 * libm::sin(index as f64 / 58.0);
            if packed && index == 7 {
                assert!(day.value.is_nan(), "the mark for missing");
            } else {
                assert!((day.value - kelvin).abs() < if packed { 0.0051 } else { 2e-5 }, "{index}: {}", day.value);
            }
        }
        // A rate over a day is a depth in the day.
        assert!((file.series[1].days[5].value - 4.32).abs() < 1e-6);
        assert_eq!(file.series[1].days[6].value, 0.0);
    }
}

#[test]
fn waterml_has_the_days_and_values_that_were_written() {
    let file = read_ok(FLOW);
    let series = &file.series[0];
    assert_eq!((series.name.as_str(), series.measure), ("Discharge & flow", Some(Measure::Flow)));
    assert_eq!((series.unit, series.days.len()), (Some(MeasureUnit::M3PerS), 400));
    assert_eq!(series.days[0].date.to_string(), "2003-10-01");
    assert_eq!(series.days[0].value, 2.0);
    assert!(series.days[12].value.is_nan());
    // An average of the time before midnight is that of the day that ends there.
    let text = String::from_utf8(FLOW.to_vec()).unwrap().replace("AverageSucc", "AveragePrec");
    assert_eq!(read_ok(text.as_bytes()).series[0].days[0].date.to_string(), "2003-09-30");
}

#[test]
fn what_cannot_be_read_is_told_with_its_line() {
    let text = String::from_utf8(FLOW.to_vec()).unwrap();
    let with = |old: &str, new: &str| {
        assert!(text.contains(old), "{old}");
        refused(text.replacen(old, new, 1).as_bytes())
    };
    let line = |word: &str| 1 + text[..text.find(word).unwrap()].matches('\n').count();
    assert_eq!(with("2003-10-02T", "2003-13-02T"), [("problem-exchange-time", line("2003-10-02T") + 1)]);
    assert_eq!(with("2003-10-02T", "2003-10-01T"), [("problem-exchange-day-twice", line("2003-10-02T") + 1)]);
    assert_eq!(with(">2.025<", ">2,025<"), [("problem-exchange-value", line(">2.025<"))]);
    assert_eq!(with("\"m3/s\"", "\"m3/s\"/><wml2:uom code=\"ft3/s\""), [("problem-waterml-units", line("\"m3/s\""))]);
    assert_eq!(with("waterml/2.0\" xmlns:om", "waterml/3.0\" xmlns:om"), [("problem-waterml-namespace", 11)]);
    assert_eq!(with("2.025", "&big;"), [("problem-xml-entity", line("2.025"))]);
    assert_eq!(refused(&FLOW[..FLOW.len() / 2])[0].0.replace("-cut", ""), "problem-xml");
    assert_eq!(refused(b"<a/>"), [("problem-waterml-none", 0)]);
    assert_eq!(refused(b"<timeSeriesResponse/>"), [("problem-waterml-old", 1)]);
    assert_eq!(refused(b"\xFF\xFE<\0a\0"), [("problem-exchange-two-byte", 1)]);
    let mut letters = FLOW.to_vec();
    letters[60] = 0xF3;
    assert_eq!(refused(&letters), [("problem-exchange-not-utf8", 2)]);
    assert_eq!(refused(b"\x89HDF\r\n\x1a\nxxxxxxxxxxx"), [("problem-netcdf-hdf5", 0)]);
    assert_eq!(refused(&STATION[..STATION.len() - 9]), [("problem-netcdf-cut", 0)]);
    assert_eq!(refused(&STATION[..100]), [("problem-netcdf-cut", 0)]);
    let calendar = |new: &[u8]| {
        let at = STATION.windows(8).position(|part| part == b"standard").unwrap();
        let mut bytes = STATION.to_vec();
        bytes[at..at + 8].copy_from_slice(new);
        refused(&bytes)
    };
    assert_eq!(calendar(b"noleap\0\0"), [("problem-netcdf-calendar", 0)]);
    // A count that is larger than the file sets nothing aside for it.
    let mut huge = STATION.to_vec();
    huge[4..8].copy_from_slice(&[0x7F, 0xFF, 0xFF, 0xFE]);
    assert_eq!(refused(&huge).len(), 1);
}

#[test]
fn a_place_names_such_files_like_any_record() {
    let folder = tempfile::tempdir().unwrap();
    std::fs::write(folder.path().join("station.nc"), STATION).unwrap();
    std::fs::write(folder.path().join("flow.xml"), FLOW).unwrap();
    let place = |unit: &str| {
        format!(
            "[place]\nname = {{ en = \"X\", es = \"X\" }}\nregion = \"es-CL\"\nlatitude_deg = 40\n\
             [station]\nelevation_m = 1600\n\
             [record]\nfile = \"station.nc\"\n[record.columns]\n\
             temperature_mean = {{ column = \"tasmin\", unit = \"{unit}\" }}\n\
             precipitation = {{ column = \"pr\", unit = \"mm\" }}\n\
             [[band]]\nelevation_m = 2000\narea_km2 = 10\n\
             [sharing]\nrule = \"proportional\"\n[start]\nsettling_years = 0\n\
             [gauge]\nmeasures = \"natural\"\nfile = \"flow.xml\"\ncolumn = \"discharge & flow\"\nunit = \"m³/s\"\n"
        )
    };
    let outcome = |unit: &str| {
        std::fs::write(folder.path().join("place.toml"), place(unit)).unwrap();
        read(Source::Folder(folder.path()))
    };
    let wrong = outcome("°C");
    assert!(told(&wrong.problems).contains(&("problem-exchange-unit", 10)), "{:?}", wrong.problems);
    let right = outcome("K");
    // The record is a year and a month: too short for a whole water year, and nothing else is wrong.
    let messages: Vec<_> = told(&right.problems).into_iter().map(|(message, _)| message).collect();
    assert_eq!(messages, ["problem-record-short", "problem-record-apart"], "{:?}", right.problems);
}
