//! How far a modelled river, snow, lake and canals were right: every score that people are told, and what each is good for.
//!
//! [`FlowTrust`] reads a modelled daily flow against the gauge; [`StoreTrust`] a lake, a canal or snow against its record.
//! [`verdict`] turns them into a plain answer for each use, by thresholds that are written there. Where a fit has been
//! tested, what is read here are years modelled by a set that never saw them ([`crossed`]).

mod flow;
mod season;
mod store;
pub mod verdict;
mod years;

pub use flow::{Daily, FlowTrust, Monthly};
pub use season::{DURATION_SHARES, DurationPoint, LateSummer, MonthOfYear, late_summer_months};
pub use store::StoreTrust;
pub use verdict::{Known, Need, Ruling, Score, Use};
pub use years::{SnowLink, YearSkill};

use super::split::{Parting, SplitTest};
use crate::water::calendar::CalendarDay;

/// Each year of `flows` (one series for each half of the test, by the set fitted on that half) as the other half's set
/// gives it; NaN on days of years that are in neither half.
pub fn crossed(test: &SplitTest, calendar: &[CalendarDay], flows: [&[f64]; 2]) -> Vec<f64> {
    let of = |(day, today): (usize, &CalendarDay)| {
        let own = test.halves.iter().position(|half| half.water_years.contains(&today.water_year));
        own.and_then(|own| flows[1 - own].get(day).copied()).unwrap_or(f64::NAN)
    };
    calendar.iter().enumerate().map(of).collect()
}

/// The test by which years are crossed: earlier against later ones, which every fit with a test has.
pub fn crossing(tests: &[SplitTest]) -> Option<&SplitTest> {
    tests.iter().find(|test| test.parting == Parting::EarlierLater)
}
