//! `show --set-pin`: asks for the PIN of the staff menu and keeps it.

use std::io::BufRead;

use super::note_words::note_words;
use super::{keep_in, tell};
use crate::commands::failure::Failure;
use crate::commands::show::request::Request;
use crate::keep::{LEAST_PIN_DIGITS, MOST_PIN_DIGITS, PinFault, PinHash};
use crate::words::Words;

/// Asks, checks and keeps. The PIN comes from standard input: on a command line everybody could read it.
pub(in crate::commands::show) fn set_pin(request: &Request, words: &Words) -> Result<(), Failure> {
    let mut keep = keep_in(request).ok_or_else(|| Failure::input(words.say("keep-no-folder", &[])))?;
    let range = [("least", LEAST_PIN_DIGITS.into()), ("most", MOST_PIN_DIGITS.into())];
    tell(words.say("kiosk-pin-ask", &range));
    let mut line = String::new();
    // Whatever cannot be read is no PIN.
    let _ = std::io::stdin().lock().read_line(&mut line);
    let pin = PinHash::new(line.trim()).map_err(|fault| {
        Failure::input(match fault {
            PinFault::Digits => words.say("kiosk-pin-bad", &range),
            PinFault::NoSalt => words.say("kiosk-pin-no-chance", &[]),
        })
    })?;
    let mut settings = keep.settings();
    keep.take_notes().iter().for_each(|note| tell(note_words(note, words)));
    (settings.pin, settings.wrong_pins) = (Some(pin), 0);
    match keep.keep_settings(&settings) {
        Some(note) => Err(Failure::input(note_words(&note, words))),
        None => {
            tell(words.say("kiosk-pin-kept", &[]));
            Ok(())
        }
    }
}
