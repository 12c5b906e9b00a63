//! The fields under a canal: what they ask for, what a delivery does, and what the crop gives to the air.
//!
//! Each plot keeps the water missing in its root zone (FAO-56, Allen et al. 1998, equations 82 to 88). In the morning it
//! asks for what brings the root zone back to the level that its farmer keeps; rain and delivery then enter, and the
//! crop uses what it can. Land that the crop-mix dial changes over is a plot of its own beside the rest of its field.

use heapless::Vec;

use super::calendar::MonthDay;
use super::crop::{CoefficientCurve, CropTraits, Stage, readily_available_mm, root_zone_day, yield_share};
use super::lanes::{Lanes, Number};
use super::units::M3_PER_MM_HECTARE;
use super::valley::{CropOnField, Field, MOST_FIELDS};

/// Most plots under a canal: every field and what the dial makes of it.
pub const MOST_PLOTS: usize = 2 * MOST_FIELDS;

/// A pair of plots for every two.
type PlotLanes = Lanes<MOST_PLOTS>;

/// No rank of any date.
const NEVER: u16 = u16::MAX;

/// Days until stages are looked up again where no crop grows; any number would do.
const MOST_QUIET_DAYS: u32 = 10_000;

/// A plot: a field, or the part of one that grows something else.
#[derive(Clone, Copy, Debug, PartialEq)]
struct Plot {
    area_ha: f64,
    traits: CropTraits,
    /// The traits' coefficients by day of the season.
    coefficients: CoefficientCurve,
    planting: MonthDay,
}

/// What the plots of a canal carry from day to day.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct PlotStores {
    /// Water missing in each root zone, mm.
    depletion_mm: PlotLanes,
    /// Crop evaporation since planting, and what it would have been without stress, mm.
    season_actual_mm: PlotLanes,
    season_full_mm: PlotLanes,
    /// Day of each crop's season when the stages were last looked up, 0 out of season.
    day_of_season: [u32; MOST_PLOTS],
    /// Where each crop stood on its coefficient curve then, and whether it was in season: 1, else 0.
    stage: Stage<PlotLanes>,
    in_season: PlotLanes,
    /// Days since then, and days from today on which no crop enters another stage.
    elapsed_days: u32,
    quiet_days: u32,
    /// Whether any crop is in season, and whether a season ends today.
    any_in_season: bool,
    ends: bool,
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
    /// Area harvested, ha, and its share of full yield; nothing where the crop has no published response.
    fn harvest(&self, actual_mm: f64, full_mm: f64) -> (f64, f64) {
        let share = self.traits.yield_response.and_then(|response| yield_share(response, actual_mm, full_mm));
        share.map_or((0.0, 0.0), |share| (self.area_ha, share))
    }
}

/// The plots of one canal.
#[derive(Clone, Debug, PartialEq)]
pub struct Plots {
    plots: Vec<Plot, MOST_PLOTS>,
    /// Together, ha.
    area_ha: f64,
    /// Length of each crop's season, days; 0 where there is none.
    season_days: [u32; MOST_PLOTS],
    /// [`MonthDay::rank`] of each crop's planting, or [`NEVER`].
    planting: [u16; MOST_PLOTS],
    /// A bit for every month in which something is planted: in most there is nothing to look for.
    planting_months: u16,
    off_season_coefficient: PlotLanes,
    m3_per_mm: PlotLanes,
    mm_per_m3: PlotLanes,
    efficiency: PlotLanes,
    total_available_mm: PlotLanes,
    depletion_share: PlotLanes,
    refill_to_mm: PlotLanes,
    most_watering_mm: PlotLanes,
    /// Asked for at the plot's edge to bring a millimetre to its roots, m³; zero where nothing is watered.
    asked_m3_per_mm: PlotLanes,
}

