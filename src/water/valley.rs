//! What a valley is: plain checked numbers that the water runs on.
//!
//! `place` builds a [`Valley`] from a folder and guarantees every condition written here; the water never checks again.

use heapless::Vec;
use serde::{Deserialize, Serialize};

use super::calendar::{MonthDay, Season};
use super::canals::{PriorityDate, SharingRule};
use super::crop::CropTraits;
use super::evaporation::Method;

/// Most elevation bands of a valley.
pub const MOST_BANDS: usize = 32;
pub use super::canals::MOST_GATES;

/// Most fields of a canal.
pub const MOST_FIELDS: usize = 8;
/// Most points of the reservoir's table.
pub const MOST_LAKE_POINTS: usize = 48;
/// Most dated points of a yearly rule.
pub const MOST_RULE_POINTS: usize = 24;
/// Longest base of the unit hydrograph, in days.
pub const MOST_HYDROGRAPH_DAYS: usize = 20;

/// A whole valley.
#[derive(Clone, Debug, PartialEq)]
pub struct Valley {
    /// Degrees north; negative in the south. Never between −0.5 and 0.5 by accident: the hemisphere sets the seasons.
    pub latitude_deg: f64,
    /// Month (1 to 12) on whose first day the water year starts.
    pub water_year_start_month: u8,
    /// Elevation of the station whose record drives everything, m.
    pub station_elevation_m: f64,
    /// How weather changes with height.
    pub climb: Climb,
    /// Rain or snow.
    pub rain_snow: RainSnow,
    /// How snow melts.
    pub snow: SnowTraits,
    /// How reference evaporation is had.
    pub evaporation: EvaporationTraits,
    /// The ground's upper layer, in every band.
    pub soil: SoilTraits,
    /// The two ground stores.
    pub ground: GroundTraits,
    /// The way from the slopes to the dam.
    pub channel: ChannelTraits,
    /// Elevation bands from low to high, at least one; lake and fields are not in them.
    pub bands: Vec<Band, MOST_BANDS>,
    /// The reservoir, if there is one.
    pub reservoir: Option<Reservoir>,
    /// Canals and towns in downstream order.
    pub gates: Vec<Gate, MOST_GATES>,
    /// The water that must stay in the river.
    pub minimum: RiverMinimum,
    /// Who gets what.
    pub rule: SharingRule,
    /// What is in store on the first morning.
    pub start: Start,
    /// Share of its demand that a canal must get for the year to be enough, 0 to 1.
    pub enough_share: f64,
    /// Day of the snow survey.
    pub survey: MonthDay,
    /// First and last month (1 to 12) of the spring volume; may run over New Year.
    pub spring_months: (u8, u8),
}

/// How weather changes with height, and how warming is spread over the year.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct Climb {
    /// Change of temperature with height in each month, °C per km; usually negative.
    pub lapse_c_per_km: [f64; 12],
    /// Share of the station's precipitation that is added per 100 m of climb.
    pub precipitation_per_100m: f64,
    /// Factor on all precipitation of the record.
    pub precipitation_factor: f64,
    /// Factor on snowfall for what the gauge misses.
    pub snow_catch_factor: f64,
    /// Weight of the warming dial in December–February, March–May, June–August, September–November.
    pub warming_weight: [f64; 4],
}

/// How precipitation is split.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct RainSnow {
    /// At or below this temperature everything is snow, °C.
    pub all_snow_below_c: f64,
    /// At or above this temperature everything is rain, °C; above `all_snow_below_c`.
    pub all_rain_above_c: f64,
    /// Whether the two temperatures are wet-bulb temperatures (Stull 2011), on days with humidity.
    pub wet_bulb: bool,
}

/// Degree-day snow.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct SnowTraits {
    /// Melt starts above this temperature, °C.
    pub melt_above_c: f64,
    /// Mean degree-day factor, mm/°C/day.
    pub melt_factor_mm_c_day: f64,
    /// Seasonal swing of the degree-day factor about its mean, mm/°C/day.
    pub melt_swing_mm_c_day: f64,
    /// Refreezing as a share of the degree-day factor.
    pub refreeze_share: f64,
    /// Liquid water that the pack holds, as a share of its ice.
    pub liquid_holding_share: f64,
    /// Whether rain brings its heat to the pack.
    pub heat_of_rain: bool,
    /// Snow water above which the ground is wholly covered, mm; above 0.
    pub full_cover_mm: f64,
    /// Snow lost to the air on every day of the cold half-year, mm/day.
    pub sublimation_mm_day: f64,
}

