//! What the model may be used for: a moon and a word for each use, and the score behind it.

use embedded_graphics::primitives::Rectangle;

use crate::picture::views::emblem::Moon;
use crate::picture::views::facts::{ScoreUnit, UseShown, Verdict};
use crate::picture::views::layout::{Layout, area};
use crate::picture::views::sheets::{self, Piece, Placed, Setting, Sign};
use crate::picture::{Canvas, Theme};
use crate::words::Words;

/// The word of a verdict.
pub fn verdict(shown: &UseShown, words: &Words) -> String {
    let id = match shown.verdict {
        Some(Verdict::Holds) => "trust-known-yes",
        Some(Verdict::Weakens) => "trust-known-partly",
        Some(Verdict::Fails) => "trust-known-no",
        None => "trust-known-unknown",
    };
    words.say(id, &[])
}

/// The score behind a verdict with its thresholds, or what is lacking for one.
pub fn reason(shown: &UseShown, words: &Words) -> String {
    let value = match shown.value {
        Err(need) => return words.say(&Words::key_id("trust-need", need), &[]),
        Ok(value) => value,
    };
    let written = |value: f64| match shown.unit {
        _ if !value.is_finite() => words.style().missing.clone(),
        ScoreUnit::Score => words.number(value.max(0.0), 2),
        ScoreUnit::Days => words.number(value, 0),
        ScoreUnit::Percent => words.percent(value, 0),
    };
    let (good, fair) = shown.thresholds;
    let arguments = [("value", written(value).into()), ("good", written(good).into()), ("fair", written(fair).into())];
    let mut text = words.say(&Words::key_id("trust-score", shown.score), &arguments);
    if shown.beaten && shown.verdict == Some(Verdict::Fails) {
        text.push(' ');
        text.push_str(&words.say("trust-beaten", &[]));
    }
    text
}

fn pieces(uses: &[UseShown], words: &Words) -> Vec<Piece> {
    let piece = |shown: &UseShown| {
        let moon = shown.verdict.map_or(Moon::Empty, Moon::from);
        Piece {
            sign: match shown.verdict {
                Some(_) => Sign::Holds(moon, verdict(shown, words)),
                None => Sign::Unknown(verdict(shown, words)),
            },
            head: words.say(&Words::key_id("trust-use", shown.key), &[]),
            text: reason(shown, words),
        }
    };
    uses.iter().map(piece).collect()
}

fn set(layout: &Layout, pieces: &[Piece]) -> (Setting, Vec<Vec<Placed>>) {
    let high = layout.content.size.height as i32 - layout.note.line_px();
    let room = layout.content;
    let room: Rectangle = area(room.top_left.x, room.top_left.y, room.size.width as i32, high);
    let columns = if layout.roomy && room.size.width > room.size.height { 2 } else { 1 };
    let setting = Setting { face: layout.label, gap: layout.gap, columns };
    (setting, sheets::set(pieces, room, setting))
}

/// How many sheets they take.
pub(super) fn sheet_count(layout: &Layout, uses: &[UseShown], words: &Words) -> usize {
    set(layout, &pieces(uses, words)).1.len()
}

/// Draws one of the sheets.
pub(super) fn draw(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    uses: &[UseShown],
    open: usize,
    theme: &Theme,
    words: &Words,
) {
    let pieces = pieces(uses, words);
    let (setting, sheets) = set(layout, &pieces);
    sheets::draw(canvas, &pieces, &sheets[open.min(sheets.len() - 1)], setting, theme);
}
