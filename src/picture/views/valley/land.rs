//! Mountain, snow, reservoir, river and fields of the valley page.

use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use super::Parts;
use crate::picture::area::polygon;
use crate::picture::chart::{DayMark, as_it_was};
use crate::picture::lettering::{Across, Face, draw_in, measure};
use crate::picture::line::segment;
use crate::picture::scenery::{
    FieldLook, Lake, Mountain, MountainSnow, draw_channel, draw_field, draw_lake, draw_stream, draw_town,
};
use crate::picture::views::layout::{Form, Layout, area, bottom, right};
use crate::picture::views::scene::{ReservoirShown, RunShown, Scene};
use crate::picture::views::wording::{fit, share};
use crate::picture::{Canvas, Spot, Stroke, Theme};
use crate::words::{Quantity, Words};

pub(super) fn draw_land(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    parts: &Parts,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    canvas.fill(parts.land, theme.sky);
    let lake = lake_of(layout, parts, scene);
    draw_ground(canvas, layout, parts, lake, theme);
    draw_mountain(canvas, layout, parts, scene, theme, words);
    if let (Some(lake), Some(now)) = (lake, scene.now.reservoir) {
        let level = |reservoir: &ReservoirShown<'_>| {
            reservoir.storage_hm3.get(scene.day).map_or(0.0, |storage| storage / reservoir.capacity_hm3)
        };
        let was = scene.was.reservoir.as_ref().map(level).filter(|_| scene.changed());
        let stroke = as_it_was(layout.line_px);
        draw_lake(canvas, lake, (level(&now), was), f64::from(parts.floor_y + 1), stroke, theme);
        let stored = now.storage_hm3.get(scene.day).filter(|_| layout.roomy);
        let stored = stored.map(|&hm3| words.quantity(hm3, Quantity::StoredVolume, scene.units, 3));
        lake_words(canvas, layout, parts, &lake, (level(&now), was), stored.as_deref(), theme, words);
        inflow(canvas, layout, parts, scene, Some(&lake), theme);
    } else {
        inflow(canvas, layout, parts, scene, None, theme);
    }
    draw_river(canvas, layout, parts, scene, lake, theme);
    draw_fields(canvas, layout, parts, scene, theme);
}

fn lake_of(layout: &Layout, parts: &Parts, scene: &Scene<'_>) -> Option<Lake> {
    scene.now.reservoir?;
    let (left, dam) = parts.lake_across;
    let bottom = f64::from(parts.floor_y) + f64::from(parts.river.size.height) * 0.5;
    Some(Lake {
        across: (f64::from(left), f64::from(dam)),
        upright: (f64::from(parts.rim_y), bottom),
        dam_px: f64::from(layout.gap) + 1.0,
    })
}

/// The rock under everything: level to the dam, then down to the valley floor, which falls a little to the river's end.
fn draw_ground(canvas: &mut Canvas<'_>, layout: &Layout, parts: &Parts, lake: Option<Lake>, theme: &Theme) {
    let (_, dam) = parts.lake_across;
    let (wide, foot) = (f64::from(right(parts.land)), f64::from(bottom(parts.land)));
    let (rim, floor) = (f64::from(if lake.is_some() { parts.rim_y } else { parts.floor_y }), f64::from(parts.floor_y));
    let dam = f64::from(dam);
    if layout.form == Form::Tall {
        let low = f64::from(parts.river.top_left.y);
        let upper_foot = floor + f64::from(parts.river.size.height);
        polygon(
            canvas,
            [(0.0, rim), (dam, rim), (dam, floor), (wide, floor), (wide, upper_foot), (0.0, upper_foot)]
                .into_iter()
                .map(|(x, y)| Spot::new(x, y)),
            theme.rock,
        );
        canvas.fill(area(0, low as i32, right(parts.land), (foot - low) as i32), theme.rock);
        return;
    }
    let end = floor + floor_fall(layout);
    let river = river_left(parts, lake);
    let corners = [(0.0, rim), (dam, rim), (dam, floor), (river, floor), (wide, end), (wide, foot), (0.0, foot)];
    polygon(canvas, corners.into_iter().map(|(x, y)| Spot::new(x, y)), theme.rock);
}

