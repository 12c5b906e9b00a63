//! Where every drop of the chosen year went: what came in and what went out, each line with a bar as long as its water.

use super::face::Face;
use super::flow::{Block, GUTTER};
use super::model::{At, Heads, Ink, Node, Piece, Role};
use super::paragraph::column_pt;
use super::pen::{BODY, End, NOTE, STRONG, Style, area, corners, edged, hatch, letters};
use crate::picture::views::ledger::entries::{Entry, Look, entries_in, entries_out, merge_smallest};
use crate::picture::views::scene::Scene;
use crate::water::units::M3_PER_HM3;
use crate::words::{Quantity, Unit, Words};

/// Room for an amount.
const AMOUNT: f64 = 46.0;
const BAR: f64 = 2.6;
/// Under this many of the larger metric unit, the smaller one reads better.
const SMALLEST_IN_LARGE_UNIT: f64 = 0.1;

/// Both sides of the accounts side by side; nothing where the record has no whole year.
pub(super) fn ledger(scene: &Scene<'_>, voices: &[&Words], tags: &[&str], width: f64, most: usize) -> Block {
    let report =
        |run: &crate::picture::views::scene::RunShown<'_>| run.years.get(run.chosen_year).map(|year| year.ledger);
    let (Some(now), Some(was), Some(words)) = (report(&scene.now), report(&scene.was), voices.first()) else {
        return Block::default();
    };
    let whole_m3 = now.in_m3().max(was.in_m3());
    let mut unit = words.unit_of(Quantity::StoredVolume, scene.units);
    if unit == Unit::CubicHectometres && whole_m3 < SMALLEST_IN_LARGE_UNIT * M3_PER_HM3 {
        unit = Unit::CubicMetres;
    }
    let sheet = Sheet { changed: scene.changed(), unit, whole_m3, voices, tags, width: column_pt(width, 2) };
    let (mut ins, mut outs) = (entries_in(&now, &was), entries_out(&now, &was));
    merge_smallest(&mut ins, most, Look::Rain);
    merge_smallest(&mut outs, most, Look::Ground);
    let left = sheet.side("handout-water-in", &ins, now.in_m3(), was.in_m3());
    let right = sheet.side("handout-water-out", &outs, now.out_m3(), was.out_m3());
    left.beside(sheet.width + GUTTER, right)
}

struct Sheet<'s> {
    changed: bool,
    unit: Unit,
    whole_m3: f64,
    voices: &'s [&'s Words],
    tags: &'s [&'s str],
    width: f64,
}

