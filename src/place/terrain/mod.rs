//! From a grid of heights and the outline of a basin to the area that lies below each height.
//!
//! Two kinds of grid are read, the Esri ASCII grid and GeoTIFF, and one kind of outline, GeoJSON (RFC 7946). The grid is
//! gone through cell by cell and never held whole. No projection is guessed: both files say in which coordinates they
//! are, and where they do not, or not in the same, they are refused with the reason.

mod coordinates;
mod curve;
mod esri_ascii;
mod geotiff;
mod mask;
mod outline;
mod prj;

use std::path::Path;

use super::problem::{Location, Problem};

pub use coordinates::Coordinates;
pub use curve::{AreaCurve, CurvePoint};

use coordinates::Geometry;
use curve::HeightBins;
use mask::Mask;

/// Most cells of a grid that are gone through.
const MOST_CELLS: u64 = 400_000_000;
/// Share of the basin that may have no height.
const MOST_EMPTY_SHARE: f64 = 0.01;

/// A unit of heights.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum HeightUnit {
    /// Metres.
    Metres,
    /// Feet.
    Feet,
}

/// The files, and what is said about them from outside.
#[derive(Clone, Copy, Debug)]
pub struct TerrainFiles<'f> {
    /// The grid of heights, as people name it.
    pub grid_file: &'f Path,
    /// Its bytes.
    pub grid: &'f [u8],
    /// The text beside the grid that says its coordinates (`.prj`), where there is one.
    pub prj: Option<&'f [u8]>,
    /// The outline of the basin, as people name it.
    pub outline_file: &'f Path,
    /// Its bytes.
    pub outline: &'f [u8],
    /// The coordinates of the grid, where its own files do not say them.
    pub grid_coordinates: Option<Coordinates>,
    /// The unit of its heights; what the file says otherwise, and metres where it does not.
    pub heights: Option<HeightUnit>,
}

/// Something that is gone through for its cells.
trait CellSource {
    /// Calls `visit(row, column, height)` for every cell that has a height; the unit is the file's.
    fn each_cell(&mut self, visit: &mut dyn FnMut(usize, usize, f64)) -> Result<(), Problem>;
}

/// Reads the files and adds the basin up; `None` after at least one error in `problems`.
pub fn area_curve(files: &TerrainFiles<'_>, problems: &mut Vec<Problem>) -> Option<AreaCurve> {
    match add_up(files) {
        Ok(curve) => Some(curve),
        Err(problem) => {
            problems.push(*problem);
            None
        }
    }
}

fn add_up(files: &TerrainFiles<'_>) -> Result<AreaCurve, Box<Problem>> {
    let outline = outline::read(files.outline_file, files.outline)?;
    let (geometry, unit, mut cells): (Geometry, Option<HeightUnit>, Box<dyn CellSource + '_>) =
        if geotiff::is_tiff(files.grid) {
            let (geometry, unit, cells) = geotiff::open(files)?;
            (geometry, unit, Box::new(cells))
        } else {
            let (geometry, cells) = esri_ascii::open(files)?;
            (geometry, None, Box::new(cells))
        };
    if geometry.cells() > MOST_CELLS {
        let problem = Problem::error(whole(files.grid_file), "problem-terrain-large");
        return Err(Box::new(problem.with("most", (MOST_CELLS / 1_000_000) as usize)));
    }
    coordinates::check_same(&geometry, &outline, files)?;
    let Some(mask) = Mask::new(&geometry, &outline) else {
        return Err(Box::new(Problem::error(whole(files.outline_file), "problem-outline-tangled")));
    };
    if let Some(beyond) = mask.beyond {
        let problem = Problem::error(whole(files.outline_file), "problem-terrain-beyond");
        return Err(Box::new(problem.with("text", beyond)));
    }
    let unit = files.heights.or(unit);
    let metres = if unit == Some(HeightUnit::Feet) { crate::water::units::M_PER_FOOT } else { 1.0 };
    let mut bins = HeightBins::default();
    let mut wild = 0usize;
    cells.each_cell(&mut |row, column, height| {
        if mask.holds(row, column) && !bins.add(height * metres, geometry.cell_km2(row)) {
            wild += 1;
        }
    })?;
    let inside_km2 = mask.area_km2(&geometry);
    bins.finish(inside_km2, unit, files, wild)
}

/// A whole file.
fn whole(file: &Path) -> Location {
    Location::whole_file(file.to_path_buf())
}

/// A line of a file.
fn at_line(file: &Path, line: usize, column: usize, length: usize) -> Location {
    Location { file: file.to_path_buf(), line, column, length }
}
