//! A look at a record that was read: from when to when, how much is missing, how far the values reach.

use chrono::{Days, NaiveDate};

use super::ReadRecord;
use super::measure::Measure;

/// How far the values of a column reach, in the measure's own unit.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Spread {
    /// Lowest value.
    pub lowest: f64,
    /// Mean.
    pub mean: f64,
    /// Highest value.
    pub highest: f64,
}

impl Spread {
    /// The spread of what is not NaN in `values`; `None` if there is nothing.
    pub fn of(values: impl IntoIterator<Item = f64>) -> Option<Self> {
        let (mut lowest, mut highest, mut sum, mut count) = (f64::INFINITY, f64::NEG_INFINITY, 0.0, 0usize);
        for value in values {
            if value.is_nan() {
                continue;
            }
            lowest = lowest.min(value);
            highest = highest.max(value);
            sum += value;
            count += 1;
        }
        (count > 0).then(|| Spread { lowest, mean: sum / count as f64, highest })
    }
}

/// A record at a glance.
#[derive(Clone, Debug, PartialEq)]
pub struct RecordLook {
    /// First day.
    pub first_date: NaiveDate,
    /// Last day.
    pub last_date: NaiveDate,
    /// Days from first to last, both included.
    pub days: usize,
    /// Each column at a glance.
    pub columns: Vec<ColumnLook>,
}

/// A column at a glance.
#[derive(Clone, Debug, PartialEq)]
pub struct ColumnLook {
    /// Its name in the plan.
    pub name: String,
    /// What it measures.
    pub measure: Measure,
    /// Days that were missing in the file.
    pub missing: usize,
    /// Days of those that were filled.
    pub filled: usize,
    /// The longest gap in the file, days.
    pub longest_gap_days: usize,
    /// How far its values reach, filled ones included; `None` if it has none.
    pub spread: Option<Spread>,
}

impl ReadRecord {
    /// The last day.
    pub fn last_date(&self) -> NaiveDate {
        self.first_date + Days::new((self.days as u64).saturating_sub(1))
    }

    /// The record at a glance.
    pub fn look(&self) -> RecordLook {
        RecordLook {
            first_date: self.first_date,
            last_date: self.last_date(),
            days: self.days,
            columns: self
                .columns
                .iter()
                .map(|column| ColumnLook {
                    name: column.name.clone(),
                    measure: column.measure,
                    missing: column.missing,
                    filled: column.filled,
                    longest_gap_days: column.longest_gap_days,
                    spread: Spread::of(column.values.iter().copied()),
                })
                .collect(),
        }
    }
}
