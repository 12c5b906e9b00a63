//! What is laid on the frame: a flat colour, a thin wash, or a hatching.
//!
//! Coverage is mixed in the stored (gamma-encoded) values, not in linear light. The encoded scale is close to even for
//! the eye, so a half-covered pixel looks half-way whether ink is darker or lighter than its ground, thin lines keep
//! their weight in both themes, and the sum is whole numbers only.

use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

use super::mask::{SQRT_HALF, Slope, to_coverage};

/// Directions of a hatching; each can be told from the others without colour.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Pattern {
    /// Stripes that climb to the right.
    Rising,
    /// Stripes that fall to the right.
    Falling,
    /// Level stripes.
    Level,
    /// Upright stripes.
    Upright,
    /// Rising and falling stripes together.
    Crossed,
    /// Dots on a diamond grid.
    Dots,
}

/// A hatching, fixed to the frame so that neighbouring areas join without a seam.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Hatch {
    /// The direction.
    pub pattern: Pattern,
    /// Pixels from one stripe to the next along x (along y for level stripes); less than 2 counts as 2. Dots repeat
    /// after the next even number.
    pub period_px: u8,
    /// Thickness of a stripe, or the diameter of a dot, in pixels.
    pub width_px: f64,
    /// Colour of the stripes.
    pub colour: Rgb565,
}

/// What fills an area or a line.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Paint {
    /// One colour.
    Solid(Rgb565),
    /// One colour thinned to `share`, 0 (nothing) to 255 (solid).
    Wash {
        /// The colour.
        colour: Rgb565,
        /// How much of it.
        share: u8,
    },
    /// Stripes or dots with nothing between them.
    Hatch(Hatch),
}

impl Paint {
    /// The same made ready for many pixels.
    pub(super) fn ready(self) -> Ready {
        match self {
            Self::Solid(colour) => Ready::Even(colour, 255),
            Self::Wash { colour, share } => Ready::Even(colour, share),
            Self::Hatch(hatch) => {
                let mut steps = [0; u8::MAX as usize];
                for (step, cell) in steps.iter_mut().take(usize::from(hatch.period())).enumerate() {
                    *cell = hatch.step_coverage(step as i32);
                }
                Ready::Stripes(hatch, steps)
            }
        }
    }
}

/// A paint with its stripes worked out.
#[allow(clippy::large_enum_variant)]
pub(super) enum Ready {
    Even(Rgb565, u8),
    /// The coverage for each step along the period.
    Stripes(Hatch, [u8; u8::MAX as usize]),
}

impl Ready {
    pub(super) fn colour(&self) -> Rgb565 {
        match self {
            Self::Even(colour, _) => *colour,
            Self::Stripes(hatch, _) => hatch.colour,
        }
    }

    pub(super) fn is_solid(&self) -> bool {
        matches!(self, Self::Even(_, 255))
    }

    /// How much of the pixel (x, y) is painted, 0 to 255.
    #[inline]
    pub(super) fn share(&self, x: i32, y: i32) -> u8 {
        match self {
            Self::Even(_, share) => *share,
            Self::Stripes(hatch, steps) => {
                let period = i32::from(hatch.period());
                let at = |step: i32| steps[step.rem_euclid(period) as usize];
                match hatch.pattern {
                    Pattern::Rising => at(x.wrapping_add(y)),
                    Pattern::Falling => at(x.wrapping_sub(y)),
                    Pattern::Crossed => at(x.wrapping_add(y)).max(at(x.wrapping_sub(y))),
                    Pattern::Level => at(y),
                    Pattern::Upright => at(x),
                    Pattern::Dots => hatch.dot(x, y),
                }
            }
        }
    }
}

impl From<Rgb565> for Paint {
    fn from(colour: Rgb565) -> Self {
        Self::Solid(colour)
    }
}

impl From<Hatch> for Paint {
    fn from(hatch: Hatch) -> Self {
        Self::Hatch(hatch)
    }
}

