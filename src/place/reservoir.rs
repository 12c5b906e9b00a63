//! The reservoir and the water that must stay in the river.

use heapless::Vec as FixedVec;

use super::bands::{ELEVATION, rising};
use super::dated::{month_day, priority};
use super::gates::FLOW;
use super::problem::{Location, Problem};
use super::section::{Limits, Number, Section};
use super::small_table::SmallTable;
use super::source::Source;
use super::unit_suffix::{AREA_KM2, FLOW_M3S, METRES, PLAIN, Units, VOLUME_HM3};
use crate::water::calendar::MonthDay;
use crate::water::canals::{MinimumPlace, PriorityDate};
use crate::water::valley::{Hedging, LakePoint, MOST_LAKE_POINTS, MOST_RULE_POINTS, Reservoir, RiverMinimum};

/// Volumes in store, hm³.
const VOLUME: Limits = Limits(0.0, 200_000.0);

/// Surfaces of the lake, km².
const AREA: Limits = Limits(0.0, 100_000.0);

/// What is read of the reservoir, with the places that later checks point at.
pub(super) struct ReadReservoir {
    /// The reservoir.
    pub reservoir: Reservoir,
    /// Where the outlet's capacity stands.
    pub outlet: Number,
    /// Where its table stands.
    pub table_at: Location,
}

/// Reads `[reservoir]`, if there is one.
pub(super) fn read(root: &Section<'_>, source: Source<'_>) -> Option<ReadReservoir> {
    let section = root.section("reservoir");
    if !section.present {
        return None;
    }
    let table_section = section.section("table");
    let table = table(&table_section, source);
    let dead = section.number_or("dead", VOLUME_HM3, VOLUME, 0.0);
    let capacity = section.need_number("capacity", VOLUME_HM3, Limits(0.000_001, VOLUME.1));
    if capacity.value <= dead.value {
        section.sheet.tell(
            Problem::error(capacity.at.clone(), "problem-capacity-below-dead")
                .with("capacity", capacity.value)
                .with("dead", dead.value),
        );
    }
    if let (Some(first), Some(last)) = (table.first(), table.last()) {
        // A digit lost in rounding between two units is no mistake.
        if capacity.value > last.volume_hm3 * (1.0 + 1e-9) {
            let problem = Problem::error(capacity.at.clone(), "problem-capacity-above-table");
            section.sheet.tell(problem.with("capacity", capacity.value).with("top", last.volume_hm3));
        }
        if dead.value < first.volume_hm3 * (1.0 - 1e-9) {
            let problem = Problem::error(dead.at.clone(), "problem-dead-below-table");
            section.sheet.tell(problem.with("dead", dead.value).with("bottom", first.volume_hm3));
        }
    }
    let outlet = section.need_number("outlet", FLOW_M3S, FLOW);
    let right = priority(&section, "right");
    if right.is_none() && section.peek("right").is_none() {
        section.tell_missing("right");
    }
    let active = capacity.value - dead.value;
    let flood_space = dated(&section, "flood_space", "date", "space", VOLUME_HM3, VOLUME);
    if let Some((_, space, at)) = flood_space.iter().find(|(_, space, _)| active > 0.0 && *space > active) {
        let problem = Problem::error(at.clone(), "problem-flood-space");
        section.sheet.tell(problem.with("space", *space).with("active", active));
    }
    let reservoir = Reservoir {
        table,
        dead_hm3: dead.value,
        capacity_hm3: capacity.value,
        outlet_m3s: outlet.value,
        right_date: right.map_or(PriorityDate::BeforeAll, |(right, _)| right),
        flood_space: flood_space.into_iter().map(|(day, space, _)| (day, space)).take(MOST_RULE_POINTS).collect(),
        serves_minimum: section.flag_or("serves_minimum", true),
        hedging: hedging(&section.section("hedging")),
    };
    Some(ReadReservoir { reservoir, outlet, table_at: table_section.at.clone() })
}

