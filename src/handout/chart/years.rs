//! Every year of the record: the share of the water asked for that arrived, and the river under it.

use super::{Legend, Plot, TICK, each, side_pt, side_words};
use crate::handout::flow::Block;
use crate::handout::model::{At, Ink, Node, Piece, Role};
use crate::handout::pen::{End, area, corners, dashed, edged, letters, line, round, straight};
use crate::picture::views::scene::{RunShown, Scene};
use crate::words::{Quantity, Words};

/// Room for the names of the years.
const NAMES: f64 = 12.0;

/// The charts in a box of that size, with `alt` as their words.
pub(in crate::handout) fn years(scene: &Scene<'_>, voices: &[&Words], width: f64, high: f64, alt: String) -> Block {
    let count = scene.now.years.len().min(scene.was.years.len());
    let has_supply =
        [scene.was, scene.now].iter().any(|run| run.years.iter().any(|year| year.signs.supply_ratio.is_some()));
    let side = side_pt(voices);
    let (mut pieces, legend_high) =
        if has_supply { legend(scene, voices).lay_out(side, width - side) } else { (Vec::new(), 4.0) };
    let body = high - legend_high - NAMES;
    let river_high = if has_supply { body * 0.3 } else { body };
    let across = (0.0, count.max(1) as f64);
    let supply = Plot {
        left: side,
        top: legend_high,
        wide: width - side,
        high: body - river_high - 6.0,
        across,
        up: (0.0, 1.05),
    };
    let flows = scene.was.years.iter().chain(scene.now.years).map(|year| year.signs.natural_flow_hm3);
    let most = flows.fold(0.0, f64::max);
    let river = Plot {
        left: side,
        top: high - NAMES - river_high,
        wide: width - side,
        high: river_high,
        across,
        up: (0.0, if most > 0.0 { most * 1.02 } else { 1.0 }),
    };
    chosen(&mut pieces, &river, if has_supply { supply.top } else { river.top }, scene);
    if has_supply {
        shares(&mut pieces, &supply, count, scene, voices);
    }
    bars(&mut pieces, &river, count, most, scene, voices);
    names(&mut pieces, &river, count, scene);
    Block::one(Node::of(Role::Figure(alt), pieces), high)
}

fn legend(scene: &Scene<'_>, voices: &[&Words]) -> Legend {
    let mut legend = Legend::default();
    let say = |id: &str| each(voices, |words| words.say(id, &[])).join(" · ");
    legend.entry(&say("page-years-was-enough"), |x, y, wide, high| dot(At::new(x + wide / 2.0, y + high / 2.0)));
    legend.entry(&say("page-years-was-short"), |x, y, wide, high| open(At::new(x + wide / 2.0, y + high / 2.0)));
    if scene.changed() {
        legend.entry(&say("picture-as-it-was"), |x, y, wide, high| tick(x + wide / 2.0, y + high / 2.0));
    }
    legend
}

/// A pale ground under the year that the other charts show.
fn chosen(pieces: &mut Vec<Piece>, plot: &Plot, top: f64, scene: &Scene<'_>) {
    let year = scene.now.chosen_year as f64;
    let (x, next) = (plot.x(year), plot.x(year + 1.0));
    pieces.push(area(vec![corners(x, top, next - x, plot.foot() - top)], Ink::Snow));
}

