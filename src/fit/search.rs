//! Dynamically dimensioned search: a walk from the best point so far that changes ever fewer numbers at a time.
//!
//! Tolson & Shoemaker (2007), *Water Resources Research* 43, W01413. The search knows nothing of water: it asks for the
//! score of a point of the unit cube ([`Search::propose`]) and is told it ([`Search::learn`]), so that several searches
//! can share one run of the engine. Higher scores are better.
//!
//! The paper's steps: a first guess, here the best of `max(5, 0.005 m)` random points; then at iteration `i` of `m` each
//! dimension is changed with probability `1 − ln i / ln m`, at least one always, by a normal step of `r` times its
//! range, reflected at the bounds; the new point is kept if it is no worse.

use crate::generator::random::{Purpose, Stream};

/// Size of a step as a share of the range: the paper's default `r`.
pub const STEP_SHARE: f64 = 0.2;
/// Fewest points tried before the walk begins.
const FEWEST_FIRST_GUESSES: usize = 5;
/// Share of all points that are first guesses.
const FIRST_GUESS_SHARE: f64 = 0.005;

/// Probability that a dimension is changed at `iteration` (from 1) of `iterations`: `1 − ln i / ln m` (step 3 of the
/// paper). 1 for a walk of a single iteration.
pub fn inclusion_probability(iteration: usize, iterations: usize) -> f64 {
    if iterations <= 1 {
        return 1.0;
    }
    1.0 - libm::log(iteration as f64) / libm::log(iterations as f64)
}

/// Brings a coordinate back between 0 and 1: mirrored at the bound that it passed, or put on that bound where the mirror
/// image lies beyond the other one (step 3 of the paper).
pub fn reflect(coordinate: f64) -> f64 {
    if coordinate < 0.0 {
        if -coordinate > 1.0 { 0.0 } else { -coordinate }
    } else if coordinate > 1.0 {
        let mirrored = 2.0 - coordinate;
        if mirrored < 0.0 { 1.0 } else { mirrored }
    } else {
        coordinate
    }
}

/// How many of `points` are first guesses.
pub fn first_guesses(points: usize) -> usize {
    let share = libm::round(FIRST_GUESS_SHARE * points as f64) as usize;
    share.max(FEWEST_FIRST_GUESSES).min(points)
}

/// One walk through the unit cube.
#[derive(Clone, Debug)]
pub struct Search {
    random: Stream,
    own_guess: bool,
    step_share: f64,
    first_guesses: usize,
    iterations: usize,
    tried: usize,
    candidate: Vec<f64>,
    changed: usize,
    best: Vec<f64>,
    best_score: f64,
}

impl Search {
    /// A walk that tries `points` points of `dimensions` coordinates.
    pub fn new(dimensions: usize, points: usize, seed: u64) -> Self {
        let guesses = first_guesses(points);
        Self {
            random: Stream::new(seed, Purpose::Search),
            own_guess: false,
            step_share: STEP_SHARE,
            first_guesses: guesses,
            iterations: points - guesses,
            tried: 0,
            candidate: vec![0.5; dimensions],
            changed: 0,
            best: vec![0.5; dimensions],
            best_score: f64::NEG_INFINITY,
        }
    }

    /// The same walk with another size of step, a share of the range.
    #[must_use]
    pub fn with_step_share(mut self, step_share: f64) -> Self {
        self.step_share = step_share;
        self
    }

    /// The same walk whose first guess is `point` and not a random one, as the paper allows.
    #[must_use]
    pub fn with_first_guess(mut self, point: &[f64]) -> Self {
        self.own_guess = point.len() == self.candidate.len();
        if self.own_guess {
            self.candidate.copy_from_slice(point);
        }
        self
    }

    /// Whether all points have been tried.
    pub fn is_over(&self) -> bool {
        self.tried >= self.first_guesses + self.iterations
    }

    /// The next point to score. Its score is told by [`Search::learn`] before the next is asked for.
    pub fn propose(&mut self) -> &[f64] {
        if self.tried == 0 && self.own_guess {
            self.changed = self.candidate.len();
            return &self.candidate;
        }
        if self.tried < self.first_guesses {
            for coordinate in &mut self.candidate {
                *coordinate = self.random.uniform();
            }
            self.changed = self.candidate.len();
            return &self.candidate;
        }
        let iteration = self.tried - self.first_guesses + 1;
        let probability = inclusion_probability(iteration, self.iterations);
        self.candidate.copy_from_slice(&self.best);
        self.changed = 0;
        for index in 0..self.candidate.len() {
            if self.random.uniform() < probability {
                self.step(index);
            }
        }
        if self.changed == 0 && !self.candidate.is_empty() {
            let dimensions = self.candidate.len();
            // `uniform` is below 1, but the product may round up to the count.
            let index = ((self.random.uniform() * dimensions as f64) as usize).min(dimensions - 1);
            self.step(index);
        }
        &self.candidate
    }

    fn step(&mut self, index: usize) {
        self.candidate[index] = reflect(self.best[index] + self.step_share * self.random.normal());
        self.changed += 1;
    }

    /// Takes the score of the point last proposed; a score that is not a number counts as the worst.
    pub fn learn(&mut self, score: f64) {
        self.tried += 1;
        let is_first = self.tried == 1;
        if is_first || score >= self.best_score {
            self.best.copy_from_slice(&self.candidate);
            self.best_score = if score.is_nan() { f64::NEG_INFINITY } else { score };
        }
    }

    /// The point last proposed.
    pub fn candidate(&self) -> &[f64] {
        &self.candidate
    }

    /// How many coordinates the point last proposed changed.
    pub fn changed(&self) -> usize {
        self.changed
    }

    /// The best point so far.
    pub fn best(&self) -> &[f64] {
        &self.best
    }

    /// Its score; minus infinity before any point was scored.
    pub fn best_score(&self) -> f64 {
        self.best_score
    }
}
