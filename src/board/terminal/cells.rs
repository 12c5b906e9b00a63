//! A frame turned into cells: parts of two colours where the picture is, letters where its texts are.

use embedded_graphics::pixelcolor::Rgb565;

use super::ability::Grain;
use super::colours::{Rgb, distance};
use super::letters;
use super::room::Room;
use crate::board::pictures::eight_bits;
use crate::board::screen::Frame;

/// What one cell shows.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Cell {
    /// The letter.
    pub symbol: char,
    /// Its colour.
    pub ink: Rgb,
    /// What is behind it.
    pub ground: Rgb,
}

impl Cell {
    /// A cell of one colour.
    pub const fn blank(ground: Rgb) -> Self {
        Self { symbol: ' ', ink: ground, ground }
    }
}

/// Colours nearer than this are one; a little more than a step of the frame's own channels.
const SAME: u32 = 3 * 9 * 9;

/// The cells of a frame in rows, as many as the room says.
pub fn cells(frame: &Frame<'_>, room: &Room, grain: Grain) -> Vec<Cell> {
    let mut pixels = frame.pixels.to_vec();
    let width = usize::from(frame.size.width);
    // The letters' own pixels go, so that nothing of them is left beside the real ones.
    let mut lines: Vec<letters::Line> =
        frame.texts.iter().filter_map(|text| letters::lift(text, &mut pixels, frame.size, room)).collect();
    let (columns, rows) = (usize::from(room.columns), usize::from(room.rows));
    let mut cells = Vec::with_capacity(columns * rows);
    for row in 0..rows {
        for column in 0..columns {
            let across = (room.x_of(column), room.x_of(column + 1));
            let down = (room.y_of(row), room.y_of(row + 1));
            cells.push(cell(&pixels, width, across, down, grain));
        }
    }
    letters::level(&mut lines);
    letters::set(&lines, &mut cells, columns);
    cells
}

fn cell(pixels: &[Rgb565], width: usize, across: (usize, usize), down: (usize, usize), grain: Grain) -> Cell {
    let (parts_across, parts_down) = grain.parts();
    let mut parts = [[0; 3]; 6];
    let count = parts_across * parts_down;
    for (index, part) in parts[..count].iter_mut().enumerate() {
        let (x, y) = (index % parts_across, index / parts_across);
        let xs = cut(across, x, parts_across);
        let ys = cut(down, y, parts_down);
        *part = colour_of(pixels, width, xs, ys);
    }
    two_colours(&parts[..count], grain)
}

/// Part number `part` of `parts`, at least one pixel wide.
fn cut((from, to): (usize, usize), part: usize, parts: usize) -> (usize, usize) {
    let start = from + (to - from) * part / parts;
    (start, (from + (to - from) * (part + 1) / parts).max(start + 1))
}

/// Between the mean of a part and what stands out most in it, so that a thin line on paper does not fade away.
fn colour_of(pixels: &[Rgb565], width: usize, xs: (usize, usize), ys: (usize, usize)) -> Rgb {
    let rows = (ys.0..ys.1).filter_map(|y| pixels.get(y * width + xs.0.min(width)..y * width + xs.1.min(width)));
    let mut sum = [0_u32; 3];
    let mut count = 0;
    for pixel in rows.clone().flatten() {
        let colour = eight_bits(*pixel);
        (0..3).for_each(|i| sum[i] += u32::from(colour[i]));
        count += 1;
    }
    if count == 0 {
        return [0; 3];
    }
    let mean = sum.map(|sum| (sum / count) as u8);
    let most = rows.flatten().map(|&pixel| eight_bits(pixel)).max_by_key(|&colour| distance(colour, mean));
    let most = most.unwrap_or(mean);
    [0, 1, 2].map(|i| (u16::from(mean[i]) + u16::from(most[i])).div_ceil(2) as u8)
}

fn two_colours(parts: &[Rgb], grain: Grain) -> Cell {
    let mut farthest = (0, 0, 0);
    for one in 0..parts.len() {
        for other in one + 1..parts.len() {
            let apart = distance(parts[one], parts[other]);
            if apart > farthest.0 {
                farthest = (apart, one, other);
            }
        }
    }
    let (apart, one, other) = farthest;
    if apart <= SAME {
        return Cell::blank(mean(parts, |_| true));
    }
    let near_other = |part: usize| distance(parts[part], parts[other]) < distance(parts[part], parts[one]);
    let many = (0..parts.len()).filter(|&part| near_other(part)).count() * 2 > parts.len();
    // The larger share is the ground, so that a lone part is always the letter.
    let is_ink = |part: usize| near_other(part) != many;
    let mask = (0..parts.len()).filter(|&part| is_ink(part)).fold(0, |mask, part| mask | 1 << part);
    Cell { symbol: grain.symbol(mask), ink: mean(parts, is_ink), ground: mean(parts, |part| !is_ink(part)) }
}

fn mean(parts: &[Rgb], of: impl Fn(usize) -> bool) -> Rgb {
    let chosen = || (0..parts.len()).filter(|&part| of(part));
    let count = chosen().count().max(1) as u32;
    [0, 1, 2].map(|i| (chosen().map(|part| u32::from(parts[part][i])).sum::<u32>() / count) as u8)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::board::size::FrameSize;
    use embedded_graphics::pixelcolor::RgbColor;

    const SIZE: FrameSize = FrameSize::new(320, 240);

    fn shown(pixels: &[Rgb565], grain: Grain) -> Vec<Cell> {
        let room = Room::of(80, 24, Some(SIZE)).unwrap();
        cells(&Frame { size: SIZE, pixels, texts: &[] }, &room, grain)
    }

    #[test]
    fn a_plain_frame_is_blank_and_a_corner_is_one_part() {
        let mut pixels = vec![Rgb565::WHITE; SIZE.pixels()];
        assert!(shown(&pixels, Grain::Quadrant).iter().all(|cell| *cell == Cell::blank([255; 3])));
        for y in 0..5 {
            pixels[y * 320..y * 320 + 2].fill(Rgb565::BLUE);
        }
        let cells = shown(&pixels, Grain::Quadrant);
        assert_eq!(cells[0], Cell { symbol: '▘', ink: [0, 0, 255], ground: [255; 3] });
        assert_eq!(cells[1], Cell::blank([255; 3]));
        assert_eq!(cells.len(), 80 * 24);
    }

    #[test]
    fn a_line_of_one_pixel_does_not_fade_away() {
        let mut pixels = vec![Rgb565::WHITE; SIZE.pixels()];
        pixels[2 * 320..3 * 320].fill(Rgb565::BLACK);
        for grain in [Grain::Half, Grain::Quadrant, Grain::Sextant] {
            let cell = shown(&pixels, grain)[40];
            assert_ne!(cell.symbol, ' ', "{grain:?}");
            assert!(cell.ink[0].min(cell.ground[0]) < 128 && cell.ink[0].max(cell.ground[0]) > 200, "{cell:?}");
        }
    }
}
