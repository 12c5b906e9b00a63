//! The checks of `reference/reservoir.toml` that touch what is built; the others are named with the reason.

mod support;
#[path = "support/valleys.rs"]
mod valleys;

use std::collections::BTreeSet;

use deshielo::water::canals::{
    Gate, MOST_GATES, MinimumPlace, PriorityDate, River, RiverDay, RiverInput, RiverSetup, RiverState, SharingRule,
};
use deshielo::water::lake::Vessel;
use deshielo::water::units::{M2_PER_KM2, M3_PER_HM3};
use deshielo::water::valley::{LakePoint, Reservoir};
use support::{assert_check, checks, number, numbers};
use toml::Table;

/// Checks of what the crate does not do: spillway hydraulics (weir; a day's spill has no head), sizing a dam (sequent
/// peak), and canal and field efficiencies, of which a place says its own (FAO manual 4; its numbers are from memory).
const NOT_BUILT: [&str; 19] = [
    "application_drip",
    "application_sprinkler",
    "application_surface",
    "conveyance_clay",
    "conveyance_lined",
    "conveyance_loam",
    "conveyance_sand",
    "scheme_efficiency",
    "seepage_clay_loam_impervious",
    "seepage_clay_loam_ordinary_silt",
    "seepage_loose_sand",
    "seepage_porous_gravel",
    "seepage_reach",
    "seepage_sandy_clay_gravelly",
    "seepage_sandy_loam",
    "sequent_peak",
    "weir_broad",
    "weir_flow",
    "weir_us_si",
];

fn input(check: &Table, name: &str) -> f64 {
    number(&check["inputs"][name])
}

fn vessel(volumes_m3: &[f64], areas_m2: &[f64], dead_m3: f64, capacity_m3: f64) -> Vessel {
    let point = |(at, (volume_m3, area_m2)): (usize, (&f64, &f64))| LakePoint {
        level_m: at as f64,
        area_km2: area_m2 / M2_PER_KM2,
        volume_hm3: volume_m3 / M3_PER_HM3,
    };
    let table = volumes_m3.iter().zip(areas_m2).enumerate().map(point).collect();
    let reservoir = Reservoir {
        table,
        dead_hm3: dead_m3 / M3_PER_HM3,
        capacity_hm3: capacity_m3 / M3_PER_HM3,
        ..valleys::reservoir(1.0)
    };
    Vessel::new(&reservoir, 0.0)
}

/// A day of a river whose gates stand in order of their rights, with nothing stored.
fn river_day(rule: SharingRule, demands_m3: &[f64], inflow_m3: f64) -> (RiverDay, f64) {
    let gates =
        (0..demands_m3.len()).map(|at| Gate::plain(PriorityDate::year(1880 + at as i32), demands_m3.len() as u8 + 1));
    let setup = RiverSetup {
        rule,
        gates: gates.collect(),
        active_m3: 0.0,
        outlet_m3: f64::INFINITY,
        reservoir_date: PriorityDate::year(1999),
        minimum_date: PriorityDate::year(2000),
        minimum_place: MinimumPlace::RiverEnd,
        pool_serves_minimum: false,
    };
    let mut demand_m3 = [0.0; MOST_GATES];
    demand_m3[..demands_m3.len()].copy_from_slice(demands_m3);
    let input = RiverInput {
        inflow_m3,
        lake_evaporation_m3: 0.0,
        lake_rain_m3: 0.0,
        flood_limit_m3: f64::INFINITY,
        minimum_m3: 0.0,
        stored_limit_m3: f64::INFINITY,
        rotation_day: 0,
        demand_m3: &demand_m3,
    };
    let (mut state, mut out) = (RiverState::default(), RiverDay::default());
    River::new(&setup).unwrap().day(&mut state, &input, &mut out);
    let residual_m3 = out.residual_m3(&input);
    (out, residual_m3)
}

/// Asserts that a split gives the check's numbers, gate by gate, and loses no water.
fn assert_split(check: &Table, rule: SharingRule, demands_name: &str) {
    let demands = numbers(&check["inputs"][demands_name]);
    let (day, residual_m3) = river_day(rule, &demands, input(check, "supply"));
    let (id, relative) = (check["id"].as_str().unwrap(), number(&check["rel_tol"]));
    for (got, want) in day.canal_m3.iter().zip(numbers(&check["expected"])) {
        assert!((got - want).abs() <= (relative * want).max(1e-9), "{id} by {rule:?}: {got} and not {want}");
    }
    assert!(residual_m3.abs() <= 1e-9, "{id} by {rule:?}: {residual_m3}");
}

