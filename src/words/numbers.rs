//! Numbers as people of a region write them: marks, gaps, minus signs and honest rounding.
//!
//! Two rules stand behind the details. A figure with exactly three decimals reads as thousands in half of the regions,
//! so no more than two decimals are ever written. In Spanish a thin gap that does not break across lines groups digits
//! from five up, since both `.` and `,` mean something else to somebody in the room (Ortografía de la lengua española,
//! 2010, seen second-hand).

use super::say::{Value, Words};

/// Most decimals that are ever written for people: exactly three would read as thousands somewhere.
const MOST_DECIMALS: u8 = 2;
/// From here up a double holds whole numbers only, so there is nothing to round to a decimal.
const NO_FRACTION_ABOVE: f64 = 9.0e15;
/// The true minus sign; a hyphen is too short to be seen on a small screen.
const MINUS: char = '\u{2212}';

/// How a region writes numbers; read from the messages of `numbers.ftl`.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct NumberStyle {
    /// The mark between whole part and decimals.
    pub decimal_mark: String,
    /// What groups the thousands.
    pub thousands_mark: String,
    /// The fewest digits of the whole part that are grouped.
    pub thousands_from: usize,
    /// What stands for a number that does not exist.
    pub missing: String,
}

impl NumberStyle {
    /// A number with exactly that many decimals (at most two are written).
    pub fn fixed(&self, value: f64, decimals: u8) -> String {
        if !value.is_finite() {
            return self.missing.clone();
        }
        let decimals = decimals.min(MOST_DECIMALS);
        self.write(&format!("{:.*}", usize::from(decimals), round_to(value, i32::from(decimals))))
    }

    /// A number with at most that many decimals (and never over two), without closing zeros.
    pub fn plain(&self, value: f64, decimals: u8) -> String {
        if !value.is_finite() {
            return self.missing.clone();
        }
        self.write(&trimmed(value, decimals.min(MOST_DECIMALS)))
    }

    /// A number rounded to that many significant digits, without closing zeros; never more than two decimals.
    pub fn significant(&self, value: f64, digits: u8) -> String {
        let (rounded, decimals) = round_significant(value, digits);
        self.plain(rounded, decimals)
    }

    /// Writes the digits of a plain decimal text (`-1234.5`) with this region's marks.
    fn write(&self, digits: &str) -> String {
        let negative = digits.starts_with('-');
        let unsigned = digits.trim_start_matches('-');
        let (whole, decimals) = unsigned.split_once('.').unwrap_or((unsigned, ""));
        let mut written = String::with_capacity(digits.len() + 8);
        if negative && unsigned.bytes().any(|digit| digit.is_ascii_digit() && digit != b'0') {
            written.push(MINUS);
        }
        let grouped = whole.len() >= self.thousands_from;
        for (index, digit) in whole.chars().enumerate() {
            if grouped && index > 0 && (whole.len() - index) % 3 == 0 {
                written.push_str(&self.thousands_mark);
            }
            written.push(digit);
        }
        if !decimals.is_empty() {
            written.push_str(&self.decimal_mark);
            written.push_str(decimals);
        }
        written
    }
}

impl Words {
    /// A number with exactly that many decimals (at most two are written); for columns of a table.
    pub fn number(&self, value: f64, decimals: u8) -> String {
        self.style().fixed(value, decimals)
    }

    /// A number with its sign always written, `+` or `−`, except for zero; for columns of changes.
    pub fn number_signed(&self, value: f64, decimals: u8) -> String {
        let written = self.style().fixed(value, decimals);
        let rounds_to_zero = round_to(value, i32::from(decimals.min(MOST_DECIMALS))) == 0.0;
        if value > 0.0 && value.is_finite() && !rounds_to_zero { format!("+{written}") } else { written }
    }

    /// A number rounded to that many significant digits, never with more than two decimals; for sentences.
    pub fn significant(&self, value: f64, digits: u8) -> String {
        self.style().significant(value, digits)
    }

    /// A percentage (18 for `18%`) with at most that many decimals.
    pub fn percent(&self, value_percent: f64, decimals: u8) -> String {
        self.say("number-percent", &[("n", Value::Number(value_percent, decimals))])
    }

    /// A year, which has no thousands mark in any language.
    pub fn year(&self, year: i32) -> String {
        if year < 0 { format!("{MINUS}{}", year.unsigned_abs()) } else { year.to_string() }
    }

