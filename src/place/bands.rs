//! Elevation bands: listed one by one, or cut from an area–elevation curve.

use heapless::Vec as FixedVec;

use super::problem::{Location, Problem};
use super::section::{Limits, Number, Section};
use super::unit_suffix::{AREA_KM2, METRES, PLAIN};
use crate::water::valley::{Band, MOST_BANDS};

/// Lowest and highest land, m; the shore of the lowest lake and the highest summit, with room.
pub(super) const ELEVATION: Limits = Limits(-500.0, 9000.0);
/// Areas of land and lake, km².
const AREA: Limits = Limits(0.000_1, 100_000.0);
/// Factors on melt and evaporation.
const FACTOR: Limits = Limits(0.1, 5.0);

/// Bands as read, before lake and fields are taken from those of a curve.
pub(super) struct ReadBands {
    /// From low to high.
    pub bands: FixedVec<Band, MOST_BANDS>,
    /// Where to point for all of them.
    pub at: Location,
    /// Whether the curve's area holds the lake and the fields as well.
    pub holds_lake: bool,
    /// Whether the curve's area holds the fields.
    pub holds_fields: bool,
    /// Whether the file has more than fit.
    pub too_many: bool,
}

/// Reads `[[band]]` or `[area_elevation]`.
pub(super) fn read(root: &Section<'_>) -> ReadBands {
    let listed = root.sections("band");
    let curve = root.section("area_elevation");
    if curve.present {
        if let Some(band) = listed.first() {
            root.sheet.tell(Problem::error(band.at.clone(), "problem-bands-and-curve"));
        }
        return from_curve(&curve);
    }
    if listed.is_empty() && !root.sheet.is_broken() {
        root.sheet.tell(Problem::error(root.at.clone(), "problem-bands-missing"));
    }
    from_list(root, &listed)
}

fn from_list(root: &Section<'_>, listed: &[Section<'_>]) -> ReadBands {
    let mut bands: FixedVec<Band, MOST_BANDS> = FixedVec::new();
    let mut before = f64::NAN;
    for (index, section) in listed.iter().enumerate() {
        let elevation = section.need_number("elevation", METRES, ELEVATION);
        if elevation.value < before {
            let problem = Problem::error(elevation.at.clone(), "problem-bands-order");
            section.sheet.tell(problem.with("value", elevation.value).with("before", before));
        }
        before = elevation.value;
        let band = Band {
            area_km2: section.need_number("area", AREA_KM2, AREA).value,
            elevation_m: elevation.value,
            melt_exposure: section.number_or("melt_exposure", PLAIN, FACTOR, 1.0).value,
            evaporation_factor: section.number_or("evaporation_factor", PLAIN, FACTOR, 1.0).value,
        };
        if bands.push(band).is_err() && index == MOST_BANDS {
            tell_too_many(section, section.at.clone(), listed.len());
        }
    }
    let at = listed.first().map_or_else(|| root.at.clone(), |section| section.at.clone());
    ReadBands { bands, at, holds_lake: false, holds_fields: false, too_many: listed.len() > MOST_BANDS }
}

fn tell_too_many(section: &Section<'_>, at: Location, found: usize) {
    let problem = Problem::error(at, "problem-too-many-bands");
    section.sheet.tell(problem.with("found", found).with("most", MOST_BANDS));
}

/// A curve of the area that lies below each elevation, cut into bands of equal height.
fn from_curve(section: &Section<'_>) -> ReadBands {
    let elevation =
        rising(section, section.numbers("elevation", METRES, ELEVATION), &section.as_written("elevation", METRES));
    let below = rising(
        section,
        section.numbers("area_below", AREA_KM2, Limits(0.0, AREA.1)),
        &section.as_written("area_below", AREA_KM2),
    );
    let count = section.number_or("bands", PLAIN, Limits(1.0, 1000.0), 8.0);
    if count.value > MOST_BANDS as f64 {
        tell_too_many(section, count.at.clone(), count.value as usize);
    } else if count.value % 1.0 > 0.0 {
        let problem = Problem::error(count.at.clone(), "problem-not-whole").with("key", "bands");
        section.sheet.tell(problem.with("value", count.value));
    }
    if !elevation.is_empty() && !below.is_empty() && elevation.len() != below.len() {
        let problem = Problem::error(section.at.clone(), "problem-list-length")
            .with("key", section.as_written("area_below", AREA_KM2));
        section.sheet.tell(problem.with("found", below.len()).with("wanted", elevation.len()));
    }
    let exposure = section.number_or("melt_exposure", PLAIN, FACTOR, 1.0).value;
    let factor = section.number_or("evaporation_factor", PLAIN, FACTOR, 1.0).value;
    let bands = cut(&elevation, &below, count.value)
        .into_iter()
        .take(MOST_BANDS)
        .map(|(area_km2, elevation_m)| Band {
            area_km2,
            elevation_m,
            melt_exposure: exposure,
            evaporation_factor: factor,
        })
        .collect();
    ReadBands {
        bands,
        at: section.at.clone(),
        holds_lake: section.flag_or("holds_lake", true),
        holds_fields: section.flag_or("holds_fields", false),
        too_many: false,
    }
}

