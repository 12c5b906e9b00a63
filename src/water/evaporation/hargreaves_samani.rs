//! Hargreaves–Samani: reference evaporation from the day's temperatures and the latitude alone.

use super::radiation::MM_PER_MJ_M2;
use crate::water::lanes::square_root;

/// Reference evaporation in mm a day from the mean of the day's extremes (°C), their range (°C) and the
/// extraterrestrial radiation (MJ/m²).
///
/// Hargreaves & Samani (1985), *Applied Engineering in Agriculture* 1(2), 96–99, in the form of FAO-56 eq. 52 (Allen et
/// al. 1998). The range is given apart from the mean because warming leaves it as it was. Negative below −17.8 °C, and
/// not a number for a negative range.
pub fn hargreaves_samani_mm(mean_c: f64, range_c: f64, extraterrestrial_mj_m2: f64) -> f64 {
    of_range_root_mm(mean_c, square_root(range_c), extraterrestrial_mj_m2)
}

/// The same from the square root of the range, which a day under many warmings shares.
#[inline(always)]
pub(super) fn of_range_root_mm(mean_c: f64, range_root: f64, extraterrestrial_mj_m2: f64) -> f64 {
    0.0023 * (mean_c + 17.8) * range_root * MM_PER_MJ_M2 * extraterrestrial_mj_m2
}
