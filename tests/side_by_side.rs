//! Settings run side by side give every lane the same bits as the run alone.

#[path = "support/valleys.rs"]
mod valleys;

use deshielo::water::basin::{Basin, BasinDay, Basins};
use deshielo::water::calendar::CalendarDay;
use deshielo::water::dials::Dials;
use deshielo::water::evaporation::Method;
use deshielo::water::valley::{MOST_BANDS, ReachTraits, Valley};
use deshielo::water::weather::StationDay;
use proptest::prelude::*;

fn numbers_of(day: &BasinDay) -> [f64; 11] {
    [
        day.precipitation_mm,
        day.snowfall_mm,
        day.snow_water_mm,
        day.soil_mm,
        day.ground_mm,
        day.channel_mm,
        day.evaporation_mm,
        day.sublimation_mm,
        day.inflow_m3,
        day.reference_evaporation_mm,
        day.valley_precipitation_mm,
    ]
}

/// What the trials turn on and off.
#[derive(Clone, Copy, Debug)]
struct Trial {
    bands: usize,
    power: f64,
    wet_bulb: bool,
    reach: bool,
}

/// A place at random with the trial's features, and weather with humidity.
fn place(seed: u32, trial: Trial) -> (Valley, Vec<CalendarDay>, Vec<StationDay>) {
    let mut valley = valleys::random_valley(seed).0;
    valley.bands = valleys::bare_basin(trial.bands).bands;
    valley.soil.recharge_power = trial.power;
    valley.rain_snow.wet_bulb = trial.wet_bulb;
    valley.channel.reach = trial.reach.then_some(ReachTraits { travel_days: 1.2, inflow_weight: 0.2 });
    let (calendar, mut record) = valleys::record(&valley, 2, seed);
    let mut next = valleys::numbers(seed ^ 0x5EED);
    for day in &mut record {
        day.relative_humidity_percent = 20.0 + 80.0 * next();
    }
    (valley, calendar, record)
}

/// The same place with other parameters in every lane; bands, kind of split and power stay.
fn lanes<const L: usize>(valley: &Valley, seed: u32) -> [(Valley, Dials); L] {
    let mut next = valleys::numbers(seed ^ 0x1A7E);
    std::array::from_fn(|lane| {
        let mut other = valley.clone();
        // The first lane keeps the place's own parameters.
        let mut turn = |value: &mut f64, spread: f64| *value *= 1.0 + if lane == 0 { 0.0 } else { spread * next() };
        turn(&mut other.snow.melt_factor_mm_c_day, 0.5);
        turn(&mut other.snow.liquid_holding_share, 1.0);
        turn(&mut other.rain_snow.all_rain_above_c, 0.4);
        turn(&mut other.climb.snow_catch_factor, 0.2);
        turn(&mut other.soil.capacity_mm, 0.6);
        turn(&mut other.ground.quick_days, 0.9);
        let dials = Dials {
            warming: (next() * 12.0).floor() * 0.5,
            winter_precipitation: (next() * 20.0).floor() * 5.0 - 50.0,
            summer_precipitation: (next() * 20.0).floor() * 5.0 - 50.0,
            ..Dials::REST
        };
        (other, if lane == 1 { Dials::REST } else { dials })
    })
}

fn alone(valley: &Valley, dials: &Dials, calendar: &[CalendarDay], record: &[StationDay]) -> Vec<BasinDay> {
    let basin = Basin::new(valley, dials);
    let mut days = vec![BasinDay::default(); record.len()];
    basin.run(&mut basin.start(), calendar, record, &mut days);
    days
}

fn together<const L: usize>(
    lanes: &[(Valley, Dials); L],
    calendar: &[CalendarDay],
    record: &[StationDay],
) -> [Vec<BasinDay>; L] {
    let basins = Basins::<L>::new(lanes.each_ref().map(|lane| &lane.0), lanes.each_ref().map(|lane| &lane.1));
    let mut days: [Vec<BasinDay>; L] = std::array::from_fn(|_| vec![BasinDay::default(); record.len()]);
    basins.run(&mut basins.start(), calendar, record, &mut days.each_mut().map(Vec::as_mut_slice));
    days
}

