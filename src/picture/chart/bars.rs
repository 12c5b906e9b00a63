//! A bar with your changes and, over it, the mark of what was.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::super::Spot;
use super::super::canvas::Canvas;
use super::super::line::{Stroke, segment};
use super::super::shape::frame;
use super::super::theme::Theme;

/// Two shares of a whole, 0 to 1.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct BarPair {
    /// As it was, or `None` where there is nothing to compare with.
    pub was: Option<f64>,
    /// With your changes.
    pub now: f64,
    /// Colour of the bar.
    pub fill: Rgb565,
}

/// Draws a level bar in `area`: the frame is the whole, filled from the left as far as `now`, what lies between `now`
/// and a greater `was` hatched as a lack, and a dashed upright line at `was` that stands out above and below.
/// Shares beyond 0 and 1 end at the edge and nothing is drawn for one that is no number.
pub fn bar_pair(canvas: &mut Canvas<'_>, area: Rectangle, pair: BarPair, theme: &Theme) {
    let Size { width, height } = area.size;
    let Point { x, y } = area.top_left;
    canvas.fill(area, theme.card);
    // The cast takes what is no number as nothing.
    let columns = |share: f64| libm::round(share.clamp(0.0, 1.0) * f64::from(width)) as u32;
    let now = columns(pair.now);
    if let Some(was) = pair.was.map(columns).filter(|&was| was > now) {
        let lack = Rectangle::new(Point::new(x.saturating_add_unsigned(now), y), Size::new(was - now, height));
        canvas.fill(lack, theme.lack_pale);
        canvas.paint(lack, theme.lack_hatch());
    }
    frame(canvas, area, 1, theme.rule);
    canvas.fill(Rectangle::new(area.top_left, Size::new(now, height)), pair.fill);
    if let Some(was) = pair.was.filter(|was| !was.is_nan()) {
        let column = (columns(was).min(width.saturating_sub(1))) as f64 + f64::from(x) + 0.5;
        let (top, bottom) = (f64::from(y) - 3.0, f64::from(y) + f64::from(height) + 3.0);
        segment(canvas, Spot::new(column, top), Spot::new(column, bottom), Stroke::solid(3.0), theme.paper);
        segment(canvas, Spot::new(column, top), Spot::new(column, bottom), Stroke::dashed(1.0, 3.0, 2.0), theme.ink);
    }
}
