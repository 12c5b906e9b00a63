//! The turn of the year: mid-month values joined by lines, and smooth curves of two waves.
//!
//! Everything seasonal is laid out on the 366 places of a leap year, so that 1 March is the same place every year; in
//! other years 29 February is simply passed over.

use core::f64::consts::PI;
use serde::{Deserialize, Serialize};

/// Places in the calendar of a leap year.
pub(super) const PLACES: usize = 366;
/// Days in each month of a leap year.
pub(super) const MONTH_DAYS: [usize; 12] = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
/// How often 29 February comes round, as a share of years (one in four; the century rule is left out).
pub(super) const LEAP_DAY_SHARE: f64 = 0.25;
/// Coefficients of a curve of two waves: the mean, then cosine and sine of each wave.
pub(super) const CURVE_TERMS: usize = 5;

/// Place (0–365) in the leap-year calendar of a month (1–12) and a day of it (from 1).
pub(super) fn place_of(month: u32, day: u32) -> usize {
    let before: usize = MONTH_DAYS.iter().take(month.saturating_sub(1) as usize).sum();
    before + day.saturating_sub(1) as usize
}

/// Month (0–11) of a place in the leap-year calendar.
pub(super) fn month_of(place: usize) -> usize {
    let mut end = 0;
    for (month, days) in MONTH_DAYS.iter().enumerate() {
        end += days;
        if place < end {
            return month;
        }
    }
    11
}

/// How often a place of the calendar occurs, in days per year.
pub(super) fn days_per_year(place: usize) -> f64 {
    if place == place_of(2, 29) { LEAP_DAY_SHARE } else { 1.0 }
}

/// Mean over each month of something that has a value at every place, 29 February counted as often as it comes.
pub(super) fn monthly_means(value_at: impl Fn(usize) -> f64) -> [f64; 12] {
    let mut sums = [0.0; 12];
    let mut days = [0.0; 12];
    for place in 0..PLACES {
        let month = month_of(place);
        sums[month] += days_per_year(place) * value_at(place);
        days[month] += days_per_year(place);
    }
    core::array::from_fn(|month| sums[month] / days[month])
}

/// The value at a place, on straight lines between the middles of the months.
pub(super) fn between_months(mid_month: &[f64; 12], place: usize) -> f64 {
    let month = month_of(place);
    let first: usize = MONTH_DAYS[..month].iter().sum();
    let from_middle = (place - first) as f64 + 0.5 - MONTH_DAYS[month] as f64 / 2.0;
    let next = if from_middle < 0.0 { (month + 11) % 12 } else { (month + 1) % 12 };
    let apart = (MONTH_DAYS[month] + MONTH_DAYS[next]) as f64 / 2.0;
    let share = from_middle.abs() / apart;
    mid_month[month] + share * (mid_month[next] - mid_month[month])
}

/// The terms of a curve of two waves at a place: 1, cosine and sine once a year, cosine and sine twice a year.
pub(super) fn curve_terms(place: usize) -> [f64; CURVE_TERMS] {
    let angle = 2.0 * PI * (place as f64 + 0.5) / PLACES as f64;
    [1.0, libm::cos(angle), libm::sin(angle), libm::cos(2.0 * angle), libm::sin(2.0 * angle)]
}

/// A smooth curve over the year: a mean and two waves, one with one peak a year and one with two.
///
/// Values are in the unit of whatever the curve describes. Peak days count from 1 January = 1 to 31 December = 366.
#[derive(Debug, Clone, Copy, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct SeasonalCurve {
    /// Mean over the year.
    pub mean: f64,
    /// Half the swing of the wave that peaks once a year.
    #[serde(default)]
    pub yearly_swing: f64,
    /// Day on which the yearly wave peaks.
    #[serde(default)]
    pub yearly_peak_day: f64,
    /// Half the swing of the wave that peaks twice a year.
    #[serde(default)]
    pub half_yearly_swing: f64,
    /// First day on which the half-yearly wave peaks.
    #[serde(default)]
    pub half_yearly_peak_day: f64,
}

