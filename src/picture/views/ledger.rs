//! Where every drop of the chosen year went: what comes in runs together to one stream and parts again into what goes
//! out, each as wide as its water.

pub(crate) mod entries;
mod slots;

use embedded_graphics::geometry::Point;
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use self::entries::{Entry, Look, entries_in, entries_out, merge_smallest, within};
use self::slots::{Slots, scale_of};
use super::layout::{Form, Layout, area, bottom, right};
use super::page_answer::{PageAnswer, ledger_of};
use super::scene::Scene;
use super::sheets::line_box;
use super::wording::{DOT, fit};
use super::{Answer, View, frame, layout_of};
use crate::picture::area::{Between, between};
use crate::picture::chart::as_it_was;
use crate::picture::lettering::{Across, Face, draw_in, measure};
use crate::picture::line::segment;
use crate::picture::{Align, Canvas, Paint, Spot, Theme, lettering};
use crate::water::ledger::Ledger;
use crate::water::units::M3_PER_HM3;
use crate::words::{Quantity, Unit, Words};

/// Pieces of the curve of a branch.
const CURVE_STEPS: usize = 16;

/// Faces, unit and columns of the page.
struct Sheet {
    face: Face,
    strong: Face,
    unit: Unit,
    /// Left column: names and amounts of what comes in; no width where there is no room for it.
    left: Rectangle,
    /// The stream.
    stream: Rectangle,
    /// Right column: names of what goes out.
    names: Rectangle,
    /// Amounts with your changes.
    now: Rectangle,
    /// Amounts as it was; no width where nothing is turned.
    was: Rectangle,
    /// Whether an entry on the left has its amount on a second line.
    two_lines: bool,
}

/// Draws the page.
pub fn draw(canvas: &mut Canvas<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let layout = layout_of(canvas, scene);
    let answer = Answer::Page(PageAnswer::ledger(scene));
    frame::draw_frame(canvas, &layout, scene, View::Ledger, &answer, theme, words);
    let (Some(now), Some(was)) = (ledger_of(&scene.now), ledger_of(&scene.was)) else { return };
    let room = layout.content;
    let foot_high = layout.label.line_px();
    let head_high = layout.label.line_px();
    let feet = if layout.roomy { 2 } else { 1 };
    let body = area(
        room.top_left.x,
        room.top_left.y + head_high,
        room.size.width as i32,
        room.size.height as i32 - head_high - feet * foot_high - layout.gap,
    );
    let (mut ins, mut outs) = (entries_in(now, was), entries_out(now, was));
    let larger = Face::regular(layout.label.px() + layout.label.px() / 3);
    let airy = layout.form == Form::Wide && rows_in(body, larger) >= outs.len() * 3 / 2;
    let faces = [larger, layout.label, layout.note].into_iter().skip(usize::from(!airy));
    let face = faces.into_iter().find(|face| rows_in(body, *face) >= outs.len());
    let face = face.unwrap_or(layout.note);
    merge_smallest(&mut outs, rows_in(body, face), Look::Ground);
    merge_smallest(&mut ins, rows_in(body, face), Look::Rain);
    let sheet = sheet_with_names(&layout, body, face, &mut ins, &outs, scene, words);
    let row = f64::from(face.line_px());
    let left_row = if sheet.two_lines { row * 2.0 } else { row };
    let high = f64::from(body.size.height);
    let amounts = |entries: &[Entry]| entries.iter().map(|entry| entry.now_m3).collect::<Vec<f64>>();
    let (in_m3, out_m3) = (amounts(&ins), amounts(&outs));
    let gap = f64::from(layout.gap);
    let scale = scale_of(&in_m3, left_row, gap, high).min(scale_of(&out_m3, row, gap, high));
    let top = f64::from(body.top_left.y);
    let left = Slots::new(&in_m3, scale, left_row, gap, top, high);
    let right_slots = Slots::new(&out_m3, scale, row, gap, top, high);
    let snow_share = scene.now.signs().and_then(|signs| signs.snow_share).unwrap_or(0.0);
    draw_stream(canvas, &sheet, (&ins, &left), (&outs, &right_slots), snow_share, theme);
    head(canvas, &layout, &sheet, head_high, (now, was), scene, theme, words);
    if sheet.left.size.width > 0 {
        for (entry, middle) in ins.iter().zip(&left.middles) {
            in_words(canvas, &sheet, entry, *middle, theme, words);
        }
    }
    for (entry, middle) in outs.iter().zip(&right_slots.middles) {
        out_words(canvas, &layout, &sheet, entry, *middle, scale, scene, theme, words);
    }
    let foot = area(room.top_left.x, bottom(room) - foot_high, room.size.width as i32, foot_high);
    draw_foot(canvas, &layout, foot, now, scene, theme, words);
}