/// The values of a list that must rise; tells where one does not.
pub(super) fn rising(section: &Section<'_>, list: Option<Vec<Number>>, key: &str) -> Vec<f64> {
    let Some(list) = list else {
        section.tell_missing(key);
        return Vec::new();
    };
    if list.len() < 2 {
        section.sheet.tell(Problem::error(section.at.clone(), "problem-list-short").with("key", key));
    }
    if let Some(pair) = list.windows(2).find(|pair| pair[1].value <= pair[0].value) {
        section.sheet.tell(
            Problem::error(pair[1].at.clone(), "problem-not-rising")
                .with("key", key)
                .with("value", pair[1].value)
                .with("before", pair[0].value),
        );
    }
    list.into_iter().map(|number| number.value).collect()
}

/// Area and mean elevation of `count` bands of equal height; the land between two points of the curve is taken as an
/// even slope. Nothing when the curve is not one.
fn cut(elevation: &[f64], below: &[f64], count: f64) -> Vec<(f64, f64)> {
    let rises = |values: &[f64]| values.len() > 1 && values.windows(2).all(|pair| pair[0] < pair[1]);
    if elevation.len() != below.len() || !rises(elevation) || !rises(below) || !(1.0..=32.0).contains(&count) {
        return Vec::new();
    }
    let (bottom, top) = (elevation[0], elevation[elevation.len() - 1]);
    let height = (top - bottom) / count;
    let mut bands = Vec::new();
    for index in 0..count as usize {
        let low = bottom + height * index as f64;
        let high = if index + 1 == count as usize { top } else { bottom + height * (index + 1) as f64 };
        let (mut area, mut moment) = (0.0, 0.0);
        for point in 1..elevation.len() {
            let (from, to) = (low.max(elevation[point - 1]), high.min(elevation[point]));
            if to > from {
                let density = (below[point] - below[point - 1]) / (elevation[point] - elevation[point - 1]);
                area += density * (to - from);
                moment += density * (to - from) * (from + to) / 2.0;
            }
        }
        bands.push((area, moment / area));
    }
    bands
}

/// Takes lake and fields out of a curve's area, from the lowest band up; a band that is used up goes.
pub(super) fn take_from_lowest(bands: &mut FixedVec<Band, MOST_BANDS>, mut area_km2: f64) {
    for band in bands.iter_mut() {
        let taken = area_km2.min(band.area_km2);
        if taken > 0.0 {
            band.area_km2 -= taken;
            area_km2 -= taken;
        }
    }
    bands.retain(|band| band.area_km2 != 0.0);
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_curve_is_cut_without_losing_area() {
        // 10 km² spread evenly over 100 m, then 30 km² over 300 m: density 0.1 km²/m throughout.
        let bands = cut(&[1000.0, 1100.0, 1400.0], &[0.0, 10.0, 40.0], 4.0);
        for (band, middle) in bands.iter().zip([1050.0, 1150.0, 1250.0, 1350.0]) {
            approx::assert_relative_eq!(band.0, 10.0, max_relative = 1e-12);
            approx::assert_relative_eq!(band.1, middle, max_relative = 1e-12);
        }
        // A band with a bend in it: 100 m at 0.1 and 100 m at 0.3 km²/m have their centre at 1125 m.
        let bent = cut(&[1000.0, 1100.0, 1200.0], &[0.0, 10.0, 40.0], 1.0);
        approx::assert_relative_eq!(bent[0].1, 1125.0, max_relative = 1e-12);
        assert_eq!(cut(&[1000.0, 900.0], &[0.0, 1.0], 1.0), []);
    }

    #[test]
    fn the_lake_lies_at_the_bottom() {
        let band = |area_km2| Band { area_km2, elevation_m: 1.0, melt_exposure: 1.0, evaporation_factor: 1.0 };
        let mut bands = FixedVec::from_array([band(2.0), band(3.0), band(4.0)]);
        take_from_lowest(&mut bands, 2.5);
        assert_eq!(bands.iter().map(|band| band.area_km2).collect::<Vec<_>>(), [2.5, 4.0]);
    }
}
