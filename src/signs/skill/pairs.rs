//! Sums over the pairs that both series have.

/// Sums over the pairs without a missing value.
#[derive(Clone, Copy, Debug)]
pub(super) struct Pairs {
    pub count: f64,
    pub mean_modelled: f64,
    pub mean_observed: f64,
    /// Sums of squared deviations and of their product.
    pub modelled: f64,
    pub observed: f64,
    pub product: f64,
    /// Sum of squared errors.
    pub error: f64,
}

/// The modelled and observed values side by side.
pub(super) fn beside<'s>(
    modelled: &'s [f64],
    observed: &'s [f64],
) -> impl Iterator<Item = (f64, f64)> + Clone + use<'s> {
    modelled.iter().copied().zip(observed.iter().copied())
}

impl Pairs {
    /// Sums over (modelled, observed); `None` for fewer than two whole pairs.
    pub fn of(all: impl Iterator<Item = (f64, f64)> + Clone) -> Option<Self> {
        let pairs = all.filter(|(m, o)| !m.is_nan() && !o.is_nan());
        let (mut count, mut sum_modelled, mut sum_observed) = (0.0, 0.0, 0.0);
        for (m, o) in pairs.clone() {
            count += 1.0;
            sum_modelled += m;
            sum_observed += o;
        }
        if count < 2.0 {
            return None;
        }
        let (mean_modelled, mean_observed) = (sum_modelled / count, sum_observed / count);
        let mut out =
            Self { count, mean_modelled, mean_observed, modelled: 0.0, observed: 0.0, product: 0.0, error: 0.0 };
        for (m, o) in pairs {
            let (dm, d_o) = (m - mean_modelled, o - mean_observed);
            out.modelled += dm * dm;
            out.observed += d_o * d_o;
            out.product += dm * d_o;
            out.error += (m - o) * (m - o);
        }
        Some(out)
    }

    /// Nash–Sutcliffe efficiency of the pairs.
    pub fn nash_sutcliffe(&self) -> Option<f64> {
        (self.observed > 0.0).then(|| 1.0 - self.error / self.observed)
    }

    /// Percent bias of the pairs, positive where the model gives too little.
    pub fn percent_bias(&self) -> Option<f64> {
        (self.mean_observed != 0.0).then(|| 100.0 * (self.mean_observed - self.mean_modelled) / self.mean_observed)
    }
}
