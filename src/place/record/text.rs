//! From the bytes of a file to lines of text.

use super::notes::Notes;
use super::plan::Encoding;
use crate::place::problem::{Location, Problem};

/// How the compressed folder of an office spreadsheet starts.
const SPREADSHEET_START: &[u8] = b"PK\x03\x04";
const UTF8_MARK: &[u8] = b"\xEF\xBB\xBF";
const UTF16_MARKS: [&[u8]; 2] = [b"\xFF\xFE", b"\xFE\xFF"];

/// The text of `bytes`, without a byte-order mark. Bytes that are not text are noted and replaced, so that the rest of
/// the file is still looked at; `None` where nothing can be read at all.
pub(super) fn decode(bytes: &[u8], encoding: Encoding, notes: &mut Notes) -> Option<String> {
    if bytes.starts_with(SPREADSHEET_START) {
        notes.add(Problem::error(notes.line(1), "problem-record-spreadsheet"));
        return None;
    }
    if UTF16_MARKS.iter().any(|mark| bytes.starts_with(mark)) {
        notes.add(Problem::error(notes.line(1), "problem-record-two-byte-text"));
        return None;
    }
    let bytes = bytes.strip_prefix(UTF8_MARK).unwrap_or(bytes);
    if encoding == Encoding::Latin1 {
        return Some(bytes.iter().map(|byte| char::from(*byte)).collect());
    }
    if let Ok(text) = std::str::from_utf8(bytes) {
        return Some(text.to_owned());
    }
    for (index, line) in bytes.split(|byte| *byte == b'\n').enumerate() {
        if let Err(fault) = std::str::from_utf8(line) {
            let before = String::from_utf8_lossy(&line[..fault.valid_up_to()]);
            let column = before.chars().count() + 1;
            let at = Location { file: notes.file.to_path_buf(), line: index + 1, column, length: 1 };
            notes.add(Problem::error(at, "problem-record-not-utf8"));
        }
    }
    Some(String::from_utf8_lossy(bytes).into_owned())
}

/// The lines of `text` without their ends: line feeds, or carriage returns where the file has nothing else.
pub(super) fn lines_of(text: &str) -> Vec<&str> {
    let end = if text.contains('\n') { '\n' } else { '\r' };
    let mut lines: Vec<&str> = text.split(end).map(|line| line.strip_suffix('\r').unwrap_or(line)).collect();
    if lines.last().is_some_and(|line| line.is_empty()) {
        lines.pop();
    }
    lines
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn lines_end_in_every_usual_way() {
        for text in ["a\nb\n", "a\r\nb\r\n", "a\rb\r", "a\nb"] {
            assert_eq!(lines_of(text), ["a", "b"], "{text:?}");
        }
        assert_eq!(lines_of("a\n\nb"), ["a", "", "b"]);
        assert!(lines_of("").is_empty());
    }
}
