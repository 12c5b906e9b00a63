//! The pages around the steps of a lesson: the list, the first page, and the word of another board.

use embedded_graphics::primitives::Rectangle;

use super::Saying;
use super::marks::{Look, draw_group};
use super::pages::{figure_within, fitted, large, mark, write};
use crate::picture::lettering::Across;
use crate::picture::shape::{rounded_box, rounded_frame};
use crate::picture::views::layout::{Layout, area, bottom};
use crate::picture::views::wording::fit;
use crate::picture::{Canvas, Face, Spot, Theme};

pub(super) fn draw_start(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    (about, minutes, ask, groups): (&Saying, &str, &str, u8),
    theme: &Theme,
) {
    let (x, wide) = (room.top_left.x, room.size.width as i32);
    let (radius, face) = mark(layout, groups.into());
    let per_row = ((f64::from(wide) / (radius * 3.0)) as i32).clamp(1, 12);
    let rows = (i32::from(groups) + per_row - 1) / per_row;
    let marks_high = (radius * 2.8) as i32 * rows;
    let ask_face = Face::bold(layout.strong.px().max(layout.label.px()));
    let ask_high = ask_face.line_px() + layout.gap;
    let low = bottom(room) - marks_high;
    let text =
        area(x, room.top_left.y, wide, low - ask_high - layout.gap * 2 - layout.label.line_px() - room.top_left.y);
    let end = write(canvas, about, text, fitted(about, text, large(layout, 2)), (theme.ink, theme.quiet), false);
    fit(
        canvas,
        minutes,
        area(x, end + layout.gap, wide, layout.label.line_px()),
        layout.label,
        theme.quiet,
        Across::Left,
    );
    fit(canvas, ask, area(x, low - ask_high, wide, ask_high), ask_face, theme.ink, Across::Left);
    for group in 0..groups {
        let (row, column) = (i32::from(group) / per_row, i32::from(group) % per_row);
        let middle = Spot::new(
            f64::from(x) + radius * (1.4 + 3.0 * f64::from(column)),
            f64::from(low) + radius * (1.4 + 2.8 * f64::from(row)),
        );
        draw_group(canvas, group, middle, radius, Look::Full, face, theme);
    }
}

/// The first entry that is listed, and how many are, so that there is room for what the open one is about.
fn listed(layout: &Layout, room: Rectangle, count: usize, open: usize) -> (usize, usize) {
    let about_high = layout.label.line_px() * 4;
    let row_high = Face::bold(layout.strong.px()).line_px() + layout.gap;
    let shown = ((room.size.height as i32 - about_high) / row_high).max(1) as usize;
    (open.saturating_sub(shown / 2).min(count.saturating_sub(shown)), shown)
}

pub(super) fn draw_list(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    entries: &[(String, String)],
    open: usize,
    theme: &Theme,
) {
    let (x, wide) = (room.top_left.x, room.size.width as i32);
    let face = Face::bold(layout.strong.px());
    let about = Face::regular(layout.label.px());
    let about_high = about.line_px() * 4;
    let row_high = face.line_px() + layout.gap;
    let (first, shown) = listed(layout, room, entries.len(), open);
    let mut y = room.top_left.y;
    for (index, (name, text)) in entries.iter().enumerate().skip(first).take(shown) {
        let row = area(x, y, wide, row_high);
        let inside = area(x + layout.gap * 2, y, wide - layout.gap * 4, row_high);
        if index == open {
            rounded_box(canvas, row, f64::from(layout.gap) * 1.2, theme.chosen);
            fit(canvas, name, inside, face, theme.on_chosen, Across::Left);
        } else {
            fit(canvas, name, inside, face, theme.ink, Across::Left);
        }
        y += row_high;
        if index == open {
            let saying = Saying { first: text.clone(), second: None };
            let place = area(inside.top_left.x, y + layout.gap / 2, inside.size.width as i32, about_high - layout.gap);
            let end = write(canvas, &saying, place, fitted(&saying, place, about), (theme.ink, theme.quiet), false);
            y = end + layout.gap;
        }
    }
}

pub(super) fn draw_word(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    ask: &str,
    (typed, hand, letters): (&str, Option<char>, usize),
    theme: &Theme,
) {
    let (x, wide, high) = (room.top_left.x, room.size.width as i32, room.size.height as i32);
    let asked = Saying { first: ask.to_owned(), second: None };
    let text = area(x, room.top_left.y, wide, high * 2 / 5);
    write(canvas, &asked, text, fitted(&asked, text, large(layout, 2)), (theme.ink, theme.quiet), false);
    let cell =
        ((wide - layout.gap * (letters as i32 - 1)) / letters.max(1) as i32).min(layout.figure.line_px() * 5 / 4);
    let face = figure_within(Face::bold(layout.figure.px()), cell);
    let tall = face.line_px() + layout.gap;
    let top = bottom(text) + (bottom(room) - bottom(text) - tall) / 2;
    for (place, letter) in
        typed.chars().map(Some).chain([hand]).chain(std::iter::repeat(None)).take(letters).enumerate()
    {
        let box_ = area(x + place as i32 * (cell + layout.gap), top, cell, tall);
        let at_hand = place == typed.chars().count();
        if at_hand {
            rounded_box(canvas, box_, f64::from(layout.gap), theme.chosen);
        } else {
            rounded_frame(canvas, box_, f64::from(layout.gap), layout.line_px.max(1.0), theme.rule);
        }
        if let Some(letter) = letter {
            let ink = if at_hand { theme.on_chosen } else { theme.ink };
            fit(canvas, &letter.to_string(), box_, face, ink, Across::Centre);
        }
    }
}
