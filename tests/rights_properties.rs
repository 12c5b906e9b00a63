//! What holds on any river on any day: the books close, no reach runs below zero, and older rights come first.
#![cfg(feature = "std")]

use deshielo::water::canals::{
    Gate, MOST_GATES, MinimumPlace, PriorityDate, River, RiverDay, RiverInput, RiverSetup, RiverState, SharingRule,
};
use proptest::prelude::*;
use proptest::sample::{Index, select};
use proptest::test_runner::RngSeed;

/// One day's input with its own demands.
#[derive(Clone, Debug)]
struct Day {
    inflow_m3: f64,
    lake_evaporation_m3: f64,
    lake_rain_m3: f64,
    flood_limit_m3: f64,
    minimum_m3: f64,
    stored_limit_m3: f64,
    demand_m3: [f64; MOST_GATES],
}

impl Day {
    fn input(&self, rotation_day: u32) -> RiverInput<'_> {
        RiverInput {
            inflow_m3: self.inflow_m3,
            lake_evaporation_m3: self.lake_evaporation_m3,
            lake_rain_m3: self.lake_rain_m3,
            flood_limit_m3: self.flood_limit_m3,
            minimum_m3: self.minimum_m3,
            stored_limit_m3: self.stored_limit_m3,
            rotation_day,
            demand_m3: &self.demand_m3,
        }
    }
}

/// A volume that is often none and sometimes large.
fn volume(most: f64) -> impl Strategy<Value = f64> + Clone {
    prop_oneof![2 => Just(0.0), 5 => 0.0..most, 1 => (0.0..most).prop_map(f64::floor)]
}

/// A limit that is often absent.
fn limit(most: f64) -> impl Strategy<Value = f64> + Clone {
    prop_oneof![2 => Just(f64::INFINITY), 4 => volume(most)]
}

/// A share that is often none or all.
fn share() -> impl Strategy<Value = f64> + Clone {
    prop_oneof![2 => Just(0.0), 1 => Just(1.0), 4 => 0.0..1.0]
}

/// Any number that the machine knows.
fn any_number() -> impl Strategy<Value = f64> + Clone {
    prop::num::f64::ANY
}

/// Dates from a few years only, so that ties are common.
fn date() -> impl Strategy<Value = PriorityDate> + Clone {
    prop_oneof![
        1 => Just(PriorityDate::BeforeAll),
        6 => (1900..1906).prop_map(PriorityDate::year),
        2 => (1900..1903, 1u8..3).prop_map(|(year, month)| PriorityDate::on(year, month, 15)),
    ]
}

fn gate(n: usize) -> impl Strategy<Value = Gate> {
    let rights = (date(), limit(300.0), limit(300.0), limit(900.0));
    let water = (share(), prop_oneof![2 => Just(0.0), 1 => 0.0..0.9], share(), share(), share());
    let returns = (prop_oneof![1 => Just(0.0), 3 => 0.1..60.0], 1..=n as u8 + 1, 0u16..4);
    (rights, water, returns).prop_map(|(rights, water, returns)| Gate {
        right_date: rights.0,
        decreed_m3: rights.1,
        canal_m3: rights.2,
        yearly_limit_m3: rights.3,
        storage_share: water.0,
        stored_loss_share: water.1,
        conveyance_loss_share: water.2,
        field_efficiency: water.3,
        return_share: water.4,
        return_days: returns.0,
        return_above: returns.1,
        turn_days: returns.2,
    })
}

fn setup(rules: &'static [SharingRule]) -> impl Strategy<Value = RiverSetup> {
    let gates = prop_oneof![8 => 0usize..=6, 2 => 7usize..=MOST_GATES].prop_flat_map(|n| {
        (prop::collection::vec(gate(n), n), share()).prop_map(|(mut gates, owned)| {
            // Shares add up to the owned part; it is often all of the reservoir or none of it.
            let sum: f64 = gates.iter().map(|gate| gate.storage_share).sum();
            for gate in &mut gates {
                gate.storage_share *= if sum > 0.0 { owned / sum } else { 0.0 };
            }
            gates.into_iter().collect()
        })
    });
    let dam = (volume(3000.0), limit(800.0), date(), date());
    let place = select(vec![MinimumPlace::RiverEnd, MinimumPlace::Dam]);
    (select(rules), gates, dam, place, any::<bool>()).prop_map(|(rule, gates, dam, minimum_place, pool)| RiverSetup {
        rule,
        gates,
        active_m3: dam.0,
        outlet_m3: dam.1,
        reservoir_date: dam.2,
        minimum_date: dam.3,
        minimum_place,
        pool_serves_minimum: pool,
    })
}

