//! Keys and mouse of a terminal as hand events.

use std::io;
use std::sync::{Arc, Mutex, PoisonError};
use std::time::{Duration, Instant};

use crossterm::event::{Event, KeyCode, KeyEvent, KeyEventKind, KeyModifiers, MouseButton, MouseEvent, MouseEventKind};

use super::room::Room;
use crate::board::hands::{HandEvent, Key, PointerPhase, Post, press};

/// Where the picture is at present, which the screen sets and the mouse needs.
pub type SharedRoom = Arc<Mutex<Option<Room>>>;

/// Reads the terminal in a thread of its own, which sleeps until something comes.
///
/// # Errors
/// Where the terminal cannot be read, or the system gives no thread.
pub fn listen(post: Post, room: SharedRoom) -> io::Result<()> {
    // From the first question on it hears of changes of size; the thread alone might ask too late for the first one.
    crossterm::event::poll(Duration::ZERO)?;
    std::thread::Builder::new().name("terminal".into()).spawn(move || {
        let mut mouse = Mouse::default();
        loop {
            let Ok(event) = crossterm::event::read() else {
                post.send(HandEvent::Close);
                return;
            };
            let room = *room.lock().unwrap_or_else(PoisonError::into_inner);
            if let Some(event) = translate(event, room, &mut mouse)
                && !post.send(event)
            {
                return;
            }
        }
    })?;
    Ok(())
}

/// Which buttons are down.
#[derive(Debug, Default)]
struct Mouse {
    pointer: bool,
    button: Option<Instant>,
}

fn translate(event: Event, room: Option<Room>, mouse: &mut Mouse) -> Option<HandEvent> {
    match event {
        Event::Key(key) => key_event(key),
        Event::Mouse(event) => mouse.event(event, room),
        Event::Resize(..) => Some(HandEvent::Resize),
        _ => None,
    }
}

fn key_event(event: KeyEvent) -> Option<HandEvent> {
    if event.kind == KeyEventKind::Release {
        return None;
    }
    if event.modifiers.contains(KeyModifiers::CONTROL) {
        return matches!(event.code, KeyCode::Char('c' | 'C' | 'q' | 'Q')).then_some(HandEvent::Close);
    }
    let key = match event.code {
        KeyCode::Up => Key::Up,
        KeyCode::Down => Key::Down,
        KeyCode::Left => Key::Left,
        KeyCode::Right => Key::Right,
        KeyCode::PageUp => Key::PageUp,
        KeyCode::PageDown => Key::PageDown,
        KeyCode::Home => Key::Home,
        KeyCode::End => Key::End,
        KeyCode::Enter => Key::Enter,
        KeyCode::Esc => Key::Escape,
        KeyCode::Tab => Key::Tab,
        KeyCode::BackTab => Key::BackTab,
        KeyCode::Char(letter) => Key::Char(letter),
        _ => return None,
    };
    Some(HandEvent::Key(key))
}

impl Mouse {
    fn event(&mut self, event: MouseEvent, room: Option<Room>) -> Option<HandEvent> {
        let pointer = |phase| {
            let room = room?;
            let (x, y) = room.pixel(event.column, event.row);
            Some(HandEvent::Pointer { phase, x, y, on: room.frame })
        };
        match event.kind {
            MouseEventKind::ScrollUp => Some(HandEvent::Turn(1)),
            MouseEventKind::ScrollDown => Some(HandEvent::Turn(-1)),
            MouseEventKind::Down(MouseButton::Left) => {
                self.pointer = true;
                pointer(PointerPhase::Down)
            }
            MouseEventKind::Drag(MouseButton::Left) if self.pointer => pointer(PointerPhase::Move),
            MouseEventKind::Up(MouseButton::Left) if std::mem::take(&mut self.pointer) => pointer(PointerPhase::Up),
            MouseEventKind::Down(_) => {
                self.button = Some(Instant::now());
                None
            }
            MouseEventKind::Up(_) => self.button.take().map(|since| press(since.elapsed())),
            _ => None,
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::board::size::FrameSize;

    #[test]
    fn control_letters_are_no_letters() {
        let key = |code, modifiers| key_event(KeyEvent::new(code, modifiers));
        assert_eq!(key(KeyCode::Char('c'), KeyModifiers::CONTROL), Some(HandEvent::Close));
        assert_eq!(key(KeyCode::Char('l'), KeyModifiers::CONTROL), None);
        assert_eq!(key(KeyCode::Char('?'), KeyModifiers::SHIFT), Some(HandEvent::Key(Key::Char('?'))));
        assert_eq!(key(KeyCode::F(5), KeyModifiers::NONE), None);
    }

    #[test]
    fn a_drag_is_in_pixels_of_the_frame() {
        let mut mouse = Mouse::default();
        let room = Room::of(80, 24, Some(FrameSize::new(320, 240)));
        let at = |kind, column, row| MouseEvent { kind, column, row, modifiers: KeyModifiers::NONE };
        let left = MouseButton::Left;
        assert_eq!(mouse.event(at(MouseEventKind::Drag(left), 3, 3), room), None);
        let down = mouse.event(at(MouseEventKind::Down(left), 10, 2), room);
        let on = FrameSize::new(320, 240);
        assert_eq!(down, Some(HandEvent::Pointer { phase: PointerPhase::Down, x: 42, y: 25, on }));
        assert_eq!(mouse.event(at(MouseEventKind::Down(left), 10, 2), None), None);
        mouse.event(at(MouseEventKind::Down(MouseButton::Right), 1, 1), room);
        let up = mouse.event(at(MouseEventKind::Up(MouseButton::Right), 1, 1), room);
        assert_eq!(up, Some(HandEvent::Press));
    }
}
