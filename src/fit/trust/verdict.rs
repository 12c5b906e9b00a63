//! What a model may be used for here: for each use one score, and two thresholds on it.
//!
//! The thresholds are common practice without a source unless another one is named; they are told with every verdict, so
//! that nobody has to believe the word alone.

use super::flow::FlowTrust;
use super::store::StoreTrust;
use crate::fit::split::{FAILS_BEYOND, HOLDS_WITHIN, Parting, SplitTest, Transfer};

/// What people use the model for.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Use {
    /// Which way it goes when it gets warmer.
    Direction,
    /// When the water comes.
    Timing,
    /// How much comes in a year.
    Volume,
    /// What is left in late summer.
    LateSummer,
    /// How full the lake is.
    Storage,
    /// What the canals get.
    Deliveries,
}

impl Use {
    /// All of them, in the order in which they are told.
    pub const ALL: [Self; 6] =
        [Self::Direction, Self::Timing, Self::Volume, Self::LateSummer, Self::Storage, Self::Deliveries];

    /// Its stable key.
    pub const fn key(self) -> &'static str {
        match self {
            Self::Direction => "direction",
            Self::Timing => "timing",
            Self::Volume => "volume",
            Self::LateSummer => "late_summer",
            Self::Storage => "storage",
            Self::Deliveries => "deliveries",
        }
    }
}

/// The score that a verdict looks at; smaller is better in each.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Score {
    /// Kling–Gupta efficiency that the worse of cold and warm years loses where the set never saw them.
    LossWarmCold,
    /// Mean size of the error of the day on which half of the year's water is past, days.
    HalfDayError,
    /// Mean size of the error of a year's volume, % of the mean.
    AnnualError,
    /// Mean size of the error of late summer's volume, % of the mean.
    LateSummerError,
    /// Mean size of the daily error of storage, % of the active capacity.
    StorageError,
    /// Mean size of the daily error of what all recorded canals took, % of the mean.
    DeliveryError,
}

impl Score {
    /// Its stable key.
    pub const fn key(self) -> &'static str {
        match self {
            Self::LossWarmCold => "loss_warm_cold",
            Self::HalfDayError => "half_day_error_days",
            Self::AnnualError => "annual_error_percent",
            Self::LateSummerError => "late_summer_error_percent",
            Self::StorageError => "storage_error_percent",
            Self::DeliveryError => "delivery_error_percent",
        }
    }

    /// Up to the first the answer is yes, up to the second in part, beyond it no. The loss has those of the split-sample
    /// test; the others: a week and two, a tenth and a fifth, and for late summer, when little water flows, twice as much
    /// and no more than a third.
    pub const fn thresholds(self) -> (f64, f64) {
        match self {
            Self::LossWarmCold => (HOLDS_WITHIN, FAILS_BEYOND),
            Self::HalfDayError => (7.0, 14.0),
            Self::LateSummerError => (20.0, 33.0),
            Self::AnnualError | Self::StorageError | Self::DeliveryError => (10.0, 20.0),
        }
    }
}

/// What would have to be there for a verdict.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Need {
    /// A river gauge with at least a whole year.
    Gauge,
    /// Test years: a fit with halves judged by halves.
    Tests,
    /// A record of the lake.
    StorageRecord,
    /// A record of a canal.
    DiversionRecord,
}

impl Need {
    /// Its stable key.
    pub const fn key(self) -> &'static str {
        match self {
            Self::Gauge => "gauge",
            Self::Tests => "tests",
            Self::StorageRecord => "storage_record",
            Self::DiversionRecord => "diversion_record",
        }
    }
}

/// A verdict.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Ruling {
    /// For what.
    pub of: Use,
    /// The score that was looked at.
    pub score: Score,
    /// Its value, or what is lacking for one.
    pub value: Result<f64, Need>,
    /// Whether a score that is no number, or a guess without a model that was better, makes it a no all the same.
    pub beaten: bool,
}

