//! How all the years went: a mark for every year, those that were not enough by shape and colour, and the river under
//! them.

mod marks;

use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use self::marks::{YearMark, draw_mark, sample};
use super::facts::YearMeasure;
use super::layout::{Layout, area, bottom, right};
use super::page_answer::{PageAnswer, shown_measure, value_of};
use super::scene::{Scene, YearKind};
use super::wording::{fit, share};
use super::{Answer, View, frame, layout_of};
use crate::picture::chart::{Plot, as_it_was};
use crate::picture::lettering::{Across, draw as draw_text, measure};
use crate::picture::line::segment;
use crate::picture::shape::triangle;
use crate::picture::{Align, Canvas, Face, Spot, Theme};
use crate::words::{Quantity, Words};

/// Marks stand at most so far apart, in times the size of a label.
const WIDEST_SLOT: i32 = 4;

/// Draws the page.
pub fn draw(canvas: &mut Canvas<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let layout = layout_of(canvas, scene);
    let answer = Answer::Page(PageAnswer::years(scene));
    frame::draw_frame(canvas, &layout, scene, View::Years, &answer, theme, words);
    let count = year_count(scene);
    if count == 0 {
        return;
    }
    let room = layout.content;
    let Charts { measure_of, texts, legend, main, river } = Charts::of(&layout, scene, words);
    let legend_high = legend.len() as i32 * layout.note.line_px();
    chosen_band(canvas, &layout, &main, &river, scene, theme);
    river_bars(canvas, &river, scene, theme);
    lines_across(canvas, &layout, &main, measure_of, scene, theme);
    for index in 0..count {
        let value = |run: &super::scene::RunShown<'_>| run.years.get(index).and_then(|year| value_of(year, measure_of));
        let mark = YearMark {
            now: value(&scene.now),
            was: if scene.changed() { value(&scene.was) } else { None },
            enough: (measure_of == YearMeasure::Supply).then_some(scene.all_years.enough_share),
        };
        draw_mark(canvas, &layout, &main, index, mark, theme);
    }
    side_labels(canvas, &layout, (&main, &river), room.top_left.x, &texts, scene, theme);
    year_names(canvas, &layout, &river, scene, theme, words);
    let top = bottom(room) - legend_high;
    draw_legend(canvas, &layout, area(room.top_left.x, top, room.size.width as i32, legend_high), &legend, theme);
}

fn year_count(scene: &Scene<'_>) -> usize {
    scene.now.years.len().min(scene.was.years.len())
}

/// Which year a place on the charts stands for, counted from 0; `None` off them.
pub fn year_at(layout: &Layout, scene: &Scene<'_>, words: &Words, x: i32, y: i32) -> Option<usize> {
    let count = year_count(scene);
    if count == 0 {
        return None;
    }
    let Charts { main, river, .. } = Charts::of(layout, scene, words);
    let names_high = layout.note.line_px() + layout.gap;
    let high = bottom(river.area) + names_high - main.area.top_left.y;
    let touched = area(main.area.top_left.x, main.area.top_left.y, main.area.size.width as i32, high);
    // The cast takes what is below zero as zero.
    touched.contains(Point::new(x, y)).then(|| (main.across_at(f64::from(x) + 0.5) as usize).min(count - 1))
}

/// Both charts in their places, and what is written around them.
struct Charts {
    measure_of: YearMeasure,
    texts: [String; 5],
    legend: Vec<Vec<(Sample, String)>>,
    main: Plot,
    river: Plot,
}

impl Charts {
    fn of(layout: &Layout, scene: &Scene<'_>, words: &Words) -> Self {
        let count = year_count(scene);
        let measure_of = shown_measure(scene);
        let room = layout.content;
        let legend = legend_rows(layout, room.size.width as i32, legend_entries(scene, measure_of, words));
        let legend_high = legend.len() as i32 * layout.note.line_px();
        let names_high = layout.note.line_px() + layout.gap * 2;
        let charts = room.size.height as i32 - legend_high - names_high - layout.gap;
        let river_high = charts / 4;
        let texts = side_texts(scene, measure_of, words);
        let side = texts.iter().map(|text| measure(text, layout.note).width as i32).max().unwrap_or(0);
        let side = side + layout.gap * 2;
        let widest = i32::from(layout.label.px()) * WIDEST_SLOT * count as i32;
        let wide = (room.size.width as i32 - side).min(widest);
        let x = room.top_left.x + side;
        let (low, high) = reach(scene, measure_of);
        let main = Plot {
            area: area(x, room.top_left.y + layout.gap, wide, charts - river_high - layout.gap * 2),
            across: (0.0, count as f64),
            up: (low, high),
        };
        let river = Plot {
            area: area(x, bottom(main.area) + layout.gap, wide, river_high),
            across: main.across,
            up: (0.0, greatest_flow(scene)),
        };
        Self { measure_of, texts, legend, main, river }
    }
}

