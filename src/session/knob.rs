//! How far a turn goes: acceleration, ends and circles.
//!
//! The pace of a turn is the time since the last one over its detents. At 120 ms a detent or slower each detent is one
//! step, so that a person who looks at the screen never jumps over a value; faster turns go further:
//!
//! | pace, ms a detent | dial or year: steps | day: days |
//! |---|---|---|
//! | 120 and over | 1 | 1 |
//! | 60 to 119 | 2 | 3 |
//! | under 60 | 4 | 10 |

pub use crate::picture::views::hand::End;

/// Pace from which a detent is one step, ms.
pub const SLOW_MS: u32 = 120;
/// Pace from which a detent is a few steps, ms; faster is the fastest.
pub const FAST_MS: u32 = 60;

/// How many steps a detent is at each pace, slow, faster, fastest.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Gear([i64; 3]);

/// For dials and years.
pub const STEPS: Gear = Gear([1, 2, 4]);
/// For the day of the year.
pub const DAYS: Gear = Gear([1, 3, 10]);
/// For short lists: never more than one step a detent.
pub const LIST: Gear = Gear([1, 1, 1]);

/// A turn of the one encoder, as it came.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct Turn {
    pub detents: i32,
    pub since_ms: u32,
}

impl Turn {
    /// A turn that does not accelerate: a key, a script.
    pub const fn plain(steps: i32) -> Self {
        Turn { detents: steps, since_ms: u32::MAX }
    }

    /// Steps in this gear. The time is shared among the detents; a turn without a known time goes slowly.
    pub fn steps(self, gear: Gear) -> i64 {
        let pace_ms =
            if self.since_ms == u32::MAX { SLOW_MS } else { self.since_ms / self.detents.unsigned_abs().max(1) };
        let [slow, faster, fastest] = gear.0;
        let factor = match pace_ms {
            SLOW_MS.. => slow,
            FAST_MS.. => faster,
            _ => fastest,
        };
        i64::from(self.detents) * factor
    }
}

/// From `place` of `count` by `steps`, stopping at the ends; says which end stood in the way.
pub(super) fn along(place: usize, count: usize, steps: i64) -> (usize, Option<End>) {
    let last = count.saturating_sub(1) as i64;
    let wanted = (place as i64).saturating_add(steps);
    match wanted {
        ..0 => (0, Some(End::First)),
        _ if wanted > last => (last as usize, Some(End::Last)),
        _ => (wanted as usize, None),
    }
}

/// From `place` of `count` by `steps`, round and round.
pub(super) fn around(place: usize, count: usize, steps: i64) -> usize {
    let count = count.max(1) as i64;
    ((place as i64).saturating_add(steps)).rem_euclid(count) as usize
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_faster_turn_goes_further_and_a_slow_one_never_jumps() {
        let steps = |detents, since_ms, gear| Turn { detents, since_ms }.steps(gear);
        assert_eq!([500, 120, 119, 60, 59, 0].map(|ms| steps(1, ms, STEPS)), [1, 1, 2, 2, 4, 4]);
        assert_eq!([500, 100, 10].map(|ms| steps(-1, ms, DAYS)), [-1, -3, -10]);
        assert_eq!(steps(3, 400, STEPS), 3, "three detents in 400 ms are slow");
        assert_eq!(steps(3, 240, STEPS), 6);
        assert_eq!(steps(2, 10, LIST), 2);
        assert_eq!(Turn::plain(5).steps(DAYS), 5);
        assert_eq!(steps(i32::MIN, u32::MAX, DAYS), i64::from(i32::MIN));
    }

    #[test]
    fn ends_stop_and_circles_go_round() {
        assert_eq!(along(3, 5, 1), (4, None));
        assert_eq!(along(3, 5, 2), (4, Some(End::Last)));
        assert_eq!(along(0, 5, i64::MIN), (0, Some(End::First)));
        assert_eq!(along(0, 0, 1), (0, Some(End::Last)));
        assert_eq!((around(4, 5, 1), around(0, 5, -1), around(0, 0, 7)), (0, 4, 0));
    }
}
