//! The river below the dam against worked cases and three tables of three years each.
//!
//! Rules and figures: common practice, no source; `tests/reference/rights/README.md` says where the tables come from.
#![cfg(feature = "std")]

use std::collections::BTreeMap;
use std::path::{Path, PathBuf};

use deshielo::water::canals::{
    Gate, MOST_GATES, MinimumPlace, PriorityDate, River, RiverDay, RiverInput, RiverSetup, RiverState, SharingRule,
};
use serde::Deserialize;

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
struct Cases {
    run: Setup,
    case: Vec<Case>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
struct Case {
    id: String,
    #[serde(rename = "what")]
    _what: String,
    #[serde(rename = "source")]
    _source: String,
    rule: String,
    inputs: Setup,
    expected: Vec<BTreeMap<String, Expected>>,
}

#[derive(Deserialize)]
#[serde(untagged)]
enum Expected {
    One(f64),
    PerGate(Vec<f64>),
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
struct Setup {
    active_m3: f64,
    outlet_m3: f64,
    reservoir_date: String,
    minimum_date: String,
    pool_serves_minimum: bool,
    gate: Vec<GateRow>,
    start: Start,
    #[serde(default)]
    day: Vec<DayRow>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
struct GateRow {
    right_date: String,
    decreed_m3: f64,
    canal_m3: f64,
    share: f64,
    conveyance_loss: f64,
    field_efficiency: f64,
    return_fraction: f64,
    return_days: f64,
    return_above: u8,
    turn_days: u16,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
struct Start {
    account_m3: Vec<f64>,
    pool_m3: f64,
    return_store_m3: Vec<f64>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
struct DayRow {
    inflow_m3: f64,
    lake_evap_m3: f64,
    lake_rain_m3: f64,
    flood_limit_m3: f64,
    minimum_m3: f64,
    demand_m3: Vec<f64>,
}

fn folder() -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/reference/rights")
}

fn cases() -> Cases {
    toml::from_str(&std::fs::read_to_string(folder().join("rights_cases.toml")).unwrap()).unwrap()
}

fn date(text: &str) -> PriorityDate {
    if text == "before_all" {
        return PriorityDate::BeforeAll;
    }
    let mut parts = text.split('-');
    let year = parts.next().unwrap().parse().unwrap();
    match (parts.next(), parts.next()) {
        (Some(month), Some(day)) => PriorityDate::on(year, month.parse().unwrap(), day.parse().unwrap()),
        _ => PriorityDate::year(year),
    }
}

fn padded(values: &[f64]) -> [f64; MOST_GATES] {
    let mut array = [0.0; MOST_GATES];
    array[..values.len()].copy_from_slice(values);
    array
}

/// A run through the library, with the plain canals in the place of fields.
struct Run {
    gates: Vec<Gate>,
    river: River,
    state: RiverState,
    day_number: u32,
    out: RiverDay,
    consumed_m3: f64,
    deep_loss_m3: f64,
}

impl Run {
    fn new(setup: &Setup, rule: &str) -> Self {
        let rule = match rule {
            "seniority" => SharingRule::Seniority,
            "proportional" => SharingRule::Proportional,
            "rotation" => SharingRule::Rotation,
            other => panic!("rule {other}"),
        };
        let gates: Vec<Gate> = setup
            .gate
            .iter()
            .map(|row| Gate {
                decreed_m3: row.decreed_m3,
                canal_m3: row.canal_m3,
                storage_share: row.share,
                conveyance_loss_share: row.conveyance_loss,
                field_efficiency: row.field_efficiency,
                return_share: row.return_fraction,
                return_days: row.return_days,
                turn_days: row.turn_days,
                ..Gate::plain(date(&row.right_date), row.return_above)
            })
            .collect();
        let river = River::new(&RiverSetup {
            rule,
            gates: gates.iter().cloned().collect(),
            active_m3: setup.active_m3,
            outlet_m3: setup.outlet_m3,
            reservoir_date: date(&setup.reservoir_date),
            minimum_date: date(&setup.minimum_date),
            minimum_place: MinimumPlace::RiverEnd,
            pool_serves_minimum: setup.pool_serves_minimum,
        })
        .unwrap();
        let state = RiverState {
            account_m3: padded(&setup.start.account_m3),
            pool_m3: setup.start.pool_m3,
            return_store_m3: padded(&setup.start.return_store_m3),
            ..RiverState::default()
        };
        let out = RiverDay::default();
        Self { gates, river, state, day_number: 0, out, consumed_m3: 0.0, deep_loss_m3: 0.0 }
    }