/// Lowest and highest value of the marks' chart. Shares begin low enough to tell years apart, and say where.
fn reach(scene: &Scene<'_>, measure: YearMeasure) -> (f64, f64) {
    let runs = [&scene.now, &scene.was];
    let values = runs.iter().flat_map(|run| run.years.iter().filter_map(|year| value_of(year, measure)));
    match measure {
        YearMeasure::Supply => {
            let least = values.fold(scene.all_years.enough_share, f64::min);
            ((libm::floor((least - 0.05) * 10.0) / 10.0).clamp(0.0, 0.8), 1.0)
        }
        YearMeasure::Snow | YearMeasure::Flow => {
            let most = values.fold(0.0, f64::max);
            (0.0, if most > 0.0 { most } else { 1.0 })
        }
    }
}

fn greatest_flow(scene: &Scene<'_>) -> f64 {
    let runs = [&scene.now, &scene.was];
    let flows = runs.iter().flat_map(|run| run.years.iter().map(|year| year.signs.natural_flow_hm3));
    let most = flows.fold(0.0, f64::max);
    if most > 0.0 { most } else { 1.0 }
}

/// What stands beside the charts: the top, the line of enough, the foot of the marks; name and reach of the river.
fn side_texts(scene: &Scene<'_>, measure: YearMeasure, words: &Words) -> [String; 5] {
    let (low, high) = reach(scene, measure);
    let written = |value: f64| match measure {
        YearMeasure::Supply => share(value, words),
        YearMeasure::Snow => words.quantity(value, Quantity::SnowWater, scene.units, 2),
        YearMeasure::Flow => words.quantity(value, Quantity::StoredVolume, scene.units, 2),
    };
    let enough = match measure {
        YearMeasure::Supply => {
            words.say("page-years-line", &[("share", share(scene.all_years.enough_share, words).into())])
        }
        YearMeasure::Snow => words.say("term-peak-snow.short", &[]),
        YearMeasure::Flow => words.say("term-river.short", &[]),
    };
    let river = words.quantity(greatest_flow(scene), Quantity::StoredVolume, scene.units, 2);
    [written(high), enough, written(low), words.say("term-river.short", &[]), format!("0–{river}")]
}

fn side_labels(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    (main, river): (&Plot, &Plot),
    x: i32,
    texts: &[String; 5],
    scene: &Scene<'_>,
    theme: &Theme,
) {
    let face = layout.note;
    let is_supply = shown_measure(scene) == YearMeasure::Supply;
    let middle = if is_supply { scene.all_years.enough_share } else { (main.up.0 + main.up.1) / 2.0 };
    let colour = |index: usize| if index == 1 { theme.ink } else { theme.quiet };
    let mut label = |index: usize, at: Point, align: Align| {
        draw_text(canvas, &texts[index], at, face, colour(index), align);
    };
    // The line in the middle has its words; those of top and foot where they keep clear of it.
    let (top, foot) = (main.area.top_left.y, bottom(main.area));
    let level = libm::round(main.y(middle)) as i32;
    let apart = face.cap_px() + face.descent_px() + 1;
    label(1, Point::new(x, level), Align::LEFT.cap_middle());
    if level - top >= apart {
        label(0, Point::new(x, top), Align::LEFT.cap_middle());
    }
    if foot - level >= apart * 3 / 2 {
        label(2, Point::new(x, foot), Align::LEFT);
    }
    let wide = river.area.top_left.x - x - layout.gap;
    let line = face.line_px();
    let centre = river.area.top_left.y + river.area.size.height as i32 / 2;
    if river.area.size.height as i32 >= line * 2 {
        fit_left(canvas, &texts[3], area(x, centre - line, wide, line), face, theme);
        fit(canvas, &texts[4], area(x, centre, wide, line), face, theme.quiet, Across::Left);
    } else {
        fit_left(canvas, &texts[3], area(x, centre - line / 2, wide, line), face, theme);
    }
}

fn fit_left(canvas: &mut Canvas<'_>, text: &str, place: Rectangle, face: Face, theme: &Theme) {
    fit(canvas, text, place, face, theme.ink, Across::Left);
}

