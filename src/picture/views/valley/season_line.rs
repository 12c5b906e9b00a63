//! The year's line at the foot of the valley page: storage, or the river's flow where there is no reservoir.

use embedded_graphics::primitives::Rectangle;

use crate::picture::chart::{LinePair, Plot, as_it_was, day_cursor, line_pair, range_band};
use crate::picture::lettering::{Across, measure};
use crate::picture::line::polyline;
use crate::picture::shape::bead;
use crate::picture::views::layout::{Layout, area};
use crate::picture::views::months::{draw_months, months_height};
use crate::picture::views::scene::{RunShown, Scene};
use crate::picture::views::wording::fit;
use crate::picture::{Canvas, Spot, Theme};
use crate::words::{Quantity, Words};

/// The series on show, what it is and its highest value.
fn series<'a>(scene: &Scene<'a>) -> (&'a [f64], &'a [f64], Quantity, f64) {
    if let (Some(was), Some(now)) = (scene.was.reservoir, scene.now.reservoir) {
        let most = was.capacity_hm3.max(now.capacity_hm3);
        return (was.storage_hm3, now.storage_hm3, Quantity::StoredVolume, most);
    }
    let (was, now) = (scene.was.natural_flow_m3s, scene.now.natural_flow_m3s);
    (was, now, Quantity::Flow, was.iter().chain(now).copied().fold(0.0, f64::max))
}

/// Name and range of the series, for the side of the plot.
fn sides(scene: &Scene<'_>, words: &Words) -> [String; 2] {
    let (_, _, quantity, most) = series(scene);
    let id = if quantity == Quantity::Flow { "term-river.short" } else { "term-reservoir.short" };
    [words.say(id, &[]), format!("0–{}", words.quantity(most, quantity, scene.units, 3))]
}

/// The plot in `room`.
pub(super) fn plot_of(layout: &Layout, room: Rectangle, scene: &Scene<'_>, words: &Words) -> Plot {
    plot_beside(layout, room, scene, &sides(scene, words))
}

fn plot_beside(layout: &Layout, room: Rectangle, scene: &Scene<'_>, sides: &[String; 2]) -> Plot {
    let (_, _, _, most) = series(scene);
    let side = measure(&sides[0], layout.label).width.max(measure(&sides[1], layout.note).width) as i32;
    let left = room.top_left.x + side + layout.gap * 2;
    let wide = room.size.width as i32 - side - layout.gap * 2;
    let high = room.size.height as i32 - months_height(layout.note) - layout.gap;
    Plot {
        area: area(left, room.top_left.y + layout.gap, wide, high),
        across: (0.0, scene.year.calendar.len() as f64),
        // A little air above a full reservoir, and a range even where nothing flows.
        up: (0.0, if most > 0.0 { most * 1.06 } else { 1.0 }),
    }
}

pub(super) fn draw_season_line(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let sides = sides(scene, words);
    let plot = plot_beside(layout, room, scene, &sides);
    let side = plot.area.top_left.x - room.top_left.x - layout.gap;
    let (x, y) = (room.top_left.x, plot.area.top_left.y);
    let name_high = layout.label.line_px();
    fit(canvas, &sides[0], area(x, y, side, name_high), layout.label, theme.ink, Across::Left);
    fit(canvas, &sides[1], area(x, y + name_high, side, layout.note.line_px()), layout.note, theme.quiet, Across::Left);

    let (was, now, quantity, _) = series(scene);
    let doubt = scene.doubt.and_then(|doubt| match quantity {
        Quantity::Flow => doubt.natural_flow_m3s,
        _ => doubt.storage_hm3,
    });
    if let Some((low, high)) = doubt {
        range_band(canvas, &plot, low.iter().copied(), high.iter().copied(), theme.water, theme);
    }
    let look = LinePair::water(layout.line_px, theme).with_lack(theme);
    // At rest both runs are one.
    let was = if scene.changed() { was } else { &[] };
    line_pair(canvas, &plot, was.iter().copied(), now.iter().copied(), look, theme);
    if let Some(beside) = &scene.beside {
        draw_beside(canvas, layout, &plot, of_run(beside, quantity), theme);
    }
    draw_months(canvas, &plot, &scene.year, layout.note, theme, words);
    let middle = scene.day as f64 + 0.5;
    let x = day_cursor(canvas, &plot, middle, theme.lack);
    if let Some(&value) = now.get(scene.day) {
        bead(canvas, Spot::new(x, plot.y(value)), layout.line_px * 1.8, theme.lack, theme.paper);
    }
}

fn of_run<'a>(run: &RunShown<'a>, quantity: Quantity) -> &'a [f64] {
    match (quantity, run.reservoir) {
        (Quantity::Flow, _) | (_, None) => run.natural_flow_m3s,
        (_, Some(reservoir)) => reservoir.storage_hm3,
    }
}

/// The third line, of the run that was kept: round dots.
fn draw_beside(canvas: &mut Canvas<'_>, layout: &Layout, plot: &Plot, values: &[f64], theme: &Theme) {
    let spots = values.iter().enumerate().map(|(day, &value)| plot.spot(day as f64 + 0.5, value));
    let width = as_it_was(layout.line_px).width_px.max(1.5);
    polyline(canvas, spots, crate::picture::views::season::kept_stroke(width), theme.town);
}