/// Reference evaporation: how, and where.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct EvaporationTraits {
    /// The published method.
    pub method: Method,
    /// Where it is worked out, m.
    pub reference_elevation_m: f64,
    /// Factor from reference to open water of the lake.
    pub lake_factor: f64,
}

/// The soil of every band.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct SoilTraits {
    /// Water that the soil holds, mm; above 0.
    pub capacity_mm: f64,
    /// Power of the recharge curve.
    pub recharge_power: f64,
    /// Below this share of capacity evaporation is reduced, 0 to 1, above 0.
    pub dry_share: f64,
}

/// Two linear ground stores.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct GroundTraits {
    /// Residence time of the quick store, days; above 0.
    pub quick_days: f64,
    /// Residence time of the slow store, days; above 0.
    pub slow_days: f64,
    /// Most that the quick store passes to the slow one, mm/day.
    pub percolation_mm_day: f64,
}

/// The way of the water from the slopes to the dam.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct ChannelTraits {
    /// Base of the triangular unit hydrograph, days; above 0 and at most [`MOST_HYDROGRAPH_DAYS`].
    pub unit_hydrograph_base_days: f64,
    /// The reach down to the dam, if it delays the flow.
    pub reach: Option<ReachTraits>,
}

/// A Muskingum reach, with 2·K·X ≤ 1 day ≤ 2·K·(1−X) so that no coefficient is negative.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct ReachTraits {
    /// Travel time K, days.
    pub travel_days: f64,
    /// Weight X of the inflow, 0 to 0.5.
    pub inflow_weight: f64,
}

/// One elevation band.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct Band {
    /// Area without lake and fields, km²; above 0.
    pub area_km2: f64,
    /// Mean elevation, m.
    pub elevation_m: f64,
    /// Factor on the degree-day factor: above 1 in the sun, below in forest.
    pub melt_exposure: f64,
    /// Factor on reference evaporation.
    pub evaporation_factor: f64,
}

/// A reservoir on the river.
#[derive(Clone, Debug, PartialEq)]
pub struct Reservoir {
    /// Rising points of the survey table, at least two, from the bottom.
    pub table: Vec<LakePoint, MOST_LAKE_POINTS>,
    /// Volume below the outlet, hm³.
    pub dead_hm3: f64,
    /// Volume when full, hm³; above dead.
    pub capacity_hm3: f64,
    /// Most that the outlet passes, m³/s.
    pub outlet_m3s: f64,
    /// The reservoir's own right to natural flow.
    pub right_date: PriorityDate,
    /// Space kept empty for floods, by date, joined by straight lines and round New Year; empty: none.
    pub flood_space: Vec<(MonthDay, f64), MOST_RULE_POINTS>,
    /// Whether unowned stored water completes the river minimum.
    pub serves_minimum: bool,
    /// When to hold stored water back before it is gone.
    pub hedging: Option<Hedging>,
}

/// A point of the level–area–volume table.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct LakePoint {
    /// Water level, m.
    pub level_m: f64,
    /// Surface, km².
    pub area_km2: f64,
    /// Volume, hm³.
    pub volume_hm3: f64,
}

/// Two-point hedging (after Bayazit & Ünal 1990): stored water is rationed while what is at hand lies between two
/// multiples of the demand ahead.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct Hedging {
    /// Days of today's demand that are looked at.
    pub days_ahead: f64,
    /// Rationing starts below this multiple of that demand; at least 1.
    pub ends_at: f64,
    /// Below this multiple all that is at hand is given; at most 1.
    pub starts_at: f64,
}

/// Water that must stay in the river.
#[derive(Clone, Debug, PartialEq)]
pub struct RiverMinimum {
    /// Where it is measured.
    pub at: super::canals::MinimumPlace,
    /// Its place in the order of dates.
    pub right_date: PriorityDate,
    /// Rate from each date on until the next, m³/s, round New Year; empty: none.
    pub rate_m3s: Vec<(MonthDay, f64), MOST_RULE_POINTS>,
}

