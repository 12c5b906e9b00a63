//! How the year goes: snow, river, storage and deliveries day by day, as it was and with your changes.

use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use super::layout::{Layout, area, bottom, right};
use super::months::{draw_months, months_height};
use super::scene::{RunShown, Scene};
use super::touch::day_on;
use super::wording::fit;
use super::{Answer, View, frame, layout_of};
use crate::picture::chart::{
    LinePair, Plot, as_it_was, day_cursor, line_pair, range_band, swatch_as_it_was, swatch_with_changes,
};
use crate::picture::lettering::{Across, draw as draw_text, measure};
use crate::picture::line::{polyline, segment};
use crate::picture::shape::{bead, triangle};
use crate::picture::{Align, Canvas, Paint, Spot, Stroke, Theme};
use crate::water::calendar::CalendarDay;
use crate::words::{Quantity, Words};

/// The look of a run that was kept beside: round dots, told apart from dashes by their shape.
pub(super) fn kept_stroke(width_px: f64) -> Stroke {
    Stroke::dashed(width_px, 0.1, width_px * 2.2).with_round_ends()
}

/// One of the stacked charts.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
enum Chart {
    Snow,
    River,
    Reservoir,
    Canals,
}

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

    fn fill(self, theme: &Theme) -> Paint {
        match self {
            Self::Snow => theme.snow.into(),
            Self::River | Self::Reservoir => theme.water_pale.into(),
            Self::Canals => Paint::Wash { colour: theme.crop, share: 150 },
        }
    }
}

/// Draws the page.
pub fn draw(canvas: &mut Canvas<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let layout = layout_of(canvas, scene);
    frame::draw_frame(canvas, &layout, scene, View::Season, &Answer::season(scene), theme, words);

    let rows = Rows::of(&layout, scene, words);
    let (side, each, room) = (rows.side, rows.each, layout.content);
    for row in &rows.charts {
        draw_chart(canvas, &layout, row.chart, &row.plot, scene, theme);
        let (x, middle) = (room.top_left.x, row.top + layout.gap + (each - layout.gap) / 2);
        let name = words.say(row.chart.title_id(), &[]);
        let (name_high, top_high) = (layout.strong.line_px(), layout.note.line_px());
        if each >= name_high + top_high {
            let name_area = area(x, middle - name_high, side - layout.gap, name_high);
            fit(canvas, &name, name_area, layout.strong, theme.ink, Across::Left);
            let range = area(x, middle, side - layout.gap, top_high);
            fit(canvas, &row.range, range, layout.note, theme.quiet, Across::Left);
        } else {
            let name_area = area(x, middle - name_high / 2, side - layout.gap, name_high);
            fit(canvas, &name, name_area, layout.strong, theme.ink, Across::Left);
        }
        if row.chart == Chart::River {
            half_marks(canvas, &layout, &row.plot, scene, theme);
        }
    }
    if let Some(row) = rows.charts.last() {
        draw_months(canvas, &row.plot, &scene.year, layout.note, theme, words);
    }
    let legend_high = layout.label.line_px();
    let legend = area(room.top_left.x, bottom(room) - legend_high, room.size.width as i32, legend_high);
    draw_legend(canvas, &layout, legend, scene, theme, words);
}

/// Which day of the year a place on the charts stands for, counted from 0; `None` off them.
pub fn day_at(layout: &Layout, scene: &Scene<'_>, words: &Words, x: i32, y: i32) -> Option<usize> {
    let rows = Rows::of(layout, scene, words);
    let plot = rows.charts.first()?.plot;
    let room = layout.content;
    let charts = area(plot.area.top_left.x, room.top_left.y, plot.area.size.width as i32, room.size.height as i32);
    charts.contains(Point::new(x, y)).then(|| day_on(&plot, scene, x))
}

/// A chart in its place.
struct Row {
    chart: Chart,
    range: String,
    /// The first row of pixels that is its own.
    top: i32,
    plot: Plot,
}

