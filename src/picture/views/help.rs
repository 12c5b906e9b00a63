//! The help card: what one knob and one button do, what a finger does, the keys, and the cautions, over whatever page is open.

use embedded_graphics::geometry::{OriginDimensions, Size};

use super::about::{CAUTIONS, caution};
use super::card::CardPlace;
use super::emblem::Hand;
use super::layout::Layout;
use super::sheets::{self, Piece, Placed, Setting, Sign};
use crate::picture::{Canvas, Face, Theme};
use crate::words::Words;

/// From so many keys on, a line of the key table names only the first and the last.
const KEYS_NAMED: usize = 5;

/// A key, by what is printed on it.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum KeyCap {
    /// The message that names it.
    Named(&'static str),
    /// A letter, digit or sign, the same in every language.
    Char(char),
}

/// A line of the key table.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct KeyLine {
    /// The keys that it speaks of.
    pub keys: Vec<KeyCap>,
    /// The message that says what they do.
    pub message: &'static str,
}

/// One part of the card.
struct Part {
    title: &'static str,
    pieces: Vec<Piece>,
    setting: Setting,
    sheets: Vec<Vec<Placed>>,
}

/// How many sheets the card has on a screen of this size; at least one.
pub fn sheet_count(size: Size, keys: &[KeyLine], words: (&Words, Option<&Words>)) -> usize {
    let layout = Layout::of(size, false);
    let place = CardPlace::large(size, &layout);
    let count = |words| parts(&place, &layout, keys, words).iter().map(|part| part.sheets.len()).sum::<usize>();
    count(words.0) + words.1.map_or(0, count)
}

/// Draws the card over what is there, with the sheet that is open, the last one where `open` is beyond. In two languages
/// all sheets come in the first, then in the second.
pub fn draw(
    canvas: &mut Canvas<'_>,
    open: usize,
    keys: &[KeyLine],
    theme: &Theme,
    (words, second): (&Words, Option<&Words>),
) {
    let layout = Layout::of(canvas.size(), false);
    let place = CardPlace::large(canvas.size(), &layout);
    let spoken: Vec<(Part, &Words)> = [Some(words), second]
        .into_iter()
        .flatten()
        .flat_map(|words| parts(&place, &layout, keys, words).into_iter().map(move |part| (part, words)))
        .collect();
    let count: usize = spoken.iter().map(|(part, _)| part.sheets.len()).sum();
    let open = open.min(count - 1);
    let mut sheet = open;
    for (part, words) in &spoken {
        if let Some(placed) = part.sheets.get(sheet) {
            place.draw(canvas, &layout, &words.say(part.title, &[]), (open, count), theme, words);
            sheets::draw(canvas, &part.pieces, placed, part.setting, theme);
            return;
        }
        sheet -= part.sheets.len();
    }
}

fn parts(place: &CardPlace, layout: &Layout, keys: &[KeyLine], words: &Words) -> Vec<Part> {
    let part = |title, pieces: Vec<Piece>, setting: Setting| {
        let sheets = sheets::set(&pieces, place.body, setting);
        Part { title, pieces, setting, sheets }
    };
    let setting = Setting { face: layout.label, gap: layout.gap, columns: 1 };
    let larger = Face::regular(layout.label.px() + layout.label.px() * 2 / 3);
    let larger = Setting { face: larger, gap: layout.gap * 2, columns: 1 };
    let hand = |(hand, id): (Hand, &str)| Piece {
        sign: Sign::Hand(hand),
        head: words.say(id, &[]),
        text: words.say(&format!("{id}.plain"), &[]),
    };
    let hands = [(Hand::Turn, "help-turn"), (Hand::Press, "help-press"), (Hand::Hold, "help-hold")];
    let hands: Vec<Piece> = hands.into_iter().map(hand).collect();
    let touch = ["help-touch-dial", "help-touch-day", "help-touch-view", "help-touch-ring", "help-touch-wheel"];
    let touch: Vec<Piece> =
        touch.map(|id| Piece { sign: Sign::Bead, head: String::new(), text: words.say(id, &[]) }).into();
    let cautions = CAUTIONS.iter().map(|id| caution(id, words)).collect();
    let mut parts = vec![part("help-title", hands.clone(), larger.fitting_one_sheet(&hands, place.body))];
    parts.push(part("help-touch", touch.clone(), larger.fitting_one_sheet(&touch, place.body)));
    if !keys.is_empty() {
        let columns = if place.body.size.width as i32 >= i32::from(layout.label.px()) * 40 { 2 } else { 1 };
        let lines = keys.iter().map(|line| key_piece(line, words)).collect();
        parts.push(part("help-keys", lines, Setting { columns, gap: (layout.gap * 2 / 3).max(2), ..setting }));
    }
    parts.push(part("help-cautions", cautions, setting));
    parts
}

fn key_piece(line: &KeyLine, words: &Words) -> Piece {
    let name = |key: &KeyCap| match key {
        KeyCap::Named(id) => words.say(id, &[]),
        KeyCap::Char(letter) => letter.to_uppercase().collect(),
    };
    let keys = match line.keys.as_slice() {
        [first, .., last] if line.keys.len() >= KEYS_NAMED => vec![format!("{}–{}", name(first), name(last))],
        keys => keys.iter().map(name).collect(),
    };
    Piece { sign: Sign::Keys(keys), head: String::new(), text: words.say(line.message, &[]) }
}
