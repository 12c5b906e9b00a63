//! The shape of a distribution of errors, and how many humps it has.
//!
//! A density with Gaussian kernels and Silverman's bandwidth `0.9 · min(s, IQR / 1.34) · n^(−1/5)` (Silverman 1986,
//! *Density Estimation for Statistics and Data Analysis*, equation 3.31), widened where it is under a fiftieth of the range. A hump is a local maximum whose prominence, its
//! height over the higher of the two dips that part it from higher ground, is at least [`LEAST_PROMINENCE`] of the
//! highest (a rule of our own, no source). Two humps are what to expect where low flows come out too low and storms too
//! high (common practice, no source): their mean may be near zero and tells nothing.

use heapless::Vec;

/// Points at which the density is known.
pub const SHAPE_POINTS: usize = 101;
/// Most humps that there can be: every second point a top.
pub const MOST_HUMPS: usize = SHAPE_POINTS.div_ceil(2);
/// Least prominence of a hump, as a share of the highest density.
pub const LEAST_PROMINENCE: f64 = 0.15;
/// Share of the values that are cut off at either end of the drawn range: single days would stretch it for all.
const CUT_SHARE: f64 = 0.005;
/// Fewest values that have a shape.
const FEWEST: usize = 30;
/// Least bandwidth as a share of the range between the cuts: a narrower kernel could fall between two points.
const LEAST_BANDWIDTH_SHARE: f64 = 0.02;
/// Bandwidths that the drawn range reaches beyond the cut values.
const MARGIN_BANDWIDTHS: f64 = 3.0;

/// A hump of the distribution.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Hump {
    /// The value at its top, in the unit of the errors.
    pub at: f64,
    /// Its prominence as a share of the highest density.
    pub prominence: f64,
}

/// A distribution of errors.
#[derive(Clone, Debug, PartialEq)]
pub struct ErrorShape {
    /// First value of the drawn range.
    pub from: f64,
    /// Last value of the drawn range.
    pub to: f64,
    /// Bandwidth of the kernels, in the unit of the errors.
    pub bandwidth: f64,
    /// Density at [`SHAPE_POINTS`] even points of the range, per unit of the errors.
    pub density: [f64; SHAPE_POINTS],
    /// The humps, from left to right.
    pub humps: Vec<Hump, MOST_HUMPS>,
}

impl ErrorShape {
    /// The shape of `errors`, which are sorted on the way; missing values are left out. `None` for fewer than 30 values or
    /// values that do not vary.
    pub fn of(errors: &mut [f64]) -> Option<Self> {
        errors.sort_unstable_by(|a, b| a.is_nan().cmp(&b.is_nan()).then(a.total_cmp(b)));
        let known = errors.iter().take_while(|error| !error.is_nan()).count();
        let errors = &errors[..known];
        if known < FEWEST || !errors.iter().all(|error| error.is_finite()) {
            return None;
        }
        let count = known as f64;
        let mean = errors.iter().sum::<f64>() / count;
        let deviation = libm::sqrt(errors.iter().map(|e| (e - mean) * (e - mean)).sum::<f64>() / (count - 1.0));
        let quantile = |share: f64| errors[((count - 1.0) * share) as usize];
        let quartiles = quantile(0.75) - quantile(0.25);
        let spread = if quartiles > 0.0 { deviation.min(quartiles / 1.34) } else { deviation };
        // Not a plain comparison with zero, so that NaN is refused too.
        if spread.is_nan() || spread <= 0.0 {
            return None;
        }
        let (low, high) = (quantile(CUT_SHARE), quantile(1.0 - CUT_SHARE));
        let bandwidth = (0.9 * spread * libm::pow(count, -0.2)).max(LEAST_BANDWIDTH_SHARE * (high - low));
        let (from, to) = (low - MARGIN_BANDWIDTHS * bandwidth, high + MARGIN_BANDWIDTHS * bandwidth);
        let step = (to - from) / (SHAPE_POINTS - 1) as f64;
        let scale = 1.0 / (count * bandwidth * libm::sqrt(2.0 * core::f64::consts::PI));
        let density = core::array::from_fn(|point| {
            let at = from + step * point as f64;
            let kernels = errors.iter().map(|error| {
                let away = (error - at) / bandwidth;
                // Beyond eight bandwidths a kernel adds less than rounding does.
                if away.abs() < 8.0 { libm::exp(-0.5 * away * away) } else { 0.0 }
            });
            scale * kernels.sum::<f64>()
        });
        Some(Self { from, to, bandwidth, density, humps: humps_of(&density, from, step) })
    }

    /// Whether the errors come in two kinds or more.
    pub fn has_several_humps(&self) -> bool {
        self.humps.len() > 1
    }
}

fn humps_of(density: &[f64; SHAPE_POINTS], from: f64, step: f64) -> Vec<Hump, MOST_HUMPS> {
    let highest = density.iter().copied().fold(0.0, f64::max);
    let mut humps = Vec::new();
    for (point, &height) in density.iter().enumerate() {
        let is_top = (point == 0 || density[point - 1] < height) && density.get(point + 1).is_none_or(|n| *n <= height);
        if !is_top {
            continue;
        }
        // The lowest dip on the way to higher ground; nothing but the plain where there is none on that side.
        let dip = |side: &mut dyn Iterator<Item = f64>| {
            let mut lowest = height;
            for other in side {
                if other > height {
                    return lowest;
                }
                lowest = lowest.min(other);
            }
            0.0
        };
        let left = dip(&mut density[..point].iter().rev().copied());
        let right = dip(&mut density[point + 1..].iter().copied());
        let prominence = (height - left.max(right)) / highest;
        if prominence >= LEAST_PROMINENCE {
            // Between two tops lies a lower point, so there is always room.
            let _ = humps.push(Hump { at: from + step * point as f64, prominence });
        }
    }
    humps
}
