//! The reservoir as a vessel: how large the lake is at a content, and the rules by date that belong to it.

use heapless::Vec;

use super::calendar::MonthDay;
use super::units::{M2_PER_KM2, M3_PER_HM3};
use super::valley::{Hedging, LakePoint, MOST_LAKE_POINTS, MOST_RULE_POINTS, Reservoir};

/// Days on the circle of the year, 29 February always counted.
const CIRCLE_DAYS: usize = 366;

/// A volume and a surface, m³ and m².
#[derive(Clone, Copy, Debug, PartialEq)]
struct VesselPoint {
    volume_m3: f64,
    area_m2: f64,
    level_m: f64,
}

/// The point at `volume_hm3` on the straight line between two points, where it lies within.
fn between(below: &LakePoint, above: &LakePoint, volume_hm3: f64) -> Option<LakePoint> {
    if !(below.volume_hm3 < volume_hm3 && volume_hm3 < above.volume_hm3) {
        return None;
    }
    let along = (volume_hm3 - below.volume_hm3) / (above.volume_hm3 - below.volume_hm3);
    Some(LakePoint {
        level_m: below.level_m + along * (above.level_m - below.level_m),
        area_km2: below.area_km2 + along * (above.area_km2 - below.area_km2),
        volume_hm3,
    })
}

/// The level–area–volume table ready for look-ups.
#[derive(Clone, Debug, PartialEq)]
pub struct Vessel {
    points: Vec<VesselPoint, { MOST_LAKE_POINTS + 1 }>,
    /// Volume below the outlet, m³.
    pub dead_m3: f64,
    /// Volume between outlet and spillway, m³.
    pub active_m3: f64,
}

impl Vessel {
    /// The vessel of `reservoir` with its active volumes enlarged by `size_percent` at the same levels and areas; what
    /// lies below the outlet stays.
    pub fn new(reservoir: &Reservoir, size_percent: f64) -> Self {
        let factor = 1.0 + size_percent / 100.0;
        let enlarged_m3 = |volume_hm3: f64| {
            let active_hm3 = volume_hm3 - reservoir.dead_hm3;
            let enlarged_hm3 = if active_hm3 > 0.0 { reservoir.dead_hm3 + active_hm3 * factor } else { volume_hm3 };
            enlarged_hm3 * M3_PER_HM3
        };
        let ready = |point: &LakePoint| VesselPoint {
            volume_m3: enlarged_m3(point.volume_hm3),
            area_m2: point.area_km2 * M2_PER_KM2,
            level_m: point.level_m,
        };
        let dead_m3 = reservoir.dead_hm3 * M3_PER_HM3;
        let mut points = Vec::new();
        let mut below: Option<&LakePoint> = None;
        for point in &reservoir.table {
            // A point of its own at the outlet: without it the first piece above would stretch what lies below. There
            // is room for one more than the table has.
            if let Some(outlet) = below.and_then(|below| between(below, point, reservoir.dead_hm3)) {
                let _ = points.push(ready(&outlet));
            }
            let _ = points.push(ready(point));
            below = Some(point);
        }
        Self { points, dead_m3, active_m3: enlarged_m3(reservoir.capacity_hm3) - dead_m3 }
    }

    /// Surface at a volume, m²: straight between the points of the table, flat beyond its ends.
    pub fn area_m2(&self, volume_m3: f64) -> f64 {
        self.at(volume_m3, |point| point.area_m2)
    }

    /// Water level at a volume, m, likewise.
    pub fn level_m(&self, volume_m3: f64) -> f64 {
        self.at(volume_m3, |point| point.level_m)
    }

    fn at(&self, volume_m3: f64, of: impl Fn(&VesselPoint) -> f64) -> f64 {
        let above = self.points.partition_point(|point| point.volume_m3 <= volume_m3);
        match (above.checked_sub(1).and_then(|below| self.points.get(below)), self.points.get(above)) {
            (Some(below), Some(above)) => {
                let along = (volume_m3 - below.volume_m3) / (above.volume_m3 - below.volume_m3);
                of(below) + along * (of(above) - of(below))
            }
            (Some(end), None) | (None, Some(end)) => of(end),
            (None, None) => 0.0,
        }
    }
}

/// A value for every day of the year.
#[derive(Clone, Debug, PartialEq)]
pub struct YearlyRule([f64; CIRCLE_DAYS]);

impl YearlyRule {
    /// Straight lines from point to point and round New Year; `empty` where there is no point.
    pub fn joined(points: &Vec<(MonthDay, f64), MOST_RULE_POINTS>, empty: f64) -> Self {
        Self::between(points, empty, |before, after, along| before + along * (after - before))
    }

    /// From each point on until the next and round New Year; `empty` where there is no point.
    pub fn stepped(points: &Vec<(MonthDay, f64), MOST_RULE_POINTS>, empty: f64) -> Self {
        Self::between(points, empty, |before, _, _| before)
    }

