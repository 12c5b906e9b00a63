//! Which cells of a grid lie in the basin: those whose middle does.

use super::coordinates::Geometry;
use super::outline::Outline;

/// Most crossings of edges of the outline with rows of the grid.
const MOST_CROSSINGS: usize = 20_000_000;

/// For each row the runs of columns that are inside, as half-open ranges.
pub(super) struct Mask {
    rows: Vec<Vec<(usize, usize)>>,
    /// How far the outline reaches beyond the grid, in cells as text; `None` where it does not.
    pub beyond: Option<String>,
}

impl Mask {
    /// The mask of `outline` by the even-odd rule, which leaves holes out.
    ///
    /// `None` where the outline crosses the rows of the grid more often than any basin does.
    pub fn new(geometry: &Geometry, outline: &Outline) -> Option<Self> {
        let mut left = MOST_CROSSINGS;
        let east = geometry.west + geometry.step_x * geometry.columns as f64;
        let south = geometry.north - geometry.step_y * geometry.rows as f64;
        let (mut beyond_x, mut beyond_y): (f64, f64) = (0.0, 0.0);
        let mut crossings: Vec<Vec<f64>> = vec![Vec::new(); geometry.rows];
        for ring in &outline.rings {
            for pair in ring.windows(2) {
                let ((x0, y0), (x1, y1)) = (pair[0], pair[1]);
                beyond_x = beyond_x.max(geometry.west - x0).max(x0 - east);
                beyond_y = beyond_y.max(south - y0).max(y0 - geometry.north);
                let (high, low) = if y0 > y1 { (y0, y1) } else { (y1, y0) };
                // Rows whose middle lies between the ends of the edge.
                let first = row_below(geometry, high);
                let last = row_below(geometry, low);
                left = left.checked_sub(last.saturating_sub(first))?;
                for (row, found) in crossings.iter_mut().enumerate().take(last).skip(first) {
                    let y = geometry.north - geometry.step_y * (row as f64 + 0.5);
                    found.push(x0 + (y - y0) / (y1 - y0) * (x1 - x0));
                }
            }
        }
        let cells = (beyond_x / geometry.step_x).max(beyond_y / geometry.step_y);
        let beyond = (cells > 0.5).then(|| format!("{cells:.0}"));
        let rows = crossings.into_iter().map(|found| runs(found, geometry)).collect();
        Some(Self { rows, beyond })
    }

    /// Whether the middle of a cell is inside.
    pub fn holds(&self, row: usize, column: usize) -> bool {
        let runs = self.rows.get(row).map_or(&[][..], Vec::as_slice);
        let after = runs.partition_point(|(_, end)| *end <= column);
        runs.get(after).is_some_and(|(start, _)| *start <= column)
    }

    /// Area of the cells inside.
    pub fn area_km2(&self, geometry: &Geometry) -> f64 {
        let cells = |runs: &[(usize, usize)]| runs.iter().map(|(start, end)| end - start).sum::<usize>() as f64;
        self.rows.iter().enumerate().map(|(row, runs)| cells(runs) * geometry.cell_km2(row)).sum()
    }
}

/// The first row whose middle is below `y`, within the grid.
fn row_below(geometry: &Geometry, y: f64) -> usize {
    let row = libm::ceil((geometry.north - y) / geometry.step_y - 0.5);
    if row > 0.0 { (row as usize).min(geometry.rows) } else { 0 }
}

fn runs(mut crossings: Vec<f64>, geometry: &Geometry) -> Vec<(usize, usize)> {
    crossings.sort_by(f64::total_cmp);
    let column = |x: f64| {
        let column = libm::ceil((x - geometry.west) / geometry.step_x - 0.5);
        if column > 0.0 { (column as usize).min(geometry.columns) } else { 0 }
    };
    crossings
        .chunks_exact(2)
        .map(|pair| (column(pair[0]), column(pair[1])))
        .filter(|(start, end)| start < end)
        .collect()
}
