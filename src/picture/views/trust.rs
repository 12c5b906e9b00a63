//! How far the model can be believed here: what its scores on years that it never saw say, or, without any, what may be
//! read off the picture and what not.

mod charts;
pub mod uses;

use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use super::about::sheet_mark;
use super::emblem::{Moon, moon};
use super::facts::{Skill, TestShown, Verdict};
use super::layout::{Layout, area, bottom, right};
use super::page_answer::PageAnswer;
use super::scene::Scene;
use super::sheets::{self, Piece, Setting, Sign};
use super::wording::fit;
use super::{Answer, View, frame, layout_of};
use crate::picture::lettering::{Across, draw as draw_text, measure, paragraph, paragraph_height};
use crate::picture::line::segment;
use crate::picture::shape::{bead, diamond};
use crate::picture::{Align, Canvas, Face, Spot, Stroke, Theme};
use crate::words::Words;

/// A sheet of the page.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
enum Sheet {
    /// What holds without a test.
    Statements,
    /// What it may be used for: which sheet of them.
    Uses(usize),
    /// Halves judged by halves.
    Tests,
    /// Season and duration curve.
    Season,
    /// Errors, and years.
    Errors,
}

/// How many sheets the page has on this canvas; at least one.
pub fn sheet_count(canvas: &Canvas<'_>, scene: &Scene<'_>, words: &Words) -> usize {
    sheets_of(&layout_of(canvas, scene), scene, words).len()
}

fn sheets_of(layout: &Layout, scene: &Scene<'_>, words: &Words) -> Vec<Sheet> {
    let Some(skill) = &scene.skill else { return vec![Sheet::Statements] };
    let mut sheets = Vec::new();
    if !skill.uses.is_empty() {
        sheets.extend((0..uses::sheet_count(layout, skill.uses, words)).map(Sheet::Uses));
    }
    if scene.fitted && !skill.tests.is_empty() {
        sheets.push(Sheet::Tests);
    } else if sheets.is_empty() {
        sheets.push(Sheet::Statements);
    }
    if skill.river.is_some() {
        sheets.extend([Sheet::Season, Sheet::Errors]);
    }
    sheets
}

/// Draws the sheet that the scene has open, the last one where it asks for one beyond.
pub fn draw(canvas: &mut Canvas<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let layout = layout_of(canvas, scene);
    let answer = Answer::Page(PageAnswer::trust(scene));
    frame::draw_frame(canvas, &layout, scene, View::Trust, &answer, theme, words);
    let skill = scene.skill.as_ref();
    let sheets = sheets_of(&layout, scene, words);
    let open = scene.sheet.min(sheets.len() - 1);
    let mut room = layout.content;
    if sheets.len() > 1 {
        sheet_mark(canvas, &layout, room, (open, sheets.len()), theme, words);
        room.size.height = room.size.height.saturating_sub(layout.note.line_px() as u32);
    }
    let inner = Layout { content: room, ..layout };
    match (sheets[open], skill) {
        (Sheet::Uses(sheet), Some(skill)) => uses::draw(canvas, &layout, skill.uses, sheet, theme, words),
        (Sheet::Tests, Some(skill)) => scores(canvas, &inner, skill, theme, words),
        (Sheet::Season, Some(Skill { river: Some(river), .. })) => {
            charts::season_and_duration(canvas, &inner, scene.units, river, theme, words);
        }
        (Sheet::Errors, Some(Skill { river: Some(river), .. })) => {
            charts::errors_and_years(canvas, &inner, scene.units, river, theme, words);
        }
        _ => statements(canvas, &layout, skill.filter(|_| scene.fitted), theme, words),
    }
}

