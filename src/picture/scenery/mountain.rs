//! A mountain that is the place's own area–elevation curve: highest band on the left, each as wide as its area.

use embedded_graphics::primitives::Rectangle;

use super::super::area::{Between, between, polygon};
use super::super::canvas::Canvas;
use super::super::line::{Stroke, polyline, segment};
use super::super::theme::Theme;
use super::super::{Paint, Spot};
use crate::water::valley::{Band, MOST_BANDS};

/// Corners of the curve: two for each band and the two ends.
const MOST_CORNERS: usize = 2 * MOST_BANDS + 2;

/// The curve of a valley in a box of the frame.
#[derive(Debug, Clone)]
pub struct Mountain {
    /// Corners from the left, falling; the band that begins at each.
    corners: heapless::Vec<Spot, MOST_CORNERS>,
    /// Left and right edge of each band, from the highest to the lowest.
    spans: heapless::Vec<(f64, f64), MOST_BANDS>,
    elevation_m: (f64, f64),
    area: Rectangle,
}

/// Snow on the bands, from low to high like the bands, in pixels of thickness.
#[derive(Debug, Clone, Copy)]
pub struct MountainSnow<'s> {
    /// Snow water of each band, mm.
    pub band_mm: &'s [f64],
    /// Pixels for each mm.
    pub px_per_mm: f64,
}

impl Mountain {
    /// Lays the bands (from low to high) into `area`: the highest ground touches its top, the lowest its bottom.
    pub fn new(bands: &[Band], area: Rectangle) -> Self {
        let whole_km2: f64 = bands.iter().map(|band| band.area_km2).sum();
        let top_m = |index: usize| match (bands.get(index), bands.get(index + 1)) {
            (Some(band), Some(above)) => (band.elevation_m + above.elevation_m) / 2.0,
            // The ends lie as far beyond the middle of their band as the edge on its other side.
            (Some(band), None) if index > 0 => {
                band.elevation_m + (band.elevation_m - bands[index - 1].elevation_m) / 2.0
            }
            (Some(band), None) => band.elevation_m + 1.0,
            _ => 0.0,
        };
        let foot_m = match bands {
            [low, next, ..] => low.elevation_m - (next.elevation_m - low.elevation_m) / 2.0,
            [only] => only.elevation_m - 1.0,
            [] => 0.0,
        };
        let peak_m = top_m(bands.len().saturating_sub(1));
        let mut mountain =
            Self { corners: heapless::Vec::new(), spans: heapless::Vec::new(), elevation_m: (foot_m, peak_m), area };
        let mut x = f64::from(area.top_left.x);
        let wide = f64::from(area.size.width);
        let peak = Spot::new(x, mountain.y(peak_m));
        let _ = mountain.corners.push(peak);
        for (index, band) in bands.iter().enumerate().rev().take(MOST_BANDS) {
            let width = if whole_km2 > 0.0 { wide * band.area_km2 / whole_km2 } else { 0.0 };
            let low_m = if index > 0 { top_m(index - 1) } else { foot_m };
            // The list holds two corners for each band that it can have.
            let middle = Spot::new(x + width / 2.0, mountain.y(band.elevation_m));
            let edge = Spot::new(x + width, mountain.y(low_m));
            let _ = mountain.corners.push(middle);
            let _ = mountain.corners.push(edge);
            let _ = mountain.spans.push((x, x + width));
            x += width;
        }
        mountain
    }

    /// The y of a height in metres.
    fn y(&self, elevation_m: f64) -> f64 {
        let (foot, peak) = self.elevation_m;
        let share = if peak > foot { (elevation_m - foot) / (peak - foot) } else { 0.0 };
        f64::from(self.area.top_left.y) + f64::from(self.area.size.height) * (1.0 - share)
    }

    /// The y of the ground at an x; beyond the ends that of the end.
    pub fn ground_y(&self, x: f64) -> f64 {
        let mut before: Option<Spot> = None;
        for &corner in &self.corners {
            if let Some(from) = before
                && x <= corner.x
            {
                let run = corner.x - from.x;
                let share = if run > 0.0 { ((x - from.x) / run).clamp(0.0, 1.0) } else { 1.0 };
                return from.y + (corner.y - from.y) * share;
            }
            before = Some(corner);
        }
        before.map_or(f64::from(self.area.top_left.y), |end| end.y)
    }

    /// Where the curve passes a height in metres; `None` above and below it.
    pub fn spot_at(&self, elevation_m: f64) -> Option<Spot> {
        let (foot, peak) = self.elevation_m;
        if !(foot..=peak).contains(&elevation_m) {
            return None;
        }
        let y = self.y(elevation_m);
        let mut pairs = self.corners.windows(2);
        let pair = pairs.find(|pair| pair[0].y <= y && y <= pair[1].y)?;
        let drop = pair[1].y - pair[0].y;
        let share = if drop > 0.0 { (y - pair[0].y) / drop } else { 0.0 };
        Some(Spot::new(pair[0].x + (pair[1].x - pair[0].x) * share, y))
    }

    /// Draws the rock down to `foot_y`, with a fine level line at every height where one band ends and the next begins.
    pub fn draw_rock(&self, canvas: &mut Canvas<'_>, foot_y: f64, theme: &Theme) {
        let Some((&(left, _), &(_, right))) = self.spans.first().zip(self.spans.last()) else { return };
        let foot = [Spot::new(right, foot_y), Spot::new(left, foot_y)];
        polygon(canvas, self.corners.iter().copied().chain(foot), theme.rock);
        for &(_, border) in self.spans.iter().rev().skip(1) {
            let y = libm::floor(self.ground_y(border)) + 0.5;
            segment(canvas, Spot::new(left, y), Spot::new(border, y), Stroke::solid(1.0), theme.rock_far);
        }
    }

