//! A look at a file of any kind that a record can have.

use std::path::Path;

use super::RecordKind;
use crate::place::exchange::{DATE_COLUMN, read_exchange, recognise};
use crate::place::problem::{Location, Problem};
use crate::place::record::{
    ColumnPlan, ColumnRole, DateOrder, DatePlan, DateReason, Measure, Peek, PeekColumn, ReadRecord, RecordPlan,
    UnitReason, peek, with_open_gaps,
};
use crate::place::record_file::read_any;

/// Looks at a CSV record, a WaterML 2.0 document or a NetCDF classic file. `Err` holds why nothing can be proposed.
pub fn look_at(file: &Path, bytes: &[u8]) -> Result<Peek, Vec<Problem>> {
    if recognise(bytes).is_none() {
        return peek(file, bytes);
    }
    let mut problems = Vec::new();
    let Some(exchange) = read_exchange(file, bytes, &mut problems) else { return Err(problems) };
    let mut plans: Vec<ColumnPlan> = Vec::new();
    let mut columns = vec![PeekColumn { name: DATE_COLUMN.into(), role: ColumnRole::Date }];
    for series in &exchange.series {
        let many = matches!(series.measure, Some(Measure::Flow | Measure::Diversion));
        let role = match (series.measure, series.unit) {
            (Some(measure), _) if !many && plans.iter().any(|plan| plan.measure == measure) => {
                ColumnRole::Again(measure)
            }
            (Some(measure), Some(unit)) => {
                plans.push(ColumnPlan::new(series.name.as_str(), measure, unit));
                ColumnRole::Measured { measure, unit, reason: UnitReason::Name }
            }
            _ => ColumnRole::Numbers,
        };
        columns.push(PeekColumn { name: series.name.clone(), role });
    }
    let date = DatePlan::Column { name: DATE_COLUMN.into(), order: DateOrder::YearMonthDay };
    let plan = RecordPlan { delimiter: Some(','), ..RecordPlan::new(file, date, plans) };
    let record = if plan.columns.is_empty() {
        problems.push(Problem::error(Location::whole_file(file), "problem-peek-columns"));
        None
    } else {
        read_any(&plan, bytes, &mut problems);
        read_any(&with_open_gaps(&plan), bytes, &mut Vec::new())
    };
    Ok(Peek { plan, header_line: 0, date_reason: DateReason::Only, columns, record, problems })
}

/// Reads a record of any format by a plan; `None` after at least one error in `problems`.
pub fn read_planned(plan: &RecordPlan, bytes: &[u8], problems: &mut Vec<Problem>) -> Option<ReadRecord> {
    read_any(plan, bytes, problems)
}

/// What a file with these columns is most likely for; `None` where it could be for several things or for none.
pub fn usual_kind(peek: &Peek) -> Option<RecordKind> {
    let has = |wanted: &[Measure]| peek.plan.columns.iter().any(|column| wanted.contains(&column.measure));
    let weather =
        has(&[Measure::Precipitation, Measure::TemperatureMin, Measure::TemperatureMax, Measure::TemperatureMean]);
    let flow = has(&[Measure::Flow]);
    let inflow = has(&[Measure::ComputedInflow]);
    match (weather, flow || inflow, has(&[Measure::SnowWater]), has(&[Measure::Storage])) {
        (true, ..) => Some(RecordKind::Weather),
        (_, true, false, false) => {
            let measures = if inflow { "computed_inflow" } else { "natural" };
            Some(RecordKind::Gauge { measures: measures.into() })
        }
        (_, false, true, false) => Some(RecordKind::Snow),
        (_, false, false, true) => Some(RecordKind::Storage),
        _ => None,
    }
}