fn day() -> impl Strategy<Value = Day> {
    let lake = (volume(1500.0), volume(80.0), volume(80.0));
    let limits = (limit(3000.0), volume(400.0), limit(300.0));
    let demand = prop::collection::vec(volume(400.0), MOST_GATES);
    (lake, limits, demand).prop_map(|(lake, limits, demand)| Day {
        inflow_m3: lake.0,
        lake_evaporation_m3: lake.1,
        lake_rain_m3: lake.2,
        flood_limit_m3: limits.0,
        minimum_m3: limits.1,
        stored_limit_m3: limits.2,
        demand_m3: demand.try_into().unwrap(),
    })
}

/// A morning: accounts and stores with anything in them, the reservoir at times above its active volume.
fn morning(setup: &RiverSetup, full_share: f64, stores: &[f64]) -> (River, RiverState) {
    let river = River::new(setup).unwrap();
    let mut state = RiverState::default();
    river.set_storage(&mut state, full_share);
    let n = setup.gates.len();
    state.return_store_m3[..n].copy_from_slice(&stores[..n]);
    (river, state)
}

fn stores() -> impl Strategy<Value = Vec<f64>> {
    prop::collection::vec(volume(500.0), MOST_GATES)
}

const ALL: &[SharingRule] = &[SharingRule::Seniority, SharingRule::Proportional, SharingRule::Rotation];
const BY_DATE: &[SharingRule] = &[SharingRule::Seniority];

fn sum(values: &[f64]) -> f64 {
    values.iter().sum()
}

