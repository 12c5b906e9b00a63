//! What two dials do together: a map coloured by one number, with the line past which it is no longer enough.
//!
//! The line stands at the place's enough share where the map shows the share of water that came, and at the value as it
//! was for everything else; the legend says which. While the map is being worked out, its sketch fills the gaps.

mod answer;
mod legend;
mod sides;

use embedded_graphics::primitives::Rectangle;

pub use answer::{GridAnswer, Needed, reading_name};

use super::layout::{Form, Layout, area, bottom, right};
use super::scene::{Scene, YearShown};
use super::wording::fit;
use super::{Answer, View, frame, layout_of};
use crate::picture::chart::{Field, contour, shade};
use crate::picture::lettering::{Across, paragraph_height};
use crate::picture::line::segment;
use crate::picture::shape::{diamond, disc, frame as box_frame, ring, rounded_box};
use crate::picture::{Canvas, Spot, Stroke, Theme};
use crate::signs::{Better, Reading};
use crate::water::dials::{Dial, Dials};
use crate::words::Words;
use legend::Legend;

/// One cell of the map.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Cell {
    /// Not worked out yet.
    Waiting,
    /// No year has such a number.
    Nothing,
    /// The number.
    Value(f64),
}

impl From<Option<f64>> for Cell {
    fn from(value: Option<f64>) -> Self {
        value.filter(|value| value.is_finite()).map_or(Cell::Nothing, Cell::Value)
    }
}

/// One side of the map.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SideShown<'a> {
    /// The dial.
    pub dial: Dial,
    /// Its values, rising and evenly apart.
    pub values: &'a [f64],
}

/// The map.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct GridShown<'a> {
    /// What is shown.
    pub reading: Reading,
    /// The name of the canal that it is about.
    pub gate_name: Option<&'a str>,
    /// How many years it is taken over.
    pub years: usize,
    /// Left to right.
    pub across: SideShown<'a>,
    /// Bottom to top.
    pub up: SideShown<'a>,
    /// Every cell, from left to right and row after row from the bottom.
    pub cells: &'a [Cell],
    /// The same number with every dial at rest.
    pub as_it_was: Option<f64>,
    /// The share from which on supply is enough at this place.
    pub enough_share: f64,
    /// Where the dials stand; those of the two sides are the present setting.
    pub dials: Dials,
}

/// The value along the line of the map.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Level {
    /// From here on it is enough.
    Enough(f64),
    /// It was so as it was.
    AsItWas(f64),
}

impl Level {
    /// The value.
    pub const fn value(self) -> f64 {
        match self {
            Level::Enough(value) | Level::AsItWas(value) => value,
        }
    }
}

impl GridShown<'_> {
    /// A cell by its column from the left and its row from the bottom.
    pub fn cell(&self, column: usize, row: usize) -> Cell {
        let at = row * self.across.values.len() + column;
        self.cells.get(at).copied().unwrap_or(Cell::Waiting)
    }

    /// The value along the line.
    pub fn level(&self) -> Option<Level> {
        if self.reading.is_supply_ratio() {
            return Some(Level::Enough(self.enough_share));
        }
        self.as_it_was.filter(|value| value.is_finite()).map(Level::AsItWas)
    }

    /// The least and the most of all cells that are there.
    pub fn range(&self) -> Option<(f64, f64)> {
        let values = self.cells.iter().filter_map(|cell| match cell {
            Cell::Value(value) => Some(*value),
            Cell::Waiting | Cell::Nothing => None,
        });
        values.fold(None, |range, value| match range {
            None => Some((value, value)),
            Some((least, most)) => Some((f64::min(least, value), f64::max(most, value))),
        })
    }

    /// Where on the map `dials` stand, counted in cells from the left and from the bottom; `None` beyond its edges.
    fn place_of(&self, dials: &Dials) -> Option<(f64, f64)> {
        let along = |side: &SideShown<'_>| {
            let (first, last) = (*side.values.first()?, *side.values.last()?);
            let value = dials.get(side.dial)?;
            let steps = (side.values.len() - 1) as f64;
            (first <= value && value <= last && last > first).then(|| (value - first) / (last - first) * steps)
        };
        Some((along(&self.across)?, along(&self.up)?))
    }

    /// Where the present setting stands, where it differs from what was.
    fn present(&self) -> Option<(f64, f64)> {
        (self.dials != Dials::REST).then(|| self.place_of(&self.dials))?
    }

    /// Where the valley as it was stands; only where no other dial is turned, since else it is not on this map.
    fn rest(&self) -> Option<(f64, f64)> {
        let others = self.dials.at_rest(self.across.dial).at_rest(self.up.dial);
        (others == Dials::REST).then(|| self.place_of(&Dials::REST))?
    }

    /// The values from the top row down, as a field is drawn; what is not there yet is filled from the sketch.
    fn top_row_first(&self) -> Vec<f64> {
        let columns = self.across.values.len();
        let value = |column: usize, row: usize| match self.cell(column, row) {
            Cell::Value(value) => Some(value),
            Cell::Nothing => Some(f64::NAN),
            Cell::Waiting => None,
        };
        let filled = |column: usize, row: usize| {
            let coarse = [(column, row), (column & !1, row & !1), (column & !3, row & !3)];
            coarse.into_iter().find_map(|(column, row)| value(column, row)).unwrap_or(f64::NAN)
        };
        let rows = (0..self.up.values.len()).rev();
        rows.flat_map(|row| (0..columns).map(move |column| (column, row))).map(|(c, r)| filled(c, r)).collect()
    }
}

