//! The card that explains one thing in plain words: a term of the page that is open, or what a dial stands for.

use embedded_graphics::geometry::{OriginDimensions, Size};

use super::View;
use super::about::CAUTIONS;
use super::card::CardPlace;
use super::layout::Layout;
use super::scene::DialSetting;
use super::sheets::{self, Piece, Setting, Sign};
use super::wording::{DOT, dial_value};
use crate::picture::{Canvas, Face, Theme};
use crate::words::{System, Words};

/// What is explained.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Explained<'a> {
    /// A term, by its message; see [`terms`].
    Term(&'a str),
    /// A dial as it stands.
    Dial(&'a DialSetting),
}

/// Names, ledger lines, signs and cautions that can be explained on a page, in order.
pub const fn terms(view: View) -> &'static [&'static str] {
    match view {
        View::Valley => &[
            "term-snow-water",
            "term-snow-line",
            "term-elevation-band",
            "term-storage",
            "term-dead-storage",
            "term-full",
            "term-short",
            "term-cut",
            "term-instream-flow",
        ],
        View::Season => &[
            "term-snow-water",
            "term-flow",
            "term-half-volume-date",
            "term-storage",
            "term-delivery",
            "term-as-it-was",
            "term-band",
        ],
        View::Canals => &[
            "term-water-right",
            "term-priority-date",
            "term-full",
            "term-short",
            "term-cut",
            "term-last-full-day",
            "term-last-water",
        ],
        View::Ledger => &[
            "term-ledger",
            "ledger-precipitation",
            "ledger-evaporation",
            "ledger-lake-evaporation",
            "ledger-crop-evaporation",
            "ledger-town-use",
            "ledger-deep-loss",
            "ledger-river-out",
            "term-return-flow",
        ],
        View::Years => &[
            "term-water-year",
            "sign-supply-ratio",
            "term-reliability",
            "term-dry-year",
            "term-middling-year",
            "term-wet-year",
        ],
        View::Grid => &["term-what-if", "term-warming", "term-precipitation", "term-range"],
        View::Trust => &["term-model", "term-fit", "term-test-years", "term-skill", "term-bias", "term-measured"],
        View::About => &CAUTIONS,
        View::Lesson => &["term-lesson", "term-guess", "term-reveal"],
    }
}

/// Draws the card over what is there, in one language or two. `place` is which of how many explanations this is, counted
/// from 0.
pub fn draw(
    canvas: &mut Canvas<'_>,
    explained: Explained<'_>,
    place: (usize, usize),
    units: System,
    theme: &Theme,
    (words, second): (&Words, Option<&Words>),
) {
    let size = canvas.size();
    let layout = Layout::of(size, false);
    let told = |words: &Words| match explained {
        Explained::Term(id) => term(id, words),
        Explained::Dial(setting) => dial(setting, units, words),
    };
    let (mut title, mut pieces) = told(words);
    if let Some((other, more)) = second.map(told) {
        if other != title {
            title = format!("{title}{DOT}{other}");
        }
        pieces.extend(more);
    }
    let (card, setting) = card_for(size, &layout, &pieces);
    card.draw(canvas, &layout, &title, place, theme, words);
    let sheets = sheets::set(&pieces, card.body, setting);
    sheets::draw(canvas, &pieces, &sheets[0], setting, theme);
}

/// A card as high as its text, whose face is as large as the screen allows.
fn card_for(size: Size, layout: &Layout, pieces: &[Piece]) -> (CardPlace, Setting) {
    let most = CardPlace::large(size, layout);
    let larger = Face::regular(layout.label.px() + layout.label.px() / 3);
    let setting = Setting { face: larger, gap: layout.gap, columns: 1 }.fitting_one_sheet(pieces, most.body);
    let sheets = sheets::set(pieces, most.body, setting);
    let low = sheets[0].iter().map(|placed| super::layout::bottom(placed.area)).max().unwrap_or(0);
    let high = low - most.body.top_left.y + layout.gap;
    (CardPlace::around(size, layout, high), setting)
}

fn plain(text: String) -> Piece {
    Piece { sign: Sign::None, head: String::new(), text }
}

fn term(id: &str, words: &Words) -> (String, Vec<Piece>) {
    let part = |part: &str| words.say(&format!("{id}.{part}"), &[]);
    if id.starts_with("caution-") {
        return (part("title"), vec![Piece { sign: Sign::Warning, head: String::new(), text: part("print") }]);
    }
    let (short, name) = (part("short"), words.say(id, &[]));
    let mut pieces = vec![plain(part("plain"))];
    // The trade's own word, where the screen uses a shorter one.
    if name.to_lowercase() != short.to_lowercase() {
        pieces.push(plain(words.say("page-term-in-full", &[("name", name.into())])));
    }
    (short, pieces)
}

fn dial(setting: &DialSetting, units: System, words: &Words) -> (String, Vec<Piece>) {
    let id = Words::key_id("dial", setting.dial.key());
    let at = |value: f64| dial_value(&DialSetting { value: Some(value), ..*setting }, units, words);
    let now = match setting.rests() {
        true if setting.value.is_none() => words.say("dial-carry-over", &[]),
        true => words.say("dial-at-rest", &[]),
        false => dial_value(setting, units, words),
    };
    let range = [("low", at(setting.range.least).into()), ("high", at(setting.range.most).into())];
    let text =
        format!("{}\n{}", words.say("page-dial-now", &[("value", now.into())]), words.say("page-dial-range", &range));
    let stands = plain(words.say(&format!("{id}.stands"), &[]));
    (words.say(&id, &[]), vec![stands, plain(text)])
}
