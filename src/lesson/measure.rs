//! What a guess or an expectation is about: a sign, of the valley or of a canal, its value or its change.

use crate::signs::{CanalSigns, Sign, SignKind, YearReport, YearSigns, spread};
use crate::water::calendar::CalendarDay;
use crate::water::keyed::keyed;
use crate::water::ledger::Flow;
use crate::water::units::M3_PER_HM3;
use crate::water::valley::Valley;

keyed! {
    /// A sign of one canal's year.
    CanalSign, CANAL_SIGNS {
        /// Delivered over demanded.
        SupplyRatio => "supply_ratio",
        /// Days on which all the water came.
        DaysFull => "days_full",
        /// Days on which some of it came.
        DaysShort => "days_short",
        /// Days on which none came.
        DaysCut => "days_cut",
        /// First day that was not full.
        FirstShortDate => "first_short_date",
        /// Last day that was full.
        LastFullDate => "last_full_date",
        /// Last day with any water.
        LastWaterDate => "last_water_date",
        /// Stored water let go for it, hm³.
        StoredDraw => "stored_draw_hm3",
        /// Left in its account, hm³.
        AccountEnd => "account_end_hm3",
    }
}

keyed! {
    /// What lessons read besides the signs: flows of the ledger and counts over the years.
    LessonSign, LESSON_SIGNS {
        /// Natural flow at the dam, hm³.
        NaturalInflow => "natural_inflow_hm3",
        /// Water that canals and fields give back to the river, hm³.
        ReturnFlow => "return_flow_hm3",
        /// Water lost on the way along the canals, hm³.
        ConveyanceLoss => "conveyance_loss_hm3",
        /// Into the canals at their heads, hm³.
        Canals => "canals_hm3",
        /// Let go from the reservoir for the river minimum, hm³.
        MinimumRelease => "minimum_release_hm3",
        /// Out of the valley at the river's end, hm³.
        RiverOut => "river_out_hm3",
        /// Years of the record in which enough water arrived, at all gates together or at one.
        YearsEnough => "years_enough",
        /// Years of the record in which the reservoir filled.
        YearsFilled => "years_filled",
        /// The canal that was first short, by its place in the order of rights: 1 is the oldest.
        FirstShortCanal => "first_short_canal",
        /// The canal with the least of what it asked for, by its place in the order of rights.
        LeastSuppliedCanal => "least_supplied_canal",
    }
}

/// A sign, and of what.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Measure {
    /// A sign of the valley.
    Sign(Sign),
    /// A sign of one gate, which is counted from 0 in downstream order.
    Canal(usize, CanalSign),
    /// A flow of the ledger, or a count.
    Lesson(LessonSign),
    /// Years in which one gate got enough.
    CanalYearsEnough(usize),
}

/// Over which years a sign is read.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Over {
    /// The year that is shown.
    Year,
    /// The mean of all years that have the sign.
    AllYears,
}

/// Whether the sign itself is meant or how it changed.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Shape {
    /// With the dials as they stand.
    Value,
    /// That, less as it was.
    Change,
}

/// What is read off a run.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Reading {
    /// The sign.
    pub measure: Measure,
    /// Over which years.
    pub over: Over,
    /// Value or change.
    pub shape: Shape,
}

/// What a reading is in, for writing it.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Quantity {
    /// Depth of water, mm.
    Depth,
    /// A share, 0 to 1.
    Share,
    /// A date, as the day of the water year.
    Date,
    /// A volume, hm³.
    Volume,
    /// A flow, m³/s.
    Flow,
    /// Days.
    Days,
    /// Years.
    Years,
    /// A canal, by its place in the order of rights, counted from 1.
    Canal,
}

impl CanalSign {
    /// The sign with this key.
    pub fn from_key(key: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|sign| sign.key() == key)
    }

    /// The sign as a number; a date as the day of the water year.
    pub fn of(self, canal: &CanalSigns) -> Option<f64> {
        let day = |date: Option<CalendarDay>| date.map(|date| f64::from(date.day_of_water_year));
        match self {
            Self::SupplyRatio => canal.supply_ratio,
            Self::DaysFull => Some(canal.days_full.into()),
            Self::DaysShort => Some(canal.days_short.into()),
            Self::DaysCut => Some(canal.days_cut.into()),
            Self::FirstShortDate => day(canal.first_short_date),
            Self::LastFullDate => day(canal.last_full_date),
            Self::LastWaterDate => day(canal.last_water_date),
            Self::StoredDraw => Some(canal.stored_draw_hm3),
            Self::AccountEnd => Some(canal.account_end_hm3),
        }
    }

    const fn quantity(self) -> Quantity {
        match self {
            Self::SupplyRatio => Quantity::Share,
            Self::DaysFull | Self::DaysShort | Self::DaysCut => Quantity::Days,
            Self::FirstShortDate | Self::LastFullDate | Self::LastWaterDate => Quantity::Date,
            Self::StoredDraw | Self::AccountEnd => Quantity::Volume,
        }
    }
}

