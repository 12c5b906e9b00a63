//! The axis of a guess: ticks, names, the hand of the group that guesses, all guesses and the result.

use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use super::marks::{Look, draw_group, draw_usual, tie};
use super::{Axis, RevealShown};
use crate::picture::lettering::{Across, draw as draw_text, lines, measure};
use crate::picture::line::segment;
use crate::picture::shape::{rounded_box, triangle};
use crate::picture::views::layout::{Layout, area, right};
use crate::picture::views::wording::fit;
use crate::picture::{Align, Canvas, Face, Spot, Stroke, Theme};

/// How far beyond the axis a result is still drawn, as a share of it.
const BEYOND: f64 = 0.03;

/// The line of an axis within its box.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Line {
    left: f64,
    wide: f64,
    /// The row of the line.
    pub y: i32,
}

impl Line {
    /// The line at the row `y` across a box, with room for half a mark at both ends.
    pub fn across(room: Rectangle, radius: f64, y: i32) -> Self {
        let inset = radius * 1.3;
        Self { left: f64::from(room.top_left.x) + inset, wide: f64::from(room.size.width) - 2.0 * inset, y }
    }

    /// The share of the way at a column, 0 to 1.
    pub fn share_at(&self, x: i32) -> f64 {
        if self.wide > 0.0 { ((f64::from(x) + 0.5 - self.left) / self.wide).clamp(0.0, 1.0) } else { 0.5 }
    }

    /// The column of a share of the way.
    pub fn x(&self, share: f64) -> f64 {
        self.left + self.wide * share.clamp(-BEYOND, 1.0 + BEYOND)
    }
}

/// Whether there is room to say under the axis where it was, which the ticks show in bold.
fn says_rest(layout: &Layout, axis: &Axis) -> bool {
    layout.roomy && axis.rest.is_some()
}

/// The face of the title and its lines: one where it fits, else as many as it needs in the smallest face.
fn title_face(layout: &Layout, title: &str, wide: u32) -> (Face, i32) {
    match Face::bold(layout.label.px()).fitting(title, wide, 9) {
        Some(face) => (face, 1),
        None => (Face::bold(9), lines(title, Face::bold(9), wide).count() as i32),
    }
}

/// How high the ticks, their names and the title under an axis are.
pub(super) fn under_px(layout: &Layout, axis: &Axis, wide: u32) -> i32 {
    let rest = if says_rest(layout, axis) { layout.label.line_px() } else { 0 };
    let (face, lines) = title_face(layout, &axis.title, wide);
    layout.gap * 2 + layout.label.line_px() + rest + face.line_px() * lines
}

/// Draws the line, its ticks with as many names as there is room for, and the title under them.
pub(super) fn draw_axis(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    line: Line,
    axis: &Axis,
    theme: &Theme,
) {
    let face = layout.label;
    let thick = layout.line_px.max(1.5);
    let y = f64::from(line.y);
    segment(canvas, Spot::new(line.x(0.0), y), Spot::new(line.x(1.0), y), Stroke::solid(thick), theme.ink);
    let tall = f64::from(layout.gap) + thick / 2.0;
    let names_top = line.y + layout.gap * 2;
    let (edge_left, edge_right) = (room.top_left.x, right(room));
    let place = |share: f64, text: &str, face: Face| {
        let wide = measure(text, face).width as i32;
        let left = libm::round(line.x(share)) as i32 - wide / 2;
        (left.min(edge_right - wide).max(edge_left), wide)
    };
    let space = i32::from(face.px()) * 2 / 3;
    // The place of what was keeps its name whatever else has to go; names are left out evenly on both sides of it.
    let is_rest = |share: f64| axis.rest.as_ref().is_some_and(|(rest, _)| (rest - share).abs() < 1e-9);
    let anchor = axis.ticks.iter().position(|(share, _)| is_rest(*share)).unwrap_or(0);
    let bold = Face::bold(face.px());
    let named = |stride: usize| (0..axis.ticks.len()).filter(move |tick| tick.abs_diff(anchor) % stride == 0);
    let face_of = |share: f64| if is_rest(share) { bold } else { face };
    let fits = |stride: &usize| {
        let mut end = i32::MIN;
        named(*stride).all(|tick| {
            let (share, text) = &axis.ticks[tick];
            let (left, wide) = place(*share, text, face_of(*share));
            let free = left >= end;
            end = left + wide + space;
            free
        })
    };
    let stride = (1..=axis.ticks.len().max(1)).find(fits).unwrap_or(usize::MAX);
    for (tick, (share, text)) in axis.ticks.iter().enumerate() {
        let x = libm::floor(line.x(*share)) + 0.5;
        let has_name = tick.abs_diff(anchor) % stride == 0;
        let long = tall
            * if is_rest(*share) {
                1.6
            } else if has_name {
                1.0
            } else {
                0.6
            };
        segment(canvas, Spot::new(x, y), Spot::new(x, y + long), Stroke::solid((thick / 2.0).max(1.0)), theme.ink);
        if has_name {
            let (left, _) = place(*share, text, face_of(*share));
            let at = Point::new(left, names_top + face.cap_px());
            draw_text(canvas, text, at, face_of(*share), theme.ink, Align::LEFT);
        }
    }
    let mut y = names_top + face.line_px();
    if let Some((share, text)) = axis.rest.as_ref().filter(|_| says_rest(layout, axis)) {
        let (left, wide) = place(*share, text, face);
        fit(
            canvas,
            text,
            area(left, y, wide.min(room.size.width as i32), face.line_px()),
            face,
            theme.quiet,
            Across::Left,
        );
        y += face.line_px();
    }
    let (face, _) = title_face(layout, &axis.title, room.size.width);
    for text in lines(&axis.title, face, room.size.width) {
        let row = area(room.top_left.x, y, room.size.width as i32, face.line_px());
        fit(canvas, text, row, face, theme.ink, Across::Centre);
        y += face.line_px();
    }
}