fn shares(pieces: &mut Vec<Piece>, plot: &Plot, count: usize, scene: &Scene<'_>, voices: &[&Words]) {
    let right = plot.left + plot.wide;
    let level = |share: f64, width: f64, ink: Ink| {
        straight(At::new(plot.left, plot.y(share)), At::new(right, plot.y(share)), width, ink)
    };
    pieces.push(level(0.0, 0.5, Ink::Rule));
    let enough = scene.all_years.enough_share;
    let y = plot.y(enough);
    pieces.push(dashed(vec![vec![At::new(plot.left, y), At::new(right, y)]], 0.5, Ink::Black, (1.0, 1.6)));
    let mut stems = Vec::new();
    let mut marks = Vec::new();
    let share = |run: &RunShown<'_>, index: usize| run.years.get(index).and_then(|year| year.signs.supply_ratio);
    for index in 0..count {
        let x = plot.x(index as f64 + 0.5);
        let (was, now) = (share(&scene.was, index), share(&scene.now, index));
        if let Some(was) = was.filter(|_| scene.changed()) {
            marks.extend(tick(x, plot.y(was)));
            if let Some(now) = now {
                stems.push(vec![At::new(x, plot.y(was)), At::new(x, plot.y(now))]);
            }
        }
        if let Some(now) = now {
            let at = At::new(x, plot.y(now));
            marks.extend(if now >= enough { dot(at) } else { open(at) });
        }
    }
    pieces.push(line(stems, 0.5, Ink::Rule));
    pieces.append(&mut marks);
    let names = each(voices, |words| words.say("sign-supply-ratio.short", &[]));
    let line = |words: &Words| words.say("page-years-line", &[("share", words.percent(enough * 100.0, 0).into())]);
    pieces.extend(side_words(&names, &each(voices, line), plot.top, plot.left - 8.0));
}

fn bars(pieces: &mut Vec<Piece>, plot: &Plot, count: usize, most: f64, scene: &Scene<'_>, voices: &[&Words]) {
    let flow = |run: &RunShown<'_>, index: usize| run.years.get(index).map_or(0.0, |year| year.signs.natural_flow_hm3);
    let pad = (plot.wide / count.max(1) as f64 * 0.16).min(3.0);
    let mut solid = Vec::new();
    let mut tops = Vec::new();
    for index in 0..count {
        let (x, next) = (plot.x(index as f64) + pad, plot.x(index as f64 + 1.0) - pad);
        let y = plot.y(flow(&scene.now, index));
        solid.push(corners(x, y, next - x, plot.foot() - y));
        let was = plot.y(flow(&scene.was, index));
        tops.push(vec![At::new(x, was), At::new(next, was)]);
    }
    pieces.push(area(solid, Ink::Water));
    if scene.changed() {
        pieces.push(line(tops, 0.8, Ink::Black));
    }
    pieces.push(straight(At::new(plot.left, plot.foot()), At::new(plot.left + plot.wide, plot.foot()), 0.5, Ink::Rule));
    let names = each(voices, |words| words.say("term-river.short", &[]));
    let scale = |words: &Words| format!("0–{}", words.quantity(most, Quantity::StoredVolume, scene.units, 2));
    pieces.extend(side_words(&names, &each(voices, scale), plot.top, plot.left - 8.0));
}

/// As many years are named as there is room for, at even steps.
fn names(pieces: &mut Vec<Piece>, plot: &Plot, count: usize, scene: &Scene<'_>) {
    let slot = plot.wide / count.max(1) as f64;
    let step = [1, 2, 5, 10, 20, 50, 100].into_iter().find(|step| slot * f64::from(*step) > 26.0).unwrap_or(100);
    let mut ticks = Vec::new();
    for index in 0..count {
        let Some(report) = scene.now.years.get(index) else { continue };
        let year = report.signs.water_year;
        if year % step != 0 && step > 1 {
            continue;
        }
        let x = plot.x(index as f64 + 0.5);
        ticks.push(vec![At::new(x, plot.foot()), At::new(x, plot.foot() + 2.5)]);
        pieces.push(letters(&year.to_string(), At::new(x, plot.foot() + 9.0), End::Middle, TICK));
    }
    pieces.push(line(ticks, 0.5, Ink::Rule));
}

fn dot(at: At) -> Vec<Piece> {
    vec![area(vec![round(at, 2.3)], Ink::Water)]
}

/// A year that was not enough: an open wedge with its point down.
fn open(at: At) -> Vec<Piece> {
    let wedge = vec![At::new(at.x - 2.7, at.y - 2.1), At::new(at.x + 2.7, at.y - 2.1), At::new(at.x, at.y + 2.7)];
    vec![edged(vec![wedge], Some(Ink::Paper), 0.9, Ink::Lack)]
}

fn tick(x: f64, y: f64) -> Vec<Piece> {
    vec![straight(At::new(x - 3.0, y), At::new(x + 3.0, y), 0.9, Ink::Black)]
}
