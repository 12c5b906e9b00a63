//! Reservoir, canals, fields, town and river: the second stage of a run.
//!
//! The order of the day:
//!
//! 1. On the first day of a water year yearly limits start afresh, and the starting-storage dial, off rest, sets the
//!    reservoir.
//! 2. The lake's rain and evaporation are worked out on its surface of the morning.
//! 3. Every field says what would refill its root zone, every town what it needs; conveyance loss is added.
//! 4. The river is shared out ([`super::canals`], steps 1 to 8).
//! 5. Canals lose water on the way, fields take theirs, rain falls on them, crops use water; what is lost goes to the
//!    return stores.

use super::basin::BasinDay;
use super::calendar::{CalendarDay, Season};
use super::canals::{self, MOST_GATES, River, RiverDay, RiverFault, RiverInput, RiverSetup, RiverState, SharingRule};
use super::dials::Dials;
use super::fields::{FieldsDay, PlotStores, Plots};
use super::lake::{Vessel, YearlyRule};
use super::units::{M3_PER_HM3, m3_per_day};
use super::valley::{Gate, Hedging, Purpose, Town, Valley};

/// What hangs on a gate, ready to run.
#[derive(Clone, Debug)]
#[allow(clippy::large_enum_variant, reason = "built once a run; indirection would need an allocator")]
enum User {
    Fields(Plots),
    Town { town: Town, growth: f64 },
}

/// A gate ready to run.
#[derive(Clone, Debug)]
struct Head {
    user: User,
    season: Season,
    canal_m3: f64,
    conveyance_loss_share: f64,
    /// From what is needed at the end of the canal to what is asked for at its head.
    head_per_end: f64,
    /// Turn over cycle under rotation, 1 otherwise: the river multiplies by its inverse, for a demand that is a day's.
    /// A field's is not: it asks for all that is missing.
    turn_per_cycle: f64,
}

/// Everything below the slopes, ready to run under one setting of the dials.
#[derive(Clone, Debug)]
pub struct Works {
    river: River,
    vessel: Option<Vessel>,
    lake_factor: f64,
    flood_space_m3: YearlyRule,
    minimum_m3: YearlyRule,
    heads: heapless::Vec<Head, MOST_GATES>,
    hedging: Option<Hedging>,
    starting_share: Option<f64>,
    start_storage_share: f64,
    start_soil_share: f64,
    rule: SharingRule,
    outlet_m3: f64,
}

/// What the works carry from day to day.
#[derive(Clone, Debug)]
pub struct WorksStores {
    /// Accounts, pool, return stores.
    pub river: RiverState,
    /// Root zones.
    pub plots: [PlotStores; MOST_GATES],
    /// What each gate's users ask for this morning: at the end of the canal, and of the river. Here so that they need
    /// not be made anew.
    at_edges_m3: [f64; MOST_GATES],
    for_river_m3: [f64; MOST_GATES],
    /// Days since the canals opened, for turns.
    rotation_day: u32,
    any_open: bool,
}

/// Everything that a day brought, told in the evening.
#[derive(Clone, Debug)]
pub struct Evening {
    /// Water year, day and month.
    pub today: CalendarDay,
    /// What came off the slopes.
    pub basin: BasinDay,
    /// How the river was shared. Entries beyond the last gate are stale.
    pub river: RiverDay,
    /// Gates in use.
    pub gates: usize,
    /// What each gate asked for at its head, at most what its canal carries, m³. Under rotation only the gate on turn
    /// asks.
    pub demand_m3: [f64; MOST_GATES],
    /// Lost on the way in each canal, m³.
    pub conveyance_loss_m3: [f64; MOST_GATES],
    /// What each gate's fields did.
    pub fields: [FieldsDay; MOST_GATES],
    /// Used up by each town, m³.
    pub town_used_m3: [f64; MOST_GATES],
    /// Lost at depth: of canals and fields, m³.
    pub deep_loss_m3: f64,
    /// Rain on the lake, m³.
    pub lake_rain_m3: f64,
    /// Surface of the lake in the morning, m².
    pub lake_area_m2: f64,
    /// River minimum of the day, m³.
    pub minimum_m3: f64,
    /// Put into the reservoir by the starting-storage dial this morning, m³; negative where taken out.
    pub set_storage_m3: f64,
    /// Active content in the evening, m³.
    pub content_m3: f64,
    /// Active capacity, m³.
    pub active_m3: f64,
    /// Natural flow that passed the dam above what the outlet carries, and stored water over the spillway, m³.
    pub spill_m3: f64,
    /// Day of the turns, 0 when the canals open; rotation only.
    pub rotation_day: u32,
    /// Days of a round of turns; 0 without rotation.
    pub cycle_days: u32,
}

