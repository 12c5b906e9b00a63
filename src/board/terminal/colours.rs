//! Colours as a terminal takes them: any, the nearest of 256, or the nearest of 16.

use std::io::{self, Write};

use super::ability::ColourDepth;

/// Red, green and blue of 8 bits.
pub type Rgb = [u8; 3];

/// Which of the two colours of a cell.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Layer {
    /// The letter.
    Ink,
    /// What is behind it.
    Ground,
}

/// How far apart two colours are; green counts most because eyes see it best.
pub fn distance(one: Rgb, other: Rgb) -> u32 {
    let square = |i: usize| u32::from(one[i].abs_diff(other[i])).pow(2);
    3 * square(0) + 6 * square(1) + square(2)
}

/// Writes the sequence that makes `colour` the colour of `layer` (ECMA-48 SGR; 38/48 of ISO 8613-6).
pub fn write(out: &mut impl Write, colour: Rgb, layer: Layer, depth: ColourDepth) -> io::Result<()> {
    let base = if layer == Layer::Ink { 30 } else { 40 };
    match depth {
        ColourDepth::True => write!(out, "\x1b[{};2;{};{};{}m", base + 8, colour[0], colour[1], colour[2]),
        ColourDepth::Indexed256 => write!(out, "\x1b[{};5;{}m", base + 8, nearest_of_256(colour)),
        ColourDepth::Sixteen => {
            let index = nearest_of_16(colour);
            // The bright eight have codes of their own.
            let code = if index < 8 { base + index } else { base + 60 + index - 8 };
            write!(out, "\x1b[{code}m")
        }
    }
}

/// Steps of the 6 × 6 × 6 cube, as every terminal with 256 colours has them.
const CUBE: [u8; 6] = [0, 95, 135, 175, 215, 255];

fn nearest_of_256(colour: Rgb) -> u8 {
    let steps = colour.map(|channel| nearest(CUBE.iter().map(|step| u32::from(step.abs_diff(channel)))));
    let of_cube = steps.map(|step| CUBE[step]);
    let mean = colour.iter().map(|&channel| u32::from(channel)).sum::<u32>() / 3;
    // 24 greys from 8 in steps of 10.
    let step = (mean.saturating_sub(3) / 10).min(23) as u8;
    let grey = [8 + 10 * step; 3];
    if distance(grey, colour) < distance(of_cube, colour) {
        232 + step
    } else {
        16 + 36 * steps[0] as u8 + 6 * steps[1] as u8 + steps[2] as u8
    }
}

/// The sixteen as most terminals draw them; people may have set others.
const SIXTEEN: [Rgb; 16] = [
    [0, 0, 0],
    [170, 0, 0],
    [0, 170, 0],
    [170, 85, 0],
    [0, 0, 170],
    [170, 0, 170],
    [0, 170, 170],
    [170, 170, 170],
    [85, 85, 85],
    [255, 85, 85],
    [85, 255, 85],
    [255, 255, 85],
    [85, 85, 255],
    [255, 85, 255],
    [85, 255, 255],
    [255, 255, 255],
];

fn nearest_of_16(colour: Rgb) -> usize {
    nearest(SIXTEEN.iter().map(|&other| distance(other, colour)))
}

/// Where the least distance is; the first of equals.
fn nearest(distances: impl Iterator<Item = u32>) -> usize {
    distances.enumerate().min_by_key(|&(_, distance)| distance).map_or(0, |(index, _)| index)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_cube_and_the_greys_are_found() {
        assert_eq!(nearest_of_256([0, 0, 0]), 16);
        assert_eq!(nearest_of_256([255, 255, 255]), 231);
        assert_eq!(nearest_of_256([95, 135, 215]), 16 + 36 + 2 * 6 + 4);
        assert_eq!(nearest_of_256([128, 128, 128]), 244);
        assert_eq!(nearest_of_256([238, 238, 238]), 255);
    }

    #[test]
    fn sequences_are_those_of_the_standard() {
        let said = |colour, layer, depth| {
            let mut out = Vec::new();
            write(&mut out, colour, layer, depth).unwrap();
            String::from_utf8(out).unwrap()
        };
        assert_eq!(said([1, 20, 255], Layer::Ink, ColourDepth::True), "\x1b[38;2;1;20;255m");
        assert_eq!(said([0, 0, 0], Layer::Ground, ColourDepth::Indexed256), "\x1b[48;5;16m");
        assert_eq!(said([160, 5, 5], Layer::Ink, ColourDepth::Sixteen), "\x1b[31m");
        assert_eq!(said([255, 255, 255], Layer::Ground, ColourDepth::Sixteen), "\x1b[107m");
    }
}
