//! Which numbers of a valley are fitted, between which bounds, and why those.
//!
//! A search walks the unit cube; [`Parameter::value_at`] turns a coordinate into a value with a unit. Every point of the
//! cube is a valley that keeps all that [`Valley`] promises: the order of the two snow temperatures, the order of the
//! two ground stores and the stability of the reach hold by the way the parameters are chosen.
//!
//! Bounds are wide enough for cold and warm, small and large basins. Where a source is named it was recalled from memory,
//! not looked up; "common practice" has no source.

use serde::{Deserialize, Serialize};

use crate::water::keyed::keyed;
use crate::water::valley::{Band, ReachTraits, Valley};

keyed! {
    /// A number of the valley that can be fitted.
    Parameter, PARAMETERS {
        /// All snow at or below this temperature, °C: −3 to 1. Snow has been seen to turn to rain between about −1 and
        /// +3 °C air temperature (Auer 1974, *Weatherwise* 27); lower where the temperature is wet-bulb or the sensor warm.
        AllSnowBelow => "all_snow_below_c",
        /// From all snow to all rain, °C: 0.5 to 5. Always above zero, so that the two temperatures keep their order;
        /// rain and snow mix over a few degrees (Auer 1974).
        MixedOver => "mixed_over_c",
        /// Melt starts above this temperature, °C: −2 to 2. Zero on the spot; the station's daily mean stands for a
        /// slope elsewhere (common practice).
        MeltAbove => "melt_above_c",
        /// Mean degree-day factor, mm/°C/day: 1 to 8, the range reported for snow (Hock 2003, *Journal of Hydrology*
        /// 282, table 1).
        MeltFactor => "melt_factor_mm_c_day",
        /// Swing of the degree-day factor over the year, mm/°C/day: 0 to 3. Sun and albedo make June melt two to three
        /// times March's (Anderson 1973).
        MeltSwing => "melt_swing_mm_c_day",
        /// Refreezing as a share of the degree-day factor: 0 to 0.15 about Bergström's (1976) 0.05.
        Refreeze => "refreeze_share",
        /// Liquid water held by the pack, share of its ice: 0 to 0.2; 0.1 in Bergström (1976), up to 0.05 in Anderson
        /// (1973) for ripe snow.
        LiquidHolding => "liquid_holding_share",
        /// Snow water that covers all the ground, mm: 5 to 150, by its logarithm; small on smooth ground, large on rough
        /// (common practice).
        FullCover => "full_cover_mm",
        /// Water that the soil holds, mm: 30 to 600, by its logarithm; from thin mountain soil to deep loam (common
        /// practice).
        SoilCapacity => "soil_capacity_mm",
        /// Power of the recharge curve: 1 to 6 in steps of a half (Bergström 1976 has 1 to 4 and more). Halves up to 4
        /// have a quick way through the engine, and finer steps change the river less than the soil's capacity does.
        RechargePower => "recharge_power",
        /// Share of capacity below which evaporation falls: 0.3 to 1 (Bergström 1976: 0.5 to 1).
        DryShare => "dry_share",
        /// Residence time of the quick store, days: 1.5 to 29, by its logarithm; days to weeks of recession (common practice).
        QuickDays => "quick_days",
        /// Residence time of the slow store, days: 30 to 1000, by its logarithm; always longer than the quick store's
        /// (common practice).
        SlowDays => "slow_days",
        /// Most that passes from the quick to the slow store, mm/day: 0 to 6 (common practice).
        Percolation => "percolation_mm_day",
        /// Base of the unit hydrograph, days: 0.5 to 10, by its logarithm; hours in a headwater, a week and more on a long
        /// river (common practice).
        HydrographBase => "unit_hydrograph_base_days",
        /// Travel time of the reach, days: 0.51 to 5, by its logarithm. Below half a day a daily step is not stable.
        ReachTravel => "reach_travel_days",
        /// Weight of the reach's inflow as a share of the largest stable one for its travel time: 0 to 0.95.
        ReachWeight => "reach_weight_of_stable",
        /// Factor on snowfall for what the gauge misses: 0.7 to 1.8. Unshielded gauges catch half to all of the snow,
        /// depending on wind (Goodison, Louie & Yang 1998, WMO report 67); below one where the snow that falls on the
        /// station does not fall on the basin, or blows away (common practice).
        SnowCatch => "snow_catch_factor",
        /// Precipitation added per 100 m of climb, share of the station's: −0.03 to 0.15. Mostly 0.02 to 0.10; below zero
        /// where the station itself lies high or on the windward side (common practice).
        PrecipitationGradient => "precipitation_per_100m",
        /// Factor on all precipitation: 0.6 to 1.8, for a station that stands for too dry or too wet a spot (common practice).
        PrecipitationFactor => "precipitation_factor",
        /// Cooling with height, mean of the twelve months, °C per km: −9.5 to −3; the months keep what parts them.
        /// Between the moist and the dry adiabatic rate, and less where cold air pools (common practice).
        MeanLapse => "mean_lapse_c_per_km",
    }
}

