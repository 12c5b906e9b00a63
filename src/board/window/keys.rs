//! Keys of a desktop as ours.

use winit::event::{MouseScrollDelta, TouchPhase};
use winit::keyboard::{Key as WinitKey, ModifiersState, NamedKey};

use crate::board::hands::{HandEvent, Key, PointerPhase};

/// What a key press means; `None` for one without a meaning.
pub fn of_key(key: &WinitKey, held: ModifiersState) -> Option<HandEvent> {
    if held.control_key() || held.super_key() {
        let letter =
            matches!(key, WinitKey::Character(text) if ["c", "q", "w"].contains(&text.to_lowercase().as_str()));
        return letter.then_some(HandEvent::Close);
    }
    if held.alt_key() && !matches!(key, WinitKey::Character(_)) {
        return None;
    }
    let key = match key {
        WinitKey::Named(named) => match named {
            NamedKey::ArrowUp => Key::Up,
            NamedKey::ArrowDown => Key::Down,
            NamedKey::ArrowLeft => Key::Left,
            NamedKey::ArrowRight => Key::Right,
            NamedKey::PageUp => Key::PageUp,
            NamedKey::PageDown => Key::PageDown,
            NamedKey::Home => Key::Home,
            NamedKey::End => Key::End,
            NamedKey::Enter => Key::Enter,
            NamedKey::Escape => Key::Escape,
            NamedKey::Space => Key::Char(' '),
            NamedKey::Tab if held.shift_key() => Key::BackTab,
            NamedKey::Tab => Key::Tab,
            _ => return None,
        },
        WinitKey::Character(text) => Key::Char(text.chars().next()?),
        _ => return None,
    };
    Some(HandEvent::Key(key))
}

/// Where a touch is.
pub fn of_touch(phase: TouchPhase) -> PointerPhase {
    match phase {
        TouchPhase::Started => PointerPhase::Down,
        TouchPhase::Moved => PointerPhase::Move,
        TouchPhase::Ended | TouchPhase::Cancelled => PointerPhase::Up,
    }
}

/// Adds up the wheel: a wheel with notches gives a detent each, a smooth one a detent for about a line.
#[derive(Debug, Default)]
pub struct Wheel {
    rest: f64,
}

/// Pixels that a smooth wheel moves for one detent.
const PIXELS_A_DETENT: f64 = 40.0;

impl Wheel {
    /// The detents that are complete.
    pub fn turn(&mut self, delta: MouseScrollDelta) -> Option<HandEvent> {
        let moved = match delta {
            MouseScrollDelta::LineDelta(_, down) => f64::from(down),
            MouseScrollDelta::PixelDelta(place) => place.y / PIXELS_A_DETENT,
        };
        if !moved.is_finite() {
            return None;
        }
        self.rest += moved;
        let whole = libm::trunc(self.rest);
        self.rest -= whole;
        let detents = whole as i32;
        (detents != 0).then_some(HandEvent::Turn(detents))
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use winit::dpi::PhysicalPosition;
    use winit::keyboard::SmolStr;

    fn letter(text: &str) -> WinitKey {
        WinitKey::Character(SmolStr::new(text))
    }

    #[test]
    fn letters_and_signs_come_as_typed() {
        let none = ModifiersState::empty();
        assert_eq!(of_key(&letter("?"), ModifiersState::SHIFT), Some(HandEvent::Key(Key::Char('?'))));
        assert_eq!(of_key(&WinitKey::Named(NamedKey::Space), none), Some(HandEvent::Key(Key::Char(' '))));
        assert_eq!(of_key(&WinitKey::Named(NamedKey::Tab), ModifiersState::SHIFT), Some(HandEvent::Key(Key::BackTab)));
        assert_eq!(of_key(&letter("q"), none), Some(HandEvent::Key(Key::Char('q'))));
        assert_eq!(of_key(&letter("Q"), ModifiersState::CONTROL | ModifiersState::SHIFT), Some(HandEvent::Close));
        assert_eq!(of_key(&letter("l"), ModifiersState::CONTROL), None);
        assert_eq!(of_key(&WinitKey::Named(NamedKey::Tab), ModifiersState::ALT), None);
    }

    #[test]
    fn a_smooth_wheel_adds_up() {
        let mut wheel = Wheel::default();
        let pixels = |y| MouseScrollDelta::PixelDelta(PhysicalPosition::new(0.0, y));
        assert_eq!(wheel.turn(MouseScrollDelta::LineDelta(0.0, -2.0)), Some(HandEvent::Turn(-2)));
        assert_eq!(wheel.turn(pixels(30.0)), None);
        assert_eq!(wheel.turn(pixels(30.0)), Some(HandEvent::Turn(1)));
        assert_eq!(wheel.turn(pixels(-20.0)), None);
        assert_eq!(wheel.turn(pixels(f64::NAN)), None);
    }
}
