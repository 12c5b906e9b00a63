//! What could be said without a model: the mean of each day of the year.
//!
//! The benchmark of Garrick, Cunnane & Nash (1978), *Journal of Hydrology* 36, 375–381: a model of a river with a strong
//! season has shown little if it does not beat the season itself.

use crate::water::calendar::CalendarDay;

/// The mean observed value of each day of a leap year.
#[derive(Clone, Debug, PartialEq)]
pub struct DayOfYearMean {
    mean: [f64; 366],
}

fn index(day: &CalendarDay) -> usize {
    usize::from(day.month_day.leap_day_of_year() - 1) % 366
}

impl DayOfYearMean {
    /// The means of `observed`, over the days that are not missing. A day of the year that was never observed is missing,
    /// but for 29 February, which then takes the mean of 28 February.
    pub fn of(calendar: &[CalendarDay], observed: &[f64]) -> Self {
        let (mut sum, mut count) = ([0.0; 366], [0.0; 366]);
        for (day, value) in calendar.iter().zip(observed).filter(|(_, value)| !value.is_nan()) {
            sum[index(day)] += value;
            count[index(day)] += 1.0;
        }
        let mut mean = core::array::from_fn(|day| if count[day] > 0.0 { sum[day] / count[day] } else { f64::NAN });
        let leap_day = 59;
        if mean[leap_day].is_nan() {
            mean[leap_day] = mean[leap_day - 1];
        }
        Self { mean }
    }

    /// The guess for a day; NaN where the day of the year was never observed.
    pub fn on(&self, day: &CalendarDay) -> f64 {
        self.mean[index(day)]
    }
}
