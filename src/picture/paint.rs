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
    /// Colour and coverage at the pixel (x, y).
    #[inline]
    pub fn at(&self, x: i32, y: i32) -> (Rgb565, u8) {
        match self {
            Self::Solid(colour) => (*colour, 255),
            Self::Wash { colour, share } => (*colour, *share),
            Self::Hatch(hatch) => (hatch.colour, hatch.coverage(x, y)),
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
    pub fn coverage(&self, x: i32, y: i32) -> u8 {
        let period = i32::from(self.period_px.max(2));
        let rising = || self.slanted(x.wrapping_add(y).rem_euclid(period), period);
        let falling = || self.slanted(x.wrapping_sub(y).rem_euclid(period), period);
        match self.pattern {
            Pattern::Rising => rising(),
            Pattern::Falling => falling(),
            Pattern::Crossed => rising().max(falling()),
            Pattern::Level => self.straight(y.rem_euclid(period)),
            Pattern::Upright => self.straight(x.rem_euclid(period)),
            Pattern::Dots => {
                let cell = (period + 1) / 2;
                let (cell_x, cell_y) = (x.div_euclid(cell), y.div_euclid(cell));
                if cell_x.wrapping_add(cell_y).rem_euclid(2) != 0 {
                    return 0;
                }
                let middle = f64::from(cell) / 2.0;
                let (dx, dy) =
                    (f64::from(x.rem_euclid(cell)) + 0.5 - middle, f64::from(y.rem_euclid(cell)) + 0.5 - middle);
                to_coverage(self.width_px / 2.0 + 0.5 - libm::sqrt(dx * dx + dy * dy))
            }
        }
    }

    /// Coverage `step` pixels along x from the middle of a stripe at 45°, exact by area.
    fn slanted(&self, step: i32, period: i32) -> u8 {
        let from_middle = f64::from(step.min(period - step)) * SQRT_HALF;
        let half = self.width_px / 2.0;
        let slope = Slope::new(SQRT_HALF, SQRT_HALF);
        to_coverage(slope.half_plane(from_middle + half) - slope.half_plane(from_middle - half))
    }

    fn straight(&self, step: i32) -> u8 {
        to_coverage(self.width_px - f64::from(step))
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
