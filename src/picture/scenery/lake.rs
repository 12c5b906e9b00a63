//! A reservoir in the ground: a bank that slopes in from the left and a dam on the right, filled to its level.

use super::super::Spot;
use super::super::area::polygon;
use super::super::canvas::Canvas;
use super::super::line::{Stroke, segment};
use super::super::theme::Theme;

/// The hollow of a reservoir.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Lake {
    /// Left end of the full lake and the dam's water side, in pixels.
    pub across: (f64, f64),
    /// Full level and bottom, in pixels.
    pub upright: (f64, f64),
    /// How thick the dam is at its crest, in pixels.
    pub dam_px: f64,
}

impl Lake {
    /// The y of the surface at a share of 0 (empty) to 1 (full); beyond them that of the end.
    pub fn surface_y(&self, share: f64) -> f64 {
        let (full, empty) = self.upright;
        if share > 0.0 { empty - (empty - full) * share.min(1.0) } else { empty }
    }

    /// The x of the left bank at a y: steep at the bottom, flat at the rim.
    pub fn bank_x(&self, y: f64) -> f64 {
        let (left, right) = self.across;
        let (full, empty) = self.upright;
        let up = if empty > full { ((empty - y) / (empty - full)).clamp(0.0, 1.0) } else { 1.0 };
        let bottom = left + (right - left) * 0.42;
        bottom - (bottom - left) * up * (0.45 + 0.55 * up)
    }

    /// Corners of the hollow from a level down, along the bank and back up the dam.
    fn outline(self, level_y: f64) -> impl Iterator<Item = Spot> + Clone {
        let empty = self.upright.1;
        let bank = (0..=8).map(move |step| {
            let y = level_y + (empty - level_y) * f64::from(step) / 8.0;
            Spot::new(self.bank_x(y), y)
        });
        bank.chain([Spot::new(self.across.1, empty), Spot::new(self.across.1, level_y)])
    }

    /// The dam's outline: upright on the water side, slanting on the other.
    fn dam(self, foot_y: f64) -> [Spot; 4] {
        let (x, crest) = (self.across.1, self.upright.0 - self.dam_px * 0.6);
        let wide = self.dam_px + (foot_y - crest) * 0.28;
        [Spot::new(x, crest), Spot::new(x + self.dam_px, crest), Spot::new(x + wide, foot_y), Spot::new(x, foot_y)]
    }

    /// Right end of the dam's foot at `foot_y`, in pixels.
    pub fn dam_foot_x(&self, foot_y: f64) -> f64 {
        self.dam(foot_y)[2].x
    }
}

/// Draws the hollow as air, the water in it up to `share`, a dashed line where `was` stood, and the dam down to
/// `foot_y`.
pub fn draw_lake(
    canvas: &mut Canvas<'_>,
    lake: Lake,
    (share, was): (f64, Option<f64>),
    foot_y: f64,
    stroke: Stroke,
    theme: &Theme,
) {
    polygon(canvas, lake.outline(lake.upright.0), theme.sky);
    let level = lake.surface_y(share);
    if share > 0.0 {
        polygon(canvas, lake.outline(level), theme.water);
    }
    polygon(canvas, lake.dam(foot_y).into_iter(), theme.ink);
    if let Some(was) = was {
        let y = lake.surface_y(was);
        let line = |canvas: &mut Canvas<'_>, stroke, colour| {
            segment(canvas, Spot::new(lake.bank_x(y), y), Spot::new(lake.across.1, y), stroke, colour);
        };
        // Dark dashes would drown in dark water: they lie on a band of the air's colour.
        line(canvas, Stroke::solid(stroke.width_px + 1.5), theme.sky);
        line(canvas, stroke, theme.ink);
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    const LAKE: Lake = Lake { across: (10.0, 60.0), upright: (20.0, 60.0), dam_px: 4.0 };

    #[test]
    fn the_level_follows_the_share_and_stays_in_the_hollow() {
        assert_eq!([0.0, 0.5, 1.0].map(|share| LAKE.surface_y(share)), [60.0, 40.0, 20.0]);
        assert_eq!((LAKE.surface_y(f64::NAN), LAKE.surface_y(7.0)), (60.0, 20.0));
    }

    #[test]
    fn the_bank_falls_inwards_all_the_way() {
        assert_eq!(LAKE.bank_x(20.0), 10.0);
        assert!((20..60).all(|y| LAKE.bank_x(f64::from(y)) < LAKE.bank_x(f64::from(y + 1))));
        assert!(LAKE.bank_x(60.0) < LAKE.across.1);
    }
}
