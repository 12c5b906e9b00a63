//! The dials along the bottom: name, value, and a track that shows rest, reach and where the dial stands.

use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::hand::{End, Focus};
use super::layout::{Layout, area, right};
use super::ring_strip;
use super::scene::{DialSetting, Scene};
use super::wording::{dial_name, dial_value, fit, in_both};
use crate::picture::lettering::{Across, Face, measure};
use crate::picture::shape::{bead, rounded_box, rounded_frame};
use crate::picture::{Canvas, Spot, Theme};
use crate::water::dials::Dials;
use crate::words::Words;

/// Colours of one card.
struct Look {
    ground: Rgb565,
    text: Rgb565,
    name: Rgb565,
    track: Rgb565,
}

pub(super) fn draw_dials(canvas: &mut Canvas<'_>, layout: &Layout, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    if matches!(scene.hand.focus, Focus::Ring(_)) {
        return ring_strip::draw_ring(canvas, layout, scene, theme, words);
    }
    if let Some(place) = lead_place(layout, scene) {
        ring_strip::draw_in_hand(canvas, layout, place, scene, theme, words);
    }
    let names = name_face(layout, scene, words);
    for (index, place) in places(layout, scene) {
        let Some(setting) = scene.dials.get(index) else { continue };
        let chosen = scene.hand.focus.is_in_dial() && scene.chosen == Some(index);
        let look = if chosen {
            Look { ground: theme.chosen, text: theme.on_chosen, name: theme.on_chosen, track: theme.on_chosen }
        } else {
            let text = if setting.rests() { theme.quiet } else { theme.ink };
            Look { ground: theme.card, text, name: theme.quiet, track: theme.rule }
        };
        let radius = f64::from(layout.gap);
        rounded_box(canvas, place, radius, look.ground);
        if !chosen {
            rounded_frame(canvas, place, radius, 1.0, theme.faint);
        }
        card(canvas, layout, setting, place, &look, names, scene, theme, words);
        if let Some(end) = scene.hand.end.filter(|_| chosen && layout.dial_rows > 1) {
            end_bar(canvas, layout, place, end, look.text);
        }
    }
}

/// A bar across the card's own end, where it has no track to stand at.
fn end_bar(canvas: &mut Canvas<'_>, layout: &Layout, card: Rectangle, end: End, colour: Rgb565) {
    let high = card.size.height as i32 * 3 / 4;
    let thick = (layout.gap / 2).max(3);
    let x = match end {
        End::First => card.top_left.x + 1,
        End::Last => right(card) - thick - 1,
    };
    let y = card.top_left.y + (card.size.height as i32 - high) / 2;
    canvas.fill(area(x, y, thick, high), colour);
}

/// The largest face in which every name has room beside its value, so that the rows look even.
fn name_face(layout: &Layout, scene: &Scene<'_>, words: &Words) -> Face {
    if layout.dial_rows == 1 {
        return layout.label;
    }
    let pad = 2 * (layout.gap + 1) + layout.gap + 1;
    let faces = places(layout, scene).filter_map(|(index, place)| {
        let setting = scene.dials.get(index)?;
        let value = measure(&dial_value(setting, scene.units, words), layout.strong).width as i32;
        let room = (place.size.width as i32 - value - pad).max(0) as u32;
        layout.label.fitting(&dial_name(setting.dial, words), room, 9)
    });
    faces.min_by_key(|face| face.px()).unwrap_or(layout.label)
}

/// How the cards of a row are parted: the first one's width, the others', and how far apart their left edges are.
struct Row {
    first: i32,
    wide: i32,
}

impl Row {
    /// Cards in `columns`, where the first one takes what `count` of them leave.
    fn of(layout: &Layout, columns: usize, count: usize) -> Self {
        let (room, gap) = (layout.dials.size.width as i32, layout.gap);
        let columns = columns.max(1) as i32;
        let wide = (room - gap * (columns - 1)) / columns;
        Self { first: room - (wide + gap) * (count.max(1) as i32 - 1), wide }
    }
}

/// Whether a thing that is no dial is in hand and leads the cards.
fn has_lead(scene: &Scene<'_>) -> bool {
    matches!(scene.hand.focus, Focus::In(_)) && !scene.hand.focus.is_in_dial()
}

/// Dials off rest, as many as stand beside what leads.
fn turned(scene: &Scene<'_>, except: Option<usize>, most: usize) -> Vec<usize> {
    let off_rest = |index: &usize| Some(*index) != except && !scene.dials[*index].rests();
    (0..scene.dials.len()).filter(off_rest).take(most).collect()
}

fn row_high(layout: &Layout) -> i32 {
    let rows = layout.dial_rows.max(1) as i32;
    (layout.dials.size.height as i32 - layout.gap * (rows - 1)) / rows
}

/// Where the thing in hand stands that is no dial: before the turned dials on a small screen, over them on a large one.
pub(super) fn lead_place(layout: &Layout, scene: &Scene<'_>) -> Option<Rectangle> {
    if !has_lead(scene) {
        return None;
    }
    let room = layout.dials;
    let wide = if layout.dial_rows > 1 {
        room.size.width as i32
    } else {
        Row::of(layout, layout.dial_columns, 1 + turned(scene, None, layout.dial_columns - 1).len()).first
    };
    Some(area(room.top_left.x, room.top_left.y, wide, row_high(layout)))
}

