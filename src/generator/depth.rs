//! How much falls on a wet day: the mixed exponential distribution (Woolhiser and Roldán 1982).
//!
//! Woolhiser and Roldán (1982, "Stochastic daily precipitation models 2", Water Resources Research 18(5):1461–1468)
//! found the mixed exponential to fit daily depths better than the gamma; it is taken for every month because it also
//! has a closed inverse — two even numbers make one depth, whatever they are — and because read off a gauge that counts
//! in steps it becomes a mixture of two geometric distributions exactly, so that a coarse gauge needs no special care.
//!
//! A wet day is one with at least half a step of the gauge. The depth is that half step plus a mixed exponential part;
//! rounded to whole steps it is 1, 2, 3 … steps.

/// Depth of rain on wet days at one time of the year; the parts are beyond half a step.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct MixedExponential {
    /// Share of wet days with light precipitation (0–1).
    pub light_share: f64,
    /// Mean of the light part, mm.
    pub light_mean_mm: f64,
    /// Mean of the heavy part, mm.
    pub heavy_mean_mm: f64,
}

impl MixedExponential {
    /// A depth beyond the first half step, mm, from two even numbers between 0 and 1.
    pub fn draw(&self, which: f64, how_much: f64) -> f64 {
        let mean = if which < self.light_share { self.light_mean_mm } else { self.heavy_mean_mm };
        -mean * libm::log(how_much)
    }

    /// The same shape with both parts multiplied.
    pub fn times(&self, factor: f64) -> Self {
        Self { light_mean_mm: self.light_mean_mm * factor, heavy_mean_mm: self.heavy_mean_mm * factor, ..*self }
    }

    /// Mean and mean square of the whole depth, mm and mm²; `rounded` says whether it is read in whole steps.
    pub fn moments(&self, step_mm: f64, rounded: bool) -> (f64, f64) {
        let part = |mean_mm: f64| {
            if rounded {
                // Steps 1, 2, 3 … with chance (1 − q) q^(n−1).
                let q = libm::exp(-step_mm / mean_mm);
                (step_mm / (1.0 - q), step_mm * step_mm * (1.0 + q) / ((1.0 - q) * (1.0 - q)))
            } else {
                let least = 0.5 * step_mm;
                (least + mean_mm, least * least + 2.0 * least * mean_mm + 2.0 * mean_mm * mean_mm)
            }
        };
        let (light, light_square) = part(self.light_mean_mm);
        let (heavy, heavy_square) = part(self.heavy_mean_mm);
        let rest = 1.0 - self.light_share;
        (self.light_share * light + rest * heavy, self.light_share * light_square + rest * heavy_square)
    }

    /// Fits the mixture to depths given in whole steps of the gauge (1, 2, 3 …), by expectation and maximisation
    /// (Dempster, Laird and Rubin 1977). `None` if there are no depths.
    pub fn fit(steps: &[u32], step_mm: f64) -> Option<Self> {
        if steps.is_empty() {
            return None;
        }
        let beyond: Vec<f64> = steps.iter().map(|&count| f64::from(count.max(1) - 1)).collect();
        let mean = beyond.iter().sum::<f64>() / beyond.len() as f64;
        if mean == 0.0 {
            // Every wet day is one step: the shortest part that still reads as one step nearly always.
            let mean_mm = SHORTEST_PART_STEPS * step_mm;
            return Some(Self { light_share: 0.5, light_mean_mm: mean_mm, heavy_mean_mm: mean_mm });
        }
        let (mut light_share, mut light, mut heavy) = (0.5, 0.4 * mean, 1.6 * mean);
        for _ in 0..MOST_ROUNDS {
            let (light_start, light_log) = geometric_logs(light);
            let (heavy_start, heavy_log) = geometric_logs(heavy);
            let (mut weight, mut light_sum, mut heavy_sum) = (0.0, 0.0, 0.0);
            for &count in &beyond {
                let as_light = light_share * libm::exp(light_start + count * light_log);
                let as_heavy = (1.0 - light_share) * libm::exp(heavy_start + count * heavy_log);
                let share = as_light / (as_light + as_heavy);
                weight += share;
                light_sum += share * count;
                heavy_sum += (1.0 - share) * count;
            }
            let others = beyond.len() as f64 - weight;
            let moved = (weight / beyond.len() as f64 - light_share).abs();
            light_share = weight / beyond.len() as f64;
            // A part that has lost its days, or all its depth, has told all it can.
            if weight < 1.0 || others < 1.0 || light_sum / weight < 1e-3 {
                break;
            }
            light = light_sum / weight;
            heavy = heavy_sum / others;
            if moved < 1e-9 {
                break;
            }
        }
        let mean_mm = |mean_steps: f64| step_mm / libm::log(1.0 + 1.0 / mean_steps);
        Some(Self { light_share, light_mean_mm: mean_mm(light), heavy_mean_mm: mean_mm(heavy) })
    }
}

