//! The pages of a lesson, each laid out afresh for the size of the screen.

use embedded_graphics::geometry::{OriginDimensions, Point, Size};
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::axis::{Line, draw_axis, draw_hand, draw_result, under_px};
use super::marks::{Look, draw_group, draw_usual};
use super::openers::{draw_list, draw_start, draw_word};
use super::{Body, Foot, GuessShown, LessonScene, RevealShown, Saying};
use crate::picture::lettering::{Across, SIZES_PX, draw as draw_text, lines, measure, paragraph, paragraph_height};
use crate::picture::shape::{disc, rounded_box, rounded_frame, triangle};
use crate::picture::views::layout::{Form, Layout, area, bottom, right};
use crate::picture::views::wording::fit;
use crate::picture::{Align, Canvas, Face, Spot, Theme};

/// The boxes of a page.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Rooms {
    pub head: Rectangle,
    pub room: Rectangle,
    pub foot: Rectangle,
}

impl Rooms {
    pub fn of(size: Size, layout: &Layout) -> Self {
        let (wide, high) = (size.width as i32, size.height as i32);
        let inner = wide - 2 * layout.margin;
        let head = area(layout.margin, layout.margin / 2, inner, layout.label.line_px());
        let foot_high = foot_px(layout);
        let foot = area(layout.margin, high - foot_high - layout.margin / 2, inner, foot_high);
        let top = bottom(head) + layout.gap * 2;
        let room = area(layout.margin, top, inner, foot.top_left.y - layout.gap - top);
        Self { head, room, foot }
    }
}

/// Draws head, page and foot.
pub(super) fn draw(canvas: &mut Canvas<'_>, layout: &Layout, scene: &LessonScene, theme: &Theme) {
    canvas.fill(canvas.frame(), theme.paper);
    let Rooms { head, room, foot } = Rooms::of(canvas.size(), layout);
    draw_head(canvas, layout, head, scene, theme);
    draw_foot(canvas, layout, foot, &scene.foot, theme);
    match &scene.body {
        Body::List { entries, open } => draw_list(canvas, layout, room, entries, *open, theme),
        Body::Start { about, minutes, ask, groups } => {
            draw_start(canvas, layout, room, (about, minutes, ask, *groups), theme);
        }
        Body::Prompt { prompt, hint } => draw_prompt(canvas, layout, room, prompt, hint, theme),
        Body::Guess(shown) => draw_guess(canvas, layout, room, shown, theme),
        Body::Reveal(shown) => draw_reveal(canvas, layout, room, shown, theme),
        Body::Talk { kicker, prompt, talk } => draw_talk(canvas, layout, room, (kicker, prompt, talk), theme),
        Body::Over { text } => draw_prompt(canvas, layout, room, text, "", theme),
        Body::Word { ask, typed, hand, letters } => {
            draw_word(canvas, layout, room, ask, (typed, *hand, *letters), theme);
        }
    }
}

/// Name and step, and under them a bead for every step.
fn draw_head(canvas: &mut Canvas<'_>, layout: &Layout, row: Rectangle, scene: &LessonScene, theme: &Theme) {
    let face = layout.label;
    let wide = measure(&scene.step, face).width as i32;
    let (x, y, high) = (row.top_left.x, row.top_left.y, row.size.height as i32);
    fit(canvas, &scene.step, area(right(row) - wide, y, wide, high), face, theme.quiet, Across::Right);
    let left = row.size.width as i32 - wide - layout.gap * 2;
    fit(canvas, &scene.title, area(x, y, left, high), Face::bold(face.px()), theme.quiet, Across::Left);
    let line = area(x, bottom(row) + layout.gap / 2, row.size.width as i32, (layout.line_px as i32).max(2));
    canvas.fill(line, theme.faint);
    if let Some((done, all)) = scene.done.filter(|(_, all)| *all > 0) {
        let far = (i64::from(line.size.width) * done.min(all) as i64 / all as i64) as i32;
        canvas.fill(area(x, line.top_left.y, far, line.size.height as i32), theme.ink);
    }
}

fn foot_px(layout: &Layout) -> i32 {
    layout.label.line_px() + layout.gap * 2 + hint_px(layout)
}

