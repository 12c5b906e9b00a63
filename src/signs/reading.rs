//! One number for many years: what a map of settings is coloured by.
//!
//! A reading is the mean over the years that have the sign, or how often the supply was enough; the same numbers that
//! all years together are told with.

use super::{CanalSigns, Sign, SignKind, YearSigns, performance, spread};
use crate::water::calendar::CalendarDay;
use crate::water::keyed::keyed;

keyed! {
    /// A sign of one canal's year.
    CanalSign, CANAL_SIGN_COUNT {
        /// Delivered over demanded at the head gate.
        SupplyRatio => "supply_ratio",
        /// Days on which at least 99.5 % of the demand came.
        DaysFull => "days_full",
        /// Days on which less than 5 % came.
        DaysCut => "days_cut",
        /// Days in between.
        DaysShort => "days_short",
        /// First day that was not full.
        FirstShortDate => "first_short_date",
        /// Last day that was full.
        LastFullDate => "last_full_date",
        /// Last day on which any water came.
        LastWaterDate => "last_water_date",
        /// Stored water let go for the canal, hm³.
        StoredDraw => "stored_draw_hm3",
        /// Left in the canal's account on the last day, hm³.
        AccountEnd => "account_end_hm3",
    }
}

keyed! {
    /// How good a supply was over many years; see [`super::Performance`].
    SupplySign, SUPPLY_SIGN_COUNT {
        /// Share of years that were enough.
        Reliability => "reliability",
        /// Share of failures that a year that was enough followed.
        Resilience => "resilience",
        /// Mean of the largest shortages, hm³.
        Vulnerability => "vulnerability_hm3",
    }
}

impl CanalSign {
    /// The sign as a number in the unit of its key; a date as the day of the water year.
    pub fn of(self, canal: &CanalSigns) -> Option<f64> {
        let day = |date: Option<CalendarDay>| date.map(|date| f64::from(date.day_of_water_year));
        match self {
            CanalSign::SupplyRatio => canal.supply_ratio,
            CanalSign::DaysFull => Some(f64::from(canal.days_full)),
            CanalSign::DaysCut => Some(f64::from(canal.days_cut)),
            CanalSign::DaysShort => Some(f64::from(canal.days_short)),
            CanalSign::FirstShortDate => day(canal.first_short_date),
            CanalSign::LastFullDate => day(canal.last_full_date),
            CanalSign::LastWaterDate => day(canal.last_water_date),
            CanalSign::StoredDraw => Some(canal.stored_draw_hm3),
            CanalSign::AccountEnd => Some(canal.account_end_hm3),
        }
    }

    const fn kind(self) -> SignKind {
        match self {
            CanalSign::SupplyRatio => SignKind::Share,
            CanalSign::DaysFull | CanalSign::DaysCut | CanalSign::DaysShort => SignKind::Days,
            CanalSign::FirstShortDate | CanalSign::LastFullDate | CanalSign::LastWaterDate => SignKind::Date,
            CanalSign::StoredDraw | CanalSign::AccountEnd => SignKind::Volume,
        }
    }
}

/// Which way people want a reading to go.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Better {
    /// More, or later.
    More,
    /// Less.
    Less,
}

/// What is read off many years as one number.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Reading {
    /// Mean of a sign over the years that have it.
    Year(Sign),
    /// Mean of a canal's sign over the years that have it.
    Canal {
        /// Which gate, counted downstream from 0.
        gate: usize,
        /// Which sign.
        sign: CanalSign,
    },
    /// How good the supply was.
    Supply {
        /// Of which gate; `None` for all of them together.
        gate: Option<usize>,
        /// Which sign.
        sign: SupplySign,
    },
}

impl Reading {
    /// The reading with this key: of one gate, or of the whole place. `None` where there is none.
    pub fn from_key(key: &str, gate: Option<usize>) -> Option<Reading> {
        if let Some(sign) = SupplySign::ALL.into_iter().find(|sign| sign.key() == key) {
            return Some(Reading::Supply { gate, sign });
        }
        match gate {
            Some(gate) => {
                let sign = CanalSign::ALL.into_iter().find(|sign| sign.key() == key)?;
                Some(Reading::Canal { gate, sign })
            }
            None => Sign::from_key(key).map(Reading::Year),
        }
    }

