//! Invented valleys and weather for tests and benchmarks: plain values, no files.
#![allow(dead_code, reason = "each test takes what it needs")]

use chrono::NaiveDate;
use deshielo::water::calendar::{CalendarDay, MonthDay, Season, fill_calendar};
use deshielo::water::canals::{MinimumPlace, PriorityDate, SharingRule};
use deshielo::water::evaporation::{EvaporationDay, Method};
use deshielo::water::valley::*;
use deshielo::water::weather::StationDay;

/// 1 March and the like.
pub fn on(month: u8, day: u8) -> MonthDay {
    MonthDay::new(month, day).unwrap()
}

/// A northern basin of `bands` bands from 2200 to 3700 m, with nothing below the dam.
pub fn bare_basin(bands: usize) -> Valley {
    let step_m = 1500.0 / bands as f64;
    Valley {
        latitude_deg: 40.0,
        water_year_start_month: 10,
        station_elevation_m: 2300.0,
        climb: Climb {
            lapse_c_per_km: [-6.5; 12],
            precipitation_per_100m: 0.05,
            precipitation_factor: 1.0,
            snow_catch_factor: 1.1,
            warming_weight: [1.0; 4],
        },
        rain_snow: RainSnow { all_snow_below_c: -0.5, all_rain_above_c: 2.5, wet_bulb: false },
        snow: SnowTraits {
            melt_above_c: 0.0,
            melt_factor_mm_c_day: 3.5,
            melt_swing_mm_c_day: 1.5,
            refreeze_share: 0.05,
            liquid_holding_share: 0.1,
            heat_of_rain: true,
            full_cover_mm: 40.0,
            sublimation_mm_day: 0.0,
        },
        evaporation: EvaporationTraits {
            method: Method::HargreavesSamani,
            reference_elevation_m: 2300.0,
            lake_factor: 1.05,
        },
        soil: SoilTraits { capacity_mm: 150.0, recharge_power: 2.5, dry_share: 0.7 },
        ground: GroundTraits { quick_days: 5.0, slow_days: 60.0, percolation_mm_day: 1.2 },
        channel: ChannelTraits { unit_hydrograph_base_days: 2.5, reach: None },
        bands: (0..bands)
            .map(|index| Band {
                area_km2: 20.0 + index as f64,
                elevation_m: 2200.0 + step_m * (index as f64 + 0.5),
                melt_exposure: 1.0,
                evaporation_factor: 1.0 - 0.02 * index as f64,
            })
            .collect(),
        reservoir: None,
        gates: heapless::Vec::new(),
        minimum: RiverMinimum {
            at: MinimumPlace::RiverEnd,
            right_date: PriorityDate::BeforeAll,
            rate_m3s: heapless::Vec::new(),
        },
        rule: SharingRule::Seniority,
        start: Start {
            snow_mm: 0.0,
            soil_share: 0.5,
            quick_mm: 5.0,
            slow_mm: 40.0,
            storage_share: 0.5,
            settling_years: 0,
        },
        enough_share: 0.9,
        survey: on(4, 1),
        spring_months: (4, 7),
    }
}

/// Numbers between 0 and 1 (linear congruential, Numerical Recipes constants).
pub fn numbers(seed: u32) -> impl FnMut() -> f64 {
    let mut state = seed;
    move || {
        state = state.wrapping_mul(1_664_525).wrapping_add(1_013_904_223);
        f64::from(state) / 4_294_967_296.0
    }
}

