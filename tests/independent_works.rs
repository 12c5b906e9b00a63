//! What is left of the independent run (numpy): the basin's sums over its bands, and its reservoir and two splits.
//!
//! Its reservoir is a fixture and not the product: there are no rights, accounts or root zones in it. It is built here
//! from the run's own description with the crate's vessel and crop curve, and each is fed the run's own inputs, to 1e-9.

mod support;
#[path = "support/valleys.rs"]
mod valleys;

use chrono::NaiveDate;
use deshielo::water::calendar::CalendarDay;
use deshielo::water::crop::CropTraits;
use deshielo::water::lake::Vessel;
use deshielo::water::lanes::Lanes;
use deshielo::water::power::Halves;
use deshielo::water::slopes::{LaneSums, LaneWeather, RowStore, Slopes, total_of_one};
use deshielo::water::snow::{SnowConstants, SnowStore, melt_factor_mm_c_day};
use deshielo::water::units::{M2_PER_KM2, M3_PER_HM3, M3_PER_MM_HECTARE};
use deshielo::water::valley::{Band, LakePoint, MOST_BANDS, Reservoir, Valley};
use deshielo::water::weather::precipitation_factor_at;
use support::{Columns, assert_column};

const MM_FLOOR: f64 = 1e-9;
const M3_FLOOR: f64 = 1e-3;

/// The independent run's basin: 24 km² in three bands, no heat of rain and no catch correction.
fn basin() -> Valley {
    let mut valley = valleys::bare_basin(3);
    for (band, (share, elevation_m)) in valley.bands.iter_mut().zip([(0.30, 2600.0), (0.45, 3100.0), (0.25, 3600.0)]) {
        *band = Band { area_km2: 24.0 * share, elevation_m, melt_exposure: 1.0, evaporation_factor: 1.0 };
    }
    valley.climb.snow_catch_factor = 1.0;
    valley.snow.heat_of_rain = false;
    valley
}

/// The basin's bands run by `lanes` of them a row, and the sums of every day.
fn sums<const L: usize>(slopes: &Slopes<L>, total: impl Fn(LaneSums<L>) -> [f64; 3]) -> [Vec<f64>; 3] {
    let forcing = Columns::read("forcing.csv");
    let dates = forcing.texts("date");
    let (precipitation, temperature) = (forcing.numbers("precip_mm"), forcing.numbers("tmean_c"));
    let traits = basin().snow;
    let mut stores = [RowStore::default(); MOST_BANDS];
    let mut columns = [const { Vec::new() }; 3];
    for day in 0..forcing.len() {
        let calendar = CalendarDay::new(dates[day].parse::<NaiveDate>().unwrap(), 10);
        let weather = LaneWeather {
            temperature_c: Lanes::splat(temperature[day]),
            precipitation_mm: Lanes::splat(precipitation[day]),
            reference_evaporation_mm: Lanes::splat(0.0),
            melt_factor: Lanes::splat(melt_factor_mm_c_day(&traits, calendar.day_of_year, false)),
            split_humidity_percent: None,
        };
        let mut day = [LaneSums::default()];
        slopes.days::<true>(Halves::<5>, &[calendar], &[weather], &mut stores, &mut day);
        let day = total(day[0]);
        for (column, value) in columns.iter_mut().zip(day) {
            column.push(value);
        }
    }
    columns
}

/// Snowfall and snow water of the basin. The rows keep the snow's other flows to themselves; they are compared below.
fn assert_snow(snowfall: &[f64], snow_water: &[f64]) {
    let want = Columns::read("reference_daily.csv");
    assert_column("snowfall_mm", snowfall, &want.numbers("snowfall_mm"), 1e-9, MM_FLOOR);
    assert_column("swe_mm", snow_water, &want.numbers("swe_mm"), 1e-9, MM_FLOOR);
}

#[test]
fn snow_over_the_bands_of_one_run() {
    let valley = basin();
    let [snowfall, snow_water, recharge] =
        sums(&Slopes::of_one(&valley), |day| [day.snowfall_mm, day.snow_water_mm, day.recharge_mm].map(total_of_one));
    assert_snow(&snowfall, &snow_water);
    assert!(recharge.iter().sum::<f64>() > 0.0, "the bands' soil passes nothing on");
}

