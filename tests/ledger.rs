//! Every drop accounted: the ledger closes for places, dials and weather at random.

#[path = "support/valleys.rs"]
mod valleys;

use deshielo::water::ledger::{Flow, Ledger, Store};
use proptest::prelude::*;

fn assert_closes(ledger: &Ledger, what: &str) {
    assert!(ledger.residual_share().abs() <= 1e-9, "{what}: residual {:e}", ledger.residual_share());
    for flow in Flow::ALL {
        assert!(ledger.of(flow) >= 0.0, "{what}: {} is {}", flow.key(), ledger.of(flow));
    }
    for store in Store::ALL {
        assert!(ledger.end.of(store) >= -1e-6, "{what}: {} holds {}", store.key(), ledger.end.of(store));
    }
}

fn check(seed: u32, weather: u32) {
    let (valley, dials) = valleys::random_valley(seed);
    let (calendar, record) = valleys::record(&valley, 4, weather);
    let ran = valleys::run(&valley, &dials, &calendar, &record);
    assert_eq!(ran.years.len(), 4);
    let mut all = Ledger::open(ran.years[0].ledger.start);
    for year in &ran.years {
        assert_closes(&year.ledger, &format!("seed {seed}, year {}", year.signs.water_year));
        all.append(&year.ledger);
    }
    assert_closes(&all, &format!("seed {seed}, all years"));
    for pair in ran.years.windows(2) {
        let (gap, size) = (pair[0].ledger.end.total_m3() - pair[1].ledger.start.total_m3(), pair[0].ledger.in_m3());
        assert!(gap.abs() <= 1e-9 * size, "seed {seed}: a year starts where the one before ended");
    }
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(300))]

    #[test]
    fn the_ledger_closes_for_any_place_dials_and_weather(seed: u32, weather: u32) {
        check(seed, weather);
    }
}

#[test]
fn random_places_cover_all_rules_with_and_without_dam_town_and_rights() {
    use deshielo::water::canals::SharingRule;
    let places: Vec<_> = (0..400).map(|seed| valleys::random_valley(seed * 7_919).0).collect();
    for rule in [SharingRule::Seniority, SharingRule::Proportional, SharingRule::Rotation] {
        assert!(places.iter().any(|place| place.rule == rule && place.reservoir.is_some()), "{rule:?} with a dam");
        assert!(places.iter().any(|place| place.rule == rule && place.reservoir.is_none()), "{rule:?} without a dam");
    }
    assert!(places.iter().any(|place| place.gates.iter().any(|gate| gate.is_town())));
    assert!(places.iter().any(|place| place.gates.is_empty()));
    assert!(places.iter().any(|place| place.gates.len() == 24));
    assert!(places.iter().any(|place| place.bands.len() == 32));
    assert!(places.iter().any(|place| place.is_southern()));
}

#[test]
fn a_whole_valley_closes_and_shows_its_flows() {
    let valley = valleys::whole_valley();
    let (calendar, record) = valleys::record(&valley, 10, 5);
    let ran = valleys::run(&valley, &deshielo::water::dials::Dials::REST, &calendar, &record);
    for year in &ran.years {
        assert_closes(&year.ledger, "whole valley");
    }
    for flow in [Flow::Canals, Flow::ReturnFlow, Flow::TownUse, Flow::LakeEvaporation, Flow::StoredRelease] {
        assert!(ran.years.iter().any(|year| year.ledger.of(flow) > 0.0), "{} never flows", flow.key());
    }
}