/// Checks one day against what must hold whatever the river; `before` is the morning, `out` the day.
fn check_day(setup: &RiverSetup, before: &RiverState, day: &Day, number: u32, state: &RiverState, out: &RiverDay) {
    let n = setup.gates.len();
    let input = day.input(number);
    let came = day.inflow_m3 + day.lake_rain_m3 + out.content_start_m3 + sum(&before.return_store_m3);
    let tolerance = 1e-9 * came.max(1.0);
    assert!(out.residual_m3(&input).abs() <= tolerance, "residual {}", out.residual_m3(&input));

    let one = [
        out.natural_flow_m3,
        out.rain_passed_m3,
        out.evaporation_m3,
        out.detained_m3,
        out.reservoir_take_m3,
        out.minimum_reserved_m3,
        out.canal_total_m3,
        out.river_loss_m3,
        out.stored_release_m3,
        out.pool_release_m3,
        out.flood_release_m3,
        out.spill_m3,
        out.dam_outflow_m3,
        out.river_out_m3,
        out.content_m3,
        state.pool_m3,
        out.content_start_m3,
        out.return_flow_total_m3,
    ];
    let many = [
        &out.wish_m3,
        &out.natural_take_m3,
        &out.stored_take_m3,
        &out.canal_m3,
        &out.return_flow_m3,
        &state.account_m3,
        &state.return_store_m3,
        &state.drawn_this_year_m3,
    ];
    for x in one.iter().chain(many.into_iter().flatten()) {
        assert!(x.is_finite() && *x >= 0.0, "{x} in {out:?} {state:?}");
    }
    for values in many {
        assert!(values[n..].iter().all(|x| *x == 0.0), "written beyond the last gate");
    }

    // Stored water.
    assert!(state.account_m3.iter().chain([&state.pool_m3]).all(|held| *held <= out.content_m3));
    assert!((out.content_m3 - sum(&state.account_m3) - state.pool_m3).abs() <= tolerance);
    assert!(out.content_m3 <= setup.active_m3 + tolerance, "the reservoir ends above its active volume");
    assert!(out.stored_release_m3 <= day.stored_limit_m3 + tolerance);
    let passing = out.natural_flow_m3 - out.reservoir_take_m3;
    let released = out.stored_release_m3 + out.pool_release_m3 + out.flood_release_m3;
    assert!(released <= (setup.outlet_m3 - passing).max(0.0) + tolerance, "more than the outlet passes");

    // Canals.
    let mut arriving = 0.0;
    for (i, gate) in setup.gates.iter().enumerate() {
        assert!(out.canal_m3[i] <= out.wish_m3[i] + tolerance);
        assert!(out.wish_m3[i] <= gate.canal_m3);
        assert!(state.drawn_this_year_m3[i] <= gate.yearly_limit_m3 + tolerance);
        if setup.rule == SharingRule::Seniority {
            assert!(out.natural_take_m3[i] <= gate.decreed_m3);
            assert!(out.stored_take_m3[i] <= before.account_m3[i] + day.lake_rain_m3 + day.inflow_m3 + tolerance);
        }
        if setup.rule != SharingRule::Rotation {
            assert!(out.wish_m3[i] <= day.demand_m3[i]);
        }
        arriving += out.canal_m3[i] - out.natural_take_m3[i];
    }
    assert!((sum(&out.canal_m3) - out.canal_total_m3).abs() <= tolerance);
    assert!((sum(&out.stored_take_m3) - out.stored_release_m3).abs() <= tolerance);
    assert!((out.stored_release_m3 - arriving - out.river_loss_m3).abs() <= tolerance);

    // The flow in every reach, with the river's loss of stored water taken out where it does most harm: at the dam.
    let mut flow = out.dam_outflow_m3 - out.river_loss_m3;
    assert!(flow >= -tolerance);
    for position in 1..=n + 1 {
        let back = setup.gates.iter().enumerate().filter(|(_, gate)| usize::from(gate.return_above) == position);
        flow += back.map(|(i, _)| out.return_flow_m3[i]).sum::<f64>();
        flow -= if position <= n { out.canal_m3[position - 1] } else { 0.0 };
        assert!(flow >= -tolerance, "{flow} below position {position}");
    }
    assert!((flow - out.river_out_m3).abs() <= tolerance);

    // The minimum.
    let dateless = setup.rule != SharingRule::Seniority;
    let first = dateless || setup.minimum_date < setup.reservoir_date;
    match setup.minimum_place {
        MinimumPlace::Dam if first => {
            assert!(out.reservoir_take_m3 <= (out.natural_flow_m3 - day.minimum_m3).max(0.0));
            assert!((out.minimum_reserved_m3 - out.natural_flow_m3.min(day.minimum_m3)).abs() <= tolerance);
        }
        MinimumPlace::RiverEnd if dateless => {
            let natural = out.natural_flow_m3 + out.return_flow_total_m3;
            assert!(out.river_out_m3 >= natural.min(day.minimum_m3) - tolerance);
        }
        _ => {}
    }
    let judged = if setup.minimum_place == MinimumPlace::Dam { out.dam_outflow_m3 } else { out.river_out_m3 };
    assert_eq!(out.minimum_met, judged >= day.minimum_m3 - 1e-9 * day.minimum_m3.max(1.0));
}

/// The same rivers on every run, so that a failure can be looked at again.
fn config() -> ProptestConfig {
    ProptestConfig {
        cases: 3000,
        rng_seed: RngSeed::Fixed(1868),
        failure_persistence: None,
        ..ProptestConfig::default()
    }
}