/// `years` water years of invented weather from 1 October 1980.
pub fn record(valley: &Valley, years: i32, seed: u32) -> (Vec<CalendarDay>, Vec<StationDay>) {
    let start_month = u32::from(valley.water_year_start_month);
    let start = NaiveDate::from_ymd_opt(1980, start_month, 1).unwrap();
    let end = NaiveDate::from_ymd_opt(1980 + years, start_month, 1).unwrap();
    let days = (end - start).num_days() as usize;
    let blank = CalendarDay { water_year: 0, day_of_year: 1, day_of_water_year: 1, month_day: on(1, 1) };
    let mut calendar = vec![blank; days];
    fill_calendar(start, valley.water_year_start_month, &mut calendar);
    let mut next = numbers(seed);
    let (mut wet, mut drift) = (false, 0.0);
    let coldest_day = if valley.is_southern() { 197.0 } else { 15.0 };
    let record = calendar
        .iter()
        .map(|day| {
            let angle = 2.0 * std::f64::consts::PI * (f64::from(day.day_of_year) - coldest_day) / 365.0;
            let season = 0.5 + 0.5 * libm::cos(angle);
            wet = next() < if wet { 0.62 } else { 0.18 + 0.14 * season };
            let depth = -libm::log(1.0 - next()) * (4.0 + 3.0 * season);
            drift = 0.75 * drift + 4.0 * (next() + next() + next() - 1.5);
            let mean = 6.0 - 11.0 * libm::cos(angle) + drift;
            let range = 8.0 + 6.0 * next();
            let air = EvaporationDay::from_extremes(mean - range / 2.0, mean + range / 2.0);
            StationDay::at_station(valley, day.month_index(), if wet { depth } else { 0.0 }, air)
        })
        .collect();
    (calendar, record)
}

/// A crop with a season of 150 days from 15 April (15 October in the south).
pub fn crop(southern: bool) -> CropOnField {
    CropOnField {
        traits: deshielo::water::crop::CropTraits {
            coefficient_initial: 0.4,
            coefficient_mid: 1.1,
            coefficient_end: 0.6,
            stage_days: [20, 40, 60, 30],
            root_depth_m: 1.0,
            depletion_share: 0.5,
            yield_response: Some(1.05),
        },
        planting: if southern { on(10, 15) } else { on(4, 15) },
        refill_to_share: 0.5,
        watered: true,
        off_season_coefficient: 0.15,
    }
}

/// Land at rest.
pub fn at_rest() -> CropOnField {
    let mut crop = crop(false);
    crop.traits.stage_days = [0; 4];
    crop.traits.yield_response = None;
    CropOnField { watered: false, off_season_coefficient: 0.2, ..crop }
}

/// A canal with one field of `area_ha` and a right of `right_year`.
pub fn canal(area_ha: f64, right_year: i32, return_above: u8) -> Gate {
    Gate {
        right_date: PriorityDate::year(right_year),
        decreed_m3s: area_ha * 0.000_6,
        canal_m3s: area_ha * 0.001,
        storage_share: 0.0,
        stored_loss_share: 0.0,
        yearly_limit_hm3: f64::INFINITY,
        conveyance_loss_share: 0.15,
        return_share: 0.5,
        return_days: 25.0,
        return_above,
        turn_days: 2,
        season: Season { from: on(4, 1), to: on(10, 15) },
        purpose: Purpose::Fields(
            heapless::Vec::from_slice(&[Field {
                area_ha,
                crop: crop(false),
                swap_to: Some(at_rest()),
                efficiency: 0.65,
                soil_holds_mm_per_m: 140.0,
                most_watering_mm_day: 9.0,
            }])
            .unwrap(),
        ),
    }
}

/// A town that needs `daily_m3`.
pub fn town(daily_m3: f64, right_year: i32, return_above: u8) -> Gate {
    Gate {
        canal_m3s: daily_m3 * 3.0 / 86_400.0,
        decreed_m3s: daily_m3 * 3.0 / 86_400.0,
        conveyance_loss_share: 0.05,
        season: Season::ALL_YEAR,
        purpose: Purpose::Town(Town {
            daily_m3,
            summer_more_m3: 0.6 * daily_m3,
            summer: Season { from: on(5, 15), to: on(9, 15) },
            used_up_share: 0.4,
        }),
        ..canal(1.0, right_year, return_above)
    }
}