impl Works {
    /// The works of `valley` under `dials`.
    ///
    /// # Errors
    /// A value of the valley's river that makes no sense; `place` lets none through.
    pub fn new(valley: &Valley, dials: &Dials) -> Result<Self, RiverFault> {
        let vessel = valley.reservoir.as_ref().map(|reservoir| Vessel::new(reservoir, dials.reservoir_size));
        let reservoir = valley.reservoir.as_ref();
        let setup = RiverSetup {
            rule: valley.rule,
            gates: valley.gates.iter().map(|gate| river_gate(gate, dials)).collect(),
            active_m3: vessel.as_ref().map_or(0.0, |vessel| vessel.active_m3),
            outlet_m3: reservoir.map_or(f64::INFINITY, |reservoir| m3_per_day(reservoir.outlet_m3s)),
            reservoir_date: reservoir.map_or(canals::PriorityDate::year(9999), |reservoir| reservoir.right_date),
            minimum_date: valley.minimum.right_date,
            minimum_place: valley.minimum.at,
            pool_serves_minimum: reservoir.is_some_and(|reservoir| reservoir.serves_minimum),
        };
        let river = River::new(&setup)?;
        let cycle_days = river.cycle_days();
        let heads = valley
            .gates
            .iter()
            .zip(&setup.gates)
            .map(|(gate, on_river)| Head::new(gate, on_river, valley.rule, cycle_days, dials))
            .collect();
        let no_space = heapless::Vec::new();
        let mut flood_space = YearlyRule::joined(reservoir.map_or(&no_space, |reservoir| &reservoir.flood_space), 0.0);
        flood_space.scale(M3_PER_HM3);
        let mut minimum = YearlyRule::stepped(&valley.minimum.rate_m3s, 0.0);
        minimum.scale(m3_per_day(1.0 + dials.river_minimum / 100.0));
        Ok(Self {
            river,
            vessel,
            lake_factor: valley.evaporation.lake_factor,
            flood_space_m3: flood_space,
            minimum_m3: minimum,
            heads,
            hedging: reservoir.and_then(|reservoir| reservoir.hedging),
            starting_share: dials.starting_storage.map(|percent| percent / 100.0),
            start_storage_share: valley.start.storage_share,
            start_soil_share: valley.start.soil_share,
            rule: valley.rule,
            outlet_m3: setup.outlet_m3,
        })
    }

    /// What is in store on the morning of `today`, as the place says.
    pub fn start(&self, today: &CalendarDay) -> WorksStores {
        let mut river = RiverState::default();
        self.river.set_storage(&mut river, self.starting_share.unwrap_or(self.start_storage_share));
        let mut plots = [PlotStores::default(); MOST_GATES];
        for (head, plots) in self.heads.iter().zip(&mut plots) {
            if let User::Fields(fields) = &head.user {
                *plots = fields.start(self.start_soil_share, today.month_day);
            }
        }
        WorksStores {
            river,
            plots,
            at_edges_m3: [0.0; MOST_GATES],
            for_river_m3: [0.0; MOST_GATES],
            rotation_day: 0,
            any_open: false,
        }
    }

    /// Active content of the reservoir, m³.
    pub fn content_m3(&self, stores: &WorksStores) -> f64 {
        self.river.content_m3(&stores.river)
    }

    /// Active capacity of the reservoir, m³.
    pub fn active_m3(&self) -> f64 {
        self.vessel.as_ref().map_or(0.0, |vessel| vessel.active_m3)
    }

    /// The lake's table; `None` without a reservoir.
    pub fn vessel(&self) -> Option<&Vessel> {
        self.vessel.as_ref()
    }

    /// Water in all root zones, m³.
    pub fn root_zones_m3(&self, stores: &WorksStores) -> f64 {
        self.heads
            .iter()
            .zip(&stores.plots)
            .map(|(head, plots)| match &head.user {
                User::Fields(fields) => fields.held_m3(plots),
                User::Town { .. } => 0.0,
            })
            .sum()
    }

    /// Water on its way back to the river, m³.
    pub fn returning_m3(&self, stores: &WorksStores) -> f64 {
        stores.river.return_store_m3[..self.heads.len()].iter().sum()
    }

    /// Runs the days from `stores`, telling `each` every evening. `evening` is scratch that is written over.
    pub fn run(
        &self,
        stores: &mut WorksStores,
        calendar: &[CalendarDay],
        basin: &[BasinDay],
        evening: &mut Evening,
        mut each: impl FnMut(&Evening, &WorksStores),
    ) {
        for (today, basin) in calendar.iter().zip(basin) {
            self.day(stores, today, basin, evening);
            each(evening, stores);
        }
    }

