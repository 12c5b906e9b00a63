//! Crops: how much of the reference evaporation a field uses on each day, and what going short does to it.
//!
//! "FAO-56" in this folder is Allen, Pereira, Raes & Smith (1998), *Crop evapotranspiration*, FAO Irrigation and Drainage
//! Paper 56: its single crop coefficient (chapter 6) and its root-zone balance (chapter 8).

mod production;
mod root_zone;
mod soil;

pub use production::yield_share;
pub use root_zone::{
    RootZoneDay, adjusted_depletion_share, readily_available_mm, root_zone_day, stress_factor, total_available_mm,
};
pub use soil::{SOIL_TEXTURES, SoilTexture, soil_texture};

use super::lanes::Number;

/// What a crop is to the water: coefficients, seasons and roots. Plain values, checked by whoever builds them.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CropTraits {
    /// Crop coefficient of the initial stage (FAO-56 table 12).
    pub coefficient_initial: f64,
    /// Crop coefficient of the mid-season stage (FAO-56 table 12).
    pub coefficient_mid: f64,
    /// Crop coefficient at the end of the late-season stage (FAO-56 table 12).
    pub coefficient_end: f64,
    /// Days of the initial, development, mid-season and late-season stages (FAO-56 table 11).
    pub stage_days: [u16; 4],
    /// Depth of the roots that irrigation serves, m (FAO-56 table 22).
    pub root_depth_m: f64,
    /// Share of the available water that may go before the crop feels it, at 5 mm a day (FAO-56 table 22).
    pub depletion_share: f64,
    /// Yield response factor of the whole season (Doorenbos & Kassam 1979), where one is published.
    pub yield_response: Option<f64>,
}

impl CropTraits {
    /// Length of the season in days.
    pub fn season_days(&self) -> u32 {
        self.stage_days.iter().copied().map(u32::from).sum()
    }

    /// Crop coefficient on a day of the season, the first being 1; zero outside the season (FAO-56 eq. 66, figure 34).
    pub fn coefficient_on(&self, day_of_season: u32) -> f64 {
        CoefficientCurve::new(self).stage_on(day_of_season).0.coefficient(0.0)
    }

    /// The same crop in another climate: mid and end coefficients moved from the table's 2 m/s of wind and 45 % of lowest
    /// humidity (FAO-56 eq. 62 and 65).
    ///
    /// `wind_2m_ms` (1 to 6 m/s) and `rhmin_percent` (20 to 80 %) are means of the stage and `height_m` (0.1 to 10 m) is
    /// the height of the crop; FAO-56 gives the equations for those ranges. An end coefficient below 0.45 stays.
    pub fn in_climate(&self, wind_2m_ms: f64, rhmin_percent: f64, height_m: f64) -> Self {
        let moved_by = climate_adjustment(wind_2m_ms, rhmin_percent, height_m);
        let coefficient_end =
            if self.coefficient_end >= 0.45 { self.coefficient_end + moved_by } else { self.coefficient_end };
        Self { coefficient_mid: self.coefficient_mid + moved_by, coefficient_end, ..*self }
    }
}

/// Crop coefficients by day of the season, ready for a run (FAO-56 eq. 66, figure 34).
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CoefficientCurve {
    /// Days before the first day of each stage, and of the whole season.
    before: [u32; 5],
    stages: [Stage; 4],
}

/// A straight piece of a crop's coefficient curve, for one crop or a few side by side.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Stage<N = f64> {
    /// Coefficient at its start.
    pub base: N,
    /// What it changes by until the end.
    pub change: N,
    /// Days that this takes; never 0.
    pub of_days: N,
    /// Days gone when the stage was looked up.
    pub days_in: N,
}

impl<N: Number> Stage<N> {
    /// The same coefficient on every day.
    pub fn flat(base: N) -> Self {
        Self { base, change: N::splat(0.0), of_days: N::splat(1.0), days_in: N::splat(0.0) }
    }

    /// The coefficient so many days after the stage was looked up.
    #[inline(always)]
    pub fn coefficient(&self, elapsed_days: N) -> N {
        self.base + (self.days_in + elapsed_days) / self.of_days * self.change
    }
}

