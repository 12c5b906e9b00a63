//! What one frame shows: borrowed plain values, put together by whoever holds the run.
//!
//! Daily series are those of the chosen water year, one value for each day of its calendar, and empty where the place
//! has no such thing. Canals stand in order of right, the oldest first, in every list of a scene.

use super::facts::{AllYears, PlaceFacts, Skill};
use super::hand::Hand;
use crate::picture::chart::DayMark;
use crate::signs::{CanalSigns, YearReport, YearSigns};
use crate::water::calendar::CalendarDay;
use crate::water::dials::{Dial, DialRange, Dials};
use crate::water::valley::Band;
use crate::words::{System, Words};

/// Everything that a view needs to draw one frame.
#[derive(Clone, Copy, Debug)]
pub struct Scene<'a> {
    /// The place's own name.
    pub place_name: &'a str,
    /// Whether the place is made up.
    pub invented: bool,
    /// Whether the model was fitted to the place's gauge.
    pub fitted: bool,
    /// The water year on show.
    pub year: YearShown<'a>,
    /// The day on show, counted from 0 at the start of the water year.
    pub day: usize,
    /// Whether the days go by by themselves.
    pub playing: bool,
    /// Whether a dial was turned and its answer is not there yet.
    pub stale: bool,
    /// The dials that the place offers, in order.
    pub dials: &'a [DialSetting],
    /// Which of them is being turned.
    pub chosen: Option<usize>,
    /// The units that people see.
    pub units: System,
    /// A second language for rooms that read two: sentences are then said in both.
    pub second: Option<&'a Words>,
    /// Elevation bands from low to high.
    pub bands: &'a [Band],
    /// The most snow water that any band holds in the year in either run, mm; the scale of the snow.
    pub deepest_snow_mm: f64,
    /// Canals and towns.
    pub canals: &'a [CanalTitle<'a>],
    /// The run with every dial at rest.
    pub was: RunShown<'a>,
    /// The run with your changes.
    pub now: RunShown<'a>,
    /// A run that was kept for comparison.
    pub beside: Option<RunShown<'a>>,
    /// How far the answer may be off, where the place has a band of parameter sets.
    pub doubt: Option<Doubt<'a>>,
    /// How all the years are looked at.
    pub all_years: AllYears<'a>,
    /// What is told of the place.
    pub facts: PlaceFacts<'a>,
    /// How far the model was right; `None` where it was not fitted or nobody has the scores.
    pub skill: Option<Skill<'a>>,
    /// Which sheet of a page with several is on show, counted from 0.
    pub sheet: usize,
    /// What the hand is at.
    pub hand: Hand<'a>,
}

impl Scene<'_> {
    /// The message on whether the model was fitted to the place's gauge, for the foot of every page.
    pub fn fitting(&self) -> &'static str {
        match (self.fitted, self.facts.old_fit, self.facts.gauged) {
            (true, true, _) => "picture-fit-old",
            (true, false, _) => "picture-fitted",
            (false, _, Some(false)) => "picture-no-gauge",
            (false, ..) => "picture-not-fitted",
        }
    }

    /// Whether any dial is off rest.
    pub fn changed(&self) -> bool {
        self.dials.iter().any(|setting| !setting.rests())
    }

    /// The day on show.
    pub fn today(&self) -> Option<CalendarDay> {
        self.year.calendar.get(self.day).copied()
    }
}

/// How the year was chosen.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum YearKind {
    /// A year out of the lowest third by natural flow.
    Dry,
    /// A year out of the middle third.
    Middling,
    /// A year out of the highest third.
    Wet,
    /// A year chosen by itself.
    Any,
}

/// The water year on show.
#[derive(Clone, Copy, Debug)]
pub struct YearShown<'a> {
    /// How it was chosen.
    pub kind: YearKind,
    /// Its days, 365 or 366.
    pub calendar: &'a [CalendarDay],
    /// Month in which the place's water years start, 1 to 12.
    pub start_month: u8,
}

