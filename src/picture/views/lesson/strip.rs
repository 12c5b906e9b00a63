//! The strip under a view while a lesson looks at it: what the room was asked, and how to go on.

use embedded_graphics::geometry::{Point, Size};

use super::Saying;
use super::pages::{fitted, write};
use crate::picture::lettering::{Across, draw as draw_text, measure};
use crate::picture::views::layout::{Layout, area, right};
use crate::picture::views::wording::fit;
use crate::picture::{Align, Canvas, Face, Theme};

/// How many pixels at the foot of a screen the strip takes; nothing on a screen too small for it.
pub fn strip_px(size: Size, two_languages: bool) -> u32 {
    let layout = Layout::of(size, false);
    if size.height < 240 {
        return 0;
    }
    let lines = match (two_languages, layout.roomy) {
        // Where views say their answer twice already, a small screen keeps the step and how to go on.
        (true, _) if size.height < 440 => 1,
        (true, _) => 4,
        (false, true) => 2,
        (false, false) => 3,
    };
    (layout.label.line_px() * lines + layout.gap * 2) as u32
}

/// Draws the strip over a whole canvas of its own: the sentence, at the right the step, and how to go on.
pub fn draw_strip(canvas: &mut Canvas<'_>, screen: Size, saying: &Saying, (step, hint): (&str, &str), theme: &Theme) {
    let layout = Layout::of(screen, false);
    let whole = canvas.frame();
    canvas.fill(whole, theme.chosen);
    let note = layout.note;
    if whole.size.height < 2 * layout.label.line_px() as u32 {
        let row = area(layout.margin, 0, whole.size.width as i32 - 2 * layout.margin, whole.size.height as i32);
        draw_text(
            canvas,
            step,
            Point::new(layout.margin, row.size.height as i32 / 2),
            note,
            theme.on_chosen,
            Align::LEFT.cap_middle(),
        );
        fit(canvas, hint, row, note, theme.on_chosen, Across::Right);
        return;
    }
    let high = whole.size.height as i32;
    if !layout.roomy {
        // A small screen gives all of it to the sentence; the foot of the view says how to go on.
        let room = area(layout.margin, layout.gap / 2, whole.size.width as i32 - 2 * layout.margin, high - layout.gap);
        let face = fitted(saying, room, Face::regular(layout.label.px()));
        write(canvas, saying, room, face, (theme.on_chosen, theme.on_chosen), true);
        return;
    }
    let wide = measure(step, note).width.max(measure(hint, note).width) as i32;
    let (gap, margin) = (layout.gap, layout.margin);
    let (middle, end) = (whole.size.height as i32 / 2, right(whole) - margin);
    let apart = note.line_px() / 2;
    for (text, y) in [(step, middle - apart), (hint, middle + apart)] {
        draw_text(canvas, text, Point::new(end, y), note, theme.on_chosen, Align::RIGHT.cap_middle());
    }
    let room = area(margin, gap / 2, whole.size.width as i32 - 2 * margin - wide - gap * 2, high - gap);
    let face = fitted(saying, room, Face::bold(layout.strong.px()));
    write(canvas, saying, room, face, (theme.on_chosen, theme.on_chosen), true);
}