/// A reservoir of `capacity_hm3` with a tenth of it dead.
pub fn reservoir(capacity_hm3: f64) -> Reservoir {
    let point = |share: f64| LakePoint {
        level_m: 40.0 * share,
        area_km2: 0.05 * capacity_hm3 * share,
        volume_hm3: capacity_hm3 * share * share,
    };
    Reservoir {
        table: [0.0, 0.2, 0.4, 0.6, 0.8, 1.0].into_iter().map(point).collect(),
        dead_hm3: capacity_hm3 * 0.1,
        capacity_hm3,
        outlet_m3s: capacity_hm3 * 0.3,
        right_date: PriorityDate::year(1910),
        flood_space: heapless::Vec::new(),
        serves_minimum: true,
        hedging: None,
    }
}

/// A basin with a reservoir, four canals of different rights and a town.
pub fn whole_valley() -> Valley {
    let mut valley = bare_basin(10);
    valley.start.settling_years = 1;
    valley.reservoir = Some(reservoir(80.0));
    let shares = [0.3, 0.2, 0.15, 0.1];
    for (index, (area_ha, year)) in [(3000.0, 1921), (2500.0, 1889), (3500.0, 1935), (1500.0, 1868)].iter().enumerate()
    {
        let mut gate = canal(*area_ha, *year, (index + 2) as u8);
        gate.storage_share = shares[index];
        valley.gates.push(gate).unwrap();
    }
    let mut pueblo = town(9000.0, 1900, 6);
    pueblo.storage_share = 0.05;
    valley.gates.push(pueblo).unwrap();
    valley.minimum.rate_m3s = heapless::Vec::from_slice(&[(on(10, 1), 0.6), (on(4, 1), 1.0)]).unwrap();
    valley.minimum.right_date = PriorityDate::year(1975);
    valley
}

