//! The fields under a canal: what they ask for, what a delivery does, and what the crop gives to the air.
//!
//! Each plot keeps the water missing in its root zone (FAO-56, Allen et al. 1998, equations 82 to 88). In the morning it
//! asks for what brings the root zone back to the level that its farmer keeps; rain and delivery then enter, and the
//! crop uses what it can. Land that the crop-mix dial changes over is a plot of its own beside the rest of its field.

use heapless::Vec;

use super::calendar::MonthDay;
use super::crop::{CropTraits, readily_available_mm, root_zone_day, yield_share};
use super::units::M3_PER_MM_HECTARE;
use super::valley::{CropOnField, Field, MOST_FIELDS};

/// Most plots under a canal: every field and what the dial makes of it.
pub const MOST_PLOTS: usize = 2 * MOST_FIELDS;

/// A plot: a field, or the part of one that grows something else.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Plot {
    /// Index of the field in the canal's list.
    pub field: usize,
    area_ha: f64,
    traits: CropTraits,
    season_days: u32,
    planting: MonthDay,
    off_season_coefficient: f64,
    watered: bool,
    efficiency: f64,
    total_available_mm: f64,
    refill_to_mm: f64,
    most_watering_mm: f64,
}

/// What a plot carries from day to day.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct PlotStore {
    /// Water missing in the root zone, mm.
    pub depletion_mm: f64,
    /// Day of the crop's season, 0 out of season.
    day_of_season: u32,
    /// Crop evaporation since planting, and what it would have been without stress, mm.
    season_actual_mm: f64,
    season_full_mm: f64,
}

/// What the plots of a canal did in a day. Volumes in m³, areas in ha.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct FieldsDay {
    /// Rain on the fields.
    pub rain_m3: f64,
    /// All that soil and crop gave to the air.
    pub evaporation_m3: f64,
    /// The part of it within the crops' seasons.
    pub crop_evaporation_m3: f64,
    /// What the crops would have used without stress, within their seasons.
    pub full_crop_evaporation_m3: f64,
    /// Lost on the fields: what watering wastes and what drains below the roots.
    pub lost_m3: f64,
    /// Area whose season ended today, of crops with a published yield response.
    pub harvested_ha: f64,
    /// The same, each hectare weighted with its share of full yield.
    pub yield_ha: f64,
}

impl Plot {
    fn new(field: &Field, index: usize, crop: &CropOnField, area_ha: f64) -> Self {
        let total_available_mm = field.soil_holds_mm_per_m * crop.traits.root_depth_m;
        let readily_mm = readily_available_mm(total_available_mm, crop.traits.depletion_share);
        Self {
            field: index,
            area_ha,
            traits: crop.traits,
            season_days: crop.traits.season_days(),
            planting: crop.planting,
            off_season_coefficient: crop.off_season_coefficient,
            watered: crop.watered,
            efficiency: field.efficiency,
            total_available_mm,
            refill_to_mm: crop.refill_to_share * readily_mm,
            most_watering_mm: field.most_watering_mm_day,
        }
    }

    /// Water held for the crop, m³.
    pub fn held_m3(&self, store: &PlotStore) -> f64 {
        (self.total_available_mm - store.depletion_mm) * self.area_ha * M3_PER_MM_HECTARE
    }

    /// What the plot asks for at its edge this morning, m³.
    #[inline(always)]
    fn asked_m3(&self, store: &PlotStore, day: MonthDay) -> f64 {
        let in_season = self.in_season(store, day);
        let missing_mm = store.depletion_mm - self.refill_to_mm;
        if !(self.watered && in_season && missing_mm > 0.0) {
            return 0.0;
        }
        let watering_mm = if missing_mm < self.most_watering_mm { missing_mm } else { self.most_watering_mm };
        watering_mm * self.area_ha * M3_PER_MM_HECTARE / self.efficiency
    }

    /// Area harvested, ha, and its share of full yield; nothing where the crop has no published response.
    fn harvest(&self, store: &PlotStore) -> (f64, f64) {
        let share = self
            .traits
            .yield_response
            .and_then(|response| yield_share(response, store.season_actual_mm, store.season_full_mm));
        share.map_or((0.0, 0.0), |share| (self.area_ha, share))
    }

    /// Whether the day about to pass is in the crop's season.
    #[inline(always)]
    fn in_season(&self, store: &PlotStore, day: MonthDay) -> bool {
        self.season_days > 0 && (day == self.planting || (1..self.season_days).contains(&store.day_of_season))
    }
}

/// The plots of one canal.
#[derive(Clone, Debug, PartialEq)]
pub struct Plots {
    plots: Vec<Plot, MOST_PLOTS>,
}

/// The stores of one canal's plots.
pub type PlotStores = [PlotStore; MOST_PLOTS];

