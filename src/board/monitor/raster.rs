//! Pixels as bytes in rows, for memory that somebody else shows.

use std::io;

use embedded_graphics::pixelcolor::{IntoStorage, Rgb565};
use embedded_graphics::primitives::Rectangle;

use crate::board::pictures::eight_bits;
use crate::board::placing::Placing;

/// How a pixel lies in memory, lowest byte first.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum PixelForm {
    /// 16 bits: 5 of red on top, 6 of green, 5 of blue.
    Bits16,
    /// 32 bits: a byte that nobody looks at on top, then red, green, blue.
    Bits32,
}

impl PixelForm {
    /// Bytes of a pixel.
    pub const fn bytes(self) -> usize {
        match self {
            Self::Bits16 => 2,
            Self::Bits32 => 4,
        }
    }

    /// Adds a pixel.
    fn put(self, into: &mut Vec<u8>, colour: Rgb565, blue_first: bool) {
        match self {
            Self::Bits16 => {
                let word = colour.into_storage();
                let word = if blue_first { word << 11 | word & 0x07e0 | word >> 11 } else { word };
                into.extend_from_slice(&word.to_le_bytes());
            }
            Self::Bits32 => {
                let [red, green, blue] = eight_bits(colour);
                into.extend_from_slice(&if blue_first { [red, green, blue, 0] } else { [blue, green, red, 0] });
            }
        }
    }
}

/// Memory that takes bytes at a place.
pub trait Memory {
    /// Writes all of `bytes` from byte `at` on.
    ///
    /// # Errors
    /// What the system says; also where the memory is too short.
    fn write(&mut self, at: u64, bytes: &[u8]) -> io::Result<()>;
}

/// How pictures lie in a memory.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Raster {
    /// Where the picture is on the glass.
    pub placing: Placing,
    /// How a pixel lies in memory.
    pub form: PixelForm,
    /// Whether red and blue change places.
    pub blue_first: bool,
    /// Bytes from one row to the next.
    pub stride: u64,
    /// Byte of the first pixel of the glass.
    pub start: u64,
}

impl Raster {
    /// Writes what lies in `changed` of a picture that has as many pixels as the placing says.
    ///
    /// # Errors
    /// What the memory says; `InvalidInput` where the picture has another size.
    pub fn draw(&self, pixels: &[Rgb565], changed: &[Rectangle], memory: &mut impl Memory) -> io::Result<()> {
        if pixels.len() != self.placing.frame.pixels() {
            return Err(io::ErrorKind::InvalidInput.into());
        }
        let mut bytes = Vec::new();
        for area in changed.iter().filter_map(|area| self.placing.clip(area)) {
            let (left, top, right, bottom) = self.placing.on_glass(&area);
            for y in top..bottom {
                bytes.clear();
                for x in left..right {
                    self.form.put(&mut bytes, pixels[self.placing.of_glass(x, y)], self.blue_first);
                }
                memory.write(self.place(left, y), &bytes)?;
            }
        }
        Ok(())
    }

    /// Makes the whole glass black.
    ///
    /// # Errors
    /// What the memory says.
    pub fn clear(&self, memory: &mut impl Memory) -> io::Result<()> {
        let row = vec![0; self.placing.width as usize * self.form.bytes()];
        (0..self.placing.height).try_for_each(|y| memory.write(self.place(0, y), &row))
    }

    fn place(&self, x: u32, y: u32) -> u64 {
        self.start + u64::from(y) * self.stride + u64::from(x) * self.form.bytes() as u64
    }
}
