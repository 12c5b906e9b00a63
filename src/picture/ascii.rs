//! A tiny frame for tests that shows coverage as figures: blank is nothing, 8 is full.

use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

use super::Canvas;

/// A frame of `W` × `H` pixels, white at first.
pub(super) struct Sheet<const W: usize, const H: usize> {
    pixels: [[Rgb565; W]; H],
}

impl<const W: usize, const H: usize> Sheet<W, H> {
    pub(super) const PAPER: Rgb565 = Rgb565::WHITE;
    pub(super) const INK: Rgb565 = Rgb565::BLACK;

    pub(super) fn new() -> Self {
        Self { pixels: [[Self::PAPER; W]; H] }
    }

    pub(super) fn canvas(&mut self) -> Canvas<'_> {
        Canvas::new(self.pixels.as_flattened_mut(), W as u16, H as u16).unwrap()
    }

    fn figure(pixel: Rgb565) -> char {
        match (u32::from(63 - pixel.g()) * 8 + 31) / 63 {
            0 => ' ',
            eighths => char::from_digit(eighths, 10).unwrap(),
        }
    }
}

/// Compares the frame with a picture of it, one string for each row.
#[track_caller]
pub(super) fn assert_art<const W: usize, const H: usize>(sheet: &Sheet<W, H>, art: &[&str]) {
    let same = art.len() == H
        && sheet
            .pixels
            .iter()
            .zip(art)
            .all(|(row, line)| row.iter().map(|&p| Sheet::<W, H>::figure(p)).eq(line.chars()));
    if !same {
        let mut shown = heapless::String::<8192>::new();
        for row in &sheet.pixels {
            let line = row.iter().map(|&pixel| Sheet::<W, H>::figure(pixel));
            core::iter::once('"').chain(line).chain("\",\n".chars()).for_each(|c| shown.push(c).unwrap());
        }
        panic!("the picture is\n{shown}and should be\n{art:#?}");
    }
}
