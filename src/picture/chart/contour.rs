//! A field of values on a grid, shaded cell by cell, with smooth contour lines.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::super::Spot;
use super::super::canvas::Canvas;
use super::super::line::{Stroke, polyline};
use super::super::paint::Paint;

/// Values at the middles of the cells of a grid, row after row from the top.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Field<'t> {
    /// The box of the frame that the cells share out.
    pub area: Rectangle,
    /// Cells in a row; rows are as many as the values give.
    pub columns: usize,
    /// The values.
    pub values: &'t [f64],
}

impl Field<'_> {
    fn rows(&self) -> usize {
        self.values.len().checked_div(self.columns).unwrap_or(0)
    }

    /// The left top corner of a cell; one beyond the last gives the far edge.
    fn corner(&self, column: usize, row: usize) -> Point {
        let share = |at: usize, of: usize, length: u32| (at as u64 * u64::from(length) / of.max(1) as u64) as u32;
        let Rectangle { top_left, size } = self.area;
        Point::new(
            top_left.x.saturating_add_unsigned(share(column, self.columns, size.width)),
            top_left.y.saturating_add_unsigned(share(row, self.rows(), size.height)),
        )
    }

    /// The place of a cell's middle, where its value holds.
    pub fn middle(&self, column: usize, row: usize) -> Spot {
        self.place(column + 1, row + 1)
    }

    /// The places where values hold, with a border all round: 0 is the left or top edge, 1 the first middle, and so on
    /// to the far edge, so that contours reach the edges.
    fn place(&self, column: usize, row: usize) -> Spot {
        let share = |at: usize, of: usize| ((at as f64 - 0.5) / of.max(1) as f64).clamp(0.0, 1.0);
        let Rectangle { top_left, size } = self.area;
        Spot::new(
            f64::from(top_left.x) + share(column, self.columns) * f64::from(size.width),
            f64::from(top_left.y) + share(row, self.rows()) * f64::from(size.height),
        )
    }

    /// The value at such a place. On the border the field is carried on straight, or where it cannot be, level.
    fn value(&self, column: usize, row: usize) -> f64 {
        let at = |column: usize, row: usize| self.values[row * self.columns + column];
        let (x, beside_x) = inner(column, self.columns);
        let (y, beside_y) = inner(row, self.rows());
        let here = at(x, y);
        let carried = here + (here - at(beside_x, y)) / 2.0 + (here - at(x, beside_y)) / 2.0;
        if carried.is_finite() { carried } else { here }
    }
}

/// For a place of the border or the middles: the nearest middle, and on the border the middle behind that.
fn inner(at: usize, count: usize) -> (usize, usize) {
    let last = count.saturating_sub(1);
    match at {
        0 => (0, last.min(1)),
        _ if at > count => (last, last.saturating_sub(1)),
        _ => (at - 1, at - 1),
    }
}

/// Fills every cell with the colour that `colour` gives for its value; cells without a finite value stay bare.
pub fn shade(canvas: &mut Canvas<'_>, field: &Field<'_>, colour: impl Fn(f64) -> Rgb565) {
    for row in 0..field.rows() {
        for column in 0..field.columns {
            let value = field.values[row * field.columns + column];
            let (from, to) = (field.corner(column, row), field.corner(column + 1, row + 1));
            if value.is_finite() {
                let size = Size::new(to.x.abs_diff(from.x), to.y.abs_diff(from.y));
                canvas.fill(Rectangle::new(from, size), colour(value));
            }
        }
    }
}

/// Draws the line along which the field, taken as straight between neighbouring middles, has the value `level`.
/// Squares with a value that is not finite have no line.
pub fn contour(canvas: &mut Canvas<'_>, field: &Field<'_>, level: f64, stroke: Stroke, paint: impl Into<Paint>) {
    let paint = paint.into();
    let gap = Spot::new(f64::NAN, f64::NAN);
    let (columns, rows) = (field.columns, field.rows());
    if rows == 0 {
        return;
    }
    let squares = (0..=rows).flat_map(|row| (0..=columns).map(move |column| (column, row)));
    // All pieces are one line with gaps, so that they are laid on the frame at once and joints do not show.
    let pieces = squares.flat_map(|(column, row)| {
        let pieces = pieces_of_square(field, column, row, level);
        pieces.into_iter().flatten().flat_map(move |(from, to)| [from, to, gap])
    });
    canvas.within(field.area, |canvas| polyline(canvas, pieces, stroke.with_round_ends(), paint));
}

/// The at most two pieces of the contour between four neighbouring places of the field with its border.
fn pieces_of_square(field: &Field<'_>, column: usize, row: usize, level: f64) -> [Option<(Spot, Spot)>; 2] {
    let corners = [(column, row), (column + 1, row), (column + 1, row + 1), (column, row + 1)];
    let values = corners.map(|(x, y)| field.value(x, y));
    if values.iter().any(|value| !value.is_finite()) {
        return [None; 2];
    }
    let crossing = |side: usize| {
        let (i, j) = (side, (side + 1) % 4);
        let (a, b) = (values[i], values[j]);
        ((a >= level) != (b >= level)).then(|| {
            let share = (level - a) / (b - a);
            let (from, to) = (field.place(corners[i].0, corners[i].1), field.place(corners[j].0, corners[j].1));
            Spot::new(from.x + (to.x - from.x) * share, from.y + (to.y - from.y) * share)
        })
    };
    let found = [crossing(0), crossing(1), crossing(2), crossing(3)];
    if let [Some(top), Some(right), Some(bottom), Some(left)] = found {
        // A saddle: its middle says which corners belong together.
        let middle = (values[0] + values[1] + values[2] + values[3]) / 4.0;
        return if (middle >= level) == (values[0] >= level) {
            [Some((top, right)), Some((bottom, left))]
        } else {
            [Some((left, top)), Some((right, bottom))]
        };
    }
    let mut crossings = found.into_iter().flatten();
    [crossings.next().zip(crossings.next()), None]
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_contour_of_a_plane_is_straight() {
        let values: heapless::Vec<f64, 30> = (0..30).map(|i| f64::from(i % 6)).collect();
        let area = Rectangle::new(Point::zero(), Size::new(60, 50));
        let field = Field { area, columns: 6, values: &values };
        for row in 0..=5 {
            for column in 0..=6 {
                let [one, other] = pieces_of_square(&field, column, row, 2.5);
                assert_eq!(other, None);
                assert_eq!(one.is_some(), column == 3);
                if let Some((from, to)) = one {
                    assert!((from.x - 30.0).abs() < 1e-9 && (to.x - 30.0).abs() < 1e-9);
                }
            }
        }
    }

    #[test]
    fn a_saddle_has_two_pieces_and_a_hole_none() {
        let area = Rectangle::new(Point::zero(), Size::new(20, 20));
        let saddle = [1.0, 0.0, 0.0, 1.0];
        assert!(pieces_of_square(&Field { area, columns: 2, values: &saddle }, 1, 1, 0.4).iter().all(Option::is_some));
        let hole = [1.0, 0.0, f64::NAN, 1.0];
        assert_eq!(pieces_of_square(&Field { area, columns: 2, values: &hole }, 1, 1, 0.4), [None; 2]);
    }
}
