//! As it was, dashed, and with your changes, solid.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::super::Spot;
use super::super::area::{Between, between, under};
use super::super::canvas::Canvas;
use super::super::line::{Stroke, polyline, segment};
use super::super::paint::Paint;
use super::super::theme::Theme;
use super::Plot;

/// How a pair of lines is drawn.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct LinePair {
    /// Width of the solid line in pixels; the dashed one is three fifths of it, and at least one.
    pub width_px: f64,
    /// Colour of the solid line.
    pub line: Rgb565,
    /// What fills the area under the solid line, if anything.
    pub area: Option<Paint>,
    /// What fills the area in which the solid line runs below the dashed one, if anything.
    pub lack: Option<Paint>,
}

impl LinePair {
    /// Water: a blue line over a pale ground.
    pub const fn water(width_px: f64, theme: &Theme) -> Self {
        Self { width_px, line: theme.water, area: Some(Paint::Solid(theme.water_pale)), lack: None }
    }

    /// The same with the lack hatched.
    pub const fn with_lack(self, theme: &Theme) -> Self {
        Self { lack: Some(theme.lack_hatch()), ..self }
    }
}

/// The line of what was, for a solid line of `width_px`.
pub fn as_it_was(width_px: f64) -> Stroke {
    let width = (width_px * 0.6).max(1.0);
    Stroke::dashed(width, width * 3.0 + 1.0, width * 2.0 + 0.5)
}

/// Draws both lines in the plot, cut off at its sides but not at its top and bottom. Each value belongs to the middle
/// of its day: the first to half a day after the left edge. A value that is not finite leaves a gap.
pub fn line_pair(
    canvas: &mut Canvas<'_>,
    plot: &Plot,
    was: impl Iterator<Item = f64> + Clone,
    now: impl Iterator<Item = f64> + Clone,
    look: LinePair,
    theme: &Theme,
) {
    let place = |(day, value): (usize, f64)| plot.spot(plot.across.0 + day as f64 + 0.5, value);
    let stride = days_a_pixel(plot);
    if let Some(paint) = look.area {
        let now = Outstanding::of(now.clone(), stride).map(place);
        under(canvas, now, plot.y(plot.up.0), paint);
    }
    if let Some(paint) = look.lack {
        let (was, now) = (was.clone().enumerate().map(place), now.clone().enumerate().map(place));
        between(canvas, was, now, Between::FirstHigher, paint);
    }
    let (was, now) = (Outstanding::of(was, stride).map(place), Outstanding::of(now, stride).map(place));
    polyline(canvas, now, Stroke::solid(look.width_px).with_round_ends(), look.line);
    polyline(canvas, was, as_it_was(look.width_px), theme.ink);
}

/// How many days share a pixel of the plot, rounded; at least one.
fn days_a_pixel(plot: &Plot) -> usize {
    let days = (plot.across.1 - plot.across.0).abs();
    // The cast takes what is no number as zero.
    (libm::round(days / f64::from(plot.area.size.width.max(1))) as usize).max(1)
}

/// Of the days that share a pixel the one that stands out most from what came before, so that a line costs what its
/// width costs and no peak is lost. The first day stands by itself, and a gap stays one.
#[derive(Clone)]
struct Outstanding<I> {
    values: core::iter::Enumerate<I>,
    stride: usize,
    before: Option<f64>,
}

impl<I: Iterator<Item = f64>> Outstanding<I> {
    fn of(values: I, stride: usize) -> Self {
        Self { values: values.enumerate(), stride, before: None }
    }
}

impl<I: Iterator<Item = f64>> Iterator for Outstanding<I> {
    type Item = (usize, f64);

    fn next(&mut self) -> Option<Self::Item> {
        let mut best = self.values.next()?;
        if let Some(before) = self.before {
            for _ in 1..self.stride {
                let Some(next) = self.values.next() else { break };
                // What is no number compares as nothing does, and stays.
                if !next.1.is_finite() || (next.1 - before).abs() > (best.1 - before).abs() {
                    best = next;
                }
            }
        }
        self.before = Some(best.1);
        Some(best)
    }
}

/// Draws the range in which the answer lies, from `low` to `high` day by day: a thin wash of `colour` under fine
/// stripes. Days count as in [`line_pair`]; draw the range first.
pub fn range_band(
    canvas: &mut Canvas<'_>,
    plot: &Plot,
    low: impl Iterator<Item = f64> + Clone,
    high: impl Iterator<Item = f64> + Clone,
    colour: Rgb565,
    theme: &Theme,
) {
    let place = |(day, value): (usize, f64)| plot.spot(plot.across.0 + day as f64 + 0.5, value);
    let (low, high) = (low.enumerate().map(place), high.enumerate().map(place));
    between(canvas, high.clone(), low.clone(), Between::Either, Paint::Wash { colour, share: 60 });
    between(canvas, high, low, Between::Either, theme.range_hatch());
}

/// A short piece of the solid line for a legend, in the middle of `area`.
pub fn swatch_with_changes(canvas: &mut Canvas<'_>, area: Rectangle, width_px: f64, colour: Rgb565) {
    let (from, to) = ends(area, width_px);
    segment(canvas, from, to, Stroke::solid(width_px), colour);
}

/// A short piece of the dashed line for a legend, in the middle of `area`.
pub fn swatch_as_it_was(canvas: &mut Canvas<'_>, area: Rectangle, width_px: f64, theme: &Theme) {
    let stroke = as_it_was(width_px);
    let (from, to) = ends(area, stroke.width_px);
    segment(canvas, from, to, stroke, theme.ink);
}

/// Marks one day of the plot with a crisp upright line from its top to its bottom and gives the line's x.
pub fn day_cursor(canvas: &mut Canvas<'_>, plot: &Plot, day: f64, colour: Rgb565) -> f64 {
    let x = libm::floor(plot.x(day));
    let Rectangle { top_left, size } = plot.area;
    // The cast saturates far out, where nothing is drawn.
    canvas.fill(Rectangle::new(Point::new(x as i32, top_left.y), Size::new(1, size.height)), colour);
    x + 0.5
}

/// The ends of a level line in the middle of `area`, moved so that its sides lie between rows.
fn ends(area: Rectangle, width_px: f64) -> (Spot, Spot) {
    let Point { x, y } = area.top_left;
    let half = width_px / 2.0;
    let middle = libm::round(f64::from(y) + f64::from(area.size.height) / 2.0 - half) + half;
    (Spot::new(f64::from(x), middle), Spot::new(f64::from(x) + f64::from(area.size.width), middle))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn days_that_share_a_pixel_are_told_by_the_one_that_stands_out() {
        let picked = |values: &[f64], stride| {
            let mut out = [(0, 0.0); 8];
            let count =
                Outstanding::of(values.iter().copied(), stride).zip(&mut out).map(|(day, to)| *to = day).count();
            (out, count)
        };
        let values = [1.0, 1.0, 9.0, 8.0, 0.0, 0.5];
        let (out, count) = picked(&values, 2);
        assert_eq!(out[..count], [(0, 1.0), (2, 9.0), (4, 0.0), (5, 0.5)]);
        let (out, count) = picked(&values, 1);
        assert_eq!((count, out[3]), (6, (3, 8.0)));
        let (out, count) = picked(&[1.0, 2.0, f64::NAN, 3.0, 4.0], 2);
        assert!(count == 3 && out[1].0 == 2 && out[1].1.is_nan(), "a gap stays a gap: {out:?}");
    }
}
