//! One window as a screen.

use std::fmt;
use std::num::NonZeroU32;
use std::rc::Rc;

use embedded_graphics::primitives::Rectangle;
use softbuffer::{Context, Surface};
use winit::event_loop::OwnedDisplayHandle;
use winit::window::Window;

use super::fit::Fit;
use crate::board::choose::ScreenKind;
use crate::board::pictures::eight_bits;
use crate::board::screen::{Caption, Frame, Screen, ScreenError};
use crate::board::size::FrameSize;

/// A window and the memory that is shown in it.
pub struct Pane {
    window: Rc<Window>,
    surface: Surface<OwnedDisplayHandle, Rc<Window>>,
    asked: Option<FrameSize>,
    /// Size of the surface in pixels.
    sized: Option<(NonZeroU32, NonZeroU32)>,
    row: Vec<u32>,
}

impl Pane {
    /// A pane over an open window.
    ///
    /// # Errors
    /// [`ScreenError`] where the desktop gives no memory to draw in.
    pub fn new(
        context: &Context<OwnedDisplayHandle>,
        window: Rc<Window>,
        asked: Option<FrameSize>,
    ) -> Result<Self, ScreenError> {
        let surface = Surface::new(context, Rc::clone(&window)).map_err(failed)?;
        Ok(Self { window, surface, asked, sized: None, row: Vec::new() })
    }
}

/// How a frame lies in `window` at present.
pub fn fit(window: &Window, asked: Option<FrameSize>) -> Fit {
    let size = window.inner_size();
    Fit::of(size.width, size.height, window.scale_factor(), asked)
}

impl Screen for Pane {
    fn kind(&self) -> ScreenKind {
        ScreenKind::Window
    }

    fn size(&self) -> FrameSize {
        fit(&self.window, self.asked).frame
    }

    fn present(&mut self, frame: &Frame<'_>, changed: &[Rectangle]) -> Result<(), ScreenError> {
        // The desktop takes whole pictures; copying rows costs less than keeping track of which of its buffers is how old.
        let _ = changed;
        let size = self.window.inner_size();
        let (Some(width), Some(height)) = (NonZeroU32::new(size.width), NonZeroU32::new(size.height)) else {
            // A window without area shows nothing.
            return Ok(());
        };
        if self.sized != Some((width, height)) {
            self.surface.resize(width, height).map_err(failed)?;
            self.sized = Some((width, height));
        }
        let fit = fit(&self.window, self.asked);
        let mut buffer = self.surface.buffer_mut().map_err(failed)?;
        if fit.frame == frame.size {
            lay_out(&mut buffer, size.width as usize, frame, &fit, &mut self.row);
        }
        self.window.pre_present_notify();
        buffer.present().map_err(failed)
    }

    fn caption(&mut self, caption: &Caption<'_>) -> Result<(), ScreenError> {
        self.window.set_title(caption.title);
        Ok(())
    }
}

/// Copies the frame into the window's pixels, enlarged, with what is left around it in the colour of its own edge.
fn lay_out(target: &mut [u32], width: usize, frame: &Frame<'_>, fit: &Fit, row: &mut Vec<u32>) {
    let colours: Vec<u32> = frame
        .pixels
        .iter()
        .map(|&pixel| {
            let [red, green, blue] = eight_bits(pixel);
            u32::from_be_bytes([0, red, green, blue])
        })
        .collect();
    let Some(&surround) = colours.first() else { return };
    let zoom = fit.zoom as usize;
    let frame_width = usize::from(frame.size.width);
    // Window pixels before the frame, and frame pixels that lie left of the window.
    let (before, hidden) = (fit.left.max(0) as usize, fit.left.min(0).unsigned_abs() as usize);
    for (y, line) in target.chunks_mut(width).enumerate() {
        let from_top = y as i64 - i64::from(fit.top);
        let source = usize::try_from(from_top).ok().map(|from_top| from_top / zoom);
        let source = source.and_then(|y| colours.get(y * frame_width..(y + 1) * frame_width));
        line.fill(surround);
        let Some(source) = source else { continue };
        row.clear();
        row.extend(source.iter().flat_map(|&colour| std::iter::repeat_n(colour, zoom)));
        let visible = row.get(hidden..).unwrap_or_default();
        for (pixel, &colour) in line.iter_mut().skip(before).zip(visible) {
            *pixel = colour;
        }
    }
}

fn failed(error: impl fmt::Display) -> ScreenError {
    ScreenError::new(ScreenKind::Window, error)
}

#[cfg(test)]
mod tests {
    use super::*;
    use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

    #[test]
    fn a_frame_is_enlarged_in_whole_pixels() {
        let mut pixels = vec![Rgb565::WHITE; 240 * 240];
        pixels[1] = Rgb565::BLUE;
        let size = FrameSize::new(240, 240);
        let frame = Frame { size, pixels: &pixels, texts: &[] };
        let fit = Fit::of(486, 482, 1.0, Some(size));
        let mut target = vec![0; 486 * 482];
        lay_out(&mut target, 486, &frame, &fit, &mut Vec::new());
        let blue: Vec<usize> = (0..target.len()).filter(|&at| target[at] == 0xFF).collect();
        assert_eq!(blue, [486 + 5, 486 + 6, 2 * 486 + 5, 2 * 486 + 6]);
        assert!(target.iter().all(|&pixel| pixel == 0xFF || pixel == 0x00FF_FFFF));
    }

    #[test]
    fn a_window_smaller_than_the_frame_shows_its_middle() {
        let size = FrameSize::new(240, 240);
        let mut pixels = vec![Rgb565::WHITE; 240 * 240];
        pixels[120 * 240 + 120] = Rgb565::RED;
        let fit = Fit::of(100, 50, 1.0, Some(size));
        let mut target = vec![0; 100 * 50];
        lay_out(&mut target, 100, &Frame { size, pixels: &pixels, texts: &[] }, &fit, &mut Vec::new());
        assert_eq!(target.iter().position(|&pixel| pixel == 0x00FF_0000), Some(25 * 100 + 50));
    }
}
