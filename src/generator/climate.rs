//! The recipe spread over the calendar: what each of the 366 days expects.

use super::depth::MixedExponential;
use super::normal::{normal_from_probability, normal_probability};
use super::recipe::{Depths, Recipe, Wetness};
use super::season::{PLACES, SeasonalCurve, between_months};
use super::wetness::WetDayChain;

/// Mean and spread of something on one kind of day.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct Normal {
    pub mean: f64,
    pub spread: f64,
}

/// What one day of the calendar expects of temperature, on a dry or a wet day, °C.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct DayTemperature {
    pub tmax: Normal,
    pub tmin: Normal,
}

/// What one day of the calendar expects.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct DayClimate {
    pub wetness: DayWetness,
    pub depth: MixedExponential,
    pub dry: DayTemperature,
    pub wet: DayTemperature,
    /// Log odds of the share of clear-sky radiation on dry and on wet days.
    pub sky: Option<(Normal, Normal)>,
    /// Mean wind, m/s.
    pub wind_2m_ms: Option<f64>,
}

/// Wet-day chances of one day of the calendar before the year has its say.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct DayWetness {
    /// Normal deviate of the share of wet days over all years.
    pub deviate: f64,
    /// Day-to-day correlation of wetness.
    pub persistence: f64,
}

impl DayWetness {
    /// Wetness of all days of the calendar.
    pub fn calendar(wetness: &Wetness) -> Vec<Self> {
        let chain =
            |month: usize| WetDayChain { dry_to_wet: wetness.dry_to_wet[month], wet_to_wet: wetness.wet_to_wet[month] };
        let deviates: [f64; 12] = core::array::from_fn(|month| normal_from_probability(chain(month).wet_share()));
        let persistence: [f64; 12] = core::array::from_fn(|month| chain(month).persistence());
        (0..PLACES)
            .map(|place| Self {
                deviate: between_months(&deviates, place),
                persistence: between_months(&persistence, place),
            })
            .collect()
    }

    /// The chain of a year with the given index.
    ///
    /// The deviate is stretched by √(1 + shift²) so that the mean share over all years is the recipe's exactly:
    /// E Φ(a √(1 + k²) + k z) = Φ(a) for a standard normal z.
    pub fn in_year(&self, wetness_shift: f64, index: f64) -> WetDayChain {
        let stretched = self.deviate * (1.0 + wetness_shift * wetness_shift).sqrt();
        WetDayChain::from_share(normal_probability(stretched + wetness_shift * index), self.persistence)
    }
}

/// Depths of all days of the calendar.
pub(super) fn depth_calendar(depths: &Depths) -> Vec<MixedExponential> {
    (0..PLACES)
        .map(|place| MixedExponential {
            light_share: between_months(&depths.light_share, place),
            light_mean_mm: between_months(&depths.light_mean_mm, place),
            heavy_mean_mm: between_months(&depths.heavy_mean_mm, place),
        })
        .collect()
}

/// By how much a year with the given index multiplies depths; one on average over all years.
pub(super) fn depth_factor(depth_shift: f64, index: f64) -> f64 {
    libm::exp(depth_shift * index - 0.5 * depth_shift * depth_shift)
}

/// The whole calendar of a checked recipe.
pub(super) fn calendar(recipe: &Recipe) -> Vec<DayClimate> {
    let t = &recipe.temperature;
    let wetness = DayWetness::calendar(&recipe.wetness);
    let depths = depth_calendar(&recipe.depths);
    (0..PLACES)
        .map(|place| {
            let pair = |mean: &SeasonalCurve, spread: &SeasonalCurve| Normal {
                mean: mean.at(place),
                spread: spread.at(place),
            };
            DayClimate {
                wetness: wetness[place],
                depth: depths[place],
                dry: DayTemperature {
                    tmax: pair(&t.tmax_dry_c, &t.tmax_dry_spread_c),
                    tmin: pair(&t.tmin_dry_c, &t.tmin_dry_spread_c),
                },
                wet: DayTemperature {
                    tmax: pair(&t.tmax_wet_c, &t.tmax_wet_spread_c),
                    tmin: pair(&t.tmin_wet_c, &t.tmin_wet_spread_c),
                },
                sky: recipe.radiation.as_ref().map(|sun| {
                    (
                        Normal { mean: sun.dry_clear_log_odds.at(place), spread: sun.dry_spread_log_odds },
                        Normal { mean: sun.wet_clear_log_odds.at(place), spread: sun.wet_spread_log_odds },
                    )
                }),
                wind_2m_ms: recipe.wind.as_ref().map(|wind| between_months(&wind.mean_2m_ms, place)),
            }
        })
        .collect()
}
