//! Smooth lines of any width with round joins, and dashes that run on evenly round the bends.

use super::Spot;
use super::canvas::Canvas;
use super::mask::{Slope, Tile, bounds, keep, through_tiles, to_coverage};
use super::paint::Paint;

/// The look of a line.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Stroke {
    /// Width in pixels; less than 1 is drawn as 1 pixel.
    pub width_px: f64,
    /// Gaps, or none for a solid line.
    pub dash: Option<Dash>,
    /// Whether the line and each of its dashes end in half a disc or square at the last place.
    pub round_ends: bool,
}

/// A pattern of dashes and gaps.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Dash {
    /// Length of a dash in pixels.
    pub on_px: f64,
    /// Length of a gap in pixels.
    pub off_px: f64,
    /// Whether the pattern is stretched or squeezed a little so that the line begins and ends with a whole dash.
    pub fit: bool,
}

/// A line may hold so many dashes; a longer one is drawn solid, since it cannot lie on any frame.
const MOST_DASHES: f64 = 10_000.0;

impl Stroke {
    /// A solid line with square ends.
    pub const fn solid(width_px: f64) -> Self {
        Self { width_px, dash: None, round_ends: false }
    }

    /// Evenly dashed, beginning and ending with a whole dash.
    pub const fn dashed(width_px: f64, on_px: f64, off_px: f64) -> Self {
        Self { width_px, dash: Some(Dash { on_px, off_px, fit: true }), round_ends: false }
    }

    /// The same with round ends.
    pub const fn with_round_ends(self) -> Self {
        Self { round_ends: true, ..self }
    }

    fn radius(&self) -> f64 {
        if self.width_px > 1.0 { self.width_px / 2.0 } else { 0.5 }
    }
}

/// Draws the line through `points` in order. A place that is not finite leaves a gap there, and the dashes begin anew
/// after it.
pub fn polyline(
    canvas: &mut Canvas<'_>,
    points: impl Iterator<Item = Spot> + Clone,
    stroke: Stroke,
    paint: impl Into<Paint>,
) {
    let paint = paint.into();
    match keep(points.clone()) {
        Some(kept) => lay(canvas, kept.iter().copied(), stroke, paint),
        None => lay(canvas, points, stroke, paint),
    }
}

fn lay(canvas: &mut Canvas<'_>, points: impl Iterator<Item = Spot> + Clone, stroke: Stroke, paint: Paint) {
    let Some(area) = bounds(points.clone(), stroke.radius() + 1.0) else { return };
    through_tiles(canvas, area, paint, |tile| {
        let mut rest = points.clone();
        while let Some(start) = rest.find(|spot| spot.is_finite()) {
            let run = core::iter::once(start).chain(rest.clone().take_while(|spot| spot.is_finite()));
            stroke_run(tile, run, stroke);
            // Walks past the run in the same way in which it was taken.
            rest.by_ref().find(|spot| !spot.is_finite());
        }
    });
}

/// Draws one straight line.
pub fn segment(canvas: &mut Canvas<'_>, from: Spot, to: Spot, stroke: Stroke, paint: impl Into<Paint>) {
    polyline(canvas, [from, to].into_iter(), stroke, paint);
}

/// How a piece ends.
#[derive(Clone, Copy, PartialEq)]
enum End {
    /// Cut off square, smoothed by area.
    Square,
    /// Half a disc round the last place.
    Round,
    /// Goes on in the next piece, which brings the disc.
    Joined,
}

fn stroke_run(tile: &mut Tile, run: impl Iterator<Item = Spot> + Clone, stroke: Stroke) {
    let end = if stroke.round_ends { End::Round } else { End::Square };
    let radius = stroke.radius();
    let mut pieces = DashWalk::new(run.clone(), stroke.dash);
    let mut points = run;
    let Some(mut from) = points.next() else { return };
    let mut first = true;
    let mut next = points.next();
    while let Some(to) = next {
        next = points.next();
        let reach = radius + 1.0;
        let near = tile.meets(
            from.x.min(to.x) - reach,
            from.y.min(to.y) - reach,
            from.x.max(to.x) + reach,
            from.y.max(to.y) + reach,
        );
        let (start, stop) = (if first { end } else { End::Round }, if next.is_some() { End::Joined } else { end });
        match pieces.as_mut() {
            None if near => piece(tile, from, to, radius, (start, stop)),
            None => {}
            Some(walk) => walk.split(from, to, near, |a, b, begins, stops| {
                let start = if begins { end } else { End::Round };
                let stop = if stops { end } else { End::Joined };
                piece(tile, a, b, radius, (start, stop));
            }),
        }
        (from, first) = (to, false);
    }
    if first && end == End::Round && stroke.dash.is_none() {
        disc(tile, from, radius);
    }
}