impl Sheet<'_> {
    fn side(&self, title: &str, entries: &[Entry], now_m3: f64, was_m3: f64) -> Block {
        let mut table = Node::new(Role::Table);
        let mut bars: Vec<Piece> = Vec::new();
        let mut y = 0.0;
        let head = Style::new(Face::Bold, 7.4, Ink::Quiet);
        let unit = self.voices.first().map_or(String::new(), |words| words.say(self.unit.id(), &[]));
        let mut row = Node::new(Role::Row);
        let mut lines = 0.0;
        let mut cell = Node::new(Role::HeadCell(Heads::Column));
        for (voice, words) in self.voices.iter().enumerate() {
            let text = words.say(title, &[("unit", unit.clone().into())]);
            cell.push(self.text(&text, At::new(0.0, y + head.rise_pt() + lines), End::Left, head, voice));
            lines += head.line_pt();
        }
        row.push(cell);
        let columns: &[(&str, f64)] =
            if self.changed { &[("page-was", AMOUNT), ("page-now", 0.0)] } else { &[("page-now", 0.0)] };
        for (id, from_right) in columns.iter().filter(|_| self.changed) {
            let mut cell = Node::new(Role::HeadCell(Heads::Column));
            for (voice, words) in self.voices.iter().enumerate() {
                let at = At::new(self.width - from_right, y + head.rise_pt() + head.line_pt() * voice as f64);
                cell.push(self.text(&words.say(id, &[]), at, End::Right, head, voice));
            }
            row.push(cell);
        }
        table.push(row);
        y += lines + 2.0;
        for entry in entries {
            y = self.row(&mut table, Some(&mut bars), y, &|words| words.say(entry.id, &[]), entry, BODY);
        }
        let sum = Entry { id: "", look: Look::Rain, has_snow: false, now_m3, was_m3 };
        y += 2.0;
        bars.push(super::pen::straight(At::new(0.0, y), At::new(self.width, y), 0.5, Ink::Rule));
        // What the stores gave and kept stands in the lines above; together both sides come to the same.
        let all: (f64, f64) =
            entries.iter().fold((0.0, 0.0), |sum, entry| (sum.0 + entry.now_m3, sum.1 + entry.was_m3));
        let sum = Entry { now_m3: all.0.max(sum.now_m3), was_m3: all.1.max(sum.was_m3), ..sum };
        y = self.row(&mut table, None, y + 1.0, &|words| words.say("handout-together", &[]), &sum, STRONG);
        Block { nodes: vec![Node::of(Role::Artifact, bars), table], high: y }
    }

    /// Adds a line with its bar, and gives where the next begins.
    fn row(
        &self,
        table: &mut Node,
        bars: Option<&mut Vec<Piece>>,
        y: f64,
        name: &dyn Fn(&Words) -> String,
        entry: &Entry,
        style: Style,
    ) -> f64 {
        let mut row = Node::new(Role::Row);
        let mut cell = Node::new(Role::HeadCell(Heads::Row));
        let room = self.width - AMOUNT * if self.changed { 2.0 } else { 1.0 };
        let names = super::chart::each(self.voices, name);
        let mut x = 0.0;
        // Both languages stand on one line, the second one quiet.
        for (voice, text) in names.iter().enumerate() {
            let style = if voice == 0 { style } else { NOTE };
            let shown = if voice == 0 { text.clone() } else { format!("· {text}") };
            let style = style.fitting(&shown, room - x, 5.0);
            cell.push(self.text(&shown, At::new(x, y + BODY.rise_pt()), End::Left, style, voice));
            x += style.width(&shown) + 4.0;
        }
        row.push(cell);
        let strong = Style::new(Face::Bold, style.size, Ink::Black);
        let quiet = Style::new(Face::Regular, style.size, Ink::Quiet);
        let mut amounts = Vec::new();
        if self.changed {
            amounts.push((entry.was_m3, AMOUNT, quiet));
        }
        amounts.push((entry.now_m3, 0.0, strong));
        for (value_m3, from_right, style) in amounts {
            let mut cell = Node::new(Role::Cell);
            if let Some(words) = self.voices.first() {
                let text = words.significant(self.unit.convert(value_m3 / M3_PER_HM3), 3);
                let at = At::new(self.width - from_right, y + BODY.rise_pt());
                cell.push(self.text(&text, at, End::Right, style, 0));
            }
            row.push(cell);
        }
        table.push(row);
        let Some(bars) = bars else { return y + BODY.line_pt() };
        let top = y + BODY.line_pt() - 0.8;
        let length = |value_m3: f64| self.width * (value_m3 / self.whole_m3).clamp(0.0, 1.0);
        let bar = corners(0.0, top, length(entry.now_m3).max(0.3), BAR);
        bars.extend(painted(entry.look, bar));
        if self.changed && entry.was_m3 > 0.0 {
            // The end of the bar as it was.
            let x = length(entry.was_m3);
            bars.push(super::pen::straight(At::new(x, top - 1.0), At::new(x, top + BAR + 1.0), 0.9, Ink::Black));
        }
        top + BAR + 1.4
    }

    fn text(&self, text: &str, at: At, end: End, style: Style, voice: usize) -> Node {
        let tag = self.tags.get(voice).filter(|_| voice > 0).map(|tag| (*tag).to_owned());
        Node::of(Role::Paragraph, vec![letters(text, at, end, style)]).in_language(tag)
    }
}

fn painted(look: Look, bar: Vec<At>) -> Vec<Piece> {
    let bar = vec![bar];
    match look {
        Look::Rain | Look::River => vec![area(bar, Ink::Water)],
        Look::Store => vec![edged(bar, Some(Ink::WaterPale), 0.4, Ink::Water)],
        Look::Air => vec![hatch(&bar, 2.0, 0.4, Ink::Quiet), edged(bar, None, 0.4, Ink::Quiet)],
        Look::Crop => vec![edged(bar, Some(Ink::Crop), 0.4, Ink::Black)],
        Look::Town | Look::Ground => vec![area(bar, Ink::Rule)],
    }
}