/// The README's order of a day, with the crate's own vessel for the lake's surface: inflow, evaporation on the morning's
/// surface, what the river keeps, diversion, spill. A fixture: the product's day below the dam goes by rights.
fn one_day(check: &Table, volumes_m3: &[f64], areas_m2: &[f64]) -> (f64, f64) {
    let (dead_m3, capacity_m3) = (input(check, "dead"), input(check, "cap"));
    let lake = vessel(volumes_m3, areas_m2, dead_m3, capacity_m3);
    let start_m3 = input(check, "v0");
    let evaporation_m3 = input(check, "coef") * input(check, "pet_mm") / 1000.0 * lake.area_m2(start_m3);
    let mut content_m3 = start_m3 + input(check, "inflow") - evaporation_m3;
    let kept_m3 = input(check, "env").min((content_m3 - dead_m3).max(0.0));
    content_m3 -= kept_m3;
    content_m3 -= input(check, "demand").min((content_m3 - dead_m3).max(0.0)).min(input(check, "canal_cap"));
    (evaporation_m3, content_m3.min(capacity_m3))
}

#[test]
fn every_published_check_of_what_is_built_is_met() {
    let checks = checks("reservoir");
    let table = &checks["area_at_0"]["inputs"];
    let (volumes, areas) = (numbers(&table["table_v"]), numbers(&table["table_a"]));
    let mut left = BTreeSet::new();
    for (id, check) in &checks {
        match id.as_str() {
            _ if id.starts_with("area_at_") => {
                let lake = vessel(&volumes, &areas, 8.0e5, 8.0e6);
                assert_check(check, lake.area_m2(input(check, "storage")));
            }
            "one_day" => {
                let (evaporation_m3, end_m3) = one_day(check, &volumes, &areas);
                for (name, got) in [("evap", evaporation_m3), ("end", end_m3)] {
                    let want = number(&check["expected"][name]);
                    assert!((got - want).abs() <= 1e-9 * want, "{id}: {name} is {got} and not {want}");
                }
            }
            "seniority" => assert_split(check, SharingRule::Seniority, "demand_senior_first"),
            "proportional" => assert_split(check, SharingRule::Proportional, "demand"),
            "allocation_surplus" | "allocation_zero" => {
                assert_split(check, SharingRule::Seniority, "demand");
                assert_split(check, SharingRule::Proportional, "demand");
            }
            // Crop water over field and conveyance efficiency.
            "gross_demand" => assert_check(check, head_gate_demand_m3(check)),
            _ => {
                left.insert(id.as_str());
            }
        }
    }
    assert_eq!(checks.len(), 31, "the copy of the checks has changed");
    assert_eq!(left, BTreeSet::from(NOT_BUILT));
}

/// What a canal asks for at its head when its one field misses just `etc_mm` above what its farmer keeps.
fn head_gate_demand_m3(check: &Table) -> f64 {
    use deshielo::water::basin::BasinDay;
    use deshielo::water::calendar::{CalendarDay, Season};
    use deshielo::water::dials::Dials;
    use deshielo::water::valley::{Gate, Purpose};
    use deshielo::water::works::{Evening, Works};

    let mut valley = valleys::bare_basin(1);
    let mut gate = valleys::canal(input(check, "ha"), 1900, 2);
    gate.canal_m3s = 1000.0;
    gate.conveyance_loss_share = 1.0 - input(check, "ec");
    if let Purpose::Fields(fields) = &mut gate.purpose {
        fields[0].efficiency = input(check, "ea");
        fields[0].crop.refill_to_share = 0.0;
        // A root zone that misses the day's crop water on the first morning: 6 of 140 mm.
        valley.start.soil_share = 1.0 - input(check, "etc_mm") / (fields[0].soil_holds_mm_per_m * 1.0);
    }
    valley.gates.push(Gate { season: Season::ALL_YEAR, ..gate }).unwrap();
    let works = Works::new(&valley, &Dials::REST).unwrap();
    let today = CalendarDay::new(chrono::NaiveDate::from_ymd_opt(2001, 6, 1).unwrap(), 10);
    let (mut stores, mut evening) = (works.start(&today), Evening::default());
    works.day(&mut stores, &today, &BasinDay::default(), &mut evening);
    evening.demand_m3[0]
}
