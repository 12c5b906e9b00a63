//! Sizes of a frame in pixels, and which of the seven layouts goes into a given room.

use std::fmt;
use std::str::FromStr;

/// Width and height of a frame in pixels.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub struct FrameSize {
    /// Pixels in a row.
    pub width: u16,
    /// Rows.
    pub height: u16,
}

/// The sizes that views are laid out for, the smallest first.
pub const LAYOUTS: [FrameSize; 7] = [
    FrameSize::new(240, 240),
    FrameSize::new(240, 320),
    FrameSize::new(320, 240),
    FrameSize::new(480, 320),
    FrameSize::new(800, 480),
    FrameSize::new(1280, 720),
    FrameSize::new(1920, 1080),
];

impl FrameSize {
    /// A frame of `width` × `height` pixels.
    pub const fn new(width: u16, height: u16) -> Self {
        Self { width, height }
    }

    /// Pixels in the whole frame.
    pub fn pixels(self) -> usize {
        usize::from(self.width) * usize::from(self.height)
    }

    /// The layout that fills most of a room of `width` × `height` pixels and goes into it; the wider of two equals.
    pub fn largest_within(width: u32, height: u32) -> Option<Self> {
        let fits = |size: &&Self| u32::from(size.width) <= width && u32::from(size.height) <= height;
        LAYOUTS.iter().filter(fits).max_by_key(|size| size.pixels()).copied()
    }
}

impl fmt::Display for FrameSize {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(f, "{}x{}", self.width, self.height)
    }
}

/// The text names none of the seven layouts.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct NotALayout;

impl FromStr for FrameSize {
    type Err = NotALayout;

    /// Reads one of the seven sizes, written as in `320x240`.
    fn from_str(text: &str) -> Result<Self, NotALayout> {
        let text = text.trim().replace(['X', '×'], "x");
        LAYOUTS.into_iter().find(|size| size.to_string() == text).ok_or(NotALayout)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_layout_that_fills_most_is_taken() {
        assert_eq!(FrameSize::largest_within(239, 2000), None);
        assert_eq!(FrameSize::largest_within(300, 300), Some(FrameSize::new(240, 240)));
        assert_eq!(FrameSize::largest_within(320, 320), Some(FrameSize::new(320, 240)));
        assert_eq!(FrameSize::largest_within(1279, 900), Some(FrameSize::new(800, 480)));
        assert_eq!(FrameSize::largest_within(u32::MAX, u32::MAX), Some(FrameSize::new(1920, 1080)));
    }

    #[test]
    fn sizes_read_back_and_others_are_refused() {
        for size in LAYOUTS {
            assert_eq!(size.to_string().parse(), Ok(size));
        }
        assert_eq!("320×240".parse(), Ok(FrameSize::new(320, 240)));
        for text in ["", "320", "321x240", "x", "99999999999x1", "-320x240"] {
            assert_eq!(text.parse::<FrameSize>(), Err(NotALayout), "{text}");
        }
    }
}
