//! The rows of a file as they stand in it, with a way back from each value to its line and column.

use chrono::NaiveDate;

use super::cells::{Cell, split_cells};
use super::notes::shown;
use super::plan::ColumnPlan;
use crate::place::problem::Location;

/// The lines of a file and how they are cut into cells.
pub(super) struct Sheet<'t> {
    pub(super) file: &'t std::path::Path,
    pub(super) lines: Vec<&'t str>,
    pub(super) delimiter: char,
}

impl<'t> Sheet<'t> {
    /// The place of bytes `start` to `end` of the line with this index.
    pub(super) fn at_bytes(&self, line: usize, start: usize, end: usize) -> Location {
        let text = self.lines.get(line).copied().unwrap_or("");
        let column = text.get(..start).map_or(0, |before| before.chars().count() + 1);
        let length = text.get(start..end).map_or(0, |meant| meant.chars().count());
        Location { file: self.file.to_path_buf(), line: line + 1, column, length }
    }

    /// The place of a cell; of the whole line where the line has no such cell.
    pub(super) fn at_cell(&self, line: usize, cell: usize) -> Location {
        match self.cell(line, cell) {
            Some(cell) => self.at_bytes(line, cell.start, cell.end),
            None => Location { file: self.file.to_path_buf(), line: line + 1, column: 0, length: 0 },
        }
    }

    /// A cell, cut out anew: only messages need it again.
    pub(super) fn cell(&self, line: usize, cell: usize) -> Option<Cell<'t>> {
        let mut cells = Vec::new();
        split_cells(self.lines.get(line)?, self.delimiter, &mut cells).ok()?;
        (cell < cells.len()).then(|| cells.swap_remove(cell))
    }
}

/// What a cell was.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum CellState {
    /// A value.
    Measured,
    /// Empty, or a declared mark for missing.
    Missing,
    /// Not readable; a problem was noted.
    Unreadable,
}

/// One planned column, row by row.
pub(super) struct Readings<'p> {
    pub(super) plan: &'p ColumnPlan,
    /// Which cell of a line it is.
    pub(super) cell: usize,
    /// In the measure's own unit; NaN where not measured.
    pub(super) values: Vec<f64>,
    pub(super) states: Vec<CellState>,
}

impl Readings<'_> {
    /// The measured values with their rows.
    pub(super) fn measured(&self) -> impl Iterator<Item = (usize, f64)> + '_ {
        self.values.iter().copied().enumerate().filter(|(row, _)| self.states[*row] == CellState::Measured)
    }
}

/// All rows of a file in the file's order.
pub(super) struct Table<'t, 'p> {
    pub(super) sheet: Sheet<'t>,
    /// The line (index) of each row.
    pub(super) lines: Vec<usize>,
    /// The date of each row, where readable.
    pub(super) dates: Vec<Option<NaiveDate>>,
    /// The cell where a row's date starts.
    pub(super) date_cell: usize,
    pub(super) columns: Vec<Readings<'p>>,
}

impl Table<'_, '_> {
    /// Where the value of a column in a row stands.
    pub(super) fn at(&self, column: &Readings, row: usize) -> Location {
        self.sheet.at_cell(self.lines[row], column.cell)
    }

    /// Where a row's date stands.
    pub(super) fn at_date(&self, row: usize) -> Location {
        self.sheet.at_cell(self.lines[row], self.date_cell)
    }

    /// A value as the file writes it.
    pub(super) fn text(&self, column: &Readings, row: usize) -> String {
        self.sheet.cell(self.lines[row], column.cell).map(|cell| shown(&cell.text)).unwrap_or_default()
    }

    /// A row's date as the file writes it.
    pub(super) fn date_text(&self, row: usize) -> String {
        self.sheet.cell(self.lines[row], self.date_cell).map(|cell| shown(&cell.text)).unwrap_or_default()
    }

    /// The line number of a row, from 1.
    pub(super) fn line_number(&self, row: usize) -> usize {
        self.lines[row] + 1
    }
}
