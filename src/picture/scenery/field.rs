//! Fields under a canal, and a town.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::primitives::Rectangle;

use super::super::area::polygon;
use super::super::canvas::Canvas;
use super::super::chart::DayMark;
use super::super::paint::{Pattern, mix};
use super::super::shape::{frame, triangle};
use super::super::theme::Theme;
use super::super::{Hatch, Paint, Spot};

/// How a field looks.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct FieldLook {
    /// What its canal got today.
    pub mark: DayMark,
    /// Share of the crops' need that is met; not a number out of season.
    pub crop_water_met: f64,
}

/// Draws a field that fills `area`: green where the crops have what they need, ever yellower where not, with stripes
/// that stand for the lack from one part in ten on; bare out of season. The canal runs along its top: solid where
/// full, broken where short, an empty bed where cut.
pub fn draw_field(canvas: &mut Canvas<'_>, area: Rectangle, canal_px: u32, look: FieldLook, theme: &Theme) {
    let Rectangle { top_left, size } = area;
    let canal_px = canal_px.min(size.height);
    let field = Rectangle::new(
        Point::new(top_left.x, top_left.y.saturating_add_unsigned(canal_px)),
        Size::new(size.width, size.height - canal_px),
    );
    let met = look.crop_water_met;
    if met.is_nan() {
        canvas.fill(field, theme.card);
        let furrows = Hatch { pattern: Pattern::Upright, period_px: 4, width_px: 1.0, colour: theme.faint };
        canvas.paint(field, furrows.into());
    } else {
        canvas.fill(field, mix(theme.crop_dry, theme.crop, (met.clamp(0.0, 1.0) * 255.0 + 0.5) as u8));
        if met < 0.9 {
            canvas.paint(field, theme.lack_hatch());
        }
    }
    frame(canvas, field, 1, if met < 0.9 { theme.lack } else { theme.rule });
    draw_canal(canvas, Rectangle::new(top_left, Size::new(size.width, canal_px)), look.mark, theme);
}

/// A level canal that fills `area`.
fn draw_canal(canvas: &mut Canvas<'_>, area: Rectangle, mark: DayMark, theme: &Theme) {
    match mark {
        DayMark::Full => canvas.fill(area, theme.water),
        DayMark::Short => {
            canvas.fill(area, theme.card);
            let broken = Hatch { pattern: Pattern::Upright, period_px: 6, width_px: 3.0, colour: theme.water };
            canvas.paint(area, Paint::Hatch(broken));
        }
        DayMark::Cut => {
            canvas.fill(area, theme.card);
            frame(canvas, area, 1, theme.lack);
        }
        DayMark::Idle => {}
    }
}

/// Draws a town in `area`: houses, as many as fit side by side; the canal along the top like that of a field.
pub fn draw_town(canvas: &mut Canvas<'_>, area: Rectangle, canal_px: u32, mark: DayMark, theme: &Theme) {
    let Rectangle { top_left, size } = area;
    let canal_px = canal_px.min(size.height);
    let high = f64::from(size.height - canal_px) - 1.0;
    let foot = f64::from(top_left.y) + f64::from(size.height);
    let (roof, wide) = (high * 0.48, high * 0.85);
    let count = ((f64::from(size.width) / (wide * 1.1)) as u32).clamp(1, 5);
    let step = f64::from(size.width) / f64::from(count);
    for house in 0..count {
        let wide = wide.min(step * 0.9);
        let left = f64::from(top_left.x) + step * f64::from(house) + (step - wide) / 2.0;
        let (eaves, ridge) = (foot - high + roof, foot - high);
        let (wall_left, wall_right) = (left + wide * 0.12, left + wide * 0.88);
        let wall = [(wall_left, eaves - 1.0), (wall_right, eaves - 1.0), (wall_right, foot), (wall_left, foot)];
        polygon(canvas, wall.into_iter().map(|(x, y)| Spot::new(x, y)), theme.card);
        let corners = [Spot::new(left, eaves), Spot::new(left + wide / 2.0, ridge), Spot::new(left + wide, eaves)];
        triangle(canvas, corners, theme.town);
    }
    draw_canal(canvas, Rectangle::new(top_left, Size::new(size.width, canal_px)), mark, theme);
}
