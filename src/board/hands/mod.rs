//! What comes in from outside: keys, turns, presses and pointers, as plain data, and the hands of a board.
//!
//! A hand of a board is decoded in two layers. The decoders are state machines over readings with times: [`quadrature`],
//! [`button`] (over a [`contact`] that bounces), [`potentiometer`], [`input`] and [`touch`]. They touch no device and build
//! anywhere. The layers that open devices are on Linux and behind the feature `board`; each hand has a thread of its own,
//! which tells a [`Listener`] what the hand did and how it is.

use std::sync::Arc;
use std::sync::mpsc::{self, Receiver};
use std::time::Duration;

use super::size::FrameSize;
use crate::water::dials::Dial;

pub mod button;
pub mod contact;
#[cfg(all(feature = "board", target_os = "linux"))]
mod device;
pub mod input;
mod key_codes;
pub mod potentiometer;
pub mod quadrature;
mod told;
pub mod touch;

#[cfg(all(feature = "board", target_os = "linux"))]
pub use device::{Ads1115, Mcp3008, ReadsShare, start};
pub use told::{HandState, HandTold, Listener, Reading, Stuck, What};

/// A button held at least so long was held on purpose.
pub const LONG_PRESS: Duration = Duration::from_millis(600);

/// A key, by what is printed on it.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Key {
    /// Arrow up.
    Up,
    /// Arrow down.
    Down,
    /// Arrow left.
    Left,
    /// Arrow right.
    Right,
    /// Page up.
    PageUp,
    /// Page down.
    PageDown,
    /// Home.
    Home,
    /// End.
    End,
    /// Enter.
    Enter,
    /// Escape.
    Escape,
    /// Tab.
    Tab,
    /// Tab with shift.
    BackTab,
    /// A letter, digit, sign or the space bar, as typed.
    Char(char),
}

/// Where a finger or a mouse button is in its touch.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum PointerPhase {
    /// It went down.
    Down,
    /// It moved while down.
    Move,
    /// It was lifted.
    Up,
}

/// Something that a hand did, or that happened to a screen.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum HandEvent {
    /// So much time went by; the stage sends it before each of the others, and alone when a tick is due.
    Time(Duration),
    /// The encoder or wheel was turned by so many detents, to the right or away from the hand above 0.
    Turn(i32),
    /// An encoder that turns one dial only was turned by so many detents.
    TurnDial {
        /// The dial.
        dial: Dial,
        /// Detents, to the right above 0.
        detents: i32,
    },
    /// A potentiometer of one dial was moved.
    SetDial {
        /// The dial.
        dial: Dial,
        /// Share of the way from the dial's first stop to its last, 0 to 1.
        share: f64,
    },
    /// The button was pressed and let go.
    Press,
    /// The button was held.
    LongPress,
    /// A key was pressed, or repeats.
    Key(Key),
    /// A finger or the mouse, in pixels of the frame that it is on; beyond its edges too while down.
    Pointer {
        /// Down, move or up.
        phase: PointerPhase,
        /// Pixels from the left edge of the frame.
        x: i32,
        /// Pixels from the top edge of the frame.
        y: i32,
        /// Size of the frame that the screen shows, which tells the layout.
        on: FrameSize,
    },
    /// A screen may have another size, or have lost what it showed.
    Resize,
    /// The person, or the system, wants the program to end.
    Close,
}

/// What a button did that was down for `held`.
pub fn press(held: Duration) -> HandEvent {
    if held >= LONG_PRESS { HandEvent::LongPress } else { HandEvent::Press }
}

/// Where a hand puts its events; cheap to clone, good in any thread.
#[derive(Clone)]
pub struct Post(Arc<dyn Fn(HandEvent) -> bool + Send + Sync>);

impl Post {
    /// A post that calls `take`, which says whether anybody still listens.
    pub fn new(take: impl Fn(HandEvent) -> bool + Send + Sync + 'static) -> Self {
        Self(Arc::new(take))
    }

    /// A post and the channel that it fills, for [`run`](super::run).
    pub fn channel() -> (Self, Receiver<HandEvent>) {
        let (sender, receiver) = mpsc::channel();
        (Self::new(move |event| sender.send(event).is_ok()), receiver)
    }

    /// Hands over an event; `false` where nobody listens any more, so that the hand may stop.
    pub fn send(&self, event: HandEvent) -> bool {
        (self.0)(event)
    }
}

impl std::fmt::Debug for Post {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        f.write_str("Post")
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_length_of_a_press_decides() {
        assert_eq!(press(Duration::ZERO), HandEvent::Press);
        assert_eq!(press(LONG_PRESS - Duration::from_nanos(1)), HandEvent::Press);
        assert_eq!(press(LONG_PRESS), HandEvent::LongPress);
    }

    #[test]
    fn a_hand_learns_that_nobody_listens() {
        let (post, receiver) = Post::channel();
        assert!(post.clone().send(HandEvent::Press));
        assert_eq!(receiver.recv(), Ok(HandEvent::Press));
        drop(receiver);
        assert!(!post.send(HandEvent::Press));
    }
}
