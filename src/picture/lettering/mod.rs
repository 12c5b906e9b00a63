//! Type: measuring, drawing, shortening and wrapping text without an allocator.
//!
//! The letters were rasterised beforehand (see `atlas/README.md`), so a text is the same pixels on every board. Small
//! letters are kept at quarter-pixel places, which keeps words evenly spaced. Figures stand on whole pixels, each as
//! wide as the others, so that a number which counts up does not shimmer and columns line up.

mod atlas;
mod wrap;

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::canvas::{Canvas, TextMark, hull};
use super::paint::Paint;
use super::shape::frame;
pub use wrap::{Lines, lines, paragraph, paragraph_height};

/// Pixels to the em in which the face can be had, smallest first.
pub const SIZES_PX: [u8; 13] = atlas::SIZES_PX;

/// Thickness of the letters.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Weight {
    /// For running text.
    Regular = 0,
    /// For names, figures and answers.
    Bold = 1,
}

/// A weight at one of [`SIZES_PX`].
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Face {
    weight: Weight,
    size: usize,
}

impl Face {
    /// The regular face of at most `px` pixels to the em: the next smaller size of [`SIZES_PX`], but at least the
    /// smallest.
    pub const fn regular(px: u8) -> Self {
        Self { weight: Weight::Regular, size: size_up_to(px) }
    }

    /// The bold face of at most `px` pixels to the em, chosen like the regular one.
    pub const fn bold(px: u8) -> Self {
        Self { weight: Weight::Bold, size: size_up_to(px) }
    }

    /// The weight.
    pub const fn weight(self) -> Weight {
        self.weight
    }

    /// Pixels to the em.
    pub const fn px(self) -> u8 {
        SIZES_PX[self.size]
    }

    /// The next smaller face of the same weight, or `None` at the smallest.
    pub const fn smaller(self) -> Option<Self> {
        if self.size == 0 { None } else { Some(Self { size: self.size - 1, ..self }) }
    }

    /// Height of capitals and figures in pixels.
    pub fn cap_px(self) -> i32 {
        atlas::glyph(self.weight, self.size, atlas::CAPITAL, 0).0.top
    }

    /// From the baseline to the top of an accented capital, in pixels.
    pub fn ascent_px(self) -> i32 {
        rounded_share(self.px(), 1000)
    }

    /// From the baseline to the foot of the lowest letter, in pixels.
    pub fn descent_px(self) -> i32 {
        (u32::from(self.px()) * 265).div_ceil(1000) as i32
    }

    /// From one baseline to the next in running text, in pixels.
    pub fn line_px(self) -> i32 {
        rounded_share(self.px(), 1300)
    }

    /// The largest face of this weight, no larger than this one, in which `text` is at most `width_px` wide; `None`
    /// where not even the smallest, or `least_px`, will do.
    pub fn fitting(self, text: &str, width_px: u32, least_px: u8) -> Option<Self> {
        let mut face = self;
        while measure(text, face).width > width_px {
            face = face.smaller().filter(|face| face.px() >= least_px)?;
        }
        Some(face)
    }
}

const fn size_up_to(px: u8) -> usize {
    let mut size = SIZES_PX.len() - 1;
    while size > 0 && SIZES_PX[size] > px {
        size -= 1;
    }
    size
}

fn rounded_share(px: u8, thousandths: i32) -> i32 {
    (i32::from(px) * thousandths + 500) / 1000
}

/// Which part of the text stands at the given x.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Across {
    /// Its left end.
    Left,
    /// Its middle.
    Centre,
    /// Its right end.
    Right,
}

/// Which part of the text stands at the given y.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Upright {
    /// The baseline: the row under the feet of the letters.
    Baseline,
    /// The top of the capitals.
    CapTop,
    /// The middle of the capitals.
    CapMiddle,
}

/// How a text stands to the place that it is given.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Align {
    /// Along the line.
    pub across: Across,
    /// Up and down.
    pub upright: Upright,
}

impl Align {
    /// Begins at the place, on the baseline.
    pub const LEFT: Self = Self { across: Across::Left, upright: Upright::Baseline };
    /// Centred on the place, on the baseline.
    pub const CENTRE: Self = Self { across: Across::Centre, upright: Upright::Baseline };
    /// Ends at the place, on the baseline.
    pub const RIGHT: Self = Self { across: Across::Right, upright: Upright::Baseline };

