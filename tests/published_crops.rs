//! Every check of `reference/crops.toml` (FAO-56 crop tables and equations), the crop table's own sanity, and its names.
#![cfg(feature = "std")]

use std::collections::{BTreeMap, BTreeSet};
use std::path::Path;

use deshielo::place::crop_table::{CROPS, Crop, built_in_crop};
use deshielo::water::crop::{
    CropTraits, adjusted_depletion_share, climate_adjustment, soil_texture, stress_factor, total_available_mm,
};
use fluent::{FluentBundle, FluentResource};
use toml::{Table, Value};

/// Checks of table 12 and the built-in crops that take their coefficients and height from it.
const COEFFICIENTS: [(&str, &[&str]); 15] = [
    ("kc_alfalfa_hay_averaged", &["alfalfa_hay"]),
    ("kc_wheat_spring", &["wheat_spring"]),
    ("kc_wheat_winter_frozen_soil", &["wheat_winter"]),
    ("kc_barley", &["barley"]),
    ("kc_maize_grain_dry", &["maize_grain"]),
    ("kc_maize_grain_moist", &["maize_silage"]),
    ("kc_maize_sweet_fresh", &["maize_sweet"]),
    ("kc_potato", &["potato"]),
    ("kc_sugar_beet", &["sugar_beet"]),
    ("kc_onion_dry", &["onion_dry"]),
    ("kc_beans_dry", &["beans_dry"]),
    ("kc_pasture_rotated", &["pasture_rotated"]),
    ("kc_pasture_extensive", &["pasture_extensive"]),
    ("kc_apple_bare_frost", &["apple_bare"]),
    ("kc_apple_cover_frost", &["apple_cover", "pear_cover", "cherry_cover"]),
];

/// Checks of table 11 and the built-in crops that take their stage lengths from it.
const STAGES: [(&str, &[&str]); 9] = [
    ("len_potato_semi_arid", &["potato"]),
    ("len_sugar_beet_semi_arid", &["sugar_beet"]),
    ("len_beans_dry_semi_arid", &["beans_dry"]),
    ("len_wheat_35_45_lat", &["wheat_spring", "barley", "oats"]),
    ("len_winter_wheat_semi_arid", &["wheat_winter"]),
    ("len_maize_grain_semi_arid", &["maize_grain"]),
    ("len_maize_grain_spain", &["maize_silage"]),
    ("len_onion_dry_mediterranean", &["onion_dry"]),
    (
        "len_orchard_high_latitude",
        &["apple_bare", "apple_cover", "pear_cover", "cherry_cover", "stone_fruit_bare", "stone_fruit_cover"],
    ),
];

/// Checks of table 22 and the built-in crops that take their roots and depletion share from it.
const ROOTS: [(&str, &[&str]); 10] = [
    ("root_p_onion", &["onion_dry"]),
    ("root_p_potato", &["potato"]),
    ("root_p_sugar_beet", &["sugar_beet"]),
    ("root_p_beans_dry", &["beans_dry"]),
    ("root_p_wheat_spring", &["wheat_spring"]),
    ("root_p_wheat_winter", &["wheat_winter"]),
    ("root_p_maize_grain", &["maize_grain", "maize_silage"]),
    ("root_p_alfalfa_hay", &["alfalfa_hay"]),
    ("root_p_pasture_rotated", &["pasture_rotated"]),
    ("root_p_apple", &["apple_bare", "apple_cover", "pear_cover", "cherry_cover"]),
];

/// Rows of the printed tables that no built-in crop takes, and one on which the sources disagree.
const NOT_SHARED: [&str; 15] = [
    "disagreement_potato_table11",
    "kc_alfalfa_hay_individual",
    "kc_apple_bare_no_frost",
    "kc_apple_cover_no_frost",
    "kc_wheat_winter_unfrozen_soil",
    "len_alfalfa_first_cut_semi_arid",
    "len_alfalfa_other_cuts_california",
    "len_alfalfa_other_cuts_semi_arid",
    "len_beans_dry_continental",
    "len_maize_grain_arid",
    "len_onion_dry_arid",
    "len_potato_continental",
    "len_potato_europe",
    "len_sugar_beet_mediterranean",
    "len_winter_wheat_mediterranean",
];

fn number(value: &Value) -> f64 {
    value.as_float().or_else(|| value.as_integer().map(|whole| whole as f64)).expect("a number")
}

fn numbers(value: &Value) -> Vec<f64> {
    value.as_array().map_or_else(|| vec![number(value)], |items| items.iter().map(number).collect())
}

fn crop(key: &str) -> &'static Crop {
    built_in_crop(key).unwrap_or_else(|| panic!("no crop {key}"))
}

fn coefficients(crop: &Crop) -> Vec<f64> {
    let traits = &crop.traits;
    vec![traits.coefficient_initial, traits.coefficient_mid, traits.coefficient_end, crop.height_m]
}

