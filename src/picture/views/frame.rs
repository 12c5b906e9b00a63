//! What every page has: the answer on top, day and year under it, the dials along the bottom, place and page at the foot.

use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use super::dial_cards;
use super::foot;
use super::hand::Item;
use super::layout::{Layout, area, bottom, right};
use super::scene::Scene;
use super::wording::{day_short, fit, year_name};
use super::{Answer, View};
use crate::picture::lettering::{Across, draw, lines, measure, paragraph, paragraph_height};
use crate::picture::shape::{disc, rounded_frame, triangle};
use crate::picture::{Align, Canvas, Face, Spot, Theme};
use crate::words::Words;

/// Draws the frame of a page on a clean ground; the page itself goes into the layout's `content`.
pub fn draw_frame(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    scene: &Scene<'_>,
    view: View,
    answer: &Answer,
    theme: &Theme,
    words: &Words,
) {
    canvas.fill(canvas.frame(), theme.paper);
    headline(canvas, layout, &sentences(scene, answer, words), theme);
    date_line(canvas, layout, scene, theme, words);
    dial_cards::draw_dials(canvas, layout, scene, theme, words);
    foot::draw_foot(canvas, layout, scene, view, theme, words);
}

/// The answer in the room's one or two languages, one line feed between them.
pub fn sentences(scene: &Scene<'_>, answer: &Answer, words: &Words) -> String {
    let first = answer.say(scene, words);
    match scene.second {
        Some(second) => format!("{first}\n{}", answer.say(scene, second)),
        None => first,
    }
}

/// As large as it can be said in the box, and level with its middle.
fn headline(canvas: &mut Canvas<'_>, layout: &Layout, text: &str, theme: &Theme) {
    let room = layout.headline;
    let mut face = layout.title;
    let fits = |face: Face| {
        paragraph_height(text, face, room.size.width) <= room.size.height
            && lines(text, face, room.size.width).all(|line| measure(line, face).width <= room.size.width)
    };
    while !fits(face) {
        let Some(smaller) = face.smaller() else { break };
        face = smaller;
    }
    if !fits(face) {
        // Said all the same, with what has no room left out; the strict witness tells.
        paragraph(canvas, text, room, face, theme.ink, Across::Left);
        return;
    }
    let wide = without_orphan(text, face, room.size.width);
    let used = paragraph_height(text, face, wide) as i32;
    let mut baseline = room.top_left.y + (room.size.height as i32 - used) / 2 + face.ascent_px();
    for line in lines(text, face, wide) {
        draw(canvas, line, Point::new(room.top_left.x, baseline), face, theme.ink, Align::LEFT);
        baseline += face.line_px();
    }
}

/// A width up to `width_px` in which no sentence leaves a single word to its last line, where that takes no more lines.
fn without_orphan(text: &str, face: Face, width_px: u32) -> u32 {
    let orphan = |width: u32| {
        text.split('\n').any(|sentence| {
            let last = lines(sentence, face, width).last().unwrap_or_default().trim();
            last.len() < sentence.trim().len() && !last.contains(' ')
        })
    };
    let count = |width: u32| lines(text, face, width).count();
    if !orphan(width_px) {
        return width_px;
    }
    let narrower =
        (1..=16).map(|step| width_px - width_px * step / 40).take_while(|&width| count(width) == count(width_px));
    narrower.into_iter().find(|&width| !orphan(width)).unwrap_or(width_px)
}

/// Boxes of the line with day and year.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct DateLine {
    /// The mark that plays the year or pauses it.
    pub play: Rectangle,
    /// The day.
    pub day: Rectangle,
    /// Three dots while an answer is on its way.
    pub dots: Rectangle,
    /// The year, as wide as it is written.
    pub year: Rectangle,
}

