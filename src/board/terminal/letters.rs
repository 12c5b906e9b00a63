//! Texts of a frame as real letters in cells.

use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::cells::Cell;
use super::colours::{Rgb, distance};
use super::room::Room;
use crate::board::pictures::eight_bits;
use crate::board::screen::PlacedText;
use crate::board::size::FrameSize;

/// A text that was taken off the pixels, and where its letters go.
pub struct Line {
    letters: Vec<char>,
    column: usize,
    row: usize,
    /// The first row of its pixels and the one after the last.
    down: (usize, usize),
    ink: Rgb,
    /// Behind the letters: what was behind their pixels, so that they can be read wherever a cell ends.
    ground: Rgb,
}

/// Letters that reach below the line on which the others stand.
const DEEP: &str = "gjpqyçQ,;()[]/|¿¡";
/// Letters that are no higher than an x.
const LOW: &str = "acegmnopqrsuvwxyzñç.,:;·−-";
/// Letters on plain paper have about thirty colours at their edges.
const MOST_COLOURS: usize = 64;
/// So many letters to the right may a text be moved to keep clear of another one.
const MOST_SHIFT: usize = 3;

/// Takes the ink of a text off `pixels` and says where its letters go; `None` for one outside the frame.
pub fn lift(text: &PlacedText, pixels: &mut [Rgb565], size: FrameSize, room: &Room) -> Option<Line> {
    let (left, top, right, bottom) = inside(text.ink, size)?;
    let width = usize::from(size.width);
    let rows = || (top..bottom).map(|y| y * width + left..y * width + right);
    let ground = commonest(rows().flat_map(|row| pixels[row].iter().copied()))?;
    let behind = eight_bits(ground);
    let ink = rows()
        .flat_map(|row| pixels[row].iter())
        .map(|&pixel| eight_bits(pixel))
        .max_by_key(|&c| distance(c, behind))?;
    for row in rows() {
        pixels[row].fill(ground);
    }
    let letters: Vec<char> = text.text.chars().filter_map(in_a_cell).collect();
    let column = column_of(text, letters.len(), room);
    let row = room.row_at(middle(text)) as usize;
    Some(Line { letters, column, row: row.min(usize::from(room.rows) - 1), down: (top, bottom), ink, ground: behind })
}

/// A letter as a terminal can be trusted with it: narrow blanks would be left out or drawn wide by some.
fn in_a_cell(letter: char) -> Option<char> {
    match letter {
        '\u{a0}' | '\u{2009}' | '\u{202f}' => Some(' '),
        '\u{2060}' => None,
        _ => (!letter.is_control()).then_some(letter),
    }
}

/// Lets texts that stand side by side on one line of type share a row, although their cells' edges may part them.
pub fn level(lines: &mut [Line]) {
    for index in 1..lines.len() {
        let (before, rest) = lines.split_at_mut(index);
        if let Some(line) = rest.first_mut()
            && let Some(beside) = before.iter().find(|other| line.is_beside(other))
        {
            line.row = beside.row;
        }
    }
}

impl Line {
    fn is_beside(&self, other: &Line) -> bool {
        let shared = self.down.1.min(other.down.1).saturating_sub(self.down.0.max(other.down.0));
        let (one, two) = (self.down.1 - self.down.0, other.down.1 - other.down.0);
        // Of about one size, and mostly at one height.
        one.max(two) * 10 <= one.min(two) * 16 && shared * 10 >= one.min(two) * 8
    }
}

/// Puts the letters of all lines into the cells. Where two would lie on each other the later one moves: a little to
/// the right, else to the row below or above; what then still has no room is left out letter by letter.
pub fn set(lines: &[Line], cells: &mut [Cell], columns: usize) {
    let mut taken = vec![false; cells.len()];
    for line in lines {
        let spots = (0..=MOST_SHIFT)
            .map(|shift| (line.row, line.column + shift))
            .chain([(line.row + 1, line.column), (line.row.wrapping_sub(1), line.column)]);
        let free = |&(row, column): &(usize, usize)| {
            // A letter of distance to the one before keeps words apart.
            let from = column.saturating_sub(1);
            column + line.letters.len() <= columns
                && (from..column + line.letters.len()).all(|at| taken.get(index(row, at, columns)) == Some(&false))
        };
        let (row, column) = spots.clone().find(free).unwrap_or((line.row, line.column));
        for (letter, at) in line.letters.iter().zip(column..columns) {
            let at = index(row, at, columns);
            if let (Some(cell), Some(taken)) = (cells.get_mut(at), taken.get_mut(at))
                && !*taken
            {
                *taken = true;
                *cell = Cell { symbol: *letter, ink: line.ink, ground: line.ground };
            }
        }
    }
}

fn index(row: usize, column: usize, columns: usize) -> usize {
    row.saturating_mul(columns).saturating_add(column)
}

/// Left, top, right and bottom of what lies on the frame.
fn inside(area: Rectangle, size: FrameSize) -> Option<(usize, usize, usize, usize)> {
    let edge = |from: i32, length: u32, most: u16| {
        let to = i64::from(from) + i64::from(length);
        (i64::from(from).clamp(0, most.into()) as usize, to.clamp(0, most.into()) as usize)
    };
    let (left, right) = edge(area.top_left.x, area.size.width, size.width);
    let (top, bottom) = edge(area.top_left.y, area.size.height, size.height);
    (left < right && top < bottom).then_some((left, top, right, bottom))
}

