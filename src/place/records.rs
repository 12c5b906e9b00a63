//! The daily records that a place names: how each is to be read, and its days beside those of the weather.

use chrono::NaiveDate;

use super::problem::Location;
use super::record::{ColumnPlan, GapFill, GapRule, Measure, MeasureUnit, ReadRecord};
use super::record_file::read;
use super::section::{Limits, Section, unknown_choice};
use super::source::Source;
use super::unit_suffix::DAYS;

/// Columns of the weather record.
pub(super) const WEATHER: [Measure; 13] = [
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
    let WeatherColumns { columns, all_readable, wind_height_m } = weather_columns(&section);
    // The record is looked through for its own mistakes even when it lacks a column that could not be read.
    (read(&section, source, columns).filter(|_| all_readable), wind_height_m)
}

/// What `[record.columns]` says.
pub(super) struct WeatherColumns {
    /// Every column that could be read.
    pub columns: Vec<ColumnPlan>,
    /// Whether that is all of them.
    all_readable: bool,
    wind_height_m: f64,
}

/// Reads `[record.columns]`.
pub(super) fn weather_columns(section: &Section<'_>) -> WeatherColumns {
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
    WeatherColumns { columns, all_readable, wind_height_m }
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
pub(super) fn column_plan(section: &Section<'_>, measure: Measure) -> Option<ColumnPlan> {
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
