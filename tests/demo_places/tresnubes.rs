//! Tresnubes is a believable mountain river, and every dial does there what one would expect.

use deshielo::signs::Sign;
use deshielo::water::canals::SharingRule;
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::ledger::Flow;

use crate::{Ran, run, tresnubes};

#[test]
fn tresnubes_is_a_believable_mountain_river() {
    let place = tresnubes();
    let ran = run(&place, &Dials::REST);
    assert!(ran.years.len() >= 40);
    assert_eq!(place.valley.bands.len(), 10);

    let snow_share = ran.mean(Sign::SnowShare);
    assert!((0.55..=0.75).contains(&snow_share), "{snow_share}");
    let runoff_mm = 1000.0 * ran.flow_hm3() / place.valley.band_area_km2();
    let ratio = runoff_mm / ran.mean(Sign::Precipitation);
    assert!((0.3..=0.6).contains(&ratio), "{ratio}");

    // Common practice, no source: northern mid-latitude snow peaks near 1 April, day 183 of the water year, and snowmelt
    // rivers carry most of the year's flow from April to July, with the peak in late spring.
    let peak_snow = ran.mean(Sign::PeakSweDate);
    assert!((173.0..=193.0).contains(&peak_snow), "{peak_snow}");
    assert!(ran.mean(Sign::SpringVolume) > 0.6 * ran.flow_hm3());
    let peak_flow = ran.mean(Sign::PeakFlowDate);
    assert!((213.0..=258.0).contains(&peak_flow), "May to the middle of June: {peak_flow}");

    let reservoir = place.valley.reservoir.as_ref().unwrap();
    let years_of_flow = reservoir.capacity_hm3 / ran.flow_hm3();
    assert!((0.75..=0.85).contains(&years_of_flow), "{years_of_flow}");
}

#[test]
fn tresnubes_has_droughts_of_several_years_and_years_that_spill() {
    let place = tresnubes();
    let ran = run(&place, &Dials::REST);
    let mean_hm3 = ran.flow_hm3();
    let (mut longest, mut dry_years) = (0, 0);
    for year in &ran.years {
        dry_years = if year.signs.natural_flow_hm3 < 0.85 * mean_hm3 { dry_years + 1 } else { 0 };
        longest = longest.max(dry_years);
    }
    assert!(longest >= 3, "{longest}");

    let mut by_flow: Vec<_> = ran.years.iter().map(|year| &year.signs).collect();
    by_flow.sort_by(|a, b| a.natural_flow_hm3.total_cmp(&b.natural_flow_hm3));
    let spill_hm3 = |years: &[&deshielo::signs::YearSigns]| years.iter().filter_map(|year| year.spill_hm3).sum::<f64>();
    assert!(by_flow[by_flow.len() - 4..].iter().all(|year| year.spill_hm3.unwrap() > 1.0), "wet years spill");
    assert!(spill_hm3(&by_flow[..10]) < 1e-6, "dry ones do not");

    // Water carried over is what bridges a dry year: without any, the youngest canal fails far more often.
    let emptied = run(&place, &Dials::REST.with(Dial::StartingStorage, 0.0));
    assert!(ran.reliability(&place, "llano") - emptied.reliability(&place, "llano") > 0.2);
}

#[test]
fn in_tresnubes_the_old_rights_are_full_and_the_youngest_fails_one_year_in_three() {
    let place = tresnubes();
    let ran = run(&place, &Dials::REST);
    let canals = place.valley.gates.iter().filter(|gate| !gate.is_town()).count();
    assert_eq!((canals, place.valley.rule), (5, SharingRule::Seniority));
    for senior in ["molino", "norte", "tresnubes", "vega"] {
        assert!(ran.reliability(&place, senior) >= 0.95, "{senior}");
        assert!(ran.supply(&place, senior) > 0.99, "{senior}");
    }
    let youngest = place.gates.iter().max_by_key(|gate| gate.right_year).unwrap();
    assert_eq!(youngest.key, "llano");
    let failed = 1.0 - ran.reliability(&place, "llano");
    assert!((0.26..=0.40).contains(&failed), "{failed}");
    let minimum_met = ran.mean_of(|year| f64::from(year.signs.river_minimum_days_met.unwrap()));
    assert!(minimum_met > 360.0);
}