    fn day(&mut self, row: &DayRow) {
        let demand_m3 = padded(&row.demand_m3);
        let input = RiverInput {
            inflow_m3: row.inflow_m3,
            lake_evaporation_m3: row.lake_evap_m3,
            lake_rain_m3: row.lake_rain_m3,
            flood_limit_m3: row.flood_limit_m3,
            minimum_m3: row.minimum_m3,
            stored_limit_m3: f64::INFINITY,
            rotation_day: self.day_number,
            demand_m3: &demand_m3,
        };
        self.river.day(&mut self.state, &input, &mut self.out);
        (self.consumed_m3, self.deep_loss_m3) = (0.0, 0.0);
        for (i, gate) in self.gates.iter().enumerate() {
            let canal = gate.plain_canal(self.out.canal_m3[i]);
            self.consumed_m3 += canal.used_m3;
            self.deep_loss_m3 += self.river.settle(&mut self.state, i, canal.lost_m3);
        }
        self.day_number += 1;
    }

    /// A value per gate by the name that the tables give it.
    fn per_gate(&self, name: &str) -> Option<&[f64; MOST_GATES]> {
        Some(match name {
            "natural_take_m3" => &self.out.natural_take_m3,
            "stored_take_m3" => &self.out.stored_take_m3,
            "canal_m3" => &self.out.canal_m3,
            "return_flow_m3" => &self.out.return_flow_m3,
            "account_m3" => &self.state.account_m3,
            "return_store_m3" => &self.state.return_store_m3,
            _ => return None,
        })
    }

