//! Asking a table of the file for what it must say, and telling whatever it says wrong.
//!
//! Every question is remembered. When a [`Section`] ends, an entry that nobody asked for is an unknown key, and the
//! nearest key that somebody did ask for is offered.

use std::cell::{Cell, RefCell};

use super::problem::{Location, Problem};
use super::tree::{Entry, Kind, Sheet, Table, Value};
use super::unit_suffix::{OTHER_SUFFIXES, UnitSuffix, Units};
use crate::words::nearest;

static NOTHING: Table = Table { entries: Vec::new() };

/// A number that was asked for.
#[derive(Clone, Debug)]
pub(crate) struct Number {
    /// In SI; NaN where the file says something wrong, which was told already. Comparisons with NaN are false, so a
    /// check written as "is it too large?" stays silent about it.
    pub value: f64,
    /// Where it stands, or the table that leaves it out.
    pub at: Location,
    /// Whether the file says it.
    pub stated: bool,
}

/// Least and most value, in SI, both allowed.
#[derive(Clone, Copy, Debug)]
pub(crate) struct Limits(pub f64, pub f64);

/// What kind of thing the file leaves out.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
enum Missing {
    Key,
    Tables,
}

/// One table of the file, or its absence.
pub(crate) struct Section<'a> {
    /// The text that it is part of.
    pub sheet: &'a Sheet<'a>,
    /// Its name, as `[reservoir]`.
    pub name: String,
    table: &'a Table,
    /// Where to point for what it leaves out.
    pub at: Location,
    /// Whether the file has this table.
    pub present: bool,
    asked: RefCell<Vec<(&'static str, Option<Units>)>>,
    missing: RefCell<Vec<(String, Missing)>>,
    rest_is_free: Cell<bool>,
}

impl<'a> Section<'a> {
    /// The whole file as a table.
    pub fn root(sheet: &'a Sheet<'a>, table: &'a Table) -> Self {
        let at = Location::whole_file(sheet.file.clone());
        Self::new(sheet, String::new(), table, at, true)
    }

    fn new(sheet: &'a Sheet<'a>, name: String, table: &'a Table, at: Location, present: bool) -> Self {
        Self {
            sheet,
            name,
            table,
            at,
            present,
            asked: RefCell::default(),
            missing: RefCell::default(),
            rest_is_free: Cell::new(false),
        }
    }

