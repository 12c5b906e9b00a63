//! Collects the problems of one record, and keeps a file that is wrong on every line from filling the screen.

use std::path::Path;

use crate::place::problem::{Location, Problem, Severity};

/// Problems of one kind that are shown one by one; the rest are counted.
const MOST_OF_A_KIND: usize = 20;
/// Characters of the file's own text that a message repeats.
const MOST_SHOWN_CHARACTERS: usize = 40;

/// The problems of one record.
pub(super) struct Notes<'a> {
    pub(super) file: &'a Path,
    problems: &'a mut Vec<Problem>,
    kinds: Vec<Kind>,
    errors: usize,
}

/// How often one message came up.
struct Kind {
    message: &'static str,
    severity: Severity,
    count: usize,
    first_not_shown: Option<Location>,
}

impl<'a> Notes<'a> {
    pub(super) fn new(file: &'a Path, problems: &'a mut Vec<Problem>) -> Self {
        Self { file, problems, kinds: Vec::new(), errors: 0 }
    }

    /// Adds `problem`, or counts it when there are enough of its kind.
    pub(super) fn add(&mut self, problem: Problem) {
        if problem.severity == Severity::Error {
            self.errors += 1;
        }
        let kind = match self.kinds.iter().position(|kind| kind.message == problem.message) {
            Some(at) => &mut self.kinds[at],
            None => {
                let (message, severity) = (problem.message, problem.severity);
                self.kinds.push(Kind { message, severity, count: 0, first_not_shown: None });
                let last = self.kinds.len() - 1;
                &mut self.kinds[last]
            }
        };
        kind.count += 1;
        if kind.count <= MOST_OF_A_KIND {
            self.problems.push(problem);
        } else if kind.first_not_shown.is_none() {
            kind.first_not_shown = Some(problem.at);
        }
    }

    /// Says how many were not shown, and returns whether the record can be used.
    pub(super) fn finish(self) -> bool {
        for kind in self.kinds {
            if let Some(at) = kind.first_not_shown {
                let more = match kind.severity {
                    Severity::Error => Problem::error(at, "problem-record-more"),
                    Severity::Warning => Problem::warning(at, "problem-record-more"),
                };
                self.problems.push(more.with("count", kind.count - MOST_OF_A_KIND));
            }
        }
        self.errors == 0
    }

    /// A line of the file, or the whole file with 0.
    pub(super) fn line(&self, line: usize) -> Location {
        Location { file: self.file.to_path_buf(), line, column: 0, length: 0 }
    }
}

/// Text of the file as a message can repeat it: short, on one line, without control characters.
pub(super) fn shown(text: &str) -> String {
    let mut short: String = text
        .trim()
        .chars()
        .take(MOST_SHOWN_CHARACTERS)
        .map(|letter| if letter.is_control() { '\u{FFFD}' } else { letter })
        .collect();
    if text.trim().chars().nth(MOST_SHOWN_CHARACTERS).is_some() {
        short.push('…');
    }
    short
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn many_of_a_kind_become_a_count() {
        let mut problems = Vec::new();
        let mut notes = Notes::new(Path::new("days.csv"), &mut problems);
        for line in 1..=50 {
            notes.add(Problem::error(notes.line(line), "problem-record-number"));
        }
        notes.add(Problem::warning(notes.line(7), "problem-record-stuck"));
        assert!(!notes.finish());
        assert_eq!(problems.len(), MOST_OF_A_KIND + 2);
        let more = problems.last().unwrap();
        assert_eq!((more.message, more.at.line), ("problem-record-more", 21));
    }

    #[test]
    fn long_or_unprintable_text_is_shortened() {
        assert_eq!(shown(" 12\u{0}5 "), "12\u{FFFD}5");
        assert_eq!(shown(&"x".repeat(100)).chars().count(), MOST_SHOWN_CHARACTERS + 1);
    }
}
