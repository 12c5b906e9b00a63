//! The daily records that a place names: how each is to be read, and its days beside those of the weather.

use chrono::NaiveDate;

use super::problem::{Location, Problem};
use super::record::{
    ColumnPlan, DateOrder, DatePlan, Encoding, GapFill, GapRule, Measure, MeasureUnit, ReadRecord, RecordPlan,
    read_record,
};
use super::section::{Limits, Section, nearest, unknown_choice};
use super::source::Source;
use super::tree::{Kind, Table, Value};
use super::unit_suffix::{DAYS, PLAIN};

/// Columns of the weather record.
const WEATHER: [Measure; 13] = [
    Measure::TemperatureMin,
    Measure::TemperatureMax,
    Measure::TemperatureMean,
    Measure::Precipitation,
    Measure::RelativeHumidityMean,
    Measure::RelativeHumidityMin,
    Measure::RelativeHumidityMax,
    Measure::DewPoint,
    Measure::VapourPressure,
    Measure::Wind,
    Measure::Solar,
    Measure::Sunshine,
    Measure::ReferenceEvaporation,
];

/// A record that was read.
pub(super) struct NamedRecord {
    /// Name of the file in the place.
    pub file: String,
    /// What was in it.
    pub record: ReadRecord,
    /// Where the place names the file.
    pub at: Location,
}

/// A daily series that the run is compared with; it may have gaps, as NaN, and may begin and end on other days.
#[derive(Clone, Debug, PartialEq)]
pub struct Series {
    /// First day of the series.
    pub first_date: NaiveDate,
    /// What was measured, which also says the unit of `values`: m³/s for flows, hm³ for storage, mm for snow.
    pub measure: Measure,
    /// One value a day; NaN where nothing was recorded.
    pub values: Vec<f64>,
}

/// What stands at a river gauge.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum GaugeMeasures {
    /// The river as it comes, above every diversion.
    Natural,
    /// Inflow computed from a reservoir's content and release.
    ComputedInflow,
    /// The river below diversions: shown beside the run, refused for fitting.
    BelowDiversions,
}

/// A river gauge with its record.
#[derive(Clone, Debug, PartialEq)]
pub struct Gauge {
    /// What it measures.
    pub measures: GaugeMeasures,
    /// Its record, m³/s.
    pub series: Series,
}

/// Reads `[record]`, the station's weather; with the height of the wind gauge, m.
pub(super) fn weather(root: &Section<'_>, source: Source<'_>) -> (Option<NamedRecord>, f64) {
    let section = root.section("record");
    section.tell_if_absent();
    let columns_section = section.section("columns");
    if section.present {
        columns_section.tell_if_absent();
    }
    let mut columns = Vec::new();
    let mut declared = 0;
    let mut wind_height_m = 2.0;
    for measure in WEATHER {
        let Some(value) = columns_section.get(measure.key()) else { continue };
        let column = columns_section.as_section(value, format!("{}.{}", columns_section.name, measure.key()));
        if measure == Measure::Wind {
            wind_height_m = column.number_or("height", super::unit_suffix::METRES, Limits(0.5, 200.0), 2.0).value;
        }
        declared += 1;
        columns.extend(column_plan(&column, measure));
    }
    let has = |measure: Measure| columns_section.peek(measure.key()).is_some();
    if columns_section.present {
        if !has(Measure::Precipitation) {
            columns_section.tell_missing("precipitation");
        }
        let extremes = has(Measure::TemperatureMin) && has(Measure::TemperatureMax);
        if !extremes && !has(Measure::TemperatureMean) {
            let lacking = if has(Measure::TemperatureMin) { "temperature_max" } else { "temperature_min" };
            columns_section.tell_missing(lacking);
        }
    }
    let all_readable = columns.len() == declared;
    // The record is looked through for its own mistakes even when it lacks a column that could not be read.
    (read(&section, source, columns).filter(|_| all_readable), wind_height_m)
}

/// Reads one comparison record: `file`, date and one `column` in `unit`.
pub(super) fn series(section: &Section<'_>, source: Source<'_>, measure: Measure) -> Option<(Series, NamedRecord)> {
    let column = column_plan(section, measure);
    let named = read(section, source, column.into_iter().collect())?;
    let values = named.record.columns.first()?.values.clone();
    Some((Series { first_date: named.record.first_date, measure, values }, named))
}

/// Reads `[gauge]`, if there is one.
pub(super) fn gauge(root: &Section<'_>, source: Source<'_>) -> Option<(Gauge, NamedRecord)> {
    let section = root.section("gauge");
    if !section.present {
        return None;
    }
    let kinds = [
        ("natural", GaugeMeasures::Natural),
        ("computed_inflow", GaugeMeasures::ComputedInflow),
        ("below_diversions", GaugeMeasures::BelowDiversions),
    ];
    if section.peek("measures").is_none() {
        section.tell_missing("measures");
    }
    let measures = section.choice("measures", &kinds).map(|(measures, _)| measures);
    let measure = match measures {
        Some(GaugeMeasures::ComputedInflow) => Measure::ComputedInflow,
        _ => Measure::Flow,
    };
    let (series, named) = series(&section, source, measure)?;
    Some((Gauge { measures: measures?, series }, named))
}

