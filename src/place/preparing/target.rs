//! A record that a place has already: its file and how the place reads it.

use super::RecordKind;
use crate::place::problem::Problem;
use crate::place::record::Measure;
use crate::place::record::{ColumnPlan, DatePlan, Peek, RecordPlan, plain_name};
use crate::place::record_file::{PlannedFile, planned};
use crate::place::records::{column_plan, weather_columns};
use crate::place::section::Section;
use crate::place::source::Source;
use crate::place::tree::{Kind, Sheet};

/// A record of a place.
#[derive(Clone, Debug, PartialEq)]
pub struct PlacedRecord {
    /// Name of its file in the place.
    pub file: String,
    /// How the place reads it.
    pub plan: RecordPlan,
    /// The bytes of its file.
    pub bytes: Vec<u8>,
}

/// The record of this kind that the place has; `Ok(None)` where it has none, and `Err` where it cannot be read.
pub fn placed_record(source: Source<'_>, kind: &RecordKind) -> Result<Option<PlacedRecord>, Vec<Problem>> {
    let text = source.place_text().map_err(|problem| vec![problem])?;
    let (sheet, table) = Sheet::parse(source.shown("place.toml"), &text);
    if sheet.is_broken() {
        return Err(sheet.problems.take());
    }
    let (present, found) = {
        let root = Section::root(&sheet, &table);
        record_of(&root, source, kind)
    };
    if !present {
        return Ok(None);
    }
    match found {
        Some(PlannedFile { file, plan, bytes, .. }) => Ok(Some(PlacedRecord { file, plan, bytes })),
        None => {
            // Only this table was asked for: that nobody asked for the others says nothing.
            let mut problems = sheet.problems.take();
            problems.retain(|problem| !problem.message.ends_with("-unknown"));
            Err(problems)
        }
    }
}

/// Flows are alike, wherever they are measured: the place says what its record is.
fn is_like(found: Measure, wanted: Measure) -> bool {
    let flow = |measure| matches!(measure, Measure::Flow | Measure::ComputedInflow | Measure::Diversion);
    found == wanted || (flow(found) && flow(wanted))
}

fn record_of(root: &Section<'_>, source: Source<'_>, kind: &RecordKind) -> (bool, Option<PlannedFile>) {
    let one = |section: &Section<'_>| -> Option<PlannedFile> {
        // What the place says of its gauge goes before what was guessed of the new file.
        let computed = section
            .peek("measures")
            .is_some_and(|value| matches!(&value.kind, Kind::Text(text) if text == "computed_inflow"));
        let measure = match kind {
            RecordKind::Gauge { .. } if computed => Measure::ComputedInflow,
            RecordKind::Gauge { .. } => Measure::Flow,
            _ => kind.measure()?,
        };
        let column = column_plan(section, measure);
        planned(section, source, column.into_iter().collect())
    };
    match kind {
        RecordKind::Weather => {
            let section = root.section("record");
            if !section.present {
                return (false, None);
            }
            let columns = weather_columns(&section).columns;
            (true, planned(&section, source, columns))
        }
        RecordKind::Gauge { .. } | RecordKind::Snow | RecordKind::Storage => {
            let key = match kind {
                RecordKind::Gauge { .. } => "gauge",
                RecordKind::Snow => "snow_record",
                _ => "storage_record",
            };
            let section = root.section(key);
            (section.present, if section.present { one(&section) } else { None })
        }
        RecordKind::Diversion { gate } => {
            let sections = root.sections("diversion_record");
            let section = sections.iter().find(|section| section.text("gate").is_some_and(|(key, _)| key == gate));
            (section.is_some(), section.and_then(one))
        }
    }
}

/// The plan for a new file that is to go behind the record `placed`: the same columns by name where the file has them,
/// else by what they measure. `Err` names the first column that the file has neither way.
pub fn with_named_columns(placed: &RecordPlan, peek: &Peek) -> Result<RecordPlan, String> {
    let has = |name: &str| {
        let plain = plain_name(name);
        peek.columns.iter().any(|column| plain_name(&column.name) == plain)
    };
    let date_there = match &placed.date {
        DatePlan::Column { name, .. } => has(name),
        DatePlan::Parts { year, month, day } => has(year) && has(month) && has(day),
        DatePlan::YearAndDay { year, day_of_year } => has(year) && has(day_of_year),
    };
    if date_there && placed.columns.iter().all(|column| has(&column.name)) {
        return Ok(RecordPlan { file: peek.plan.file.clone(), delimiter: peek.plan.delimiter, ..placed.clone() });
    }
    let mut columns = Vec::new();
    for wanted in &placed.columns {
        let found = peek.plan.columns.iter().find(|column| is_like(column.measure, wanted.measure));
        let Some(found) = found else { return Err(wanted.name.clone()) };
        columns.push(ColumnPlan::new(found.name.as_str(), wanted.measure, found.unit));
    }
    Ok(RecordPlan { columns, ..peek.plan.clone() })
}
