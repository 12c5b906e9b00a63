//! What the staff may set.

use serde::{Deserialize, Serialize};

/// Minutes of a day.
pub const DAY_MINUTES: u16 = 1440;
/// One step of a time of day, minutes.
pub(super) const TIME_STEP: u16 = 15;
/// One step of the backlight, percent.
pub(super) const LIGHT_STEP: u8 = 10;
/// Least backlight that can be set, percent: less could not be read, and not be set back.
pub const LEAST_LIGHT: u8 = 20;

/// When it is night.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct Night {
    /// Whether the screen dims and sleeps at night.
    pub sleeps: bool,
    /// The minute of the day when night begins.
    pub from_minute: u16,
    /// The minute of the day when it ends.
    pub until_minute: u16,
}

impl Night {
    /// Whether a minute of the day is in the night; a night that ends when it begins is none.
    pub fn holds(self, minute: u16) -> bool {
        let Self { sleeps, from_minute: from, until_minute: until } = self;
        let inside = if from <= until { from <= minute && minute < until } else { minute < until || from <= minute };
        sleeps && inside
    }
}

/// What the staff wishes of the kiosk.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
#[serde(default)]
pub struct Wishes {
    /// The night.
    pub night: Night,
    /// How bright the screen is by day, percent.
    pub light_percent: u8,
    /// Fewer pictures a second and less light while strolling, for a battery.
    pub low_power: bool,
    /// Whether the message of the day is shown.
    pub message_shown: bool,
    /// The staff says that the clock is right though nothing stands behind it.
    pub clock_is_right: bool,
}

impl Default for Wishes {
    fn default() -> Self {
        Self {
            night: Night { sleeps: true, from_minute: 21 * 60, until_minute: 7 * 60 },
            light_percent: 100,
            low_power: false,
            message_shown: true,
            clock_is_right: false,
        }
    }
}

impl Wishes {
    /// With the usual value in place of any that cannot be set, as a file from elsewhere may hold.
    #[must_use]
    pub fn sound(mut self) -> Self {
        let usual = Self::default();
        if self.night.from_minute >= DAY_MINUTES || self.night.until_minute >= DAY_MINUTES {
            self.night = usual.night;
        }
        if !(LEAST_LIGHT..=100).contains(&self.light_percent) {
            self.light_percent = usual.light_percent;
        }
        self
    }
}

/// A time of day moved by steps, round the clock; one between two steps goes to the next step on its way.
pub(super) fn turned_time(minute: u16, steps: i32) -> u16 {
    let step = i64::from(TIME_STEP);
    let from = i64::from(minute);
    let from = if steps < 0 { (from + step - 1) / step } else { from / step };
    ((from + i64::from(steps)) * step).rem_euclid(i64::from(DAY_MINUTES)) as u16
}

/// The backlight moved by steps, within its ends.
pub(super) fn turned_light(percent: u8, steps: i32) -> u8 {
    let wanted = i64::from(percent) + i64::from(steps) * i64::from(LIGHT_STEP);
    wanted.clamp(LEAST_LIGHT.into(), 100) as u8
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn nights_go_over_midnight() {
        let night = Night { sleeps: true, from_minute: 1260, until_minute: 420 };
        assert!(night.holds(1260) && night.holds(0) && night.holds(419));
        assert!(!night.holds(420) && !night.holds(720) && !night.holds(1259));
        let siesta = Night { from_minute: 800, until_minute: 900, ..night };
        assert!(siesta.holds(800) && !siesta.holds(900) && !siesta.holds(0));
        assert!(!Night { until_minute: 1260, ..night }.holds(1260));
        assert!(!Night { sleeps: false, ..night }.holds(0));
    }

    #[test]
    fn times_go_round_and_light_stops() {
        assert_eq!((turned_time(0, -1), turned_time(1425, 1), turned_time(7, 1), turned_time(7, -1)), (1425, 0, 15, 0));
        assert_eq!(turned_time(0, i32::MAX) % TIME_STEP, 0);
        assert_eq!((turned_light(100, 1), turned_light(30, -5), turned_light(100, i32::MIN)), (100, 20, 20));
        let odd = Wishes {
            light_percent: 3,
            night: Night { from_minute: 2000, ..Wishes::default().night },
            ..Wishes::default()
        };
        assert_eq!(odd.sound(), Wishes::default());
    }
}
