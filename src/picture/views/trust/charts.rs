//! The modelled river beside the measured one: season, duration curve, errors, years. Measured is dashed, the model solid.

use chrono::Month;
use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use crate::picture::area::under;
use crate::picture::chart::{
    LinePair, Months, Plot, as_it_was, line_pair, month_axis, swatch_as_it_was, swatch_with_changes,
};
use crate::picture::lettering::{Across, draw as draw_text, measure, paragraph, paragraph_height};
use crate::picture::line::{polyline, segment};
use crate::picture::views::facts::RiverSkill;
use crate::picture::views::layout::{Layout, area, bottom, right};
use crate::picture::views::months::months_height;
use crate::picture::views::wording::fit;
use crate::picture::{Align, Canvas, Spot, Stroke, Theme};
use crate::words::{Quantity, System, Words};

/// The flows of the duration curve are drawn by their logarithms, down to this share of the highest.
const LOWEST_SHARE: f64 = 1e-4;

/// Two boxes side by side, or one above the other on a tall screen, and the legend's row below.
fn halves(layout: &Layout) -> ([Rectangle; 2], Rectangle) {
    let room = layout.content;
    let (x, y, wide) = (room.top_left.x, room.top_left.y, room.size.width as i32);
    let legend_high = layout.note.line_px();
    let high = room.size.height as i32 - legend_high - layout.gap;
    let legend = area(x, bottom(room) - legend_high, wide, legend_high);
    let gap = layout.gap * 4;
    let boxes = if wide > high {
        let half = (wide - gap) / 2;
        [area(x, y, half, high), area(x + half + gap, y, half, high)]
    } else {
        let half = (high - layout.gap * 2) / 2;
        [area(x, y, wide, half), area(x, y + half + layout.gap * 2, wide, half)]
    };
    (boxes, legend)
}

/// Writes the title and gives what is left of the box, with room for a line of text below.
fn titled(canvas: &mut Canvas<'_>, layout: &Layout, room: Rectangle, title: &str, theme: &Theme) -> Rectangle {
    let wide = room.size.width;
    let high = (paragraph_height(title, layout.note, wide) as i32).min(layout.note.line_px() * 2);
    let top = area(room.top_left.x, room.top_left.y, wide as i32, high);
    paragraph(canvas, title, top, layout.note, theme.ink, Across::Left);
    let foot = months_height(layout.note);
    let top = bottom(top) + layout.gap;
    area(room.top_left.x, top, wide as i32, (bottom(room) - foot - top).max(1))
}

/// Words below a box: at its left end and at its right end.
fn ends(canvas: &mut Canvas<'_>, layout: &Layout, plot: Rectangle, [left, end]: [&str; 2], theme: &Theme) {
    let half = plot.size.width as i32 / 2;
    let y = bottom(plot) + 2;
    let high = layout.note.line_px();
    fit(canvas, left, area(plot.top_left.x, y, half, high), layout.note, theme.quiet, Across::Left);
    fit(canvas, end, area(plot.top_left.x + half, y, half, high), layout.note, theme.quiet, Across::Right);
    canvas.fill(area(plot.top_left.x, bottom(plot), plot.size.width as i32, 1), theme.rule);
}

fn legend(canvas: &mut Canvas<'_>, layout: &Layout, room: Rectangle, unseen: bool, theme: &Theme, words: &Words) {
    let swatch = i32::from(layout.label.px()) * 2;
    let model = if unseen { "trust-chart-model-unseen" } else { "trust-chart-model" };
    let mut x = room.top_left.x;
    for (measured, id) in [(false, model), (true, "trust-chart-measured")] {
        let text = words.say(id, &[]);
        let wide = measure(&text, layout.note).width as i32;
        if x + swatch + layout.gap + wide > right(room) {
            continue;
        }
        let sample = area(x, room.top_left.y, swatch, room.size.height as i32);
        if measured {
            swatch_as_it_was(canvas, sample, layout.line_px, theme);
        } else {
            swatch_with_changes(canvas, sample, layout.line_px, theme.water);
        }
        x += swatch + layout.gap;
        let at = Point::new(x, room.top_left.y + room.size.height as i32 / 2);
        draw_text(canvas, &text, at, layout.note, theme.quiet, Align::LEFT.cap_middle());
        x += wide + layout.gap * 3;
    }
}

/// The season by months, and the duration curve.
pub(super) fn season_and_duration(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    units: System,
    river: &RiverSkill<'_>,
    theme: &Theme,
    words: &Words,
) {
    let (boxes, foot) = halves(layout);
    season(canvas, layout, boxes[0], units, river, theme, words);
    duration(canvas, layout, boxes[1], units, river, theme, words);
    legend(canvas, layout, foot, river.unseen, theme, words);
}

fn season(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    units: System,
    river: &RiverSkill<'_>,
    theme: &Theme,
    words: &Words,
) {
    let most = greatest(river.season.iter().flat_map(|month| [month.1, month.2]));
    let top = words.quantity(most, Quantity::Flow, units, 2);
    let title = words.say("trust-chart-season", &[("most", top.into())]);
    let place = titled(canvas, layout, room, &title, theme);
    let plot = Plot { area: place, across: (0.0, river.season.len().max(1) as f64), up: (0.0, most) };
    let (measured, modelled) = (river.season.iter().map(|month| month.1), river.season.iter().map(|month| month.2));
    line_pair(canvas, &plot, measured, modelled, LinePair::water(layout.line_px, theme), theme);
    let begins: Vec<f64> = (0..=river.season.len()).map(|month| month as f64).collect();
    let of = |month: &(u8, f64, f64)| Month::try_from(month.0).unwrap_or(Month::January);
    let names: Vec<String> = river.season.iter().map(|month| words.month_letter(of(month))).collect();
    let names: Vec<&str> = names.iter().map(String::as_str).collect();
    month_axis(canvas, &plot, Months { begins: &begins, names: &names }, layout.note, theme);
}

