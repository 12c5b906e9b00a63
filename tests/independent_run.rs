//! Every routine of the basin against an independent run (numpy), each fed that run's own inputs, to 1e-9.
//!
//! The parameters are the constants at the head of that run; its `k` of a ground store is `1 − exp(−1/T)` here.

mod support;

use deshielo::water::channel::{Channel, ChannelStore};
use deshielo::water::ground::{Ground, GroundStores};
use deshielo::water::lanes::Lanes;
use deshielo::water::power::{AnyPower, Halves, PowerCurve};
use deshielo::water::snow::{SnowConstants, SnowStore, melt_factor_mm_c_day};
use deshielo::water::soil::SoilConstants;
use deshielo::water::valley::{ChannelTraits, GroundTraits, RainSnow, SnowTraits, SoilTraits};
use deshielo::water::weather::precipitation_factor_at;
use support::{Columns, assert_column};

const MM_FLOOR: f64 = 1e-9;

fn split() -> RainSnow {
    RainSnow { all_snow_below_c: -0.5, all_rain_above_c: 2.5, wet_bulb: false }
}

fn snow() -> SnowTraits {
    SnowTraits {
        melt_above_c: 0.0,
        melt_factor_mm_c_day: 3.5,
        melt_swing_mm_c_day: 1.5,
        refreeze_share: 0.05,
        liquid_holding_share: 0.10,
        heat_of_rain: false,
        full_cover_mm: 20.0,
        sublimation_mm_day: 0.0,
    }
}

fn soil() -> SoilTraits {
    SoilTraits { capacity_mm: 120.0, recharge_power: 3.6, dry_share: 0.7 }
}

/// Residence time whose daily share is `k`.
fn days_of_share(k: f64) -> f64 {
    -1.0 / (-k).ln_1p()
}

#[test]
fn weather_and_snow_of_each_band() {
    let forcing = Columns::read("forcing.csv");
    let want = Columns::read("reference_bands.csv");
    let (doy, p, t) = (forcing.numbers("doy"), forcing.numbers("precip_mm"), forcing.numbers("tmean_c"));
    let climb = deshielo::water::valley::Climb {
        lapse_c_per_km: [-6.5; 12],
        precipitation_per_100m: 0.05,
        precipitation_factor: 1.0,
        snow_catch_factor: 1.0,
        warming_weight: [1.0; 4],
    };
    let constants = SnowConstants::<2>::new(&split(), &snow(), 1.0);
    for (band, elevation_m) in [(1, 2600.0), (2, 3100.0), (3, 3600.0)] {
        let factor = precipitation_factor_at(&climb, 2300.0, elevation_m);
        let mut store = SnowStore::<2>::default();
        let mut got: Vec<[f64; 9]> = Vec::new();
        for day in 0..doy.len() {
            let air_c = t[day] + climb.lapse_c_per_km[0] * (elevation_m - 2300.0) / 1000.0;
            let precipitation_mm = p[day] * factor;
            let melt_factor = melt_factor_mm_c_day(&snow(), doy[day] as u16, false);
            let out = constants.day(
                &mut store,
                Lanes::splat(precipitation_mm),
                Lanes::splat(air_c),
                Lanes::splat(air_c),
                Lanes::splat(melt_factor),
                Lanes::splat(0.0),
            );
            let lane = |lanes: Lanes<2>| lanes.0[1];
            got.push([
                air_c,
                precipitation_mm,
                lane(out.snowfall_mm),
                lane(out.rain_mm),
                lane(out.melt_mm),
                lane(out.refreeze_mm),
                lane(store.ice_mm),
                lane(store.liquid_mm),
                lane(out.outflow_mm),
            ]);
        }
        let names = ["temp", "precip", "fall", "rain", "melt", "refreeze", "ice", "liq", "out"];
        for (at, name) in names.into_iter().enumerate() {
            let column = format!("b{band}_{name}");
            let values: Vec<f64> = got.iter().map(|row| row[at]).collect();
            assert_column(&column, &values, &want.numbers(&column), 1e-9, MM_FLOOR);
        }
    }
}