/// Where on the dash pattern a walk along a line stands.
struct DashWalk {
    on: f64,
    period: f64,
    at: f64,
    total: f64,
    done: f64,
}

impl DashWalk {
    /// `None` where the line is to be solid.
    fn new(run: impl Iterator<Item = Spot> + Clone, dash: Option<Dash>) -> Option<Self> {
        let dash = dash.filter(|dash| dash.on_px > 0.0 && dash.off_px > 0.0)?;
        let total: f64 = run.clone().zip(run.skip(1)).map(|(from, to)| distance(from, to)).sum();
        let period = dash.on_px + dash.off_px;
        let count = libm::round((total - dash.on_px) / period);
        // Also false for lengths that are no numbers.
        if !(count <= MOST_DASHES && total > 0.0) {
            return None;
        }
        let scale = if dash.fit && count >= 1.0 { total / (count * period + dash.on_px) } else { 1.0 };
        Some(Self { on: dash.on_px * scale, period: period * scale, at: 0.0, total, done: 0.0 })
    }

    /// Hands the dashes of one straight stretch to `draw`, with whether each begins and stops there.
    fn split(&mut self, from: Spot, to: Spot, near: bool, mut draw: impl FnMut(Spot, Spot, bool, bool)) {
        const TINY: f64 = 1e-9;
        let length = distance(from, to);
        if length.is_nan() || length <= 0.0 {
            return;
        }
        let along = |step: f64| {
            let share = step / length;
            Spot::new(from.x + (to.x - from.x) * share, from.y + (to.y - from.y) * share)
        };
        let last = self.done + length >= self.total - TINY;
        let mut step = 0.0;
        while length - step > TINY {
            let drawing = self.at < self.on - TINY;
            let left = if drawing { self.on - self.at } else { self.period - self.at };
            let next = if step + left < length { step + left } else { length };
            if drawing && near {
                let begins = self.at < TINY;
                let stops = left <= next - step + TINY || (last && next >= length);
                draw(along(step), along(next), begins, stops);
            }
            self.at += next - step;
            if self.at >= self.period - TINY {
                self.at = 0.0;
            }
            step = next;
        }
        self.done += length;
    }
}

fn distance(from: Spot, to: Spot) -> f64 {
    let (dx, dy) = (to.x - from.x, to.y - from.y);
    libm::sqrt(dx * dx + dy * dy)
}

/// Raises the coverage of one straight piece: by area along its sides and square ends, by distance round its discs.
fn piece(tile: &mut Tile, from: Spot, to: Spot, radius: f64, (start, stop): (End, End)) {
    let length = distance(from, to);
    if length.is_nan() || length <= 0.0 {
        if start == End::Round {
            disc(tile, from, radius);
        }
        return;
    }
    let (ux, uy) = ((to.x - from.x) / length, (to.y - from.y) / length);
    let slope = Slope::new(ux, uy);
    let side = radius + slope.reach();
    let (before, after) = (side, if stop == End::Joined { 0.0 } else { side });
    let full_to = radius - slope.reach();
    let (top, bottom) = (from.y.min(to.y) - side, from.y.max(to.y) + side);
    let (per_ux, per_uy) = (1.0 / ux, -1.0 / uy);
    for row in tile.rows_between(top, bottom) {
        let dy = tile.middle(0, row).y - from.y;
        // Where on this row the piece can be: between its sides, and between its ends.
        let across = crossing(per_uy, ux * dy, -side, side);
        let along = crossing(per_ux, uy * dy, -before, length + after);
        let columns = tile.columns_between(across.0.max(along.0) + from.x, across.1.min(along.1) + from.x);
        if columns.is_empty() {
            continue;
        }
        let first = tile.middle(columns.start, row).x - from.x;
        let (first_t, first_d) = (first * ux + dy * uy, dy * ux - first * uy);
        for (cell, step) in tile.row_cells(row, columns).iter_mut().zip(0..) {
            let step = f64::from(step);
            let (t, d) = (first_t + step * ux, first_d - step * uy);
            let share = if t < 0.0 && start == End::Round {
                round_share(t * t + d * d, radius)
            } else if t > length && stop != End::Square {
                if stop == End::Joined { 0.0 } else { round_share((t - length) * (t - length) + d * d, radius) }
            } else {
                let sides =
                    if d.abs() <= full_to { 1.0 } else { slope.half_plane(d + radius) - slope.half_plane(d - radius) };
                let begun = if start == End::Square { slope.half_plane(t) } else { 1.0 };
                let over = if stop == End::Square { slope.half_plane(t - length) } else { 0.0 };
                sides * (begun - over)
            };
            *cell = (*cell).max(to_coverage(share));
        }
    }
}

