//! When a board is left alone, and when it is night.

use crate::place::problem::Problem;
use crate::place::section::{Limits, Section};

use super::units::SECONDS;

/// How long nobody must touch it, s.
const IDLE_S: Limits = Limits(10.0, 3_600.0);
const USUAL_IDLE_S: f64 = 120.0;

/// When it counts as left alone.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Idle {
    /// So long after the last touch, s.
    pub after_s: u32,
}

/// A minute of the day, on the clock of the wall.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct TimeOfDay {
    /// Minutes after midnight, 0 to 1439.
    pub minute: u16,
}

impl TimeOfDay {
    /// Reads hours and minutes of a day of 24 hours: `07:30`.
    pub fn read(text: &str) -> Option<Self> {
        let (hour, minute) = text.trim().split_once(':')?;
        let number = |text: &str, most: u16| {
            let digits = matches!(text.len(), 1 | 2) && text.bytes().all(|byte| byte.is_ascii_digit());
            digits.then(|| text.parse::<u16>().ok()).flatten().filter(|number| *number <= most)
        };
        if minute.len() != 2 {
            return None;
        }
        Some(Self { minute: number(hour, 23)? * 60 + number(minute, 59)? })
    }
}

/// The dark part of the day. Whoever dims by it first makes sure that the clock can be believed.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Night {
    /// When it begins.
    pub from: TimeOfDay,
    /// When it ends; before `from` where it runs over midnight.
    pub to: TimeOfDay,
    /// What the screens do then.
    pub light: NightLight,
}

impl Night {
    /// Whether a minute of the day belongs to it; its first does, its last does not.
    pub fn holds(self, now: TimeOfDay) -> bool {
        if self.from <= self.to { self.from <= now && now < self.to } else { now >= self.from || now < self.to }
    }
}

/// What screens do at night.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum NightLight {
    /// They are dimmed where their backlight can be; others stay as they are.
    #[default]
    Dim,
    /// They are put out.
    Off,
}

pub(super) fn idle(section: &Section<'_>) -> Idle {
    let after = section.number_or("after", SECONDS, IDLE_S, USUAL_IDLE_S).value;
    // Errors are NaN, told already, and become 0.
    Idle { after_s: after as u32 }
}

pub(super) fn night(section: &Section<'_>) -> Option<Night> {
    let time = |key| {
        let (text, at) = section.need_text(key)?;
        let time = TimeOfDay::read(text);
        if time.is_none() {
            section.sheet.tell(Problem::error(at.clone(), "problem-board-time").with("key", key).with("value", text));
        }
        time.map(|time| (time, at))
    };
    let (from, to) = (time("from"), time("to"));
    let lights = [("dim", NightLight::Dim), ("off", NightLight::Off)];
    let light = section.choice("light", &lights).map_or_else(NightLight::default, |(light, _)| light);
    let ((from, _), (to, at)) = (from?, to?);
    if from == to {
        section.sheet.tell(Problem::error(at, "problem-board-night-empty"));
    }
    Some(Night { from, to, light })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn times_of_day_are_read_strictly() {
        for (text, minute) in [("00:00", 0), ("7:05", 425), (" 23:59 ", 1439)] {
            assert_eq!(TimeOfDay::read(text), Some(TimeOfDay { minute }));
        }
        for wrong in ["24:00", "7:5", "7", "07:60", "-1:00", "+7:00", "7:00 pm", ":", ""] {
            assert_eq!(TimeOfDay::read(wrong), None, "{wrong}");
        }
    }

    #[test]
    fn a_night_runs_over_midnight() {
        let time = |text| TimeOfDay::read(text).unwrap();
        let night = Night { from: time("21:30"), to: time("06:00"), light: NightLight::Dim };
        let dark: Vec<bool> = ["21:29", "21:30", "00:00", "05:59", "06:00"].map(|text| night.holds(time(text))).into();
        assert_eq!(dark, [false, true, true, true, false]);
        let nap = Night { from: time("13:00"), to: time("14:00"), light: NightLight::Off };
        assert!(nap.holds(time("13:59")) && !nap.holds(time("14:00")) && !nap.holds(time("01:00")));
    }
}