/// One column as the place declares it.
fn column_plan(section: &Section<'_>, measure: Measure) -> Option<ColumnPlan> {
    let name = section.need_text("column");
    let unit = unit(section, measure);
    let mut gaps = measure.default_gap_rule();
    let fills: Vec<(&'static str, GapFill)> = GapFill::ALL.into_iter().map(|fill| (fill.key(), fill)).collect();
    let usual_days = gaps.longest_days as f64;
    if let Some((how, _)) = section.choice("fill", &fills) {
        gaps = GapRule { how, longest_days: gaps.longest_days.max(2) };
    }
    if let Some(longest) = section.number("longest_gap", DAYS, Limits(0.0, 3660.0)) {
        gaps.longest_days = if longest.value.is_nan() { usual_days as usize } else { longest.value as usize };
    }
    let (name, at) = name?;
    Some(ColumnPlan { gaps, declared_at: Some(at), ..ColumnPlan::new(name, measure, unit?) })
}

fn unit(section: &Section<'_>, measure: Measure) -> Option<MeasureUnit> {
    let (word, at) = section.need_text("unit")?;
    let unit = MeasureUnit::from_key(word).filter(|unit| measure.accepts(*unit));
    if unit.is_none() {
        section.sheet.tell(unknown_choice(at, "unit", word, measure.units().iter().map(|unit| unit.key())));
    }
    unit
}

fn read(section: &Section<'_>, source: Source<'_>, columns: Vec<ColumnPlan>) -> Option<NamedRecord> {
    let encodings = [("utf-8", Encoding::Utf8), ("latin-1", Encoding::Latin1)];
    let encoding = section.choice("encoding", &encodings).map_or(Encoding::Utf8, |(encoding, _)| encoding);
    let delimiters = [(",", ','), (";", ';'), ("tab", '\t'), ("|", '|')];
    let delimiter = section.choice("delimiter", &delimiters).map(|(delimiter, _)| delimiter);
    let decimal_comma = section.flag_or("decimal_comma", false);
    let skip_lines = section.number_or("skip_lines", PLAIN, Limits(0.0, 1000.0), 0.0).value as usize;
    let missing = missing(section);
    let date = date(section);
    let (file, at) = section.need_text("file")?;
    let bytes = match source.record(file, &at) {
        Ok(bytes) => bytes,
        Err(problem) => {
            section.sheet.tell(problem);
            return None;
        }
    };
    // Without columns nothing in the file can be judged; that they are lacking was told.
    if columns.is_empty() {
        return None;
    }
    let plan = RecordPlan {
        encoding,
        delimiter,
        decimal_comma,
        skip_lines,
        missing,
        ..RecordPlan::new(source.shown(file), date?, columns)
    };
    let mut problems = Vec::new();
    let record = read_record(&plan, &bytes, &mut problems);
    problems.into_iter().for_each(|problem| section.sheet.tell(problem));
    Some(NamedRecord { file: file.to_owned(), record: record?, at })
}

/// Marks that stand for a missing value: texts, or numbers as they are written in the file.
fn missing(section: &Section<'_>) -> Vec<String> {
    let mut marks = Vec::new();
    for value in section.list("missing").unwrap_or_default() {
        match &value.kind {
            Kind::Text(text) => marks.push(text.clone()),
            Kind::Number(number) => marks.push(number.to_string()),
            _ => {
                section.sheet.tell(Problem::error(section.value_at(value), "problem-not-text").with("key", "missing"));
            }
        }
    }
    marks
}

/// Where the date of a row is: one column and the order in it, or two or three columns.
fn date(section: &Section<'_>) -> Option<DatePlan> {
    let value = section.get("date");
    let order = date_order(section);
    let Some(value) = value else {
        section.tell_missing("date");
        return None;
    };
    match &value.kind {
        Kind::Text(name) => Some(DatePlan::Column { name: name.clone(), order: order? }),
        Kind::Table(table) => date_parts(section, value, table),
        _ => {
            section.sheet.tell(Problem::error(section.value_at(value), "problem-not-text").with("key", "date"));
            None
        }
    }
}

fn date_parts(section: &Section<'_>, value: &Value, table: &Table) -> Option<DatePlan> {
    let parts = section.as_section(value, format!("{}.date", section.name));
    let (year, _) = parts.need_text("year")?;
    if table.get("day_of_year").is_some() {
        let (day_of_year, _) = parts.text("day_of_year")?;
        return Some(DatePlan::YearAndDay { year: year.to_owned(), day_of_year: day_of_year.to_owned() });
    }
    let (month, day) = (parts.need_text("month"), parts.need_text("day"));
    Some(DatePlan::Parts { year: year.to_owned(), month: month?.0.to_owned(), day: day?.0.to_owned() })
}

fn date_order(section: &Section<'_>) -> Option<DateOrder> {
    let Some((word, at)) = section.text("date_format") else {
        return section.peek("date_format").is_none().then_some(DateOrder::YearMonthDay);
    };
    let order = DateOrder::from_key(word);
    if order.is_none() {
        let keys = DateOrder::ALL.map(DateOrder::key);
        section.sheet.tell(
            Problem::error(at, "problem-choice")
                .with("key", "date_format")
                .with("value", word)
                .with("choices", keys.join(", "))
                .with("nearest", nearest(word, keys.iter().map(|key| (*key).to_owned()))),
        );
    }
    order
}