/// The level–area–volume table: three lists of one length, here or in a file.
fn table(section: &Section<'_>, source: Source<'_>) -> FixedVec<LakePoint, MOST_LAKE_POINTS> {
    section.tell_if_absent();
    if !section.present {
        return FixedVec::new();
    }
    let (levels, areas, volumes) = match section.text("file") {
        Some((file, at)) => match from_file(section, source, file, &at) {
            (Some(levels), Some(areas), Some(volumes)) => (Some(levels), Some(areas), Some(volumes)),
            // What the file lacks was told there.
            _ => return FixedVec::new(),
        },
        None => (
            section.numbers("level", METRES, ELEVATION),
            section.numbers("area", AREA_KM2, AREA),
            section.numbers("volume", VOLUME_HM3, VOLUME),
        ),
    };
    let level = rising(section, levels, &section.as_written("level", METRES));
    let volume = rising(section, volumes, &section.as_written("volume", VOLUME_HM3));
    if areas.is_none() {
        section.tell_missing("area_km2");
    }
    let area_count = areas.as_ref().map_or(level.len(), Vec::len);
    let areas = areas.unwrap_or_default();
    if let Some(pair) = areas.windows(2).find(|pair| pair[1].value < pair[0].value) {
        section.sheet.tell(
            Problem::error(pair[1].at.clone(), "problem-lake-shrinks")
                .with("value", pair[1].value)
                .with("before", pair[0].value),
        );
    }
    // A list of levels or volumes that is too short by itself was told as that.
    let volume_count = if volume.len() < 2 { level.len() } else { volume.len() };
    for (base, units, found) in [("volume", VOLUME_HM3, volume_count), ("area", AREA_KM2, area_count)] {
        if found != level.len() && level.len() > 1 {
            let problem = Problem::error(section.at.clone(), "problem-list-length");
            let problem = problem.with("key", section.as_written(base, units));
            section.sheet.tell(problem.with("found", found).with("wanted", level.len()));
        }
    }
    if level.len() > MOST_LAKE_POINTS {
        let problem = Problem::error(section.at.clone(), "problem-too-many-points");
        section.sheet.tell(problem.with("found", level.len()).with("most", MOST_LAKE_POINTS));
    }
    warn_of_units(section, &level, &areas, &volume);
    let points = level.iter().zip(&areas).zip(&volume);
    points
        .take(MOST_LAKE_POINTS)
        .map(|((&level_m, area), &volume_hm3)| LakePoint { level_m, area_km2: area.value, volume_hm3 })
        .collect()
}

type Columns = (Option<Vec<Number>>, Option<Vec<Number>>, Option<Vec<Number>>);

fn from_file(section: &Section<'_>, source: Source<'_>, file: &str, at: &Location) -> Columns {
    let mut problems = Vec::new();
    let columns = match source.table_text(file, at) {
        Ok(text) => {
            let table = SmallTable::parse(source.shown(file), &text, &mut problems);
            table.tell_unknown(&[], &[("level", METRES), ("area", AREA_KM2), ("volume", VOLUME_HM3)], &mut problems);
            (
                table.numbers("level", METRES, ELEVATION, &mut problems),
                table.numbers("area", AREA_KM2, AREA, &mut problems),
                table.numbers("volume", VOLUME_HM3, VOLUME, &mut problems),
            )
        }
        Err(problem) => {
            problems.push(problem);
            (None, None, None)
        }
    };
    problems.into_iter().for_each(|problem| section.sheet.tell(problem));
    columns
}

/// The volume between two levels lies between height times the smaller and the larger surface. A table far outside of
/// that mixes units somewhere.
fn warn_of_units(section: &Section<'_>, level: &[f64], areas: &[Number], volume: &[f64]) {
    let count = level.len().min(areas.len()).min(volume.len());
    if count < 2 {
        return;
    }
    // 1 m over 1 km² is 1 hm³.
    let expected: f64 = (1..count)
        .map(|point| (level[point] - level[point - 1]) * (areas[point].value + areas[point - 1].value) / 2.0)
        .sum();
    let stated = volume[count - 1] - volume[0];
    if stated > 2.5 * expected || stated < expected / 2.5 {
        let problem = Problem::warning(section.at.clone(), "problem-table-units");
        section.sheet.tell(problem.with("stated", stated).with("expected", expected));
    }
}

