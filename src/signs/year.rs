//! The signs of one water year, read evening by evening.
//!
//! Centre of volume: centroid of the year's natural flow, Stewart, Cayan & Dettinger (2005), *Journal of Climate* 18,
//! 1136–1155. The other dates are as the trade uses them (common practice, no source).

use heapless::Vec;

use super::CanalSigns;
use super::canal::CanalReader;
use crate::water::calendar::{CalendarDay, MonthDay};
use crate::water::canals::MOST_GATES;
use crate::water::units::{M3_PER_HM3, SECONDS_PER_DAY};
use crate::water::valley::Valley;
use crate::water::works::{Evening, WorksStores};

/// Snow water over which the ground counts as white, mm.
pub const WHITE_MM: f64 = 5.0;
/// A rise by less than this share of the pack is the rounding of sums, not snow: on a plateau the first day keeps the date,
/// whatever units the place was written in.
const ROUNDING_SHARE: f64 = 1e-9;
/// Days of a bare week.
const BARE_DAYS: u16 = 7;
/// Share of active capacity from which the reservoir counts as full.
const FULL_SHARE: f64 = 0.99;
/// Days of the low-flow mean.
const LOW_FLOW_DAYS: usize = 7;

/// What is read off a water year. `None` where the year or the place has no such thing.
#[derive(Clone, Debug, Default, PartialEq)]
#[allow(missing_docs, reason = "each is documented once, at its `Sign`")]
pub struct YearSigns {
    pub water_year: i32,
    /// Days of the year, 365 or 366.
    pub days: u16,
    pub precipitation_mm: f64,
    pub snow_share: Option<f64>,
    pub survey_swe_mm: Option<f64>,
    pub peak_swe_mm: f64,
    pub peak_swe_date: Option<CalendarDay>,
    pub melt_out_date: Option<CalendarDay>,
    pub half_volume_date: Option<CalendarDay>,
    pub centre_of_volume_day: Option<f64>,
    pub spring_volume_hm3: f64,
    pub peak_flow_m3s: f64,
    pub peak_flow_date: Option<CalendarDay>,
    pub low_flow_7day_m3s: Option<f64>,
    pub fill_date: Option<CalendarDay>,
    pub carryover_hm3: Option<f64>,
    pub spill_hm3: Option<f64>,
    pub flood_release_hm3: Option<f64>,
    pub crop_evaporation_hm3: Option<f64>,
    pub yield_share: Option<f64>,
    pub river_minimum_days_met: Option<u16>,
    pub supply_ratio: Option<f64>,
    /// Natural flow of the year, hm³; the year chooser ranks by it.
    pub natural_flow_hm3: f64,
    /// One for each gate, in downstream order.
    pub canals: Vec<CanalSigns, MOST_GATES>,
}

/// Reads a water year evening by evening.
#[derive(Clone, Debug)]
pub struct YearReader {
    survey: MonthDay,
    spring_months: (u8, u8),
    has_reservoir: bool,
    has_fields: bool,
    flow_m3: Vec<f64, 366>,
    half_passed: Vec<CalendarDay, 366>,
    canals: Vec<CanalReader, MOST_GATES>,
    so_far: SoFar,
}

/// What is carried from evening to evening, beside flows and canals.
#[derive(Clone, Debug, Default)]
struct SoFar {
    water_year: i32,
    days: u16,
    precipitation_mm: f64,
    survey_swe_mm: Option<f64>,
    peak_swe_mm: f64,
    peak_swe_date: Option<CalendarDay>,
    melt_out_date: Option<CalendarDay>,
    peak_flow_date: Option<CalendarDay>,
    fill_date: Option<CalendarDay>,
    snowfall_mm: f64,
    /// Snow water on the day that the peak is dated to, mm.
    dated_peak_mm: f64,
    peak_seen: bool,
    white_until: Option<CalendarDay>,
    bare_run: u16,
    melted_out: bool,
    moment: f64,
    peak_flow_m3: f64,
    lowest_week_m3: Option<f64>,
    spring_m3: f64,
    content_m3: f64,
    spill_m3: f64,
    flood_release_m3: f64,
    crop_evaporation_m3: f64,
    harvested_ha: f64,
    yield_ha: f64,
    minimum_asked: bool,
    minimum_days: u16,
}