    /// Lays the snow on the rock, with a fine edge where it meets the sky.
    pub fn draw_snow(&self, canvas: &mut Canvas<'_>, snow: MountainSnow<'_>, theme: &Theme) {
        let top = self.snow_top(snow);
        let ground = top.clone().map(|(spot, _)| Spot::new(spot.x, self.ground_y(spot.x)));
        // A thin cover is still seen: snow begins a little under the ground.
        let cover = top.clone().map(|(spot, _)| spot);
        between(canvas, cover, ground.map(|spot| Spot::new(spot.x, spot.y + 0.75)), Between::FirstHigher, theme.snow);
        let edge = top.map(|(spot, thick)| if thick > 0.2 { spot } else { Spot::new(spot.x, f64::NAN) });
        polyline(canvas, edge, Stroke::solid(1.0), theme.snow_edge);
    }

    /// Dashes where the snow lay.
    pub fn draw_snow_outline(&self, canvas: &mut Canvas<'_>, snow: MountainSnow<'_>, stroke: Stroke, theme: &Theme) {
        let line =
            self.snow_top(snow).map(|(spot, thick)| if thick > 0.2 { spot } else { Spot::new(spot.x, f64::NAN) });
        polyline(canvas, line, stroke, theme.ink);
    }

    /// Marks a height on the rock with a short level line at the curve.
    pub fn draw_height(&self, canvas: &mut Canvas<'_>, elevation_m: f64, length_px: f64, paint: impl Into<Paint>) {
        if let Some(spot) = self.spot_at(elevation_m) {
            let from = Spot::new((spot.x - length_px).max(f64::from(self.area.top_left.x)), spot.y);
            segment(canvas, from, spot, Stroke::solid(1.0), paint);
        }
    }

    /// The top of the snow column by column, with its thickness. Between two bands the thickness changes over a few
    /// pixels, as drifts do.
    fn snow_top<'a>(&'a self, snow: MountainSnow<'a>) -> impl Iterator<Item = (Spot, f64)> + Clone + 'a {
        let from = self.area.top_left.x;
        let wide = self.area.size.width as i32;
        let thickness = move |x: f64| {
            let count = self.spans.len();
            let at = self.spans.iter().position(|&(_, right)| x < right).unwrap_or(count.saturating_sub(1));
            let of = |span: usize| {
                let band = count.checked_sub(span + 1)?;
                snow.band_mm.get(band).map(|mm| mm.max(0.0) * snow.px_per_mm)
            };
            let here = of(at).unwrap_or(0.0);
            let Some(&(left, right)) = self.spans.get(at) else { return 0.0 };
            let drift = ((right - left) / 2.0).min(4.0);
            if drift <= 0.0 {
                return here;
            }
            // Half of the way to the neighbour lies on either side of the border.
            let (to_left, to_right) = (x - left, right - x);
            let (next, distance) = if to_left < to_right && at > 0 {
                (of(at - 1).unwrap_or(here), to_left)
            } else if to_right <= to_left && at + 1 < count {
                (of(at + 1).unwrap_or(here), to_right)
            } else {
                return here;
            };
            let share = if distance < drift { 0.5 * (1.0 - distance / drift) } else { 0.0 };
            here + (next - here) * share
        };
        // Half pixels: the first and the last column are covered in full.
        (0..=wide).map(move |column| {
            let x = f64::from(from + column);
            let thick = thickness(x);
            (Spot::new(x, self.ground_y(x) - thick), thick)
        })
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use embedded_graphics::geometry::{Point, Size};

    fn band(elevation_m: f64, area_km2: f64) -> Band {
        Band { area_km2, elevation_m, melt_exposure: 1.0, evaporation_factor: 1.0 }
    }

    const BOX: Rectangle = Rectangle { top_left: Point::new(10, 20), size: Size::new(100, 60) };

    #[test]
    fn the_curve_falls_through_the_middle_of_every_band() {
        let mountain = Mountain::new(&[band(1000.0, 30.0), band(1200.0, 50.0), band(1600.0, 20.0)], BOX);
        // From 900 m at the bottom to 1800 m at the top; the highest band is the leftmost fifth.
        assert_eq!(mountain.ground_y(20.0), 20.0 + 60.0 * (1.0 - 700.0 / 900.0));
        assert_eq!(mountain.ground_y(10.0), 20.0);
        assert_eq!(mountain.ground_y(110.0), 80.0);
        assert_eq!(mountain.spot_at(1200.0).unwrap().x, 55.0);
        assert!(mountain.spot_at(1801.0).is_none() && mountain.spot_at(899.0).is_none());
        assert!((10..110).all(|x| mountain.ground_y(f64::from(x)) <= mountain.ground_y(f64::from(x + 1))));
    }

    #[test]
    fn snow_lies_as_thick_as_it_is_said_in_the_middle_of_a_band() {
        let mountain = Mountain::new(&[band(1000.0, 50.0), band(1500.0, 50.0)], BOX);
        let snow = MountainSnow { band_mm: &[0.0, 100.0], px_per_mm: 0.1 };
        let thick = |x: f64| mountain.snow_top(snow).find(|(spot, _)| spot.x == x).unwrap().1;
        assert_eq!((thick(35.0), thick(85.0)), (10.0, 0.0));
        // On the border the two meet half-way.
        assert_eq!(thick(60.0), 5.0);
    }

    #[test]
    fn no_bands_and_one_band_do_no_harm() {
        assert_eq!(Mountain::new(&[], BOX).ground_y(50.0), 80.0);
        let one = Mountain::new(&[band(2000.0, 5.0)], BOX);
        assert_eq!(one.ground_y(60.0), 50.0);
    }
}
