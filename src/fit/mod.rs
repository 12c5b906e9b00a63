//! Fits a valley to its gauge, and finds out how far the fit can be trusted.
//!
//! [`fit`] does it all: it parts the years in halves and judges each half's fit on the other ([`split`]), fits all years
//! ([`starts`], [`mod@search`]), and keeps an ensemble of sets that fit nearly as well ([`ensemble`]). [`report::FitFile`] is
//! what is kept of it. The same records, settings and seed give the same bits on every target and any number of threads.
//!
//! Which numbers are fitted, and between which bounds, is in [`parameters`]; what "well" means in [`objective`].

pub mod ensemble;
pub mod objective;
pub mod parameters;
pub mod record;
pub mod report;
pub mod search;
pub mod split;
pub mod starts;
pub mod trial;
pub mod trust;

pub use objective::Objective;
pub use parameters::{Parameter, PrecipitationCorrection, apply};
pub use record::{FitError, Measures, Record, SnowAt, SnowRecord};
pub use report::{FitFile, FitFileError, FittedParameter, FittedSet};
pub use split::{Half, Parting, Scores, SplitTest, Transfer};
pub use starts::{Progress, Watch};

use std::sync::Mutex;

use rayon::prelude::*;

use crate::water::run::WaterYear;
use crate::water::valley::Valley;
use ensemble::{Spread, choose};
use record::Target;
use starts::{Searched, search};
use trial::Trial;

/// How to fit.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Settings {
    /// Seed of the search.
    pub seed: u64,
    /// Independent starts, each with a search of its own.
    pub starts: usize,
    /// Runs of each start.
    pub runs_per_start: usize,
    /// What to make large.
    pub objective: Objective,
    /// Which correction of precipitation to fit.
    pub correction: PrecipitationCorrection,
    /// Whole water years at the start of the record that are run but not scored.
    pub warm_up_years: usize,
    /// First and last water year to fit to; `None` for all that the gauge has.
    pub years: Option<(i32, i32)>,
    /// Whether to fit and judge halves too.
    pub split: bool,
    /// Distance from the best score within which a set belongs to the ensemble.
    pub distance: f64,
    /// Sets to keep in the ensemble; never fewer than [`ensemble::FEWEST_SETS`].
    pub sets: usize,
}

impl Default for Settings {
    fn default() -> Self {
        Self {
            seed: 1,
            starts: 8,
            runs_per_start: 1500,
            objective: Objective::default(),
            correction: PrecipitationCorrection::default(),
            warm_up_years: 1,
            years: None,
            split: true,
            distance: ensemble::DISTANCE,
            sets: ensemble::SETS,
        }
    }
}

/// A fitted valley, and what is known about the fit.
#[derive(Clone, Debug, PartialEq)]
pub struct Fit {
    /// What was fitted.
    pub parameters: Vec<Parameter>,
    /// Water years that were fitted to.
    pub water_years: Vec<i32>,
    /// Scores of the best set on them.
    pub scores: Scores,
    /// The best set, then the rest of the ensemble.
    pub sets: Vec<FittedSet>,
    /// How the ensemble was chosen.
    pub spread: Spread,
    /// Halves judged by halves; empty if not asked for, or as `untested` says.
    pub tests: Vec<SplitTest>,
    /// Why halves could not be judged, if they were to be.
    pub untested: Option<FitError>,
    /// Whether a search was stopped before its end.
    pub stopped: bool,
}

