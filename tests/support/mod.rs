//! What several tests share: reading the published checks and the independent run, and comparing with them.
#![allow(dead_code, reason = "each test takes what it needs")]

use std::collections::BTreeMap;
use std::path::Path;

/// A table of numbers by column name, as the independent run writes it.
pub struct Columns {
    names: Vec<String>,
    rows: Vec<Vec<String>>,
}

impl Columns {
    /// Reads `tests/reference/<name>`.
    pub fn read(name: &str) -> Self {
        let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/reference").join(name);
        let mut reader = csv::Reader::from_path(&path).unwrap_or_else(|error| panic!("{path:?}: {error}"));
        let names = reader.headers().unwrap().iter().map(str::to_owned).collect();
        let rows = reader.records().map(|row| row.unwrap().iter().map(str::to_owned).collect()).collect();
        Self { names, rows }
    }

    fn index(&self, name: &str) -> usize {
        self.names.iter().position(|n| n == name).unwrap_or_else(|| panic!("no column {name}"))
    }

    /// A column as numbers.
    pub fn numbers(&self, name: &str) -> Vec<f64> {
        let at = self.index(name);
        self.rows.iter().map(|row| row[at].parse().unwrap()).collect()
    }

    /// A column as text.
    pub fn texts(&self, name: &str) -> Vec<String> {
        let at = self.index(name);
        self.rows.iter().map(|row| row[at].clone()).collect()
    }

    /// How many rows there are.
    pub fn len(&self) -> usize {
        self.rows.len()
    }
}

/// Asserts that two columns agree to `relative` with an absolute floor.
pub fn assert_column(name: &str, got: &[f64], want: &[f64], relative: f64, floor: f64) {
    assert_eq!(got.len(), want.len(), "{name}");
    for (day, (got, want)) in got.iter().zip(want).enumerate() {
        let allowed = (relative * want.abs()).max(floor);
        assert!((got - want).abs() <= allowed, "{name}, row {day}: got {got:?}, want {want:?}");
    }
}

/// The checks of `tests/reference/<name>.toml` by id.
pub fn checks(name: &str) -> BTreeMap<String, toml::Table> {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/reference").join(format!("{name}.toml"));
    let text = std::fs::read_to_string(&path).unwrap_or_else(|error| panic!("{path:?}: {error}"));
    let document: toml::Table = text.parse().unwrap();
    let list = document["check"].as_array().unwrap();
    list.iter().map(|check| (check["id"].as_str().unwrap().to_owned(), check.as_table().unwrap().clone())).collect()
}

/// A number of a check, whole or not.
pub fn number(value: &toml::Value) -> f64 {
    value.as_float().or_else(|| value.as_integer().map(|whole| whole as f64)).unwrap_or_else(|| panic!("{value}"))
}

/// A list of numbers of a check.
pub fn numbers(value: &toml::Value) -> Vec<f64> {
    value.as_array().unwrap().iter().map(number).collect()
}

/// Asserts a single computed value against a check's `expected` or its range.
pub fn assert_check(check: &toml::Table, got: f64) {
    let id = check["id"].as_str().unwrap();
    if let Some(expected) = check.get("expected") {
        let want = number(expected);
        let relative = check.get("rel_tol").map_or(1e-9, number);
        let allowed = if want == 0.0 { 1e-9 } else { relative * want.abs() };
        assert!((got - want).abs() <= allowed, "{id}: got {got:?}, want {want:?}");
    } else {
        let (low, high) = (number(&check["lo"]), number(&check["hi"]));
        assert!(low <= got && got <= high, "{id}: {got:?} outside {low}..{high}");
    }
}
