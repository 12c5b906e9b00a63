//! A document as PDF/UA-1: letters that can be copied, a tree of headings, tables and figures, a language and a title.

use std::io::{self, Write};
use std::num::NonZeroU16;

use krilla::color::rgb;
use krilla::configure::{Configuration, Validator};
use krilla::destination::XyzDestination;
use krilla::geom::{Path, PathBuilder, Point};
use krilla::metadata::Metadata;
use krilla::num::NormalizedF32;
use krilla::outline::{Outline, OutlineNode};
use krilla::page::PageSettings;
use krilla::paint::{Fill, FillRule, LineCap, LineJoin, Stroke, StrokeDash};
use krilla::surface::Surface;
use krilla::tagging::{
    ArtifactType, ContentTag, Identifier, SpanTag, TableHeaderScope, Tag, TagGroup, TagKind, TagTree,
};
use krilla::text::{Font, GlyphId, KrillaGlyph};
use krilla::{Data, Document as Writer, SerializeSettings};

use super::face::Face;
use super::model::{At, Child, Document, Heads, Ink, Letters, Mark, Node, Piece, Role};

/// Corners from which a course is long.
const LONG: usize = 60;

/// Why there is no PDF.
#[derive(Debug)]
pub enum PdfFault {
    /// The document could not be made into one that holds to PDF/UA-1; what the writer says.
    Unsound(String),
    /// It could not be written.
    Unwritable(io::Error),
}

/// Writes the document.
///
/// # Errors
/// A [`PdfFault`].
pub fn write_pdf(document: &Document, out: &mut dyn Write) -> Result<(), PdfFault> {
    let bytes = bytes_of(document)?;
    out.write_all(&bytes).and_then(|()| out.flush()).map_err(PdfFault::Unwritable)
}

fn bytes_of(document: &Document) -> Result<Vec<u8>, PdfFault> {
    let unsound = |what: &str| PdfFault::Unsound(what.to_owned());
    let settings = SerializeSettings {
        configuration: Configuration::new_with_validator(Validator::UA1),
        ..SerializeSettings::default()
    };
    let font = |face: Face| Font::new(Data::from(face.file().to_vec()), 0).ok_or_else(|| unsound("face"));
    let fonts = [font(Face::Regular)?, font(Face::Bold)?];
    let mut writer = Writer::new_with(settings);
    writer.set_metadata(
        Metadata::new()
            .title(document.title.clone())
            .language(document.language.clone())
            .creator(format!("deshielo {}", env!("CARGO_PKG_VERSION"))),
    );
    let mut tree = TagTree::new();
    let mut outline = Outline::new();
    let (wide, high) = document.paper.size_pt();
    for (index, page) in document.pages.iter().enumerate() {
        let size = PageSettings::from_wh(wide as f32, high as f32).ok_or_else(|| unsound("paper"))?;
        let mut sheet = writer.start_page_with(size);
        let mut surface = sheet.surface();
        for part in &page.parts {
            let mut brush = Brush { surface: &mut surface, fonts: &fonts, page: index, outline: &mut outline };
            for group in brush.part(part) {
                tree.push(group);
            }
        }
        surface.finish();
        sheet.finish();
    }
    writer.set_outline(outline);
    writer.set_tag_tree(tree);
    writer.finish().map_err(|error| PdfFault::Unsound(format!("{error:?}")))
}

struct Brush<'b, 's> {
    surface: &'b mut Surface<'s>,
    fonts: &'b [Font; 2],
    page: usize,
    outline: &'b mut Outline,
}

impl Brush<'_, '_> {
    /// Draws a part and gives what stands for it in the tree; ornaments have nothing there.
    fn part(&mut self, part: &Node) -> Vec<TagGroup> {
        if part.role == Role::Artifact {
            let mut pieces = Vec::new();
            part.each_piece(&mut |piece| pieces.push(piece));
            if !pieces.is_empty() {
                let _ = self.surface.start_tagged(ContentTag::Artifact(ArtifactType::Other));
                pieces.into_iter().for_each(|piece| self.piece(piece));
                self.surface.end_tagged();
            }
            return Vec::new();
        }
        if let Role::Heading(_) = part.role {
            self.enter_heading(part);
        }
        let mut group = TagGroup::new(tag_of(part));
        let mut is_empty = true;
        if let Role::Figure(_) = part.role {
            // A figure is one thing, whatever it is drawn of.
            let mut pieces = Vec::new();
            part.each_piece(&mut |piece| pieces.push(piece));
            let id = self.surface.start_tagged(ContentTag::Other);
            pieces.into_iter().for_each(|piece| self.piece(piece));
            self.surface.end_tagged();
            group.push(id);
            return vec![group];
        }
        let mut run: Vec<&Piece> = Vec::new();
        for child in &part.children {
            match child {
                Child::Piece(piece) => run.push(piece),
                Child::Node(node) => {
                    if let Some(id) = self.tagged(&mut run) {
                        group.push(id);
                        is_empty = false;
                    }
                    let is_plain = node.role == Role::Paragraph && node.language.is_none();
                    if is_plain && part.role != Role::Section {
                        // A paragraph that is all of a cell or an item says nothing that the cell does not.
                        node.each_piece(&mut |piece| run.push(piece));
                        continue;
                    }
                    for inner in self.part(node) {
                        group.push(inner);
                        is_empty = false;
                    }
                }
            }
        }
        if let Some(id) = self.tagged(&mut run) {
            group.push(id);
            is_empty = false;
        }
        if is_empty { Vec::new() } else { vec![group] }
    }