/// Draws the page.
pub fn draw(canvas: &mut Canvas<'_>, scene: &Scene<'_>, grid: &GridShown<'_>, theme: &Theme, words: &Words) {
    let layout = layout_of(canvas, scene);
    // The map is of many years: no day and no year of the scene belongs to it.
    let no_day = Scene { year: YearShown { calendar: &[], ..scene.year }, playing: false, ..*scene };
    let answer = answer_within(&layout, grid, scene, words);
    frame::draw_frame(canvas, &layout, &no_day, View::Grid, &answer, theme, words);
    let over = words.say("grid-years", &[("n", grid.years.into())]);
    let half = area(
        right(layout.date) - layout.date.size.width as i32 * 2 / 5,
        layout.date.top_left.y,
        layout.date.size.width as i32 * 2 / 5,
        layout.date.size.height as i32,
    );
    fit(canvas, &over, half, layout.label, theme.quiet, Across::Right);

    let legend = Legend::of(grid, &layout, scene, words);
    let (room, face, gap) = (layout.content, layout.note, layout.gap);
    let (map, legend_room) = if layout.form == Form::Tall {
        let high = legend.height(room.size.width as i32);
        let map = area(room.top_left.x, room.top_left.y, room.size.width as i32, room.size.height as i32 - high);
        (map, area(map.top_left.x, bottom(map), room.size.width as i32, high))
    } else {
        let wide = legend.width();
        let map =
            area(room.top_left.x, room.top_left.y, room.size.width as i32 - wide - 2 * gap, room.size.height as i32);
        (map, area(right(map) + 2 * gap, room.top_left.y, wide, room.size.height as i32))
    };
    let line = face.line_px();
    let up_wide = sides::up_width(&grid.up, face, scene, words) + gap;
    let foot = 2 * face.cap_px() + 2 * face.descent_px() + 4;
    let inner = area(
        map.top_left.x + up_wide,
        map.top_left.y + line,
        map.size.width as i32 - up_wide,
        map.size.height as i32 - line - foot,
    );
    let values = grid.top_row_first();
    let field = Field { area: inner, columns: grid.across.values.len(), values: &values };
    if !values.is_empty() {
        draw_map(canvas, &field, grid, layout.line_px, theme);
        let radius = f64::from(layout.label.cap_px()) * 0.55 + 1.5;
        draw_marks(canvas, &field, grid, radius, theme);
        sides::draw_up(canvas, &field, &grid.up, face, gap, scene, theme, words);
        let top = bottom(inner) + 3;
        sides::draw_across(canvas, &field, &grid.across, face, top, map, scene, theme, words);
    }
    let title = sides::title(grid.up.dial, map.size.width, face, scene, words);
    fit(
        canvas,
        &title,
        area(map.top_left.x, map.top_left.y, map.size.width as i32, line - 1),
        face,
        theme.ink,
        Across::Left,
    );
    let title = sides::title(grid.across.dial, map.size.width, face, scene, words);
    let below =
        area(map.top_left.x, bottom(map) - face.cap_px() - face.descent_px(), map.size.width as i32, face.cap_px());
    fit(canvas, &title, below, face, theme.ink, Across::Right);
    if layout.form == Form::Tall {
        legend.draw_under(canvas, legend_room, theme);
    } else {
        legend.draw_beside(canvas, legend_room, theme);
    }
}

