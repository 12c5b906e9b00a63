//! What the hands do, as the kiosk has to know it.

use std::time::Duration;

use crate::board::{HandEvent, Key, PointerPhase};
use crate::session::kiosk::Hand;

/// A finger held in the corner so long asks for the staff menu.
const CORNER_HELD: Duration = Duration::from_secs(4);
/// The corner is this part of either side.
const CORNER_PARTS: i32 = 6;

/// Fingers that are down.
#[derive(Debug, Default)]
pub(super) struct Fingers {
    in_corner: Option<Duration>,
}

impl Fingers {
    /// The same event for the kiosk; `None` for what no hand did. `in_menu`: the thirds of the screen are the knob.
    pub fn hand(&mut self, event: HandEvent, in_menu: bool) -> Option<Hand> {
        Some(match event {
            HandEvent::Turn(detents) => Hand::Turn(detents),
            HandEvent::TurnDial { .. } | HandEvent::SetDial { .. } => Hand::Other,
            HandEvent::Press => Hand::Press,
            HandEvent::LongPress => Hand::Hold,
            HandEvent::Key(key) => match key {
                Key::Up | Key::Right if in_menu => Hand::Turn(1),
                Key::Down | Key::Left if in_menu => Hand::Turn(-1),
                Key::Enter => Hand::Enter,
                Key::Escape => Hand::Back,
                Key::End => Hand::StaffKey,
                Key::Char(letter) => letter.to_digit(10).map_or(Hand::Other, |digit| Hand::Digit(digit as u8)),
                _ => Hand::Other,
            },
            HandEvent::Pointer { phase, x, y, on } => {
                let (wide, high) = (i32::from(on.width), i32::from(on.height));
                let in_corner = x < wide / CORNER_PARTS && y < high / CORNER_PARTS;
                match phase {
                    PointerPhase::Down => self.in_corner = in_corner.then_some(Duration::ZERO),
                    PointerPhase::Move if in_corner => {}
                    PointerPhase::Move | PointerPhase::Up => self.in_corner = None,
                }
                match phase {
                    PointerPhase::Up if in_menu && x < wide / 3 => Hand::Turn(-1),
                    PointerPhase::Up if in_menu && x >= wide - wide / 3 => Hand::Turn(1),
                    PointerPhase::Up if in_menu => Hand::Press,
                    _ => Hand::Other,
                }
            }
            HandEvent::Time(gone_by) => {
                let held = self.in_corner.as_mut()?;
                *held = held.saturating_add(gone_by);
                if *held < CORNER_HELD {
                    return None;
                }
                self.in_corner = None;
                Hand::Corner
            }
            HandEvent::Resize | HandEvent::Close => return None,
        })
    }

    /// When a finger in the corner wants to be looked at again.
    pub fn due(&self) -> Option<Duration> {
        self.in_corner.map(|held| CORNER_HELD.saturating_sub(held).max(Duration::from_millis(50)))
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::board::FrameSize;

    const ON: FrameSize = FrameSize::new(320, 240);

    fn at(phase: PointerPhase, x: i32, y: i32) -> HandEvent {
        HandEvent::Pointer { phase, x, y, on: ON }
    }

    #[test]
    fn a_finger_held_in_the_corner_knocks_once() {
        let mut fingers = Fingers::default();
        let second = HandEvent::Time(Duration::from_secs(1));
        assert_eq!(fingers.hand(second, false), None);
        assert_eq!(fingers.hand(at(PointerPhase::Down, 20, 20), false), Some(Hand::Other));
        let knocks = [(); 6].map(|()| fingers.hand(second, false));
        assert_eq!(knocks, [None, None, None, Some(Hand::Corner), None, None]);
        fingers.hand(at(PointerPhase::Down, 20, 20), false);
        fingers.hand(at(PointerPhase::Move, 200, 20), false);
        assert_eq!([(); 6].map(|()| fingers.hand(second, false)), [None; 6], "it went away");
    }

    #[test]
    fn in_the_menu_the_thirds_of_the_screen_are_the_knob() {
        let mut fingers = Fingers::default();
        let mut tap = |x| fingers.hand(at(PointerPhase::Up, x, 120), true);
        assert_eq!([tap(5), tap(160), tap(310)], [Hand::Turn(-1), Hand::Press, Hand::Turn(1)].map(Some));
        assert_eq!(fingers.hand(at(PointerPhase::Up, 5, 120), false), Some(Hand::Other));
    }

    #[test]
    fn digits_and_arrows_work_the_menu() {
        let mut fingers = Fingers::default();
        assert_eq!(fingers.hand(HandEvent::Key(Key::Char('7')), true), Some(Hand::Digit(7)));
        assert_eq!(fingers.hand(HandEvent::Key(Key::Up), true), Some(Hand::Turn(1)));
        assert_eq!(fingers.hand(HandEvent::Key(Key::Up), false), Some(Hand::Other));
        assert_eq!(fingers.hand(HandEvent::Key(Key::End), false), Some(Hand::StaffKey));
    }
}