impl Plots {
    /// The plots of `fields` with all areas multiplied by `area_factor` and `swapped_share` of every field that has
    /// another crop to change to growing that.
    pub fn new(fields: &Vec<Field, MOST_FIELDS>, area_factor: f64, swapped_share: f64) -> Self {
        let none = PlotLanes::default();
        let mut plots = Self {
            plots: Vec::new(),
            area_ha: 0.0,
            season_days: [0; MOST_PLOTS],
            planting: [NEVER; MOST_PLOTS],
            planting_months: 0,
            off_season_coefficient: none,
            m3_per_mm: none,
            mm_per_m3: none,
            efficiency: none,
            total_available_mm: none,
            depletion_share: none,
            refill_to_mm: none,
            most_watering_mm: none,
            asked_m3_per_mm: none,
        };
        for field in fields {
            let area_ha = field.area_ha * area_factor;
            let swapped_ha = if field.swap_to.is_some() { area_ha * swapped_share } else { 0.0 };
            if area_ha - swapped_ha > 0.0 {
                plots.push(field, &field.crop, area_ha - swapped_ha);
            }
            if let (Some(crop), true) = (&field.swap_to, swapped_ha > 0.0) {
                plots.push(field, crop, swapped_ha);
            }
        }
        plots
    }

    /// A field has two plots at most, so there is always room.
    fn push(&mut self, field: &Field, crop: &CropOnField, area_ha: f64) {
        let lane = self.plots.len();
        let coefficients = CoefficientCurve::new(&crop.traits);
        let plot = Plot { area_ha, traits: crop.traits, coefficients, planting: crop.planting };
        if self.plots.push(plot).is_err() {
            return;
        }
        let total_available_mm = field.soil_holds_mm_per_m * crop.traits.root_depth_m;
        let m3_per_mm = area_ha * M3_PER_MM_HECTARE;
        self.area_ha += area_ha;
        self.season_days[lane] = crop.traits.season_days();
        if self.season_days[lane] > 0 {
            self.planting[lane] = crop.planting.rank();
            self.planting_months |= 1 << (crop.planting.month % 16);
        }
        self.off_season_coefficient.0[lane] = crop.off_season_coefficient;
        self.m3_per_mm.0[lane] = m3_per_mm;
        self.mm_per_m3.0[lane] = 1.0 / m3_per_mm;
        self.efficiency.0[lane] = field.efficiency;
        self.total_available_mm.0[lane] = total_available_mm;
        self.depletion_share.0[lane] = crop.traits.depletion_share;
        self.refill_to_mm.0[lane] =
            crop.refill_to_share * readily_available_mm(total_available_mm, crop.traits.depletion_share);
        self.most_watering_mm.0[lane] = field.most_watering_mm_day;
        self.asked_m3_per_mm.0[lane] = if crop.watered { m3_per_mm / field.efficiency } else { 0.0 };
    }

    /// Stores with the root zones at `soil_share` of what they hold, on the morning of `today`, in the middle of
    /// whatever seasons are running.
    pub fn start(&self, soil_share: f64, today: MonthDay) -> PlotStores {
        let mut stores = PlotStores {
            depletion_mm: Lanes::splat(1.0 - soil_share) * self.total_available_mm,
            stage: Stage::flat(PlotLanes::default()),
            ..PlotStores::default()
        };
        let seasons = self.season_days.iter().zip(&mut stores.day_of_season);
        for (plot, (season_days, day_of_season)) in self.plots.iter().zip(seasons) {
            let since = i32::from(today.leap_day_of_year()) - i32::from(plot.planting.leap_day_of_year());
            let since = since.rem_euclid(366) as u32;
            *day_of_season = if since < *season_days { since } else { 0 };
        }
        stores
    }

    /// Water in all root zones, m³.
    pub fn held_m3(&self, stores: &PlotStores) -> f64 {
        let held_m3 = (self.total_available_mm - stores.depletion_mm) * self.m3_per_mm;
        held_m3.0.iter().sum()
    }

    /// How many pairs of plots there are.
    #[inline(always)]
    fn pairs(&self) -> usize {
        self.plots.len().div_ceil(2).min(PlotLanes::PAIRS)
    }

    /// Lets the seasons move on to `today`: to be called every morning. Most mornings no crop enters another stage, and
    /// there is nothing to look up.
    #[inline(always)]
    pub fn morning(&self, stores: &mut PlotStores, today: MonthDay) {
        let planting = (self.planting_months >> (today.month % 16)) & 1 != 0 && self.planting.contains(&today.rank());
        if stores.quiet_days > 0 && !planting {
            stores.quiet_days -= 1;
            stores.elapsed_days += 1;
        } else {
            self.look_up_stages(stores, today.rank());
        }
    }