impl SeasonalCurve {
    /// The same value all year.
    pub const fn flat(mean: f64) -> Self {
        Self { mean, yearly_swing: 0.0, yearly_peak_day: 0.0, half_yearly_swing: 0.0, half_yearly_peak_day: 0.0 }
    }

    /// One wave a year about a mean.
    pub const fn yearly(mean: f64, yearly_swing: f64, yearly_peak_day: f64) -> Self {
        Self { mean, yearly_swing, yearly_peak_day, half_yearly_swing: 0.0, half_yearly_peak_day: 0.0 }
    }

    /// The value at a place (0–365) of the leap-year calendar.
    pub(super) fn at(&self, place: usize) -> f64 {
        let wave = |peak_day: f64, per_year: f64| {
            libm::cos(2.0 * PI * per_year * (place as f64 + 1.0 - peak_day) / PLACES as f64)
        };
        self.mean
            + self.yearly_swing * wave(self.yearly_peak_day, 1.0)
            + self.half_yearly_swing * wave(self.half_yearly_peak_day, 2.0)
    }

    /// The curve with the given weights of `curve_terms`.
    pub(super) fn from_terms(terms: &[f64; CURVE_TERMS]) -> Self {
        let peak = |cosine: f64, sine: f64, per_year: f64| {
            let turn = libm::atan2(sine, cosine) / (2.0 * PI);
            let turn = if turn < 0.0 { turn + 1.0 } else { turn };
            turn * PLACES as f64 / per_year + 0.5
        };
        Self {
            mean: terms[0],
            yearly_swing: libm::hypot(terms[1], terms[2]),
            yearly_peak_day: peak(terms[1], terms[2], 1.0),
            half_yearly_swing: libm::hypot(terms[3], terms[4]),
            half_yearly_peak_day: peak(terms[3], terms[4], 2.0),
        }
    }

    /// The curve with every value multiplied.
    pub(super) fn times(&self, factor: f64) -> Self {
        Self {
            mean: self.mean * factor,
            yearly_swing: self.yearly_swing * factor,
            half_yearly_swing: self.half_yearly_swing * factor,
            ..*self
        }
    }

    /// Whether every number of the curve is finite.
    pub(super) fn is_finite(&self) -> bool {
        [self.mean, self.yearly_swing, self.yearly_peak_day, self.half_yearly_swing, self.half_yearly_peak_day]
            .iter()
            .all(|value| value.is_finite())
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn places_and_months_agree() {
        assert_eq!(place_of(1, 1), 0);
        assert_eq!(place_of(2, 29), 59);
        assert_eq!(place_of(12, 31), 365);
        assert_eq!((month_of(30), month_of(31), month_of(59), month_of(60), month_of(365)), (0, 1, 1, 2, 11));
    }

    #[test]
    fn lines_pass_through_mid_month_and_join_at_new_year() {
        let values: [f64; 12] = core::array::from_fn(|month| month as f64);
        // The sixteenth day is the middle of a month of 31 days.
        assert_eq!(between_months(&values, place_of(7, 16)), 6.0);
        let last = between_months(&values, 365);
        let first = between_months(&values, 0);
        assert!((last - first).abs() <= 11.0 / 31.0 + 1e-12, "{last} {first}");
        assert!((0..PLACES).all(|place| between_months(&[3.5; 12], place) == 3.5));
    }

    #[test]
    fn a_curve_and_its_terms_are_one() {
        let weights = [4.0, -2.0, 1.5, 0.3, -0.7];
        let curve = SeasonalCurve::from_terms(&weights);
        for place in 0..PLACES {
            let direct: f64 = curve_terms(place).iter().zip(&weights).map(|(term, weight)| term * weight).sum();
            assert!((curve.at(place) - direct).abs() < 1e-12);
        }
        assert!((curve.times(2.0).at(100) - 2.0 * curve.at(100)).abs() < 1e-12);
    }
}