/// The colour that most pixels have; the first of equals. Colours beyond [`MOST_COLOURS`] are too rare to be it.
fn commonest(pixels: impl Iterator<Item = Rgb565>) -> Option<Rgb565> {
    let mut counts: Vec<(Rgb565, usize)> = Vec::new();
    for pixel in pixels {
        match counts.iter().position(|(colour, _)| *colour == pixel) {
            Some(at) => counts[at].1 += 1,
            None if counts.len() < MOST_COLOURS => counts.push((pixel, 1)),
            None => {}
        }
    }
    counts.into_iter().rev().max_by_key(|&(_, count)| count).map(|(colour, _)| colour)
}

/// Where a text begins: letters keep its left edge, its middle or its right edge, as it was set in its box; the left one
/// where there is no box.
fn column_of(text: &PlacedText, letters: usize, room: &Room) -> usize {
    let (left, width) = (f64::from(text.ink.top_left.x), f64::from(text.ink.size.width));
    let (start, end) = (room.column_at(left), room.column_at(left + width));
    let spare = end - start - letters as f64;
    let share = match text.given {
        None => 0.0,
        Some(given) => {
            let before = left - f64::from(given.top_left.x);
            let after = f64::from(given.size.width) - before - width;
            match () {
                () if before <= 2.0 => 0.0,
                () if after <= 2.0 => 1.0,
                () if (before - after).abs() <= 3.0 => 0.5,
                () => 0.0,
            }
        }
    };
    let wanted = (start + spare * share + 0.5).max(0.0) as usize;
    wanted.min(usize::from(room.columns).saturating_sub(letters))
}

/// The height at which an x of this text has its middle, so that texts on one line of type come to lie on one row.
fn middle(text: &PlacedText) -> f64 {
    let (top, height) = (f64::from(text.ink.top_left.y), f64::from(text.ink.size.height));
    let deep = text.text.contains(|letter| DEEP.contains(letter));
    let low = text.text.chars().all(|letter| letter.is_whitespace() || LOW.contains(letter));
    // Shares of the size of type: a capital is 0.72 high, an x 0.54, and letters reach 0.2 below the line.
    let size = height / (if low { 0.54 } else { 0.72 } + if deep { 0.2 } else { 0.0 });
    let line = top + height - if deep { 0.2 * size } else { 0.0 };
    line - 0.3 * size
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::board::screen::Frame;
    use crate::board::terminal::ability::Grain;
    use crate::board::terminal::cells::cells;
    use embedded_graphics::geometry::{Point, Size};
    use embedded_graphics::pixelcolor::RgbColor;

    const SIZE: FrameSize = FrameSize::new(320, 240);

    fn placed(text: &str, x: i32, y: i32, width: u32, height: u32) -> PlacedText {
        let ink = Rectangle::new(Point::new(x, y), Size::new(width, height));
        PlacedText { text: text.to_owned(), ink, given: None }
    }

    fn rows(texts: &[PlacedText], pixels: &[Rgb565]) -> Vec<String> {
        let room = Room::of(80, 24, Some(SIZE)).unwrap();
        let cells = cells(&Frame { size: SIZE, pixels, texts }, &room, Grain::Quadrant);
        cells.chunks(80).map(|row| row.iter().map(|cell| cell.symbol).collect()).collect()
    }

    #[test]
    fn letters_stand_where_their_pixels_were_and_leave_no_trace() {
        let mut pixels = vec![Rgb565::WHITE; SIZE.pixels()];
        for y in 41..48 {
            pixels[y * 320 + 16..y * 320 + 40].fill(Rgb565::BLACK);
            pixels[y * 320 + 20..y * 320 + 38].fill(Rgb565::WHITE);
        }
        let rows = rows(&[placed("Nieve", 16, 41, 24, 7)], &pixels);
        assert_eq!(rows[4].trim_end(), "    Nieve");
        assert!(rows.iter().enumerate().all(|(at, row)| at == 4 || row.trim().is_empty()));
    }

    #[test]
    fn texts_of_one_line_share_a_row_whatever_their_letters() {
        let pixels = vec![Rgb565::WHITE; SIZE.pixels()];
        // Type of 10 pixels standing on pixel 57: capitals from 50, an x from 52, depths to 59.
        let texts = [placed("Mayo", 0, 50, 20, 9), placed("nu", 100, 52, 10, 5), placed("12", 200, 50, 10, 7)];
        let rows = rows(&texts, &pixels);
        assert!(rows[5].starts_with("Mayo") && rows[5].contains("nu") && rows[5].contains("12"), "{rows:?}");
    }

    #[test]
    fn a_row_edge_between_two_texts_of_one_line_does_not_part_them() {
        let pixels = vec![Rgb565::WHITE; SIZE.pixels()];
        // Wherever the edge of a row falls; the second text reaches below the line, the first does not.
        for top in 70..85 {
            let rows = rows(&[placed("Oct 1", 6, top, 28, 8), placed("2020, a year", 200, top, 110, 10)], &pixels);
            assert!(rows.iter().any(|row| row.contains("Oct 1") && row.contains("2020, a year")), "{top} {rows:?}");
        }
    }

    #[test]
    fn a_text_in_the_way_moves_and_stays_whole() {
        let pixels = vec![Rgb565::WHITE; SIZE.pixels()];
        let texts = [placed("first", 0, 100, 20, 8), placed("second", 4, 101, 24, 8)];
        let all = rows(&texts, &pixels).join("\n");
        assert!(all.contains("first") && all.contains("second"));
    }

    #[test]
    fn texts_beyond_the_frame_are_left_out() {
        let pixels = vec![Rgb565::WHITE; SIZE.pixels()];
        let far = [placed("far", i32::MAX, i32::MIN, u32::MAX, u32::MAX), placed("gone", 400, 10, 20, 8)];
        assert!(rows(&far, &pixels).iter().all(|row| row.trim().is_empty()));
    }
}
