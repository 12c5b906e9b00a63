//! A card that lies over a page until it is closed.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::primitives::Rectangle;

use super::foot::note_within;
use super::layout::{Layout, area, bottom};
use super::wording::fit;
use crate::picture::lettering::{Across, Face};
use crate::picture::shape::{rounded_box, rounded_frame};
use crate::picture::{Canvas, Paint, Theme};
use crate::words::Words;

/// Widest card, in sizes of its text.
const WIDEST: i32 = 46;

/// How much of the page behind is veiled, of 255.
const BEHIND: u8 = 170;

/// The boxes of a card.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct CardPlace {
    pub card: Rectangle,
    pub title: Rectangle,
    pub body: Rectangle,
    pub foot: Rectangle,
    pub title_face: Face,
    pad: i32,
}

/// Whether a finger at this place of a screen with a card asks for the next sheet: it is in the right third. Anywhere
/// else it closes the card.
pub fn next_at(size: Size, at: Point) -> bool {
    i64::from(at.x) * 3 >= i64::from(size.width) * 2
}

impl CardPlace {
    /// A card over nearly the whole screen.
    pub fn large(size: Size, layout: &Layout) -> Self {
        let (wide, high) = (size.width as i32, size.height as i32);
        Self::with(
            size,
            layout,
            (wide - layout.margin).min(i32::from(layout.label.px()) * WIDEST),
            high - layout.margin,
        )
    }

    /// A card whose body is `body_high` pixels high, in the middle of the screen.
    pub fn around(size: Size, layout: &Layout, body_high: i32) -> Self {
        let (wide, high) = (size.width as i32, size.height as i32);
        let wide = (wide - layout.margin).min(i32::from(layout.label.px()) * WIDEST);
        let frame = Self::with(size, layout, wide, high - layout.margin);
        let rest = frame.card.size.height as i32 - frame.body.size.height as i32;
        Self::with(size, layout, wide, (rest + body_high).min(high - layout.margin))
    }

    fn with(size: Size, layout: &Layout, wide: i32, high: i32) -> Self {
        let card = area((size.width as i32 - wide) / 2, (size.height as i32 - high) / 2, wide, high);
        let pad = layout.margin + layout.gap / 2;
        let title_face = Face::bold(layout.title.px());
        let (x, inner) = (card.top_left.x + pad, wide - 2 * pad);
        let title = area(x, card.top_left.y + pad / 2 + 1, inner, title_face.line_px());
        let foot_high = layout.note.line_px();
        let foot = area(x, bottom(card) - foot_high - pad / 2, inner, foot_high);
        let top = bottom(title) + layout.gap;
        let body = area(x, top, inner, foot.top_left.y - layout.gap - top);
        Self { card, title, body, foot, title_face, pad }
    }

    /// Draws the card, its title, and at its foot how to go on and where in the list it is.
    pub fn draw(
        &self,
        canvas: &mut Canvas<'_>,
        layout: &Layout,
        title: &str,
        place: (usize, usize),
        theme: &Theme,
        words: &Words,
    ) {
        let id = if place.1 > 1 { "page-card-turn" } else { "page-card-press" };
        self.draw_saying(canvas, layout, title, place, &words.say(id, &[]), theme, words);
    }

    /// The same with `hint` at its foot.
    #[allow(clippy::too_many_arguments, reason = "a card, drawn from two places")]
    pub fn draw_saying(
        &self,
        canvas: &mut Canvas<'_>,
        layout: &Layout,
        title: &str,
        place: (usize, usize),
        hint: &str,
        theme: &Theme,
        words: &Words,
    ) {
        // The page behind steps back.
        canvas.paint(canvas.frame(), Paint::Wash { colour: theme.paper, share: BEHIND });
        let radius = f64::from(self.pad) * 0.8;
        rounded_box(canvas, self.card, radius, theme.card);
        rounded_frame(canvas, self.card, radius, layout.line_px, theme.ink);
        fit(canvas, title, self.title, self.title_face, theme.ink, Across::Left);
        let (open, count) = place;
        let mark = words.say("page-sheet", &[("n", (open + 1).into()), ("of", count.into())]);
        let taken = if count > 1 {
            super::about::sheet_mark(canvas, layout, self.foot, place, theme, words);
            crate::picture::lettering::measure(&mark, layout.note).width as i32 + layout.gap * 2
        } else {
            0
        };
        let left = area(
            self.foot.top_left.x,
            self.foot.top_left.y,
            self.foot.size.width as i32 - taken,
            self.foot.size.height as i32,
        );
        fit(canvas, &note_within(hint, layout.note, left), left, layout.note, theme.quiet, Across::Left);
    }
}
