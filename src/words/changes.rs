//! Changes and doubt in plain words: "18 days sooner", "12% less", "between 18 and 25 days sooner".

use super::numbers::round_to;
use super::say::{Value, Words};
use super::units::{Quantity, System};

impl Words {
    /// A shift of a date in whole days; negative is sooner.
    pub fn days_change(&self, days: i32) -> String {
        let count = || Value::Number(f64::from(days).abs(), 0);
        match days {
            0 => self.say("days-same", &[]),
            ..0 => self.say("days-sooner", &[("n", count())]),
            _ => self.say("days-later", &[("n", count())]),
        }
    }

    /// A range of shifts in whole days, in any order; negative is sooner.
    pub fn days_range(&self, one_end: i32, other_end: i32) -> String {
        let (low, high) = (one_end.min(other_end), one_end.max(other_end));
        let size = |days: i32| Value::Number(f64::from(days).abs(), 0);
        if low == high {
            self.days_change(low)
        } else if high <= 0 {
            self.say("days-range-sooner", &[("a", size(high)), ("b", size(low))])
        } else if low >= 0 {
            self.say("days-range-later", &[("a", size(low)), ("b", size(high))])
        } else {
            self.say("days-range-across", &[("a", size(low)), ("b", size(high))])
        }
    }

    /// A relative change in percent (−18 is "18% less"), rounded to whole percent; a change that rounds to nothing is
    /// said as none.
    pub fn percent_change(&self, change_percent: f64) -> String {
        let whole = round_to(change_percent, 0);
        let size = self.percent(whole.abs(), 0);
        if whole == 0.0 {
            self.say("change-none", &[])
        } else if whole < 0.0 {
            self.say("amount-less", &[("amount", size.into())])
        } else {
            self.say("amount-more", &[("amount", size.into())])
        }
    }

    /// A range of relative changes in percent, in any order.
    pub fn percent_range(&self, one_end: f64, other_end: f64) -> String {
        let (low, high) = (round_to(one_end.min(other_end), 0), round_to(one_end.max(other_end), 0));
        if low == high {
            return self.percent_change(low);
        }
        let plain = |percent: f64| Value::Number(percent.abs(), 0);
        let marked = |percent: f64| Value::from(self.percent(percent.abs(), 0));
        if high <= 0.0 {
            self.say("percent-range-less", &[("a", plain(high)), ("b", marked(low))])
        } else if low >= 0.0 {
            self.say("percent-range-more", &[("a", plain(low)), ("b", marked(high))])
        } else {
            self.say("percent-range-across", &[("a", marked(low)), ("b", marked(high))])
        }
    }

    /// A change of a quantity ("12 hm³ less"); for temperatures use [`Quantity::TemperatureChange`].
    pub fn amount_change(&self, change: f64, quantity: Quantity, system: System, digits: u8) -> String {
        if change == 0.0 {
            return self.say("change-none", &[]);
        }
        let amount = self.quantity(change.abs(), quantity, system, digits);
        let id = if change < 0.0 { "amount-less" } else { "amount-more" };
        self.say(id, &[("amount", amount.into())])
    }

    /// How often it was enough, for a share from 0 to 1: "9 of 10 years".
    ///
    /// "10 of 10" is said only where it never failed, and "0 of 10" only where it always did: rounding must not hide
    /// the one bad year.
    pub fn of_ten_years(&self, share: f64) -> String {
        let rounded = round_to(share * 10.0, 0);
        let years = match rounded {
            10.0 if share < 1.0 => 9.0,
            0.0 if share > 0.0 => 1.0,
            rounded => rounded,
        };
        self.say("years-of-ten", &[("k", Value::Number(years, 0))])
    }

    /// A shortage as a share from 0 to 1: "18 of each 100 parts do not arrive".
    pub fn shortage(&self, share: f64) -> String {
        let parts = round_to(share * 100.0, 0);
        if parts == 0.0 {
            let id = if share > 0.0 { "shortage-under-one" } else { "shortage-none" };
            return self.say(id, &[]);
        }
        self.say("shortage-parts", &[("n", Value::Number(parts, 0))])
    }
}
