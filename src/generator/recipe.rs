//! What the generator is told: every number of a station's weather, with its unit, as it stands in a TOML file.

use super::residuals::ResidualCorrelations;
use super::season::{PLACES, SeasonalCurve};
use serde::{Deserialize, Serialize};

/// Everything that the generator needs to know of a station.
///
/// Lists of twelve run from January to December and hold values at mid-month; days between lie on straight lines
/// (wet-day chances on lines of their normal deviates, so that they cannot leave 0–1).
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct Recipe {
    /// Where the numbers are from, in a sentence.
    pub about: String,
    /// Month (1–12) with which the water year begins: the year index changes then.
    pub water_year_start_month: u32,
    /// Step in which the gauge is read, mm; a wet day has at least half a step.
    pub depth_step_mm: f64,
    /// Step in which the thermometer is read, °C.
    pub temperature_step_c: f64,
    /// Whether depths and temperatures are rounded to those steps, as a station would.
    pub round_as_station: bool,
    /// Wet and dry days.
    pub wetness: Wetness,
    /// Depths on wet days.
    pub depths: Depths,
    /// Temperatures.
    pub temperature: Temperatures,
    /// Day-to-day memory.
    pub residuals: ResidualCorrelations,
    /// Differences between years.
    pub years: YearIndex,
    /// Solar radiation, if wanted.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub radiation: Option<Radiation>,
    /// Humidity, if wanted.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub humidity: Option<Humidity>,
    /// Wind, if wanted.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub wind: Option<Wind>,
}

/// Chances of a wet day by month, in a year of middling wetness index (Richardson 1981).
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct Wetness {
    /// Chance of a wet day after a dry one, between 0 and 1.
    pub dry_to_wet: [f64; 12],
    /// Chance of a wet day after a wet one; not below `dry_to_wet`.
    pub wet_to_wet: [f64; 12],
}

/// Mixed exponential depths on wet days by month, mm, each beyond half a step of the gauge (Woolhiser and Roldán 1982).
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct Depths {
    /// Share of wet days with light precipitation, 0 to 1.
    pub light_share: [f64; 12],
    /// Mean depth of the light days, mm.
    pub light_mean_mm: [f64; 12],
    /// Mean depth of the heavy days, mm.
    pub heavy_mean_mm: [f64; 12],
}

/// Daily extremes of temperature on dry and wet days over the year, °C, and their day-to-day spread (standard deviation).
///
/// Maximum and minimum are made as two correlated normal values. Where their difference would fall below 1 °C it is
/// bent so that it nears 0.2 °C and never reaches it; their mean stays. So the minimum is always below the maximum, the
/// bulk of the days is untouched, and nothing is swapped or cut off.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct Temperatures {
    /// Mean maximum on dry days.
    pub tmax_dry_c: SeasonalCurve,
    /// Mean maximum on wet days.
    pub tmax_wet_c: SeasonalCurve,
    /// Mean minimum on dry days.
    pub tmin_dry_c: SeasonalCurve,
    /// Mean minimum on wet days.
    pub tmin_wet_c: SeasonalCurve,
    /// Spread of the maximum on dry days.
    pub tmax_dry_spread_c: SeasonalCurve,
    /// Spread of the maximum on wet days.
    pub tmax_wet_spread_c: SeasonalCurve,
    /// Spread of the minimum on dry days.
    pub tmin_dry_spread_c: SeasonalCurve,
    /// Spread of the minimum on wet days.
    pub tmin_wet_spread_c: SeasonalCurve,
}

/// The year's hidden wetness index z: mean 0, spread 1, one value per water year, remembering the year before.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct YearIndex {
    /// Correlation of the index with that of the year before, 0 to below 1.
    pub lag_one: f64,
    /// How far one unit of the index shifts the chance of a wet day, in normal deviates.
    pub wetness_shift: f64,
    /// How far one unit of the index raises depths, as a natural logarithm (0.1 is about a tenth).
    pub depth_shift: f64,
    /// How much cooler a year is for one unit of the index, °C, beyond what its wet days bring.
    pub wet_year_cooling_c: f64,
    /// Spread of the year's temperature that has nothing to do with wetness, °C.
    pub temperature_spread_c: f64,
}

