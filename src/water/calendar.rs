//! Days as the water needs them: day of year for the sun, month for the seasons, water year for the accounts.

use chrono::{Datelike, NaiveDate};
use serde::{Deserialize, Serialize};

/// A month and a day of it, as a rule that comes round every year is dated (1 March, 15 November).
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Serialize, Deserialize)]
pub struct MonthDay {
    /// 1 to 12.
    pub month: u8,
    /// 1 to 31.
    pub day: u8,
}

impl MonthDay {
    /// A month and day that exist in a leap year, or `None`.
    pub fn new(month: u8, day: u8) -> Option<Self> {
        NaiveDate::from_ymd_opt(2000, month.into(), day.into()).map(|_| Self { month, day })
    }

    /// A number that rises through the year as the dates do.
    #[inline(always)]
    pub(super) fn rank(self) -> u16 {
        u16::from_be_bytes([self.month, self.day])
    }

    /// Day of a leap year, 1 to 366: a fixed place on the circle of the year whatever the year's length.
    pub fn leap_day_of_year(self) -> u16 {
        const BEFORE: [u16; 12] = [0, 31, 60, 91, 121, 152, 182, 213, 244, 274, 305, 335];
        BEFORE[usize::from((self.month.clamp(1, 12)) - 1)] + u16::from(self.day)
    }
}

/// The days from `from` to `to`, both included, every year; may run over New Year.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct Season {
    /// First day.
    pub from: MonthDay,
    /// Last day.
    pub to: MonthDay,
}

impl Season {
    /// The whole year.
    pub const ALL_YEAR: Season = Season { from: MonthDay { month: 1, day: 1 }, to: MonthDay { month: 12, day: 31 } };

    /// Whether `day` lies in the season.
    #[inline(always)]
    pub fn holds(self, day: MonthDay) -> bool {
        let (from, to, day) = (self.from.rank(), self.to.rank(), day.rank());
        let (begun, not_over) = (from <= day, day <= to);
        if from <= to { begun & not_over } else { begun | not_over }
    }
}

/// One day of the record, with everything about its date that the day loop asks for worked out beforehand.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct CalendarDay {
    /// The water year that the day belongs to, named for the calendar year in which it ends.
    pub water_year: i32,
    /// 1 to 366; 29 February is day 60.
    pub day_of_year: u16,
    /// 1 on the first day of the water year.
    pub day_of_water_year: u16,
    /// Month and day.
    pub month_day: MonthDay,
}

impl CalendarDay {
    /// The day `date` in water years that start on the first of `water_year_start_month` (1 to 12).
    pub fn new(date: NaiveDate, water_year_start_month: u8) -> Self {
        let start_month = u32::from(water_year_start_month.clamp(1, 12));
        let (year, month) = (date.year(), date.month());
        // A year that starts in January is the calendar year itself.
        let water_year = if start_month > 1 && month >= start_month { year + 1 } else { year };
        let first_year = if start_month > 1 { water_year - 1 } else { water_year };
        let first = NaiveDate::from_ymd_opt(first_year, start_month, 1).unwrap_or(date);
        Self {
            water_year,
            day_of_year: date.ordinal() as u16,
            day_of_water_year: (date - first).num_days() as u16 + 1,
            month_day: MonthDay { month: month as u8, day: date.day() as u8 },
        }
    }

    /// Month as an index, 0 for January.
    pub fn month_index(self) -> usize {
        usize::from(self.month_day.month - 1)
    }

    /// Whether the next day starts another water year.
    pub fn is_last_of_water_year(self, water_year_start_month: u8) -> bool {
        let tomorrow = self.date(water_year_start_month).succ_opt();
        tomorrow.is_some_and(|date| CalendarDay::new(date, water_year_start_month).day_of_water_year == 1)
    }

    /// The date on the calendar.
    pub fn date(self, water_year_start_month: u8) -> NaiveDate {
        let later = water_year_start_month > 1 && self.month_day.month >= water_year_start_month;
        let year = if later { self.water_year - 1 } else { self.water_year };
        NaiveDate::from_yo_opt(year, self.day_of_year.into()).unwrap_or_default()
    }
}

/// Fills `days` with consecutive days from `start`.
pub fn fill_calendar(start: NaiveDate, water_year_start_month: u8, days: &mut [CalendarDay]) {
    let mut date = start;
    for day in days {
        *day = CalendarDay::new(date, water_year_start_month);
        date = date.succ_opt().unwrap_or(date);
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn date(text: &str) -> NaiveDate {
        text.parse().unwrap()
    }

    #[test]
    fn a_water_year_is_named_for_the_year_in_which_it_ends() {
        let autumn = CalendarDay::new(date("2003-10-01"), 10);
        assert_eq!((autumn.water_year, autumn.day_of_water_year, autumn.day_of_year), (2004, 1, 274));
        let leap = CalendarDay::new(date("2004-02-29"), 10);
        assert_eq!((leap.water_year, leap.day_of_water_year, leap.day_of_year), (2004, 152, 60));
        assert_eq!(CalendarDay::new(date("2004-09-30"), 10).day_of_water_year, 366);
    }

    #[test]
    fn southern_and_calendar_water_years() {
        assert_eq!(CalendarDay::new(date("2004-04-01"), 4).water_year, 2005);
        assert_eq!(CalendarDay::new(date("2004-03-31"), 4).water_year, 2004);
        let plain = CalendarDay::new(date("2004-12-31"), 1);
        assert_eq!((plain.water_year, plain.day_of_water_year), (2004, 366));
    }

    #[test]
    fn a_day_knows_its_date_again() {
        let mut day = date("1999-01-01");
        while day < date("2005-01-01") {
            for start in [1, 4, 7, 10] {
                assert_eq!(CalendarDay::new(day, start).date(start), day);
            }
            day = day.succ_opt().unwrap();
        }
    }

    #[test]
    fn a_season_may_run_over_new_year() {
        let md = |month, day| MonthDay::new(month, day).unwrap();
        let summer = Season { from: md(10, 1), to: md(4, 15) };
        assert!(summer.holds(md(10, 1)) && summer.holds(md(1, 1)) && summer.holds(md(4, 15)));
        assert!(!summer.holds(md(4, 16)) && !summer.holds(md(9, 30)));
        assert!(Season::ALL_YEAR.holds(md(2, 29)));
        assert_eq!(MonthDay::new(2, 30), None);
    }
}
