//! How a text file is laid out: its letters, its header, and what stands between its cells.

use std::path::Path;

use super::super::cells::texts_of;
use super::super::dates::{DateFault, parse_date};
use super::super::notes::Notes;
use super::super::plan::{DateOrder, Encoding};
use super::super::rows::is_idle;
use super::super::text::{decode, lines_of};
use crate::place::measure_words::{DatePart, date_part};
use crate::place::problem::{Location, Problem};

/// Lines among which a header is looked for.
const MOST_LINES_ABOVE: usize = 120;
/// Columns of a file.
const MOST_COLUMNS: usize = 400;
const DELIMITERS: [char; 4] = [',', ';', '\t', '|'];
/// Digits of the shortest date: 1-may-04.
const FEWEST_DIGITS: usize = 3;
const COMMENT: Option<char> = Some('#');

/// A file that has a header and rows below it.
pub(super) struct Layout {
    lines: Vec<String>,
    pub encoding: Encoding,
    pub delimiter: char,
    /// Line of the header, from 0.
    pub header_line: usize,
    /// Lines that a plan must pass over to find it.
    pub skip_lines: usize,
    /// Names of the columns; the last one is not empty.
    pub names: Vec<String>,
}

impl Layout {
    /// Finds the first line that looks like a header: the line below it has as many cells and a date among them.
    pub fn find(file: &Path, bytes: &[u8]) -> Result<Self, Vec<Problem>> {
        let encoding = if std::str::from_utf8(bytes).is_ok() { Encoding::Utf8 } else { Encoding::Latin1 };
        let mut problems = Vec::new();
        let mut notes = Notes::new(file, &mut problems);
        let text = decode(bytes, encoding, &mut notes);
        notes.finish();
        let Some(text) = text else { return Err(problems) };
        let tell = |line: usize, message| {
            vec![Problem::error(Location { file: file.to_path_buf(), line, column: 0, length: 0 }, message)]
        };
        let lines: Vec<String> = lines_of(&text).into_iter().map(str::to_owned).collect();
        let busy: Vec<usize> = (0..lines.len()).filter(|line| !is_idle(&lines[*line], COMMENT, None)).collect();
        let Some(first) = busy.first() else { return Err(tell(0, "problem-record-empty")) };
        for pair in busy.windows(2).take(MOST_LINES_ABOVE) {
            let (header, row) = (&lines[pair[0]], &lines[pair[1]]);
            let fitting = DELIMITERS.iter().filter_map(|mark| names_of(header, row, *mark).map(|names| (*mark, names)));
            // The delimiter that makes most columns: a comma inside decimals makes fewer or none.
            if let Some((delimiter, names)) = fitting.max_by_key(|(_, names)| names.len()) {
                let skip_lines = if pair[0] == *first { 0 } else { pair[0] };
                return Ok(Self { header_line: pair[0], lines, encoding, delimiter, skip_lines, names });
            }
        }
        let is_row =
            |line: &str| DELIMITERS.iter().any(|mark| texts_of(line, *mark).iter().any(|cell| looks_like_date(cell)));
        let message = if is_row(&lines[*first]) { "problem-peek-header" } else { "problem-peek-layout" };
        Err(tell(first + 1, message))
    }

    /// The cells of the rows, at most `most` of them; a line that cannot be cut has none.
    pub fn rows(&self, most: usize) -> Vec<Vec<String>> {
        let below = self.lines.iter().skip(self.header_line + 1);
        let rows = below.filter(|line| !is_idle(line, COMMENT, Some(self.delimiter)));
        let cells = |line: &String| texts_of(line, self.delimiter).into_iter().take(self.names.len()).collect();
        rows.take(most).map(cells).collect()
    }
}

/// Names of the header, if the two lines can be a header and its first row.
fn names_of(header: &str, row: &str, delimiter: char) -> Option<Vec<String>> {
    let mut names = texts_of(header, delimiter);
    while names.last().is_some_and(String::is_empty) {
        names.pop();
    }
    let cells = texts_of(row, delimiter);
    let parts: Vec<DatePart> = names.iter().filter_map(|name| date_part(name)).collect();
    let in_parts = parts.contains(&DatePart::Year)
        && (parts.contains(&DatePart::DayOfYear)
            || (parts.contains(&DatePart::Month) && parts.contains(&DatePart::Day)));
    let fits = (2..=MOST_COLUMNS).contains(&names.len())
        && cells.len() >= names.len()
        && !names.iter().any(|name| looks_like_date(name))
        && (in_parts || cells.iter().take(names.len()).any(|cell| looks_like_date(cell)));
    fits.then_some(names)
}

/// Whether a text is a date in some order, or would be but for a small fault.
fn looks_like_date(text: &str) -> bool {
    let close = |fault| matches!(fault, DateFault::ShortYear | DateFault::TimeOfDay);
    text.bytes().filter(u8::is_ascii_digit).count() >= FEWEST_DIGITS
        && text.len() <= 40
        && DateOrder::ALL.iter().any(|order| match parse_date(text, *order) {
            Ok(_) => true,
            Err(fault) => close(fault),
        })
}