    /// "between 18 and 25", both ends rounded to that many significant digits.
    pub fn number_range(&self, low: f64, high: f64, digits: u8) -> String {
        let (low, high) = (self.significant(low, digits), self.significant(high, digits));
        self.say("number-between", &[("a", low.into()), ("b", high.into())])
    }
}

/// Rounds half away from zero, as people are taught to, at that many decimals (negative: tens, hundreds ...).
pub(super) fn round_to(value: f64, decimals: i32) -> f64 {
    if !value.is_finite() || (decimals >= 0 && value.abs() >= NO_FRACTION_ABOVE) {
        return value;
    }
    let scale = power_of_ten(decimals.unsigned_abs());
    if decimals >= 0 { libm::round(value * scale) / scale } else { libm::round(value / scale) * scale }
}

/// The value rounded to that many significant digits (never past two decimals), and the decimals that it needs.
pub(super) fn round_significant(value: f64, digits: u8) -> (f64, u8) {
    if value == 0.0 || !value.is_finite() {
        return (value, 0);
    }
    // Rounded once only: 1.2346 to three decimals and then to two would be 1.24.
    let last_digit =
        |value: f64| (i32::from(digits.max(1)) - 1 - decimal_exponent(value)).min(i32::from(MOST_DECIMALS));
    let rounded = round_to(value, last_digit(value));
    if rounded == 0.0 {
        return (0.0, 0);
    }
    // 9.96 in two digits is 10, which needs one decimal fewer than 9.96 did.
    (rounded, last_digit(rounded).max(0) as u8)
}

/// The exponent of the first digit: 2 for 123, −2 for 0.0123.
fn decimal_exponent(value: f64) -> i32 {
    // Printing is exact where a logarithm may fall on either side of a power of ten.
    let printed = format!("{value:e}");
    printed.split_once('e').and_then(|(_, exponent)| exponent.parse().ok()).unwrap_or(0)
}

/// The value with at most that many decimals and no closing zeros, in plain digits.
pub(super) fn trimmed(value: f64, decimals: u8) -> String {
    let printed = format!("{:.*}", usize::from(decimals), round_to(value, i32::from(decimals)));
    if printed.contains('.') { printed.trim_end_matches('0').trim_end_matches('.').to_owned() } else { printed }
}

/// Ten to that power, correctly rounded.
fn power_of_ten(power: u32) -> f64 {
    format!("1e{power}").parse().unwrap_or(f64::INFINITY)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn plain() -> NumberStyle {
        NumberStyle { decimal_mark: ".".into(), thousands_mark: ",".into(), thousands_from: 4, missing: "?".into() }
    }

    #[test]
    fn halves_go_away_from_zero() {
        assert_eq!(round_to(2.5, 0), 3.0);
        assert_eq!(round_to(-2.5, 0), -3.0);
        assert_eq!(round_to(0.15, 1), 0.2);
        assert_eq!(round_to(1250.0, -2), 1300.0);
    }

    #[test]
    fn significant_digits_shed_what_is_not_known() {
        let style = plain();
        for (value, digits, expected) in [
            (1234.5, 2, "1,200"),
            (1234.5, 3, "1,230"),
            (0.0, 3, "0"),
            (9.96, 2, "10"),
            (0.999, 2, "1"),
            (3.6, 2, "3.6"),
            (0.012_34, 2, "0.01"),
            (0.001, 2, "0"),
            (1.2346, 4, "1.23"),
            (1.2345, 4, "1.23"),
            (-18.4, 2, "\u{2212}18"),
        ] {
            assert_eq!(style.significant(value, digits), expected, "{value} in {digits} digits");
        }
    }

    #[test]
    fn nothing_at_all_upsets_it() {
        let style = plain();
        for value in [f64::NAN, f64::INFINITY, f64::NEG_INFINITY] {
            assert_eq!(style.fixed(value, 1), "?");
            assert_eq!(style.significant(value, 3), "?");
        }
        for value in [f64::MAX, f64::MIN, f64::MIN_POSITIVE, 1e-320, -0.0] {
            for digits in [0, 1, 2, 3, 255] {
                assert!(!style.fixed(value, digits).is_empty());
                assert!(!style.significant(value, digits).is_empty());
            }
        }
        assert_eq!(style.fixed(-0.04, 1), "0.0", "a zero has no sign");
    }
}