/// The charts, one under another.
struct Rows {
    /// From the left edge of the page to the charts.
    side: i32,
    /// Height of each.
    each: i32,
    charts: Vec<Row>,
}

impl Rows {
    fn of(layout: &Layout, scene: &Scene<'_>, words: &Words) -> Self {
        let mut charts = vec![Chart::Snow, Chart::River];
        charts.extend(scene.now.reservoir.map(|_| Chart::Reservoir));
        if !scene.canals.is_empty() {
            charts.push(Chart::Canals);
        }
        let room = layout.content;
        let marks_high = i32::from(layout.note.px()) * 2 / 3;
        let below = layout.label.line_px() + months_height(layout.note) + marks_high;
        let each = (room.size.height as i32 - below) / charts.len() as i32;
        let most: Vec<f64> = charts.iter().map(|&chart| greatest(chart, scene)).collect();
        let range =
            |(chart, most): (&Chart, &f64)| format!("0–{}", words.quantity(*most, chart.quantity(), scene.units, 2));
        let ranges: Vec<String> = charts.iter().zip(&most).map(range).collect();
        let side = charts.iter().zip(&ranges).map(|(chart, range)| {
            let name = measure(&words.say(chart.title_id(), &[]), layout.strong).width;
            name.max(measure(range, layout.note).width) as i32
        });
        let side = side.max().unwrap_or(0) + layout.gap * 2;
        let mut top = room.top_left.y;
        let charts = charts.into_iter().zip(ranges).zip(most).map(|((chart, range), most)| {
            let (x, wide) = (room.top_left.x + side, room.size.width as i32 - side);
            let plot = Plot {
                area: area(x, top + layout.gap, wide, each - layout.gap),
                across: (0.0, scene.year.calendar.len() as f64),
                up: (0.0, most * 1.05),
            };
            let row = Row { chart, range, top, plot };
            top += each + if chart == Chart::River { marks_high } else { 0 };
            row
        });
        Self { side, each, charts: charts.collect() }
    }
}

/// The highest value of a chart in either run; what the axis is named by.
fn greatest(chart: Chart, scene: &Scene<'_>) -> f64 {
    let runs = [Some(scene.was), Some(scene.now), scene.beside];
    let capacity = runs.iter().flatten().filter_map(|run| run.reservoir).map(|reservoir| reservoir.capacity_hm3);
    let most = match chart {
        Chart::Reservoir => capacity.fold(0.0, f64::max),
        _ => {
            let doubt = scene.doubt.and_then(|doubt| doubt.natural_flow_m3s).filter(|_| chart == Chart::River);
            let high = doubt.map_or(&[] as &[f64], |(_, high)| high);
            runs.iter().flatten().flat_map(|run| chart.of(run)).chain(high).copied().fold(0.0, f64::max)
        }
    };
    if most > 0.0 { most } else { 1.0 }
}

fn draw_chart(canvas: &mut Canvas<'_>, layout: &Layout, chart: Chart, plot: &Plot, scene: &Scene<'_>, theme: &Theme) {
    let doubt = scene.doubt.and_then(|doubt| match chart {
        Chart::River => doubt.natural_flow_m3s,
        Chart::Reservoir => doubt.storage_hm3,
        Chart::Snow | Chart::Canals => None,
    });
    // At rest both runs are one.
    let was = if scene.changed() { chart.of(&scene.was) } else { &[] };
    let (was, now) = (was.iter().copied(), chart.of(&scene.now).iter().copied());
    let look = LinePair { width_px: layout.line_px, line: theme.water, area: Some(chart.fill(theme)), lack: None };
    let lack = matches!(chart, Chart::Reservoir | Chart::Canals).then(|| theme.lack_hatch());
    line_pair(canvas, plot, was, now, LinePair { lack, ..look }, theme);
    if let Some((low, high)) = doubt {
        range_band(canvas, plot, low.iter().copied(), high.iter().copied(), theme.water, theme);
    }
    if let Some(beside) = &scene.beside {
        let spots = chart.of(beside).iter().enumerate().map(|(day, &value)| plot.spot(day as f64 + 0.5, value));
        let width = as_it_was(layout.line_px).width_px.max(1.5);
        polyline(canvas, spots, kept_stroke(width), theme.town);
    }
    let foot = area(plot.area.top_left.x, bottom(plot.area), plot.area.size.width as i32, 1);
    canvas.fill(foot, theme.rule);
    let x = day_cursor(canvas, plot, scene.day as f64 + 0.5, theme.lack);
    if let Some(&value) = chart.of(&scene.now).get(scene.day) {
        bead(canvas, Spot::new(x, plot.y(value)), layout.line_px * 1.3, theme.lack, theme.paper);
    }
}

