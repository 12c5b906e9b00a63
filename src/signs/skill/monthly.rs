//! Means of calendar months, on which the published bands are defined.

use super::pairs::Pairs;
use crate::water::calendar::CalendarDay;

/// Share of a month's days that must be there for its mean to count (common practice, no source).
const LEAST_SHARE_OF_DAYS: f64 = 0.8;
/// Days of each month, February without its leap day.
const DAYS: [u16; 12] = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/// A month of the record.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct MonthMean {
    /// Water year that the month belongs to.
    pub water_year: i32,
    /// 1 to 12.
    pub month: u8,
    /// Mean of the modelled values on the days that have both, in the unit of the series.
    pub modelled: f64,
    /// Mean of the observed values on the same days.
    pub observed: f64,
}

/// The months of a record, in order; those with fewer than four days in five are left out.
#[derive(Clone, Debug)]
pub struct MonthlyMeans<'s> {
    calendar: &'s [CalendarDay],
    modelled: &'s [f64],
    observed: &'s [f64],
}

impl<'s> MonthlyMeans<'s> {
    /// The months of series that are as long as `calendar`; the shortest counts.
    pub fn new(calendar: &'s [CalendarDay], modelled: &'s [f64], observed: &'s [f64]) -> Self {
        let days = calendar.len().min(modelled.len()).min(observed.len());
        Self { calendar: &calendar[..days], modelled: &modelled[..days], observed: &observed[..days] }
    }
}

impl Iterator for MonthlyMeans<'_> {
    type Item = MonthMean;

    fn next(&mut self) -> Option<MonthMean> {
        loop {
            let first = self.calendar.first()?;
            let month = first.month_day.month;
            let days = self.calendar.iter().take_while(|day| day.month_day.month == month).count();
            let (mut count, mut modelled, mut observed) = (0.0, 0.0, 0.0);
            for (m, o) in self.modelled[..days].iter().zip(&self.observed[..days]) {
                if !m.is_nan() && !o.is_nan() {
                    (count, modelled, observed) = (count + 1.0, modelled + m, observed + o);
                }
            }
            self.calendar = &self.calendar[days..];
            self.modelled = &self.modelled[days..];
            self.observed = &self.observed[days..];
            if count >= LEAST_SHARE_OF_DAYS * f64::from(DAYS[first.month_index()]) {
                let water_year = first.water_year;
                return Some(MonthMean { water_year, month, modelled: modelled / count, observed: observed / count });
            }
        }
    }
}

/// Nash–Sutcliffe efficiency and percent bias of the monthly means. `None` where there are fewer than two months, or the
/// observed ones do not vary or have no mean.
pub fn monthly_skill(calendar: &[CalendarDay], modelled: &[f64], observed: &[f64]) -> Option<(f64, f64)> {
    let months = MonthlyMeans::new(calendar, modelled, observed);
    let pairs = Pairs::of(months.map(|month| (month.modelled, month.observed)))?;
    Some((pairs.nash_sutcliffe()?, pairs.percent_bias()?))
}
