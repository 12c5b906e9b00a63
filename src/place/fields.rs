//! Fields under a canal, and what the canal loses on the way to them.

use super::crops::{Crops, FALLOW, PlaceCrop};
use super::dated::month_day;
use super::problem::{Location, Problem};
use super::section::{Limits, Number, Section, unknown_choice};
use super::text::Text;
use super::unit_suffix::{AREA_HA, CANAL_LENGTH, DEPTH_MM_DAY, METRES, PLAIN, SEEPAGE, SHARE, SOIL_HOLDS};
use crate::water::crop::{SOIL_TEXTURES, soil_texture};
use crate::water::units::SECONDS_PER_DAY;
use crate::water::valley::{CropOnField, Field, MOST_FIELDS};

/// Share of the water at the field that reaches the roots (Brouwer, Prins & Heibloem 1989, FAO Irrigation Water
/// Management Training Manual no. 4, annex I, table 8; from memory). Furrow, border and basin are ways to water by
/// gravity, for which the table has one value.
const METHODS: [(&str, f64); 6] =
    [("surface", 0.60), ("furrow", 0.60), ("border", 0.60), ("basin", 0.60), ("sprinkler", 0.75), ("drip", 0.90)];

/// Share that a canal of earth passes on when long (over 2000 m), middling (200–2000 m) and short, by its soil, and a
/// lined one of any length (table 7 there; from memory).
const LININGS: [(&str, [f64; 3]); 4] = [
    ("earth_sand", [0.60, 0.70, 0.80]),
    ("earth_loam", [0.70, 0.75, 0.85]),
    ("earth_clay", [0.80, 0.85, 0.90]),
    ("lined", [0.95, 0.95, 0.95]),
];

/// Loss of a middling earth canal in loam, used where a place says nothing (table 7 there).
const USUAL_LOSS: f64 = 0.25;

/// Seepage per wetted area in m/day: middles of the ranges of Kraatz (1977), *Irrigation canal lining*, FAO Land and
/// Water Development Series 1 (from memory).
const BEDS: [(&str, f64); 6] = [
    ("impervious_clay_loam", 0.085),
    ("clay_loam", 0.19),
    ("gravelly_sandy_clay", 0.265),
    ("sandy_loam", 0.375),
    ("loose_sand", 0.50),
    ("porous_gravel", 0.825),
];

/// A field's crop for people.
#[derive(Clone, Debug, PartialEq)]
pub struct FieldNames {
    /// Key of the crop.
    pub crop: String,
    /// Name of the crop, where the place describes it itself.
    pub crop_name: Option<Text>,
}

/// A field as read.
pub(super) struct ReadField {
    /// The field; its `swap_to` is filled in when all fields are known.
    pub field: Field,
    /// Its crop for people.
    pub names: FieldNames,
}

/// Reads every `[[canal.field]]`.
pub(super) fn read(canal: &Section<'_>, crops: &Crops) -> Vec<ReadField> {
    let sections = canal.sections("field");
    if let Some(beyond) = sections.get(MOST_FIELDS) {
        let problem = Problem::error(beyond.at.clone(), "problem-too-many-fields");
        canal.sheet.tell(problem.with("found", sections.len()).with("most", MOST_FIELDS));
    }
    if sections.is_empty() {
        canal.tell_missing_tables("field");
    }
    sections.iter().map(|section| field(section, crops)).collect()
}

fn field(section: &Section<'_>, crops: &Crops) -> ReadField {
    let area = section.need_number("area", AREA_HA, Limits(0.000_1, 2.0e6));
    let efficiency = efficiency(section);
    let soil = soil(section);
    let refill = section.number_or("refill_to", SHARE, Limits(0.0, 1.0), 0.0).value;
    let off_season = section.number_or("off_season_coefficient", PLAIN, Limits(0.0, 1.2), 0.2).value;
    let most_watering = section.number_or("most_watering", DEPTH_MM_DAY, Limits(0.1, 300.0), 10.0).value;
    let planting = section.get("planting").and_then(|value| month_day(section, "planting", value));
    let named = section.need_text("crop");
    let crop = named.as_ref().and_then(|(key, at)| crops.find(section, key, at));
    // The area of a field whose crop is unknown still counts where areas are compared.
    let crop = crop.unwrap_or_else(|| PlaceCrop::unknown(named.map_or("", |(key, _)| key)));
    let field = Field {
        area_ha: area.value,
        crop: CropOnField { planting: planting.unwrap_or(crop.planting), ..on_field(&crop, refill, off_season) },
        swap_to: None,
        efficiency,
        soil_holds_mm_per_m: soil,
        most_watering_mm_day: most_watering,
    };
    ReadField { field, names: FieldNames { crop: crop.key, crop_name: crop.name } }
}