impl Plots {
    /// The plots of `fields` with all areas multiplied by `area_factor` and `swapped_share` of every field that has
    /// another crop to change to growing that.
    pub fn new(fields: &Vec<Field, MOST_FIELDS>, area_factor: f64, swapped_share: f64) -> Self {
        let mut plots = Vec::new();
        for (index, field) in fields.iter().enumerate() {
            let area_ha = field.area_ha * area_factor;
            let swapped_ha = if field.swap_to.is_some() { area_ha * swapped_share } else { 0.0 };
            // A field has two plots at most, so there is always room.
            if area_ha - swapped_ha > 0.0 {
                let _ = plots.push(Plot::new(field, index, &field.crop, area_ha - swapped_ha));
            }
            if let (Some(crop), true) = (&field.swap_to, swapped_ha > 0.0) {
                let _ = plots.push(Plot::new(field, index, crop, swapped_ha));
            }
        }
        Self { plots }
    }

    /// The plots one by one.
    pub fn iter(&self) -> impl Iterator<Item = &Plot> {
        self.plots.iter()
    }

    /// Stores with the root zones at `soil_share` of what they hold, on the morning of `today`, in the middle of
    /// whatever seasons are running.
    pub fn start(&self, soil_share: f64, today: MonthDay) -> PlotStores {
        let mut stores = [PlotStore::default(); MOST_PLOTS];
        for (plot, store) in self.plots.iter().zip(&mut stores) {
            store.depletion_mm = (1.0 - soil_share) * plot.total_available_mm;
            let since = i32::from(today.leap_day_of_year()) - i32::from(plot.planting.leap_day_of_year());
            let since = since.rem_euclid(366) as u32;
            store.day_of_season = if since < plot.season_days { since } else { 0 };
        }
        stores
    }

    /// Water in all root zones, m³.
    pub fn held_m3(&self, stores: &PlotStores) -> f64 {
        self.plots.iter().zip(stores).map(|(plot, store)| plot.held_m3(store)).sum()
    }

    /// What the plots ask for at their edges this morning, together, m³.
    #[inline]
    pub fn asked_m3(&self, stores: &PlotStores, today: MonthDay) -> f64 {
        self.plots.iter().zip(stores).map(|(plot, store)| plot.asked_m3(store, today)).sum()
    }

    /// One day into `out`: `delivered_m3` is shared among the plots as they asked (`asked_m3` in all), rain falls, the
    /// crops use water.
    #[allow(clippy::too_many_arguments, reason = "the weather of a field is two numbers, its water two more")]
    pub fn day(
        &self,
        stores: &mut PlotStores,
        today: MonthDay,
        delivered_m3: f64,
        asked_m3: f64,
        rain_mm: f64,
        reference_evaporation_mm: f64,
        out: &mut FieldsDay,
    ) {
        // Sums of their own, not fields of `out`: they stay in registers until the end.
        let (mut area_ha, mut evaporation_m3, mut lost_m3) = (0.0, 0.0, 0.0);
        let (mut crop_evaporation_m3, mut full_crop_evaporation_m3) = (0.0, 0.0);
        let (mut harvested_ha, mut yield_ha) = (0.0, 0.0);
        let met = if asked_m3 > 0.0 { delivered_m3 / asked_m3 } else { 0.0 };
        for (plot, store) in self.plots.iter().zip(stores) {
            let m3_per_mm = plot.area_ha * M3_PER_MM_HECTARE;
            let edge_m3 = if met > 0.0 { plot.asked_m3(store, today) * met } else { 0.0 };
            let watering_m3 = edge_m3 * plot.efficiency;
            let in_season = plot.in_season(store, today);
            let coefficient = if in_season {
                if today == plot.planting {
                    *store = PlotStore { depletion_mm: store.depletion_mm, ..PlotStore::default() };
                }
                store.day_of_season += 1;
                plot.traits.coefficient_on(store.day_of_season)
            } else {
                store.day_of_season = 0;
                plot.off_season_coefficient
            };
            let full_mm = coefficient * reference_evaporation_mm;
            let zone = root_zone_day(
                store.depletion_mm,
                plot.total_available_mm,
                plot.traits.depletion_share,
                full_mm,
                rain_mm + watering_m3 / m3_per_mm,
            );
            store.depletion_mm = zone.depletion_mm;

            area_ha += plot.area_ha;
            evaporation_m3 += zone.crop_evaporation_mm * m3_per_mm;
            lost_m3 += edge_m3 - watering_m3 + zone.percolation_mm * m3_per_mm;
            if in_season {
                store.season_actual_mm += zone.crop_evaporation_mm;
                store.season_full_mm += full_mm;
                crop_evaporation_m3 += zone.crop_evaporation_mm * m3_per_mm;
                full_crop_evaporation_m3 += full_mm * m3_per_mm;
                if store.day_of_season == plot.season_days {
                    let (ha, share) = plot.harvest(store);
                    harvested_ha += ha;
                    yield_ha += share * ha;
                }
            }
        }
        *out = FieldsDay {
            rain_m3: rain_mm * area_ha * M3_PER_MM_HECTARE,
            evaporation_m3,
            crop_evaporation_m3,
            full_crop_evaporation_m3,
            lost_m3,
            harvested_ha,
            yield_ha,
        };
    }
}
