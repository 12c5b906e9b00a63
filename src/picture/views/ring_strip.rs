//! The thing in hand where it is no dial, and the open ring: a strip in the place of the dials.
//!
//! On the ring the thing at hand has a frame and its neighbours stand beside it; a thing that was taken in hand is dark
//! like a dial in hand.

use embedded_graphics::geometry::Point;
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::hand::{End, Focus, Item};
use super::layout::{Form, Layout, area, bottom, right};
use super::scene::Scene;
use super::wording::{day_short, dial_name, dial_value, fit, in_both, year_name};
use crate::picture::lettering::{Across, Face, draw as draw_text, lines, measure};
use crate::picture::shape::{disc, rounded_box, rounded_frame, triangle};
use crate::picture::{Align, Canvas, Spot, Theme};
use crate::words::Words;

/// So many places of a list are shown as dots; longer lists as a line.
const MOST_DOTS: usize = 14;

/// The boxes of the open ring.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct RingPlace {
    /// The thing at hand.
    pub card: Rectangle,
    /// What comes before it, with the arrow.
    pub before: Rectangle,
    /// What comes after it.
    pub after: Rectangle,
}

impl RingPlace {
    pub fn of(layout: &Layout) -> Self {
        let room = layout.dials;
        let wide = room.size.width as i32;
        let side = match layout.form {
            Form::Narrow | Form::Tall => i32::from(layout.label.px()) * 2,
            Form::Wide => wide * 26 / 100,
        };
        let (y, high) = (room.top_left.y, room.size.height as i32);
        let x = room.top_left.x;
        Self {
            card: area(x + side, y, wide - 2 * side, high),
            before: area(x, y, side, high),
            after: area(x + wide - side, y, side, high),
        }
    }
}

/// The name of a thing.
pub(super) fn item_name(item: Item, words: &Words) -> String {
    match (item, item.message()) {
        (Item::Dial(dial), _) => dial_name(dial, words),
        (_, Some(id)) => words.say(id, &[]),
        (_, None) => String::new(),
    }
}

fn name_in_both(item: Item, scene: &Scene<'_>, words: &Words, face: Face, wide: i32) -> String {
    in_both(item_name(item, words), scene.second.map(|second| item_name(item, second)), face, wide)
}

/// How a thing stands.
fn stands(item: Item, scene: &Scene<'_>, words: &Words) -> String {
    match item {
        Item::Dial(dial) => {
            let setting = scene.dials.iter().find(|setting| setting.dial == dial);
            setting.map(|setting| dial_value(setting, scene.units, words)).unwrap_or_default()
        }
        Item::Year => year_name(&scene.year, words),
        Item::Day => scene.today().map(|day| day_short(day, &scene.year, words)).unwrap_or_default(),
        _ => scene.hand.stands.to_owned(),
    }
}

/// Draws the open ring.
pub(super) fn draw_ring(canvas: &mut Canvas<'_>, layout: &Layout, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let Focus::Ring(item) = scene.hand.focus else { return };
    let place = RingPlace::of(layout);
    let radius = f64::from(layout.gap);
    rounded_box(canvas, place.card, radius, theme.card);
    rounded_frame(canvas, place.card, radius, layout.line_px.max(2.0), theme.lack);
    let inner = place.card.size.width as i32 - 2 * (layout.gap + 2);
    let (name, value) = (name_in_both(item, scene, words, layout.label, inner), stands(item, scene, words));
    two_lines(canvas, layout, place.card, (&name, &value), (theme.quiet, theme.ink));
    let ring = scene.hand.ring;
    let at = ring.iter().position(|other| *other == item);
    let tall = f64::from(layout.label.cap_px()) / 2.0;
    let y = f64::from(place.card.top_left.y) + f64::from(place.card.size.height) / 2.0;
    let (left, end) = (f64::from(place.before.top_left.x), f64::from(right(place.after)));
    triangle(
        canvas,
        [Spot::new(left + tall * 1.4, y - tall), Spot::new(left, y), Spot::new(left + tall * 1.4, y + tall)],
        theme.lack,
    );
    triangle(
        canvas,
        [Spot::new(end - tall * 1.4, y - tall), Spot::new(end, y), Spot::new(end - tall * 1.4, y + tall)],
        theme.lack,
    );
    let Some(at) = at.filter(|_| ring.len() > 2) else { return };
    let taken = (tall * 1.4) as i32 + layout.gap;
    let (before, after) = (ring[(at + ring.len() - 1) % ring.len()], ring[(at + 1) % ring.len()]);
    let inner = |place: Rectangle, from_left: i32| {
        area(
            place.top_left.x + from_left,
            place.top_left.y,
            place.size.width as i32 - taken - layout.gap,
            place.size.height as i32,
        )
    };
    neighbour(canvas, layout, &item_name(before, words), inner(place.before, taken), theme);
    neighbour(canvas, layout, &item_name(after, words), inner(place.after, layout.gap), theme);
}