    #[inline(never)]
    fn look_up_stages(&self, stores: &mut PlotStores, today: u16) {
        let (mut any_in_season, mut ends, mut quiet_days) = (false, false, MOST_QUIET_DAYS);
        for (index, plot) in self.plots.iter().enumerate() {
            let grown = if stores.in_season.0[index] > 0.0 { stores.elapsed_days } else { 0 };
            let mut day = stores.day_of_season[index] + grown;
            if self.planting[index] == today {
                day = 1;
                stores.season_actual_mm.0[index] = 0.0;
                stores.season_full_mm.0[index] = 0.0;
            } else if day > 0 && day < self.season_days[index] {
                day += 1;
            } else {
                day = 0;
            }
            let (stage, days_left) = if day > 0 {
                any_in_season = true;
                ends |= day == self.season_days[index];
                // The last day of a season is a stage of its own, since it brings the harvest.
                let (stage, last_day) = plot.coefficients.stage_on(day);
                (stage, last_day.min(self.season_days[index] - 1).saturating_sub(day))
            } else {
                (Stage::flat(self.off_season_coefficient.0[index]), MOST_QUIET_DAYS)
            };
            quiet_days = quiet_days.min(days_left);
            stores.day_of_season[index] = day;
            stores.in_season.0[index] = f64::from(u8::from(day > 0));
            stores.stage.set_lane(index, stage);
        }
        stores.elapsed_days = 0;
        stores.quiet_days = quiet_days;
        stores.any_in_season = any_in_season;
        stores.ends = ends;
    }

    /// What the plots of a pair ask for at their edges, m³.
    #[inline(always)]
    fn asked_by_pair_m3(&self, stores: &PlotStores, pair: usize) -> Lanes<2> {
        let missing_mm = (stores.depletion_mm.pair(pair) - self.refill_to_mm.pair(pair)).positive();
        missing_mm.least(self.most_watering_mm.pair(pair))
            * self.asked_m3_per_mm.pair(pair)
            * stores.in_season.pair(pair)
    }

    /// What the plots ask for at their edges this morning, together, m³.
    #[inline(always)]
    pub fn asked_m3(&self, stores: &PlotStores) -> f64 {
        let mut asked_m3 = Lanes::default();
        if stores.any_in_season {
            for pair in 0..self.pairs() {
                asked_m3 = asked_m3 + self.asked_by_pair_m3(stores, pair);
            }
        }
        sum(asked_m3)
    }

    /// One day into `out`: `delivered_m3` is shared among the plots as they asked (`asked_m3` in all), rain falls, the
    /// crops use water.
    #[inline(always)]
    pub fn day(
        &self,
        stores: &mut PlotStores,
        delivered_m3: f64,
        asked_m3: f64,
        rain_mm: f64,
        reference_evaporation_mm: f64,
        out: &mut FieldsDay,
    ) {
        let rain_m3 = rain_mm * self.area_ha * M3_PER_MM_HECTARE;
        let rain_mm = Lanes::splat(rain_mm);
        let reference_evaporation_mm = Lanes::splat(reference_evaporation_mm);
        let mut water = Water::default();
        if !stores.any_in_season {
            for pair in 0..self.pairs() {
                let full_mm = self.off_season_coefficient.pair(pair) * reference_evaporation_mm;
                self.balance(stores, pair, full_mm, rain_mm, &mut water);
            }
            *out = FieldsDay {
                rain_m3,
                evaporation_m3: sum(water.evaporation_m3),
                lost_m3: sum(water.drained_m3),
                ..FieldsDay::default()
            };
            return;
        }

        let mut crop = CropDay::default();
        let mut lost_m3 = Lanes::default();
        let met = Lanes::splat(if asked_m3 > 0.0 { delivered_m3 / asked_m3 } else { 0.0 });
        let elapsed_days = Lanes::splat(f64::from(stores.elapsed_days));
        for pair in 0..self.pairs() {
            let in_season = stores.in_season.pair(pair);
            let edge_m3 = self.asked_by_pair_m3(stores, pair) * met;
            let watering_m3 = edge_m3 * self.efficiency.pair(pair);
            lost_m3 = lost_m3 + (edge_m3 - watering_m3);
            let coefficient = stores.stage.pair(pair).coefficient(elapsed_days);
            let full_mm = coefficient * reference_evaporation_mm;
            let water_mm = rain_mm + watering_m3 * self.mm_per_m3.pair(pair);
            let actual_mm = self.balance(stores, pair, full_mm, water_mm, &mut water) * in_season;
            let full_mm = full_mm * in_season;
            stores.season_actual_mm.set_pair(pair, stores.season_actual_mm.pair(pair) + actual_mm);
            stores.season_full_mm.set_pair(pair, stores.season_full_mm.pair(pair) + full_mm);
            crop.evaporation_m3 = crop.evaporation_m3 + actual_mm * self.m3_per_mm.pair(pair);
            crop.full_evaporation_m3 = crop.full_evaporation_m3 + full_mm * self.m3_per_mm.pair(pair);
        }
        let (harvested_ha, yield_ha) = if stores.ends { self.harvest(stores) } else { (0.0, 0.0) };
        *out = FieldsDay {
            rain_m3,
            evaporation_m3: sum(water.evaporation_m3),
            crop_evaporation_m3: sum(crop.evaporation_m3),
            full_crop_evaporation_m3: sum(crop.full_evaporation_m3),
            lost_m3: sum(lost_m3 + water.drained_m3),
            harvested_ha,
            yield_ha,
        };
    }

