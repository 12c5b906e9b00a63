//! Where the cells of a grid lie, and in which coordinates; whether the outline is in the same.

use libm::{log, sin, sqrt};

use super::outline::Outline;
use super::{TerrainFiles, whole};
use crate::place::problem::Problem;

/// Half the long axis of the WGS 84 ellipsoid, km, and its flattening (NIMA TR8350.2, 2000, table 3.1; from memory).
const SEMI_MAJOR_KM: f64 = 6_378.137;
const FLATTENING: f64 = 1.0 / 298.257_223_563;
const RADIANS_PER_DEGREE: f64 = core::f64::consts::PI / 180.0;
const M2_PER_KM2: f64 = 1.0e6;

/// Geographic systems that differ from WGS 84 by a few metres at most: WGS 84, NAD83, ETRS89, SIRGAS 2000, RGF93.
const LIKE_WGS84: [u32; 6] = [4326, 4269, 4258, 4674, 4979, 4171];

/// Coordinates of a file.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Coordinates {
    /// Degrees of longitude and latitude on WGS 84 or a system within metres of it.
    Degrees,
    /// A projection in metres by its EPSG code.
    Metres(u32),
    /// A projection in metres that has no code in its file; only its name.
    Unnamed,
}

impl Coordinates {
    /// The coordinates that an EPSG code means; `None` where it is not known to be in degrees or in metres.
    pub fn from_epsg(code: u32) -> Option<Self> {
        if LIKE_WGS84.contains(&code) {
            return Some(Coordinates::Degrees);
        }
        // UTM zones of WGS 84 north and south, NAD83, NAD83(2011), ETRS89 and SIRGAS 2000: all in metres.
        let in_metres = (32_601..=32_660).contains(&code)
            || (32_701..=32_760).contains(&code)
            || (26_901..=26_923).contains(&code)
            || (6_328..=6_348).contains(&code)
            || (25_828..=25_838).contains(&code)
            || (31_965..=31_985).contains(&code);
        in_metres.then_some(Coordinates::Metres(code))
    }

    /// The coordinates that people name: `EPSG:32613`, `32613` or `degrees`.
    pub fn from_key(key: &str) -> Option<Self> {
        let key = key.trim();
        if key.eq_ignore_ascii_case("degrees") {
            return Some(Coordinates::Degrees);
        }
        let number = key.rsplit(':').next().unwrap_or(key);
        Self::from_epsg(number.trim().parse().ok()?)
    }

    /// How people name it.
    pub fn name(self) -> String {
        match self {
            Coordinates::Degrees => "EPSG:4326".to_owned(),
            Coordinates::Metres(code) => format!("EPSG:{code}"),
            Coordinates::Unnamed => "?".to_owned(),
        }
    }
}

/// Where the cells of a grid lie.
#[derive(Clone, Debug)]
pub(super) struct Geometry {
    pub columns: usize,
    pub rows: usize,
    /// Western edge of the first column.
    pub west: f64,
    /// Northern edge of the first row.
    pub north: f64,
    /// Width and height of a cell, both above zero.
    pub step_x: f64,
    pub step_y: f64,
    pub coordinates: Coordinates,
}

impl Geometry {
    pub fn cells(&self) -> u64 {
        self.columns as u64 * self.rows as u64
    }

    /// Area of a cell of this row.
    pub fn cell_km2(&self, row: usize) -> f64 {
        if self.coordinates != Coordinates::Degrees {
            return self.step_x * self.step_y / M2_PER_KM2;
        }
        let north = self.north - self.step_y * row as f64;
        let south = north - self.step_y;
        let width = self.step_x * RADIANS_PER_DEGREE;
        (below_km2(north) - below_km2(south)) * width
    }

    /// Whether every edge is a number that the coordinates can have.
    pub fn is_sound(&self) -> bool {
        let (east, south) =
            (self.west + self.step_x * self.columns as f64, self.north - self.step_y * self.rows as f64);
        let ends = [self.west, self.north, east, south, self.step_x, self.step_y];
        let finite = ends.iter().all(|end| end.is_finite() && end.abs() < 1.0e9);
        let on_globe = self.coordinates != Coordinates::Degrees
            || (self.west >= -360.5 && east <= 360.5 && self.north <= 90.5 && south >= -90.5);
        finite && self.step_x > 0.0 && self.step_y > 0.0 && self.columns > 0 && self.rows > 0 && on_globe
    }
}

/// Area between the equator and a latitude, for one radian of longitude, on the ellipsoid (the authalic integral: Snyder
/// 1987, *Map Projections: A Working Manual*, Professional Paper 1395, equation 3-12; from memory).
fn below_km2(latitude_deg: f64) -> f64 {
    let eccentricity_2 = FLATTENING * (2.0 - FLATTENING);
    let eccentricity = sqrt(eccentricity_2);
    let sine = sin(latitude_deg * RADIANS_PER_DEGREE);
    let part = sine / (1.0 - eccentricity_2 * sine * sine)
        + log((1.0 + eccentricity * sine) / (1.0 - eccentricity * sine)) / (2.0 * eccentricity);
    SEMI_MAJOR_KM * SEMI_MAJOR_KM * (1.0 - eccentricity_2) / 2.0 * part
}

/// Refuses an outline that is not in the coordinates of the grid.
pub(super) fn check_same(geometry: &Geometry, outline: &Outline, files: &TerrainFiles<'_>) -> Result<(), Box<Problem>> {
    let refuse = |message| Problem::error(whole(files.outline_file), message);
    let grid = geometry.coordinates;
    if outline.coordinates == grid && grid != Coordinates::Unnamed {
        return Ok(());
    }
    let told = refuse("problem-terrain-coordinates")
        .with("grid", grid.name())
        .with("outline", outline.coordinates.name())
        .with("file", files.grid_file.display().to_string());
    Err(Box::new(told))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_globe_has_its_known_area() {
        // The ellipsoid of WGS 84 has 510 065 621.7 km² (any handbook of geodesy; from memory).
        let globe = 2.0 * core::f64::consts::PI * (below_km2(90.0) - below_km2(-90.0));
        approx::assert_relative_eq!(globe, 510_065_621.7, max_relative = 1e-9);
        // A degree at the equator is 111.3195 km wide (a·π/180) and 110.574 km high.
        let cell = Geometry {
            columns: 1,
            rows: 1,
            west: 0.0,
            north: 0.5,
            step_x: 1.0,
            step_y: 1.0,
            coordinates: Coordinates::Degrees,
        };
        approx::assert_relative_eq!(cell.cell_km2(0), 111.3195 * 110.574, max_relative = 1e-4);
    }

    #[test]
    fn codes_are_known_or_refused() {
        assert_eq!(Coordinates::from_key("EPSG:4326"), Some(Coordinates::Degrees));
        assert_eq!(Coordinates::from_key("32613"), Some(Coordinates::Metres(32_613)));
        assert_eq!(Coordinates::from_key("degrees"), Some(Coordinates::Degrees));
        // State plane in US feet, web Mercator: areas would be wrong.
        assert_eq!(Coordinates::from_key("EPSG:2227"), None);
        assert_eq!(Coordinates::from_key("EPSG:3857"), None);
        assert_eq!(Coordinates::from_key("x"), None);
    }
}
