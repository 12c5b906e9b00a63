//! Days out of the times that exchange formats write: ISO 8601 instants and counts since a moment.

use chrono::{Datelike, Days, NaiveDate};

use crate::water::units::SECONDS_PER_DAY;

/// Years in which a daily record can lie, as for CSV records.
const YEARS: std::ops::RangeInclusive<i32> = 1750..=2200;

/// An instant as written, without moving it to another zone: the day of a gauge is its local day.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Instant {
    /// The day that is written.
    pub date: NaiveDate,
    /// Seconds since its midnight, as written.
    pub second: f64,
}

/// Reads `2004-05-31`, `2004-05-31T07:00:00-06:00`, `2004-05-31 00:00:0.0 UTC`.
pub(super) fn parse_instant(text: &str) -> Option<Instant> {
    let text = text.trim();
    let mut parts = text.splitn(3, '-');
    let (year, month, rest) = (parts.next()?, parts.next()?, parts.next()?);
    let end = rest.find(|letter: char| !letter.is_ascii_digit()).unwrap_or(rest.len());
    let (day, clock) = rest.split_at(end);
    let number = |text: &str, most: usize| -> Option<u32> {
        let fine = !text.is_empty() && text.len() <= most && text.bytes().all(|byte| byte.is_ascii_digit());
        fine.then(|| text.parse().ok()).flatten()
    };
    let year = i32::try_from(number(year, 4)?).ok()?;
    let date = NaiveDate::from_ymd_opt(year, number(month, 2)?, number(day, 2)?)?;
    let clock = clock.trim_start();
    let clock = clock.strip_prefix(['T', 't']).unwrap_or(clock);
    Some(Instant { date, second: seconds_of(clock)? })
}

/// Seconds of `07:00:00.0-06:00`, `7`, or nothing at all; the zone is passed over.
fn seconds_of(clock: &str) -> Option<f64> {
    let end = clock.find(|letter: char| !(letter.is_ascii_digit() || letter == ':' || letter == '.'));
    let (time, zone) = clock.split_at(end.unwrap_or(clock.len()));
    let zone = zone.trim();
    let is_zone = zone.is_empty()
        || zone.starts_with(['Z', 'z', '+', '-'])
        || ["utc", "gmt"].iter().any(|name| zone.eq_ignore_ascii_case(name));
    if zone.len() > 12 || !is_zone {
        return None;
    }
    if time.is_empty() {
        return Some(0.0);
    }
    let mut seconds = 0.0;
    let mut parts = 0;
    for (part, scale) in time.split(':').zip([3_600.0, 60.0, 1.0]) {
        if part.is_empty() || part.len() > 12 {
            return None;
        }
        seconds += part.parse::<f64>().ok()? * scale;
        parts += 1;
    }
    let fine = time.split(':').count() == parts && (0.0..=SECONDS_PER_DAY).contains(&seconds);
    fine.then_some(seconds)
}

/// A scale of time such as `hours since 1950-01-01`.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Since {
    unit_s: f64,
    from: Instant,
}

/// Reads the units of a CF time axis; `None` for months and years, which have no one length, and for anything else.
pub(super) fn parse_since(units: &str) -> Option<Since> {
    let (unit, from) = units.trim().split_once(" since ")?;
    let unit_s = match unit.trim().to_ascii_lowercase().as_str() {
        "days" | "day" | "d" => SECONDS_PER_DAY,
        "hours" | "hour" | "hr" | "hrs" | "h" => 3_600.0,
        "minutes" | "minute" | "min" | "mins" => 60.0,
        "seconds" | "second" | "sec" | "secs" | "s" => 1.0,
        _ => return None,
    };
    Some(Since { unit_s, from: parse_instant(from)? })
}

impl Since {
    /// The day in which a count lies, and the seconds since its midnight; `None` far from any measured record.
    pub fn instant(&self, count: f64) -> Option<Instant> {
        let seconds = self.from.second + count * self.unit_s;
        // A thousandth of a second is the noise of a count in days.
        let day = libm::floor((seconds + 1e-3) / SECONDS_PER_DAY);
        if day.is_nan() || day.abs() > 1.0e7 {
            return None;
        }
        let (whole, past) = (day.abs() as u64, day < 0.0);
        let from = self.from.date;
        let date =
            if past { from.checked_sub_days(Days::new(whole)) } else { from.checked_add_days(Days::new(whole)) }?;
        YEARS.contains(&date.year()).then_some(Instant { date, second: (seconds - day * SECONDS_PER_DAY).max(0.0) })
    }
}

/// Whether a day can be that of a measured record.
pub(super) fn is_in_record_years(date: NaiveDate) -> bool {
    YEARS.contains(&date.year())
}

#[cfg(test)]
mod tests {
    use super::*;

    fn instant(text: &str) -> Option<(String, f64)> {
        parse_instant(text).map(|instant| (instant.date.to_string(), instant.second))
    }

    #[test]
    fn instants_keep_the_day_that_is_written() {
        for (text, second) in [
            ("2004-05-31", 0.0),
            ("2004-5-31", 0.0),
            ("2004-05-31T07:00:00-06:00", 25_200.0),
            ("2004-05-31T00:00:00.000Z", 0.0),
            ("2004-05-31 00:00:0.0 UTC", 0.0),
            ("2004-05-31 12", 43_200.0),
        ] {
            assert_eq!(instant(text), Some(("2004-05-31".into(), second)), "{text}");
        }
        for text in
            ["", "2004-05", "2004-02-30", "2004-05-31T25:00", "31/05/2004", "2004-05-31Tx:y", "-5-5-5", "20041-05-31"]
        {
            assert_eq!(instant(text), None, "{text}");
        }
    }

    #[test]
    fn counts_become_days() {
        let day = |units: &str, count: f64| {
            parse_since(units).and_then(|since| since.instant(count)).map(|instant| instant.date.to_string())
        };
        assert_eq!(day("days since 1950-01-01", 0.5).as_deref(), Some("1950-01-01"));
        assert_eq!(day("days since 1950-01-01 12:00", 0.5).as_deref(), Some("1950-01-02"));
        assert_eq!(day("hours since 2000-03-01 00:00:00", -24.0).as_deref(), Some("2000-02-29"));
        assert_eq!(day("seconds since 1970-01-01T00:00:00Z", 1.0e9).as_deref(), Some("2001-09-09"));
        assert_eq!(day("days since 2000-01-01", 0.999_999_999_99).as_deref(), Some("2000-01-02"));
        assert_eq!(day("months since 2000-01-01", 1.0), None);
        assert_eq!(day("days since 2000-01-01", f64::NAN), None);
        assert_eq!(day("days since 2000-01-01", 1.0e300), None);
        assert_eq!(day("days since 0001-01-01", 1.0), None);
    }
}
