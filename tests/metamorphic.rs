//! What must hold between two runs of one place, whatever the numbers are: turn a dial, and the answer may only move one way.
//!
//! That a later right asking for more changes no older right's natural take from one morning state is proved at the river
//! itself, in `rights_properties.rs`. Places at random are made by fixed seeds, so that a failure can be looked at.

#[path = "support/valleys.rs"]
mod valleys;

use deshielo::signs::YearReport;
use deshielo::water::basin::BasinDay;
use deshielo::water::canals::SharingRule;
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::ledger::Flow;
use deshielo::water::valley::{Gate, Purpose, Valley};
use deshielo::water::works::Works;
use valleys::{Ran, numbers, on};

/// Rounding of a sum over years, as a share of it.
const ROUNDING: f64 = 1e-9;

fn run(valley: &Valley, dials: &Dials, years: i32, weather: u32) -> Ran {
    let (calendar, record) = valleys::record(valley, years, weather);
    valleys::run(valley, dials, &calendar, &record)
}

/// Runs `valley` with `dial` at each of `values`, from low to high.
fn ladder(valley: &Valley, dials: &Dials, dial: Dial, values: &[f64], years: i32, weather: u32) -> Vec<Ran> {
    let (calendar, record) = valleys::record(valley, years, weather);
    values.iter().map(|value| valleys::run(valley, &dials.with(dial, *value), &calendar, &record)).collect()
}

/// Asserts that a number of every year never rises from one run to the next; `slack` is rounding.
fn assert_never_rises(what: &str, runs: &[Ran], slack: f64, of: impl Fn(&YearReport) -> f64) {
    for pair in runs.windows(2) {
        for (low, high) in pair[0].years.iter().zip(&pair[1].years) {
            let (low_value, high_value) = (of(low), of(high));
            assert!(high_value <= low_value + slack, "{what}, {}: {low_value} then {high_value}", low.signs.water_year);
        }
    }
}

/// What the fields under all canals were given up to the end of each year, hm³: canal flow less what it lost on the way.
fn given_to_fields_so_far(ran: &Ran, loss_share: impl Fn(usize) -> f64, is_canal: impl Fn(usize) -> bool) -> Vec<f64> {
    let mut so_far = 0.0;
    let years = ran.years.iter().map(|year| {
        let canals = year.signs.canals.iter().enumerate().filter(|(gate, _)| is_canal(*gate));
        so_far += canals.map(|(gate, canal)| canal.delivered_hm3 * (1.0 - loss_share(gate))).sum::<f64>();
        so_far
    });
    years.collect()
}

fn assert_no_less(what: &str, low: &[f64], high: &[f64]) {
    for (year, (low, high)) in low.iter().zip(high).enumerate() {
        assert!(*high >= low - ROUNDING * low.abs() - 1e-12, "{what}, year {year}: {low} then {high}");
    }
}

/// A place at random where everyone shares one pool by one fraction and nothing comes back to the river: without returns,
/// a river minimum, yearly limits, hedging or losses in the river, water has one way to go.
fn one_pool(seed: u32) -> Valley {
    let mut valley = valleys::random_valley(seed).0;
    let mut next = numbers(seed ^ 0x900);
    valley.rule = SharingRule::Proportional;
    let mut dam = valleys::reservoir(5.0 + 100.0 * next());
    dam.serves_minimum = false;
    valley.reservoir = Some(dam);
    valley.minimum.rate_m3s.clear();
    if !valley.gates.iter().any(|gate| !gate.is_town()) {
        valley.gates.truncate(20);
        valley.gates.push(valleys::canal(2000.0, 1900, 1)).unwrap();
    }
    let end = valley.gates.len() as u8 + 1;
    for gate in &mut valley.gates {
        (gate.return_share, gate.return_above) = (0.0, end);
        gate.stored_loss_share = 0.0;
        gate.yearly_limit_hm3 = f64::INFINITY;
    }
    valley
}