impl CoefficientCurve {
    /// The curve of a crop.
    pub fn new(traits: &CropTraits) -> Self {
        let [initial, development, mid, late] = traits.stage_days.map(u32::from);
        let between = |from: f64, to: f64, days: u32| Stage {
            base: from,
            change: to - from,
            of_days: f64::from(days.max(1)),
            days_in: 0.0,
        };
        Self {
            before: [
                0,
                initial,
                initial + development,
                initial + development + mid,
                initial + development + mid + late,
            ],
            stages: [
                Stage::flat(traits.coefficient_initial),
                between(traits.coefficient_initial, traits.coefficient_mid, development),
                Stage::flat(traits.coefficient_mid),
                between(traits.coefficient_mid, traits.coefficient_end, late),
            ],
        }
    }

    /// The stage on a day of the season, the first being 1, and the stage's last day; zero and no day outside the season.
    pub fn stage_on(&self, day_of_season: u32) -> (Stage, u32) {
        let mut ends = self.before.iter().skip(1).zip(&self.before).zip(&self.stages);
        match ends.find(|((end, _), _)| day_of_season <= **end) {
            Some(((end, before), stage)) if day_of_season > 0 => {
                (Stage { days_in: f64::from(day_of_season - before), ..*stage }, *end)
            }
            _ => (Stage::flat(0.0), 0),
        }
    }
}

/// What wind (m/s at 2 m), lowest relative humidity (%) and height (m) add to a crop coefficient (FAO-56 eq. 62 and 65).
pub fn climate_adjustment(wind_2m_ms: f64, rhmin_percent: f64, height_m: f64) -> f64 {
    (0.04 * (wind_2m_ms - 2.0) - 0.004 * (rhmin_percent - 45.0)) * libm::pow(height_m / 3.0, 0.3)
}

#[cfg(test)]
mod tests {
    use super::*;

    const POTATO: CropTraits = CropTraits {
        coefficient_initial: 0.5,
        coefficient_mid: 1.15,
        coefficient_end: 0.4,
        stage_days: [45, 30, 70, 20],
        root_depth_m: 0.4,
        depletion_share: 0.35,
        yield_response: Some(1.1),
    };

    #[test]
    fn the_curve_has_no_step_inside_the_season() {
        let steepest = (1..POTATO.season_days())
            .map(|day| (POTATO.coefficient_on(day + 1) - POTATO.coefficient_on(day)).abs())
            .fold(0.0, f64::max);
        assert!((steepest - 0.75 / 20.0).abs() < 1e-12, "{steepest}");
        assert_eq!(POTATO.coefficient_on(165), 0.4);
        assert_eq!(POTATO.coefficient_on(166), 0.0);
        assert_eq!(POTATO.coefficient_on(u32::MAX), 0.0);
    }

    #[test]
    fn stages_without_days_are_stepped_over() {
        let sod = CropTraits { stage_days: [0, 0, 100, 0], ..POTATO };
        assert_eq!((sod.coefficient_on(1), sod.coefficient_on(100), sod.coefficient_on(101)), (1.15, 1.15, 0.0));
        let fallow = CropTraits { stage_days: [0; 4], ..POTATO };
        assert_eq!((fallow.season_days(), fallow.coefficient_on(1)), (0, 0.0));
        let longest = CropTraits { stage_days: [u16::MAX; 4], ..POTATO };
        assert_eq!(longest.coefficient_on(longest.season_days()), 0.4);
    }

    #[test]
    fn a_dry_end_of_season_is_not_moved_by_climate() {
        let windy = POTATO.in_climate(4.0, 30.0, 0.6);
        assert!(windy.coefficient_mid > POTATO.coefficient_mid);
        assert_eq!(windy.coefficient_end, POTATO.coefficient_end);
        let green = CropTraits { coefficient_end: 0.75, ..POTATO }.in_climate(4.0, 30.0, 0.6);
        assert!((green.coefficient_end - 0.75 - (windy.coefficient_mid - 1.15)).abs() < 1e-12);
    }
}
