//! Crops: the built-in table, and those that a place describes itself.

use super::dated::month_day;
use super::problem::{Location, Problem};
use super::section::{Limits, Section, nearest};
use super::text::{Text, need_names};
use super::unit_suffix::{METRES, PLAIN, SHARE};
use crate::place::crop_table;
use crate::water::calendar::MonthDay;
use crate::water::crop::CropTraits;

/// Land at rest; the one crop that is not watered.
pub(super) const FALLOW: &str = "fallow";

/// A crop as a place knows it.
#[derive(Clone, Debug, PartialEq)]
pub struct Crop {
    /// Key that the place's fields use.
    pub key: String,
    /// Its name, where the place describes the crop itself; the built-in crops have theirs in `locales`.
    pub name: Option<Text>,
    /// Published or stated traits.
    pub traits: CropTraits,
    /// First day of its season in this hemisphere.
    pub planting: MonthDay,
}

/// The crops that fields may name.
pub(super) struct Crops {
    own: Vec<Crop>,
    southern: bool,
}

impl Crops {
    /// Reads every `[[crop]]`.
    pub fn read(root: &Section<'_>, southern: bool) -> Self {
        let mut crops = Self { own: Vec::new(), southern };
        for section in root.sections("crop") {
            let crop = own_crop(&section);
            if crops.own.iter().any(|known| known.key == crop.key && !crop.key.is_empty()) {
                let problem = Problem::error(section.at.clone(), "problem-same-key");
                section.sheet.tell(problem.with("key", crop.key.clone()));
            }
            crops.own.push(crop);
        }
        crops
    }

    /// The crop that a field at `at` names; tells where there is none.
    pub fn find(&self, section: &Section<'_>, key: &str, at: &Location) -> Option<Crop> {
        if let Some(crop) = self.own.iter().find(|crop| crop.key == key) {
            return Some(crop.clone());
        }
        if let Some(row) = crop_table::crop(key) {
            let planting = if self.southern { half_a_year_later(row.planting) } else { row.planting };
            return Some(Crop { key: key.to_owned(), name: None, traits: row.traits, planting });
        }
        let known = self.own.iter().map(|crop| crop.key.clone());
        let nearest = nearest(key, known.chain(crop_table::CROPS.iter().map(|row| row.key.to_owned())));
        let problem = Problem::error(at.clone(), "problem-crop-unknown").with("value", key);
        section.sheet.tell(problem.with("nearest", nearest));
        None
    }
}

fn own_crop(section: &Section<'_>) -> Crop {
    let coefficient = |base| section.need_number(base, PLAIN, Limits(0.0, 2.0)).value;
    let stages = section.numbers("stage_days", PLAIN, Limits(0.0, 366.0));
    if stages.is_none() {
        section.tell_missing("stage_days");
    }
    let stages = stages.unwrap_or_default();
    let total: f64 = stages.iter().map(|stage| stage.value).sum();
    if !stages.is_empty() && (stages.len() != 4 || !(1.0..=366.0).contains(&total) && !total.is_nan()) {
        let problem = Problem::error(stages[0].at.clone(), "problem-crop-stages");
        section.sheet.tell(problem.with("found", stages.len()).with("total", total));
    }
    if let Some(part) = stages.iter().find(|stage| stage.value % 1.0 > 0.0) {
        let problem = Problem::error(part.at.clone(), "problem-not-whole").with("key", "stage_days");
        section.sheet.tell(problem.with("value", part.value));
    }
    let planting = section.get("planting");
    if planting.is_none() {
        section.tell_missing("planting");
    }
    Crop {
        key: key(section),
        name: Some(need_names(section, "name")),
        traits: CropTraits {
            coefficient_initial: coefficient("coefficient_initial"),
            coefficient_mid: coefficient("coefficient_mid"),
            coefficient_end: coefficient("coefficient_end"),
            stage_days: std::array::from_fn(|stage| stages.get(stage).map_or(0, |days| days.value as u16)),
            root_depth_m: section.need_number("root_depth", METRES, Limits(0.05, 10.0)).value,
            depletion_share: section.need_number("depletion", SHARE, Limits(0.05, 0.9)).value,
            yield_response: section.number("yield_response", PLAIN, Limits(0.1, 3.0)).map(|number| number.value),
        },
        planting: planting
            .and_then(|value| month_day(section, "planting", value))
            .unwrap_or(MonthDay { month: 1, day: 1 }),
    }
}

/// The short name by which the rest of the file and the results call something.
pub(super) fn key(section: &Section<'_>) -> String {
    let Some((key, at)) = section.need_text("key") else { return String::new() };
    let plain = |letter: char| letter.is_ascii_lowercase() || letter.is_ascii_digit() || matches!(letter, '_' | '-');
    if !key.chars().all(plain) {
        section.sheet.tell(Problem::error(at, "problem-key-letters").with("value", key));
    }
    key.to_owned()
}

/// The same time of the growing year on the other half of the earth.
fn half_a_year_later(day: MonthDay) -> MonthDay {
    let month = (day.month + 5) % 12 + 1;
    // Months differ in length: the 31st has none in half of them.
    (1..=day.day).rev().find_map(|day| MonthDay::new(month, day)).unwrap_or(day)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn seasons_are_turned_round() {
        let md = |month, day| MonthDay::new(month, day).unwrap();
        assert_eq!(half_a_year_later(md(4, 15)), md(10, 15));
        assert_eq!(half_a_year_later(md(10, 31)), md(4, 30));
        assert_eq!(half_a_year_later(md(8, 31)), md(2, 29));
        assert_eq!(half_a_year_later(md(12, 1)), md(6, 1));
    }
}