impl YearReader {
    /// A reader for the next water year of `valley`.
    pub fn new(valley: &Valley) -> Self {
        Self {
            survey: valley.survey,
            spring_months: valley.spring_months,
            has_reservoir: valley.reservoir.is_some(),
            has_fields: valley.gates.iter().any(|gate| !gate.is_town()),
            flow_m3: Vec::new(),
            half_passed: Vec::new(),
            canals: valley.gates.iter().enumerate().map(|(at, gate)| CanalReader::new(at, gate.is_town())).collect(),
            so_far: SoFar::default(),
        }
    }

    /// Forgets what was read, for another year of the same valley.
    pub fn start_over(&mut self) {
        self.flow_m3.clear();
        self.half_passed.clear();
        self.canals.iter_mut().for_each(CanalReader::start_over);
        self.so_far = SoFar::default();
    }

    /// Reads an evening.
    pub fn day(&mut self, evening: &Evening, stores: &WorksStores) {
        self.read_snow(evening);
        self.read_flow(evening);
        self.read_works(evening);
        self.supply_day(evening, stores);
    }

    /// Reads of an evening only what the canals asked for and got; the signs of snow, river and fields then say nothing.
    pub fn supply_day(&mut self, evening: &Evening, stores: &WorksStores) {
        self.so_far.water_year = evening.today.water_year;
        self.so_far.days += 1;
        for (canal, account_m3) in self.canals.iter_mut().zip(&stores.river.account_m3) {
            canal.day(evening, *account_m3);
        }
    }

    fn read_works(&mut self, evening: &Evening) {
        let so_far = &mut self.so_far;
        so_far.spill_m3 += evening.spill_m3;
        so_far.flood_release_m3 += evening.river.flood_release_m3;
        if self.has_reservoir {
            let full_m3 = FULL_SHARE * evening.active_m3;
            if so_far.fill_date.is_none() && evening.content_m3 >= full_m3 {
                so_far.fill_date = Some(evening.today);
            }
            so_far.content_m3 = evening.content_m3;
        }
        for fields in &evening.fields[..evening.gates] {
            so_far.crop_evaporation_m3 += fields.crop_evaporation_m3;
            so_far.harvested_ha += fields.harvested_ha;
            so_far.yield_ha += fields.yield_ha;
        }
        if evening.minimum_m3 > 0.0 {
            so_far.minimum_asked = true;
            so_far.minimum_days += u16::from(evening.river.minimum_met);
        }
    }

    fn read_snow(&mut self, evening: &Evening) {
        let so_far = &mut self.so_far;
        let (today, swe_mm) = (evening.today, evening.basin.snow_water_mm);
        so_far.precipitation_mm += evening.basin.precipitation_mm;
        so_far.snowfall_mm += evening.basin.snowfall_mm;
        if today.month_day == self.survey {
            so_far.survey_swe_mm = Some(swe_mm);
        }
        if swe_mm > so_far.peak_swe_mm {
            so_far.peak_swe_mm = swe_mm;
        }
        if swe_mm > so_far.dated_peak_mm * (1.0 + ROUNDING_SHARE) {
            // A new peak: whatever melted out before it was not the year's melt.
            so_far.dated_peak_mm = swe_mm;
            so_far.peak_swe_date = Some(today);
            so_far.peak_seen = swe_mm > WHITE_MM;
            so_far.melted_out = false;
            so_far.melt_out_date = None;
        }
        if !so_far.peak_seen || so_far.melted_out {
            return;
        }
        if swe_mm > WHITE_MM {
            so_far.white_until = Some(today);
            so_far.bare_run = 0;
        } else {
            so_far.bare_run += 1;
            if so_far.bare_run == BARE_DAYS {
                so_far.melt_out_date = so_far.white_until;
                so_far.melted_out = true;
            }
        }
    }