fn draw_mountain(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    parts: &Parts,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let mountain = Mountain::new(scene.bands, parts.mountain);
    let snow_room = f64::from(parts.mountain.top_left.y - parts.land.top_left.y) - 2.0;
    let px_per_mm = if scene.deepest_snow_mm > 0.0 { snow_room / scene.deepest_snow_mm } else { 0.0 };
    let cover = |run: &RunShown<'_>| run.band_snow_mm.iter().any(|&mm| mm > 0.0);
    mountain.draw_rock(canvas, f64::from(bottom(parts.mountain)) + 1.0, theme);
    if cover(&scene.now) {
        mountain.draw_snow(canvas, MountainSnow { band_mm: scene.now.band_snow_mm, px_per_mm }, theme);
    }
    if scene.changed() && cover(&scene.was) {
        let snow = MountainSnow { band_mm: scene.was.band_snow_mm, px_per_mm };
        mountain.draw_snow_outline(canvas, snow, as_it_was(layout.line_px), theme);
    }

    let room = parts.snow_words;
    let mut y = room.top_left.y;
    let mut line = |canvas: &mut Canvas<'_>, text: &str, face: Face| {
        let place = area(room.top_left.x, y, room.size.width as i32, face.line_px());
        if bottom(place) <= bottom(room) + 2 {
            fit(canvas, text, place, face, theme.on_rock, Across::Left);
            y = bottom(place);
        }
    };
    let height = |metres: f64| words.quantity(metres, Quantity::Elevation, scene.units, 3);
    match scene.now.snow_line_m {
        Some(metres) => {
            // Where the words find no room, the leader alone says what the height is of.
            let said = words.say("picture-snow-line", &[("height", height(metres).into())]);
            let fits = measure(&said, Face::regular(9)).width <= room.size.width;
            line(canvas, &if fits { said } else { height(metres) }, layout.label);
            if let Some(spot) = mountain.spot_at(metres) {
                // A leader from the height on the flank down to the words that name it.
                let end = Spot::new(spot.x - 0.5, f64::from(room.top_left.y) - 1.0);
                segment(canvas, Spot::new(spot.x - 0.5, spot.y), end, Stroke::dashed(1.0, 2.0, 2.0), theme.on_rock);
                mountain.draw_height(canvas, metres, f64::from(layout.figure.px()), theme.on_rock);
            }
        }
        None => line(canvas, &words.say("picture-no-snow", &[]), layout.label),
    }
    let depth = |run: &RunShown<'_>| {
        let mm = run.snow_water_mm.get(scene.day).copied().unwrap_or(f64::NAN);
        words.quantity(mm, Quantity::SnowWater, scene.units, 2)
    };
    let (was, now) = (depth(&scene.was), depth(&scene.now));
    let same = was == now;
    let largest = if layout.roomy { layout.figure } else { Face::bold(layout.strong.px() + 4) };
    let rows =
        |face: Face, labels: i32| labels * layout.label.line_px() + face.line_px() <= room.size.height as i32 + 2;
    // Smaller where the rock is low, so that all of it is on the rock; what was goes before that is too small.
    let faces = || {
        core::iter::successors(Some(largest), |face| face.smaller()).take_while(|face| face.px() > layout.label.px())
    };
    let labels = if scene.changed() && !same { 2 } else { 1 };
    let face = faces().find(|face| rows(*face, labels)).or_else(|| faces().find(|face| rows(*face, 1)));
    let face = face.unwrap_or(Face::bold(layout.label.px()));
    line(canvas, &words.say("picture-snow", &[("amount", now.into())]), face);
    if scene.changed() && !same {
        line(canvas, &words.say("picture-was", &[("value", was.into())]), layout.label);
    }
}

