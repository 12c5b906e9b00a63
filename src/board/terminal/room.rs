//! Which layout goes into how many cells, and which pixel lies in which cell.
//!
//! The picture is drawn at a layout's own size and its pixels are gathered into cells, but its texts are put there as
//! real letters. A letter takes one cell, so a layout fits where a cell covers no more pixels than its smallest type
//! takes for a letter. That is why 80 × 24 cells, which are only 160 × 48 dots, can carry the layout of 320 × 240 pixels.

use crate::board::size::{FrameSize, LAYOUTS};

/// The smallest type of each of [`LAYOUTS`] in pixels.
const SMALLEST_TYPE: [f64; 7] = [9.0, 9.0, 9.0, 10.0, 12.0, 15.0, 22.0];
/// Pixels across that a cell may cover, for each pixel of type: a mean letter is about so wide.
const ACROSS: f64 = 0.5;
/// Pixels down that a cell may cover, for each pixel of type: lines stand a little further apart.
const DOWN: f64 = 1.21;
/// A cell is about twice as high as wide. Pictures may be stretched a little to fill the terminal.
const LEAST_HIGH_TO_WIDE: f64 = 1.6;
const MOST_HIGH_TO_WIDE: f64 = 2.8;

/// A block of cells and the frame that it shows.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Room {
    /// The frame.
    pub frame: FrameSize,
    /// Cells across.
    pub columns: u16,
    /// Cells down.
    pub rows: u16,
    /// Empty columns before it.
    pub left: u16,
    /// Empty rows above it.
    pub top: u16,
}

impl Room {
    /// The largest layout that can be read in `columns` × `rows` cells, or `None` where not even the smallest can. Where
    /// `asked`, only that one.
    pub fn of(columns: u16, rows: u16, asked: Option<FrameSize>) -> Option<Self> {
        let (wide, high) = (f64::from(columns), f64::from(rows));
        let can = |index: &usize| {
            let (frame, type_px) = (LAYOUTS[*index], SMALLEST_TYPE[*index]);
            asked.is_none_or(|asked| asked == frame)
                && f64::from(frame.width) <= wide * type_px * ACROSS
                && f64::from(frame.height) <= high * type_px * DOWN
        };
        let frame = LAYOUTS[(0..LAYOUTS.len()).filter(can).max_by_key(|&index| LAYOUTS[index].pixels())?];
        let (across, down) = (f64::from(frame.width) / wide, f64::from(frame.height) / high);
        let (mut used_columns, mut used_rows) = (columns, rows);
        if down > across * MOST_HIGH_TO_WIDE {
            used_columns = (f64::from(frame.width) * MOST_HIGH_TO_WIDE / down) as u16;
        } else if down < across * LEAST_HIGH_TO_WIDE {
            used_rows = (f64::from(frame.height) / (across * LEAST_HIGH_TO_WIDE)) as u16;
        }
        let (columns_used, rows_used) = (used_columns.clamp(1, columns), used_rows.clamp(1, rows));
        Some(Self {
            frame,
            columns: columns_used,
            rows: rows_used,
            left: (columns - columns_used) / 2,
            top: (rows - rows_used) / 2,
        })
    }

    /// The first pixel of a column, or of the one after the last.
    pub fn x_of(&self, column: usize) -> usize {
        column * usize::from(self.frame.width) / usize::from(self.columns)
    }

    /// The first pixel of a row, or of the one after the last.
    pub fn y_of(&self, row: usize) -> usize {
        row * usize::from(self.frame.height) / usize::from(self.rows)
    }

    /// The middle pixel of a cell of the terminal, beyond the frame where the cell is.
    pub fn pixel(&self, column: u16, row: u16) -> (i32, i32) {
        let (column, row) = (i32::from(column) - i32::from(self.left), i32::from(row) - i32::from(self.top));
        let middle = |cell: i32, pixels: u16, cells: u16| (2 * cell + 1) * i32::from(pixels) / (2 * i32::from(cells));
        (middle(column, self.frame.width, self.columns), middle(row, self.frame.height, self.rows))
    }

    /// The column in which pixel `x` lies, which may be beyond the frame.
    pub fn column_at(&self, x: f64) -> f64 {
        x * f64::from(self.columns) / f64::from(self.frame.width)
    }

    /// The row in which pixel `y` lies, which may be beyond the frame.
    pub fn row_at(&self, y: f64) -> f64 {
        y * f64::from(self.rows) / f64::from(self.frame.height)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_plainest_terminal_carries_the_small_wide_layout() {
        // One of 24 rows is kept for the hint.
        let room = Room::of(80, 23, None).unwrap();
        assert_eq!(room.frame, FrameSize::new(320, 240));
        assert_eq!((room.columns, room.rows, room.left), (80, 23, 0));
        assert_eq!(Room::of(200, 60, None).unwrap().frame, FrameSize::new(1920, 1080));
        assert_eq!(Room::of(140, 40, None).unwrap().frame, FrameSize::new(800, 480));
        assert_eq!(Room::of(40, 20, None), None);
        assert_eq!(Room::of(0, 0, None), None);
    }

    #[test]
    fn a_size_that_was_asked_for_is_kept_or_refused() {
        let asked = FrameSize::new(320, 240);
        assert_eq!(Room::of(200, 60, Some(asked)).unwrap().frame, asked);
        assert_eq!(Room::of(60, 60, Some(asked)), None);
    }

    #[test]
    fn shapes_stay_near_their_own_and_every_cell_has_its_pixels() {
        for (columns, rows) in [(80, 23), (300, 23), (54, 90), (237, 66), (65535, 65535), (65535, 23)] {
            let Some(room) = Room::of(columns, rows, None) else { continue };
            let across = f64::from(room.frame.width) / f64::from(room.columns);
            let down = f64::from(room.frame.height) / f64::from(room.rows);
            assert!((1.5..3.0).contains(&(down / across)), "{room:?}");
            assert_eq!(room.x_of(room.columns.into()), usize::from(room.frame.width));
            let (x, y) = room.pixel(room.left, room.top);
            assert!(x >= 0 && y >= 0 && f64::from(x) <= across && f64::from(y) <= down, "{room:?}");
            assert!(room.pixel(0, 0) <= (x, y));
        }
    }
}
