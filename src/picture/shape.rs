//! Discs, rings, rounded boxes, arrows and markers.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::primitives::Rectangle;

use super::Spot;
use super::area::polygon;
use super::canvas::{Canvas, edges};
use super::line;
use super::mask::{Tile, through_tiles, to_coverage};
use super::paint::Paint;

/// Fills a disc.
pub fn disc(canvas: &mut Canvas<'_>, middle: Spot, radius_px: f64, paint: impl Into<Paint>) {
    if !(middle.is_finite() && radius_px > 0.0 && radius_px.is_finite()) {
        return;
    }
    through_tiles(canvas, around(middle, radius_px + 1.0), paint.into(), |tile| line::disc(tile, middle, radius_px));
}

/// Draws a ring whose outer edge is `radius_px` from the middle and whose width lies inside of that.
pub fn ring(canvas: &mut Canvas<'_>, middle: Spot, radius_px: f64, width_px: f64, paint: impl Into<Paint>) {
    if !(middle.is_finite() && radius_px > 0.0 && radius_px.is_finite()) {
        return;
    }
    through_tiles(canvas, around(middle, radius_px + 1.0), paint.into(), |tile| {
        each_pixel(tile, around(middle, radius_px + 1.0), |at| {
            let (dx, dy) = (at.x - middle.x, at.y - middle.y);
            let distance = libm::sqrt(dx * dx + dy * dy);
            let outside = (radius_px + 0.5 - distance).clamp(0.0, 1.0);
            outside - (radius_px - width_px + 0.5 - distance).clamp(0.0, 1.0)
        });
    });
}

/// Fills a box with rounded corners; a radius of more than half the shorter side counts as half of it.
pub fn rounded_box(canvas: &mut Canvas<'_>, area: Rectangle, radius_px: f64, paint: impl Into<Paint>) {
    let Some(outer) = Rounded::new(area, 0.0, radius_px) else { return };
    through_tiles(canvas, outer.bounds(), paint.into(), |tile| each_pixel(tile, outer.bounds(), |at| outer.share(at)));
}

/// Draws the frame of a box with rounded corners, `width_px` wide and wholly inside `area`.
pub fn rounded_frame(canvas: &mut Canvas<'_>, area: Rectangle, radius_px: f64, width_px: f64, paint: impl Into<Paint>) {
    let Some(outer) = Rounded::new(area, 0.0, radius_px) else { return };
    let inner = Rounded::new(area, width_px, (radius_px - width_px).max(0.0));
    through_tiles(canvas, outer.bounds(), paint.into(), |tile| {
        each_pixel(tile, outer.bounds(), |at| outer.share(at) - inner.as_ref().map_or(0.0, |inner| inner.share(at)));
    });
}

/// Draws the frame of a box, one whole number of pixels wide and wholly inside `area`.
pub fn frame(canvas: &mut Canvas<'_>, area: Rectangle, width_px: u32, paint: impl Into<Paint>) {
    let paint = paint.into();
    let Size { width, height } = area.size;
    let (across, down) = (width_px.min(width), width_px.min(height));
    let inner = height.saturating_sub(down.saturating_mul(2));
    let corner = area.top_left;
    let at = |x: u32, y: u32| Point::new(corner.x.saturating_add_unsigned(x), corner.y.saturating_add_unsigned(y));
    canvas.paint(Rectangle::new(corner, Size::new(width, down)), paint);
    canvas.paint(Rectangle::new(at(0, down), Size::new(across, inner)), paint);
    if width > across {
        canvas.paint(Rectangle::new(at(width - across, down), Size::new(across, inner)), paint);
    }
    if height > down {
        canvas.paint(Rectangle::new(at(0, height - down), Size::new(width, down)), paint);
    }
}

/// Fills a triangle.
pub fn triangle(canvas: &mut Canvas<'_>, corners: [Spot; 3], paint: impl Into<Paint>) {
    polygon(canvas, corners.into_iter(), paint);
}

/// Fills a diamond of `radius_px` from the middle to each corner.
pub fn diamond(canvas: &mut Canvas<'_>, middle: Spot, radius_px: f64, paint: impl Into<Paint>) {
    let corner = |x: f64, y: f64| Spot::new(middle.x + x * radius_px, middle.y + y * radius_px);
    let corners = [corner(0.0, -1.0), corner(1.0, 0.0), corner(0.0, 1.0), corner(-1.0, 0.0)];
    polygon(canvas, corners.into_iter(), paint);
}