#[test]
fn warmer_never_gives_a_larger_share_of_snow() {
    for seed in 0..60 {
        let (mut valley, dials) = valleys::random_valley(seed * 977);
        valley.gates.clear();
        valley.reservoir = None;
        let (calendar, mut record) = valleys::record(&valley, 3, seed);
        let mut next = numbers(seed);
        for day in &mut record {
            day.relative_humidity_percent = 30.0 + 70.0 * next();
        }
        valley.rain_snow.wet_bulb = seed % 2 == 0;
        let runs: Vec<Ran> = [0.0, 0.5, 1.0, 2.0, 4.0, 6.0]
            .into_iter()
            .map(|warming| valleys::run(&valley, &dials.with(Dial::Warming, warming), &calendar, &record))
            .collect();
        assert_never_rises(&format!("seed {seed}"), &runs, 1e-12, |year| year.signs.snow_share.unwrap());
    }
}

#[test]
fn warmer_never_brings_the_mean_centre_of_volume_later() {
    let valley = valleys::whole_valley();
    let runs = ladder(&valley, &Dials::REST, Dial::Warming, &[0.0, 1.0, 2.0, 3.0, 4.0, 5.0, 6.0], 12, 5);
    let mean = |ran: &Ran| {
        let days = ran.years.iter().map(|year| year.signs.centre_of_volume_day.unwrap());
        days.sum::<f64>() / ran.years.len() as f64
    };
    let means: Vec<f64> = runs.iter().map(mean).collect();
    assert!(means.windows(2).all(|pair| pair[1] <= pair[0]), "{means:?}");
    assert!(means[6] < means[0] - 5.0, "six degrees shift it by days: {means:?}");
}

#[test]
fn more_winter_precipitation_never_gives_a_smaller_peak_of_snow() {
    let steps = [-50.0, -20.0, 0.0, 20.0, 50.0];
    let assert_grows = |what: &str, runs: &[Ran]| {
        assert_never_rises(what, runs, 1e-9, |year| -year.signs.peak_swe_mm);
    };
    for seed in 0..60 {
        let (mut valley, dials) = valleys::random_valley(seed * 31);
        valley.gates.clear();
        valley.reservoir = None;
        // Rain's heat melts snow: more rain could leave less. Without it more can only be more.
        valley.snow.heat_of_rain = false;
        assert_grows(&format!("seed {seed}"), &ladder(&valley, &dials, Dial::WinterPrecipitation, &steps, 3, seed));
    }
    let whole = valleys::whole_valley();
    assert!(whole.snow.heat_of_rain);
    let runs = ladder(&whole, &Dials::REST, Dial::WinterPrecipitation, &steps, 8, 3);
    assert_grows("with rain's heat", &runs);
    assert!(runs[4].years[1].signs.peak_swe_mm > 1.5 * runs[0].years[1].signs.peak_swe_mm);
}

#[test]
fn more_diversion_never_carries_more_over_from_one_pool() {
    let mut moved = 0;
    for seed in 0..60 {
        let valley = one_pool(seed * 131);
        let runs = ladder(&valley, &Dials::REST, Dial::Diversion, &[-50.0, -20.0, 0.0, 35.0, 100.0], 3, seed);
        assert_never_rises(&format!("seed {seed}"), &runs, 1e-9, |year| year.signs.carryover_hm3.unwrap());
        let carryover = |ran: &Ran| ran.years[2].signs.carryover_hm3.unwrap();
        moved += u32::from(carryover(&runs[4]) < 0.9 * carryover(&runs[0]));
    }
    assert!(moved > 20, "diversion mattered in {moved} places only");
}

/// Everything that a run tells, to the bit.
fn bits(ran: &Ran) -> (Vec<u64>, String) {
    let basin = |day: &BasinDay| {
        let stores = [day.snow_water_mm, day.soil_mm, day.ground_mm, day.channel_mm];
        let flows = [day.precipitation_mm, day.snowfall_mm, day.evaporation_mm, day.sublimation_mm, day.inflow_m3];
        let valley = [day.reference_evaporation_mm, day.valley_precipitation_mm];
        stores.into_iter().chain(flows).chain(valley).map(f64::to_bits).collect::<Vec<_>>()
    };
    // `Debug` writes the shortest digits that give a number back, and the sign of zero: as good as bits.
    (ran.basin.iter().flat_map(basin).collect(), format!("{:?}", ran.years))
}