#[allow(clippy::too_many_arguments, reason = "one lake, drawn once from one place")]
/// Name, content and earlier level in the air above the lake, the level itself in the largest free part of the hollow.
fn lake_words(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    parts: &Parts,
    lake: &Lake,
    (level, was): (f64, Option<f64>),
    stored: Option<&str>,
    theme: &Theme,
    words: &Words,
) {
    let room = parts.lake_words;
    let mut y = bottom(room) - layout.gap * 2 - (lake.dam_px * 0.6) as i32;
    if let Some(was) = was {
        y -= layout.label.line_px();
        let text = words.say("picture-was", &[("value", share(was, words).into())]);
        let place = area(room.top_left.x, y, room.size.width as i32, layout.label.line_px());
        fit(canvas, &text, place, layout.label, theme.quiet, Across::Right);
    }
    if let Some(stored) = stored {
        y -= layout.label.line_px();
        let place = area(room.top_left.x, y, room.size.width as i32, layout.label.line_px());
        fit(canvas, stored, place, layout.label, theme.ink, Across::Right);
    }
    y -= layout.strong.line_px();
    let place = area(room.top_left.x, y, room.size.width as i32, layout.strong.line_px());
    fit(canvas, &words.say("term-reservoir.short", &[]), place, layout.strong, theme.ink, Across::Right);

    let (rim, foot) = lake.upright;
    let surface = lake.surface_y(level);
    let mut cuts = [rim, was.map_or(rim, |was| lake.surface_y(was)), surface, foot];
    cuts.sort_unstable_by(f64::total_cmp);
    let spans = cuts.windows(2).map(|pair| (pair[0], pair[1]));
    let Some((top, low)) = spans.max_by(|a, b| (a.1 - a.0).total_cmp(&(b.1 - b.0))) else { return };
    let text = share(level, words);
    let mut face = layout.figure;
    let right = lake.across.1 as i32 - layout.gap - 1;
    let middle = (top + low) / 2.0;
    let fits = |face: Face| {
        let half = f64::from(face.cap_px()) / 2.0;
        let left = lake.bank_x((middle + half).min(foot)) as i32 + layout.gap;
        f64::from(face.cap_px()) + 4.0 <= low - top && measure(&text, face).width as i32 <= right - left
    };
    while !fits(face) {
        let Some(smaller) = face.smaller() else { break };
        face = smaller;
    }
    let colour = if top >= surface { theme.on_water } else { theme.ink };
    let wide = measure(&text, face).width as i32;
    let high = face.cap_px() + 2;
    draw_in(canvas, &text, area(right - wide, middle as i32 - high / 2, wide, high), face, colour, Across::Right);
}

/// The stream from the flank of the mountain into the lake, as wide as the root of its flow.
fn inflow(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    parts: &Parts,
    scene: &Scene<'_>,
    lake: Option<&Lake>,
    theme: &Theme,
) {
    let width = stream_px(layout, scene.now.natural_flow_m3s, scene);
    let mountain = Mountain::new(scene.bands, parts.mountain);
    let (from, to) = (f64::from(right(parts.mountain)) * 0.5, f64::from(right(parts.mountain)));
    // The stream gathers its water on the way down.
    let pieces = 16;
    let at = |piece: i32| {
        let share = f64::from(piece) / f64::from(pieces);
        let thick = 1.0 + (width - 1.0).max(0.0) * share;
        let x = from + (to - from) * share;
        (Spot::new(x, mountain.ground_y(x) - thick / 2.0 + 0.5), thick)
    };
    for piece in 0..pieces {
        let ((begin, _), (end, thick)) = (at(piece), at(piece + 1));
        draw_stream(canvas, [begin, end].into_iter(), if width > 0.0 { thick } else { 0.0 }, theme);
    }
    if let Some(lake) = lake {
        let now = scene.now.reservoir.and_then(|now| Some(now.storage_hm3.get(scene.day)? / now.capacity_hm3));
        let surface = lake.surface_y(now.unwrap_or(0.0));
        let (rim, _) = lake.upright;
        let lift = width / 2.0 - 0.5;
        let steps = (0..=6).map(|step| rim + (surface - rim) * f64::from(step) / 6.0);
        let bank = steps.map(|y| Spot::new(lake.bank_x(y) + lift.max(0.0), y - lift));
        draw_stream(canvas, bank, width, theme);
    }
}

/// Pixels across for the flow of the day; 0 only where nothing flows.
fn stream_px(layout: &Layout, flow_m3s: &[f64], scene: &Scene<'_>) -> f64 {
    let greatest = |run: &RunShown<'_>| run.natural_flow_m3s.iter().copied().fold(0.0, f64::max);
    let most = greatest(&scene.was).max(greatest(&scene.now));
    let today = flow_m3s.get(scene.day).copied().unwrap_or(0.0);
    if today > 0.0 && most > 0.0 { 1.0 + layout.line_px * 2.0 * libm::sqrt(today / most) } else { 0.0 }
}

