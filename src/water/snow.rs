//! Degree-day snow: what falls as snow, what melts, what the pack holds and lets go in a day.
//!
//! Degree-day melt with a seasonal sine (Anderson 1973, Technical Memorandum NWS HYDRO-17), heat of rain
//! `P·T/80` (latent heat of fusion over the specific heat of water), liquid holding and refreezing (Bergström 1976,
//! SMHI Report RHO 7). The snow-covered share is a straight depletion curve: Anderson (1973) lets the covered share
//! fall with snow water below a full-cover amount; a straight line is the simplest of his curves.

use super::lanes::{Lanes, most};
use super::valley::{RainSnow, SnowTraits};

/// Millimetres of rain at 1 °C that melt one millimetre of ice.
pub const RAIN_MM_C_PER_MELT_MM: f64 = 80.0;

/// Day of the year at which the northern melt factor passes its mean on the way up (21–22 March).
const EQUINOX_DAY: f64 = 81.0;

/// Snow of one band in each lane.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct SnowStore<const L: usize> {
    /// Ice, mm of water.
    pub ice_mm: Lanes<L>,
    /// Liquid water in the pack, mm.
    pub liquid_mm: Lanes<L>,
}

/// Everything about snow that stays the same from day to day, one value a lane.
#[derive(Clone, Copy, Debug)]
pub struct SnowConstants<const L: usize> {
    all_rain_above_c: Lanes<L>,
    per_c_of_split: Lanes<L>,
    snow_catch_factor: Lanes<L>,
    melt_above_c: Lanes<L>,
    refreeze_share: Lanes<L>,
    liquid_holding_share: Lanes<L>,
    heat_of_rain_per_c: Lanes<L>,
    per_full_cover_mm: Lanes<L>,
}

/// What the snow of a band does in a day, mm.
#[derive(Clone, Copy, Debug)]
pub struct SnowDay<const L: usize> {
    /// Snow that fell, corrected for catch.
    pub snowfall_mm: Lanes<L>,
    /// Rain that fell.
    pub rain_mm: Lanes<L>,
    /// Snow lost to the air.
    pub sublimation_mm: Lanes<L>,
    /// Ice that melted.
    pub melt_mm: Lanes<L>,
    /// Liquid that froze again.
    pub refreeze_mm: Lanes<L>,
    /// Water that left the pack for the soil.
    pub outflow_mm: Lanes<L>,
    /// Snow water in the evening.
    pub snow_water_mm: Lanes<L>,
    /// Share of the ground under snow in the evening.
    pub covered_share: Lanes<L>,
}

impl<const L: usize> SnowConstants<L> {
    /// Constants for lanes that all share the same traits.
    pub fn new(split: &RainSnow, snow: &SnowTraits, snow_catch_factor: f64) -> Self {
        Self::by_lane([split; L], [snow; L], [snow_catch_factor; L])
    }

    /// Constants for lanes that differ, as in fitting.
    pub fn by_lane(split: [&RainSnow; L], snow: [&SnowTraits; L], catch: [f64; L]) -> Self {
        let of_split = |f: fn(&RainSnow) -> f64| Lanes(split.map(f));
        let of_snow = |f: fn(&SnowTraits) -> f64| Lanes(snow.map(f));
        Self {
            all_rain_above_c: of_split(|s| s.all_rain_above_c),
            per_c_of_split: of_split(|s| 1.0 / (s.all_rain_above_c - s.all_snow_below_c)),
            snow_catch_factor: Lanes(catch),
            melt_above_c: of_snow(|s| s.melt_above_c),
            refreeze_share: of_snow(|s| s.refreeze_share),
            liquid_holding_share: of_snow(|s| s.liquid_holding_share),
            heat_of_rain_per_c: of_snow(|s| if s.heat_of_rain { 1.0 / RAIN_MM_C_PER_MELT_MM } else { 0.0 }),
            per_full_cover_mm: of_snow(|s| 1.0 / s.full_cover_mm),
        }
    }

    /// Share of precipitation that falls as snow at `temperature_c` (air or wet-bulb, as the place says).
    #[inline(always)]
    pub fn snow_share(&self, temperature_c: Lanes<L>) -> Lanes<L> {
        let share = (self.all_rain_above_c - temperature_c) * self.per_c_of_split;
        share.positive().least(Lanes::splat(1.0))
    }

    /// One day: `split_c` decides between rain and snow, `air_c` melts; `melt_factor` in mm/°C/day.
    #[inline(always)]
    pub fn day(
        &self,
        store: &mut SnowStore<L>,
        precipitation_mm: Lanes<L>,
        split_c: Lanes<L>,
        air_c: Lanes<L>,
        melt_factor: Lanes<L>,
        most_sublimation_mm: Lanes<L>,
    ) -> SnowDay<L> {
        let caught_snow = self.snow_share(split_c) * precipitation_mm;
        let rain_mm = precipitation_mm - caught_snow;
        let snowfall_mm = caught_snow * self.snow_catch_factor;

        let mut ice = store.ice_mm + snowfall_mm;
        let sublimation_mm = most_sublimation_mm.least(ice);
        ice = ice - sublimation_mm;

        let above_c = air_c - self.melt_above_c;
        let rain_heat_mm = rain_mm * air_c.positive() * self.heat_of_rain_per_c;
        let melt_mm = (melt_factor * above_c.positive() + rain_heat_mm).least(ice);
        ice = ice - melt_mm;
        let mut liquid = store.liquid_mm + (rain_mm + melt_mm);

        let below_c = self.melt_above_c - air_c;
        let refreeze_mm = (self.refreeze_share * melt_factor * below_c.positive()).least(liquid);
        liquid = liquid - refreeze_mm;
        ice = ice + refreeze_mm;

        let outflow_mm = (liquid - self.liquid_holding_share * ice).positive();
        liquid = liquid - outflow_mm;
        *store = SnowStore { ice_mm: ice, liquid_mm: liquid };

        let snow_water_mm = ice + liquid;
        let covered_share = (snow_water_mm * self.per_full_cover_mm).least(Lanes::splat(1.0));
        SnowDay { snowfall_mm, rain_mm, sublimation_mm, melt_mm, refreeze_mm, outflow_mm, snow_water_mm, covered_share }
    }
}

/// Degree-day factor on a day of the year, mm/°C/day: `mean + swing · sin(2π (day − 81) / 365)`, the sine turned over
/// in the south. The year has 365 days here in leap years too. Never negative: a swing larger than the mean melts
/// nothing in midwinter.
pub fn melt_factor_mm_c_day(snow: &SnowTraits, day_of_year: u16, southern: bool) -> f64 {
    let angle = 2.0 * core::f64::consts::PI * (f64::from(day_of_year) - EQUINOX_DAY) / 365.0;
    let swing = if southern { -snow.melt_swing_mm_c_day } else { snow.melt_swing_mm_c_day };
    most(snow.melt_factor_mm_c_day + swing * libm::sin(angle), 0.0)
}
