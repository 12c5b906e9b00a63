//! The two sides of the map: which dial, in which unit, and the values along it.

use embedded_graphics::geometry::Point;
use embedded_graphics::primitives::Rectangle;

use super::SideShown;
use crate::picture::chart::Field;
use crate::picture::lettering::{Face, draw, measure};
use crate::picture::views::scene::Scene;
use crate::picture::{Align, Canvas, Theme};
use crate::water::dials::{Dial, DialUnit, Dials};
use crate::words::{Quantity, Words};

/// The value of a dial without its unit, signed where it means more or less.
fn bare_value(dial: Dial, value: f64, scene: &Scene<'_>, words: &Words) -> String {
    let shown = match dial.unit() {
        DialUnit::Celsius => words.unit_of(Quantity::TemperatureChange, scene.units).convert(value),
        DialUnit::Percent => value,
    };
    let written = words.style().plain(shown, 1);
    let is_share = matches!(dial, Dial::CanalLining | Dial::CropMix | Dial::StartingStorage);
    if shown > 0.0 && !is_share { format!("+{written}") } else { written }
}

/// "Warming, °C"; with the short name where the long one has no room.
pub(super) fn title(dial: Dial, wide: u32, face: Face, scene: &Scene<'_>, words: &Words) -> String {
    let unit = match dial.unit() {
        DialUnit::Celsius => words.unit(Quantity::TemperatureChange, scene.units),
        DialUnit::Percent => "%".to_owned(),
    };
    let id = Words::key_id("dial", dial.key());
    let say = |id: &str| words.say("grid-side", &[("dial", words.say(id, &[]).into()), ("unit", unit.as_str().into())]);
    let long = say(&id);
    if measure(&long, face).width <= wide { long } else { say(&format!("{id}.short")) }
}

/// Which values are written: so far apart that `fits` holds for every two neighbours, and rest among them.
fn written(side: &SideShown<'_>, fits: impl Fn(usize) -> bool) -> impl Iterator<Item = usize> {
    let count = side.values.len();
    let rest = Dials::REST.get(side.dial);
    let anchor = rest.and_then(|rest| side.values.iter().position(|value| *value == rest)).unwrap_or(0);
    let every = (1..=count.max(1)).find(|every| fits(*every)).unwrap_or(count.max(1));
    (0..count).filter(move |at| at.abs_diff(anchor).is_multiple_of(every))
}

/// The width of the values up the side.
pub(super) fn up_width(side: &SideShown<'_>, face: Face, scene: &Scene<'_>, words: &Words) -> i32 {
    let widths = side.values.iter().map(|value| measure(&bare_value(side.dial, *value, scene, words), face).width);
    widths.max().unwrap_or(0) as i32
}

/// Writes the values up the left side of the field, right up to `gap_px` before it.
#[allow(clippy::too_many_arguments, reason = "one side, drawn once from one place")]
pub(super) fn draw_up(
    canvas: &mut Canvas<'_>,
    field: &Field<'_>,
    side: &SideShown<'_>,
    face: Face,
    gap_px: i32,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let count = side.values.len();
    let row_px = f64::from(field.area.size.height) / count.max(1) as f64;
    let line_px = f64::from(face.cap_px() + face.descent_px() + 1);
    for at in written(side, |every| every as f64 * row_px >= line_px) {
        let y = libm::round(field.middle(0, count - 1 - at).y) as i32;
        let text = bare_value(side.dial, side.values[at], scene, words);
        let place = Point::new(field.area.top_left.x - gap_px, y);
        draw(canvas, &text, place, face, theme.quiet, Align::RIGHT.cap_middle());
    }
}

/// Writes the values along the bottom of the field, their heads at `top`, and none far beyond the edges of `room`.
#[allow(clippy::too_many_arguments, reason = "one side, drawn once from one place")]
pub(super) fn draw_across(
    canvas: &mut Canvas<'_>,
    field: &Field<'_>,
    side: &SideShown<'_>,
    face: Face,
    top: i32,
    room: Rectangle,
    scene: &Scene<'_>,
    theme: &Theme,
    words: &Words,
) {
    let text = |at: usize| bare_value(side.dial, side.values[at], scene, words);
    let widest = (0..side.values.len()).map(|at| measure(&text(at), face).width).max().unwrap_or(0);
    let column_px = f64::from(field.area.size.width) / side.values.len().max(1) as f64;
    let apart_px = f64::from(widest) + f64::from(face.px()) / 2.0;
    for at in written(side, |every| every as f64 * column_px >= apart_px) {
        let text = text(at);
        let x = libm::round(field.middle(at, 0).x) as i32;
        let half = measure(&text, face).width as i32 / 2 + 1;
        if x - half < room.top_left.x || x + half > super::right(room) + i32::from(face.px()) * 2 / 3 {
            continue;
        }
        draw(canvas, &text, Point::new(x, top), face, theme.quiet, Align::CENTRE.cap_top());
    }
}
