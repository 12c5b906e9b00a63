//! The terminal as a screen: real letters over a picture of coloured part-cells.
//!
//! A picture reduced to the dots of a terminal cannot be read: 80 × 24 cells are at best 160 × 72 dots. So a view is
//! drawn at a layout's own size, its pixels are gathered into quadrants of a cell, and every text that the view set is
//! written again in the terminal's own letters where it stood ([`PlacedText`](super::PlacedText)). A letter takes one
//! cell, which is about what a letter of the small layouts takes; 80 × 24 cells carry the view of 320 × 240 pixels, and
//! larger terminals carry larger layouts ([`Room`]). The last row holds the most needed keys.
//!
//! Only changed cells are sent, so a login over a slow line stays usable; colours degrade to 256 and to 16
//! ([`Ability`]). The terminal is given back as it was after a normal end, a panic, and a signal.

mod ability;
mod cells;
mod colours;
mod guard;
mod input;
mod letters;
mod painter;
mod room;

use std::io::{self, BufWriter, Stdout, Write};
use std::sync::PoisonError;

use embedded_graphics::primitives::Rectangle;

pub use ability::{Ability, ColourDepth, GRAIN_VARIABLE, Grain};
use cells::Cell;
use guard::Guard;
use input::SharedRoom;
use painter::Painter;
pub use room::Room;

use super::choose::ScreenKind;
use super::hands::Post;
use super::screen::{Caption, Frame, Screen, ScreenError};
use super::size::FrameSize;

/// Around a picture that does not fill the terminal.
const SURROUND: [u8; 3] = [0, 0, 0];
/// Letters of the hint and of notices.
const HINT_INK: [u8; 3] = [220, 220, 220];
/// Shown to the instrument while the terminal is too small for any layout.
const WHILE_TOO_SMALL: FrameSize = super::LAYOUTS[0];

/// The terminal that standard input and output belong to.
#[derive(Debug)]
pub struct Terminal {
    ability: Ability,
    asked: Option<FrameSize>,
    out: BufWriter<Stdout>,
    painter: Painter,
    room: SharedRoom,
    picture: Vec<Cell>,
    picture_room: Option<Room>,
    hint: String,
    too_small: String,
    // Last, so that nothing is written after the terminal was given back.
    guard: Guard,
}

impl Terminal {
    /// Takes the terminal over and posts its keys. Where `asked`, only that layout is shown.
    ///
    /// # Errors
    /// [`ScreenError`] where there is no terminal.
    pub fn open(ability: Ability, asked: Option<FrameSize>, post: &Post) -> Result<Self, ScreenError> {
        let room = SharedRoom::default();
        let guard = Guard::enter().map_err(failed)?;
        guard::heed_signals(post.clone()).map_err(failed)?;
        input::listen(post.clone(), room.clone()).map_err(failed)?;
        Ok(Self {
            ability,
            asked,
            out: BufWriter::new(io::stdout()),
            painter: Painter::default(),
            room,
            picture: Vec::new(),
            picture_room: None,
            hint: String::new(),
            too_small: String::new(),
            guard,
        })
    }

    fn room_now(&self) -> Option<Room> {
        let (columns, rows) = cell_counts();
        Room::of(columns, rows.saturating_sub(1), self.asked)
    }

    /// Lays picture, surround and hint out and writes what changed.
    fn show(&mut self) -> io::Result<()> {
        if !self.guard.holds() {
            return Err(io::ErrorKind::BrokenPipe.into());
        }
        let (columns, rows) = cell_counts();
        let (wide, high) = (usize::from(columns), usize::from(rows));
        let mut all = vec![Cell::blank(SURROUND); wide * high];
        match self.picture_room {
            Some(room) => {
                let (left, top) = (usize::from(room.left), usize::from(room.top));
                for (row, cells) in self.picture.chunks(usize::from(room.columns)).enumerate() {
                    let start = (top + row) * wide + left;
                    // The terminal may have become smaller meanwhile; the next event tells.
                    if let Some(target) = all.get_mut(start..start + cells.len()) {
                        target.copy_from_slice(cells);
                    }
                }
                write_row(&mut all, wide, high.saturating_sub(1), &self.hint);
            }
            None => {
                for (row, line) in self.too_small.lines().enumerate() {
                    write_row(&mut all, wide, row, line);
                }
            }
        }
        self.painter.show(&mut self.out, all, wide, self.ability.depth)?;
        Ok(())
    }
}

impl Screen for Terminal {
    fn kind(&self) -> ScreenKind {
        ScreenKind::Terminal
    }

    fn size(&self) -> FrameSize {
        self.room_now().map_or(WHILE_TOO_SMALL, |room| room.frame)
    }

    fn wants_texts(&self) -> bool {
        true
    }

    fn present(&mut self, frame: &Frame<'_>, changed: &[Rectangle]) -> Result<(), ScreenError> {
        // Which cells changed shows when they are compared; whole rows of them are as quick as boxes of pixels.
        let _ = changed;
        let room = self.room_now().filter(|room| room.frame == frame.size);
        self.picture = room.map(|room| cells::cells(frame, &room, self.ability.grain)).unwrap_or_default();
        self.picture_room = room;
        *self.room.lock().unwrap_or_else(PoisonError::into_inner) = room;
        self.show().map_err(failed)
    }

    fn caption(&mut self, caption: &Caption<'_>) -> Result<(), ScreenError> {
        self.hint = caption.hint.to_owned();
        self.too_small = caption.too_small.to_owned();
        if !self.guard.holds() {
            return Err(failed(io::ErrorKind::BrokenPipe.into()));
        }
        // The title of the terminal's own window (OSC 2); control letters would end it early.
        let title: String = caption.title.chars().filter(|letter| !letter.is_control()).collect();
        write!(self.out, "\x1b]2;{title}\x07").map_err(failed)?;
        self.show().map_err(failed)
    }
}

fn write_row(cells: &mut [Cell], columns: usize, row: usize, text: &str) {
    let start = (row * columns).min(cells.len());
    let room = cells[start..].iter_mut().take(columns);
    for (cell, symbol) in room.zip(text.chars().filter(|letter| !letter.is_control())) {
        *cell = Cell { symbol, ink: HINT_INK, ground: SURROUND };
    }
}

/// Columns and rows; what every terminal has at least where the system does not know.
fn cell_counts() -> (u16, u16) {
    match crossterm::terminal::size() {
        Ok((columns, rows)) if columns > 0 && rows > 0 => (columns, rows),
        _ => (80, 24),
    }
}

fn failed(error: io::Error) -> ScreenError {
    ScreenError::new(ScreenKind::Terminal, error)
}
