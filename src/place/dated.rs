//! Months, days that come round every year, seasons and the dates of rights, as a place file writes them.

use chrono::{Datelike, NaiveDate};

use super::problem::{Location, Problem};
use super::section::Section;
use super::tree::{Kind, Value};
use crate::water::calendar::{MonthDay, Season};
use crate::water::canals::PriorityDate;

const MONTHS: [(&str, &str); 12] = [
    ("january", "enero"),
    ("february", "febrero"),
    ("march", "marzo"),
    ("april", "abril"),
    ("may", "mayo"),
    ("june", "junio"),
    ("july", "julio"),
    ("august", "agosto"),
    ("september", "septiembre"),
    ("october", "octubre"),
    ("november", "noviembre"),
    ("december", "diciembre"),
];

/// First and last year that a right may bear.
const RIGHT_YEARS: std::ops::RangeInclusive<i32> = 1500..=2200;

/// A month by its number, or by its name in English or Spanish.
pub(super) fn month(section: &Section<'_>, key: &str, value: &Value) -> Option<u8> {
    let at = section.value_at(value);
    let written = match &value.kind {
        Kind::Number(number) if (1.0..=12.0).contains(number) && *number % 1.0 == 0.0 => return Some(*number as u8),
        Kind::Number(number) => number.to_string(),
        Kind::Text(text) => {
            let name = text.trim().to_lowercase();
            let known = |(english, spanish): &(&str, &str)| *english == name || *spanish == name;
            if let Some(index) = MONTHS.iter().position(known) {
                return Some(index as u8 + 1);
            }
            text.clone()
        }
        _ => String::new(),
    };
    let names = MONTHS.iter().flat_map(|(english, spanish)| [*english, *spanish]);
    section.sheet.tell(
        Problem::error(at, "problem-month")
            .with("key", key)
            .with_nearest(&written.to_lowercase(), names)
            .with("value", written),
    );
    None
}

/// A day of every year, written `"04-15"` for 15 April.
pub(crate) fn month_day(section: &Section<'_>, key: &str, value: &Value) -> Option<MonthDay> {
    let at = section.value_at(value);
    let Kind::Text(text) = &value.kind else {
        section.sheet.tell(Problem::error(at, "problem-month-day").with("key", key).with("value", ""));
        return None;
    };
    let parts = text.trim().split_once('-').map(|(month, day)| (small_number(month), small_number(day)));
    let Some((Some(month), Some(day))) = parts else {
        section.sheet.tell(Problem::error(at, "problem-month-day").with("key", key).with("value", text.clone()));
        return None;
    };
    let found = MonthDay::new(month, day);
    if found.is_none() {
        let problem = match MonthDay::new(day, month) {
            Some(_) => Problem::error(at, "problem-month-day-swapped").with("right", format!("{day:02}-{month:02}")),
            None => Problem::error(at, "problem-day-impossible"),
        };
        section.sheet.tell(problem.with("key", key).with("value", text.clone()));
    }
    found
}

fn small_number(text: &str) -> Option<u8> {
    (matches!(text.len(), 1 | 2) && text.bytes().all(|byte| byte.is_ascii_digit())).then(|| text.parse().ok())?
}

/// A day of every year under `key`, or the usual one where the file does not say it.
pub(super) fn month_day_or(section: &Section<'_>, key: &'static str, usual: MonthDay) -> MonthDay {
    section.get(key).and_then(|value| month_day(section, key, value)).unwrap_or(usual)
}

/// The days between two keys, with the place of the later one; `None` where the file gives neither.
pub(super) fn season(section: &Section<'_>, from: &'static str, to: &'static str) -> Option<(Season, Location)> {
    let (first, last) = (section.get(from), section.get(to));
    match (first, last) {
        (None, None) => None,
        (Some(_), None) => {
            section.tell_missing(to);
            None
        }
        (None, Some(_)) => {
            section.tell_missing(from);
            None
        }
        (Some(first), Some(last)) => {
            let (from_day, to_day) = (month_day(section, from, first), month_day(section, to, last));
            Some((Season { from: from_day?, to: to_day? }, section.value_at(last)))
        }
    }
}

/// The date of a right: a year, a date, or `"before_all"`.
pub(super) fn priority(section: &Section<'_>, key: &'static str) -> Option<(PriorityDate, Location)> {
    let value = section.get(key)?;
    let at = section.value_at(value);
    let read = match &value.kind {
        Kind::Number(year) => whole_year(*year),
        Kind::Date(date) => priority_on(*date),
        Kind::Text(text) => priority_from_text(text),
        _ => None,
    };
    if read.is_none() {
        section.sheet.tell(Problem::error(at.clone(), "problem-right-date").with("key", key));
    }
    read.map(|right| (right, at))
}

/// The date of a right as a cell of a table has it.
pub(super) fn priority_from_text(text: &str) -> Option<PriorityDate> {
    let text = text.trim();
    if text == "before_all" {
        return Some(PriorityDate::BeforeAll);
    }
    if let Ok(year) = text.parse::<u16>() {
        return whole_year(year.into());
    }
    NaiveDate::parse_from_str(text, "%Y-%m-%d").ok().and_then(priority_on)
}

fn whole_year(year: f64) -> Option<PriorityDate> {
    let inside = year % 1.0 == 0.0 && RIGHT_YEARS.contains(&(year as i32));
    inside.then_some(PriorityDate::On { year: year as i32, month: 1, day: 1 })
}

fn priority_on(date: NaiveDate) -> Option<PriorityDate> {
    RIGHT_YEARS.contains(&date.year()).then_some(PriorityDate::On {
        year: date.year(),
        month: date.month() as u8,
        day: date.day() as u8,
    })
}

/// How many days a season has, round New Year where it runs over it.
pub(super) fn season_days(season: Season) -> u16 {
    let (from, to) = (season.from.leap_day_of_year(), season.to.leap_day_of_year());
    if from <= to { to - from + 1 } else { 366 - from + to + 1 }
}
