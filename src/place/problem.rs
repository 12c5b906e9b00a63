//! What is wrong with a place, as data: where it stands, which message says it, and the values in that message.
//!
//! The words are in `locales/*/problems.ftl` and `record-problems.ftl`: a message says what is wrong, its attribute
//! `.remedy` says what would be right. `commands` puts the two together.

use std::path::PathBuf;

use chrono::NaiveDate;

use crate::words::nearest;

/// Known names that a message repeats.
const MOST_CHOICES: usize = 24;

/// How bad a problem is.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Severity {
    /// The place works; somebody should look.
    Warning,
    /// The place cannot be used.
    Error,
}

/// Where a problem stands in a file.
#[derive(Clone, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub struct Location {
    /// The file, as the user would name it.
    pub file: PathBuf,
    /// Line, from 1; 0 where the whole file is meant.
    pub line: usize,
    /// Column in characters, from 1; 0 where the whole line is meant.
    pub column: usize,
    /// How many characters are meant, 0 where unknown.
    pub length: usize,
}

/// A value inside a message; formatted for the reader's language when it is said.
#[derive(Clone, Debug, PartialEq)]
pub enum Argument {
    /// Text from the file, or a key.
    Text(String),
    /// A count.
    Count(usize),
    /// A number without a unit of its own (the message names the unit).
    Number(f64),
    /// A date.
    Date(NaiveDate),
}

/// One thing that is wrong.
#[derive(Clone, Debug, PartialEq)]
pub struct Problem {
    /// Where.
    pub at: Location,
    /// How bad.
    pub severity: Severity,
    /// Message id in `locales/`, starting with `problem-`.
    pub message: &'static str,
    /// Values in the message, by name.
    pub arguments: Vec<(&'static str, Argument)>,
}

impl Location {
    /// The whole file.
    pub fn whole_file(file: impl Into<PathBuf>) -> Self {
        Self { file: file.into(), line: 0, column: 0, length: 0 }
    }

    /// The place in `text` (the content of `file`) that the bytes `span` cover.
    pub fn of_span(file: impl Into<PathBuf>, text: &str, span: std::ops::Range<usize>) -> Self {
        let mut start = span.start.min(text.len());
        while !text.is_char_boundary(start) {
            start -= 1;
        }
        let before = &text[..start];
        let line_start = before.rfind('\n').map_or(0, |at| at + 1);
        let end = span.end.clamp(start, text.len());
        let meant = text.get(start..end).unwrap_or("").lines().next().unwrap_or("");
        Self {
            file: file.into(),
            line: before.matches('\n').count() + 1,
            column: before[line_start..].chars().count() + 1,
            length: meant.chars().count(),
        }
    }
}

impl Problem {
    /// An error at `at`, said by `message`.
    pub fn error(at: Location, message: &'static str) -> Self {
        Self { at, severity: Severity::Error, message, arguments: Vec::new() }
    }

    /// A warning at `at`, said by `message`.
    pub fn warning(at: Location, message: &'static str) -> Self {
        Self { severity: Severity::Warning, ..Self::error(at, message) }
    }

    /// The same problem with a value in its message.
    #[must_use]
    pub fn with(mut self, name: &'static str, argument: impl Into<Argument>) -> Self {
        self.arguments.push((name, argument.into()));
        self
    }
}

impl Problem {
    /// The same problem with the name of `known` that is nearest to `word` as `nearest`, and `near` 1; where none is near,
    /// `near` is 0. All of them stand in `choices`, unless the problem has that already.
    #[must_use]
    pub fn with_nearest<N: AsRef<str>>(self, word: &str, known: impl IntoIterator<Item = N>) -> Self {
        let names: Vec<N> = known.into_iter().collect();
        let near = nearest(word, names.iter().map(AsRef::as_ref)).map(str::to_owned);
        let has_choices = self.arguments.iter().any(|(name, _)| *name == "choices");
        let told = self.with("near", usize::from(near.is_some())).with("nearest", near.unwrap_or_default());
        if has_choices {
            return told;
        }
        let mut choices: Vec<&str> = names.iter().take(MOST_CHOICES).map(AsRef::as_ref).collect();
        if names.len() > MOST_CHOICES {
            choices.push("…");
        }
        told.with("choices", choices.join(", "))
    }
}

impl From<&str> for Argument {
    fn from(text: &str) -> Self {
        Argument::Text(text.to_owned())
    }
}

impl From<String> for Argument {
    fn from(text: String) -> Self {
        Argument::Text(text)
    }
}

impl From<usize> for Argument {
    fn from(count: usize) -> Self {
        Argument::Count(count)
    }
}

impl From<f64> for Argument {
    fn from(number: f64) -> Self {
        Argument::Number(number)
    }
}

impl From<NaiveDate> for Argument {
    fn from(date: NaiveDate) -> Self {
        Argument::Date(date)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_span_is_found_by_line_and_column_in_characters() {
        let text = "uno\nniñez = \"á\"\ntres";
        let at = Location::of_span("place.toml", text, text.find('"').unwrap()..text.find('"').unwrap() + 4);
        assert_eq!((at.line, at.column, at.length), (2, 9, 3));
        let end = Location::of_span("place.toml", text, 999..1000);
        assert_eq!((end.line, end.column, end.length), (3, 5, 0));
    }
}
