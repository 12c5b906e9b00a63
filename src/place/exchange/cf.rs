//! Point series by the CF conventions in a NetCDF classic file: time axis, packing, missing values, standard names.

use std::path::Path;

use super::clock::{Instant, Since, parse_since};
use super::netcdf::{Fault, Kind, NetCdf, Variable};
use super::unit_text::unit_of;
use super::{ExchangeDay, ExchangeSeries, fault, shown};
use crate::place::measure_words::measure_of_words;
use crate::place::problem::Problem;

/// Calendars in which a date is the same as on the wall, for the years of records.
const CALENDARS: [&str; 4] = ["", "standard", "gregorian", "proleptic_gregorian"];
/// Words in names of variables that say how good a value is, and are no values.
const QUALITY: [&str; 4] = ["flag", "qc", "quality", "status"];
/// Series of one file.
const MOST_SERIES: usize = 60;
/// Steps of one axis: every day from 1750 to 2200.
const MOST_DAYS: usize = 165_000;

/// Reads every series; tells at least one problem where it gives none.
pub(super) fn read(file: &Path, bytes: &[u8], problems: &mut Vec<Problem>) -> Vec<ExchangeSeries> {
    match read_series(file, bytes) {
        Ok(series) => series,
        Err(problem) => {
            problems.push(*problem);
            Vec::new()
        }
    }
}

fn read_series(file: &Path, bytes: &[u8]) -> Result<Vec<ExchangeSeries>, Box<Problem>> {
    let tell = |found: Fault| Box::new(fault(file, 0, found.message).with("byte", found.byte));
    let net = NetCdf::open(bytes).map_err(tell)?;
    let Some(time) = time_axis(&net) else { return Err(Box::new(fault(file, 0, "problem-netcdf-no-time"))) };
    let axis = time.dimensions[0];
    let days = days_of(file, &net, time)?;
    let mut series = Vec::new();
    let mut stations = 0;
    for variable in &net.variables {
        if !is_series(variable, time, axis) {
            continue;
        }
        let others = net.size(variable).and_then(|size| size.checked_div(days.len()));
        if others != Some(1) {
            stations = stations.max(others.unwrap_or(0));
            continue;
        }
        if series.len() == MOST_SERIES {
            return Err(Box::new(fault(file, 0, "problem-exchange-many").with("most", MOST_SERIES)));
        }
        series.push(one_series(&net, variable, &days).map_err(tell)?);
    }
    if is_ragged(&net) {
        return Err(Box::new(fault(file, 0, "problem-netcdf-ragged")));
    }
    if series.is_empty() {
        return Err(Box::new(if stations > 1 {
            fault(file, 0, "problem-netcdf-stations").with("n", stations)
        } else {
            fault(file, 0, "problem-netcdf-no-series")
        }));
    }
    Ok(series)
}

/// The variable of one dimension that counts time; one that is named like its dimension before any other.
fn time_axis<'n>(net: &'n NetCdf) -> Option<&'n Variable> {
    let counts = |variable: &&Variable| {
        variable.dimensions.len() == 1
            && variable.kind != Kind::Text
            && variable.attributes.text("units").contains(" since ")
    };
    let named = |variable: &&Variable| net.dimensions[variable.dimensions[0]].name == variable.name;
    let mut axes = net.variables.iter().filter(counts);
    let first = axes.next()?;
    if named(&first) { Some(first) } else { axes.find(named).or(Some(first)) }
}

