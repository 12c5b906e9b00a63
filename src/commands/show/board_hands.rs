//! The hands of a board file, in `show`: their events go to the session, what is wrong with them to the log.

use crate::board::Post;
use crate::board::file::{BoardFile, HandPart};
use crate::board::hands::{HandState, Stuck};
use crate::picture::views::wording::dial_name;
use crate::words::{Value, Words};

/// What a hand is called: `part` is that of [`HandTold`](crate::board::hands::HandTold).
pub(in crate::commands) fn hand_name(hand: &HandPart, part: u8, words: &Words) -> String {
    let pin = |pin: crate::board::file::Pin| Value::from(u32::from(pin.0));
    match hand {
        HandPart::InputDevice(device) => words.say("hand-input-device", &[("name", device.name.as_str().into())]),
        HandPart::Touchscreen(device) => words.say("hand-touchscreen", &[("name", device.name.as_str().into())]),
        HandPart::Encoder(encoder) => match encoder.button_pin.filter(|_| part == 1) {
            Some(button) => words.say("hand-shaft-button", &[("pin", pin(button))]),
            None => words.say("hand-encoder", &[("a", pin(encoder.a_pin)), ("b", pin(encoder.b_pin))]),
        },
        HandPart::Button(button) => words.say("hand-button", &[("pin", pin(button.pin))]),
        HandPart::Converter(converter) => {
            let dial = converter.inputs.iter().find(|input| input.input == part);
            let name = dial.map(|input| dial_name(input.dial, words)).unwrap_or_default();
            words.say("hand-knob", &[("dial", name.into()), ("input", u32::from(part).into())])
        }
    }
}

/// What is wrong with a hand, in a few words; `None` where nothing is.
pub(in crate::commands) fn state_words(state: &HandState, words: &Words) -> Option<String> {
    let id = match state {
        HandState::There => return None,
        HandState::Lost(_) => "hand-lost",
        HandState::Stuck(Stuck::Button) => "hand-stuck-button",
        HandState::Stuck(Stuck::OneContact) => "hand-stuck-one-contact",
        HandState::Stuck(Stuck::Loose) => "hand-stuck-loose",
    };
    Some(words.say(id, &[]))
}

/// Starts the hands. What becomes of them is told on standard error, which a service keeps.
#[cfg(all(feature = "board", target_os = "linux"))]
pub(super) fn start(board: &BoardFile, post: &Post, words: &Words) {
    use std::collections::BTreeMap;
    use std::sync::{Mutex, PoisonError};

    use crate::board::hands::{Listener, What, start};
    use crate::commands::tell_standard_error;

    // The threads of the hands have no words of their own: every line is made ready here.
    let mut lines: BTreeMap<(usize, u8), HandLines> = BTreeMap::new();
    for (index, hand) in board.hands.iter().enumerate() {
        for part in parts(hand) {
            lines.insert((index, part), HandLines::new(&hand_name(hand, part, words), words));
        }
    }
    let (post, told) = (post.clone(), Mutex::new(BTreeMap::<(usize, u8), HandState>::new()));
    let listener = Listener::new(move |news| match news.what {
        What::Did(event) => post.send(event),
        What::Reads(_) => true,
        What::Is(state) => {
            let key = (news.hand, news.part);
            let before = told.lock().unwrap_or_else(PoisonError::into_inner).insert(key, state.clone());
            // That a hand is there from the start is nothing to tell.
            let is_new = before.as_ref() != Some(&state) && (before.is_some() || state != HandState::There);
            if let Some(lines) = lines.get(&key).filter(|_| is_new) {
                tell_standard_error(&[lines.of(&state)]);
            }
            true
        }
    });
    start(board, &listener);
}

/// Elsewhere a board has no hands.
#[cfg(not(all(feature = "board", target_os = "linux")))]
pub(super) fn start(_: &BoardFile, _: &Post, _: &Words) {}

/// The parts of a hand that tell things.
pub(in crate::commands) fn parts(hand: &HandPart) -> Vec<u8> {
    match hand {
        HandPart::Encoder(encoder) if encoder.button_pin.is_some() => vec![0, 1],
        HandPart::Converter(converter) => converter.inputs.iter().map(|input| input.input).collect(),
        _ => vec![0],
    }
}

/// What the log says of one hand.
#[cfg(all(feature = "board", target_os = "linux"))]
struct HandLines {
    back: String,
    lost: String,
    stuck: [(Stuck, String); 3],
}

#[cfg(all(feature = "board", target_os = "linux"))]
impl HandLines {
    fn new(name: &str, words: &Words) -> Self {
        let stuck = [Stuck::Button, Stuck::OneContact, Stuck::Loose].map(|stuck| {
            let what = state_words(&HandState::Stuck(stuck), words).unwrap_or_default();
            (stuck, words.say("board-hand-stuck", &[("hand", name.into()), ("what", what.into())]))
        });
        Self {
            back: words.say("board-hand-back", &[("hand", name.into())]),
            lost: words.say("board-hand-lost", &[("hand", name.into())]),
            stuck,
        }
    }

    fn of(&self, state: &HandState) -> String {
        match state {
            HandState::There => self.back.clone(),
            HandState::Lost(reason) => format!("{} {reason}", self.lost),
            HandState::Stuck(stuck) => {
                self.stuck.iter().find(|(other, _)| other == stuck).map(|(_, line)| line.clone()).unwrap_or_default()
            }
        }
    }
}
