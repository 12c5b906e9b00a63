//! The crops of a place with their numbers and where each comes from.

use super::grid::{Column, Side, lay_out};
use super::summary_lines::wrapped;
use crate::place::Place;
use crate::place::crop_table::{CROPS, Crop, built_in_crop};
use crate::water::crop::CropTraits;
use crate::water::valley::Purpose;
use crate::words::{Quantity, System, Words};

/// A crop that grows in the place or that the crop-mix dial may bring.
struct Shown {
    name: String,
    traits: CropTraits,
    built_in: Option<&'static Crop>,
}

/// A table of the crops and a line of sources for each.
pub(super) fn write(place: &Place, system: System, words: &Words) -> String {
    let shown = crops_of(place, words);
    let say = |id: &str| words.say(id, &[]);
    let mut text = format!("\n{}\n", say("tell-crops"));
    if shown.is_empty() {
        text.push_str(&wrapped(&say("tell-crops-none"), ""));
        return text;
    }
    let depth_heading = {
        let unit = words.unit(Quantity::Elevation, system);
        words.say("tell-name-and-unit", &[("name", say("crop-column-roots").into()), ("unit", unit.into())])
    };
    let column = |heading: String, side| Column { heading, side, most: 24, heading_most: 0 };
    let columns = [
        column(say("crop-column-name"), Side::Left),
        column(say("crop-column-coefficients"), Side::Right),
        column(say("crop-column-stages"), Side::Right),
        column(depth_heading, Side::Right),
        column(say("crop-column-depletion"), Side::Right),
        column(say("crop-column-yield"), Side::Right),
    ];
    let rows: Vec<Vec<String>> = shown.iter().map(|crop| row(crop, system, words)).collect();
    text.push_str(&lay_out(&columns, &rows).replace('\u{202f}', " "));
    text.push('\n');
    for crop in &shown {
        let line = words
            .say("crop-and-source", &[("crop", crop.name.as_str().into()), ("source", source(crop, words).into())]);
        text.push_str(&wrapped(&line, ""));
    }
    text
}

fn crops_of(place: &Place, words: &Words) -> Vec<Shown> {
    let mut shown: Vec<Shown> = Vec::new();
    let mut add = |crop: Shown| {
        if !shown.iter().any(|known| known.name == crop.name) {
            shown.push(crop);
        }
    };
    let mut swapped = Vec::new();
    for (gate, names) in place.valley.gates.iter().zip(&place.gates) {
        let Purpose::Fields(fields) = &gate.purpose else { continue };
        for (field, names) in fields.iter().zip(&names.fields) {
            let built_in = built_in_crop(&names.crop).filter(|_| names.crop_name.is_none());
            let name = match &names.crop_name {
                Some(own) => own.get(words.tag()).to_owned(),
                None => words.say(&format!("crop-{}", names.crop), &[]),
            };
            add(Shown { name, traits: field.crop.traits, built_in });
            swapped.extend(field.swap_to.map(|crop| crop.traits));
        }
    }
    // A field keeps only the numbers of the crop that the dial would bring; among the built-in crops they name it.
    for traits in swapped {
        if let Some(crop) = CROPS.iter().find(|crop| crop.traits == traits) {
            let name = words.say(&format!("crop-{}", crop.key), &[]);
            add(Shown { name, traits, built_in: Some(crop) });
        }
    }
    shown
}

fn row(crop: &Shown, system: System, words: &Words) -> Vec<String> {
    let traits = &crop.traits;
    let missing = || words.style().missing.clone();
    if traits.season_days() == 0 {
        return [crop.name.clone()].into_iter().chain((0..5).map(|_| missing())).collect();
    }
    let coefficients = [traits.coefficient_initial, traits.coefficient_mid, traits.coefficient_end];
    let list = |parts: Vec<String>| parts.join("/");
    let depth = words.unit_of(Quantity::Elevation, system).convert(traits.root_depth_m);
    vec![
        crop.name.clone(),
        list(coefficients.iter().map(|coefficient| words.number(*coefficient, 2)).collect()),
        list(traits.stage_days.iter().map(|days| words.number(f64::from(*days), 0)).collect()),
        words.number(depth, 1),
        words.percent(traits.depletion_share * 100.0, 0),
        traits.yield_response.map_or_else(missing, |response| words.number(response, 2)),
    ]
}

/// Where the numbers of a crop come from, with what was recalled marked.
fn source(crop: &Shown, words: &Words) -> String {
    let Some(row) = crop.built_in else { return words.say("crop-source-place", &[]) };
    if row.traits.season_days() == 0 {
        return words.say("crop-source-none", &[]);
    }
    let memory = |recalled: bool| if recalled { words.say("crop-source-memory", &[]) } else { String::new() };
    let stages =
        if row.season_source.starts_with("table 11") { "crop-source-stages" } else { "crop-source-stages-ours" };
    let mut parts = vec![
        words.say("crop-source-coefficients", &[("memory", memory(row.from_memory.coefficients).into())]),
        words.say(stages, &[("memory", memory(row.from_memory.stage_days).into())]),
        words.say("crop-source-roots", &[("memory", memory(row.from_memory.roots).into())]),
    ];
    if row.traits.yield_response.is_some() {
        parts.push(words.say("crop-source-yield", &[("memory", memory(row.from_memory.yield_response).into())]));
    }
    parts.join("; ")
}
