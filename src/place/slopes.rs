//! The tables of a place about its slopes: weather with height, rain or snow, melt, evaporation, soil, ground, channel.
//!
//! Usual values stand in the code beside their keys; `PLACE.md` tells where each comes from.

use super::problem::Problem;
use super::section::{Limits, Number, Section};
use super::unit_suffix::{CELSIUS, DAYS, DEGREE_DAY, DEPTH_MM, DEPTH_MM_DAY, GRADIENT, LAPSE, PLAIN, SHARE, Units};
use crate::water::valley::{
    ChannelTraits, Climb, GroundTraits, MOST_HYDROGRAPH_DAYS, RainSnow, ReachTraits, SnowTraits, SoilTraits, Start,
};

/// Free air cools by this much with height (International Standard Atmosphere), °C per km.
const USUAL_LAPSE_C_PER_KM: f64 = -6.5;

/// Reads `[climb]`.
pub(super) fn climb(root: &Section<'_>) -> (Climb, Number) {
    let section = root.section("climb");
    let lapse_limits = Limits(-15.0, 15.0);
    let is_list = ["lapse_c_per_km", "lapse_f_per_1000ft"]
        .iter()
        .any(|key| section.peek(key).is_some_and(|value| matches!(value.kind, super::tree::Kind::List(_))));
    let lapse: Vec<Number> = if is_list {
        let list = section.numbers("lapse", LAPSE, lapse_limits).unwrap_or_default();
        if list.len() != 12 {
            tell_length(&section, &section.as_written("lapse", LAPSE), list.len(), 12);
        }
        list
    } else {
        vec![section.number_or("lapse", LAPSE, lapse_limits, USUAL_LAPSE_C_PER_KM)]
    };
    // A month of inversions may have it warmer above, but not the whole year.
    let mean = lapse.iter().map(|month| month.value).sum::<f64>() / lapse.len().max(1) as f64;
    if mean > 0.0 {
        section.sheet.tell(Problem::error(lapse[0].at.clone(), "problem-lapse-sign").with("value", mean));
    }
    let gradient = section.number_or("precipitation", GRADIENT, Limits(-0.2, 0.5), 0.05);
    let climb = Climb {
        lapse_c_per_km: std::array::from_fn(|month| lapse.get(month).or(lapse.first()).map_or(f64::NAN, |m| m.value)),
        precipitation_per_100m: gradient.value,
        precipitation_factor: section.number_or("precipitation_factor", PLAIN, Limits(0.2, 5.0), 1.0).value,
        snow_catch_factor: section.number_or("snow_catch_factor", PLAIN, Limits(0.5, 3.0), 1.0).value,
        warming_weight: warming_weight(&section),
    };
    (climb, gradient)
}

/// How much of the warming dial each quarter gets, December–February first.
fn warming_weight(section: &Section<'_>) -> [f64; 4] {
    let Some(list) = section.numbers("warming_weight", PLAIN, Limits(0.0, 3.0)) else { return [1.0; 4] };
    if list.len() != 4 {
        tell_length(section, "warming_weight", list.len(), 4);
    }
    std::array::from_fn(|quarter| list.get(quarter).map_or(f64::NAN, |weight| weight.value))
}

fn tell_length(section: &Section<'_>, key: &str, found: usize, wanted: usize) {
    let problem = Problem::error(section.at.clone(), "problem-list-length").with("key", key);
    section.sheet.tell(problem.with("found", found).with("wanted", wanted));
}

/// Reads `[rain_snow]`; `humidity` is whether the record has any.
pub(super) fn rain_snow(root: &Section<'_>, humidity: bool) -> RainSnow {
    let section = root.section("rain_snow");
    let snow = section.number_or("all_snow_below", CELSIUS, Limits(-10.0, 10.0), 0.0);
    let rain = section.number_or("all_rain_above", CELSIUS, Limits(-10.0, 10.0), 3.0);
    if snow.value >= rain.value {
        let at = if rain.stated { rain.at } else { snow.at };
        section
            .sheet
            .tell(Problem::error(at, "problem-rain-snow-order").with("snow", snow.value).with("rain", rain.value));
    }
    let wet_bulb = section.flag_or("wet_bulb", false);
    if let (true, false, Some(value)) = (wet_bulb, humidity, section.peek("wet_bulb")) {
        section.sheet.tell(Problem::error(section.value_at(value), "problem-wet-bulb-humidity"));
    }
    RainSnow { all_snow_below_c: snow.value, all_rain_above_c: rain.value, wet_bulb }
}

