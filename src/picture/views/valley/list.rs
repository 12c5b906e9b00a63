//! The list of canals beside the valley: who gets what today, the oldest right first, and what is left in the river.

use embedded_graphics::primitives::Rectangle;

use crate::picture::chart::{DayMark, swatch};
use crate::picture::lettering::{Across, draw_in, measure};
use crate::picture::views::layout::{Layout, area, bottom, right};
use crate::picture::views::scene::{CanalShown, Scene};
use crate::picture::views::wording::{fit, name_within, share};
use crate::picture::{Canvas, Theme};
use crate::words::{Quantity, Words};

pub(super) fn draw_list(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let (left, wide) = (room.top_left.x, room.size.width as i32);
    let river_rows = if scene.now.minimum_m3s.iter().any(|&minimum| minimum > 0.0) { 2 } else { 1 };
    let (row_high, note_high) = (layout.label.line_px(), layout.note.line_px());
    let river_top = bottom(room) - row_high - note_high * (river_rows - 1);
    draw_river_rows(canvas, layout, area(left, river_top, wide, bottom(room) - river_top), scene, theme, words);

    let mut y = room.top_left.y;
    let heading = if scene.canals.is_empty() {
        return;
    } else {
        words.say("picture-oldest-first", &[])
    };
    let rows = scene.canals.len() as i32;
    let free = river_top - layout.gap - (y + note_high);
    if rows * (layout.label.cap_px() + 4) > free {
        let counted = words.say("picture-canal-count", &[("n", scene.canals.len().into())]);
        draw_in(canvas, &counted, area(left, y, wide, row_high), layout.label, theme.ink, Across::Left);
        draw_counts(canvas, layout, area(left, y + row_high, wide, river_top - y - row_high), scene, theme, words);
        return;
    }
    fit(canvas, &heading, area(left, y, wide, note_high), layout.note, theme.quiet, Across::Left);
    y += note_high;
    let step = (free / rows).min(layout.strong.line_px() * 2);
    for (title, canal) in scene.canals.iter().zip(scene.now.canals) {
        let row = area(left, y, wide, step);
        y += step;
        let (mark, text) = status(canal, scene, words);
        let side = draw_swatch(canvas, layout, row, mark, theme);
        let colour = match mark {
            DayMark::Full => theme.water_ink,
            DayMark::Idle => theme.quiet,
            DayMark::Short | DayMark::Cut => theme.lack_ink,
        };
        let face = if mark == DayMark::Idle { layout.label } else { layout.strong };
        let taken = (measure(&text, face).width as i32 + 1).min(wide / 2);
        fit(canvas, &text, area(right(row) - taken, row.top_left.y, taken, step), face, colour, Across::Right);
        let space = wide - side - taken - layout.gap;
        let name = name_within(title.name, layout.label, space.max(0) as u32);
        draw_in(canvas, &name, area(left + side, row.top_left.y, space, step), layout.label, theme.ink, Across::Left);
    }
}

/// The day's mark as a pattern at the left of a row; gives how far the text has to stand off.
fn draw_swatch(canvas: &mut Canvas<'_>, layout: &Layout, row: Rectangle, mark: DayMark, theme: &Theme) -> i32 {
    let tall = layout.label.cap_px() + 1;
    let middle = row.top_left.y + row.size.height as i32 / 2;
    swatch(canvas, area(row.top_left.x, middle - tall / 2, tall + 2, tall), mark, theme);
    tall + 2 + layout.gap + 1
}

/// What today is for a canal, and the word or share that says so.
fn status(canal: &CanalShown<'_>, scene: &Scene<'_>, words: &Words) -> (DayMark, String) {
    let mark = canal.marks.get(scene.day).copied().unwrap_or(DayMark::Idle);
    let text = match mark {
        DayMark::Full => words.say("term-full.short", &[]),
        DayMark::Cut => words.say("term-cut.short", &[]),
        DayMark::Idle => words.say("picture-no-demand", &[]),
        DayMark::Short => match (canal.delivered_m3s.get(scene.day), canal.demand_m3s.get(scene.day)) {
            (Some(&delivered), Some(&demand)) if demand > 0.0 && delivered < demand => share(delivered / demand, words),
            // Under turns a canal may be short over the round and not today.
            _ => words.say("term-short.short", &[]),
        },
    };
    (mark, text)
}

/// Where there are more canals than rows: how many are full, short, cut and not asking.
fn draw_counts(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let kinds = [
        (DayMark::Full, "term-full.short"),
        (DayMark::Short, "term-short.short"),
        (DayMark::Cut, "term-cut.short"),
        (DayMark::Idle, "picture-no-demand"),
    ];
    let step = (room.size.height as i32 / kinds.len() as i32).min(layout.strong.line_px() * 2);
    let wide = room.size.width as i32;
    for (at, (kind, id)) in kinds.into_iter().enumerate() {
        let row = area(room.top_left.x, room.top_left.y + step * at as i32, wide, step);
        let side = draw_swatch(canvas, layout, row, kind, theme);
        let today = scene.now.canals.iter().filter(|canal| canal.marks.get(scene.day) == Some(&kind)).count();
        let number = words.number(today as f64, 0);
        let taken = measure(&number, layout.strong).width as i32 + 1;
        draw_in(
            canvas,
            &number,
            area(right(row) - taken, row.top_left.y, taken, step),
            layout.strong,
            theme.ink,
            Across::Right,
        );
        let rest = area(row.top_left.x + side, row.top_left.y, wide - side - taken - layout.gap, step);
        fit(canvas, &words.say(id, &[]), rest, layout.label, theme.ink, Across::Left);
    }
}

fn draw_river_rows(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let today = |series: &[f64]| series.get(scene.day).copied().unwrap_or(f64::NAN);
    let (flow, minimum) = (today(scene.now.river_m3s), today(scene.now.minimum_m3s));
    let amount = |m3s: f64| words.quantity(m3s, Quantity::Flow, scene.units, 2);
    let (wide, high) = (room.size.width as i32, layout.label.line_px());
    let colour = if flow < minimum { theme.lack_ink } else { theme.ink };
    let value = amount(flow);
    let taken = (measure(&value, layout.strong).width as i32 + 1).min(wide * 2 / 3);
    let row = area(right(room) - taken, room.top_left.y, taken, high);
    fit(canvas, &value, row, layout.strong, colour, Across::Right);
    let name = area(room.top_left.x, room.top_left.y, wide - taken - layout.gap, high);
    fit(canvas, &words.say("term-river.short", &[]), name, layout.label, theme.ink, Across::Left);
    let rest = area(room.top_left.x, room.top_left.y + high, wide, room.size.height as i32 - high);
    if rest.size.height > 0 {
        let text = words.say("picture-minimum", &[("amount", amount(minimum).into())]);
        fit(canvas, &text, rest, layout.note, theme.quiet, Across::Right);
    }
}