    /// Every key that goes with one gate, or with the whole place.
    pub fn keys(of_a_gate: bool) -> impl Iterator<Item = &'static str> {
        let years = Sign::ALL.into_iter().map(Sign::key).filter(move |_| !of_a_gate);
        let canals = CanalSign::ALL.into_iter().map(CanalSign::key).filter(move |_| of_a_gate);
        years.chain(canals).chain(SupplySign::ALL.into_iter().map(SupplySign::key))
    }

    /// Its stable key.
    pub const fn key(self) -> &'static str {
        match self {
            Reading::Year(sign) => sign.key(),
            Reading::Canal { sign, .. } => sign.key(),
            Reading::Supply { sign, .. } => sign.key(),
        }
    }

    /// The gate that it is about, if it is about one.
    pub const fn gate(self) -> Option<usize> {
        match self {
            Reading::Year(_) => None,
            Reading::Canal { gate, .. } => Some(gate),
            Reading::Supply { gate, .. } => gate,
        }
    }

    /// What kind of number it is.
    pub const fn kind(self) -> SignKind {
        match self {
            Reading::Year(sign) => sign.kind(),
            Reading::Canal { sign, .. } => sign.kind(),
            Reading::Supply { sign: SupplySign::Vulnerability, .. } => SignKind::Volume,
            Reading::Supply { .. } => SignKind::Share,
        }
    }

    /// Whether it is the share of the water asked for that came, which fails below the place's enough share.
    pub const fn is_supply_ratio(self) -> bool {
        matches!(self, Reading::Year(Sign::SupplyRatio) | Reading::Canal { sign: CanalSign::SupplyRatio, .. })
    }

    /// Whether it is read off canals alone, so that snow, river and fields need not be.
    pub const fn is_of_supply(self) -> bool {
        matches!(self, Reading::Year(Sign::SupplyRatio) | Reading::Canal { .. } | Reading::Supply { .. })
    }

    /// Which way people want it to go; `None` where that is not for the water to say.
    pub const fn better(self) -> Option<Better> {
        match self {
            Reading::Year(Sign::SupplyRatio | Sign::YieldShare | Sign::Carryover | Sign::RiverMinimumDaysMet)
            | Reading::Canal {
                sign:
                    CanalSign::SupplyRatio
                    | CanalSign::DaysFull
                    | CanalSign::FirstShortDate
                    | CanalSign::LastFullDate
                    | CanalSign::LastWaterDate
                    | CanalSign::AccountEnd,
                ..
            }
            | Reading::Supply { sign: SupplySign::Reliability | SupplySign::Resilience, .. } => Some(Better::More),
            Reading::Canal { sign: CanalSign::DaysCut | CanalSign::DaysShort, .. }
            | Reading::Supply { sign: SupplySign::Vulnerability, .. } => Some(Better::Less),
            Reading::Year(_) | Reading::Canal { sign: CanalSign::StoredDraw, .. } => None,
        }
    }

    /// The reading over `years`, in order; `None` where no year has it. A year's supply is enough from `enough_share`
    /// of what was asked for on. What asks for the year after is there only where `unbroken` says that the years follow
    /// one another.
    pub fn of<'y>(
        self,
        years: impl IntoIterator<Item = &'y YearSigns>,
        enough_share: f64,
        unbroken: bool,
    ) -> Option<f64> {
        let years = years.into_iter();
        match self {
            Reading::Year(sign) => spread(years.filter_map(|year| sign.of(year))).map(|spread| spread.mean),
            Reading::Canal { gate, sign } => {
                let values = years.filter_map(|year| year.canals.get(gate)).filter_map(|canal| sign.of(canal));
                spread(values).map(|spread| spread.mean)
            }
            Reading::Supply { gate, sign } => {
                let totals = years.filter_map(|year| match gate {
                    Some(gate) => year.canals.get(gate).map(|canal| (canal.demand_hm3, canal.delivered_hm3)),
                    None => {
                        let sum = |read: fn(&CanalSigns) -> f64| year.canals.iter().map(read).sum::<f64>();
                        Some((sum(|canal| canal.demand_hm3), sum(|canal| canal.delivered_hm3)))
                    }
                });
                let found = performance(totals, enough_share)?;
                match sign {
                    SupplySign::Reliability => Some(found.reliability),
                    SupplySign::Resilience => found.resilience.filter(|_| unbroken),
                    SupplySign::Vulnerability => Some(found.vulnerability_hm3).filter(|_| unbroken),
                }
            }
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn year(demand_hm3: f64, delivered_hm3: f64) -> YearSigns {
        let canal = CanalSigns {
            demand_hm3,
            delivered_hm3,
            supply_ratio: Some(delivered_hm3 / demand_hm3),
            days_full: 100,
            ..CanalSigns::default()
        };
        let mut signs = YearSigns { supply_ratio: canal.supply_ratio, peak_swe_mm: 300.0, ..YearSigns::default() };
        let _ = signs.canals.push(canal);
        signs
    }

    #[test]
    fn every_key_finds_its_reading() {
        for gate in [None, Some(3)] {
            for key in Reading::keys(gate.is_some()) {
                let found = Reading::from_key(key, gate);
                assert_eq!(found.map(|found| (found.key(), found.gate())), Some((key, gate)));
            }
        }
        assert_eq!(Reading::from_key("days_full", None), None);
        assert_eq!(Reading::from_key("peak_swe_mm", Some(0)), None);
        assert_eq!(Reading::from_key("reliability", Some(0)).map(Reading::kind), Some(SignKind::Share));
    }

    #[test]
    fn years_become_one_number() {
        let years = [year(10.0, 10.0), year(10.0, 5.0), year(10.0, 9.0), year(10.0, 4.0)];
        let read = |key, gate, unbroken| Reading::from_key(key, gate).and_then(|r| r.of(&years, 0.9, unbroken));
        assert_eq!(read("supply_ratio", None, true), Some(0.7));
        assert_eq!(read("supply_ratio", Some(0), true), Some(0.7));
        assert_eq!(read("reliability", None, true), Some(0.5));
        assert_eq!(read("resilience", Some(0), true), Some(1.0));
        assert_eq!(read("vulnerability_hm3", None, true), Some(5.5));
        assert_eq!((read("resilience", None, false), read("vulnerability_hm3", None, false)), (None, None));
        assert_eq!(read("days_full", Some(0), true), Some(100.0));
        assert_eq!((read("days_full", Some(1), true), read("fill_date", None, true)), (None, None));
        assert_eq!(Reading::Year(Sign::PeakSwe).of([], 0.9, true), None);
    }
}
