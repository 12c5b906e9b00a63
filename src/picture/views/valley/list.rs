//! The list of canals beside the valley: who gets what today, the oldest right first, and what is left in the river.

use embedded_graphics::primitives::Rectangle;

use crate::picture::chart::{DayMark, swatch};
use crate::picture::lettering::{Across, Face, measure};
use crate::picture::views::layout::{Layout, area, bottom, right};
use crate::picture::views::scene::{CanalShown, CanalTitle, Scene};
use crate::picture::views::wording::{DOT, fit, name_within, right_since, share};
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
    let tight = |face: Face| face.cap_px() + face.descent_px() + 1;
    let (row_high, note_high) = if layout.roomy {
        (layout.label.line_px(), layout.note.line_px())
    } else {
        (tight(layout.label) - 1, tight(layout.note))
    };
    let rows = scene.canals.len() as i32;
    let least_row = layout.label.cap_px() + layout.label.descent_px() + 1;
    // The minimum gets a row of its own where that takes no canal's row away.
    let minimum = minimum_said(scene, words).filter(|text| measure(text, Face::regular(9)).width as i32 <= wide);
    let asks = minimum.is_some();
    let room_for_both = room.size.height as i32 - note_high - row_high - layout.gap >= rows * least_row;
    let minimum_high = if asks && room_for_both { note_high } else { 0 };
    let river_top = bottom(room) - row_high - minimum_high;
    let river = area(left, river_top, wide, bottom(room) - river_top);
    draw_river_rows(canvas, layout, river, row_high, minimum.as_deref(), scene, theme, words);

    let mut y = room.top_left.y;
    if scene.canals.is_empty() {
        return;
    }
    let order = words.say("picture-oldest-first", &[]);
    let fits = measure(&order, Face::regular(9)).width as i32 <= wide;
    let heading = if fits { order } else { words.say("picture-canals", &[]) };
    let free = river_top - layout.gap / 2 - y;
    let columns = if rows * least_row > free && wide >= i32::from(layout.label.px()) * 20 { 2 } else { 1 };
    let rows = (rows + columns - 1) / columns;
    if rows * least_row > free {
        let counted = words.say("picture-canal-count", &[("n", scene.canals.len().into())]);
        fit(canvas, &counted, area(left, y, wide, row_high), layout.label, theme.ink, Across::Left);
        draw_counts(canvas, layout, area(left, y + row_high, wide, river_top - y - row_high), scene, theme, words);
        return;
    }
    let mut free = free;
    // The heading is what a small screen can do without: the page of the canals tells the years of the rights.
    if rows * least_row + note_high <= free {
        fit(canvas, &heading, area(left, y, wide, note_high), layout.note, theme.quiet, Across::Left);
        y += note_high;
        free -= note_high;
    }
    let step = (free / rows).min(layout.strong.line_px() * 2);
    let gutter = layout.gap * 4;
    let across = (wide - gutter * (columns - 1)) / columns;
    for (at, (title, canal)) in scene.canals.iter().zip(scene.now.canals).enumerate() {
        let (column, line) = (at as i32 / rows, at as i32 % rows);
        let row = area(left + column * (across + gutter), y + line * step, across, step);
        draw_row(canvas, layout, row, title, canal, scene, theme, words);
    }
}

#[allow(clippy::too_many_arguments, reason = "one row, drawn once from one place")]
fn draw_row(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    row: Rectangle,
    title: &CanalTitle<'_>,
    canal: &CanalShown<'_>,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let (mark, text) = status(canal, scene, words);
    let side = draw_swatch(canvas, layout, row, mark, theme);
    let (top, wide, high) = (row.top_left.y, row.size.width as i32, row.size.height as i32);
    let colour = match mark {
        DayMark::Full => theme.water_ink,
        DayMark::Idle => theme.quiet,
        DayMark::Short | DayMark::Cut => theme.lack_ink,
    };
    let tall = layout.strong.cap_px() + layout.strong.descent_px() + 2 <= high;
    let strong = if tall { layout.strong } else { Face::bold(layout.label.px() - 1) };
    let face = if mark == DayMark::Idle { layout.label } else { strong };
    // The pattern says it too: where word and name have no room side by side, the name goes first.
    let crowded = wide - side - (measure(&text, face).width as i32) < measure(title.name, layout.label).width as i32;
    let text = if mark != DayMark::Short && crowded { String::new() } else { text };
    let flow = canal.delivered_m3s.get(scene.day).filter(|_| layout.roomy && mark != DayMark::Idle);
    let text = match flow {
        Some(&m3s) => format!("{}{DOT}{text}", words.quantity(m3s, Quantity::Flow, scene.units, 2)),
        None => text,
    };
    let taken = (measure(&text, face).width as i32 + 1).min(wide * 2 / 3);
    fit(canvas, &text, area(right(row) - taken, top, taken, high), face, colour, Across::Right);
    let space = (wide - side - taken - layout.gap).max(0);
    let names = name_face(layout.label, title.name, space);
    let name = name_within(title.name, names, space as u32);
    let left = row.top_left.x + side;
    fit(canvas, &name, area(left, top, space, high), names, theme.ink, Across::Left);
    // The year of the right where there is room for it: it is why the rows stand as they do.
    let used = measure(&name, layout.label).width as i32 + layout.gap * 2;
    let since = right_since(title, words);
    if layout.roomy && used + measure(&since, layout.note).width as i32 <= space {
        fit(canvas, &since, area(left + used, top, space - used, high), layout.note, theme.quiet, Across::Left);
    }
}

