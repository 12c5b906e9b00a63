//! Writes cells to a terminal, only those that changed.

use std::io::{self, Write};

use super::ability::ColourDepth;
use super::cells::Cell;
use super::colours::{Layer, Rgb, write as write_colour};

/// Remembers what the terminal shows.
#[derive(Debug, Default)]
pub struct Painter {
    shown: Vec<Cell>,
    columns: usize,
    /// Colours that the terminal writes with at present; `None` where that is not known.
    ink: Option<Rgb>,
    ground: Option<Rgb>,
}

impl Painter {
    /// Forgets what is shown, so that the next time every cell is written.
    pub fn forget(&mut self) {
        self.shown.clear();
        self.ink = None;
        self.ground = None;
    }

    /// Makes the terminal show `cells`, rows of `columns` from the left top corner. Gives back how many were written.
    ///
    /// # Errors
    /// Where the terminal is gone.
    pub fn show(
        &mut self,
        out: &mut impl Write,
        cells: Vec<Cell>,
        columns: usize,
        depth: ColourDepth,
    ) -> io::Result<usize> {
        if self.columns != columns || self.shown.len() != cells.len() {
            self.forget();
            out.write_all(b"\x1b[0m\x1b[2J")?;
        }
        let mut written = 0;
        let mut at = None;
        for (index, cell) in cells.iter().enumerate() {
            if self.shown.get(index).is_some_and(|shown| looks_the_same(shown, cell)) {
                continue;
            }
            let (row, column) = (index / columns, index % columns);
            if at != Some(index) || column == 0 {
                write!(out, "\x1b[{};{}H", row + 1, column + 1)?;
            }
            self.write(out, cell, depth)?;
            at = Some(index + 1);
            written += 1;
        }
        self.shown = cells;
        self.columns = columns;
        out.flush()?;
        Ok(written)
    }

    fn write(&mut self, out: &mut impl Write, cell: &Cell, depth: ColourDepth) -> io::Result<()> {
        if self.ground != Some(cell.ground) {
            write_colour(out, cell.ground, Layer::Ground, depth)?;
            self.ground = Some(cell.ground);
        }
        // A blank shows no ink.
        if cell.symbol != ' ' && self.ink != Some(cell.ink) {
            write_colour(out, cell.ink, Layer::Ink, depth)?;
            self.ink = Some(cell.ink);
        }
        write!(out, "{}", cell.symbol)
    }
}

fn looks_the_same(one: &Cell, other: &Cell) -> bool {
    one.symbol == other.symbol && one.ground == other.ground && (one.symbol == ' ' || one.ink == other.ink)
}

#[cfg(test)]
mod tests {
    use super::*;

    const PAPER: Cell = Cell::blank([250, 250, 240]);

    fn show(painter: &mut Painter, cells: &[Cell]) -> (usize, String) {
        let mut out = Vec::new();
        let written = painter.show(&mut out, cells.to_vec(), 4, ColourDepth::True).unwrap();
        (written, String::from_utf8(out).unwrap())
    }

    #[test]
    fn only_changed_cells_are_written() {
        let mut painter = Painter::default();
        let mut cells = [PAPER; 12];
        let (written, text) = show(&mut painter, &cells);
        assert_eq!((written, text.matches("\x1b[2J").count()), (12, 1));
        assert_eq!(show(&mut painter, &cells), (0, String::new()));
        cells[6] = Cell { symbol: '½', ink: [0; 3], ground: [250, 250, 240] };
        // The ground is still the same, so only the place, the ink and the letter go out.
        assert_eq!(show(&mut painter, &cells), (1, "\x1b[2;3H\x1b[38;2;0;0;0m½".to_owned()));
        painter.forget();
        assert_eq!(show(&mut painter, &cells).0, 12);
    }
}