/// Draws an arrow from `from` to its tip at `to`; the head is `head_px` long and wide, or as long as the arrow.
pub fn arrow(canvas: &mut Canvas<'_>, from: Spot, to: Spot, width_px: f64, head_px: f64, paint: impl Into<Paint>) {
    let paint = paint.into();
    let (dx, dy) = (to.x - from.x, to.y - from.y);
    let length = libm::sqrt(dx * dx + dy * dy);
    if !(length > 0.0 && length.is_finite()) {
        return;
    }
    let (ux, uy) = (dx / length, dy / length);
    let head = head_px.min(length);
    let half = width_px.max(1.0) / 2.0;
    let wing = head_px / 2.0;
    // One outline, so that shaft and head join without a seam.
    let along = |back: f64, side: f64| Spot::new(to.x - ux * back - uy * side, to.y - uy * back + ux * side);
    let corners = [
        along(length, half),
        along(head, half),
        along(head, wing),
        to,
        along(head, -wing),
        along(head, -half),
        along(length, -half),
    ];
    polygon(canvas, corners.into_iter(), paint);
}

/// Draws the marker of a day or a reading: a disc with a rim of the ground around it, so that it stands out
/// from a line of its own colour.
pub fn bead(canvas: &mut Canvas<'_>, middle: Spot, radius_px: f64, paint: impl Into<Paint>, rim: impl Into<Paint>) {
    disc(canvas, middle, radius_px + 1.5, rim);
    disc(canvas, middle, radius_px, paint);
}

fn around(middle: Spot, reach: f64) -> (f64, f64, f64, f64) {
    (middle.x - reach, middle.y - reach, middle.x + reach, middle.y + reach)
}

fn each_pixel(tile: &mut Tile, (left, top, right, bottom): (f64, f64, f64, f64), share: impl Fn(Spot) -> f64) {
    for row in tile.row_span(top, bottom) {
        for column in tile.column_span(left, right) {
            let at = tile.middle(column, row);
            tile.raise(column, row, to_coverage(share(at)));
        }
    }
}

struct Rounded {
    left: f64,
    top: f64,
    right: f64,
    bottom: f64,
    radius: f64,
}

impl Rounded {
    fn new(area: Rectangle, inset: f64, radius: f64) -> Option<Self> {
        let (left, top, right, bottom) = edges(area)?;
        let (left, top) = (f64::from(left) + inset, f64::from(top) + inset);
        let (right, bottom) = (f64::from(right) - inset, f64::from(bottom) - inset);
        if !(right > left && bottom > top) {
            return None;
        }
        let radius = radius.max(0.0).min((right - left) / 2.0).min((bottom - top) / 2.0);
        Some(Self { left, top, right, bottom, radius })
    }

    fn bounds(&self) -> (f64, f64, f64, f64) {
        (self.left, self.top, self.right, self.bottom)
    }

    fn share(&self, at: Spot) -> f64 {
        // Distance into the box from the nearer side, each way.
        let (dx, dy) = ((at.x - self.left).min(self.right - at.x), (at.y - self.top).min(self.bottom - at.y));
        if dx < self.radius && dy < self.radius {
            let (cx, cy) = (self.radius - dx, self.radius - dy);
            return (self.radius + 0.5 - libm::sqrt(cx * cx + cy * cy)).clamp(0.0, 1.0);
        }
        (dx + 0.5).clamp(0.0, 1.0) * (dy + 0.5).clamp(0.0, 1.0)
    }
}

#[cfg(test)]
mod tests {
    use super::super::ascii::{Sheet, assert_art};
    use super::*;

    #[test]
    fn a_frame_leaves_its_inside() {
        let mut sheet = Sheet::<6, 4>::new();
        frame(&mut sheet.canvas(), Rectangle::new(Point::new(1, 0), Size::new(4, 4)), 1, Sheet::<6, 4>::INK);
        assert_art(&sheet, &[" 8888 ", " 8  8 ", " 8  8 ", " 8888 "]);
    }

    #[test]
    fn a_box_without_radius_is_a_box() {
        let mut sheet = Sheet::<5, 3>::new();
        rounded_box(&mut sheet.canvas(), Rectangle::new(Point::new(1, 1), Size::new(3, 2)), 0.0, Sheet::<5, 3>::INK);
        assert_art(&sheet, &["     ", " 888 ", " 888 "]);
    }

    #[test]
    fn round_things_are_the_same_from_all_sides() {
        let mut sheet = Sheet::<9, 9>::new();
        disc(&mut sheet.canvas(), Spot::new(4.5, 4.5), 3.5, Sheet::<9, 9>::INK);
        assert_art(
            &sheet,
            &[
                "         ",
                "  37873  ",
                " 3888883 ",
                " 7888887 ",
                " 8888888 ",
                " 7888887 ",
                " 3888883 ",
                "  37873  ",
                "         ",
            ],
        );
    }

    #[test]
    fn a_disc_has_the_area_of_a_disc() {
        let mut sheet = Sheet::<40, 40>::new();
        disc(&mut sheet.canvas(), Spot::new(19.3, 20.1), 14.0, Sheet::<40, 40>::INK);
        let canvas = sheet.canvas();
        let ink: f64 =
            canvas.pixels().iter().map(|p| 1.0 - f64::from(embedded_graphics::prelude::RgbColor::g(p)) / 63.0).sum();
        assert!((ink / (core::f64::consts::PI * 14.0 * 14.0) - 1.0).abs() < 0.01, "{ink}");
    }
}
