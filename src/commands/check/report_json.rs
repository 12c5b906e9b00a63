//! What `check` found, for tools: one object a problem.

use serde::Serialize;

use super::found::Checked;
use crate::commands::problem_words::{message, remedy};
use crate::place::problem::Severity;
use crate::words::Words;

/// One problem. Line and column count from 1; 0 means the whole file, or the whole line.
#[derive(Serialize)]
struct Entry {
    file: String,
    line: usize,
    column: usize,
    /// How many letters are meant, 0 where unknown.
    length: usize,
    /// `error` or `warning`.
    severity: &'static str,
    /// Stable name of the kind of problem.
    code: &'static str,
    message: String,
    remedy: String,
}

/// Every problem as an array; messages in the reader's language, all else stable.
pub(super) fn write(checked: &[Checked], words: &Words) -> String {
    let mut entries = Vec::new();
    for checked in checked {
        entries.extend(checked.unreadable.iter().map(|line| Entry {
            file: checked.path.clone(),
            line: 0,
            column: 0,
            length: 0,
            severity: "error",
            code: "unreadable",
            message: line.clone(),
            remedy: String::new(),
        }));
        entries.extend(checked.problems.iter().map(|problem| Entry {
            file: problem.at.file.display().to_string(),
            line: problem.at.line,
            column: problem.at.column,
            length: problem.at.length,
            severity: if problem.severity == Severity::Error { "error" } else { "warning" },
            code: problem.message,
            message: message(problem, words),
            remedy: remedy(problem, words),
        }));
    }
    // Strings and whole numbers always have a JSON form.
    serde_json::to_string_pretty(&entries).unwrap_or_default() + "\n"
}