fn stages(crop: &Crop) -> Vec<f64> {
    let days = crop.traits.stage_days.iter().map(|&days| f64::from(days));
    days.chain([f64::from(crop.traits.season_days())]).collect()
}

fn roots(crop: &Crop) -> Vec<f64> {
    vec![crop.root_depth_range_m[0], crop.root_depth_range_m[1], crop.traits.depletion_share]
}

/// All that the crate says to one check, once per crop that shares it.
fn compute(id: &str, inputs: &Table) -> Vec<Vec<f64>> {
    let of_crops = |shared: &[(&str, &[&str])], read: fn(&Crop) -> Vec<f64>| -> Option<Vec<Vec<f64>>> {
        let (_, keys) = shared.iter().find(|(check, _)| *check == id)?;
        Some(keys.iter().map(|key| read(crop(key))).collect())
    };
    let tabled =
        of_crops(&COEFFICIENTS, coefficients).or_else(|| of_crops(&STAGES, stages)).or_else(|| of_crops(&ROOTS, roots));
    if let Some(values) = tabled {
        return values;
    }
    let input = |name: &str| number(&inputs[name]);
    let one = match id {
        "ex27_taipei" | "ex27_mocha" => {
            vec![input("kc") + climate_adjustment(input("u2"), input("rhmin"), input("h"))]
        }
        "p_adjust" => {
            let pairs = numbers(&inputs["p_tab"]).into_iter().zip(numbers(&inputs["etc"]));
            pairs.map(|(share, thirst_mm)| adjusted_depletion_share(share, thirst_mm)).collect()
        }
        "taw" => vec![total_available_mm(input("fc"), input("wp"), input("zr"))],
        "ks" => {
            let depletions = numbers(&inputs["dr"]).into_iter();
            depletions.map(|depletion_mm| stress_factor(depletion_mm, input("taw"), input("p"))).collect()
        }
        "kc_curve" => {
            // The season is in the check's description: 45/30/70/20 days at 0.5, 1.15 and 0.75, the built-in potato.
            let days = numbers(&inputs["day"]).into_iter();
            days.map(|day| crop("potato").traits.coefficient_on(day as u32)).collect()
        }
        _ => match id.strip_prefix("soil_").and_then(soil_texture) {
            Some(soil) => [soil.field_capacity_share, soil.wilting_point_share].concat(),
            None => return Vec::new(),
        },
    };
    vec![one]
}

fn checks() -> Vec<Value> {
    let file: Table = include_str!("reference/crops.toml").parse().expect("a table");
    file["check"].as_array().expect("checks").clone()
}

#[test]
fn every_published_value_is_met() {
    let mut left_out = BTreeSet::new();
    for check in checks() {
        let id = check["id"].as_str().expect("an id");
        let results = compute(id, check["inputs"].as_table().expect("inputs"));
        if results.is_empty() {
            left_out.insert(id.to_owned());
        }
        for ours in results {
            let expected = numbers(&check["expected"]);
            let rel_tol = number(&check["rel_tol"]);
            assert_eq!(ours.len(), expected.len(), "{id}");
            for (value, target) in ours.iter().zip(&expected) {
                let tolerance = if *target == 0.0 { 1e-9 } else { rel_tol * target.abs() };
                assert!((value - target).abs() <= tolerance, "{id}: {value} is not {target}");
            }
            if let (Some(printed), Some(hold)) = (check.get("printed"), check.get("hold_printed_to")) {
                assert!((ours[0] - number(printed)).abs() <= number(hold) * 1.000_000_1, "{id}");
            }
        }
    }
    assert_eq!(checks().len(), 60, "the copy of the checks has changed");
    let named: BTreeSet<String> = NOT_SHARED.iter().map(|&id| id.to_owned()).collect();
    assert_eq!(left_out, named);
}

