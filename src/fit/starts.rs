//! Independent searches from many starts, run in groups on all cores.
//!
//! Each start has its own stream of random numbers under the seed, and a set its own score whatever its company, so the
//! result is the same for any number of threads.

use std::sync::atomic::{AtomicBool, Ordering};

use rayon::prelude::*;

use super::record::FitError;
use super::search::Search;
use super::trial::{LANES, Trial};
use crate::generator::random::{Purpose, Stream};

/// How a fit can be watched and stopped.
#[derive(Clone, Copy)]
pub struct Watch<'w> {
    /// Once true, the search ends after the runs that are under way and keeps the best so far.
    pub stop: &'w AtomicBool,
    /// Told, from any thread, after every few runs.
    pub progress: &'w (dyn Fn(Progress) + Sync),
}

/// How far a fit has come.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Progress {
    /// Runs done.
    pub runs: usize,
    /// Runs in all.
    pub of: usize,
    /// The best score so far of the fit to all years; minus infinity before the first.
    pub best_score: f64,
}

/// A point that was tried.
#[derive(Clone, Debug, PartialEq)]
pub struct Tried {
    /// Which start tried it, from 0.
    pub start: usize,
    /// In the unit cube.
    pub point: Vec<f64>,
    /// Its score; minus infinity where not defined.
    pub score: f64,
}

/// All that a search from many starts tried.
#[derive(Clone, Debug, PartialEq)]
pub struct Searched {
    /// Start by start, in the order in which each tried them.
    pub tried: Vec<Tried>,
    /// Index of the best.
    pub best: usize,
    /// Whether it was stopped before its end.
    pub stopped: bool,
}

impl Searched {
    /// The best point.
    pub fn best(&self) -> &Tried {
        &self.tried[self.best]
    }
}

/// Searches from `starts` starts with `runs_per_start` runs each; `each` is told the runs done since it was last told,
/// and the best score of the starts that did them.
///
/// # Errors
/// [`FitError::WrongSetting`] for no starts or no runs, [`FitError::NothingScored`] if no run had a score.
pub fn search(
    trial: &Trial<'_>,
    starts: usize,
    runs_per_start: usize,
    seed: u64,
    stop: &AtomicBool,
    each: &(dyn Fn(usize, f64) + Sync),
) -> Result<Searched, FitError> {
    if starts == 0 {
        return Err(FitError::WrongSetting { name: "starts" });
    }
    if runs_per_start == 0 {
        return Err(FitError::WrongSetting { name: "runs_per_start" });
    }
    let mut seeds = Stream::new(seed, Purpose::Starts);
    let mut searches: Vec<Search> =
        (0..starts).map(|_| Search::new(trial.dimensions(), runs_per_start, seeds.bits())).collect();
    // One walk also looks at what the preparer wrote down before any fit.
    searches[0] = searches[0].clone().with_first_guess(&trial.own_point());
    let groups: Vec<(Vec<Scored>, bool)> =
        searches.par_chunks(LANES).map(|group| search_group(trial, group.to_vec(), stop, each)).collect();

    let stopped = groups.iter().any(|(_, stopped)| *stopped);
    let by_start = groups.into_iter().flat_map(|(by_start, _)| by_start).enumerate();
    let tried: Vec<Tried> = by_start
        .flat_map(|(start, tried)| tried.into_iter().map(move |(point, score)| Tried { start, point, score }))
        .collect();
    let mut best = None;
    for (index, one) in tried.iter().enumerate() {
        if one.score > best.map_or(f64::NEG_INFINITY, |best: usize| tried[best].score) {
            best = Some(index);
        }
    }
    let best = best.ok_or(FitError::NothingScored)?;
    Ok(Searched { tried, best, stopped })
}

/// The points of one start and their scores, in the order in which they were tried.
type Scored = Vec<(Vec<f64>, f64)>;

/// Runs the starts of a group side by side; what each tried, and whether they were stopped.
fn search_group(
    trial: &Trial<'_>,
    mut searches: Vec<Search>,
    stop: &AtomicBool,
    each: &(dyn Fn(usize, f64) + Sync),
) -> (Vec<Scored>, bool) {
    let mut room = trial.room();
    let mut scores = [f64::NEG_INFINITY; LANES];
    let mut tried: Vec<Scored> = vec![Vec::new(); searches.len()];
    let mut stopped = false;
    while searches.iter().any(|search| !search.is_over()) {
        for search in &mut searches {
            search.propose();
        }
        trial.score(searches.iter().map(Search::candidate), &mut room, &mut scores);
        let mut best_score = f64::NEG_INFINITY;
        for ((search, score), tried) in searches.iter_mut().zip(scores).zip(&mut tried) {
            tried.push((search.candidate().to_vec(), score));
            search.learn(score);
            best_score = best_score.max(search.best_score());
        }
        each(searches.len(), best_score);
        // Looked at only after the first runs: a search that is stopped at once still has a best.
        if stop.load(Ordering::Relaxed) {
            stopped = searches.iter().any(|search| !search.is_over());
            break;
        }
    }
    (tried, stopped)
}
