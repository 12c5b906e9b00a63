//! What `place peek` finds, for tools.

use serde_json::{Value, json};

use crate::commands::problem_words::{message, remedy};
use crate::place::problem::Severity;
use crate::place::record::{ColumnRole, Peek, Spread, UnitReason};
use crate::place::terrain::AreaCurve;
use crate::words::Words;

/// A record: its columns in the file's own units, the lines for `place.toml`, and what is wrong.
pub(super) fn of_record(peek: &Peek, mapping: Option<&str>, words: &Words) -> String {
    let columns: Vec<Value> = peek
        .columns
        .iter()
        .map(|column| match &column.role {
            ColumnRole::Date => json!({ "name": column.name, "role": "date" }),
            ColumnRole::Measured { measure, unit, reason } => {
                let read = peek.record.as_ref().and_then(|record| {
                    record.columns.iter().find(|read| read.name == column.name && read.measure == *measure)
                });
                let spread = read.and_then(|read| Spread::of(read.values.iter().copied()));
                json!({
                    "name": column.name,
                    "role": measure.key(),
                    "unit": unit.key(),
                    "unit_from": match reason {
                        UnitReason::Name => "name",
                        UnitReason::Size => "size",
                        UnitReason::Usual => "usual",
                    },
                    "missing": read.map(|read| read.missing),
                    "longest_gap_days": read.map(|read| read.longest_gap_days),
                    "lowest": spread.map(|spread| unit.from_si(spread.lowest)),
                    "mean": spread.map(|spread| unit.from_si(spread.mean)),
                    "highest": spread.map(|spread| unit.from_si(spread.highest)),
                })
            }
            ColumnRole::Again(measure) => json!({ "name": column.name, "role": "again", "measure": measure.key() }),
            ColumnRole::Numbers => json!({ "name": column.name, "role": "numbers" }),
            ColumnRole::Text => json!({ "name": column.name, "role": "text" }),
        })
        .collect();
    let problems: Vec<Value> = peek
        .problems
        .iter()
        .map(|problem| {
            json!({
                "line": problem.at.line,
                "column": problem.at.column,
                "severity": if problem.severity == Severity::Error { "error" } else { "warning" },
                "code": problem.message,
                "message": message(problem, words),
                "remedy": remedy(problem, words),
            })
        })
        .collect();
    let answer = json!({
        "header_line": peek.header_line,
        "delimiter": peek.plan.delimiter.map(String::from),
        "decimal_comma": peek.plan.decimal_comma,
        "encoding": peek.plan.encoding.key(),
        "date_format": peek.plan.date.order().map(|order| order.key()),
        "missing": peek.plan.missing,
        "first_date": peek.record.as_ref().map(|record| record.first_date.to_string()),
        "last_date": peek.record.as_ref().map(|record| record.last_date().to_string()),
        "days": peek.record.as_ref().map(|record| record.days),
        "columns": columns,
        "mapping": mapping,
        "problems": problems,
    });
    written(&answer)
}

/// A curve of area below height.
pub(super) fn of_curve(curve: &AreaCurve, table: &str) -> String {
    let points: Vec<Value> = curve
        .points
        .iter()
        .map(|point| json!({ "elevation_m": point.elevation_m, "area_below_km2": point.area_below_km2 }))
        .collect();
    written(&json!({
        "area_km2": curve.area_km2,
        "mean_m": curve.mean_m,
        "cells": curve.cells,
        "empty_share": curve.empty_share,
        "points": points,
        "mapping": table,
    }))
}

fn written(value: &Value) -> String {
    // A value always has a JSON form.
    serde_json::to_string_pretty(value).unwrap_or_default() + "\n"
}
