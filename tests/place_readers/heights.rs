//! Heights and outlines: the area below each height as an independent library counts it, and refusals with reasons.

use std::path::Path;

use deshielo::place::terrain::{AreaCurve, Coordinates, HeightUnit, TerrainFiles, area_curve};

use super::support::{BASIN, HEIGHTS_ASCII, HEIGHTS_TIFF, told};

const PRJ: &[u8] = b"PROJCS[\"WGS_1984_UTM_Zone_19S\",GEOGCS[\"GCS_WGS_1984\",DATUM[\"D_WGS_1984\",\
    SPHEROID[\"WGS_1984\",6378137.0,298.257223563]],PRIMEM[\"Greenwich\",0.0],UNIT[\"Degree\",0.0174532925199433]],\
    PROJECTION[\"Transverse_Mercator\"],UNIT[\"Meter\",1.0]]";

fn files<'f>(grid: &'f [u8], outline: &'f [u8]) -> TerrainFiles<'f> {
    TerrainFiles {
        grid_file: Path::new("grid"),
        grid,
        prj: None,
        outline_file: Path::new("basin.geojson"),
        outline,
        grid_coordinates: None,
        heights: None,
    }
}

fn curve(files: &TerrainFiles<'_>) -> Result<AreaCurve, Vec<(&'static str, usize)>> {
    let mut problems = Vec::new();
    area_curve(files, &mut problems).ok_or_else(|| told(&problems))
}

#[test]
fn both_grids_give_the_area_that_an_independent_library_counts() {
    let values: serde_json::Value = serde_json::from_str(include_str!("files/heights_values.json")).unwrap();
    let value = |name: &str| values[name].as_f64().unwrap();
    let tiff = curve(&files(HEIGHTS_TIFF, BASIN)).unwrap();
    let ascii = curve(&TerrainFiles { prj: Some(PRJ), ..files(HEIGHTS_ASCII, BASIN) }).unwrap();
    for curve in [&tiff, &ascii] {
        approx::assert_relative_eq!(curve.area_km2, value("area_km2"), max_relative = 1e-12);
        approx::assert_relative_eq!(curve.mean_m, value("mean_m"), max_relative = 1e-6);
        assert_eq!(curve.cells as f64, value("cells"));
        let (first, last) = (curve.points.first().unwrap(), curve.points.last().unwrap());
        assert_eq!((first.elevation_m, first.area_below_km2), (value("lowest_m").floor(), 0.0));
        assert_eq!(last.elevation_m, value("highest_m").floor() + 1.0);
        approx::assert_relative_eq!(last.area_below_km2, value("area_km2"), max_relative = 1e-12);
        assert!(curve.points.windows(2).all(|pair| {
            pair[0].elevation_m < pair[1].elevation_m && pair[0].area_below_km2 < pair[1].area_below_km2
        }));
        // Between its points the curve is straight: within a hundredth of the basin.
        let pair = curve.points.windows(2).find(|pair| pair[1].elevation_m >= 2000.0).unwrap();
        let share = (2000.0 - pair[0].elevation_m) / (pair[1].elevation_m - pair[0].elevation_m);
        let below = pair[0].area_below_km2 + share * (pair[1].area_below_km2 - pair[0].area_below_km2);
        assert!((below - value("below_2000_km2")).abs() < value("area_km2") / 100.0, "{below}");
    }
    assert!(tiff.heights_said && !ascii.heights_said);
}

#[test]
fn nothing_is_guessed() {
    let outline = String::from_utf8(BASIN.to_vec()).unwrap();
    let ascii = files(HEIGHTS_ASCII, BASIN);
    assert_eq!(curve(&ascii), Err(vec![("problem-terrain-no-prj", 0)]));
    assert_eq!(curve(&TerrainFiles { prj: Some(b"LOCAL_CS[\"x\"]"), ..ascii }), Err(vec![("problem-terrain-prj", 0)]));
    let told_zone = TerrainFiles { grid_coordinates: Some(Coordinates::Metres(32_719)), ..ascii };
    assert!(curve(&told_zone).is_ok());
    let other = TerrainFiles { grid_coordinates: Some(Coordinates::Metres(32_718)), ..ascii };
    assert_eq!(curve(&other), Err(vec![("problem-terrain-coordinates", 0)]));
    let both = TerrainFiles { prj: Some(PRJ), ..other };
    assert_eq!(curve(&both), Err(vec![("problem-terrain-told-otherwise", 0)]));
    let without = outline.replace("\"crs\"", "\"was\"");
    assert_eq!(curve(&files(HEIGHTS_TIFF, without.as_bytes())), Err(vec![("problem-outline-not-degrees", 0)]));
    let beyond = outline.replace("6299000", "6300900");
    assert_eq!(curve(&files(HEIGHTS_TIFF, beyond.as_bytes())), Err(vec![("problem-terrain-beyond", 0)]));
    let feet = TerrainFiles { heights: Some(HeightUnit::Feet), ..files(HEIGHTS_TIFF, BASIN) };
    let (feet, metres) = (curve(&feet).unwrap(), curve(&files(HEIGHTS_TIFF, BASIN)).unwrap());
    approx::assert_relative_eq!(feet.mean_m, metres.mean_m * 0.3048, max_relative = 1e-12);
}

#[test]
fn broken_grids_are_told_at_their_line() {
    let text = String::from_utf8(HEIGHTS_ASCII.to_vec()).unwrap();
    let told_of = |text: &str| curve(&TerrainFiles { prj: Some(PRJ), ..files(text.as_bytes(), BASIN) }).unwrap_err();
    assert_eq!(told_of(&text.replacen("nrows", "rows", 1)), [("problem-grid-header", 2)]);
    assert_eq!(told_of(&text.replacen("nrows 80", "nrows 8O", 1)), [("problem-grid-number", 2)]);
    assert_eq!(told_of(&text.replacen("nrows 80", "nrows 79", 1)), [("problem-grid-many", 86)]);
    assert_eq!(told_of(&text.replacen("nrows 80", "nrows 99999", 1)), [("problem-grid-few", 0)]);
    assert_eq!(told_of(&text.replacen("cellsize 90.0", "cellsize -90", 1)), [("problem-terrain-place", 0)]);
    assert_eq!(told_of(&text.replacen("-9999.000 ", "1,5 ", 1)), [("problem-grid-number", 7)]);
    assert_eq!(told_of(&text[..text.len() / 2]), [("problem-grid-few", 46)]);
    assert_eq!(told_of("ncols 3"), [("problem-grid-lacks", 0)]);
    assert_eq!(told_of(""), [("problem-grid-lacks", 0)]);
    let cut = curve(&files(&HEIGHTS_TIFF[..HEIGHTS_TIFF.len() / 2], BASIN)).unwrap_err();
    assert!(cut[0].0.starts_with("problem-tiff"), "{cut:?}");
}
