//! How a record is to be read: the mapping that a place declares, as plain data.

use std::path::PathBuf;

use super::measure::Measure;
use super::unit::MeasureUnit;
use crate::place::problem::Location;

/// How one delimited text file of daily values is to be read.
#[derive(Clone, Debug, PartialEq)]
pub struct RecordPlan {
    /// The file as the user names it; only shown.
    pub file: PathBuf,
    /// How letters are stored.
    pub encoding: Encoding,
    /// What stands between cells; recognised among `,` `;` tab and `|` where not given.
    pub delimiter: Option<char>,
    /// Whether 12,5 is twelve and a half.
    pub decimal_comma: bool,
    /// Lines that start with this are passed over.
    pub comment: Option<char>,
    /// Lines to pass over before the header, whatever is in them.
    pub skip_lines: usize,
    /// Where the date is.
    pub date: DatePlan,
    /// The columns to read; the file may have others.
    pub columns: Vec<ColumnPlan>,
    /// Cells that stand for a missing value, besides the empty cell; `-9999` also means `-9999.0`.
    pub missing: Vec<String>,
}

/// How letters are stored in the file.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Default)]
pub enum Encoding {
    /// UTF-8, with or without a byte-order mark.
    #[default]
    Utf8,
    /// ISO 8859-1, one byte a letter.
    Latin1,
}

impl Encoding {
    /// The key that a place file writes for it.
    pub fn key(self) -> &'static str {
        match self {
            Encoding::Utf8 => "utf-8",
            Encoding::Latin1 => "latin-1",
        }
    }

    /// The encoding that `key` names; capitals do not count.
    pub fn from_key(key: &str) -> Option<Self> {
        [Encoding::Utf8, Encoding::Latin1].into_iter().find(|encoding| encoding.key().eq_ignore_ascii_case(key))
    }
}

/// Where the date of a row is.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum DatePlan {
    /// In one column.
    Column {
        /// Name of the column.
        name: String,
        /// What comes first in it.
        order: DateOrder,
    },
    /// In three columns of whole numbers.
    Parts {
        /// Column of the year, four digits.
        year: String,
        /// Column of the month, 1 to 12.
        month: String,
        /// Column of the day of the month.
        day: String,
    },
    /// In two columns of whole numbers.
    YearAndDay {
        /// Column of the year, four digits.
        year: String,
        /// Column of the day of the year, 1 to 366.
        day_of_year: String,
    },
}

/// The order of year, month and day in a date; marks between them may be any of `-` `/` `.` or a space, or none with
/// eight digits. A month may be a name in English or Spanish.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum DateOrder {
    /// 2004-05-31, 20040531.
    YearMonthDay,
    /// 31/05/2004, 31 may 2004.
    DayMonthYear,
    /// 05/31/2004.
    MonthDayYear,
}

impl DateOrder {
    /// Every order.
    pub const ALL: [DateOrder; 3] = [DateOrder::YearMonthDay, DateOrder::DayMonthYear, DateOrder::MonthDayYear];

    /// The key that a place file writes for it, and that messages say.
    pub fn key(self) -> &'static str {
        match self {
            DateOrder::YearMonthDay => "year-month-day",
            DateOrder::DayMonthYear => "day/month/year",
            DateOrder::MonthDayYear => "month/day/year",
        }
    }

    /// The order that `key` names, with any of `-` `/` `.` or a space between the words.
    pub fn from_key(key: &str) -> Option<Self> {
        let plain: Vec<&str> = key.trim().split(['-', '/', '.', ' ']).collect();
        Self::ALL.into_iter().find(|order| order.key().split(['-', '/']).eq(plain.iter().copied()))
    }
}

/// One column to read.
#[derive(Clone, Debug, PartialEq)]
pub struct ColumnPlan {
    /// Its name in the header; capitals and spaces around it do not count.
    pub name: String,
    /// What it measures.
    pub measure: Measure,
    /// The unit that it is written in.
    pub unit: MeasureUnit,
    /// What becomes of its missing cells.
    pub gaps: GapRule,
    /// Where the place declares it, so that a wrong declaration is shown there; the header of the record otherwise.
    pub declared_at: Option<Location>,
}

impl ColumnPlan {
    /// A column with the measure's own rule for gaps.
    pub fn new(name: impl Into<String>, measure: Measure, unit: MeasureUnit) -> Self {
        Self { name: name.into(), measure, unit, gaps: measure.default_gap_rule(), declared_at: None }
    }
}

/// What becomes of missing cells.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct GapRule {
    /// How a gap is closed.
    pub how: GapFill,
    /// The longest gap that is closed, in days; a longer one is refused.
    pub longest_days: usize,
}

/// How a gap is closed.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum GapFill {
    /// Not at all: a gap is an error.
    Refuse,
    /// By a straight line in time between the days before and after.
    Linear,
    /// With zero, as if it had been dry.
    Zero,
    /// With the record's mean of the same calendar month.
    Mean,
    /// Not at all: the gap stays, as NaN, however long.
    Keep,
}

impl GapFill {
    /// Every way.
    pub const ALL: [GapFill; 5] = [GapFill::Refuse, GapFill::Linear, GapFill::Zero, GapFill::Mean, GapFill::Keep];

    /// The key that a place file writes for it.
    pub fn key(self) -> &'static str {
        match self {
            GapFill::Refuse => "refuse",
            GapFill::Linear => "linear",
            GapFill::Zero => "zero",
            GapFill::Mean => "mean",
            GapFill::Keep => "keep",
        }
    }

    /// The way that `key` names.
    pub fn from_key(key: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|how| how.key() == key)
    }
}

impl RecordPlan {
    /// A plan with nothing special: UTF-8, delimiter recognised, decimal point, `#` for comments, no missing marks.
    pub fn new(file: impl Into<PathBuf>, date: DatePlan, columns: Vec<ColumnPlan>) -> Self {
        Self {
            file: file.into(),
            encoding: Encoding::Utf8,
            delimiter: None,
            decimal_comma: false,
            comment: Some('#'),
            skip_lines: 0,
            date,
            columns,
            missing: Vec::new(),
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn orders_and_fills_are_found_by_their_keys() {
        for order in DateOrder::ALL {
            assert_eq!(DateOrder::from_key(order.key()), Some(order));
        }
        assert_eq!(DateOrder::from_key("day-month-year"), Some(DateOrder::DayMonthYear));
        assert_eq!(DateOrder::from_key("year/day/month"), None);
        assert_eq!(Encoding::from_key("Latin-1"), Some(Encoding::Latin1));
        assert_eq!(Encoding::from_key("utf-7"), None);
        for how in GapFill::ALL {
            assert_eq!(GapFill::from_key(how.key()), Some(how));
        }
    }
}