impl Hatch {
    /// How much of the pixel (x, y) the stripes cover, 0 to 255.
    pub fn coverage(self, x: i32, y: i32) -> u8 {
        Paint::Hatch(self).ready().share(x, y)
    }

    fn period(&self) -> u8 {
        self.period_px.max(2)
    }

    /// Coverage `step` pixels along the period from the middle (slanted) or the first row or column of a stripe.
    fn step_coverage(&self, step: i32) -> u8 {
        match self.pattern {
            Pattern::Level | Pattern::Upright | Pattern::Dots => to_coverage(self.width_px - f64::from(step)),
            Pattern::Rising | Pattern::Falling | Pattern::Crossed => {
                // Exact by area for stripes at 45°.
                let from_middle = f64::from(step.min(i32::from(self.period()) - step)) * SQRT_HALF;
                let (half, slope) = (self.width_px / 2.0, Slope::new(SQRT_HALF, SQRT_HALF));
                to_coverage(slope.half_plane(from_middle + half) - slope.half_plane(from_middle - half))
            }
        }
    }

    fn dot(&self, x: i32, y: i32) -> u8 {
        let cell = (i32::from(self.period()) + 1) / 2;
        let (cell_x, cell_y) = (x.div_euclid(cell), y.div_euclid(cell));
        if cell_x.wrapping_add(cell_y).rem_euclid(2) != 0 {
            return 0;
        }
        let from_middle = |at: i32| f64::from(at.rem_euclid(cell)) + 0.5 - f64::from(cell) / 2.0;
        let (dx, dy) = (from_middle(x), from_middle(y));
        to_coverage(self.width_px / 2.0 + 0.5 - libm::sqrt(dx * dx + dy * dy))
    }
}

/// `ground` with `colour` laid over it by a coverage of 0 to 255.
#[inline]
pub fn mix(ground: Rgb565, colour: Rgb565, coverage: u8) -> Rgb565 {
    let (over, under) = (u32::from(coverage), 255 - u32::from(coverage));
    let channel = |ground: u8, colour: u8| ((u32::from(ground) * under + u32::from(colour) * over + 127) / 255) as u8;
    Rgb565::new(channel(ground.r(), colour.r()), channel(ground.g(), colour.g()), channel(ground.b(), colour.b()))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn mixing_ends_at_both_colours_and_is_monotone() {
        let (dark, light) = (Rgb565::new(3, 50, 31), Rgb565::new(28, 9, 0));
        assert_eq!(mix(dark, light, 0), dark);
        assert_eq!(mix(dark, light, 255), light);
        for coverage in 1..=255 {
            assert!(mix(dark, light, coverage).r() >= mix(dark, light, coverage - 1).r());
            assert!(mix(dark, light, coverage).g() <= mix(dark, light, coverage - 1).g());
        }
    }

    #[test]
    fn a_slanted_hatching_covers_its_share_of_the_area() {
        for pattern in [Pattern::Rising, Pattern::Falling] {
            let hatch = Hatch { pattern, period_px: 6, width_px: 1.5, colour: Rgb565::BLACK };
            let sum: u32 = (0..36).map(|i| u32::from(hatch.coverage(i % 6, i / 6))).sum();
            let share = f64::from(sum) / 36.0 / 255.0;
            let expected = 1.5 / (6.0 * SQRT_HALF);
            assert!((share - expected).abs() < 0.01, "{share} against {expected}");
        }
    }

    #[test]
    fn hatching_goes_on_left_of_and_above_the_frame() {
        let hatch = Hatch { pattern: Pattern::Crossed, period_px: 5, width_px: 1.0, colour: Rgb565::BLACK };
        assert_eq!(hatch.coverage(-5, -10), hatch.coverage(0, 0));
        assert_eq!(hatch.coverage(i32::MAX, i32::MIN), hatch.coverage(i32::MAX, i32::MIN));
    }
}