#[test]
fn soil_fed_with_the_independent_outflow() {
    let want = Columns::read("reference_daily.csv");
    let (water, e0) = (want.numbers("snow_out_mm"), Columns::read("forcing.csv").numbers("pet_mm"));
    let constants = SoilConstants::<2>::new(&soil());
    let curve = AnyPower(Lanes::splat(3.6));
    let mut soil_mm = Lanes::splat(60.0);
    let (mut recharge, mut evaporation, mut store) = (Vec::new(), Vec::new(), Vec::new());
    for (water, e0) in water.iter().zip(&e0) {
        // The independent run has no snow cover over the soil.
        let day = constants.day(&mut soil_mm, curve, Lanes::splat(*water), Lanes::splat(*e0), Lanes::splat(0.0));
        recharge.push(day.recharge_mm.0[0]);
        evaporation.push(day.evaporation_mm.0[0]);
        store.push(soil_mm.0[0]);
    }
    assert_column("recharge_mm", &recharge, &want.numbers("recharge_mm"), 1e-9, MM_FLOOR);
    assert_column("aet_mm", &evaporation, &want.numbers("aet_mm"), 1e-9, MM_FLOOR);
    assert_column("soil_mm", &store, &want.numbers("soil_mm"), 1e-9, MM_FLOOR);
}

#[test]
fn ground_stores_fed_with_the_independent_recharge() {
    let want = Columns::read("reference_daily.csv");
    let ground = Ground::new(&GroundTraits {
        quick_days: days_of_share(0.18),
        slow_days: days_of_share(0.02),
        percolation_mm_day: 1.2,
    });
    let mut stores = GroundStores { quick_mm: 5.0, slow_mm: 40.0 };
    let mut got = [const { Vec::new() }; 5];
    for recharge in want.numbers("recharge_mm") {
        let day = ground.day(&mut stores, recharge);
        let values = [day.percolation_mm, day.quick_flow_mm, day.slow_flow_mm, stores.quick_mm, stores.slow_mm];
        for (column, value) in got.iter_mut().zip(values) {
            column.push(value);
        }
    }
    for (name, column) in ["perc_mm", "q_quick_mm", "q_slow_mm", "quick_store_mm", "slow_store_mm"].iter().zip(&got) {
        assert_column(name, column, &want.numbers(name), 1e-9, MM_FLOOR);
    }
}

#[test]
fn routing_fed_with_the_independent_flow() {
    let want = Columns::read("reference_daily.csv");
    let channel = Channel::new(&ChannelTraits { unit_hydrograph_base_days: 2.5, reach: None });
    let mut store = ChannelStore::default();
    let routed: Vec<f64> =
        want.numbers("q_gen_mm").into_iter().map(|generated| channel.day(&mut store, generated)).collect();
    assert_column("q_routed_mm", &routed, &want.numbers("q_routed_mm"), 1e-9, MM_FLOOR);
    let inflow: Vec<f64> = routed.iter().map(|mm| mm * 24.0 * deshielo::water::units::M3_PER_MM_KM2).collect();
    assert_column("inflow_m3", &inflow, &want.numbers("inflow_m3"), 1e-9, 1e-3);
}

#[test]
fn the_square_root_curve_and_the_general_curve_agree_in_the_soil() {
    let soil = SoilTraits { recharge_power: 2.5, ..soil() };
    let constants = SoilConstants::<2>::new(&soil);
    let (mut by_root, mut by_power) = (Lanes::splat(60.0), Lanes::splat(60.0));
    for day in 0..400 {
        let water = Lanes::splat(f64::from(day % 13));
        fn step<C: PowerCurve<2>>(c: &SoilConstants<2>, s: &mut Lanes<2>, curve: C, water: Lanes<2>) -> f64 {
            c.day(s, curve, water, Lanes::splat(3.0), Lanes::splat(0.0)).recharge_mm.0[0]
        }
        let a = step(&constants, &mut by_root, Halves::<5>, water);
        let b = step(&constants, &mut by_power, AnyPower(Lanes::splat(2.5)), water);
        assert!((a - b).abs() <= 1e-10 * a.abs().max(1e-3), "day {day}: {a} and {b}");
    }
}
