//! Coverage by area, gathered in square tiles before it is laid on the frame.
//!
//! A tile lets pieces that overlap (the two sides of a bend, the halves of a dash) count once: each pixel keeps the
//! greatest coverage that any piece gives it. All of it is `+ - * /`, comparison and square root on `f64`, which every
//! target rounds alike.

use super::Spot;
use super::canvas::{Canvas, edges, overlap};
use super::paint::{Paint, Ready};

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::primitives::Rectangle;

/// Side of a tile in pixels.
pub(super) const TILE: usize = 64;

pub(super) const SQRT_HALF: f64 = core::f64::consts::FRAC_1_SQRT_2;

/// A share of 0 to 1 as coverage of 0 to 255, rounded; what lies outside counts as 0 or 1.
#[inline]
pub(super) fn to_coverage(share: f64) -> u8 {
    (share * 255.0 + 0.5) as u8
}

/// How a straight edge of one direction cuts a pixel.
#[derive(Clone, Copy)]
pub(super) struct Slope {
    flat_to: f64,
    reach: f64,
    per_flat: f64,
    per_corner: f64,
}

impl Slope {
    /// For an edge whose unit normal is (nx, ny).
    pub(super) fn new(nx: f64, ny: f64) -> Self {
        let (nx, ny) = (nx.abs(), ny.abs());
        let (large, small) = if nx > ny { (nx, ny) } else { (ny, nx) };
        let product = 2.0 * large * small;
        Self {
            flat_to: (large - small) / 2.0,
            reach: (large + small) / 2.0,
            per_flat: 1.0 / large,
            per_corner: if product > 0.0 { 1.0 / product } else { 0.0 },
        }
    }

    /// Greatest distance from a pixel's middle at which the edge still touches it.
    pub(super) fn reach(&self) -> f64 {
        self.reach
    }

    /// The share of a unit square on the inner side of an edge that passes `inside` pixels outward of its middle.
    #[inline]
    pub(super) fn half_plane(&self, inside: f64) -> f64 {
        let distance = inside.abs();
        if distance >= self.reach {
            return if inside > 0.0 { 1.0 } else { 0.0 };
        }
        if distance <= self.flat_to {
            return 0.5 + inside * self.per_flat;
        }
        let corner = (self.reach - distance) * (self.reach - distance) * self.per_corner;
        if inside > 0.0 { 1.0 - corner } else { corner }
    }
}

/// Coverage of a square of the frame; rows and columns count from its own corner.
pub(super) struct Tile {
    pub(super) left: i32,
    pub(super) top: i32,
    pub(super) width: usize,
    pub(super) height: usize,
    coverage: [[u8; TILE]; TILE],
    touched: [(u8, u8); TILE],
}

impl Tile {
    /// The frame's columns that this tile holds, first and first-beyond.
    pub(super) fn columns(&self) -> (f64, f64) {
        (f64::from(self.left), f64::from(self.left) + self.width as f64)
    }

    /// The frame's rows that this tile holds, first and first-beyond.
    pub(super) fn rows(&self) -> (f64, f64) {
        (f64::from(self.top), f64::from(self.top) + self.height as f64)
    }

    /// Whether any of the box, in frame pixels, lies in this tile.
    pub(super) fn meets(&self, left: f64, top: f64, right: f64, bottom: f64) -> bool {
        let ((x0, x1), (y0, y1)) = (self.columns(), self.rows());
        right > x0 && left < x1 && bottom > y0 && top < y1
    }

    /// The tile's columns from the one that holds `from` to the one that holds `to`, for places in the frame.
    pub(super) fn column_span(&self, from: f64, to: f64) -> core::ops::Range<usize> {
        span(from - f64::from(self.left), to - f64::from(self.left), self.width)
    }

    /// The tile's rows from the one that holds `from` to the one that holds `to`, for places in the frame.
    pub(super) fn row_span(&self, from: f64, to: f64) -> core::ops::Range<usize> {
        span(from - f64::from(self.top), to - f64::from(self.top), self.height)
    }