/// A place at random in every respect that the contract allows, with dials at random.
pub fn random_valley(seed: u32) -> (Valley, deshielo::water::dials::Dials) {
    use deshielo::water::dials::{Dial, Dials};
    let mut next = numbers(seed);
    let mut valley = bare_basin(1 + (next() * 32.0) as usize);
    let southern = next() < 0.3;
    if southern {
        valley.latitude_deg = -33.0;
        valley.water_year_start_month = 4;
        valley.survey = on(9, 1);
        valley.spring_months = (10, 1);
    }
    for lapse in &mut valley.climb.lapse_c_per_km {
        *lapse = -4.0 - 4.0 * next();
    }
    valley.climb.precipitation_per_100m = -0.02 + 0.1 * next();
    valley.climb.snow_catch_factor = 1.0 + 0.4 * next();
    valley.climb.warming_weight = [next() * 2.0, next() * 2.0, next() * 2.0, next() * 2.0];
    valley.snow.heat_of_rain = next() < 0.5;
    valley.snow.sublimation_mm_day = if next() < 0.5 { 0.0 } else { next() };
    valley.snow.full_cover_mm = 1.0 + 80.0 * next();
    valley.soil.recharge_power = if next() < 0.5 { 2.5 } else { 0.8 + 5.0 * next() };
    valley.soil.capacity_mm = 20.0 + 400.0 * next();
    valley.ground.quick_days = 0.5 + 20.0 * next();
    valley.ground.percolation_mm_day = 3.0 * next();
    valley.channel.unit_hydrograph_base_days = 0.2 + 19.8 * next();
    if next() < 0.4 {
        // 2 K X ≤ 1 ≤ 2 K (1 − X).
        let inflow_weight = 0.3 * next();
        let (low, high) = (0.5 / (1.0 - inflow_weight), 0.5 / inflow_weight.max(0.05));
        let travel_days = low + (high - low) * next();
        valley.channel.reach = Some(ReachTraits { travel_days, inflow_weight });
    }
    valley.rule = [SharingRule::Seniority, SharingRule::Proportional, SharingRule::Rotation][(next() * 2.999) as usize];
    if next() < 0.75 {
        let mut dam = reservoir(5.0 + 150.0 * next());
        dam.outlet_m3s *= next() * 2.0;
        dam.right_date = PriorityDate::year(1850 + (next() * 150.0) as i32);
        dam.serves_minimum = next() < 0.5;
        if next() < 0.5 {
            let space = dam.capacity_hm3 * next();
            dam.flood_space = heapless::Vec::from_slice(&[(on(2, 1), space), (on(6, 15), 0.0)]).unwrap();
        }
        if next() < 0.4 {
            dam.hedging = Some(Hedging { days_ahead: 20.0 + 60.0 * next(), starts_at: 0.4, ends_at: 1.6 });
        }
        valley.reservoir = Some(dam);
    }
    let gates = if next() < 0.15 { 0 } else { 1 + (next() * 23.99) as usize };
    let mut shares_left = 1.0;
    for index in 0..gates {
        let year = 1850 + (next() * 150.0) as i32;
        let below = index as u8 + 1 + (next() * (gates - index + 1) as f64) as u8;
        let return_above = if next() < 0.2 { 1 + (next() * gates as f64) as u8 } else { below.min(gates as u8 + 1) };
        let mut gate = if next() < 0.2 {
            town(500.0 + 20_000.0 * next(), year, return_above)
        } else {
            let mut gate = canal(100.0 + 3000.0 * next(), year, return_above);
            if let Purpose::Fields(fields) = &mut gate.purpose {
                let first = fields[0];
                for _ in 0..(next() * 8.0) as usize {
                    let mut field = Field { area_ha: 20.0 + 400.0 * next(), efficiency: 0.4 + 0.6 * next(), ..first };
                    field.crop.planting = if southern { on(10, 5) } else { on(4, 1 + (next() * 27.0) as u8) };
                    field.swap_to = if next() < 0.5 { Some(at_rest()) } else { None };
                    field.crop.refill_to_share = next();
                    let _ = fields.push(field);
                }
            }
            if southern {
                gate.season = Season { from: on(9, 15), to: on(4, 20) };
            }
            gate
        };
        gate.storage_share = shares_left * next() * 0.4;
        shares_left -= gate.storage_share;
        gate.stored_loss_share = if next() < 0.3 { 0.3 * next() } else { 0.0 };
        gate.yearly_limit_hm3 = if next() < 0.3 { 20.0 * next() } else { f64::INFINITY };
        gate.conveyance_loss_share = 0.6 * next();
        gate.return_share = next();
        gate.return_days = if next() < 0.2 { 0.0 } else { 80.0 * next() };
        gate.turn_days = (next() * 5.0) as u16;
        gate.decreed_m3s *= 0.3 + 2.0 * next();
        valley.gates.push(gate).unwrap();
    }
    if next() < 0.6 {
        valley.minimum.rate_m3s =
            heapless::Vec::from_slice(&[(on(1, 1), 2.0 * next()), (on(5, 1), 2.0 * next())]).unwrap();
        valley.minimum.at = if next() < 0.5 { MinimumPlace::Dam } else { MinimumPlace::RiverEnd };
        if next() < 0.5 {
            valley.minimum.right_date = PriorityDate::year(1850 + (next() * 150.0) as i32);
        }
    }
    valley.start.settling_years = (next() * 3.0) as u8;
    let mut dials = Dials::REST;
    for dial in Dial::ALL {
        if next() < 0.5 {
            let range = dial.widest();
            let steps = ((range.most - range.least) / range.step * next()).round();
            dials = dials.with(dial, range.least + steps * range.step);
        }
    }
    (valley, dials)
}

/// A whole run: basin, then works.
pub struct Ran {
    /// Days of the basin.
    pub basin: Vec<deshielo::water::basin::BasinDay>,
    /// Every whole water year.
    pub years: Vec<deshielo::signs::YearReport>,
}

/// Runs a valley over a record.
pub fn run(
    valley: &Valley,
    dials: &deshielo::water::dials::Dials,
    calendar: &[CalendarDay],
    record: &[StationDay],
) -> Ran {
    use deshielo::water::basin::{Basin, BasinDay};
    let mut basin_days = vec![BasinDay::default(); record.len()];
    let before = deshielo::water::run::run_basin(valley, &Basin::new(valley, dials), calendar, record, &mut basin_days);
    let works = deshielo::water::works::Works::new(valley, dials).unwrap();
    let mut years = Vec::new();
    deshielo::signs::read_run(valley, &works, calendar, &basin_days, &before, |_, _| {}, |year| years.push(year));
    Ran { basin: basin_days, years }
}
