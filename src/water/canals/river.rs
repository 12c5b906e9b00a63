//! A river made ready for a run: checked, its rights in order, and everything that does not change worked out once.

use core::fmt;

use super::accounts::Shares;
use super::width::sum;
use super::{Gate, MOST_GATES, MOST_POSITIONS, MinimumPlace, RiverSetup, RiverState, SharingRule};

/// An unowned share of the reservoir below this is rounding and counts as none.
const SMALLEST_POOL_SHARE: f64 = 1e-12;

/// A value of a set-up that makes no sense: not a number, below zero, or out of its range.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct RiverFault {
    /// The gate, counted from 0; none where the value belongs to the whole river.
    pub gate: Option<usize>,
    /// Name of the field.
    pub value: &'static str,
}

impl fmt::Display for RiverFault {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self.gate {
            Some(gate) => write!(f, "gate[{gate}].{}", self.value),
            None => f.write_str(self.value),
        }
    }
}

impl core::error::Error for RiverFault {}

/// What a day needs to know of a gate.
#[derive(Clone, Debug)]
pub(super) struct GateRule {
    pub(super) decreed_m3: f64,
    /// Share of stored water let go at the dam that arrives at the gate, and one over it.
    pub(super) arriving_share: f64,
    pub(super) release_per_arriving: f64,
    pub(super) return_share: f64,
    /// Cycle over turn: the turn carries the whole cycle's demand.
    pub(super) cycle_per_turn: f64,
    /// First day after this gate's turn, counted from the cycle's start.
    pub(super) turn_end: u32,
}

/// A river ready for a run.
#[derive(Clone, Debug)]
pub struct River {
    pub(super) rule: SharingRule,
    pub(super) gates: heapless::Vec<GateRule, MOST_GATES>,
    pub(super) canal_m3: [f64; MOST_GATES],
    pub(super) yearly_limit_m3: [f64; MOST_GATES],
    pub(super) stored_loss_share: [f64; MOST_GATES],
    /// Share of the return store that comes back in a day.
    pub(super) daily_return_share: [f64; MOST_GATES],
    pub(super) return_above: [u8; MOST_GATES],
    pub(super) shares: Shares,
    pub(super) active_m3: f64,
    pub(super) outlet_m3: f64,
    /// Positions in order of dates.
    pub(super) date_order: heapless::Vec<u8, MOST_POSITIONS>,
    pub(super) minimum_at_dam: bool,
    pub(super) minimum_before_reservoir: bool,
    pub(super) pool_serves_minimum: bool,
    pub(super) any_stored_loss: bool,
    pub(super) any_yearly_limit: bool,
    pub(super) cycle_days: u32,
}

impl River {
    /// Checks a set-up and makes it ready.
    ///
    /// # Errors
    /// The first value that is not a number, below zero, infinite where that has no meaning, or out of its range;
    /// storage shares that add up to more than one are reported as `storage_share` of the whole river.
    pub fn new(setup: &RiverSetup) -> Result<Self, RiverFault> {
        check(setup)?;
        let n = setup.gates.len();
        let cycle_days: u32 = setup.gates.iter().map(|gate| u32::from(gate.turn_days)).sum();
        let mut turn_end = 0;
        let gates = setup
            .gates
            .iter()
            .map(|gate| {
                turn_end += u32::from(gate.turn_days);
                let arriving_share = 1.0 - gate.stored_loss_share;
                GateRule {
                    decreed_m3: gate.decreed_m3,
                    arriving_share,
                    release_per_arriving: 1.0 / arriving_share,
                    return_share: gate.return_share,
                    cycle_per_turn: if gate.turn_days > 0 {
                        f64::from(cycle_days) / f64::from(gate.turn_days)
                    } else {
                        0.0
                    },
                    turn_end,
                }
            })
            .collect();

        let date = |position: usize| match position {
            0 => setup.reservoir_date,
            p if p <= n => setup.gates[p - 1].right_date,
            _ => setup.minimum_date,
        };
        let mut date_order: heapless::Vec<u8, MOST_POSITIONS> = (0..n as u8 + 2).collect();
        date_order.sort_unstable_by_key(|&position| (date(usize::from(position)), position));
        let mut return_above = [0; MOST_GATES];
        for (slot, gate) in return_above.iter_mut().zip(&setup.gates) {
            *slot = gate.return_above;
        }
        let per_gate = |value: fn(&Gate) -> f64| {
            let mut values = [0.0; MOST_GATES];
            for (slot, gate) in values.iter_mut().zip(&setup.gates) {
                *slot = value(gate);
            }
            values
        };

        Ok(Self {
            rule: setup.rule,
            gates,
            canal_m3: per_gate(|gate| gate.canal_m3),
            yearly_limit_m3: per_gate(|gate| gate.yearly_limit_m3),
            stored_loss_share: per_gate(|gate| gate.stored_loss_share),
            daily_return_share: per_gate(daily_return_share),
            return_above,
            shares: shares(setup),
            active_m3: setup.active_m3,
            outlet_m3: setup.outlet_m3,
            date_order,
            minimum_at_dam: setup.minimum_place == MinimumPlace::Dam,
            minimum_before_reservoir: setup.rule != SharingRule::Seniority || setup.minimum_date < setup.reservoir_date,
            pool_serves_minimum: setup.pool_serves_minimum,
            any_stored_loss: setup.gates.iter().any(|gate| gate.stored_loss_share > 0.0),
            any_yearly_limit: setup.gates.iter().any(|gate| gate.yearly_limit_m3 < f64::INFINITY),
            cycle_days,
        })
    }

