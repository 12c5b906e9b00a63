//! Whatever bytes stand in `place.toml` or its small tables, reading ends with an answer and never with a panic.

use deshielo::place::problem::Severity;
use deshielo::place::{DialPlan, Outcome, Source, read, read_setting};
use deshielo::water::dials::Dials;
use deshielo::water::valley::{Purpose, Valley};
use deshielo::water::works::Works;
use proptest::collection::vec;
use proptest::prelude::*;

const PLACE: &str = include_str!("places/good/place.toml");
const RIGHTS: &str = include_str!("places/good/rights.csv");

/// Enough of the record for its columns to be found; mutated places are about the place file.
fn short_weather() -> String {
    include_str!("places/good/weather.csv").lines().take(372).collect::<Vec<_>>().join("\n")
}

fn check(place: &str, rights: &str) -> Outcome {
    let weather = short_weather();
    let files = [
        ("place.toml", place),
        ("weather.csv", weather.as_str()),
        ("gauge.csv", "fecha;caudal\n01/10/2001;1,5\n02/10/2001;1,6\n"),
        ("snow.csv", "year,month,day,swe_in\n2001,10,1,0\n2001,10,2,0\n"),
        ("rights.csv", rights),
    ];
    let outcome = read(Source::Embedded(&files));
    let errors = outcome.problems.iter().any(|problem| problem.severity == Severity::Error);
    assert_eq!(outcome.place.is_none(), errors);
    if let Some(place) = &outcome.place {
        assert_kept_promises(&place.valley);
    }
    for problem in &outcome.problems {
        assert!(problem.at.line <= 1 + place.lines().count().max(rights.lines().count()).max(400));
    }
    outcome
}

/// What the valley's documentation promises to the water, which never checks again.
fn assert_kept_promises(valley: &Valley) {
    assert!(Works::new(valley, &Dials::REST).is_ok(), "{:?}", Works::new(valley, &Dials::REST).err());
    assert!(!format!("{valley:?}").contains("NaN"), "{valley:?}");
    assert!(valley.latitude_deg.abs() >= 0.5 && !valley.bands.is_empty());
    assert!(valley.bands.iter().all(|band| band.area_km2 > 0.0));
    assert!(valley.bands.windows(2).all(|pair| pair[0].elevation_m <= pair[1].elevation_m));
    assert!(valley.rain_snow.all_snow_below_c < valley.rain_snow.all_rain_above_c);
    assert!(valley.soil.capacity_mm > 0.0 && valley.soil.dry_share > 0.0 && valley.snow.full_cover_mm > 0.0);
    assert!(valley.ground.quick_days > 0.0 && valley.ground.slow_days > 0.0);
    assert!((0.0..=20.0).contains(&valley.channel.unit_hydrograph_base_days));
    if let Some(reach) = valley.channel.reach {
        assert!(2.0 * reach.travel_days * reach.inflow_weight <= 1.0 + 1e-12);
        assert!(2.0 * reach.travel_days * (1.0 - reach.inflow_weight) >= 1.0 - 1e-12);
    }
    if let Some(reservoir) = &valley.reservoir {
        assert!(reservoir.table.len() >= 2 && reservoir.capacity_hm3 > reservoir.dead_hm3);
        assert!(reservoir.table.windows(2).all(|pair| {
            pair[0].level_m < pair[1].level_m
                && pair[0].volume_hm3 < pair[1].volume_hm3
                && pair[0].area_km2 <= pair[1].area_km2
        }));
        assert!(reservoir.flood_space.windows(2).all(|pair| pair[0].0 < pair[1].0));
    }
    assert!(valley.gates.iter().map(|gate| gate.storage_share).sum::<f64>() <= 1.0 + 1e-9);
    for (index, gate) in valley.gates.iter().enumerate() {
        let below = usize::from(gate.return_above);
        assert!((index + 2..=valley.gates.len() + 1).contains(&below));
        assert!(gate.decreed_m3s > 0.0 && gate.canal_m3s > 0.0 && gate.conveyance_loss_share < 1.0);
        if let Purpose::Fields(fields) = &gate.purpose {
            assert!(!fields.is_empty() && fields.iter().all(|field| field.area_ha > 0.0 && field.efficiency > 0.0));
        }
    }
}