/// One dial as it stands.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DialSetting {
    /// Which.
    pub dial: Dial,
    /// Its value in its own unit; `None` for a starting storage that carries over.
    pub value: Option<f64>,
    /// What the place allows.
    pub range: DialRange,
}

impl DialSetting {
    /// Whether the dial is at rest.
    pub fn rests(&self) -> bool {
        self.value == Dials::REST.get(self.dial)
    }
}

/// A canal or town as people know it.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct CanalTitle<'a> {
    /// Its name.
    pub name: &'a str,
    /// Year of its right; `None` for a right before all others.
    pub right_year: Option<i32>,
    /// Whether a town hangs on it.
    pub is_town: bool,
    /// Its place in the signs of a year, which follow the river downstream.
    pub gate: usize,
}

/// One run of the water in the chosen year.
#[derive(Clone, Copy, Debug)]
pub struct RunShown<'a> {
    /// Snow water over the bands, mm.
    pub snow_water_mm: &'a [f64],
    /// Snow water of each band on the day on show, mm.
    pub band_snow_mm: &'a [f64],
    /// Height above which the ground is white on the day on show, m; `None` where it is bare.
    pub snow_line_m: Option<f64>,
    /// Natural flow at the dam, m³/s.
    pub natural_flow_m3s: &'a [f64],
    /// The reservoir, if there is one.
    pub reservoir: Option<ReservoirShown<'a>>,
    /// Flow at the end of the river, m³/s.
    pub river_m3s: &'a [f64],
    /// What must stay in it, m³/s.
    pub minimum_m3s: &'a [f64],
    /// Delivered to all canals together, m³/s.
    pub delivered_m3s: &'a [f64],
    /// Asked for by all canals together, m³/s.
    pub demand_m3s: &'a [f64],
    /// Canals and towns.
    pub canals: &'a [CanalShown<'a>],
    /// Every whole water year of the run, with its signs and ledger.
    pub years: &'a [YearReport],
    /// Which of them is the chosen one.
    pub chosen_year: usize,
}

impl<'a> RunShown<'a> {
    /// The signs of the chosen year.
    pub fn signs(&self) -> Option<&'a YearSigns> {
        self.years.get(self.chosen_year).map(|report| &report.signs)
    }

    /// The signs of one canal in the chosen year.
    pub fn canal_signs(&self, title: &CanalTitle<'_>) -> Option<&'a CanalSigns> {
        self.signs()?.canals.get(title.gate)
    }
}

/// The reservoir in the chosen year.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ReservoirShown<'a> {
    /// Content in the evening, dead storage and all, hm³.
    pub storage_hm3: &'a [f64],
    /// Content when full, hm³.
    pub capacity_hm3: f64,
    /// Content below the outlet, hm³.
    pub dead_hm3: f64,
    /// Surface, km².
    pub lake_area_km2: &'a [f64],
}

/// One canal or town in the chosen year.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CanalShown<'a> {
    /// What each day was.
    pub marks: &'a [DayMark],
    /// Delivered at the head gate, m³/s.
    pub delivered_m3s: &'a [f64],
    /// Asked for there, m³/s.
    pub demand_m3s: &'a [f64],
    /// Share of the crops' need of the last week that was met, 0 to 1; not a number out of season and for towns.
    pub crop_water_met: &'a [f64],
}

/// How far the answer may be off.
#[derive(Clone, Copy, Debug, Default)]
pub struct Doubt<'a> {
    /// Least and most of each day's natural flow, m³/s.
    pub natural_flow_m3s: Option<(&'a [f64], &'a [f64])>,
    /// Least and most of each day's storage, hm³.
    pub storage_hm3: Option<(&'a [f64], &'a [f64])>,
    /// Least and most shift of the day on which half of the water is past, days, set by set against its own rest.
    pub half_volume_days: Option<(i32, i32)>,
    /// The same of each canal's days that were not full; in the order of the canals.
    pub lacking_days: &'a [(i32, i32)],
    /// The same of each canal's last full day, where every set has one.
    pub last_full_days: &'a [Option<(i32, i32)>],
}
