//! What a person sees: drawing on a frame buffer. Draws values; computes none.
//!
//! Everything is drawn on a [`Canvas`] over pixels that the caller owns, so nothing here allocates and the same calls
//! give the same bytes on every target. Places are [`Spot`]s in pixels from the left top corner of the frame: pixel
//! (0, 0) covers the square from 0 to 1, so a crisp line one pixel wide has its middle at a half.

pub mod area;
#[cfg(test)]
mod ascii;
pub mod canvas;
pub mod changes;
pub mod chart;
pub mod colour;
pub mod lettering;
pub mod line;
mod mask;
pub mod paint;
pub mod scenery;
pub mod shape;
#[cfg(feature = "std")]
pub mod strict;
pub mod theme;
#[cfg(feature = "std")]
pub mod views;

pub use canvas::{Canvas, TextMark, Witness};
pub use lettering::{Align, Face, Weight};
pub use line::{Dash, Stroke};
pub use paint::{Hatch, Paint};
pub use theme::Theme;

/// A place on the frame in pixels, x to the right and y downwards.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Spot {
    /// Pixels from the left edge.
    pub x: f64,
    /// Pixels from the top edge.
    pub y: f64,
}

impl Spot {
    /// The place `x` pixels from the left and `y` from the top.
    pub const fn new(x: f64, y: f64) -> Self {
        Self { x, y }
    }

    /// Whether both numbers are finite; a place that is not interrupts the line that it belongs to.
    pub fn is_finite(self) -> bool {
        self.x.is_finite() && self.y.is_finite()
    }
}