/// A head gate on the river, with what hangs on it.
#[derive(Clone, Debug, PartialEq)]
pub struct Gate {
    /// Date of the right.
    pub right_date: PriorityDate,
    /// Decreed rate of the right, natural flow only, m³/s; may be infinite.
    pub decreed_m3s: f64,
    /// Most that the canal carries, m³/s.
    pub canal_m3s: f64,
    /// Share of the reservoir's active capacity that is this gate's account, 0 to 1.
    pub storage_share: f64,
    /// Share of stored water lost in the river on the way from the dam, 0 to below 1.
    pub stored_loss_share: f64,
    /// Most that may be taken in a water year, hm³; may be infinite.
    pub yearly_limit_hm3: f64,
    /// Share of what enters the canal that is lost on the way, 0 to below 1.
    pub conveyance_loss_share: f64,
    /// Share of what is lost that comes back to the river.
    pub return_share: f64,
    /// Mean delay of what comes back, days.
    pub return_days: f64,
    /// The gate above which it comes back, from 1; one more than the number of gates is below them all.
    pub return_above: u8,
    /// Days of this gate's turn in `rotation`; 0 is no turn.
    pub turn_days: u16,
    /// When the canal is open.
    pub season: Season,
    /// What the water is for.
    pub purpose: Purpose,
}

/// What a gate's water is for.
#[derive(Clone, Debug, PartialEq)]
#[allow(
    clippy::large_enum_variant,
    reason = "a valley is built once and never moved; indirection would need an allocator"
)]
pub enum Purpose {
    /// Fields under a canal.
    Fields(Vec<Field, MOST_FIELDS>),
    /// A town.
    Town(Town),
}

/// A field, with the crop that the crop-mix dial may change it to.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Field {
    /// Irrigated area, ha; above 0.
    pub area_ha: f64,
    /// What grows there.
    pub crop: CropOnField,
    /// What the crop-mix dial puts in its place; `None` where the dial does not touch this field.
    pub swap_to: Option<CropOnField>,
    /// Share of the water at the field that reaches the root zone, above 0 to 1.
    pub efficiency: f64,
    /// Water that the soil holds between field capacity and wilting point, mm per metre of depth.
    pub soil_holds_mm_per_m: f64,
    /// Most that one day's watering brings to the root zone, mm.
    pub most_watering_mm_day: f64,
}

/// A crop as it is grown on a field.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CropOnField {
    /// Published traits.
    pub traits: CropTraits,
    /// First day of the initial stage.
    pub planting: MonthDay,
    /// Depletion to which watering refills, as a share of the readily available water: 0 keeps the soil full.
    pub refill_to_share: f64,
    /// Whether it is watered; land at rest is not.
    pub watered: bool,
    /// Coefficient of the bare or resting ground out of season.
    pub off_season_coefficient: f64,
}

/// A town's use.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct Town {
    /// Need on a day out of summer, m³/day.
    pub daily_m3: f64,
    /// More on a summer day, m³/day.
    pub summer_more_m3: f64,
    /// The summer part.
    pub summer: Season,
    /// Share of what arrives that is used up, 0 to 1; the rest returns.
    pub used_up_share: f64,
}

/// What is in store on the first morning.
#[derive(Clone, Copy, Debug, PartialEq, Serialize, Deserialize)]
pub struct Start {
    /// Snow ice in every band, mm.
    pub snow_mm: f64,
    /// Soil water as a share of capacity.
    pub soil_share: f64,
    /// Quick store, mm.
    pub quick_mm: f64,
    /// Slow store, mm.
    pub slow_mm: f64,
    /// Reservoir content as a share of active capacity.
    pub storage_share: f64,
    /// Years of the record that are run first to let the stores settle; 0 starts from the values above.
    pub settling_years: u8,
}

impl Valley {
    /// Whether the valley lies south of the equator.
    pub fn is_southern(&self) -> bool {
        self.latitude_deg < 0.0
    }

    /// Area of the bands, km².
    pub fn band_area_km2(&self) -> f64 {
        self.bands.iter().map(|band| band.area_km2).sum()
    }

    /// Area of all fields, ha.
    pub fn field_area_ha(&self) -> f64 {
        self.gates.iter().map(Gate::field_area_ha).sum()
    }
}

impl Gate {
    /// Area of the gate's fields, ha; 0 for a town.
    pub fn field_area_ha(&self) -> f64 {
        match &self.purpose {
            Purpose::Fields(fields) => fields.iter().map(|field| field.area_ha).sum(),
            Purpose::Town(_) => 0.0,
        }
    }

    /// Whether a town hangs on the gate.
    pub fn is_town(&self) -> bool {
        matches!(self.purpose, Purpose::Town(_))
    }
}
