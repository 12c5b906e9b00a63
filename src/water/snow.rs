//! Degree-day snow: what falls as snow, what melts, what the pack holds and lets go in a day.
//!
//! Degree-day melt with a seasonal sine (Anderson 1973, Technical Memorandum NWS HYDRO-17), heat of rain
//! `P·T/80` (latent heat of fusion over the specific heat of water), liquid holding and refreezing (Bergström 1976,
//! SMHI Report RHO 7). The snow-covered share is a straight depletion curve: Anderson (1973) lets the covered share
//! fall with snow water below a full-cover amount; a straight line is the simplest of his curves.

use super::lanes::{Lanes, Number, most};
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

/// What a temperature means to snow. Each part rises in a straight line with it and is not yet held within its bounds.
#[derive(Clone, Copy, Debug, Default)]
pub(super) struct SnowWarmth<const L: usize> {
    /// Share of precipitation that falls as snow.
    pub(super) snow_share: Lanes<L>,
    /// Degrees above which snow melts, °C.
    pub(super) above_c: Lanes<L>,
    /// Ice that a millimetre of rain melts, mm.
    pub(super) melt_per_rain: Lanes<L>,
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

    /// The constants of a pair of lanes.
    #[inline(always)]
    pub(super) fn pair(&self, pair: usize) -> SnowConstants<2> {
        SnowConstants {
            all_rain_above_c: self.all_rain_above_c.pair(pair),
            per_c_of_split: self.per_c_of_split.pair(pair),
            snow_catch_factor: self.snow_catch_factor.pair(pair),
            melt_above_c: self.melt_above_c.pair(pair),
            refreeze_share: self.refreeze_share.pair(pair),
            liquid_holding_share: self.liquid_holding_share.pair(pair),
            heat_of_rain_per_c: self.heat_of_rain_per_c.pair(pair),
            per_full_cover_mm: self.per_full_cover_mm.pair(pair),
        }
    }

    /// Share of precipitation that falls as snow at `temperature_c` (air or wet-bulb, as the place says).
    #[inline(always)]
    pub fn snow_share(&self, temperature_c: Lanes<L>) -> Lanes<L> {
        within_one((self.all_rain_above_c - temperature_c) * self.per_c_of_split)
    }

    /// What a day's temperature means to snow, in parts: what `offset_c` above the station adds on every day of a month.
    #[inline(always)]
    pub(super) fn of_offset(&self, offset_c: Lanes<L>) -> SnowWarmth<L> {
        SnowWarmth {
            snow_share: (self.all_rain_above_c - offset_c) * self.per_c_of_split,
            above_c: offset_c - self.melt_above_c,
            melt_per_rain: offset_c * self.heat_of_rain_per_c,
        }
    }

    /// And what the station's own temperature takes and adds on a day.
    #[inline(always)]
    pub(super) fn of_station(&self, temperature_c: Lanes<L>) -> SnowWarmth<L> {
        SnowWarmth {
            snow_share: temperature_c * self.per_c_of_split,
            above_c: temperature_c,
            melt_per_rain: temperature_c * self.heat_of_rain_per_c,
        }
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
        let warmth = SnowWarmth {
            snow_share: (self.all_rain_above_c - split_c) * self.per_c_of_split,
            above_c: air_c - self.melt_above_c,
            melt_per_rain: air_c * self.heat_of_rain_per_c,
        };
        self.pack::<true>(store, precipitation_mm, warmth, melt_factor, most_sublimation_mm, self.per_full_cover_mm)
    }

    /// The same from the parts of the day's temperature; a day that is not `WET` has no precipitation, and the arithmetic that
    /// would change nothing is left out. Depths may be over any area, that of a band or of the basin, as
    /// long as they are all over the same: `per_full_cover_mm` is one over the depth that covers the ground.
    #[inline(always)]
    pub(super) fn pack<const WET: bool>(
        &self,
        store: &mut SnowStore<L>,
        precipitation_mm: Lanes<L>,
        warmth: SnowWarmth<L>,
        melt_factor: Lanes<L>,
        most_sublimation_mm: Lanes<L>,
        per_full_cover_mm: Lanes<L>,
    ) -> SnowDay<L> {
        let nothing = Lanes::splat(0.0);
        let (mut ice, mut liquid) = (store.ice_mm, store.liquid_mm);
        let (mut snowfall_mm, mut rain_mm) = (nothing, nothing);
        if WET {
            let caught_snow = within_one(warmth.snow_share) * precipitation_mm;
            rain_mm = precipitation_mm - caught_snow;
            snowfall_mm = caught_snow * self.snow_catch_factor;
            ice = ice + snowfall_mm;
        }
        let sublimation_mm = most_sublimation_mm.least(ice);
        ice = ice - sublimation_mm;

        // Below zero where it freezes: one of the two is nothing.
        let by_degrees_mm = melt_factor * warmth.above_c;
        let thawing_mm = by_degrees_mm.positive();
        let freezing_mm = thawing_mm - by_degrees_mm;
        let mut melting_mm = thawing_mm;
        if WET {
            melting_mm = melting_mm + rain_mm * warmth.melt_per_rain.positive();
        }
        let melt_mm = melting_mm.least(ice);
        ice = ice - melt_mm;
        liquid = liquid + if WET { rain_mm + melt_mm } else { melt_mm };

        let refreeze_mm = (self.refreeze_share * freezing_mm).least(liquid);
        liquid = liquid - refreeze_mm;
        ice = ice + refreeze_mm;

        let held = (self.liquid_holding_share * ice).least(liquid);
        let outflow_mm = liquid - held;
        *store = SnowStore { ice_mm: ice, liquid_mm: held };

        let snow_water_mm = ice + held;
        let covered_share = (snow_water_mm * per_full_cover_mm).least(Lanes::splat(1.0));
        SnowDay { snowfall_mm, rain_mm, sublimation_mm, melt_mm, refreeze_mm, outflow_mm, snow_water_mm, covered_share }
    }
}

/// A share kept between 0 and 1.
#[inline(always)]
fn within_one<const L: usize>(share: Lanes<L>) -> Lanes<L> {
    share.positive().least(Lanes::splat(1.0))
}

impl<const L: usize> SnowWarmth<L> {
    /// The parts of a pair of lanes.
    #[inline(always)]
    pub(super) fn pair(&self, pair: usize) -> SnowWarmth<2> {
        SnowWarmth {
            snow_share: self.snow_share.pair(pair),
            above_c: self.above_c.pair(pair),
            melt_per_rain: self.melt_per_rain.pair(pair),
        }
    }

    /// Of an offset: what it means on top of the station's temperature.
    #[inline(always)]
    pub(super) fn at(&self, station: &Self) -> Self {
        SnowWarmth {
            snow_share: self.snow_share - station.snow_share,
            above_c: self.above_c + station.above_c,
            melt_per_rain: self.melt_per_rain + station.melt_per_rain,
        }
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