/// A small screen says in short what a turn and a press do; a tall one has room for two lines.
fn hint_px(layout: &Layout) -> i32 {
    layout.note.line_px() * if layout.roomy && layout.form == Form::Tall { 2 } else { 1 }
}

/// Where the name of what is at hand stands, right of the first arrow where there are more.
pub(super) fn chip_place(layout: &Layout, row: Rectangle, name: &str, count: usize) -> Rectangle {
    let face = Face::bold(layout.label.px());
    let wide = measure(name, face).width as i32 + layout.gap * 4;
    let arrow = if count > 1 { face.cap_px() * 8 / 5 } else { 0 };
    area(row.top_left.x + arrow, row.top_left.y, wide, layout.label.line_px() + layout.gap)
}

/// What is at hand between two arrows, or a note; under it what a turn and a press do.
fn draw_foot(canvas: &mut Canvas<'_>, layout: &Layout, row: Rectangle, foot: &Foot, theme: &Theme) {
    let (x, y, wide) = (row.top_left.x, row.top_left.y, row.size.width as i32);
    let high = layout.label.line_px() + layout.gap;
    let face = Face::bold(layout.label.px());
    let mut left = x;
    if let Some((name, place, count)) = &foot.choice {
        let arrow = f64::from(face.cap_px());
        let chip = chip_place(layout, row, name, *count);
        rounded_box(canvas, chip, f64::from(high) / 2.0, theme.chosen);
        fit(canvas, name, chip, face, theme.on_chosen, Across::Centre);
        let middle = f64::from(y) + f64::from(high) / 2.0;
        left = right(chip);
        if *count > 1 {
            let mut tip = |at: f64, way: f64| {
                let back = at - way * arrow * 0.8;
                let (up, down) = (middle - arrow * 0.6, middle + arrow * 0.6);
                triangle(canvas, [Spot::new(back, up), Spot::new(at, middle), Spot::new(back, down)], theme.ink);
            };
            tip(f64::from(x), -1.0);
            tip(f64::from(left) + arrow * 1.5, 1.0);
            left += (arrow * 2.2) as i32;
            let radius = (arrow / 5.0).max(1.5);
            for dot in 0..*count {
                let at = Spot::new(f64::from(left) + radius * (2.0 + 3.4 * dot as f64), middle);
                disc(canvas, at, radius, if dot == *place { theme.ink } else { theme.rule });
            }
            left += (radius * (4.0 + 3.4 * *count as f64)) as i32;
        }
    }
    let notes = area(left + layout.gap, y, x + wide - left - layout.gap, high);
    let hint = area(x, y + high + layout.gap / 2, wide, hint_px(layout));
    let mut small = |text: &str, face: Face, ink: Rgb565| {
        let saying = Saying { first: text.to_owned(), second: None };
        write(canvas, &saying, hint, fitted(&saying, hint, face), (ink, ink), false);
    };
    match &foot.note {
        // A note that finds no room beside the choice takes the place of the hint.
        Some(note) if layout.label.fitting(note, notes.size.width, 10).is_none() => {
            small(note, layout.label, theme.lack_ink);
        }
        note => {
            small(if layout.roomy { &foot.hint } else { &foot.hint_short }, layout.note, theme.quiet);
            if let Some(note) = note {
                fit(canvas, note, notes, layout.label, theme.lack_ink, Across::Left);
            }
        }
    }
}

/// Both languages as one text.
fn whole(saying: &Saying) -> String {
    match &saying.second {
        Some(second) => format!("{}\n{second}", saying.first),
        None => saying.first.clone(),
    }
}

/// The largest face up to `largest` in which a saying goes into a box.
pub(super) fn fitted(saying: &Saying, room: Rectangle, largest: Face) -> Face {
    let text = whole(saying);
    let mut face = largest;
    while !fits(&text, face, room) {
        let Some(smaller) = face.smaller() else { break };
        face = smaller;
    }
    face
}

fn fits(text: &str, face: Face, room: Rectangle) -> bool {
    paragraph_height(text, face, room.size.width) <= room.size.height
        && lines(text, face, room.size.width).all(|line| measure(line, face).width <= room.size.width)
}