/// What holds without a test, what holds in part, and what does not.
fn statements(canvas: &mut Canvas<'_>, layout: &Layout, skill: Option<&Skill<'_>>, theme: &Theme, words: &Words) {
    let piece = |(holds, word, id): (Moon, &str, &str)| Piece {
        sign: Sign::Holds(holds, words.say(word, &[])),
        head: words.say(id, &[]),
        text: words.say(&format!("{id}.plain"), &[]),
    };
    let rows = [
        (Moon::Full, "page-yes", "page-trust-direction"),
        (Moon::Half, "page-partly", "page-trust-size"),
        (Moon::Empty, "page-no", "page-trust-exact"),
    ];
    let mut pieces: Vec<Piece> = rows.into_iter().map(piece).collect();
    if let Some(skill) = skill {
        let text = summary(skill, words);
        pieces.insert(0, Piece { sign: Sign::None, head: String::new(), text });
    }
    let larger = Face::regular(layout.label.px() + layout.label.px() * 2 / 3);
    let setting = Setting { face: larger, gap: layout.gap * 3 / 2, columns: 1 };
    let setting = setting.fitting_one_sheet(&pieces, layout.content);
    let mut sheets = sheets::set(&pieces, layout.content, setting);
    if sheets.len() > 1 {
        // A small screen that speaks two languages has room for the statements alone.
        pieces.retain(|piece| !piece.head.is_empty());
        pieces.iter_mut().for_each(|piece| piece.text.clear());
        sheets = sheets::set(&pieces, layout.content, setting);
    }
    sheets::draw(canvas, &pieces, &sheets[0], setting, theme);
}

/// What it was fitted to, and whether it gives too much or too little.
fn summary(skill: &Skill<'_>, words: &Words) -> String {
    let (first, last) = skill.fitted_years;
    let years = [("first", words.year(first).into()), ("last", words.year(last).into())];
    let mut text = words.say("page-trust-fitted-to", &years);
    if let Some(bias) = skill.percent_bias {
        let size = words.percent(bias.abs(), 0);
        let id = match libm::round(bias) {
            bias if bias > 0.0 => "page-trust-too-little",
            bias if bias < 0.0 => "page-trust-too-much",
            _ => "page-trust-even",
        };
        text.push(' ');
        text.push_str(&words.say(id, &[("percent", size.into())]));
    }
    text
}

/// A row for every test: how far from the guess to perfect the model came on years that it never saw.
fn scores(canvas: &mut Canvas<'_>, layout: &Layout, skill: &Skill<'_>, theme: &Theme, words: &Words) {
    let room = layout.content;
    let wide = room.size.width as i32;
    let text = summary(skill, words);
    let high = paragraph_height(&text, layout.label, room.size.width) as i32;
    let top = area(room.top_left.x, room.top_left.y, wide, high);
    paragraph(canvas, &text, top, layout.label, theme.ink, Across::Left);

    let legend_high = layout.note.line_px();
    let rows_top = bottom(top) + layout.gap;
    let rows_high = bottom(room) - legend_high * legend_rows(layout, wide, words) - layout.gap - rows_top;
    let row_high = (rows_high / skill.tests.len() as i32).min(layout.strong.line_px() * 4);
    let names = skill.tests.iter().map(|test| name_px(layout, test, words)).max().unwrap_or(0);
    let verdicts = [Verdict::Holds, Verdict::Weakens, Verdict::Fails].map(|verdict| verdict_px(layout, verdict, words));
    let verdicts = verdicts.into_iter().max().unwrap_or(0);
    let least = skill.tests.iter().flat_map(|test| [test.judged, test.guess]).flatten().fold(0.0, f64::min);
    // A score without end lies at the left end of its line.
    let low = least.max(-1.0);
    let two_lines = names + verdicts + layout.gap * 4 + i32::from(layout.label.px()) * 5 > wide;
    for (index, test) in skill.tests.iter().enumerate() {
        let row = area(room.top_left.x, rows_top + row_high * index as i32, wide, row_high);
        score_row(canvas, layout, row, test, (names, verdicts, low, two_lines), theme, words);
    }
    let foot = area(room.top_left.x, bottom(room) - legend_high * legend_rows(layout, wide, words), wide, legend_high);
    legend(canvas, layout, foot, theme, words);
}

fn name_of(test: &TestShown, words: &Words) -> String {
    words.say(test.years.id(), &[("n", test.count.into())])
}

fn name_px(layout: &Layout, test: &TestShown, words: &Words) -> i32 {
    measure(&name_of(test, words), layout.label).width as i32
}

fn verdict_px(layout: &Layout, verdict: Verdict, words: &Words) -> i32 {
    let word = measure(&words.say(verdict.id(), &[]), layout.strong).width as i32;
    word + layout.strong.line_px() + layout.gap
}