/// Fits `valley` to `record`.
///
/// # Errors
/// See [`FitError`]. Too few years for halves is no error: the fit then says that it is untested.
pub fn fit(valley: &Valley, record: &Record<'_>, settings: &Settings, watch: &Watch<'_>) -> Result<Fit, FitError> {
    record.check(settings.objective)?;
    // Not a plain comparison, so that NaN is refused too.
    if settings.distance.is_nan() || settings.distance < 0.0 {
        return Err(FitError::WrongSetting { name: "distance" });
    }
    let parameters = Parameter::fitted(valley, settings.correction);
    let mut years = record.gauged_years(valley.water_year_start_month, settings.warm_up_years);
    if let Some((first, last)) = settings.years {
        years.retain(|year| (first..=last).contains(&year.water_year));
    }
    if years.is_empty() {
        return Err(FitError::TooFewYears { found: 0, needed: 1 });
    }
    let whole = record.target(&years, settings.objective)?;
    let (partings, untested) = match partings(record, &years, settings) {
        Ok(partings) => (partings, None),
        Err(error) => (Vec::new(), Some(error)),
    };

    let mut targets = vec![&whole];
    targets.extend(partings.iter().flat_map(|parted| &parted.targets));
    let searches = search_all(valley, record, &parameters, &targets, settings, watch)?;
    let trial = Trial::new(valley, &parameters, *record, &whole, settings.objective);
    let best_of = |index: usize| trial.values_at(&searches[index].best().point);

    let tests = partings.iter().enumerate().map(|(index, parted)| {
        let bests = [best_of(1 + 2 * index), best_of(2 + 2 * index)];
        judge(&trial, record, parted, &bests, settings.objective)
    });
    let tests = tests.collect();

    let chosen = choose(&searches[0].tried, searches[0].best, settings.distance, settings.sets);
    let set = |index: &usize| {
        let tried = &searches[0].tried[*index];
        FittedSet { score: tried.score, values: trial.values_at(&tried.point) }
    };
    let sets: Vec<FittedSet> = chosen.kept.iter().map(set).collect();
    let best = trial.run(&sets[0].values);
    Ok(Fit {
        scores: Scores::of(settings.objective, &best.flow_m3s, &best.snow_mm, &whole),
        water_years: years.iter().map(|year| year.water_year).collect(),
        parameters: parameters.clone(),
        sets,
        spread: Spread {
            distance_asked: settings.distance,
            distance: chosen.distance,
            behavioural: chosen.behavioural,
        },
        tests,
        untested,
        stopped: searches.iter().any(|searched| searched.stopped),
    })
}

/// Years parted in two, and what is scored on each half.
struct Parted {
    parting: Parting,
    halves: [Vec<WaterYear>; 2],
    targets: [Target; 2],
}

fn partings(record: &Record<'_>, years: &[WaterYear], settings: &Settings) -> Result<Vec<Parted>, FitError> {
    if !settings.split {
        return Ok(Vec::new());
    }
    let of = |parting| {
        let halves = split::part(record, years, parting)?;
        let targets = [record.target(&halves[0], settings.objective)?, record.target(&halves[1], settings.objective)?];
        Ok(Parted { parting, halves, targets })
    };
    [Parting::EarlierLater, Parting::ColderWarmer].into_iter().map(of).collect()
}

/// Searches all targets at the same time; the first is the fit to all years, whose best score is told.
fn search_all(
    valley: &Valley,
    record: &Record<'_>,
    parameters: &[Parameter],
    targets: &[&Target],
    settings: &Settings,
    watch: &Watch<'_>,
) -> Result<Vec<Searched>, FitError> {
    let of = targets.len() * settings.starts * settings.runs_per_start;
    let sofar = Mutex::new(Progress { runs: 0, of, best_score: f64::NEG_INFINITY });
    let one = |(index, target): (usize, &&Target)| {
        let trial = Trial::new(valley, parameters, *record, target, settings.objective);
        let each = |runs: usize, best_score: f64| {
            // A watcher that panicked must not take the fit with it: the numbers are whole at any moment.
            let mut progress = sofar.lock().unwrap_or_else(std::sync::PoisonError::into_inner);
            progress.runs += runs;
            if index == 0 {
                progress.best_score = progress.best_score.max(best_score);
            }
            (watch.progress)(*progress);
        };
        search(&trial, settings.starts, settings.runs_per_start, settings.seed, watch.stop, &each)
    };
    targets.par_iter().enumerate().map(one).collect()
}

fn judge(
    trial: &Trial<'_>,
    record: &Record<'_>,
    parted: &Parted,
    bests: &[Vec<f64>; 2],
    objective: Objective,
) -> SplitTest {
    let runs = bests.each_ref().map(|best| trial.run(best));
    let half = |own: usize| {
        let (other, target) = (1 - own, &parted.targets[own]);
        let scores = |run: &trial::Modelled| Scores::of(objective, &run.flow_m3s, &run.snow_mm, target);
        Half {
            water_years: parted.halves[own].iter().map(|year| year.water_year).collect(),
            mean_temperature_c: split::mean_temperature_c(record, &parted.halves[own]),
            values: bests[own].clone(),
            fitted: scores(&runs[own]),
            judged: scores(&runs[other]),
            guess_kling_gupta: split::guess(record, &parted.targets[other], target),
        }
    };
    SplitTest { parting: parted.parting, halves: [half(0), half(1)] }
}
