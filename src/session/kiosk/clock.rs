//! Whether the clock on the wall can be believed.
//!
//! Many boards have no clock that runs without power, and start in 1970 or at the time of the last shutdown. The clock is
//! believed while all of this holds:
//!
//! 1. it says no earlier time than this program's release, and none more than [`MOST_YEARS_ON`] years later;
//! 2. something stands behind it: the board has a battery clock or it was set since the start ([`Wall::has_source`]), or
//!    the staff has said that it is right;
//! 3. it has kept step with the time that really went by: for a minute since the start, or for ten minutes since it last
//!    jumped by more than two minutes in either direction.
//!
//! Without belief nothing dims or sleeps, and what is counted has no day.

/// The clock as it was read.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Wall {
    /// Seconds since 1970-01-01 in UTC.
    pub unix_s: i64,
    /// The local day, counted from 1970-01-01.
    pub local_day: i32,
    /// The local minute of the day.
    pub local_minute: u16,
    /// Whether a battery clock or a time signal stands behind it.
    pub has_source: bool,
}

/// Why the clock is not believed.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Doubt {
    /// It cannot be read.
    Missing,
    /// It is earlier than this program, or far too late.
    Year,
    /// Nothing stands behind it.
    NoSource,
    /// It jumped, or has not run long enough.
    Unsteady,
}

/// No clock that is right says an earlier time: 2026-12-01, when this release was made.
pub const RELEASED_UNIX_S: i64 = 1_796_083_200;
/// A clock further on than this is wrong.
pub const MOST_YEARS_ON: i64 = 30;

const YEAR_S: i64 = 31_557_600;
/// Steady for so long since the start.
const STEADY_AT_START_MS: u64 = 60_000;
/// Steady for so long since a jump.
const STEADY_AFTER_JUMP_MS: u64 = 600_000;
/// Further out of step than this is a jump.
const JUMP_S: i64 = 120;
/// A crystal loses seconds in a day: after that time what is in step is measured from anew.
const ANCHOR_MS: u64 = 86_400_000;

/// What is known of the clock.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub struct Belief {
    wall: Option<Wall>,
    /// What the clock said at some time, and how much time really went by since.
    anchor: Option<(i64, u64)>,
    steady_ms: u64,
    has_jumped: bool,
}

impl Belief {
    /// Time went by and the clock was read again.
    pub fn tick(&mut self, elapsed_ms: u32, wall: Option<Wall>) {
        self.wall = wall;
        let Some(wall) = wall else {
            (self.anchor, self.steady_ms) = (None, 0);
            return;
        };
        self.steady_ms = self.steady_ms.saturating_add(elapsed_ms.into());
        let Some((said, since_ms)) = &mut self.anchor else {
            (self.anchor, self.steady_ms) = (Some((wall.unix_s, 0)), 0);
            return;
        };
        *since_ms = since_ms.saturating_add(elapsed_ms.into());
        let expected = said.saturating_add_unsigned(*since_ms / 1000);
        let jumped = wall.unix_s.saturating_sub(expected).saturating_abs() > JUMP_S;
        if jumped {
            (self.steady_ms, self.has_jumped) = (0, true);
        }
        if jumped || *since_ms > ANCHOR_MS {
            self.anchor = Some((wall.unix_s, 0));
        }
    }

    /// The clock, where it is believed.
    ///
    /// # Errors
    /// Why it is not.
    pub fn wall(&self, staff_says_right: bool) -> Result<Wall, Doubt> {
        let wall = self.wall.ok_or(Doubt::Missing)?;
        if !(RELEASED_UNIX_S..RELEASED_UNIX_S + MOST_YEARS_ON * YEAR_S).contains(&wall.unix_s) {
            return Err(Doubt::Year);
        }
        if !wall.has_source && !staff_says_right {
            return Err(Doubt::NoSource);
        }
        let needed = if self.has_jumped { STEADY_AFTER_JUMP_MS } else { STEADY_AT_START_MS };
        if self.steady_ms < needed { Err(Doubt::Unsteady) } else { Ok(wall) }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn at(unix_s: i64) -> Option<Wall> {
        Some(Wall { unix_s, local_day: 0, local_minute: 0, has_source: true })
    }

    /// Lets the clock run in step for so many seconds.
    fn run(belief: &mut Belief, from: i64, seconds: i64) -> i64 {
        for second in 1..=seconds {
            belief.tick(1000, at(from + second));
        }
        from + seconds
    }

    const NOW: i64 = RELEASED_UNIX_S + 1000;

    #[test]
    fn a_steady_clock_is_believed_after_a_minute() {
        let mut belief = Belief::default();
        assert_eq!(belief.wall(false), Err(Doubt::Missing));
        belief.tick(0, at(NOW));
        let now = run(&mut belief, NOW, 59);
        assert_eq!(belief.wall(false), Err(Doubt::Unsteady));
        run(&mut belief, now, 1);
        assert!(belief.wall(false).is_ok());
    }

    #[test]
    fn a_jump_either_way_costs_ten_minutes() {
        for jump in [-86_400, -121, 121, 3600, 400 * 86_400] {
            let mut belief = Belief::default();
            let start = NOW + 500 * 86_400;
            belief.tick(0, at(start));
            let now = run(&mut belief, start, 100) + jump;
            let now = run(&mut belief, now, 599);
            assert_eq!(belief.wall(false), Err(Doubt::Unsteady), "{jump}");
            run(&mut belief, now, 2);
            assert!(belief.wall(false).is_ok(), "{jump}");
        }
    }

    #[test]
    fn years_and_sources_are_looked_at() {
        for (unix_s, doubt) in
            [(0, Doubt::Year), (RELEASED_UNIX_S - 10_000, Doubt::Year), (i64::MAX - 9999, Doubt::Year)]
        {
            let mut belief = Belief::default();
            belief.tick(0, at(unix_s));
            run(&mut belief, unix_s, 1000);
            assert_eq!(belief.wall(true), Err(doubt), "{unix_s}");
        }
        let mut belief = Belief::default();
        let unsourced = |unix_s| Some(Wall { has_source: false, ..at(unix_s).unwrap() });
        belief.tick(0, unsourced(NOW));
        (1..100).for_each(|second| belief.tick(1000, unsourced(NOW + second)));
        assert_eq!(belief.wall(false), Err(Doubt::NoSource));
        assert!(belief.wall(true).is_ok());
    }

    #[test]
    fn a_crystal_that_drifts_is_no_jump_and_a_clock_that_races_is() {
        // Ten seconds a day, for a month.
        let mut belief = Belief::default();
        for minute in 0..30 * 1440_i64 {
            belief.tick(60_000, at(NOW + minute * 60 + minute * 10 / 1440));
            assert!(minute < 2 || belief.wall(false).is_ok(), "minute {minute}");
        }
        let mut racing = Belief::default();
        for second in 0..10_000 {
            racing.tick(1000, at(NOW + second * 2));
            assert!(second < 700 || racing.wall(false).is_err());
        }
    }
}
