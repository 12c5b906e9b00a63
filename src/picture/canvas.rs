//! A frame of pixels owned by the caller, with a clip and a witness.

use core::convert::Infallible;

use embedded_graphics::Pixel;
use embedded_graphics::draw_target::DrawTarget;
use embedded_graphics::geometry::{OriginDimensions, Point, Size};
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::paint::{Paint, Ready, mix};

/// One piece of text as it was drawn, told to the [`Witness`].
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct TextMark<'t> {
    /// The text.
    pub text: &'t str,
    /// The smallest box around its ink, before any clipping.
    pub ink: Rectangle,
    /// The box that it had to stay in, where the caller gave one.
    pub given: Option<Rectangle>,
    /// What of the frame could be drawn on at that time.
    pub clip: Rectangle,
    /// Characters that the face lacks and that were drawn as a box.
    pub missing: usize,
    /// Whether the text was shortened to fit.
    pub shortened: bool,
}

/// Someone who is told of every piece of text, so that a test can find text over text or text cut off.
pub trait Witness {
    /// Called once for each piece of text, after it was drawn.
    fn text(&mut self, mark: TextMark<'_>);
}

/// The buffer has not exactly as many pixels as the frame.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct WrongLength {
    /// Pixels in the frame.
    pub wanted: usize,
    /// Pixels in the buffer.
    pub given: usize,
}

/// A frame over `width` × `height` pixels in rows from the top.
pub struct Canvas<'a> {
    pixels: &'a mut [Rgb565],
    size: Size,
    clip: Rectangle,
    witness: Option<&'a mut dyn Witness>,
}

impl<'a> Canvas<'a> {
    /// A canvas over `pixels`, which keep what they hold.
    ///
    /// # Errors
    /// [`WrongLength`] where the buffer is not `width` × `height` pixels long.
    pub fn new(pixels: &'a mut [Rgb565], width: u16, height: u16) -> Result<Self, WrongLength> {
        let wanted = usize::from(width) * usize::from(height);
        if pixels.len() != wanted {
            return Err(WrongLength { wanted, given: pixels.len() });
        }
        let size = Size::new(u32::from(width), u32::from(height));
        Ok(Self { pixels, size, clip: Rectangle::new(Point::zero(), size), witness: None })
    }

    /// The same canvas, telling `witness` of every piece of text.
    pub fn with_witness(mut self, witness: &'a mut dyn Witness) -> Self {
        self.witness = Some(witness);
        self
    }

    /// The whole frame.
    pub fn frame(&self) -> Rectangle {
        Rectangle::new(Point::zero(), self.size)
    }

    /// What can be drawn on at present.
    pub fn clip(&self) -> Rectangle {
        self.clip
    }

    /// Draws with the clip narrowed to `area`, then gives back the clip as it was.
    pub fn within<T>(&mut self, area: Rectangle, draw: impl FnOnce(&mut Self) -> T) -> T {
        let before = self.clip;
        self.clip = overlap(before, area);
        let result = draw(self);
        self.clip = before;
        result
    }

    /// All pixels, row after row.
    pub fn pixels(&self) -> &[Rgb565] {
        self.pixels
    }

    /// The rows from the top, each `width` pixels long.
    pub fn rows(&self) -> impl Iterator<Item = &[Rgb565]> {
        self.pixels.chunks_exact((self.size.width as usize).max(1))
    }

    /// The pixel at `place`, or `None` outside the frame.
    pub fn pixel(&self, place: Point) -> Option<Rgb565> {
        self.frame().contains(place).then(|| self.pixels[self.index(place.x, place.y)])
    }

    /// Fills `area` with one colour.
    pub fn fill(&mut self, area: Rectangle, colour: Rgb565) {
        let Some((left, top, right, bottom)) = edges(overlap(self.clip, area)) else { return };
        for y in top..bottom {
            let (from, to) = (self.index(left, y), self.index(right - 1, y) + 1);
            self.pixels[from..to].fill(colour);
        }
    }