/// A name on one line or two, where there is room for it.
fn neighbour(canvas: &mut Canvas<'_>, layout: &Layout, name: &str, room: Rectangle, theme: &Theme) {
    let mut face = layout.label;
    let fits = |face: Face| {
        let rows: Vec<&str> = lines(name, face, room.size.width).collect();
        rows.len() <= 2 && rows.iter().all(|row| measure(row, face).width <= room.size.width)
    };
    while !fits(face) {
        let Some(smaller) = face.smaller() else { return };
        face = smaller;
    }
    let count = lines(name, face, room.size.width).count() as i32;
    let middle = room.top_left.y + room.size.height as i32 / 2;
    let mut y = middle - (count - 1) * face.line_px() / 2;
    let x = room.top_left.x + room.size.width as i32 / 2;
    for row in lines(name, face, room.size.width) {
        draw_text(canvas, row, Point::new(x, y), face, theme.quiet, Align::CENTRE.cap_middle());
        y += face.line_px();
    }
}

/// A name over a value in the middle of a card.
fn two_lines(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    card: Rectangle,
    (name, value): (&str, &str),
    (name_ink, value_ink): (Rgb565, Rgb565),
) {
    let pad = layout.gap + 2;
    let (x, wide) = (card.top_left.x + pad, card.size.width as i32 - 2 * pad);
    let (y, high) = (card.top_left.y, card.size.height as i32);
    if value.is_empty() {
        fit(canvas, name, area(x, y, wide, high), layout.strong, value_ink, Across::Centre);
        return;
    }
    // On a low card the name is smaller, so that its feet keep clear of the value's heads.
    let face = if layout.dial_rows == 1 { layout.note } else { layout.label };
    let upper = high * 44 / 100;
    fit(canvas, name, area(x, y + 2, wide, upper - 2), face, name_ink, Across::Centre);
    fit(canvas, value, area(x, y + upper, wide, high - upper - 1), layout.strong, value_ink, Across::Centre);
}

/// Draws the thing in hand that is no dial, as the first of the cards.
pub(super) fn draw_in_hand(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    card: Rectangle,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let Focus::In(item) = scene.hand.focus else { return };
    rounded_box(canvas, card, f64::from(layout.gap), theme.chosen);
    let (name, value) = (item_name(item, words), stands(item, scene, words));
    let pad = layout.gap + 1;
    let (x, y) = (card.top_left.x + pad, card.top_left.y);
    let (wide, high) = (card.size.width as i32 - 2 * pad, card.size.height as i32);
    let track = if layout.dial_rows > 1 {
        let name_wide = measure(&name, layout.label).width as i32 + 1;
        fit(canvas, &name, area(x, y, name_wide.min(wide), high), layout.label, theme.on_chosen, Across::Left);
        let rest = wide - name_wide - layout.gap * 2;
        let taken = (measure(&value, layout.strong).width as i32 + 1).min(rest);
        let value_place = area(x + wide - taken, y, taken, high);
        fit(canvas, &value, value_place, layout.strong, theme.on_chosen, Across::Right);
        area(x + name_wide + layout.gap * 2, y, rest - taken - layout.gap * 2, high)
    } else {
        let name_high = layout.label.line_px();
        let name = name_in_both(item, scene, words, layout.label, wide);
        fit(canvas, &name, area(x, y + 1, wide, name_high), layout.label, theme.on_chosen, Across::Left);
        let (below, below_high) = (y + name_high, high - name_high - 1);
        let taken = (measure(&value, layout.strong).width as i32 + 1).min(wide);
        fit(canvas, &value, area(x, below, taken, below_high), layout.strong, theme.on_chosen, Across::Left);
        area(x + taken + pad, below, wide - taken - pad, below_high)
    };
    if track.size.width as i32 >= i32::from(layout.label.px()) * 3 {
        draw_places(canvas, track, scene, theme);
    }
}

/// Where in its list the thing in hand stands: dots, or a line where they are too many.
fn draw_places(canvas: &mut Canvas<'_>, room: Rectangle, scene: &Scene<'_>, theme: &Theme) {
    let Some((place, count)) = scene.hand.place.filter(|(_, count)| *count > 1) else { return };
    let radius = f64::from(room.size.height.min(16)) / 4.0;
    let y = f64::from(room.top_left.y) + f64::from(room.size.height) / 2.0;
    let (from, to) = (f64::from(room.top_left.x) + radius + 4.0, f64::from(right(room)) - radius - 4.0);
    let step = ((to - from) / (count as f64 - 1.0)).min(radius * 6.0);
    let from = to - step * (count as f64 - 1.0);
    let x = |place: usize| from + step * place as f64;
    if count <= MOST_DOTS && step >= radius * 2.0 {
        (0..count).filter(|other| *other != place).for_each(|other| {
            disc(canvas, Spot::new(x(other), y), radius * 0.45, theme.on_chosen);
        });
    } else {
        canvas.fill(area(from as i32, y as i32, (to - from) as i32 + 1, 1), theme.on_chosen);
    }
    disc(canvas, Spot::new(x(place.min(count - 1)), y), radius, theme.lack);
    draw_end(canvas, (from - radius, to + radius), room, scene.hand.end, theme.on_chosen);
}

/// A bar across the end that a turn wanted to go beyond.
pub(super) fn draw_end(
    canvas: &mut Canvas<'_>,
    (from, to): (f64, f64),
    room: Rectangle,
    end: Option<End>,
    colour: Rgb565,
) {
    let Some(end) = end else { return };
    let high = (room.size.height as i32 * 3 / 4).min(24);
    let middle = (room.top_left.y + bottom(room)) / 2;
    let thick = (high / 6).max(3);
    let x = match end {
        End::First => from as i32 - thick,
        End::Last => to as i32,
    };
    canvas.fill(area(x, middle - high / 2, thick, high), colour);
}
