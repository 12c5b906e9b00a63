//! What a laid-out document is: pages of vectors and letters, each under a tag that says what it is.
//!
//! Lengths are in points (1/72 inch), x to the right and y down from the left top corner of the page.

use super::face::Face;

/// A sheet of paper.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Paper {
    /// ISO 216 A4, 210 × 297 mm.
    A4,
    /// US Letter, 8.5 × 11 inches.
    Letter,
}

impl Paper {
    /// Width and height in points.
    pub fn size_pt(self) -> (f64, f64) {
        match self {
            Self::A4 => (595.28, 841.89),
            Self::Letter => (612.0, 792.0),
        }
    }
}

/// A place on a page, in points.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct At {
    pub x: f64,
    pub y: f64,
}

impl At {
    pub const fn new(x: f64, y: f64) -> Self {
        Self { x, y }
    }
}

/// A colour by what it means.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Ink {
    /// Text and the line as it was.
    Black,
    /// Text that matters less.
    Quiet,
    /// Axes and edges.
    Rule,
    /// Hairlines.
    Faint,
    /// Water: thick lines and solid bars.
    Water,
    /// The area under a line of water.
    WaterPale,
    /// What is lacking.
    Lack,
    /// Snow on the ground.
    Snow,
    /// Fields.
    Crop,
    /// The paper itself.
    Paper,
}

impl Ink {
    /// Red, green, blue.
    pub fn rgb(self) -> [u8; 3] {
        match self {
            Self::Black => [0x16, 0x1B, 0x22],
            Self::Quiet => [0x52, 0x5A, 0x63],
            Self::Rule => [0x80, 0x84, 0x88],
            Self::Faint => [0xD2, 0xD4, 0xD6],
            Self::Water => [0x1F, 0x6A, 0xA8],
            Self::WaterPale => [0xCF, 0xE1, 0xF0],
            Self::Lack => [0xB8, 0x4A, 0x00],
            Self::Snow => [0xE6, 0xEA, 0xEE],
            Self::Crop => [0xD5, 0xE3, 0xC8],
            Self::Paper => [0xFF, 0xFF, 0xFF],
        }
    }
}

/// A line's look.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Line {
    pub width: f64,
    pub ink: Ink,
    /// On and off, in points.
    pub dash: Option<(f64, f64)>,
}

/// Lines and areas of one look.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Mark {
    /// Each a run of corners.
    pub runs: Vec<Vec<At>>,
    /// Whether the last corner of each run leads back to the first.
    pub closed: bool,
    pub fill: Option<Ink>,
    pub line: Option<Line>,
}

/// Letters on one line.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Letters {
    /// Left end of the baseline.
    pub at: At,
    pub text: String,
    pub face: Face,
    pub size: f64,
    pub ink: Ink,
}

/// A thing that is drawn.
#[derive(Clone, Debug, PartialEq)]
pub(super) enum Piece {
    Mark(Mark),
    Letters(Letters),
}

/// What a cell of a table heads.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Heads {
    Row,
    Column,
}

/// What a part of a page is to somebody who cannot see it.
#[derive(Clone, Debug, PartialEq)]
pub(super) enum Role {
    /// Ornament: nothing to read.
    Artifact,
    /// Parts that belong together.
    Section,
    /// A heading of this level, from 1.
    Heading(u16),
    Paragraph,
    /// A picture, with its words.
    Figure(String),
    Table,
    Row,
    HeadCell(Heads),
    Cell,
}

/// A part of a page.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Node {
    pub role: Role,
    /// Tag of its language, where that is not the document's.
    pub language: Option<String>,
    pub children: Vec<Child>,
}

/// What a part holds.
#[derive(Clone, Debug, PartialEq)]
pub(super) enum Child {
    Node(Node),
    Piece(Piece),
}

impl Node {
    pub fn new(role: Role) -> Self {
        Self { role, language: None, children: Vec::new() }
    }

    pub fn of(role: Role, pieces: Vec<Piece>) -> Self {
        Self { role, language: None, children: pieces.into_iter().map(Child::Piece).collect() }
    }

    pub fn in_language(mut self, language: Option<String>) -> Self {
        self.language = language;
        self
    }

    pub fn push(&mut self, node: Node) {
        self.children.push(Child::Node(node));
    }

    /// Moves everything.
    pub fn shift(&mut self, right: f64, down: f64) {
        for child in &mut self.children {
            match child {
                Child::Node(node) => node.shift(right, down),
                Child::Piece(Piece::Letters(letters)) => {
                    letters.at = At::new(letters.at.x + right, letters.at.y + down);
                }
                Child::Piece(Piece::Mark(mark)) => {
                    for at in mark.runs.iter_mut().flatten() {
                        *at = At::new(at.x + right, at.y + down);
                    }
                }
            }
        }
    }

    /// Calls `see` for every piece in reading order.
    pub fn each_piece<'n>(&'n self, see: &mut dyn FnMut(&'n Piece)) {
        for child in &self.children {
            match child {
                Child::Node(node) => node.each_piece(see),
                Child::Piece(piece) => see(piece),
            }
        }
    }

    /// The words of a heading or any other part.
    pub fn text(&self) -> String {
        let mut text = String::new();
        self.each_piece(&mut |piece| {
            if let Piece::Letters(letters) = piece {
                text.push_str(&letters.text);
            }
        });
        text
    }
}

/// One page.
#[derive(Clone, Debug, Default, PartialEq)]
pub(super) struct Page {
    /// Its parts in reading order.
    pub parts: Vec<Node>,
}

/// A document, laid out.
#[derive(Clone, Debug, PartialEq)]
pub struct Document {
    /// What it is called.
    pub(super) title: String,
    /// Tag of its language.
    pub(super) language: String,
    pub(super) paper: Paper,
    pub(super) pages: Vec<Page>,
}

impl Document {
    /// How many pages it has.
    pub fn page_count(&self) -> usize {
        self.pages.len()
    }

    /// Its title.
    pub fn title(&self) -> &str {
        &self.title
    }

    /// Everything that is written on it, in reading order, a line for each run of letters.
    pub fn lines(&self) -> Vec<String> {
        let mut lines = Vec::new();
        for part in self.pages.iter().flat_map(|page| &page.parts) {
            part.each_piece(&mut |piece| {
                if let Piece::Letters(letters) = piece {
                    lines.push(letters.text.clone());
                }
            });
        }
        lines
    }

    /// Letters that stand outside the page, or over other letters; a sound page has none.
    pub fn collisions(&self) -> Vec<String> {
        let (wide, high) = self.paper.size_pt();
        let mut found = Vec::new();
        for page in &self.pages {
            let mut boxes: Vec<(&str, [f64; 4])> = Vec::new();
            for part in &page.parts {
                part.each_piece(&mut |piece| {
                    let Piece::Letters(letters) = piece else { return };
                    let text = letters.text.trim_end();
                    let width = letters.face.width(text, letters.size);
                    let At { x, y } = letters.at;
                    // Capitals and figures, and not the room for accents, are what must not touch.
                    let area = [x, y - letters.size * 0.7, x + width, y + letters.size * 0.05];
                    if area[0] < 0.0 || area[2] > wide || area[1] < 0.0 || area[3] > high {
                        found.push(format!("outside: {text}"));
                    }
                    boxes.push((text, area));
                });
            }
            for (index, (text, a)) in boxes.iter().enumerate() {
                for (other, b) in &boxes[..index] {
                    if a[0] < b[2] && b[0] < a[2] && a[1] < b[3] && b[1] < a[3] {
                        found.push(format!("“{text}” over “{other}”"));
                    }
                }
            }
        }
        found
    }
}
