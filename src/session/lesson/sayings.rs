//! What a guess is about, and its values, in the reader's words.

use chrono::{Datelike, Days, NaiveDate};

use super::course::Course;
use crate::lesson::{Guess, Measure, Quantity, Reading, Shape};
use crate::signs::Sign;
use crate::words::{DateStyle, Quantity as Written, System, Unit, Value, Words};

/// Most marks along an axis.
const MOST_TICKS: f64 = 9.0;

/// A guess's words in one language.
#[derive(Clone, Copy)]
pub(super) struct Sayings<'a> {
    pub course: &'a Course,
    /// The step, counted from 0.
    pub step: usize,
    pub guess: &'a Guess,
    pub system: System,
    pub words: &'a Words,
}

impl Sayings<'_> {
    fn reading(&self) -> &Reading {
        &self.guess.reading
    }

    /// What is guessed, and its unit.
    pub fn title(&self) -> String {
        let words = self.words;
        let (message, canal) = match self.reading().measure {
            Measure::Sign(sign) => (Words::key_id("sign", sign.key()), None),
            Measure::Canal(gate, sign) => (Words::key_id("sign-canal", sign.key()), Some(gate)),
            Measure::Lesson(sign) => (Words::key_id("lesson", sign.key()), None),
            Measure::CanalYearsEnough(gate) => ("lesson-years-enough".to_owned(), Some(gate)),
        };
        let sign = words.say(&message, &[]);
        let what = match canal {
            Some(gate) => {
                let canal = self.gate(gate);
                words.say("lesson-of-canal", &[("canal", canal.into()), ("sign", sign.into())])
            }
            None => sign,
        };
        match (self.reading().shape, self.unit()) {
            (Shape::Change, Some(unit)) => {
                words.say("lesson-axis-change", &[("what", what.into()), ("unit", unit.into())])
            }
            (Shape::Value, Some(unit)) => words.say("lesson-axis", &[("what", what.into()), ("unit", unit.into())]),
            (Shape::Change, None) => words.say("lesson-axis-change-only", &[("what", what.into())]),
            (Shape::Value, None) => what,
        }
    }

    /// The unit along the axis; dates and canals say it themselves.
    fn unit(&self) -> Option<String> {
        let words = self.words;
        Some(match self.reading().quantity() {
            Quantity::Date => return None,
            Quantity::Canal => words.say("lesson-unit-rights", &[]),
            Quantity::Share => words.say("lesson-unit-parts", &[]),
            Quantity::Days => words.say("lesson-unit-days", &[]),
            Quantity::Years => words.say("lesson-unit-years", &[]),
            quantity => words.unit(self.written(quantity), self.system),
        })
    }

    fn written(&self, quantity: Quantity) -> Written {
        match (quantity, self.reading().measure) {
            (Quantity::Flow, _) => Written::Flow,
            (Quantity::Depth, Measure::Sign(Sign::Precipitation)) => Written::Rain,
            (Quantity::Depth, _) => Written::SnowWater,
            _ => Written::StoredVolume,
        }
    }

    fn gate(&self, gate: usize) -> &str {
        self.course.gates.get(gate).map_or("", |name| name.get(self.words.tag()))
    }

    /// The gate at a place in the order of rights, counted from 1.
    fn gate_by_right(&self, place: f64) -> &str {
        let place = (libm::round(place).max(1.0) as usize) - 1;
        self.course.by_right.get(place).map_or("", |gate| self.gate(*gate))
    }

    fn date(&self, day: f64) -> NaiveDate {
        let first = self.course.first_days.get(self.step).copied().unwrap_or_default();
        first.checked_add_days(Days::new(libm::round(day).clamp(1.0, 366.0) as u64 - 1)).unwrap_or(first)
    }

    /// A value in full: "35 days sooner", "60 of each 100 parts".
    pub fn value(&self, value: f64) -> String {
        let words = self.words;
        let is_change = self.reading().shape == Shape::Change;
        let count = |value: f64| ("n", Value::Number(value.abs(), 0));
        let more = |less: &str, more: &str, value: f64| {
            let whole = libm::round(value);
            match whole {
                0.0 => words.say("lesson-no-change", &[]),
                ..0.0 => words.say(less, &[count(whole)]),
                _ => words.say(more, &[count(whole)]),
            }
        };
        match self.reading().quantity() {
            Quantity::Date => words.date(self.date(value), DateStyle::Short),
            Quantity::Canal => self.gate_by_right(value).to_owned(),
            Quantity::Days if is_change && self.reading().measure.quantity() == Quantity::Date => {
                match libm::round(value) as i32 {
                    0 => words.say("lesson-same-day", &[]),
                    days => words.days_change(days),
                }
            }
            Quantity::Days if is_change => more("lesson-days-fewer", "lesson-days-more", value),
            Quantity::Days => words.say("days-count", &[count(libm::round(value))]),
            Quantity::Years if is_change => more("lesson-years-fewer", "lesson-years-more", value),
            Quantity::Years => words.say("years-count", &[count(libm::round(value))]),
            Quantity::Share if is_change => more("lesson-parts-fewer", "lesson-parts-more", value * 100.0),
            Quantity::Share => words.say("lesson-parts", &[count(libm::round(value * 100.0))]),
            _ if is_change && value == 0.0 => words.say("lesson-no-change", &[]),
            quantity if is_change => words.amount_change(value, self.written(quantity), self.system, 2),
            quantity => words.quantity(value, self.written(quantity), self.system, 2),
        }
    }

    /// The same within a sentence: "el 30 jun".
    pub fn in_sentence(&self, value: f64) -> String {
        match self.reading().quantity() {
            Quantity::Date => self.words.date(self.date(value), DateStyle::InSentence),
            _ => self.value(value),
        }
    }

    /// Marks along the axis, in the unit that is read: the value and what stands beside it.
    pub fn ticks(&self) -> Vec<(f64, String)> {
        let (least, most) = (self.guess.least, self.guess.most());
        let (words, is_change) = (self.words, self.reading().shape == Shape::Change);
        match self.reading().quantity() {
            Quantity::Date => self.month_ticks(least, most),
            Quantity::Canal => {
                let count = self.course.by_right.len() as f64;
                let places = (0..self.guess.stops).filter_map(|stop| self.guess.value(stop));
                places.filter(|place| *place <= count).map(|place| (place, words.number(place, 0))).collect()
            }
            quantity => {
                // Round numbers in the unit that people read are seldom round in the one that is computed.
                let one = self.shown_per_unit(quantity);
                let (low, high) = (least * one, most * one);
                let step = round_step((high - low) / MOST_TICKS);
                let decimals = decimals_of(step);
                let (first, last) = (libm::ceil(low / step - 1e-9) as i64, libm::floor(high / step + 1e-9) as i64);
                let label = |shown: f64| match is_change {
                    true => words.number_signed(shown, decimals),
                    false => words.number(shown, decimals),
                };
                (first..=last).map(|tick| tick as f64 * step).map(|shown| (shown / one, label(shown + 0.0))).collect()
            }
        }
    }

    fn month_ticks(&self, least: f64, most: f64) -> Vec<(f64, String)> {
        let days = libm::round(least) as i64..=libm::round(most) as i64;
        let days = days.map(|day| (day as f64, self.date(day as f64)));
        let label = |date: NaiveDate| self.words.date(date, DateStyle::Short);
        days.filter(|(_, date)| date.day() == 1).map(|(day, date)| (day, label(date))).collect()
    }

    /// How many of the unit that is read make one of the unit that is computed.
    fn shown_per_unit(&self, quantity: Quantity) -> f64 {
        let unit: Unit = match quantity {
            Quantity::Share => return 100.0,
            Quantity::Days | Quantity::Years | Quantity::Date | Quantity::Canal => return 1.0,
            quantity => self.words.unit_of(self.written(quantity), self.system),
        };
        unit.convert(1.0)
    }
}