    /// Begins a new year: yearly limits start again from nothing drawn.
    pub fn start_year(&self, state: &mut RiverState) {
        state.drawn_this_year_m3 = [0.0; MOST_GATES];
    }

    /// Sets every account and the pool to a share of what they may hold; 1 is a full reservoir.
    pub fn set_storage(&self, state: &mut RiverState, share_of_active: f64) {
        state.account_m3 = [0.0; MOST_GATES];
        for (held, share) in state.account_m3.iter_mut().zip(&self.shares.share) {
            *held = share_of_active * (share * self.active_m3);
        }
        state.pool_m3 = share_of_active * self.pool_capacity_m3();
    }

    /// The most that a gate's account may hold, m³; zero where it has none, and under one-pool rules.
    pub fn account_capacity_m3(&self, gate: usize) -> f64 {
        self.shares.share.get(gate).map_or(0.0, |share| share * self.active_m3)
    }

    /// The most that the pool may hold, m³.
    pub fn pool_capacity_m3(&self) -> f64 {
        self.shares.pool_share * self.active_m3
    }

    /// All stored water of a state, m³.
    pub fn content_m3(&self, state: &RiverState) -> f64 {
        // Most rivers have few gates; what is left out is zero.
        let owned_m3 =
            if self.gates.len() <= 8 { sum::<8>(&state.account_m3) } else { sum::<MOST_GATES>(&state.account_m3) };
        owned_m3 + state.pool_m3
    }

    /// Days of one full rotation; zero where no gate has a turn.
    pub fn cycle_days(&self) -> u32 {
        self.cycle_days
    }

    /// The gate, counted from 0, whose turn it is on a day of the rotation; none where no gate has a turn.
    pub fn gate_on_turn(&self, rotation_day: u32) -> Option<usize> {
        let day = rotation_day.checked_rem(self.cycle_days)?;
        self.gates.iter().position(|gate| day < gate.turn_end)
    }
}

/// Share of a return store that comes back in a day: 1 − exp(−1/T), the exact daily form of a linear store.
fn daily_return_share(gate: &Gate) -> f64 {
    // expm1 keeps its digits where the stay is long.
    if gate.return_days > 0.0 { -libm::expm1(-1.0 / gate.return_days) } else { 1.0 }
}

/// Storage shares and capacities; under one-pool rules the pool has all of it.
fn shares(setup: &RiverSetup) -> Shares {
    let capacity = |share: f64| if share > 0.0 { share * setup.active_m3 } else { f64::INFINITY };
    let mut shares = Shares {
        share: [0.0; MOST_GATES],
        capacity_m3: [f64::INFINITY; MOST_GATES],
        pool_share: 1.0,
        pool_capacity_m3: setup.active_m3,
        per_share: 1.0,
    };
    if setup.rule == SharingRule::Seniority {
        let mut owned = 0.0;
        for (i, gate) in setup.gates.iter().enumerate() {
            owned += gate.storage_share;
            shares.share[i] = gate.storage_share;
            shares.capacity_m3[i] = capacity(gate.storage_share);
        }
        let unowned = 1.0 - owned;
        shares.pool_share = if unowned >= SMALLEST_POOL_SHARE { unowned } else { 0.0 };
        shares.pool_capacity_m3 = capacity(shares.pool_share);
        shares.per_share = 1.0 / (owned + shares.pool_share);
    }
    shares
}

/// Refuses values that make no sense, by the name of the field.
fn check(setup: &RiverSetup) -> Result<(), RiverFault> {
    let share = |x: f64| (0.0..=1.0).contains(&x);
    let whole = |ok: bool, value| if ok { Ok(()) } else { Err(RiverFault { gate: None, value }) };
    whole(setup.active_m3 >= 0.0 && setup.active_m3 < f64::INFINITY, "active_m3")?;
    whole(setup.outlet_m3 >= 0.0, "outlet_m3")?;
    let positions = 1..=setup.gates.len() + 1;
    for (i, gate) in setup.gates.iter().enumerate() {
        let checks = [
            (gate.decreed_m3 >= 0.0, "decreed_m3"),
            (gate.canal_m3 >= 0.0, "canal_m3"),
            (share(gate.storage_share), "storage_share"),
            (share(gate.stored_loss_share) && gate.stored_loss_share < 1.0, "stored_loss_share"),
            (gate.yearly_limit_m3 >= 0.0, "yearly_limit_m3"),
            (share(gate.conveyance_loss_share), "conveyance_loss_share"),
            (share(gate.field_efficiency), "field_efficiency"),
            (share(gate.return_share), "return_share"),
            (gate.return_days >= 0.0, "return_days"),
            (positions.contains(&usize::from(gate.return_above)), "return_above"),
        ];
        if let Some((_, value)) = checks.into_iter().find(|(ok, _)| !ok) {
            return Err(RiverFault { gate: Some(i), value });
        }
    }
    let owned: f64 = setup.gates.iter().map(|gate| gate.storage_share).sum();
    whole(owned <= 1.0 + SMALLEST_POOL_SHARE, "storage_share")
}