#[test]
fn snow_over_the_bands_of_runs_side_by_side() {
    let valley = basin();
    for lane in 0..4 {
        let [snowfall, snow_water, _] = sums(&Slopes::of_many([&valley; 4]), |day| {
            [day.snowfall_mm, day.snow_water_mm, day.recharge_mm].map(|sum| sum.0[lane])
        });
        assert_snow(&snowfall, &snow_water);
    }
}

#[test]
fn every_flow_of_the_snow_with_the_bands_as_lanes() {
    let (forcing, want) = (Columns::read("forcing.csv"), Columns::read("reference_daily.csv"));
    let (doy, p, t) = (forcing.numbers("doy"), forcing.numbers("precip_mm"), forcing.numbers("tmean_c"));
    let valley = basin();
    let bands: [Band; 3] = valley.bands.as_slice().try_into().unwrap();
    let share = Lanes(bands.map(|band| band.area_km2 / valley.band_area_km2()));
    let factor =
        Lanes(bands.map(|b| precipitation_factor_at(&valley.climb, valley.station_elevation_m, b.elevation_m)));
    let offset_c = Lanes(bands.map(|b| -6.5 * (b.elevation_m - valley.station_elevation_m) / 1000.0));
    let constants = SnowConstants::<3>::new(&valley.rain_snow, &valley.snow, valley.climb.snow_catch_factor);
    let mut store = SnowStore::default();
    let mut columns = [const { Vec::new() }; 7];
    for day in 0..doy.len() {
        let air_c = Lanes::splat(t[day]) + offset_c;
        let fall_mm = Lanes::splat(p[day]) * factor;
        let melt_factor = Lanes::splat(melt_factor_mm_c_day(&valley.snow, doy[day] as u16, false));
        let out = constants.day(&mut store, fall_mm, air_c, air_c, melt_factor, Lanes::splat(0.0));
        let flows =
            [fall_mm, out.snowfall_mm, out.rain_mm, out.melt_mm, out.refreeze_mm, out.snow_water_mm, out.outflow_mm];
        for (column, flow) in columns.iter_mut().zip(flows) {
            column.push((share * flow).0.iter().sum::<f64>());
        }
    }
    let names = ["precip_mm", "snowfall_mm", "rain_mm", "melt_mm", "refreeze_mm", "swe_mm", "snow_out_mm"];
    for (name, column) in names.into_iter().zip(&columns) {
        assert_column(name, column, &want.numbers(name), 1e-9, MM_FLOOR);
    }
}

#[test]
fn precipitation_of_the_basin_run_with_weather_and_all() {
    use deshielo::water::basin::{Basin, BasinDay};
    use deshielo::water::dials::Dials;
    use deshielo::water::evaporation::{EvaporationDay, Method};
    use deshielo::water::weather::StationDay;

    let mut valley = basin();
    valley.evaporation.method = Method::Given;
    let (forcing, want) = (Columns::read("forcing.csv"), Columns::read("reference_daily.csv"));
    let start: NaiveDate = forcing.texts("date")[0].parse().unwrap();
    let mut calendar = vec![CalendarDay::new(start, 10); forcing.len()];
    deshielo::water::calendar::fill_calendar(start, 10, &mut calendar);
    let columns = ["precip_mm", "tmean_c", "pet_mm"].map(|name| forcing.numbers(name));
    let record: Vec<StationDay> = (0..forcing.len())
        .map(|day| {
            let [precipitation_mm, mean_temperature_c, given_mm] = columns.each_ref().map(|column| column[day]);
            let air = EvaporationDay {
                given_mm,
                tmean_c: mean_temperature_c,
                ..EvaporationDay::from_extremes(mean_temperature_c, mean_temperature_c)
            };
            StationDay { precipitation_mm, mean_temperature_c, relative_humidity_percent: f64::NAN, air }
        })
        .collect();
    let doy: Vec<f64> = calendar.iter().map(|day| f64::from(day.day_of_year)).collect();
    assert_column("doy", &doy, &forcing.numbers("doy"), 0.0, 0.0);
    let (basin, mut days) = (Basin::new(&valley, &Dials::REST), vec![BasinDay::default(); record.len()]);
    basin.run(&mut basin.start(), &calendar, &record, &mut days);
    let column = |of: fn(&BasinDay) -> f64| days.iter().map(of).collect::<Vec<_>>();
    assert_snow(&column(|day| day.snowfall_mm), &column(|day| day.snow_water_mm));
    assert_column("precip_mm", &column(|day| day.precipitation_mm), &want.numbers("precip_mm"), 1e-9, MM_FLOOR);
    assert_column("pet_mm", &column(|day| day.reference_evaporation_mm), &columns[2], 0.0, 0.0);
}

