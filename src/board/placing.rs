//! Where a picture lies on glass that may be larger than it, and may be turned.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::primitives::Rectangle;

use super::file::Turned;
use super::size::FrameSize;

/// A picture on glass: centred, in whole multiples, turned.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Placing {
    /// Columns of the glass, before the picture is turned.
    pub width: u32,
    /// Rows of the glass.
    pub height: u32,
    /// How far the picture is turned.
    pub turned: Turned,
    /// The picture.
    pub frame: FrameSize,
    /// Pixels of the glass for one of the picture, across and down.
    pub scale: u32,
    /// Pixels of the glass left of the turned picture, as a reader sees it.
    pub left: u32,
    /// Pixels of the glass above it.
    pub top: u32,
}

impl Placing {
    /// The layout that fills most of the glass, in whole multiples; `None` where none goes onto it.
    pub fn new(width: u32, height: u32, turned: Turned) -> Option<Self> {
        let (across, down) = if turned.swaps() { (height, width) } else { (width, height) };
        let mut best: Option<(u64, FrameSize, u32)> = None;
        for scale in 1.. {
            let Some(frame) = FrameSize::largest_within(across / scale, down / scale) else { break };
            let filled = frame.pixels() as u64 * u64::from(scale) * u64::from(scale);
            // Of two that fill the same, the one with the finer pixels.
            if best.is_none_or(|(most, _, _)| filled > most) {
                best = Some((filled, frame, scale));
            }
        }
        let (_, frame, scale) = best?;
        let left = (across - u32::from(frame.width) * scale) / 2;
        let top = (down - u32::from(frame.height) * scale) / 2;
        Some(Self { width, height, turned, frame, scale, left, top })
    }

    /// Whether the picture leaves some of the glass dark.
    pub fn has_bars(&self) -> bool {
        self.frame.pixels() as u64 * u64::from(self.scale).pow(2) < u64::from(self.width) * u64::from(self.height)
    }

    /// The part of the picture that a box covers, or nothing.
    pub fn clip(&self, area: &Rectangle) -> Option<Rectangle> {
        let whole = Rectangle::new(Point::zero(), Size::new(self.frame.width.into(), self.frame.height.into()));
        let clipped = whole.intersection(area);
        (!clipped.is_zero_sized()).then_some(clipped)
    }

    /// The box of the unturned glass that a box inside the picture covers: first column and row, and the first beyond.
    pub(super) fn on_glass(&self, area: &Rectangle) -> (u32, u32, u32, u32) {
        let place = |edge: i32, before: u32| edge.unsigned_abs() * self.scale + before;
        let (x0, y0) = (place(area.top_left.x, self.left), place(area.top_left.y, self.top));
        let (x1, y1) = (x0 + area.size.width * self.scale, y0 + area.size.height * self.scale);
        match self.turned {
            Turned::By0 => (x0, y0, x1, y1),
            Turned::By90 => (self.width - y1, x0, self.width - y0, x1),
            Turned::By180 => (self.width - x1, self.height - y1, self.width - x0, self.height - y0),
            Turned::By270 => (y0, self.height - x1, y1, self.height - x0),
        }
    }

    /// The pixel of the picture under a place on the unturned glass, beyond the picture's edges too.
    pub(super) fn under(&self, x: i32, y: i32) -> (i32, i32) {
        let (width, height, scale) = (self.width as i32, self.height as i32, self.scale.max(1) as i32);
        let (across, down) = match self.turned {
            Turned::By0 => (x, y),
            Turned::By90 => (y, width.saturating_sub(1).saturating_sub(x)),
            Turned::By180 => (width.saturating_sub(1).saturating_sub(x), height.saturating_sub(1).saturating_sub(y)),
            Turned::By270 => (height.saturating_sub(1).saturating_sub(y), x),
        };
        let (left, top) = (self.left as i32, self.top as i32);
        (across.saturating_sub(left).div_euclid(scale), down.saturating_sub(top).div_euclid(scale))
    }

    /// The pixel of the picture that is at a pixel of the glass; it must be one that the picture covers.
    pub(super) fn of_glass(&self, x: u32, y: u32) -> usize {
        let (across, down) = match self.turned {
            Turned::By0 => (x, y),
            Turned::By90 => (y, self.width - 1 - x),
            Turned::By180 => (self.width - 1 - x, self.height - 1 - y),
            Turned::By270 => (self.height - 1 - y, x),
        };
        let (column, row) = ((across - self.left) / self.scale, (down - self.top) / self.scale);
        row as usize * usize::from(self.frame.width) + column as usize
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn pictures_are_centred_in_whole_multiples() {
        let placed = |width, height, turned| Placing::new(width, height, turned).unwrap();
        let small = placed(240, 320, Turned::By90);
        assert_eq!((small.frame, small.scale, small.left, small.top), (FrameSize::new(320, 240), 1, 0, 0));
        assert!(!small.has_bars());
        let wide = placed(1366, 768, Turned::By0);
        assert_eq!((wide.frame, wide.scale, wide.left, wide.top), (FrameSize::new(1280, 720), 1, 43, 24));
        assert!(wide.has_bars());
        let fine = placed(3840, 2160, Turned::By180);
        assert_eq!((fine.frame, fine.scale, fine.left, fine.top), (FrameSize::new(1920, 1080), 2, 0, 0));
        // 640 × 480 is twice 320 × 240 exactly, which fills more than 480 × 320 once.
        let old = placed(640, 480, Turned::By0);
        assert_eq!((old.frame, old.scale), (FrameSize::new(320, 240), 2));
        assert_eq!(Placing::new(172, 320, Turned::By0), None);
        assert_eq!(Placing::new(0, 0, Turned::By0), None);
    }

    #[test]
    fn every_pixel_of_the_picture_is_on_the_glass_once() {
        for (width, height) in [(240, 240), (323, 251), (251, 323), (487, 490)] {
            for turned in Turned::ALL {
                let placing = Placing::new(width, height, turned).unwrap();
                let mut seen = vec![0; placing.frame.pixels()];
                let whole = Rectangle::new(Point::zero(), Size::new(100_000, 100_000));
                let (x0, y0, x1, y1) = placing.on_glass(&placing.clip(&whole).unwrap());
                assert!(x1 <= width && y1 <= height);
                for y in y0..y1 {
                    for x in x0..x1 {
                        let index = placing.of_glass(x, y);
                        seen[index] += 1;
                        // A finger finds the same pixel.
                        let (column, row) = placing.under(x as i32, y as i32);
                        assert_eq!((row * i32::from(placing.frame.width) + column) as usize, index);
                    }
                }
                assert!(seen.iter().all(|times| *times == placing.scale * placing.scale), "{placing:?}");
            }
        }
    }
}