    fn read_flow(&mut self, evening: &Evening) {
        let so_far = &mut self.so_far;
        let (today, flow_m3) = (evening.today, evening.basin.inflow_m3);
        if flow_m3 > so_far.peak_flow_m3 {
            so_far.peak_flow_m3 = flow_m3;
            so_far.peak_flow_date = Some(today);
        }
        let (from, to) = self.spring_months;
        let month = today.month_day.month;
        let in_spring = if from <= to { (from..=to).contains(&month) } else { month >= from || month <= to };
        if in_spring {
            so_far.spring_m3 += flow_m3;
        }
        so_far.moment += f64::from(today.day_of_water_year) * flow_m3;
        // A water year has at most 366 days, so there is always room.
        let _ = self.flow_m3.push(flow_m3);
        let _ = self.half_passed.push(today);
        if self.flow_m3.len() >= LOW_FLOW_DAYS {
            let week_m3: f64 = self.flow_m3[self.flow_m3.len() - LOW_FLOW_DAYS..].iter().sum();
            if so_far.lowest_week_m3.is_none_or(|lowest_m3| week_m3 < lowest_m3) {
                so_far.lowest_week_m3 = Some(week_m3);
            }
        }
    }

    /// The year's signs.
    pub fn close(&self) -> YearSigns {
        let so_far = &self.so_far;
        let mut signs = YearSigns {
            water_year: so_far.water_year,
            days: so_far.days,
            precipitation_mm: so_far.precipitation_mm,
            survey_swe_mm: so_far.survey_swe_mm,
            peak_swe_mm: so_far.peak_swe_mm,
            peak_swe_date: so_far.peak_swe_date,
            melt_out_date: so_far.melt_out_date,
            peak_flow_date: so_far.peak_flow_date,
            fill_date: so_far.fill_date,
            ..YearSigns::default()
        };
        if signs.precipitation_mm > 0.0 {
            signs.snow_share = Some(so_far.snowfall_mm / signs.precipitation_mm);
        }
        let total_m3: f64 = self.flow_m3.iter().sum();
        signs.natural_flow_hm3 = total_m3 / M3_PER_HM3;
        signs.spring_volume_hm3 = so_far.spring_m3 / M3_PER_HM3;
        signs.peak_flow_m3s = so_far.peak_flow_m3 / SECONDS_PER_DAY;
        signs.low_flow_7day_m3s =
            so_far.lowest_week_m3.map(|week_m3| week_m3 / (LOW_FLOW_DAYS as f64 * SECONDS_PER_DAY));
        if total_m3 > 0.0 {
            signs.centre_of_volume_day = Some(so_far.moment / total_m3);
            let mut passed_m3 = 0.0;
            let half = self.flow_m3.iter().position(|flow_m3| {
                passed_m3 += flow_m3;
                passed_m3 >= 0.5 * total_m3
            });
            signs.half_volume_date = half.and_then(|day| self.half_passed.get(day).copied());
        }
        if self.has_reservoir {
            signs.carryover_hm3 = Some(so_far.content_m3 / M3_PER_HM3);
            signs.spill_hm3 = Some(so_far.spill_m3 / M3_PER_HM3);
            signs.flood_release_hm3 = Some(so_far.flood_release_m3 / M3_PER_HM3);
        }
        if self.has_fields {
            signs.crop_evaporation_hm3 = Some(so_far.crop_evaporation_m3 / M3_PER_HM3);
        }
        if so_far.harvested_ha > 0.0 {
            signs.yield_share = Some(so_far.yield_ha / so_far.harvested_ha);
        }
        if so_far.minimum_asked {
            signs.river_minimum_days_met = Some(so_far.minimum_days);
        }
        signs.canals = self.canals.iter().map(CanalReader::close).collect();
        let demand_hm3: f64 = signs.canals.iter().map(|canal| canal.demand_hm3).sum();
        let delivered_hm3: f64 = signs.canals.iter().map(|canal| canal.delivered_hm3).sum();
        signs.supply_ratio = (demand_hm3 > 0.0).then(|| delivered_hm3 / demand_hm3);
        signs
    }
}
