//! One cell as a number, strictly: what could be read in two ways is not read at all.

/// Why a cell is not a number.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum NumberFault {
    /// It has marks between thousands.
    Thousands,
    /// It has a comma where a decimal point was declared.
    Comma,
    /// It has a point where a decimal comma was declared.
    Point,
    /// A number with something behind it (a unit, a flag).
    Tail,
    /// The letter T, a trace of rain or snow.
    Trace,
    /// Anything else.
    Unreadable,
}

impl NumberFault {
    /// The message that says it.
    pub(super) fn message(self) -> &'static str {
        match self {
            NumberFault::Thousands => "problem-record-number-thousands",
            NumberFault::Comma => "problem-record-number-comma",
            NumberFault::Point => "problem-record-number-point",
            NumberFault::Tail => "problem-record-number-tail",
            NumberFault::Trace => "problem-record-number-trace",
            NumberFault::Unreadable => "problem-record-number",
        }
    }
}

/// The number in `text`; a true minus sign counts as a hyphen.
pub(super) fn parse_number(text: &str, decimal_comma: bool) -> Result<f64, NumberFault> {
    let text = text.trim();
    if !decimal_comma && is_plain_number(text.as_bytes()) {
        return finite(text);
    }
    let mark = if decimal_comma { ',' } else { '.' };
    let plain: String = text
        .chars()
        .map(|letter| match letter {
            '\u{2212}' => '-',
            // Whatever is not the declared mark must not pass for it.
            '.' if decimal_comma => '\u{0}',
            letter if letter == mark => '.',
            letter => letter,
        })
        .collect();
    if is_plain_number(plain.as_bytes()) { finite(&plain) } else { Err(fault_of(text, decimal_comma)) }
}

fn finite(plain: &str) -> Result<f64, NumberFault> {
    plain.parse().ok().filter(|number: &f64| number.is_finite()).ok_or(NumberFault::Unreadable)
}

/// Sign, digits with at most one point, exponent; no words such as "inf".
fn is_plain_number(bytes: &[u8]) -> bool {
    let digits = |from: usize| bytes[from..].iter().take_while(|byte| byte.is_ascii_digit()).count();
    let mut at = usize::from(matches!(bytes.first(), Some(b'+' | b'-')));
    let whole = digits(at);
    at += whole;
    let mut part = 0;
    if bytes.get(at) == Some(&b'.') {
        part = digits(at + 1);
        at += 1 + part;
    }
    if whole + part == 0 {
        return false;
    }
    if matches!(bytes.get(at), Some(b'e' | b'E')) {
        at += 1 + usize::from(matches!(bytes.get(at + 1), Some(b'+' | b'-')));
        let exponent = if at <= bytes.len() { digits(at) } else { 0 };
        if exponent == 0 {
            return false;
        }
        at += exponent;
    }
    at == bytes.len()
}

fn fault_of(text: &str, decimal_comma: bool) -> NumberFault {
    let body = text.trim_start_matches(['+', '-', '\u{2212}']);
    if body.eq_ignore_ascii_case("t") {
        return NumberFault::Trace;
    }
    if !body.starts_with(|letter: char| letter.is_ascii_digit() || letter == '.' || letter == ',') {
        return NumberFault::Unreadable;
    }
    let is_gap = |letter: char| matches!(letter, ' ' | '\'' | '’' | '\u{A0}' | '\u{202F}' | '\u{2009}' | '_');
    if body.chars().all(|letter| letter.is_ascii_digit() || letter == '.' || letter == ',' || is_gap(letter)) {
        let (commas, points) = (body.matches(',').count(), body.matches('.').count());
        return if body.chars().any(is_gap) || (commas > 0 && points > 0) {
            NumberFault::Thousands
        } else if commas > 1 || points > 1 {
            // Groups of three digits throughout are thousands; anything else is no number.
            let mark = if commas > 1 { ',' } else { '.' };
            let grouped = body.split(mark).skip(1).all(|group| group.len() == 3);
            if grouped { NumberFault::Thousands } else { NumberFault::Unreadable }
        } else if decimal_comma && points == 1 {
            NumberFault::Point
        } else if !decimal_comma && commas == 1 {
            NumberFault::Comma
        } else {
            NumberFault::Unreadable
        };
    }
    let starts = body.trim_start_matches(|letter: char| letter.is_ascii_digit() || letter == '.' || letter == ',');
    let is_tail = starts.chars().all(|letter| !letter.is_ascii_digit() && letter != '-' && letter != ':');
    if is_tail && body.starts_with(|letter: char| letter.is_ascii_digit()) {
        NumberFault::Tail
    } else {
        NumberFault::Unreadable
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn numbers_in_both_marks() {
        for (text, comma, number) in [
            ("12.5", false, 12.5),
            (" -0.3 ", false, -0.3),
            ("\u{2212}4", false, -4.0),
            (".5", false, 0.5),
            ("5.", false, 5.0),
            ("1.2e-3", false, 0.0012),
            ("+7", false, 7.0),
            ("12,5", true, 12.5),
            ("-0,3", true, -0.3),
            ("7", true, 7.0),
        ] {
            assert_eq!(parse_number(text, comma), Ok(number), "{text}");
        }
    }

    #[test]
    fn what_can_be_read_two_ways_is_not_read() {
        use NumberFault::*;
        for (text, comma, fault) in [
            ("1,234", false, Comma),
            ("12,5", false, Comma),
            ("1,234.5", false, Thousands),
            ("1.234,5", true, Thousands),
            ("1 234", false, Thousands),
            ("1'234.5", false, Thousands),
            ("1.234.567", true, Thousands),
            ("12.5", true, Point),
            ("12.5 mm", false, Tail),
            ("12.5e", false, Tail),
            ("3*", false, Tail),
            ("T", false, Trace),
            ("inf", false, Unreadable),
            ("NaN", false, Unreadable),
            ("0x10", false, Unreadable),
            ("1e999", false, Unreadable),
            ("1.2.3", false, Unreadable),
            ("--5", false, Unreadable),
            ("e", false, Unreadable),
            ("1e", true, Tail),
            (".", false, Unreadable),
            ("M", false, Unreadable),
            ("2001-05-03", false, Unreadable),
        ] {
            assert_eq!(parse_number(text, comma), Err(fault), "{text}");
        }
    }
}
