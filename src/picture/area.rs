//! Filled outlines, and the areas under a line or between two.

use super::Spot;
use super::canvas::Canvas;
use super::mask::{TILE, Tile, bounds, keep, through_tiles};
use super::paint::Paint;

/// Which parts between two lines are filled.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Between {
    /// Wherever they differ.
    Either,
    /// Only where the first line is higher up on the frame.
    FirstHigher,
    /// Only where the second line is higher up on the frame.
    SecondHigher,
}

/// Fills the outline through `corners`, which closes itself; parts that it goes round twice are filled once.
/// An outline with a corner that is not finite is left out.
pub fn polygon(canvas: &mut Canvas<'_>, corners: impl Iterator<Item = Spot> + Clone, paint: impl Into<Paint>) {
    if corners.clone().any(|spot| !spot.is_finite()) {
        return;
    }
    fill(canvas, corners.clone(), paint.into(), Between::Either, |tile| {
        let Some(first) = corners.clone().next() else { return };
        let mut from = first;
        for to in corners.clone().skip(1).chain([first]) {
            tile.edge(from, to);
            from = to;
        }
    });
}

/// Fills from the line through `points` (x increasing) to the level `base_y`; a place that is not finite leaves a gap.
pub fn under(
    canvas: &mut Canvas<'_>,
    points: impl Iterator<Item = Spot> + Clone,
    base_y: f64,
    paint: impl Into<Paint>,
) {
    let base = points.clone().map(|spot| Spot::new(spot.x, base_y));
    between(canvas, points, base, Between::Either, paint);
}

/// Fills between two lines whose places go together one by one (same number, same x, x increasing).
/// A pair that is not finite leaves a gap.
pub fn between(
    canvas: &mut Canvas<'_>,
    first: impl Iterator<Item = Spot> + Clone,
    second: impl Iterator<Item = Spot> + Clone,
    which: Between,
    paint: impl Into<Paint>,
) {
    let paint = paint.into();
    match (keep(first.clone()), keep(second.clone())) {
        (Some(one), Some(other)) => lay(canvas, one.iter().copied(), other.iter().copied(), which, paint),
        _ => lay(canvas, first, second, which, paint),
    }
}

fn lay(
    canvas: &mut Canvas<'_>,
    first: impl Iterator<Item = Spot> + Clone,
    second: impl Iterator<Item = Spot> + Clone,
    which: Between,
    paint: Paint,
) {
    fill(canvas, first.clone().chain(second.clone()), paint, which, |tile| {
        let (left, right) = tile.tile.columns();
        let mut pairs = first.clone().zip(second.clone());
        let Some(mut from) = pairs.next() else { return };
        let mut open = false;
        for to in pairs {
            let xs = [from.0.x, from.1.x, to.0.x, to.1.x];
            let beside = xs.iter().all(|&x| x <= left) || xs.iter().all(|&x| x >= right);
            let whole = [from.0, from.1, to.0, to.1].iter().all(|spot| spot.is_finite());
            // A stretch beside the tile is closed by itself and adds nothing to it.
            if whole && !beside {
                if !open {
                    tile.edge(from.1, from.0);
                }
                tile.edge(from.0, to.0);
                tile.edge(to.1, from.1);
                open = true;
            } else if open {
                tile.edge(from.0, from.1);
                open = false;
            }
            from = to;
        }
        if open {
            tile.edge(from.0, from.1);
        }
    });
}

fn fill(
    canvas: &mut Canvas<'_>,
    all: impl Iterator<Item = Spot>,
    paint: Paint,
    which: Between,
    draw: impl Fn(&mut Signed<'_>),
) {
    let Some(area) = bounds(all, 0.0) else { return };
    let mut cells = [[0; TILE + 1]; TILE];
    let mut touched = [UNTOUCHED; TILE];
    through_tiles(canvas, area, paint, |tile| {
        let mut signed = Signed { tile, cells: &mut cells, touched: &mut touched };
        draw(&mut signed);
        signed.finish(which);
    });
}

/// One whole pixel in the sums below.
const ONE: f64 = 65_536.0;

/// Signed area that each cell gains over its left neighbour; the running sum along a row is the coverage.
struct Signed<'t> {
    tile: &'t mut Tile,
    cells: &'t mut [[i32; TILE + 1]; TILE],
    /// For each row the first cell that gained or lost, and the first beyond the last.
    touched: &'t mut [(usize, usize); TILE],
}

