//! Keeps what the pages show of one water year, evening by evening, in the units that they speak.

use super::scene::{CanalShown, CanalTitle, ReservoirShown};
use crate::picture::chart::DayMark;
use crate::water::units::{M2_PER_KM2, M3_PER_HM3, SECONDS_PER_DAY};
use crate::water::valley::Valley;
use crate::water::works::Evening;

/// A day counts as full from this share of what it asked for, as in the signs.
const FULL_SHARE: f64 = 0.995;
/// A day counts as cut below this share, as in the signs.
const CUT_SHARE: f64 = 0.05;
/// How far back the fields remember whether their crops were short, days.
const CROP_DAYS: usize = 7;
/// Snow water over which the ground counts as white, mm, as in the signs.
const WHITE_MM: f64 = 5.0;

/// The gates of a valley in order of right, the oldest first; of equal rights the one further upstream first.
pub fn order_of_right(valley: &Valley) -> Vec<usize> {
    let mut order: Vec<usize> = (0..valley.gates.len()).collect();
    order.sort_by_key(|&gate| valley.gates[gate].right_date);
    order
}

/// Titles in order of right; names are given in downstream order.
pub fn titles<'n>(valley: &Valley, names: &[&'n str]) -> Vec<CanalTitle<'n>> {
    let title = |gate: usize| CanalTitle {
        name: names.get(gate).copied().unwrap_or_default(),
        right_year: valley.gates[gate].right_date.right_year(),
        is_town: valley.gates[gate].is_town(),
        gate,
    };
    order_of_right(valley).into_iter().map(title).collect()
}

/// The height above which the ground is white, m: the foot of the lowest band above which all are white, half-way to
/// its lower neighbour. `None` where the highest band is bare.
pub fn snow_line_m(valley: &Valley, band_snow_mm: &[f64]) -> Option<f64> {
    let white = |band: &usize| band_snow_mm.get(*band).is_some_and(|&snow| snow > WHITE_MM);
    let lowest = (0..valley.bands.len()).rev().take_while(white).last()?;
    let height = |band: usize| valley.bands[band].elevation_m;
    let half_step = |low: usize, high: usize| (height(high) - height(low)) / 2.0;
    Some(match lowest {
        0 if valley.bands.len() > 1 => height(0) - half_step(0, 1),
        0 => height(0),
        band => height(band) - half_step(band - 1, band),
    })
}

/// One canal's days.
#[derive(Clone, Debug, Default)]
struct CanalLog {
    marks: Vec<DayMark>,
    delivered_m3s: Vec<f64>,
    demand_m3s: Vec<f64>,
    crop_used_m3: Vec<f64>,
    crop_need_m3: Vec<f64>,
    crop_water_met: Vec<f64>,
    open: OpenSpan,
}

/// Days that are judged together and not judged yet: one day, or a round of turns.
#[derive(Clone, Debug, Default)]
struct OpenSpan {
    days: Vec<usize>,
    delivered_m3: f64,
    delivered_before_today_m3: f64,
    asked_m3: f64,
    asked_today_m3: f64,
}

/// One water year of a run.
#[derive(Clone, Debug)]
pub struct YearLog {
    order: Vec<usize>,
    is_town: Vec<bool>,
    dead_hm3: Option<f64>,
    capacity_hm3: f64,
    snow_water_mm: Vec<f64>,
    natural_flow_m3s: Vec<f64>,
    storage_hm3: Vec<f64>,
    lake_area_km2: Vec<f64>,
    river_m3s: Vec<f64>,
    minimum_m3s: Vec<f64>,
    delivered_m3s: Vec<f64>,
    demand_m3s: Vec<f64>,
    canals: Vec<CanalLog>,
}

impl YearLog {
    /// An empty log for a year of `valley`.
    pub fn new(valley: &Valley) -> Self {
        let order = order_of_right(valley);
        Self {
            is_town: order.iter().map(|&gate| valley.gates[gate].is_town()).collect(),
            dead_hm3: valley.reservoir.as_ref().map(|reservoir| reservoir.dead_hm3),
            capacity_hm3: 0.0,
            snow_water_mm: Vec::new(),
            natural_flow_m3s: Vec::new(),
            storage_hm3: Vec::new(),
            lake_area_km2: Vec::new(),
            river_m3s: Vec::new(),
            minimum_m3s: Vec::new(),
            delivered_m3s: Vec::new(),
            demand_m3s: Vec::new(),
            canals: vec![CanalLog::default(); order.len()],
            order,
        }
    }