/// The guess of the group at hand: its mark on a pin.
pub(super) fn draw_hand(
    canvas: &mut Canvas<'_>,
    line: Line,
    group: u8,
    share: f64,
    radius: f64,
    face: Face,
    theme: &Theme,
) {
    let (x, y) = (line.x(share), f64::from(line.y));
    let middle = Spot::new(x, y - radius * 2.4);
    let tip = Spot::new(x, y);
    triangle(
        canvas,
        [Spot::new(x - radius * 0.55, y - radius * 1.4), tip, Spot::new(x + radius * 0.55, y - radius * 1.4)],
        theme.lack,
    );
    draw_group(canvas, group, middle, radius, Look::AtHand, face, theme);
}

/// Where the marks of all guesses stand: each as low as it can over its place, aside where the pile is too high.
fn piled(line: Line, guesses: &[(u8, f64)], radius: f64, room: Rectangle) -> Vec<(u8, f64, Spot)> {
    let (wide, high) = (radius * 2.7, radius * 2.5);
    let floor = f64::from(line.y) - radius * 1.8;
    let rows = libm::floor((floor - radius - f64::from(room.top_left.y)) / high) as i64 + 1;
    let (least, most) = (f64::from(room.top_left.x) + radius, f64::from(right(room)) - radius);
    let mut order: Vec<(u8, f64)> = guesses.to_vec();
    order.sort_by(|a, b| a.1.total_cmp(&b.1).then(a.0.cmp(&b.0)));
    let mut placed: Vec<(u8, f64, Spot)> = Vec::new();
    for (group, share) in order {
        let x = line.x(share);
        let asides = (0..24).map(|step: i32| f64::from((step + 1) / 2 * if step % 2 == 0 { 1 } else { -1 }) * wide);
        let spots = asides.flat_map(|aside| {
            (0..rows.max(1)).map(move |row| Spot::new((x + aside).min(most).max(least), floor - row as f64 * high))
        });
        let is_free = |spot: &Spot| {
            placed
                .iter()
                .all(|(_, _, other)| (other.x - spot.x).abs() >= wide - 0.01 || (other.y - spot.y).abs() >= high - 0.01)
        };
        let spot = { spots }.find(is_free).unwrap_or(Spot::new(x, floor));
        placed.push((group, share, spot));
    }
    placed
}

/// The guesses over the line, how far they lie apart, what most people say, and the result through all of it.
pub(super) fn draw_result(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    line: Line,
    shown: &RevealShown,
    (radius, face): (f64, Face),
    theme: &Theme,
) {
    let y = f64::from(line.y);
    if let Some((least, middle, most)) = shown.spread {
        let half = (radius * 0.5).max(2.0);
        let (from, to) = (line.x(least) - half, line.x(most) + half);
        let bar =
            area(libm::round(from) as i32, line.y - half as i32, libm::round(to - from) as i32, (half * 2.0) as i32);
        rounded_box(canvas, bar, half, theme.rule);
        let x = line.x(middle);
        segment(
            canvas,
            Spot::new(x, y - half * 1.8),
            Spot::new(x, y + half * 1.8),
            Stroke::solid(layout.line_px.max(2.0)),
            theme.ink,
        );
    }
    if let Some(result) = shown.result {
        let x = line.x(result);
        let top = f64::from(room.top_left.y);
        let wide = (radius * 0.8).max(layout.line_px * 1.6);
        segment(canvas, Spot::new(x, top), Spot::new(x, y + 1.0), Stroke::solid(wide), theme.water);
        let half = wide * 1.6;
        triangle(
            canvas,
            [Spot::new(x - half, top), Spot::new(x, top + half * 1.3), Spot::new(x + half, top)],
            theme.water,
        );
    }
    let places = piled(line, &shown.guesses, radius, room);
    for (_, share, spot) in &places {
        tie(canvas, *spot, Spot::new(line.x(*share), y), theme);
    }
    for (group, _, spot) in &places {
        draw_group(canvas, *group, *spot, radius, Look::Full, face, theme);
    }
    if let Some((share, _)) = &shown.usual {
        draw_usual(canvas, Spot::new(line.x(*share), y), (radius * 0.75).max(4.0), theme);
    }
}
