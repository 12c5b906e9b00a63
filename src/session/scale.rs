//! Where a dial may stand: its stops, from the lowest to the highest.
//!
//! Stops are counted from rest, so that rest is a stop to the bit; the ends of the place's range are stops even where
//! the step does not meet them. The starting storage has one stop more below its lowest value: off.

use crate::water::dials::{Dial, DialRange, Dials};

/// Most stops that a dial may have.
pub const MOST_STOPS: usize = 10_000;

/// Values are tidied to this many parts of one, so that three steps of a tenth are 0.3 and not 0.30000000000000004.
const PARTS_OF_ONE: f64 = 1e6;
/// A stop nearer to an end than this share of a step is the end.
const SAME_STOP_SHARE: f64 = 1e-6;

/// The stops of one dial.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DialScale {
    dial: Dial,
    range: DialRange,
    /// Where counting starts: rest, or the lowest starting storage.
    anchor: f64,
    /// First and last step from the anchor that lie inside the range.
    first: i32,
    last: i32,
    least_apart: bool,
    most_apart: bool,
    has_off: bool,
}

impl DialScale {
    /// The stops of `dial` over `range`; `None` where the range has no rest in it, is empty, wider than the dial's
    /// widest, not finite, or has more than [`MOST_STOPS`] stops.
    pub fn new(dial: Dial, range: DialRange) -> Option<Self> {
        // A range may be written with −0; rest is +0.
        let range = DialRange { least: range.least + 0.0, most: range.most + 0.0, step: range.step };
        let DialRange { least, most, step } = range;
        let widest = dial.widest();
        let has_off = dial == Dial::StartingStorage;
        let finite = least.is_finite() && most.is_finite() && step.is_finite();
        let inside = widest.least <= least && least < most && most <= widest.most;
        if !finite || !inside || step <= 0.0 || (most - least) / step > MOST_STOPS as f64 - 4.0 {
            return None;
        }
        let has_rest = has_off || least <= 0.0 && 0.0 <= most;
        if !has_rest {
            return None;
        }
        let anchor = if has_off { least } else { 0.0 };
        let first = libm::ceil((least - anchor) / step - SAME_STOP_SHARE);
        let last = libm::floor((most - anchor) / step + SAME_STOP_SHARE);
        let apart = |end: f64, steps: f64| (end - anchor - steps * step).abs() > SAME_STOP_SHARE * step;
        Some(Self {
            dial,
            range,
            anchor,
            first: first as i32,
            last: last as i32,
            least_apart: apart(least, first),
            most_apart: apart(most, last),
            has_off,
        })
    }

    /// The dial.
    pub fn dial(&self) -> Dial {
        self.dial
    }

    /// The place's range.
    pub fn range(&self) -> DialRange {
        self.range
    }

    /// How many stops there are; at least two.
    pub fn stops(&self) -> usize {
        let on_grid = (self.last - self.first + 1) as usize;
        on_grid + usize::from(self.least_apart) + usize::from(self.most_apart) + usize::from(self.has_off)
    }

    /// The value at a stop, counted from 0; `Some(None)` is off, `None` is beyond the last stop.
    pub fn value(&self, stop: usize) -> Option<Option<f64>> {
        let Some(above_off) = stop.checked_sub(usize::from(self.has_off)) else { return Some(None) };
        let lowest = usize::from(self.has_off);
        if stop >= self.stops() {
            return None;
        }
        let value = if stop + 1 == self.stops() {
            self.range.most
        } else if stop == lowest {
            self.range.least
        } else {
            let steps = self.first + (above_off as i32) - i32::from(self.least_apart);
            let value = self.anchor + f64::from(steps) * self.range.step;
            // Rest must stay +0.0, and rounding a tidied end must not leave the range.
            let tidy = libm::round(value * PARTS_OF_ONE) / PARTS_OF_ONE + 0.0;
            tidy.max(self.range.least).min(self.range.most)
        };
        Some(Some(value))
    }

    /// The stop at `value`, or the highest below it; off is below all.
    pub fn stop_at(&self, value: Option<f64>) -> usize {
        let Some(value) = value else { return 0 };
        let (mut low, mut high) = (usize::from(self.has_off), self.stops());
        while low + 1 < high {
            let middle = low + (high - low) / 2;
            match self.value(middle) {
                Some(Some(at)) if at <= value => low = middle,
                _ => high = middle,
            }
        }
        low
    }

