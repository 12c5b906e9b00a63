//! One date from its text, in a declared order of year, month and day.

use chrono::NaiveDate;

use super::plan::DateOrder;

/// Years in which a daily record can lie; outside them a year is a typing mistake.
const YEARS: std::ops::RangeInclusive<i32> = 1750..=2200;

/// First letters of the months in English, then where Spanish differs.
const MONTHS: [(&str, u32); 18] = [
    ("jan", 1),
    ("feb", 2),
    ("mar", 3),
    ("apr", 4),
    ("may", 5),
    ("jun", 6),
    ("jul", 7),
    ("aug", 8),
    ("sep", 9),
    ("oct", 10),
    ("nov", 11),
    ("dec", 12),
    ("ene", 1),
    ("abr", 4),
    ("ago", 8),
    ("set", 9),
    ("dic", 12),
    ("sept", 9),
];

/// Why a text is not a date.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum DateFault {
    /// Not three parts in the declared order.
    Unreadable,
    /// The year has fewer than four digits.
    ShortYear,
    /// Three good parts, and no such day on the calendar.
    NoSuchDay,
    /// A time of day other than midnight stands behind it.
    TimeOfDay,
    /// A year far from any measured record.
    FarYear,
}

impl DateFault {
    /// The message that says it.
    pub(super) fn message(self) -> &'static str {
        match self {
            DateFault::Unreadable => "problem-record-date-unreadable",
            DateFault::ShortYear => "problem-record-date-short-year",
            DateFault::NoSuchDay => "problem-record-date-no-such-day",
            DateFault::TimeOfDay => "problem-record-date-time",
            DateFault::FarYear => "problem-record-date-far-year",
        }
    }
}

/// The date in `text`; midnight behind it is passed over.
pub(super) fn parse_date(text: &str, order: DateOrder) -> Result<NaiveDate, DateFault> {
    let text = without_midnight(text.trim())?;
    if text.len() == 8 && text.bytes().all(|byte| byte.is_ascii_digit()) {
        let (year, month, day) = match order {
            DateOrder::YearMonthDay => (&text[..4], &text[4..6], &text[6..]),
            DateOrder::DayMonthYear => (&text[4..], &text[2..4], &text[..2]),
            DateOrder::MonthDayYear => (&text[4..], &text[..2], &text[2..4]),
        };
        return from_parts(year, month, day);
    }
    let mut parts = [""; 3];
    let mut count = 0;
    for part in text.split(|letter: char| !letter.is_alphanumeric()) {
        if part.is_empty() || part.eq_ignore_ascii_case("de") {
            continue;
        }
        *parts.get_mut(count).ok_or(DateFault::Unreadable)? = part;
        count += 1;
    }
    if count != 3 {
        return Err(DateFault::Unreadable);
    }
    let mut named = (0..3).filter(|at| parts[*at].chars().all(char::is_alphabetic));
    let (year, month, day) = match (named.next(), order) {
        // A month by name cannot be mixed up with the day; only the year's place is left to the order.
        (Some(at), DateOrder::YearMonthDay) => {
            (parts[usize::from(at == 0)], parts[at], parts[2 - usize::from(at == 2)])
        }
        (Some(at), _) => (parts[2 - usize::from(at == 2)], parts[at], parts[usize::from(at == 0)]),
        (None, DateOrder::YearMonthDay) => (parts[0], parts[1], parts[2]),
        (None, DateOrder::DayMonthYear) => (parts[2], parts[1], parts[0]),
        (None, DateOrder::MonthDayYear) => (parts[2], parts[0], parts[1]),
    };
    if year.len() != 4 {
        let all_short = parts.iter().all(|part| part.len() <= 2 || part.chars().all(char::is_alphabetic));
        return Err(if all_short { DateFault::ShortYear } else { DateFault::Unreadable });
    }
    from_parts(year, month, day)
}

/// The date of three parts: a year of four digits, a month by number or name, a day.
pub(super) fn from_parts(year: &str, month: &str, day: &str) -> Result<NaiveDate, DateFault> {
    let year = four_digit_year(year)?;
    let month = if month.len() <= 2 { whole(month) } else { month_by_name(month) };
    let (Some(month), Some(day)) = (month, whole(day).filter(|_| day.len() <= 2)) else {
        return Err(DateFault::Unreadable);
    };
    NaiveDate::from_ymd_opt(year, month, day).ok_or(DateFault::NoSuchDay)
}

/// The date of a year and a day of the year, 1 to 366.
pub(super) fn from_year_and_day(year: &str, day_of_year: &str) -> Result<NaiveDate, DateFault> {
    let year = four_digit_year(year)?;
    let day = whole(day_of_year).filter(|_| day_of_year.len() <= 3).ok_or(DateFault::Unreadable)?;
    NaiveDate::from_yo_opt(year, day).ok_or(DateFault::NoSuchDay)
}