/// One change of the text.
#[derive(Clone, Debug)]
enum Change {
    Delete(usize, usize),
    Repeat(usize, usize),
    Put(usize, String),
    Swap(usize, usize),
}

fn change() -> impl Strategy<Value = Change> {
    let size = PLACE.len();
    prop_oneof![
        (0..size, 1usize..60).prop_map(|(at, length)| Change::Delete(at, length)),
        (0..size, 1usize..200).prop_map(|(at, length)| Change::Repeat(at, length)),
        (0..size, "[\\[\\]{}=\",.0-9a-z_#\n\\-+eñ°≠ \u{0}]{1,4}").prop_map(|(at, text)| Change::Put(at, text)),
        (0..size, prop_oneof!["-?[0-9]{1,3}e?[0-9]{0,3}", "true", "nan", "inf", "\\[\\]", "\\{\\}", "\"\""])
            .prop_map(|(at, text)| Change::Put(at, text)),
        (0usize..200, 0usize..200).prop_map(|(a, b)| Change::Swap(a, b)),
    ]
}

fn apply(text: &str, change: &Change) -> String {
    let bytes = text.as_bytes();
    let within = |at: usize| at.min(bytes.len());
    let changed = match change {
        Change::Delete(at, length) => [&bytes[..within(*at)], &bytes[within(at + length)..]].concat(),
        Change::Repeat(at, length) => [&bytes[..within(at + length)], &bytes[within(*at)..]].concat(),
        Change::Put(at, text) => [&bytes[..within(*at)], text.as_bytes(), &bytes[within(*at)..]].concat(),
        Change::Swap(a, b) => {
            let mut lines: Vec<&str> = text.lines().collect();
            let last = lines.len().saturating_sub(1);
            if !lines.is_empty() {
                lines.swap((*a).min(last), (*b).min(last));
            }
            lines.join("\n").into_bytes()
        }
    };
    String::from_utf8_lossy(&changed).into_owned()
}

#[test]
fn the_place_that_is_changed_is_a_good_one() {
    let outcome = check(PLACE, RIGHTS);
    assert!(outcome.place.is_some(), "{:#?}", outcome.problems);
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 400, ..ProptestConfig::default() })]

    #[test]
    fn no_change_of_a_good_place_makes_reading_panic(changes in vec(change(), 1..5)) {
        let text = changes.iter().fold(PLACE.to_owned(), |text, change| apply(&text, change));
        check(&text, RIGHTS);
    }

    #[test]
    fn no_value_makes_reading_panic(
        line in 0usize..220,
        value in prop_oneof![
            "-?[0-9]{1,4}(\\.[0-9])?", Just("1e308".to_owned()), Just("-1e308".to_owned()), Just("5e-324".to_owned()),
            Just("9223372036854775807".to_owned()), Just("[]".to_owned()), Just("[1, \"a\", {}]".to_owned()),
            Just("{}".to_owned()), Just("[{}]".to_owned()), Just("1979-05-27".to_owned()), Just("07:32:00".to_owned()),
            Just("\"12-31\"".to_owned()), Just("\"\"".to_owned()), Just("nan".to_owned()),
        ],
    ) {
        let changed = |(index, text): (usize, &str)| match text.split_once(" = ") {
            Some((key, _)) if index == line => format!("{key} = {value}"),
            _ => text.to_owned(),
        };
        let text: Vec<String> = PLACE.lines().enumerate().map(changed).collect();
        check(&text.join("\n"), RIGHTS);
    }

    #[test]
    fn no_table_of_rights_makes_reading_panic(rights in "(key|right|rate_m3s|,|;|\t|\n|north|\"|-|[0-9]|ñ| ){0,60}") {
        check(PLACE, &rights);
    }

    #[test]
    fn no_setting_makes_reading_panic(text in "(name|dials|warming|years|=|\\[|\\]|\\{|\\}|\"|\n|[0-9]|\\.|en|es|,| ){0,80}") {
        let outcome = read_setting(std::path::Path::new("setting.toml"), &text, &DialPlan::WIDEST);
        prop_assert_eq!(
            outcome.setting.is_none(),
            outcome.problems.iter().any(|problem| problem.severity == Severity::Error)
        );
    }
}