    /// One day.
    pub fn day(&self, stores: &mut WorksStores, today: &CalendarDay, basin: &BasinDay, evening: &mut Evening) {
        evening.today = *today;
        evening.basin = *basin;
        evening.gates = self.heads.len();
        evening.set_storage_m3 = 0.0;
        if today.day_of_water_year == 1 {
            self.river.start_year(&mut stores.river);
            if let Some(share) = self.starting_share {
                let before_m3 = self.content_m3(stores);
                self.river.set_storage(&mut stores.river, share);
                evening.set_storage_m3 = self.content_m3(stores) - before_m3;
            }
        }

        let (mut lake_evaporation_m3, mut flood_limit_m3) = (0.0, f64::INFINITY);
        (evening.lake_rain_m3, evening.lake_area_m2, evening.active_m3) = (0.0, 0.0, 0.0);
        if let Some(vessel) = &self.vessel {
            let area_m2 = vessel.area_m2(vessel.dead_m3 + self.content_m3(stores));
            lake_evaporation_m3 = basin.reference_evaporation_mm * self.lake_factor / 1000.0 * area_m2;
            evening.lake_rain_m3 = basin.valley_precipitation_mm / 1000.0 * area_m2;
            evening.lake_area_m2 = area_m2;
            evening.active_m3 = vessel.active_m3;
            let space_m3 = self.flood_space_m3.on(today.month_day);
            flood_limit_m3 = if space_m3 < vessel.active_m3 { vessel.active_m3 - space_m3 } else { 0.0 };
        }
        evening.minimum_m3 = self.minimum_m3.on(today.month_day);

        let (mut wished_m3, mut any_open) = (0.0, false);
        for (index, head) in self.heads.iter().enumerate() {
            let open = head.season.holds(today.month_day);
            if let User::Fields(fields) = &head.user {
                fields.morning(&mut stores.plots[index], today.month_day);
            }
            any_open |= open;
            let at_end_m3 = match &head.user {
                _ if !open => 0.0,
                User::Fields(fields) => fields.asked_m3(&stores.plots[index]),
                User::Town { town, growth } => {
                    let more_m3 = if town.summer.holds(today.month_day) { town.summer_more_m3 } else { 0.0 };
                    (town.daily_m3 + more_m3) * growth
                }
            };
            stores.at_edges_m3[index] = at_end_m3;
            stores.for_river_m3[index] = at_end_m3 * head.head_per_end * head.turn_per_cycle;
            let asked_m3 = at_end_m3 * head.head_per_end;
            evening.demand_m3[index] = if asked_m3 < head.canal_m3 { asked_m3 } else { head.canal_m3 };
            wished_m3 += evening.demand_m3[index];
        }
        // Turns start afresh when the first canal opens; where one is always open, with the water year.
        let starts_afresh = any_open && (!stores.any_open || today.day_of_water_year == 1 && self.always_open());
        stores.rotation_day = if starts_afresh { 0 } else { stores.rotation_day + 1 };
        stores.any_open = any_open;
        evening.rotation_day = stores.rotation_day;
        evening.cycle_days = if self.rule == SharingRule::Rotation { self.river.cycle_days() } else { 0 };

        let stored_limit_m3 = self.hedging.as_ref().map_or(f64::INFINITY, |hedging| {
            let at_hand_m3 = self.content_m3(stores) + basin.inflow_m3 * hedging.days_ahead;
            wished_m3 * hedging.share(at_hand_m3, wished_m3 * hedging.days_ahead)
        });
        let input = RiverInput {
            inflow_m3: basin.inflow_m3,
            lake_evaporation_m3,
            lake_rain_m3: evening.lake_rain_m3,
            flood_limit_m3,
            minimum_m3: evening.minimum_m3,
            stored_limit_m3,
            rotation_day: stores.rotation_day,
            demand_m3: &stores.for_river_m3,
        };
        self.river.day(&mut stores.river, &input, &mut evening.river);
        if self.rule == SharingRule::Rotation {
            for (index, demand_m3) in evening.demand_m3[..self.heads.len()].iter_mut().enumerate() {
                *demand_m3 = if evening.river.turn_gate == Some(index) { evening.river.wish_m3[index] } else { 0.0 };
            }
        }
        evening.content_m3 = evening.river.content_m3;
        let passed_m3 = evening.river.natural_flow_m3 - evening.river.reservoir_take_m3;
        let over_outlet_m3 = if passed_m3 > self.outlet_m3 { passed_m3 - self.outlet_m3 } else { 0.0 };
        evening.spill_m3 = evening.river.spill_m3 + over_outlet_m3;

        evening.deep_loss_m3 = 0.0;
        for (index, head) in self.heads.iter().enumerate() {
            let head_m3 = evening.river.canal_m3[index];
            let on_the_way_m3 = head.conveyance_loss_share * head_m3;
            let arrived_m3 = head_m3 - on_the_way_m3;
            let lost_m3 = match &head.user {
                User::Fields(fields) => {
                    fields.day(
                        &mut stores.plots[index],
                        arrived_m3,
                        stores.at_edges_m3[index],
                        basin.valley_precipitation_mm,
                        basin.reference_evaporation_mm,
                        &mut evening.fields[index],
                    );
                    evening.town_used_m3[index] = 0.0;
                    on_the_way_m3 + evening.fields[index].lost_m3
                }
                User::Town { town, .. } => {
                    let used_m3 = arrived_m3 * town.used_up_share;
                    evening.town_used_m3[index] = used_m3;
                    on_the_way_m3 + (arrived_m3 - used_m3)
                }
            };
            evening.conveyance_loss_m3[index] = on_the_way_m3;
            evening.deep_loss_m3 += self.river.settle(&mut stores.river, index, lost_m3);
        }
    }