/// Reads `[snow]`.
pub(super) fn snow(root: &Section<'_>) -> SnowTraits {
    let section = root.section("snow");
    let factor = section.number_or("melt_factor", DEGREE_DAY, Limits(0.1, 20.0), 3.5);
    let swing = section.number_or("melt_swing", DEGREE_DAY, Limits(0.0, 20.0), 1.5);
    if swing.value > factor.value {
        let at = if swing.stated { swing.at.clone() } else { factor.at.clone() };
        let problem = Problem::error(at, "problem-melt-swing");
        section.sheet.tell(problem.with("swing", swing.value).with("factor", factor.value));
    }
    SnowTraits {
        melt_above_c: section.number_or("melt_above", CELSIUS, Limits(-5.0, 5.0), 0.0).value,
        melt_factor_mm_c_day: factor.value,
        melt_swing_mm_c_day: swing.value,
        refreeze_share: share(&section, "refreeze", 0.05),
        liquid_holding_share: section.number_or("liquid_holding", SHARE, Limits(0.0, 0.5), 0.10).value,
        heat_of_rain: section.flag_or("heat_of_rain", true),
        full_cover_mm: section.number_or("full_cover", DEPTH_MM, Limits(0.1, 1000.0), 20.0).value,
        sublimation_mm_day: section.number_or("sublimation", DEPTH_MM_DAY, Limits(0.0, 5.0), 0.0).value,
    }
}

/// Reads `[soil]`.
pub(super) fn soil(root: &Section<'_>) -> SoilTraits {
    let section = root.section("soil");
    SoilTraits {
        capacity_mm: section.number_or("capacity", DEPTH_MM, Limits(1.0, 2000.0), 150.0).value,
        recharge_power: section.number_or("recharge_power", PLAIN, Limits(0.5, 10.0), 2.5).value,
        dry_share: section.number_or("dry", SHARE, Limits(0.01, 1.0), 0.7).value,
    }
}

/// Reads `[ground]`.
pub(super) fn ground(root: &Section<'_>) -> GroundTraits {
    let section = root.section("ground");
    let quick = section.number_or("quick", DAYS, Limits(0.1, 1000.0), 8.0);
    let slow = section.number_or("slow", DAYS, Limits(0.1, 10_000.0), 90.0);
    if quick.value >= slow.value {
        let at = if slow.stated { slow.at.clone() } else { quick.at.clone() };
        let problem = Problem::error(at, "problem-ground-order");
        section.sheet.tell(problem.with("quick", quick.value).with("slow", slow.value));
    }
    GroundTraits {
        quick_days: quick.value,
        slow_days: slow.value,
        percolation_mm_day: section.number_or("percolation", DEPTH_MM_DAY, Limits(0.0, 50.0), 1.0).value,
    }
}

/// Reads `[channel]`.
pub(super) fn channel(root: &Section<'_>) -> ChannelTraits {
    let section = root.section("channel");
    let most_days = MOST_HYDROGRAPH_DAYS as f64;
    let base = section.number_or("unit_hydrograph_base", DAYS, Limits(0.01, most_days), 2.0).value;
    let travel = section.number("reach_travel", DAYS, Limits(0.01, 60.0));
    let weight = section.number("reach_inflow_weight", PLAIN, Limits(0.0, 0.5));
    if let (None, Some(weight)) = (&travel, &weight) {
        section.sheet.tell(
            Problem::error(weight.at.clone(), "problem-key-missing")
                .with("key", "reach_travel_days")
                .with("table", section.name.clone()),
        );
    }
    let reach = travel.map(|travel| {
        let weight = weight.as_ref().map_or(0.2, |weight| weight.value);
        // Outside of these the published coefficients turn negative and the reach would make water run backwards.
        let (longest, shortest) = (1.0 / (2.0 * weight), 1.0 / (2.0 * (1.0 - weight)));
        if travel.value > longest || travel.value < shortest {
            section.sheet.tell(
                Problem::error(travel.at.clone(), "problem-reach-unstable")
                    .with("value", travel.value)
                    .with("least", shortest)
                    .with("most", longest),
            );
        }
        ReachTraits { travel_days: travel.value, inflow_weight: weight }
    });
    ChannelTraits { unit_hydrograph_base_days: base, reach }
}

/// Reads `[start]`.
pub(super) fn start(root: &Section<'_>) -> (Start, Number) {
    let section = root.section("start");
    let depth = |base: &'static str, units: Units, usual: f64| {
        section.number_or(base, units, Limits(0.0, 10_000.0), usual).value
    };
    let settling = section.number_or("settling_years", PLAIN, Limits(0.0, 50.0), 1.0);
    if settling.value % 1.0 != 0.0 && settling.value.is_finite() {
        let problem = Problem::error(settling.at.clone(), "problem-not-whole").with("key", "settling_years");
        section.sheet.tell(problem.with("value", settling.value));
    }
    let start = Start {
        snow_mm: depth("snow", DEPTH_MM, 0.0),
        soil_share: share(&section, "soil", 0.5),
        quick_mm: depth("quick", DEPTH_MM, 0.0),
        slow_mm: depth("slow", DEPTH_MM, 50.0),
        storage_share: share(&section, "storage", 0.5),
        settling_years: settling.value as u8,
    };
    (start, settling)
}

/// A share from 0 to 1 with a usual value.
pub(super) fn share(section: &Section<'_>, base: &'static str, usual: f64) -> f64 {
    section.number_or(base, SHARE, Limits(0.0, 1.0), usual).value
}