/// The largest face that holds a name, or the smallest, in which it has to be shortened.
fn name_face(face: Face, name: &str, space: i32) -> Face {
    face.fitting(name, space.max(0) as u32, 9).unwrap_or(Face::regular(9))
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
    let of = |kind: DayMark| scene.now.canals.iter().filter(|canal| canal.marks.get(scene.day) == Some(&kind)).count();
    let least = layout.strong.cap_px() + layout.strong.descent_px();
    let high = room.size.height as i32;
    let columns = if kinds.len() as i32 * least > high && room.size.width >= 200 { 2 } else { 1 };
    // Where room is short, what nobody has today goes unsaid.
    let short = kinds.len() as i32 * least > high * columns;
    let kinds: Vec<_> = kinds.into_iter().filter(|&(kind, _)| !short || of(kind) > 0).collect();
    let lines = (kinds.len() as i32 + columns - 1) / columns;
    let step = (high / lines.max(1)).min(layout.strong.line_px() * 2);
    let gutter = layout.gap * 4;
    let wide = (room.size.width as i32 - gutter * (columns - 1)) / columns;
    for (at, (kind, id)) in kinds.into_iter().enumerate() {
        let (column, line) = (at as i32 / lines, at as i32 % lines);
        let row = area(room.top_left.x + column * (wide + gutter), room.top_left.y + step * line, wide, step);
        let side = draw_swatch(canvas, layout, row, kind, theme);
        let number = words.number(of(kind) as f64, 0);
        let taken = measure(&number, layout.strong).width as i32 + 1;
        fit(
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

/// What must stay in the river today, where the place asks for anything in the year.
fn minimum_said(scene: &Scene<'_>, words: &Words) -> Option<String> {
    let minimum = scene.now.minimum_m3s;
    let today = *minimum.get(scene.day)?;
    minimum.iter().any(|&minimum| minimum > 0.0).then(|| {
        let amount = words.quantity(today, Quantity::Flow, scene.units, 2);
        words.say("picture-minimum", &[("amount", amount.into())])
    })
}

#[allow(clippy::too_many_arguments, reason = "two rows, drawn once from one place")]
fn draw_river_rows(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    high: i32,
    minimum_said: Option<&str>,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let today = |series: &[f64]| series.get(scene.day).copied().unwrap_or(f64::NAN);
    let (flow, minimum) = (today(scene.now.river_m3s), today(scene.now.minimum_m3s));
    let amount = |m3s: f64| words.quantity(m3s, Quantity::Flow, scene.units, 2);
    let wide = room.size.width as i32;
    let colour = if flow < minimum { theme.lack_ink } else { theme.ink };
    let value = amount(flow);
    let title = words.say("term-river.short", &[]);
    let most = wide - layout.gap - measure(&title, layout.label).width as i32;
    let taken = (measure(&value, layout.strong).width as i32 + 1).min(most);
    let row = area(right(room) - taken, room.top_left.y, taken, high);
    fit(canvas, &value, row, layout.strong, colour, Across::Right);
    let name = area(room.top_left.x, room.top_left.y, wide - taken - layout.gap, high);
    fit(canvas, &title, name, layout.label, theme.ink, Across::Left);
    let rest = area(room.top_left.x, room.top_left.y + high, wide, room.size.height as i32 - high);
    if let Some(text) = minimum_said.filter(|_| rest.size.height > 0) {
        fit(canvas, text, rest, layout.note, theme.quiet, Across::Right);
    }
}
