//! A first look at records of many offices: columns, dates, units and marks with the reason of each.

use std::path::Path;

use deshielo::place::preparing::{RecordKind, look_at, record_table, usual_kind};
use deshielo::place::record::{ColumnRole, DateOrder, DatePlan, DateReason, Encoding, Measure, Peek, UnitReason};

use super::support::{FLOW, STATION, told};

fn look(bytes: &[u8]) -> Peek {
    look_at(Path::new("file.csv"), bytes).unwrap_or_else(|problems| panic!("{:?}", told(&problems)))
}

/// Measure, unit and reason of each column that is one.
fn measured(peek: &Peek) -> Vec<(&str, Measure, &'static str, UnitReason)> {
    let columns = peek.columns.iter().filter_map(|column| match &column.role {
        ColumnRole::Measured { measure, unit, reason } => Some((column.name.as_str(), *measure, unit.key(), *reason)),
        _ => None,
    });
    columns.collect()
}

#[test]
fn the_shipped_records_are_recognised() {
    let seattle = look(include_bytes!("../station/seattle-weather.csv"));
    assert_eq!(seattle.problems.len(), 0, "{:?}", told(&seattle.problems));
    let found = measured(&seattle);
    assert!(found.contains(&("temp_max", Measure::TemperatureMax, "°C", UnitReason::Size)), "{found:?}");
    assert!(found.contains(&("precipitation", Measure::Precipitation, "mm", UnitReason::Size)), "{found:?}");
    assert_eq!(usual_kind(&seattle), Some(RecordKind::Weather));
    assert_eq!(seattle.record.as_ref().map(|record| record.days), Some(1461));

    let us = look(include_bytes!("../records/us.csv"));
    assert!(
        measured(&us).contains(&("High", Measure::TemperatureMax, "°C", UnitReason::Usual)),
        "nothing says °F here"
    );
    assert_eq!(peek.columns[3].role, ColumnRole::Text);
    assert_eq!(peek.problems, []);
}

#[test]
fn the_order_of_day_and_month_is_read_off_the_run_of_days() {
    // Days one to nine of January fit both orders; only one of them counts up by days.
    let body = rows("%m/%d/%Y", 13, |day| format!(",{day}")).lines().skip(4).collect::<Vec<_>>().join("\n");
    let peek = look(format!("date,flow_cfs\n{body}\n").as_bytes());
    assert_eq!((peek.plan.date.order(), peek.date_reason), (Some(DateOrder::MonthDayYear), DateReason::Daily));
    let parts = rows("%Y,%m,%d", 40, |day| format!(",{day}"));
    let peek = look(format!("Año,Mes,Día,Caudal\n{parts}").as_bytes());
    assert_eq!((peek.date_reason, measured(&peek)[0].3), (DateReason::Parts, UnitReason::Usual));
    let table = record_table(&usual_kind(&peek).unwrap(), &peek.plan, "q.csv");
    assert!(table.contains("date = { year = \"Año\", month = \"Mes\", day = \"Día\" }"), "{table}");
}

#[test]
fn files_of_exchange_say_what_they_are() {
    let station = look(STATION);
    assert_eq!(measured(&station).len(), 2);
    assert_eq!(usual_kind(&station), Some(RecordKind::Weather));
    assert_eq!(usual_kind(&look(FLOW)), Some(RecordKind::Gauge { measures: "natural".into() }));
}

#[test]
fn what_is_no_record_is_refused_with_the_reason() {
    let refused = |text: &[u8]| told(&look_at(Path::new("x"), text).unwrap_err());
    assert_eq!(refused(b""), [("problem-record-empty", 0)]);
    assert_eq!(refused(b"Dear all,\nsee you on Monday.\n"), [("problem-peek-layout", 1)]);
    assert_eq!(refused(b"2004-01-01,1\n2004-01-02,2\n"), [("problem-peek-header", 1)]);
    assert_eq!(refused(b"PK\x03\x04zip"), [("problem-record-spreadsheet", 1)]);
    assert_eq!(refused(b"\xFF\xFEd\0a\0"), [("problem-record-two-byte-text", 1)]);
}
