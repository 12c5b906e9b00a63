//! A good place is read whole, in whichever units it is written.

use std::path::Path;

use deshielo::place::problem::Problem;
use deshielo::place::{DialOffer, EvaporationChoice, GaugeMeasures, Place, Source, UnitSystem, read};
use deshielo::signs::read_run;
use deshielo::water::basin::{Basin, BasinDay};
use deshielo::water::calendar::MonthDay;
use deshielo::water::canals::PriorityDate;
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::run::run_basin;
use deshielo::water::valley::Purpose;
use deshielo::water::works::Works;

const PLACE: &str = include_str!("places/good/place.toml");

fn told(problems: &[Problem]) -> String {
    let say = |problem: &Problem| {
        let at = &problem.at;
        format!("{}:{}:{} {} {:?}", at.file.display(), at.line, at.column, problem.message, problem.arguments)
    };
    problems.iter().map(say).collect::<Vec<_>>().join("\n")
}

fn files(place: &str) -> [(&'static str, &str); 5] {
    [
        ("place.toml", place),
        ("weather.csv", include_str!("places/good/weather.csv")),
        ("gauge.csv", include_str!("places/good/gauge.csv")),
        ("snow.csv", include_str!("places/good/snow.csv")),
        ("rights.csv", include_str!("places/good/rights.csv")),
    ]
}

fn good(text: &str) -> Place {
    let outcome = read(Source::Embedded(&files(text)));
    assert_eq!(told(&outcome.problems), "");
    outcome.place.expect("a place without problems is there")
}

#[test]
fn a_folder_and_its_embedded_texts_are_the_same_place() {
    let outcome = read(Source::Folder(Path::new("tests/places/good")));
    assert_eq!(told(&outcome.problems), "");
    let folder = outcome.place.unwrap();
    assert_eq!(folder.folder.as_deref(), Some(Path::new("tests/places/good")));
    // NaN in a record is not equal to itself; the debug form is.
    assert_eq!(format!("{:?}", Place { folder: None, ..folder }), format!("{:?}", good(PLACE)));
}

#[test]
fn what_the_file_says_arrives() {
    let place = good(PLACE);
    assert_eq!(place.name.get("en-US"), "Test Valley");
    assert_eq!(place.name.get("es-CL"), "Valle de ensayo");
    assert_eq!((place.region.as_str(), place.units, place.invented), ("en-US", UnitSystem::Us, true));
    assert_eq!((place.days.len(), place.calendar.len()), (730, 730));
    assert_eq!(place.first_date.to_string(), "2001-10-01");
    assert_eq!(place.calendar[0].day_of_water_year, 1);

    let keys: Vec<&str> = place.gates.iter().map(|gate| gate.key.as_str()).collect();
    assert_eq!(keys, ["north", "town", "meadow"], "gates stand in the order of the file, canals and towns mixed");
    let valley = &place.valley;
    let north = &valley.gates[0];
    assert_eq!((north.right_date, north.decreed_m3s), (PriorityDate::year(1882), 2.0), "from the list of rights");
    assert_eq!(valley.gates[2].right_date, PriorityDate::on(1905, 5, 14));
    assert_eq!(place.gates[2].right_year, Some(1905));
    assert_eq!((north.return_above, valley.gates[1].return_above, valley.gates[2].return_above), (2, 3, 4));
    // FAO manual 4, annex I, table 7: a long earth canal in loam passes on 70 %.
    approx::assert_relative_eq!(valley.gates[2].conveyance_loss_share, 0.30, max_relative = 1e-12);
    let Purpose::Fields(fields) = &north.purpose else { panic!("north has fields") };
    assert_eq!((fields[0].efficiency, fields[1].efficiency), (0.60, 0.70));
    assert_eq!(fields[1].crop.planting, MonthDay { month: 5, day: 10 });
    assert!(!fields[0].swap_to.expect("alfalfa is swapped").watered, "fallow is not watered");
    assert!(fields[1].swap_to.is_none());
    // Flood space is listed from November and kept from January.
    let space: Vec<f64> = valley.reservoir.as_ref().unwrap().flood_space.iter().map(|point| point.1).collect();
    assert_eq!(space, [5.0, 0.0, 3.0]);

    assert_eq!(place.dials.range(Dial::Warming).map(|range| range.most), Some(4.0));
    assert_eq!(place.dials.offer(Dial::ReservoirSize), DialOffer::Hidden);
    assert!(place.dials.range(Dial::TownGrowth).is_some());
    assert_eq!(place.notes.evaporation.choice, EvaporationChoice::PenmanMonteith);
    assert!(!place.notes.evaporation.best_available);
    let recorded: Vec<&str> = place.notes.records.iter().map(|note| note.file.as_str()).collect();
    assert_eq!(recorded, ["weather.csv", "gauge.csv", "snow.csv"]);

    let gauge = place.gauge.unwrap();
    assert_eq!(gauge.measures, GaugeMeasures::Natural);
    assert!(gauge.series.values[100].is_nan() && gauge.series.values[99] > 0.0, "a gauge keeps its gap");
    assert_eq!(gauge.series.first_date, place.first_date);
    let day = &place.days[300];
    assert!(day.air.solar_mj_m2 > 0.0 && day.air.wind_2m_ms > 0.0 && day.air.vapour_pressure_kpa > 0.0);
}

#[test]
fn line_ends_and_byte_order_marks_of_other_systems_change_nothing() {
    let windows = format!("\u{feff}{}", PLACE.replace('\n', "\r\n"));
    assert_eq!(format!("{:?}", good(&windows)), format!("{:?}", good(PLACE)));
}

#[test]
fn the_water_runs_on_what_was_read() {
    let place = good(PLACE);
    let basin = Basin::new(&place.valley, &Dials::REST);
    let mut days = vec![BasinDay::default(); place.days.len()];
    let before = run_basin(&place.valley, &basin, &place.calendar, &place.days, &mut days);
    let works = Works::new(&place.valley, &Dials::REST).unwrap();
    let mut years = Vec::new();
    read_run(&place.valley, &works, &place.calendar, &days, &before, |_, _| {}, |year| years.push(year));
    assert_eq!(years.iter().map(|year| year.year.water_year).collect::<Vec<_>>(), [2002, 2003]);
    for year in &years {
        assert!(year.ledger.residual_share().abs() <= 1e-9, "{:?}", year.ledger);
        // A northern mountain: some snow, more than none and less than all of what falls.
        let snow = year.signs.snow_share.unwrap();
        assert!((0.1..0.95).contains(&snow), "{snow}");
    }
}

/// End of a metric key, its end in US units, and the value there.
type Rewrite = (&'static str, &'static str, fn(f64) -> f64);

/// Writes every metric value of the file in US units, to all digits.
fn in_us_units(text: &str) -> String {
    const ACRE_M2: f64 = 4_046.856_422_4;
    const FOOT_M: f64 = 0.3048;
    let to_us: [Rewrite; 18] = [
        ("_c_per_km", "_f_per_1000ft", |value| value * 1.8 * FOOT_M),
        ("_per_100m", "_per_1000ft", |value| value * FOOT_M * 10.0),
        ("_mm_c_day", "_in_f_day", |value| value / 25.4 / 1.8),
        ("_mm_per_m", "_in_per_ft", |value| value / 25.4 * FOOT_M),
        ("_m3_day", "_acre_feet_day", |value| value / (ACRE_M2 * FOOT_M)),
        ("_mm_day", "_in_day", |value| value / 25.4),
        ("_km2", "_acres", |value| value * 1.0e6 / ACRE_M2),
        ("_hm3", "_acre_feet", |value| value * 1.0e6 / (ACRE_M2 * FOOT_M)),
        ("_m3s", "_cfs", |value| value / (FOOT_M * FOOT_M * FOOT_M)),
        ("_share", "_percent", |value| value * 100.0),
        ("_ha", "_acres", |value| value * 10_000.0 / ACRE_M2),
        ("length_km", "length_ft", |value| value * 1000.0 / FOOT_M),
        ("_mm", "_in", |value| value / 25.4),
        ("elevation_m", "elevation_ft", |value| value / FOOT_M),
        ("level_m", "level_ft", |value| value / FOOT_M),
        ("depth_m", "depth_ft", |value| value / FOOT_M),
        ("below_c", "below_f", |value| value * 1.8 + 32.0),
        ("above_c", "above_f", |value| value * 1.8 + 32.0),
    ];
    let mut lines = Vec::new();
    for line in text.lines() {
        let mut line = line.to_owned();
        for (metric, us, convert) in to_us {
            let sign = format!("{metric} = ");
            if let Some(at) = line.find(&sign) {
                let (before, after) = (&line[..at], &line[at + sign.len()..]);
                let end = after.find(|c: char| !"0123456789.-[, ]".contains(c)).unwrap_or(after.len());
                let numbers = after[..end].trim_end().trim_end_matches(',');
                let list = numbers.trim_start().starts_with('[');
                let converted: Vec<String> = numbers
                    .trim_matches(['[', ']', ' '])
                    .split(',')
                    .map(|number| format!("{:?}", convert(number.trim().parse().unwrap())))
                    .collect();
                let joined = converted.join(", ");
                let value = if list { format!("[{joined}]") } else { joined };
                line = format!("{before}{us} = {value}{}", &after[numbers.len()..]);
                break;
            }
        }
        lines.push(line);
    }
    lines.join("\n")
}

/// Compares two debug forms: words equal, numbers to 1e-12.
fn assert_nearly_the_same(one: &str, other: &str) {
    let parts = |text: &str| -> Vec<String> {
        text.split(|c: char| ",:()[]{} ".contains(c)).filter(|part| !part.is_empty()).map(str::to_owned).collect()
    };
    let (one, other) = (parts(one), parts(other));
    assert_eq!(one.len(), other.len());
    for (a, b) in one.iter().zip(&other) {
        match (a.parse::<f64>(), b.parse::<f64>()) {
            (Ok(a), Ok(b)) if a.is_finite() => approx::assert_relative_eq!(a, b, max_relative = 1e-12, epsilon = 1e-12),
            _ => assert_eq!(a, b),
        }
    }
}

#[test]
fn us_units_give_the_same_place() {
    let us = in_us_units(PLACE);
    let metric_left = us.lines().filter(|line| line.contains("_km2 =") || line.contains("_m3s =")).count();
    assert_eq!(metric_left, 0, "{us}");
    assert!(us.contains("outlet_cfs") && us.contains("all_rain_above_f") && us.contains("capacity_acre_feet"), "{us}");
    let (metric, us) = (good(PLACE), good(&us));
    assert_nearly_the_same(&format!("{:?}", metric.valley), &format!("{:?}", us.valley));
    assert_nearly_the_same(&format!("{:?}", &metric.days[..100]), &format!("{:?}", &us.days[..100]));
}
