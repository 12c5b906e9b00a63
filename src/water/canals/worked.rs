//! Days worked by hand, for what the reference tables do not reach: losses in the river, yearly limits, held-back stored
//! water, the minimum at the dam, and rivers without a dam or without gates. Common practice, no source.

use super::*;

/// A day with this inflow, no lake, no limits, no minimum, and everyone asking for the same.
fn input(inflow_m3: f64, demand_m3: &[f64; MOST_GATES]) -> RiverInput<'_> {
    RiverInput {
        inflow_m3,
        lake_evaporation_m3: 0.0,
        lake_rain_m3: 0.0,
        flood_limit_m3: f64::INFINITY,
        minimum_m3: 0.0,
        stored_limit_m3: f64::INFINITY,
        rotation_day: 0,
        demand_m3,
    }
}

/// A dam with these gates, junior to them all.
fn setup(rule: SharingRule, active_m3: f64, gates: &[Gate]) -> RiverSetup {
    RiverSetup {
        rule,
        gates: gates.iter().cloned().collect(),
        active_m3,
        outlet_m3: f64::INFINITY,
        reservoir_date: PriorityDate::year(1990),
        minimum_date: PriorityDate::year(1975),
        minimum_place: MinimumPlace::RiverEnd,
        pool_serves_minimum: false,
    }
}

fn gate(year: i32, storage_share: f64, stored_loss_share: f64) -> Gate {
    Gate { storage_share, stored_loss_share, ..Gate::plain(PriorityDate::year(year), 1) }
}

const RULES: [SharingRule; 3] = [SharingRule::Seniority, SharingRule::Proportional, SharingRule::Rotation];

fn close(got: f64, expected: f64) {
    assert!((got - expected).abs() < 1e-12, "{got}, expected {expected}");
}

/// Twenty are wanted and a fifth is lost on the way: 25 leave the account, 5 are lost. With only 10 allowed out of the
/// dam, 8 arrive.
#[test]
fn stored_water_is_debited_at_the_dam() {
    let river = River::new(&setup(SharingRule::Seniority, 100.0, &[gate(1900, 1.0, 0.2)])).unwrap();
    for (limit, debited, arriving) in [(f64::INFINITY, 25.0, 20.0), (10.0, 10.0, 8.0)] {
        let (mut state, mut out) = (RiverState::default(), RiverDay::default());
        river.set_storage(&mut state, 0.5);
        let day = RiverInput { stored_limit_m3: limit, ..input(0.0, &[20.0; MOST_GATES]) };
        river.day(&mut state, &day, &mut out);
        close(out.stored_take_m3[0], debited);
        close(out.canal_m3[0], arriving);
        close(out.river_loss_m3, debited - arriving);
        close(state.account_m3[0], 50.0 - debited);
        close(out.dam_outflow_m3, debited);
        close(out.river_out_m3, 0.0);
    }
}

/// Ten each are wanted from full accounts, but 12 may leave the dam: the older right, downstream, has its 10.
#[test]
fn held_back_stored_water_goes_by_date() {
    let gates = [gate(1950, 0.5, 0.0), gate(1900, 0.5, 0.0)];
    let river = River::new(&setup(SharingRule::Seniority, 100.0, &gates)).unwrap();
    let (mut state, mut out) = (RiverState::default(), RiverDay::default());
    river.set_storage(&mut state, 1.0);
    river.day(&mut state, &RiverInput { stored_limit_m3: 12.0, ..input(0.0, &[10.0; MOST_GATES]) }, &mut out);
    assert_eq!(out.canal_m3[..2], [2.0, 10.0]);
    assert_eq!(state.account_m3[..2], [48.0, 40.0]);
}

/// Of 25 a year, 10 a day: 10, 10, 5, nothing; and 10 again when a new year begins.
#[test]
fn a_yearly_limit_runs_out() {
    let limited = Gate { yearly_limit_m3: 25.0, ..gate(1900, 0.0, 0.0) };
    for rule in RULES {
        let river = River::new(&setup(rule, 0.0, core::slice::from_ref(&limited))).unwrap();
        let (mut state, mut out) = (RiverState::default(), RiverDay::default());
        let mut day = || {
            river.day(&mut state, &input(100.0, &[10.0; MOST_GATES]), &mut out);
            (out.canal_m3[0], out.river_out_m3)
        };
        assert_eq!([day(), day(), day(), day()], [(10.0, 90.0), (10.0, 90.0), (5.0, 95.0), (0.0, 100.0)]);
        river.start_year(&mut state);
        river.day(&mut state, &input(100.0, &[10.0; MOST_GATES]), &mut out);
        assert_eq!(out.canal_m3[0], 10.0);
    }
}

/// Of 60, an old right below takes 30, which leaves 30 for the reservoir. A minimum of 40 at the dam, older than the
/// reservoir, lets it store 20; what the gate takes further down does not matter to it. A younger minimum stops nobody:
/// the reservoir stores 30, 30 pass, and the pool, which holds 7 + 30, adds 10.
#[test]
fn minimum_at_the_dam() {
    let mut setup = setup(SharingRule::Seniority, 100.0, &[gate(1900, 0.0, 0.0)]);
    setup.minimum_place = MinimumPlace::Dam;
    for (year, pool_serves, take, reserved, pool_release, outflow, met) in [
        (1975, true, 20.0, 40.0, 0.0, 40.0, true),
        (1995, true, 30.0, 30.0, 10.0, 40.0, true),
        (1995, false, 30.0, 30.0, 0.0, 30.0, false),
    ] {
        setup.minimum_date = PriorityDate::year(year);
        setup.pool_serves_minimum = pool_serves;
        let river = River::new(&setup).unwrap();
        let (mut state, mut out) = (RiverState { pool_m3: 7.0, ..RiverState::default() }, RiverDay::default());
        river.day(&mut state, &RiverInput { minimum_m3: 40.0, ..input(60.0, &[30.0; MOST_GATES]) }, &mut out);
        assert_eq!(
            (out.reservoir_take_m3, out.minimum_reserved_m3, out.pool_release_m3),
            (take, reserved, pool_release)
        );
        assert_eq!((out.dam_outflow_m3, out.river_out_m3, out.minimum_met), (outflow, outflow - 30.0, met));
        assert_eq!(state.pool_m3, 7.0 + take - pool_release);
    }
}

