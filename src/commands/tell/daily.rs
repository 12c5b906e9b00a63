//! The days of the years shown, for both runs.

use std::borrow::Cow;

use chrono::NaiveDate;

use super::node::Node;
use super::runs::{Run, Told};
use crate::place::Place;
use crate::signs::YearReport;
use crate::water::units::{M2_PER_KM2, M3_PER_HM3, SECONDS_PER_DAY};
use crate::water::works::{Evening, Works, WorksStores};

/// A column of every day.
pub(super) struct DayColumn {
    /// Its name, with the unit.
    pub key: &'static str,
    read: fn(&Works, &Evening) -> f64,
    /// Whether it is about a reservoir, and left out where there is none.
    of_lake: bool,
}

/// A column of every gate and day; the gate's key and `_` stand before it.
pub(in crate::commands) struct GateColumn {
    /// The end of its name, with the unit.
    pub key: &'static str,
    read: fn(&Evening, &WorksStores, usize) -> f64,
}

const fn day(key: &'static str, read: fn(&Works, &Evening) -> f64) -> DayColumn {
    DayColumn { key, read, of_lake: false }
}

const fn lake(key: &'static str, read: fn(&Works, &Evening) -> f64) -> DayColumn {
    DayColumn { key, read, of_lake: true }
}

/// What every day tells, in the order of the water's way.
pub(super) const EACH_DAY: [DayColumn; 23] = [
    day("precipitation_mm", |_, evening| evening.basin.precipitation_mm),
    day("snowfall_mm", |_, evening| evening.basin.snowfall_mm),
    day("snow_water_mm", |_, evening| evening.basin.snow_water_mm),
    day("soil_mm", |_, evening| evening.basin.soil_mm),
    day("ground_mm", |_, evening| evening.basin.ground_mm),
    day("channel_mm", |_, evening| evening.basin.channel_mm),
    day("evaporation_mm", |_, evening| evening.basin.evaporation_mm),
    day("sublimation_mm", |_, evening| evening.basin.sublimation_mm),
    day("reference_evaporation_mm", |_, evening| evening.basin.reference_evaporation_mm),
    day("inflow_m3s", |_, evening| flow_m3s(evening.basin.inflow_m3)),
    lake("storage_hm3", |_, evening| evening.content_m3 / M3_PER_HM3),
    lake("lake_level_m", |works, evening| {
        works.vessel().map_or(f64::NAN, |vessel| vessel.level_m(vessel.dead_m3 + evening.content_m3))
    }),
    lake("lake_area_km2", |_, evening| evening.lake_area_m2 / M2_PER_KM2),
    lake("lake_rain_m3", |_, evening| evening.lake_rain_m3),
    lake("lake_evaporation_m3", |_, evening| evening.river.evaporation_m3),
    lake("storage_set_m3", |_, evening| evening.set_storage_m3),
    lake("flood_release_m3s", |_, evening| flow_m3s(evening.river.flood_release_m3)),
    lake("spill_m3s", |_, evening| flow_m3s(evening.spill_m3)),
    day("dam_outflow_m3s", |_, evening| flow_m3s(evening.river.dam_outflow_m3)),
    day("return_flow_m3s", |_, evening| flow_m3s(evening.river.return_flow_total_m3)),
    day("river_minimum_m3s", |_, evening| flow_m3s(evening.minimum_m3)),
    day("river_minimum_met", |_, evening| f64::from(u8::from(evening.river.minimum_met))),
    day("river_out_m3s", |_, evening| flow_m3s(evening.river.river_out_m3)),
];

/// What every gate tells.
pub(in crate::commands) const EACH_GATE: [GateColumn; 5] = [
    GateColumn { key: "demand_m3s", read: |evening, _, gate| flow_m3s(evening.demand_m3[gate]) },
    GateColumn { key: "delivered_m3s", read: |evening, _, gate| flow_m3s(evening.river.canal_m3[gate]) },
    GateColumn { key: "stored_m3s", read: |evening, _, gate| flow_m3s(evening.river.stored_take_m3[gate]) },
    GateColumn { key: "crop_evaporation_m3", read: |evening, _, gate| evening.fields[gate].crop_evaporation_m3 },
    GateColumn { key: "account_hm3", read: |_, stores, gate| stores.river.account_m3[gate] / M3_PER_HM3 },
];

fn flow_m3s(volume_m3: f64) -> f64 {
    volume_m3 / SECONDS_PER_DAY
}

/// The columns that a place has.
pub(in crate::commands) struct DailyColumns {
    lake: bool,
    gates: usize,
}

impl DailyColumns {
    /// Those of `place`.
    pub fn of(place: &Place) -> Self {
        Self { lake: place.valley.reservoir.is_some(), gates: place.valley.gates.len() }
    }

    fn of_day(&self) -> impl Iterator<Item = &'static DayColumn> + use<> {
        let lake = self.lake;
        EACH_DAY.iter().filter(move |column| lake || !column.of_lake)
    }
}

/// The days of a run, column by column.
#[derive(Clone)]
pub(in crate::commands) struct Days {
    start_month: u8,
    lake: bool,
    gates: usize,
    dates: Vec<NaiveDate>,
    water_years: Vec<i32>,
    /// Day by day, each as wide as the columns.
    values: Vec<f64>,
}

