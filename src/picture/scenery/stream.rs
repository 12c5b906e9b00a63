//! Running water: a stream whose width is its flow, and a channel filled to its depth with the mark of its minimum.

use super::super::Spot;
use super::super::area::{Between, between, polygon};
use super::super::canvas::Canvas;
use super::super::line::{Stroke, polyline};
use super::super::theme::Theme;

/// Draws a stream along `course`, `width_px` wide; a dry one as a dotted bed.
pub fn draw_stream(canvas: &mut Canvas<'_>, course: impl Iterator<Item = Spot> + Clone, width_px: f64, theme: &Theme) {
    if width_px > 0.0 {
        polyline(canvas, course, Stroke::solid(width_px).with_round_ends(), theme.water);
    } else {
        polyline(canvas, course, Stroke::dashed(1.0, 1.0, 3.0), theme.rule);
    }
}

/// Draws a river bed from (left, top) on, falling by `fall_px` to the right, `deep_px` deep, filled to `share` of its
/// depth; dashes at `minimum` of its depth.
pub fn draw_channel(
    canvas: &mut Canvas<'_>,
    (left, right): (f64, f64),
    (top, deep_px, fall_px): (f64, f64, f64),
    (share, minimum): (f64, Option<f64>),
    stroke: Stroke,
    theme: &Theme,
) {
    let line = move |depth: f64| {
        let y = top + deep_px * (1.0 - depth);
        [Spot::new(left, y), Spot::new(right, y + fall_px)].into_iter()
    };
    // One pixel higher than the bed: no seam is left between it and the air above.
    polygon(canvas, line(1.0 + 1.0 / deep_px.max(1.0)).chain(line(0.0).rev()), theme.sky);
    let share = if share > 0.0 { share.min(1.0) } else { 0.0 };
    between(canvas, line(share), line(0.0), Between::FirstHigher, theme.water);
    if let Some(minimum) = minimum.filter(|minimum| *minimum > 0.0) {
        let depth = minimum.min(1.0);
        polyline(canvas, line(depth), stroke, theme.ink);
    }
}
