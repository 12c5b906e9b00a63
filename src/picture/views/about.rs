//! What the model is and is not, what this place was made from, and every caution: sheets that are turned like pages.

use embedded_graphics::geometry::{OriginDimensions, Point};
use embedded_graphics::primitives::Rectangle;

use super::layout::{Layout, area, bottom, right};
use super::page_answer::PageAnswer;
use super::scene::Scene;
use super::sheets::{self, Piece, Placed, Setting, Sign};
use super::wording::share;
use super::{Answer, View, frame, layout_of};
use crate::picture::lettering::draw as draw_text;
use crate::picture::{Align, Canvas, Theme};
use crate::words::{Quantity, Words};

/// The cautions, in the order in which they are read. The first belongs to every result.
pub const CAUTIONS: [&str; 11] = [
    "caution-not-a-forecast",
    "caution-not-for-dam-operation",
    "caution-not-for-floods",
    "caution-not-for-deliveries",
    "caution-not-for-rights",
    "caution-ask-first",
    "caution-canals-kill",
    "caution-reservoirs-kill",
    "caution-spring-ice-kills",
    "caution-someone-falls-in",
    "caution-electrical-wiring",
];

/// How many sheets the page has on this canvas; at least one.
pub fn sheet_count(canvas: &Canvas<'_>, scene: &Scene<'_>, words: &Words) -> usize {
    let layout = Layout::of(canvas.size(), scene.second.is_some());
    set(&layout, &pieces(scene, words)).1.len()
}

/// Draws the sheet that the scene has open, the last one where it asks for one beyond.
pub fn draw(canvas: &mut Canvas<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let layout = layout_of(canvas, scene);
    frame::draw_frame(canvas, &layout, scene, View::About, &Answer::Page(PageAnswer::Model), theme, words);
    let pieces = pieces(scene, words);
    let (setting, sheets) = set(&layout, &pieces);
    let open = scene.sheet.min(sheets.len() - 1);
    sheets::draw(canvas, &pieces, &sheets[open], setting, theme);
    if sheets.len() > 1 {
        sheet_mark(canvas, &layout, layout.content, (open, sheets.len()), theme, words);
    }
}

/// "2 of 5" at the right end of the last line of a box.
pub(super) fn sheet_mark(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    (open, count): (usize, usize),
    theme: &Theme,
    words: &Words,
) {
    let text = words.say("page-sheet", &[("n", (open + 1).into()), ("of", count.into())]);
    let at = Point::new(right(room), bottom(room) - layout.note.line_px() / 2);
    draw_text(canvas, &text, at, layout.note, theme.quiet, Align::RIGHT.cap_middle());
}

fn set(layout: &Layout, pieces: &[Piece]) -> (Setting, Vec<Vec<Placed>>) {
    let room = layout.content;
    let columns = if layout.roomy && room.size.width > room.size.height { 2 } else { 1 };
    let setting = Setting { face: layout.label, gap: layout.gap, columns };
    let high = room.size.height as i32 - layout.note.line_px();
    let inner = area(room.top_left.x, room.top_left.y, room.size.width as i32, high);
    (setting, sheets::set(pieces, inner, setting))
}

/// A caution as a piece of text.
pub(super) fn caution(id: &str, words: &Words) -> Piece {
    Piece { sign: Sign::Warning, head: String::new(), text: words.say(id, &[]) }
}

fn pieces(scene: &Scene<'_>, words: &Words) -> Vec<Piece> {
    let facts = &scene.facts;
    let mut pieces = vec![caution(CAUTIONS[0], words)];
    let mut tell = |head: &str, text: String| {
        pieces.push(Piece { sign: Sign::Bead, head: words.say(head, &[]), text });
    };
    let (first, last) = (scene.was.years.first(), scene.was.years.last());
    if let (Some(first), Some(last)) = (first, last) {
        let years = [
            ("n", scene.was.years.len().into()),
            ("first", words.year(first.signs.water_year).into()),
            ("last", words.year(last.signs.water_year).into()),
        ];
        let mut text = words.say("page-about-years", &years);
        if let Some(filled) = facts.filled_values {
            text.push(' ');
            let id = if filled == 0 { "page-about-no-gaps" } else { "tell-gaps" };
            text.push_str(&words.say(id, &[("n", filled.into())]));
        }
        tell("page-about-record", text);
    }
    tell("page-about-dials", format!("{} {}", words.say("tell-storms-kept", &[]), words.say("page-about-delta", &[])));
    if let Some(key) = facts.evaporation_key {
        let method = words.say(&Words::key_id("tell-method", key), &[]);
        let mut text = words.say("tell-method", &[("method", method.into())]);
        text.push('.');
        if let Some(percent) = facts.percent_per_degree {
            let degree = words.quantity(1.0, Quantity::TemperatureChange, scene.units, 2);
            let more = [("degree", degree.into()), ("percent", words.percent(percent, 1).into())];
            text.push(' ');
            text.push_str(&words.say("tell-method-per-degree", &more));
        }
        tell("page-about-air", text);
    }
    if let Some(key) = facts.rule_key {
        let rule = words.say(&Words::key_id("tell-rule", key), &[]);
        let enough = [("share", share(scene.all_years.enough_share, words).into())];
        let rule = words.say("tell-rule", &[("rule", rule.into())]);
        tell("page-about-sharing", format!("{rule}. {}", words.say("tell-enough", &enough)));
    }
    let mut origin = Vec::new();
    if scene.invented {
        origin.push(words.say("tell-invented", &[]));
    }
    if let Some(source) = facts.source {
        origin.push(source.to_owned());
    }
    if !origin.is_empty() {
        tell("page-about-origin", origin.join(" "));
    }
    pieces.extend(CAUTIONS[1..].iter().map(|id| caution(id, words)));
    pieces
}
