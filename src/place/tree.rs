//! A TOML text as a tree in which every key and value knows where it stands.
//!
//! The parser goes on after an error, so that a file's mistakes are told together.

use std::cell::RefCell;
use std::ops::Range;
use std::path::PathBuf;

use chrono::NaiveDate;
use toml::de::{DeTable, DeValue};

use super::problem::{Location, Problem};

/// A value and the bytes that it covers.
#[derive(Clone, Debug)]
pub(crate) struct Value {
    /// Bytes of the text.
    pub span: Range<usize>,
    /// What it is.
    pub kind: Kind,
}

/// What a value is.
#[derive(Clone, Debug)]
pub(crate) enum Kind {
    /// Text between quotes.
    Text(String),
    /// A finite number.
    Number(f64),
    /// true or false.
    Flag(bool),
    /// A date without a time.
    Date(NaiveDate),
    /// Several values.
    List(Vec<Value>),
    /// Keys and values.
    Table(Table),
    /// Something that a place has no use for: infinity, a time of day.
    Other,
}

/// A key with its value.
#[derive(Clone, Debug)]
pub(crate) struct Entry {
    /// The key.
    pub key: String,
    /// Bytes of the key.
    pub key_span: Range<usize>,
    /// The value.
    pub value: Value,
}

/// Keys and values in the order of the file.
#[derive(Clone, Debug, Default)]
pub(crate) struct Table {
    /// Entries in the order of the file.
    pub entries: Vec<Entry>,
}

impl Table {
    /// The entry with this key.
    pub fn get(&self, key: &str) -> Option<&Entry> {
        self.entries.iter().find(|entry| entry.key == key)
    }
}

/// A text being read: where problems are gathered.
pub(crate) struct Sheet<'t> {
    /// The file, as the user would name it.
    pub file: PathBuf,
    /// Its text.
    pub text: &'t str,
    /// What was found so far.
    pub problems: RefCell<Vec<Problem>>,
    /// Where each line starts.
    line_starts: Vec<usize>,
    /// How many of them, at the start, are lines that could not be read.
    unread: usize,
}

impl<'t> Sheet<'t> {
    /// Parses `text`; every error of syntax becomes a problem.
    pub fn parse(file: impl Into<PathBuf>, text: &'t str) -> (Self, Table) {
        let (document, mut errors) = DeTable::parse_recoverable(text);
        errors.sort_by_key(|error| error.span().map_or(0, |span| span.start));
        let after_breaks = text.match_indices('\n').map(|(at, _)| at + 1);
        let line_starts = std::iter::once(0).chain(after_breaks).collect();
        let mut sheet = Self { file: file.into(), text, problems: RefCell::default(), line_starts, unread: 0 };
        let mut last_line = 0;
        for error in &errors {
            let span = error.span().unwrap_or(0..0);
            let at = sheet.at(&span);
            // One slip often makes the parser stumble several times on its line.
            if at.line != last_line {
                last_line = at.line;
                let problem = syntax_problem(at, error.message(), text, &span);
                sheet.problems.get_mut().push(problem);
            }
        }
        sheet.unread = sheet.problems.get_mut().len();
        (sheet, table(document.get_ref()))
    }

    /// Where these bytes stand.
    pub fn at(&self, span: &Range<usize>) -> Location {
        let line = self.line_starts.partition_point(|start| *start <= span.start).saturating_sub(1);
        let first = self.line_starts[line];
        let within = span.start - first..span.end.saturating_sub(first);
        let at = Location::of_span(self.file.clone(), &self.text[first..], within);
        Location { line: line + 1, ..at }
    }

    /// Adds a problem; what follows from a line that could not be read is not told again.
    pub fn tell(&self, problem: Problem) {
        let mut problems = self.problems.borrow_mut();
        let follows = problems[..self.unread]
            .iter()
            .any(|told| told.at.file == problem.at.file && told.at.line == problem.at.line);
        if !follows {
            problems.push(problem);
        }
    }

    /// Whether the text broke the rules of TOML; then what seems missing may only be unreadable and is not told.
    pub fn is_broken(&self) -> bool {
        self.unread > 0
    }
}

