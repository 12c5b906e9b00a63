//! Short texts that several pages write: values of dials, shares, the year, names that have to be shortened.

use embedded_graphics::geometry::Point;
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::scene::{CanalTitle, DialSetting, YearKind, YearShown};
use crate::picture::lettering::{Across, Face, Weight, draw, draw_in, measure};
use crate::picture::{Align, Canvas, Theme};
use crate::water::calendar::CalendarDay;
use crate::water::dials::{Dial, DialUnit};
use crate::words::{DateStyle, Quantity, System, Words};

/// What stands between small remarks on one line.
pub(super) const DOT: &str = " · ";

/// The short name of a dial.
pub fn dial_name(dial: Dial, words: &Words) -> String {
    words.say(&format!("{}.short", Words::key_id("dial", dial.key())), &[])
}

/// Where a dial stands, with its sign where it means more or less, and its unit.
pub fn dial_value(setting: &DialSetting, units: System, words: &Words) -> String {
    let Some(value) = setting.value else { return words.say("picture-carried-over", &[]) };
    let written = match setting.dial.unit() {
        DialUnit::Celsius => words.quantity(value, Quantity::TemperatureChange, units, 2),
        DialUnit::Percent => words.percent(value, 0),
    };
    let is_share = matches!(setting.dial, Dial::CanalLining | Dial::CropMix | Dial::StartingStorage);
    if value > 0.0 && !is_share { format!("+{written}") } else { written }
}

/// A share of 0 to 1 in whole percent that is "100%" only where nothing lacks and "0%" only where nothing is.
pub(super) fn share(share: f64, words: &Words) -> String {
    let percent = libm::round(share * 100.0);
    let honest = match percent {
        100.0 if share < 0.995 => 99.0,
        0.0 if share >= 0.005 => 1.0,
        percent => percent,
    };
    words.percent(honest, 0)
}

/// A day as a label.
pub(super) fn day_short(day: CalendarDay, year: &YearShown<'_>, words: &Words) -> String {
    words.date(day.date(year.start_month), DateStyle::Short)
}

/// A day within a sentence.
pub(super) fn day_in_sentence(day: CalendarDay, year: &YearShown<'_>, words: &Words) -> String {
    // Day and month stay on one line.
    words.date(day.date(year.start_month), DateStyle::InSentence).replace(' ', "\u{A0}")
}

/// The chosen year and how it was chosen.
pub(super) fn year_name(year: &YearShown<'_>, words: &Words) -> String {
    let Some(first) = year.calendar.first() else { return String::new() };
    let id = match year.kind {
        YearKind::Dry => "picture-year-dry",
        YearKind::Middling => "picture-year-middling",
        YearKind::Wet => "picture-year-wet",
        YearKind::Any => "picture-year-any",
    };
    words.say(id, &[("year", words.year(first.water_year).into())])
}

/// "since 1921", or that the right comes before all others.
pub(super) fn right_since(title: &CanalTitle<'_>, words: &Words) -> String {
    match title.right_year {
        Some(year) => words.say("picture-since", &[("year", words.year(year).into())]),
        None => words.say("tell-right-before-all", &[]),
    }
}

/// A name in the room's two languages where both fit on a line of that width, else in the first.
pub(super) fn in_both(first: String, second: Option<String>, face: Face, width_px: i32) -> String {
    match second.filter(|second| *second != first) {
        None => first,
        Some(second) => {
            let both = format!("{first}{DOT}{second}");
            let fits = face.fitting(&both, width_px.max(0) as u32, 9).is_some();
            if fits { both } else { first }
        }
    }
}

/// A place's own name, shortened with an ellipsis where there is no room for it. Only names are ever shortened: a place
/// may have any, and the words of the program are made to fit.
pub(super) fn name_within(name: &str, face: Face, width_px: u32) -> String {
    if measure(name, face).width <= width_px {
        return name.to_owned();
    }
    let mut kept = name;
    while let Some((at, _)) = kept.char_indices().next_back() {
        kept = kept[..at].trim_end();
        let shortened = format!("{kept}…");
        if measure(&shortened, face).width <= width_px {
            return if kept.is_empty() { String::new() } else { shortened };
        }
    }
    String::new()
}

/// Draws words on one line, the capitals in the middle of the box's height, in the largest face up to `face` that fits
/// the box's width. Only words that even the smallest face does not fit are cut, which the strict witness reports.
pub(super) fn fit(canvas: &mut Canvas<'_>, text: &str, area: Rectangle, face: Face, colour: Rgb565, across: Across) {
    let Some(face) = face.fitting(text, area.size.width, 9) else {
        draw_in(canvas, text, area, smallest(face.weight()), colour, across);
        return;
    };
    let Rectangle { top_left: Point { x, y }, size } = area;
    let middle = y.saturating_add_unsigned(size.height / 2);
    let (x, align) = match across {
        Across::Left => (x, Align::LEFT),
        Across::Centre => (x.saturating_add_unsigned(size.width / 2), Align::CENTRE),
        Across::Right => (x.saturating_add_unsigned(size.width), Align::RIGHT),
    };
    draw(canvas, text, Point::new(x, middle), face, colour, align.cap_middle());
}

fn smallest(weight: Weight) -> Face {
    match weight {
        Weight::Regular => Face::regular(9),
        Weight::Bold => Face::bold(9),
    }
}

/// The colour of a change: a lack where there is less, water where there is more.
pub(super) fn change_ink(change: f64, theme: &Theme) -> Rgb565 {
    match change {
        change if change < 0.0 => theme.lack_ink,
        change if change > 0.0 => theme.water_ink,
        _ => theme.quiet,
    }
}