    /// A day in the root zones of a pair of plots; gives what their crops and soil evaporate, mm.
    #[inline(always)]
    fn balance(
        &self,
        stores: &mut PlotStores,
        pair: usize,
        full_mm: Lanes<2>,
        water_mm: Lanes<2>,
        water: &mut Water,
    ) -> Lanes<2> {
        let zone = root_zone_day(
            stores.depletion_mm.pair(pair),
            self.total_available_mm.pair(pair),
            self.depletion_share.pair(pair),
            full_mm,
            water_mm,
        );
        stores.depletion_mm.set_pair(pair, zone.depletion_mm);
        let m3_per_mm = self.m3_per_mm.pair(pair);
        water.evaporation_m3 = water.evaporation_m3 + zone.crop_evaporation_mm * m3_per_mm;
        water.drained_m3 = water.drained_m3 + zone.percolation_mm * m3_per_mm;
        zone.crop_evaporation_mm
    }

    /// Area of the plots whose season ends today, ha, and the same weighted with each share of full yield.
    #[cold]
    fn harvest(&self, stores: &PlotStores) -> (f64, f64) {
        let (mut harvested_ha, mut yield_ha) = (0.0, 0.0);
        for (index, plot) in self.plots.iter().enumerate() {
            let season_days = self.season_days[index];
            if season_days > 0 && stores.day_of_season[index] == season_days {
                let (ha, share) = plot.harvest(stores.season_actual_mm.0[index], stores.season_full_mm.0[index]);
                harvested_ha += ha;
                yield_ha += share * ha;
            }
        }
        (harvested_ha, yield_ha)
    }
}

/// Water of the plots of a day, a pair of lanes for all pairs of plots.
#[derive(Clone, Copy, Default)]
struct Water {
    evaporation_m3: Lanes<2>,
    drained_m3: Lanes<2>,
}

/// What the crops in season did.
#[derive(Clone, Copy, Default)]
struct CropDay {
    evaporation_m3: Lanes<2>,
    full_evaporation_m3: Lanes<2>,
}

impl Stage<PlotLanes> {
    #[inline(always)]
    fn pair(&self, pair: usize) -> Stage<Lanes<2>> {
        Stage {
            base: self.base.pair(pair),
            change: self.change.pair(pair),
            of_days: self.of_days.pair(pair),
            days_in: self.days_in.pair(pair),
        }
    }

    fn set_lane(&mut self, lane: usize, stage: Stage) {
        self.base.0[lane] = stage.base;
        self.change.0[lane] = stage.change;
        self.of_days.0[lane] = stage.of_days;
        self.days_in.0[lane] = stage.days_in;
    }
}

#[inline(always)]
fn sum(pair: Lanes<2>) -> f64 {
    pair.0[0] + pair.0[1]
}
