//! The invented places are what they are said to be: believable, sensible at every dial, and made again to the byte.

#[path = "../examples/make_demo_data/records.rs"]
mod records;

use std::collections::BTreeSet;
use std::path::Path;

use deshielo::place::demo::{demo_files, droughts, piedranieve_files};
use deshielo::place::{DialOffer, DialPlan, EvaporationChoice, Place, Source, Years, read, read_setting};
use deshielo::signs::{CanalSigns, Sign, YearReport, performance, read_run, spread};
use deshielo::water::basin::{Basin, BasinDay};
use deshielo::water::canals::{MinimumPlace, SharingRule};
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::ledger::Flow;
use deshielo::water::run::run_basin;
use deshielo::water::valley::{MOST_FIELDS, MOST_GATES, MOST_LAKE_POINTS, MOST_RULE_POINTS, Purpose, Valley};
use deshielo::water::works::{Evening, Works};

/// Reads a place that must have nothing wrong with it, not even a warning.
fn place(source: Source<'_>) -> Place {
    let outcome = read(source);
    let told: Vec<_> =
        outcome.problems.iter().map(|problem| (problem.at.line, problem.message, &problem.arguments)).collect();
    assert!(told.is_empty(), "{told:?}");
    outcome.place.expect("a place without problems")
}

fn tresnubes() -> Place {
    place(Source::Embedded(demo_files()))
}

fn piedranieve() -> Place {
    place(Source::Embedded(piedranieve_files()))
}

fn limits() -> Place {
    place(Source::Folder(Path::new("demo-data/limits")))
}

/// The days of the basin and the whole water years.
fn run_telling(place: &Place, valley: &Valley, dials: &Dials, each: impl FnMut(&Evening)) -> Ran {
    let mut each = each;
    let mut basin = vec![BasinDay::default(); place.days.len()];
    let before = run_basin(valley, &Basin::new(valley, dials), &place.calendar, &place.days, &mut basin);
    let works = Works::new(valley, dials).expect("a checked place");
    let mut years = Vec::new();
    let each_day = |evening: &Evening, _: &_| each(evening);
    read_run(valley, &works, &place.calendar, &basin, &before, each_day, |year| years.push(year));
    Ran { basin, years }
}

fn run(place: &Place, dials: &Dials) -> Ran {
    run_telling(place, &place.valley, dials, |_| {})
}

struct Ran {
    basin: Vec<BasinDay>,
    years: Vec<YearReport>,
}

impl Ran {
    fn mean_of(&self, value: impl Fn(&YearReport) -> f64) -> f64 {
        self.years.iter().map(value).sum::<f64>() / self.years.len() as f64
    }

    fn mean(&self, sign: Sign) -> f64 {
        spread(self.years.iter().filter_map(|year| sign.of(&year.signs))).map_or(f64::NAN, |spread| spread.mean)
    }

    /// Mean natural flow of a year, hm³.
    fn flow_hm3(&self) -> f64 {
        self.mean_of(|year| year.signs.natural_flow_hm3)
    }

    fn canal(&self, place: &Place, key: &str, value: impl Fn(&CanalSigns) -> f64) -> f64 {
        let index = place.gates.iter().position(|gate| gate.key == key).expect("a gate of that name");
        self.mean_of(|year| value(&year.signs.canals[index]))
    }

    fn supply(&self, place: &Place, key: &str) -> f64 {
        self.canal(place, key, |canal| canal.supply_ratio.unwrap_or(1.0))
    }

    fn reliability(&self, place: &Place, key: &str) -> f64 {
        let index = place.gates.iter().position(|gate| gate.key == key).expect("a gate of that name");
        let years = self.years.iter().map(|year| &year.signs.canals[index]);
        let asked = years.map(|canal| (canal.demand_hm3, canal.delivered_hm3));
        performance(asked, place.valley.enough_share).expect("years with demand").reliability
    }
}

