//! A canal's year as a strip: full, short or cut, day by day, judged as the signs judge it.

use crate::signs::{CUT_SHARE, FULL_SHARE};
use crate::water::works::Evening;

/// How much of a day's demand came.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Supply {
    /// At least 99.5 %.
    Full,
    /// Less than that, and at least 5 %.
    Short,
    /// Less than 5 %.
    Cut,
}

/// Writes the strip of one gate. Under rotation all days of a round of turns get one verdict.
#[derive(Clone, Debug)]
pub(super) struct Strip {
    gate: usize,
    /// A field that got nothing asks again tomorrow; a town does not.
    asks_again: bool,
    days: Vec<Option<Supply>>,
    /// First day that has no verdict yet.
    open_from: usize,
    delivered_m3: f64,
    delivered_before_today_m3: f64,
    asked_m3: f64,
    asked_today_m3: f64,
}

impl Strip {
    pub(super) fn new(gate: usize, is_town: bool) -> Self {
        Self {
            gate,
            asks_again: !is_town,
            days: Vec::with_capacity(366),
            open_from: 0,
            delivered_m3: 0.0,
            delivered_before_today_m3: 0.0,
            asked_m3: 0.0,
            asked_today_m3: 0.0,
        }
    }

    pub(super) fn day(&mut self, evening: &Evening) {
        let (demand_m3, delivered_m3) = (evening.demand_m3[self.gate], evening.river.canal_m3[self.gate]);
        let by_turns = evening.cycle_days > 0;
        if !by_turns || evening.rotation_day.is_multiple_of(evening.cycle_days) {
            self.judge(by_turns);
        }
        // The verdict comes when the span ends.
        self.days.push((demand_m3 > 0.0).then_some(Supply::Short));
        if demand_m3 > 0.0 {
            self.delivered_before_today_m3 = self.delivered_m3;
            self.delivered_m3 += delivered_m3;
            self.asked_m3 += demand_m3;
            self.asked_today_m3 = demand_m3;
        }
        if !by_turns {
            self.judge(false);
        }
    }

    fn judge(&mut self, by_turns: bool) {
        let due_m3 = if by_turns && self.asks_again {
            self.delivered_before_today_m3 + self.asked_today_m3
        } else {
            self.asked_m3
        };
        // Compared as the signs compare it, so that no day can be judged otherwise here than there.
        let verdict = if self.delivered_m3 >= FULL_SHARE * due_m3 {
            Supply::Full
        } else if self.delivered_m3 < CUT_SHARE * due_m3 {
            Supply::Cut
        } else {
            Supply::Short
        };
        self.days[self.open_from..].iter_mut().flatten().for_each(|supply| *supply = verdict);
        self.open_from = self.days.len();
        (self.delivered_m3, self.delivered_before_today_m3) = (0.0, 0.0);
        (self.asked_m3, self.asked_today_m3) = (0.0, 0.0);
    }

    /// The whole strip; a round of turns that the year cuts off is judged as it stands.
    pub(super) fn close(mut self) -> Vec<Option<Supply>> {
        self.judge(true);
        self.days
    }
}