/// How a coordinate between 0 and 1 becomes a value.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Scale {
    /// In proportion.
    Straight,
    /// By the logarithm: for what is judged by its ratio.
    Logarithm,
    /// In steps of a half.
    Halves,
}

/// The values that a parameter may take.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Bounds {
    /// Lowest, in the parameter's unit.
    pub least: f64,
    /// Highest.
    pub most: f64,
    /// What lies between.
    pub scale: Scale,
}

/// What a parameter is measured in.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub enum ParameterUnit {
    /// °C.
    #[serde(rename = "°C")]
    Celsius,
    /// mm/°C/day.
    #[serde(rename = "mm/°C/day")]
    MmPerCelsiusDay,
    /// mm.
    #[serde(rename = "mm")]
    Mm,
    /// mm/day.
    #[serde(rename = "mm/day")]
    MmPerDay,
    /// Days.
    #[serde(rename = "days")]
    Days,
    /// A share, factor or power.
    #[serde(rename = "1")]
    One,
    /// Share per 100 m.
    #[serde(rename = "1/100 m")]
    PerHundredMetres,
    /// °C per km.
    #[serde(rename = "°C/km")]
    CelsiusPerKm,
}

/// The correction of precipitation that is fitted. A gradient beside a factor would undo it; a factor on snow beside one
/// on everything does not, since rain and snow reach the river in different months.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum PrecipitationCorrection {
    /// What the gauge misses of snow.
    SnowCatch,
    /// The change with height.
    Gradient,
    /// A factor on everything, which can lower as well as raise.
    #[default]
    Factor,
    /// A factor on everything and another on snow: what the gauge stands for, and what it misses of snow.
    RainAndSnow,
}

impl Parameter {
    /// The values that it may take.
    pub const fn bounds(self) -> Bounds {
        use Scale::{Halves, Logarithm, Straight};
        let (least, most, scale) = match self {
            Parameter::AllSnowBelow => (-3.0, 1.0, Straight),
            Parameter::MixedOver => (0.5, 5.0, Straight),
            Parameter::MeltAbove => (-2.0, 2.0, Straight),
            Parameter::MeltFactor => (1.0, 8.0, Straight),
            Parameter::MeltSwing => (0.0, 3.0, Straight),
            Parameter::Refreeze => (0.0, 0.15, Straight),
            Parameter::LiquidHolding => (0.0, 0.2, Straight),
            Parameter::FullCover => (5.0, 150.0, Logarithm),
            Parameter::SoilCapacity => (30.0, 600.0, Logarithm),
            Parameter::RechargePower => (1.0, 6.0, Halves),
            Parameter::DryShare => (0.3, 1.0, Straight),
            Parameter::QuickDays => (1.5, 29.0, Logarithm),
            Parameter::SlowDays => (30.0, 1000.0, Logarithm),
            Parameter::Percolation => (0.0, 6.0, Straight),
            Parameter::HydrographBase => (0.5, 10.0, Logarithm),
            Parameter::ReachTravel => (0.51, 5.0, Logarithm),
            Parameter::ReachWeight => (0.0, 0.95, Straight),
            Parameter::SnowCatch => (0.7, 1.8, Straight),
            Parameter::PrecipitationGradient => (-0.03, 0.15, Straight),
            Parameter::PrecipitationFactor => (0.6, 1.8, Straight),
            Parameter::MeanLapse => (-9.5, -3.0, Straight),
        };
        Bounds { least, most, scale }
    }