const UNTOUCHED: (usize, usize) = (TILE + 1, 0);

impl Signed<'_> {
    /// Adds one directed edge of a closed outline. Areas to its right count, downward edges positive.
    fn edge(&mut self, from: Spot, to: Spot) {
        if from.y == to.y {
            return;
        }
        // Always worked out from the upper place, so that an edge walked both ways cancels to the last bit.
        let (upper, lower, sign) = if from.y < to.y { (from, to, 1.0) } else { (to, from, -1.0) };
        let ((left, right), (top, bottom)) = (self.tile.columns(), self.tile.rows());
        if lower.y <= top || upper.y >= bottom || upper.x.min(lower.x) >= right {
            return;
        }
        let slope = (lower.x - upper.x) / (lower.y - upper.y);
        let x_at = |y: f64| {
            let x = upper.x + (y - upper.y) * slope;
            // Rounding must not carry a place beyond the ends of the edge.
            x.max(upper.x.min(lower.x)).min(upper.x.max(lower.x)) - left
        };
        for row in self.tile.row_span(upper.y, lower.y) {
            let (y0, y1) = (top + row as f64, top + row as f64 + 1.0);
            let (from, to) = (upper.y.max(y0), lower.y.min(y1));
            if to > from {
                let (x0, x1) = (x_at(from), x_at(to));
                self.row_piece(row, x0.min(x1), x0.max(x1), (to - from) * sign);
            }
        }
    }

    /// A piece of an edge within one row that runs from `x0` to `x1` while it goes `rise` rows down.
    fn row_piece(&mut self, row: usize, x0: f64, x1: f64, rise: f64) {
        let width = self.tile.width as f64;
        let (cells, touched) = (&mut self.cells[row], &mut self.touched[row]);
        let mut add = |column: usize, area: f64| {
            *touched = (touched.0.min(column), touched.1.max(column + 1));
            let rounded = area * ONE;
            let rounded = if rounded < 0.0 { rounded - 0.5 } else { rounded + 0.5 };
            cells[column] = cells[column].saturating_add(rounded as i32);
        };
        if x0 >= width {
            return;
        }
        if x1 <= 0.0 {
            return add(0, rise);
        }
        let run = x1 - x0;
        // A cast rounds down, and takes what is below zero as zero.
        let (first, last) = (x0 as usize, x1.min(width) as usize);
        if run <= 0.0 || (first == last && x0 >= 0.0 && x1 <= width) {
            let inside = 1.0 - ((x0 + x1) / 2.0 - first as f64);
            add(first, rise * inside);
            if first < TILE {
                add(first + 1, rise * (1.0 - inside));
            }
            return;
        }
        let per_run = 0.5 / run;
        // How much of the strip from the piece's left end to x lies to the right of the piece.
        let reached = |x: f64| {
            let passed = (x - x0).max(0.0).min(run);
            passed * passed * per_run + (x - x1).max(0.0)
        };
        let (mut left, mut before) = (reached(first as f64), 0.0);
        for column in first..=last.min(TILE - 1) {
            let right = reached(column as f64 + 1.0);
            let covered = right - left;
            add(column, rise * (covered - before));
            (left, before) = (right, covered);
        }
        add(last.min(TILE - 1) + 1, rise * (1.0 - before));
    }

    fn finish(self, which: Between) {
        for row in 0..self.tile.height {
            let (first, beyond) = core::mem::replace(&mut self.touched[row], UNTOUCHED);
            if first >= beyond {
                continue;
            }
            let mut sum = 0i32;
            let mut coverage = |cell: &mut i32| {
                sum = sum.saturating_add(core::mem::take(cell));
                let area = match which {
                    Between::Either => sum.saturating_abs(),
                    Between::FirstHigher => sum.saturating_neg(),
                    Between::SecondHigher => sum,
                };
                ((area.clamp(0, ONE as i32) * 255 + 32_768) >> 16) as u8
            };
            let cells = &mut self.cells[row];
            self.tile.set_row(row, first, cells[first..beyond].iter_mut().map(&mut coverage));
            // Beyond the last change the coverage stays as it is, often none at all.
            let rest = coverage(&mut 0);
            self.tile.fill_row(row, beyond, rest);
        }
    }
}

