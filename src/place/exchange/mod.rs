//! Daily series in open exchange formats, WaterML 2.0 and NetCDF classic, read as a table of days.
//!
//! A place may name such a file where it names a CSV record. The file says itself where its days and units are, so the
//! place only says which series to take; `day` is the name of the date column. The table then goes through the same
//! checks as any record.
//!
//! Sources: OGC 10-126r4, *OGC WaterML 2.0: Part 1, Timeseries* (2014); OGC 10-092r3, *NetCDF Classic and 64-bit Offset
//! Format* (2011), appendix grammar; *NetCDF Climate and Forecast (CF) Metadata Conventions* 1.8, chapters 4.4, 7.1, 8.1
//! and 9. All from memory. NetCDF was tried on files that an independent library wrote, WaterML on one by hand.

mod cf;
mod clock;
mod netcdf;
mod unit_text;
mod waterml;

use std::collections::BTreeMap;
use std::path::Path;

use chrono::NaiveDate;

use super::problem::{Location, Problem};
use super::record::{Measure, MeasureUnit};

/// Name of the date column of the table that is made.
pub const DATE_COLUMN: &str = "day";
/// Letters of a file's own text that a message repeats.
const MOST_SHOWN: usize = 60;

/// The format of a file.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum ExchangeForm {
    /// XML: WaterML 2.0, if it can be read at all.
    WaterMl,
    /// NetCDF classic, or its younger relative that is refused with a reason.
    NetCdf,
}

/// One day of a series.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ExchangeDay {
    /// The day.
    pub date: NaiveDate,
    /// The value in the series' unit; NaN where the file says that it is missing.
    pub value: f64,
    /// Line of the file, from 1; 0 in a file without lines.
    pub line: usize,
}

/// One series of a file.
#[derive(Clone, Debug, PartialEq)]
pub struct ExchangeSeries {
    /// Name of its column: no other series of the file has it.
    pub name: String,
    /// What the file says that it is.
    pub described: String,
    /// What it measures, where the file says that in words that are known.
    pub measure: Option<Measure>,
    /// The unit as the file writes it.
    pub unit_text: String,
    /// The unit of the values of `days`; `None` where the file's unit is not known.
    pub unit: Option<MeasureUnit>,
    /// Its days, each later than the one before.
    pub days: Vec<ExchangeDay>,
}

/// What a file holds.
#[derive(Clone, Debug, PartialEq)]
pub struct ExchangeFile {
    /// Its format.
    pub form: ExchangeForm,
    /// Its series, at least one.
    pub series: Vec<ExchangeSeries>,
}

/// A file as a table of text, like a CSV record.
#[derive(Clone, Debug, PartialEq)]
pub struct DayTable {
    /// Header and one row a day; decimal point, comma between cells.
    pub text: String,
    /// For each line of `text` the line of the file that it comes from, 0 where there is none.
    pub source_lines: Vec<usize>,
}

/// The format that `bytes` begin like; `None` for anything that may be a CSV record.
pub fn recognise(bytes: &[u8]) -> Option<ExchangeForm> {
    if bytes.starts_with(b"CDF") || bytes.starts_with(netcdf::HDF5_START) {
        return Some(ExchangeForm::NetCdf);
    }
    let bytes = bytes.strip_prefix(b"\xEF\xBB\xBF").unwrap_or(bytes);
    let first = bytes.iter().take(4096).find(|byte| !byte.is_ascii_whitespace());
    if first == Some(&b'<') {
        return Some(ExchangeForm::WaterMl);
    }
    // XML in two-byte letters: a byte-order mark, then `<` beside a zero.
    let two_byte = bytes.starts_with(b"\xFF\xFE<\0") || bytes.starts_with(b"\xFE\xFF\0<");
    two_byte.then_some(ExchangeForm::WaterMl)
}

/// Reads `bytes` in the format that they begin like; `None` after at least one error in `problems`. Memory stays within a
/// small multiple of the file's size, whatever its bytes say.
pub fn read_exchange(file: &Path, bytes: &[u8], problems: &mut Vec<Problem>) -> Option<ExchangeFile> {
    let form = recognise(bytes)?;
    let before = problems.len();
    let series = match form {
        ExchangeForm::WaterMl => waterml::read(file, bytes, problems),
        ExchangeForm::NetCdf => cf::read(file, bytes, problems),
    };
    if problems.len() > before {
        return None;
    }
    Some(ExchangeFile { form, series: with_own_names(series) })
}

