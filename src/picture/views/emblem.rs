//! Small signs that say something without words: yes, in part, no; a warning; a hand on the knob.

use embedded_graphics::primitives::Rectangle;

use super::facts::Verdict;
use crate::picture::line::{polyline, segment};
use crate::picture::shape::{disc, ring, triangle};
use crate::picture::{Canvas, Spot, Stroke, Theme};

/// How full the moon of a statement is.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Moon {
    /// It holds.
    Full,
    /// It holds in part.
    Half,
    /// It does not hold.
    Empty,
}

impl From<Verdict> for Moon {
    fn from(verdict: Verdict) -> Self {
        match verdict {
            Verdict::Holds => Self::Full,
            Verdict::Weakens => Self::Half,
            Verdict::Fails => Self::Empty,
        }
    }
}

/// A ring that is full, half full or empty; an empty one is struck through and has the colour of a lack.
pub(super) fn moon(canvas: &mut Canvas<'_>, middle: Spot, radius_px: f64, moon: Moon, theme: &Theme) {
    let width = (radius_px / 4.0).max(1.5);
    match moon {
        Moon::Full => disc(canvas, middle, radius_px, theme.water),
        Moon::Half => {
            let (left, top) = ((middle.x - radius_px - 1.0) as i32, middle.y as i32);
            let half = super::layout::area(left, top, (radius_px * 2.0) as i32 + 3, radius_px as i32 + 2);
            canvas.within(half, |canvas| disc(canvas, middle, radius_px, theme.water));
            ring(canvas, middle, radius_px, width, theme.water);
        }
        Moon::Empty => {
            ring(canvas, middle, radius_px, width, theme.lack);
            let reach = radius_px * 0.65;
            let (from, to) =
                (Spot::new(middle.x - reach, middle.y + reach), Spot::new(middle.x + reach, middle.y - reach));
            segment(canvas, from, to, Stroke::solid(width), theme.lack);
        }
    }
}

/// A triangle with a stroke and a dot in it.
pub(super) fn warning(canvas: &mut Canvas<'_>, place: Rectangle, theme: &Theme) {
    let (left, top) = (f64::from(place.top_left.x), f64::from(place.top_left.y));
    let (wide, high) = (f64::from(place.size.width), f64::from(place.size.height));
    let middle = left + wide / 2.0;
    let corners = [Spot::new(left, top + high), Spot::new(middle, top), Spot::new(left + wide, top + high)];
    triangle(canvas, corners, theme.lack);
    let thick = (wide / 8.0).max(1.2);
    let (from, to) = (Spot::new(middle, top + high * 0.38), Spot::new(middle, top + high * 0.66));
    segment(canvas, from, to, Stroke::solid(thick), theme.on_lack);
    disc(canvas, Spot::new(middle, top + high * 0.84), thick * 0.62, theme.on_lack);
}

/// What a hand does with the knob.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Hand {
    /// It turns it.
    Turn,
    /// It presses it.
    Press,
    /// It holds it down.
    Hold,
}

/// The knob from above, and what is done with it.
pub(super) fn knob(canvas: &mut Canvas<'_>, middle: Spot, radius_px: f64, hand: Hand, theme: &Theme) {
    let inner = radius_px * 0.62;
    let width = (radius_px / 7.0).max(1.2);
    match hand {
        Hand::Turn => {
            ring(canvas, middle, inner, width, theme.ink);
            let mark = |share: f64| Spot::new(middle.x + inner * 0.55 * share, middle.y - inner * 0.8 * share);
            segment(canvas, mark(0.25), mark(0.95), Stroke::solid(width), theme.ink);
            // Three quarters of a turn round the knob, with heads at both ends.
            let around = |turn: f64| {
                let angle = core::f64::consts::TAU * turn;
                Spot::new(middle.x + radius_px * libm::sin(angle), middle.y - radius_px * libm::cos(angle))
            };
            for (from, to) in [(-0.30, -0.06), (0.30, 0.06)] {
                let course = (0..=8).map(|step| around(from + (to - from) * f64::from(step) / 8.0));
                polyline(canvas, course, Stroke::solid(width), theme.lack);
                let (tip, back) = (around(from), around(from + (to - from) * 0.35));
                let (dx, dy) = (tip.x - back.x, tip.y - back.y);
                let side = |way: f64| Spot::new(tip.x - dx * 0.5 - way * dy * 0.75, tip.y - dy * 0.5 + way * dx * 0.75);
                let head = Spot::new(tip.x + dx * 0.5, tip.y + dy * 0.5);
                triangle(canvas, [side(1.0), head, side(-1.0)], theme.lack);
            }
        }
        Hand::Press | Hand::Hold => {
            ring(canvas, middle, inner, width, theme.ink);
            disc(canvas, middle, inner * 0.55, theme.lack);
            if hand == Hand::Hold {
                ring(canvas, middle, radius_px, width, theme.lack);
            }
        }
    }
}
