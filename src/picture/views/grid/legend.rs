//! Beside or under the map: what its colours, its line and its marks stand for.

use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use super::answer::{reading_value, sign_name};
use super::{Cell, GridShown, Level, draw_line_sample, mark_present, mark_rest, right};
use crate::picture::lettering::{Across, Face, draw, measure};
use crate::picture::shape::rounded_box;
use crate::picture::views::layout::{Layout, area};
use crate::picture::views::scene::Scene;
use crate::picture::views::wording::{fit, name_within};
use crate::picture::{Align, Canvas, Spot, Theme};
use crate::words::Words;

/// What an entry shows beside its words.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
enum Sample {
    Line,
    Present,
    Rest,
    Nothing,
}

/// The legend of a map, in words.
#[derive(Clone, Debug)]
pub(super) struct Legend {
    sign: String,
    canal: Option<String>,
    least: String,
    most: String,
    entries: Vec<(Sample, String)>,
    face: Face,
    gap: i32,
}

impl Legend {
    /// The legend of `grid`.
    pub fn of(grid: &GridShown<'_>, layout: &Layout, scene: &Scene<'_>, words: &Words) -> Self {
        let value = |value: f64| reading_value(grid.reading, value, scene, words);
        let (least, most) = grid.range().map_or((String::new(), String::new()), |(a, b)| (value(a), value(b)));
        let mut entries = Vec::new();
        // While the map fills in there is no line yet.
        match grid.level().filter(|_| !grid.cells.contains(&Cell::Waiting)) {
            Some(Level::Enough(share)) => {
                entries.push((Sample::Line, words.say("grid-enough", &[("value", value(share).into())])));
            }
            Some(Level::AsItWas(at)) => {
                entries.push((Sample::Line, words.say("grid-as-it-was", &[("value", value(at).into())])));
            }
            None => {}
        }
        if grid.present().is_some() {
            entries.push((Sample::Present, words.say("picture-with-changes", &[])));
        }
        if grid.rest().is_some() {
            entries.push((Sample::Rest, words.say("picture-as-it-was", &[])));
        }
        if grid.cells.contains(&Cell::Nothing) {
            entries.push((Sample::Nothing, words.say("grid-no-value", &[])));
        }
        Self {
            sign: sign_name(grid.reading, words),
            canal: grid.gate_name.map(str::to_owned),
            least,
            most,
            entries,
            face: layout.note,
            gap: layout.gap,
        }
    }

    fn sample_px(&self) -> i32 {
        i32::from(self.face.px()) * 3 / 2
    }

    /// The width that it takes beside the map.
    pub fn width(&self) -> i32 {
        let wide = |text: &str| measure(text, self.face).width as i32 + 1;
        let bar = self.sample_px() + self.gap + wide(&self.least).max(wide(&self.most));
        let entries = self.entries.iter().map(|(_, text)| self.sample_px() + self.gap + wide(text));
        entries.chain([bar, wide(&self.sign)]).max().unwrap_or(0)
    }

    /// The height that it takes under the map in a box `wide` pixels wide.
    pub fn height(&self, wide: i32) -> i32 {
        (1 + self.rows(wide).len() as i32) * self.line_high()
    }

    fn line_high(&self) -> i32 {
        self.face.cap_px() + self.face.descent_px() + self.gap
    }

    /// Entries side by side, as many as a row takes.
    fn rows(&self, wide: i32) -> Vec<Vec<usize>> {
        let mut rows: Vec<Vec<usize>> = Vec::new();
        let mut x = wide + 1;
        for (index, (_, text)) in self.entries.iter().enumerate() {
            let needed = self.sample_px() + self.gap + measure(text, self.face).width as i32;
            if x + needed > wide {
                rows.push(Vec::new());
                x = 0;
            }
            if let Some(row) = rows.last_mut() {
                row.push(index);
            }
            x += needed + 3 * self.gap;
        }
        rows
    }