#[test]
fn all_dials_at_rest_are_as_it_was_to_the_bit() {
    for seed in 0..12 {
        let (valley, _) = valleys::random_valley(seed * 53);
        let as_it_was = bits(&run(&valley, &Dials::REST, 2, seed));
        let mut set_to_rest = Dials::default();
        for dial in Dial::ALL {
            if let Some(rest) = Dials::REST.get(dial) {
                set_to_rest = set_to_rest.with(dial, rest);
            }
            let turned_back = Dials::REST.with(dial, dial.widest().most).at_rest(dial);
            assert_eq!(turned_back, Dials::REST, "{dial:?}");
        }
        assert!(as_it_was == bits(&run(&valley, &set_to_rest, 2, seed)), "seed {seed}");
        // A range that starts below zero may be left by way of −0.
        let minus_zero = Dials { winter_precipitation: -0.0, diversion: -0.0, river_minimum: -0.0, ..Dials::REST };
        assert!(as_it_was == bits(&run(&valley, &minus_zero, 2, seed)), "seed {seed}, minus zero");
    }
}

/// A place of one canal at random; what it loses comes back below it, or not at all.
fn one_canal(seed: u32, rule: SharingRule) -> Valley {
    let mut next = numbers(seed);
    let mut valley = valleys::bare_basin(6);
    valley.rule = rule;
    valley.reservoir = Some(valleys::reservoir(2.0 + 60.0 * next()));
    let mut gate = valleys::canal(500.0 + 9000.0 * next(), 1900, 2);
    gate.conveyance_loss_share = 0.6 * next();
    gate.storage_share = 0.2 + 0.8 * next();
    gate.decreed_m3s *= 0.3 + next();
    gate.canal_m3s *= 0.3 + next();
    gate.turn_days = 3;
    if let Purpose::Fields(fields) = &mut gate.purpose {
        fields[0].crop.refill_to_share = next();
        fields[0].most_watering_mm_day = 3.0 + 12.0 * next();
    }
    valley.gates.push(gate).unwrap();
    valley
}

#[test]
fn lining_never_lowers_what_reaches_the_fields_of_a_single_canal() {
    let mut moved = 0;
    for rule in [SharingRule::Seniority, SharingRule::Proportional] {
        for seed in 0..30 {
            let valley = one_canal(seed * 17, rule);
            let lining = [0.0, 30.0, 60.0, 100.0];
            let runs = ladder(&valley, &Dials::REST, Dial::CanalLining, &lining, 4, seed);
            let loss = valley.gates[0].conveyance_loss_share;
            let given: Vec<Vec<f64>> = runs
                .iter()
                .zip(lining)
                .map(|(ran, lined)| given_to_fields_so_far(ran, |_| loss * (1.0 - lined / 100.0), |_| true))
                .collect();
            for pair in given.windows(2) {
                assert_no_less(&format!("{rule:?}, seed {seed}"), &pair[0], &pair[1]);
            }
            let what = format!("{rule:?}, seed {seed}, crops");
            assert_never_rises(&what, &runs, 1e-9, |year| -year.signs.crop_evaporation_hm3.unwrap());
            moved += u32::from(given[3][3] > 1.02 * given[0][3]);
        }
    }
    assert!(moved > 15, "lining mattered in {moved} places only");
}

#[test]
fn a_fuller_start_never_lowers_the_years_supply_from_one_pool() {
    let mut moved = 0;
    for seed in 0..60 {
        let mut valley = one_pool(seed * 211);
        valley.start.settling_years = 0;
        // A dry place, where the start is not forgotten in the spring.
        valley.climb.precipitation_factor = 0.4;
        let runs = ladder(&valley, &Dials::REST, Dial::StartingStorage, &[0.0, 10.0, 25.0, 50.0, 100.0], 1, seed);
        let supply = |year: &YearReport| -year.signs.supply_ratio.unwrap_or(1.0);
        assert_never_rises(&format!("seed {seed}"), &runs, 1e-9, supply);
        let delivered: Vec<f64> = runs.iter().map(|ran| ran.years[0].ledger.of(Flow::Canals)).collect();
        assert!(delivered.windows(2).all(|pair| pair[1] >= pair[0] * (1.0 - ROUNDING)), "seed {seed}: {delivered:?}");
        moved += u32::from(delivered[4] > 1.02 * delivered[0]);
    }
    assert!(moved > 20, "the start mattered in {moved} places only");
}

