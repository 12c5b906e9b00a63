//! Problems at their lines: the line of the file, what is meant in it, and what would be right.

use std::borrow::Cow;
use std::collections::BTreeMap;
use std::path::Path;

use annotate_snippets::{AnnotationKind, Group, Level, Origin, Renderer, Snippet};

use super::problem_words::{message, remedy, severity};
use crate::place::problem::{Problem, Severity};
use crate::words::Words;

/// Columns of a terminal that every screen has.
const WIDTH: usize = 100;
/// More problems than this are counted and not shown: nobody reads further before mending some.
const MOST_SHOWN: usize = 200;
/// Largest file whose lines are shown, bytes.
const MOST_BYTES: u64 = 64 << 20;
/// Letters of a line that are shown before what is meant, and after.
const AROUND: usize = 60;

/// The lines of files that problems are in.
pub(super) struct Texts<'a> {
    given: Vec<(&'a str, &'a str)>,
    on_disk: bool,
    read: BTreeMap<String, Option<Vec<u8>>>,
}

impl<'a> Texts<'a> {
    /// Files that are where their names say.
    pub fn on_disk() -> Self {
        Self { given: Vec::new(), on_disk: true, read: BTreeMap::new() }
    }

    /// Files built into the program.
    pub fn built_in(files: &'a [(&'a str, &'a str)]) -> Self {
        Self { given: files.to_vec(), on_disk: false, read: BTreeMap::new() }
    }

    /// Texts that are already in memory.
    pub fn given(files: &'a [(String, String)]) -> Self {
        let given = files.iter().map(|(file, text)| (file.as_str(), text.as_str())).collect();
        Self { given, on_disk: false, read: BTreeMap::new() }
    }

    /// A line, counted from 1.
    fn line(&mut self, file: &Path, line: usize) -> Option<Cow<'_, str>> {
        let name = file.to_string_lossy().into_owned();
        if let Some((_, text)) = self.given.iter().find(|(given, _)| *given == name) {
            return text.lines().nth(line.checked_sub(1)?).map(Cow::Borrowed);
        }
        if !self.on_disk {
            return None;
        }
        let bytes = self.read.entry(name).or_insert_with(|| {
            let small = std::fs::metadata(file).is_ok_and(|about| about.is_file() && about.len() <= MOST_BYTES);
            small.then(|| std::fs::read(file).ok()).flatten()
        });
        let bytes = bytes.as_deref()?;
        let bytes = bytes.strip_prefix("\u{feff}".as_bytes()).unwrap_or(bytes);
        // As records are read: carriage returns end lines where the file has nothing else.
        let end = if bytes.contains(&b'\n') { b'\n' } else { b'\r' };
        let line = bytes.split(|byte| *byte == end).nth(line.checked_sub(1)?)?;
        Some(readable(line.strip_suffix(b"\r").unwrap_or(line)))
    }
}

/// A line as people know it: one that is not UTF-8 comes most likely from a Latin-1 file, where each byte is a letter.
fn readable(line: &[u8]) -> Cow<'_, str> {
    match std::str::from_utf8(line) {
        Ok(text) => Cow::Borrowed(text),
        Err(_) => Cow::Owned(line.iter().map(|byte| char::from(*byte)).collect()),
    }
}

/// Every problem with its line, and a count of what is not shown.
pub(super) fn report(problems: &[Problem], texts: &mut Texts<'_>, words: &Words) -> String {
    let renderer = Renderer::plain().term_width(WIDTH);
    let mut parts: Vec<String> =
        problems.iter().take(MOST_SHOWN).map(|problem| one(problem, texts, &renderer, words)).collect();
    if problems.len() > MOST_SHOWN {
        parts.push(words.say("check-more", &[("n", (problems.len() - MOST_SHOWN).into())]));
    }
    parts.join("\n\n")
}

fn one(problem: &Problem, texts: &mut Texts<'_>, renderer: &Renderer, words: &Words) -> String {
    let level = if problem.severity == Severity::Error { Level::ERROR } else { Level::WARNING };
    let level = level.with_name(severity(problem.severity, words));
    let at = &problem.at;
    let path = at.file.display().to_string();
    let group = Group::with_title(level.primary_title(visible(&message(problem, words))));
    let line = texts.line(&at.file, at.line).map(Cow::into_owned);
    let mut group = match &line {
        Some(line) => {
            let (shown, span) = cut(line, at.column, at.length);
            let snippet = Snippet::source(shown).line_start(at.line).path(path).fold(false);
            group.element(snippet.annotation(AnnotationKind::Primary.span(span)))
        }
        None if at.line > 0 => group.element(Origin::path(path).line(at.line).char_column(at.column.max(1))),
        None => group.element(Origin::path(path)),
    };
    let help = remedy(problem, words);
    if !help.is_empty() {
        let name = words.say("error-remedy", &[]);
        group = group.element(Level::HELP.with_name(name).message(visible(&help)));
    }
    renderer.render(&[group])
}

/// The part of a line around what is meant, and where that is in it, in bytes. Letters that move the cursor are
/// replaced, so that no file can paint on the terminal.
fn cut(line: &str, column: usize, length: usize) -> (String, std::ops::Range<usize>) {
    let letters: Vec<char> = line.chars().map(|letter| if letter.is_control() { ' ' } else { letter }).collect();
    let whole_line = column == 0;
    let from = if whole_line { 0 } else { (column - 1).min(letters.len()) };
    let to = if whole_line { letters.len() } else { (from + length.max(1)).min(letters.len()) };
    let first = from.saturating_sub(AROUND);
    let last = to.min(from + AROUND).saturating_add(AROUND).min(letters.len());
    let bytes =
        |range: std::ops::Range<usize>| -> usize { letters[range].iter().map(|letter| letter.len_utf8()).sum() };
    let mut shown: String = letters[first..last].iter().collect();
    let start = bytes(first..from.min(last));
    let end = start + bytes(from.min(last)..to.min(last));
    if first > 0 {
        shown.replace_range(0..letters[first].len_utf8(), &" ".repeat(letters[first].len_utf8()));
    }
    (shown, start..end)
}

/// Text without letters that move the cursor.
fn visible(text: &str) -> String {
    text.chars().map(|letter| if letter.is_control() { ' ' } else { letter }).collect()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn what_is_meant_stays_in_sight_in_any_line() {
        let long = format!("{}niñez{}", "á".repeat(500), "x".repeat(500));
        let (shown, span) = cut(&long, 501, 5);
        assert_eq!(&shown[span], "niñez");
        assert!(shown.chars().count() < 200);
        for (column, length) in [(0, 0), (1, 0), (9_999, 5), (1_005, 9_999)] {
            let (shown, span) = cut(&long, column, length);
            assert!(shown.get(span).is_some(), "{column} {length}");
        }
        assert_eq!(readable(b"nev\xf3; \xb0"), "nevó; °");
        assert_eq!(cut("", 1, 1), (String::new(), 0..0));
        assert_eq!(cut("a\u{1b}[2J", 1, 1).0, "a [2J");
    }
}
