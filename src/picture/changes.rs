//! Which parts of the frame differ from what a screen shows already.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::{IntoStorage, Rgb565};
use embedded_graphics::primitives::Rectangle;
use heapless::Vec;

use super::canvas::hull;

/// At most so many boxes come out, however the frames differ.
pub const MOST_CHANGES: usize = 16;

/// Boxes that together hold every pixel in which two frames differ.
pub type Changes = Vec<Rectangle, MOST_CHANGES>;

/// Rows looked at together: less than a line of small type, so that lines of text fall into few bands.
const BAND_ROWS: usize = 8;
/// Pixels without change that part two boxes; shorter gaps cost less to send than a window costs to set up.
const GAP: usize = 24;
/// So many unchanged pixels may be sent along to save one box.
const SLACK: u64 = 256;

/// The boxes in which `now` differs from `before`; both hold rows of `width` pixels. Frames of unequal length or of a
/// length that is no whole number of rows have changed as a whole.
pub fn changes(before: &[Rgb565], now: &[Rgb565], width: u16) -> Changes {
    let mut found = Changes::new();
    let row = usize::from(width);
    if row == 0 || now.is_empty() {
        return found;
    }
    if before.len() != now.len() || !now.len().is_multiple_of(row) {
        let height = now.len().div_ceil(row);
        add(&mut found, Rectangle::new(Point::zero(), Size::new(u32::from(width), height as u32)));
        return found;
    }
    for (band, (old, new)) in before.chunks(row * BAND_ROWS).zip(now.chunks(row * BAND_ROWS)).enumerate() {
        if differ(old, new) {
            boxes_of_band(&mut found, old, new, row, band * BAND_ROWS);
        }
    }
    found
}

/// Looks at every pixel without leaving early, which lets the processor look at many at once.
fn differ(old: &[Rgb565], new: &[Rgb565]) -> bool {
    old.iter().zip(new).fold(0, |found, (a, b)| found | (a.into_storage() ^ b.into_storage())) != 0
}

fn boxes_of_band(found: &mut Changes, old: &[Rgb565], new: &[Rgb565], row: usize, top: usize) {
    let rows = old.len() / row;
    let differs = |x: usize| (0..rows).any(|y| old[y * row + x] != new[y * row + x]);
    let mut x = 0;
    while let Some(left) = (x..row).find(|&x| differs(x)) {
        let mut right = left + 1;
        while let Some(next) = (right..row.min(right + GAP)).find(|&x| differs(x)) {
            right = next + 1;
        }
        let changed = |y: &usize| old[y * row + left..y * row + right] != new[y * row + left..y * row + right];
        let first = (0..rows).find(changed).unwrap_or(0);
        let last = (0..rows).rev().find(changed).unwrap_or(0);
        let corner = Point::new(left as i32, (top + first) as i32);
        add(found, Rectangle::new(corner, Size::new((right - left) as u32, (last + 1 - first) as u32)));
        x = right;
    }
}

/// Adds a box, joined with another where that wastes little or where the list is full.
fn add(found: &mut Changes, mut area: Rectangle) {
    loop {
        let cheapest = (0..found.len()).map(|i| (waste(&found[i], &area), i)).min();
        match cheapest {
            Some((cost, at)) if cost <= SLACK || found.is_full() => area = hull(found.swap_remove(at), area),
            _ => {
                // There is room: a full list has joined above.
                let _ = found.push(area);
                return;
            }
        }
    }
}

fn pixels(area: &Rectangle) -> u64 {
    u64::from(area.size.width) * u64::from(area.size.height)
}

/// Pixels that a joined box holds beyond those of its two parts.
fn waste(one: &Rectangle, other: &Rectangle) -> u64 {
    pixels(&hull(*one, *other)).saturating_sub(pixels(one) + pixels(other))
}

#[cfg(test)]
mod tests {
    use super::*;
    use embedded_graphics::pixelcolor::RgbColor;
    use proptest::prelude::*;

    const WIDTH: u16 = 80;

    proptest! {
        #[test]
        fn every_changed_pixel_lies_in_a_box(places in prop::collection::vec((0..80usize, 0..60usize), 0..60)) {
            let before = [Rgb565::BLACK; 80 * 60];
            let mut now = before;
            for &(x, y) in &places {
                now[y * 80 + x] = Rgb565::RED;
            }
            let boxes = changes(&before, &now, WIDTH);
            for (x, y) in &places {
                prop_assert!(boxes.iter().any(|area| area.contains(Point::new(*x as i32, *y as i32))));
            }
            prop_assert_eq!(boxes.is_empty(), places.is_empty());
        }
    }

    #[test]
    fn two_far_words_are_two_boxes_and_tight() {
        let before = [Rgb565::BLACK; 80 * 60];
        let mut now = before;
        for y in 10..21 {
            now[y * 80 + 3..y * 80 + 20].fill(Rgb565::WHITE);
            now[(y + 30) * 80 + 60..(y + 30) * 80 + 77].fill(Rgb565::WHITE);
        }
        let boxes = changes(&before, &now, WIDTH);
        assert_eq!(boxes.len(), 2);
        assert!(boxes.contains(&Rectangle::new(Point::new(3, 10), Size::new(17, 11))));
        assert!(boxes.contains(&Rectangle::new(Point::new(60, 40), Size::new(17, 11))));
    }

    #[test]
    fn a_frame_of_another_size_is_sent_whole() {
        let boxes = changes(&[Rgb565::BLACK; 80], &[Rgb565::BLACK; 160], WIDTH);
        assert_eq!(boxes.as_slice(), [Rectangle::new(Point::zero(), Size::new(80, 2))]);
    }
}
