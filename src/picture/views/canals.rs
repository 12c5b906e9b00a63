//! Who gets water and until when: the year of every canal as a strip, the oldest right on top.

use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use super::layout::{Layout, area, bottom, right};
use super::months::{draw_months, months_height};
use super::scene::{CanalShown, CanalTitle, Scene};
use super::touch::day_on;
use super::wording::{change_ink, day_short, fit, name_within, right_since};
use super::{Answer, View, frame, layout_of};
use crate::picture::chart::{DayMark, Plot, as_it_was, day_cursor, swatch, swatch_as_it_was, year_strip};
use crate::picture::lettering::{Across, Face, draw as draw_text, measure};
use crate::picture::line::{polyline, segment};
use crate::picture::{Align, Canvas, Spot, Theme};
use crate::words::Words;

/// Columns and rows of the page.
#[derive(Clone, Copy, Debug)]
struct Grid {
    names: i32,
    dates: i32,
    strip_left: i32,
    strip_wide: i32,
    row_high: i32,
    /// Whether rows are high enough for names and dates.
    named: bool,
    /// Whether a row has room for a second line of small type.
    two_lines: bool,
}

/// Draws the page.
pub fn draw(canvas: &mut Canvas<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let layout = layout_of(canvas, scene);
    frame::draw_frame(canvas, &layout, scene, View::Canals, &Answer::canals(scene), theme, words);
    if scene.canals.is_empty() {
        return;
    }
    let room = layout.content;
    let (rows, legend_high) = rows_of(&layout);
    let grid = grid_of(&layout, rows, scene, words);
    let (from, to) = window(scene);
    if !grid.named {
        let text = words.say("picture-names-elsewhere", &[("n", scene.canals.len().into())]);
        let note = area(rows.top_left.x, rows.top_left.y, rows.size.width as i32, layout.note.line_px());
        fit(canvas, &text, note, layout.note, theme.quiet, Across::Left);
    }
    let axis = axis_of(&layout, rows, &grid, scene);
    let mut y = axis.area.top_left.y;
    for (title, (was, now)) in scene.canals.iter().zip(scene.was.canals.iter().zip(scene.now.canals)) {
        let row = area(rows.top_left.x, y, rows.size.width as i32, grid.row_high);
        y += grid.row_high;
        draw_strip(canvas, &layout, &grid, row, (was, now), (from, to), scene, theme);
        if grid.named {
            draw_words(canvas, &layout, &grid, row, title, scene, theme, words);
        }
    }
    if (from..to).contains(&scene.day) {
        day_cursor(canvas, &axis, scene.day as f64 + 0.5, theme.lack);
    }
    draw_months(canvas, &axis, &scene.year, layout.note, theme, words);
    let legend = area(room.top_left.x, bottom(room) - legend_high, room.size.width as i32, legend_high);
    draw_legend(canvas, &layout, legend, scene, theme, words);
}

/// The box of the rows, and the height of the legend.
fn rows_of(layout: &Layout) -> (Rectangle, i32) {
    let room = layout.content;
    let legend_high = line_high(layout.note) + 1;
    let foot = months_height(layout.note) + legend_high;
    (area(room.top_left.x, room.top_left.y, room.size.width as i32, room.size.height as i32 - foot), legend_high)
}

/// The days that the strips show, over the height of all of them.
fn axis_of(layout: &Layout, rows: Rectangle, grid: &Grid, scene: &Scene<'_>) -> Plot {
    let (from, to) = window(scene);
    let first = rows.top_left.y + if grid.named { 0 } else { layout.note.line_px() };
    let count = scene.canals.len().min(scene.was.canals.len()).min(scene.now.canals.len()) as i32;
    Plot {
        area: area(grid.strip_left, first, grid.strip_wide, grid.row_high * count),
        across: (from as f64, to as f64),
        up: (0.0, 1.0),
    }
}

/// Which day of the year a place on the strips stands for, counted from 0; `None` off them.
pub fn day_at(layout: &Layout, scene: &Scene<'_>, words: &Words, x: i32, y: i32) -> Option<usize> {
    if scene.canals.is_empty() {
        return None;
    }
    let (rows, _) = rows_of(layout);
    let axis = axis_of(layout, rows, &grid_of(layout, rows, scene, words), scene);
    let touched = area(
        axis.area.top_left.x,
        axis.area.top_left.y,
        axis.area.size.width as i32,
        axis.area.size.height as i32 + months_height(layout.note),
    );
    touched.contains(Point::new(x, y)).then(|| day_on(&axis, scene, x))
}