/// Writes a saying, the second language in its own ink; `centred` puts it level with the middle of the box. Where both
/// languages find no room even in the smallest face, the first is written alone. Gives the row under it.
pub(super) fn write(
    canvas: &mut Canvas<'_>,
    saying: &Saying,
    room: Rectangle,
    face: Face,
    (ink, second_ink): (Rgb565, Rgb565),
    centred: bool,
) -> i32 {
    let alone = Saying { first: saying.first.clone(), second: None };
    let both = fits(&whole(saying), face, room);
    let (saying, face) = if both { (saying, face) } else { (&alone, fitted(&alone, room, face)) };
    let text = whole(saying);
    if !fits(&text, face, room) {
        // Said all the same, with what has no room left out; the strict witness tells.
        paragraph(canvas, &text, room, face, ink, Across::Left);
        return bottom(room);
    }
    let used = paragraph_height(&text, face, room.size.width) as i32;
    let down = if centred { (room.size.height as i32 - used) / 2 } else { 0 };
    let mut baseline = room.top_left.y + down + face.ascent_px();
    for (text, ink) in [(Some(&saying.first), ink), (saying.second.as_ref(), second_ink)] {
        let Some(text) = text else { continue };
        for line in lines(text, face, room.size.width) {
            draw_text(canvas, line, Point::new(room.top_left.x, baseline), face, ink, Align::LEFT);
            baseline += face.line_px();
        }
    }
    room.top_left.y + down + used
}

/// A face of at most so many pixels, for a sentence that the back row must read.
pub(super) fn large(layout: &Layout, times: u8) -> Face {
    let wanted = layout.title.px().saturating_mul(times) / 2;
    Face::bold(SIZES_PX.into_iter().rfind(|px| *px <= wanted).unwrap_or(SIZES_PX[0]))
}

fn draw_prompt(canvas: &mut Canvas<'_>, layout: &Layout, room: Rectangle, prompt: &Saying, hint: &str, theme: &Theme) {
    // A bar at the edge makes a quotation of the question.
    let bar = (layout.gap).max(3);
    let indent = bar + layout.gap * 3;
    let hint_high = if hint.is_empty() { 0 } else { layout.label.line_px() * 2 + layout.gap };
    let text = area(
        room.top_left.x + indent,
        room.top_left.y,
        room.size.width as i32 - indent,
        room.size.height as i32 - hint_high,
    );
    let face = fitted(prompt, text, large(layout, 3));
    let used = paragraph_height(&whole(prompt), face, text.size.width) as i32;
    let top = text.top_left.y + (text.size.height as i32 - used).max(0) / 2;
    canvas.fill(area(room.top_left.x, top, bar, used.min(text.size.height as i32)), theme.lack);
    write(canvas, prompt, text, face, (theme.ink, theme.quiet), true);
    if !hint.is_empty() {
        let place = area(text.top_left.x, bottom(text) + layout.gap, text.size.width as i32, hint_high - layout.gap);
        let saying = Saying { first: hint.to_owned(), second: None };
        write(canvas, &saying, place, fitted(&saying, place, layout.label), (theme.water_ink, theme.quiet), false);
    }
}

/// Radius of a group's mark and the face of its letter: larger where few groups share the axis.
pub(super) fn mark(layout: &Layout, groups: usize) -> (f64, Face) {
    let px = u16::from(layout.label.px());
    let px = match (groups, layout.form) {
        (7.., _) | (_, Form::Narrow) => px,
        _ if layout.roomy => px * 3 / 2,
        _ => px * 5 / 4,
    };
    let face = Face::bold(px.min(255) as u8);
    (f64::from(face.px()) * 0.72, face)
}

/// The line along which a guess is moved.
pub(super) fn guess_line(layout: &Layout, room: Rectangle, shown: &GuessShown) -> Line {
    let (radius, _) = mark(layout, shown.is_in.len());
    let groups_top = bottom(room) - (radius * 2.6) as i32;
    Line::across(room, radius, groups_top - layout.gap - under_px(layout, &shown.axis, room.size.width))
}

