//! The contact sheet: every picture small, in its order, with its name.

use embedded_graphics::geometry::Point;
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

use crate::board::FrameSize;
use crate::picture::lettering::{Across, draw_in};
use crate::picture::{Canvas, Face, Theme};

/// Small pictures side by side.
const COLUMNS: usize = 5;
/// Their width, pixels.
const WIDE: usize = 320;
/// Between them, pixels.
const GAP: usize = 12;
/// The row of a name, pixels.
const NAME: usize = 20;

/// A sheet that grows picture by picture.
pub(super) struct Contact {
    from: FrameSize,
    high: usize,
    wide: usize,
    small: Vec<(String, Vec<Rgb565>)>,
}

impl Contact {
    /// A sheet for pictures of that size.
    pub fn new(from: FrameSize) -> Self {
        let wide = WIDE.min(from.width.into());
        let high = usize::from(from.height) * wide / usize::from(from.width).max(1);
        Self { from, high: high.max(1), wide, small: Vec::new() }
    }

    /// Adds a picture.
    pub fn add(&mut self, name: &str, pixels: &[Rgb565]) {
        let (from_wide, from_high) = (usize::from(self.from.width), usize::from(self.from.height));
        let mut small = Vec::with_capacity(self.wide * self.high);
        for y in 0..self.high {
            let rows = y * from_high / self.high..((y + 1) * from_high / self.high).max(y * from_high / self.high + 1);
            for x in 0..self.wide {
                let left = x * from_wide / self.wide;
                let columns = left..((x + 1) * from_wide / self.wide).max(left + 1);
                small.push(mean(rows.clone().flat_map(|row| {
                    columns.clone().filter_map(move |column| pixels.get(row * from_wide + column).copied())
                })));
            }
        }
        self.small.push((name.to_owned(), small));
    }

    /// The sheet; `None` without any picture, or with more than a sheet can hold.
    pub fn draw(&self) -> Option<(FrameSize, Vec<Rgb565>)> {
        let columns = COLUMNS.min(self.small.len());
        let rows = if columns == 0 { return None } else { self.small.len().div_ceil(columns) };
        let (cell_wide, cell_high) = (self.wide + GAP, self.high + NAME + GAP);
        let wide = u16::try_from(columns * cell_wide + GAP).ok()?;
        let high = u16::try_from(rows * cell_high + GAP).ok()?;
        let size = FrameSize::new(wide, high);
        let mut pixels = vec![Theme::LIGHT.faint; size.pixels()];
        for (index, (_, small)) in self.small.iter().enumerate() {
            let (left, top) = (GAP + index % columns * cell_wide, GAP + index / columns * cell_high);
            for (row, line) in small.chunks_exact(self.wide).enumerate() {
                let at = (top + row) * usize::from(wide) + left;
                pixels[at..at + self.wide].copy_from_slice(line);
            }
        }
        let mut canvas = Canvas::new(&mut pixels, wide, high).ok()?;
        for (index, (name, _)) in self.small.iter().enumerate() {
            let (left, top) = (GAP + index % columns * cell_wide, GAP + index / columns * cell_high + self.high);
            let mut row = canvas.frame();
            row.top_left = Point::new(left as i32, top as i32);
            row.size.width = self.wide as u32;
            row.size.height = NAME as u32;
            draw_in(&mut canvas, name, row, Face::regular(12), Theme::LIGHT.ink, Across::Left);
        }
        Some((size, pixels))
    }
}

/// The mean colour.
fn mean(pixels: impl Iterator<Item = Rgb565>) -> Rgb565 {
    let (mut red, mut green, mut blue, mut count) = (0_u32, 0_u32, 0_u32, 0_u32);
    for pixel in pixels {
        red += u32::from(pixel.r());
        green += u32::from(pixel.g());
        blue += u32::from(pixel.b());
        count += 1;
    }
    let share = |sum: u32| ((sum + count / 2) / count.max(1)) as u8;
    Rgb565::new(share(red), share(green), share(blue))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn pictures_are_made_smaller_by_their_mean() {
        let mut contact = Contact::new(FrameSize::new(640, 480));
        assert_eq!(contact.draw().map(|(size, _)| size), None);
        let stripes: Vec<Rgb565> =
            (0..640 * 480).map(|at| if at % 2 == 0 { Rgb565::BLACK } else { Rgb565::WHITE }).collect();
        contact.add("one", &stripes);
        let (size, pixels) = contact.draw().unwrap();
        assert_eq!((size.width, size.height), (344, 284));
        let middle = pixels[100 * 344 + 100];
        assert_eq!((middle.r(), middle.g(), middle.b()), (16, 32, 16));
        (0..11).for_each(|_| contact.add("more", &stripes));
        assert_eq!(contact.draw().unwrap().0, FrameSize::new(5 * 332 + 12, 3 * 272 + 12));
    }
}