impl YearIndex {
    /// What is taken where a record is too short to tell: common practice, no source.
    pub const WHEN_UNKNOWN: Self = Self {
        lag_one: 0.2,
        wetness_shift: 0.10,
        depth_shift: 0.06,
        wet_year_cooling_c: 0.1,
        temperature_spread_c: 0.5,
    };
}

/// Solar radiation as a share of what a clear sky would give (FAO-56, equation 37).
///
/// The share is 1 / (1 + exp(−v)) with v normal, so radiation stays above zero and below the clear sky by construction.
/// Curves and spreads are those of v: 0 is half of the clear sky, 2 is 88 %, 3 is 95 %.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct Radiation {
    /// Latitude in degrees, south negative.
    pub latitude_degrees: f64,
    /// Elevation of the station, m.
    pub elevation_m: f64,
    /// v on dry days.
    pub dry_clear_log_odds: SeasonalCurve,
    /// v on wet days.
    pub wet_clear_log_odds: SeasonalCurve,
    /// Spread of v on dry days.
    pub dry_spread_log_odds: f64,
    /// Spread of v on wet days.
    pub wet_spread_log_odds: f64,
}

/// Humidity from a dewpoint that lies a fixed step below the night's minimum.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct Humidity {
    /// Dewpoint below the minimum on dry days, °C (0 or more).
    pub dry_dewpoint_below_tmin_c: f64,
    /// Dewpoint below the minimum on wet days, °C (0 or more).
    pub wet_dewpoint_below_tmin_c: f64,
}

/// Daily mean wind at 2 m: a Weibull distribution with one shape (Justus et al. 1978) and a mean for each month.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct Wind {
    /// Mean wind, m/s.
    pub mean_2m_ms: [f64; 12],
    /// Weibull shape: 2 is usual, larger is steadier.
    pub shape: f64,
}

/// What is wrong with a recipe.
#[derive(Debug, Clone, PartialEq)]
pub enum RecipeFault {
    /// A number lies outside what makes sense.
    OutOfRange {
        /// Key of the number, as in the file.
        key: &'static str,
        /// Month (1–12) if it is one of a list.
        month: Option<u32>,
        /// What was given.
        value: f64,
        /// Least that is possible.
        least: f64,
        /// Most that is possible.
        most: f64,
    },
    /// A wet day is likelier after a dry day than after a wet one.
    WetterAfterDry {
        /// Month (1–12).
        month: u32,
    },
    /// A curve has a value outside what makes sense at some time of the year.
    CurveOutOfRange {
        /// Key of the curve, as in the file.
        key: &'static str,
        /// First day of the leap-year calendar (1–366) where it does.
        day: u32,
        /// Its value there.
        value: f64,
        /// Least that is possible.
        least: f64,
        /// Most that is possible.
        most: f64,
    },
    /// No random process has the given residual correlations.
    ImpossibleCorrelations,
}

impl Recipe {
    /// Checks every number.
    ///
    /// # Errors
    /// All faults found.
    pub fn check(&self) -> Result<(), Vec<RecipeFault>> {
        let mut faults = Faults(Vec::new());
        faults.one("water_year_start_month", f64::from(self.water_year_start_month), 1.0, 12.0);
        faults.one("depth_step_mm", self.depth_step_mm, 0.001, 50.0);
        faults.one("temperature_step_c", self.temperature_step_c, 0.001, LARGEST_TEMPERATURE_STEP_C);
        self.check_precipitation(&mut faults);
        self.check_temperature(&mut faults);
        if let Some(radiation) = &self.radiation {
            faults.one("latitude_degrees", radiation.latitude_degrees, -90.0, 90.0);
            faults.one("elevation_m", radiation.elevation_m, -500.0, 9000.0);
            faults.curve("dry_clear_log_odds", &radiation.dry_clear_log_odds, -20.0, 20.0);
            faults.curve("wet_clear_log_odds", &radiation.wet_clear_log_odds, -20.0, 20.0);
            faults.one("dry_spread_log_odds", radiation.dry_spread_log_odds, 0.0, 10.0);
            faults.one("wet_spread_log_odds", radiation.wet_spread_log_odds, 0.0, 10.0);
        }
        if let Some(humidity) = &self.humidity {
            faults.one("dry_dewpoint_below_tmin_c", humidity.dry_dewpoint_below_tmin_c, 0.0, 40.0);
            faults.one("wet_dewpoint_below_tmin_c", humidity.wet_dewpoint_below_tmin_c, 0.0, 40.0);
        }
        if let Some(wind) = &self.wind {
            faults.months("mean_2m_ms", &wind.mean_2m_ms, 0.01, 50.0);
            faults.one("shape", wind.shape, 0.5, 50.0);
        }
        if faults.0.is_empty() { Ok(()) } else { Err(faults.0) }
    }

