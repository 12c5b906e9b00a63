//! How a frame lies in a window: which layout, how often enlarged, and where.

use crate::board::size::{FrameSize, LAYOUTS};

/// A frame in a window.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Fit {
    /// The frame.
    pub frame: FrameSize,
    /// Window pixels along each side of a frame pixel; whole, so that letters stay crisp.
    pub zoom: u32,
    /// Window pixels before the frame; below 0 where the window is smaller.
    pub left: i32,
    /// Window pixels above the frame; below 0 where the window is smaller.
    pub top: i32,
}

impl Fit {
    /// The largest layout that can be read in a window of `width` × `height` pixels of which `scale` go along a point of
    /// the desktop, or `asked`, enlarged as far as it goes.
    pub fn of(width: u32, height: u32, scale: f64, asked: Option<FrameSize>) -> Self {
        let scale = if scale.is_finite() && scale > 1.0 { scale } else { 1.0 };
        // On a dense screen the layout goes by points, since its type is made for pixels that can be seen.
        let points = |pixels: u32| (f64::from(pixels) / scale) as u32;
        let fitting = || FrameSize::largest_within(points(width), points(height));
        let frame = asked.or_else(fitting).unwrap_or(LAYOUTS[0]);
        let (wide, high) = (u32::from(frame.width), u32::from(frame.height));
        let zoom = (width / wide).min(height / high).max(1);
        let before = |room: u32, frame: u32| {
            let spare = i64::from(room) - i64::from(frame) * i64::from(zoom);
            spare.div_euclid(2) as i32
        };
        Self { frame, zoom, left: before(width, wide), top: before(height, high) }
    }

    /// The frame pixel under a window pixel; beyond the frame where that is.
    pub fn pixel(&self, x: f64, y: f64) -> (i32, i32) {
        let zoom = f64::from(self.zoom);
        let along = |at: f64, before: i32| libm::floor((at - f64::from(before)) / zoom) as i32;
        (along(x, self.left), along(y, self.top))
    }
}

/// The window to begin with on a screen of `width` × `height` pixels, in pixels: most of the screen, but not all.
pub fn first_size(screen: Option<(u32, u32)>, scale: f64, asked: Option<FrameSize>) -> (u32, u32) {
    // Where nothing is known of the screen, nearly all have room for this.
    let (width, height) = screen.unwrap_or((1024, 700));
    let (width, height) = (width / 10 * 9, height / 20 * 17);
    let fit = Fit::of(width, height, scale, asked);
    (u32::from(fit.frame.width) * fit.zoom, u32::from(fit.frame.height) * fit.zoom)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn whole_pixels_in_the_middle() {
        let fit = Fit::of(1000, 700, 1.0, None);
        assert_eq!((fit.frame, fit.zoom), (FrameSize::new(800, 480), 1));
        assert_eq!((fit.left, fit.top), (100, 110));
        let fit = Fit::of(1000, 700, 1.0, Some(FrameSize::new(320, 240)));
        assert_eq!((fit.zoom, fit.left, fit.top), (2, 180, 110));
        assert_eq!(fit.pixel(180.0, 110.0), (0, 0));
        assert_eq!(fit.pixel(819.9, 589.9), (319, 239));
        assert_eq!(fit.pixel(179.5, 0.0), (-1, -55));
    }

    #[test]
    fn a_dense_screen_shows_larger_pixels_and_not_smaller_type() {
        let fit = Fit::of(1600, 960, 2.0, None);
        assert_eq!((fit.frame, fit.zoom), (FrameSize::new(800, 480), 2));
    }

    #[test]
    fn windows_too_small_and_numbers_that_are_none() {
        let fit = Fit::of(100, 0, f64::NAN, None);
        assert_eq!((fit.frame, fit.zoom, fit.left, fit.top), (LAYOUTS[0], 1, -70, -120));
        assert_eq!(fit.pixel(f64::NAN, f64::INFINITY), (0, i32::MAX));
        Fit::of(u32::MAX, u32::MAX, f64::INFINITY, None);
    }

    #[test]
    fn the_first_window_leaves_room_around() {
        assert_eq!(first_size(Some((1920, 1080)), 1.0, None), (1280, 720));
        assert_eq!(first_size(Some((1366, 768)), 1.0, None), (800, 480));
        assert_eq!(first_size(Some((1920, 1080)), 1.0, Some(FrameSize::new(320, 240))), (960, 720));
        assert_eq!(first_size(None, 1.0, None), (800, 480));
    }
}