/// A hundred are wanted, half by a gate that loses a fifth of its stored water: the mean loss is a tenth. Ten come
/// naturally, so 90 must arrive and 100 leave the pool.
#[test]
fn one_fraction_with_a_mean_loss() {
    let gates = [gate(1900, 0.0, 0.0), gate(1900, 0.0, 0.2)];
    let river = River::new(&setup(SharingRule::Proportional, 200.0, &gates)).unwrap();
    let (mut state, mut out) = (RiverState { pool_m3: 150.0, ..RiverState::default() }, RiverDay::default());
    river.day(&mut state, &input(10.0, &[50.0; MOST_GATES]), &mut out);
    assert_eq!(out.fraction, Some(1.0));
    close(out.stored_release_m3, 100.0);
    close(out.river_loss_m3, 10.0);
    // The same mix in both canals: 5 natural, and 50 let go for 45 that arrive.
    for i in 0..2 {
        close(out.natural_take_m3[i], 5.0);
        close(out.stored_take_m3[i], 50.0);
    }
    close(out.river_out_m3, 0.0);
}

/// Without a dam there is natural flow only, and without gates it all runs past.
#[test]
fn no_dam_and_no_gates() {
    for rule in RULES {
        let river = River::new(&setup(rule, 0.0, &[gate(1900, 0.0, 0.1)])).unwrap();
        let (mut state, mut out) = (RiverState::default(), RiverDay::default());
        river.day(&mut state, &input(20.0, &[30.0; MOST_GATES]), &mut out);
        assert_eq!((out.canal_m3[0], out.river_out_m3, out.content_m3), (20.0, 0.0, 0.0));
        assert_eq!((out.dam_outflow_m3, out.detained_m3, out.river_loss_m3), (20.0, 0.0, 0.0));

        let river = River::new(&setup(rule, 0.0, &[])).unwrap();
        let mut out = RiverDay::default();
        river.day(&mut state, &input(20.0, &[30.0; MOST_GATES]), &mut out);
        assert_eq!((out.river_out_m3, out.turn_gate, out.minimum_met), (20.0, None, true));
        assert_eq!(river.settle(&mut state, 0, 8.0), 8.0, "nothing can come back where there is no gate");
    }
}

/// A day without demand leaves no trace of the day before.
#[test]
fn yesterday_is_cleared() {
    for rule in RULES {
        let river = River::new(&setup(rule, 100.0, &[gate(1900, 1.0, 0.0)])).unwrap();
        let (mut state, mut out) = (RiverState::default(), RiverDay::default());
        river.set_storage(&mut state, 0.5);
        river.day(&mut state, &input(20.0, &[30.0; MOST_GATES]), &mut out);
        assert!(out.natural_take_m3[0] > 0.0 && out.stored_take_m3[0] > 0.0);
        river.day(&mut state, &input(20.0, &[0.0; MOST_GATES]), &mut out);
        let takes = [out.wish_m3, out.natural_take_m3, out.stored_take_m3, out.canal_m3];
        assert_eq!(takes, [[0.0; MOST_GATES]; 4]);
        assert_eq!(out.canal_total_m3, 0.0);
    }
}

#[test]
fn turns_by_whole_days() {
    let turn = |turn_days| Gate { turn_days, ..gate(1900, 0.0, 0.0) };
    let river = River::new(&setup(SharingRule::Rotation, 0.0, &[turn(2), turn(0), turn(1)])).unwrap();
    assert_eq!(river.cycle_days(), 3);
    let turns: Vec<_> = (0..4).map(|day| river.gate_on_turn(day)).collect();
    assert_eq!(turns, [Some(0), Some(0), Some(2), Some(0)]);
    let idle = River::new(&setup(SharingRule::Rotation, 0.0, &[turn(0)])).unwrap();
    assert_eq!(idle.gate_on_turn(5), None);
}

#[test]
fn senseless_values_are_refused_by_name() {
    let refused = |change: fn(&mut RiverSetup)| {
        let mut setup = setup(SharingRule::Seniority, 100.0, &[gate(1900, 0.5, 0.0), gate(1901, 0.5, 0.0)]);
        change(&mut setup);
        River::new(&setup).map(|_| ()).unwrap_err()
    };
    let fault = |gate, value| RiverFault { gate, value };
    assert_eq!(refused(|s| s.active_m3 = f64::INFINITY), fault(None, "active_m3"));
    assert_eq!(refused(|s| s.outlet_m3 = f64::NAN), fault(None, "outlet_m3"));
    assert_eq!(refused(|s| s.gates[1].decreed_m3 = -1.0), fault(Some(1), "decreed_m3"));
    assert_eq!(refused(|s| s.gates[0].stored_loss_share = 1.0), fault(Some(0), "stored_loss_share"));
    assert_eq!(refused(|s| s.gates[0].return_above = 4), fault(Some(0), "return_above"));
    assert_eq!(refused(|s| s.gates[0].return_above = 0), fault(Some(0), "return_above"));
    assert_eq!(refused(|s| s.gates[0].storage_share = 0.6), fault(None, "storage_share"));
}
