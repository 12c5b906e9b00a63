//! The mark of one year: a disc where it was enough, an arrow down and a hatched gap where it was not, a ring as it was.

use crate::picture::area::polygon;
use crate::picture::chart::{Plot, as_it_was};
use crate::picture::line::segment;
use crate::picture::shape::{disc, ring, triangle};
use crate::picture::{Canvas, Spot, Stroke, Theme};

use super::super::layout::Layout;

/// What a mark shows.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct YearMark {
    /// With your changes.
    pub now: Option<f64>,
    /// As it was.
    pub was: Option<f64>,
    /// What counts as enough; `None` where nothing is judged.
    pub enough: Option<f64>,
}

impl YearMark {
    fn is_short(&self) -> bool {
        matches!((self.now, self.enough), (Some(now), Some(enough)) if now < enough)
    }
}

/// Draws the mark of the year at `index`.
pub(super) fn draw_mark(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    plot: &Plot,
    index: usize,
    mark: YearMark,
    theme: &Theme,
) {
    let x = plot.x(index as f64 + 0.5);
    let slot = plot.x(1.0) - plot.x(0.0);
    let radius = (slot * 0.36).min(f64::from(layout.label.px()) * 0.42).max(1.2);
    let Some(now) = mark.now else {
        // Nobody asked for water: a short level stroke on the foot.
        let y = f64::from(plot.area.top_left.y) + f64::from(plot.area.size.height) - 1.0;
        segment(canvas, Spot::new(x - radius, y), Spot::new(x + radius, y), Stroke::solid(2.0), theme.rule);
        return;
    };
    let at = Spot::new(x, plot.y(now));
    if let (true, Some(enough)) = (mark.is_short(), mark.enough) {
        let half = (radius * 0.7).max(1.0);
        let (top, foot) = (plot.y(enough), at.y);
        let corners = [(x - half, top), (x + half, top), (x + half, foot), (x - half, foot)];
        let corners = corners.map(|(x, y)| Spot::new(x, y));
        polygon(canvas, corners.into_iter(), theme.lack_pale);
        polygon(canvas, corners.into_iter(), theme.lack_hatch());
    }
    let stroke = as_it_was(layout.line_px);
    if let Some(was) = mark.was.map(|was| Spot::new(x, plot.y(was))) {
        // Below the line of enough the hatched gap ties the two together already.
        let tied = mark.enough.filter(|_| mark.is_short()).map_or(at.y, |enough| plot.y(enough));
        if tied - was.y > radius || (tied == at.y && was.y - at.y > radius * 2.0) {
            segment(canvas, was, Spot::new(x, tied), stroke, theme.ink);
        }
        if (was.y - at.y).abs() > radius * 0.5 {
            ghost(canvas, was, radius * 0.95, stroke.width_px, theme);
        }
    }
    sample(canvas, at, radius, mark, theme);
}

/// The mark alone.
pub(super) fn sample(canvas: &mut Canvas<'_>, at: Spot, radius_px: f64, mark: YearMark, theme: &Theme) {
    if mark.is_short() {
        let (wide, high) = (radius_px * 1.15, radius_px * 0.95);
        let corner = |x: f64, y: f64| Spot::new(at.x + x * wide, at.y + y * high);
        triangle(canvas, [corner(-1.0, -1.0), corner(1.0, -1.0), corner(0.0, 1.0)], theme.lack);
    } else {
        disc(canvas, at, radius_px, theme.water);
    }
}

/// The ring of what was.
pub(super) fn ghost(canvas: &mut Canvas<'_>, at: Spot, radius_px: f64, width_px: f64, theme: &Theme) {
    disc(canvas, at, radius_px, theme.paper);
    ring(canvas, at, radius_px, width_px.min(radius_px), theme.ink);
}