/// Every dial of the place at both of its ends.
fn dial_ends(plan: &DialPlan) -> Vec<(Dial, f64)> {
    plan.open().flat_map(|(dial, range)| [(dial, range.least), (dial, range.most)]).collect()
}

#[test]
fn every_record_is_made_again_byte_for_byte() {
    for record in records::RECORDS {
        let kept = std::fs::read_to_string(record.file).unwrap();
        assert!(record.text() == kept, "{}: run `cargo run --example make_demo_data`", record.file);
    }
    assert!(records::observed_text() == std::fs::read_to_string(records::OBSERVED_FILE).unwrap());
}

#[test]
fn every_file_says_on_top_that_it_is_invented_in_both_languages() {
    let mut seen = 0;
    for folder in ["tresnubes", "piedranieve", "limits"] {
        for entry in std::fs::read_dir(Path::new("demo-data").join(folder)).unwrap() {
            let path = entry.unwrap().path();
            let text = std::fs::read_to_string(&path).unwrap();
            let top: String = text.lines().take_while(|line| line.starts_with('#')).collect();
            let top = top.to_lowercase();
            assert!(top.contains("invented") && top.contains("inventado"), "{}", path.display());
            assert!(top.contains("made by") || top.contains("make_demo_data"), "{}: how?", path.display());
            seen += 1;
        }
    }
    assert_eq!(seen, 9);
    for place in [tresnubes(), piedranieve(), limits()] {
        assert!(place.invented && place.source.is_some());
    }
}

#[test]
fn what_is_built_in_is_what_lies_in_the_folder() {
    for (embedded, folder) in [(tresnubes(), "tresnubes"), (piedranieve(), "piedranieve")] {
        let folder = place(Source::Folder(&Path::new("demo-data").join(folder)));
        // NaN in a record is not equal to itself; the debug form is.
        assert_eq!(format!("{:?}", Place { folder: None, ..folder }), format!("{embedded:?}"));
    }
}

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

#[test]
fn the_ledger_closes_everywhere_at_rest_and_at_every_end() {
    for place in [tresnubes(), piedranieve(), limits()] {
        let ends = dial_ends(&place.dials);
        let settings = ends.iter().map(|&(dial, value)| Dials::REST.with(dial, value));
        for dials in settings.chain([Dials::REST]) {
            for year in run(&place, &dials).years {
                let residual = year.ledger.residual_share().abs();
                assert!(residual <= 1e-9, "{dials:?}, {}: {residual:e}", year.signs.water_year);
            }
        }
    }
}

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

#[test]
fn every_drought_is_one_wherever_it_can_be_tried() {
    assert_eq!(droughts().len(), 4);
    for (name, text) in droughts() {
        let file = format!("scenarios/droughts/{name}.toml");
        assert_eq!(*text, std::fs::read_to_string(&file).unwrap());
        let widest = read_setting(Path::new(&file), text, &DialPlan::WIDEST);
        assert!(widest.problems.is_empty(), "{:?}", widest.problems);
        let setting = widest.setting.unwrap();
        assert!(matches!(setting.years, Years::Dry | Years::Middling));
        for tag in ["en", "es", "es-CL", "es-ES"] {
            let sentence = setting.text.as_ref().unwrap().get(tag);
            assert!(sentence.ends_with('.') && setting.name.get(tag) != *name, "{tag}: {sentence}");
        }
        for place in [tresnubes(), piedranieve(), limits()] {
            let here = read_setting(Path::new(&file), text, &place.dials);
            assert!(here.problems.iter().all(|problem| problem.message == "problem-setting-dial-absent"));
            let (rest, dry) = (run(&place, &Dials::REST), run(&place, &here.setting.unwrap().dials));
            assert!(dry.mean(Sign::SupplyRatio) < rest.mean(Sign::SupplyRatio), "{name} at {}", place.name.get("en"));
        }
    }
}