impl ExchangeFile {
    /// All series beside each other, one row for every day that any of them has.
    pub fn table(&self) -> DayTable {
        let mut rows: BTreeMap<NaiveDate, (usize, Vec<f64>)> = BTreeMap::new();
        for (index, series) in self.series.iter().enumerate() {
            for day in &series.days {
                let row = rows.entry(day.date).or_insert_with(|| (day.line, vec![f64::NAN; self.series.len()]));
                row.1[index] = day.value;
            }
        }
        let mut text = DATE_COLUMN.to_owned();
        for series in &self.series {
            text.push_str(&format!(",\"{}\"", series.name.replace('"', "\"\"")));
        }
        text.push('\n');
        let mut source_lines = vec![0];
        for (date, (line, values)) in rows {
            text.push_str(&date.to_string());
            for value in values {
                text.push(',');
                if !value.is_nan() {
                    text.push_str(&value.to_string());
                }
            }
            text.push('\n');
            source_lines.push(line);
        }
        DayTable { text, source_lines }
    }
}

/// Series whose names would be told apart by nothing get a number; line breaks and marks have no place in a header.
fn with_own_names(mut series: Vec<ExchangeSeries>) -> Vec<ExchangeSeries> {
    let mut taken: Vec<String> = vec![DATE_COLUMN.to_owned()];
    for (index, one) in series.iter_mut().enumerate() {
        let plain: String = one.name.chars().map(|letter| if letter.is_control() { ' ' } else { letter }).collect();
        let plain = plain.split_whitespace().collect::<Vec<_>>().join(" ").trim_start_matches('#').trim().to_owned();
        let base = if plain.is_empty() { format!("series {}", index + 1) } else { plain };
        let mut name = base.clone();
        let mut number = 1;
        while taken.contains(&name.to_lowercase()) {
            number += 1;
            name = format!("{base} {number}");
        }
        taken.push(name.to_lowercase());
        one.name = name;
    }
    series
}

/// A problem of `file` at `line` (0: the whole file).
fn fault(file: &Path, line: usize, message: &'static str) -> Problem {
    Problem::error(Location { file: file.to_path_buf(), line, column: 0, length: 0 }, message)
}

/// Text of the file as a message can repeat it.
fn shown(text: &str) -> String {
    let short: String = text.trim().chars().take(MOST_SHOWN).collect();
    let cut = text.trim().chars().nth(MOST_SHOWN).is_some();
    let plain: String = short.chars().map(|letter| if letter.is_control() { '\u{FFFD}' } else { letter }).collect();
    if cut { plain + "…" } else { plain }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn formats_are_known_by_how_they_begin() {
        assert_eq!(recognise(b"CDF\x01rest"), Some(ExchangeForm::NetCdf));
        assert_eq!(recognise(b"\x89HDF\r\n\x1a\nrest"), Some(ExchangeForm::NetCdf));
        assert_eq!(recognise(b"\xEF\xBB\xBF\n <?xml"), Some(ExchangeForm::WaterMl));
        assert_eq!(recognise(b"\xFF\xFE<\0?\0"), Some(ExchangeForm::WaterMl));
        assert_eq!(recognise(b"date,flow\n"), None);
        assert_eq!(recognise(b""), None);
    }

    #[test]
    fn no_two_columns_share_a_name() {
        let one = |name: &str| ExchangeSeries {
            name: name.into(),
            described: String::new(),
            measure: None,
            unit_text: String::new(),
            unit: None,
            days: Vec::new(),
        };
        let named = with_own_names(vec![one("Flow"), one("flow"), one(""), one("day"), one("# a\n\"b\"")]);
        let names: Vec<_> = named.iter().map(|series| series.name.as_str()).collect();
        assert_eq!(names, ["Flow", "flow 2", "series 3", "day 2", "a \"b\""]);
    }
}