impl Days {
    /// No day yet.
    pub fn new(columns: &DailyColumns, place: &Place) -> Self {
        Self {
            start_month: place.valley.water_year_start_month,
            lake: columns.lake,
            gates: columns.gates,
            dates: Vec::new(),
            water_years: Vec::new(),
            values: Vec::new(),
        }
    }

    fn columns(&self) -> DailyColumns {
        DailyColumns { lake: self.lake, gates: self.gates }
    }

    fn width(&self) -> usize {
        self.columns().of_day().count() + self.gates * EACH_GATE.len()
    }

    /// Enters an evening.
    pub fn enter(&mut self, works: &Works, evening: &Evening, stores: &WorksStores) {
        self.dates.push(evening.today.date(self.start_month));
        self.water_years.push(evening.today.water_year);
        let columns = self.columns();
        self.values.extend(columns.of_day().map(|column| (column.read)(works, evening)));
        for gate in 0..self.gates {
            self.values.extend(EACH_GATE.iter().map(|column| (column.read)(evening, stores, gate)));
        }
    }

    /// Only the days of these years.
    pub fn keep(self, years: &[YearReport]) -> Days {
        let width = self.width();
        let mut kept = Days { dates: Vec::new(), water_years: Vec::new(), values: Vec::new(), ..self };
        for year in years {
            let days = year.year.first..year.year.first + year.year.days;
            kept.dates.extend(self.dates.get(days.clone()).unwrap_or_default());
            kept.water_years.extend(self.water_years.get(days.clone()).unwrap_or_default());
            kept.values.extend(self.values.get(days.start * width..days.end * width).unwrap_or_default());
        }
        kept
    }

    /// The days.
    pub fn dates(&self) -> &[NaiveDate] {
        &self.dates
    }

    /// The water year of each day.
    pub fn water_years(&self) -> &[i32] {
        &self.water_years
    }

    /// The names of the valley's columns, which come first.
    pub fn day_keys(&self) -> Vec<&'static str> {
        self.columns().of_day().map(|column| column.key).collect()
    }

    /// The place of a gate's column, counted from 0.
    pub fn gate_column(&self, gate: usize, index: usize) -> usize {
        self.columns().of_day().count() + gate * EACH_GATE.len() + index
    }

    /// A column, day by day.
    pub fn column(&self, index: usize) -> Vec<f64> {
        self.values.iter().skip(index).step_by(self.width().max(1)).copied().collect()
    }

    fn names(&self, place: &Place) -> Vec<Cow<'static, str>> {
        let mut names: Vec<Cow<'static, str>> = self.columns().of_day().map(|column| column.key.into()).collect();
        for gate in &place.gates {
            names.extend(EACH_GATE.iter().map(|column| Cow::Owned(format!("{}_{}", gate.key, column.key))));
        }
        names
    }

    /// Every column as a list, beginning with the dates.
    pub(super) fn node(&self, place: &Place) -> Node {
        let width = self.width();
        let dates = self.dates.iter().map(|date| Node::from(date.to_string())).collect();
        let mut columns: Vec<(Cow<'static, str>, Node)> = vec![("date".into(), Node::List(dates))];
        for (index, name) in self.names(place).into_iter().enumerate() {
            let values = self.values.iter().skip(index).step_by(width.max(1)).map(|value| Node::Number(*value));
            columns.push((name, Node::List(values.collect())));
        }
        Node::Table(columns)
    }
}

/// Every day of both runs as CSV, one row a day and run.
pub(super) fn write_csv(told: &Told) -> String {
    let mut text = String::new();
    let names = told.as_it_was.days.as_ref().map(|days| days.names(&told.place)).unwrap_or_default();
    text.push_str("run,date,water_year");
    for name in names {
        text.push(',');
        text.push_str(&name);
    }
    text.push('\n');
    for (run, days) in [("as_it_was", &told.as_it_was), ("with_changes", &told.with_changes)] {
        rows(run, days, &mut text);
    }
    text
}

fn rows(name: &str, run: &Run, text: &mut String) {
    let Some(days) = &run.days else { return };
    let width = days.width();
    for (index, (date, water_year)) in days.dates.iter().zip(&days.water_years).enumerate() {
        text.push_str(&format!("{name},{date},{water_year}"));
        for value in &days.values[index * width..(index + 1) * width] {
            text.push(',');
            text.push_str(&number(*value));
        }
        text.push('\n');
    }
}

/// A number in the fewest digits that give it back; empty where there is none.
pub(in crate::commands) fn number(value: f64) -> String {
    if !value.is_finite() {
        String::new()
    } else if value != 0.0 && (value.abs() < 1e-5 || value.abs() >= 1e16) {
        // Spreadsheets read this too, and a row of zeros nobody reads.
        format!("{value:e}")
    } else {
        value.to_string()
    }
}

#[cfg(test)]
mod tests {
    use super::number;

    #[test]
    fn numbers_come_back_bit_for_bit() {
        for value in [0.0, 0.1 + 0.2, -1.5e-17, 123_456_789.123, 1e22, f64::MIN_POSITIVE] {
            assert_eq!(number(value).parse::<f64>().unwrap().to_bits(), value.to_bits());
        }
        assert_eq!(number(f64::NAN), "");
    }
}
