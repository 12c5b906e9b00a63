//! Means over the years shown, and changes year by year: each year against the same year at rest.

use super::runs::{Run, Told};
use crate::signs::{CanalSigns, Performance, Sign, Spread, YearSigns, performance, spread};
use crate::water::ledger::Ledger;
use crate::water::valley::Valley;

/// Mean and range of a sign over the years shown.
pub(super) fn of_sign(run: &Run, sign: Sign) -> Option<Spread> {
    spread(run.years.iter().filter_map(|year| sign.of(&year.signs)))
}

/// Mean and range of the yearly changes of anything that is read off a year; years that lack it in one of the runs are
/// left out.
pub(super) fn of_change(told: &Told, read: impl Fn(&YearSigns) -> Option<f64>) -> Option<Spread> {
    let pairs = told.as_it_was.years.iter().zip(&told.with_changes.years);
    spread(pairs.filter_map(|(was, with)| Some(read(&with.signs)? - read(&was.signs)?)))
}

/// The signs of one canal, year by year.
pub(super) fn canal_years(run: &Run, gate: usize) -> impl Iterator<Item = &CanalSigns> {
    run.years.iter().filter_map(move |year| year.signs.canals.get(gate))
}

/// Mean and range of something read off one canal.
pub(super) fn of_canal(run: &Run, gate: usize, read: impl Fn(&CanalSigns) -> Option<f64>) -> Option<Spread> {
    spread(canal_years(run, gate).filter_map(read))
}

/// How reliable one canal's supply was.
pub(super) fn canal_performance(run: &Run, gate: usize, enough_share: f64) -> Option<Performance> {
    performance(canal_years(run, gate).map(|canal| (canal.demand_hm3, canal.delivered_hm3)), enough_share)
}

/// How reliable the supply of all canals together was.
pub(super) fn overall_performance(run: &Run, enough_share: f64) -> Option<Performance> {
    let years = run.years.iter().map(|year| {
        let canals = &year.signs.canals;
        let sum = |read: fn(&CanalSigns) -> f64| canals.iter().map(read).sum::<f64>();
        (sum(|canal| canal.demand_hm3), sum(|canal| canal.delivered_hm3))
    });
    performance(years, enough_share)
}

/// The accounts of all the years shown, which must follow one another; `None` without any.
pub(super) fn whole_ledger(run: &Run) -> Option<Ledger> {
    let (first, rest) = run.years.split_first()?;
    let mut whole = first.ledger;
    rest.iter().for_each(|year| whole.append(&year.ledger));
    Some(whole)
}

/// What is not explained and what went through, m³, summed over the years shown.
pub(super) fn closure_m3(run: &Run) -> (f64, f64) {
    let sum = |read: fn(&Ledger) -> f64| run.years.iter().map(|year| read(&year.ledger)).sum::<f64>();
    (sum(|ledger| ledger.residual_m3().abs()), sum(|ledger| ledger.in_m3().max(ledger.out_m3())))
}

/// Gates by the date of their right, the oldest first; of one date the upper one first.
pub(super) fn gates_by_right(valley: &Valley) -> Vec<usize> {
    let mut order: Vec<usize> = (0..valley.gates.len()).collect();
    order.sort_by_key(|gate| (valley.gates[*gate].right_date, *gate));
    order
}