#[test]
fn a_growing_town_never_gives_the_canals_more() {
    let mut moved = 0;
    for seed in 0..40 {
        let mut valley = one_pool(seed * 389);
        valley.gates.truncate(20);
        for daily_m3 in [15_000.0, 35_000.0] {
            valley.gates.push(Gate { return_share: 0.0, ..valleys::town(daily_m3, 1900, 1) }).unwrap();
        }
        let end = valley.gates.len() as u8 + 1;
        valley.gates.iter_mut().for_each(|gate| gate.return_above = end);
        let runs = ladder(&valley, &Dials::REST, Dial::TownGrowth, &[0.0, 50.0, 100.0, 200.0], 3, seed);
        let is_canal = |gate: usize| !valley.gates[gate].is_town();
        let loss = |gate: usize| valley.gates[gate].conveyance_loss_share;
        let given: Vec<Vec<f64>> = runs.iter().map(|ran| given_to_fields_so_far(ran, loss, is_canal)).collect();
        for pair in given.windows(2) {
            assert_no_less(&format!("seed {seed}"), &pair[1], &pair[0]);
        }
        moved += u32::from(given[3][2] < 0.99 * given[0][2]);
    }
    assert!(moved > 10, "growth mattered in {moved} places only");
}

#[test]
fn the_size_dial_leaves_dead_storage_as_it_is() {
    for seed in 0..200 {
        let (valley, _) = valleys::random_valley(seed);
        let Some(reservoir) = &valley.reservoir else { continue };
        let dead_m3 = reservoir.dead_hm3 * 1.0e6;
        let at_rest = Works::new(&valley, &Dials::REST).unwrap();
        for size in [-50.0, -10.0, 40.0, 100.0] {
            let works = Works::new(&valley, &Dials::REST.with(Dial::ReservoirSize, size)).unwrap();
            let (vessel, as_it_was) = (works.vessel().unwrap(), at_rest.vessel().unwrap());
            assert_eq!(vessel.dead_m3, dead_m3);
            for share in [0.0, 0.3, 0.8, 1.0] {
                let volume_m3 = dead_m3 * share;
                assert_eq!(vessel.level_m(volume_m3), as_it_was.level_m(volume_m3), "seed {seed}, {size} %");
            }
            let active = vessel.active_m3 / as_it_was.active_m3;
            assert!((active - (1.0 + size / 100.0)).abs() < 1e-12, "seed {seed}, {size} %: {active}");
        }
    }
}

#[test]
fn a_leap_year_has_366_days_in_signs_and_ledger() {
    let valley = valleys::whole_valley();
    let ran = run(&valley, &Dials::REST, 8, 5);
    let lengths: Vec<(i32, u16)> = ran.years.iter().map(|year| (year.signs.water_year, year.signs.days)).collect();
    let leap = lengths.iter().filter(|(_, days)| *days == 366).map(|(year, _)| *year).collect::<Vec<_>>();
    assert_eq!((lengths.len(), leap), (8, vec![1984, 1988]));
    for year in &ran.years {
        assert_eq!(usize::from(year.signs.days), year.year.days);
        // Every day is entered once: the ledger's year is the sum over its days and no other.
        let days = &ran.basin[year.year.first..year.year.first + year.year.days];
        let inflow_m3: f64 = days.iter().map(|day| day.inflow_m3).sum();
        assert!((year.ledger.of(Flow::NaturalInflow) - inflow_m3).abs() <= ROUNDING * inflow_m3);
        assert!(year.ledger.residual_share().abs() <= 1e-9);
    }
}

