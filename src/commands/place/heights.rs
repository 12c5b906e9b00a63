//! A grid of heights and the outline of a basin, as `peek` and `new` take them.

use std::path::{Path, PathBuf};

use clap::ArgMatches;

use super::files::{MOST_GRID_BYTES, MOST_RECORD_BYTES, read_bytes, refused};
use crate::commands::failure::Failure;
use crate::commands::usage::{mistake, unknown_choice};
use crate::place::terrain::{AreaCurve, Coordinates, HeightUnit, TerrainFiles, area_curve};
use crate::words::{Quantity, System, Words};

/// Bands where nobody says how many.
const USUAL_BANDS: usize = 8;
/// Most bands of a place.
const MOST_BANDS: usize = 32;

/// What is said about a grid on the command line.
pub(super) struct HeightOptions {
    outline: Option<PathBuf>,
    coordinates: Option<Coordinates>,
    unit: Option<HeightUnit>,
    /// Bands that the curve is to be cut into.
    pub bands: usize,
}

impl HeightOptions {
    /// Reads the options.
    pub fn read(matches: &ArgMatches, words: &Words) -> Result<Self, Failure> {
        let text = |name: &str| matches.get_one::<String>(name).map(String::as_str);
        let coordinates = match text("coordinates") {
            None => None,
            Some(key) => Some(Coordinates::from_key(key).ok_or_else(|| {
                mistake(&words.say("place-coordinates-unknown", &[("value", key.into())]), Some("place"), words)
            })?),
        };
        let unit = match text("height-unit") {
            None => None,
            Some("m") => Some(HeightUnit::Metres),
            Some("ft") => Some(HeightUnit::Feet),
            Some(other) => {
                let line = unknown_choice("--height-unit", other, &["m", "ft"], words);
                return Err(mistake(&line, Some("place"), words));
            }
        };
        let bands = match text("bands") {
            None => USUAL_BANDS,
            Some(number) => number.parse().ok().filter(|bands| (1..=MOST_BANDS).contains(bands)).ok_or_else(|| {
                let ends = [("low", "1".into()), ("high", MOST_BANDS.to_string().into())];
                let line = words.say("error-option-number", &[&[("option", "--bands".into())][..], &ends].concat());
                mistake(&line, Some("place"), words)
            })?,
        };
        Ok(Self { outline: matches.get_one::<PathBuf>("outline").cloned(), coordinates, unit, bands })
    }

    /// The curve of the basin in `grid`.
    pub fn curve(&self, grid: &Path, words: &Words) -> Result<AreaCurve, Failure> {
        let Some(outline) = &self.outline else {
            return Err(mistake(&words.say("place-outline-missing", &[]), Some("place"), words));
        };
        let grid_bytes = read_bytes(grid, MOST_GRID_BYTES, words)?;
        let outline_bytes = read_bytes(outline, MOST_RECORD_BYTES, words)?;
        let prj = ["prj", "PRJ"].iter().find_map(|ending| std::fs::read(grid.with_extension(ending)).ok());
        let files = TerrainFiles {
            grid_file: grid,
            grid: &grid_bytes,
            prj: prj.as_deref(),
            outline_file: outline,
            outline: &outline_bytes,
            grid_coordinates: self.coordinates,
            heights: self.unit,
        };
        let mut problems = Vec::new();
        area_curve(&files, &mut problems).ok_or_else(|| refused(&problems, words))
    }
}

/// Whether a file is a grid of heights and no record.
pub(super) fn is_grid(bytes: &[u8]) -> bool {
    let tiff = [&b"II*\0"[..], b"MM\0*", b"II+\0", b"MM\0+"].iter().any(|start| bytes.starts_with(start));
    let bytes = bytes.strip_prefix(b"\xEF\xBB\xBF").unwrap_or(bytes).trim_ascii_start();
    tiff || bytes.get(..5).is_some_and(|start| start.eq_ignore_ascii_case(b"ncols"))
}

/// The curve in words: how large, how high, how well known.
pub(super) fn say(curve: &AreaCurve, system: System, words: &Words) -> Vec<String> {
    let amount = |value: f64, quantity| words.quantity(value, quantity, system, 4);
    let ends =
        [curve.points.first(), curve.points.last()].map(|point| point.map_or(f64::NAN, |point| point.elevation_m));
    let mut lines = vec![words.say(
        "place-curve",
        &[
            ("area", amount(curve.area_km2, Quantity::Area).into()),
            ("low", amount(ends[0], Quantity::Elevation).into()),
            ("high", amount(ends[1], Quantity::Elevation).into()),
            ("mean", amount(curve.mean_m, Quantity::Elevation).into()),
            ("n", curve.cells.into()),
        ],
    )];
    if !curve.heights_said {
        lines.push(words.say("place-curve-unit", &[]));
    }
    if curve.empty_share > 0.0 {
        lines.push(words.say("place-curve-empty", &[("percent", words.number(curve.empty_share * 100.0, 2).into())]));
    }
    lines
}