    /// Entries in the order of the file, for tables whose keys are free; none of them is then unknown.
    pub fn free_entries(&mut self) -> &'a [Entry] {
        self.allow_rest();
        &self.table.entries
    }

    /// Leaves every key that nobody asks for unjudged, where what may be there is not known.
    pub fn allow_rest(&self) {
        self.rest_is_free.set(true);
    }

    /// Where this entry's key stands.
    pub fn key_at(&self, entry: &Entry) -> Location {
        self.sheet.at(&entry.key_span)
    }

    /// Where this value stands.
    pub fn value_at(&self, value: &Value) -> Location {
        self.sheet.at(&value.span)
    }

    /// The value of `key`, if the file has it.
    pub fn get(&self, key: &'static str) -> Option<&'a Value> {
        self.asked.borrow_mut().push((key, None));
        self.table.get(key).map(|entry| &entry.value)
    }

    /// The value of a key that is asked for elsewhere.
    pub fn peek(&self, key: &str) -> Option<&'a Value> {
        self.table.get(key).map(|entry| &entry.value)
    }

    /// A table inside this one.
    pub fn section(&self, key: &'static str) -> Section<'a> {
        let name = if self.name.is_empty() { key.to_owned() } else { format!("{}.{key}", self.name) };
        match self.get(key) {
            Some(value) => self.as_section(value, name),
            None => Section::new(self.sheet, name, &NOTHING, self.at.clone(), false),
        }
    }

    /// Every `[[key]]` of the file, in its order.
    pub fn sections(&self, key: &'static str) -> Vec<Section<'a>> {
        let name = if self.name.is_empty() { key.to_owned() } else { format!("{}.{key}", self.name) };
        match self.get(key) {
            None => Vec::new(),
            Some(Value { kind: Kind::List(values), .. }) => {
                values.iter().map(|value| self.as_section(value, name.clone())).collect()
            }
            Some(value) => {
                let problem = match value.kind {
                    Kind::Table(_) => "problem-one-bracket",
                    _ => "problem-not-tables",
                };
                self.sheet.tell(Problem::error(self.value_at(value), problem).with("table", name.clone()));
                // Its content is still read, so that the mistakes in it are told too.
                if matches!(value.kind, Kind::Table(_)) { vec![self.as_section(value, name)] } else { Vec::new() }
            }
        }
    }

    /// A value as a table; tells where it is none.
    pub fn as_section(&self, value: &'a Value, name: String) -> Section<'a> {
        let at = self.value_at(value);
        if let Kind::Table(table) = &value.kind {
            return Section::new(self.sheet, name, table, at, true);
        }
        self.sheet.tell(Problem::error(at.clone(), "problem-not-table").with("key", name.clone()));
        Section::new(self.sheet, name, &NOTHING, at, false)
    }

    /// Tells that `key` is missing, unless the whole table is or the text is broken. It is told at the end, and not at
    /// all when a misspelt key turns out to be meant for it.
    pub fn tell_missing(&self, key: &str) {
        self.remember_missing(key, Missing::Key);
    }

    /// The same for tables inside this one, of which there must be one at least.
    pub fn tell_missing_tables(&self, key: &str) {
        self.remember_missing(key, Missing::Tables);
    }

    fn remember_missing(&self, key: &str, kind: Missing) {
        if self.present && !self.sheet.is_broken() {
            self.missing.borrow_mut().push((key.to_owned(), kind));
        }
    }

    /// Tells that the file lacks this whole table, which it must have.
    pub fn tell_if_absent(&self) {
        if !self.present && !self.sheet.is_broken() {
            self.sheet.tell(Problem::error(self.at.clone(), "problem-table-missing").with("table", self.name.clone()));
        }
    }

    /// A number in whichever unit it is written, or `None` where the file does not say it.
    pub fn number(&self, base: &'static str, units: Units, limits: Limits) -> Option<Number> {
        let (entry, unit) = self.measured(base, units)?;
        Some(self.checked_number(&entry.key, &entry.value, unit, limits))
    }

    /// The entry of a measured key and the unit that it is written in; tells where it is there in two.
    fn measured(&self, base: &'static str, units: Units) -> Option<(&'a Entry, UnitSuffix)> {
        self.asked.borrow_mut().push((base, Some(units)));
        let mut found: Option<(&Entry, UnitSuffix)> = None;
        for unit in units {
            let Some(entry) = self.table.get(&format!("{base}{}", unit.suffix)) else { continue };
            match found {
                None => found = Some((entry, *unit)),
                Some((first, _)) => {
                    // The later one is shown: the first was there when it was added.
                    let (early, late) =
                        if first.key_span.start < entry.key_span.start { (first, entry) } else { (entry, first) };
                    let problem = Problem::error(self.key_at(late), "problem-two-units");
                    self.sheet.tell(problem.with("key", late.key.clone()).with("other", early.key.clone()));
                }
            }
        }
        found
    }

    /// `value` as a number in `unit`, within `limits`.
    pub fn checked_number(&self, key: &str, value: &Value, unit: UnitSuffix, limits: Limits) -> Number {
        let at = self.value_at(value);
        let Kind::Number(written) = value.kind else {
            self.sheet.tell(Problem::error(at.clone(), "problem-not-number").with("key", key));
            return Number { value: f64::NAN, at, stated: true };
        };
        let si = unit.to_si(written);
        // The bounds are compared as written, so that a limit given exactly in another unit is inside.
        let (least, most) = (rounded(unit.si_as_written(limits.0)), rounded(unit.si_as_written(limits.1)));
        if si.is_finite() && ((limits.0 <= si && si <= limits.1) || (least <= written && written <= most)) {
            return Number { value: si, at, stated: true };
        }
        self.sheet.tell(
            Problem::error(at.clone(), "problem-number-range")
                .with("key", key)
                .with("value", written)
                .with("least", least)
                .with("most", most),
        );
        Number { value: f64::NAN, at, stated: true }
    }

    /// A number that has a usual value, used where the file does not say it.
    pub fn number_or(&self, base: &'static str, units: Units, limits: Limits, usual: f64) -> Number {
        self.number(base, units, limits).unwrap_or_else(|| Number { value: usual, at: self.at.clone(), stated: false })
    }

    /// A number that the file must give.
    pub fn need_number(&self, base: &'static str, units: Units, limits: Limits) -> Number {
        self.number(base, units, limits).unwrap_or_else(|| {
            self.tell_missing(&format!("{base}{}", units[0].suffix));
            Number { value: f64::NAN, at: self.at.clone(), stated: false }
        })
    }

    /// The value of `key` as text.
    pub fn text(&self, key: &'static str) -> Option<(&'a str, Location)> {
        let value = self.get(key)?;
        self.as_text(key, value)
    }

    /// A value as text that is not empty.
    pub fn as_text(&self, key: &str, value: &'a Value) -> Option<(&'a str, Location)> {
        let at = self.value_at(value);
        match &value.kind {
            Kind::Text(text) if !text.trim().is_empty() => return Some((text, at)),
            Kind::Text(_) => self.sheet.tell(Problem::error(at, "problem-text-empty").with("key", key)),
            _ => self.sheet.tell(Problem::error(at, "problem-not-text").with("key", key)),
        }
        None
    }

    /// Text that the file must give.
    pub fn need_text(&self, key: &'static str) -> Option<(&'a str, Location)> {
        if self.table.get(key).is_none() {
            self.tell_missing(key);
        }
        self.text(key)
    }

    /// The value of `key` as yes or no.
    pub fn flag_or(&self, key: &'static str, usual: bool) -> bool {
        match self.get(key) {
            None => usual,
            Some(Value { kind: Kind::Flag(flag), .. }) => *flag,
            Some(value) => {
                self.sheet.tell(Problem::error(self.value_at(value), "problem-not-flag").with("key", key));
                usual
            }
        }
    }

    /// The values of a list.
    pub fn list(&self, key: &'static str) -> Option<&'a [Value]> {
        match self.get(key)? {
            Value { kind: Kind::List(values), .. } => Some(values),
            value => {
                self.sheet.tell(Problem::error(self.value_at(value), "problem-not-list").with("key", key));
                None
            }
        }
    }

    /// Numbers of a list in whichever unit the key names, with the place of each.
    pub fn numbers(&self, base: &'static str, units: Units, limits: Limits) -> Option<Vec<Number>> {
        let (entry, unit) = self.measured(base, units)?;
        let Kind::List(values) = &entry.value.kind else {
            self.sheet
                .tell(Problem::error(self.value_at(&entry.value), "problem-not-list").with("key", entry.key.clone()));
            return None;
        };
        Some(values.iter().map(|value| self.checked_number(&entry.key, value, unit, limits)).collect())
    }

    /// `base` with the unit that the file writes it in, or with the first where it does not.
    pub fn as_written(&self, base: &str, units: Units) -> String {
        let mut forms = units.iter().map(|unit| format!("{base}{}", unit.suffix));
        forms.find(|key| self.table.get(key).is_some()).unwrap_or_else(|| format!("{base}{}", units[0].suffix))
    }

    /// One of a few words.
    pub fn choice<T: Copy>(&self, key: &'static str, choices: &[(&'static str, T)]) -> Option<(T, Location)> {
        let (word, at) = self.text(key)?;
        let found = choices.iter().find(|(name, _)| *name == word);
        if found.is_none() {
            self.sheet.tell(unknown_choice(at.clone(), key, word, choices.iter().map(|(name, _)| *name)));
        }
        found.map(|(_, choice)| (*choice, at))
    }

    /// One of a few words, which the file must give.
    pub fn need_choice<T: Copy>(&self, key: &'static str, choices: &[(&'static str, T)]) -> Option<(T, Location)> {
        if self.table.get(key).is_none() {
            self.tell_missing(key);
        }
        self.choice(key, choices)
    }

    /// Says that every key not asked for is unknown, then what is missing.
    fn conclude(&self) {
        let asked = self.asked.borrow();
        let names: Vec<String> = asked.iter().flat_map(|(base, units)| written(base, *units)).collect();
        let mut explained: Vec<String> = Vec::new();
        for entry in self.table.entries.iter().filter(|entry| !self.rest_is_free.get() && !names.contains(&entry.key)) {
            let problem = |message| Problem::error(self.key_at(entry), message).with("key", entry.key.clone());
            let in_other_unit: Vec<String> = asked
                .iter()
                .filter(|(base, units)| units.is_some_and(|units| is_without_unit(&entry.key, base, units)))
                .flat_map(|(base, units)| written(base, *units))
                .collect();
            if !in_other_unit.is_empty() {
                self.sheet.tell(problem("problem-key-unit").with("choices", in_other_unit.join(", ")));
                explained.extend(in_other_unit);
                continue;
            }
            explained.extend(nearest(&entry.key, names.iter().map(String::as_str)).map(str::to_owned));
            let told = if self.name.is_empty() {
                problem("problem-table-unknown")
            } else {
                problem("problem-key-unknown").with("table", self.name.clone())
            };
            self.sheet.tell(told.with_nearest(&entry.key, &names));
        }
        // What is there in a wrong form was told as that.
        let is_there = |key: &String| {
            let forms = asked.iter().map(|(base, units)| written(base, *units)).find(|forms| forms.contains(key));
            forms.into_iter().flatten().any(|form| self.table.get(&form).is_some())
        };
        let missing = self.missing.borrow();
        for (key, kind) in missing.iter().filter(|(key, _)| !explained.contains(key) && !is_there(key)) {
            let problem = |message| Problem::error(self.at.clone(), message).with("key", key.clone());
            self.sheet.tell(match kind {
                Missing::Key if self.name.is_empty() => problem("problem-key-missing-at-top"),
                Missing::Key => problem("problem-key-missing").with("table", self.name.clone()),
                Missing::Tables => problem("problem-tables-missing").with("table", self.name.clone()),
            });
        }
    }
}