fn rows_in(body: Rectangle, face: Face) -> usize {
    (body.size.height as i32 / face.line_px()).max(1) as usize
}

fn amount(value_m3: f64, unit: Unit, words: &Words) -> String {
    words.significant(unit.convert(value_m3 / M3_PER_HM3), 3)
}

/// The columns with room for the names of what comes in: each above its amount where that leaves the stream its width,
/// else beside it, else above it after all, the smallest joined where there are too many.
fn sheet_with_names(
    layout: &Layout,
    body: Rectangle,
    face: Face,
    ins: &mut Vec<Entry>,
    outs: &[Entry],
    scene: &Scene<'_>,
    words: &Words,
) -> Sheet {
    let high = body.size.height as i32;
    let needed = ins.len() as i32 * face.line_px() * 2;
    for (two_lines, fits) in [(true, needed * 5 <= high * 3), (false, true), (true, needed <= high)] {
        let sheet = sheet_of(layout, body, face, (ins, outs), two_lines, scene, words);
        if fits && sheet.left.size.width > 0 {
            return sheet;
        }
    }
    let mut joined = ins.clone();
    merge_smallest(&mut joined, rows_in(body, face) / 2, Look::Rain);
    let sheet = sheet_of(layout, body, face, (&joined, outs), true, scene, words);
    if sheet.left.size.width > 0 && joined.len() as i32 * face.line_px() * 2 <= high {
        *ins = joined;
        return sheet;
    }
    sheet_of(layout, body, face, (&[], outs), false, scene, words)
}

fn sheet_of(
    layout: &Layout,
    body: Rectangle,
    face: Face,
    (ins, outs): (&[Entry], &[Entry]),
    two_lines: bool,
    scene: &Scene<'_>,
    words: &Words,
) -> Sheet {
    let strong = Face::bold(face.px());
    let unit = words.unit_of(Quantity::StoredVolume, scene.units);
    let wide = |text: &str, face: Face| measure(text, face).width as i32;
    let widest = |texts: &mut dyn Iterator<Item = i32>| texts.max().unwrap_or(0);
    let name = |entry: &Entry| wide(&words.say(entry.id, &[]), face);
    let names = widest(&mut outs.iter().map(name));
    let head = |id: &str| wide(&words.say(id, &[]), layout.note);
    let column = |value: fn(&Entry) -> f64, face: Face| {
        widest(&mut outs.iter().map(|entry| wide(&amount(value(entry), unit, words), face)))
    };
    let now = column(|entry| entry.now_m3, strong).max(head("page-now"));
    let was = if scene.changed() { column(|entry| entry.was_m3, face).max(head("page-was")) } else { 0 };
    let gap = layout.gap * 2;
    let left_name = widest(&mut ins.iter().map(name));
    let left_amount = widest(&mut ins.iter().map(|entry| wide(&amount(entry.now_m3, unit, words), strong)));
    let mut left = if two_lines { left_name.max(left_amount) } else { left_name + layout.gap + left_amount };
    let whole = body.size.width as i32;
    let right_side = names + gap + now + if was > 0 { gap + was } else { 0 };
    let least_stream = i32::from(layout.label.px()) * 4;
    if ins.is_empty() || layout.form != Form::Wide || left + right_side + 2 * gap + least_stream > whole {
        left = 0;
    }
    let (x, y, high) = (body.top_left.x, body.top_left.y, body.size.height as i32);
    let end = x + whole;
    let was_area = area(end - was, y, was, high);
    let now_area = area(end - was - if was > 0 { gap } else { 0 } - now, y, now, high);
    let names_area = area(now_area.top_left.x - gap - names, y, names, high);
    let stream_left = if left > 0 { x + left + gap } else { x };
    let stream = area(stream_left, y, names_area.top_left.x - gap * 2 - stream_left, high);
    Sheet {
        face,
        strong,
        unit,
        left: area(x, y, left, high),
        stream,
        names: names_area,
        now: now_area,
        was: was_area,
        two_lines,
    }
}

