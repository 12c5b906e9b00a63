//! What `tell` says to people: what changed, in about a dozen lines, then canals by right.

use chrono::{Days, NaiveDate};

use super::canal_table;
use super::grid::{Column, Side, lay_out};
use super::means::{of_change, of_sign};
use super::runs::{Run, Told};
use super::summary_lines::{footer, heading};
use crate::signs::{Sign, SignKind};
use crate::words::{DateStyle, Quantity, System, Unit, Words};

/// The signs that tell most, in the order of the water's way.
const MOST_TELLING: [Sign; 10] = [
    Sign::SnowShare,
    Sign::SurveySwe,
    Sign::HalfVolumeDate,
    Sign::SpringVolume,
    Sign::PeakFlow,
    Sign::FillDate,
    Sign::Carryover,
    Sign::CropEvaporation,
    Sign::SupplyRatio,
    Sign::RiverMinimumDaysMet,
];
/// Letters of a name before it is broken.
const MOST_NAME: usize = 41;
/// Letters of a value or a change before it is broken.
const MOST_VALUE: usize = 16;
/// Letters of a heading before it is broken.
const MOST_HEADING: usize = 9;
/// Under this many of the larger metric unit of flow, the smaller one reads better.
const SMALLEST_IN_LARGE_UNIT: f64 = 0.1;

/// The whole answer.
pub(super) fn write(told: &Told, system: System, words: &Words) -> String {
    let mut text = heading(told, system, words);
    text.push('\n');
    text.push_str(&signs(told, system, words));
    if let Some(ranges) = &told.ranges {
        text.push('\n');
        text.push_str(&ranges.say(&MOST_TELLING, words));
    }
    if !told.place.valley.gates.is_empty() {
        text.push('\n');
        text.push_str(&canal_table::write(told, words));
    }
    text.push('\n');
    text.push_str(&footer(told, system, words));
    text
}

fn signs(told: &Told, system: System, words: &Words) -> String {
    let (heads, rows) = sign_rows(told, system, words);
    let column = |(index, heading): (usize, String)| {
        let (side, most) = if index == 0 { (Side::Left, MOST_NAME) } else { (Side::Right, MOST_VALUE) };
        Column { heading, side, most, heading_most: MOST_HEADING }
    };
    let columns: Vec<Column> = heads.into_iter().enumerate().map(column).collect();
    lay_out(&columns, &rows).replace('\u{202f}', " ")
}

/// Heads of the columns, and a row for each of the signs that tell most.
pub(in crate::commands) fn sign_rows(told: &Told, system: System, words: &Words) -> (Vec<String>, Vec<Vec<String>>) {
    let say = |id: &str| words.say(id, &[]);
    let years = &told.as_it_was.years;
    let over = match years.as_slice() {
        [only] => words.say("tell-over-one-year", &[("year", words.year(only.year.water_year).into())]),
        years => words.say("tell-mean-of-years", &[("n", years.len().into())]),
    };
    let mut heads = vec![over, say("tell-as-it-was")];
    if told.is_turned() {
        heads.push(say("tell-with-your-changes"));
        heads.push(say("tell-change"));
    }
    let mut rows = Vec::new();
    for sign in MOST_TELLING {
        rows.extend(row(told, sign, system, words));
        if sign == Sign::FillDate {
            rows.extend(years_that_fill(told, words));
        }
    }
    for row in &mut rows {
        row.truncate(heads.len());
    }
    (heads, rows)
}