fn four_digit_year(text: &str) -> Result<i32, DateFault> {
    let year = whole(text).ok_or(DateFault::Unreadable)?;
    match text.len() {
        1..=2 => Err(DateFault::ShortYear),
        4 => i32::try_from(year).ok().filter(|year| YEARS.contains(year)).ok_or(DateFault::FarYear),
        _ => Err(DateFault::Unreadable),
    }
}

fn whole(text: &str) -> Option<u32> {
    if text.is_empty() || text.len() > 4 || !text.bytes().all(|byte| byte.is_ascii_digit()) {
        return None;
    }
    text.parse().ok()
}

fn month_by_name(text: &str) -> Option<u32> {
    let lower = text.to_lowercase();
    MONTHS.iter().find(|(start, _)| lower.starts_with(start)).map(|(_, month)| *month)
}

/// The text before a time of day, if that time is midnight or there is none.
fn without_midnight(text: &str) -> Result<&str, DateFault> {
    let Some(colon) = text.find(':') else { return Ok(text) };
    let Some(gap) = text[..colon].rfind([' ', 'T']) else { return Err(DateFault::Unreadable) };
    let time = &text[gap + 1..];
    let midnight = time.chars().all(|letter| matches!(letter, '0' | ':' | '.' | 'Z'));
    if midnight { Ok(text[..gap].trim_end()) } else { Err(DateFault::TimeOfDay) }
}

#[cfg(test)]
mod tests {
    use super::*;
    use DateOrder::*;

    fn day(text: &str) -> NaiveDate {
        text.parse().unwrap()
    }

    #[test]
    fn dates_in_every_usual_dress() {
        for (text, order) in [
            ("2004-05-31", YearMonthDay),
            ("2004/5/31", YearMonthDay),
            ("2004.05.31", YearMonthDay),
            ("20040531", YearMonthDay),
            ("2004-05-31T00:00:00Z", YearMonthDay),
            ("2004-05-31 00:00", YearMonthDay),
            ("2004 May 31", YearMonthDay),
            ("31/05/2004", DayMonthYear),
            ("31052004", DayMonthYear),
            ("31-may-2004", DayMonthYear),
            ("31 de mayo de 2004", DayMonthYear),
            ("05/31/2004", MonthDayYear),
            ("May 31, 2004", MonthDayYear),
            ("31-May-2004", MonthDayYear),
        ] {
            assert_eq!(parse_date(text, order), Ok(day("2004-05-31")), "{text}");
        }
        assert_eq!(parse_date("1 sept 2004", DayMonthYear), Ok(day("2004-09-01")));
        assert_eq!(parse_date("2 ENE 2004", DayMonthYear), Ok(day("2004-01-02")));
        assert_eq!(from_year_and_day("2004", "366"), Ok(day("2004-12-31")));
        assert_eq!(from_parts("2004", "2", "29"), Ok(day("2004-02-29")));
    }

    #[test]
    fn what_is_no_date_is_told_apart() {
        for (text, order, fault) in [
            ("2003-02-29", YearMonthDay, DateFault::NoSuchDay),
            ("2004-13-05", YearMonthDay, DateFault::NoSuchDay),
            ("2004-00-05", YearMonthDay, DateFault::NoSuchDay),
            ("13/05/2004", MonthDayYear, DateFault::NoSuchDay),
            ("05/13/04", MonthDayYear, DateFault::ShortYear),
            ("04-05-13", YearMonthDay, DateFault::ShortYear),
            ("3-May-04", DayMonthYear, DateFault::ShortYear),
            ("2004-05-13", DayMonthYear, DateFault::Unreadable),
            ("13/05/2004", YearMonthDay, DateFault::Unreadable),
            ("2004-05-13 07:00", YearMonthDay, DateFault::TimeOfDay),
            ("0204-05-13", YearMonthDay, DateFault::FarYear),
            ("", YearMonthDay, DateFault::Unreadable),
            ("2004-05", YearMonthDay, DateFault::Unreadable),
            ("2004-05-13-1", YearMonthDay, DateFault::Unreadable),
            ("2004-xyz-13", YearMonthDay, DateFault::Unreadable),
            ("12:30", YearMonthDay, DateFault::Unreadable),
        ] {
            assert_eq!(parse_date(text, order), Err(fault), "{text}");
        }
        assert_eq!(from_year_and_day("2003", "366"), Err(DateFault::NoSuchDay));
        assert_eq!(from_year_and_day("2003", "0"), Err(DateFault::NoSuchDay));
    }
}