/// Dated values of a yearly rule, in order of their dates.
fn dated(
    section: &Section<'_>,
    key: &'static str,
    date_key: &'static str,
    base: &'static str,
    units: Units,
    limits: Limits,
) -> Vec<(MonthDay, f64, Location)> {
    let mut points: Vec<(MonthDay, f64, Location)> = Vec::new();
    for (index, value) in section.list(key).unwrap_or_default().iter().enumerate() {
        let point = section.as_section(value, format!("{}.{key}", section.name));
        if index == MOST_RULE_POINTS {
            let problem = Problem::error(point.at.clone(), "problem-too-many-dates").with("key", key);
            section.sheet.tell(problem.with("most", MOST_RULE_POINTS));
        }
        let amount = point.need_number(base, units, limits);
        let Some(day) = point.get(date_key) else {
            point.tell_missing(date_key);
            continue;
        };
        let Some(day) = month_day(&point, date_key, day) else { continue };
        if points.iter().any(|(known, ..)| *known == day) {
            section.sheet.tell(Problem::error(point.at.clone(), "problem-date-twice").with("key", key));
        }
        points.push((day, amount.value, amount.at));
    }
    // People start such a list in any month; the water wants it from January.
    points.sort_by_key(|(day, ..)| *day);
    points
}

fn hedging(section: &Section<'_>) -> Option<Hedging> {
    section.present.then(|| Hedging {
        days_ahead: section.number_or("days_ahead", PLAIN, Limits(1.0, 366.0), 30.0).value,
        ends_at: section.number_or("ends_at", PLAIN, Limits(1.0, 20.0), 2.0).value,
        starts_at: section.number_or("starts_at", PLAIN, Limits(0.0, 1.0), 0.5).value,
    })
}

/// The river minimum, with where its largest rate stands.
pub(super) struct ReadMinimum {
    /// The minimum.
    pub minimum: RiverMinimum,
    /// Its largest rate, if there is any.
    pub largest: Option<(f64, Location)>,
}

/// Reads `[river_minimum]`: one rate for the whole year, or dated ones.
pub(super) fn minimum(root: &Section<'_>) -> ReadMinimum {
    let section = root.section("river_minimum");
    let places = [("river_end", MinimumPlace::RiverEnd), ("dam", MinimumPlace::Dam)];
    let at = section.choice("at", &places).map_or(MinimumPlace::RiverEnd, |(place, _)| place);
    let right_date = priority(&section, "right").map_or(PriorityDate::BeforeAll, |(right, _)| right);
    let steady = section.number("rate", FLOW_M3S, FLOW);
    let dated = dated(&section, "rates", "from", "rate", FLOW_M3S, FLOW);
    let new_year = MonthDay { month: 1, day: 1 };
    let rates = match steady {
        Some(rate) if dated.is_empty() => vec![(new_year, rate.value, rate.at)],
        Some(rate) => {
            section.sheet.tell(Problem::error(rate.at, "problem-minimum-twice"));
            Vec::new()
        }
        None => {
            if dated.is_empty() && section.peek("rates").is_none() {
                section.tell_missing("rate_m3s");
            }
            dated
        }
    };
    let largest = rates.iter().max_by(|a, b| a.1.total_cmp(&b.1)).map(|(_, rate, at)| (*rate, at.clone()));
    let rate_m3s = rates.into_iter().map(|(day, rate, _)| (day, rate)).take(MOST_RULE_POINTS).collect();
    ReadMinimum { minimum: RiverMinimum { at, right_date, rate_m3s }, largest }
}
