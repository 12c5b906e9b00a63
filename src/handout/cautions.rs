//! The cautions at the foot of a page: as they are written for paper where there is room, else as on the screen.

use super::face::Face;
use super::flow::{Block, GUTTER};
use super::model::{Ink, Role};
use super::paragraph::{column_pt, paragraph};
use super::pen::Style;
use crate::picture::views::about::CAUTIONS;
use crate::words::Words;

/// All cautions under their heading, in the largest letters for which there is room.
pub(super) fn cautions(head: Block, voices: &[&Words], width: f64, room: f64, (form, sizes): (&str, &[f64])) -> Block {
    let column = column_pt(width, 2);
    let mut whole = head.clone();
    for size in sizes {
        let style = Style::new(Face::Regular, *size, Ink::Black);
        let body = if voices.len() > 1 {
            each_caution(voices, column, form, style)
        } else {
            in_columns(voices, column, form, style)
        };
        whole = head.clone().below(2.0, body);
        if whole.high <= room {
            break;
        }
    }
    whole
}

/// One language in two columns of about the same height.
fn in_columns(voices: &[&Words], column: f64, form: &str, style: Style) -> Block {
    let Some(words) = voices.first() else { return Block::default() };
    let parts: Vec<Block> = CAUTIONS.iter().map(|id| caution(words, id, form, column, style, None)).collect();
    let whole: f64 = parts.iter().map(|part| part.high).sum();
    let (mut left, mut right) = (Block::default(), Block::default());
    for part in parts {
        if left.high < whole / 2.0 { left = left.below(2.0, part) } else { right = right.below(2.0, part) }
    }
    left.beside(column + GUTTER, right)
}

/// Each caution in both languages, level with each other.
fn each_caution(voices: &[&Words], column: f64, form: &str, style: Style) -> Block {
    let mut body = Block::default();
    for id in CAUTIONS {
        let mut row = Block::default();
        for (index, words) in voices.iter().enumerate() {
            let part = caution(words, id, form, column, style, Some(words.tag()));
            row = row.beside((column + GUTTER) * index as f64, part);
        }
        body = body.below(2.0, row);
    }
    body
}

/// A caution: its title in bold where it is written out, then its text.
fn caution(words: &Words, id: &str, form: &str, width: f64, style: Style, tag: Option<&str>) -> Block {
    let text = words.say(&format!("{id}{form}"), &[]);
    let mut block = if form.is_empty() {
        paragraph(&text, width, style, Role::Paragraph)
    } else {
        let title = Style::new(Face::Bold, style.size, style.ink);
        let head = paragraph(&words.say(&format!("{id}.title"), &[]), width, title, Role::Heading(3));
        head.below(0.0, paragraph(&text, width, style, Role::Paragraph))
    };
    block.nodes.iter_mut().for_each(|node| node.language = tag.map(str::to_owned));
    block
}
