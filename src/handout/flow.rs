//! Blocks one below another, and on to the next page where one ends.

use super::face::Face;
use super::model::{At, Document, Ink, Node, Page, Paper, Role};
use super::pen::{End, NOTE, Style, letters, straight};

/// Empty paper on every side, points.
pub(super) const MARGIN: f64 = 42.0;
/// Between two columns.
pub(super) const GUTTER: f64 = 18.0;
/// Room for the first line at the foot of a page.
const FOOT: f64 = 20.0;
/// Room for each further one.
const FOOT_LINE: f64 = 9.5;

/// Parts that were laid out from (0, 0), and how high they are together.
#[derive(Clone, Debug, Default)]
pub(super) struct Block {
    pub nodes: Vec<Node>,
    pub high: f64,
}

impl Block {
    pub fn one(node: Node, high: f64) -> Self {
        Self { nodes: vec![node], high }
    }

    /// Puts another block under this one.
    pub fn below(mut self, gap: f64, mut other: Block) -> Self {
        if other.nodes.is_empty() {
            return self;
        }
        let gap = if self.nodes.is_empty() { 0.0 } else { gap };
        other.shift(0.0, self.high + gap);
        self.nodes.append(&mut other.nodes);
        self.high += gap + other.high;
        self
    }

    /// Puts another block beside this one, `right` points from the left edge.
    pub fn beside(mut self, right: f64, mut other: Block) -> Self {
        other.shift(right, 0.0);
        self.nodes.append(&mut other.nodes);
        self.high = self.high.max(other.high);
        self
    }

    pub fn shift(&mut self, right: f64, down: f64) {
        self.nodes.iter_mut().for_each(|node| node.shift(right, down));
    }
}

/// The pages so far.
pub(super) struct Flow {
    paper: Paper,
    pages: Vec<Page>,
    y: f64,
    foot: f64,
}

impl Flow {
    pub fn new(paper: Paper) -> Self {
        Self { paper, pages: vec![Page::default()], y: MARGIN, foot: FOOT }
    }

    /// With room for so many lines at the foot of every page.
    pub fn with_foot_lines(self, lines: usize) -> Self {
        Self { foot: FOOT + FOOT_LINE * lines.saturating_sub(1) as f64, ..self }
    }

    /// How many pages there are so far.
    pub fn page_count(&self) -> usize {
        self.pages.len()
    }

    /// Width between the margins.
    pub fn width(&self) -> f64 {
        self.paper.size_pt().0 - 2.0 * MARGIN
    }

    /// What is left of this page.
    pub fn room(&self) -> f64 {
        self.paper.size_pt().1 - MARGIN - self.foot - self.y
    }

    /// Whether nothing stands on this page yet.
    pub fn is_at_top(&self) -> bool {
        self.y <= MARGIN
    }

    pub fn next_page(&mut self) {
        self.pages.push(Page::default());
        self.y = MARGIN;
    }

    /// Leaves room empty; none at the top of a page.
    pub fn gap(&mut self, high: f64) {
        if !self.is_at_top() {
            self.y += high;
        }
    }

    /// Puts a block down, on the next page where this one has no room for it.
    pub fn put(&mut self, mut block: Block) {
        if block.high > self.room() && !self.is_at_top() {
            self.next_page();
        }
        block.shift(MARGIN, self.y);
        self.y += block.high;
        if let Some(page) = self.pages.last_mut() {
            page.parts.append(&mut block.nodes);
        }
    }

    /// The document, with a line at the foot of every page: what must always be said, and the number of the page.
    pub fn finish(
        mut self,
        title: String,
        language: String,
        always: &[String],
        number: &dyn Fn(usize, usize) -> String,
    ) -> Document {
        let (wide, high) = self.paper.size_pt();
        let count = self.pages.len();
        let strong = Style::new(Face::Bold, 7.6, Ink::Black);
        for (index, page) in self.pages.iter_mut().enumerate() {
            let y = high - MARGIN;
            let top = y - FOOT_LINE * always.len().saturating_sub(1) as f64;
            let rule = straight(At::new(MARGIN, top - 12.0), At::new(wide - MARGIN, top - 12.0), 0.6, Ink::Rule);
            page.parts.push(Node::of(Role::Artifact, vec![rule]));
            let of = number(index + 1, count);
            let room = wide - 2.0 * MARGIN - NOTE.width(&of) - GUTTER;
            for (line, text) in always.iter().enumerate() {
                let at = At::new(MARGIN, top + FOOT_LINE * line as f64);
                let text = letters(text, at, End::Left, strong.fitting(text, room, 5.0));
                page.parts.push(Node::of(Role::Paragraph, vec![text]));
            }
            let of = letters(&of, At::new(wide - MARGIN, y), End::Right, NOTE);
            page.parts.push(Node::of(Role::Artifact, vec![of]));
        }
        Document { title, language, paper: self.paper, pages: self.pages }
    }
}