    /// The tile's columns whose middles lie from `from` to `to`, in frame pixels.
    pub(super) fn columns_between(&self, from: f64, to: f64) -> core::ops::Range<usize> {
        middles(from - f64::from(self.left), to - f64::from(self.left), self.width)
    }

    /// The tile's rows whose middles lie from `from` to `to`, in frame pixels.
    pub(super) fn rows_between(&self, from: f64, to: f64) -> core::ops::Range<usize> {
        middles(from - f64::from(self.top), to - f64::from(self.top), self.height)
    }

    /// The middle of a pixel of this tile, in the frame.
    pub(super) fn middle(&self, column: usize, row: usize) -> Spot {
        Spot::new(f64::from(self.left) + column as f64 + 0.5, f64::from(self.top) + row as f64 + 0.5)
    }

    /// Raises a pixel's coverage to at least `coverage`.
    #[inline]
    pub(super) fn raise(&mut self, column: usize, row: usize, coverage: u8) {
        let cell = &mut self.coverage[row][column];
        if coverage > *cell {
            *cell = coverage;
            let (first, beyond) = &mut self.touched[row];
            *first = (*first).min(column as u8);
            *beyond = (*beyond).max(column as u8 + 1);
        }
    }

    /// Sets a row's coverage from `column` on, for a row in which nothing was raised before.
    pub(super) fn set_row(&mut self, row: usize, column: usize, coverage: impl Iterator<Item = u8>) {
        let column = column.min(self.width);
        let mut beyond = column;
        // The iterator is gone through to its end: it empties the sums that it reads.
        for (coverage, at) in coverage.zip(column..) {
            if at < self.width {
                self.coverage[row][at] = coverage;
                beyond = at + 1;
            }
        }
        self.touched[row] = (column as u8, beyond as u8);
    }

    /// Sets the rest of such a row from `column` on to one coverage.
    pub(super) fn fill_row(&mut self, row: usize, column: usize, coverage: u8) {
        if coverage > 0 && column < self.width {
            self.coverage[row][column..self.width].fill(coverage);
            self.touched[row].1 = self.width as u8;
        }
    }

    /// The coverage of some of a row's pixels, to be raised in place.
    pub(super) fn row_cells(&mut self, row: usize, columns: core::ops::Range<usize>) -> &mut [u8] {
        let (first, beyond) = &mut self.touched[row];
        *first = (*first).min(columns.start as u8);
        *beyond = (*beyond).max(columns.end as u8);
        &mut self.coverage[row][columns]
    }

    fn lay(&self, canvas: &mut Canvas<'_>, paint: &Ready) {
        for row in 0..self.height {
            let (first, beyond) = self.touched[row];
            if first < beyond {
                let cells = &self.coverage[row][usize::from(first)..usize::from(beyond)];
                canvas.blend_row(self.left + i32::from(first), self.top + row as i32, cells, paint);
            }
        }
    }

    fn empty(&mut self) {
        for row in 0..self.height {
            if self.touched[row].0 < self.touched[row].1 {
                self.coverage[row] = [0; TILE];
                self.touched[row] = (TILE as u8, 0);
            }
        }
    }
}

fn span(from: f64, to: f64, limit: usize) -> core::ops::Range<usize> {
    // A cast takes what is below zero, and what is no number, as zero.
    let (first, whole) = (from as usize, to as usize);
    let beyond = if to > whole as f64 { whole.saturating_add(1) } else { whole };
    first.min(limit)..beyond.min(limit)
}

fn middles(from: f64, to: f64, limit: usize) -> core::ops::Range<usize> {
    // Casts as in `span`; half a pixel more rounds to the nearest middle.
    let (first, beyond) = (span(0.0, from - 0.5, limit).end, ((to + 0.5) as usize).min(limit));
    first.min(beyond)..beyond
}

