//! The staff menu: a card over the whole screen with a PIN, a list that the knob goes through, or a few facts.

use embedded_graphics::geometry::OriginDimensions;
use embedded_graphics::primitives::Rectangle;

use super::layout::{Layout, area, bottom, right};
use super::wording::fit;
use crate::picture::lettering::{Across, Face, measure, paragraph, paragraph_height};
use crate::picture::shape::{disc, ring, rounded_box, triangle};
use crate::picture::{Canvas, Spot, Theme};

/// A line of a list.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct Line {
    /// What it is about.
    pub name: String,
    /// How that is; may be empty.
    pub value: String,
}

/// What the card shows.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Body<'a> {
    /// A text.
    Text(&'a str),
    /// A PIN that is being typed.
    Pin {
        /// Digits so far.
        digits: u8,
        /// What the wheel stands at.
        wheel: &'a str,
        /// Said under it; may be empty.
        note: &'a str,
    },
    /// Lines.
    List {
        /// All of them.
        lines: &'a [Line],
        /// The one at hand, in a list that the knob goes through.
        at: Option<usize>,
        /// Whether a turn changes the value of that one.
        in_hand: bool,
    },
}

/// The card.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct StaffCard<'a> {
    /// Heads it.
    pub title: &'a str,
    /// What it shows.
    pub body: Body<'a>,
    /// How to go on.
    pub foot: &'a str,
}

/// Draws the card over everything.
pub fn draw(canvas: &mut Canvas<'_>, card: &StaffCard<'_>, theme: &Theme) {
    let size = canvas.size();
    let layout = Layout::of(size, false);
    let (wide, high) = (size.width as i32, size.height as i32);
    canvas.fill(canvas.frame(), theme.card);
    let face = Face::bold(layout.title.px());
    let head = area(0, 0, wide, face.line_px() + layout.gap * 2);
    canvas.fill(head, theme.chosen);
    let inner = wide - 2 * layout.margin;
    fit(
        canvas,
        card.title,
        area(layout.margin, 0, inner, head.size.height as i32),
        face,
        theme.on_chosen,
        Across::Left,
    );
    let foot_high = layout.label.line_px() + layout.gap;
    let foot = area(layout.margin, high - foot_high, inner, foot_high);
    fit(canvas, card.foot, foot, layout.label, theme.quiet, Across::Left);
    let top = bottom(head) + layout.gap;
    let body = area(layout.margin, top, inner, foot.top_left.y - layout.gap / 2 - top);
    match card.body {
        Body::Text(text) => draw_text(canvas, text, body, Face::regular(layout.title.px()), theme),
        Body::Pin { digits, wheel, note } => draw_pin(canvas, (digits, wheel, note), body, &layout, theme),
        Body::List { lines, at, in_hand } => draw_list(canvas, lines, (at, in_hand), body, &layout, theme),
    }
}

fn draw_text(canvas: &mut Canvas<'_>, text: &str, room: Rectangle, largest: Face, theme: &Theme) {
    let mut face = largest;
    while paragraph_height(text, face, room.size.width) > room.size.height {
        let Some(smaller) = face.smaller() else { break };
        face = smaller;
    }
    paragraph(canvas, text, room, face, theme.ink, Across::Left);
}

fn draw_pin(
    canvas: &mut Canvas<'_>,
    (digits, wheel, note): (u8, &str, &str),
    room: Rectangle,
    layout: &Layout,
    theme: &Theme,
) {
    const PLACES: u8 = 8;
    let (x, wide, high) = (room.top_left.x, room.size.width as i32, room.size.height as i32);
    let unit = high / 8;
    let middle = x + wide / 2;
    let radius = f64::from((unit / 2).min(wide / 40)).max(2.0);
    let apart = radius * 3.2;
    for place in 0..PLACES {
        let at = f64::from(middle) + (f64::from(place) - f64::from(PLACES - 1) / 2.0) * apart;
        let spot = Spot::new(at, f64::from(room.top_left.y + unit));
        if place < digits {
            disc(canvas, spot, radius, theme.ink);
        } else {
            ring(canvas, spot, radius * 0.8, (radius / 4.0).max(1.0), theme.rule);
        }
    }
    let wheel_high = unit * 3;
    // One figure that is read from two metres away.
    let face = Face::bold((wheel_high * 2 / 3).clamp(18, 64) as u8);
    let wheel_place = area(middle - wide / 4, room.top_left.y + unit * 2 + unit / 4, wide / 2, wheel_high);
    rounded_box(canvas, wheel_place, f64::from(layout.gap) * 1.5, theme.chosen);
    let inside =
        area(wheel_place.top_left.x + layout.gap, wheel_place.top_left.y, wide / 2 - 2 * layout.gap, wheel_high);
    fit(canvas, wheel, inside, face, theme.on_chosen, Across::Centre);
    arrows(canvas, wheel_place, f64::from(unit) * 0.7, f64::from(layout.gap * 2), theme);
    let low = bottom(wheel_place) + layout.gap;
    let under = area(x, low, wide, bottom(room) - low);
    if !note.is_empty() {
        let line = area(x, low, wide, layout.strong.line_px().min(under.size.height as i32));
        fit(canvas, note, line, Face::bold(layout.strong.px()), theme.lack_ink, Across::Centre);
    }
}

