//! Least squares on the waves of the year.

use super::super::SeasonalCurve;
use super::super::season::{CURVE_TERMS, PLACES, curve_terms};
use super::record::RecordDay;
use super::{ByKind, FitNote};

/// Days of a kind in every month below which the kind gets no curve of its own.
const LEAST_DAYS_A_MONTH: usize = 10;
/// A spread that falls below this share of its mean anywhere is taken with fewer waves.
const LEAST_SHARE_OF_MEAN: f64 = 0.3;

/// One value at a place of the calendar.
pub(super) type Sample = (usize, f64);

/// Fits the first so many terms (1, 3 or 5) of a seasonal curve by least squares; `None` if the samples do not tell.
pub(super) fn curve(samples: &[Sample], terms: usize) -> Option<SeasonalCurve> {
    let mut matrix = [[0.0; CURVE_TERMS]; CURVE_TERMS];
    let mut right = [0.0; CURVE_TERMS];
    for &(place, value) in samples {
        let wave = curve_terms(place);
        for row in 0..terms {
            right[row] += wave[row] * value;
            for column in 0..terms {
                matrix[row][column] += wave[row] * wave[column];
            }
        }
    }
    // Gaussian elimination; the matrix is symmetric and positive definite, so its diagonal serves as it comes.
    for pivot in 0..terms {
        let enough = matrix[pivot][pivot] > 1e-9 * samples.len() as f64;
        if !enough {
            return None;
        }
        let above = matrix[pivot];
        for row in pivot + 1..terms {
            let factor = matrix[row][pivot] / above[pivot];
            for (value, over) in matrix[row].iter_mut().zip(&above) {
                *value -= factor * over;
            }
            right[row] -= factor * right[pivot];
        }
    }
    let mut weights = [0.0; CURVE_TERMS];
    for row in (0..terms).rev() {
        let known: f64 = (row + 1..terms).map(|column| matrix[row][column] * weights[column]).sum();
        weights[row] = (right[row] - known) / matrix[row][row];
    }
    Some(SeasonalCurve::from_terms(&weights))
}

/// Curves of a value on dry and on wet days.
///
/// The commoner kind gets its own curve; the other too if every month has ten days of it, else a fixed step from the
/// first. If even the commoner kind lacks days in some month, both share the curve of all days, a step apart.
pub(super) fn by_kind(
    days: &[RecordDay],
    field: &'static str,
    value: impl Fn(&RecordDay) -> Option<f64>,
    notes: &mut Vec<FitNote>,
) -> Option<ByKind> {
    let samples = |keep: &dyn Fn(bool) -> bool| -> Vec<Sample> {
        days.iter().filter(|day| keep(day.wet)).filter_map(|day| Some((day.place, value(day)?))).collect()
    };
    let full = |wet: bool| {
        let mut counts = [0; 12];
        for day in days.iter().filter(|day| day.wet == wet && value(day).is_some()) {
            counts[day.month] += 1;
        }
        counts.iter().all(|&count| count >= LEAST_DAYS_A_MONTH)
    };
    let dry = samples(&|wet| !wet);
    let wet = samples(&|wet| wet);
    let (dry_full, wet_full) = (full(false), full(true));
    let stepped = |base: &SeasonalCurve, samples: &[Sample]| -> Option<SeasonalCurve> {
        let beyond: Vec<Sample> = samples.iter().map(|&(place, value)| (place, value - base.at(place))).collect();
        let step = curve(&beyond, 1)?.mean;
        Some(SeasonalCurve { mean: base.mean + step, ..*base })
    };
    if !(dry_full && wet_full) {
        notes.push(FitNote::SameStepAllYear { field });
    }
    let (dry_curve, wet_curve) = match (dry_full, wet_full) {
        (true, true) => (curve(&dry, CURVE_TERMS)?, curve(&wet, CURVE_TERMS)?),
        (true, false) => {
            let base = curve(&dry, CURVE_TERMS)?;
            (base, stepped(&base, &wet)?)
        }
        (false, true) => {
            let base = curve(&wet, CURVE_TERMS)?;
            (stepped(&base, &dry)?, base)
        }
        (false, false) => {
            let base = curve(&samples(&|_| true), CURVE_TERMS)?;
            (stepped(&base, &dry)?, stepped(&base, &wet)?)
        }
    };
    let mut simpler = false;
    let mut spread = |mean: &SeasonalCurve, samples: &[Sample], full: bool| {
        spread(mean, samples, if full { CURVE_TERMS } else { 1 }, &mut simpler)
    };
    let dry_spread = spread(&dry_curve, &dry, dry_full)?;
    let wet_spread = spread(&wet_curve, &wet, wet_full)?;
    if simpler {
        notes.push(FitNote::SimplerSpread { field });
    }
    Some(ByKind { dry: dry_curve, wet: wet_curve, dry_spread, wet_spread })
}

/// The spread about a curve, from the size of the departures, scaled so that standardised departures have variance 1.
fn spread(mean: &SeasonalCurve, samples: &[Sample], terms: usize, simpler: &mut bool) -> Option<SeasonalCurve> {
    let sizes: Vec<Sample> = samples.iter().map(|&(place, value)| (place, (value - mean.at(place)).abs())).collect();
    let mut terms = terms;
    let shape = loop {
        let shape = curve(&sizes, terms)?;
        let least = (0..PLACES).map(|place| shape.at(place)).fold(f64::INFINITY, f64::min);
        if terms == 1 || least > LEAST_SHARE_OF_MEAN * shape.mean {
            break shape;
        }
        *simpler = true;
        terms -= 2;
    };
    if shape.mean <= 0.0 || shape.mean.is_nan() {
        return None;
    }
    let squares: f64 = sizes
        .iter()
        .map(|&(place, size)| {
            let standardised = size / shape.at(place);
            standardised * standardised
        })
        .sum();
    Some(shape.times((squares / sizes.len() as f64).sqrt()))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_curve_is_found_again() {
        let weights = [5.0, -10.0, 2.0, 0.5, -0.25];
        let truth = SeasonalCurve::from_terms(&weights);
        let samples: Vec<Sample> = (0..PLACES).step_by(3).map(|place| (place, truth.at(place))).collect();
        let found = curve(&samples, CURVE_TERMS).unwrap();
        assert!((0..PLACES).all(|place| (found.at(place) - truth.at(place)).abs() < 1e-9));
        assert!(curve(&samples[..2], CURVE_TERMS).is_none());
    }
}
