//! The sentences of the pages beside the year: the accounts, all the years, trust, what the model is.

use super::facts::{Verdict, YearMeasure};
use super::scene::{RunShown, Scene};
use crate::signs::{YearReport, spread};
use crate::water::ledger::{Flow, Ledger};
use crate::words::{Quantity, Words};

/// How many years were enough, of those in which water was asked for.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Enough {
    /// Years that were.
    pub years: usize,
    /// Years in which any water was asked for.
    pub of: usize,
}

/// What one of these pages says.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum PageAnswer {
    /// What the river brings for each 100 parts that fall on the basin.
    RiverParts {
        /// With your changes.
        now: f64,
        /// As it was; `None` where nothing is turned or nothing fell.
        before: Option<f64>,
    },
    /// Nothing fell on the basin in the year.
    NothingFell,
    /// There is no year to tell of.
    NoYear,
    /// In how many years the water was enough.
    Enough {
        /// With your changes.
        now: Enough,
        /// As it was; `None` where nothing is turned.
        before: Option<Enough>,
    },
    /// What the snow or the river brings in a mean year.
    Mean {
        /// Which of the two, and never the supply.
        measure: YearMeasure,
        /// With your changes, in the unit of the measure.
        now: f64,
        /// As it was; `None` where nothing is turned.
        before: Option<f64>,
    },
    /// The place is made up and its model was not fitted.
    Invented,
    /// The model was not fitted.
    NotFitted,
    /// It was fitted, and there is no test of it.
    Untested,
    /// It was fitted and tested; the worst verdict.
    Tested(Verdict),
    /// What the model is.
    Model,
}

impl PageAnswer {
    /// What the ledger says.
    pub fn ledger(scene: &Scene<'_>) -> Self {
        let Some(now) = ledger_of(&scene.now) else { return Self::NoYear };
        let Some(parts) = river_parts(now) else { return Self::NothingFell };
        let was = ledger_of(&scene.was).filter(|_| scene.changed());
        Self::RiverParts { now: parts, before: was.and_then(river_parts) }
    }

    /// What the page of all years says.
    pub fn years(scene: &Scene<'_>) -> Self {
        let changed = |run| Some(run).filter(|_| scene.changed());
        match shown_measure(scene) {
            _ if scene.now.years.is_empty() => Self::NoYear,
            YearMeasure::Supply => {
                let count = |run: &RunShown<'_>| enough(run.years, scene.all_years.enough_share);
                Self::Enough { now: count(&scene.now), before: changed(&scene.was).map(count) }
            }
            measure => {
                let mean = |run: &RunShown<'_>| {
                    let values = run.years.iter().filter_map(|report| value_of(report, measure));
                    spread(values).map_or(0.0, |spread| spread.mean)
                };
                Self::Mean { measure, now: mean(&scene.now), before: changed(&scene.was).map(mean) }
            }
        }
    }

    /// What the trust page says.
    pub fn trust(scene: &Scene<'_>) -> Self {
        match scene.skill.filter(|_| scene.fitted) {
            _ if !scene.fitted && scene.invented => Self::Invented,
            _ if !scene.fitted => Self::NotFitted,
            Some(skill) => skill.worst().map_or(Self::Untested, Self::Tested),
            None => Self::Untested,
        }
    }

    /// The sentence.
    pub fn say(&self, scene: &Scene<'_>, words: &Words) -> String {
        let parts = |share: f64| words.number(share * 100.0, 0).into();
        match *self {
            Self::RiverParts { now, before: None } => words.say("page-ledger-parts", &[("n", parts(now))]),
            Self::RiverParts { now, before: Some(before) } => {
                words.say("page-ledger-parts-changed", &[("n", parts(now)), ("before", parts(before))])
            }
            Self::NothingFell => words.say("page-ledger-nothing-fell", &[]),
            Self::NoYear => words.say("page-no-year", &[]),
            Self::Enough { now: Enough { of: 0, .. }, .. } => words.say("page-years-nobody-asks", &[]),
            Self::Enough { now, before } => {
                let now_args = [("years", now.years.into()), ("of", now.of.into())];
                match before {
                    None => words.say("page-years-enough", &now_args),
                    Some(before) if before == now => words.say("page-years-enough-same", &now_args),
                    Some(before) => {
                        let [years, of] = now_args;
                        let (was_years, was_of) = (("was-years", before.years.into()), ("was-of", before.of.into()));
                        if before.of == now.of {
                            words.say("page-years-enough-changed", &[years, of, was_years])
                        } else {
                            words.say("page-years-enough-changed-of", &[years, of, was_years, was_of])
                        }
                    }
                }
            }
            Self::Mean { measure, now, before } => {
                let (id, quantity) = match measure {
                    YearMeasure::Snow => ("page-years-snow", Quantity::SnowWater),
                    YearMeasure::Supply | YearMeasure::Flow => ("page-years-flow", Quantity::StoredVolume),
                };
                let amount = |value: f64| words.quantity(value, quantity, scene.units, 3).into();
                match before {
                    None => words.say(id, &[("now", amount(now))]),
                    Some(before) => {
                        words.say(&format!("{id}-changed"), &[("now", amount(now)), ("before", amount(before))])
                    }
                }
            }
            Self::Invented => words.say("page-trust-invented", &[]),
            Self::NotFitted => words.say("page-trust-not-fitted", &[]),
            Self::Untested => words.say("page-trust-untested", &[]),
            Self::Tested(Verdict::Holds) => words.say("model-strong", &[]),
            Self::Tested(Verdict::Weakens) => words.say("page-trust-weaker", &[]),
            Self::Tested(Verdict::Fails) => words.say("model-weak", &[]),
            Self::Model => words.say("model-calm", &[]),
        }
    }
}

/// The accounts of the chosen year.
pub(super) fn ledger_of<'a>(run: &RunShown<'a>) -> Option<&'a Ledger> {
    run.years.get(run.chosen_year).map(|report| &report.ledger)
}

/// What the river brings to the dam over what falls on the basin.
fn river_parts(ledger: &Ledger) -> Option<f64> {
    let fell_m3 = ledger.of(Flow::BasinPrecipitation);
    (fell_m3 > 0.0).then(|| ledger.of(Flow::NaturalInflow) / fell_m3)
}

/// Years that got at least their share, of those in which water was asked for.
pub fn enough(years: &[YearReport], enough_share: f64) -> Enough {
    let asked = years.iter().filter_map(|report| report.signs.supply_ratio);
    asked.fold(Enough { years: 0, of: 0 }, |count, share| Enough {
        years: count.years + usize::from(share >= enough_share),
        of: count.of + 1,
    })
}

/// The measure of all years: the flow of the river where nobody ever asks for water.
pub(super) fn shown_measure(scene: &Scene<'_>) -> YearMeasure {
    let asked = |run: &RunShown<'_>| run.years.iter().any(|report| report.signs.supply_ratio.is_some());
    match scene.all_years.measure {
        YearMeasure::Supply if !asked(&scene.now) && !asked(&scene.was) => YearMeasure::Flow,
        measure => measure,
    }
}

/// A year's value of a measure, in its own unit (share, mm, hm³).
pub(super) fn value_of(report: &YearReport, measure: YearMeasure) -> Option<f64> {
    match measure {
        YearMeasure::Supply => report.signs.supply_ratio,
        YearMeasure::Snow => Some(report.signs.peak_swe_mm),
        YearMeasure::Flow => Some(report.signs.natural_flow_hm3),
    }
}