    /// The stop where the dial rests.
    pub fn rest(&self) -> usize {
        self.stop_at(Dials::REST.get(self.dial))
    }

    /// Whether a dial may stand at `value` (between two stops too: a saved setting need not meet the steps).
    pub fn holds(&self, value: Option<f64>) -> bool {
        match value {
            Some(value) => self.range.least <= value && value <= self.range.most,
            None => self.has_off,
        }
    }

    /// The stop nearest to a share of the way from the first to the last; `None` where the share is no number.
    pub fn stop_at_share(&self, share: f64) -> Option<usize> {
        if share.is_nan() {
            return None;
        }
        let last = (self.stops() - 1) as f64;
        Some(libm::round(share.clamp(0.0, 1.0) * last) as usize)
    }

    /// `dials` with this dial at `stop`; unchanged beyond the last stop.
    pub fn set(&self, dials: Dials, stop: usize) -> Dials {
        match self.value(stop) {
            Some(Some(value)) => dials.with(self.dial, value),
            Some(None) => dials.at_rest(self.dial),
            None => dials,
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn values(dial: Dial, least: f64, most: f64, step: f64) -> Vec<Option<f64>> {
        let scale = DialScale::new(dial, DialRange { least, most, step }).unwrap();
        (0..scale.stops()).map(|stop| scale.value(stop).unwrap()).collect()
    }

    #[test]
    fn rest_is_a_stop_to_the_bit_and_the_ends_are_stops() {
        for dial in Dial::ALL {
            let scale = DialScale::new(dial, dial.widest()).unwrap();
            let rest = scale.value(scale.rest()).unwrap();
            assert_eq!(rest.map(f64::to_bits), Dials::REST.get(dial).map(f64::to_bits), "{dial:?}");
            assert_eq!(scale.value(scale.stops() - 1), Some(Some(dial.widest().most)));
            assert_eq!(scale.value(scale.stops()), None);
        }
        let odd = values(Dial::Diversion, -25.0, 17.0, 10.0);
        assert_eq!(odd, [-25.0, -20.0, -10.0, 0.0, 10.0, 17.0].map(Some));
        let fine = values(Dial::Warming, 0.0, 0.4, 0.1);
        assert_eq!(fine, [0.0, 0.1, 0.2, 0.3, 0.4].map(Some));
    }

    #[test]
    fn starting_storage_is_off_below_its_lowest_value() {
        assert_eq!(values(Dial::StartingStorage, 20.0, 50.0, 15.0), [None, Some(20.0), Some(35.0), Some(50.0)]);
        let scale = DialScale::new(Dial::StartingStorage, Dial::StartingStorage.widest()).unwrap();
        assert_eq!((scale.stop_at(None), scale.stop_at(Some(0.0)), scale.stop_at(Some(7.0))), (0, 1, 2));
    }

    #[test]
    fn every_stop_is_found_again_and_every_share_is_a_stop() {
        for dial in Dial::ALL {
            let scale = DialScale::new(dial, dial.widest()).unwrap();
            for stop in 0..scale.stops() {
                assert_eq!(scale.stop_at(scale.value(stop).unwrap()), stop, "{dial:?}");
                let share = stop as f64 / (scale.stops() - 1) as f64;
                assert_eq!(scale.stop_at_share(share), Some(stop), "{dial:?}");
            }
            assert_eq!(scale.stop_at_share(f64::NAN), None);
            assert_eq!(scale.stop_at_share(f64::INFINITY), Some(scale.stops() - 1));
        }
    }

    #[test]
    fn ranges_that_make_no_sense_are_refused() {
        let refused = |least, most, step| DialScale::new(Dial::Diversion, DialRange { least, most, step }).is_none();
        assert!(refused(10.0, 20.0, 5.0), "no rest");
        assert!(refused(-10.0, 10.0, 0.0) && refused(-10.0, 10.0, -1.0) && refused(-10.0, 10.0, f64::NAN));
        assert!(refused(f64::NAN, 10.0, 1.0) && refused(-10.0, f64::INFINITY, 1.0));
        assert!(refused(0.0, 0.0, 1.0), "empty");
        assert!(refused(-60.0, 10.0, 5.0), "wider than the widest");
        assert!(refused(-10.0, 10.0, 1e-9), "too many stops");
    }
}