/// What a verdict says.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Known {
    /// It may be used for that.
    Yes,
    /// It may, with care.
    Partly,
    /// It may not.
    No,
    /// Nobody knows.
    Unknown,
}

impl Known {
    /// Its stable key.
    pub const fn key(self) -> &'static str {
        match self {
            Self::Yes => "yes",
            Self::Partly => "partly",
            Self::No => "no",
            Self::Unknown => "unknown",
        }
    }
}

impl Ruling {
    /// What it says.
    pub fn known(&self) -> Known {
        let (good, fair) = self.score.thresholds();
        match self.value {
            Err(_) => Known::Unknown,
            // Written so that a value that is no number is a no.
            Ok(value) if value <= good && !self.beaten => Known::Yes,
            Ok(value) if value <= fair && !self.beaten => Known::Partly,
            Ok(_) => Known::No,
        }
    }
}

/// What the verdicts are drawn from.
#[derive(Clone, Copy, Debug)]
pub struct Evidence<'e> {
    /// The river, on years that it never saw where there are any.
    pub flow: Option<&'e FlowTrust>,
    /// Halves judged by halves.
    pub tests: &'e [SplitTest],
    /// The lake, and its active capacity, hm³; `None` without a lake or its record.
    pub storage: Option<(&'e StoreTrust, f64)>,
    /// Whether the place has a lake at all.
    pub has_lake: bool,
    /// The recorded canals.
    pub canals: &'e [StoreTrust],
    /// Whether the place has canals at all.
    pub has_canals: bool,
}

/// A verdict for every use that the place has.
pub fn rule(evidence: &Evidence<'_>) -> Vec<Ruling> {
    let of_flow = |value: fn(&FlowTrust) -> Option<f64>| evidence.flow.and_then(value).ok_or(Need::Gauge);
    let ruling = |of, score, value| Ruling { of, score, value, beaten: false };
    let mut rulings = vec![
        direction(evidence),
        ruling(Use::Timing, Score::HalfDayError, of_flow(FlowTrust::half_day_error)),
        ruling(Use::Volume, Score::AnnualError, of_flow(FlowTrust::annual_error_percent)),
        ruling(Use::LateSummer, Score::LateSummerError, of_flow(FlowTrust::late_summer_error_percent)),
    ];
    if evidence.has_lake {
        let value = evidence.storage.filter(|(_, active_hm3)| *active_hm3 > 0.0);
        let value = value.map(|(lake, active_hm3)| 100.0 * lake.mean_error / active_hm3).ok_or(Need::StorageRecord);
        rulings.push(ruling(Use::Storage, Score::StorageError, value));
    }
    if evidence.has_canals {
        let sum = |value: fn(&StoreTrust) -> f64| evidence.canals.iter().map(value).sum::<f64>();
        let (error, mean) = (sum(|canal| canal.mean_error), sum(|canal| canal.mean_observed));
        let value = if mean > 0.0 { Ok(100.0 * error / mean) } else { Err(Need::DiversionRecord) };
        rulings.push(ruling(Use::Deliveries, Score::DeliveryError, value));
    }
    rulings
}

/// Warm years judged by cold ones and the other way round; a change of regime between earlier and later years breaks the
/// direction too, whatever their warmth.
fn direction(evidence: &Evidence<'_>) -> Ruling {
    let loss = |test: &SplitTest| {
        // A loss that is not defined is none that could be lived with.
        test.halves.iter().map(|half| half.loss().unwrap_or(f64::INFINITY)).fold(f64::NEG_INFINITY, f64::max)
    };
    let warm_cold = evidence.tests.iter().find(|test| test.parting == Parting::ColderWarmer);
    Ruling {
        of: Use::Direction,
        score: Score::LossWarmCold,
        value: match evidence.flow {
            None => Err(Need::Gauge),
            Some(_) => warm_cold.map(loss).ok_or(Need::Tests),
        },
        beaten: evidence.tests.iter().any(|test| test.transfer() == Transfer::Fails),
    }
}