impl DateLine {
    pub fn of(layout: &Layout, scene: &Scene<'_>, words: &Words) -> Self {
        let Rectangle { top_left: Point { x, y }, size } = layout.date;
        let (wide, high) = (size.width as i32, size.height as i32);
        let today = scene.today().map(|today| day_short(today, &scene.year, words)).unwrap_or_default();
        let play = area(x, y, layout.label.cap_px() * 5 / 6 + 1, high);
        let day_face = Face::bold(layout.label.px());
        let day = area(right(play) + layout.gap * 3 / 2 + 1, y, measure(&today, day_face).width as i32, high);
        let dots = area(right(day) + layout.gap, y, if scene.stale { dot_px(layout) * 8 } else { 0 }, high);
        let room = x + wide - right(dots) - layout.gap;
        let name = year_name(&scene.year, words);
        let face = layout.label.fitting(&name, room.max(0) as u32, 9).unwrap_or(layout.label);
        let year_wide = (measure(&name, face).width as i32).min(room);
        Self { play, day, dots, year: area(x + wide - year_wide, y, year_wide, high) }
    }
}

fn dot_px(layout: &Layout) -> i32 {
    (i32::from(layout.label.px()) / 5).max(2)
}

fn date_line(canvas: &mut Canvas<'_>, layout: &Layout, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let row = layout.date;
    let places = DateLine::of(layout, scene, words);
    let middle = row.top_left.y + row.size.height as i32 / 2;
    if let Some(today) = scene.today() {
        play_mark(canvas, layout, places.play, scene.playing, theme);
        let text = day_short(today, &scene.year, words);
        let at = Point::new(places.day.top_left.x, middle);
        draw(canvas, &text, at, Face::bold(layout.label.px()), theme.ink, Align::LEFT.cap_middle());
    }
    if scene.stale {
        // Three dots: the answer on show is the old one, the new one is on its way.
        let step = f64::from(dot_px(layout)) * 2.0;
        for dot in 0..3 {
            let x = f64::from(places.dots.top_left.x) + step * (f64::from(dot) + 0.5);
            disc(canvas, Spot::new(x, f64::from(middle)), step / 4.0, theme.lack);
        }
    }
    fit(canvas, &year_name(&scene.year, words), places.year, layout.label, theme.quiet, Across::Right);
    let line = layout.across(area(row.top_left.x, bottom(row) + layout.gap / 2, row.size.width as i32, 1));
    canvas.fill(line, theme.faint);
    for (item, place) in [(Item::Play, places.play), (Item::Day, places.day), (Item::Year, places.year)] {
        if scene.hand.focus.is_at(item) {
            focus_mark(canvas, layout, place, theme);
        }
    }
}

/// A frame around what the hand is at.
pub(super) fn focus_mark(canvas: &mut Canvas<'_>, layout: &Layout, place: Rectangle, theme: &Theme) {
    let (apart, thick) = (layout.gap / 2 + 1, (layout.line_px * 0.8).max(1.5));
    let Rectangle { top_left: Point { x, y }, size } = place;
    let around = area(x - apart, y - 1, size.width as i32 + 2 * apart, size.height as i32 + 2);
    rounded_frame(canvas, around, f64::from(layout.gap), thick, theme.lack);
}

/// What a tap would do: a wedge plays the year, two bars pause it.
fn play_mark(canvas: &mut Canvas<'_>, layout: &Layout, place: Rectangle, playing: bool, theme: &Theme) {
    let (left, wide) = (place.top_left.x, place.size.width as i32);
    let tall = layout.label.cap_px();
    let top = place.top_left.y + (place.size.height as i32 - tall) / 2;
    if playing {
        let bar = (wide / 3).max(2);
        canvas.fill(area(left, top, bar, tall), theme.lack);
        canvas.fill(area(left + wide - bar, top, bar, tall), theme.lack);
    } else {
        let (x, y, high) = (f64::from(left), f64::from(top), f64::from(tall));
        let tip = Spot::new(x + f64::from(wide), y + high / 2.0);
        triangle(canvas, [Spot::new(x, y), tip, Spot::new(x, y + high)], theme.rule);
    }
}