    /// The same with the top of the capitals at the place.
    pub const fn cap_top(self) -> Self {
        Self { upright: Upright::CapTop, ..self }
    }

    /// The same with the middle of the capitals at the place.
    pub const fn cap_middle(self) -> Self {
        Self { upright: Upright::CapMiddle, ..self }
    }
}

/// What was drawn.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Drawn {
    /// The smallest box around the ink.
    pub ink: Rectangle,
    /// How far the pen moved on, in pixels.
    pub advance_px: u32,
    /// Characters without a picture, each drawn as a box.
    pub missing: usize,
    /// Whether some of the text was left out to fit, with an ellipsis in its place.
    pub shortened: bool,
}

/// Width and line height of `text` in pixels, rounded up.
pub fn measure(text: &str, face: Face) -> Size {
    Size::new(width_px(text, face), face.line_px() as u32)
}

/// The smallest box around the ink that [`draw`] would lay down.
pub fn ink(text: &str, at: Point, face: Face, align: Align) -> Rectangle {
    let (x, baseline) = pen_start(text, at, face, align);
    let mut found = Rectangle::new(Point::new(x, baseline), Size::zero());
    walk(text, face, x, |mark| found = hull(found, mark.area(face, baseline)));
    found
}

/// Draws one line of text. Line breaks are not obeyed here; see [`paragraph`].
pub fn draw(canvas: &mut Canvas<'_>, text: &str, at: Point, face: Face, colour: Rgb565, align: Align) -> Drawn {
    let (x, baseline) = pen_start(text, at, face, align);
    let drawn = draw_from(canvas, text, x, baseline, face, colour);
    let clip = canvas.clip();
    canvas.tell(TextMark { text, ink: drawn.ink, given: None, clip, missing: drawn.missing, shortened: false });
    drawn
}

/// Draws one line inside `area`, its capitals in the middle of the height. Text that is too wide is cut off with an
/// ellipsis and the answer says so.
pub fn draw_in(
    canvas: &mut Canvas<'_>,
    text: &str,
    area: Rectangle,
    face: Face,
    colour: Rgb565,
    across: Across,
) -> Drawn {
    let middle = area.top_left.y.saturating_add_unsigned(area.size.height / 2);
    let baseline = middle.saturating_add((face.cap_px() + 1) / 2);
    draw_line(canvas, text, area, baseline, face, colour, across, false)
}

const ELLIPSIS: &str = "…";

/// Draws one line inside `area` on a baseline, shortened where it is too wide or `more` follows that finds no room.
#[allow(clippy::too_many_arguments)]
fn draw_line(
    canvas: &mut Canvas<'_>,
    text: &str,
    area: Rectangle,
    baseline: i32,
    face: Face,
    colour: Rgb565,
    across: Across,
    more: bool,
) -> Drawn {
    let whole = width_px(text, face);
    let shortened = more || whole > area.size.width;
    let (kept, width) = if shortened { shorten(text, face, area.size.width) } else { (text, whole) };
    let room = area.size.width.saturating_sub(width);
    let x = area.top_left.x.saturating_add_unsigned(match across {
        Across::Left => 0,
        Across::Centre => room / 2,
        Across::Right => room,
    });
    let mut drawn = draw_from(canvas, kept, x, baseline, face, colour);
    if shortened {
        let end = x.saturating_add_unsigned(drawn.advance_px);
        let dots = draw_from(canvas, ELLIPSIS, end, baseline, face, colour);
        drawn.ink = hull(drawn.ink, dots.ink);
        drawn.advance_px += dots.advance_px;
    }
    drawn.shortened = shortened;
    let (clip, ink, missing) = (canvas.clip(), drawn.ink, drawn.missing);
    canvas.tell(TextMark { text, ink, given: Some(area), clip, missing, shortened });
    drawn
}

/// The longest beginning that leaves room for an ellipsis, without blanks at its end, and the width of both together.
fn shorten(text: &str, face: Face, width: u32) -> (&str, u32) {
    let dots = width_px(ELLIPSIS, face);
    let mut kept = text.trim_end();
    while !kept.is_empty() && width_px(kept, face) + dots > width {
        let shorter = kept.char_indices().next_back().map_or(0, |(at, _)| at);
        kept = kept[..shorter].trim_end();
    }
    (kept, width_px(kept, face) + dots)
}

