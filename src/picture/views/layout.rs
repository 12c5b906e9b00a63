//! Where things stand on a screen of a given size.
//!
//! A large screen is not a small one enlarged: type grows more slowly than the screen, and what is won carries more.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::primitives::Rectangle;

use crate::picture::lettering::{Face, paragraph_height};

/// The box `width` × `height` pixels whose left top corner is (x, y); sides below 0 count as 0.
pub(super) fn area(x: i32, y: i32, width: i32, height: i32) -> Rectangle {
    Rectangle::new(Point::new(x, y), Size::new(width.max(0) as u32, height.max(0) as u32))
}

/// The first column or row to the right of or below a box.
pub(super) fn right(area: Rectangle) -> i32 {
    area.top_left.x.saturating_add_unsigned(area.size.width)
}

/// The first row below a box.
pub(super) fn bottom(area: Rectangle) -> i32 {
    area.top_left.y.saturating_add_unsigned(area.size.height)
}

/// The general form of a screen.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Form {
    /// About as wide as high, with less room across than a small wide screen.
    Narrow,
    /// Higher than wide.
    Tall,
    /// Wider than high.
    Wide,
}

/// Faces and boxes for one size of screen.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Layout {
    /// The general form.
    pub form: Form,
    /// Whether there is room for all dials and for what is said beside the main things.
    pub roomy: bool,
    /// From the edge of the screen to what stands on it, in pixels.
    pub margin: i32,
    /// Between things that belong together, in pixels.
    pub gap: i32,
    /// For small marks: months, footer.
    pub note: Face,
    /// For names and units.
    pub label: Face,
    /// For names that count, and figures in a list.
    pub strong: Face,
    /// For the figures of a view.
    pub figure: Face,
    /// The largest face of the answer.
    pub title: Face,
    /// Width of a solid data line, in pixels.
    pub line_px: f64,
    /// The answer.
    pub headline: Rectangle,
    /// Day and year.
    pub date: Rectangle,
    /// The view itself.
    pub content: Rectangle,
    /// The dials.
    pub dials: Rectangle,
    /// Cards of dials side by side.
    pub dial_columns: usize,
    /// Rows of cards.
    pub dial_rows: usize,
    /// Place and page.
    pub footer: Rectangle,
}

/// Sizes of type and distance for screens of at least so many rows.
struct Scale {
    least_height: u32,
    margin: i32,
    gap: i32,
    note: u8,
    label: u8,
    strong: u8,
    figure: u8,
    title: u8,
    title_rows: u8,
    line_px: f64,
}

const SCALES: [Scale; 5] = [
    Scale {
        least_height: 960,
        margin: 32,
        gap: 14,
        note: 22,
        label: 28,
        strong: 28,
        figure: 64,
        title: 48,
        title_rows: 36,
        line_px: 5.0,
    },
    Scale {
        least_height: 640,
        margin: 22,
        gap: 10,
        note: 15,
        label: 18,
        strong: 18,
        figure: 48,
        title: 36,
        title_rows: 28,
        line_px: 3.5,
    },
    Scale {
        least_height: 440,
        margin: 14,
        gap: 7,
        note: 12,
        label: 15,
        strong: 15,
        figure: 28,
        title: 28,
        title_rows: 18,
        line_px: 2.5,
    },
    Scale {
        least_height: 300,
        margin: 8,
        gap: 4,
        note: 10,
        label: 12,
        strong: 13,
        figure: 22,
        title: 18,
        title_rows: 13,
        line_px: 2.0,
    },
    Scale {
        least_height: 0,
        margin: 6,
        gap: 3,
        note: 9,
        label: 10,
        strong: 11,
        figure: 18,
        title: 15,
        title_rows: 12,
        line_px: 2.0,
    },
];

impl Layout {
    /// The layout of a screen. With `two_languages` the answer has room to be said twice.
    pub fn of(size: Size, two_languages: bool) -> Self {
        let (wide, high) = (size.width.min(1 << 14) as i32, size.height.min(1 << 14) as i32);
        let form = match () {
            () if wide * 5 < high * 4 => Form::Tall,
            () if wide < 300 => Form::Narrow,
            () => Form::Wide,
        };
        // A tall screen is as small as it is narrow.
        let measure = if form == Form::Wide { high.min(wide * 3 / 4) } else { high.min(wide) };
        let found = SCALES.iter().find(|scale| measure >= scale.least_height as i32);
        let Scale { margin, gap, note, label, strong, figure, title, title_rows, line_px, .. } =
            found.unwrap_or(&SCALES[SCALES.len() - 1]);
        let (margin, gap) = (*margin, *gap);
        let (note, label) = (Face::regular(*note), Face::regular(*label));
        let (strong, figure, title) = (Face::bold(*strong), Face::bold(*figure), Face::bold(*title));
        let roomy = measure >= 440;
        let inner = wide - 2 * margin;

        let rows = if two_languages { "a\na\na\na" } else { "a\na" };
        let head = paragraph_height(rows, Face::bold(*title_rows), 99) as i32;
        let headline = area(margin, margin / 3, inner, head);
        let date = area(margin, bottom(headline) + gap / 3, inner, label.line_px());
        let foot = note.cap_px() + note.descent_px() + 1;
        let footer = area(margin, high - foot - gap / 3, inner, foot);
        let (dial_columns, dial_rows) = match form {
            _ if roomy => (5, 2),
            Form::Narrow | Form::Tall => (2, 1),
            Form::Wide if wide >= 440 => (4, 1),
            Form::Wide => (3, 1),
        };
        let card = if roomy { label.line_px() + gap } else { label.line_px() + strong.line_px() + 2 };
        let cards = card * dial_rows as i32 + gap * (dial_rows as i32 - 1);
        let dials = area(margin, footer.top_left.y - gap / 2 - cards, inner, cards);
        let top = bottom(date) + gap;
        let content = area(margin, top, inner, dials.top_left.y - gap * 2 / 3 - top);
        Self {
            form,
            roomy,
            margin,
            gap,
            note,
            label,
            strong,
            figure,
            title,
            line_px: *line_px,
            headline,
            date,
            content,
            dials,
            dial_columns,
            dial_rows,
            footer,
        }
    }

    /// The width of the whole screen at the height of a box: from edge to edge.
    pub fn across(&self, inner: Rectangle) -> Rectangle {
        area(0, inner.top_left.y, inner.size.width as i32 + 2 * self.margin, inner.size.height as i32)
    }
}
