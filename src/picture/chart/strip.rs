//! A canal's year as a strip: full, short and cut, each with a colour and a pattern.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::primitives::Rectangle;

use super::super::Spot;
use super::super::area::polygon;
use super::super::canvas::Canvas;
use super::super::paint::Paint;
use super::super::shape::frame;
use super::super::theme::Theme;
use super::Plot;

/// What a day was for a canal.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum DayMark {
    /// Nothing was asked for.
    Idle,
    /// It got all it was due.
    Full,
    /// It got some.
    Short,
    /// It got none.
    Cut,
}

/// Draws a year of days along the plot: full days solid, short days hatched on a pale ground, cut days an empty frame,
/// idle days a thin line at mid-height. The first day begins at the left edge; the plot's height is used in full.
pub fn year_strip(canvas: &mut Canvas<'_>, plot: &Plot, days: impl Iterator<Item = DayMark> + Clone, theme: &Theme) {
    let mut rest = days.enumerate().peekable();
    let mut begin = 0;
    while let Some((day, mark)) = rest.next() {
        if rest.peek().is_none_or(|&(_, next)| next != mark) {
            run(canvas, plot, begin, day + 1, mark, theme);
            begin = day + 1;
        }
    }
}

fn run(canvas: &mut Canvas<'_>, plot: &Plot, begin: usize, end: usize, mark: DayMark, theme: &Theme) {
    let x = |day: usize| plot.x(plot.across.0 + day as f64);
    let (top, height) = (plot.area.top_left.y, plot.area.size.height);
    let (left, right) = (x(begin), x(end));
    let mut fill = |paint: Paint, top: f64, bottom: f64| {
        let corners = [(left, top), (right, top), (right, bottom), (left, bottom)].map(|(x, y)| Spot::new(x, y));
        polygon(canvas, corners.into_iter(), paint);
    };
    let bottom = f64::from(top) + f64::from(height);
    match mark {
        DayMark::Full => fill(theme.water.into(), f64::from(top), bottom),
        DayMark::Short => {
            fill(theme.lack_pale.into(), f64::from(top), bottom);
            fill(theme.lack_hatch(), f64::from(top), bottom);
        }
        DayMark::Cut => {
            let edge = theme.lack.into();
            fill(edge, f64::from(top), bottom);
            let (left, right) = (left + 1.0, right - 1.0);
            let (top, bottom) = (f64::from(top) + 1.0, bottom - 1.0);
            if right > left && bottom > top {
                let corners =
                    [(left, top), (right, top), (right, bottom), (left, bottom)].map(|(x, y)| Spot::new(x, y));
                polygon(canvas, corners.into_iter(), theme.card);
            }
        }
        DayMark::Idle => {
            let middle = libm::floor((f64::from(top) + bottom) / 2.0);
            fill(theme.rule.into(), middle, middle + 1.0);
        }
    }
}

/// A sample of one mark for a legend, filling `area`.
pub fn swatch(canvas: &mut Canvas<'_>, area: Rectangle, mark: DayMark, theme: &Theme) {
    match mark {
        DayMark::Full => canvas.fill(area, theme.water),
        DayMark::Short => {
            canvas.fill(area, theme.lack_pale);
            canvas.paint(area, theme.lack_hatch());
        }
        DayMark::Cut => {
            canvas.fill(area, theme.card);
            frame(canvas, area, 1, theme.lack);
        }
        DayMark::Idle => {
            let y = area.top_left.y.saturating_add_unsigned(area.size.height / 2);
            canvas.fill(Rectangle::new(Point::new(area.top_left.x, y), Size::new(area.size.width, 1)), theme.rule);
        }
    }
}