    fn always_open(&self) -> bool {
        self.heads.iter().any(|head| head.season == Season::ALL_YEAR)
    }
}

impl Head {
    fn new(gate: &Gate, on_river: &canals::Gate, rule: SharingRule, cycle_days: u32, dials: &Dials) -> Self {
        let user = match &gate.purpose {
            Purpose::Fields(fields) => {
                User::Fields(Plots::new(fields, 1.0 + dials.diversion / 100.0, dials.crop_mix / 100.0))
            }
            Purpose::Town(town) => User::Town { town: *town, growth: 1.0 + dials.town_growth / 100.0 },
        };
        let by_turns = rule == SharingRule::Rotation && cycle_days > 0 && matches!(user, User::Fields(_));
        Self {
            user,
            season: gate.season,
            canal_m3: on_river.canal_m3,
            conveyance_loss_share: on_river.conveyance_loss_share,
            head_per_end: 1.0 / (1.0 - on_river.conveyance_loss_share),
            turn_per_cycle: if by_turns { f64::from(gate.turn_days) / f64::from(cycle_days) } else { 1.0 },
        }
    }
}

/// The gate as the river sees it, in m³ a day, under the dials. The diversion dial widens a canal with the land that it
/// waters; lining takes its share of the conveyance loss. Towns keep their pipe.
fn river_gate(gate: &Gate, dials: &Dials) -> canals::Gate {
    let town = match &gate.purpose {
        Purpose::Town(town) => Some(town),
        Purpose::Fields(_) => None,
    };
    let (widened, unlined) =
        if town.is_some() { (1.0, 1.0) } else { (1.0 + dials.diversion / 100.0, 1.0 - dials.canal_lining / 100.0) };
    canals::Gate {
        right_date: gate.right_date,
        decreed_m3: m3_per_day(gate.decreed_m3s),
        canal_m3: m3_per_day(gate.canal_m3s) * widened,
        storage_share: gate.storage_share,
        stored_loss_share: gate.stored_loss_share,
        yearly_limit_m3: gate.yearly_limit_hm3 * M3_PER_HM3,
        conveyance_loss_share: gate.conveyance_loss_share * unlined,
        // Fields keep their own account of what is used; the river asks for it only where a town does not.
        field_efficiency: town.map_or(1.0, |town| town.used_up_share),
        return_share: gate.return_share,
        return_days: gate.return_days,
        return_above: gate.return_above,
        turn_days: gate.turn_days,
    }
}

impl Default for Evening {
    fn default() -> Self {
        Self {
            today: CalendarDay {
                water_year: 0,
                day_of_year: 1,
                day_of_water_year: 1,
                month_day: super::calendar::MonthDay { month: 1, day: 1 },
            },
            basin: BasinDay::default(),
            river: RiverDay::default(),
            gates: 0,
            demand_m3: [0.0; MOST_GATES],
            conveyance_loss_m3: [0.0; MOST_GATES],
            fields: [FieldsDay::default(); MOST_GATES],
            town_used_m3: [0.0; MOST_GATES],
            deep_loss_m3: 0.0,
            lake_rain_m3: 0.0,
            lake_area_m2: 0.0,
            minimum_m3: 0.0,
            set_storage_m3: 0.0,
            content_m3: 0.0,
            active_m3: 0.0,
            spill_m3: 0.0,
            rotation_day: 0,
            cycle_days: 0,
        }
    }
}