/// Puts the parser's complaint into one of our own messages.
fn syntax_problem(at: Location, message: &str, text: &str, span: &Range<usize>) -> Problem {
    let line = text.lines().nth(at.line.saturating_sub(1)).unwrap_or("");
    if message.contains("duplicate key") {
        let key = text.get(span.clone()).unwrap_or("").to_owned();
        Problem::error(at, "problem-key-twice").with("key", key)
    } else if has_decimal_comma(line) {
        Problem::error(at, "problem-decimal-comma")
    } else if message.contains("must be quoted") {
        Problem::error(at, "problem-text-unquoted")
    } else if message.contains("string") || line.matches('"').count() % 2 == 1 {
        Problem::error(at, "problem-quote")
    } else if message.contains("table") || message.contains("array") || message.contains(']') {
        Problem::error(at, "problem-bracket")
    } else {
        Problem::error(at, "problem-syntax")
    }
}

/// Whether a line gives a number as `12,5` outside of a list and of quotes.
fn has_decimal_comma(line: &str) -> bool {
    let Some((_, value)) = line.split_once('=') else { return false };
    let value = value.split('#').next().unwrap_or("").trim();
    let mut parts = value.splitn(2, ',');
    let digits = |part: &str| !part.is_empty() && part.bytes().all(|byte| byte.is_ascii_digit());
    match (parts.next(), parts.next()) {
        (Some(whole), Some(rest)) => digits(whole.trim_start_matches(['-', '+'])) && digits(rest),
        _ => false,
    }
}

fn table(from: &DeTable<'_>) -> Table {
    let mut entries: Vec<Entry> = from
        .iter()
        .map(|(key, value)| Entry {
            key: key.get_ref().to_string(),
            key_span: key.span(),
            value: Value { span: value.span(), kind: kind(value.get_ref()) },
        })
        .collect();
    entries.sort_by_key(|entry| entry.key_span.start);
    Table { entries }
}

fn kind(value: &DeValue<'_>) -> Kind {
    let finite = |number: f64| if number.is_finite() { Kind::Number(number) } else { Kind::Other };
    match value {
        DeValue::String(text) => Kind::Text(text.to_string()),
        DeValue::Integer(whole) => {
            // Whole numbers beyond 2^53 lose digits here, far outside every range of a place.
            i64::from_str_radix(whole.as_str(), whole.radix()).map_or(Kind::Other, |whole| finite(whole as f64))
        }
        DeValue::Float(number) => number.as_str().parse().map_or(Kind::Other, finite),
        DeValue::Boolean(flag) => Kind::Flag(*flag),
        DeValue::Datetime(moment) => match (moment.date, moment.time) {
            (Some(date), None) => NaiveDate::from_ymd_opt(date.year.into(), date.month.into(), date.day.into())
                .map_or(Kind::Other, Kind::Date),
            _ => Kind::Other,
        },
        DeValue::Array(values) => {
            Kind::List(values.iter().map(|value| Value { span: value.span(), kind: kind(value.get_ref()) }).collect())
        }
        DeValue::Table(entries) => Kind::Table(table(entries)),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn several_slips_are_told_together_and_reading_goes_on() {
        let text = "[place]\nlatitude_deg = 39,5\nx = 1\nx = 2\nname = \"open\ny = 5 mm\n[climb\n";
        let (sheet, _) = Sheet::parse("place.toml", text);
        let told: Vec<_> = sheet.problems.borrow().iter().map(|problem| (problem.message, problem.at.line)).collect();
        assert_eq!(
            told,
            [
                ("problem-decimal-comma", 2),
                ("problem-key-twice", 4),
                ("problem-quote", 5),
                ("problem-text-unquoted", 6),
                ("problem-bracket", 7)
            ]
        );
        assert!(sheet.is_broken());
    }

    #[test]
    fn order_and_places_of_the_file_are_kept() {
        let (sheet, root) = Sheet::parse("place.toml", "z = 1\na = { b = \"ñ\", c = 2 }\n");
        assert_eq!(root.entries[0].key, "z");
        let Kind::Table(inner) = &root.entries[1].value.kind else { panic!("a table") };
        let at = sheet.at(&inner.get("c").unwrap().value.span);
        assert_eq!((at.line, at.column), (2, 20));
    }
}
