//! The devices of a board's hands: one thread for each hand, which sleeps until its device has something to say.
//!
//! A device that is not there, or goes, is looked for again every few seconds; the others go on meanwhile.

mod converter;
mod inputs;
mod pins;

use std::time::Duration;

use super::{HandState, Listener, What};
use crate::board::file::{BoardFile, HandPart};

pub use converter::{Ads1115, Mcp3008, ReadsShare};

/// From one look for a device that is not there to the next.
const AGAIN: Duration = Duration::from_secs(3);
/// Who holds a line, for whoever lists them.
const HOLDER: &str = "deshielo";

/// Starts every hand of a board. Each tells `listener` how it is and what it does, until nobody listens any more.
pub fn start(board: &BoardFile, listener: &Listener) {
    for (index, part) in board.hands.iter().enumerate() {
        let teller = Teller { hand: index, listener: listener.clone() };
        let (part, gpio_chip) = (part.clone(), board.gpio_chip.clone());
        let placing = inputs::placing_of(board, &part);
        let work = {
            let teller = teller.clone();
            move || match part {
                HandPart::InputDevice(part) => inputs::serve_knobs(&part, &teller),
                HandPart::Touchscreen(part) => inputs::serve_touch(&part, placing, &teller),
                HandPart::Encoder(part) => pins::serve_encoder(&part, &gpio_chip, &teller),
                HandPart::Button(part) => pins::serve_button(&part, &gpio_chip, &teller),
                HandPart::Converter(part) => converter::serve(&part, &teller),
            }
        };
        if let Err(error) = std::thread::Builder::new().name(format!("hand {index}")).spawn(work) {
            teller.tell(0, What::Is(HandState::Lost(error.to_string())));
        }
    }
}

/// One hand's way to the listener.
#[derive(Clone, Debug)]
struct Teller {
    hand: usize,
    listener: Listener,
}

/// Nobody listens any more.
struct Unheard;

/// Why a device is served no longer.
enum Ended {
    Unheard,
    Lost(String),
}

impl From<Unheard> for Ended {
    fn from(_: Unheard) -> Self {
        Self::Unheard
    }
}

impl Teller {
    fn tell(&self, part: u8, what: What) -> bool {
        self.listener.tell(self.hand, part, what)
    }

    fn try_tell(&self, part: u8, what: What) -> Result<(), Unheard> {
        if self.tell(part, what) { Ok(()) } else { Err(Unheard) }
    }

    /// Serves a device again and again, with a pause where it is lost; each reason is told once.
    fn keep_serving(&self, parts: &[u8], mut serve: impl FnMut() -> Ended) {
        let mut told = None;
        loop {
            let began = std::time::Instant::now();
            let Ended::Lost(reason) = serve() else { return };
            // One that had been there for a while is told of even if the reason is the old one.
            if told.as_ref() != Some(&reason) || began.elapsed() > AGAIN {
                let all_told = parts.iter().all(|part| self.tell(*part, What::Is(HandState::Lost(reason.clone()))));
                if !all_told {
                    return;
                }
                told = Some(reason);
            }
            std::thread::sleep(AGAIN);
        }
    }
}
