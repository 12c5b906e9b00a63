//! A document as a picture: its pages one below the other.

use skrifa::outline::OutlinePen;
use tiny_skia::{Color, FillRule, LineJoin, Paint, Path, PathBuilder, Pixmap, Stroke, StrokeDash, Transform};

use super::model::{Document, Ink, Letters, Mark, Piece};

/// Dots to the inch.
const DOTS: f64 = 150.0;
/// Grey between two pages, points.
const BETWEEN: f64 = 12.0;

/// Why there is no picture.
#[derive(Debug)]
pub enum PngFault {
    /// The pages are larger than a picture can be.
    TooLarge,
    /// The picture could not be packed.
    Unpackable(::png::EncodingError),
}

/// The document as a PNG of 150 dots to the inch.
///
/// # Errors
/// A [`PngFault`].
pub fn write_png(document: &Document) -> Result<Vec<u8>, PngFault> {
    let (wide, high) = document.paper.size_pt();
    let count = document.pages.len() as f64;
    let dots = DOTS / 72.0;
    let whole = high * count + BETWEEN * (count - 1.0);
    let (across, down) = (libm::round(wide * dots) as u32, libm::round(whole * dots) as u32);
    let mut map = Pixmap::new(across, down).ok_or(PngFault::TooLarge)?;
    map.fill(Color::from_rgba8(0xB8, 0xBC, 0xC0, 0xFF));
    for (index, page) in document.pages.iter().enumerate() {
        let top = (high + BETWEEN) * index as f64 * dots;
        let place = Transform::from_row(dots as f32, 0.0, 0.0, dots as f32, 0.0, top as f32);
        let sheet = tiny_skia::Rect::from_xywh(0.0, 0.0, wide as f32, high as f32);
        if let Some(sheet) = sheet {
            let path = PathBuilder::from_rect(sheet);
            map.fill_path(&path, &paint(Ink::Paper), FillRule::Winding, place, None);
        }
        for part in &page.parts {
            part.each_piece(&mut |piece| match piece {
                Piece::Mark(mark) => draw_mark(&mut map, mark, place),
                Piece::Letters(letters) => draw_letters(&mut map, letters, place),
            });
        }
    }
    packed(&map).map_err(PngFault::Unpackable)
}

fn packed(map: &Pixmap) -> Result<Vec<u8>, ::png::EncodingError> {
    // Nothing on a page lets anything through, so the fourth channel says nothing.
    let pixels: Vec<u8> = map.pixels().iter().flat_map(|pixel| [pixel.red(), pixel.green(), pixel.blue()]).collect();
    let mut bytes = Vec::new();
    let mut encoder = ::png::Encoder::new(&mut bytes, map.width(), map.height());
    encoder.set_color(::png::ColorType::Rgb);
    encoder.set_depth(::png::BitDepth::Eight);
    let mut writer = encoder.write_header()?;
    writer.write_image_data(&pixels)?;
    writer.finish()?;
    Ok(bytes)
}

fn paint(ink: Ink) -> Paint<'static> {
    let [red, green, blue] = ink.rgb();
    let mut paint = Paint { anti_alias: true, ..Paint::default() };
    paint.set_color_rgba8(red, green, blue, 0xFF);
    paint
}

fn draw_mark(map: &mut Pixmap, mark: &Mark, place: Transform) {
    let Some(path) = path_of(mark) else { return };
    if let Some(ink) = mark.fill {
        map.fill_path(&path, &paint(ink), FillRule::Winding, place, None);
    }
    if let Some(line) = mark.line {
        let stroke = Stroke {
            width: line.width as f32,
            line_join: LineJoin::Round,
            dash: line.dash.and_then(|(on, off)| StrokeDash::new(vec![on as f32, off as f32], 0.0)),
            ..Stroke::default()
        };
        map.stroke_path(&path, &paint(line.ink), &stroke, place, None);
    }
}

fn path_of(mark: &Mark) -> Option<Path> {
    let mut path = PathBuilder::new();
    for run in &mark.runs {
        for (index, at) in run.iter().filter(|at| at.x.is_finite() && at.y.is_finite()).enumerate() {
            if index == 0 {
                path.move_to(at.x as f32, at.y as f32);
            } else {
                path.line_to(at.x as f32, at.y as f32);
            }
        }
        if mark.closed && run.len() > 1 {
            path.close();
        }
    }
    path.finish()
}

fn draw_letters(map: &mut Pixmap, letters: &Letters, place: Transform) {
    let mut pen = Outlines { path: PathBuilder::new(), left: letters.at.x, base: letters.at.y, size: letters.size };
    for shaped in letters.face.shape(&letters.text) {
        letters.face.outline(shaped.glyph, &mut pen);
        pen.left += shaped.advance_em * letters.size;
    }
    if let Some(path) = pen.path.finish() {
        map.fill_path(&path, &paint(letters.ink), FillRule::Winding, place, None);
    }
}

/// Sets outlines in ems, y upwards, onto the page.
struct Outlines {
    path: PathBuilder,
    left: f64,
    base: f64,
    size: f64,
}

impl Outlines {
    fn at(&self, x: f32, y: f32) -> (f32, f32) {
        ((self.left + f64::from(x) * self.size) as f32, (self.base - f64::from(y) * self.size) as f32)
    }
}

impl OutlinePen for Outlines {
    fn move_to(&mut self, x: f32, y: f32) {
        let (x, y) = self.at(x, y);
        self.path.move_to(x, y);
    }

    fn line_to(&mut self, x: f32, y: f32) {
        let (x, y) = self.at(x, y);
        self.path.line_to(x, y);
    }

    fn quad_to(&mut self, x0: f32, y0: f32, x: f32, y: f32) {
        let ((x0, y0), (x, y)) = (self.at(x0, y0), self.at(x, y));
        self.path.quad_to(x0, y0, x, y);
    }

    fn curve_to(&mut self, x0: f32, y0: f32, x1: f32, y1: f32, x: f32, y: f32) {
        let ((x0, y0), (x1, y1), (x, y)) = (self.at(x0, y0), self.at(x1, y1), self.at(x, y));
        self.path.cubic_to(x0, y0, x1, y1, x, y);
    }

    fn close(&mut self) {
        self.path.close();
    }
}