/// A ground under the chosen year, through both charts.
fn chosen_band(canvas: &mut Canvas<'_>, layout: &Layout, main: &Plot, river: &Plot, scene: &Scene<'_>, theme: &Theme) {
    let index = scene.now.chosen_year as f64;
    let (left, end) = (main.x(index), main.x(index + 1.0));
    let (left, wide) = (libm::floor(left) as i32, (libm::ceil(end - left) as i32).max(3));
    let top = main.area.top_left.y - layout.gap;
    canvas.fill(area(left, top, wide, bottom(river.area) - top), theme.sky);
    let (x, y) = (f64::from(left) + f64::from(wide) / 2.0, f64::from(bottom(river.area)) + 1.5);
    let size = f64::from(layout.gap.max(4));
    triangle(canvas, [Spot::new(x - size, y + size), Spot::new(x, y), Spot::new(x + size, y + size)], theme.lack);
}

/// The river of each year: dry years hatched, middling ones pale, wet ones full; dashes where it stood.
fn river_bars(canvas: &mut Canvas<'_>, plot: &Plot, scene: &Scene<'_>, theme: &Theme) {
    let foot = bottom(plot.area);
    for (index, year) in scene.now.years.iter().enumerate() {
        let (left, end) = slot(plot, index);
        let top = libm::round(plot.y(year.signs.natural_flow_hm3)) as i32;
        let bar = area(left, top, end - left, foot - top);
        let kind = scene.all_years.kinds.get(index).copied().unwrap_or(YearKind::Any);
        fill_kind(canvas, bar, kind, theme);
        if let Some(was) = scene.was.years.get(index).filter(|_| scene.changed()) {
            let y = libm::floor(plot.y(was.signs.natural_flow_hm3)) + 0.5;
            let (from, to) = (Spot::new(f64::from(left), y), Spot::new(f64::from(end), y));
            segment(canvas, from, to, crate::picture::Stroke::solid(1.0), theme.ink);
        }
    }
    canvas.fill(area(plot.area.top_left.x, foot, plot.area.size.width as i32, 1), theme.rule);
}

fn slot(plot: &Plot, index: usize) -> (i32, i32) {
    let (left, end) = (libm::round(plot.x(index as f64)) as i32, libm::round(plot.x(index as f64 + 1.0)) as i32);
    let gap = ((end - left) / 4).max(i32::from(end - left > 2));
    (left + gap - gap / 2, (end - gap / 2).max(left + 1))
}

fn fill_kind(canvas: &mut Canvas<'_>, place: Rectangle, kind: YearKind, theme: &Theme) {
    match kind {
        YearKind::Dry => {
            canvas.fill(place, theme.lack_pale);
            canvas.paint(place, theme.lack_hatch());
        }
        YearKind::Middling | YearKind::Any => canvas.fill(place, theme.water_pale),
        YearKind::Wet => canvas.fill(place, theme.water),
    }
}

/// The line of enough, and the foot of the marks.
fn lines_across(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    plot: &Plot,
    measure: YearMeasure,
    scene: &Scene<'_>,
    theme: &Theme,
) {
    let (left, end) = (f64::from(plot.area.top_left.x), f64::from(right(plot.area)));
    let mut level = |value: f64, colour, width: f64| {
        let y = libm::floor(plot.y(value)) + 0.5;
        segment(canvas, Spot::new(left, y), Spot::new(end, y), crate::picture::Stroke::solid(width), colour);
    };
    level(plot.up.1, theme.faint, 1.0);
    level(plot.up.0, theme.faint, 1.0);
    if measure == YearMeasure::Supply {
        level(scene.all_years.enough_share, theme.rule, (layout.line_px / 2.0).max(1.0));
    }
}

/// The chosen year, and of the others as many as there is room for.
fn year_names(canvas: &mut Canvas<'_>, layout: &Layout, plot: &Plot, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let years = scene.now.years;
    let y = bottom(plot.area) + layout.gap.max(4) + 4 + layout.note.cap_px();
    let bold = Face::bold(layout.note.px());
    let (room_left, room_right) = (layout.content.top_left.x, right(layout.content));
    let place = |index: usize, text: &str, face: Face| {
        let wide = measure(text, face).width as i32;
        let middle = libm::round(plot.x(index as f64 + 0.5)) as i32;
        ((middle - wide / 2).min(room_right - wide).max(room_left), wide)
    };
    let name = |index: usize| years.get(index).map(|year| words.year(year.signs.water_year)).unwrap_or_default();
    let chosen = scene.now.chosen_year;
    let chosen_name = name(chosen);
    let (left, wide) = place(chosen, &chosen_name, bold);
    draw_text(canvas, &chosen_name, Point::new(left, y), bold, theme.lack_ink, Align::LEFT);
    let space = i32::from(layout.note.px());
    let mut taken = vec![(left - space, left + wide + space)];
    let step = [1, 2, 5, 10, 20, 50].into_iter().find(|step| {
        let per_year = f64::from(plot.area.size.width) / years.len().max(1) as f64;
        per_year * f64::from(*step) >= f64::from(wide + space)
    });
    let step = step.unwrap_or(100);
    for (index, year) in years.iter().enumerate().filter(|(index, _)| *index != chosen) {
        if year.signs.water_year.rem_euclid(step) != 0 {
            continue;
        }
        let text = name(index);
        let (left, wide) = place(index, &text, layout.note);
        if taken.iter().any(|&(from, to)| left < to && left + wide > from) {
            continue;
        }
        draw_text(canvas, &text, Point::new(left, y), layout.note, theme.quiet, Align::LEFT);
        taken.push((left, left + wide + space / 2));
    }
}