/// Mean, in steps, of a part that nearly always reads as one step (exp(−8): three days in ten thousand do not).
const SHORTEST_PART_STEPS: f64 = 0.125;
/// Rounds after which the fit stops even if it still creeps; the likelihood hardly changes by then.
const MOST_ROUNDS: usize = 2000;

/// Logarithms of first chance and of ratio of the geometric distribution 0, 1, 2 … with the given mean.
fn geometric_logs(mean: f64) -> (f64, f64) {
    (-libm::log(1.0 + mean), libm::log(mean / (1.0 + mean)))
}

#[cfg(test)]
mod tests {
    use super::super::random::{Purpose, Stream};
    use super::*;

    #[test]
    fn moments_of_rounded_depths_are_those_of_a_long_sum() {
        let depth = MixedExponential { light_share: 0.6, light_mean_mm: 2.0, heavy_mean_mm: 9.0 };
        let step = 2.54;
        let (mut total, mut mean, mut square) = (0.0, 0.0, 0.0);
        for count in 1..2000 {
            let below = |edge: f64| {
                1.0 - 0.6 * libm::exp(-(edge - step / 2.0) / 2.0) - 0.4 * libm::exp(-(edge - step / 2.0) / 9.0)
            };
            let value = f64::from(count) * step;
            let chance = below(value + step / 2.0) - below(value - step / 2.0);
            total += chance;
            mean += chance * value;
            square += chance * value * value;
        }
        let (exact_mean, exact_square) = depth.moments(step, true);
        assert!((total - 1.0).abs() < 1e-12);
        assert!((mean - exact_mean).abs() < 1e-9 && (square - exact_square).abs() < 1e-7);
    }

    #[test]
    fn fit_recovers_a_mixture_on_fine_and_coarse_gauges() {
        let truth = MixedExponential { light_share: 0.6, light_mean_mm: 2.0, heavy_mean_mm: 9.0 };
        for step in [0.1, 2.54] {
            let mut stream = Stream::new(11, Purpose::Depth);
            let count = 20_000;
            let steps: Vec<u32> = (0..count)
                .map(|_| {
                    let beyond = truth.draw(stream.uniform(), stream.uniform());
                    libm::floor((beyond + 0.5 * step) / step + 0.5) as u32
                })
                .collect();
            let found = MixedExponential::fit(&steps, step).unwrap();
            let (mean, square) = truth.moments(step, true);
            let limit = 4.0 * ((square - mean * mean) / f64::from(count)).sqrt();
            let (found_mean, found_square) = found.moments(step, true);
            assert!((found_mean - mean).abs() < limit, "{step} {found:?}");
            // The variance of a mixture this skewed has a relative standard error near sqrt((kurtosis - 1) / n),
            // with a kurtosis of about 14: 2.5 % here.
            let spread = |mean: f64, square: f64| square - mean * mean;
            assert!((spread(found_mean, found_square) / spread(mean, square) - 1.0).abs() < 0.1, "{step} {found:?}");
            assert!((found.light_share - 0.6).abs() < 0.08, "{step} {found:?}");
        }
        assert!(MixedExponential::fit(&[], 0.1).is_none());
        let all_one = MixedExponential::fit(&[1; 40], 0.1).unwrap();
        assert!((all_one.moments(0.1, true).0 - 0.1).abs() < 1e-3);
    }
}
