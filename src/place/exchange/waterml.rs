//! WaterML 2.0: measured time series in XML, read from end to end without building a tree.
//!
//! What is read of OGC 10-126r4: every `om:OM_Observation` with a `wml2:MeasurementTimeseries`; its observed property,
//! default unit and interpolation type; its points with time, value, `xsi:nil` and a unit of their own. Entities that the
//! document defines itself are refused, so no file can grow while it is read.

use std::path::Path;

use chrono::Days;
use quick_xml::XmlVersion;
use quick_xml::events::{BytesStart, Event};
use quick_xml::name::ResolveResult;
use quick_xml::reader::NsReader;

use super::clock::{is_in_record_years, parse_instant};
use super::unit_text::unit_of;
use super::{ExchangeDay, ExchangeSeries, fault, shown};
use crate::place::measure_words::measure_of_words;
use crate::place::problem::Problem;

const NAMESPACE: &[u8] = b"http://www.opengis.net/waterml/2.0";
/// Elements inside each other; the standard's own documents have some fifteen.
const MOST_DEPTH: usize = 64;
/// Letters of a time or a value.
const MOST_LETTERS: usize = 80;
/// Series of one file.
const MOST_SERIES: usize = 60;

/// Where the reader is.
#[derive(Default)]
struct State {
    series: Vec<ExchangeSeries>,
    /// Open elements, from the root.
    open: Vec<Vec<u8>>,
    /// The observation that is open.
    property: String,
    in_timeseries: bool,
    /// What the interpolation type says of the time before or after an instant.
    kind: String,
    days: Vec<ExchangeDay>,
    unit: Option<String>,
    point: Option<Point>,
    /// Text of the element that is open, where it is wanted.
    text: Option<String>,
}

/// The point that is open.
#[derive(Default)]
struct Point {
    line: usize,
    time: Option<String>,
    value: Option<String>,
    nil: bool,
}

/// Reads every series; tells at least one problem where it gives none.
pub(super) fn read(file: &Path, bytes: &[u8], problems: &mut Vec<Problem>) -> Vec<ExchangeSeries> {
    if bytes.starts_with(b"\xFF\xFE") || bytes.starts_with(b"\xFE\xFF") {
        problems.push(fault(file, 1, "problem-exchange-two-byte"));
        return Vec::new();
    }
    let bytes = bytes.strip_prefix(b"\xEF\xBB\xBF").unwrap_or(bytes);
    let text = match std::str::from_utf8(bytes) {
        Ok(text) => text,
        Err(error) => {
            let line = line_of(bytes, error.valid_up_to());
            problems.push(fault(file, line, "problem-exchange-not-utf8"));
            return Vec::new();
        }
    };
    let mut state = State::default();
    let mut lines = Lines { bytes, at: 0, line: 1 };
    match walk(text, &mut state, &mut lines, file) {
        Ok(()) => {}
        Err(problem) => {
            problems.push(*problem);
            return Vec::new();
        }
    }
    if state.series.is_empty() {
        problems.push(fault(file, 0, "problem-waterml-none"));
    }
    state.series
}

fn walk(text: &str, state: &mut State, lines: &mut Lines, file: &Path) -> Result<(), Box<Problem>> {
    let mut reader = NsReader::from_str(text);
    loop {
        let before = reader.buffer_position() as usize;
        let event = reader.read_resolved_event();
        let (namespace, event) = match event {
            Ok((ResolveResult::Bound(namespace), event)) => (Some(namespace.as_ref().to_vec()), event),
            Ok((_, event)) => (None, event),
            Err(_) => {
                let line = lines.at(reader.error_position() as usize);
                return Err(Box::new(fault(file, line, "problem-xml")));
            }
        };
        let line = lines.at(before);
        match event {
            Event::Start(start) => {
                open(&start, namespace.as_deref(), state, line, file)?;
                if state.open.len() > MOST_DEPTH {
                    return Err(Box::new(fault(file, line, "problem-xml-deep")));
                }
            }
            Event::Empty(start) => {
                open(&start, namespace.as_deref(), state, line, file)?;
                close(state, line, file)?;
            }
            Event::End(_) => close(state, line, file)?,
            Event::Text(part) => add_text(state, &part.decode().unwrap_or_default(), line, file)?,
            Event::CData(part) => add_text(state, &part.decode().unwrap_or_default(), line, file)?,
            Event::GeneralRef(reference) => {
                let name = reference.decode().unwrap_or_default();
                let known = ["amp", "lt", "gt", "quot", "apos"].contains(&name.as_ref()) || name.starts_with('#');
                if !known {
                    return Err(Box::new(fault(file, line, "problem-xml-entity").with("text", shown(&name))));
                }
                add_text(state, "?", line, file)?;
            }
            Event::Eof => {
                if let Some(name) = state.open.last() {
                    let name = shown(&String::from_utf8_lossy(name));
                    return Err(Box::new(fault(file, lines.at(text.len()), "problem-xml-cut").with("text", name)));
                }
                return Ok(());
            }
            Event::Decl(_) | Event::PI(_) | Event::DocType(_) | Event::Comment(_) => {}
        }
    }
}