/// The x between which `low <= x / per_rate + rest <= high`; everything or nothing where x does not matter.
fn crossing(per_rate: f64, rest: f64, low: f64, high: f64) -> (f64, f64) {
    if per_rate.abs() > 1e12 {
        return if rest >= low && rest <= high { (f64::MIN, f64::MAX) } else { (1.0, 0.0) };
    }
    let (one, other) = ((low - rest) * per_rate, (high - rest) * per_rate);
    if one < other { (one, other) } else { (other, one) }
}

/// Coverage of a pixel whose middle is √`squared` from the middle of a disc.
#[inline]
fn round_share(squared: f64, radius: f64) -> f64 {
    let (inner, outer) = (radius - 0.5, radius + 0.5);
    if squared >= outer * outer {
        0.0
    } else if squared <= inner * inner {
        1.0
    } else {
        outer - libm::sqrt(squared)
    }
}

/// Raises the coverage of a disc.
pub(super) fn disc(tile: &mut Tile, middle: Spot, radius: f64) {
    let reach = radius + 0.5;
    for row in tile.row_span(middle.y - reach, middle.y + reach) {
        for column in tile.column_span(middle.x - reach, middle.x + reach) {
            let at = tile.middle(column, row);
            let (dx, dy) = (at.x - middle.x, at.y - middle.y);
            tile.raise(column, row, to_coverage(round_share(dx * dx + dy * dy, radius)));
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
    fn a_line_on_the_middle_of_a_row_is_crisp_and_ends_where_it_should() {
        let mut sheet = Sheet::<8, 3>::new();
        segment(&mut sheet.canvas(), Spot::new(1.0, 1.5), Spot::new(6.5, 1.5), Stroke::solid(1.0), Sheet::<8, 3>::INK);
        assert_art(&sheet, &["        ", " 888884 ", "        "]);
    }

    #[test]
    fn a_bend_is_filled_once() {
        let mut sheet = Sheet::<7, 6>::new();
        let corner = spots(&[(1.0, 2.0), (4.0, 2.0), (4.0, 6.0)]);
        polyline(&mut sheet.canvas(), corner, Stroke::solid(2.0), Sheet::<7, 6>::INK);
        assert_art(&sheet, &["       ", " 8886  ", " 8888  ", "   88  ", "   88  ", "   88  "]);
    }

    #[test]
    fn dashes_begin_and_end_whole_and_carry_on_round_the_bend() {
        let mut sheet = Sheet::<17, 1>::new();
        let straight = spots(&[(0.0, 0.5), (17.0, 0.5)]);
        polyline(&mut sheet.canvas(), straight, Stroke::dashed(1.0, 3.0, 4.0), Sheet::<17, 1>::INK);
        assert_art(&sheet, &["888    888    888"]);

        let mut broken = Sheet::<17, 1>::new();
        let same = spots(&[(0.0, 0.5), (1.5, 0.5), (8.0, 0.5), (16.0, 0.5), (17.0, 0.5)]);
        polyline(&mut broken.canvas(), same, Stroke::dashed(1.0, 3.0, 4.0), Sheet::<17, 1>::INK);
        assert_art(&broken, &["888    888    888"]);
    }

    #[test]
    fn a_hole_in_the_record_is_a_hole_in_the_line() {
        let mut sheet = Sheet::<9, 1>::new();
        let line = spots(&[(0.0, 0.5), (3.0, 0.5), (4.0, f64::NAN), (6.0, 0.5), (9.0, 0.5)]);
        polyline(&mut sheet.canvas(), line, Stroke::solid(1.0), Sheet::<9, 1>::INK);
        assert_art(&sheet, &["888   888"]);
    }

    #[test]
    fn a_slanted_line_has_the_area_of_its_length_and_width() {
        let mut sheet = Sheet::<60, 60>::new();
        let (from, to) = (Spot::new(7.3, 9.1), Spot::new(51.0, 38.6));
        segment(&mut sheet.canvas(), from, to, Stroke::solid(2.5), Sheet::<60, 60>::INK);
        let canvas = sheet.canvas();
        let ink: f64 =
            canvas.pixels().iter().map(|p| 1.0 - f64::from(embedded_graphics::prelude::RgbColor::g(p)) / 63.0).sum();
        assert!((ink / (distance(from, to) * 2.5) - 1.0).abs() < 0.01, "{ink}");
    }

    #[test]
    fn numbers_far_out_of_reach_do_no_harm() {
        let mut sheet = Sheet::<8, 4>::new();
        for stroke in [Stroke::solid(1e300), Stroke::dashed(2.0, 3.0, 2.0), Stroke::dashed(f64::NAN, 1e-300, f64::NAN)]
        {
            let wild =
                spots(&[(-1e308, 1e308), (1e308, -1e308), (f64::MAX, 2.0), (2.0, 2.0), (2.0, 2.0), (1e-308, 3.0)]);
            polyline(&mut sheet.canvas(), wild, stroke.with_round_ends(), Sheet::<8, 4>::INK);
        }
    }
}
