//! Pictures compared pixel by pixel with those in `tests/golden`.
#![allow(dead_code, reason = "each test takes what it needs")]

use std::fs::{self, File};
use std::io::BufReader;
use std::path::{Path, PathBuf};

use deshielo::picture::strict::Strict;
use deshielo::picture::{Canvas, Theme};
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

fn bytes(pixels: &[Rgb565]) -> Vec<u8> {
    let eight = |value: u8, bits: u8| (value << (8 - bits)) | (value >> (2 * bits - 8));
    pixels.iter().flat_map(|p| [eight(p.r(), 5), eight(p.g(), 6), eight(p.b(), 5)]).collect()
}

fn write_png(path: &Path, width: u32, height: u32, data: &[u8]) {
    fs::create_dir_all(path.parent().unwrap()).unwrap();
    let mut encoder = png::Encoder::new(File::create(path).unwrap(), width, height);
    encoder.set_color(png::ColorType::Rgb);
    encoder.set_compression(png::Compression::High);
    encoder.write_header().unwrap().write_image_data(data).unwrap();
}

fn read_png(path: &Path) -> Option<(u32, u32, Vec<u8>)> {
    let mut reader = png::Decoder::new(BufReader::new(File::open(path).ok()?)).read_info().ok()?;
    let mut data = vec![0; reader.output_buffer_size()?];
    let info = reader.next_frame(&mut data).ok()?;
    data.truncate(info.buffer_size());
    Some((info.width, info.height, data))
}

/// Draws under the strict witness and gives the picture with what was seen.
pub fn paint(width: u16, height: u16, draw: impl FnOnce(&mut Canvas<'_>)) -> (Vec<Rgb565>, Strict) {
    let mut pixels = vec![Rgb565::BLACK; usize::from(width) * usize::from(height)];
    let mut strict = Strict::default();
    let mut canvas = Canvas::new(&mut pixels, width, height).unwrap().with_witness(&mut strict);
    draw(&mut canvas);
    (pixels, strict)
}

/// Draws under the strict witness and compares with the golden picture `name`; with `DESHIELO_WRITE_GOLDEN=1` writes it.
pub fn check(name: &str, width: u16, height: u16, draw: impl FnOnce(&mut Canvas<'_>)) {
    let (pixels, strict) = paint(width, height, draw);
    let drawn = bytes(&pixels);
    let golden = PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("tests/golden").join(format!("{name}.png"));
    let (wide, high) = (u32::from(width), u32::from(height));
    if std::env::var_os("DESHIELO_WRITE_GOLDEN").is_some_and(|value| value == "1") {
        write_png(&golden, wide, high, &drawn);
    }
    strict.assert_clean(name);
    if read_png(&golden) != Some((wide, high, drawn.clone())) {
        let new = golden.with_extension("new.png");
        write_png(&new, wide, high, &drawn);
        panic!("{name} differs from its golden picture; compare {} with {}", golden.display(), new.display());
    }
}
