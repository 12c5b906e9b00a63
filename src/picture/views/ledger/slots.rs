//! Places for branches of different widths, each with room for its words.

/// Halvings with which the scale is found: to far less than a pixel.
const HALVINGS: usize = 40;

/// Where each branch of one side ends.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Slots {
    /// Middle of each branch beside its words, in pixels of the frame.
    pub middles: Vec<f64>,
    /// Its width, pixels.
    pub widths: Vec<f64>,
    middle: f64,
}

fn needed(amounts: &[f64], scale: f64, least: f64, gap: f64) -> f64 {
    amounts.iter().map(|amount| (amount * scale + gap).max(least)).sum()
}

/// The largest scale, in pixels for one of the amounts, at which every branch has its width and its words at least
/// `least` pixels within `high`; 0 where nothing flows or nothing fits.
pub(super) fn scale_of(amounts: &[f64], least: f64, gap: f64, high: f64) -> f64 {
    let whole: f64 = amounts.iter().sum();
    if !(whole > 0.0 && whole.is_finite()) {
        return 0.0;
    }
    let (mut low, mut top) = (0.0, high / whole);
    for _ in 0..HALVINGS {
        let middle = (low + top) / 2.0;
        if needed(amounts, middle, least, gap) <= high { low = middle } else { top = middle }
    }
    low
}

impl Slots {
    /// Places from `top` on within `high`; what is left over is shared out evenly.
    pub fn new(amounts: &[f64], scale: f64, least: f64, gap: f64, top: f64, high: f64) -> Self {
        let spare = (high - needed(amounts, scale, least, gap)).max(0.0) / amounts.len().max(1) as f64;
        let widths: Vec<f64> = amounts.iter().map(|amount| amount * scale).collect();
        let mut y = top;
        let middles = widths.iter().map(|width| {
            let own = (width + gap).max(least) + spare;
            y += own;
            y - own / 2.0
        });
        Self { middles: middles.collect(), widths, middle: top + high / 2.0 }
    }

    /// Top and bottom of the stream where all branches lie side by side.
    pub fn trunk(&self) -> (f64, f64) {
        let half = self.widths.iter().sum::<f64>() / 2.0;
        (self.middle - half, self.middle + half)
    }

    /// The middle of each branch within the stream.
    pub fn trunk_middles(&self) -> impl Iterator<Item = f64> + '_ {
        let mut y = self.trunk().0;
        self.widths.iter().map(move |width| {
            y += width;
            y - width / 2.0
        })
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use proptest::prelude::*;

    proptest! {
        #[test]
        fn branches_and_words_never_meet(amounts in prop::collection::vec(0.0..1e9f64, 1..12)) {
            let (least, gap, high) = (10.0, 4.0, 140.0);
            let scale = scale_of(&amounts, least, gap, high);
            let slots = Slots::new(&amounts, scale, least, gap, 50.0, high);
            let edge = |index: usize, side: f64| slots.middles[index] + side * slots.widths[index].max(least - 1.0) / 2.0;
            prop_assert!(edge(0, -1.0) >= 50.0 - 1e-6 && edge(amounts.len() - 1, 1.0) <= 190.0 + 1e-6);
            for index in 1..amounts.len() {
                prop_assert!(edge(index, -1.0) >= edge(index - 1, 1.0) - 1e-6);
            }
            let (top, low) = slots.trunk();
            prop_assert!(top >= 50.0 - 1e-6 && low <= 190.0 + 1e-6);
        }
    }

    #[test]
    fn nothing_has_no_width() {
        assert_eq!(scale_of(&[0.0, 0.0], 10.0, 4.0, 140.0), 0.0);
        assert_eq!(scale_of(&[], 10.0, 4.0, 140.0), 0.0);
    }
}