    /// Enters an evening.
    pub fn day(&mut self, evening: &Evening) {
        let m3s = |m3: f64| m3 / SECONDS_PER_DAY;
        self.snow_water_mm.push(evening.basin.snow_water_mm);
        self.natural_flow_m3s.push(m3s(evening.basin.inflow_m3));
        self.river_m3s.push(m3s(evening.river.river_out_m3));
        self.minimum_m3s.push(m3s(evening.minimum_m3));
        if let Some(dead_hm3) = self.dead_hm3 {
            self.capacity_hm3 = dead_hm3 + evening.active_m3 / M3_PER_HM3;
            self.storage_hm3.push(dead_hm3 + evening.content_m3 / M3_PER_HM3);
            self.lake_area_km2.push(evening.lake_area_m2 / M2_PER_KM2);
        }
        let (mut delivered, mut demand) = (0.0, 0.0);
        for ((canal, &gate), &is_town) in self.canals.iter_mut().zip(&self.order).zip(&self.is_town) {
            canal.day(evening, gate, is_town);
            delivered += evening.river.canal_m3[gate];
            demand += evening.demand_m3[gate];
        }
        self.delivered_m3s.push(m3s(delivered));
        self.demand_m3s.push(m3s(demand));
    }

    /// Judges the round of turns that the year's end cuts off.
    pub fn close(&mut self) {
        for (canal, is_town) in self.canals.iter_mut().zip(&self.is_town) {
            canal.judge(true, !is_town);
        }
    }

    /// Snow water over the bands, mm.
    pub fn snow_water_mm(&self) -> &[f64] {
        &self.snow_water_mm
    }

    /// Natural flow at the dam, m³/s.
    pub fn natural_flow_m3s(&self) -> &[f64] {
        &self.natural_flow_m3s
    }

    /// Flow at the end of the river and what must stay in it, m³/s.
    pub fn river_m3s(&self) -> (&[f64], &[f64]) {
        (&self.river_m3s, &self.minimum_m3s)
    }

    /// What all canals together got and asked for, m³/s.
    pub fn delivered_and_demand_m3s(&self) -> (&[f64], &[f64]) {
        (&self.delivered_m3s, &self.demand_m3s)
    }

    /// The reservoir, if there is one.
    pub fn reservoir(&self) -> Option<ReservoirShown<'_>> {
        self.dead_hm3.map(|dead_hm3| ReservoirShown {
            storage_hm3: &self.storage_hm3,
            capacity_hm3: self.capacity_hm3,
            dead_hm3,
            lake_area_km2: &self.lake_area_km2,
        })
    }

    /// The canals in order of right.
    pub fn canals(&self) -> Vec<CanalShown<'_>> {
        self.canals.iter().map(CanalLog::shown).collect()
    }
}

impl CanalLog {
    fn shown(&self) -> CanalShown<'_> {
        CanalShown {
            marks: &self.marks,
            delivered_m3s: &self.delivered_m3s,
            demand_m3s: &self.demand_m3s,
            crop_water_met: &self.crop_water_met,
        }
    }

    fn day(&mut self, evening: &Evening, gate: usize, is_town: bool) {
        let (asked_m3, delivered_m3) = (evening.demand_m3[gate], evening.river.canal_m3[gate]);
        let by_turns = evening.cycle_days > 0;
        if !by_turns || evening.rotation_day.is_multiple_of(evening.cycle_days) {
            self.judge(by_turns, !is_town);
        }
        self.marks.push(DayMark::Idle);
        self.delivered_m3s.push(delivered_m3 / SECONDS_PER_DAY);
        self.demand_m3s.push(asked_m3 / SECONDS_PER_DAY);
        if asked_m3 > 0.0 {
            let open = &mut self.open;
            open.delivered_before_today_m3 = open.delivered_m3;
            open.delivered_m3 += delivered_m3;
            open.asked_m3 += asked_m3;
            open.asked_today_m3 = asked_m3;
            open.days.push(self.marks.len() - 1);
        }
        if !by_turns {
            self.judge(false, !is_town);
        }
        let fields = &evening.fields[gate];
        let (used, need) =
            if is_town { (0.0, 0.0) } else { (fields.crop_evaporation_m3, fields.full_crop_evaporation_m3) };
        self.crop_used_m3.push(used);
        self.crop_need_m3.push(need);
        let last = |series: &[f64]| series.iter().rev().take(CROP_DAYS).sum::<f64>();
        let need = last(&self.crop_need_m3);
        self.crop_water_met.push(if need > 0.0 { last(&self.crop_used_m3) / need } else { f64::NAN });
    }

    /// Judges the open span like the signs do: in a round of turns a field's demand of a later day holds what the
    /// earlier days left unmet.
    fn judge(&mut self, by_turns: bool, asks_again: bool) {
        let span = core::mem::take(&mut self.open);
        let due_m3 =
            if by_turns && asks_again { span.delivered_before_today_m3 + span.asked_today_m3 } else { span.asked_m3 };
        let share = span.delivered_m3 / due_m3;
        let mark = match share {
            share if share >= FULL_SHARE => DayMark::Full,
            share if share < CUT_SHARE => DayMark::Cut,
            _ => DayMark::Short,
        };
        for day in span.days {
            self.marks[day] = mark;
        }
    }
}
