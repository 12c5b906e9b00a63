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

/// Digits that people write; a number with more was worked out.
const MOST_WRITTEN: usize = 7;
/// Digits that are shown of such a number.
const SHOWN_DIGITS: i32 = 4;

/// The number as a file would have it, at most six digits behind the point; one that was worked out is rounded.
fn as_in_file(number: f64) -> String {
    if !number.is_finite() || number.abs() >= 1e15 {
        return format!("{number:e}");
    }
    let digits = |text: &str| text.bytes().filter(u8::is_ascii_digit).count();
    let shortest = number.abs().to_string();
    let written = if digits(shortest.trim_start_matches(['0', '.'])) > MOST_WRITTEN {
        let exponent: i32 = format!("{number:e}").rsplit('e').next().and_then(|text| text.parse().ok()).unwrap_or(0);
        let decimals = usize::try_from(SHOWN_DIGITS - 1 - exponent).unwrap_or(0);
        format!("{number:.decimals$}")
    } else {
        format!("{number:.6}")
    };
    if !written.contains('.') {
        return written;
    }
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
        let worked_out: Vec<_> = [96.423_456_789, 1.0 / 3.0, 2.0e6 / 7.0, -1.0 / 7.0e3, 1234.567, 86_400_000.0]
            .into_iter()
            .map(as_in_file)
            .collect();
        assert_eq!(worked_out, ["96.42", "0.3333", "285714", "-0.0001429", "1234.567", "86400000"]);
    }
}
