//! The strip under a view while a lesson looks at it: what the room was asked, and how to go on.

use embedded_graphics::geometry::{Point, Size};

use super::Saying;
use super::pages::{fitted, write};
use crate::picture::lettering::{draw as draw_text, measure};
use crate::picture::views::layout::{Layout, area, right};
use crate::picture::{Align, Canvas, Face, Theme};

/// How many pixels at the foot of a screen the strip takes; nothing on a screen too small for it.
pub fn strip_px(size: Size, two_languages: bool) -> u32 {
    let layout = Layout::of(size, false);
    if size.height < 240 {
        return 0;
    }
    let lines = if two_languages { 4 } else { 2 };
    (layout.label.line_px() * lines + layout.gap * 2) as u32
}

/// Draws the strip over a whole canvas of its own: the sentence, and the step at the right.
pub fn draw_strip(canvas: &mut Canvas<'_>, screen: Size, saying: &Saying, step: &str, theme: &Theme) {
    let layout = Layout::of(screen, false);
    let whole = canvas.frame();
    canvas.fill(whole, theme.chosen);
    let note = layout.note;
    let wide = measure(step, note).width as i32;
    let (gap, margin) = (layout.gap, layout.margin);
    let high = whole.size.height as i32;
    draw_text(
        canvas,
        step,
        Point::new(right(whole) - margin, high / 2),
        note,
        theme.on_chosen,
        Align::RIGHT.cap_middle(),
    );
    let room = area(margin, gap / 2, whole.size.width as i32 - 2 * margin - wide - gap * 2, high - gap);
    let face = fitted(saying, room, Face::bold(layout.strong.px()));
    write(canvas, saying, room, face, (theme.on_chosen, theme.on_chosen), true);
}
