//! One canal's year: what it asked for, what it got, and on which days it was full, short or cut.

use crate::water::calendar::CalendarDay;
use crate::water::units::M3_PER_HM3;
use crate::water::works::Evening;

/// A day is full from this share of its demand on.
pub const FULL_SHARE: f64 = 0.995;
/// Less than this is rounding, not water.
const ANY_WATER_M3: f64 = 1e-3;
/// A day is cut below this share of its demand.
pub const CUT_SHARE: f64 = 0.05;

/// What is read off a canal's year.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct CanalSigns {
    /// Asked for at the head gate, hm³.
    pub demand_hm3: f64,
    /// Delivered at the head gate, hm³.
    pub delivered_hm3: f64,
    /// Delivered over demanded; `None` without demand.
    pub supply_ratio: Option<f64>,
    /// Days on which at least 99.5 % of the demand came.
    pub days_full: u16,
    /// Days on which less than 5 % came.
    pub days_cut: u16,
    /// Days in between.
    pub days_short: u16,
    /// First day that was not full.
    pub first_short_date: Option<CalendarDay>,
    /// Last day that was full.
    pub last_full_date: Option<CalendarDay>,
    /// Last day on which any water came.
    pub last_water_date: Option<CalendarDay>,
    /// Stored water let go for the canal, hm³.
    pub stored_draw_hm3: f64,
    /// Left in the canal's account on the last day, hm³.
    pub account_end_hm3: f64,
}

/// A span of days that is judged as one: a day, or under rotation a round of turns.
#[derive(Clone, Copy, Debug, Default)]
struct Span {
    delivered_m3: f64,
    delivered_before_today_m3: f64,
    asked_m3: f64,
    asked_today_m3: f64,
    days: u16,
    first: Option<CalendarDay>,
    last: Option<CalendarDay>,
}

/// Reads one canal day by day.
#[derive(Clone, Copy, Debug)]
pub(super) struct CanalReader {
    gate: usize,
    /// A field that got nothing asks again tomorrow; a town does not.
    asks_again: bool,
    demand_m3: f64,
    delivered_m3: f64,
    stored_m3: f64,
    account_m3: f64,
    span: Span,
    signs: CanalSigns,
}

impl CanalReader {
    pub(super) fn new(gate: usize, is_town: bool) -> Self {
        Self {
            gate,
            asks_again: !is_town,
            demand_m3: 0.0,
            delivered_m3: 0.0,
            stored_m3: 0.0,
            account_m3: 0.0,
            span: Span::default(),
            signs: CanalSigns::default(),
        }
    }

    /// Forgets what was read.
    pub(super) fn start_over(&mut self) {
        *self = Self::new(self.gate, !self.asks_again);
    }

    pub(super) fn day(&mut self, evening: &Evening, account_m3: f64) {
        let (demand_m3, delivered_m3) = (evening.demand_m3[self.gate], evening.river.canal_m3[self.gate]);
        self.stored_m3 += evening.river.stored_take_m3[self.gate];
        self.account_m3 = account_m3;
        if delivered_m3 > ANY_WATER_M3 {
            self.signs.last_water_date = Some(evening.today);
        }
        let by_turns = evening.cycle_days > 0;
        if !by_turns {
            // A span of a day needs no store to go through.
            if demand_m3 > 0.0 {
                self.judge(demand_m3, delivered_m3, 1, evening.today, evening.today);
            }
            return;
        }
        if evening.rotation_day.is_multiple_of(evening.cycle_days) {
            self.judge_round();
        }
        if demand_m3 > 0.0 {
            let span = &mut self.span;
            span.delivered_before_today_m3 = span.delivered_m3;
            span.delivered_m3 += delivered_m3;
            span.asked_m3 += demand_m3;
            span.asked_today_m3 = demand_m3;
            span.days += 1;
            span.first = span.first.or(Some(evening.today));
            span.last = Some(evening.today);
        }
    }

    /// Judges the round of turns that ends here. A field's demand of a later day holds what the earlier days left unmet, so
    /// that what was due is what came before the last day and what was asked on it.
    fn judge_round(&mut self) {
        let span = core::mem::take(&mut self.span);
        let (Some(first), Some(last)) = (span.first, span.last) else { return };
        let due_m3 = if self.asks_again { span.delivered_before_today_m3 + span.asked_today_m3 } else { span.asked_m3 };
        self.judge(due_m3, span.delivered_m3, span.days, first, last);
    }

    /// Judges a span of `days`, of which `first` and `last` had a demand.
    #[inline(always)]
    fn judge(&mut self, due_m3: f64, delivered_m3: f64, days: u16, first: CalendarDay, last: CalendarDay) {
        self.demand_m3 += due_m3;
        self.delivered_m3 += delivered_m3;
        let signs = &mut self.signs;
        if delivered_m3 >= FULL_SHARE * due_m3 {
            signs.days_full += days;
            signs.last_full_date = Some(last);
        } else {
            signs.first_short_date = signs.first_short_date.or(Some(first));
            if delivered_m3 < CUT_SHARE * due_m3 {
                signs.days_cut += days;
            } else {
                signs.days_short += days;
            }
        }
    }

    pub(super) fn close(&self) -> CanalSigns {
        let mut whole = *self;
        whole.judge_round();
        whole.signs()
    }

    fn signs(&self) -> CanalSigns {
        let ratio = (self.demand_m3 > 0.0).then(|| self.delivered_m3 / self.demand_m3);
        CanalSigns {
            demand_hm3: self.demand_m3 / M3_PER_HM3,
            delivered_hm3: self.delivered_m3 / M3_PER_HM3,
            supply_ratio: ratio,
            stored_draw_hm3: self.stored_m3 / M3_PER_HM3,
            account_end_hm3: self.account_m3 / M3_PER_HM3,
            ..self.signs
        }
    }
}
