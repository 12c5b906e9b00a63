//! Labels beside the ends of lines that keep clear of each other.

use embedded_graphics::geometry::Point;
use embedded_graphics::pixelcolor::Rgb565;
use heapless::Vec;

use super::super::Spot;
use super::super::canvas::Canvas;
use super::super::lettering::{Align, Face, draw};
use super::super::line::{Stroke, segment};

/// So many labels can stand in one column.
pub const MOST_LABELS: usize = 32;

/// A label that belongs to a height.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct EndLabel<'t> {
    /// The words.
    pub text: &'t str,
    /// The y that it belongs to, in pixels of the frame.
    pub y: f64,
    /// Its face.
    pub face: Face,
    /// Its colour.
    pub colour: Rgb565,
}

/// Draws labels in a column whose left edge is `x`, each as near to its y as the others let it, in order from the top,
/// between `top` and `bottom`. A label that had to move by more than half its height gets a thin leader from `tie_x`.
/// False, and nothing drawn, where there is no room for all or there are more than [`MOST_LABELS`].
pub fn end_labels(canvas: &mut Canvas<'_>, labels: &[EndLabel<'_>], x: i32, tie_x: f64, top: i32, bottom: i32) -> bool {
    let mut order: Vec<&EndLabel<'_>, MOST_LABELS> = Vec::new();
    for label in labels {
        if !label.y.is_finite() || order.push(label).is_err() {
            return false;
        }
    }
    order.sort_unstable_by(|a, b| a.y.total_cmp(&b.y).then(a.text.cmp(b.text)));
    let wishes: Vec<(f64, f64), MOST_LABELS> =
        order.iter().map(|label| (label.y, f64::from(label.face.cap_px() + label.face.descent_px() + 1))).collect();
    let Some(middles) = spread(&wishes, f64::from(top), f64::from(bottom)) else { return false };
    for (label, middle) in order.iter().zip(middles) {
        let at = Point::new(x, libm::round(middle) as i32);
        draw(canvas, label.text, at, label.face, label.colour, Align::LEFT.cap_middle());
        if (middle - label.y).abs() > f64::from(label.face.cap_px()) / 2.0 {
            let (from, to) = (Spot::new(tie_x, label.y), Spot::new(f64::from(x) - 2.0, middle));
            segment(canvas, from, to, Stroke::solid(1.0), label.colour);
        }
    }
    true
}

/// Middles as near as can be (least squares) to the wished ones, for (wish, height) sorted by wish, without overlap and
/// between the limits: neighbours that collide are pooled and moved together.
fn spread(wishes: &[(f64, f64)], top: f64, bottom: f64) -> Option<Vec<f64, MOST_LABELS>> {
    if wishes.iter().map(|(_, height)| height).sum::<f64>() > bottom - top {
        return None;
    }
    // Blocks of labels that touch: where the block begins, its height, how many labels it holds.
    let mut blocks: Vec<(f64, f64, usize), MOST_LABELS> = Vec::new();
    for &(wish, height) in wishes {
        let hold = |start: f64, height: f64| start.min(bottom - height).max(top);
        let mut block = (wish - height / 2.0, height, 1);
        while let Some(&(start, above, count)) = blocks.last() {
            if start.min(bottom - above).max(top) + above <= hold(block.0, block.1) {
                break;
            }
            blocks.pop();
            // Each label of the lower block is shifted down by the height of the upper one.
            let all = (count + block.2) as f64;
            let joined = (start * count as f64 + (block.0 - above) * block.2 as f64) / all;
            block = (joined, above + block.1, count + block.2);
        }
        // There is a block for at most each wish, and wishes fit the list.
        let _ = blocks.push(block);
    }
    let mut middles = Vec::new();
    let mut heights = wishes.iter().map(|&(_, height)| height);
    for (start, height, count) in blocks {
        let mut at = start.min(bottom - height).max(top);
        for height in heights.by_ref().take(count) {
            let _ = middles.push(at + height / 2.0);
            at += height;
        }
    }
    Some(middles)
}

#[cfg(test)]
mod tests {
    use super::*;
    use proptest::prelude::*;

    #[test]
    fn far_labels_stay_and_near_ones_part_evenly() {
        assert_eq!(spread(&[(10.0, 8.0), (40.0, 8.0)], 0.0, 60.0).unwrap(), [10.0, 40.0]);
        assert_eq!(spread(&[(29.0, 8.0), (31.0, 8.0)], 0.0, 60.0).unwrap(), [26.0, 34.0]);
        assert_eq!(spread(&[(0.0, 8.0), (1.0, 8.0)], 0.0, 60.0).unwrap(), [4.0, 12.0]);
        assert_eq!(spread(&[(0.0, 8.0), (1.0, 8.0)], 0.0, 15.0), None);
    }

    proptest! {
        #[test]
        fn labels_never_meet(mut wishes in prop::collection::vec((-50.0..250.0f64, 5.0..15.0f64), 1..13)) {
            wishes.sort_by(|a, b| a.0.total_cmp(&b.0));
            let middles = spread(&wishes, 0.0, 200.0).unwrap();
            let edge = |i: usize| (middles[i] - wishes[i].1 / 2.0, middles[i] + wishes[i].1 / 2.0);
            prop_assert!(edge(0).0 >= -1e-9 && edge(middles.len() - 1).1 <= 200.0 + 1e-9);
            for i in 1..middles.len() {
                prop_assert!(edge(i).0 >= edge(i - 1).1 - 1e-9);
            }
        }
    }
}