/// Under the river: a full wedge on the day with half of the water past, an open one where it was, and the way between.
fn half_marks(canvas: &mut Canvas<'_>, layout: &Layout, plot: &Plot, scene: &Scene<'_>, theme: &Theme) {
    let size = f64::from(layout.note.px()) * 0.5;
    let y = f64::from(bottom(plot.area)) + 1.5;
    let x = |day: CalendarDay| plot.x(f64::from(day.day_of_water_year) - 0.5);
    let day = |run: &RunShown<'_>| run.signs().and_then(|signs| signs.half_volume_date);
    let corners = |x: f64| [Spot::new(x - size, y + size * 1.3), Spot::new(x, y), Spot::new(x + size, y + size * 1.3)];
    let (was, now) = (day(&scene.was), day(&scene.now));
    if let (Some(was), Some(now)) = (was, now)
        && scene.changed()
        && was != now
    {
        let level = y + size * 1.3 - 0.5;
        segment(canvas, Spot::new(x(was), level), Spot::new(x(now), level), Stroke::solid(1.0), theme.lack);
    }
    if let Some(was) = was.filter(|_| scene.changed()) {
        triangle(canvas, corners(x(was)), theme.ink);
        let inner = corners(x(was)).map(|spot| {
            let middle = Spot::new(x(was), y + size * 0.85);
            Spot::new(middle.x + (spot.x - middle.x) * 0.5, middle.y + (spot.y - middle.y) * 0.5)
        });
        triangle(canvas, inner, theme.paper);
    }
    if let Some(now) = now {
        triangle(canvas, corners(x(now)), theme.water);
    }
}

fn draw_legend(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    room: Rectangle,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let mut x = room.top_left.x;
    let swatch = i32::from(layout.label.px()) * 2;
    let face = layout.note;
    let middle = room.top_left.y + room.size.height as i32 / 2;
    let mut entry = |canvas: &mut Canvas<'_>, id: &str, sample: &mut dyn FnMut(&mut Canvas<'_>, Rectangle)| {
        let text = words.say(id, &[]);
        let wide = measure(&text, face).width as i32;
        if x + swatch + layout.gap + wide > right(room) {
            return;
        }
        sample(canvas, area(x, room.top_left.y, swatch, room.size.height as i32));
        x += swatch + layout.gap;
        draw_text(canvas, &text, Point::new(x, middle), face, theme.quiet, Align::LEFT.cap_middle());
        x += wide + layout.gap * 3;
    };
    let now = if scene.changed() { "picture-with-changes" } else { "picture-as-it-was" };
    entry(canvas, now, &mut |canvas, place| swatch_with_changes(canvas, place, layout.line_px, theme.water));
    if scene.changed() {
        entry(canvas, "picture-as-it-was", &mut |canvas, place| {
            swatch_as_it_was(canvas, place, layout.line_px, theme);
        });
    }
    if scene.beside.is_some() {
        entry(canvas, "picture-beside", &mut |canvas, place| {
            let y = f64::from(place.top_left.y) + f64::from(place.size.height) / 2.0;
            let (from, to) = (f64::from(place.top_left.x), f64::from(right(place)));
            segment(canvas, Spot::new(from, y), Spot::new(to, y), kept_stroke(2.0), theme.town);
        });
    }
}
