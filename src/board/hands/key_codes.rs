//! The kernel's numbers for events, axes and keys (Linux, `input-event-codes.h`, from memory), and what keys mean here.

use super::Key;

/// Kinds of event.
pub(super) const SYNCHRONISATION: u16 = 0;
pub(super) const KEY: u16 = 1;
pub(super) const RELATIVE: u16 = 2;
pub(super) const ABSOLUTE: u16 = 3;

/// Codes of a synchronisation.
pub(super) const REPORT: u16 = 0;
pub(super) const DROPPED: u16 = 3;

/// Relative axes that are a knob or a wheel.
pub(super) const REL_X: u16 = 0;
pub(super) const REL_HORIZONTAL_WHEEL: u16 = 6;
pub(super) const REL_DIAL: u16 = 7;
pub(super) const REL_WHEEL: u16 = 8;

/// Absolute axes.
pub(super) const ABS_X: u16 = 0;
pub(super) const ABS_Y: u16 = 1;
pub(super) const ABS_SLOT: u16 = 47;
pub(super) const ABS_MANY_X: u16 = 53;
pub(super) const ABS_MANY_Y: u16 = 54;
pub(super) const ABS_TRACKING: u16 = 57;

/// A finger is on the glass.
pub(super) const TOUCH: u16 = 330;
/// Letters that every keyboard has and no row of buttons: Q and P.
#[cfg(all(feature = "board", target_os = "linux"))]
pub(super) const LETTERS: (u16, u16) = (16, 25);

pub(super) const LEFT_SHIFT: u16 = 42;
pub(super) const RIGHT_SHIFT: u16 = 54;

const ENTER: u16 = 28;
const SPACE: u16 = 57;
const KEYPAD_ENTER: u16 = 96;

/// The letters of the three rows, by the place of the key on a keyboard of the United States.
const ROWS: [(u16, &str); 3] = [(16, "qwertyuiop"), (30, "asdfghjkl"), (44, "zxcvbnm")];
/// Further signs: alone and with shift.
const SIGNS: [(u16, char, char); 6] =
    [(12, '-', '_'), (13, '=', '+'), (26, '[', '{'), (27, ']', '}'), (51, ',', '<'), (52, '.', '>')];
const NAMED: [(u16, Key); 13] = [
    (1, Key::Escape),
    (ENTER, Key::Enter),
    (SPACE, Key::Char(' ')),
    (KEYPAD_ENTER, Key::Enter),
    (102, Key::Home),
    (103, Key::Up),
    (104, Key::PageUp),
    (105, Key::Left),
    (106, Key::Right),
    (107, Key::End),
    (108, Key::Down),
    (109, Key::PageDown),
    (78, Key::Char('+')),
];

/// What a key means; `None` for one without a meaning here.
pub(super) fn key_of(code: u16, shift: bool) -> Option<Key> {
    match code {
        15 if shift => return Some(Key::BackTab),
        15 => return Some(Key::Tab),
        53 => return Some(if shift { Key::Char('?') } else { Key::Char('/') }),
        74 => return Some(Key::Char('-')),
        // The row of digits begins with 1 and ends with 0.
        2..=11 if !shift => return char::from_digit(u32::from(code - 1) % 10, 10).map(Key::Char),
        _ => {}
    }
    if let Some((_, key)) = NAMED.iter().find(|(other, _)| *other == code) {
        return Some(*key);
    }
    if let Some((_, alone, shifted)) = SIGNS.iter().find(|(other, _, _)| *other == code) {
        return Some(Key::Char(if shift { *shifted } else { *alone }));
    }
    ROWS.iter().find_map(|(first, letters)| letters.chars().nth(code.checked_sub(*first)?.into())).map(Key::Char)
}

/// Whether a key is what the button of a knob is, on a device that is no keyboard.
pub(super) fn is_button(code: u16) -> bool {
    matches!(code, ENTER | SPACE | KEYPAD_ENTER) || key_of(code, false).is_none()
}

/// Whether a key that is held does the same again and again.
pub(super) fn repeats(key: Key) -> bool {
    match key {
        Key::Up | Key::Down | Key::Left | Key::Right | Key::PageUp | Key::PageDown => true,
        Key::Char(sign) => matches!(sign, '+' | '-' | ',' | '.' | '<' | '>' | '[' | ']'),
        _ => false,
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn keys_mean_what_is_printed_on_them() {
        let named = [(16, 'q'), (25, 'p'), (38, 'l'), (50, 'm'), (2, '1'), (11, '0'), (51, ','), (57, ' ')];
        for (code, sign) in named {
            assert_eq!(key_of(code, false), Some(Key::Char(sign)), "{code}");
        }
        assert_eq!(key_of(51, true), Some(Key::Char('<')));
        assert_eq!(key_of(53, true), Some(Key::Char('?')));
        assert_eq!((key_of(15, true), key_of(15, false)), (Some(Key::BackTab), Some(Key::Tab)));
        assert_eq!((key_of(116, false), key_of(0, false), key_of(u16::MAX, true)), (None, None, None));
        assert!(is_button(116) && is_button(28) && !is_button(103));
    }
}