    /// A value of the day by the name that the tables give it, `canal_2_m3` being that of the second gate.
    fn value(&self, name: &str) -> f64 {
        let out = &self.out;
        match name {
            "natural_flow_m3" => out.natural_flow_m3,
            "rain_passed_m3" => out.rain_passed_m3,
            "evaporation_m3" => out.evaporation_m3,
            "detained_m3" => out.detained_m3,
            "reservoir_take_m3" => out.reservoir_take_m3,
            "minimum_reserved_m3" => out.minimum_reserved_m3,
            "stored_release_m3" => out.stored_release_m3,
            "fraction" => out.fraction.expect("the proportional rule has a fraction"),
            "turn_gate" => out.turn_gate.map_or(0.0, |gate| (gate + 1) as f64),
            "pool_m3" => self.state.pool_m3,
            "content_m3" => out.content_m3,
            "pool_release_m3" => out.pool_release_m3,
            "flood_release_m3" => out.flood_release_m3,
            "spill_m3" => out.spill_m3,
            "dam_outflow_m3" => out.dam_outflow_m3,
            "river_out_m3" => out.river_out_m3,
            "minimum_met" => f64::from(u8::from(out.minimum_met)),
            "consumed_m3" => self.consumed_m3,
            "deep_loss_m3" => self.deep_loss_m3,
            _ => {
                let (start, number) = name.strip_suffix("_m3").unwrap().rsplit_once('_').unwrap();
                let values = self.per_gate(&format!("{start}_m3")).unwrap_or_else(|| panic!("unknown column {name}"));
                values[number.parse::<usize>().unwrap() - 1]
            }
        }
    }
}

fn close(got: f64, expected: f64, at_least: f64) -> bool {
    (got - expected).abs() <= 1e-9 * expected.abs().max(at_least)
}

#[test]
fn worked_cases() {
    let cases = cases().case;
    assert_eq!(cases.len(), 8);
    for case in &cases {
        let mut run = Run::new(&case.inputs, &case.rule);
        assert_eq!(case.inputs.day.len(), case.expected.len(), "{}", case.id);
        for (row, expected) in case.inputs.day.iter().zip(&case.expected) {
            run.day(row);
            for (name, expected) in expected {
                match expected {
                    Expected::One(x) => {
                        let got = run.value(name);
                        assert!(close(got, *x, 1.0), "{}: {name} is {got}, expected {x}", case.id);
                    }
                    Expected::PerGate(list) => {
                        let got = &run.per_gate(name).unwrap_or_else(|| panic!("unknown {name}"))[..list.len()];
                        let all = got.iter().zip(list).all(|(got, x)| close(*got, *x, 1.0));
                        assert!(all, "{}: {name} is {got:?}, expected {list:?}", case.id);
                    }
                }
            }
        }
    }
}

/// Runs the three years under a rule and compares every column of its table; returns the sums of all columns.
fn three_years(rule: &str, table: &str) -> (Run, BTreeMap<String, f64>) {
    let setup = cases().run;
    let mut run = Run::new(&setup, rule);
    let mut forcing = csv::Reader::from_path(folder().join("rights_forcing.csv")).unwrap();
    let mut table = csv::Reader::from_path(folder().join(table)).unwrap();
    let columns = table.headers().unwrap().clone();
    let mut sums = BTreeMap::new();
    let mut days = 0;
    for (given, expected) in forcing.records().zip(table.records()) {
        let (given, expected) = (given.unwrap(), expected.unwrap());
        assert_eq!(&given[0], &expected[0], "the dates of forcing and table");
        let numbers: Vec<f64> = given.iter().skip(1).map(|cell| cell.parse().unwrap()).collect();
        run.day(&DayRow {
            inflow_m3: numbers[0],
            lake_evap_m3: numbers[1],
            lake_rain_m3: numbers[2],
            flood_limit_m3: numbers[3],
            minimum_m3: numbers[4],
            demand_m3: numbers[5..].to_vec(),
        });
        for (name, cell) in columns.iter().zip(&expected).skip(1) {
            let (got, expected): (f64, f64) = (run.value(name), cell.parse().unwrap());
            assert!(close(got, expected, 1000.0), "{} {name}: {got}, expected {expected}", &given[0]);
            *sums.entry(name.to_owned()).or_insert(0.0) += got;
        }
        days += 1;
    }
    assert_eq!(days, 1096);
    (run, sums)
}

/// The sums over the run to the three decimals in which they are published beside the tables, and the last content.
fn check_sums(run: &Run, sums: &BTreeMap<String, f64>, take: f64, river: f64, consumed: f64, met: f64, content: f64) {
    let expected =
        [("reservoir_take_m3", take), ("river_out_m3", river), ("consumed_m3", consumed), ("minimum_met", met)];
    for (name, expected) in expected {
        assert!((sums[name] - expected).abs() < 0.001, "{name}: {} expected {expected}", sums[name]);
    }
    assert!((run.out.content_m3 - content).abs() < 0.001);
}

#[test]
fn three_years_by_seniority() {
    let (run, sums) = three_years("seniority", "rights_daily.csv");
    check_sums(&run, &sums, 150409181.613, 420625146.587, 278132818.739, 614.0, 15717955.654);
}

#[test]
fn three_years_by_one_fraction() {
    let (run, sums) = three_years("proportional", "rights_proportional.csv");
    check_sums(&run, &sums, 101855177.123, 436763529.568, 281086319.330, 1066.0, 0.0);
}

#[test]
fn three_years_by_turns() {
    let (run, sums) = three_years("rotation", "rights_rotation.csv");
    check_sums(&run, &sums, 76561178.867, 591955364.245, 141097755.801, 1096.0, 33309775.448);
}
