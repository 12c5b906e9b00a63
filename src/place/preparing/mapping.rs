//! A record's mapping as the lines that `place.toml` has for it.

use crate::place::record::{ColumnPlan, DateOrder, DatePlan, Encoding, Measure, RecordPlan};
use crate::place::records::WEATHER;
use crate::place::terrain::AreaCurve;

/// What a record is for.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum RecordKind {
    /// The weather that the water runs on: `[record]`.
    Weather,
    /// A river gauge: `[gauge]`.
    Gauge {
        /// `natural`, `computed_inflow` or `below_diversions`.
        measures: String,
    },
    /// Snow water: `[snow_record]`.
    Snow,
    /// Water in the reservoir: `[storage_record]`.
    Storage,
    /// Flow into a canal or town: `[[diversion_record]]`.
    Diversion {
        /// Key of the canal or town.
        gate: String,
    },
}

impl RecordKind {
    /// The table of `place.toml`, with its brackets.
    pub fn table(&self) -> &'static str {
        match self {
            RecordKind::Weather => "[record]",
            RecordKind::Gauge { .. } => "[gauge]",
            RecordKind::Snow => "[snow_record]",
            RecordKind::Storage => "[storage_record]",
            RecordKind::Diversion { .. } => "[[diversion_record]]",
        }
    }

    /// Whether such a record can have a column of this measure.
    pub fn takes(&self, measure: Measure) -> bool {
        match self {
            RecordKind::Weather => WEATHER.contains(&measure),
            RecordKind::Gauge { measures } if measures == "computed_inflow" => {
                matches!(measure, Measure::ComputedInflow | Measure::Flow)
            }
            RecordKind::Gauge { .. } => measure == Measure::Flow,
            RecordKind::Snow => measure == Measure::SnowWater,
            RecordKind::Storage => measure == Measure::Storage,
            RecordKind::Diversion { .. } => matches!(measure, Measure::Diversion | Measure::Flow),
        }
    }

    /// The measure that a record of one column has.
    pub fn measure(&self) -> Option<Measure> {
        match self {
            RecordKind::Weather => None,
            RecordKind::Gauge { measures } if measures == "computed_inflow" => Some(Measure::ComputedInflow),
            RecordKind::Gauge { .. } => Some(Measure::Flow),
            RecordKind::Snow => Some(Measure::SnowWater),
            RecordKind::Storage => Some(Measure::Storage),
            RecordKind::Diversion { .. } => Some(Measure::Diversion),
        }
    }
}

/// Text between quotation marks, as TOML writes it.
pub fn text_value(text: &str) -> String {
    toml::Value::String(text.to_owned()).to_string()
}

/// The table of a record in `file`, with only those columns that it can have; ends with a line break.
///
/// Keys that would say what is usual are left out.
pub fn record_table(kind: &RecordKind, plan: &RecordPlan, file: &str) -> String {
    let mut lines = vec![kind.table().to_owned()];
    match kind {
        RecordKind::Gauge { measures } => lines.push(format!("measures = {}", text_value(measures))),
        RecordKind::Diversion { gate } => lines.push(format!("gate = {}", text_value(gate))),
        _ => {}
    }
    lines.push(format!("file = {}", text_value(file)));
    match &plan.date {
        DatePlan::Column { name, order } => {
            lines.push(format!("date = {}", text_value(name)));
            if *order != DateOrder::YearMonthDay {
                lines.push(format!("date_format = {}", text_value(order.key())));
            }
        }
        DatePlan::Parts { year, month, day } => lines.push(format!(
            "date = {{ year = {}, month = {}, day = {} }}",
            text_value(year),
            text_value(month),
            text_value(day)
        )),
        DatePlan::YearAndDay { year, day_of_year } => {
            lines.push(format!("date = {{ year = {}, day_of_year = {} }}", text_value(year), text_value(day_of_year)))
        }
    }
    match plan.delimiter {
        None | Some(',') => {}
        Some('\t') => lines.push("delimiter = \"tab\"".to_owned()),
        Some(mark) => lines.push(format!("delimiter = {}", text_value(&mark.to_string()))),
    }
    if plan.decimal_comma {
        lines.push("decimal_comma = true".to_owned());
    }
    if plan.encoding != Encoding::Utf8 {
        lines.push(format!("encoding = {}", text_value(plan.encoding.key())));
    }
    if plan.skip_lines > 0 {
        lines.push(format!("skip_lines = {}", plan.skip_lines));
    }
    if !plan.missing.is_empty() {
        let marks: Vec<String> = plan.missing.iter().map(|mark| text_value(mark)).collect();
        lines.push(format!("missing = [{}]", marks.join(", ")));
    }
    let mut columns = plan.columns.iter().filter(|column| kind.takes(column.measure));
    if *kind == RecordKind::Weather {
        lines.push(String::new());
        lines.push("[record.columns]".to_owned());
        lines.extend(columns.map(|column| format!("{} = {}", column.measure.key(), inline(column))));
    } else if let Some(column) = columns.next() {
        lines.push(format!("column = {}", text_value(&column.name)));
        lines.push(format!("unit = {}", text_value(column.unit.key())));
    }
    lines.join("\n") + "\n"
}

fn inline(column: &ColumnPlan) -> String {
    format!("{{ column = {}, unit = {} }}", text_value(&column.name), text_value(column.unit.key()))
}

/// The table of a curve of area below height, with this many bands; ends with a line break.
pub fn area_table(curve: &AreaCurve, bands: usize) -> String {
    let heights: Vec<String> = curve.points.iter().map(|point| format!("{:.0}", point.elevation_m)).collect();
    let areas: Vec<String> = curve.points.iter().map(|point| format!("{:.4}", point.area_below_km2)).collect();
    let trimmed = |text: &String| match text.trim_end_matches('0').trim_end_matches('.') {
        "" => "0".to_owned(),
        plain => plain.to_owned(),
    };
    let areas: Vec<String> = areas.iter().map(trimmed).collect();
    format!(
        "[area_elevation]\nelevation_m = [{}]\narea_below_km2 = [{}]\nbands = {bands}\n",
        heights.join(", "),
        areas.join(", ")
    )
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::place::record::{Measure, MeasureUnit};

    #[test]
    fn only_what_is_not_usual_is_written() {
        let date = DatePlan::Column { name: "date".into(), order: DateOrder::YearMonthDay };
        let columns = vec![ColumnPlan::new("q \"x\"", Measure::Flow, MeasureUnit::Ft3PerS)];
        let plan = RecordPlan { delimiter: Some(','), ..RecordPlan::new("a.csv", date, columns) };
        let kind = RecordKind::Gauge { measures: "natural".into() };
        let wanted = "[gauge]\nmeasures = \"natural\"\nfile = \"a.csv\"\ndate = \"date\"\ncolumn = 'q \"x\"'\nunit = \"ft³/s\"\n";
        assert_eq!(record_table(&kind, &plan, "a.csv"), wanted);
    }
}
