//! Dates with the name of the month: an all-number date means another day to somebody in the room.

use chrono::{Datelike, Month, NaiveDate};

use super::say::Words;

/// How a date is written.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum DateStyle {
    /// "May 9", "9 May", "9 may": for labels and tables.
    Short,
    /// "May 9", "el 9 may": for short sentences.
    InSentence,
    /// "May 9", "el 9 de mayo": for sentences with room, without the year.
    InSentenceLong,
    /// "May 9, 2026", "9 de mayo de 2026".
    Long,
}

impl Words {
    /// A date in words.
    pub fn date(&self, date: NaiveDate, style: DateStyle) -> String {
        let month = month_of(date);
        let (id, month) = match style {
            DateStyle::Short => ("date-short", self.month_short(month)),
            DateStyle::InSentence => ("date-in-sentence", self.month_short(month)),
            DateStyle::InSentenceLong => ("date-in-sentence-long", self.month_name(month)),
            DateStyle::Long => ("date-long", self.month_name(month)),
        };
        let day = date.day().to_string();
        if style == DateStyle::Long {
            let year = self.year(date.year());
            return self.say(id, &[("day", day.into()), ("month", month.into()), ("year", year.into())]);
        }
        self.say(id, &[("day", day.into()), ("month", month.into())])
    }

    /// Two dates as a range for a sentence: "May 9 to 16", "entre el 9 y el 16 may". Years are not written.
    ///
    /// Within one month of one year the month is named once; a range of a single day is that day.
    pub fn date_range(&self, first: NaiveDate, last: NaiveDate) -> String {
        if first == last {
            return self.date(first, DateStyle::InSentence);
        }
        let (first, last) = if first <= last { (first, last) } else { (last, first) };
        let days = [("a", first.day().to_string().into()), ("b", last.day().to_string().into())];
        let [a, b] = days;
        let last_month = self.month_short(month_of(last)).into();
        if (first.year(), first.month()) == (last.year(), last.month()) {
            return self.say("date-range-in-month", &[a, b, ("month", last_month)]);
        }
        let first_month = self.month_short(month_of(first)).into();
        self.say("date-range", &[a, ("month_a", first_month), b, ("month_b", last_month)])
    }

    /// The full name of a month: "May", "mayo".
    pub fn month_name(&self, month: Month) -> String {
        self.say(month_id(month), &[])
    }

    /// The short name of a month: "May", "may".
    pub fn month_short(&self, month: Month) -> String {
        self.say(&format!("{}.short", month_id(month)), &[])
    }

    /// The letter of a month for the foot of a chart: "J", "E".
    pub fn month_letter(&self, month: Month) -> String {
        self.say(&format!("{}.letter", month_id(month)), &[])
    }
}

fn month_of(date: NaiveDate) -> Month {
    let number = u8::try_from(date.month()).unwrap_or(1);
    Month::try_from(number).unwrap_or(Month::January)
}

fn month_id(month: Month) -> &'static str {
    match month {
        Month::January => "month-1",
        Month::February => "month-2",
        Month::March => "month-3",
        Month::April => "month-4",
        Month::May => "month-5",
        Month::June => "month-6",
        Month::July => "month-7",
        Month::August => "month-8",
        Month::September => "month-9",
        Month::October => "month-10",
        Month::November => "month-11",
        Month::December => "month-12",
    }
}
