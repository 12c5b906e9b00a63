//! Broken bytes for every reader: an answer or a reason that both languages can say, and never a panic.

use std::path::Path;

use deshielo::place::exchange::read_exchange;
use deshielo::place::preparing::{RecordKind, look_at, record_table, usual_kind};
use deshielo::place::problem::{Problem, Severity};
use deshielo::place::record::{ColumnPlan, DateOrder, DatePlan, Measure, MeasureUnit, RecordPlan, append, read_record};
use deshielo::place::terrain::{Coordinates, TerrainFiles, area_curve};
use proptest::collection::vec;
use proptest::prelude::*;

use super::support::{BASIN, FLOW, HEIGHTS_ASCII, HEIGHTS_TIFF, STATION, STATION_64, assert_sayable};

const WEATHER: &[u8] = include_bytes!("../records/metric.csv");

/// One way in which a file breaks on its way.
#[derive(Clone, Debug)]
enum Change {
    Cut(usize),
    Flip(usize, u8),
    Set(usize, Vec<u8>),
    Insert(usize, Vec<u8>),
    Repeat(usize, usize),
    Mark,
    TwoByte,
    LineEnds(&'static str),
}

fn change() -> impl Strategy<Value = Change> {
    let bytes = prop_oneof![
        Just(vec![0]),
        Just(vec![0xFF; 4]),
        Just(vec![0x7F, 0xFF, 0xFF, 0xFF]),
        Just(b"\"".to_vec()),
        Just(b"99999999999999999999".to_vec()),
        Just(b"-1e308".to_vec()),
        Just(b"NaN".to_vec()),
        Just(b",;\t|".to_vec()),
        Just(b"<!--".to_vec()),
        Just(b"</a>".to_vec()),
        Just("é°\u{202E}".as_bytes().to_vec()),
        vec(any::<u8>(), 1..9),
    ];
    // Where: the head of a file says most, so half of the changes are there.
    let at = prop_oneof![0usize..600, 0usize..60_000];
    prop_oneof![
        at.clone().prop_map(Change::Cut),
        (at.clone(), any::<u8>()).prop_map(|(at, mask)| Change::Flip(at, mask)),
        (at.clone(), bytes.clone()).prop_map(|(at, bytes)| Change::Set(at, bytes)),
        (at.clone(), bytes).prop_map(|(at, bytes)| Change::Insert(at, bytes)),
        (at, 1usize..300).prop_map(|(at, length)| Change::Repeat(at, length)),
        Just(Change::Mark),
        Just(Change::TwoByte),
        prop_oneof![Just("\r\n"), Just("\r"), Just("\n\n"), Just("")].prop_map(Change::LineEnds),
    ]
}

fn changed(good: &[u8], changes: &[Change]) -> Vec<u8> {
    let mut bytes = good.to_vec();
    for change in changes {
        let length = bytes.len();
        let within = |at: usize| at % (length + 1);
        match change {
            Change::Cut(at) => bytes.truncate(within(*at)),
            Change::Flip(at, mask) if length > 0 => bytes[at % length] ^= mask,
            Change::Flip(..) => {}
            Change::Set(at, new) => {
                let at = within(*at);
                let end = (at + new.len()).min(length);
                bytes.splice(at..end, new.iter().copied());
            }
            Change::Insert(at, new) => {
                let at = within(*at);
                bytes.splice(at..at, new.iter().copied());
            }
            Change::Repeat(at, run) => {
                let at = within(*at);
                let part = bytes[at..(at + run).min(length)].to_vec();
                bytes.splice(at..at, part);
            }
            Change::Mark => {
                bytes.splice(0..0, *b"\xEF\xBB\xBF");
            }
            Change::TwoByte => {
                bytes = [0xFF, 0xFE].into_iter().chain(bytes.iter().flat_map(|byte| [*byte, 0])).collect();
            }
            Change::LineEnds(end) => {
                let lines: Vec<&[u8]> = bytes.split(|byte| *byte == b'\n').collect();
                bytes = lines.join(end.as_bytes());
            }
        }
    }
    bytes
}

/// Nothing without a reason, and every reason in both languages.
fn assert_told(answered: bool, problems: &[Problem]) {
    let errors = problems.iter().filter(|problem| problem.severity == Severity::Error).count();
    assert_eq!(answered, errors == 0, "{problems:?}");
    problems.iter().for_each(assert_sayable);
}

fn plan() -> RecordPlan {
    let date = DatePlan::Column { name: "date".into(), order: DateOrder::YearMonthDay };
    let columns = vec![
        ColumnPlan::new("tmin", Measure::TemperatureMin, MeasureUnit::Celsius),
        ColumnPlan::new("tmax", Measure::TemperatureMax, MeasureUnit::Celsius),
        ColumnPlan::new("precipitation", Measure::Precipitation, MeasureUnit::Millimetre),
    ];
    RecordPlan { missing: vec!["-99".into()], ..RecordPlan::new("days.csv", date, columns) }
}

fn curve_of(grid: &[u8], outline: &[u8]) {
    let mut problems = Vec::new();
    let files = TerrainFiles {
        grid_file: Path::new("grid"),
        grid,
        prj: None,
        outline_file: Path::new("basin"),
        outline,
        grid_coordinates: Some(Coordinates::Metres(32_719)),
        heights: None,
    };
    let curve = area_curve(&files, &mut problems);
    assert_told(curve.is_some(), &problems);
    if let Some(curve) = curve {
        assert!(curve.points.windows(2).all(|pair| pair[0].area_below_km2 < pair[1].area_below_km2));
        assert!(curve.area_km2.is_finite() && curve.mean_m.is_finite());
    }
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 300, ..ProptestConfig::default() })]

    #[test]
    fn broken_files_of_exchange(which in 0usize..3, changes in vec(change(), 1..4)) {
        let bytes = changed([STATION, STATION_64, FLOW][which], &changes);
        let mut problems = Vec::new();
        match read_exchange(Path::new("file"), &bytes, &mut problems) {
            Some(file) => {
                assert_told(true, &problems);
                let table = file.table();
                prop_assert_eq!(table.text.lines().count(), table.source_lines.len());
                prop_assert!(file.series.iter().all(|series| series.days.windows(2).all(|pair| pair[0].date < pair[1].date)));
            }
            None => prop_assert!(deshielo::place::exchange::recognise(&bytes).is_none() || !problems.is_empty()),
        }
        problems.iter().for_each(assert_sayable);
    }

    #[test]
    fn broken_records(changes in vec(change(), 1..4)) {
        let bytes = changed(WEATHER, &changes);
        let mut problems = Vec::new();
        let record = read_record(&plan(), &bytes, &mut problems);
        assert_told(record.is_some(), &problems);
        if let Some(record) = &record {
            prop_assert!(record.columns.iter().all(|column| column.values.len() == record.days));
            let again = append(&plan(), &bytes, &plan(), &bytes, record);
            // A file has no day after its own last one.
            prop_assert_eq!(again.unwrap_err()[0].message, "problem-add-nothing");
        }
    }

    #[test]
    fn looks_at_broken_files(which in 0usize..3, changes in vec(change(), 1..4)) {
        let bytes = changed([WEATHER, STATION, FLOW][which], &changes);
        match look_at(Path::new("file"), &bytes) {
            Ok(peek) => {
                peek.problems.iter().for_each(assert_sayable);
                let kind = usual_kind(&peek).unwrap_or(RecordKind::Weather);
                let table = record_table(&kind, &peek.plan, "a \"file\".csv");
                prop_assert!(table.parse::<toml::Table>().is_ok(), "{}", table);
            }
            Err(problems) => {
                prop_assert!(!problems.is_empty());
                problems.iter().for_each(assert_sayable);
            }
        }
    }

    #[test]
    fn broken_heights(is_tiff in any::<bool>(), changes in vec(change(), 1..4)) {
        curve_of(&changed(if is_tiff { HEIGHTS_TIFF } else { HEIGHTS_ASCII }, &changes), BASIN);
    }

    #[test]
    fn broken_outlines(changes in vec(change(), 1..4)) {
        curve_of(HEIGHTS_ASCII, &changed(BASIN, &changes));
    }
}
