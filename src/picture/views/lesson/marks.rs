//! The mark of a group: a letter on a shape, so that colour is never the only sign.

use embedded_graphics::geometry::Point;
use embedded_graphics::pixelcolor::Rgb565;

use crate::picture::area::polygon;
use crate::picture::lettering::draw as draw_text;
use crate::picture::shape::{disc, ring};
use crate::picture::{Align, Canvas, Face, Spot, Stroke, Theme};

/// Shapes before they come again; the letter goes on.
const SHAPES: u8 = 6;

/// The letter of a group.
pub(super) fn letter(group: u8) -> char {
    char::from(b'A' + group.min(25))
}

/// How a mark looks.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Look {
    /// Its guess is in, or its guess itself.
    Full,
    /// It guesses now.
    AtHand,
    /// It has still to guess.
    Empty,
}

/// Draws the mark of a group around `middle`, its letter in `face`.
pub(super) fn draw_group(
    canvas: &mut Canvas<'_>,
    group: u8,
    middle: Spot,
    radius_px: f64,
    look: Look,
    face: Face,
    theme: &Theme,
) {
    let (fill, ink) = match look {
        Look::Full => (theme.ink, theme.paper),
        Look::AtHand => (theme.lack, theme.on_lack),
        Look::Empty => (theme.paper, theme.quiet),
    };
    let edge = if look == Look::Empty { theme.quiet } else { theme.paper };
    let width = (radius_px / 7.0).max(1.0);
    shape(canvas, group, middle, radius_px, edge);
    shape(canvas, group, middle, radius_px - width, fill);
    let drop = if group % SHAPES == 2 {
        radius_px * 0.25
    } else if group % SHAPES == 4 {
        -radius_px * 0.25
    } else {
        0.0
    };
    let at = Point::new(libm::round(middle.x) as i32, libm::round(middle.y + drop) as i32);
    let mut text = [0_u8; 4];
    draw_text(canvas, letter(group).encode_utf8(&mut text), at, face, ink, Align::CENTRE.cap_middle());
}

fn shape(canvas: &mut Canvas<'_>, group: u8, middle: Spot, radius: f64, colour: Rgb565) {
    let corner = |x: f64, y: f64| Spot::new(middle.x + x * radius, middle.y + y * radius);
    let of = |canvas: &mut Canvas<'_>, corners: &[(f64, f64)]| {
        polygon(canvas, corners.iter().map(|&(x, y)| corner(x, y)), colour);
    };
    match group % SHAPES {
        0 => disc(canvas, middle, radius, colour),
        1 => of(canvas, &[(-0.88, -0.88), (0.88, -0.88), (0.88, 0.88), (-0.88, 0.88)]),
        2 => of(canvas, &[(0.0, -1.32), (1.32, 0.92), (-1.32, 0.92)]),
        3 => of(canvas, &[(0.0, -1.2), (1.2, 0.0), (0.0, 1.2), (-1.2, 0.0)]),
        4 => of(canvas, &[(0.0, 1.32), (1.32, -0.92), (-1.32, -0.92)]),
        _ => of(canvas, &[(-0.55, -0.98), (0.55, -0.98), (1.1, 0.0), (0.55, 0.98), (-0.55, 0.98), (-1.1, 0.0)]),
    }
}

/// A hollow mark for what most people say.
pub(super) fn draw_usual(canvas: &mut Canvas<'_>, middle: Spot, radius_px: f64, theme: &Theme) {
    disc(canvas, middle, radius_px, theme.paper);
    ring(canvas, middle, radius_px, (radius_px / 3.0).max(1.5), theme.quiet);
}

/// A line from a mark down to its place on the axis.
pub(super) fn tie(canvas: &mut Canvas<'_>, from: Spot, to: Spot, theme: &Theme) {
    crate::picture::line::segment(canvas, from, to, Stroke::solid(1.0), theme.rule);
}