fn days_of(file: &Path, net: &NetCdf, time: &Variable) -> Result<Vec<ExchangeDay>, Box<Problem>> {
    let tell = |found: Fault| Box::new(fault(file, 0, found.message).with("byte", found.byte));
    let units = time.attributes.text("units");
    let calendar = time.attributes.text("calendar").to_lowercase();
    if !CALENDARS.contains(&calendar.as_str()) {
        return Err(Box::new(fault(file, 0, "problem-netcdf-calendar").with("text", shown(&calendar))));
    }
    let since = parse_since(units)
        .ok_or_else(|| Box::new(fault(file, 0, "problem-netcdf-time-units").with("text", shown(units))))?;
    if net.size(time).is_none_or(|size| size > MOST_DAYS) {
        return Err(Box::new(fault(file, 0, "problem-netcdf-long").with("most", MOST_DAYS)));
    }
    let counts = net.values(time).map_err(tell)?;
    let bounds = match net.variable(time.attributes.text("bounds")) {
        Some(bounds) if net.size(bounds) == counts.len().checked_mul(2) => Some(net.values(bounds).map_err(tell)?),
        _ => None,
    };
    let mut days: Vec<ExchangeDay> = Vec::new();
    for (index, count) in counts.iter().enumerate() {
        let instant = day_start(&since, *count, bounds.as_ref().and_then(|ends| ends.get(2 * index..2 * index + 2)));
        let Some(instant) = instant else {
            let problem = fault(file, 0, "problem-netcdf-time").with("n", index + 1);
            return Err(Box::new(problem.with("text", count.to_string())));
        };
        let date = instant.date;
        if let Some(last) = days.last().filter(|last| last.date >= date) {
            let message = if last.date == date { "problem-exchange-day-twice" } else { "problem-exchange-day-back" };
            return Err(Box::new(fault(file, 0, message).with("date", date)));
        }
        days.push(ExchangeDay { date, value: f64::NAN, line: 0 });
    }
    if days.is_empty() {
        return Err(Box::new(fault(file, 0, "problem-exchange-empty")));
    }
    Ok(days)
}

/// The day that a count means: where the file gives the ends of each step, the day in which the step begins.
fn day_start(since: &Since, count: f64, ends: Option<&[f64]>) -> Option<Instant> {
    match ends {
        Some([start, end]) => {
            let (start, end) = if end < start { (end, start) } else { (start, end) };
            since.instant(*start).filter(|_| end.is_finite())
        }
        _ => since.instant(count),
    }
}

/// Whether a variable is a series over the time axis, and not the axis, its ends or a mark of quality.
fn is_series(variable: &Variable, time: &Variable, axis: usize) -> bool {
    let name = variable.name.to_lowercase();
    let of_quality = name.split(|letter: char| !letter.is_alphanumeric()).any(|part| QUALITY.contains(&part))
        || variable.attributes.text("standard_name").ends_with("flag");
    variable.dimensions.contains(&axis)
        && variable.kind != Kind::Text
        && variable.name != time.name
        && variable.name != time.attributes.text("bounds")
        && !variable.attributes.text("units").contains(" since ")
        && !of_quality
}

/// Whether several stations lie behind each other on one axis (CF chapter 9.3.3 and 9.3.4).
fn is_ragged(net: &NetCdf) -> bool {
    let counted = |variable: &Variable| !variable.attributes.text("sample_dimension").is_empty();
    let indexed = |variable: &Variable| !variable.attributes.text("instance_dimension").is_empty();
    net.variables.iter().any(|variable| (counted(variable) && net.size(variable) != Some(1)) || indexed(variable))
}

fn one_series(net: &NetCdf, variable: &Variable, days: &[ExchangeDay]) -> Result<ExchangeSeries, Fault> {
    let about = &variable.attributes;
    let long = [about.text("standard_name"), about.text("long_name"), about.text("cell_methods")];
    let measure =
        measure_of_words(&format!("{} {}", long.join(" "), variable.name)).or_else(|| measure_of_words(&variable.name));
    let unit_text = about.text("units").to_owned();
    let unit = unit_of(&unit_text, measure);
    let scale = unit.map_or(1.0, |(_, scale)| scale);
    let missing: Vec<f64> = ["_FillValue", "missing_value"].iter().filter_map(|name| about.number(name)).collect();
    let usual_fill = if about.number("_FillValue").is_some() { None } else { variable.kind.usual_fill() };
    let low = about.number("valid_min").unwrap_or(f64::NEG_INFINITY);
    let high = about.number("valid_max").unwrap_or(f64::INFINITY);
    let (factor, offset) = (about.number("scale_factor").unwrap_or(1.0), about.number("add_offset").unwrap_or(0.0));
    let raw = net.values(variable)?;
    let value = |raw: f64| {
        let there = raw.is_finite() && !missing.contains(&raw) && usual_fill != Some(raw) && low <= raw && raw <= high;
        let value = (raw * factor + offset) * scale;
        if there && value.is_finite() { value } else { f64::NAN }
    };
    let described = long.into_iter().filter(|text| !text.is_empty()).collect::<Vec<_>>().join("; ");
    Ok(ExchangeSeries {
        name: variable.name.clone(),
        described,
        measure,
        unit_text,
        unit: unit.map(|(unit, _)| unit),
        days: days.iter().zip(raw).map(|(day, raw)| ExchangeDay { value: value(raw), ..*day }).collect(),
    })
}