    fn check_precipitation(&self, faults: &mut Faults) {
        faults.months("dry_to_wet", &self.wetness.dry_to_wet, SMALLEST_CHANCE, 1.0 - SMALLEST_CHANCE);
        faults.months("wet_to_wet", &self.wetness.wet_to_wet, SMALLEST_CHANCE, 1.0 - SMALLEST_CHANCE);
        for (month, (dry, wet)) in self.wetness.dry_to_wet.iter().zip(&self.wetness.wet_to_wet).enumerate() {
            if wet < dry {
                faults.0.push(RecipeFault::WetterAfterDry { month: month as u32 + 1 });
            }
        }
        faults.months("light_share", &self.depths.light_share, 0.0, 1.0);
        faults.months("light_mean_mm", &self.depths.light_mean_mm, 0.001, 500.0);
        faults.months("heavy_mean_mm", &self.depths.heavy_mean_mm, 0.001, 500.0);
        faults.one("lag_one", self.years.lag_one, 0.0, 0.99);
        faults.one("wetness_shift", self.years.wetness_shift, 0.0, 2.0);
        faults.one("depth_shift", self.years.depth_shift, 0.0, 2.0);
        faults.one("wet_year_cooling_c", self.years.wet_year_cooling_c, -5.0, 5.0);
        faults.one("temperature_spread_c", self.years.temperature_spread_c, 0.0, 5.0);
    }

    fn check_temperature(&self, faults: &mut Faults) {
        let t = &self.temperature;
        faults.curve("tmax_dry_c", &t.tmax_dry_c, -80.0, 70.0);
        faults.curve("tmax_wet_c", &t.tmax_wet_c, -80.0, 70.0);
        faults.curve("tmin_dry_c", &t.tmin_dry_c, -80.0, 70.0);
        faults.curve("tmin_wet_c", &t.tmin_wet_c, -80.0, 70.0);
        faults.curve("tmax_dry_spread_c", &t.tmax_dry_spread_c, 0.01, 30.0);
        faults.curve("tmax_wet_spread_c", &t.tmax_wet_spread_c, 0.01, 30.0);
        faults.curve("tmin_dry_spread_c", &t.tmin_dry_spread_c, 0.01, 30.0);
        faults.curve("tmin_wet_spread_c", &t.tmin_wet_spread_c, 0.01, 30.0);
        if self.residuals.memory().is_none() {
            faults.0.push(RecipeFault::ImpossibleCorrelations);
        }
    }
}

/// Smallest chance of a wet day that a recipe may hold: as good as never, and still a number with a normal deviate.
pub(super) const SMALLEST_CHANCE: f64 = 1.0e-9;
/// Coarsest thermometer: rounding to more could make the minimum equal the maximum.
const LARGEST_TEMPERATURE_STEP_C: f64 = 0.1;

struct Faults(Vec<RecipeFault>);

impl Faults {
    fn number(&mut self, key: &'static str, month: Option<u32>, value: f64, least: f64, most: f64) {
        if !(value >= least && value <= most) {
            self.0.push(RecipeFault::OutOfRange { key, month, value, least, most });
        }
    }

    fn one(&mut self, key: &'static str, value: f64, least: f64, most: f64) {
        self.number(key, None, value, least, most);
    }

    fn months(&mut self, key: &'static str, values: &[f64; 12], least: f64, most: f64) {
        for (month, &value) in (1..).zip(values) {
            self.number(key, Some(month), value, least, most);
        }
    }

    fn curve(&mut self, key: &'static str, curve: &SeasonalCurve, least: f64, most: f64) {
        let outside = (0..PLACES)
            .map(|place| (place, curve.at(place)))
            .find(|(_, value)| !(*value >= least && *value <= most && curve.is_finite()));
        if let Some((place, value)) = outside {
            self.0.push(RecipeFault::CurveOutOfRange { key, day: place as u32 + 1, value, least, most });
        }
    }
}