fn pen_start(text: &str, at: Point, face: Face, align: Align) -> (i32, i32) {
    let width = width_px(text, face) as i32;
    let x = match align.across {
        Across::Left => at.x,
        Across::Centre => at.x.saturating_sub(width / 2),
        Across::Right => at.x.saturating_sub(width),
    };
    let baseline = match align.upright {
        Upright::Baseline => at.y,
        Upright::CapTop => at.y.saturating_add(face.cap_px()),
        Upright::CapMiddle => at.y.saturating_add((face.cap_px() + 1) / 2),
    };
    (x, baseline)
}

fn width_px(text: &str, face: Face) -> u32 {
    let end = walk(text, face, 0, |_| {});
    (end.max(0) as u32).div_ceil(64)
}

fn draw_from(canvas: &mut Canvas<'_>, text: &str, x: i32, baseline: i32, face: Face, colour: Rgb565) -> Drawn {
    let mut ink = Rectangle::new(Point::new(x, baseline), Size::zero());
    let mut missing = 0;
    let paint = Paint::Solid(colour).ready();
    let end = walk(text, face, x, |mark| {
        let area = mark.area(face, baseline);
        ink = hull(ink, area);
        match mark {
            Mark::Letter(glyph, _) => {
                let corner = area.top_left;
                glyph.rows(|row, cells| {
                    canvas.blend_row(corner.x, corner.y.saturating_add(row as i32), cells, &paint);
                });
            }
            Mark::Missing(_) => {
                missing += 1;
                frame(canvas, area, u32::from(face.px()).div_ceil(14), colour);
            }
        }
    });
    let advance_px = u32::try_from(end - (x.clamp(-FAR, FAR) * 64)).unwrap_or(0).div_ceil(64);
    Drawn { ink, advance_px, missing, shortened: false }
}

/// Places further out than this are drawn here: far from every frame, near enough to count in 1/64 pixel.
const FAR: i32 = 1 << 20;

/// One character at its place; x is that of the pen, in whole pixels.
enum Mark {
    Letter(atlas::Glyph, i32),
    Missing(i32),
}

impl Mark {
    fn area(&self, face: Face, baseline: i32) -> Rectangle {
        match self {
            Self::Letter(glyph, x) => Rectangle::new(
                Point::new(x + glyph.left, baseline.saturating_sub(glyph.top)),
                Size::new(glyph.width as u32, glyph.height as u32),
            ),
            Self::Missing(x) => {
                let cap = face.cap_px();
                Rectangle::new(Point::new(x + 1, baseline.saturating_sub(cap)), Size::new(missing_px(face), cap as u32))
            }
        }
    }
}

/// Width of the box for a character that the face lacks.
fn missing_px(face: Face) -> u32 {
    u32::from(face.px()).div_ceil(2)
}

/// Goes along `text` from the whole pixel `x`; gives the end of the pen in 1/64 pixel.
fn walk(text: &str, face: Face, x: i32, mut mark: impl FnMut(Mark)) -> i32 {
    let (weight, px) = (face.weight, face.px());
    let mut pen = x.clamp(-FAR, FAR) * 64;
    let mut before = None;
    for character in text.chars().filter(|&c| !is_invisible(c)) {
        // A text longer than this is on no frame; the pen must stay within its number.
        if pen > FAR * 64 {
            break;
        }
        let Some(place) = atlas::find(character) else {
            mark(Mark::Missing((pen + 32).div_euclid(64)));
            pen += (missing_px(face) as i32 + 2) * 64;
            before = None;
            continue;
        };
        let mut advance = atlas::advance(weight, px, place);
        if character.is_ascii_digit() {
            pen = (pen + 32).div_euclid(64) * 64;
            advance = (advance + 32) / 64 * 64;
        } else if let Some(left) = before {
            pen += atlas::kerning(weight, px, left, place);
        }
        let (glyph, column) = atlas::glyph(weight, face.size, place, pen);
        if glyph.width > 0 {
            mark(Mark::Letter(glyph, column));
        }
        pen += advance;
        before = Some(place);
    }
    pen
}

/// Marks of writing direction that message formatting may put round a number; they have no picture.
fn is_invisible(character: char) -> bool {
    matches!(character, '\u{2066}'..='\u{2069}')
}