#[test]
fn a_row_is_from_memory_unless_a_check_holds_it() {
    let checks = checks();
    let looked_up = |shared: &[(&str, &[&'static str])]| -> BTreeSet<&'static str> {
        let seen = |id: &str| {
            let check = checks.iter().find(|check| check["id"].as_str() == Some(id)).expect("the check");
            check["from_memory"].as_bool() == Some(false)
        };
        shared.iter().filter(|(id, _)| seen(id)).flat_map(|(_, keys)| keys.iter().copied()).collect()
    };
    let claimed = |recalled: fn(&Crop) -> bool| -> BTreeSet<&'static str> {
        CROPS.iter().filter(|crop| !recalled(crop)).map(|crop| crop.key).collect()
    };
    assert_eq!(claimed(|crop| crop.from_memory.coefficients), looked_up(&COEFFICIENTS));
    assert_eq!(claimed(|crop| crop.from_memory.stage_days), looked_up(&STAGES));
    assert_eq!(claimed(|crop| crop.from_memory.roots), looked_up(&ROOTS));
    assert!(CROPS.iter().all(|crop| crop.from_memory.yield_response));
}

#[test]
fn rows_are_sane() {
    let keys: BTreeSet<&str> = CROPS.iter().map(|crop| crop.key).collect();
    assert_eq!(keys.len(), CROPS.len(), "a key stands twice");
    assert!(CROPS.len() >= 40);
    for crop in CROPS {
        let CropTraits { coefficient_initial, coefficient_mid, coefficient_end, .. } = crop.traits;
        let key = crop.key;
        assert!((0.1..=0.8).contains(&crop.traits.depletion_share), "{key}");
        let [shallow_m, deep_m] = crop.root_depth_range_m;
        assert!(0.0 < shallow_m && shallow_m <= deep_m && deep_m <= 3.0, "{key}");
        assert_eq!(crop.traits.root_depth_m, shallow_m, "{key}");
        assert!(crop.traits.yield_response.is_none_or(|factor| (0.2..=1.6).contains(&factor)), "{key}");
        let (month, day) = crop.northern_start;
        assert!((1..=12).contains(&month) && (1..=28).contains(&day), "{key}");
        assert!(!crop.season_source.is_empty() && !crop.harvest.is_empty() && !crop.source().is_empty(), "{key}");
        if key == "fallow" {
            assert_eq!((crop.traits.season_days(), crop.traits.coefficient_on(1)), (0, 0.0));
            continue;
        }
        assert!((60..=365).contains(&crop.traits.season_days()), "{key}");
        assert!(crop.traits.stage_days.iter().all(|&days| days > 0), "{key}");
        assert!(0.0 < coefficient_initial && coefficient_initial <= coefficient_mid, "{key}");
        assert!(0.2 < coefficient_end && coefficient_end <= coefficient_mid && coefficient_mid <= 1.25, "{key}");
        assert!((0.05..=10.0).contains(&crop.height_m), "{key}");
    }
}

#[test]
fn the_southern_season_is_six_months_later() {
    assert_eq!(crop("barley").season_start(false), (4, 10));
    assert_eq!(crop("barley").season_start(true), (10, 10));
    assert_eq!(crop("wheat_winter").season_start(true), (4, 5));
    assert_eq!(crop("zucchini").season_start(true), (12, 1));
}

#[test]
fn sources_say_what_is_recalled() {
    let potato = crop("potato").source();
    assert!(potato.contains("table 12;") && potato.contains("FAO-33") && potato.ends_with("(from memory)"), "{potato}");
    assert!(crop("melon").source().contains("table 12 (from memory)"));
    assert!(!crop("melon").source().contains("FAO-33"));
    assert!(crop("fallow").source().starts_with("no source"));
}

/// The names in one language's file, by message; every fault of the file fails the test.
fn names(language: &str) -> BTreeMap<String, String> {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("locales").join(language).join("crops.ftl");
    let text = std::fs::read_to_string(&path).unwrap_or_else(|error| panic!("{}: {error}", path.display()));
    let ids: Vec<String> =
        text.lines().filter_map(|line| line.split_once(" = ")).map(|(id, _)| id.to_owned()).collect();
    let resource = FluentResource::try_new(text).expect("well-formed messages");
    let mut bundle = FluentBundle::new(vec![language.parse().expect("a language")]);
    bundle.add_resource(resource).expect("no message twice");
    let read = |id: String| {
        let mut errors = Vec::new();
        let pattern = bundle.get_message(&id).and_then(|message| message.value()).expect("a value");
        let name = bundle.format_pattern(pattern, None, &mut errors).into_owned();
        assert!(errors.is_empty(), "{id}");
        (id, name)
    };
    ids.into_iter().map(read).collect()
}

#[test]
fn every_crop_has_a_name_in_both_languages() {
    let keys: BTreeSet<String> = CROPS.iter().map(|crop| format!("crop-{}", crop.key)).collect();
    let spanish = names("es");
    for (language, base) in
        [("en", None), ("es", None), ("es-MX", Some(&spanish)), ("es-CL", Some(&spanish)), ("es-ES", Some(&spanish))]
    {
        let own = names(language);
        let mut all = base.cloned().unwrap_or_default();
        for (id, name) in own {
            // A regional file holds only what differs.
            assert_ne!(all.get(&id), Some(&name), "{language}");
            all.insert(id, name);
        }
        assert_eq!(all.keys().cloned().collect::<BTreeSet<_>>(), keys, "{language}");
        // Two crops that read alike cannot be chosen between, and a small screen holds about twenty letters.
        let distinct: BTreeSet<&str> = all.values().map(String::as_str).collect();
        assert_eq!(distinct.len(), all.len(), "{language}");
        for name in distinct {
            assert!((2..=20).contains(&name.chars().count()), "{language}: {name}");
        }
    }
}
