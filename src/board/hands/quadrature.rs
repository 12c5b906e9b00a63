//! A rotary encoder: two contacts a quarter turn apart, decoded to detents however they bounce.
//!
//! The two contacts together go round four states. Every change of one contact is a step to the neighbouring state, so a
//! contact that bounces steps to and fro and ends where it would have ended anyway: nothing is waited for, and a fast
//! turn loses nothing. A detent is counted when the steps since the last one are complete, and the next step back does not
//! take it away. Only where every step is a detent would bounce be counted; there the contacts are left to come to rest.

use std::time::Duration;

use crate::board::file::EncoderPart;

/// An encoder left alone so long stands in a detent; common practice, no source.
const AT_REST: Duration = Duration::from_millis(150);
/// Changes of one contact, with pauses between them, while the other never changes: its wire is loose.
const ALONE: u32 = 12;
/// Changes that come closer are one, for that count.
const APART: Duration = Duration::from_millis(5);

/// The decoder of one encoder.
#[derive(Clone, Copy, Debug)]
pub struct Quadrature {
    edges_per_detent: i32,
    reversed: bool,
    bounce: Duration,
    state: i32,
    /// The state in which it was found: a detent.
    rest: i32,
    /// Steps since the last detent.
    steps: i32,
    heading: i32,
    last_edge: Option<Duration>,
    rested: bool,
    /// The contact that changed last, and how often since the other one did.
    alone: (bool, u32),
}

/// Turned right, contact A leads: open, A, both, B.
const fn state_of(a: bool, b: bool) -> i32 {
    match (a, b) {
        (false, false) => 0,
        (true, false) => 1,
        (true, true) => 2,
        (false, true) => 3,
    }
}

impl Quadrature {
    /// An encoder with its contacts closed or open as they are found.
    pub fn new(part: &EncoderPart, a: bool, b: bool) -> Self {
        let state = state_of(a, b);
        Self {
            edges_per_detent: i32::from(part.edges_per_detent.max(1)),
            reversed: part.reversed,
            bounce: Duration::from_millis(part.bounce_ms.into()),
            state,
            rest: state,
            steps: 0,
            heading: 0,
            last_edge: None,
            rested: true,
            alone: (false, 0),
        }
    }

    /// The contacts are seen closed or open; gives the detents that are complete, to the right above 0.
    pub fn edge(&mut self, at: Duration, a: bool, b: bool) -> i32 {
        let before = self.time(at);
        let state = state_of(a, b);
        let steps = match (state - self.state).rem_euclid(4) {
            1 => 1,
            3 => -1,
            // A state was missed: it goes on the way it went.
            2 => 2 * self.heading,
            _ => return before,
        };
        self.count_alone(at, state, steps);
        self.state = state;
        if steps != 0 {
            self.heading = steps.signum();
        }
        self.steps += steps;
        (self.last_edge, self.rested) = (Some(at), false);
        let now = if self.edges_per_detent > 1 { self.take() } else { 0 };
        before + now
    }

    /// When [`Quadrature::time`] wants to be called.
    pub fn due(&self) -> Option<Duration> {
        let last = self.last_edge.filter(|_| !self.rested)?;
        let waits = self.edges_per_detent == 1 && self.steps != 0;
        Some(last.saturating_add(if waits { self.bounce } else { AT_REST }))
    }

    /// Time is `now`; gives the detents that are complete.
    pub fn time(&mut self, now: Duration) -> i32 {
        let Some(last) = self.last_edge.filter(|_| !self.rested) else { return 0 };
        let quiet = now.saturating_sub(last);
        let mut detents = 0;
        if self.edges_per_detent == 1 && quiet >= self.bounce {
            detents += self.take();
        }
        if quiet >= AT_REST {
            self.rested = true;
            // It stands in a detent. Steps over mean that some were missed: the nearer detent it is.
            let round = self.state == self.rest || (self.edges_per_detent == 2 && (self.state - self.rest) % 2 == 0);
            if round && self.steps != 0 {
                if self.steps.abs() * 2 > self.edges_per_detent {
                    detents += self.signed(self.steps.signum());
                }
                self.steps = 0;
            }
        }
        detents
    }

    /// Whether one contact changed many times while the other never did.
    pub fn is_one_contact_silent(&self) -> bool {
        self.alone.1 >= ALONE
    }

    fn count_alone(&mut self, at: Duration, state: i32, steps: i32) {
        if steps.abs() != 1 {
            self.alone.1 = 0;
            return;
        }
        let is_a = |state: i32| matches!(state, 1 | 2);
        let a_changed = is_a(state) != is_a(self.state);
        let apart = self.last_edge.is_none_or(|last| at.saturating_sub(last) >= APART);
        self.alone = match self.alone {
            (contact, times) if contact == a_changed => (contact, times.saturating_add(u32::from(apart))),
            _ => (a_changed, 1),
        };
    }

    fn take(&mut self) -> i32 {
        let detents = self.steps / self.edges_per_detent;
        self.steps -= detents * self.edges_per_detent;
        self.signed(detents)
    }

    const fn signed(&self, detents: i32) -> i32 {
        if self.reversed { -detents } else { detents }
    }
}
