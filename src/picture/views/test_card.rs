//! The test card for whoever wires a board: colours, edges and the right way up; and every hand with what it says.

use embedded_graphics::geometry::OriginDimensions;
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};
use embedded_graphics::primitives::Rectangle;

use super::layout::{Layout, area, bottom, right};
use super::wording::fit;
use crate::picture::colour::rgb;
use crate::picture::lettering::{Across, Face, lines, measure, paragraph_height};
use crate::picture::shape::{arrow, disc, frame, ring, rounded_box, triangle};
use crate::picture::{Canvas, Spot, Theme};
use crate::words::Words;

/// How a hand is doing.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum Mark {
    /// Nothing was heard of it yet.
    #[default]
    Silent,
    /// It answers.
    Heard,
    /// It answered just now.
    Fresh,
    /// Something is wrong.
    Wrong,
}

/// One hand, or one part of it.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct HandRow {
    /// What it is called.
    pub name: String,
    /// What it says.
    pub value: String,
    /// How it is doing.
    pub mark: Mark,
    /// Where a potentiometer stands, 0 to 1.
    pub level: Option<f64>,
}

/// Every hand.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct HandsCard<'a> {
    /// In the order of the board file.
    pub rows: &'a [HandRow],
    /// The one that is kept in sight where there is no room for all.
    pub at: usize,
    /// What to do about the first one that is silent or wrong.
    pub advice: &'a str,
}

/// The bars: every colour of full light, with the message of its name where mixing the colours up would show.
const BARS: [(Rgb565, Option<&str>); 8] = [
    (Rgb565::WHITE, None),
    (Rgb565::YELLOW, None),
    (Rgb565::CYAN, None),
    (Rgb565::GREEN, Some("test-card-green")),
    (Rgb565::MAGENTA, None),
    (Rgb565::RED, Some("test-card-red")),
    (Rgb565::BLUE, Some("test-card-blue")),
    (Rgb565::BLACK, None),
];
/// Steps from black to white.
const GREYS: i32 = 16;

/// Draws bars of colour, steps of grey, the outermost pixels, a circle and an arrow that points up. Its own colours, not
/// those of a theme: it is the screen that is looked at.
pub fn draw_colours(canvas: &mut Canvas<'_>, words: &Words) {
    let size = canvas.size();
    let (wide, high) = (size.width as i32, size.height as i32);
    let layout = Layout::of(size, false);
    canvas.fill(canvas.frame(), Rgb565::BLACK);
    let edge = (high / 60).max(3);
    let inner = area(edge, edge, wide - 2 * edge, high - 2 * edge);
    let bars_high = inner.size.height as i32 * 2 / 5;
    let name_face = Face::bold(layout.strong.px());
    for (index, (colour, name)) in BARS.iter().enumerate() {
        let (from, to) = (split(inner, index as i32, 8), split(inner, index as i32 + 1, 8));
        let bar = area(from, inner.top_left.y, to - from, bars_high);
        canvas.fill(bar, *colour);
        if let Some(id) = name {
            let ink = if *colour == Rgb565::GREEN { Rgb565::BLACK } else { Rgb565::WHITE };
            let place = area(from + 1, bottom(bar) - name_face.line_px(), to - from - 2, name_face.line_px());
            fit(canvas, &words.say(id, &[]), place, name_face, ink, Across::Centre);
        }
    }
    let greys_high = inner.size.height as i32 / 8;
    let greys_top = inner.top_left.y + bars_high + edge / 2;
    for step in 0..GREYS {
        let (from, to) = (split(inner, step, GREYS), split(inner, step + 1, GREYS));
        let light = (step * 255 / (GREYS - 1)) as u8;
        canvas.fill(area(from, greys_top, to - from, greys_high), rgb(light, light, light));
    }
    // The outermost pixels, all of them: where one is missing, the picture is moved or cut.
    frame(canvas, canvas.frame(), 1, Rgb565::WHITE);
    let top = greys_top + greys_high + edge;
    let rest = area(inner.top_left.x + edge, top, inner.size.width as i32 - 2 * edge, bottom(inner) - top - edge / 2);
    let radius = f64::from(rest.size.height.min(rest.size.width / 3)) / 2.0 - 1.0;
    let middle = Spot::new(
        f64::from(rest.top_left.x) + radius + 1.0,
        f64::from(rest.top_left.y) + f64::from(rest.size.height) / 2.0,
    );
    ring(canvas, middle, radius, (radius / 16.0).max(1.5), Rgb565::WHITE);
    let half = radius * 0.62;
    let (low, high_end) = (Spot::new(middle.x, middle.y + half), Spot::new(middle.x, middle.y - half));
    arrow(canvas, low, high_end, (radius / 6.0).max(2.0), radius * 0.5, Rgb565::WHITE);
    let x = rest.top_left.x + (radius * 2.0) as i32 + 2 + edge * 2;
    let text = area(x, rest.top_left.y, right(rest) - x, rest.size.height as i32);
    let size_text = words.say("test-card-size", &[("width", size.width.into()), ("height", size.height.into())]);
    let head = Face::bold(layout.title.px());
    let line = area(x, text.top_left.y, text.size.width as i32, head.line_px());
    fit(canvas, &size_text, line, head, Rgb565::WHITE, Across::Left);
    let below = area(x, bottom(line), text.size.width as i32, bottom(text) - bottom(line));
    told(canvas, &words.say("test-card-look", &[]), below, Face::regular(layout.strong.px()), Rgb565::WHITE);
}