    /// Paints `area`, whole pixels only.
    pub fn paint(&mut self, area: Rectangle, paint: Paint) {
        if let Paint::Solid(colour) = paint {
            return self.fill(area, colour);
        }
        let Some((left, top, right, bottom)) = edges(overlap(self.clip, area)) else { return };
        let paint = paint.ready();
        for y in top..bottom {
            for x in left..right {
                self.mix_at(x, y, paint.colour(), paint.share(x, y));
            }
        }
    }

    /// Lays `colour` over the pixel at (x, y) by a coverage of 0 (nothing) to 255 (all); outside the clip nothing.
    #[inline]
    pub fn blend(&mut self, x: i32, y: i32, colour: Rgb565, coverage: u8) {
        if self.clip.contains(Point::new(x, y)) {
            self.mix_at(x, y, colour, coverage);
        }
    }

    /// Paints a row of coverage that starts at (x, y); what lies outside the clip is left out.
    pub(super) fn blend_row(&mut self, x: i32, y: i32, coverage: &[u8], paint: &Ready) {
        let Some((left, top, right, bottom)) = edges(self.clip) else { return };
        if y < top || y >= bottom {
            return;
        }
        let skip = usize::try_from(left.saturating_sub(x)).unwrap_or(0);
        let keep = usize::try_from(right.saturating_sub(x)).unwrap_or(0).min(coverage.len());
        let Some(row) = coverage.get(skip..keep).filter(|row| !row.is_empty()) else { return };
        let start = x + skip as i32;
        let (first, colour) = (self.index(start, y), paint.colour());
        let pixels = &mut self.pixels[first..first + row.len()];
        if paint.is_solid() {
            for (pixels, row) in pixels.chunks_mut(16).zip(row.chunks(16)) {
                if row.iter().fold(255, |all, cover| all & cover) == 255 {
                    pixels.fill(colour);
                } else {
                    pixels.iter_mut().zip(row).for_each(|(pixel, &cover)| lay(pixel, colour, cover));
                }
            }
        } else {
            for ((pixel, &cover), at) in pixels.iter_mut().zip(row).zip(start..) {
                if cover > 0 {
                    lay(pixel, colour, times(paint.share(at, y), cover));
                }
            }
        }
    }

    /// Passes the record of a drawn text to the witness, if there is one.
    pub(super) fn tell(&mut self, mark: TextMark<'_>) {
        if let Some(witness) = self.witness.as_mut() {
            witness.text(mark);
        }
    }

    fn index(&self, x: i32, y: i32) -> usize {
        y as usize * self.size.width as usize + x as usize
    }

    /// The caller has made sure that (x, y) lies in the clip, which lies in the frame.
    #[inline]
    fn mix_at(&mut self, x: i32, y: i32, colour: Rgb565, coverage: u8) {
        let at = self.index(x, y);
        lay(&mut self.pixels[at], colour, coverage);
    }
}

#[inline]
fn lay(pixel: &mut Rgb565, colour: Rgb565, coverage: u8) {
    match coverage {
        0 => {}
        255 => *pixel = colour,
        _ => *pixel = mix(*pixel, colour, coverage),
    }
}

impl OriginDimensions for Canvas<'_> {
    fn size(&self) -> Size {
        self.size
    }
}

impl DrawTarget for Canvas<'_> {
    type Color = Rgb565;
    type Error = Infallible;

    fn draw_iter<I: IntoIterator<Item = Pixel<Rgb565>>>(&mut self, pixels: I) -> Result<(), Infallible> {
        for Pixel(place, colour) in pixels {
            self.blend(place.x, place.y, colour, 255);
        }
        Ok(())
    }

    fn fill_solid(&mut self, area: &Rectangle, colour: Rgb565) -> Result<(), Infallible> {
        self.fill(*area, colour);
        Ok(())
    }

    fn clear(&mut self, colour: Rgb565) -> Result<(), Infallible> {
        self.fill(self.clip, colour);
        Ok(())
    }
}

