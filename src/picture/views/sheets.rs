//! Short pieces of text with a sign beside each, set in columns and parted into sheets that are turned like pages.

use embedded_graphics::geometry::Point;
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::emblem::{Hand, Moon, knob, moon, warning};
use super::layout::area;
use crate::picture::lettering::{Across, Face, draw as draw_text, draw_in, lines, measure};
use crate::picture::shape::{disc, rounded_box, rounded_frame};
use crate::picture::{Align, Canvas, Spot, Theme};

/// What stands beside a piece of text.
#[derive(Clone, Debug, PartialEq)]
pub(super) enum Sign {
    /// Nothing.
    None,
    /// A bead, for facts.
    Bead,
    /// A warning.
    Warning,
    /// A hand on the knob.
    Hand(Hand),
    /// Keys, by what is printed on them.
    Keys(Vec<String>),
    /// How far something holds, and the word for it.
    Holds(Moon, String),
    /// That nobody knows how far it holds, in a word.
    Unknown(String),
}

/// One piece.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Piece {
    pub sign: Sign,
    /// A few words in bold; may be empty.
    pub head: String,
    /// The text; may be empty.
    pub text: String,
}

/// Faces and distances of a set of pieces.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Setting {
    pub face: Face,
    pub gap: i32,
    pub columns: usize,
}

/// A piece in its place.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Placed {
    /// Which piece.
    pub piece: usize,
    pub area: Rectangle,
}

impl Setting {
    fn bold(self) -> Face {
        Face::bold(self.face.px())
    }

    /// The largest face, no larger than this one's, in which every piece is on one sheet; else the smallest.
    pub fn fitting_one_sheet(self, pieces: &[Piece], room: Rectangle) -> Self {
        let mut setting = self;
        while set(pieces, room, setting).len() > 1 {
            let Some(face) = setting.face.smaller() else { break };
            setting.face = face;
        }
        setting
    }
}

/// The box of a line of text whose row begins at `y`, with room for what hangs below.
pub(super) fn line_box(x: i32, y: i32, wide: i32, face: Face) -> Rectangle {
    let spare = face.descent_px();
    area(x, y - spare, wide, face.line_px() + 2 * spare)
}

/// How far text stands in from the left edge, the same for all pieces of a set.
fn indent(pieces: &[Piece], setting: Setting) -> i32 {
    pieces.iter().map(|piece| sign_px(&piece.sign, setting)).max().unwrap_or(0)
}

fn sign_px(sign: &Sign, setting: Setting) -> i32 {
    let line = setting.face.line_px();
    match sign {
        Sign::None => 0,
        Sign::Bead => line * 2 / 3 + setting.gap / 2,
        Sign::Warning => line + setting.gap,
        Sign::Hand(_) => line * 5 / 2 + setting.gap * 2,
        Sign::Keys(keys) => {
            keys.iter().map(|key| cap_px(key, setting) + setting.gap / 2 + 1).sum::<i32>() + setting.gap
        }
        Sign::Holds(_, word) | Sign::Unknown(word) => {
            line * 3 / 2 + setting.gap * 3 + measure(word, setting.bold()).width as i32
        }
    }
}

fn cap_px(key: &str, setting: Setting) -> i32 {
    let face = setting.bold();
    (measure(key, face).width as i32 + setting.gap * 2).max(cap_high(setting))
}

fn cap_high(setting: Setting) -> i32 {
    setting.face.line_px() + 1
}

fn height(piece: &Piece, wide: i32, setting: Setting) -> i32 {
    let rows = |text: &str, face: Face| match text {
        "" => 0,
        text => lines(text, face, wide.max(0) as u32).count() as i32 * face.line_px(),
    };
    let text = rows(&piece.head, setting.bold()) + rows(&piece.text, setting.face);
    let sign = match piece.sign {
        Sign::Hand(_) => setting.face.line_px() * 5 / 2,
        Sign::Keys(_) => cap_high(setting),
        Sign::Holds(..) | Sign::Unknown(_) => setting.face.line_px() * 3 / 2,
        Sign::None | Sign::Bead | Sign::Warning => 0,
    };
    text.max(sign)
}

