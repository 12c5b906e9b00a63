//! The tally: how often what was used, day by day. Nothing in it says who.
//!
//! A view, a dial, a language or a lesson counts once a visit, however often it was turned to. Days come from the clock
//! and only while it is believable; the rest is counted without a day. The newest [`MOST_DAYS`] days are kept one by one,
//! what is older in one sum, so that the file has a bound.

use std::collections::BTreeMap;

use chrono::NaiveDate;
use serde::{Deserialize, Serialize};

use crate::session::View;
use crate::session::kiosk::Count;

/// Days that are kept one by one: a year and a little.
pub const MOST_DAYS: usize = 370;
/// Languages and lessons that are counted by name on one day; the rest counts under `OTHERS`.
pub const MOST_NAMES: usize = 6;
/// Letters of a name that are kept.
const MOST_LETTERS: usize = 32;
/// The name for all that have no room.
const OTHERS: &str = "+";

/// Counts of one day, or of many.
#[derive(Clone, Debug, Default, PartialEq, Eq, Serialize, Deserialize)]
#[serde(default)]
pub struct Counts {
    /// Visits: from a touch until everything was left alone.
    pub visits: u32,
    /// Minutes of all visits together, whole ones.
    pub minutes: u32,
    /// Visits in which a view was opened.
    #[serde(skip_serializing_if = "BTreeMap::is_empty")]
    pub views: BTreeMap<View, u32>,
    /// Visits in which a dial was turned, by its key.
    #[serde(skip_serializing_if = "BTreeMap::is_empty")]
    pub dials: BTreeMap<String, u32>,
    /// Visits in a language, by its tag; two at once as `en+es`.
    #[serde(skip_serializing_if = "BTreeMap::is_empty")]
    pub languages: BTreeMap<String, u32>,
    /// Visits with a lesson, by its key.
    #[serde(skip_serializing_if = "BTreeMap::is_empty")]
    pub lessons: BTreeMap<String, u32>,
}

/// Counts of a day.
#[derive(Clone, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct DayCount {
    /// The day.
    pub day: NaiveDay,
    /// What was counted.
    #[serde(flatten)]
    pub counts: Counts,
}

/// A day as days since 1970-01-01.
type NaiveDay = i32;

/// The whole tally.
#[derive(Clone, Debug, Default, PartialEq, Eq, Serialize, Deserialize)]
#[serde(default)]
pub struct Tally {
    /// Days, the oldest first.
    days: Vec<DayCount>,
    /// What was counted while the clock could not be believed.
    undated: Counts,
    /// The sum of days that are older than those kept.
    earlier: Counts,
}

impl Counts {
    fn add(&mut self, count: &Count<'_>) {
        let one = |number: &mut u32| *number = number.saturating_add(1);
        match count {
            Count::Visit => one(&mut self.visits),
            Count::Minutes(minutes) => self.minutes = self.minutes.saturating_add(*minutes),
            Count::View(view) => one(self.views.entry(*view).or_default()),
            Count::Dial(dial) => one(self.dials.entry(dial.key().to_owned()).or_default()),
            Count::Language(tag) => one(by_name(&mut self.languages, tag)),
            Count::Lesson(key) => one(by_name(&mut self.lessons, key)),
        }
    }

    fn join(&mut self, other: &Counts) {
        let add = |to: &mut u32, more: u32| *to = to.saturating_add(more);
        add(&mut self.visits, other.visits);
        add(&mut self.minutes, other.minutes);
        other.views.iter().for_each(|(view, more)| add(self.views.entry(*view).or_default(), *more));
        other.dials.iter().for_each(|(dial, more)| add(self.dials.entry(dial.clone()).or_default(), *more));
        other.languages.iter().for_each(|(name, more)| add(by_name(&mut self.languages, name), *more));
        other.lessons.iter().for_each(|(name, more)| add(by_name(&mut self.lessons, name), *more));
    }

    /// Whether nothing was counted.
    pub fn is_empty(&self) -> bool {
        *self == Self::default()
    }
}

/// The number under a name, or under that of all others where there is no room.
fn by_name<'a>(numbers: &'a mut BTreeMap<String, u32>, name: &str) -> &'a mut u32 {
    let name: String = name.chars().filter(|letter| !letter.is_control()).take(MOST_LETTERS).collect();
    let has_room = numbers.contains_key(&name) || numbers.len() < MOST_NAMES;
    numbers.entry(if has_room { name } else { OTHERS.to_owned() }).or_default()
}

impl Tally {
    /// Counts something on a day, or without one.
    pub fn add(&mut self, count: &Count<'_>, day: Option<NaiveDay>) {
        let Some(day) = day else { return self.undated.add(count) };
        let at = match self.days.binary_search_by_key(&day, |other| other.day) {
            Ok(at) => at,
            Err(at) => {
                self.days.insert(at, DayCount { day, counts: Counts::default() });
                at
            }
        };
        self.days[at].counts.add(count);
        self.fold();
    }

    /// Brings the oldest days into the sum until the rest has room; also those of a file from elsewhere.
    fn fold(&mut self) {
        let over = self.days.len().saturating_sub(MOST_DAYS);
        for old in self.days.drain(..over) {
            self.earlier.join(&old.counts);
        }
    }

