//! The units that keys of a board file carry at their end.

use crate::place::unit_suffix::{UnitSuffix, Units};

const fn unit(suffix: &'static str) -> UnitSuffix {
    UnitSuffix { suffix, scale: 1.0, fahrenheit: false }
}

/// Pixels.
pub(super) const PIXELS: Units = &[unit("_px")];
/// Angles, degrees.
pub(super) const DEGREES: Units = &[unit("_deg")];
/// Clocks of buses, MHz.
pub(super) const MEGAHERTZ: Units = &[unit("_mhz")];
/// Short times, ms.
pub(super) const MILLISECONDS: Units = &[unit("_ms")];
/// Times, s.
pub(super) const SECONDS: Units = &[unit("_s"), UnitSuffix { suffix: "_min", scale: 60.0, fahrenheit: false }];
/// How often, times a second.
pub(super) const PER_SECOND: Units = &[unit("_per_s")];
/// Parts of a whole.
pub(super) const SHARE: Units = &[unit("_share"), UnitSuffix { suffix: "_percent", scale: 0.01, fahrenheit: false }];