fn assert_same_bits<const L: usize>(seed: u32, trial: Trial) {
    let (valley, calendar, record) = place(seed, trial);
    let lanes = lanes::<L>(&valley, seed);
    let together = together(&lanes, &calendar, &record);
    for (lane, ((valley, dials), together)) in lanes.iter().zip(&together).enumerate() {
        let alone = alone(valley, dials, &calendar, &record);
        assert!(alone.iter().all(|day| numbers_of(day).iter().all(|number| number.is_finite())));
        for (day, (alone, together)) in alone.iter().zip(together).enumerate() {
            let (alone, together) = (numbers_of(alone), numbers_of(together));
            let bits = |numbers: [f64; 11]| numbers.map(f64::to_bits);
            assert_eq!(
                bits(alone),
                bits(together),
                "{trial:?}, seed {seed}, lane {lane} of {L}, day {day}: {alone:?}, {together:?}"
            );
        }
    }
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(60))]

    #[test]
    fn every_lane_has_the_bits_of_the_run_alone(
        seed: u32,
        bands in 1..=MOST_BANDS,
        halves in 1_u32..=12,
        general in prop::option::of(0.3_f64..9.0),
        wet_bulb: bool,
        reach: bool,
    ) {
        let power = general.unwrap_or(f64::from(halves) / 2.0);
        let trial = Trial { bands, power, wet_bulb, reach };
        assert_same_bits::<2>(seed, trial);
        assert_same_bits::<4>(seed, trial);
        assert_same_bits::<8>(seed, trial);
    }
}

#[test]
fn every_number_of_bands_and_every_compiled_power() {
    for bands in 1..=MOST_BANDS {
        let power = 0.5 * (1 + bands % 10) as f64;
        let trial = Trial { bands, power, wet_bulb: bands % 3 == 0, reach: bands % 2 == 0 };
        assert_same_bits::<2>(bands as u32, trial);
        assert_same_bits::<4>(bands as u32, Trial { power: 3.6, ..trial });
        assert_same_bits::<8>(bands as u32, trial);
    }
}

#[test]
fn wet_bulb_and_reach_are_felt() {
    // Were they not, the trials above would say nothing of them.
    let plain = Trial { bands: 6, power: 2.5, wet_bulb: false, reach: false };
    let flow = |trial: Trial| {
        let (mut valley, calendar, record) = place(11, trial);
        valley.evaporation.method = Method::Oudin;
        alone(&valley, &Dials::REST, &calendar, &record).iter().map(|day| day.inflow_m3).collect::<Vec<_>>()
    };
    let as_is = flow(plain);
    assert_ne!(as_is, flow(Trial { wet_bulb: true, ..plain }));
    assert_ne!(as_is, flow(Trial { reach: true, ..plain }));
    assert_ne!(as_is, flow(Trial { power: 3.0, ..plain }));
}

#[test]
fn lanes_of_different_powers_agree_with_the_run_alone_to_rounding() {
    // They all take the general curve: halves alone go by multiplication, and differ in the last digits.
    let trial = Trial { bands: 7, power: 2.5, wet_bulb: false, reach: true };
    let (valley, calendar, record) = place(5, trial);
    let mut lanes = lanes::<4>(&valley, 5);
    for (lane, power) in lanes.iter_mut().zip([2.5, 3.0, 3.6, 1.0]) {
        lane.0.soil.recharge_power = power;
    }
    let together = together(&lanes, &calendar, &record);
    for ((valley, dials), together) in lanes.iter().zip(&together) {
        for (alone, together) in alone(valley, dials, &calendar, &record).iter().zip(together) {
            for (alone, together) in numbers_of(alone).into_iter().zip(numbers_of(together)) {
                assert!((alone - together).abs() <= 1e-10 * alone.abs().max(1e-3), "{alone} and {together}");
            }
        }
    }
}

#[test]
fn a_longer_page_than_the_record_is_left_as_it_was() {
    // Settling runs write a few years into room for all of them; what lies beyond must not move the stores on.
    let valley = valleys::bare_basin(7);
    let (calendar, record) = valleys::record(&valley, 1, 3);
    let basin = Basin::new(&valley, &Dials::REST);
    let (mut exact, mut roomy) = (basin.start(), basin.start());
    let days = 37;
    let mut page = vec![BasinDay::default(); days];
    basin.run(&mut exact, &calendar[..days], &record[..days], &mut page);
    let mut longer = vec![BasinDay::default(); days + 40];
    basin.run(&mut roomy, &calendar[..days], &record[..days], &mut longer);
    assert_eq!(exact, roomy);
    assert_eq!(page[..], longer[..days]);
    assert!(longer[days..].iter().all(|day| *day == BasinDay::default()));
}
