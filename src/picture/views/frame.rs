//! What every page has: the answer on top, day and year under it, the dials along the bottom, place and page at the foot.

use embedded_graphics::geometry::Point;

use super::dial_cards;
use super::layout::{Form, Layout, area, bottom, right};
use super::scene::Scene;
use super::wording::{DOT, day_short, fit, name_within, year_name};
use super::{Answer, View};
use crate::picture::lettering::{Across, draw, lines, measure, paragraph, paragraph_height};
use crate::picture::shape::{disc, rounded_box, triangle};
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
    footer(canvas, layout, scene, view, theme, words);
}

/// Which of the scene's dials lies under a finger, and how far along its card, 0 to 1; `None` off the cards.
pub fn dial_at(layout: &Layout, scene: &Scene<'_>, x: i32, y: i32) -> Option<(usize, f64)> {
    let finger = Point::new(x, y);
    let (index, card) = dial_cards::places(layout, scene).find(|(_, card)| card.contains(finger))?;
    let share = (f64::from(x - card.top_left.x) + 0.5) / f64::from(card.size.width.max(1));
    Some((index, share))
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
    let used = paragraph_height(text, face, room.size.width) as i32;
    let mut baseline = room.top_left.y + (room.size.height as i32 - used) / 2 + face.ascent_px();
    for line in lines(text, face, room.size.width) {
        draw(canvas, line, Point::new(room.top_left.x, baseline), face, theme.ink, Align::LEFT);
        baseline += face.line_px();
    }
}

fn date_line(canvas: &mut Canvas<'_>, layout: &Layout, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let row = layout.date;
    let mut x = row.top_left.x;
    let middle = row.top_left.y + row.size.height as i32 / 2;
    if let Some(today) = scene.today() {
        if scene.playing {
            let (tall, y) = (f64::from(layout.label.cap_px()) / 2.0, f64::from(middle));
            let left = f64::from(x);
            let tip = Spot::new(left + tall * 1.6, y);
            triangle(canvas, [Spot::new(left, y - tall), tip, Spot::new(left, y + tall)], theme.lack);
            x += (tall * 1.6) as i32 + layout.gap;
        }
        let face = Face::bold(layout.label.px());
        let text = day_short(today, &scene.year, words);
        x += draw(canvas, &text, Point::new(x, middle), face, theme.ink, Align::LEFT.cap_middle()).advance_px as i32;
    }
    if scene.stale {
        // Three dots: the answer on show is the old one, the new one is on its way.
        let radius = f64::from(layout.label.px()) / 8.0;
        for step in 1..=3 {
            let place = f64::from(x) + f64::from(step) * radius * 4.0;
            disc(canvas, Spot::new(place, f64::from(middle)), radius, theme.lack);
        }
        x += (radius * 16.0) as i32;
    }
    let rest = area(x + layout.gap, row.top_left.y, right(row) - x - layout.gap, row.size.height as i32);
    fit(canvas, &year_name(&scene.year, words), rest, layout.label, theme.quiet, Across::Right);
    let line = layout.across(area(row.top_left.x, bottom(row) + layout.gap / 2, row.size.width as i32, 1));
    canvas.fill(line, theme.faint);
}

/// Place and remarks on the left, a mark for every page on the right.
fn footer(canvas: &mut Canvas<'_>, layout: &Layout, scene: &Scene<'_>, view: View, theme: &Theme, words: &Words) {
    let row = layout.footer;
    let face = layout.note;
    let middle = row.top_left.y + row.size.height as i32 / 2;
    let mut end = right(row);
    if layout.form == Form::Wide {
        let wide = page_marks_px(layout);
        page_marks(canvas, layout, Point::new(end - wide, middle), view, theme);
        end -= wide + layout.gap * 2;
    } else {
        // A narrow foot belongs to the place; day and year leave room between them.
        let left = row.top_left.x + (row.size.width as i32 - page_marks_px(layout)) / 2;
        let date = layout.date.top_left.y + layout.date.size.height as i32 / 2;
        page_marks(canvas, layout, Point::new(left, date), view, theme);
    }
    if layout.roomy {
        let name = words.say(&format!("view-{}", view.key()), &[]);
        let wide = measure(&name, face).width as i32;
        draw(canvas, &name, Point::new(end, middle), face, theme.quiet, Align::RIGHT.cap_middle());
        end -= wide + layout.gap * 2;
    }
    let mut remarks = String::new();
    let fitting = match (scene.fitted, scene.facts.old_fit, scene.facts.gauged) {
        (true, true, _) => "picture-fit-old",
        (true, false, _) => "picture-fitted",
        (false, _, Some(false)) => "picture-no-gauge",
        (false, ..) => "picture-not-fitted",
    };
    for (holds, id) in [(scene.invented, "picture-invented"), (true, fitting)] {
        if holds {
            remarks.push_str(DOT);
            remarks.push_str(&words.say(id, &[]));
        }
    }
    let room = (end - row.top_left.x).max(0);
    let taken = measure(&remarks, face).width as i32;
    let name = name_within(scene.place_name, face, (room - taken).max(0) as u32);
    let text = if name.is_empty() { remarks.trim_start_matches(DOT).to_owned() } else { name + &remarks };
    let inside = area(row.top_left.x, row.top_left.y, room, row.size.height as i32);
    fit(canvas, &text, inside, face, theme.quiet, Across::Left);
}

fn mark_px(layout: &Layout) -> i32 {
    let px = i32::from(layout.note.px());
    if layout.form == Form::Wide { (px / 3).max(3) } else { 2 }
}

/// Width of all marks.
fn page_marks_px(layout: &Layout) -> i32 {
    mark_px(layout) * (2 * (View::ALL.len() as i32 - 1) + 3)
}

/// A dot for every page, a bar for this one.
fn page_marks(canvas: &mut Canvas<'_>, layout: &Layout, at: Point, view: View, theme: &Theme) {
    let tall = mark_px(layout);
    let mut x = at.x;
    for page in View::ALL {
        let (wide, colour) = if page == view { (tall * 3, theme.ink) } else { (tall, theme.rule) };
        rounded_box(canvas, area(x, at.y - tall / 2, wide, tall), f64::from(tall) / 2.0, colour);
        x += wide + tall;
    }
}
