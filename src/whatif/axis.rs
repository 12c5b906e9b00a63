//! The values of one dial along one side of a grid.

use crate::water::dials::{Dial, DialRange, Dials};

/// Most values along one side.
pub const MOST_STOPS: usize = 1000;

/// Values are tidied to this many parts of one, so that three steps of a tenth are 0.3, as a person would type it.
const PARTS_OF_ONE: f64 = 1e6;
/// A last step that misses the end by less than this share of a step meets it.
const SAME_STOP_SHARE: f64 = 1e-6;

/// Why the values of a side make no sense.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum AxisFault {
    /// A number is not finite.
    NotFinite,
    /// The step is zero or less.
    Step,
    /// The end does not lie above the beginning.
    Backward,
    /// The steps do not meet the end; the last value before it.
    Misses(f64),
    /// More values than [`MOST_STOPS`].
    TooMany,
}

/// A dial and where it stands along one side, from the lowest value to the highest.
#[derive(Clone, Debug, PartialEq)]
pub struct Axis {
    dial: Dial,
    step: f64,
    values: Vec<f64>,
}

impl Axis {
    /// The values `from`, `from + step` ... `to` of `dial`, in its own unit. Both ends are met to the bit.
    ///
    /// # Errors
    /// An [`AxisFault`]. Whether the dial may stand there is not asked here: the place's range decides.
    pub fn new(dial: Dial, from: f64, to: f64, step: f64) -> Result<Self, AxisFault> {
        // −0 would be another number in the output than 0.
        let (from, to) = (from + 0.0, to + 0.0);
        if ![from, to, step].into_iter().all(f64::is_finite) {
            return Err(AxisFault::NotFinite);
        }
        if step <= 0.0 {
            return Err(AxisFault::Step);
        }
        if to <= from {
            return Err(AxisFault::Backward);
        }
        let steps = (to - from) / step;
        if steps > (MOST_STOPS - 1) as f64 + 0.5 {
            return Err(AxisFault::TooMany);
        }
        let whole = libm::round(steps);
        let value = |at: usize| libm::round((from + at as f64 * step) * PARTS_OF_ONE) / PARTS_OF_ONE + 0.0;
        if (steps - whole).abs() > SAME_STOP_SHARE || whole < 1.0 {
            return Err(AxisFault::Misses(value(libm::floor(steps) as usize)));
        }
        let last = whole as usize;
        let values = (0..=last).map(|at| match at {
            0 => from,
            at if at == last => to,
            at => value(at),
        });
        Ok(Self { dial, step, values: values.collect() })
    }

    /// The values of `dial` over the whole of a range, `most_values` at most: stops of the dial with rest among them, or
    /// evenly apart where its step does not meet both ends.
    ///
    /// # Errors
    /// As [`Axis::new`].
    pub fn over(dial: Dial, range: DialRange, most_values: usize) -> Result<Self, AxisFault> {
        let DialRange { least, most, step } = range;
        let rest = Dials::REST.get(dial).unwrap_or(least);
        let stops = (most - least) / step;
        let spaces = most_values.clamp(2, MOST_STOPS) as f64 - 1.0;
        let meets = |apart: f64, step: f64| {
            let steps = apart / step;
            (steps - libm::round(steps)).abs() <= SAME_STOP_SHARE
        };
        let fewest = libm::ceil(stops / spaces - SAME_STOP_SHARE).max(1.0);
        if stops <= MOST_STOPS as f64 {
            for every in fewest as usize..=stops as usize {
                let wide = step * every as f64;
                if meets(rest - least, wide) && meets(most - rest, wide) {
                    return Self::new(dial, least, most, wide);
                }
            }
        }
        Self::new(dial, least, most, (most - least) / spaces)
    }

    /// The dial.
    pub fn dial(&self) -> Dial {
        self.dial
    }

    /// From one value to the next.
    pub fn step(&self) -> f64 {
        self.step
    }

    /// The values, rising; at least two.
    pub fn values(&self) -> &[f64] {
        &self.values
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_values_are_those_that_a_person_would_type() {
        let axis = Axis::new(Dial::Warming, 0.0, 0.7, 0.1).unwrap();
        assert_eq!(axis.values(), [0.0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7]);
        let axis = Axis::new(Dial::WinterPrecipitation, -20.0, 20.0, 10.0).unwrap();
        assert_eq!(axis.values(), [-20.0, -10.0, 0.0, 10.0, 20.0]);
        assert!(axis.values()[2].is_sign_positive());
        assert_eq!(Axis::new(Dial::Warming, 0.25, 1.0, 0.25).unwrap().values(), [0.25, 0.5, 0.75, 1.0]);
    }

    #[test]
    fn a_range_is_covered_by_stops_of_the_dial_with_rest_among_them() {
        let over = |dial, least, most, step, count| {
            Axis::over(dial, DialRange { least, most, step }, count).unwrap().values().to_vec()
        };
        assert_eq!(
            over(Dial::WinterPrecipitation, -40.0, 40.0, 5.0, 9),
            [-40., -30., -20., -10., 0., 10., 20., 30., 40.]
        );
        assert_eq!(over(Dial::Diversion, -25.0, 100.0, 5.0, 9), [-25.0, 0.0, 25.0, 50.0, 75.0, 100.0]);
        assert_eq!(over(Dial::CanalLining, 0.0, 7.0, 2.0, 3), [0.0, 3.5, 7.0]);
        for dial in Dial::ALL {
            let values = over(dial, dial.widest().least, dial.widest().most, dial.widest().step, 13);
            assert!((3..=13).contains(&values.len()), "{dial:?} {values:?}");
            assert!(Dials::REST.get(dial).is_none_or(|rest| values.contains(&rest)), "{dial:?} {values:?}");
        }
        let endless = DialRange { least: 0.0, most: 6.0, step: 0.0 };
        assert_eq!(Axis::over(Dial::Warming, endless, 4).unwrap().values(), [0.0, 2.0, 4.0, 6.0]);
    }

    #[test]
    fn sides_that_make_no_sense_are_refused() {
        let fault = |from, to, step| Axis::new(Dial::Warming, from, to, step).unwrap_err();
        assert_eq!(fault(0.0, f64::NAN, 1.0), AxisFault::NotFinite);
        assert_eq!(fault(0.0, 1.0, f64::INFINITY), AxisFault::NotFinite);
        assert_eq!(fault(0.0, 1.0, 0.0), AxisFault::Step);
        assert_eq!(fault(1.0, 1.0, 0.5), AxisFault::Backward);
        assert_eq!(fault(0.0, 1.0, 0.3), AxisFault::Misses(0.9));
        assert_eq!(fault(0.0, 1.0, 3.0), AxisFault::Misses(0.0));
        assert_eq!(fault(0.0, 6.0, 1e-9), AxisFault::TooMany);
        assert_eq!(fault(0.0, 6.0, 1e-320), AxisFault::TooMany);
    }
}
