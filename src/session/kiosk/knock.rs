//! The held combination that asks for the staff menu: three holds in a row with nothing between.
//!
//! A hold by itself sets everything back, so that three of them do no harm when a child finds them out.

/// How many holds.
const HOLDS: u8 = 3;
/// Within this time, ms.
const WITHIN_MS: u32 = 8000;

/// How much of the combination has been given.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub(super) struct Knock {
    holds: u8,
    since_ms: u32,
}

impl Knock {
    /// Time goes by.
    pub fn tick(&mut self, elapsed_ms: u32) {
        self.since_ms = self.since_ms.saturating_add(elapsed_ms);
        if self.since_ms > WITHIN_MS {
            *self = Self::default();
        }
    }

    /// A hold; whether it was the last one.
    pub fn hold(&mut self) -> bool {
        if self.holds == 0 {
            self.since_ms = 0;
        }
        self.holds += 1;
        let whole = self.holds == HOLDS;
        if whole {
            *self = Self::default();
        }
        whole
    }

    /// Something else was done.
    pub fn other(&mut self) {
        *self = Self::default();
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn three_holds_in_time_and_nothing_else() {
        let mut knock = Knock::default();
        assert_eq!([knock.hold(), knock.hold(), knock.hold(), knock.hold()], [false, false, true, false]);
        knock.other();
        assert_eq!([knock.hold(), knock.hold()], [false, false]);
        knock.other();
        assert!(!knock.hold());
        knock.tick(WITHIN_MS + 1);
        assert_eq!([knock.hold(), knock.hold()], [false, false]);
        knock.tick(WITHIN_MS);
        assert!(knock.hold());
    }
}