    /// What it is measured in.
    pub const fn unit(self) -> ParameterUnit {
        use ParameterUnit::{Celsius, CelsiusPerKm, Days, Mm, MmPerCelsiusDay, MmPerDay, One, PerHundredMetres};
        match self {
            Parameter::AllSnowBelow | Parameter::MixedOver | Parameter::MeltAbove => Celsius,
            Parameter::MeltFactor | Parameter::MeltSwing => MmPerCelsiusDay,
            Parameter::FullCover | Parameter::SoilCapacity => Mm,
            Parameter::Percolation => MmPerDay,
            Parameter::QuickDays | Parameter::SlowDays | Parameter::HydrographBase | Parameter::ReachTravel => Days,
            Parameter::PrecipitationGradient => PerHundredMetres,
            Parameter::MeanLapse => CelsiusPerKm,
            Parameter::Refreeze
            | Parameter::LiquidHolding
            | Parameter::RechargePower
            | Parameter::DryShare
            | Parameter::ReachWeight
            | Parameter::SnowCatch
            | Parameter::PrecipitationFactor => One,
        }
    }

    /// The parameter with this key.
    pub fn from_key(key: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|parameter| parameter.key() == key)
    }

    /// The value at a coordinate between 0 and 1.
    pub fn value_at(self, coordinate: f64) -> f64 {
        let Bounds { least, most, scale } = self.bounds();
        match scale {
            Scale::Straight => least + coordinate * (most - least),
            Scale::Logarithm => least * libm::exp(coordinate * libm::log(most / least)),
            Scale::Halves => libm::round(2.0 * (least + coordinate * (most - least))) / 2.0,
        }
    }

    /// The coordinate of a value; outside 0 to 1 where the value is outside the bounds.
    pub fn coordinate_of(self, value: f64) -> f64 {
        let Bounds { least, most, scale } = self.bounds();
        match scale {
            Scale::Straight | Scale::Halves => (value - least) / (most - least),
            Scale::Logarithm => libm::log(value / least) / libm::log(most / least),
        }
    }

    /// The parameters that are fitted for `valley`: all of them, but of the corrections of precipitation only what
    /// `correction` names, without the reach where the place has none, and without the cooling with height where all
    /// bands lie at the station's.
    pub fn fitted(valley: &Valley, correction: PrecipitationCorrection) -> Vec<Parameter> {
        let kept: &[Parameter] = match correction {
            PrecipitationCorrection::SnowCatch => &[Parameter::SnowCatch],
            PrecipitationCorrection::Gradient => &[Parameter::PrecipitationGradient],
            PrecipitationCorrection::Factor => &[Parameter::PrecipitationFactor],
            PrecipitationCorrection::RainAndSnow => &[Parameter::SnowCatch, Parameter::PrecipitationFactor],
        };
        let off_station = |band: &Band| (band.elevation_m - valley.station_elevation_m).abs() >= LEAST_CLIMB_M;
        let climbs = valley.bands.iter().any(off_station);
        Self::ALL
            .into_iter()
            .filter(|parameter| match parameter {
                Parameter::ReachTravel | Parameter::ReachWeight => valley.channel.reach.is_some(),
                Parameter::SnowCatch | Parameter::PrecipitationGradient | Parameter::PrecipitationFactor => {
                    kept.contains(parameter)
                }
                Parameter::MeanLapse => climbs,
                _ => true,
            })
            .collect()
    }
}

/// Where every band is nearer to the station's height than this, m, its cooling cannot be told from nothing.
const LEAST_CLIMB_M: f64 = 50.0;

/// Largest inflow weight with which a reach of `travel_days` has no negative coefficient at a step of a day:
/// `2 K X ≤ 1 ≤ 2 K (1 − X)` and X at most one half.
pub fn largest_stable_weight(travel_days: f64) -> f64 {
    (0.5 / travel_days).min(1.0 - 0.5 / travel_days).clamp(0.0, 0.5)
}

/// `valley` with the values of `parameters`; one value a parameter, in its unit and within its bounds.
pub fn apply(valley: &Valley, parameters: &[Parameter], values: &[f64]) -> Valley {
    let mut fitted = valley.clone();
    set(&mut fitted, parameters, values);
    fitted
}