/// A crop as it is grown on a field.
pub(super) fn on_field(crop: &PlaceCrop, refill_to_share: f64, off_season_coefficient: f64) -> CropOnField {
    CropOnField {
        traits: crop.traits,
        planting: crop.planting,
        refill_to_share,
        watered: crop.key != FALLOW,
        off_season_coefficient,
    }
}

/// A way of watering by name, or a number of one's own; not both.
fn efficiency(section: &Section<'_>) -> f64 {
    let method = section.choice("method", &METHODS);
    let number = section.number("efficiency", SHARE, Limits(0.05, 1.0));
    match (method, number) {
        (Some(_), Some(number)) => {
            tell_either(section, number.at, "method", "efficiency");
            f64::NAN
        }
        (_, Some(number)) => number.value,
        (Some((efficiency, _)), None) => efficiency,
        (None, None) => {
            if section.peek("method").is_none() {
                section.tell_missing("method");
            }
            f64::NAN
        }
    }
}

/// A soil by name, or the water it holds as a number; loam where neither is said.
fn soil(section: &Section<'_>) -> f64 {
    let named = section.text("soil");
    let number = section.number("soil_holds", SOIL_HOLDS, Limits(10.0, 400.0));
    match (named, number) {
        (Some(_), Some(number)) => {
            tell_either(section, number.at, "soil", "soil_holds_mm_per_m");
            f64::NAN
        }
        (None, Some(number)) => number.value,
        (None, None) => holds_mm_per_m("loam").unwrap_or(f64::NAN),
        (Some((name, at)), None) => holds_mm_per_m(name).unwrap_or_else(|| {
            section.sheet.tell(unknown_choice(at, "soil", name, SOIL_TEXTURES.iter().map(|texture| texture.key)));
            f64::NAN
        }),
    }
}

/// Middle of the published range of a texture (FAO-56 table 19).
fn holds_mm_per_m(texture: &str) -> Option<f64> {
    soil_texture(texture).map(|texture| texture.typical_available_share() * 1_000.0)
}

fn tell_either(section: &Section<'_>, at: Location, key: &str, other: &str) {
    section.sheet.tell(Problem::error(at, "problem-either").with("key", key).with("other", other));
}

/// Share of what enters a canal that is lost on the way: stated, or from its length and lining or bed.
pub(super) fn loss(canal: &Section<'_>, capacity: &Number) -> f64 {
    let stated = canal.number("loss", SHARE, Limits(0.0, 0.95));
    let described = canal.section("losses");
    match (stated, described.present) {
        (Some(stated), true) => {
            tell_either(canal, stated.at, "loss_share", "losses");
            // Read all the same, so that the mistakes in it are told too.
            f64::NAN * described_loss(&described, capacity)
        }
        (Some(stated), false) => stated.value,
        (None, true) => described_loss(&described, capacity),
        (None, false) => USUAL_LOSS,
    }
}

fn described_loss(section: &Section<'_>, capacity: &Number) -> f64 {
    let length = section.need_number("length", CANAL_LENGTH, Limits(1.0, 1.0e6));
    if let Some((passed, _)) = section.choice("lining", &LININGS) {
        let class = if length.value > 2_000.0 { 0 } else { usize::from(length.value < 200.0) + 1 };
        return 1.0 - passed[class];
    }
    if section.peek("lining").is_some() {
        return f64::NAN;
    }
    let perimeter = section.need_number("wetted_perimeter", METRES, Limits(0.1, 200.0));
    let bed = section.choice("bed", &BEDS);
    let seepage = match (section.number("seepage", SEEPAGE, Limits(0.0, 5.0)), bed) {
        (Some(own), None) => own.value,
        (None, Some((published, _))) => published,
        (Some(own), Some(_)) => {
            tell_either(section, own.at, "bed", "seepage_m_day");
            f64::NAN
        }
        (None, None) => {
            section.tell_missing("lining");
            f64::NAN
        }
    };
    let lost_m3s = seepage * perimeter.value * length.value / SECONDS_PER_DAY;
    let share = lost_m3s / capacity.value;
    if share > 0.95 {
        let problem = Problem::error(section.at.clone(), "problem-loss-too-large");
        section.sheet.tell(problem.with("lost", lost_m3s).with("capacity", capacity.value));
    }
    share
}
