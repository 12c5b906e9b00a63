//! Heights added up by the metre, and the curve of the area below each height.

use super::{HeightUnit, MOST_EMPTY_SHARE, TerrainFiles, whole};
use crate::place::problem::Problem;

/// Lowest and highest ground, m, as for the bands of a place.
const LOWEST_M: f64 = -500.0;
const HIGHEST_M: f64 = 9_000.0;
const BINS: usize = (HIGHEST_M - LOWEST_M) as usize;

/// Shares of the area at which the curve has a point: close together at the ends, where the ground is steepest.
const SHARES: [f64; 15] = [0.0, 0.025, 0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 0.95, 0.975, 1.0];

/// A point of the curve.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CurvePoint {
    /// Height, m, whole.
    pub elevation_m: f64,
    /// Area of the basin below it, km².
    pub area_below_km2: f64,
}

/// The area of a basin below each height.
#[derive(Clone, Debug, PartialEq)]
pub struct AreaCurve {
    /// Points from low to high; the first has no area below it, the last all.
    pub points: Vec<CurvePoint>,
    /// The whole basin, km².
    pub area_km2: f64,
    /// The mean height, m.
    pub mean_m: f64,
    /// Cells of the grid inside the basin that have a height.
    pub cells: usize,
    /// Part of the basin without a height, 0 to 1; the curve is stretched over it.
    pub empty_share: f64,
    /// The unit that the grid's heights are in, and whether the file or the caller says so.
    pub heights: HeightUnit,
    /// Whether anybody says that unit.
    pub heights_said: bool,
}

/// Area by whole metres of height.
pub(super) struct HeightBins {
    km2: Vec<f64>,
    moment: f64,
    cells: usize,
}

impl Default for HeightBins {
    fn default() -> Self {
        Self { km2: vec![0.0; BINS], moment: 0.0, cells: 0 }
    }
}

impl HeightBins {
    /// Adds a cell; `false` where its height cannot be one on land.
    pub fn add(&mut self, height_m: f64, km2: f64) -> bool {
        if !(height_m >= LOWEST_M && height_m < HIGHEST_M) {
            return false;
        }
        self.km2[(height_m - LOWEST_M) as usize] += km2;
        self.moment += height_m * km2;
        self.cells += 1;
        true
    }

    /// The curve of what was added, of a basin of `inside_km2` whose other cells had no height.
    pub fn finish(
        self,
        inside_km2: f64,
        unit: Option<HeightUnit>,
        files: &TerrainFiles<'_>,
        wild: usize,
    ) -> Result<AreaCurve, Box<Problem>> {
        let refuse = |message| Problem::error(whole(files.grid_file), message);
        let with_height: f64 = self.km2.iter().sum();
        if wild > 0 {
            return Err(Box::new(refuse("problem-terrain-wild").with("n", wild)));
        }
        if self.cells == 0 {
            return Err(Box::new(refuse("problem-terrain-nothing")));
        }
        let empty_share = (1.0 - with_height / inside_km2).max(0.0);
        if empty_share > MOST_EMPTY_SHARE {
            let percent = libm::ceil(empty_share * 100.0);
            return Err(Box::new(refuse("problem-terrain-empty").with("percent", percent as usize)));
        }
        let points = self.points(with_height, inside_km2);
        if points.len() < 2 {
            return Err(Box::new(refuse("problem-terrain-flat")));
        }
        Ok(AreaCurve {
            points,
            area_km2: inside_km2,
            mean_m: self.moment / with_height,
            cells: self.cells,
            empty_share,
            heights: unit.unwrap_or(HeightUnit::Metres),
            heights_said: unit.is_some(),
        })
    }

    /// Points at whole metres, the nearest to each of the shares.
    fn points(&self, with_height: f64, inside_km2: f64) -> Vec<CurvePoint> {
        let stretch = inside_km2 / with_height;
        let mut points: Vec<CurvePoint> = Vec::new();
        let mut below = 0.0;
        let mut wanted = SHARES.iter().map(|share| share * with_height).peekable();
        let last = self.km2.iter().rposition(|km2| *km2 > 0.0).map_or(0, |index| index + 1);
        for index in 0..=last {
            let elevation_m = LOWEST_M + index as f64;
            let here = self.km2.get(index).copied().unwrap_or(0.0);
            // The first point is the foot of the lowest metre that has land, the last the top of the highest.
            let is_end = index == last || (below == 0.0 && here > 0.0);
            let mut reached = is_end;
            while wanted.peek().is_some_and(|share| *share < below + here / 2.0) {
                wanted.next();
                reached = below > 0.0 || reached;
            }
            let area_below_km2 = below * stretch;
            let rises = points.last().is_none_or(|last| last.area_below_km2 < area_below_km2);
            if reached && rises {
                points.push(CurvePoint { elevation_m, area_below_km2 });
            }
            below += here;
        }
        points
    }
}
