//! The season and the flow-duration curve, observed and modelled on the same days.

use crate::signs::skill::{exceeded_m3s, sort_flows};
use crate::water::calendar::CalendarDay;

/// Shares of time for which the duration curve is told.
pub const DURATION_SHARES: [f64; 11] = [0.01, 0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.95];

/// A month of the year over all years.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct MonthOfYear {
    /// 1 to 12.
    pub month: u8,
    /// Mean observed flow, m³/s; NaN where never observed.
    pub observed_m3s: f64,
    /// Mean modelled flow on the same days.
    pub modelled_m3s: f64,
}

/// A point of the duration curve.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DurationPoint {
    /// Share of time, 0 to 1.
    pub share: f64,
    /// Flow that is exceeded for that share, observed, m³/s.
    pub observed_m3s: f64,
    /// Modelled.
    pub modelled_m3s: f64,
}

/// The months that are told as late summer.
pub type LateSummer = [u8; 2];

/// The two months in which canals live off what is left: August and September, February and March in the south (common
/// practice, no source).
pub fn late_summer_months(southern: bool) -> LateSummer {
    if southern { [2, 3] } else { [8, 9] }
}

/// The months in the order of the water year.
pub(super) fn months(
    calendar: &[CalendarDay],
    modelled: &[f64],
    observed: &[f64],
    start_month: u8,
) -> [MonthOfYear; 12] {
    let mut sums = [(0.0, 0.0, 0.0); 12];
    for ((day, m), o) in calendar.iter().zip(modelled).zip(observed) {
        if !m.is_nan() && !o.is_nan() {
            let sum = &mut sums[day.month_index()];
            *sum = (sum.0 + 1.0, sum.1 + m, sum.2 + o);
        }
    }
    std::array::from_fn(|step| {
        let index = (usize::from(start_month.clamp(1, 12)) - 1 + step) % 12;
        let (count, modelled, observed) = sums[index];
        MonthOfYear { month: index as u8 + 1, observed_m3s: observed / count, modelled_m3s: modelled / count }
    })
}

/// Both series on the days that have both, sorted from high to low.
pub(super) fn sorted(modelled: &[f64], observed: &[f64]) -> [Vec<f64>; 2] {
    let pairs = modelled.iter().zip(observed).filter(|(m, o)| !m.is_nan() && !o.is_nan());
    let (mut modelled, mut observed): (Vec<f64>, Vec<f64>) = pairs.map(|(m, o)| (*m, *o)).unzip();
    sort_flows(&mut modelled);
    sort_flows(&mut observed);
    [modelled, observed]
}

/// The duration curve of two sorted series.
pub(super) fn duration([modelled, observed]: &[Vec<f64>; 2]) -> Vec<DurationPoint> {
    let point = |share: f64| {
        let modelled_m3s = exceeded_m3s(modelled, share)?;
        Some(DurationPoint { share, observed_m3s: exceeded_m3s(observed, share)?, modelled_m3s })
    };
    DURATION_SHARES.into_iter().filter_map(point).collect()
}