    /// Draws it beside the map.
    pub fn draw_beside(&self, canvas: &mut Canvas<'_>, room: Rectangle, theme: &Theme) {
        let line = self.face.line_px();
        let (x, wide) = (room.top_left.x, room.size.width as i32);
        let mut y = room.top_left.y;
        fit(canvas, &self.sign, area(x, y, wide, line), self.face, theme.ink, Across::Left);
        y += line;
        if let Some(canal) = &self.canal {
            let name = name_within(canal, self.face, wide as u32);
            fit(canvas, &name, area(x, y, wide, line), self.face, theme.ink, Across::Left);
            y += line;
        }
        let below = self.entries.len() as i32 * self.line_high();
        let high = super::bottom(room) - below - self.gap - y;
        let words_high = self.face.cap_px() + 1;
        if high > 2 * words_high + 2 && !self.least.is_empty() {
            let bar = area(x, y + 1, self.sample_px(), high.min(wide * 2) - 2);
            draw_bar(canvas, bar, true, theme);
            let left = x + self.sample_px() + self.gap;
            let ends = [(&self.most, bar.top_left.y), (&self.least, super::bottom(bar) - words_high)];
            for (text, top) in ends {
                let place = area(left, top, right(room) - left, words_high);
                fit(canvas, text, place, self.face, theme.quiet, Across::Left);
            }
        }
        y = super::bottom(room) - below;
        for (sample, text) in &self.entries {
            self.entry(canvas, Point::new(x, y + self.line_high() / 2), *sample, text, theme);
            y += self.line_high();
        }
    }

    /// Draws it under the map.
    pub fn draw_under(&self, canvas: &mut Canvas<'_>, room: Rectangle, theme: &Theme) {
        let line = self.line_high();
        let (left, wide) = (room.top_left.x, room.size.width as i32);
        let middle = room.top_left.y + line / 2;
        let put = |canvas: &mut Canvas<'_>, x: i32, text: &str, colour| {
            draw(canvas, text, Point::new(x, middle), self.face, colour, Align::LEFT.cap_middle());
            x + measure(text, self.face).width as i32 + self.gap
        };
        let mut x = put(canvas, left, &self.sign, theme.ink) + self.gap;
        if let Some(canal) = &self.canal {
            let ends = measure(&self.least, self.face).width + measure(&self.most, self.face).width;
            let free = left + wide - x - ends as i32 - self.gap * 4 - self.sample_px() * 2;
            let name = name_within(canal, self.face, free.max(0) as u32);
            if !name.is_empty() {
                x = put(canvas, x, &name, theme.ink) + self.gap;
            }
        }
        if !self.least.is_empty() {
            x = put(canvas, x, &self.least, theme.quiet);
            let most = measure(&self.most, self.face).width as i32;
            let bar = (left + wide - x - self.gap - most - 1).clamp(0, wide / 3);
            draw_bar(canvas, area(x, middle - self.face.cap_px() / 2, bar, self.face.cap_px()), false, theme);
            put(canvas, x + bar + self.gap, &self.most, theme.quiet);
        }
        let mut y = room.top_left.y + line;
        for row in self.rows(wide) {
            let mut x = left;
            for index in row {
                let (sample, text) = &self.entries[index];
                self.entry(canvas, Point::new(x, y + line / 2), *sample, text, theme);
                x += self.sample_px() + measure(text, self.face).width as i32 + 4 * self.gap;
            }
            y += line;
        }
    }

    fn entry(&self, canvas: &mut Canvas<'_>, at: Point, sample: Sample, text: &str, theme: &Theme) {
        let wide = self.sample_px();
        let radius = f64::from(self.face.cap_px()) * 0.55 + 1.0;
        let middle = Spot::new(f64::from(at.x) + f64::from(wide) / 2.0, f64::from(at.y));
        let place = area(at.x, at.y - self.face.cap_px() / 2, wide, self.face.cap_px());
        match sample {
            Sample::Line => draw_line_sample(canvas, place, f64::from(self.face.px()) / 5.0, theme),
            Sample::Present => mark_present(canvas, middle, radius, theme),
            Sample::Rest => mark_rest(canvas, middle, radius, theme),
            Sample::Nothing => rounded_box(canvas, place, 0.0, theme.range_hatch()),
        }
        let x = at.x + wide + self.gap;
        draw(canvas, text, Point::new(x, at.y), self.face, theme.quiet, Align::LEFT.cap_middle());
    }
}

/// All colours of the map in order, the most on top or to the right.
fn draw_bar(canvas: &mut Canvas<'_>, place: Rectangle, upright: bool, theme: &Theme) {
    let long = if upright { place.size.height } else { place.size.width } as i32;
    for step in 0..long {
        let share = (f64::from(step) + 0.5) / f64::from(long);
        let Rectangle { top_left: Point { x, y }, size } = place;
        let piece = if upright {
            area(x, y + long - 1 - step, size.width as i32, 1)
        } else {
            area(x + step, y, 1, size.height as i32)
        };
        canvas.fill(piece, theme.ramp(share));
    }
}