fn grid_of(layout: &Layout, rows: Rectangle, scene: &Scene<'_>, words: &Words) -> Grid {
    let count = scene.canals.len() as i32;
    let high = rows.size.height as i32;
    let named = high / count > line_high(layout.note);
    let free = if named { high } else { high - layout.note.line_px() };
    let row_high = (free / count).clamp(2, layout.strong.line_px() * 5);
    let two_lines = row_high > line_high(Face::bold(layout.label.px())) + line_high(layout.note) + 1;
    let face = name_face(layout, row_high, two_lines);
    let wide = rows.size.width as i32;
    let (names, dates) = if named {
        let name = |title: &CanalTitle<'_>| {
            let since = measure(&right_since(title, words), layout.note).width;
            let name = measure(title.name, face).width;
            if two_lines { name.max(since) } else { name }
        };
        let names = scene.canals.iter().map(name).max().unwrap_or(0) as i32;
        let dates = scene.canals.iter().map(|title| dates_width(layout, row_high, two_lines, title, scene, words));
        (names.min(wide * 32 / 100), dates.max().unwrap_or(0))
    } else {
        (0, 0)
    };
    let gap = if named { layout.gap * 2 } else { 0 };
    Grid {
        names,
        dates,
        strip_left: rows.top_left.x + names + gap,
        strip_wide: wide - names - dates - 2 * gap,
        row_high,
        named,
        two_lines,
    }
}

/// The least height of a line whose neighbours keep clear of it.
fn line_high(face: Face) -> i32 {
    face.cap_px() + face.descent_px()
}

fn name_face(layout: &Layout, row_high: i32, two_lines: bool) -> Face {
    let high = if two_lines { row_high - line_high(layout.note) - 1 } else { row_high - 2 };
    let faces = [layout.strong, Face::bold(layout.label.px())];
    faces.into_iter().find(|&face| line_high(face) <= high).unwrap_or(Face::bold(layout.note.px()))
}

/// The last full day now, and how it moved in days.
fn last_full(title: &CanalTitle<'_>, scene: &Scene<'_>, words: &Words) -> (String, Option<(f64, String)>) {
    let of = |signs: Option<&crate::signs::CanalSigns>| signs.and_then(|signs| signs.last_full_date);
    let (was, now) = (of(scene.was.canal_signs(title)), of(scene.now.canal_signs(title)));
    let asks = scene.now.canal_signs(title).is_some_and(|signs| signs.supply_ratio.is_some());
    let text = match now {
        Some(day) => day_short(day, &scene.year, words),
        None if asks => words.say("picture-no-full-day", &[]),
        None => words.say("picture-no-demand", &[]),
    };
    let change = match (was, now) {
        _ if !scene.changed() => None,
        (Some(was), Some(now)) => {
            let days = i32::from(now.day_of_water_year) - i32::from(was.day_of_water_year);
            let text = if days == 0 { words.say("picture-same-day", &[]) } else { words.days_change(days) };
            Some((f64::from(days), text))
        }
        (Some(was), None) => {
            let before = day_short(was, &scene.year, words);
            Some((-1.0, words.say("picture-was", &[("value", before.into())])))
        }
        (None, _) => None,
    };
    (text, change)
}

fn dates_width(
    layout: &Layout,
    row_high: i32,
    two_lines: bool,
    title: &CanalTitle<'_>,
    scene: &Scene<'_>,
    words: &Words,
) -> i32 {
    let (date, change) = last_full(title, scene, words);
    let date = measure(&date, name_face(layout, row_high, two_lines)).width;
    let change = change.filter(|_| two_lines).map_or(0, |(_, text)| measure(&text, layout.note).width);
    date.max(change) as i32
}

/// The first day on show and the one after the last: whole months, from the first in which a field asks for water or
/// anybody lacks any to the last. What is left out are months in which towns got all they asked for.
fn window(scene: &Scene<'_>) -> (usize, usize) {
    let calendar = scene.year.calendar;
    let runs = [scene.was.canals, scene.now.canals];
    let told = |day: usize| {
        runs.iter().flat_map(|canals| scene.canals.iter().zip(*canals)).any(|(title, canal)| {
            match canal.marks.get(day) {
                Some(DayMark::Full) => !title.is_town,
                Some(DayMark::Short | DayMark::Cut) => true,
                Some(DayMark::Idle) | None => false,
            }
        })
    };
    let days = 0..calendar.len();
    let (Some(first), Some(last)) = (days.clone().find(|&day| told(day)), days.rev().find(|&day| told(day))) else {
        return (0, calendar.len());
    };
    let begins = |day: &usize| calendar.get(*day).is_none_or(|day| day.month_day.day == 1);
    let from = (0..=first).rev().find(begins).unwrap_or(0);
    let to = (last + 1..calendar.len()).find(begins).unwrap_or(calendar.len());
    (from, to)
}