/// Name, as it was, with the changes, change; `None` where the place has no such thing.
fn row(told: &Told, sign: Sign, system: System, words: &Words) -> Option<Vec<String>> {
    let name = words.say(&Words::key_id("sign", sign.key()), &[]);
    let [was, with] = [&told.as_it_was, &told.with_changes].map(|run| of_sign(run, sign).map(|spread| spread.mean));
    let change = of_change(told, |year| sign.of(year)).map(|spread| spread.mean);
    let missing = || words.style().missing.clone();
    match sign.kind() {
        SignKind::Date => {
            told.place
                .valley
                .reservoir
                .as_ref()
                .filter(|_| sign == Sign::FillDate)
                .map_or(was.or(with), |_| Some(0.0))?;
            let dates = [&told.as_it_was, &told.with_changes].map(|run| date(told, run, sign, words));
            let change = change.map_or_else(missing, |days| days_change(days, words));
            let [was, with] = dates;
            Some(vec![name, was, with, change])
        }
        SignKind::Share => {
            was.or(with)?;
            let percent = |share: Option<f64>| share.map_or_else(missing, |share| words.percent(share * 100.0, 0));
            Some(vec![name, percent(was), percent(with), change.map_or_else(missing, |share| points(share, words))])
        }
        SignKind::Days => {
            was.or(with)?;
            let days = |days: Option<f64>| days.map_or_else(missing, |days| words.number(days, 0));
            Some(vec![name, days(was), days(with), change.map_or_else(missing, |days| fewer_days(days, words))])
        }
        SignKind::Depth | SignKind::Volume | SignKind::Flow | SignKind::Day => {
            was.or(with)?;
            let unit = unit_of_row(sign, [was, with], system, words);
            let shown = |value: Option<f64>| value.map(|value| unit.convert(value));
            let scale = Rounding::for_values([shown(was), shown(with)]);
            let number = |value: Option<f64>| shown(value).map_or_else(missing, |value| scale.say(value, words));
            let name =
                words.say("tell-name-and-unit", &[("name", name.into()), ("unit", words.say(unit.id(), &[]).into())]);
            let change = shown(change).map_or_else(missing, |change| scale.say_change(change, words));
            Some(vec![name, number(was), number(with), change])
        }
    }
}

/// In how many of the years the reservoir fills; told where more than one year is shown.
fn years_that_fill(told: &Told, words: &Words) -> Option<Vec<String>> {
    told.place.valley.reservoir.as_ref()?;
    let years = told.as_it_was.years.len();
    if years < 2 {
        return None;
    }
    let filled = |run: &Run| run.years.iter().filter(|year| year.signs.fill_date.is_some()).count();
    let [was, with] = [&told.as_it_was, &told.with_changes].map(filled);
    let say = |filled: usize| words.say("tell-years-of", &[("k", filled.into()), ("n", years.into())]);
    let change = with as f64 - was as f64;
    let change = match change {
        0.0 => words.say("tell-no-change", &[]),
        ..0.0 => words.say("tell-years-fewer", &[("n", crate::words::Value::Number(-change, 0))]),
        _ => words.say("tell-years-more", &[("n", crate::words::Value::Number(change, 0))]),
    };
    Some(vec![words.say("tell-reservoir-fills", &[]), say(was), say(with), change])
}

/// The date of a sign: that of the one year shown, else the mean of the years that have one.
fn date(told: &Told, run: &Run, sign: Sign, words: &Words) -> String {
    let start_month = told.place.valley.water_year_start_month;
    let days = match run.years.as_slice() {
        [only] => sign.date_of(&only.signs).map(|day| day.date(start_month)),
        _ => of_sign(run, sign).map(|spread| mean_date(spread.mean, start_month)),
    };
    days.map_or_else(|| words.say("tell-never", &[]), |date| words.date(date, DateStyle::Short))
}

/// The date of a mean day of the water year, in a year without a leap day.
pub(in crate::commands) fn mean_date(day_of_water_year: f64, start_month: u8) -> NaiveDate {
    // Water years that start in March or later hold the February of the next year: 2001 has no leap day, nor has 2002.
    let year = if start_month > 2 { 2000 } else { 2001 };
    let first = NaiveDate::from_ymd_opt(year, u32::from(start_month), 1).unwrap_or_default();
    let later = libm::round(day_of_water_year - 1.0).clamp(0.0, 365.0) as u64;
    first.checked_add_days(Days::new(later)).unwrap_or(first)
}

/// A change of dates: "18 days sooner".
pub(super) fn days_change(days: f64, words: &Words) -> String {
    let whole = libm::round(days);
    if whole == 0.0 { words.say("tell-no-change", &[]) } else { words.days_change(whole as i32) }
}

/// A change of a count of days: "12 days fewer".
fn fewer_days(days: f64, words: &Words) -> String {
    let whole = libm::round(days);
    let count = || [("n", crate::words::Value::Number(whole.abs(), 0))];
    match whole {
        0.0 => words.say("tell-no-change", &[]),
        ..0.0 => words.say("tell-days-fewer", &count()),
        _ => words.say("tell-days-more", &count()),
    }
}