/// The river below the dam. A third of its bed is the minimum; beyond that ever more water fills ever less of the rest,
/// so that a low flow can still be seen and a flood still fits.
fn draw_river(
    canvas: &mut Canvas<'_>,
    layout: &Layout,
    parts: &Parts,
    scene: &Scene<'_>,
    lake: Option<Lake>,
    theme: &Theme,
) {
    let now = &scene.now;
    let greatest = now.minimum_m3s.iter().copied().fold(0.0, f64::max);
    let mean = now.river_m3s.iter().sum::<f64>() / now.river_m3s.len().max(1) as f64;
    let half_deep_m3s = if greatest > 0.0 { 2.0 * greatest } else { mean };
    let depth = |m3s: f64| if m3s > 0.0 { m3s / (m3s + half_deep_m3s) } else { 0.0 };
    let today = |series: &[f64]| series.get(scene.day).copied().map_or(0.0, depth);
    let bed = parts.river;
    let (top, deep) = (f64::from(bed.top_left.y), f64::from(bed.size.height));
    let foot = river_left(parts, lake);
    let share = today(now.river_m3s);
    let levels = (share, Some(today(now.minimum_m3s)));
    let stroke = as_it_was(layout.line_px);
    let edge = f64::from(right(parts.land));
    if layout.form == Form::Tall {
        // Down the right edge and back to the left.
        let wide = bed.size.height as i32;
        let left = right(parts.land) - wide;
        canvas.fill(area(left, parts.floor_y, wide, bed.top_left.y - parts.floor_y), theme.sky);
        let flow = (deep * share) as i32 + i32::from(share > 0.0);
        let drop = area(left + (wide - flow) / 2, parts.floor_y, flow, bottom(bed) - parts.floor_y - 1);
        draw_channel(canvas, (0.0, edge), (top, deep, 0.0), levels, stroke, theme);
        canvas.fill(drop, theme.water);
        return;
    }
    draw_channel(canvas, (foot, edge), (top, deep, floor_fall(layout)), levels, stroke, theme);
}

/// Where the river begins below the dam.
fn river_left(parts: &Parts, lake: Option<Lake>) -> f64 {
    lake.map_or(f64::from(parts.lake_across.1), |lake| lake.dam_foot_x(f64::from(parts.floor_y + 1)))
}

/// How far the valley floor falls from the dam to the edge, in pixels.
fn floor_fall(layout: &Layout) -> f64 {
    f64::from(layout.gap) * 0.7
}

/// One field for each canal, from left to right in order of right, under the river that feeds them.
fn draw_fields(canvas: &mut Canvas<'_>, layout: &Layout, parts: &Parts, scene: &Scene<'_>, theme: &Theme) {
    let count = scene.canals.len() as i32;
    if count == 0 {
        return;
    }
    let room = parts.fields;
    let gap = if count > 8 { 1.max(layout.gap / 3) } else { layout.gap };
    let canal_px = (layout.line_px * 1.5) as u32;
    let place = |at: i32| {
        let x = |at: i32| room.top_left.x + (room.size.width as i32 + gap) * at / count;
        area(x(at), room.top_left.y, x(at + 1) - gap - x(at), room.size.height as i32)
    };
    for (at, (title, canal)) in scene.canals.iter().zip(scene.now.canals).enumerate() {
        let field = place(at as i32);
        let mark = canal.marks.get(scene.day).copied().unwrap_or(DayMark::Idle);
        let crop_water_met = canal.crop_water_met.get(scene.day).copied().unwrap_or(f64::NAN);
        if canal.delivered_m3s.get(scene.day).is_some_and(|&flow| flow > 0.0) {
            let top = bottom(parts.river);
            let stub = Rectangle::new(Point::new(field.top_left.x, top), field.size);
            let wide = (canal_px as i32).min(field.size.width as i32);
            canvas.fill(area(stub.top_left.x, top - 1, wide, field.top_left.y - top + 1), theme.water);
        }
        if title.is_town {
            draw_town(canvas, field, canal_px, mark, theme);
        } else {
            draw_field(canvas, field, canal_px, FieldLook { mark, crop_water_met }, theme);
        }
    }
}
