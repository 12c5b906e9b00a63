//! Choosing a year: dry, middling, wet, or any by name.
//!
//! Whole water years are ranked by the natural flow of the run as it was. The driest third is dry, the wettest third
//! wet, what remains is middling (both outer thirds are rounded down, and hold one year at least). The year that stands
//! for a third is its median: of an even number, the drier of the two in the middle. Years of equal flow keep their
//! order in time.

use serde::{Deserialize, Serialize};

use crate::signs::YearReport;

/// A third of the years.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum Third {
    /// The driest.
    Dry,
    /// What lies between.
    Middling,
    /// The wettest.
    Wet,
}

impl Third {
    /// All three, driest first.
    pub const ALL: [Third; 3] = [Third::Dry, Third::Middling, Third::Wet];
}

/// Which year is shown.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum YearChoice {
    /// The year that stands for a third.
    Of(Third),
    /// Any year, counted from 0 in the whole water years of the record.
    Any(usize),
}

/// What the year chooser knows of the record.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct YearList {
    days: Vec<u16>,
    thirds: Vec<Third>,
    standing: [usize; 3],
}

impl YearList {
    /// Ranks the years of the run as it was; `None` without any whole water year.
    pub fn of(years: &[YearReport]) -> Option<Self> {
        Self::by_flow(years.iter().map(|report| (report.year.days as u16, report.signs.natural_flow_hm3)))
    }

    /// Ranks years of `(days, natural_flow_hm3)`, in their order in time; `None` without any.
    pub fn by_flow(years: impl IntoIterator<Item = (u16, f64)>) -> Option<Self> {
        let (days, flows): (Vec<u16>, Vec<f64>) = years.into_iter().unzip();
        let count = flows.len();
        if count == 0 || days.contains(&0) {
            return None;
        }
        let mut by_flow: Vec<usize> = (0..count).collect();
        by_flow.sort_by(|a, b| flows[*a].total_cmp(&flows[*b]));
        let outer = (count / 3).max(1);
        let middle = if count < 3 { (count - 1) / 2..(count - 1) / 2 + 1 } else { outer..count - outer };
        let median = |from: usize, to: usize| by_flow[(from + to - 1) / 2];
        let standing = [median(0, outer), median(middle.start, middle.end), median(count - outer, count)];
        let mut thirds = vec![Third::Middling; count];
        by_flow[count - outer..].iter().for_each(|year| thirds[*year] = Third::Wet);
        by_flow[..outer].iter().for_each(|year| thirds[*year] = Third::Dry);
        Some(Self { days, thirds, standing })
    }

    /// How many years there are; at least one.
    pub fn count(&self) -> usize {
        self.days.len()
    }

    /// The index of the year that a choice means; `None` for a year that is not there.
    pub fn index(&self, choice: YearChoice) -> Option<usize> {
        match choice {
            YearChoice::Of(third) => Some(self.standing[third as usize]),
            YearChoice::Any(index) => (index < self.count()).then_some(index),
        }
    }

    /// Days of a year; `None` for a year that is not there.
    pub fn days(&self, index: usize) -> Option<u16> {
        self.days.get(index).copied()
    }

    /// The third that a year is in; `None` for a year that is not there.
    pub fn third(&self, index: usize) -> Option<Third> {
        self.thirds.get(index).copied()
    }

    /// Place of a choice in the list that a person turns through: dry, middling, wet, then year by year.
    pub(super) fn place(&self, choice: YearChoice) -> usize {
        match choice {
            YearChoice::Of(third) => third as usize,
            YearChoice::Any(index) => Third::ALL.len() + index,
        }
    }

    /// The choice at a place of that list.
    pub(super) fn at_place(&self, place: usize) -> Option<YearChoice> {
        match place.checked_sub(Third::ALL.len()) {
            None => Some(YearChoice::Of(Third::ALL[place])),
            Some(index) => (index < self.count()).then_some(YearChoice::Any(index)),
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn list(flows: &[f64]) -> YearList {
        YearList::by_flow(flows.iter().map(|flow| (365, *flow))).unwrap()
    }

    #[test]
    fn a_third_is_shown_by_its_median() {
        // Ranked: 10 20 30 | 40 50 60 | 70 80 90, whose middles are 20, 50 and 80.
        let years = list(&[90.0, 20.0, 50.0, 10.0, 80.0, 60.0, 30.0, 70.0, 40.0]);
        assert_eq!(Third::ALL.map(|third| years.index(YearChoice::Of(third))), [Some(1), Some(2), Some(4)]);
        assert_eq!(years.third(3), Some(Third::Dry));
        assert_eq!(years.third(5), Some(Third::Middling));
        // Ranked: 1 2 | 3 4 5 6 | 7 8: of two the drier, of four the second.
        let years = list(&[1.0, 2.0, 3.0, 4.0, 5.0, 6.0, 7.0, 8.0]);
        assert_eq!(Third::ALL.map(|third| years.index(YearChoice::Of(third))), [Some(0), Some(3), Some(6)]);
    }

    #[test]
    fn short_records_have_all_three_too() {
        assert!(YearList::by_flow([]).is_none());
        for flows in [&[5.0][..], &[5.0, 4.0], &[5.0, 4.0, 6.0]] {
            let years = list(flows);
            let chosen = Third::ALL.map(|third| flows[years.index(YearChoice::Of(third)).unwrap()]);
            assert!(chosen[0] <= chosen[1] && chosen[1] <= chosen[2], "{chosen:?}");
        }
    }

    #[test]
    fn places_lead_through_all_choices_and_back() {
        let years = list(&[3.0, 1.0, 2.0, 2.0]);
        for place in 0..7 {
            assert_eq!(years.place(years.at_place(place).unwrap()), place);
        }
        assert_eq!(years.at_place(7), None);
        assert_eq!(years.index(YearChoice::Any(4)), None);
    }
}