/// The answer, in brief where it would have to be said in small letters.
fn answer_within(layout: &Layout, grid: &GridShown<'_>, scene: &Scene<'_>, words: &Words) -> Answer {
    let found = GridAnswer::of(grid);
    let full = Answer::Grid(found.clone());
    let text = frame::sentences(scene, &full, words);
    let room = layout.headline.size;
    if paragraph_height(&text, layout.strong, room.width) <= room.height {
        full
    } else {
        Answer::Grid(found.in_brief())
    }
}

fn draw_map(canvas: &mut Canvas<'_>, field: &Field<'_>, grid: &GridShown<'_>, line_px: f64, theme: &Theme) {
    let Some((least, most)) = grid.range() else {
        rounded_box(canvas, field.area, 0.0, theme.range_hatch());
        return;
    };
    let worse_is_more = grid.reading.better() == Some(Better::Less);
    let share = |value: f64| {
        let share = if most > least { (value - least) / (most - least) } else { 0.5 };
        if worse_is_more { 1.0 - share } else { share }
    };
    if grid.cells.contains(&Cell::Nothing) {
        rounded_box(canvas, field.area, 0.0, theme.range_hatch());
    }
    shade(canvas, field, |value| theme.ramp(share(value)));
    box_frame(canvas, field.area, 1, theme.rule);
    let is_whole = !grid.cells.contains(&Cell::Waiting);
    if let Some(level) = grid.level().filter(|_| is_whole) {
        let (rim, line) = line_strokes(line_px);
        contour(canvas, field, level.value(), rim, theme.paper);
        contour(canvas, field, level.value(), line, theme.lack_ink);
    }
}

/// The line and the ground around it, which keeps it apart from any colour.
fn line_strokes(line_px: f64) -> (Stroke, Stroke) {
    (Stroke::solid(line_px + 3.0), Stroke::solid(line_px + 0.5))
}

fn draw_line_sample(canvas: &mut Canvas<'_>, place: Rectangle, line_px: f64, theme: &Theme) {
    let y = f64::from(place.top_left.y) + f64::from(place.size.height) / 2.0;
    let (from, to) = (f64::from(place.top_left.x), f64::from(right(place)));
    let (_, line) = line_strokes(line_px);
    segment(canvas, Spot::new(from, y), Spot::new(to, y), line, theme.lack_ink);
}

fn draw_marks(canvas: &mut Canvas<'_>, field: &Field<'_>, grid: &GridShown<'_>, radius: f64, theme: &Theme) {
    let spot = |(across, up): (f64, f64)| {
        let (first, last) =
            (field.middle(0, 0), field.middle(field.columns.saturating_sub(1), grid.up.values.len() - 1));
        let share = |at: f64, count: usize| if count > 1 { at / (count - 1) as f64 } else { 0.0 };
        let x = first.x + (last.x - first.x) * share(across, grid.across.values.len());
        let y = last.y + (first.y - last.y) * share(up, grid.up.values.len());
        Spot::new(x, y)
    };
    canvas.within(field.area, |canvas| {
        if let Some(place) = grid.rest() {
            mark_rest(canvas, spot(place), radius, theme);
        }
        if let Some(place) = grid.present() {
            mark_present(canvas, spot(place), radius, theme);
        }
    });
}

/// The present setting: a full disc in a ring.
fn mark_present(canvas: &mut Canvas<'_>, middle: Spot, radius: f64, theme: &Theme) {
    disc(canvas, middle, radius + 1.0, theme.paper);
    ring(canvas, middle, radius, radius * 0.3, theme.ink);
    disc(canvas, middle, radius * 0.4, theme.ink);
}

/// The valley as it was: an open diamond.
fn mark_rest(canvas: &mut Canvas<'_>, middle: Spot, radius: f64, theme: &Theme) {
    diamond(canvas, middle, radius * 1.2 + 1.5, theme.paper);
    diamond(canvas, middle, radius * 1.2, theme.ink);
    diamond(canvas, middle, radius * 0.6, theme.paper);
}
