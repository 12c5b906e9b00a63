//! Round numbers for an axis.

/// Evenly spaced round values.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Steps {
    /// The first value.
    pub first: f64,
    /// From one value to the next.
    pub step: f64,
    /// How many there are.
    pub count: usize,
    /// Digits after the decimal mark that tell the values apart.
    pub decimals: usize,
}

impl Steps {
    /// The values, from the least.
    pub fn values(&self) -> impl Iterator<Item = f64> + Clone + use<> {
        let Self { first, step, count, .. } = *self;
        (0..count).map(move |i| first + step * i as f64)
    }

    /// The greatest value.
    pub fn last(&self) -> f64 {
        self.first + self.step * self.count.saturating_sub(1) as f64
    }
}

/// Values of 1, 2 or 5 times a power of ten that lie between `low` and `high`, at most `most` of them. `None` where
/// that range is empty or no number, or `most` is less than 2.
pub fn nice_steps(low: f64, high: f64, most: usize) -> Option<Steps> {
    let span = high - low;
    if most < 2 || !(span > 0.0 && span.is_finite() && low.is_finite()) {
        return None;
    }
    // Powers of ten by multiplication alone, so that every target finds the same ones.
    let (mut power, mut decimals) = (1.0, 0);
    while power > span && decimals < 300 {
        power /= 10.0;
        decimals += 1;
    }
    while power * 10.0 <= span && power < 1e300 {
        power *= 10.0;
        decimals -= 1;
    }
    // Down to hundredths of the span the count only grows, so the first fit from below is the finest one.
    let finest =
        [(0.01, 2), (0.02, 2), (0.05, 2), (0.1, 1), (0.2, 1), (0.5, 1), (1.0, 0), (2.0, 0), (5.0, 0), (10.0, -1)];
    finest.into_iter().find_map(|(factor, more)| {
        let step = power * factor;
        let (first, last) = (libm::ceil(low / step - 1e-9), libm::floor(high / step + 1e-9));
        let count = last - first + 1.0;
        (count >= 1.0 && count <= most as f64).then(|| Steps {
            // Zero has no sign on an axis.
            first: first * step + 0.0,
            step,
            count: count as usize,
            decimals: usize::try_from(decimals + more).unwrap_or(0),
        })
    })
}

#[cfg(test)]
mod tests {
    use super::*;
    use proptest::prelude::*;

    #[test]
    fn an_axis_reads_in_ones_twos_and_fives() {
        let steps = nice_steps(0.0, 551.0, 4).unwrap();
        assert_eq!((steps.first, steps.step, steps.count, steps.decimals), (0.0, 200.0, 3, 0));
        let steps = nice_steps(0.0, 4.4, 5).unwrap();
        assert_eq!((steps.step, steps.last(), steps.decimals), (1.0, 4.0, 0));
        let steps = nice_steps(0.0, 0.3, 4).unwrap();
        assert_eq!((steps.count, steps.decimals), (4, 1));
        assert_eq!(nice_steps(-1.0, 1.0, 3).unwrap().first, -1.0);
    }

    #[test]
    fn no_range_no_steps() {
        for (low, high, most) in
            [(1.0, 1.0, 5), (2.0, 1.0, 5), (f64::NAN, 1.0, 5), (0.0, f64::INFINITY, 5), (0.0, 1.0, 1)]
        {
            assert_eq!(nice_steps(low, high, most), None);
        }
    }

    proptest! {
        #[test]
        fn steps_stay_in_range(low in -1e6..1e6f64, span in 1e-6..1e9f64, most in 2usize..12) {
            let steps = nice_steps(low, low + span, most).unwrap();
            prop_assert!(steps.count <= most && steps.count >= 1);
            let slack = steps.step * 1e-6;
            prop_assert!(steps.values().all(|v| v >= low - slack && v <= low + span + slack));
        }
    }
}
