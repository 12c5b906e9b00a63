//! Scores of a modelled series against an observed one. Pairs with a missing value (NaN) are left out.

/// Sums over the pairs that both series have.
#[derive(Clone, Copy, Debug)]
struct Pairs {
    count: f64,
    mean_modelled: f64,
    mean_observed: f64,
    /// Sums of squared deviations and of their product.
    modelled: f64,
    observed: f64,
    product: f64,
    /// Sum of squared errors.
    error: f64,
}

impl Pairs {
    fn of(modelled: &[f64], observed: &[f64]) -> Option<Self> {
        let pairs = || modelled.iter().zip(observed).filter(|(m, o)| !m.is_nan() && !o.is_nan());
        let count = pairs().count() as f64;
        if count < 2.0 {
            return None;
        }
        let mean_modelled = pairs().map(|(m, _)| m).sum::<f64>() / count;
        let mean_observed = pairs().map(|(_, o)| o).sum::<f64>() / count;
        let mut out =
            Self { count, mean_modelled, mean_observed, modelled: 0.0, observed: 0.0, product: 0.0, error: 0.0 };
        for (m, o) in pairs() {
            let (dm, d_o) = (m - mean_modelled, o - mean_observed);
            out.modelled += dm * dm;
            out.observed += d_o * d_o;
            out.product += dm * d_o;
            out.error += (m - o) * (m - o);
        }
        Some(out)
    }
}

/// Nash–Sutcliffe efficiency (Nash & Sutcliffe 1970). `None` where the observed series does not vary.
pub fn nash_sutcliffe(modelled: &[f64], observed: &[f64]) -> Option<f64> {
    let pairs = Pairs::of(modelled, observed)?;
    (pairs.observed > 0.0).then(|| 1.0 - pairs.error / pairs.observed)
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
    let pairs = Pairs::of(modelled, observed)?;
    let varies = pairs.modelled > 0.0 && pairs.observed > 0.0 && pairs.mean_observed != 0.0;
    varies.then(|| kling_gupta(&pairs, libm::sqrt(pairs.modelled / pairs.observed)))
}

/// Kling–Gupta efficiency of 2012 (Kling, Fuchs & Paulin 2012, *Journal of Hydrology* 424–425, 264–277), with the ratio of
/// coefficients of variation. `None` likewise, and where the modelled mean is zero.
pub fn kling_gupta_2012(modelled: &[f64], observed: &[f64]) -> Option<KlingGupta> {
    let pairs = Pairs::of(modelled, observed)?;
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
    let pairs = Pairs::of(modelled, observed)?;
    (pairs.mean_observed != 0.0).then(|| 100.0 * (pairs.mean_observed - pairs.mean_modelled) / pairs.mean_observed)
}

/// Root mean square error, in the unit of the series.
pub fn root_mean_square_error(modelled: &[f64], observed: &[f64]) -> Option<f64> {
    Pairs::of(modelled, observed).map(|pairs| libm::sqrt(pairs.error / pairs.count))
}