fn draw_guess(canvas: &mut Canvas<'_>, layout: &Layout, room: Rectangle, shown: &GuessShown, theme: &Theme) {
    let (radius, face) = mark(layout, shown.is_in.len());
    let (x, wide) = (room.top_left.x, room.size.width as i32);
    let groups_high = (radius * 2.6) as i32;
    let groups = area(x, bottom(room) - groups_high, wide, groups_high);
    let line = guess_line(layout, room, shown);
    let line_y = line.y;
    draw_axis(canvas, layout, room, line, &shown.axis, theme);
    let pin_top = line_y - (radius * 3.8) as i32;
    let rest = pin_top - room.top_left.y;
    // The guess stands large over its pin; the question keeps what is left.
    let figure = figure_within(Face::bold(layout.figure.px()), rest * 2 / 5);
    let name_high = layout.label.line_px();
    let value_high = figure.line_px() + name_high;
    let prompt_room = area(x, room.top_left.y, wide, rest - value_high - layout.gap);
    let prompt_face = fitted(&shown.prompt, prompt_room, large(layout, 2));
    write(canvas, &shown.prompt, prompt_room, prompt_face, (theme.ink, theme.quiet), false);
    if let Some(hand) = shown.hand {
        let top = pin_top - value_high - layout.gap / 2;
        let value_face = figure.fitting(&shown.value, room.size.width, 9).unwrap_or(figure);
        let widest = measure(&shown.value, value_face).width.max(measure(&shown.group_name, layout.label).width) as i32;
        let left = (libm::round(line.x(hand)) as i32 - widest / 2).min(right(room) - widest).max(x);
        let name = area(left, top, widest, name_high);
        fit(canvas, &shown.group_name, name, layout.label, theme.lack_ink, Across::Centre);
        let value = area(left, top + name_high, widest, figure.line_px());
        fit(canvas, &shown.value, value, value_face, theme.ink, Across::Centre);
        draw_hand(canvas, line, shown.group, hand, radius, face, theme);
    }
    draw_groups(canvas, groups, shown, (radius, face), theme);
}

pub(super) fn figure_within(face: Face, high: i32) -> Face {
    let mut face = face;
    while face.ascent_px() + face.descent_px() > high {
        let Some(smaller) = face.smaller() else { break };
        face = smaller;
    }
    face
}

/// A mark for every group: full where its guess is in.
fn draw_groups(
    canvas: &mut Canvas<'_>,
    row: Rectangle,
    shown: &GuessShown,
    (radius, face): (f64, Face),
    theme: &Theme,
) {
    let count = shown.is_in.len().max(1) as f64;
    let apart = (f64::from(row.size.width) / count).min(radius * 3.4);
    let left = f64::from(row.top_left.x) + (f64::from(row.size.width) - apart * count) / 2.0;
    let y = f64::from(row.top_left.y) + f64::from(row.size.height) / 2.0;
    let radius = radius.min(apart / 2.5);
    let face = Face::bold(face.px().min((radius * 1.4) as u8));
    for (group, is_in) in shown.is_in.iter().enumerate() {
        let middle = Spot::new(left + apart * (group as f64 + 0.5), y);
        let look = match is_in {
            true => Look::Full,
            false if shown.hand.is_some() && group == usize::from(shown.group) => Look::AtHand,
            false => Look::Empty,
        };
        draw_group(canvas, group as u8, middle, radius, look, face, theme);
    }
}