fn duration(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    units: System,
    river: &RiverSkill<'_>,
    theme: &Theme,
    words: &Words,
) {
    let most = greatest(river.duration.iter().flat_map(|point| [point.1, point.2]));
    let flows = river.duration.iter().flat_map(|point| [point.1, point.2]);
    let least = flows.filter(|flow| *flow > 0.0).fold(most, f64::min).max(most * LOWEST_SHARE);
    let flow = |value: f64| words.quantity(value, Quantity::Flow, units, 2);
    let title = words.say("trust-chart-duration", &[("least", flow(least).into()), ("most", flow(most).into())]);
    let place = titled(canvas, layout, room, &title, theme);
    let plot = Plot { area: place, across: (0.0, 1.0), up: (libm::log(least) - 0.1, libm::log(most) + 0.1) };
    let at = |share: f64, flow: f64| plot.spot(share, libm::log(flow.max(least)));
    let modelled = river.duration.iter().map(|point| at(point.0, point.2));
    let measured = river.duration.iter().map(|point| at(point.0, point.1));
    polyline(canvas, modelled, Stroke::solid(layout.line_px).with_round_ends(), theme.water);
    polyline(canvas, measured, as_it_was(layout.line_px), theme.ink);
    let words_of = ["trust-chart-rare", "trust-chart-always"].map(|id| words.say(id, &[]));
    ends(canvas, layout, place, [&words_of[0], &words_of[1]], theme);
}

/// The shape of the daily errors, and the years.
pub(super) fn errors_and_years(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    units: System,
    river: &RiverSkill<'_>,
    theme: &Theme,
    words: &Words,
) {
    let (boxes, foot) = halves(layout);
    errors(canvas, layout, boxes[0], river, theme, words);
    years(canvas, layout, boxes[1], units, river, theme, words);
    legend(canvas, layout, foot, river.unseen, theme, words);
}

fn errors(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    river: &RiverSkill<'_>,
    theme: &Theme,
    words: &Words,
) {
    let id = match river.humps {
        0 => "trust-chart-no-errors",
        1 => "trust-chart-one-hump",
        _ => "trust-chart-humps",
    };
    let title = words.say(id, &[("n", river.humps.into())]);
    let place = titled(canvas, layout, room, &title, theme);
    let most = greatest(river.errors.iter().copied());
    let plot = Plot { area: place, across: river.error_ends, up: (0.0, most * 1.05) };
    let step = (river.error_ends.1 - river.error_ends.0) / (river.errors.len().max(2) - 1) as f64;
    let spots = river.errors.iter().enumerate().map(|(at, height)| {
        let spot = plot.spot(river.error_ends.0 + step * at as f64, *height);
        Spot::new(spot.x, spot.y)
    });
    under(canvas, spots.clone(), plot.y(0.0), theme.water_pale);
    polyline(canvas, spots, Stroke::solid(layout.line_px).with_round_ends(), theme.water);
    let (from, to) = river.error_ends;
    if from < 0.0 && 0.0 < to {
        let (top, foot) = (f64::from(place.top_left.y), f64::from(bottom(place)));
        segment(
            canvas,
            Spot::new(plot.x(0.0), top),
            Spot::new(plot.x(0.0), foot),
            Stroke::dashed(1.5, 4.0, 3.0),
            theme.ink,
        );
    }
    let words_of = ["trust-chart-too-little", "trust-chart-too-much"].map(|id| words.say(id, &[]));
    ends(canvas, layout, place, [&words_of[0], &words_of[1]], theme);
}

fn years(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    units: System,
    river: &RiverSkill<'_>,
    theme: &Theme,
    words: &Words,
) {
    let most = greatest(river.years.iter().flat_map(|year| [year.1, year.2]));
    let top = words.quantity(most, Quantity::StoredVolume, units, 2);
    let title = words.say("trust-chart-years", &[("most", top.into())]);
    let place = titled(canvas, layout, room, &title, theme);
    let plot = Plot { area: place, across: (0.0, river.years.len().max(1) as f64), up: (0.0, most) };
    let (measured, modelled) = (river.years.iter().map(|year| year.1), river.years.iter().map(|year| year.2));
    line_pair(canvas, &plot, measured, modelled, LinePair::water(layout.line_px, theme), theme);
    let year = |at: Option<&(i32, f64, f64)>| at.map_or_else(String::new, |year| words.year(year.0));
    ends(canvas, layout, place, [&year(river.years.first()), &year(river.years.last())], theme);
}

/// The greatest of the values that are numbers; 1 where none is above zero.
fn greatest(values: impl Iterator<Item = f64>) -> f64 {
    let most = values.filter(|value| value.is_finite()).fold(0.0, f64::max);
    if most > 0.0 { most } else { 1.0 }
}
