//! Hand events as events of the session.

use std::time::Duration;

use crate::board::{HandEvent, Key};
use crate::session::{self, Event};
use crate::water::dials::{DIALS, Dial};

/// Turns the time between events into whole milliseconds without losing the rest.
#[derive(Debug, Default)]
pub(super) struct Clock {
    rest: Duration,
    /// Since the encoder was last turned; `None` before its first turn.
    since_turn: Option<Duration>,
    /// What the first turn of those that came at once was told, and how many they are by now.
    at_once: (u32, u32),
    /// Time since the beginning, and when each dial with an encoder of its own was turned last.
    now: Duration,
    dial_turned: [Option<Duration>; DIALS],
}

/// No hand turns so fast: turns that come closer were waiting while something else was done, and share the time before
/// the first of them. Otherwise a slow board would take a slow hand for a fast one.
const AT_ONCE_MS: u32 = 3;

impl Clock {
    /// The event for the session, if it is one that the session knows.
    pub fn event(&mut self, event: HandEvent) -> Option<Event> {
        Some(match event {
            HandEvent::Time(gone_by) => {
                self.since_turn = self.since_turn.map(|since| since.saturating_add(gone_by));
                self.rest = self.rest.saturating_add(gone_by);
                self.now = self.now.saturating_add(gone_by);
                let elapsed_ms = whole_ms(self.rest);
                self.rest = self.rest.saturating_sub(Duration::from_millis(elapsed_ms.into()));
                Event::Tick { elapsed_ms }
            }
            HandEvent::Turn(detents) => {
                let since_ms = self.since_turn.replace(Duration::ZERO).map_or(u32::MAX, whole_ms);
                self.at_once = match self.at_once {
                    (first, count) if since_ms < AT_ONCE_MS => (first, count.saturating_add(1)),
                    _ => (since_ms, 1),
                };
                let (first, count) = self.at_once;
                let since_ms = if first == u32::MAX { first } else { first / count };
                Event::Turn { detents, since_ms }
            }
            HandEvent::TurnDial { dial, detents } => {
                let before = Dial::ALL.iter().position(|other| *other == dial).map(|at| &mut self.dial_turned[at]);
                let turned = before.and_then(|before| before.replace(self.now));
                let since_ms = turned.map_or(u32::MAX, |turned| whole_ms(self.now.saturating_sub(turned)));
                Event::TurnDial { dial, detents, since_ms }
            }
            HandEvent::SetDial { dial, share } => Event::SetDial { dial, share },
            HandEvent::Press => Event::Press,
            HandEvent::LongPress => Event::LongPress,
            HandEvent::Key(key) => Event::Key(session_key(key)?),
            HandEvent::Pointer { .. } | HandEvent::Resize | HandEvent::Close => return None,
        })
    }
}

fn whole_ms(time: Duration) -> u32 {
    u32::try_from(time.as_millis()).unwrap_or(u32::MAX)
}

fn session_key(key: Key) -> Option<session::keys::Key> {
    use session::keys::Key as To;
    Some(match key {
        Key::Up => To::Up,
        Key::Down => To::Down,
        Key::Left => To::Left,
        Key::Right => To::Right,
        Key::PageUp => To::PageUp,
        Key::PageDown => To::PageDown,
        Key::Home => To::Home,
        Key::End => return None,
        Key::Enter => To::Enter,
        Key::Escape => To::Escape,
        Key::Tab => To::Tab,
        Key::BackTab => To::BackTab,
        Key::Char(letter) => To::Char(letter),
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn no_part_of_a_millisecond_is_lost() {
        let mut clock = Clock::default();
        let mut sum = 0;
        for _ in 0..10 {
            let Some(Event::Tick { elapsed_ms }) = clock.event(HandEvent::Time(Duration::from_micros(700))) else {
                panic!("time is a tick");
            };
            sum += elapsed_ms;
        }
        assert_eq!(sum, 7);
    }

    #[test]
    fn turns_know_how_long_ago_the_last_one_was() {
        let mut clock = Clock::default();
        assert_eq!(clock.event(HandEvent::Turn(1)), Some(Event::Turn { detents: 1, since_ms: u32::MAX }));
        clock.event(HandEvent::Time(Duration::from_millis(40)));
        clock.event(HandEvent::Key(Key::End));
        clock.event(HandEvent::Time(Duration::from_millis(2)));
        assert_eq!(clock.event(HandEvent::Turn(-2)), Some(Event::Turn { detents: -2, since_ms: 42 }));
    }

    #[test]
    fn dials_with_knobs_of_their_own_have_a_time_of_their_own() {
        let mut clock = Clock::default();
        let turn = |dial, since_ms| Some(Event::TurnDial { dial, detents: 1, since_ms });
        let turned = |dial| HandEvent::TurnDial { dial, detents: 1 };
        assert_eq!(clock.event(turned(Dial::Warming)), turn(Dial::Warming, u32::MAX));
        clock.event(HandEvent::Time(Duration::from_millis(30)));
        assert_eq!(clock.event(turned(Dial::Diversion)), turn(Dial::Diversion, u32::MAX));
        clock.event(HandEvent::Time(Duration::from_millis(20)));
        assert_eq!(clock.event(turned(Dial::Warming)), turn(Dial::Warming, 50));
        let share = Event::SetDial { dial: Dial::TownGrowth, share: 0.25 };
        assert_eq!(clock.event(HandEvent::SetDial { dial: Dial::TownGrowth, share: 0.25 }), Some(share));
    }

    #[test]
    fn turns_that_waited_share_the_time_before_them() {
        let mut clock = Clock::default();
        clock.event(HandEvent::Turn(1));
        clock.event(HandEvent::Time(Duration::from_millis(300)));
        let since = |clock: &mut Clock| match clock.event(HandEvent::Turn(1)) {
            Some(Event::Turn { since_ms, .. }) => since_ms,
            other => panic!("{other:?}"),
        };
        assert_eq!([(); 3].map(|()| since(&mut clock)), [300, 150, 100]);
        clock.event(HandEvent::Time(Duration::from_millis(40)));
        assert_eq!(since(&mut clock), 40, "a fast hand is told as one");
    }
}