    /// Days with their counts, the oldest first.
    pub fn days(&self) -> impl Iterator<Item = (NaiveDate, &Counts)> {
        let start = NaiveDate::default();
        self.days.iter().filter_map(move |day| {
            let date = start.checked_add_signed(chrono::Duration::days(day.day.into()))?;
            Some((date, &day.counts))
        })
    }

    /// The sum of the days from one to another, both included; open ends take what has no day as well.
    pub fn sum(&self, from: Option<NaiveDate>, to: Option<NaiveDate>) -> Counts {
        let mut sum = Counts::default();
        let inside = |date: NaiveDate| from.is_none_or(|from| from <= date) && to.is_none_or(|to| date <= to);
        self.days().filter(|(date, _)| inside(*date)).for_each(|(_, counts)| sum.join(counts));
        if from.is_none() && to.is_none() {
            sum.join(&self.earlier);
            sum.join(&self.undated);
        }
        sum
    }

    /// What was counted while the clock could not be believed.
    pub fn undated(&self) -> &Counts {
        &self.undated
    }

    /// The sum of days older than those that are kept one by one.
    pub fn earlier(&self) -> &Counts {
        &self.earlier
    }

    /// Sets right what a file from elsewhere may hold: days out of order, twice, or too many.
    #[must_use]
    pub fn tidied(self) -> Self {
        let mut tidy = Self { days: Vec::new(), undated: Counts::default(), earlier: Counts::default() };
        tidy.undated.join(&self.undated);
        tidy.earlier.join(&self.earlier);
        let mut days = self.days;
        days.sort_by_key(|day| day.day);
        for day in days {
            match tidy.days.last_mut().filter(|last| last.day == day.day) {
                Some(last) => last.counts.join(&day.counts),
                None => tidy.days.push(day),
            }
        }
        tidy.fold();
        tidy
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::keep::MOST_BYTES;
    use crate::water::dials::Dial;

    fn all_of_a_day(tally: &mut Tally, day: Option<i32>) {
        tally.add(&Count::Visit, day);
        tally.add(&Count::Minutes(4_000_000_000), day);
        View::ALL.iter().for_each(|view| tally.add(&Count::View(*view), day));
        Dial::ALL.iter().for_each(|dial| tally.add(&Count::Dial(*dial), day));
        for name in 0..20 {
            tally.add(&Count::Language(&format!("{name:040}")), day);
            tally.add(&Count::Lesson(&format!("{name:ñ>40}")), day);
        }
    }

    #[test]
    fn the_fullest_tally_fits_its_file_and_loses_no_visit() {
        let mut tally = Tally::default();
        for day in 0..3000 {
            all_of_a_day(&mut tally, Some(20_000 + day));
        }
        all_of_a_day(&mut tally, None);
        assert_eq!(tally.days.len(), MOST_DAYS);
        assert_eq!(tally.sum(None, None).visits, 3001);
        // Every number as long as it can be.
        for day in &mut tally.days {
            day.counts.visits = u32::MAX;
            let maps = [&mut day.counts.dials, &mut day.counts.languages, &mut day.counts.lessons];
            maps.into_iter().flat_map(BTreeMap::values_mut).for_each(|number| *number = u32::MAX);
            day.counts.views.values_mut().for_each(|number| *number = u32::MAX);
        }
        let text = serde_json::to_string(&tally).unwrap();
        assert!(text.len() < MOST_BYTES, "{} bytes", text.len());
        assert_eq!(serde_json::from_str::<Tally>(&text).unwrap(), tally);
    }

    #[test]
    fn sums_take_both_ends_and_open_ends_take_what_has_no_day() {
        let mut tally = Tally::default();
        // 2026-11-30, and the clock jumps back a day and forth again.
        for day in [20_787, 20_786, 20_788, 20_787] {
            tally.add(&Count::Visit, Some(day));
        }
        tally.add(&Count::Visit, None);
        let date = |day| NaiveDate::from_ymd_opt(2026, 11, day);
        assert_eq!(tally.sum(date(30), date(30)).visits, 2);
        assert_eq!(tally.sum(date(29), date(30)).visits, 3);
        assert_eq!(tally.sum(None, date(29)).visits, 1);
        assert_eq!(tally.sum(None, None).visits, 5);
        assert!(tally.days().map(|(date, _)| date).is_sorted());
    }

    #[test]
    fn a_file_from_elsewhere_is_set_right() {
        let day = |day, visits| DayCount { day, counts: Counts { visits, ..Counts::default() } };
        let tally = Tally { days: vec![day(9, 1), day(3, 2), day(9, 4), day(i32::MAX, 1)], ..Tally::default() };
        let tidy = tally.tidied();
        assert_eq!(
            tidy.days.iter().map(|day| (day.day, day.counts.visits)).collect::<Vec<_>>(),
            [(3, 2), (9, 5), (i32::MAX, 1)]
        );
        assert_eq!(tidy.days().count(), 2, "a day beyond all calendars has no date");
    }
}
