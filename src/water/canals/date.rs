//! The priority date of a water right.

/// The priority date of a right; the earlier date has the older, stronger right.
///
/// Two rights of one date are legal: the one further upstream then comes first.
///
/// ```
/// use deshielo::water::canals::PriorityDate;
///
/// assert!(PriorityDate::BeforeAll < PriorityDate::year(1868));
/// assert!(PriorityDate::year(1889) < PriorityDate::on(1889, 1, 2));
/// ```
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash, serde::Serialize, serde::Deserialize)]
pub enum PriorityDate {
    /// Before every date.
    BeforeAll,
    /// A calendar date.
    On {
        /// Calendar year.
        year: i32,
        /// Month, 1 to 12.
        month: u8,
        /// Day of the month, 1 to 31.
        day: u8,
    },
}

impl PriorityDate {
    /// The date of a right of which only the year is known: 1 January of it.
    pub const fn year(year: i32) -> Self {
        Self::on(year, 1, 1)
    }

    /// The date of a right by year, month and day. Whether the calendar has that day is the caller's to check.
    pub const fn on(year: i32, month: u8, day: u8) -> Self {
        Self::On { year, month, day }
    }

    /// The year of the right, none where it comes before every date.
    pub const fn right_year(self) -> Option<i32> {
        match self {
            Self::BeforeAll => None,
            Self::On { year, .. } => Some(year),
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn dates_order_by_year_month_day() {
        let in_order = [
            PriorityDate::BeforeAll,
            PriorityDate::year(-3000),
            PriorityDate::on(1868, 6, 15),
            PriorityDate::on(1868, 11, 2),
            PriorityDate::on(1868, 11, 3),
            PriorityDate::year(1869),
        ];
        assert!(in_order.windows(2).all(|pair| pair[0] < pair[1]));
    }
}
