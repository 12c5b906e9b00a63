//! The checks of `reference/routing.toml` that touch what is built; the others are named with the reason.

mod support;

use std::collections::{BTreeMap, BTreeSet};

use deshielo::water::channel::{Channel, ChannelStore, Reach};
use deshielo::water::ground::{Ground, GroundStores, daily_share};
use deshielo::water::valley::{ChannelTraits, GroundTraits, ReachTraits};
use support::{checks, number, numbers};
use toml::Table;

/// Checks of what the crate does not do. The reservoir passes water by rights and not by a stage–outflow curve
/// (level pool); the unit hydrograph is an isosceles triangle and not a dimensionless curve (SCS) or a row of stores
/// (Nash).
const NOT_BUILT: [&str; 12] = [
    "level_pool_indication",
    "level_pool_indication_all",
    "level_pool_peak",
    "level_pool_problem_8_2_2",
    "level_pool_q",
    "nash_mass_48h",
    "nash_moments",
    "nash_ordinates",
    "nash_peak_time",
    "scs_peak_factor",
    "scs_ratios",
    "scs_triangle",
];

fn input(check: &Table, name: &str) -> f64 {
    number(&check["inputs"][name])
}

/// Residence time whose daily share is `k`.
fn days_of_share(k: f64) -> f64 {
    -1.0 / (-k).ln_1p()
}

/// Flow of the slow ground store on the days after it was filled, with nothing coming in, as a share of its first.
fn recession(residence_days: f64, days: usize) -> f64 {
    let ground = Ground::new(&GroundTraits { quick_days: 1.0, slow_days: residence_days, percolation_mm_day: 0.0 });
    let mut stores = GroundStores { quick_mm: 0.0, slow_mm: 100.0 };
    let first = ground.day(&mut stores, 0.0).slow_flow_mm;
    let flows = (0..days).map(|_| ground.day(&mut stores, 0.0).slow_flow_mm);
    flows.last().unwrap() / first
}

fn compute(id: &str, check: &Table, all: &BTreeMap<String, Table>) -> Option<Vec<f64>> {
    let example = &all["muskingum_c"];
    // Chow, Maidment & Mays 1988, example 8.4.1: K, X and the step in hours are from memory.
    let reach = Reach::new(input(example, "k_h") / input(example, "dt_h"), input(example, "x"));
    Some(match id {
        "muskingum_c" => vec![reach.on_inflow, reach.on_earlier_inflow, reach.on_earlier_outflow],
        // The same example's flows; inflows from memory.
        "muskingum_q" => {
            let inflow = numbers(&check["inputs"]["inflow"]);
            let mut outflow = vec![input(check, "q0")];
            for pair in inflow.windows(2) {
                outflow.push(reach.route(pair[1], pair[0], outflow[outflow.len() - 1]));
            }
            outflow
        }
        "muskingum_stability" => {
            let (k, x) = (input(check, "k_h"), input(check, "x"));
            // The steps at which the crate's own test of stability turns over.
            let stable = |step: f64| Reach::new(k / step, x).is_stable();
            let turns_at = |stable_side: f64, other_side: f64| {
                let (mut good, mut bad) = (stable_side, other_side);
                assert!(stable(good) && !stable(bad));
                for _ in 0..200 {
                    let middle = (good + bad) / 2.0;
                    if stable(middle) { good = middle } else { bad = middle }
                }
                good
            };
            let sum = reach.on_inflow + reach.on_earlier_inflow + reach.on_earlier_outflow;
            vec![turns_at(1.0, 0.01), turns_at(1.0, 100.0), sum]
        }
        _ if id.starts_with("recession_exact_") => vec![recession(input(check, "t_res"), input(check, "t") as usize)],
        // A store whose daily share is k goes down by the same factor every day.
        _ if id.starts_with("recession_discrete_") => {
            vec![recession(days_of_share(input(check, "k")), input(check, "n") as usize)]
        }
        _ if id.starts_with("k_exact_") => vec![daily_share(input(check, "t_res"))],
        "linear_steady" => {
            let quick_days = days_of_share(input(check, "k"));
            let traits = GroundTraits { quick_days, slow_days: 1.0, percolation_mm_day: 0.0 };
            let (ground, mut stores) = (Ground::new(&traits), GroundStores::default());
            for _ in 0..1000 {
                ground.day(&mut stores, input(check, "r"));
            }
            vec![stores.quick_mm]
        }
        _ if id.starts_with("triangle_") => {
            let unit_hydrograph_base_days = input(check, "base_days");
            Channel::new(&ChannelTraits { unit_hydrograph_base_days, reach: None }).weights().to_vec()
        }
        _ => return None,
    })
}

#[test]
fn every_published_check_of_what_is_built_is_met() {
    let checks = checks("routing");
    let mut left = BTreeSet::new();
    for (id, check) in &checks {
        let Some(got) = compute(id, check, &checks) else {
            left.insert(id.as_str());
            continue;
        };
        let want = match &check["expected"] {
            list @ toml::Value::Array(_) => numbers(list),
            one => vec![number(one)],
        };
        assert_eq!(got.len(), want.len(), "{id}");
        let relative = number(&check["rel_tol"]);
        for (got, want) in got.iter().zip(&want) {
            assert!((got - want).abs() <= relative * want.abs(), "{id}: {got} and not {want}");
        }
        if let (Some(printed), Some(hold)) = (check.get("printed"), check.get("hold_printed_to")) {
            for (got, printed) in got.iter().zip(numbers(printed)) {
                assert!((got - printed).abs() <= number(hold), "{id}: {got} is not as printed, {printed}");
            }
        }
    }
    assert_eq!(checks.len(), 27, "the copy of the checks has changed");
    assert_eq!(left, BTreeSet::from(NOT_BUILT));
}

#[test]
fn the_channel_takes_the_same_reach_day_by_day() {
    // The reach of the published example with a step of a day, behind a triangle of one day that delays nothing.
    let checks = checks("routing");
    let example = &checks["muskingum_c"];
    let reach = ReachTraits { travel_days: input(example, "k_h"), inflow_weight: input(example, "x") };
    let channel = Channel::new(&ChannelTraits { unit_hydrograph_base_days: 1.0, reach: Some(reach) });
    let check = &checks["muskingum_q"];
    let steady = input(check, "q0");
    let mut store = ChannelStore::default();
    for _ in 0..2000 {
        channel.day(&mut store, steady);
    }
    // The example's outflow starts at 85 while 93 comes in; a steady start needs the same number on both sides.
    let inflow = numbers(&check["inputs"]["inflow"]);
    let coefficients = Reach::new(reach.travel_days, reach.inflow_weight);
    let (mut before, mut outflow) = (steady, steady);
    for inflow in inflow {
        outflow = coefficients.route(inflow, before, outflow);
        let got = channel.day(&mut store, inflow);
        assert!((got - outflow).abs() <= 1e-9 * outflow, "{got} and not {outflow}");
        before = inflow;
    }
}