/// Draws every hand with what it says.
pub fn draw_hands(canvas: &mut Canvas<'_>, card: &HandsCard<'_>, theme: &Theme, words: &Words) {
    let size = canvas.size();
    let layout = Layout::of(size, false);
    let (wide, high) = (size.width as i32, size.height as i32);
    canvas.fill(canvas.frame(), theme.card);
    let face = Face::bold(layout.title.px());
    let head = area(0, 0, wide, face.line_px() + layout.gap * 2);
    canvas.fill(head, theme.chosen);
    let inner = wide - 2 * layout.margin;
    let title = area(layout.margin, 0, inner, head.size.height as i32);
    fit(canvas, &words.say("test-card-hands", &[]), title, face, theme.on_chosen, Across::Left);
    // Advice has up to two fifths of the card, and as many lines as it needs.
    let advice_face = Face::regular(layout.strong.px());
    let needed = paragraph_height(card.advice, advice_face, inner as u32) as i32 + layout.gap;
    let advice_high = if card.advice.is_empty() { 0 } else { needed.min(high * 2 / 5) };
    let advice = area(layout.margin, high - advice_high - layout.gap, inner, advice_high);
    told(canvas, card.advice, advice, advice_face, theme.lack_ink);
    let top = bottom(head) + layout.gap;
    let room = area(layout.margin, top, inner, advice.top_left.y - layout.gap - top);
    rows(canvas, card, room, &layout, theme);
}

fn rows(canvas: &mut Canvas<'_>, card: &HandsCard<'_>, room: Rectangle, layout: &Layout, theme: &Theme) {
    let high = room.size.height as i32;
    let large = Face::regular(layout.title.px());
    let count = card.rows.len().max(1) as i32;
    // As large as all of them can be, so that a row is read from the workbench.
    let mut face = large;
    while (face.line_px() + layout.gap) * count > high && face.px() > layout.label.px() {
        let Some(smaller) = face.smaller() else { break };
        face = smaller;
    }
    let least = face.line_px() + 3;
    let seen = (high / least).clamp(1, count);
    let row_high = (high / seen).min(least * 2);
    let from = (card.at as i32 - seen / 2).clamp(0, count - seen);
    let shown = card.rows.iter().skip(from as usize).take(seen as usize);
    for (index, row) in shown.enumerate() {
        let place = area(room.top_left.x, room.top_left.y + index as i32 * row_high, room.size.width as i32, row_high);
        draw_row(canvas, row, place, face, layout, theme);
    }
    if seen < count {
        let track = row_high * seen;
        let bar = area(
            right(room) + layout.margin / 3,
            room.top_left.y + track * from / count,
            (layout.margin / 3).max(2),
            track * seen / count,
        );
        canvas.fill(bar, theme.rule);
    }
}

