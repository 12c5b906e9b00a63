//! The months along the bottom of a year, and a scale up its side.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::primitives::Rectangle;

use super::super::canvas::Canvas;
use super::super::lettering::{Align, Face, draw, measure};
use super::super::theme::Theme;
use super::{Plot, Steps, nice_steps};

/// The months of a chart, in order.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Months<'t> {
    /// The value of the axis (a day) at which each month begins, and after the last of them its end: one more than
    /// there are names.
    pub begins: &'t [f64],
    /// What to write under each month.
    pub names: &'t [&'t str],
}

/// Draws the axis along the bottom edge of the plot: a line, a tick where each month truly begins and its name in the
/// middle of it. Where the names have no room side by side, the first letter of each stands for it; where even that has
/// none, every third. The height used below the plot is in the answer.
pub fn month_axis(canvas: &mut Canvas<'_>, plot: &Plot, months: Months<'_>, face: Face, theme: &Theme) -> u32 {
    let Rectangle { top_left, size } = plot.area;
    let y = top_left.y.saturating_add_unsigned(size.height);
    let tick = u32::from(face.px() / 4).max(3);
    canvas.fill(Rectangle::new(Point::new(top_left.x, y), Size::new(size.width, 1)), theme.rule);
    for &day in months.begins {
        // The last tick belongs on the last column, not on the one after it.
        let x = (plot.x(day) as i32).min(top_left.x.saturating_add_unsigned(size.width.saturating_sub(1)));
        if x >= top_left.x {
            canvas.fill(Rectangle::new(Point::new(x, y), Size::new(1, tick)), theme.rule);
        }
    }
    let spans = || months.begins.windows(2).zip(months.names);
    let room = |span: &[f64]| plot.x(span[1]) - plot.x(span[0]);
    let gap = f64::from(face.px()) / 4.0;
    let fits =
        |shown: fn(&str) -> &str| spans().all(|(s, name)| f64::from(measure(shown(name), face).width) + gap <= room(s));
    let (shown, every): (fn(&str) -> &str, usize) = if fits(|name| name) {
        (|name| name, 1)
    } else if fits(initial) {
        (initial, 1)
    } else {
        (initial, 3)
    };
    let top = y.saturating_add_unsigned(tick + 2);
    for (span, name) in spans().step_by(every) {
        let middle = (plot.x(span[0]) + plot.x(span[1])) / 2.0;
        let at = Point::new(libm::round(middle) as i32, top);
        draw(canvas, shown(name), at, face, theme.quiet, Align::CENTRE.cap_top());
    }
    tick + 2 + face.cap_px() as u32 + face.descent_px() as u32
}

fn initial(name: &str) -> &str {
    let end = name.char_indices().nth(1).map_or(name.len(), |(at, _)| at);
    &name[..end]
}

/// Round values for the side of the plot, as many as have room for their numbers in `face`, at most seven. `None` where
/// the plot has no range or no height.
pub fn level_steps(plot: &Plot, face: Face) -> Option<Steps> {
    let room = plot.area.size.height / (face.line_px() as u32).max(1);
    nice_steps(plot.up.0, plot.up.1, (room as usize + 1).min(7))
}

/// Draws the scale at the left edge of the plot: hairlines at the steps and their numbers, written by `write`, right
/// up to `gap_px` before the plot.
pub fn level_axis<const N: usize>(
    canvas: &mut Canvas<'_>,
    plot: &Plot,
    steps: &Steps,
    write: impl Fn(f64) -> heapless::String<N>,
    face: Face,
    gap_px: i32,
    theme: &Theme,
) {
    let Rectangle { top_left, size } = plot.area;
    for value in steps.values() {
        let y = libm::round(plot.y(value));
        let row = (y as i32).min(top_left.y.saturating_add_unsigned(size.height));
        if value != plot.up.0 {
            canvas.fill(Rectangle::new(Point::new(top_left.x, row), Size::new(size.width, 1)), theme.faint);
        }
        let at = Point::new(top_left.x.saturating_sub(gap_px), row);
        draw(canvas, &write(value), at, face, theme.quiet, Align::RIGHT.cap_middle());
    }
}