fn open(
    start: &BytesStart,
    namespace: Option<&[u8]>,
    state: &mut State,
    line: usize,
    file: &Path,
) -> Result<(), Box<Problem>> {
    let name = start.local_name();
    let name = name.as_ref();
    let refuse = |message| Err(Box::new(fault(file, line, message)));
    if state.open.is_empty() && name == b"timeSeriesResponse" {
        return refuse("problem-waterml-old");
    }
    state.open.push(name.to_vec());
    match name {
        b"OM_Observation" => state.property.clear(),
        b"observedProperty" => {
            let title = attribute(start, b"title").or_else(|| attribute(start, b"href").map(|href| last_part(&href)));
            state.property = title.unwrap_or_default();
        }
        b"CategoricalTimeseries" => return refuse("problem-waterml-words"),
        b"MeasurementTimeseries" => {
            if namespace != Some(NAMESPACE) {
                return refuse("problem-waterml-namespace");
            }
            if state.in_timeseries {
                return refuse("problem-xml");
            }
            state.in_timeseries = true;
            state.kind.clear();
            state.unit = None;
            state.days.clear();
        }
        b"uom" if state.in_timeseries => {
            let unit = attribute(start, b"code").or_else(|| attribute(start, b"title")).unwrap_or_default();
            match &state.unit {
                // The unit behind the points would have to be carried along with each: nobody writes such files.
                Some(known) if *known != unit && !unit.is_empty() => {
                    let problem = fault(file, line, "problem-waterml-units");
                    return Err(Box::new(problem.with("unit", shown(&unit)).with("other", shown(known))));
                }
                _ if unit.is_empty() => {}
                _ => state.unit = Some(unit),
            }
        }
        b"interpolationType" if state.in_timeseries && state.point.is_none() => {
            let kind = attribute(start, b"href").or_else(|| attribute(start, b"title")).unwrap_or_default();
            state.kind = last_part(&kind);
        }
        b"point" if state.in_timeseries => state.point = Some(Point { line, ..Point::default() }),
        b"time" | b"value" if state.is_in_point() => {
            state.text = Some(String::new());
            if let (Some(point), b"value") = (&mut state.point, name) {
                point.line = line;
                point.nil = attribute(start, b"nil").is_some_and(|nil| nil == "true" || nil == "1");
            }
        }
        _ => {}
    }
    Ok(())
}

fn close(state: &mut State, line: usize, file: &Path) -> Result<(), Box<Problem>> {
    let Some(name) = state.open.pop() else { return Ok(()) };
    match name.as_slice() {
        b"time" | b"value" => {
            let text = state.text.take();
            if let (Some(point), Some(text)) = (&mut state.point, text) {
                let place = if name == b"time" { &mut point.time } else { &mut point.value };
                *place = Some(text);
            }
        }
        b"point" => {
            if let Some(point) = state.point.take() {
                let day = day_of(&point, state, file)?;
                state.days.push(day);
            }
        }
        b"MeasurementTimeseries" => {
            state.in_timeseries = false;
            finish_series(state, line, file)?;
        }
        _ => {}
    }
    Ok(())
}

impl State {
    /// Whether an element that opens stands directly in a point's time–value pair.
    fn is_in_point(&self) -> bool {
        let above = self.open.len().checked_sub(2).and_then(|index| self.open.get(index));
        self.point.is_some() && above.is_some_and(|name| name == b"MeasurementTVP" || name == b"TimeValuePair")
    }
}