fn score_row(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    row: Rectangle,
    test: &TestShown,
    (names, verdicts, low, two_lines): (i32, i32, f64, bool),
    theme: &Theme,
    words: &Words,
) {
    let (x, y, high) = (row.top_left.x, row.top_left.y, row.size.height as i32);
    let line = if two_lines { high / 2 } else { high };
    let wide = row.size.width as i32;
    let name_wide = if two_lines { wide - verdicts - layout.gap } else { names };
    let name = area(x, y, name_wide, line);
    fit(canvas, &name_of(test, words), name, layout.label, theme.ink, Across::Left);
    let middle = y + line / 2;
    let word = words.say(test.verdict.id(), &[]);
    let colour = if test.verdict == Verdict::Fails { theme.lack_ink } else { theme.water_ink };
    let at = Point::new(right(row), middle);
    draw_text(canvas, &word, at, layout.strong, colour, Align::RIGHT.cap_middle());
    let radius = f64::from(layout.strong.cap_px()) * 0.55;
    let moon_x = f64::from(right(row) - measure(&word, layout.strong).width as i32 - layout.gap) - radius;
    moon(canvas, Spot::new(moon_x, f64::from(middle)), radius, Moon::from(test.verdict), theme);

    let (left, end) =
        if two_lines { (x, right(row)) } else { (x + names + layout.gap * 2, right(row) - verdicts - layout.gap) };
    let middle = if two_lines { y + line + line / 2 } else { middle };
    let pad = f64::from(layout.label.px()) / 2.0;
    let (from, to) = (f64::from(left) + pad, f64::from(end) - pad);
    let at = |score: f64| Spot::new(from + (to - from) * (score.max(low) - low) / (1.0 - low), f64::from(middle));
    let level = f64::from(middle);
    segment(canvas, Spot::new(from, level), Spot::new(to, level), Stroke::solid(1.0), theme.rule);
    let tall = f64::from(layout.label.cap_px()) / 2.0;
    segment(canvas, Spot::new(to, level - tall), Spot::new(to, level + tall), Stroke::solid(2.0), theme.ink);
    let Some(judged) = test.judged else {
        if let Some(guess) = test.guess {
            diamond(canvas, at(guess), tall, theme.rule);
        }
        return;
    };
    if let Some(guess) = test.guess {
        let colour = if judged < guess { theme.lack } else { theme.water };
        segment(canvas, at(guess), at(judged), Stroke::solid(layout.line_px * 1.6), colour);
        diamond(canvas, at(guess), tall, theme.ink);
        diamond(canvas, at(guess), tall * 0.5, theme.paper);
    }
    let fill = if test.verdict == Verdict::Fails { theme.lack } else { theme.water };
    bead(canvas, at(judged), tall * 0.95, fill, theme.paper);
}

fn legend_rows(layout: &Layout, wide: i32, words: &Words) -> i32 {
    let own: i32 = legend_ids().iter().map(|id| entry_px(layout, id, words) + layout.gap * 3).sum();
    if own <= wide + layout.gap * 3 { 1 } else { 2 }
}

const fn legend_ids() -> [&'static str; 3] {
    ["page-trust-model", "page-trust-guess", "page-trust-perfect"]
}

fn entry_px(layout: &Layout, id: &str, words: &Words) -> i32 {
    layout.note.cap_px() + layout.gap + measure(&words.say(id, &[]), layout.note).width as i32
}

fn legend(canvas: &mut Canvas<'_>, layout: &Layout, foot: Rectangle, theme: &Theme, words: &Words) {
    let tall = f64::from(layout.note.cap_px()) / 2.0;
    let (mut x, mut y) = (foot.top_left.x, foot.top_left.y + layout.note.line_px() / 2);
    for (index, id) in legend_ids().into_iter().enumerate() {
        let own = entry_px(layout, id, words);
        if x > foot.top_left.x && x + own > right(foot) {
            (x, y) = (foot.top_left.x, y + layout.note.line_px());
        }
        let middle = Spot::new(f64::from(x) + tall, f64::from(y));
        match index {
            0 => bead(canvas, middle, tall * 0.95, theme.water, theme.paper),
            1 => {
                diamond(canvas, middle, tall, theme.ink);
                diamond(canvas, middle, tall * 0.5, theme.paper);
            }
            _ => {
                let (from, to) = (Spot::new(middle.x, middle.y - tall), Spot::new(middle.x, middle.y + tall));
                segment(canvas, from, to, Stroke::solid(2.0), theme.ink);
            }
        }
        let at = Point::new(x + layout.note.cap_px() + layout.gap, y);
        draw_text(canvas, &words.say(id, &[]), at, layout.note, theme.quiet, Align::LEFT.cap_middle());
        x += own + layout.gap * 3;
    }
}
