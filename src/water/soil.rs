//! The soil of a band: recharge by a power curve, evaporation less where the soil is dry or under snow.
//!
//! Bergström (1976), SMHI Report RHO 7: the share of water that passes is (soil water / capacity) to a power;
//! evaporation is potential above a share of capacity and falls in proportion below it. Evaporation is further reduced
//! by the share of the ground that snow covers, after Anderson (1973), as the snow module says.

use super::lanes::{Lanes, Number};
use super::power::PowerCurve;
use super::valley::SoilTraits;

/// Everything about soil that stays the same from day to day, one value a lane.
#[derive(Clone, Copy, Debug, Default)]
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
        let mut constants = Self::default();
        for (lane, soil) in soil.into_iter().enumerate() {
            constants.set(lane, soil, 1.0);
        }
        constants
    }

    /// Sets a lane to soil that makes up `area_share` of the ground over which depths are meant.
    pub(super) fn set(&mut self, lane: usize, soil: &SoilTraits, area_share: f64) {
        let capacity_mm = soil.capacity_mm * area_share;
        self.capacity_mm.0[lane] = capacity_mm;
        self.per_capacity_mm.0[lane] = 1.0 / capacity_mm;
        self.per_dry_mm.0[lane] = 1.0 / (soil.dry_share * capacity_mm);
    }

    /// The constants of a pair of lanes.
    #[inline(always)]
    pub(super) fn pair(&self, pair: usize) -> SoilConstants<2> {
        SoilConstants {
            capacity_mm: self.capacity_mm.pair(pair),
            per_capacity_mm: self.per_capacity_mm.pair(pair),
            per_dry_mm: self.per_dry_mm.pair(pair),
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
        let wet_mm = filled_mm.least(self.capacity_mm);
        let overflow_mm = filled_mm - wet_mm;

        let evaporation_mm = self.evaporation_mm(wet_mm, evaporation_mm * (Lanes::splat(1.0) - covered_share));
        *soil_mm = wet_mm - evaporation_mm;
        SoilDay { recharge_mm: passed_mm + overflow_mm, evaporation_mm }
    }

    /// A day on which no water enters and no snow lies: the same numbers with less work. In the morning the soil holds no
    /// more than its capacity. Gives what evaporates, mm.
    #[inline(always)]
    pub(super) fn dry_day(&self, soil_mm: &mut Lanes<L>, evaporation_mm: Lanes<L>) -> Lanes<L> {
        let evaporation_mm = self.evaporation_mm(*soil_mm, evaporation_mm);
        *soil_mm = *soil_mm - evaporation_mm;
        evaporation_mm
    }

    /// What soil that holds `wet_mm` gives when `asked_mm` is asked.
    #[inline(always)]
    fn evaporation_mm(&self, wet_mm: Lanes<L>, asked_mm: Lanes<L>) -> Lanes<L> {
        let moisture = (wet_mm * self.per_dry_mm).least(Lanes::splat(1.0));
        (asked_mm * moisture).least(wet_mm)
    }
}
