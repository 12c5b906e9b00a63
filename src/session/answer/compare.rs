//! What changed: every sign of every year against the same year of another run, and all years together.
//!
//! Dates are compared as days of the water year, so that a change is in days. Where one of the two has no such sign (a
//! reservoir that never filled) there is no change to tell; how often that happened is counted.

use crate::signs::{CanalSigns, Performance, SIGNS, Sign, Spread, YearReport, YearSigns, performance, spread};
use crate::water::calendar::CalendarDay;

/// A quantity in both runs.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Pair {
    /// As it was.
    pub before: Option<f64>,
    /// With the changes.
    pub after: Option<f64>,
}

impl Pair {
    /// After less before; `None` where either is missing.
    pub fn change(self) -> Option<f64> {
        Some(self.after? - self.before?)
    }
}

/// A canal's year in both runs, in the units of [`CanalSigns`]; dates as days of the water year.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
#[allow(missing_docs, reason = "each is documented once, at `CanalSigns`")]
pub struct CanalChange {
    pub demand_hm3: Pair,
    pub delivered_hm3: Pair,
    pub supply_ratio: Pair,
    pub days_full: Pair,
    pub days_short: Pair,
    pub days_cut: Pair,
    pub first_short_day: Pair,
    pub last_full_day: Pair,
    pub last_water_day: Pair,
    pub stored_draw_hm3: Pair,
    pub account_end_hm3: Pair,
}

/// A quantity over all years.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Overall {
    /// As it was.
    pub before: Option<Spread>,
    /// With the changes.
    pub after: Option<Spread>,
    /// Changes of the years that have it in both runs.
    pub change: Option<Spread>,
    /// Years that have it only with the changes.
    pub come: usize,
    /// Years that had it only as it was.
    pub gone: usize,
}

/// A canal, or all of them together, over all years.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SupplyOverall {
    /// Supply ratio.
    pub supply_ratio: Overall,
    /// How reliable the supply was.
    pub before: Option<Performance>,
    /// How reliable it is with the changes.
    pub after: Option<Performance>,
}

/// Every sign of a year in both runs, in the order of [`Sign::ALL`].
pub fn year_changes(before: &YearSigns, after: &YearSigns) -> [Pair; SIGNS] {
    Sign::ALL.map(|sign| Pair { before: sign.of(before), after: sign.of(after) })
}

/// Every canal of a year in both runs, in downstream order.
pub fn canal_changes(before: &YearSigns, after: &YearSigns) -> Vec<CanalChange> {
    before.canals.iter().zip(&after.canals).map(|(before, after)| CanalChange::new(before, after)).collect()
}

impl CanalChange {
    fn new(before: &CanalSigns, after: &CanalSigns) -> Self {
        let pair = |of: &dyn Fn(&CanalSigns) -> Option<f64>| Pair { before: of(before), after: of(after) };
        let day = |date: Option<CalendarDay>| date.map(|date| f64::from(date.day_of_water_year));
        Self {
            demand_hm3: pair(&|canal| Some(canal.demand_hm3)),
            delivered_hm3: pair(&|canal| Some(canal.delivered_hm3)),
            supply_ratio: pair(&|canal| canal.supply_ratio),
            days_full: pair(&|canal| Some(canal.days_full.into())),
            days_short: pair(&|canal| Some(canal.days_short.into())),
            days_cut: pair(&|canal| Some(canal.days_cut.into())),
            first_short_day: pair(&|canal| day(canal.first_short_date)),
            last_full_day: pair(&|canal| day(canal.last_full_date)),
            last_water_day: pair(&|canal| day(canal.last_water_date)),
            stored_draw_hm3: pair(&|canal| Some(canal.stored_draw_hm3)),
            account_end_hm3: pair(&|canal| Some(canal.account_end_hm3)),
        }
    }
}

impl Overall {
    fn of(pairs: impl Iterator<Item = Pair> + Clone) -> Self {
        Self {
            before: spread(pairs.clone().filter_map(|pair| pair.before)),
            after: spread(pairs.clone().filter_map(|pair| pair.after)),
            change: spread(pairs.clone().filter_map(Pair::change)),
            come: pairs.clone().filter(|pair| pair.before.is_none() && pair.after.is_some()).count(),
            gone: pairs.filter(|pair| pair.before.is_some() && pair.after.is_none()).count(),
        }
    }
}

/// Every sign over all years, in the order of [`Sign::ALL`]. The runs are of the same record.
pub fn all_years(before: &[YearReport], after: &[YearReport]) -> [Overall; SIGNS] {
    Sign::ALL.map(|sign| {
        let years = before.iter().zip(after);
        Overall::of(years.map(|(b, a)| Pair { before: sign.of(&b.signs), after: sign.of(&a.signs) }))
    })
}

/// All canals together over all years; a year is enough from `enough_share` of its demand on.
pub fn supply_of_all(before: &[YearReport], after: &[YearReport], enough_share: f64) -> SupplyOverall {
    let totals = |report: &YearReport| {
        let canals = &report.signs.canals;
        let demand_hm3: f64 = canals.iter().map(|canal| canal.demand_hm3).sum();
        (demand_hm3, canals.iter().map(|canal| canal.delivered_hm3).sum::<f64>())
    };
    supply(before, after, enough_share, |report| report.signs.supply_ratio, totals)
}

/// One canal over all years; `None` for a canal that is not there.
pub fn supply_of_canal(
    before: &[YearReport],
    after: &[YearReport],
    canal: usize,
    enough_share: f64,
) -> Option<SupplyOverall> {
    let is_there = before.iter().chain(after).all(|report| canal < report.signs.canals.len());
    is_there.then(|| {
        let of = |report: &YearReport| report.signs.canals[canal];
        let totals = |report: &YearReport| (of(report).demand_hm3, of(report).delivered_hm3);
        supply(before, after, enough_share, |report| of(report).supply_ratio, totals)
    })
}

fn supply(
    before: &[YearReport],
    after: &[YearReport],
    enough_share: f64,
    ratio: impl Fn(&YearReport) -> Option<f64>,
    totals: impl Fn(&YearReport) -> (f64, f64),
) -> SupplyOverall {
    let pairs = before.iter().zip(after).map(|(b, a)| Pair { before: ratio(b), after: ratio(a) });
    SupplyOverall {
        supply_ratio: Overall::of(pairs),
        before: performance(before.iter().map(&totals), enough_share),
        after: performance(after.iter().map(&totals), enough_share),
    }
}
