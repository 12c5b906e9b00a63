//! Snow, river, reservoir and canals through the chosen year, one small chart above the other.

use super::{AS_IT_WAS, Legend, MONTHS_PT, Plot, each, months, side_pt, side_words};
use crate::handout::flow::Block;
use crate::handout::model::{At, Ink, Node, Piece, Role};
use crate::handout::pen::{area, dashed, edged, hatch, line, straight};
use crate::picture::views::scene::{RunShown, Scene};
use crate::water::calendar::CalendarDay;
use crate::words::{Quantity, Words};

#[derive(Clone, Copy, PartialEq, Eq)]
enum Chart {
    Snow,
    River,
    Reservoir,
    Canals,
}

/// Between two plots.
const GAP: f64 = 7.0;
/// Room for the wedges under the river.
const WEDGES: f64 = 6.0;

impl Chart {
    fn title_id(self) -> &'static str {
        match self {
            Self::Snow => "term-snow-water.short",
            Self::River => "term-river.short",
            Self::Reservoir => "term-reservoir.short",
            Self::Canals => "picture-canals",
        }
    }

    fn quantity(self) -> Quantity {
        match self {
            Self::Snow => Quantity::SnowWater,
            Self::Reservoir => Quantity::StoredVolume,
            Self::River | Self::Canals => Quantity::Flow,
        }
    }

    fn of<'a>(self, run: &RunShown<'a>) -> &'a [f64] {
        match self {
            Self::Snow => run.snow_water_mm,
            Self::River => run.natural_flow_m3s,
            Self::Reservoir => run.reservoir.map_or(&[], |reservoir| reservoir.storage_hm3),
            Self::Canals => run.delivered_m3s,
        }
    }

    fn fill(self) -> Ink {
        match self {
            Self::Snow => Ink::Snow,
            Self::River | Self::Reservoir => Ink::WaterPale,
            Self::Canals => Ink::Crop,
        }
    }

    /// The top of the scale, in the unit of the values.
    fn greatest(self, scene: &Scene<'_>) -> f64 {
        let runs = [scene.was, scene.now];
        let most = match self {
            Self::Reservoir => {
                runs.iter().filter_map(|run| run.reservoir).map(|full| full.capacity_hm3).fold(0.0, f64::max)
            }
            _ => {
                runs.iter().flat_map(|run| self.of(run)).copied().filter(|value| value.is_finite()).fold(0.0, f64::max)
            }
        };
        if most > 0.0 { most } else { 1.0 }
    }
}

/// The charts in a box of that size, with `alt` as their words.
pub(in crate::handout) fn season(scene: &Scene<'_>, voices: &[&Words], width: f64, high: f64, alt: String) -> Block {
    let mut charts = vec![Chart::Snow, Chart::River];
    charts.extend(scene.now.reservoir.map(|_| Chart::Reservoir));
    if !scene.canals.is_empty() {
        charts.push(Chart::Canals);
    }
    let mut pieces = Vec::new();
    let side_wide = side_pt(voices);
    let mut legend = Legend::default();
    legend.runs(scene.changed(), voices);
    if scene.changed() {
        let lack = each(voices, |words| words.say("handout-less", &[])).join(" · ");
        legend.entry(&lack, |x, y, wide, high| {
            let corners = crate::handout::pen::corners(x, y, wide, high);
            vec![hatch(std::slice::from_ref(&corners), 2.6, 0.5, Ink::Lack), edged(vec![corners], None, 0.3, Ink::Lack)]
        });
    }
    let half = each(voices, |words| words.say("handout-half-mark", &[])).join(" · ");
    legend.entry(&half, |x, y, wide, high| {
        let middle = x + wide / 2.0;
        vec![area(vec![wedge(middle, y + 1.0, high - 1.0)], Ink::Water)]
    });
    let (drawn, legend_high) = legend.lay_out(side_wide, width - side_wide);
    pieces.extend(drawn);
    let count = charts.len() as f64;
    let each_high = (high - legend_high - MONTHS_PT - WEDGES - GAP * (count - 1.0)) / count;
    let mut top = legend_high;
    let mut last = None;
    for chart in charts {
        let days = scene.year.calendar.len().max(1) as f64;
        let plot = Plot {
            left: side_wide,
            top,
            wide: width - side_wide,
            high: each_high,
            across: (0.0, days),
            up: (0.0, chart.greatest(scene) * 1.04),
        };
        draw(&mut pieces, chart, &plot, scene);
        side(&mut pieces, chart, &plot, scene, voices);
        top += each_high + GAP;
        if chart == Chart::River {
            half_marks(&mut pieces, &plot, scene);
            top += WEDGES;
        }
        last = Some(plot);
    }
    if let Some(plot) = last {
        pieces.extend(months(&plot, &scene.year, voices));
    }
    Block::one(Node::of(Role::Figure(alt), pieces), high)
}

