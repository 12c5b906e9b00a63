//! The soil of a band: recharge by a power curve, evaporation less where the soil is dry or under snow.
//!
//! Bergström (1976), SMHI Report RHO 7: the share of water that passes is (soil water / capacity) to a power;
//! evaporation is potential above a share of capacity and falls in proportion below it. Evaporation is further reduced
//! by the share of the ground that snow covers, after Anderson (1973), as the snow module says.

use super::lanes::Lanes;
use super::power::PowerCurve;
use super::valley::SoilTraits;

/// Everything about soil that stays the same from day to day, one value a lane.
#[derive(Clone, Copy, Debug)]
pub struct SoilConstants<const L: usize> {
    capacity_mm: Lanes<L>,
    per_capacity_mm: Lanes<L>,
    per_dry_mm: Lanes<L>,
}

/// What the soil of a band does in a day, mm.
#[derive(Clone, Copy, Debug)]
pub struct SoilDay<const L: usize> {
    /// Water that passes on to the ground stores.
    pub recharge_mm: Lanes<L>,
    /// Water that soil and plants give to the air.
    pub evaporation_mm: Lanes<L>,
}

impl<const L: usize> SoilConstants<L> {
    /// Constants for lanes that all share the same traits.
    pub fn new(soil: &SoilTraits) -> Self {
        Self::by_lane([soil; L])
    }

    /// Constants for lanes that differ, as in fitting.
    pub fn by_lane(soil: [&SoilTraits; L]) -> Self {
        Self {
            capacity_mm: Lanes(soil.map(|s| s.capacity_mm)),
            per_capacity_mm: Lanes(soil.map(|s| 1.0 / s.capacity_mm)),
            per_dry_mm: Lanes(soil.map(|s| 1.0 / (s.dry_share * s.capacity_mm))),
        }
    }

    /// One day: `water_mm` enters `soil_mm`; `evaporation_mm` is what the air asks for where no snow lies.
    #[inline(always)]
    pub fn day(
        &self,
        soil_mm: &mut Lanes<L>,
        curve: impl PowerCurve<L>,
        water_mm: Lanes<L>,
        evaporation_mm: Lanes<L>,
        covered_share: Lanes<L>,
    ) -> SoilDay<L> {
        let passed_mm = curve.times(water_mm, *soil_mm * self.per_capacity_mm);
        let filled_mm = *soil_mm + (water_mm - passed_mm);
        let overflow_mm = (filled_mm - self.capacity_mm).positive();
        let wet_mm = filled_mm.least(self.capacity_mm);

        let asked_mm = evaporation_mm * (Lanes::splat(1.0) - covered_share);
        let moisture = (wet_mm * self.per_dry_mm).least(Lanes::splat(1.0));
        let evaporation_mm = (asked_mm * moisture).least(wet_mm);
        *soil_mm = wet_mm - evaporation_mm;
        SoilDay { recharge_mm: passed_mm + overflow_mm, evaporation_mm }
    }
}
