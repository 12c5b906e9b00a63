//! Efficiencies, biases and errors of a whole series.

use super::pairs::{Pairs, beside};
use crate::water::calendar::CalendarDay;

/// Share of the observed mean that is added to both series before their logarithms are taken.
const ADDED_BEFORE_LOG: f64 = 0.01;

/// Nash–Sutcliffe efficiency (Nash & Sutcliffe 1970). `None` where the observed series does not vary.
pub fn nash_sutcliffe(modelled: &[f64], observed: &[f64]) -> Option<f64> {
    Pairs::of(beside(modelled, observed))?.nash_sutcliffe()
}

/// Nash–Sutcliffe efficiency of square roots, which lets low flows count for more (Oudin, Andréassian, Mathevet, Perrin &
/// Michel 2006, *Water Resources Research* 42, W07410). Days on which either value is negative have no root and are left
/// out. `None` likewise.
pub fn nash_sutcliffe_of_roots(modelled: &[f64], observed: &[f64]) -> Option<f64> {
    Pairs::of(beside(modelled, observed).map(|(m, o)| (libm::sqrt(m), libm::sqrt(o))))?.nash_sutcliffe()
}

/// Nash–Sutcliffe efficiency of logarithms, which judges low flows most, with a hundredth of the observed mean added to
/// both series because of days without flow (Pushpalatha, Perrin, Le Moine & Andréassian 2012, *Journal of Hydrology*
/// 420–421, 171–182). Days on which either sum is not above zero are left out. `None` likewise.
pub fn nash_sutcliffe_of_logs(modelled: &[f64], observed: &[f64]) -> Option<f64> {
    let added = ADDED_BEFORE_LOG * Pairs::of(beside(modelled, observed))?.mean_observed;
    let log = |value: f64| if value + added > 0.0 { libm::log(value + added) } else { f64::NAN };
    Pairs::of(beside(modelled, observed).map(|(m, o)| (log(m), log(o))))?.nash_sutcliffe()
}

/// Volumetric efficiency `1 − Σ|modelled − observed| / Σ observed` (Criss & Winston 2008, *Hydrological Processes* 22,
/// 2723–2725). `None` where the observed sum is not above zero.
pub fn volumetric_efficiency(modelled: &[f64], observed: &[f64]) -> Option<f64> {
    let pairs = beside(modelled, observed).filter(|(m, o)| !m.is_nan() && !o.is_nan());
    let (mut error, mut volume) = (0.0, 0.0);
    for (m, o) in pairs {
        error += (m - o).abs();
        volume += o;
    }
    (volume > 0.0).then(|| 1.0 - error / volume)
}

/// Root mean square error over the standard deviation of the observed series (RSR, Moriasi et al. 2007). `None` where the
/// observed series does not vary.
pub fn rsr(modelled: &[f64], observed: &[f64]) -> Option<f64> {
    let pairs = Pairs::of(beside(modelled, observed))?;
    (pairs.observed > 0.0).then(|| libm::sqrt(pairs.error / pairs.observed))
}

/// Kling–Gupta efficiency and its three parts.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct KlingGupta {
    /// 1 less the distance of the parts from 1.
    pub efficiency: f64,
    /// Correlation.
    pub correlation: f64,
    /// Ratio of spread: of standard deviations (2009) or of coefficients of variation (2012).
    pub variability: f64,
    /// Ratio of means.
    pub bias: f64,
}

fn kling_gupta(pairs: &Pairs, variability: f64) -> KlingGupta {
    let correlation = pairs.product / libm::sqrt(pairs.modelled * pairs.observed);
    let bias = pairs.mean_modelled / pairs.mean_observed;
    let distance = (correlation - 1.0) * (correlation - 1.0)
        + (variability - 1.0) * (variability - 1.0)
        + (bias - 1.0) * (bias - 1.0);
    KlingGupta { efficiency: 1.0 - libm::sqrt(distance), correlation, variability, bias }
}

/// Kling–Gupta efficiency of 2009 (Gupta, Kling, Yilmaz & Martinez 2009, *Journal of Hydrology* 377, 80–91). `None` where
/// either series does not vary or the observed mean is zero.
pub fn kling_gupta_2009(modelled: &[f64], observed: &[f64]) -> Option<KlingGupta> {
    let pairs = Pairs::of(beside(modelled, observed))?;
    let varies = pairs.modelled > 0.0 && pairs.observed > 0.0 && pairs.mean_observed != 0.0;
    varies.then(|| kling_gupta(&pairs, libm::sqrt(pairs.modelled / pairs.observed)))
}

/// Kling–Gupta efficiency of 2012 (Kling, Fuchs & Paulin 2012, *Journal of Hydrology* 424–425, 264–277), with the ratio of
/// coefficients of variation. `None` likewise, and where the modelled mean is zero.
pub fn kling_gupta_2012(modelled: &[f64], observed: &[f64]) -> Option<KlingGupta> {
    let pairs = Pairs::of(beside(modelled, observed))?;
    let varies = pairs.modelled > 0.0 && pairs.observed > 0.0;
    let means = pairs.mean_observed != 0.0 && pairs.mean_modelled != 0.0;
    (varies && means).then(|| {
        let spread = libm::sqrt(pairs.modelled / pairs.observed);
        kling_gupta(&pairs, spread * pairs.mean_observed / pairs.mean_modelled)
    })
}

/// Percent bias, positive where the model gives too little: `100 Σ(observed − modelled) / Σ observed` (Moriasi et al. 2007,
/// *Transactions of the ASABE* 50(3), 885–900). `None` where the observed sum is zero.
pub fn percent_bias(modelled: &[f64], observed: &[f64]) -> Option<f64> {
    Pairs::of(beside(modelled, observed))?.percent_bias()
}

/// [`percent_bias`] on the days of `calendar` that `counts` says count, such as those of the flood season.
pub fn percent_bias_on(
    modelled: &[f64],
    observed: &[f64],
    calendar: &[CalendarDay],
    counts: impl Fn(&CalendarDay) -> bool,
) -> Option<f64> {
    let days = beside(modelled, observed).zip(calendar).filter(|(_, day)| counts(day));
    let mut sums = (0.0, 0.0);
    for ((m, o), _) in days.filter(|((m, o), _)| !m.is_nan() && !o.is_nan()) {
        sums = (sums.0 + m, sums.1 + o);
    }
    (sums.1 != 0.0).then(|| 100.0 * (sums.1 - sums.0) / sums.1)
}

/// Root mean square error, in the unit of the series.
pub fn root_mean_square_error(modelled: &[f64], observed: &[f64]) -> Option<f64> {
    Pairs::of(beside(modelled, observed)).map(|pairs| libm::sqrt(pairs.error / pairs.count))
}
