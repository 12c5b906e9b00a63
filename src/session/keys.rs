//! The key table, as data: what the window and the terminal obey, the help card shows and the README prints.

use super::command::Command;

/// A key, by what is printed on it. Letters are given in lower case; [`command_of`] takes either.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
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
    /// Enter.
    Enter,
    /// Escape.
    Escape,
    /// Tab.
    Tab,
    /// Tab with shift.
    BackTab,
    /// A letter, digit, sign or the space bar.
    Char(char),
}

/// A row of the table.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct KeyRow {
    /// The key.
    pub key: Key,
    /// What it does.
    pub command: Command,
    /// The message that says so; neighbouring rows with the same one are one line of the help card.
    pub message: &'static str,
}

const fn row(key: Key, command: Command, message: &'static str) -> KeyRow {
    KeyRow { key, command, message }
}

/// Steps of a page key.
pub(super) const PAGE: i32 = 5;
/// Days of the longer day keys.
const WEEK: i32 = 7;

/// Every key.
pub const KEYS: [KeyRow; 40] = [
    row(Key::Up, Command::Turn(1), "key-turn"),
    row(Key::Down, Command::Turn(-1), "key-turn"),
    row(Key::PageUp, Command::Turn(PAGE), "key-turn-far"),
    row(Key::PageDown, Command::Turn(-PAGE), "key-turn-far"),
    row(Key::Left, Command::StepDial(-1), "key-dial"),
    row(Key::Right, Command::StepDial(1), "key-dial"),
    row(Key::Home, Command::DialToRest, "key-dial-to-rest"),
    row(Key::Enter, Command::Press, "key-press"),
    row(Key::Escape, Command::Close, "key-close"),
    row(Key::Tab, Command::StepView(1), "key-view"),
    row(Key::BackTab, Command::StepView(-1), "key-view"),
    row(Key::Char('1'), Command::ShowNumber(0), "key-view-number"),
    row(Key::Char('2'), Command::ShowNumber(1), "key-view-number"),
    row(Key::Char('3'), Command::ShowNumber(2), "key-view-number"),
    row(Key::Char('4'), Command::ShowNumber(3), "key-view-number"),
    row(Key::Char('5'), Command::ShowNumber(4), "key-view-number"),
    row(Key::Char('6'), Command::ShowNumber(5), "key-view-number"),
    row(Key::Char('7'), Command::ShowNumber(6), "key-view-number"),
    row(Key::Char('8'), Command::ShowNumber(7), "key-view-number"),
    row(Key::Char('9'), Command::ShowNumber(8), "key-view-number"),
    row(Key::Char(' '), Command::PlayOrPause, "key-play"),
    row(Key::Char(','), Command::StepDay(-1), "key-day"),
    row(Key::Char('.'), Command::StepDay(1), "key-day"),
    row(Key::Char('<'), Command::StepDay(-WEEK), "key-week"),
    row(Key::Char('>'), Command::StepDay(WEEK), "key-week"),
    row(Key::Char('['), Command::StepYear(-1), "key-year"),
    row(Key::Char(']'), Command::StepYear(1), "key-year"),
    row(Key::Char('-'), Command::StepYear(-1), "key-year"),
    row(Key::Char('+'), Command::StepYear(1), "key-year"),
    row(Key::Char('y'), Command::NextThird, "key-third"),
    row(Key::Char('k'), Command::Keep, "key-keep"),
    row(Key::Char('s'), Command::Settings, "key-settings"),
    row(Key::Char('z'), Command::Undo, "key-undo"),
    row(Key::Char('r'), Command::Reset, "key-reset"),
    row(Key::Char('l'), Command::NextVoice, "key-language"),
    row(Key::Char('u'), Command::OtherUnits, "key-units"),
    row(Key::Char('t'), Command::NextShade, "key-shade"),
    row(Key::Char('w'), Command::Words, "key-words"),
    row(Key::Char('h'), Command::Help, "key-help"),
    row(Key::Char('?'), Command::Help, "key-help"),
];

/// What a key does; `None` for a key without a meaning.
pub fn command_of(key: Key) -> Option<Command> {
    let key = match key {
        Key::Char(letter) => Key::Char(letter.to_ascii_lowercase()),
        other => other,
    };
    KEYS.iter().find(|row| row.key == key).map(|row| row.command)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_key_has_one_meaning_and_a_line_of_help_is_one_block() {
        for (index, row) in KEYS.iter().enumerate() {
            assert!(!KEYS[..index].iter().any(|other| other.key == row.key), "{:?}", row.key);
            assert_eq!(command_of(row.key), Some(row.command));
            let first = KEYS.iter().position(|other| other.message == row.message).unwrap();
            assert!(KEYS[first..=index].iter().all(|other| other.message == row.message), "{}", row.message);
        }
        assert_eq!(command_of(Key::Char('Z')), Some(Command::Undo));
        assert_eq!(command_of(Key::Char('ñ')), None);
    }
}