impl LessonSign {
    /// The sign with this key.
    pub fn from_key(key: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|sign| sign.key() == key)
    }

    /// Whether it counts years, and so has one value for all of them.
    pub const fn counts_years(self) -> bool {
        matches!(self, Self::YearsEnough | Self::YearsFilled)
    }

    const fn flow(self) -> Option<Flow> {
        match self {
            Self::NaturalInflow => Some(Flow::NaturalInflow),
            Self::ReturnFlow => Some(Flow::ReturnFlow),
            Self::ConveyanceLoss => Some(Flow::ConveyanceLoss),
            Self::Canals => Some(Flow::Canals),
            Self::MinimumRelease => Some(Flow::MinimumRelease),
            Self::RiverOut => Some(Flow::RiverOut),
            Self::YearsEnough | Self::YearsFilled | Self::FirstShortCanal | Self::LeastSuppliedCanal => None,
        }
    }

    fn of(self, year: &YearReport, valley: &Valley) -> Option<f64> {
        if let Some(flow) = self.flow() {
            return Some(year.ledger.of(flow) / M3_PER_HM3);
        }
        let canals = &year.signs.canals;
        // The lowest wins; of two alike the later right, since it is the one that waits.
        let lowest = |of: &dyn Fn(&CanalSigns) -> Option<f64>| {
            let mut best: Option<(usize, f64)> = None;
            for (place, gate) in gates_by_right(valley).into_iter().enumerate() {
                let Some(value) = canals.get(gate).and_then(of) else { continue };
                if best.is_none_or(|(_, least)| value <= least) {
                    best = Some((place + 1, value));
                }
            }
            best.map(|(place, _)| place as f64)
        };
        match self {
            Self::FirstShortCanal => lowest(&|canal| CanalSign::FirstShortDate.of(canal)),
            Self::LeastSuppliedCanal => lowest(&|canal| canal.supply_ratio.filter(|ratio| *ratio < 1.0)),
            _ => None,
        }
    }

    const fn quantity(self) -> Quantity {
        match self {
            Self::YearsEnough | Self::YearsFilled => Quantity::Years,
            Self::FirstShortCanal | Self::LeastSuppliedCanal => Quantity::Canal,
            _ => Quantity::Volume,
        }
    }
}

/// The gates from the oldest right to the newest; of one date, in downstream order.
pub(super) fn gates_by_right(valley: &Valley) -> Vec<usize> {
    let mut gates: Vec<usize> = (0..valley.gates.len()).collect();
    gates.sort_by_key(|gate| valley.gates[*gate].right_date);
    gates
}

impl Measure {
    /// What its value is in.
    pub fn quantity(self) -> Quantity {
        match self {
            Measure::Sign(sign) => match sign.kind() {
                SignKind::Depth => Quantity::Depth,
                SignKind::Share => Quantity::Share,
                SignKind::Date | SignKind::Day => Quantity::Date,
                SignKind::Volume => Quantity::Volume,
                SignKind::Flow => Quantity::Flow,
                SignKind::Days => Quantity::Days,
            },
            Measure::Canal(_, sign) => sign.quantity(),
            Measure::Lesson(sign) => sign.quantity(),
            Measure::CanalYearsEnough(_) => Quantity::Years,
        }
    }

    fn of_year(self, year: &YearReport, valley: &Valley) -> Option<f64> {
        match self {
            Measure::Sign(sign) => sign.of(&year.signs),
            Measure::Canal(gate, sign) => year.signs.canals.get(gate).and_then(|canal| sign.of(canal)),
            Measure::Lesson(sign) => sign.of(year, valley),
            Measure::CanalYearsEnough(_) => None,
        }
    }

    /// A count over the years, for the measures that are one.
    fn of_all(self, years: &[YearReport], valley: &Valley) -> Option<f64> {
        let count = |holds: &dyn Fn(&YearSigns) -> bool| years.iter().filter(|year| holds(&year.signs)).count() as f64;
        let enough = |ratio: Option<f64>| ratio.is_some_and(|ratio| ratio >= valley.enough_share);
        match self {
            Measure::Lesson(LessonSign::YearsEnough) => Some(count(&|year| enough(year.supply_ratio))),
            Measure::Lesson(LessonSign::YearsFilled) => Some(count(&|year| year.fill_date.is_some())),
            Measure::CanalYearsEnough(gate) => {
                Some(count(&|year| enough(year.canals.get(gate).and_then(|canal| canal.supply_ratio))))
            }
            _ => None,
        }
    }
}

impl Reading {
    /// What it is in; the change of a date is in days.
    pub fn quantity(&self) -> Quantity {
        match (self.measure.quantity(), self.shape) {
            (Quantity::Date, Shape::Change) => Quantity::Days,
            (quantity, _) => quantity,
        }
    }

    /// Reads it off two runs of one record. `year` counts from 0 in the whole water years. `None` where one of the runs
    /// has no such thing; the mean of changes is that of the years that have it in both.
    pub fn of(
        &self,
        as_it_was: &[YearReport],
        with_changes: &[YearReport],
        year: usize,
        valley: &Valley,
    ) -> Option<f64> {
        if let Some(after) = self.measure.of_all(with_changes, valley) {
            return match self.shape {
                Shape::Value => Some(after),
                Shape::Change => Some(after - self.measure.of_all(as_it_was, valley)?),
            };
        }
        let of_one = |before: &YearReport, after: &YearReport| {
            let value = self.measure.of_year(after, valley)?;
            match self.shape {
                Shape::Value => Some(value),
                Shape::Change => Some(value - self.measure.of_year(before, valley)?),
            }
        };
        match self.over {
            Over::Year => of_one(as_it_was.get(year)?, with_changes.get(year)?),
            Over::AllYears => {
                let values = as_it_was.iter().zip(with_changes).filter_map(|(before, after)| of_one(before, after));
                spread(values).map(|spread| spread.mean)
            }
        }
    }
}
