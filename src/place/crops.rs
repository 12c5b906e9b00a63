//! Crops: the built-in table, and those that a place describes itself.

use super::dated::month_day;
use super::problem::{Location, Problem};
use super::section::{Limits, Section};
use super::text::{Text, need_names};
use super::unit_suffix::{METRES, PLAIN, SHARE};
use crate::place::crop_table;
use crate::water::calendar::MonthDay;
use crate::water::crop::CropTraits;

/// Land at rest; the one crop that is not watered.
pub(super) const FALLOW: &str = "fallow";

/// A crop as a place knows it.
#[derive(Clone, Debug, PartialEq)]
pub struct PlaceCrop {
    /// Key that the place's fields use.
    pub key: String,
    /// Its name, where the place describes the crop itself; the built-in crops have theirs in `locales`.
    pub name: Option<Text>,
    /// Published or stated traits.
    pub traits: CropTraits,
    /// First day of its season in this hemisphere.
    pub planting: MonthDay,
}

impl PlaceCrop {
    /// What stands on a field whose crop is not known, so that reading can go on; it was told.
    pub(super) fn unknown(key: &str) -> Self {
        let traits = CropTraits {
            coefficient_initial: f64::NAN,
            coefficient_mid: f64::NAN,
            coefficient_end: f64::NAN,
            stage_days: [0; 4],
            root_depth_m: f64::NAN,
            depletion_share: f64::NAN,
            yield_response: None,
        };
        Self { key: key.to_owned(), name: None, traits, planting: MonthDay { month: 1, day: 1 } }
    }
}

/// The crops that fields may name.
pub(super) struct Crops {
    own: Vec<PlaceCrop>,
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
    pub fn find(&self, section: &Section<'_>, key: &str, at: &Location) -> Option<PlaceCrop> {
        if let Some(crop) = self.own.iter().find(|crop| crop.key == key) {
            return Some(crop.clone());
        }
        if let Some(row) = crop_table::built_in_crop(key) {
            let (month, day) = row.season_start(self.southern);
            // Months differ in length: what starts on a 31st here may have none half a year later.
            let planting = (1..=day).rev().find_map(|day| MonthDay::new(month, day))?;
            return Some(PlaceCrop { key: key.to_owned(), name: None, traits: row.traits, planting });
        }
        let known = self.own.iter().map(|crop| crop.key.clone());
        let known = known.chain(crop_table::CROPS.iter().map(|row| row.key.to_owned()));
        let problem = Problem::error(at.clone(), "problem-crop-unknown").with("value", key);
        section.sheet.tell(problem.with_nearest(key, known));
        None
    }
}

fn own_crop(section: &Section<'_>) -> PlaceCrop {
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
    PlaceCrop {
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