#[cfg(test)]
mod tests {
    use super::super::ascii::{Sheet, assert_art};
    use super::*;

    fn spots(list: &'static [(f64, f64)]) -> impl Iterator<Item = Spot> + Clone {
        list.iter().map(|&(x, y)| Spot::new(x, y))
    }

    #[test]
    fn a_half_pixel_is_half_covered() {
        let mut sheet = Sheet::<6, 4>::new();
        polygon(&mut sheet.canvas(), spots(&[(1.5, 1.0), (4.0, 1.0), (4.0, 2.5), (1.5, 2.5)]), Sheet::<6, 4>::INK);
        assert_art(&sheet, &["      ", " 488  ", " 244  ", "      "]);
    }

    #[test]
    fn a_triangle_covers_half_its_box() {
        let mut sheet = Sheet::<4, 4>::new();
        polygon(&mut sheet.canvas(), spots(&[(0.0, 0.0), (4.0, 4.0), (0.0, 4.0)]), Sheet::<4, 4>::INK);
        assert_art(&sheet, &["4   ", "84  ", "884 ", "8884"]);
    }

    #[test]
    fn what_lies_left_of_a_tile_still_counts_in_it() {
        let mut pixels = [Sheet::<1, 1>::PAPER; 200 * 3];
        let mut canvas = Canvas::new(&mut pixels, 200, 3).unwrap();
        let corners = spots(&[(-50.0, -9.0), (190.0, -9.0), (190.0, 99.0), (-50.0, 99.0)]);
        polygon(&mut canvas, corners, Sheet::<1, 1>::INK);
        let inked = |pixel: &&_| **pixel == Sheet::<1, 1>::INK;
        assert_eq!(canvas.rows().map(|row| row.iter().filter(inked).count()).min(), Some(190));
    }

    #[test]
    fn between_tells_which_line_is_higher() {
        let first = [(0.0, 1.0), (8.0, 1.0)];
        let second = [(0.0, 3.0), (4.0, 3.0)];
        for (which, expected) in [(Between::FirstHigher, "8888    "), (Between::SecondHigher, "        ")] {
            let mut sheet = Sheet::<8, 4>::new();
            let lower = second.into_iter().map(|(x, y)| Spot::new(x, y));
            let upper = first.into_iter().zip(second).map(|((_, y), (x, _))| Spot::new(x, y));
            between(&mut sheet.canvas(), upper, lower, which, Sheet::<8, 4>::INK);
            assert_art(&sheet, &["        ", expected, expected, "        "]);
        }
    }

    #[test]
    fn a_gap_in_the_line_is_a_gap_in_the_area() {
        let mut sheet = Sheet::<9, 2>::new();
        let line = [(0.0, 1.0), (3.0, 1.0), (4.0, f64::NAN), (6.0, 1.0), (9.0, 1.0)];
        let points = line.into_iter().map(|(x, y)| Spot::new(x, y));
        under(&mut sheet.canvas(), points, 2.0, Sheet::<9, 2>::INK);
        assert_art(&sheet, &["         ", "888   888"]);
    }

    #[test]
    fn numbers_far_out_of_reach_do_no_harm() {
        let mut sheet = Sheet::<8, 4>::new();
        let wild = spots(&[(-1e308, 1e308), (1e308, -1e308), (f64::MAX, 2.0), (1e-308, f64::MIN)]);
        polygon(&mut sheet.canvas(), wild.clone(), Sheet::<8, 4>::INK);
        under(&mut sheet.canvas(), wild, 1e300, Sheet::<8, 4>::INK);
    }
}
