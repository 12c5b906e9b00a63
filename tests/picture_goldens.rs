//! Specimen sheets, compared pixel by pixel with the pictures in `tests/golden`.
//!
//! `DESHIELO_WRITE_GOLDEN=1 cargo test --test picture_goldens` writes the pictures anew; look at them before you commit
//! them. A sheet that differs is written beside the golden one with the ending `.new.png`.

mod picture_sheets;

use std::fs::{self, File};
use std::io::BufReader;
use std::path::{Path, PathBuf};

use deshielo::picture::strict::Strict;
use deshielo::picture::{Canvas, Theme};
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

const THEMES: [(&str, Theme); 3] = [("light", Theme::LIGHT), ("dark", Theme::DARK), ("sunlight", Theme::SUNLIGHT)];

fn bytes(pixels: &[Rgb565]) -> Vec<u8> {
    let eight = |value: u8, bits: u8| (value << (8 - bits)) | (value >> (2 * bits - 8));
    pixels.iter().flat_map(|p| [eight(p.r(), 5), eight(p.g(), 6), eight(p.b(), 5)]).collect()
}

fn write_png(path: &Path, width: u32, height: u32, data: &[u8]) {
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

/// Draws a sheet under the strict witness and compares it with its golden picture.
fn check(name: &str, width: u16, height: u16, theme: &Theme, draw: impl FnOnce(&mut Canvas<'_>, &Theme)) {
    let mut pixels = vec![Rgb565::BLACK; usize::from(width) * usize::from(height)];
    let mut strict = Strict::default();
    let mut canvas = Canvas::new(&mut pixels, width, height).unwrap().with_witness(&mut strict);
    canvas.fill(canvas.frame(), theme.paper);
    draw(&mut canvas, theme);
    let drawn = bytes(&pixels);
    let golden = PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("tests/golden").join(format!("{name}.png"));
    let (wide, high) = (u32::from(width), u32::from(height));
    if std::env::var_os("DESHIELO_WRITE_GOLDEN").is_some_and(|value| value == "1") {
        fs::create_dir_all(golden.parent().unwrap()).unwrap();
        write_png(&golden, wide, high, &drawn);
    }
    strict.assert_clean(name);
    if read_png(&golden) != Some((wide, high, drawn.clone())) {
        let new = golden.with_extension("new.png");
        write_png(&new, wide, high, &drawn);
        panic!("{name} differs from its golden picture; compare {} with {}", golden.display(), new.display());
    }
}

#[test]
fn type_in_all_sizes() {
    for (name, theme) in &THEMES[..2] {
        check(&format!("picture-type-{name}-800x480"), 800, 480, theme, picture_sheets::type_large);
        check(&format!("picture-type-{name}-320x240"), 320, 240, theme, picture_sheets::type_small);
    }
}

#[test]
fn every_character_of_the_face() {
    check("picture-characters-320x240", 320, 240, &Theme::LIGHT, picture_sheets::characters);
}

#[test]
fn lines_areas_and_shapes() {
    for (name, theme) in &THEMES {
        check(&format!("picture-shapes-{name}-320x240"), 320, 240, theme, picture_sheets::shapes);
    }
}

#[test]
fn charts() {
    for (name, theme) in &THEMES {
        check(&format!("picture-charts-{name}-320x240"), 320, 240, theme, picture_sheets::charts);
        check(&format!("picture-charts-{name}-800x480"), 800, 480, theme, picture_sheets::charts);
    }
}