fn draw_reveal(canvas: &mut Canvas<'_>, layout: &Layout, room: Rectangle, shown: &RevealShown, theme: &Theme) {
    let (radius, face) = mark(layout, shown.guesses.len());
    let (x, wide, high) = (room.top_left.x, room.size.width as i32, room.size.height as i32);
    // What is said under the axis: the guesses in a sentence, and what most people say.
    let verdict = Saying { first: shown.verdict.clone(), second: None };
    let verdict_wide = wide as u32;
    let lines_of = |face: Face| lines(&shown.verdict, face, verdict_wide).count() as i32;
    let verdict_face = if lines_of(layout.label) > 2 { layout.note } else { layout.label };
    let verdict_high = verdict_face.line_px() * lines_of(verdict_face).min(2);
    let usual_high = if shown.usual.is_some() { layout.label.line_px() } else { 0 };
    let below = area(x, bottom(room) - verdict_high - usual_high, wide, verdict_high + usual_high);
    let line_y = below.top_left.y - layout.gap / 2 - under_px(layout, &shown.axis, room.size.width);
    let line = Line::across(room, radius, line_y);
    let result_face = figure_within(Face::bold(layout.figure.px()), high / 7);
    let chip_high = result_face.line_px() + layout.gap;
    // The guesses have two rows where the sentence leaves room for them, and one at least.
    let free = line_y - chip_high - layout.gap * 2 - room.top_left.y;
    let needed = paragraph_height(&shown.reveal.first, Face::bold(9), room.size.width) as i32;
    let head_high = (free - (radius * 6.0) as i32).max(needed.min(free - (radius * 3.4) as i32));
    let most = layout.title.line_px() * if shown.reveal.second.is_some() { 5 } else { 3 };
    let head = area(x, room.top_left.y, wide, head_high.min(most.max(needed)));
    let face_head = fitted(&shown.reveal, head, large(layout, 2));
    let end = write(canvas, &shown.reveal, head, face_head, (theme.ink, theme.quiet), false);
    // The result in large figures, on the ground of water, which its line shares.
    let says_wide = measure(&shown.says, layout.label).width as i32;
    let inset = layout.gap * 7;
    let result_face = result_face.fitting(&shown.result_text, (wide - says_wide - inset).max(0) as u32, 9);
    let result_face = result_face.unwrap_or(Face::bold(9));
    let text_wide = measure(&shown.result_text, result_face).width as i32;
    let chip = area(x, end + layout.gap, (says_wide + text_wide + inset).min(wide), chip_high);
    rounded_box(canvas, chip, f64::from(layout.gap) * 1.2, theme.water);
    let inside = area(x + layout.gap * 2, chip.top_left.y, says_wide, chip_high);
    fit(canvas, &shown.says, inside, layout.label, theme.on_water, Across::Left);
    let left = right(inside) + layout.gap * 3;
    let value = area(left, chip.top_left.y, right(chip) - left - layout.gap, chip_high);
    fit(canvas, &shown.result_text, value, result_face, theme.on_water, Across::Left);
    let top = bottom(chip) + layout.gap;
    draw_result(canvas, layout, area(x, top, wide, line_y - top), line, shown, (radius, face), theme);
    draw_axis(canvas, layout, room, line, &shown.axis, theme);
    let mut y = below.top_left.y;
    write(canvas, &verdict, area(x, y, wide, verdict_high), verdict_face, (theme.ink, theme.ink), false);
    y += verdict_high;
    if let Some((_, text)) = &shown.usual {
        let mark = layout.label.cap_px();
        let middle = Spot::new(f64::from(x + mark / 2 + 1), f64::from(y + usual_high / 2));
        draw_usual(canvas, middle, f64::from(mark) / 2.0, theme);
        let place = area(x + mark + layout.gap * 2, y, wide - mark - layout.gap * 2, usual_high);
        fit(canvas, text, place, layout.label, theme.quiet, Across::Left);
    }
}

fn draw_talk(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    (kicker, prompt, talk): (&str, &str, &Saying),
    theme: &Theme,
) {
    let (x, wide) = (room.top_left.x, room.size.width as i32);
    let face = layout.label;
    let chip_wide = measure(kicker, face).width as i32 + layout.gap * 3;
    let chip = area(x, room.top_left.y, chip_wide.min(wide), face.line_px() + layout.gap / 2);
    rounded_frame(canvas, chip, f64::from(layout.gap), layout.line_px.max(1.0), theme.quiet);
    fit(canvas, kicker, chip, face, theme.quiet, Across::Centre);
    let mut top = bottom(chip) + layout.gap;
    if layout.roomy {
        let asked = Saying { first: prompt.to_owned(), second: None };
        let place = area(x, top, wide, face.line_px() * 2);
        top = write(canvas, &asked, place, fitted(&asked, place, face), (theme.quiet, theme.quiet), false)
            + layout.gap * 2;
    }
    let text = area(x, top, wide, bottom(room) - top);
    let largest = Face::regular(layout.title.px());
    write(canvas, talk, text, fitted(talk, text, largest), (theme.ink, theme.quiet), false);
}