/// Draws through tiles over the part of `bounds` (left, top, right, bottom) that the clip lets through.
pub(super) fn through_tiles(
    canvas: &mut Canvas<'_>,
    bounds: (f64, f64, f64, f64),
    paint: Paint,
    mut draw: impl FnMut(&mut Tile),
) {
    let Some((left, top, right, bottom)) = edges(overlap(whole_pixels(bounds), canvas.clip())) else { return };
    let mut tile =
        Tile { left, top, width: 0, height: 0, coverage: [[0; TILE]; TILE], touched: [(TILE as u8, 0); TILE] };
    let paint = paint.ready();
    for y in (top..bottom).step_by(TILE) {
        for x in (left..right).step_by(TILE) {
            (tile.left, tile.top) = (x, y);
            tile.width = TILE.min((right - x) as usize);
            tile.height = TILE.min((bottom - y) as usize);
            draw(&mut tile);
            tile.lay(canvas, &paint);
            tile.empty();
        }
    }
}

/// The whole pixels that a box of places touches.
fn whole_pixels((left, top, right, bottom): (f64, f64, f64, f64)) -> Rectangle {
    // Casts saturate: a box far outside ends at the largest whole number and meets no frame.
    let corner = Point::new(libm::floor(left) as i32, libm::floor(top) as i32);
    let far = Point::new(libm::ceil(right) as i32, libm::ceil(bottom) as i32);
    let extent = |from: i32, to: i32| u32::try_from(i64::from(to) - i64::from(from)).unwrap_or(0);
    Rectangle::new(corner, Size::new(extent(corner.x, far.x), extent(corner.y, far.y)))
}

/// The places of an iterator worked out once, where they are few enough to be kept; each tile goes through them again,
/// and a chart has to turn every value into a place.
pub(super) fn keep(points: impl Iterator<Item = Spot>) -> Option<heapless::Vec<Spot, MOST_KEPT>> {
    let mut kept = heapless::Vec::new();
    for spot in points {
        kept.push(spot).ok()?;
    }
    Some(kept)
}

/// A leap year and some: 8 kilobytes.
const MOST_KEPT: usize = 512;

/// The smallest box around the finite ones of some places, widened by `margin`; `None` where there are none.
pub(super) fn bounds(points: impl Iterator<Item = Spot>, margin: f64) -> Option<(f64, f64, f64, f64)> {
    points.filter(|spot| spot.is_finite()).fold(None, |found, spot| {
        let (left, top, right, bottom) = found.unwrap_or((f64::MAX, f64::MAX, f64::MIN, f64::MIN));
        Some((
            left.min(spot.x - margin),
            top.min(spot.y - margin),
            right.max(spot.x + margin),
            bottom.max(spot.y + margin),
        ))
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Area of the unit square on the inner side, by counting a fine grid: an independent way to the same number.
    fn counted(nx: f64, ny: f64, inside: f64) -> f64 {
        let n = 400;
        let hits = (0..n * n).filter(|i| {
            let x = (f64::from(i % n) + 0.5) / f64::from(n) - 0.5;
            let y = (f64::from(i / n) + 0.5) / f64::from(n) - 0.5;
            x * nx + y * ny <= inside
        });
        hits.count() as f64 / f64::from(n * n)
    }

    #[test]
    fn a_half_plane_covers_its_area() {
        for (nx, ny) in [(1.0, 0.0), (0.6, 0.8), (-0.28, 0.96), (SQRT_HALF, -SQRT_HALF)] {
            let slope = Slope::new(nx, ny);
            for tenth in -9..=9 {
                let inside = f64::from(tenth) / 10.0;
                let difference = slope.half_plane(inside) - counted(nx, ny, inside);
                assert!(difference.abs() < 0.004, "normal {nx} {ny}, {inside}: {difference}");
            }
        }
    }

    #[test]
    fn spans_stay_inside_the_tile_for_any_number() {
        for (from, to) in [(f64::NAN, f64::NAN), (-1e300, 1e300), (1e300, -1e300), (3.2, 5.0)] {
            let range = span(from, to, 64);
            assert!(range.start <= 64 && range.end <= 64);
        }
        assert_eq!(span(3.2, 5.0, 64), 3..5);
    }
}
