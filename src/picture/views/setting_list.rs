//! The list of settings over a page: the droughts, one's own, save and forget; under it what the open entry is.

use embedded_graphics::geometry::{OriginDimensions, Point, Size};
use embedded_graphics::primitives::Rectangle;

use super::card::CardPlace;
use super::layout::{Layout, area, bottom, right};
use super::wording::fit;
use crate::picture::lettering::{Across, Face, paragraph_height};
use crate::picture::shape::{rounded_box, triangle};
use crate::picture::{Canvas, Spot, Theme};
use crate::words::Words;

/// One entry, in words.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct SettingLine {
    /// Its name, in one language or two.
    pub name: String,
    /// What it is, in one language or two, one line feed between them; may be empty.
    pub text: String,
}

/// The list as it stands.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SettingList<'a> {
    /// Every entry.
    pub lines: &'a [SettingLine],
    /// The one at hand, counted from 0.
    pub open: usize,
}

/// The boxes of the list.
struct Parts {
    card: CardPlace,
    rows: Rectangle,
    row_high: i32,
    /// The first entry that is shown, and how many are.
    first: usize,
    shown: usize,
    text: Rectangle,
    face: Face,
    text_face: Face,
}

/// So many rows are shown at least, before the text under them is set smaller.
const LEAST_ROWS: usize = 4;

impl Parts {
    fn of(size: Size, list: &SettingList<'_>) -> Self {
        let layout = Layout::of(size, false);
        let most = CardPlace::large(size, &layout).body;
        let count = list.lines.len().max(1);
        // Room for the longest text of any entry, so that rows stay where they are while the hand turns.
        let longest = |face: Face| {
            let heights = list.lines.iter().map(|line| match line.text.as_str() {
                "" => 0,
                text => paragraph_height(text, face, most.size.width) as i32,
            });
            heights.max().unwrap_or(0) + layout.gap * 2
        };
        let row = |face: Face| face.line_px() + layout.gap;
        let (high, least_rows) = (most.size.height as i32, count.min(LEAST_ROWS) as i32);
        // As large as all of it fits; where it never does, rows go first and then the text grows small.
        let mut face = Face::regular(layout.label.px() + layout.label.px() / 2);
        let fits_all = |face: Face| count as i32 * row(face) + longest(face) <= high;
        while face.px() > layout.label.px() && !fits_all(face) {
            face = face.smaller().unwrap_or(layout.label);
        }
        let mut text_face = face;
        while least_rows * row(face) + longest(text_face) > high {
            let Some(smaller) = text_face.smaller() else { break };
            text_face = smaller;
        }
        let row_high = row(face);
        let text_high = longest(text_face).min(high - row_high);
        let shown = (((high - text_high) / row_high).max(1) as usize).min(count);
        let card = CardPlace::around(size, &layout, row_high * shown as i32 + text_high);
        let room = card.body;
        let first = list.open.saturating_sub(shown / 2).min(count - shown);
        let rows = area(room.top_left.x, room.top_left.y, room.size.width as i32, row_high * shown as i32);
        let text_top = bottom(rows) + layout.gap;
        let text = area(room.top_left.x, text_top, room.size.width as i32, text_high - layout.gap);
        Self { card, rows, row_high, first, shown, text, face, text_face }
    }

    fn row(&self, entry: usize) -> Rectangle {
        let y = self.rows.top_left.y + (entry - self.first) as i32 * self.row_high;
        area(self.rows.top_left.x, y, self.rows.size.width as i32, self.row_high)
    }

    fn entries(&self, count: usize) -> core::ops::Range<usize> {
        self.first..(self.first + self.shown).min(count)
    }
}

/// Draws the list over what is there.
pub fn draw(canvas: &mut Canvas<'_>, list: &SettingList<'_>, note: &str, theme: &Theme, words: &Words) {
    let (size, count) = (canvas.size(), list.lines.len());
    let layout = Layout::of(size, false);
    let parts = Parts::of(size, list);
    let title = words.say("setting-title", &[]);
    let hint = if note.is_empty() { words.say("setting-hint", &[]) } else { note.to_owned() };
    parts.card.draw_saying(canvas, &layout, &title, (list.open, count), &hint, theme, words);
    for entry in parts.entries(count) {
        let row = parts.row(entry);
        let open = entry == list.open;
        if open {
            rounded_box(canvas, row, f64::from(layout.gap), theme.chosen);
        }
        let (face, ink) = if open { (Face::bold(parts.face.px()), theme.on_chosen) } else { (parts.face, theme.ink) };
        let pad = layout.gap * 2;
        let inside =
            area(row.top_left.x + pad, row.top_left.y, row.size.width as i32 - 2 * pad, row.size.height as i32);
        fit(canvas, &list.lines[entry].name, inside, face, ink, Across::Left);
    }
    let shown = parts.entries(count);
    let tall = f64::from(layout.gap) * 1.2;
    let x = f64::from(right(parts.rows)) - tall * 1.5;
    let mut more = |y: f64, way: f64| {
        let corners =
            [Spot::new(x - tall, y - way * tall), Spot::new(x, y + way * tall), Spot::new(x + tall, y - way * tall)];
        triangle(canvas, corners, theme.lack);
    };
    let half_row = f64::from(parts.row_high) / 2.0;
    if shown.start > 0 && list.open != shown.start {
        more(f64::from(parts.rows.top_left.y) + half_row, -1.0);
    }
    if shown.end < count && list.open + 1 != shown.end {
        more(f64::from(bottom(parts.rows)) - half_row, 1.0);
    }
    if let Some(line) = list.lines.get(list.open).filter(|line| !line.text.is_empty()) {
        let rule =
            area(parts.text.top_left.x, parts.text.top_left.y - layout.gap / 2 - 1, parts.text.size.width as i32, 1);
        canvas.fill(rule, theme.faint);
        let room = area(
            parts.text.top_left.x,
            parts.text.top_left.y,
            parts.text.size.width as i32,
            parts.text.size.height as i32 + parts.text_face.descent_px(),
        );
        crate::picture::lettering::paragraph(canvas, &line.text, room, parts.text_face, theme.ink, Across::Left);
    }
}

/// Which entry lies under a finger; `None` off the rows.
pub fn entry_at(size: Size, list: &SettingList<'_>, x: i32, y: i32) -> Option<usize> {
    let parts = Parts::of(size, list);
    parts.entries(list.lines.len()).find(|&entry| parts.row(entry).contains(Point::new(x, y)))
}

/// Whether the list lies under a finger.
pub fn is_on(size: Size, list: &SettingList<'_>, x: i32, y: i32) -> bool {
    Parts::of(size, list).card.card.contains(Point::new(x, y))
}