impl Look {
    fn paints(self, theme: &Theme) -> (Paint, Option<Paint>) {
        match self {
            Self::Rain | Self::River => (theme.water.into(), None),
            Self::Store => (theme.water_pale.into(), None),
            Self::Air => (theme.faint.into(), Some(theme.range_hatch())),
            Self::Crop => (theme.crop.into(), None),
            Self::Town => (theme.town.into(), None),
            Self::Ground => (theme.rock_far.into(), None),
        }
    }
}

/// A branch between two places, `thick` wide at both ends, easing in and out.
fn branch(canvas: &mut Canvas<'_>, from: Spot, to: Spot, thick: f64, paint: Paint) {
    let half = thick.max(1.0) / 2.0;
    let course = move |side: f64| {
        (0..=CURVE_STEPS).map(move |step| {
            let share = step as f64 / CURVE_STEPS as f64;
            let eased = share * share * (3.0 - 2.0 * share);
            Spot::new(from.x + (to.x - from.x) * share, from.y + (to.y - from.y) * eased + side * half)
        })
    };
    between(canvas, course(-1.0), course(1.0), Between::Either, paint);
}

/// The branches of what comes in, the stream where all of it is together, the branches of what goes out.
fn draw_stream(
    canvas: &mut Canvas<'_>,
    sheet: &Sheet,
    (ins, left): (&[Entry], &Slots),
    (outs, right_slots): (&[Entry], &Slots),
    snow_share: f64,
    theme: &Theme,
) {
    let room = sheet.stream;
    let (from, to) = (f64::from(room.top_left.x), f64::from(right(room)));
    let trunk = (from + (to - from) * 0.40, from + (to - from) * 0.48);
    for ((entry, middle), (thick, in_trunk)) in
        ins.iter().zip(&left.middles).zip(left.widths.iter().zip(left.trunk_middles()))
    {
        let (paint, hatch) = entry.look.paints(theme);
        let (start, end) = (Spot::new(from, *middle), Spot::new(trunk.0, in_trunk));
        branch(canvas, start, end, *thick, paint);
        if let Some(hatch) = hatch {
            branch(canvas, start, end, *thick, hatch);
        }
        if entry.look == Look::Rain && entry.has_snow && snow_share > 0.0 {
            // Its upper part fell as snow.
            let snow = *thick * snow_share.min(1.0);
            let lift = (snow - *thick) / 2.0;
            let (start, end) = (Spot::new(start.x, start.y + lift), Spot::new(end.x, end.y + lift));
            branch(canvas, start, end, snow, theme.snow.into());
            branch(canvas, start, end, snow, theme.snow_hatch());
        }
    }
    for ((entry, middle), (thick, in_trunk)) in
        outs.iter().zip(&right_slots.middles).zip(right_slots.widths.iter().zip(right_slots.trunk_middles()))
    {
        let (paint, hatch) = entry.look.paints(theme);
        let (start, end) = (Spot::new(trunk.1, in_trunk), Spot::new(to, *middle));
        branch(canvas, start, end, *thick, paint);
        if let Some(hatch) = hatch {
            branch(canvas, start, end, *thick, hatch);
        }
    }
    let (top, low) = left.trunk();
    let (top, low) = (libm::floor(top) as i32, libm::ceil(low) as i32);
    let wide = (trunk.1 - trunk.0) as i32 + 2;
    canvas.fill(area(trunk.0 as i32, top, wide, low - top), theme.water);
}

/// What came in altogether, and the names of the columns with their unit.
#[allow(clippy::too_many_arguments, reason = "one line, drawn once from one place")]
fn head(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    sheet: &Sheet,
    high: i32,
    (now, was): (&Ledger, &Ledger),
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let y = layout.content.top_left.y;
    let changed = scene.changed();
    let total = |ledger: &Ledger| words.amount(sheet.unit.convert(ledger.in_m3() / M3_PER_HM3), sheet.unit, 3);
    let mut text = words.say("page-ledger-in", &[("amount", total(now).into())]);
    let columns_left = sheet.now.top_left.x - layout.gap * 2;
    let x = layout.content.top_left.x;
    let with_was = format!("{text}{DOT}{}", words.say("picture-was", &[("value", total(was).into())]));
    if changed && measure(&with_was, layout.note).width as i32 <= columns_left - x {
        text = with_was;
    }
    let face = if changed { layout.note } else { layout.label };
    if measure(&text, Face::regular(9)).width as i32 > columns_left - x {
        text = total(now);
    }
    fit(canvas, &text, area(x, y, columns_left - x, high), face, theme.ink, Across::Left);
    if changed {
        let column = |column: Rectangle| area(column.top_left.x, y, column.size.width as i32, high);
        fit(canvas, &words.say("page-now", &[]), column(sheet.now), layout.note, theme.ink, Across::Right);
        fit(canvas, &words.say("page-was", &[]), column(sheet.was), layout.note, theme.quiet, Across::Right);
    } else {
        let unit = words.unit(Quantity::StoredVolume, scene.units);
        let at = Point::new(right(sheet.now), y + high / 2);
        lettering::draw(canvas, &unit, at, layout.note, theme.quiet, Align::RIGHT.cap_middle());
    }
}