/// Left, top, right and bottom of a box that is not empty; right and bottom are the first outside.
pub(super) fn edges(area: Rectangle) -> Option<(i32, i32, i32, i32)> {
    let (left, top) = (area.top_left.x, area.top_left.y);
    let right = left.saturating_add_unsigned(area.size.width);
    let bottom = top.saturating_add_unsigned(area.size.height);
    (right > left && bottom > top).then_some((left, top, right, bottom))
}

/// What two boxes have in common, for boxes however far out; empty where they do not meet.
pub(super) fn overlap(one: Rectangle, other: Rectangle) -> Rectangle {
    let (Some(a), Some(b)) = (edges(one), edges(other)) else { return Rectangle::zero() };
    let (left, top, right, bottom) = (a.0.max(b.0), a.1.max(b.1), a.2.min(b.2), a.3.min(b.3));
    if right <= left || bottom <= top {
        return Rectangle::zero();
    }
    Rectangle::new(Point::new(left, top), Size::new(right.abs_diff(left), bottom.abs_diff(top)))
}

/// The smallest box around two boxes; an empty one counts for nothing.
pub(super) fn hull(one: Rectangle, other: Rectangle) -> Rectangle {
    let (Some(a), Some(b)) = (edges(one), edges(other)) else {
        return if edges(one).is_some() { one } else { other };
    };
    let corner = Point::new(a.0.min(b.0), a.1.min(b.1));
    Rectangle::new(corner, Size::new(a.2.max(b.2).abs_diff(corner.x), a.3.max(b.3).abs_diff(corner.y)))
}

/// The product of two coverages of 0 to 255, rounded.
pub(super) fn times(one: u8, other: u8) -> u8 {
    ((u32::from(one) * u32::from(other) + 127) / 255) as u8
}

#[cfg(test)]
mod tests {
    use super::*;
    use embedded_graphics::pixelcolor::RgbColor;

    #[test]
    fn a_buffer_of_the_wrong_length_is_refused() {
        let mut pixels = [Rgb565::BLACK; 11];
        assert_eq!(Canvas::new(&mut pixels, 3, 4).err(), Some(WrongLength { wanted: 12, given: 11 }));
    }

    #[test]
    fn the_clip_holds_and_comes_back() {
        let mut pixels = [Rgb565::BLACK; 16];
        let mut canvas = Canvas::new(&mut pixels, 4, 4).unwrap();
        let inner = Rectangle::new(Point::new(1, 1), Size::new(2, 9));
        canvas.within(inner, |canvas| {
            canvas.fill(Rectangle::new(Point::new(-5, -5), Size::new(99, 7)), Rgb565::WHITE);
            canvas.blend(0, 3, Rgb565::WHITE, 255);
            canvas.blend_row(-2, 3, &[255; 9], &Paint::Solid(Rgb565::WHITE).ready());
        });
        assert_eq!(canvas.clip(), canvas.frame());
        let lit: heapless::Vec<usize, 16> = (0..16).filter(|&i| pixels[i] == Rgb565::WHITE).collect();
        assert_eq!(lit, [5, 6, 13, 14]);
    }

    #[test]
    fn an_empty_frame_and_far_places_do_nothing() {
        let mut canvas = Canvas::new(&mut [], 0, 7).unwrap();
        canvas.fill(Rectangle::new(Point::new(i32::MAX, i32::MIN), Size::new(u32::MAX, u32::MAX)), Rgb565::WHITE);
        canvas.blend_row(i32::MIN, 0, &[9; 40], &Paint::Solid(Rgb565::WHITE).ready());
        assert_eq!(canvas.rows().count(), 0);
        let mut pixels = [Rgb565::BLACK; 12];
        let mut canvas = Canvas::new(&mut pixels, 4, 3).unwrap();
        canvas.blend_row(9, 2, &[9; 4], &Paint::Solid(Rgb565::WHITE).ready());
        assert_eq!(pixels, [Rgb565::BLACK; 12]);
    }
}
