//! Whether the parts of a place fit together: what is right by itself and wrong beside the rest.
//!
//! A value that was wrong by itself is NaN here and makes every comparison false, so that it is told once only.

use super::bands::ReadBands;
use super::dated::season_days;
use super::gates::{ReadGate, SHORTEST_SEASON};
use super::problem::{Location, Problem};
use super::record::{Measure, ReadRecord};
use super::reservoir::{ReadMinimum, ReadReservoir};
use super::section::{Number, Section};
use crate::water::calendar::{CalendarDay, MonthDay, Season};
use crate::water::canals::SharingRule;
use crate::water::lake::Vessel;
use crate::water::units::{M2_PER_HECTARE, M2_PER_KM2, M3_PER_HM3, M3_PER_MM_HECTARE, SECONDS_PER_DAY};
use crate::water::valley::{Climb, Field, Purpose, Reservoir};

/// Feet in a metre, nearly: two heights in this relation were written in two units.
const FEET_LIKE: std::ops::RangeInclusive<f64> = 2.9..=3.7;
/// More water than any field takes on its hottest day, mm/day (common practice, no source).
const GREATEST_NEED_MM_DAY: f64 = 12.0;

/// Largest surface of the lake, at capacity, km²; NaN where the reservoir could not be read.
pub(super) fn largest_lake_km2(reservoir: &Reservoir) -> f64 {
    if reservoir.table.len() < 2 || reservoir.capacity_hm3.is_nan() || reservoir.capacity_hm3 <= reservoir.dead_hm3 {
        return f64::NAN;
    }
    Vessel::new(reservoir, 0.0).area_m2(reservoir.capacity_hm3 * M3_PER_HM3) / M2_PER_KM2
}

/// Bands, lake and fields beside the stated area of the whole valley.
pub(super) fn areas(root: &Section<'_>, stated: Option<&Number>, bands: &ReadBands, lake_km2: f64, fields_km2: f64) {
    let Some(stated) = stated else { return };
    // Bands beyond those that fit were told, and their area is not among the others.
    if bands.bands.is_empty() || bands.too_many || root.sheet.is_broken() {
        return;
    }
    let bands_km2: f64 = bands.bands.iter().map(|band| band.area_km2).sum();
    let found = bands_km2 + lake_km2 + fields_km2;
    // Half a hundredth covers the rounding of areas read off a map.
    if (found - stated.value).abs() > 0.005 * stated.value {
        root.sheet.tell(
            Problem::error(stated.at.clone(), "problem-areas")
                .with("stated", stated.value)
                .with("found", found)
                .with("bands", bands_km2)
                .with("lake", lake_km2)
                .with("fields", fields_km2),
        );
    }
}

/// The station's height beside the land's, and what the weather's change with height makes of both ends.
pub(super) fn station(root: &Section<'_>, station: &Number, bands: &ReadBands, climb: &Climb, gradient: &Number) {
    let (Some(lowest), Some(highest)) = (bands.bands.first(), bands.bands.last()) else { return };
    let half_step = match bands.bands.len() {
        0 | 1 => 300.0,
        count => (highest.elevation_m - bands.bands[count - 2].elevation_m).abs().max(200.0) / 2.0,
    };
    let middle = (lowest.elevation_m + highest.elevation_m) / 2.0;
    let top = highest.elevation_m + half_step;
    let problem = if station.value > top && FEET_LIKE.contains(&(station.value / middle)) {
        Some(Problem::error(station.at.clone(), "problem-station-feet"))
    } else if station.value > top {
        Some(Problem::error(station.at.clone(), "problem-station-above"))
    } else if lowest.elevation_m - station.value > 3_000.0 {
        Some(Problem::error(station.at.clone(), "problem-station-far-below"))
    } else if lowest.elevation_m - station.value > 1_500.0 {
        Some(Problem::warning(station.at.clone(), "problem-station-far-below"))
    } else {
        None
    };
    if let Some(problem) = problem {
        root.sheet.tell(
            problem
                .with("station", station.value)
                .with("lowest", lowest.elevation_m)
                .with("highest", highest.elevation_m),
        );
        return;
    }
    for band in [lowest, highest] {
        let factor = 1.0 + climb.precipitation_per_100m * (band.elevation_m - station.value) / 100.0;
        if factor <= 0.0 || factor > 6.0 {
            let problem = Problem::error(gradient.at.clone(), "problem-gradient");
            root.sheet.tell(problem.with("elevation", band.elevation_m).with("factor", factor));
            return;
        }
    }
}

