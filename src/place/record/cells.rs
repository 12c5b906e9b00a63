//! One line as cells, each with its place in the line.
//!
//! Own code, since a record is pointed at by line and column: a quotation mark that is not closed must not swallow the
//! lines behind it, and blank or comment lines must not shift the count.

use std::borrow::Cow;

/// One cell.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Cell<'t> {
    /// Its text without quotation marks and the spaces around it.
    pub(super) text: Cow<'t, str>,
    /// Byte in the line where it starts, quotation mark included.
    pub(super) start: usize,
    /// Byte in the line behind it.
    pub(super) end: usize,
}

/// What is wrong with a line's quotation marks, and at which byte.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum QuoteFault {
    /// Opened and never closed.
    Open(usize),
    /// Text between a closing mark and the next delimiter.
    Behind(usize),
}

/// Splits `line` into `cells` (emptied before). A cell may stand in double quotation marks, doubled inside.
pub(super) fn split_cells<'t>(line: &'t str, delimiter: char, cells: &mut Vec<Cell<'t>>) -> Result<(), QuoteFault> {
    cells.clear();
    let mut at = 0;
    loop {
        let rest = &line[at..];
        let open = at + (rest.len() - rest.trim_start_matches(' ').len());
        let end = if line[open..].starts_with('"') {
            let close = closing_mark(line, open + 1).ok_or(QuoteFault::Open(open))?;
            let inner = line[open + 1..close].trim();
            let text = if inner.contains('"') { inner.replace("\"\"", "\"").into() } else { inner.into() };
            cells.push(Cell { text, start: open, end: close + 1 });
            let behind = &line[close + 1..];
            let next = close + 1 + (behind.len() - behind.trim_start_matches(' ').len());
            if next < line.len() && !line[next..].starts_with(delimiter) {
                return Err(QuoteFault::Behind(next));
            }
            next
        } else {
            let end = rest.find(delimiter).map_or(line.len(), |found| at + found);
            let text = line[at..end].trim();
            let start = at + (line[at..end].len() - line[at..end].trim_start().len());
            cells.push(Cell { text: text.into(), start, end: start + text.len() });
            end
        };
        if end >= line.len() {
            return Ok(());
        }
        at = end + delimiter.len_utf8();
    }
}

/// The texts of a line's cells; none where its quotation marks are wrong.
pub(super) fn texts_of(line: &str, delimiter: char) -> Vec<String> {
    let mut cells = Vec::new();
    match split_cells(line, delimiter, &mut cells) {
        Ok(()) => cells.into_iter().map(|cell| cell.text.into_owned()).collect(),
        Err(_) => Vec::new(),
    }
}

/// The byte of the quotation mark that closes a cell whose text starts at `from`.
fn closing_mark(line: &str, from: usize) -> Option<usize> {
    let bytes = line.as_bytes();
    let mut at = from;
    while at < bytes.len() {
        if bytes[at] == b'"' {
            if bytes.get(at + 1) != Some(&b'"') {
                return Some(at);
            }
            at += 1;
        }
        at += 1;
    }
    None
}

/// A name as it is compared: capitals, outer spaces and runs of spaces do not count.
pub(in crate::place) fn plain_name(name: &str) -> String {
    name.split_whitespace().collect::<Vec<_>>().join(" ").to_lowercase()
}

/// The delimiter of a file with this header: the one that brings out most of the `wanted` names, then most cells.
pub(super) fn recognise_delimiter(header: &str, wanted: &[&str]) -> Option<char> {
    let wanted: Vec<String> = wanted.iter().map(|name| plain_name(name)).collect();
    let mut best = None;
    for delimiter in [',', ';', '\t', '|'] {
        let mut cells = Vec::new();
        // A quotation mark left open hides the cells behind it, but not those before.
        let hidden = usize::from(split_cells(header, delimiter, &mut cells).is_err());
        let found = cells.iter().filter(|cell| wanted.contains(&plain_name(&cell.text))).count();
        let merit = (found, cells.len() + hidden);
        if merit.1 > 1 && best.is_none_or(|(_, so_far)| merit > so_far) {
            best = Some((delimiter, merit));
        }
    }
    best.map(|(delimiter, _)| delimiter)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn texts(line: &str, delimiter: char) -> Result<Vec<String>, QuoteFault> {
        let mut cells = Vec::new();
        split_cells(line, delimiter, &mut cells)?;
        Ok(cells.into_iter().map(|cell| cell.text.into_owned()).collect())
    }

    #[test]
    fn quoted_and_bare_cells() {
        assert_eq!(texts("a, b ,c", ',').unwrap(), ["a", "b", "c"]);
        assert_eq!(texts("a;;", ';').unwrap(), ["a", "", ""]);
        assert_eq!(texts("\"1,5\",\"say \"\"so\"\"\" ,x", ',').unwrap(), ["1,5", "say \"so\"", "x"]);
        assert_eq!(texts("a\t\"b\"", '\t').unwrap(), ["a", "b"]);
        assert_eq!(texts("", ',').unwrap(), [""]);
        assert_eq!(texts("á·ñ", '·').unwrap(), ["á", "ñ"]);
        assert_eq!(texts("a,\"b", ','), Err(QuoteFault::Open(2)));
        assert_eq!(texts("\"a\"b,c", ','), Err(QuoteFault::Behind(3)));
    }

    #[test]
    fn a_cell_knows_its_place() {
        let mut cells = Vec::new();
        split_cells("a,  ñu ,\"x\"", ',', &mut cells).unwrap();
        assert_eq!((cells[1].start, cells[1].end), (4, 7));
        assert_eq!((cells[2].start, cells[2].end), (9, 12));
    }

    #[test]
    fn the_delimiter_shows_in_the_header() {
        assert_eq!(recognise_delimiter("date;tmin, °C;tmax, °C", &["date", "tmin, °C"]), Some(';'));
        assert_eq!(recognise_delimiter("date\ttmin", &[]), Some('\t'));
        assert_eq!(recognise_delimiter("date|tmin", &["tmin"]), Some('|'));
        assert_eq!(recognise_delimiter("date tmin", &["tmin"]), None);
    }
}
