//! A contact that bounces: closed or open, once it has been so for long enough.

use std::time::Duration;

/// A change of a contact.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Change {
    /// When it came to rest.
    pub at: Duration,
    /// Whether it is closed now.
    pub closed: bool,
}

/// A contact. Times are those of one clock that never goes back.
#[derive(Clone, Copy, Debug)]
pub struct Contact {
    bounce: Duration,
    settled: bool,
    raw: bool,
    changed_at: Duration,
}

impl Contact {
    /// A contact as it is found, which bounces for no longer than `bounce`.
    pub const fn new(bounce: Duration, closed: bool) -> Self {
        Self { bounce, settled: closed, raw: closed, changed_at: Duration::ZERO }
    }

    /// Whether it is closed, bounces left out.
    pub const fn is_closed(&self) -> bool {
        self.settled
    }

    /// It is seen closed or open; gives the change that was complete before that.
    pub fn edge(&mut self, at: Duration, closed: bool) -> Option<Change> {
        let change = self.settle(at);
        if closed != self.raw {
            (self.raw, self.changed_at) = (closed, at);
        }
        // Without bounce nothing needs to be waited for.
        if self.bounce.is_zero() { self.settle(at).or(change) } else { change }
    }

    /// When [`Contact::settle`] wants to be called.
    pub fn due(&self) -> Option<Duration> {
        (self.raw != self.settled).then(|| self.changed_at.saturating_add(self.bounce))
    }

    /// Time is `now`; gives the change that is complete.
    pub fn settle(&mut self, now: Duration) -> Option<Change> {
        if self.due()? > now {
            return None;
        }
        self.settled = self.raw;
        Some(Change { at: self.changed_at, closed: self.settled })
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    const fn us(us: u64) -> Duration {
        Duration::from_micros(us)
    }

    #[test]
    fn a_bounce_is_one_change_and_a_spark_is_none() {
        let mut contact = Contact::new(us(1000), false);
        for (at, closed) in [(100, true), (300, false), (350, true), (700, false), (720, true)] {
            assert_eq!(contact.edge(us(at), closed), None);
        }
        assert_eq!(contact.due(), Some(us(1720)));
        assert_eq!(contact.settle(us(1719)), None);
        assert_eq!(contact.settle(us(1720)), Some(Change { at: us(720), closed: true }));
        assert_eq!(contact.edge(us(5000), false), None);
        assert_eq!(contact.edge(us(5200), true), None);
        assert_eq!((contact.due(), contact.is_closed()), (None, true));
    }

    #[test]
    fn a_change_that_nobody_waited_for_is_told_with_the_next_edge() {
        let mut contact = Contact::new(us(1000), false);
        assert_eq!(contact.edge(us(0), true), None);
        assert_eq!(contact.edge(us(9000), false), Some(Change { at: us(0), closed: true }));
        let mut clean = Contact::new(Duration::ZERO, false);
        assert_eq!(clean.edge(us(3), true), Some(Change { at: us(3), closed: true }));
    }
}
