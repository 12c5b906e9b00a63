//! Days from a file of another form go into the form of the record.

use std::path::Path;

use deshielo::place::Source;
use deshielo::place::preparing::{RecordKind, look_at, placed_record, read_planned, with_named_columns};
use deshielo::place::record::{append, with_open_gaps};

use super::support::told;

#[test]
fn units_dates_and_commas_are_those_of_the_record() {
    let folder = tempfile::tempdir().unwrap();
    let toml = "[gauge]\nmeasures = \"computed_inflow\"\nfile = \"q.csv\"\ndate = \"Fecha\"\n\
                date_format = \"day/month/year\"\ndelimiter = \";\"\ndecimal_comma = true\ncolumn = \"Caudal\"\nunit = \"m³/s\"\n";
    std::fs::write(folder.path().join("place.toml"), toml).unwrap();
    std::fs::write(folder.path().join("q.csv"), "Fecha;Caudal\n30/01/2004;1,5\n31/01/2004;1,25\n").unwrap();
    let kind = RecordKind::Gauge { measures: "natural".into() };
    let placed = placed_record(Source::Folder(folder.path()), &kind).unwrap().expect("it is there");
    let days: String = (1..=9).map(|day| format!("2004-02-0{day},{day}00\n")).collect();
    let new = format!("date,flow_cfs\n{days}");
    let peek = look_at(Path::new("new.csv"), new.as_bytes()).unwrap();
    let plan = with_named_columns(&placed.plan, &peek).unwrap();
    let record = read_planned(&with_open_gaps(&plan), new.as_bytes(), &mut Vec::new()).unwrap();
    let whole = append(&placed.plan, &placed.bytes, &plan, new.as_bytes(), &record).unwrap();
    let text = String::from_utf8(whole.bytes).unwrap();
    // 100 and 900 ft³/s by the exact foot.
    assert!(text.ends_with("09/02/2004;25,4852\n") && text.contains("\n01/02/2004;2,8317\n"), "{text}");
    assert_eq!(whole.days, 9);
    // A record that the place does not have is no mistake; one that is described wrongly is.
    assert!(placed_record(Source::Folder(folder.path()), &RecordKind::Snow).unwrap().is_none());
    std::fs::write(folder.path().join("place.toml"), toml.replace("m³/s", "mm")).unwrap();
    let problems = placed_record(Source::Folder(folder.path()), &kind).unwrap_err();
    assert_eq!(told(&problems), [("problem-choice", 9)]);
}