fn add_text(state: &mut State, part: &str, line: usize, file: &Path) -> Result<(), Box<Problem>> {
    if let Some(text) = &mut state.text {
        text.push_str(part);
        if text.len() > MOST_LETTERS {
            let start = shown(text);
            return Err(Box::new(fault(file, line, "problem-exchange-value").with("text", start)));
        }
    }
    Ok(())
}

/// The day of a point. What is said of the time *before* an instant at midnight belongs to the day that ends there.
fn day_of(point: &Point, state: &State, file: &Path) -> Result<ExchangeDay, Box<Problem>> {
    let time = point.time.as_deref().unwrap_or_default();
    let instant = parse_instant(time).filter(|instant| is_in_record_years(instant.date));
    let Some(instant) = instant else {
        return Err(Box::new(fault(file, point.line, "problem-exchange-time").with("text", shown(time))));
    };
    let ends_there = state.kind.ends_with("Prec") && instant.second == 0.0;
    let date = if ends_there { instant.date - Days::new(1) } else { instant.date };
    if let Some(last) = state.days.last().filter(|last| last.date >= date) {
        let message = if last.date == date { "problem-exchange-day-twice" } else { "problem-exchange-day-back" };
        return Err(Box::new(fault(file, point.line, message).with("date", date)));
    }
    let text = point.value.as_deref().unwrap_or_default().trim();
    let value = if point.nil || text.is_empty() || text == "NaN" {
        f64::NAN
    } else {
        let number = text.parse().ok().filter(|number: &f64| number.is_finite());
        number.ok_or_else(|| Box::new(fault(file, point.line, "problem-exchange-value").with("text", shown(text))))?
    };
    Ok(ExchangeDay { date, value, line: point.line })
}

fn finish_series(state: &mut State, line: usize, file: &Path) -> Result<(), Box<Problem>> {
    if state.series.len() == MOST_SERIES {
        return Err(Box::new(fault(file, line, "problem-exchange-many").with("most", MOST_SERIES)));
    }
    let mut days = std::mem::take(&mut state.days);
    if days.is_empty() {
        return Err(Box::new(fault(file, line, "problem-exchange-empty")));
    }
    let kind = state.kind.to_lowercase();
    let extreme = [("min", "minimum"), ("max", "maximum")].iter().find(|(start, _)| kind.starts_with(start));
    let words = format!("{} {}", state.property, extreme.map_or("", |(_, word)| word));
    let measure = measure_of_words(&words);
    let unit_text = state.unit.take().unwrap_or_default();
    let unit = unit_of(&unit_text, measure);
    if let Some((_, scale)) = unit.filter(|(_, scale)| *scale != 1.0) {
        days.iter_mut().for_each(|day| day.value *= scale);
    }
    state.series.push(ExchangeSeries {
        name: state.property.clone(),
        described: words.trim().to_owned(),
        measure,
        unit_text,
        unit: unit.map(|(unit, _)| unit),
        days,
    });
    Ok(())
}

fn attribute(start: &BytesStart, local: &[u8]) -> Option<String> {
    let found = start.attributes().flatten().find(|attribute| attribute.key.local_name().as_ref() == local)?;
    Some(found.normalized_value(XmlVersion::Implicit1_0).ok()?.into_owned())
}

/// What stands behind the last `/`, `:` or `#` of an address.
fn last_part(address: &str) -> String {
    address.trim_end_matches(['/', '#']).rsplit(['/', '#', ':']).next().unwrap_or_default().to_owned()
}

fn line_of(bytes: &[u8], at: usize) -> usize {
    1 + bytes[..at.min(bytes.len())].iter().filter(|byte| **byte == b'\n').count()
}

/// Lines of bytes that are asked for in order, counted once.
struct Lines<'b> {
    bytes: &'b [u8],
    at: usize,
    line: usize,
}

impl Lines<'_> {
    /// The line of the first byte at or after `at` that is not blank.
    fn at(&mut self, at: usize) -> usize {
        let at = at.min(self.bytes.len());
        let blank = self.bytes[at..].iter().take_while(|byte| byte.is_ascii_whitespace()).count();
        let at = at + blank;
        if at >= self.at {
            self.line += self.bytes[self.at..at].iter().filter(|byte| **byte == b'\n').count();
            self.at = at;
        }
        self.line
    }
}
