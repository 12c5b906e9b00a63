//! The two faces of the printed page: widths, shaping and outlines, read from the embedded files once.
//!
//! B612 regular and bold, Copyright (c) 2012 AIRBUS, under the SIL Open Font License 1.1 (`type/OFL.txt`). The thin gaps
//! that it lacks are blanks of a fixed width; a character that it lacks altogether is a question mark.

use std::ops::Range;
use std::sync::OnceLock;

use skrifa::instance::{LocationRef, Size};
use skrifa::metrics::GlyphMetrics;
use skrifa::outline::{DrawSettings, OutlinePen};
use skrifa::{FontRef, GlyphId, MetadataProvider};

const REGULAR: &[u8] = include_bytes!("type/B612-Regular.otf");
const BOLD: &[u8] = include_bytes!("type/B612-Bold.otf");

/// Height of the capitals in ems, the same in both faces.
pub(super) const CAPITAL_EM: f64 = 0.75;
/// Width of the thin gaps in ems: U+2009 and U+202F.
const THIN_EM: f64 = 0.165;

/// Regular or bold.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Face {
    Regular,
    Bold,
}

/// A glyph where it stands in a run.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Shaped {
    pub glyph: u16,
    /// Bytes of the text that it stands for.
    pub bytes: Range<usize>,
    /// Its advance in ems.
    pub advance_em: f64,
}

struct Loaded {
    font: FontRef<'static>,
    per_em: f64,
    blank: u16,
    unknown: u16,
}

impl Face {
    /// The file.
    pub fn file(self) -> &'static [u8] {
        match self {
            Self::Regular => REGULAR,
            Self::Bold => BOLD,
        }
    }

    fn loaded(self) -> Option<&'static Loaded> {
        static LOADED: [OnceLock<Option<Loaded>>; 2] = [OnceLock::new(), OnceLock::new()];
        LOADED[self as usize].get_or_init(|| Loaded::read(self.file())).as_ref()
    }

    /// Glyph by glyph.
    pub fn shape(self, text: &str) -> Vec<Shaped> {
        let Some(loaded) = self.loaded() else { return Vec::new() };
        let map = loaded.font.charmap();
        let metrics = GlyphMetrics::new(&loaded.font, Size::unscaled(), LocationRef::default());
        let advance = |glyph: u16| metrics.advance_width(GlyphId::new(glyph.into())).map_or(0.5, f64::from);
        text.char_indices()
            .map(|(at, letter)| {
                let bytes = at..at + letter.len_utf8();
                if matches!(letter, '\u{2009}' | '\u{202f}') {
                    return Shaped { glyph: loaded.blank, bytes, advance_em: THIN_EM };
                }
                let found = map.map(letter).map(|glyph| glyph.to_u32() as u16).filter(|glyph| *glyph != 0);
                let glyph = found.unwrap_or(loaded.unknown);
                Shaped { glyph, bytes, advance_em: advance(glyph) / loaded.per_em }
            })
            .collect()
    }

    /// Width of a run of letters at that size.
    pub fn width(self, text: &str, size: f64) -> f64 {
        self.shape(text).iter().map(|shaped| shaped.advance_em).sum::<f64>() * size
    }

    /// Draws the outline of a glyph, in ems, y upwards.
    pub fn outline(self, glyph: u16, pen: &mut dyn OutlinePen) {
        let Some(loaded) = self.loaded() else { return };
        if let Some(outline) = loaded.font.outline_glyphs().get(GlyphId::new(glyph.into())) {
            let settings = DrawSettings::unhinted(Size::new(1.0), LocationRef::default());
            // A glyph without an outline is a blank.
            let _ = outline.draw(settings, &mut Thick(pen));
        }
    }

    /// A text in lines no wider than `width`; a word that is wider stands alone.
    pub fn lines(self, text: &str, size: f64, width: f64) -> Vec<String> {
        let mut lines: Vec<String> = Vec::new();
        let mut line = String::new();
        for word in text.split([' ', '\n']).filter(|word| !word.is_empty()) {
            let longer = if line.is_empty() { word.to_owned() } else { format!("{line} {word}") };
            if !line.is_empty() && self.width(&longer, size) > width {
                lines.push(std::mem::replace(&mut line, word.to_owned()));
            } else {
                line = longer;
            }
        }
        if !line.is_empty() || lines.is_empty() {
            lines.push(line);
        }
        lines
    }
}

impl Loaded {
    fn read(file: &'static [u8]) -> Option<Self> {
        let font = FontRef::new(file).ok()?;
        let per_em = f64::from(font.metrics(Size::unscaled(), LocationRef::default()).units_per_em);
        let glyph = |letter: char| font.charmap().map(letter).map_or(0, |glyph| glyph.to_u32() as u16);
        let (blank, unknown) = (glyph('\u{a0}'), glyph('?'));
        Some(Self { font, per_em, blank, unknown })
    }
}

/// Passes an outline on to a pen that is only borrowed.
struct Thick<'p>(&'p mut dyn OutlinePen);

impl OutlinePen for Thick<'_> {
    fn move_to(&mut self, x: f32, y: f32) {
        self.0.move_to(x, y);
    }

    fn line_to(&mut self, x: f32, y: f32) {
        self.0.line_to(x, y);
    }

    fn quad_to(&mut self, x0: f32, y0: f32, x: f32, y: f32) {
        self.0.quad_to(x0, y0, x, y);
    }

    fn curve_to(&mut self, x0: f32, y0: f32, x1: f32, y1: f32, x: f32, y: f32) {
        self.0.curve_to(x0, y0, x1, y1, x, y);
    }

    fn close(&mut self) {
        self.0.close();
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn both_faces_hold_every_letter_of_the_locales() {
        for face in [Face::Regular, Face::Bold] {
            let loaded = face.loaded().unwrap();
            let map = loaded.font.charmap();
            let lacking: std::collections::BTreeSet<char> = crate::words::EMBEDDED
                .iter()
                .flat_map(|file| file.text.chars())
                .filter(|letter| !letter.is_control() && !matches!(letter, '\u{2009}' | '\u{202f}'))
                .filter(|letter| map.map(*letter).is_none())
                .collect();
            assert!(lacking.is_empty(), "{face:?} lacks {lacking:?}");
        }
    }

    #[test]
    fn widths_are_those_of_the_face() {
        // Two bytes of one letter are one glyph; figures are of one width.
        assert_eq!(Face::Regular.shape("ñ").len(), 1);
        assert_eq!(Face::Bold.width("1111", 10.0), Face::Bold.width("0890", 10.0));
        assert!((Face::Regular.width("\u{202f}", 10.0) - 1.65).abs() < 1e-9);
        assert_eq!(Face::Regular.shape("\u{4e2d}")[0].glyph, Face::Regular.shape("?")[0].glyph);
    }

    #[test]
    fn lines_hold_every_word_and_keep_to_the_width() {
        let text = "The snow is gone 18 days sooner than it was before.";
        let lines = Face::Regular.lines(text, 10.0, 90.0);
        assert_eq!(lines.join(" "), text);
        assert!(lines.len() > 2 && lines.iter().all(|line| Face::Regular.width(line, 10.0) <= 90.0));
        assert_eq!(Face::Regular.lines("", 10.0, 90.0), [""]);
    }
}