proptest! {
    #![proptest_config(config())]

    /// Every day's books close, nothing is negative or not a number, and every limit is kept; with the canals' losses
    /// settled in the evening, so do the books of river and canals together.
    #[test]
    fn the_books_close_on_any_river(
        setup in setup(ALL), full in prop_oneof![share(), Just(1.2)], stores in stores(),
        days in prop::collection::vec(day(), 1..8),
    ) {
        let (river, mut state) = morning(&setup, full, &stores);
        let mut out = RiverDay::default();
        for (number, day) in (0..).zip(&days) {
            let before = state.clone();
            river.day(&mut state, &day.input(number), &mut out);
            check_day(&setup, &before, day, number, &state, &out);

            let (mut consumed, mut deep) = (0.0, 0.0);
            for (i, gate) in setup.gates.iter().enumerate() {
                let canal = gate.plain_canal(out.canal_m3[i]);
                consumed += canal.used_m3;
                deep += river.settle(&mut state, i, canal.lost_m3);
            }
            let came = day.inflow_m3 + day.lake_rain_m3 + out.content_start_m3 + sum(&before.return_store_m3);
            let went = consumed + deep + out.evaporation_m3 + out.river_loss_m3 + out.river_out_m3;
            let kept = river.content_m3(&state) + sum(&state.return_store_m3);
            prop_assert!((came - went - kept).abs() <= 1e-9 * came.max(1.0));
        }
    }

    /// From one morning, no gate's natural take changes when a gate with a later right asks for more; nor does the
    /// reservoir's where it is the older right.
    #[test]
    fn a_junior_asking_more_changes_nothing_for_seniors(
        setup in setup(BY_DATE), full in share(), stores in stores(), day in day(),
        junior in any::<Index>(), more in 0.0..500.0,
    ) {
        if setup.gates.is_empty() {
            return Ok(());
        }
        let junior = junior.index(setup.gates.len());
        let (river, state) = morning(&setup, full, &stores);
        let run = |day: &Day| {
            let mut out = RiverDay::default();
            river.day(&mut state.clone(), &day.input(0), &mut out);
            out
        };
        let mut asking_more = day.clone();
        asking_more.demand_m3[junior] += more;
        let (was, is) = (run(&day), run(&asking_more));
        let key = |i: usize| (setup.gates[i].right_date, i + 1);
        for i in (0..setup.gates.len()).filter(|&i| key(i) < key(junior)) {
            prop_assert_eq!(was.natural_take_m3[i].to_bits(), is.natural_take_m3[i].to_bits());
        }
        if setup.reservoir_date <= setup.gates[junior].right_date {
            prop_assert_eq!(was.reservoir_take_m3.to_bits(), is.reservoir_take_m3.to_bits());
        }
    }

    /// Natural flow goes to each right in turn in the largest amount that leaves no reach below zero. The slow way: what
    /// is taken at or above a reach may not exceed what comes in at or above it.
    #[test]
    fn natural_flow_is_the_largest_for_each_right_in_turn(
        setup in setup(BY_DATE), full in share(), stores in stores(), day in day(),
    ) {
        let n = setup.gates.len();
        let (river, mut state) = morning(&setup, full, &stores);
        let mut out = RiverDay::default();
        river.day(&mut state, &day.input(0), &mut out);

        // Room in the reservoir once lake and detention are done.
        let gained = day.lake_rain_m3 - out.rain_passed_m3 - out.evaporation_m3 + out.detained_m3;
        let held = out.content_start_m3 + gained;
        let space = (setup.active_m3.min(day.flood_limit_m3) - held).max(0.0);
        let at_dam = setup.minimum_place == MinimumPlace::Dam;
        let date = |p: usize| match p {
            0 => setup.reservoir_date,
            p if p <= n => setup.gates[p - 1].right_date,
            _ => setup.minimum_date,
        };
        let want = |p: usize| match p {
            0 if at_dam && setup.minimum_date < setup.reservoir_date =>
                space.min((out.natural_flow_m3 - day.minimum_m3).max(0.0)),
            0 => space,
            p if p <= n => {
                let gate = &setup.gates[p - 1];
                day.demand_m3[p - 1].min(gate.canal_m3).min(gate.yearly_limit_m3).min(gate.decreed_m3)
            }
            _ if at_dam => 0.0,
            _ => day.minimum_m3,
        };
        let comes_in = |j: usize| -> f64 {
            let above = |i: &usize| usize::from(setup.gates[*i].return_above) <= j;
            out.natural_flow_m3 + (0..n).filter(above).map(|i| out.return_flow_m3[i]).sum::<f64>()
        };
        let mut take = vec![0.0; n + 2];
        let mut order: Vec<usize> = (0..n + 2).collect();
        order.sort_by_key(|&p| (date(p), p));
        for p in order {
            let room = (p..n + 2).map(|j| comes_in(j) - sum(&take[..=j])).fold(f64::INFINITY, f64::min);
            take[p] = room.min(want(p)).max(0.0);
        }
        let tolerance = 1e-9 * comes_in(n + 1).max(held).max(1.0);
        prop_assert!((out.reservoir_take_m3 - take[0]).abs() <= tolerance);
        for i in 0..n {
            prop_assert!((out.natural_take_m3[i] - take[i + 1]).abs() <= tolerance, "gate {i}");
        }
        if !at_dam {
            prop_assert!((out.minimum_reserved_m3 - take[n + 1]).abs() <= tolerance);
        }
    }

    /// The proportional rule gives the largest fraction: any more would leave a reach below zero with the pool giving
    /// all it can, or exceed the wish. Unless all wishes are met, some reach is used up, and the pool with it.
    #[test]
    fn one_fraction_is_the_largest(
        setup in setup(&[SharingRule::Proportional]), full in share(), stores in stores(), day in day(),
    ) {
        let n = setup.gates.len();
        let (river, mut state) = morning(&setup, full, &stores);
        let mut out = RiverDay::default();
        river.day(&mut state, &day.input(0), &mut out);
        let fraction = out.fraction.unwrap();
        prop_assert!((0.0..=1.0).contains(&fraction));
        for i in 0..n {
            prop_assert_eq!(out.canal_m3[i], fraction * out.wish_m3[i]);
        }
        if fraction < 1.0 {
            let reserved = if setup.minimum_place == MinimumPlace::Dam { 0.0 } else { out.minimum_reserved_m3 };
            let arriving = out.stored_release_m3 - out.river_loss_m3;
            let mut flow = out.natural_flow_m3 + arriving;
            let mut smallest = f64::INFINITY;
            for position in 1..=n + 1 {
                let back = (0..n).filter(|&i| usize::from(setup.gates[i].return_above) == position);
                flow += back.map(|i| out.return_flow_m3[i]).sum::<f64>();
                flow -= if position <= n { out.canal_m3[position - 1] } else { reserved };
                smallest = smallest.min(flow);
            }
            let came = out.natural_flow_m3 + out.content_start_m3 + out.return_flow_total_m3;
            let tolerance = 1e-9 * came.max(1.0);
            prop_assert!(smallest.abs() <= tolerance);
            prop_assert!(out.reservoir_take_m3 <= tolerance);
            let outlet = (setup.outlet_m3 - out.natural_flow_m3).max(0.0);
            let held = out.content_m3 + out.stored_release_m3 + out.pool_release_m3 + out.flood_release_m3 + out.spill_m3;
            let most = held.min(outlet).min(day.stored_limit_m3);
            prop_assert!((out.stored_release_m3 - most).abs() <= tolerance);
        }
    }
    /// Inputs without sense give days without sense, but they never stop the program.
    #[test]
    fn no_numbers_stop_a_day(
        setup in setup(ALL), numbers in prop::collection::vec(any_number(), 8), demand in any_number(), turn in any::<u32>(),
    ) {
        let (river, mut state) = morning(&setup, numbers[0], &[numbers[1]; MOST_GATES]);
        let day = Day {
            inflow_m3: numbers[2],
            lake_evaporation_m3: numbers[3],
            lake_rain_m3: numbers[4],
            flood_limit_m3: numbers[5],
            minimum_m3: numbers[6],
            stored_limit_m3: numbers[7],
            demand_m3: [demand; MOST_GATES],
        };
        let mut out = RiverDay::default();
        river.day(&mut state, &day.input(turn), &mut out);
        river.settle(&mut state, turn as usize, demand);
        prop_assert!(out.turn_gate.is_none_or(|gate| gate < setup.gates.len()));
    }
}
