//! The loop that sleeps until a hand does something or a tick is due.

use std::sync::mpsc::{Receiver, RecvTimeoutError};
use std::time::Instant;

use super::hands::HandEvent;
use super::screen::{Instrument, ScreenError};
use super::stage::Stage;

/// So many waiting events are taken before the next frame, so that a flood of them cannot stop the picture.
const MOST_EVENTS_A_FRAME: usize = 256;

/// Plays until the instrument is done, somebody closes it, or all hands are gone and nothing moves.
///
/// # Errors
/// The first screen that fails ends it.
pub fn run<I: Instrument>(stage: &mut Stage<I>, hands: &Receiver<HandEvent>) -> Result<(), ScreenError> {
    loop {
        stage.refresh()?;
        if stage.done() {
            return Ok(());
        }
        match next(stage, hands) {
            Next::Event(event) => {
                stage.hand(event);
                for event in hands.try_iter().take(MOST_EVENTS_A_FRAME) {
                    stage.hand(event);
                }
            }
            Next::Tick => stage.tick(),
            Next::NoHands => return Ok(()),
        }
    }
}

enum Next {
    Event(HandEvent),
    Tick,
    NoHands,
}

fn next<I: Instrument>(stage: &Stage<I>, hands: &Receiver<HandEvent>) -> Next {
    let Some(due) = stage.next_tick() else {
        return hands.recv().map_or(Next::NoHands, Next::Event);
    };
    match hands.recv_timeout(due.saturating_duration_since(Instant::now())) {
        Ok(event) => Next::Event(event),
        Err(RecvTimeoutError::Timeout) => Next::Tick,
        Err(RecvTimeoutError::Disconnected) => {
            std::thread::sleep(due.saturating_duration_since(Instant::now()));
            Next::Tick
        }
    }
}