/// What a sign of the legend stands for.
#[derive(Clone, Copy, Debug, PartialEq)]
enum Sample {
    Mark(YearMark),
    AsItWas,
    Kind(YearKind),
}

fn legend_entries(scene: &Scene<'_>, measure: YearMeasure, words: &Words) -> Vec<(Sample, String)> {
    let mark = |now: f64, enough: Option<f64>| Sample::Mark(YearMark { now: Some(now), was: None, enough });
    let mut entries = Vec::new();
    let mut add = |sample: Sample, id: &str| entries.push((sample, words.say(id, &[])));
    if measure == YearMeasure::Supply {
        add(mark(1.0, Some(0.5)), "page-years-was-enough");
        add(mark(0.0, Some(0.5)), "page-years-was-short");
    } else {
        add(mark(1.0, None), if scene.changed() { "picture-with-changes" } else { "picture-as-it-was" });
    }
    if scene.changed() {
        add(Sample::AsItWas, "picture-as-it-was");
    }
    if !scene.all_years.kinds.is_empty() {
        add(Sample::Kind(YearKind::Dry), "page-dry");
        add(Sample::Kind(YearKind::Middling), "page-middling");
        add(Sample::Kind(YearKind::Wet), "page-wet");
    }
    entries
}

fn entry_px(layout: &Layout, text: &str) -> i32 {
    layout.note.cap_px() * 2 + layout.gap + measure(text, layout.note).width as i32
}

/// The rows of the legend: one where all of it fits, else the marks apart from the thirds.
fn legend_rows(layout: &Layout, wide: i32, entries: Vec<(Sample, String)>) -> Vec<Vec<(Sample, String)>> {
    let px = |entries: &[(Sample, String)]| {
        entries.iter().map(|(_, text)| entry_px(layout, text) + layout.gap * 3).sum::<i32>() - layout.gap * 3
    };
    if px(&entries) <= wide {
        return vec![entries];
    }
    let (kinds, marks): (Vec<_>, Vec<_>) = entries.into_iter().partition(|(of, _)| matches!(of, Sample::Kind(_)));
    let mut rows: Vec<Vec<(Sample, String)>> = Vec::new();
    for group in [marks, kinds] {
        rows.push(Vec::new());
        for entry in group {
            let Some(row) = rows.last_mut() else { break };
            row.push(entry);
            if px(row) > wide && row.len() > 1 {
                let moved = row.pop();
                rows.push(moved.into_iter().collect());
            }
        }
    }
    rows
}

fn draw_legend(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    rows: &[Vec<(Sample, String)>],
    theme: &Theme,
) {
    let face = layout.note;
    let (tall, wide) = (face.cap_px(), face.cap_px() * 2);
    let mut y = room.top_left.y + face.line_px() / 2;
    for row in rows {
        let mut x = room.top_left.x;
        for (of, text) in row {
            let (middle, radius) = (Spot::new(f64::from(x + wide / 2), f64::from(y)), f64::from(tall) / 2.0);
            match of {
                Sample::Mark(mark) => sample(canvas, middle, radius, *mark, theme),
                Sample::AsItWas => {
                    marks::ghost(canvas, middle, radius, as_it_was(layout.line_px).width_px, theme);
                }
                Sample::Kind(kind) => fill_kind(canvas, area(x, y - tall / 2, wide, tall), *kind, theme),
            }
            let at = Point::new(x + wide + layout.gap, y);
            draw_text(canvas, text, at, face, theme.quiet, Align::LEFT.cap_middle());
            x += entry_px(layout, text) + layout.gap * 3;
        }
        y += face.line_px();
    }
}