    fn between(
        points: &Vec<(MonthDay, f64), MOST_RULE_POINTS>,
        empty: f64,
        value: impl Fn(f64, f64, f64) -> f64,
    ) -> Self {
        let mut sorted = points.clone();
        sorted.sort_unstable_by_key(|(date, _)| *date);
        let mut days = [empty; CIRCLE_DAYS];
        let count = sorted.len();
        for (index, (date, before)) in sorted.iter().enumerate() {
            let (next_date, after) = sorted[(index + 1) % count];
            let from = usize::from(date.leap_day_of_year());
            let to = usize::from(next_date.leap_day_of_year());
            let span = if to > from { to - from } else { to + CIRCLE_DAYS - from };
            for step in 0..span {
                let along = step as f64 / span as f64;
                days[(from - 1 + step) % CIRCLE_DAYS] = value(*before, after, along);
            }
        }
        Self(days)
    }

    /// Multiplies every value, as from one unit to another.
    pub fn scale(&mut self, factor: f64) {
        for value in &mut self.0 {
            *value *= factor;
        }
    }

    /// The value on a day.
    #[inline(always)]
    pub fn on(&self, day: MonthDay) -> f64 {
        self.0[usize::from(day.leap_day_of_year() - 1) % CIRCLE_DAYS]
    }
}

impl Hedging {
    /// Share of the demand that may be met today when `at_hand_m3` is there for a demand of `ahead_m3` in the days
    /// looked at. All that is at hand is given while it is less than `starts_at` of the demand ahead, all of the demand
    /// when it is more than `ends_at`, and in between the share rises in a straight line (Bayazit & Ünal 1990, two-point
    /// hedging, here day by day).
    pub fn share(&self, at_hand_m3: f64, ahead_m3: f64) -> f64 {
        if ahead_m3 <= 0.0 {
            return 1.0;
        }
        let cover = at_hand_m3 / ahead_m3;
        if cover >= self.ends_at {
            1.0
        } else if cover <= self.starts_at {
            cover
        } else {
            self.starts_at + (cover - self.starts_at) * (1.0 - self.starts_at) / (self.ends_at - self.starts_at)
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn on(month: u8, day: u8) -> MonthDay {
        MonthDay::new(month, day).unwrap()
    }

    #[test]
    fn a_joined_rule_runs_straight_and_round_new_year() {
        let points = Vec::from_slice(&[(on(3, 1), 10.0), (on(11, 1), 0.0)]).unwrap();
        let rule = YearlyRule::joined(&points, 0.0);
        assert_eq!(rule.on(on(3, 1)), 10.0);
        assert_eq!(rule.on(on(11, 1)), 0.0);
        // 121 days from 1 November to 1 March on the leap circle; 61 of them to 1 January.
        assert!((rule.on(on(1, 1)) - 10.0 * 61.0 / 121.0).abs() < 1e-12);
        assert!(rule.on(on(2, 29)) < 10.0 && rule.on(on(2, 29)) > rule.on(on(2, 28)));
    }

    #[test]
    fn a_stepped_rule_holds_until_the_next_date() {
        let points = Vec::from_slice(&[(on(4, 1), 2.0), (on(10, 1), 1.0)]).unwrap();
        let rule = YearlyRule::stepped(&points, 0.0);
        assert_eq!(
            [rule.on(on(3, 31)), rule.on(on(4, 1)), rule.on(on(9, 30)), rule.on(on(12, 31))],
            [1.0, 2.0, 2.0, 1.0]
        );
        assert_eq!(YearlyRule::stepped(&Vec::new(), 7.0).on(on(5, 5)), 7.0);
        let one = Vec::from_slice(&[(on(6, 1), 3.0)]).unwrap();
        assert_eq!(YearlyRule::joined(&one, 0.0).on(on(1, 1)), 3.0);
    }

    #[test]
    fn hedging_gives_everything_at_both_ends() {
        let hedging = Hedging { days_ahead: 60.0, starts_at: 0.5, ends_at: 1.5 };
        assert_eq!(hedging.share(100.0, 0.0), 1.0);
        assert_eq!(hedging.share(20.0, 100.0), 0.2);
        assert_eq!(hedging.share(150.0, 100.0), 1.0);
        assert!((hedging.share(100.0, 100.0) - 0.75).abs() < 1e-15);
    }

    #[test]
    fn a_larger_reservoir_keeps_its_dead_storage_and_levels() {
        let point = |level_m, area_km2, volume_hm3| LakePoint { level_m, area_km2, volume_hm3 };
        let reservoir = Reservoir {
            table: Vec::from_slice(&[point(0.0, 0.0, 0.0), point(10.0, 1.0, 4.0), point(20.0, 2.0, 20.0)]).unwrap(),
            dead_hm3: 4.0,
            capacity_hm3: 20.0,
            outlet_m3s: 10.0,
            right_date: super::super::canals::PriorityDate::year(1950),
            flood_space: Vec::new(),
            serves_minimum: false,
            hedging: None,
        };
        let vessel = Vessel::new(&reservoir, 50.0);
        assert_eq!((vessel.dead_m3, vessel.active_m3), (4.0e6, 24.0e6));
        assert_eq!(vessel.level_m(28.0e6), 20.0);
        assert_eq!(vessel.level_m(16.0e6), 15.0);
        assert_eq!(vessel.area_m2(16.0e6), 1.5e6);
        assert_eq!(vessel.area_m2(2.0e6), 0.5e6);
        assert_eq!(Vessel::new(&reservoir, 0.0).active_m3, 16.0e6);
    }
}