/// Whether the record's warm half-year is that of the latitude; what the record says is believed.
pub(super) fn is_southern(
    root: &Section<'_>,
    latitude: &Number,
    calendar: &[CalendarDay],
    record: Option<&ReadRecord>,
) -> bool {
    let stated = latitude.value < 0.0;
    let column = |measure| record.and_then(|record| record.column(measure)).map(|column| column.values.as_slice());
    let (low, high) = (column(Measure::TemperatureMin), column(Measure::TemperatureMax));
    let (Some(low), Some(high)) = (low.or(column(Measure::TemperatureMean)), high.or(column(Measure::TemperatureMean)))
    else {
        return stated;
    };
    let mean = |months: [u8; 3]| {
        let days = calendar.iter().zip(low.iter().zip(high)).filter(|(day, _)| months.contains(&day.month_day.month));
        let (sum, count) = days.fold((0.0, 0usize), |(sum, count), (_, (low, high))| (sum + low + high, count + 1));
        if count < 60 { f64::NAN } else { sum / (2 * count) as f64 }
    };
    let (june, december) = (mean([6, 7, 8]), mean([12, 1, 2]));
    if latitude.value.is_nan() {
        return june < december;
    }
    // Near the equator seasons say little; elsewhere three degrees leave no doubt.
    if (june - december) * latitude.value.signum() < -3.0 {
        root.sheet.tell(
            Problem::error(latitude.at.clone(), "problem-latitude-sign")
                .with("value", latitude.value)
                .with("june", june)
                .with("december", december),
        );
        return !stated;
    }
    stated
}

/// Gates beside each other, the reservoir and the rule.
pub(super) fn gates(
    root: &Section<'_>,
    gates: &[ReadGate],
    reservoir: Option<&ReadReservoir>,
    rule: SharingRule,
    southern: bool,
) {
    let mut shares = 0.0;
    let mut told = false;
    for gate in gates {
        shares += gate.storage.value;
        // No more than the rounding of a few decimal shares, as the river's accounts have it.
        if shares > 1.0 + 1e-12 && !told {
            told = true;
            let problem = Problem::error(gate.storage.at.clone(), "problem-storage-shares");
            root.sheet.tell(problem.with("total", shares * 100.0));
        }
        if gate.storage.value > 0.0 && reservoir.is_none() {
            let problem = Problem::warning(gate.storage.at.clone(), "problem-share-without-reservoir");
            root.sheet.tell(problem.with("key", gate.names.key.clone()));
        }
        right(root, gate);
        limit(root, gate);
        if let Some((season, at)) = &gate.season
            && matches!(gate.gate.purpose, Purpose::Fields(_))
        {
            opening(root, gate, *season, at, southern);
        }
    }
    if rule == SharingRule::Rotation
        && let Some(first) = gates.first()
        && gates.iter().all(|gate| gate.turn.value == 0.0)
    {
        root.sheet.tell(Problem::error(first.at.clone(), "problem-no-turns"));
    }
}

/// The right's rate beside the canal, and the canal beside its fields.
fn right(root: &Section<'_>, gate: &ReadGate) {
    let (decreed, capacity) = (gate.decreed.value, gate.capacity.value);
    let key = gate.names.key.clone();
    let times = decreed / capacity;
    if decreed.is_finite() && times >= 20.0 {
        root.sheet.tell(
            Problem::error(gate.decreed.at.clone(), "problem-right-too-large")
                .with("key", key)
                .with("rate", decreed)
                .with("capacity", capacity)
                .with("times", times),
        );
        return;
    }
    if decreed.is_finite() && times > 2.0 {
        let problem = Problem::warning(gate.decreed.at.clone(), "problem-right-above-canal");
        root.sheet.tell(problem.with("key", key.clone()).with("rate", decreed).with("capacity", capacity));
    }
    let need_m3s = greatest_need_m3s(gate);
    let problem = if capacity > 100.0 * need_m3s {
        Problem::error(gate.capacity.at.clone(), "problem-canal-far-too-large")
    } else if capacity > 10.0 * need_m3s {
        Problem::warning(gate.capacity.at.clone(), "problem-canal-large")
    } else if capacity < need_m3s / 5.0 {
        Problem::warning(gate.capacity.at.clone(), "problem-canal-small")
    } else {
        return;
    };
    root.sheet.tell(problem.with("key", key).with("capacity", capacity).with("need", need_m3s));
}

