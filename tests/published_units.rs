//! Every check of `reference/units.toml` that the crate has a constant for; the others are named with the reason.
#![cfg(feature = "std")]

use deshielo::water::evaporation::LATENT_HEAT_OF_VAPORISATION_MJ_KG;
use deshielo::water::units::*;
use toml::{Table, Value};

/// Checks of melt energy: snow melts here by degree-days, and no module holds a latent heat of fusion.
const WITHOUT_A_CONSTANT: [&str; 2] = ["latent_fusion", "energy_to_melt_1mm"];

fn number(value: &Value) -> f64 {
    value.as_float().or_else(|| value.as_integer().map(|whole| whole as f64)).expect("a number")
}

fn compute(id: &str, inputs: &Table) -> Option<f64> {
    let m3_per_day_of_ft3s = m3_per_day(M3S_PER_FT3S);
    Some(match id {
        "acre_foot" => M3_PER_ACRE_FOOT,
        "cfs" => M3S_PER_FT3S,
        "cms_to_cfs" => 1.0 / M3S_PER_FT3S,
        "cfs_day_af" => m3_per_day_of_ft3s / M3_PER_ACRE_FOOT,
        "cfs_day_m3" => m3_per_day_of_ft3s,
        "cms_day_mm" => m3_per_day(number(&inputs["q_m3s"])) / (number(&inputs["area_km2"]) * M3_PER_MM_KM2),
        "mm_ha" => M3_PER_MM_HECTARE,
        "mm_km2" => M3_PER_MM_KM2,
        "lps_ha" => m3_per_day(1.0 / LITRES_PER_M3) / M3_PER_MM_HECTARE,
        "acre" => M2_PER_ACRE,
        "mi2" => M2_PER_SQUARE_MILE,
        "inch" => MM_PER_INCH,
        "ddf_in_f" => MM_PER_INCH * FAHRENHEIT_PER_CELSIUS,
        "f_to_c_35" => celsius_from_fahrenheit(number(&inputs["f"])),
        "in_hr_acre" => MM_PER_INCH / 1000.0 * M2_PER_ACRE / 3600.0 / M3S_PER_FT3S,
        "latent_vap" => LATENT_HEAT_OF_VAPORISATION_MJ_KG,
        "miners_inch_40" => M3S_PER_FT3S / 40.0,
        _ => return None,
    })
}

#[test]
fn every_published_unit_is_met() {
    let file: Table = include_str!("reference/units.toml").parse().expect("a table");
    let checks = file["check"].as_array().expect("checks");
    let mut left_out = Vec::new();
    for check in checks {
        let id = check["id"].as_str().expect("an id");
        let Some(ours) = compute(id, check["inputs"].as_table().expect("inputs")) else {
            left_out.push(id);
            continue;
        };
        let expected = number(&check["expected"]);
        let tolerance = number(&check["rel_tol"]) * expected.abs();
        assert!((ours - expected).abs() <= tolerance, "{id}: {ours} is not {expected} ± {tolerance}");
        if let (Some(printed), Some(hold)) = (check.get("printed"), check.get("hold_printed_to")) {
            assert!((ours - number(printed)).abs() <= number(hold) * 1.000_000_1, "{id}: {ours} is not as printed");
        }
    }
    assert_eq!(checks.len(), 19, "the copy of the checks has changed");
    assert_eq!(left_out, WITHOUT_A_CONSTANT);
}