/// Name and amount of what comes in, level with its branch.
fn in_words(canvas: &mut Canvas<'_>, sheet: &Sheet, entry: &Entry, middle: f64, theme: &Theme, words: &Words) {
    let line = sheet.face.line_px();
    let (x, wide) = (sheet.left.top_left.x, sheet.left.size.width as i32);
    let name = words.say(entry.id, &[]);
    let text = amount(entry.now_m3, sheet.unit, words);
    let middle = libm::round(middle) as i32;
    if sheet.two_lines {
        draw_in(canvas, &name, line_box(x, middle - line, wide, sheet.face), sheet.face, theme.quiet, Across::Left);
        draw_in(canvas, &text, line_box(x, middle, wide, sheet.strong), sheet.strong, theme.ink, Across::Left);
    } else {
        let row = line_box(x, middle - line / 2, wide, sheet.face);
        draw_in(canvas, &name, row, sheet.face, theme.quiet, Across::Left);
        draw_in(canvas, &text, row, sheet.strong, theme.ink, Across::Right);
    }
}

/// Name and amounts of what goes out, and a dashed upright line as high as its branch was wide.
#[allow(clippy::too_many_arguments, reason = "one line, drawn once from one place")]
fn out_words(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    sheet: &Sheet,
    entry: &Entry,
    middle: f64,
    scale: f64,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let line = sheet.face.line_px();
    let top = libm::round(middle) as i32 - line / 2;
    let row = |column: Rectangle| line_box(column.top_left.x, top, column.size.width as i32, sheet.face);
    draw_in(canvas, &words.say(entry.id, &[]), row(sheet.names), sheet.face, theme.ink, Across::Left);
    let ink = name_ink(entry.look, theme);
    let now = amount(entry.now_m3, sheet.unit, words);
    draw_in(canvas, &now, row(sheet.now), sheet.strong, ink, Across::Right);
    if scene.changed() {
        let was = amount(entry.was_m3, sheet.unit, words);
        draw_in(canvas, &was, row(sheet.was), sheet.face, theme.quiet, Across::Right);
        let half = (entry.was_m3 * scale).max(1.0) / 2.0;
        let x = f64::from(right(sheet.stream)) + f64::from(layout.gap);
        let (from, to) = (Spot::new(x, middle - half), Spot::new(x, middle + half));
        let body = (f64::from(sheet.stream.top_left.y), f64::from(bottom(sheet.stream)));
        let (from, to) = (Spot::new(x, from.y.max(body.0)), Spot::new(x, to.y.min(body.1)));
        segment(canvas, from, to, as_it_was(layout.line_px), theme.ink);
    }
}

fn name_ink(look: Look, theme: &Theme) -> Rgb565 {
    match look {
        Look::River | Look::Store => theme.water_ink,
        Look::Crop => theme.crop_ink,
        _ => theme.ink,
    }
}

/// What is not accounted for; where there is room, what went through the works on its way.
fn draw_foot(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    foot: Rectangle,
    ledger: &Ledger,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let unit = words.unit_of(Quantity::StoredVolume, scene.units);
    let written = |value_m3: f64| words.amount(unit.convert(value_m3 / M3_PER_HM3), unit, 3);
    let rest = words.say("page-ledger-residual", &[("amount", written(ledger.residual_m3()).into())]);
    fit(canvas, &rest, foot, layout.label, theme.ink, Across::Left);
    if !layout.roomy {
        return;
    }
    let mut text = words.say("ledger-inside", &[]);
    text.push_str(": ");
    for (index, (id, value_m3)) in within(ledger).into_iter().enumerate() {
        if index > 0 {
            text.push_str(DOT);
        }
        text.push_str(&words.say(id, &[]));
        text.push(' ');
        text.push_str(&written(value_m3));
    }
    let above = area(
        foot.top_left.x,
        foot.top_left.y - foot.size.height as i32,
        foot.size.width as i32,
        foot.size.height as i32,
    );
    fit(canvas, &text, above, layout.label, theme.quiet, Across::Left);
}
