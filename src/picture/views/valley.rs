//! Where the water is: the valley on one day of the year, from the snow to the river's end.
//!
//! The ground falls from left to right as the water does. The mountain is the place's own area–elevation curve with
//! the snow that lies on it; under it the reservoir with its dam; below the dam the river, and the fields under their
//! canals in order of right. The line at the bottom is the year, with the day on show.

mod land;
mod list;
mod season_line;

use super::layout::{Form, Layout, area, bottom, right};
use super::touch::day_on;
use super::{Answer, Scene, View, frame, layout_of};
use crate::picture::{Canvas, Theme};
use crate::words::Words;
use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

/// Boxes of the page.
#[derive(Clone, Copy, Debug)]
struct Parts {
    /// Sky and ground, from edge to edge.
    land: Rectangle,
    /// The mountain's curve.
    mountain: Rectangle,
    /// What is said of the snow, on the rock.
    snow_words: Rectangle,
    /// Left end of the full lake and the dam's water side.
    lake_across: (i32, i32),
    /// Where lake and river valley begin and end: rim and floor.
    rim_y: i32,
    floor_y: i32,
    /// What is said of the reservoir, in the air above it.
    lake_words: Rectangle,
    /// The list of canals.
    list: Rectangle,
    /// The river bed below the dam.
    river: Rectangle,
    /// The fields.
    fields: Rectangle,
    /// The year's line.
    season: Rectangle,
}

impl Parts {
    fn of(layout: &Layout, has_reservoir: bool) -> Self {
        let whole = layout.across(layout.content);
        let (wide, high, gap) = (whole.size.width as i32, whole.size.height as i32, layout.gap);
        let top = whole.top_left.y - gap / 2;
        let season_share = if layout.form == Form::Tall { 18 } else { 25 };
        let note_high = layout.note.line_px();
        let season_high = (high * season_share / 100).max(note_high * 11 / 4).min(note_high * 9);
        let land_high = high + gap / 2 - season_high - gap;
        let season = area(layout.margin, top + land_high + gap, wide - 2 * layout.margin, season_high);
        let land = area(0, top, wide, land_high);
        let river_deep = (layout.figure.px() as i32 * 4 / 9).max(7);
        let fields_high = (land_high.min(wide) / if layout.form == Form::Tall { 12 } else { 10 }).max(river_deep);
        let floor_high = river_deep + fields_high + 2 * gap;
        let (upper_high, foot_share) = match layout.form {
            Form::Tall => (land_high * 44 / 100, 60),
            Form::Narrow => (land_high, 39),
            Form::Wide => (land_high, 41),
        };
        let mountain_right = wide * foot_share / 100;
        let dam =
            wide * if layout.form == Form::Tall {
                92
            } else if layout.form == Form::Narrow {
                60
            } else {
                59
            } / 100;
        let rim_y = top + upper_high * if layout.form == Form::Tall { 50 } else { 53 } / 100;
        let floor_y = match layout.form {
            Form::Tall => top + upper_high - river_deep,
            _ => bottom(land) - floor_high,
        };
        let snow_high = gap + land_high / 8;
        // Without a reservoir the mountain reaches down to the river.
        let (mountain_right, foot_y) = if has_reservoir { (mountain_right, rim_y) } else { (dam, floor_y) };
        let mountain = area(0, top + snow_high, mountain_right, foot_y - top - snow_high);
        let caption_bottom = if layout.form == Form::Tall { top + upper_high } else { bottom(land) };
        let caption_top = rim_y.max(top + upper_high / 2) + gap;
        let snow_words = area(
            layout.margin,
            caption_top,
            mountain_right - layout.margin - gap,
            caption_bottom - caption_top - gap / 2,
        );
        let lake_words = area(
            mountain_right + gap,
            top + gap,
            dam - mountain_right + layout.figure.px() as i32 / 2,
            rim_y - top - gap,
        );
        let (list, bed) = match layout.form {
            Form::Tall => {
                let list_top = top + upper_high + gap;
                let bed_top = bottom(land) - floor_high;
                let list =
                    area(layout.margin, list_top, wide - 2 * layout.margin - river_deep, bed_top - list_top - gap);
                (list, area(0, bed_top, wide, river_deep))
            }
            _ => {
                let left = dam + layout.figure.px() as i32;
                let list = area(left, top + gap / 2, wide - left - layout.margin, floor_y - top - gap);
                (list, area(dam, floor_y, wide - dam, river_deep))
            }
        };
        let fields_left = if layout.form == Form::Tall { layout.margin } else { list.top_left.x };
        let fields_top = bottom(bed) + gap;
        let fields_end = if layout.form == Form::Tall { wide - layout.margin } else { right(list) };
        let fields = area(fields_left, fields_top, fields_end - fields_left, bottom(land) - gap - fields_top);
        Self {
            land,
            mountain,
            snow_words,
            lake_across: (mountain_right, dam),
            rim_y,
            floor_y,
            lake_words,
            list,
            river: bed,
            fields,
            season,
        }
    }
}

/// Draws the page.
pub fn draw(canvas: &mut Canvas<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let layout = layout_of(canvas, scene);
    frame::draw_frame(canvas, &layout, scene, View::Valley, &Answer::valley(scene), theme, words);
    let parts = Parts::of(&layout, scene.now.reservoir.is_some());
    land::draw_land(canvas, &layout, &parts, scene, theme, words);
    list::draw_list(canvas, &layout, parts.list, scene, theme, words);
    season_line::draw_season_line(canvas, &layout, parts.season, scene, theme, words);
}

/// Which day of the year a place on the page's line stands for, counted from 0; `None` off the line.
pub fn day_at(layout: &Layout, scene: &Scene<'_>, words: &Words, x: i32, y: i32) -> Option<usize> {
    let parts = Parts::of(layout, scene.now.reservoir.is_some());
    let plot = season_line::plot_of(layout, parts.season, scene, words);
    let touched = area(
        plot.area.top_left.x,
        parts.season.top_left.y,
        plot.area.size.width as i32,
        parts.season.size.height as i32,
    );
    if !touched.contains(Point::new(x, y)) {
        return None;
    }
    Some(day_on(&plot, scene, x))
}