/// Writes the values of `parameters` into `valley`. Its earlier values of them are lost, whatever they were; of months
/// that keep what parts them, the differences stay, so that [`reset`] comes first where bits matter.
pub fn set(valley: &mut Valley, parameters: &[Parameter], values: &[f64]) {
    let value_of = |wanted: Parameter| {
        parameters.iter().zip(values).find(|(parameter, _)| **parameter == wanted).map(|(_, value)| *value)
    };
    for (parameter, value) in parameters.iter().zip(values) {
        let value = *value;
        match parameter {
            Parameter::AllSnowBelow => valley.rain_snow.all_snow_below_c = value,
            Parameter::MixedOver => {}
            Parameter::MeltAbove => valley.snow.melt_above_c = value,
            Parameter::MeltFactor => valley.snow.melt_factor_mm_c_day = value,
            Parameter::MeltSwing => valley.snow.melt_swing_mm_c_day = value,
            Parameter::Refreeze => valley.snow.refreeze_share = value,
            Parameter::LiquidHolding => valley.snow.liquid_holding_share = value,
            Parameter::FullCover => valley.snow.full_cover_mm = value,
            Parameter::SoilCapacity => valley.soil.capacity_mm = value,
            Parameter::RechargePower => valley.soil.recharge_power = value,
            Parameter::DryShare => valley.soil.dry_share = value,
            Parameter::QuickDays => valley.ground.quick_days = value,
            Parameter::SlowDays => valley.ground.slow_days = value,
            Parameter::Percolation => valley.ground.percolation_mm_day = value,
            Parameter::HydrographBase => valley.channel.unit_hydrograph_base_days = value,
            Parameter::ReachTravel => {
                let weight = value_of(Parameter::ReachWeight).unwrap_or(0.0) * largest_stable_weight(value);
                valley.channel.reach = Some(ReachTraits { travel_days: value, inflow_weight: weight });
            }
            Parameter::ReachWeight => {}
            Parameter::SnowCatch => valley.climb.snow_catch_factor = value,
            Parameter::PrecipitationGradient => valley.climb.precipitation_per_100m = value,
            Parameter::PrecipitationFactor => valley.climb.precipitation_factor = value,
            Parameter::MeanLapse => {
                let shift = value - mean_lapse_c_per_km(valley);
                valley.climb.lapse_c_per_km.iter_mut().for_each(|lapse| *lapse += shift);
            }
        }
    }
    // Written last: it counts from the lower temperature, fitted or not.
    if let Some(mixed_over_c) = value_of(Parameter::MixedOver) {
        valley.rain_snow.all_rain_above_c = valley.rain_snow.all_snow_below_c + mixed_over_c;
    }
}

/// The values of `parameters` in `valley` as it stands; NaN for those of a reach that it does not have.
pub fn values_of(valley: &Valley, parameters: &[Parameter]) -> Vec<f64> {
    let reach = valley.channel.reach.unwrap_or(ReachTraits { travel_days: f64::NAN, inflow_weight: f64::NAN });
    let value = |parameter: &Parameter| match parameter {
        Parameter::AllSnowBelow => valley.rain_snow.all_snow_below_c,
        Parameter::MixedOver => valley.rain_snow.all_rain_above_c - valley.rain_snow.all_snow_below_c,
        Parameter::MeltAbove => valley.snow.melt_above_c,
        Parameter::MeltFactor => valley.snow.melt_factor_mm_c_day,
        Parameter::MeltSwing => valley.snow.melt_swing_mm_c_day,
        Parameter::Refreeze => valley.snow.refreeze_share,
        Parameter::LiquidHolding => valley.snow.liquid_holding_share,
        Parameter::FullCover => valley.snow.full_cover_mm,
        Parameter::SoilCapacity => valley.soil.capacity_mm,
        Parameter::RechargePower => valley.soil.recharge_power,
        Parameter::DryShare => valley.soil.dry_share,
        Parameter::QuickDays => valley.ground.quick_days,
        Parameter::SlowDays => valley.ground.slow_days,
        Parameter::Percolation => valley.ground.percolation_mm_day,
        Parameter::HydrographBase => valley.channel.unit_hydrograph_base_days,
        Parameter::ReachTravel => reach.travel_days,
        Parameter::ReachWeight => reach.inflow_weight / largest_stable_weight(reach.travel_days),
        Parameter::SnowCatch => valley.climb.snow_catch_factor,
        Parameter::PrecipitationGradient => valley.climb.precipitation_per_100m,
        Parameter::PrecipitationFactor => valley.climb.precipitation_factor,
        Parameter::MeanLapse => mean_lapse_c_per_km(valley),
    };
    parameters.iter().map(value).collect()
}

fn mean_lapse_c_per_km(valley: &Valley) -> f64 {
    valley.climb.lapse_c_per_km.iter().sum::<f64>() / 12.0
}

/// Gives `valley` what [`set`] changes of it by steps from where it stood: months that keep what parts them.
pub fn reset(valley: &mut Valley, base: &Valley) {
    valley.climb.lapse_c_per_km = base.climb.lapse_c_per_km;
}
