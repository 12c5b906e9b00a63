//! Running text: paragraphs and headings in one column, or side by side in two languages.

use super::face::Face;
use super::flow::{Block, GUTTER};
use super::model::{At, Ink, Node, Role};
use super::pen::{End, Style, letters, straight};

pub(super) const HEADING: Style = Style::new(Face::Bold, 10.6, Ink::Black);

/// A text in lines of that width.
pub(super) fn paragraph(text: &str, width: f64, style: Style, role: Role) -> Block {
    let lines = style.face.lines(text, style.size, width);
    let last = lines.len() - 1;
    let pieces = lines.iter().enumerate().map(|(index, line)| {
        let y = style.rise_pt() + style.line_pt() * index as f64;
        // Two words that a new line parts stay two words for whoever copies or hears them.
        let text = if index < last { format!("{line} ") } else { line.clone() };
        letters(&text, At::new(0.0, y), End::Left, style)
    });
    let pieces = pieces.collect();
    Block::one(Node::of(role, pieces), style.line_pt() * lines.len() as f64)
}

/// The width of each of so many columns.
pub(super) fn column_pt(width: f64, columns: usize) -> f64 {
    (width - GUTTER * columns.saturating_sub(1) as f64) / columns.max(1) as f64
}

/// The same part in every language, side by side. Each text comes with the tag of its language.
pub(super) fn side_by_side(texts: &[(String, &str)], width: f64, part: impl Fn(&str, f64) -> Block) -> Block {
    let column = column_pt(width, texts.len());
    let mut whole = Block::default();
    for (index, (text, tag)) in texts.iter().enumerate() {
        let mut block = part(text, column);
        if texts.len() > 1 {
            block.nodes.iter_mut().for_each(|node| node.language = Some((*tag).to_owned()));
        }
        whole = whole.beside((column + GUTTER) * index as f64, block);
    }
    whole
}

/// A heading with a rule above it.
pub(super) fn heading(texts: &[(String, &str)], width: f64) -> Block {
    let rule = straight(At::new(0.0, 0.0), At::new(width, 0.0), 0.9, Ink::Black);
    let rule = Block::one(Node::of(Role::Artifact, vec![rule]), 4.0);
    rule.below(0.0, side_by_side(texts, width, |text, width| paragraph(text, width, HEADING, Role::Heading(2))))
}
