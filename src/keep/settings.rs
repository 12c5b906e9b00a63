//! What the staff has set, and where the instrument was when the power went.

use std::collections::BTreeMap;

use serde::{Deserialize, Serialize};

use super::pin::PinHash;
use crate::session::Whereabouts;
use crate::session::kiosk::Wishes;

/// Most letters of a message of the day: what goes onto the smallest screen.
pub const MOST_MESSAGE_LETTERS: usize = 120;
/// Most languages of a message of the day.
const MOST_LANGUAGES: usize = 8;

/// Everything that is set. A file of an older program that knows less is taken with the usual values for the rest.
#[derive(Clone, Debug, Default, PartialEq, Serialize, Deserialize)]
#[serde(default)]
pub struct Settings {
    /// The place that was shown; elsewhere one does not go back to where one was.
    pub place: String,
    /// Where the instrument was, and a person's own settings.
    pub whereabouts: Option<Whereabouts>,
    /// Whether it was left alone there.
    pub left_alone: bool,
    /// What the staff wishes of the kiosk.
    pub wishes: Wishes,
    /// The PIN of the staff menu; without one it stays closed.
    pub pin: Option<PinHash>,
    /// Wrong PINs since the last right one.
    pub wrong_pins: u32,
}

/// The message of the day by language, as the staff wrote it.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct Messages(BTreeMap<String, String>);

impl Messages {
    /// Reads lines such as `es = "Hoy a las 10: visita a la presa"`. What is no line of text, too long or one language too
    /// many is left out and counted.
    pub fn read(text: &str) -> (Self, usize) {
        let Ok(table) = text.parse::<toml::Table>() else { return (Self::default(), 1) };
        let (mut messages, mut left_out) = (BTreeMap::new(), 0);
        for (language, value) in table {
            let text = value.as_str().map(str::trim).unwrap_or_default();
            let fits = !text.is_empty()
                && text.chars().count() <= MOST_MESSAGE_LETTERS
                && !text.chars().any(char::is_control)
                && messages.len() < MOST_LANGUAGES;
            if fits {
                messages.insert(language, text.to_owned());
            } else {
                left_out += 1;
            }
        }
        (Self(messages), left_out)
    }

    /// The message for a language tag: of its region where there is one, else of its language.
    pub fn get(&self, tag: &str) -> Option<&str> {
        let language = tag.split('-').next().unwrap_or(tag);
        self.0.get(tag).or_else(|| self.0.get(language)).map(String::as_str)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn messages_are_read_by_language_and_bad_ones_are_counted() {
        let long = "a".repeat(MOST_MESSAGE_LETTERS + 1);
        let text =
            format!("en = \"Open day\"\nes = \"Día abierto\"\nes-CL = \"Puertas abiertas\"\nfr = 3\nde = \"{long}\"");
        let (messages, left_out) = Messages::read(&text);
        assert_eq!(left_out, 2);
        assert_eq!(messages.get("en-US"), Some("Open day"));
        assert_eq!(messages.get("es-MX"), Some("Día abierto"));
        assert_eq!(messages.get("es-CL"), Some("Puertas abiertas"));
        assert_eq!(messages.get("fr"), None);
        assert_eq!(Messages::read("no table").1, 1);
    }

    #[test]
    fn a_file_that_knows_less_is_taken() {
        let read: Settings = serde_json::from_str("{\"place\":\"demo\"}").unwrap();
        assert_eq!(read, Settings { place: "demo".to_owned(), ..Settings::default() });
    }
}