/// One of the independent run's three users, given most senior first.
struct User {
    area_ha: f64,
    conveyance_share: f64,
    field_share: f64,
    crop: CropTraits,
    start_day: u32,
}

fn users() -> [User; 3] {
    let crop = |coefficients: [f64; 3], stage_days| CropTraits {
        coefficient_initial: coefficients[0],
        coefficient_mid: coefficients[1],
        coefficient_end: coefficients[2],
        stage_days,
        root_depth_m: 1.0,
        depletion_share: 0.5,
        yield_response: None,
    };
    let user = |area_ha, conveyance_share, field_share, start_day, crop| User {
        area_ha,
        conveyance_share,
        field_share,
        crop,
        start_day,
    };
    [
        user(700.0, 0.70, 0.60, 100, crop([0.40, 0.95, 0.90], [10, 30, 120, 20])),
        user(900.0, 0.75, 0.75, 90, crop([0.30, 1.15, 0.40], [20, 30, 50, 30])),
        user(800.0, 0.95, 0.90, 121, crop([0.50, 1.15, 0.75], [25, 30, 45, 30])),
    ]
}

impl User {
    /// Asked for at the head gate on a day of the year, m³: no rain is counted.
    fn demand_m3(&self, day_of_year: u32, reference_evaporation_mm: f64) -> f64 {
        let day_of_season = (day_of_year + 1).saturating_sub(self.start_day);
        self.crop.coefficient_on(day_of_season) * reference_evaporation_mm * self.area_ha * M3_PER_MM_HECTARE
            / (self.conveyance_share * self.field_share)
    }
}

#[test]
fn demands_by_the_crop_curve() {
    let (forcing, want) = (Columns::read("forcing.csv"), Columns::read("reference_daily.csv"));
    let (doy, e0) = (forcing.numbers("doy"), forcing.numbers("pet_mm"));
    for (number, user) in users().iter().enumerate() {
        let name = format!("u{}_demand_m3", number + 1);
        let got: Vec<f64> = doy.iter().zip(&e0).map(|(doy, e0)| user.demand_m3(*doy as u32, *e0)).collect();
        assert!(got.iter().any(|demand_m3| *demand_m3 > 0.0));
        assert_column(&name, &got, &want.numbers(&name), 1e-9, M3_FLOOR);
    }
}

const DEAD_M3: f64 = 0.8e6;
const CAPACITY_M3: f64 = 8.0e6;
const KEPT_IN_RIVER_M3: f64 = 6_000.0;
const CANAL_M3: f64 = 150_000.0;
const LAKE_FACTOR: f64 = 1.05;

fn vessel() -> Vessel {
    let point = |(volume_m3, area_m2, level_m): (f64, f64, f64)| LakePoint {
        level_m,
        area_km2: area_m2 / M2_PER_KM2,
        volume_hm3: volume_m3 / M3_PER_HM3,
    };
    let table =
        [(0.0, 0.0, 0.0), (0.8e6, 0.12e6, 1.0), (2.5e6, 0.30e6, 2.0), (5.0e6, 0.48e6, 3.0), (8.0e6, 0.62e6, 4.0)];
    let reservoir = Reservoir {
        table: table.into_iter().map(point).collect(),
        dead_hm3: DEAD_M3 / M3_PER_HM3,
        capacity_hm3: CAPACITY_M3 / M3_PER_HM3,
        ..valleys::reservoir(8.0)
    };
    Vessel::new(&reservoir, 0.0)
}

