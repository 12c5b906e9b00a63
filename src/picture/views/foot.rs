//! The foot of every page: the way to the ring, the place or a note on the left, a mark for every page on the right.

use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use super::View;
use super::frame::focus_mark;
use super::hand::Item;
use super::layout::{Form, Layout, area, right};
use super::scene::Scene;
use super::wording::{DOT, fit, in_both, name_within};
use crate::picture::lettering::{Across, draw, measure};
use crate::picture::line::segment;
use crate::picture::shape::{ring, rounded_box};
use crate::picture::{Align, Canvas, Face, Spot, Stroke, Theme};
use crate::words::Words;

/// Boxes of the foot.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Foot {
    /// The small knob that opens the ring.
    pub knob: Rectangle,
    /// The place's name and remarks, or a note.
    pub text: Rectangle,
    /// The page's name; without width where there is no room for it.
    pub name: Rectangle,
    /// The marks of the pages. On a narrow screen they stand between day and year.
    pub marks: Rectangle,
}

impl Foot {
    pub fn of(layout: &Layout, scene: &Scene<'_>, view: View, words: &Words) -> Self {
        let row = layout.footer;
        let Rectangle { top_left: Point { x, y }, size } = row;
        let (wide, high) = (size.width as i32, size.height as i32);
        let marks_wide = marks_px(layout, scene);
        let mut end = right(row);
        let marks = if layout.form == Form::Wide {
            let place = area(end - marks_wide, y, marks_wide, high);
            end -= marks_wide + layout.gap * 2;
            place
        } else {
            // A narrow foot belongs to the place; day and year leave room between them.
            let date = layout.date;
            area(x + (wide - marks_wide) / 2, date.top_left.y, marks_wide, date.size.height as i32)
        };
        let mut name = area(end, y, 0, high);
        if layout.roomy {
            let name_wide = measure(&page_name(view, words), layout.note).width as i32;
            name = area(end - name_wide, y, name_wide, high);
            end -= name_wide + layout.gap * 2;
        }
        let knob_wide = layout.note.cap_px() + 2;
        let knob = area(x, y, knob_wide, high);
        let text_left = right(knob) + layout.gap;
        Self { knob, text: area(text_left, y, end - text_left, high), name, marks }
    }
}

fn page_name(view: View, words: &Words) -> String {
    words.say(&format!("view-{}", view.key()), &[])
}

pub(super) fn draw_foot(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    scene: &Scene<'_>,
    view: View,
    theme: &Theme,
    words: &Words,
) {
    let foot = Foot::of(layout, scene, view, words);
    let face = layout.note;
    page_marks(canvas, layout, foot.marks, scene, view, theme);
    if foot.name.size.width > 0 {
        let at = Point::new(foot.name.top_left.x, foot.name.top_left.y + foot.name.size.height as i32 / 2);
        draw(canvas, &page_name(view, words), at, face, theme.quiet, Align::LEFT.cap_middle());
    }
    small_knob(canvas, foot.knob, theme);
    if !scene.hand.note.is_empty() {
        fit(canvas, &note_within(scene.hand.note, face, foot.text), foot.text, face, theme.ink, Across::Left);
        return;
    }
    let mut remarks = String::new();
    for (holds, id) in [(scene.invented, "picture-invented"), (true, scene.fitting())] {
        if holds {
            remarks.push_str(DOT);
            remarks.push_str(&words.say(id, &[]));
        }
    }
    let taken = measure(&remarks, face).width;
    let name = name_within(scene.place_name, face, foot.text.size.width.saturating_sub(taken));
    let text = if name.is_empty() { remarks.trim_start_matches(DOT).to_owned() } else { name + &remarks };
    fit(canvas, &text, foot.text, face, theme.quiet, Across::Left);
}

/// A note in as many of its languages as fit, which a line feed parts.
pub(super) fn note_within(note: &str, face: Face, room: Rectangle) -> String {
    let (first, second) =
        note.split_once('\n').map_or((note, None), |(first, second)| (first, Some(second.to_owned())));
    in_both(first.to_owned(), second, face, room.size.width as i32)
}

/// The knob from above, as on the help card: here a finger opens the ring.
fn small_knob(canvas: &mut Canvas<'_>, place: Rectangle, theme: &Theme) {
    let radius = f64::from(place.size.width) / 2.0 - 0.5;
    let middle = Spot::new(
        f64::from(place.top_left.x) + f64::from(place.size.width) / 2.0,
        f64::from(place.top_left.y) + f64::from(place.size.height) / 2.0,
    );
    let width = (radius / 4.0).max(1.2);
    ring(canvas, middle, radius, width, theme.quiet);
    let (from, to) = (Spot::new(middle.x, middle.y - radius * 0.1), Spot::new(middle.x, middle.y - radius * 0.8));
    segment(canvas, from, to, Stroke::solid(width), theme.quiet);
}

fn mark_px(layout: &Layout) -> i32 {
    let px = i32::from(layout.note.px());
    if layout.form == Form::Wide { (px / 3).max(3) } else { 2 }
}

/// Width of all marks.
fn marks_px(layout: &Layout, scene: &Scene<'_>) -> i32 {
    mark_px(layout) * (2 * (scene.hand.pages.len().max(1) as i32 - 1) + 3)
}

/// A dot for every page on offer, a bar for this one.
fn page_marks(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    place: Rectangle,
    scene: &Scene<'_>,
    view: View,
    theme: &Theme,
) {
    let tall = mark_px(layout);
    let middle = place.top_left.y + place.size.height as i32 / 2;
    let mut x = place.top_left.x;
    for page in scene.hand.pages {
        let (wide, colour) = if *page == view { (tall * 3, theme.ink) } else { (tall, theme.rule) };
        rounded_box(canvas, area(x, middle - tall / 2, wide, tall), f64::from(tall) / 2.0, colour);
        x += wide + tall;
    }
    if scene.hand.focus.is_at(Item::View) {
        focus_mark(canvas, layout, place, theme);
    }
}

/// Which page's mark lies under a finger that is on the marks, counted in the pages on offer: the nearest one.
pub(super) fn page_at(layout: &Layout, scene: &Scene<'_>, view: View, place: Rectangle, x: i32) -> Option<usize> {
    let tall = mark_px(layout);
    let mut left = place.top_left.x;
    let middles = scene.hand.pages.iter().enumerate().map(move |(index, page)| {
        let wide = if *page == view { tall * 3 } else { tall };
        let middle = left + wide / 2;
        left += wide + tall;
        (index, middle)
    });
    middles.min_by_key(|(_, middle)| (middle - x).abs()).map(|(index, _)| index)
}