#[test]
fn warming_takes_snow_and_brings_the_river_forward() {
    // Common practice, no source.
    let place = tresnubes();
    let mut before = run(&place, &Dials::REST);
    let rest = before.mean(Sign::HalfVolumeDate);
    for warming in [1.0, 2.0, 3.0, 6.0] {
        let warmer = run(&place, &Dials::REST.with(Dial::Warming, warming));
        for (cool, warm) in before.years.iter().zip(&warmer.years) {
            assert!(warm.signs.snow_share < cool.signs.snow_share, "{warming} °C, {}", cool.signs.water_year);
        }
        for sign in [Sign::SurveySwe, Sign::PeakSwe, Sign::PeakSweDate, Sign::HalfVolumeDate, Sign::CentreOfVolumeDay] {
            assert!(warmer.mean(sign) < before.mean(sign), "{warming} °C: {}", sign.key());
        }
        assert!(warmer.supply(&place, "llano") < before.supply(&place, "llano"));
        before = warmer;
    }
    // What six degrees do here: more than three weeks.
    assert!(rest - before.mean(Sign::HalfVolumeDate) > 21.0);
}

#[test]
fn every_dial_of_tresnubes_does_what_one_would_expect() {
    let place = tresnubes();
    let rest = run(&place, &Dials::REST);
    let at = |dial, value| run(&place, &Dials::REST.with(dial, value));
    let llano = |ran: &Ran| ran.supply(&place, "llano");
    let flow = |ran: &Ran, flow: Flow| ran.mean_of(|year| year.ledger.of(flow));
    assert_eq!(place.dials.open().count(), 10, "every dial is there to be turned");

    for dial in [Dial::WinterPrecipitation, Dial::SummerPrecipitation] {
        let (less, more) = (at(dial, -50.0), at(dial, 50.0));
        assert!(less.flow_hm3() < 0.85 * rest.flow_hm3() && rest.flow_hm3() < 0.87 * more.flow_hm3());
        assert!(llano(&less) + 0.1 < llano(&rest) && llano(&rest) + 0.05 < llano(&more), "{}", dial.key());
    }
    let (less, more) = (at(Dial::Diversion, -50.0), at(Dial::Diversion, 100.0));
    assert!(llano(&less) > 0.999 && llano(&more) < 0.5);
    assert!(more.mean(Sign::Carryover) + 20.0 < rest.mean(Sign::Carryover));
    assert!(rest.mean(Sign::Carryover) + 20.0 < less.mean(Sign::Carryover));

    let lined = at(Dial::CanalLining, 100.0);
    assert!(flow(&lined, Flow::ConveyanceLoss) < 0.1 * flow(&rest, Flow::ConveyanceLoss), "the town keeps its pipe");
    assert!(llano(&lined) > llano(&rest) + 0.03);
    assert!(flow(&lined, Flow::ReturnFlow) < 0.8 * flow(&rest, Flow::ReturnFlow), "and the return flow goes too");
    assert!(flow(&lined, Flow::Canals) < 0.95 * flow(&rest, Flow::Canals));

    let grain = at(Dial::CropMix, 100.0);
    assert!(llano(&grain) > llano(&rest) + 0.03 && grain.mean(Sign::Carryover) > rest.mean(Sign::Carryover) + 5.0);

    let (none, triple) = (at(Dial::RiverMinimum, -100.0), at(Dial::RiverMinimum, 200.0));
    assert!(none.years.iter().all(|year| year.signs.river_minimum_days_met.is_none()));
    assert!(llano(&triple) + 0.1 < llano(&rest) && llano(&rest) < llano(&none));
    assert!(triple.mean(Sign::RiverMinimumDaysMet) + 20.0 < rest.mean(Sign::RiverMinimumDaysMet));

    let (small, large) = (at(Dial::ReservoirSize, -50.0), at(Dial::ReservoirSize, 100.0));
    assert!(llano(&small) + 0.2 < llano(&rest) && llano(&rest) + 0.05 < llano(&large));

    let (empty, full) = (at(Dial::StartingStorage, 0.0), at(Dial::StartingStorage, 100.0));
    assert!(llano(&empty) + 0.2 < llano(&rest) && llano(&rest) < llano(&full));

    let grown = at(Dial::TownGrowth, 200.0);
    assert!(flow(&grown, Flow::TownUse) > 2.0 * flow(&rest, Flow::TownUse));
    assert!(grown.supply(&place, "tresnubes") < 0.9, "the town outgrows its right");
    assert!(llano(&grown) < llano(&rest) - 0.01 && grown.mean(Sign::Carryover) < rest.mean(Sign::Carryover) - 2.0);
}