    /// Draws neighbouring pieces as one run of content, and empties the list.
    fn tagged(&mut self, run: &mut Vec<&Piece>) -> Option<Identifier> {
        if run.is_empty() {
            return None;
        }
        let tag = match run.as_slice() {
            [Piece::Letters(_)] => ContentTag::Span(SpanTag::empty()),
            _ => ContentTag::Other,
        };
        let id = self.surface.start_tagged(tag);
        run.drain(..).for_each(|piece| self.piece(piece));
        self.surface.end_tagged();
        Some(id)
    }

    /// The list of headings that a reader shows beside the page.
    fn enter_heading(&mut self, heading: &Node) {
        let mut top = None;
        heading.each_piece(&mut |piece| {
            if let (Piece::Letters(letters), None) = (piece, top) {
                top = Some(Point::from_xy(letters.at.x as f32, (letters.at.y - letters.size * 1.2) as f32));
            }
        });
        if let Some(top) = top {
            let text = heading.text().trim_end().to_owned();
            self.outline.push_child(OutlineNode::new(text, XyzDestination::new(self.page, top)));
        }
    }

    fn piece(&mut self, piece: &Piece) {
        match piece {
            Piece::Mark(mark) => self.mark(mark),
            Piece::Letters(letters) => self.letters(letters),
        }
    }

    fn mark(&mut self, mark: &Mark) {
        let Some(path) = path_of(mark) else { return };
        self.surface.set_fill(mark.fill.map(fill_of));
        self.surface.set_stroke(mark.line.map(|line| Stroke {
            paint: colour(line.ink).into(),
            width: line.width as f32,
            line_cap: LineCap::Butt,
            line_join: LineJoin::Round,
            opacity: NormalizedF32::ONE,
            dash: line.dash.map(|(on, off)| StrokeDash { array: vec![on as f32, off as f32], offset: 0.0 }),
            ..Stroke::default()
        }));
        self.surface.draw_path(&path);
    }

    fn letters(&mut self, letters: &Letters) {
        let glyphs: Vec<KrillaGlyph> = letters
            .face
            .shape(&letters.text)
            .into_iter()
            .map(|shaped| KrillaGlyph {
                glyph_id: GlyphId::new(shaped.glyph.into()),
                text_range: shaped.bytes,
                x_advance: shaped.advance_em as f32,
                x_offset: 0.0,
                y_offset: 0.0,
                y_advance: 0.0,
                location: None,
            })
            .collect();
        self.surface.set_stroke(None);
        self.surface.set_fill(Some(fill_of(letters.ink)));
        let font = self.fonts[letters.face as usize].clone();
        let At { x, y } = letters.at;
        let start = Point::from_xy(x as f32, y as f32);
        self.surface.draw_glyphs(start, &glyphs, font, &letters.text, letters.size as f32, false);
    }
}

fn tag_of(part: &Node) -> TagKind {
    let tag: TagKind = match &part.role {
        Role::Artifact | Role::Section => Tag::Section.into(),
        Role::Heading(level) => {
            let level = NonZeroU16::new(*level).unwrap_or(NonZeroU16::MIN);
            Tag::Hn(level, Some(part.text().trim_end().to_owned())).into()
        }
        Role::Paragraph => Tag::P.into(),
        Role::Figure(words) => Tag::Figure(Some(words.clone())).into(),
        Role::Table => Tag::Table.into(),
        Role::Row => Tag::TR.into(),
        Role::HeadCell(Heads::Row) => Tag::TH(TableHeaderScope::Row).into(),
        Role::HeadCell(Heads::Column) => Tag::TH(TableHeaderScope::Column).into(),
        Role::Cell => Tag::TD.into(),
    };
    tag.with_lang(part.language.clone())
}

fn path_of(mark: &Mark) -> Option<Path> {
    let mut path = PathBuilder::new();
    // Hundredths of a point are finer than any printer; a long course is as good in tenths, and shorter to write.
    let steps = if mark.runs.iter().map(Vec::len).sum::<usize>() > LONG { 10.0 } else { 100.0 };
    let rounded = |value: f64| (libm::round(value * steps) / steps) as f32;
    for run in &mark.runs {
        let finite = run.iter().filter(|at| at.x.is_finite() && at.y.is_finite());
        for (index, at) in finite.enumerate() {
            let (x, y) = (rounded(at.x), rounded(at.y));
            if index == 0 {
                path.move_to(x, y);
            } else {
                path.line_to(x, y);
            }
        }
        if mark.closed && run.len() > 1 {
            path.close();
        }
    }
    path.finish()
}

fn colour(ink: Ink) -> rgb::Color {
    let [red, green, blue] = ink.rgb();
    rgb::Color::new(red, green, blue)
}

fn fill_of(ink: Ink) -> Fill {
    Fill { paint: colour(ink).into(), opacity: NormalizedF32::ONE, rule: FillRule::NonZero }
}
