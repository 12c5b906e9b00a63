//! Pieces of charts: scales, axes, pairs of lines, strips, bars, labels that keep clear of each other, contours.
//!
//! A [`Plot`] ties values to a box of the frame; the pieces draw in it. Words and numbers come in as text: how a number
//! is written depends on the region, which is not known here.

mod axis;
mod bars;
mod contour;
mod labels;
mod lines;
mod steps;
mod strip;

pub use axis::{Months, level_axis, level_steps, month_axis};
pub use bars::{BarPair, bar_pair};
pub use contour::{Field, contour, shade};
pub use labels::{EndLabel, MOST_LABELS, end_labels};
pub use lines::{LinePair, as_it_was, day_cursor, line_pair, range_band, swatch_as_it_was, swatch_with_changes};
pub use steps::{Steps, nice_steps};
pub use strip::{DayMark, swatch, year_strip};

use embedded_graphics::primitives::Rectangle;

use super::Spot;

/// A box of the frame with the values at its edges.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Plot {
    /// The box in the frame.
    pub area: Rectangle,
    /// The value at the left edge and at the right edge.
    pub across: (f64, f64),
    /// The value at the bottom edge and at the top edge.
    pub up: (f64, f64),
}

impl Plot {
    /// The x of a value along the bottom, in pixels of the frame. Values beyond the edges lie outside of the box; where
    /// both edges have the same value, everything lies on the left one.
    pub fn x(&self, value: f64) -> f64 {
        let left = f64::from(self.area.top_left.x);
        left + along(value, self.across, self.area.size.width)
    }

    /// The y of a value up the side, in pixels of the frame; likewise.
    pub fn y(&self, value: f64) -> f64 {
        let bottom = f64::from(self.area.top_left.y) + f64::from(self.area.size.height);
        bottom - along(value, self.up, self.area.size.height)
    }

    /// The place of a pair of values.
    pub fn spot(&self, across: f64, up: f64) -> Spot {
        Spot::new(self.x(across), self.y(up))
    }

    /// The value along the bottom at an x of the frame, for a finger that points at a day.
    pub fn across_at(&self, x: f64) -> f64 {
        let share = (x - f64::from(self.area.top_left.x)) / f64::from(self.area.size.width.max(1));
        self.across.0 + share * (self.across.1 - self.across.0)
    }
}

fn along(value: f64, (from, to): (f64, f64), length: u32) -> f64 {
    // Multiplied first: where a day is a whole number of pixels wide, it stays so.
    if to == from { 0.0 } else { (value - from) * f64::from(length) / (to - from) }
}

#[cfg(test)]
mod tests {
    use super::*;
    use embedded_graphics::geometry::{Point, Size};

    #[test]
    fn values_lie_where_they_should_and_come_back() {
        let area = Rectangle::new(Point::new(10, 20), Size::new(100, 50));
        let plot = Plot { area, across: (0.0, 365.0), up: (0.0, 5.0) };
        assert_eq!(plot.spot(0.0, 0.0), Spot::new(10.0, 70.0));
        assert_eq!(plot.spot(365.0, 5.0), Spot::new(110.0, 20.0));
        assert!((plot.across_at(plot.x(123.0)) - 123.0).abs() < 1e-9);
        assert_eq!(Plot { up: (2.0, 2.0), ..plot }.y(2.0), 70.0);
    }
}
