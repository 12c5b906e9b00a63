//! Frames that change at random, for screens to keep up with.

use deshielo::board::FrameSize;
use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::raw::RawU16;
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};
use embedded_graphics::primitives::{PointsIter, Rectangle};

/// Seeded random numbers (xorshift: Marsaglia 2003, the triple 13, 17, 5).
pub struct Dice(u32);

impl Dice {
    pub fn new(seed: u32) -> Self {
        Self(seed.max(1))
    }

    pub fn below(&mut self, most: u32) -> u32 {
        self.0 ^= self.0 << 13;
        self.0 ^= self.0 >> 17;
        self.0 ^= self.0 << 5;
        self.0 % most.max(1)
    }

    pub fn colour(&mut self) -> Rgb565 {
        RawU16::new(self.below(1 << 16) as u16).into()
    }
}

/// A frame that somebody draws on.
pub struct Drawn {
    pub size: FrameSize,
    pub pixels: Vec<Rgb565>,
}

impl Drawn {
    pub fn black(size: FrameSize) -> Self {
        Self { size, pixels: vec![Rgb565::BLACK; size.pixels()] }
    }

    pub fn whole(&self) -> Rectangle {
        Rectangle::new(Point::zero(), Size::new(self.size.width.into(), self.size.height.into()))
    }

    pub fn at(&self, x: u32, y: u32) -> Rgb565 {
        self.pixels[y as usize * usize::from(self.size.width) + x as usize]
    }

    /// Draws noise into one to three boxes, and gives them; some reach beyond the frame, some are a pixel wide.
    pub fn scribble(&mut self, dice: &mut Dice) -> Vec<Rectangle> {
        let (width, height) = (u32::from(self.size.width), u32::from(self.size.height));
        let mut boxes = Vec::new();
        for _ in 0..=dice.below(3) {
            let most = if dice.below(20) == 0 { width.max(height) } else { 40 };
            let size = Size::new(1 + dice.below(most), 1 + dice.below(most));
            let corner = Point::new(dice.below(width + 8) as i32 - 8, dice.below(height + 8) as i32 - 8);
            let area = Rectangle::new(corner, size);
            for point in area.intersection(&self.whole()).points() {
                self.pixels[point.y as usize * width as usize + point.x as usize] = dice.colour();
            }
            boxes.push(area);
        }
        boxes
    }
}

/// The column and row of the glass of `width` × `height` at which a pixel of a picture that is `degrees` clockwise is.
pub fn turned(x: u32, y: u32, degrees: u16, width: u32, height: u32) -> (u32, u32) {
    match degrees {
        0 => (x, y),
        90 => (width - 1 - y, x),
        180 => (width - 1 - x, height - 1 - y),
        270 => (y, height - 1 - x),
        other => panic!("{other}"),
    }
}
