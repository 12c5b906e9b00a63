//! Root zone: the water that a field holds within reach of its roots, counted as what is missing from full.
//!
//! FAO-56 (Allen et al. 1998), chapter 8. Depths in mm. No water rises from below and none runs off: what the roots cannot
//! hold drains.

use crate::water::lanes::Number;

/// Water between field capacity and wilting point in the root zone, mm (FAO-56 eq. 82), both as volume shares.
pub fn total_available_mm(field_capacity_share: f64, wilting_point_share: f64, root_depth_m: f64) -> f64 {
    1000.0 * (field_capacity_share - wilting_point_share) * root_depth_m
}

/// Part of the available water that the crop takes without stress, mm (FAO-56 eq. 83).
pub fn readily_available_mm(total_available_mm: f64, depletion_share: f64) -> f64 {
    depletion_share * total_available_mm
}

/// Depletion share on a day of other thirst than the table's 5 mm, kept within 0.1 and 0.8 (FAO-56 table 22, footnote).
#[inline(always)]
pub fn adjusted_depletion_share<N: Number>(depletion_share: N, crop_evaporation_mm: N) -> N {
    let adjusted = depletion_share + N::splat(0.04) * (N::splat(5.0) - crop_evaporation_mm);
    adjusted.most(N::splat(0.1)).least(N::splat(0.8))
}

/// Share of its full evaporation that a crop still reaches at a depletion in mm (FAO-56 eq. 84): 1 while the readily
/// available water lasts, 0 when everything available is gone.
#[inline(always)]
pub fn stress_factor<N: Number>(depletion_mm: N, total_available_mm: N, depletion_share: N) -> N {
    let one = N::splat(1.0);
    // Where nothing can be held this is nothing over nothing, and then no share is reached.
    ((total_available_mm - depletion_mm) / ((one - depletion_share) * total_available_mm)).positive().least(one)
}

/// A day in the root zone.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct RootZoneDay<N = f64> {
    /// Water missing from full at the end of the day, mm.
    pub depletion_mm: N,
    /// Water that the crop and its soil gave to the air, mm.
    pub crop_evaporation_mm: N,
    /// Water that drained below the roots, mm.
    pub percolation_mm: N,
    /// Share of the full evaporation that the stress left, 0 to 1.
    pub stress_factor: N,
}

/// One day of the balance (FAO-56 eq. 85 to 88), from the depletion at its start.
///
/// `water_mm` is rain and delivery together and enters at the start of the day, before the stress is judged (as in FAO-56
/// example 38); `full_evaporation_mm` is the day's crop evaporation without stress, coefficient times reference.
/// The evaporation stops where the available water ends, so that the depletion grows by exactly evaporation + percolation − water.
/// Without branches, so that plots can go side by side.
#[inline(always)]
pub fn root_zone_day<N: Number>(
    depletion_mm: N,
    total_available_mm: N,
    depletion_share: N,
    full_evaporation_mm: N,
    water_mm: N,
) -> RootZoneDay<N> {
    let watered_mm = depletion_mm - water_mm;
    let share = adjusted_depletion_share(depletion_share, full_evaporation_mm);
    let stress_factor = stress_factor(watered_mm.positive(), total_available_mm, share);
    let within_reach_mm = (total_available_mm - watered_mm).positive();
    let crop_evaporation_mm = (stress_factor * full_evaporation_mm).least(within_reach_mm);
    let balance_mm = watered_mm + crop_evaporation_mm;
    let depletion_mm = balance_mm.positive();
    RootZoneDay { depletion_mm, crop_evaporation_mm, percolation_mm: depletion_mm - balance_mm, stress_factor }
}

#[cfg(test)]
mod tests {
    use super::*;
    use proptest::prelude::*;

    #[test]
    fn a_field_without_water_dries_to_the_wilting_point_and_no_further() {
        let mut depletion_mm = 0.0;
        let mut evaporated_mm = 0.0;
        let mut last = f64::INFINITY;
        for _ in 0..400 {
            let day = root_zone_day(depletion_mm, 120.0, 0.55, 6.0, 0.0);
            assert!(day.crop_evaporation_mm <= last);
            last = day.crop_evaporation_mm;
            depletion_mm = day.depletion_mm;
            evaporated_mm += day.crop_evaporation_mm;
        }
        assert!((119.9..=120.0).contains(&depletion_mm), "{depletion_mm}");
        assert!((evaporated_mm - depletion_mm).abs() < 1e-9);
    }

    #[test]
    fn more_water_than_is_missing_drains() {
        let day = root_zone_day(20.0, 120.0, 0.55, 6.0, 50.0);
        assert_eq!(
            day,
            RootZoneDay { depletion_mm: 0.0, crop_evaporation_mm: 6.0, percolation_mm: 24.0, stress_factor: 1.0 }
        );
    }

    #[test]
    fn soil_that_holds_nothing_gives_nothing() {
        let day = root_zone_day(0.0, 0.0, 0.55, 6.0, 0.0);
        assert_eq!((day.crop_evaporation_mm, day.percolation_mm, day.depletion_mm), (0.0, 0.0, 0.0));
    }

    proptest! {
        #[test]
        fn every_drop_is_accounted(
            total in 1.0..400.0f64, part in 0.0..=1.0f64, share in 0.1..0.8f64, thirst in 0.0..15.0f64, water in 0.0..200.0f64,
        ) {
            let start = part * total;
            let day = root_zone_day(start, total, share, thirst, water);
            // Depletion falls by what came in and rises by what left.
            let residual = day.depletion_mm - start + water - day.crop_evaporation_mm - day.percolation_mm;
            prop_assert!(residual.abs() < 1e-9, "{residual}");
            prop_assert!(day.depletion_mm >= 0.0 && day.depletion_mm <= total * (1.0 + 1e-12));
            prop_assert!(day.crop_evaporation_mm >= 0.0 && day.crop_evaporation_mm <= thirst);
            prop_assert!(day.percolation_mm >= 0.0);
        }
    }
}