/// Every way to write a key.
fn written(base: &str, units: Option<Units>) -> Vec<String> {
    match units {
        None => vec![base.to_owned()],
        Some(units) => units.iter().map(|unit| format!("{base}{}", unit.suffix)).collect(),
    }
}

/// Whether `key` is `base` without a unit, or with one that this value cannot have.
fn is_without_unit(key: &str, base: &str, units: Units) -> bool {
    let Some(rest) = key.strip_prefix(base) else { return false };
    !units[0].suffix.is_empty() && (rest.is_empty() || OTHER_SUFFIXES.contains(&rest))
}

impl Drop for Section<'_> {
    /// A table is judged when nobody will ask it any more, whichever way its reader returned.
    fn drop(&mut self) {
        self.conclude();
    }
}

/// Tells that `word` is none of the choices.
pub(crate) fn unknown_choice(
    at: Location,
    key: &str,
    word: &str,
    choices: impl Iterator<Item = &'static str>,
) -> Problem {
    let choices: Vec<&str> = choices.collect();
    Problem::error(at, "problem-choice")
        .with("key", key)
        .with("value", word)
        .with("choices", choices.join(", "))
        .with_nearest(word, &choices)
}

/// A bound as people would write it, six significant digits.
fn rounded(bound: f64) -> f64 {
    format!("{bound:.5e}").parse().unwrap_or(bound)
}