fn draw(pieces: &mut Vec<Piece>, chart: Chart, plot: &Plot, scene: &Scene<'_>) {
    let (was, now) = (chart.of(&scene.was), chart.of(&scene.now));
    pieces.push(area(plot.areas(now), chart.fill()));
    if scene.changed() && matches!(chart, Chart::Reservoir | Chart::Canals) {
        let lacking = lacking(plot, was, now);
        pieces.push(hatch(&lacking, 2.6, 0.5, Ink::Lack));
    }
    pieces.push(straight(At::new(plot.left, plot.foot()), At::new(plot.left + plot.wide, plot.foot()), 0.5, Ink::Rule));
    if let (Chart::Reservoir, Some(reservoir)) = (chart, scene.now.reservoir) {
        let y = plot.y(reservoir.capacity_hm3);
        pieces.push(dashed(
            vec![vec![At::new(plot.left, y), At::new(plot.left + plot.wide, y)]],
            0.4,
            Ink::Rule,
            (0.8, 1.6),
        ));
    }
    pieces.push(line(plot.runs(now), 1.3, Ink::Water));
    if scene.changed() {
        pieces.push(dashed(plot.runs(was), 0.85, Ink::Black, AS_IT_WAS));
    }
}

/// The areas between two lines where there is less than there was.
fn lacking(plot: &Plot, was: &[f64], now: &[f64]) -> Vec<Vec<At>> {
    let mut areas = Vec::new();
    let mut open: Vec<(f64, f64, f64)> = Vec::new();
    let mut close = |open: &mut Vec<(f64, f64, f64)>| {
        if open.len() > 1 {
            let over = open.iter().map(|(x, was, _)| plot.at(*x, *was));
            let under = open.iter().rev().map(|(x, _, now)| plot.at(*x, *now));
            areas.push(over.chain(under).collect());
        }
        open.clear();
    };
    for (day, (was, now)) in was.iter().zip(now).enumerate() {
        if was > now {
            open.push((day as f64 + 0.5, *was, *now));
        } else {
            close(&mut open);
        }
    }
    close(&mut open);
    areas
}

/// Name and scale at the left of a plot.
fn side(pieces: &mut Vec<Piece>, chart: Chart, plot: &Plot, scene: &Scene<'_>, voices: &[&Words]) {
    let top = chart.greatest(scene);
    let names = each(voices, |words| words.say(chart.title_id(), &[]));
    let scales = each(voices, |words| format!("0–{}", words.quantity(top, chart.quantity(), scene.units, 2)));
    pieces.extend(side_words(&names, &scales, plot.top, plot.left - 8.0));
    let x = plot.left;
    pieces.push(line(
        vec![
            vec![At::new(x, plot.y(0.0)), At::new(x, plot.y(top))],
            vec![At::new(x - 2.5, plot.y(top)), At::new(x, plot.y(top))],
        ],
        0.5,
        Ink::Rule,
    ));
}

/// Under the river: a full wedge on the day with half of the water past, an open one where it was.
fn half_marks(pieces: &mut Vec<Piece>, plot: &Plot, scene: &Scene<'_>) {
    let x = |day: CalendarDay| plot.x(f64::from(day.day_of_water_year) - 0.5);
    let day = |run: &RunShown<'_>| run.signs().and_then(|signs| signs.half_volume_date);
    let (was, now) = (day(&scene.was), day(&scene.now));
    let top = plot.foot() + 0.8;
    if let (Some(was), Some(now)) = (was, now)
        && scene.changed()
        && was != now
    {
        let level = top + 4.6;
        pieces.push(straight(At::new(x(was), level), At::new(x(now), level), 0.6, Ink::Lack));
    }
    if let Some(was) = was.filter(|_| scene.changed()) {
        pieces.push(edged(vec![wedge(x(was), top, 5.0)], Some(Ink::Paper), 0.7, Ink::Black));
    }
    if let Some(now) = now {
        pieces.push(area(vec![wedge(x(now), top, 5.4)], Ink::Water));
    }
}

fn wedge(x: f64, top: f64, high: f64) -> Vec<At> {
    let half = high * 0.72;
    vec![At::new(x, top), At::new(x + half, top + high), At::new(x - half, top + high)]
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn lack_is_where_there_is_less() {
        let plot = Plot { left: 0.0, top: 0.0, wide: 60.0, high: 10.0, across: (0.0, 6.0), up: (0.0, 10.0) };
        let areas = lacking(&plot, &[5.0, 5.0, 5.0, 5.0, 5.0, 5.0], &[6.0, 4.0, 3.0, 5.0, 1.0, 2.0]);
        assert_eq!(areas.len(), 2);
        assert_eq!(areas[0], [plot.at(1.5, 5.0), plot.at(2.5, 5.0), plot.at(2.5, 3.0), plot.at(1.5, 4.0)]);
    }
}