/// A change of a share, in parts of a hundred: "14 points less".
fn points(share: f64, words: &Words) -> String {
    let whole = libm::round(share * 100.0);
    let count = || [("n", crate::words::Value::Number(whole.abs(), 0))];
    match whole {
        0.0 => words.say("tell-no-change", &[]),
        ..0.0 => words.say("tell-points-less", &count()),
        _ => words.say("tell-points-more", &count()),
    }
}

/// One unit for the whole row, so that its numbers can be held against each other.
fn unit_of_row(sign: Sign, values: [Option<f64>; 2], system: System, words: &Words) -> Unit {
    let quantity = match sign.kind() {
        SignKind::Depth if sign == Sign::Precipitation => Quantity::Rain,
        SignKind::Depth => Quantity::SnowWater,
        SignKind::Flow => Quantity::Flow,
        _ => Quantity::StoredVolume,
    };
    let unit = words.unit_of(quantity, system);
    let most = values.into_iter().flatten().map(|value| unit.convert(value).abs()).fold(0.0, f64::max);
    let is_small = most > 0.0 && most < SMALLEST_IN_LARGE_UNIT;
    match unit {
        Unit::CubicMetresPerSecond if is_small => Unit::LitresPerSecond,
        Unit::CubicHectometres | Unit::Megalitres if is_small => Unit::CubicMetres,
        unit => unit,
    }
}

/// How the numbers of a row are rounded: about three figures of the largest, and never more than two decimals.
struct Rounding {
    step: f64,
    decimals: u8,
}

impl Rounding {
    fn for_values(values: [Option<f64>; 2]) -> Self {
        let most = values.into_iter().flatten().filter(|value| value.is_finite()).map(f64::abs).fold(0.0, f64::max);
        let mut step = 1.0;
        while most / step >= 1000.0 {
            step *= 10.0;
        }
        let decimals = if most >= 100.0 {
            0
        } else if most >= 1.0 || most == 0.0 {
            1
        } else {
            2
        };
        Self { step, decimals }
    }

    fn round(&self, value: f64) -> f64 {
        if self.step > 1.0 { libm::round(value / self.step) * self.step } else { value }
    }

    fn say(&self, value: f64, words: &Words) -> String {
        words.number(self.round(value), self.decimals)
    }

    fn say_change(&self, change: f64, words: &Words) -> String {
        let amount = self.say(change.abs(), words);
        if amount.chars().all(|letter| !letter.is_ascii_digit() || letter == '0') {
            return words.say("tell-no-change", &[]);
        }
        let id = if change < 0.0 { "amount-less" } else { "amount-more" };
        words.say(id, &[("amount", amount.into())])
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_mean_day_becomes_a_date_of_the_water_year() {
        let date = |day, month| mean_date(day, month).format("%m-%d").to_string();
        assert_eq!(date(1.0, 10), "10-01");
        assert_eq!(date(151.4, 10), "02-28");
        assert_eq!(date(152.0, 10), "03-01");
        assert_eq!(date(60.0, 1), "03-01");
        assert_eq!(date(29.0, 2), "03-01");
        assert_eq!(date(365.0, 4), "03-31");
    }

    #[test]
    fn numbers_of_a_row_are_rounded_alike() {
        let (words, _) = Words::new("en");
        let rounding = Rounding::for_values([Some(12_345.0), Some(987.0)]);
        assert_eq!((rounding.say(12_345.0, &words), rounding.say(987.0, &words)), ("12,300".into(), "1,000".into()));
        assert_eq!(rounding.say_change(-11_358.0, &words), "11,400 less");
        assert_eq!(rounding.say_change(-20.0, &words), "no change");
        assert_eq!(Rounding::for_values([Some(0.345), None]).say(0.345, &words), "0.35");
        assert_eq!(Rounding::for_values([Some(f64::NAN), None]).say(f64::NAN, &words), words.style().missing);
        assert_eq!(Rounding::for_values([Some(f64::MAX), None]).decimals, 0);
    }
}
