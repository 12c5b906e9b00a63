//! A button: pressed, held, or stuck.

use std::time::Duration;

use super::contact::{Change, Contact};
use super::{HandEvent, Key, press};
use crate::board::file::ButtonDoes;

/// Nobody holds a button so long: something lies on it, or its wires touch. Common practice, no source.
pub const STUCK_AFTER: Duration = Duration::from_secs(60);

/// What a button did.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum ButtonTold {
    /// It went down.
    Down,
    /// It was let go after so long.
    Up(Duration),
    /// It has been down for longer than anybody holds one.
    Stuck,
    /// It was stuck, or down from the start, and came up.
    Free,
}

/// A button over its contact.
#[derive(Clone, Copy, Debug)]
pub struct Button {
    contact: Contact,
    down_since: Option<Duration>,
    /// It was down before anybody looked, or is stuck: what it does next is no press.
    void: bool,
    told_stuck: bool,
}

impl Button {
    /// A button as it is found at `now`.
    pub fn new(bounce: Duration, now: Duration, closed: bool) -> Self {
        let contact = Contact::new(bounce, closed);
        Self { contact, down_since: closed.then_some(now), void: closed, told_stuck: false }
    }

    /// Its contact is seen closed or open.
    pub fn edge(&mut self, at: Duration, closed: bool) -> Option<ButtonTold> {
        let change = self.contact.edge(at, closed)?;
        self.changed(change)
    }

    /// When [`Button::time`] wants to be called.
    pub fn due(&self) -> Option<Duration> {
        let stuck = self.down_since.filter(|_| !self.told_stuck).and_then(|since| since.checked_add(STUCK_AFTER));
        self.contact.due().into_iter().chain(stuck).min()
    }

    /// Time is `now`.
    pub fn time(&mut self, now: Duration) -> Option<ButtonTold> {
        if let Some(change) = self.contact.settle(now) {
            return self.changed(change);
        }
        if self.told_stuck || self.down_since?.checked_add(STUCK_AFTER)? > now {
            return None;
        }
        (self.void, self.told_stuck) = (true, true);
        Some(ButtonTold::Stuck)
    }

    fn changed(&mut self, change: Change) -> Option<ButtonTold> {
        if change.closed {
            self.down_since = Some(change.at);
            return Some(ButtonTold::Down);
        }
        let held = change.at.saturating_sub(self.down_since.take()?);
        self.told_stuck = false;
        let void = std::mem::take(&mut self.void) || held >= STUCK_AFTER;
        Some(if void { ButtonTold::Free } else { ButtonTold::Up(held) })
    }
}

/// What a button of a board file does when it did that; steps are taken as it goes down, presses as it comes up.
pub fn does(does: ButtonDoes, told: ButtonTold) -> Option<HandEvent> {
    let down = told == ButtonTold::Down;
    match (does, told) {
        (ButtonDoes::Press, ButtonTold::Up(held)) => Some(press(held)),
        (ButtonDoes::Press, _) => None,
        (ButtonDoes::View, _) => down.then_some(HandEvent::Key(Key::Tab)),
        (ButtonDoes::Language, _) => down.then_some(HandEvent::Key(Key::Char('l'))),
        (ButtonDoes::Play, _) => down.then_some(HandEvent::Key(Key::Char(' '))),
        (ButtonDoes::Help, _) => down.then_some(HandEvent::Key(Key::Char('?'))),
        (ButtonDoes::More, _) => down.then_some(HandEvent::Turn(1)),
        (ButtonDoes::Less, _) => down.then_some(HandEvent::Turn(-1)),
        (ButtonDoes::Back, _) => down.then_some(HandEvent::Key(Key::Escape)),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    const fn ms(ms: u64) -> Duration {
        Duration::from_millis(ms)
    }

    #[test]
    fn presses_are_told_with_their_length() {
        let mut button = Button::new(ms(15), ms(0), false);
        assert_eq!(button.edge(ms(100), true), None);
        assert_eq!(button.time(ms(115)), Some(ButtonTold::Down));
        assert_eq!(button.edge(ms(900), false), None);
        let told = button.time(ms(915)).unwrap();
        assert_eq!(told, ButtonTold::Up(ms(800)));
        assert_eq!(does(ButtonDoes::Press, told), Some(HandEvent::LongPress));
        assert_eq!(does(ButtonDoes::More, told), None);
        assert_eq!(does(ButtonDoes::More, ButtonTold::Down), Some(HandEvent::Turn(1)));
        assert_eq!(button.due(), None);
    }

    #[test]
    fn a_stuck_button_is_told_once_and_presses_nothing() {
        let mut button = Button::new(ms(15), ms(0), false);
        button.edge(ms(0), true);
        assert_eq!(button.time(ms(15)), Some(ButtonTold::Down));
        assert_eq!(button.due(), Some(STUCK_AFTER));
        assert_eq!(button.time(ms(59_999)), None);
        assert_eq!(button.time(STUCK_AFTER), Some(ButtonTold::Stuck));
        assert_eq!((button.due(), button.time(ms(90_000))), (None, None));
        button.edge(ms(95_000), false);
        assert_eq!(button.time(ms(95_015)), Some(ButtonTold::Free));
        button.edge(ms(96_000), true);
        assert_eq!(button.time(ms(96_020)), Some(ButtonTold::Down));
    }

    #[test]
    fn a_button_that_was_down_at_the_start_presses_nothing() {
        let mut button = Button::new(ms(15), ms(50), true);
        button.edge(ms(70), false);
        assert_eq!(button.time(ms(85)), Some(ButtonTold::Free));
    }
}