fn draw_row(canvas: &mut Canvas<'_>, row: &HandRow, place: Rectangle, face: Face, layout: &Layout, theme: &Theme) {
    let (x, y, wide, high) = (place.top_left.x, place.top_left.y, place.size.width as i32, place.size.height as i32);
    if row.mark == Mark::Fresh {
        let around = area(x - layout.gap, y, wide + 2 * layout.gap, high - 1);
        rounded_box(canvas, around, f64::from(layout.gap), theme.water_pale);
    }
    let radius = f64::from(face.px()) * 0.36;
    let middle = Spot::new(f64::from(x) + radius + 1.0, f64::from(y) + f64::from(high) / 2.0);
    // A shape for each, not a colour alone.
    match row.mark {
        Mark::Silent => ring(canvas, middle, radius, (radius / 3.0).max(1.0), theme.quiet),
        Mark::Heard | Mark::Fresh => disc(canvas, middle, radius, theme.water),
        Mark::Wrong => {
            let at = |across: f64, down: f64| Spot::new(middle.x + across * radius, middle.y + down * radius);
            triangle(canvas, [at(-1.1, 0.9), at(1.1, 0.9), at(0.0, -1.1)], theme.lack);
        }
    }
    let left = x + (radius * 2.0) as i32 + 2 + layout.gap;
    let all = right(place) - left;
    let (ink, value_ink) = match row.mark {
        Mark::Silent => (theme.quiet, theme.quiet),
        Mark::Wrong => (theme.ink, theme.lack_ink),
        _ => (theme.ink, theme.water_ink),
    };
    // A row in one line: smaller rather than cut off.
    let mut face = face;
    let both = |face: Face| measure(&row.name, face).width + measure(&row.value, Face::bold(face.px())).width;
    while both(face) as i32 + layout.gap + 2 > all && face.px() > layout.label.px() {
        let Some(smaller) = face.smaller() else { break };
        face = smaller;
    }
    let value_face = Face::bold(face.px());
    let value_wide = measure(&row.value, value_face).width as i32 + 2;
    let line_high = face.line_px().min(high);
    let text_top = if row.level.is_some() { y } else { y + (high - line_high) / 2 };
    let name = area(left, text_top, all - value_wide - layout.gap, line_high);
    fit(canvas, &row.name, name, face, ink, Across::Left);
    let value = area(right(place) - value_wide, text_top, value_wide, line_high);
    fit(canvas, &row.value, value, value_face, value_ink, Across::Right);
    if let Some(level) = row.level.filter(|level| level.is_finite()) {
        let thick = (high - line_high - 2).clamp(2, layout.gap * 2);
        let track = area(left, y + line_high, all, thick);
        canvas.fill(track, theme.faint);
        let filled = (f64::from(all) * level.clamp(0.0, 1.0)) as i32;
        canvas.fill(area(left, y + line_high, filled, thick), theme.water);
    }
}

/// The edge between two of `parts` equal parts.
fn split(room: Rectangle, index: i32, parts: i32) -> i32 {
    room.top_left.x + room.size.width as i32 * index / parts
}

/// A text as large as it goes into the room.
fn told(canvas: &mut Canvas<'_>, text: &str, room: Rectangle, largest: Face, colour: Rgb565) {
    let mut face = largest;
    while paragraph_height(text, face, room.size.width) > room.size.height {
        let Some(smaller) = face.smaller() else { break };
        face = smaller;
    }
    let mut y = room.top_left.y;
    for line in lines(text, face, room.size.width) {
        let place = area(room.top_left.x, y, room.size.width as i32, face.line_px());
        fit(canvas, line, place, face, colour, Across::Left);
        y += face.line_px();
    }
}