/// Places the pieces in the columns of as many sheets as they need, in order. A piece that is higher than a sheet stands
/// on one by itself.
pub(super) fn set(pieces: &[Piece], room: Rectangle, setting: Setting) -> Vec<Vec<Placed>> {
    let columns = setting.columns.max(1) as i32;
    let between = setting.gap * 4;
    let wide = (room.size.width as i32 - between * (columns - 1)) / columns;
    let inset = indent(pieces, setting);
    let (mut sheets, mut column, mut y) = (vec![Vec::new()], 0, 0);
    for (index, piece) in pieces.iter().enumerate() {
        let high = height(piece, wide - inset, setting);
        if y > 0 && y + high > room.size.height as i32 {
            (column, y) = (column + 1, 0);
            if column == columns {
                column = 0;
                sheets.push(Vec::new());
            }
        }
        let (left, top) = (room.top_left.x + column * (wide + between), room.top_left.y + y);
        let placed = Placed { piece: index, area: area(left, top, wide, high) };
        if let Some(sheet) = sheets.last_mut() {
            sheet.push(placed);
        }
        y += high + setting.gap * 2;
    }
    sheets
}

/// Draws one sheet.
pub(super) fn draw(canvas: &mut Canvas<'_>, pieces: &[Piece], sheet: &[Placed], setting: Setting, theme: &Theme) {
    let inset = indent(pieces, setting);
    for placed in sheet {
        let Some(piece) = pieces.get(placed.piece) else { continue };
        let place = placed.area;
        let line = setting.face.line_px();
        let wide = place.size.width as i32 - inset;
        let own = height(&Piece { sign: Sign::None, ..piece.clone() }, wide, setting);
        // Text lower than its sign stands level with the sign's middle.
        let mut y = place.top_left.y + (place.size.height as i32 - own).max(0) / 2;
        draw_sign(canvas, &piece.sign, place, y + line / 2, setting, theme);
        let x = place.top_left.x + inset;
        let mut rows = |canvas: &mut Canvas<'_>, text: &str, face: Face, colour: Rgb565| {
            for row in lines(text, face, wide.max(0) as u32).filter(|_| !text.is_empty()) {
                if measure(row, face).width as i32 > wide {
                    // One word longer than the line, such as an address in a place's own words.
                    draw_in(canvas, row, line_box(x, y, wide, face), face, colour, Across::Left);
                } else {
                    let at = Point::new(x, y + line / 2);
                    draw_text(canvas, row, at, face, colour, Align::LEFT.cap_middle());
                }
                y += line;
            }
        };
        rows(canvas, &piece.head, setting.bold(), theme.ink);
        rows(canvas, &piece.text, setting.face, if piece.head.is_empty() { theme.ink } else { theme.quiet });
    }
}

fn draw_sign(canvas: &mut Canvas<'_>, sign: &Sign, place: Rectangle, first_line: i32, setting: Setting, theme: &Theme) {
    let line = setting.face.line_px();
    let x = place.top_left.x;
    let middle = place.top_left.y + place.size.height as i32 / 2;
    match sign {
        Sign::None => {}
        Sign::Bead => {
            let radius = f64::from(setting.face.px()) / 5.0;
            disc(canvas, Spot::new(f64::from(x) + radius, f64::from(first_line)), radius, theme.water);
        }
        Sign::Warning => {
            let tall = setting.face.cap_px() + 3;
            warning(canvas, area(x, first_line - tall / 2, tall + 1, tall), theme);
        }
        Sign::Hand(hand) => {
            let radius = f64::from(line) * 1.15;
            knob(canvas, Spot::new(f64::from(x) + radius + 1.0, f64::from(middle)), radius, *hand, theme);
        }
        Sign::Keys(keys) => {
            let (mut x, high) = (x, cap_high(setting));
            for key in keys {
                let wide = cap_px(key, setting);
                let cap = area(x, middle - high / 2, wide, high);
                let radius = f64::from(setting.gap);
                rounded_box(canvas, cap, radius, theme.paper);
                rounded_frame(canvas, cap, radius, 1.0, theme.rule);
                let at = Point::new(x + wide / 2, middle);
                draw_text(canvas, key, at, setting.bold(), theme.ink, Align::CENTRE.cap_middle());
                x += wide + setting.gap / 2 + 1;
            }
        }
        Sign::Unknown(word) => {
            let left = x + (f64::from(line) * 1.2) as i32 + 2 + setting.gap;
            draw_text(canvas, word, Point::new(left, middle), setting.bold(), theme.quiet, Align::LEFT.cap_middle());
        }
        Sign::Holds(holds, word) => {
            let radius = f64::from(line) * 0.6;
            moon(canvas, Spot::new(f64::from(x) + radius + 1.0, f64::from(middle)), radius, *holds, theme);
            let left = x + (radius * 2.0) as i32 + 2 + setting.gap;
            let colour = if *holds == Moon::Empty { theme.lack_ink } else { theme.water_ink };
            draw_text(canvas, word, Point::new(left, middle), setting.bold(), colour, Align::LEFT.cap_middle());
        }
    }
}
