//! The key table as the help card draws it.

use super::keys::{KEYS, Key};
use crate::picture::views::help::{KeyCap, KeyLine};

/// One line for every message of the table, in its order.
pub fn key_lines() -> Vec<KeyLine> {
    let mut lines: Vec<KeyLine> = Vec::new();
    for row in &KEYS {
        match lines.last_mut().filter(|line| line.message == row.message) {
            Some(line) => line.keys.push(cap(row.key)),
            None => lines.push(KeyLine { keys: vec![cap(row.key)], message: row.message }),
        }
    }
    lines
}

fn cap(key: Key) -> KeyCap {
    match key {
        Key::Up => KeyCap::Named("key-name-up"),
        Key::Down => KeyCap::Named("key-name-down"),
        Key::Left => KeyCap::Named("key-name-left"),
        Key::Right => KeyCap::Named("key-name-right"),
        Key::PageUp => KeyCap::Named("key-name-page-up"),
        Key::PageDown => KeyCap::Named("key-name-page-down"),
        Key::Home => KeyCap::Named("key-name-home"),
        Key::Enter => KeyCap::Named("key-name-enter"),
        Key::Escape => KeyCap::Named("key-name-escape"),
        Key::Tab => KeyCap::Named("key-name-tab"),
        Key::BackTab => KeyCap::Named("key-name-back-tab"),
        Key::Char(' ') => KeyCap::Named("key-name-space"),
        Key::Char(letter) => KeyCap::Char(letter),
    }
}