/// The northern valley with every date moved by half a year, in the south.
fn mirrored(valley: &Valley) -> Valley {
    let half_a_year = |date: deshielo::water::calendar::MonthDay| on((date.month + 5) % 12 + 1, date.day);
    let mut south = valley.clone();
    south.latitude_deg = -valley.latitude_deg;
    south.water_year_start_month = 4;
    south.survey = half_a_year(valley.survey);
    south.spring_months = (10, 1);
    for (date, _) in &mut south.minimum.rate_m3s {
        *date = half_a_year(*date);
    }
    for gate in &mut south.gates {
        if !gate.is_town() {
            gate.season.from = half_a_year(gate.season.from);
            gate.season.to = half_a_year(gate.season.to);
        }
        match &mut gate.purpose {
            Purpose::Fields(fields) => {
                for field in fields {
                    field.crop.planting = half_a_year(field.crop.planting);
                }
            }
            Purpose::Town(town) => {
                town.summer.from = half_a_year(town.summer.from);
                town.summer.to = half_a_year(town.summer.to);
            }
        }
    }
    south
}

#[test]
fn a_southern_place_half_a_year_away_behaves_like_the_northern_one() {
    use deshielo::water::calendar::CalendarDay;
    use deshielo::water::evaporation::Method;

    // Evaporation as given: the earth is nearer to the sun in the southern summer, and no shift of dates undoes that.
    let mut north = valleys::whole_valley();
    north.evaporation.method = Method::Given;
    let south = mirrored(&north);
    let (calendar, mut record) = valleys::record(&north, 8, 5);
    for (day, today) in record.iter_mut().zip(&calendar) {
        let angle = 2.0 * std::f64::consts::PI * f64::from(today.day_of_water_year) / 365.0;
        day.air.given_mm = 3.0 - 2.5 * libm::sin(angle);
    }
    let start = chrono::NaiveDate::from_ymd_opt(1980, 4, 1).unwrap();
    let mut southern_calendar: Vec<CalendarDay> = calendar.clone();
    deshielo::water::calendar::fill_calendar(start, 4, &mut southern_calendar);
    for dials in [
        Dials::REST,
        Dials { winter_precipitation: -30.0, ..Dials::REST },
        Dials { summer_precipitation: -40.0, diversion: 40.0, ..Dials::REST },
    ] {
        let northern = valleys::run(&north, &dials, &calendar, &record);
        let southern = valleys::run(&south, &dials, &southern_calendar, &record);
        assert_eq!((northern.years.len(), southern.years.len()), (8, 8));
        for (north, south) in northern.years.iter().map(|y| &y.signs).zip(southern.years.iter().map(|y| &y.signs)) {
            let what = format!("{}, {dials:?}", north.water_year);
            assert_eq!(north.water_year, south.water_year);
            // The half-years have 182 and 183 days, so a few days feel the other season's dial or melt factor.
            let near = |name: &str, a: Option<f64>, b: Option<f64>, share: f64| {
                let (a, b) = (a.unwrap(), b.unwrap());
                assert!((a - b).abs() <= share * a.abs(), "{what}: {name} {a} and {b}");
            };
            near("precipitation", Some(north.precipitation_mm), Some(south.precipitation_mm), 0.02);
            near("snow share", north.snow_share, south.snow_share, 0.02);
            near("peak snow", Some(north.peak_swe_mm), Some(south.peak_swe_mm), 0.02);
            near("survey", north.survey_swe_mm, south.survey_swe_mm, 0.05);
            near("natural flow", Some(north.natural_flow_hm3), Some(south.natural_flow_hm3), 0.02);
            near("centre of volume", north.centre_of_volume_day, south.centre_of_volume_day, 0.01);
            near("spring volume", Some(north.spring_volume_hm3), Some(south.spring_volume_hm3), 0.03);
            near("supply", north.supply_ratio, south.supply_ratio, 0.03);
            let day = |date: Option<CalendarDay>| f64::from(date.unwrap().day_of_water_year);
            let dates = [
                ("peak snow", north.peak_swe_date, south.peak_swe_date),
                ("melt-out", north.melt_out_date, south.melt_out_date),
                ("half volume", north.half_volume_date, south.half_volume_date),
            ];
            for (name, north, south) in dates {
                assert!((day(north) - day(south)).abs() <= 3.0, "{what}: {name} {north:?} and {south:?}");
            }
        }
    }
}