/// Which dial stands where: all of them in rows on a large screen; on a small one the chosen one, as wide as there is
/// room, and beside it those that are turned, as many as fit. While something else is in hand, only those that are
/// turned; while the ring is open, none.
pub(super) fn places(layout: &Layout, scene: &Scene<'_>) -> impl Iterator<Item = (usize, Rectangle)> + use<> {
    let (room, gap, high) = (layout.dials, layout.gap, row_high(layout));
    let (small, columns, count) = (layout.dial_rows == 1, layout.dial_columns.max(1), scene.dials.len());
    let chosen = scene.chosen.filter(|&index| index < count);
    let (shown, before, row) = if matches!(scene.hand.focus, Focus::Ring(_)) {
        (Vec::new(), 0, Row::of(layout, columns, 1))
    } else if has_lead(scene) {
        let most = if small { columns - 1 } else { columns };
        let shown = turned(scene, None, most);
        let before = if small { 1 } else { columns };
        let row = Row::of(layout, columns, if small { 1 + shown.len() } else { columns });
        (shown, before, row)
    } else if small {
        let others = columns - usize::from(chosen.is_some());
        let shown: Vec<usize> = chosen.into_iter().chain(turned(scene, chosen, others)).collect();
        let row = Row::of(layout, columns, shown.len());
        (shown, 0, row)
    } else {
        let columns = columns.min(count.max(1));
        ((0..count).collect(), 0, Row::of(layout, columns, columns))
    };
    let across = if small { columns } else { columns.min(before.max(count).max(1)) };
    shown.into_iter().enumerate().map(move |(at, index)| {
        let at = at + before;
        let (column, line) = ((at % across) as i32, (at / across) as i32);
        let x = if column == 0 { 0 } else { row.first + gap + (column - 1) * (row.wide + gap) };
        let width = if column == 0 { row.first } else { row.wide };
        (index, area(room.top_left.x + x, room.top_left.y + line * (high + gap), width, high))
    })
}

#[allow(clippy::too_many_arguments, reason = "one card, drawn once from one place")]
fn card(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    setting: &DialSetting,
    place: Rectangle,
    look: &Look,
    names: Face,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let pad = layout.gap + 1;
    let (left, top) = (place.top_left.x + pad, place.top_left.y);
    let (wide, high) = (place.size.width as i32 - 2 * pad, place.size.height as i32);
    let name = dial_name(setting.dial, words);
    let value = dial_value(setting, scene.units, words);
    if layout.dial_rows > 1 {
        let taken = measure(&value, layout.strong).width as i32 + 1;
        let value_left = (left + wide - taken).max(left);
        fit(canvas, &value, area(value_left, top, taken.min(wide), high), layout.strong, look.text, Across::Right);
        let rest = area(left, top, value_left - left - layout.gap, high);
        fit(canvas, &name, rest, names, look.name, Across::Left);
        return;
    }
    let name_high = layout.label.line_px();
    let name = in_both(name, scene.second.map(|second| dial_name(setting.dial, second)), layout.label, wide);
    fit(canvas, &name, area(left, top + 1, wide, name_high), layout.label, look.name, Across::Left);
    let figure = Face::bold(layout.strong.px() + 2);
    let least_track = i32::from(layout.label.px()) * 3;
    let below = area(left, top + name_high, wide, high - name_high - 1);
    let taken = (measure(&value, figure).width as i32 + 1).min(wide);
    fit(canvas, &value, area(left, below.top_left.y, taken, below.size.height as i32), figure, look.text, Across::Left);
    let track = area(left + taken + pad, below.top_left.y, wide - taken - pad, below.size.height as i32);
    if track.size.width as i32 >= least_track {
        let chosen =
            scene.hand.focus.is_in_dial() && scene.chosen.is_some_and(|at| scene.dials.get(at) == Some(setting));
        draw_track(canvas, setting, track, look, scene.hand.end.filter(|_| chosen), theme);
    }
}

/// A level line from the least to the most value, a tick at rest, thick from rest to where the dial stands.
fn draw_track(
    canvas: &mut Canvas<'_>,
    setting: &DialSetting,
    place: Rectangle,
    look: &Look,
    end: Option<End>,
    theme: &Theme,
) {
    let range = setting.range;
    let Some(value) = setting.value else { return };
    if range.most <= range.least {
        return;
    }
    let radius = f64::from(place.size.height.min(16)) / 4.0;
    let (from, to) = (f64::from(place.top_left.x) + radius, f64::from(right(place)) - radius);
    let y = place.top_left.y + place.size.height as i32 / 2;
    let x = |value: f64| from + (to - from) * (value - range.least) / (range.most - range.least);
    let bar = |canvas: &mut Canvas<'_>, one: f64, other: f64, thick: i32, colour: Rgb565| {
        let (left, end) = (one.min(other), one.max(other));
        canvas.fill(area(left as i32, y - thick / 2, (end - left) as i32 + 1, thick), colour);
    };
    bar(canvas, from, to, 1, look.track);
    let rest = Dials::REST.get(setting.dial).filter(|rest| *rest >= range.least && *rest <= range.most);
    if let Some(rest) = rest {
        let tick = place.size.height as i32 / 3;
        canvas.fill(area(x(rest) as i32, y - tick / 2 - 1, 1, tick + 1), look.track);
        bar(canvas, x(rest), x(value), 3, theme.lack);
    }
    bead(canvas, Spot::new(x(value), f64::from(y)), radius, theme.lack, look.ground);
    ring_strip::draw_end(canvas, (from - radius, to + radius), place, end, look.track);
}
