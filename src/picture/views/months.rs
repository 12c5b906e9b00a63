//! The months of the chosen year along the bottom of a chart.

use chrono::Month;

use super::scene::YearShown;
use crate::picture::chart::{Months, Plot, month_axis};
use crate::picture::lettering::measure;
use crate::picture::{Canvas, Face, Theme};
use crate::words::Words;

/// Draws the axis below `plot`, whose values along the bottom are days of the year from 0; short names where they fit,
/// letters where not. The height used is in the answer.
pub(super) fn draw_months(
    canvas: &mut Canvas<'_>,
    plot: &Plot,
    year: &YearShown<'_>,
    face: Face,
    theme: &Theme,
    words: &Words,
) -> u32 {
    let mut begins: Vec<f64> = Vec::with_capacity(14);
    let mut months: Vec<Month> = Vec::with_capacity(13);
    // The casts take what is below zero as zero.
    let (from, to) = (plot.across.0 as usize, (plot.across.1 as usize).min(year.calendar.len()));
    for (index, day) in year.calendar.iter().enumerate().take(to).skip(from) {
        if index == from || day.month_day.day == 1 {
            begins.push(index as f64);
            months.push(Month::try_from(day.month_day.month).unwrap_or(Month::January));
        }
    }
    begins.push(to as f64);
    let short: Vec<String> = months.iter().map(|&month| words.month_short(month)).collect();
    let room = plot.area.size.width / (months.len().max(1) as u32);
    let fits = short.iter().all(|name| measure(name, face).width + u32::from(face.px()) / 2 <= room);
    let names = if fits { short } else { months.iter().map(|&month| words.month_letter(month)).collect() };
    let names: Vec<&str> = names.iter().map(String::as_str).collect();
    month_axis(canvas, plot, Months { begins: &begins, names: &names }, face, theme)
}

/// The height that [`draw_months`] uses below its plot.
pub(super) fn months_height(face: Face) -> i32 {
    i32::from(face.px() / 4).max(3) + 2 + face.cap_px() + face.descent_px()
}