#[test]
fn the_fixture_reservoir_with_the_crates_vessel() {
    let want = Columns::read("reference_daily.csv");
    let demands = ["u1", "u2", "u3"].map(|user| want.numbers(&format!("{user}_demand_m3")));
    let (inflow, e0) = (want.numbers("inflow_m3"), Columns::read("forcing.csv").numbers("pet_mm"));
    let lake = vessel();
    let mut volume_m3 = 3.0e6;
    let names = ["res_area_m2", "res_evap_m3", "env_release_m3", "divert_m3", "spill_m3", "storage_m3"];
    let mut columns = [const { Vec::new() }; 6];
    for day in 0..inflow.len() {
        let area_m2 = lake.area_m2(volume_m3);
        volume_m3 += inflow[day];
        let evaporation_m3 = (LAKE_FACTOR * e0[day] / 1000.0 * area_m2).min(volume_m3);
        volume_m3 -= evaporation_m3;
        let available_m3 = (volume_m3 - lake.dead_m3).max(0.0);
        let kept_m3 = KEPT_IN_RIVER_M3.min(available_m3);
        let asked_m3: f64 = demands.iter().map(|demand| demand[day]).sum();
        let diverted_m3 = asked_m3.min(available_m3 - kept_m3).min(CANAL_M3);
        volume_m3 -= kept_m3;
        volume_m3 -= diverted_m3;
        let spilled_m3 = (volume_m3 - lake.dead_m3 - lake.active_m3).max(0.0);
        volume_m3 -= spilled_m3;
        let values = [area_m2, evaporation_m3, kept_m3, diverted_m3, spilled_m3, volume_m3];
        for (column, value) in columns.iter_mut().zip(values) {
            column.push(value);
        }
    }
    assert!(columns[4].iter().any(|spilled_m3| *spilled_m3 > 0.0), "it spills");
    for (name, column) in names.into_iter().zip(&columns) {
        assert_column(name, column, &want.numbers(name), 1e-9, M3_FLOOR);
    }
}

/// A day of the crate's river with `supply_m3` at the gates and nothing else: what each of three gates gets.
fn shared(rule: deshielo::water::canals::SharingRule, supply_m3: f64, demands_m3: [f64; 3]) -> [f64; 3] {
    use deshielo::water::canals::*;
    let gates = (0..3).map(|at| Gate::plain(PriorityDate::year(1900 + at), 4)).collect();
    let setup = RiverSetup {
        rule,
        gates,
        active_m3: 0.0,
        outlet_m3: f64::INFINITY,
        reservoir_date: PriorityDate::year(1990),
        minimum_date: PriorityDate::year(1991),
        minimum_place: MinimumPlace::RiverEnd,
        pool_serves_minimum: false,
    };
    let mut demand_m3 = [0.0; MOST_GATES];
    demand_m3[..3].copy_from_slice(&demands_m3);
    let input = RiverInput {
        inflow_m3: supply_m3,
        lake_evaporation_m3: 0.0,
        lake_rain_m3: 0.0,
        flood_limit_m3: f64::INFINITY,
        minimum_m3: 0.0,
        stored_limit_m3: f64::INFINITY,
        rotation_day: 0,
        demand_m3: &demand_m3,
    };
    let mut out = RiverDay::default();
    River::new(&setup).unwrap().day(&mut RiverState::default(), &input, &mut out);
    [out.canal_m3[0], out.canal_m3[1], out.canal_m3[2]]
}

#[test]
fn both_splits_by_the_crates_river() {
    use deshielo::water::canals::SharingRule;
    let want = Columns::read("reference_daily.csv");
    let supply = want.numbers("divert_m3");
    let demands = ["u1", "u2", "u3"].map(|user| want.numbers(&format!("{user}_demand_m3")));
    for (rule, kind) in [(SharingRule::Seniority, "senior"), (SharingRule::Proportional, "share")] {
        let got: Vec<[f64; 3]> = (0..supply.len())
            .map(|day| shared(rule, supply[day], demands.each_ref().map(|demand| demand[day])))
            .collect();
        for user in 0..3 {
            let name = format!("u{}_{kind}_m3", user + 1);
            let column: Vec<f64> = got.iter().map(|day| day[user]).collect();
            assert_column(&name, &column, &want.numbers(&name), 1e-9, M3_FLOOR);
        }
    }
}
