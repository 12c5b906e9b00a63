//! The smaller and the larger of two volumes, with the same bits on every target.
//!
//! The standard minimum and maximum leave open which zero they return when the signs differ, and they spend extra
//! instructions on not-a-number; a plain comparison does neither.

/// The smaller of two volumes.
#[inline(always)]
pub(super) fn least(a_m3: f64, b_m3: f64) -> f64 {
    if a_m3 < b_m3 { a_m3 } else { b_m3 }
}

/// The volume itself where it is above zero, else zero.
#[inline(always)]
pub(super) fn positive(volume_m3: f64) -> f64 {
    if volume_m3 > 0.0 { volume_m3 } else { 0.0 }
}