/// Heads of arrows on both sides of a box: turning changes what is in it.
fn arrows(canvas: &mut Canvas<'_>, place: Rectangle, high: f64, apart: f64, theme: &Theme) {
    let y = f64::from(place.top_left.y) + f64::from(place.size.height) / 2.0;
    for (edge, way) in [(f64::from(place.top_left.x), -1.0), (f64::from(right(place)), 1.0)] {
        let at = |along: f64, down: f64| Spot::new(edge + way * (apart + along), y + down);
        triangle(canvas, [at(0.0, -high), at(high * 1.1, 0.0), at(0.0, high)], theme.lack);
    }
}

fn draw_list(
    canvas: &mut Canvas<'_>,
    lines: &[Line],
    (at, in_hand): (Option<usize>, bool),
    room: Rectangle,
    layout: &Layout,
    theme: &Theme,
) {
    let (x, wide, high) = (room.top_left.x, room.size.width as i32, room.size.height as i32);
    // A few facts have room to be read from further away.
    let face = if at.is_some() { layout.label } else { Face::regular(layout.label.px() + layout.label.px() / 3) };
    let least = face.line_px() + 2;
    let seen = usize::try_from(high / least).unwrap_or(0).clamp(1, lines.len().max(1));
    let row_high = (high / seen as i32).min(least * 2);
    // The one at hand stays in the middle where the list is longer than the screen.
    let from = at.unwrap_or(0).saturating_sub(seen / 2).min(lines.len().saturating_sub(seen));
    for (row, (index, line)) in lines.iter().enumerate().skip(from).take(seen).enumerate() {
        let place = area(x, room.top_left.y + row as i32 * row_high, wide, row_high);
        let chosen = at == Some(index);
        let (ink, value_ink) = if chosen { (theme.on_chosen, theme.on_chosen) } else { (theme.ink, theme.water_ink) };
        if chosen {
            let out = layout.gap.min(layout.margin);
            let around = area(x - out, place.top_left.y, wide + 2 * out, row_high);
            rounded_box(canvas, around, f64::from(layout.gap), theme.chosen);
        }
        let value_face = Face::bold(face.px());
        let arrow = if chosen && in_hand { i32::from(face.px()) } else { 0 };
        let needed = measure(&line.value, value_face).width as i32 + 2;
        let value_wide = if line.value.is_empty() { 0 } else { needed.min(wide * 3 / 5) };
        let value_place = area(right(place) - value_wide - arrow, place.top_left.y, value_wide, row_high);
        let name_wide = wide - value_wide - 2 * arrow - layout.gap * 2;
        fit(canvas, &line.name, area(x, place.top_left.y, name_wide, row_high), face, ink, Across::Left);
        if value_wide > 0 {
            fit(canvas, &line.value, value_place, value_face, value_ink, Across::Right);
        }
        if arrow > 0 {
            let small = f64::from(face.px()) * 0.35;
            let on_row = Theme { lack: theme.on_chosen, ..*theme };
            arrows(canvas, value_place, small, 2.0, &on_row);
        }
    }
    if seen < lines.len() {
        // How far down the list one is, at its right edge.
        let track = f64::from(row_high * seen as i32);
        let bar = (track * seen as f64 / lines.len() as f64) as i32;
        let down = (track * from as f64 / lines.len() as f64) as i32;
        let edge = (layout.margin / 3).max(2);
        let place = area(right(room) + layout.margin - edge, room.top_left.y + down, edge, bar);
        canvas.fill(place, theme.rule);
    }
}
