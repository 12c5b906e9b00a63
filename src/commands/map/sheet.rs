//! A map or a part of one as data: written as JSON or CSV, read back and put together.

use std::path::{Path, PathBuf};

use serde::{Deserialize, Serialize};

use crate::commands::failure::Failure;
use crate::commands::output::reason;
use crate::water::dials::{Dial, Dials};
use crate::whatif::{Axis, MOST_CELLS};
use crate::words::Words;

/// No map is larger; anything else that is read by mistake may be.
const MOST_BYTES: u64 = 64 << 20;

/// A map, or the part of one.
#[derive(Clone, Debug, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct Sheet {
    /// The place's name in English.
    pub place: String,
    /// The key of what is shown.
    pub sign: String,
    /// The key of the canal that it is about.
    pub canal: Option<String>,
    /// The years that it is taken over.
    pub years: YearsShown,
    /// Where the dials stand; those of the two sides are the present setting.
    pub dials: Dials,
    /// The two sides.
    pub over: [Side; 2],
    /// The share from which on supply is enough.
    pub enough_share: f64,
    /// The number with every dial at rest.
    pub as_it_was: Option<f64>,
    /// Which part it is; nothing for a whole map.
    pub part: Option<Part>,
    /// The cells along the first side, row after row of the second.
    pub values: Vec<Option<f64>>,
}

/// The years of a map.
#[derive(Clone, Debug, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct YearsShown {
    /// As they were asked for.
    pub asked: String,
    /// Every water year.
    pub water_years: Vec<i32>,
}

/// One side of a map.
#[derive(Clone, Debug, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct Side {
    /// The key of the dial.
    pub dial: String,
    /// The step from value to value.
    pub step: f64,
    /// Its values.
    pub values: Vec<f64>,
}

/// Which part of a map.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct Part {
    /// Counted from 1.
    pub part: usize,
    /// How many there are.
    pub of: usize,
    /// Its first cell, counted from 0.
    pub first_cell: usize,
}

impl From<&Axis> for Side {
    fn from(axis: &Axis) -> Self {
        Self { dial: axis.dial().key().to_owned(), step: axis.step(), values: axis.values().to_vec() }
    }
}

impl Sheet {
    /// The dial of a side.
    pub fn dial(&self, side: usize) -> Option<Dial> {
        Dial::from_key(&self.over.get(side)?.dial)
    }

    fn cells(&self) -> usize {
        self.over[0].values.len().saturating_mul(self.over[1].values.len())
    }

    /// Whether the parts of the sheet fit one another: hand-made or damaged files need not.
    fn makes_sense(&self) -> bool {
        let sides =
            |side: &Side| Dial::from_key(&side.dial).is_some() && side.values.windows(2).all(|pair| pair[0] < pair[1]);
        let cells = self.cells();
        let expected = match self.part {
            None => Some(cells),
            Some(Part { part, of, first_cell }) => (1..=of)
                .contains(&part)
                .then(|| {
                    let bound = |part: usize| (cells as u128 * part as u128 / of as u128) as usize;
                    (bound(part - 1) == first_cell).then(|| bound(part) - bound(part - 1))
                })
                .flatten(),
        };
        let long_enough = self.over.iter().all(|side| side.values.len() > 1);
        self.over.iter().all(sides) && long_enough && cells <= MOST_CELLS && expected == Some(self.values.len())
    }

    /// The sheet as JSON.
    pub fn to_json(&self) -> String {
        // Numbers, text and lists only: nothing here can fail to be written.
        serde_json::to_string(self).map(|text| text + "\n").unwrap_or_default()
    }

    /// The cells as CSV: the two dials, then the number.
    pub fn to_csv(&self) -> String {
        use std::fmt::Write;
        let [across, up] = &self.over;
        let mut text = format!("{},{},{}\n", across.dial, up.dial, self.sign);
        let places = up.values.iter().flat_map(|up| across.values.iter().map(move |across| (across, up)));
        for ((across, up), value) in places.zip(&self.values) {
            // Writing into memory cannot fail.
            let _ = match value {
                Some(value) => writeln!(text, "{across},{up},{value}"),
                None => writeln!(text, "{across},{up},"),
            };
        }
        text
    }
}

/// Reads parts and puts them together to the whole map.
pub(super) fn merge(paths: &[PathBuf], words: &Words) -> Result<Sheet, Failure> {
    let mut parts: Vec<(&Path, Sheet)> = Vec::with_capacity(paths.len());
    for path in paths {
        parts.push((path, read(path, words)?));
    }
    parts.sort_by_key(|(_, sheet)| sheet.part.map_or(0, |part| part.first_cell));
    parts.sort_by_key(|(_, sheet)| sheet.part.map_or(1, |part| part.part));
    let Some((first_path, first)) = parts.first() else { return Err(Failure::input(String::new())) };
    let bare = |sheet: &Sheet| Sheet { part: None, values: Vec::new(), ..sheet.clone() };
    let number = |sheet: &Sheet| sheet.part.map_or((1, 1), |part| (part.part, part.of));
    let (head, (_, of)) = (bare(first), number(first));
    let shown = |path: &Path| path.display().to_string();
    let pair = |id: &str, path: &Path, other: &Path| {
        Failure::input(words.say(id, &[("path", shown(path).into()), ("other", shown(other).into())]))
    };
    for (path, sheet) in &parts {
        if number(sheet).1 != of || bare(sheet) != head {
            return Err(pair("error-merge-differ", path, first_path));
        }
    }
    for two in parts.windows(2) {
        if number(&two[0].1) == number(&two[1].1) {
            return Err(pair("error-merge-twice", two[1].0, two[0].0));
        }
    }
    let have: Vec<usize> = parts.iter().map(|(_, sheet)| number(sheet).0).collect();
    let missing: Vec<String> =
        (1..=of).filter(|part| have.binary_search(part).is_err()).take(20).map(|part| part.to_string()).collect();
    if !missing.is_empty() {
        let arguments = [("parts", missing.join(", ").into()), ("all", of.into())];
        return Err(Failure::input(words.say("error-merge-missing", &arguments)));
    }
    let values = parts.iter().flat_map(|(_, sheet)| sheet.values.iter().copied()).collect();
    Ok(Sheet { values, ..head })
}

fn read(path: &Path, words: &Words) -> Result<Sheet, Failure> {
    let shown = || path.display().to_string();
    let wrong = |reason: String| {
        Failure::input(words.say("error-merge-file", &[("path", shown().into()), ("reason", reason.into())]))
    };
    let about = std::fs::metadata(path).map_err(|error| wrong(reason(&error, words)))?;
    if about.len() > MOST_BYTES {
        return Err(wrong(words.say("reason-too-large", &[])));
    }
    let text = std::fs::read_to_string(path).map_err(|error| wrong(reason(&error, words)))?;
    let sheet: Sheet = serde_json::from_str(&text)
        .map_err(|error| wrong(words.say("reason-other", &[("reason", error.to_string().into())])))?;
    if sheet.makes_sense() { Ok(sheet) } else { Err(wrong(words.say("error-merge-values", &[]))) }
}