#[allow(clippy::too_many_arguments, reason = "one strip, drawn once from one place")]
/// As it was as a dashed line that ends in a tick on its last full day, over the strip with your changes.
fn draw_strip(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    grid: &Grid,
    row: Rectangle,
    (was, now): (&CanalShown<'_>, &CanalShown<'_>),
    (from, to): (usize, usize),
    scene: &Scene<'_>,
    theme: &Theme,
) {
    let across = (from as f64, to as f64);
    let high = grid.row_high;
    let with_line = scene.changed() && high >= 7;
    let line_room = if with_line { (high / 4).max(3) } else { 0 };
    let pad = if high >= 7 { (high / 8).max(1) } else { i32::from(high > 2) };
    let top = row.top_left.y + pad / 2 + line_room;
    let strip =
        Plot { area: area(grid.strip_left, top, grid.strip_wide, high - pad - line_room), across, up: (0.0, 1.0) };
    let marks = now.marks.get(from..to).unwrap_or_default();
    year_strip(canvas, &strip, marks.iter().copied(), theme);
    if !with_line {
        return;
    }
    let stroke = as_it_was(layout.line_px);
    let y = f64::from(top) - f64::from(line_room) / 2.0 - 0.5;
    let y = libm::floor(y) + 0.5;
    // Dashes over the days that were full; a pair of ends for each unbroken span, since a gap parts the line.
    let full = |day: usize| was.marks.get(day) == Some(&DayMark::Full);
    let ends = (from..to).filter(|&day| full(day)).flat_map(|day| {
        let begin = (day == from || !full(day - 1)).then_some(day as f64);
        let end = (day + 1 == to || !full(day + 1)).then_some(day as f64 + 1.0);
        let spot = |x: f64| Spot::new(strip.x(x), y);
        let gap = Spot::new(f64::NAN, y);
        [begin.map(spot), end.map(spot), end.map(|_| gap)].into_iter().flatten()
    });
    polyline(canvas, ends, stroke, theme.ink);
    if let Some(last) = (0..was.marks.len()).rev().find(|&day| full(day)) {
        let x = libm::floor(strip.x(last as f64 + 1.0)) - 0.5;
        let half = f64::from(line_room) / 2.0 + 0.5;
        segment(
            canvas,
            Spot::new(x, y - half),
            Spot::new(x, y + half),
            crate::picture::Stroke::solid(stroke.width_px),
            theme.ink,
        );
    }
}

#[allow(clippy::too_many_arguments, reason = "one row, drawn once from one place")]
fn draw_words(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    grid: &Grid,
    row: Rectangle,
    title: &CanalTitle<'_>,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let face = name_face(layout, grid.row_high, grid.two_lines);
    let (date, change) = last_full(title, scene, words);
    let (left, high) = (row.top_left.x, grid.row_high);
    // Feet of the first line and heads of the second keep clear of each other.
    let apart = if high >= face.line_px() + layout.note.line_px() {
        layout.note.line_px() - layout.note.cap_px()
    } else {
        face.descent_px() + 1
    };
    let both = face.cap_px() + apart + layout.note.cap_px();
    let first = row.top_left.y + (high - if grid.two_lines { both } else { face.cap_px() }) / 2;
    let second = first + face.cap_px() + apart;
    let upper = |x: i32, wide: i32| area(x, first, wide, face.cap_px());
    let lower = |x: i32, wide: i32| area(x, second, wide, layout.note.cap_px());
    let names = face.fitting(title.name, grid.names as u32, 9).unwrap_or(Face::bold(9));
    let name = name_within(title.name, names, grid.names as u32);
    fit(canvas, &name, upper(left, grid.names), names, theme.ink, Across::Left);
    let dates_left = right(row) - grid.dates;
    let lacks = change.as_ref().map_or(0.0, |(days, _)| *days);
    let date_colour = if grid.two_lines { theme.ink } else { single_line_ink(lacks, theme) };
    fit(canvas, &date, upper(dates_left, grid.dates), face, date_colour, Across::Right);
    if grid.two_lines {
        let since = name_within(&right_since(title, words), layout.note, grid.names as u32);
        fit(canvas, &since, lower(left, grid.names), layout.note, theme.quiet, Across::Left);
        if let Some((days, text)) = change {
            fit(canvas, &text, lower(dates_left, grid.dates), layout.note, change_ink(days, theme), Across::Right);
        }
    }
}

fn single_line_ink(days: f64, theme: &Theme) -> embedded_graphics::pixelcolor::Rgb565 {
    if days == 0.0 { theme.ink } else { change_ink(days, theme) }
}

fn draw_legend(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let face = layout.note;
    let middle = room.top_left.y + room.size.height as i32 / 2;
    let tall = face.cap_px() + 1;
    let wide = tall * 2;
    let mut x = room.top_left.x;
    let mut entry = |canvas: &mut Canvas<'_>, id: &str, mark: Option<DayMark>| {
        let text = words.say(id, &[]);
        let needed = measure(&text, face).width as i32;
        if x + wide + layout.gap + needed > right(room) {
            return;
        }
        let place = area(x, middle - tall / 2, wide, tall);
        match mark {
            Some(mark) => swatch(canvas, place, mark, theme),
            None => swatch_as_it_was(canvas, place, layout.line_px, theme),
        }
        x += wide + layout.gap;
        draw_text(canvas, &text, Point::new(x, middle), face, theme.quiet, Align::LEFT.cap_middle());
        x += needed + layout.gap * 3;
    };
    entry(canvas, "term-full.short", Some(DayMark::Full));
    entry(canvas, "term-short.short", Some(DayMark::Short));
    entry(canvas, "term-cut.short", Some(DayMark::Cut));
    if scene.changed() {
        entry(canvas, "picture-was-full", None);
    }
}