/// Degrees of warming in a lesson's text, which is written in Celsius, in the reader's units: "2 °C" as "3.6 °F".
pub(super) fn in_units(text: &str, system: System, words: &Words) -> String {
    if system == System::Metric {
        return text.to_owned();
    }
    let mut said = String::with_capacity(text.len());
    let mut rest = text;
    while let Some(at) = rest.find("°C") {
        let before = &rest[..at];
        let number = before.trim_end_matches([' ', '\u{A0}', '\u{202F}']);
        let digits = number.len() - number.trim_end_matches(|c: char| c.is_ascii_digit()).len();
        let (kept, digits) = number.split_at(number.len() - digits);
        match digits.parse::<f64>() {
            Ok(degrees) => {
                said.push_str(kept);
                said.push_str(&words.quantity(degrees, Written::TemperatureChange, system, 2));
            }
            Err(_) => said.push_str(&rest[..at + "°C".len()]),
        }
        rest = &rest[at + "°C".len()..];
    }
    said.push_str(rest);
    said
}

/// 1, 2 or 5 times a power of ten, at least as far as `least`.
fn round_step(least: f64) -> f64 {
    let power = libm::pow(10.0, libm::floor(libm::log10(least.max(1e-9))));
    [1.0, 2.0, 5.0, 10.0].into_iter().map(|times| times * power).find(|step| *step >= least).unwrap_or(10.0 * power)
}

fn decimals_of(step: f64) -> u8 {
    (0..4).find(|decimals| step * libm::pow(10.0, f64::from(*decimals)) >= 0.999).unwrap_or(4)
}
