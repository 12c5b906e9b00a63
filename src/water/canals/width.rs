//! How many gates the daily loops are compiled for.
//!
//! Rivers have a handful of gates, and a loop of unknown short length spends more on its ends than on its middle. So the
//! day is compiled for a few fixed widths, and what a width holds beyond the last gate is zero and changes nothing. The
//! result does not depend on the width.

use super::MOST_GATES;

/// The sum over the first `WIDTH` values, an even number of them. Two running sums, so that one need not wait for the
/// other.
#[inline(always)]
pub(super) fn sum<const WIDTH: usize>(values: &[f64; MOST_GATES]) -> f64 {
    let (mut even, mut odd) = (0.0, 0.0);
    for pair in values[..WIDTH].as_chunks::<2>().0 {
        even += pair[0];
        odd += pair[1];
    }
    even + odd
}
