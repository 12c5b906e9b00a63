//! A script of events, one a line, that plays the instrument without hands.
//!
//! ```text
//! # What follows a number sign is a remark.
//! turn 3            the encoder, so many steps; below 0 to the left
//! press             the button
//! hold              the button, held
//! key L             a key: a letter or sign, or Up, Down, Left, Right, PageUp, PageDown, Home, Enter, Escape, Tab
//! dial warming 2    the encoder of one dial, so many steps
//! wait 500          so many milliseconds go by
//! picture start     a picture is made, and named so
//! ```
//!
//! A script without any `picture` makes one at the start and one after every event.

use crate::session::keys::Key;
use crate::session::{Command, Event};
use crate::water::dials::Dial;

/// One line of a script.
#[derive(Clone, Debug, PartialEq)]
pub(super) enum Act {
    /// Something happens.
    Event(Event, String),
    /// A picture is made.
    Picture(String),
}

/// Why a line cannot be played.
#[derive(Clone, Debug, PartialEq, Eq)]
pub(super) struct BadLine {
    /// Counted from 1.
    pub line: usize,
    /// The message that says why.
    pub message: &'static str,
    /// What stood there.
    pub text: String,
}

/// The words a line may begin with.
const VERBS: [&str; 7] = ["turn", "press", "hold", "key", "dial", "wait", "picture"];

/// Most steps of one turn, and most milliseconds of one wait: an hour.
const MOST: i32 = 3_600_000;

/// Reads a script.
pub(super) fn read(text: &str) -> Result<Vec<Act>, BadLine> {
    let mut acts = Vec::new();
    for (index, line) in text.lines().enumerate() {
        let plain = match line.split_once('#') {
            // The sign itself is no key of the instrument, so that nothing is lost.
            Some((before, _)) => before,
            None => line,
        };
        let words: Vec<&str> = plain.split_whitespace().collect();
        if words.is_empty() {
            continue;
        }
        let bad = |message| BadLine { line: index + 1, message, text: plain.trim().to_owned() };
        acts.push(act(&words).map_err(bad)?);
    }
    Ok(acts)
}

fn act(words: &[&str]) -> Result<Act, &'static str> {
    let number = |text: &str| {
        let number: Option<i32> = text.parse().ok().filter(|number: &i32| number.abs() <= MOST);
        number.ok_or("rehearse-bad-number")
    };
    let named = |event| Ok(Act::Event(event, words.join("-")));
    match words {
        ["turn", steps] => named(Event::Command(Command::Turn(number(steps)?))),
        ["press"] => named(Event::Press),
        ["hold"] => named(Event::LongPress),
        ["key", name] => named(Event::Key(key(name).ok_or("rehearse-bad-key")?)),
        ["dial", name, steps] => {
            let dial = Dial::ALL.into_iter().find(|dial| dial.key() == *name).ok_or("rehearse-bad-dial")?;
            named(Event::TurnDial { dial, detents: number(steps)?, since_ms: u32::MAX })
        }
        ["wait", time] => {
            let elapsed_ms = u32::try_from(number(time)?).map_err(|_| "rehearse-bad-number")?;
            named(Event::Tick { elapsed_ms })
        }
        ["picture", name] if is_name(name) => Ok(Act::Picture((*name).to_owned())),
        ["picture", _] => Err("rehearse-bad-name"),
        [verb, ..] if VERBS.contains(verb) => Err("rehearse-bad-line"),
        _ => Err("rehearse-bad-verb"),
    }
}

/// A name that any system can have as part of a file's.
fn is_name(name: &str) -> bool {
    name.len() <= 40 && name.chars().all(|c| c.is_ascii_alphanumeric() || c == '-' || c == '_')
}

fn key(name: &str) -> Option<Key> {
    Some(match name {
        "Up" => Key::Up,
        "Down" => Key::Down,
        "Left" => Key::Left,
        "Right" => Key::Right,
        "PageUp" => Key::PageUp,
        "PageDown" => Key::PageDown,
        "Home" => Key::Home,
        "Enter" => Key::Enter,
        "Escape" => Key::Escape,
        "Tab" => Key::Tab,
        "BackTab" => Key::BackTab,
        "Space" => Key::Char(' '),
        _ => {
            let mut letters = name.chars();
            let letter = letters.next()?;
            if letters.next().is_some() {
                return None;
            }
            Key::Char(letter)
        }
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_kind_of_line_is_read() {
        let text =
            "# a remark\n\nturn -3\npress # now\nhold\nkey l\nkey PageUp\ndial warming 2\nwait 500\npicture a-1\n";
        let acts = read(text).unwrap();
        assert_eq!(acts.len(), 8);
        assert_eq!(acts[0], Act::Event(Event::Command(Command::Turn(-3)), "turn--3".into()));
        assert_eq!(acts[6], Act::Event(Event::Tick { elapsed_ms: 500 }, "wait-500".into()));
        assert_eq!(acts[7], Act::Picture("a-1".into()));
    }

    #[test]
    fn a_line_that_cannot_be_played_is_named() {
        for (line, message) in [
            ("twist 3", "rehearse-bad-verb"),
            ("turn", "rehearse-bad-line"),
            ("press 2", "rehearse-bad-line"),
            ("turn far", "rehearse-bad-number"),
            ("turn 99999999999", "rehearse-bad-number"),
            ("wait -5", "rehearse-bad-number"),
            ("key Tabulator", "rehearse-bad-key"),
            ("dial heat 2", "rehearse-bad-dial"),
            ("picture ../a", "rehearse-bad-name"),
        ] {
            let bad = read(&format!("press\n{line}\n")).unwrap_err();
            assert_eq!((bad.line, bad.message, bad.text.as_str()), (2, message, line));
        }
    }
}
