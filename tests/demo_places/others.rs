//! The southern place takes turns, and the place at the limits is at every limit.

use std::collections::BTreeSet;

use deshielo::place::{DialOffer, EvaporationChoice};
use deshielo::signs::Sign;
use deshielo::water::canals::{MinimumPlace, SharingRule};
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::valley::{MOST_FIELDS, MOST_GATES, MOST_LAKE_POINTS, MOST_RULE_POINTS, Purpose, Valley};

use crate::{limits, piedranieve, run, run_telling};

#[test]
fn piedranieve_melts_in_the_southern_spring_and_takes_turns() {
    let place = piedranieve();
    assert!(place.valley.is_southern() && place.valley.water_year_start_month == 4);
    assert_eq!((place.region.as_str(), place.valley.rule), ("es-CL", SharingRule::Rotation));
    for dial in [Dial::ReservoirSize, Dial::StartingStorage, Dial::TownGrowth] {
        assert_eq!(place.dials.offer(dial), DialOffer::Lacking);
    }
    let mut served = BTreeSet::new();
    let mut turns = Vec::new();
    let ran = run_telling(&place, &place.valley, &Dials::REST, |evening| {
        let watered: Vec<usize> = (0..evening.gates).filter(|&gate| evening.river.canal_m3[gate] > 0.0).collect();
        assert!(watered.len() <= 1, "one canal at a time");
        assert!(watered.iter().all(|&gate| evening.river.turn_gate == Some(gate)));
        served.extend(watered);
        if evening.today.water_year == 2000 && evening.today.month_day.month == 11 {
            turns.extend(evening.river.turn_gate);
        }
    });
    assert!(ran.years.len() >= 20);
    assert_eq!(served.len(), 4, "everyone gets a turn");
    assert_eq!(turns.len(), 30);
    assert!(turns.iter().zip(&turns[10..]).all(|(now, next)| now == next), "a round of ten days: {turns:?}");
    for (gate, days) in [2, 3, 2, 3].into_iter().enumerate() {
        assert_eq!(turns[..10].iter().filter(|&&turn| turn == gate).count(), days);
    }

    let mut by_month = [0.0; 12];
    for (day, basin) in place.calendar.iter().zip(&ran.basin) {
        by_month[day.month_index()] += basin.inflow_m3;
    }
    let wettest = (0..12).max_by(|&a, &b| by_month[a].total_cmp(&by_month[b])).unwrap() + 1;
    assert!((10..=12).contains(&wettest), "{wettest}: {by_month:?}");
    // Common practice, no source: half a year from the north's first of April.
    let peak_snow = ran.mean(Sign::PeakSweDate);
    assert!((123.0..=193.0).contains(&peak_snow), "August to the first days of October: {peak_snow}");
    let warmer = run(&place, &Dials::REST.with(Dial::Warming, 3.0));
    assert!(warmer.mean(Sign::SnowShare) < ran.mean(Sign::SnowShare) - 0.1);
    assert!(warmer.mean(Sign::HalfVolumeDate) < ran.mean(Sign::HalfVolumeDate) - 7.0);
    assert!(run(&place, &Dials::REST.with(Dial::WinterPrecipitation, -50.0)).flow_hm3() < 0.6 * ran.flow_hm3());
}

#[test]
fn the_place_at_the_limits_is_at_every_limit() {
    let place = limits();
    let valley = &place.valley;
    assert_eq!((valley.bands.len(), valley.gates.len()), (valley.bands.capacity(), MOST_GATES));
    let fields = |gate: &deshielo::water::valley::Gate| match &gate.purpose {
        Purpose::Fields(fields) => fields.len(),
        Purpose::Town(_) => 0,
    };
    assert!(valley.gates.iter().filter(|gate| fields(gate) == MOST_FIELDS).count() >= 3);
    assert_eq!(valley.gates.iter().filter(|gate| gate.is_town()).count(), 2);
    let reservoir = valley.reservoir.as_ref().unwrap();
    assert_eq!((reservoir.table.len(), reservoir.flood_space.len()), (MOST_LAKE_POINTS, MOST_RULE_POINTS));
    assert_eq!((valley.minimum.rate_m3s.len(), valley.minimum.at), (MOST_RULE_POINTS, MinimumPlace::Dam));
    assert_eq!(valley.channel.unit_hydrograph_base_days, 20.0);
    assert_eq!(place.notes.evaporation.choice, EvaporationChoice::PenmanMonteith);
    let air = |day: &deshielo::water::weather::StationDay| {
        day.air.solar_mj_m2.is_finite() && day.air.wind_2m_ms.is_finite() && day.air.vapour_pressure_kpa.is_finite()
    };
    assert!(place.days.iter().all(air), "every column is there every day");
    assert!(
        place.gates.iter().flat_map(|gate| &gate.fields).any(|field| field.crop_name.is_some()),
        "a crop of its own"
    );
    assert_eq!(place.dials.offer(Dial::TownGrowth), DialOffer::Hidden);
    assert_eq!(place.dials.range(Dial::Warming).map(|range| range.most), Some(4.0));
    assert!(place.gauge.is_some() && place.snow_record.is_some() && place.storage_record.is_some());
    assert_eq!(place.diversions.len(), 1);
    assert_eq!(run(&place, &Dials::REST).years.len(), 3);
}

#[test]
fn every_option_of_the_place_at_the_limits_does_something() {
    let place = limits();
    let dials = Dials::REST.with(Dial::Warming, 2.0);
    let signs = |valley: &Valley| {
        let years = run_telling(&place, valley, &dials, |_| {}).years;
        years.into_iter().map(|year| (year.signs, year.ledger)).collect::<Vec<_>>()
    };
    let with_all = signs(&place.valley);
    type TakeAway = fn(&mut Valley);
    let without: [(&str, TakeAway); 14] = [
        ("monthly lapse", |valley| valley.climb.lapse_c_per_km = [-6.0; 12]),
        ("warming by quarter", |valley| valley.climb.warming_weight = [1.0; 4]),
        ("precipitation factor", |valley| valley.climb.precipitation_factor = 1.0),
        ("wet bulb", |valley| valley.rain_snow.wet_bulb = false),
        ("heat of rain", |valley| valley.snow.heat_of_rain = false),
        ("sublimation", |valley| valley.snow.sublimation_mm_day = 0.0),
        ("reach", |valley| valley.channel.reach = None),
        ("exposure", |valley| valley.bands.iter_mut().for_each(|band| band.melt_exposure = 1.0)),
        ("hedging", |valley| valley.reservoir.as_mut().unwrap().hedging = None),
        ("dated minimum", |valley| valley.minimum.rate_m3s.truncate(1)),
        ("yearly limits", |valley| valley.gates.iter_mut().for_each(|gate| gate.yearly_limit_hm3 = f64::INFINITY)),
        ("stored loss", |valley| valley.gates.iter_mut().for_each(|gate| gate.stored_loss_share = 0.0)),
        ("accounts", |valley| valley.gates.iter_mut().for_each(|gate| gate.storage_share = 0.0)),
        ("flood space", |valley| {
            let reservoir = valley.reservoir.as_mut().unwrap();
            reservoir.flood_space.clear();
        }),
    ];
    for (option, take_away) in without {
        let mut valley = place.valley.clone();
        take_away(&mut valley);
        assert!(signs(&valley) != with_all, "{option} changes nothing");
    }
}