/// What the gate's fields or town need at the head gate on the hottest day, m³/s; NaN where that is not known.
fn greatest_need_m3s(gate: &ReadGate) -> f64 {
    let at_field_m3: f64 = match &gate.gate.purpose {
        Purpose::Town(town) => town.daily_m3 + town.summer_more_m3,
        Purpose::Fields(_) => {
            let need = |field: &Field| field.area_ha * M3_PER_MM_HECTARE * GREATEST_NEED_MM_DAY / field.efficiency;
            gate.fields.iter().map(|read| &read.field).filter(|field| field.crop.watered).map(need).sum()
        }
    };
    let need = at_field_m3 / (1.0 - gate.gate.conveyance_loss_share) / SECONDS_PER_DAY;
    if need > 0.0 { need } else { f64::NAN }
}

/// A season over New Year is legal; one that leaves out the whole of summer is most likely written the wrong way round.
fn opening(root: &Section<'_>, gate: &ReadGate, season: Season, at: &Location, southern: bool) {
    if season_days(season) < SHORTEST_SEASON {
        return;
    }
    let over_new_year = season.from > season.to;
    let midsummer = MonthDay { month: if southern { 1 } else { 7 }, day: 15 };
    let (from, to) = (written(season.from), written(season.to));
    let problem = match gate.over_new_year {
        Some(false) if over_new_year => Problem::error(at.clone(), "problem-season-backwards"),
        None if over_new_year && !season.holds(midsummer) => Problem::error(at.clone(), "problem-season-backwards"),
        _ if !over_new_year && !season.holds(midsummer) => Problem::warning(at.clone(), "problem-season-winter"),
        _ => return,
    };
    root.sheet.tell(problem.with("key", gate.names.key.clone()).with("opens", from).with("closes", to));
}

fn written(day: MonthDay) -> String {
    format!("{:02}-{:02}", day.month, day.day)
}

/// The outlet beside the river minimum.
pub(super) fn outlet(root: &Section<'_>, reservoir: Option<&ReadReservoir>, minimum: &ReadMinimum) {
    let (Some(reservoir), Some((rate, at))) = (reservoir, &minimum.largest) else { return };
    if reservoir.outlet.value < *rate {
        let problem = Problem::warning(at.clone(), "problem-minimum-above-outlet");
        root.sheet.tell(problem.with("rate", *rate).with("outlet", reservoir.outlet.value));
    }
}

/// The full lake beside the highest land: above it, one of the two heights is in another unit.
pub(super) fn lake_level(root: &Section<'_>, reservoir: Option<&ReadReservoir>, bands: &ReadBands) {
    let (Some(read), Some(highest)) = (reservoir, bands.bands.last()) else { return };
    let capacity_m3 = read.reservoir.capacity_hm3 * M3_PER_HM3;
    let level_m = Vessel::new(&read.reservoir, 0.0).level_m(capacity_m3);
    if level_m > highest.elevation_m {
        let problem = Problem::error(read.table_at.clone(), "problem-lake-above-land");
        root.sheet.tell(problem.with("level", level_m).with("highest", highest.elevation_m));
    }
}

/// A yearly limit far beyond what the canal can reach in its whole season changes nothing; mostly its unit is another.
fn limit(root: &Section<'_>, gate: &ReadGate) {
    let season = gate.season.as_ref().map_or(Season::ALL_YEAR, |(season, _)| *season);
    let most_hm3 = gate.capacity.value * SECONDS_PER_DAY * f64::from(season_days(season)) / M3_PER_HM3;
    if let Some(limit) = &gate.yearly_limit
        && limit.value > 5.0 * most_hm3
        && season_days(season) >= SHORTEST_SEASON
    {
        let problem = Problem::warning(limit.at.clone(), "problem-limit-idle").with("key", gate.names.key.clone());
        root.sheet.tell(problem.with("limit", limit.value).with("most", most_hm3));
    }
}

/// Irrigated area of a valley, km².
pub(super) fn fields_km2(gates: &[ReadGate]) -> f64 {
    let areas = gates.iter().flat_map(|gate| &gate.fields).map(|read| read.field.area_ha);
    // An empty `sum` is −0, which people would read as a minus sign.
    areas.fold(0.0, |sum, area| sum + area) * M2_PER_HECTARE / M2_PER_KM2
}
