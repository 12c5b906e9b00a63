//! Problems of places, records and settings in words.

use crate::place::problem::{Argument, Problem, Severity};
use crate::words::{DateStyle, Value, Words};

/// Letters of a text of the file that a message repeats: more is a mistake in itself.
const MOST_LETTERS: usize = 400;

/// What is wrong, in the reader's language.
pub(super) fn message(problem: &Problem, words: &Words) -> String {
    words.say(problem.message, &arguments(problem, words))
}

/// What would be right; empty where the message has no remedy.
pub(super) fn remedy(problem: &Problem, words: &Words) -> String {
    let id = format!("{}.remedy", problem.message);
    if words.has(&id) { words.say(&id, &arguments(problem, words)) } else { String::new() }
}

/// The word for how bad it is.
pub(super) fn severity(severity: Severity, words: &Words) -> String {
    words.say(if severity == Severity::Error { "error-error" } else { "error-warning" }, &[])
}

fn arguments<'a>(problem: &'a Problem, words: &Words) -> Vec<(&'static str, Value<'a>)> {
    let value = |argument: &'a Argument| match argument {
        Argument::Text(text) => match text.char_indices().nth(MOST_LETTERS) {
            Some((end, _)) => Value::from(format!("{}…", &text[..end])),
            None => Value::from(text.as_str()),
        },
        Argument::Count(count) => Value::from(*count),
        // Written as the file writes it: people look for these digits in it, whatever the mark of their region.
        Argument::Number(number) => Value::Counted { number: *number, text: as_in_file(*number).into() },
        Argument::Date(date) => Value::from(words.date(*date, DateStyle::Long)),
    };
    problem.arguments.iter().map(|(name, argument)| (*name, value(argument))).collect()
}

/// The number as a file would have it, at most six digits behind the point.
fn as_in_file(number: f64) -> String {
    if !number.is_finite() || number.abs() >= 1e15 {
        return format!("{number:e}");
    }
    let written = format!("{number:.6}");
    let trimmed = written.trim_end_matches('0').trim_end_matches('.');
    if trimmed == "-0" { "0".to_owned() } else { trimmed.to_owned() }
}

#[cfg(test)]
mod tests {
    use super::as_in_file;

    #[test]
    fn numbers_keep_the_digits_of_the_file() {
        let said: Vec<_> = [0.0001, 12.5, -0.0, -1e308, 3.0].into_iter().map(as_in_file).collect();
        assert_eq!(said, ["0.0001", "12.5", "0", "-1e308", "3"]);
    }
}
