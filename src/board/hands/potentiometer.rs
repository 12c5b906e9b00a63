//! A potentiometer: where it stands is where its dial stands, without chatter.
//!
//! The dial's first stop lies at the left end and its last at the right end, with a straight line between. What is found
//! at the start changes nothing, however the dial stands: the first move picks the dial up.

use std::time::Duration;

use crate::board::file::DialInput;

/// A jump of this share of the turn from one reading to the next, and back, and so on: no hand does that. Common practice,
/// no source, as are the next three.
const JUMP: f64 = 0.12;
/// So many jumps in turn are too many.
const MOST_JUMPS: u32 = 6;
/// Readings further apart than that say nothing about jumps.
const APART: Duration = Duration::from_millis(250);
/// It counts as firm again when it has been calm for so long.
const CALM: Duration = Duration::from_secs(2);

/// What a reading means.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Read {
    /// Where the dial stands now, 0 to 1 from its first stop to its last, if the hand moved it.
    pub moved: Option<f64>,
    /// `true` where its wiper turned out to be loose, `false` where it is firm again.
    pub loose: Option<bool>,
}

/// The decoder of one potentiometer.
#[derive(Clone, Copy, Debug)]
pub struct Potentiometer {
    input: DialInput,
    /// The last three readings, the newest last.
    latest: Option<[f64; 3]>,
    stands: Option<f64>,
    last: Option<(Duration, f64)>,
    /// How often it jumped in turn, and which way last.
    jumps: (u32, bool),
    jumped_at: Duration,
    loose: bool,
}

impl Potentiometer {
    /// A potentiometer that was not read yet.
    pub const fn new(input: DialInput) -> Self {
        Self {
            input,
            latest: None,
            stands: None,
            last: None,
            jumps: (0, false),
            jumped_at: Duration::ZERO,
            loose: false,
        }
    }

    /// The share of the turn, 0 at the first stop of its dial, that this share of the supply means. The ends are stops: what
    /// lies beyond them is at them.
    pub fn turn_share(&self, supply_share: f64) -> f64 {
        let DialInput { low_end_share: low, high_end_share: high, .. } = self.input;
        let along = if supply_share <= low {
            0.0
        } else if supply_share >= high {
            1.0
        } else {
            (supply_share - low) / (high - low)
        };
        if self.input.reversed { 1.0 - along } else { along }
    }

    /// Takes a reading: the share of the supply at its wiper. A reading that is no number is none.
    pub fn read(&mut self, at: Duration, supply_share: f64) -> Read {
        if !supply_share.is_finite() {
            return Read::default();
        }
        let raw = self.turn_share(supply_share);
        let loose = self.judge(at, raw);
        // The middle one of three: a speck of dust under the wiper is no turn.
        let latest = self.latest.map_or([raw; 3], |[_, second, third]| [second, third, raw]);
        self.latest = Some(latest);
        let [first, second, third] = latest;
        let middle = first.max(second).min(first.min(second).max(third));
        let Some(stands) = self.stands.filter(|_| !self.loose) else {
            self.stands = Some(middle);
            return Read { moved: None, loose };
        };
        let at_end = middle <= 0.0 || middle >= 1.0;
        let far = (middle - stands).abs() > self.input.hysteresis_share;
        if middle == stands || !(far || at_end) {
            return Read { moved: None, loose };
        }
        self.stands = Some(middle);
        Read { moved: Some(middle), loose }
    }

    fn judge(&mut self, at: Duration, raw: f64) -> Option<bool> {
        let before = self.last.replace((at, raw));
        if let Some((then, before)) = before {
            let moved = raw - before;
            if moved.abs() > JUMP && at.saturating_sub(then) <= APART {
                let up = moved > 0.0;
                let recent = at.saturating_sub(self.jumped_at) <= APART * 2;
                self.jumps = if recent && self.jumps.1 != up { (self.jumps.0.saturating_add(1), up) } else { (1, up) };
                self.jumped_at = at;
            }
        }
        let loose = if self.loose { at.saturating_sub(self.jumped_at) < CALM } else { self.jumps.0 > MOST_JUMPS };
        if loose == self.loose {
            return None;
        }
        self.loose = loose;
        self.jumps.0 = 0;
        Some(loose)
    }
}
