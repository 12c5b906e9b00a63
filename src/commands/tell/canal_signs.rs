//! The signs of one canal's year, by their stable keys.

use crate::signs::CanalSigns;
use crate::water::calendar::CalendarDay;

/// How a sign of a canal is read.
#[derive(Clone, Copy)]
pub(super) enum Reading {
    /// A number in the unit of its key.
    Number(fn(&CanalSigns) -> Option<f64>),
    /// A date.
    Date(fn(&CanalSigns) -> Option<CalendarDay>),
}

/// Every sign of a canal after its name and the year of its right.
pub(super) const CANAL_SIGNS: [(&str, Reading); 9] = [
    ("supply_ratio", Reading::Number(|canal| canal.supply_ratio)),
    ("days_full", Reading::Number(|canal| Some(f64::from(canal.days_full)))),
    ("days_cut", Reading::Number(|canal| Some(f64::from(canal.days_cut)))),
    ("days_short", Reading::Number(|canal| Some(f64::from(canal.days_short)))),
    ("first_short_date", Reading::Date(|canal| canal.first_short_date)),
    ("last_full_date", Reading::Date(|canal| canal.last_full_date)),
    ("last_water_date", Reading::Date(|canal| canal.last_water_date)),
    ("stored_draw_hm3", Reading::Number(|canal| Some(canal.stored_draw_hm3))),
    ("account_end_hm3", Reading::Number(|canal| Some(canal.account_end_hm3))),
];

impl Reading {
    /// The sign as a number; a date as the day of the water year.
    pub fn number(self, canal: &CanalSigns) -> Option<f64> {
        match self {
            Reading::Number(read) => read(canal),
            Reading::Date(read) => read(canal).map(|date| f64::from(date.day_of_water_year)),
        }
    }
}

/// Whether the sign of this key is a date.
pub(super) fn is_date(key: &str) -> bool {
    key.ends_with("_date")
}
