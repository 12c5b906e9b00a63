//! The charts of the screen as vectors: the year, its canals, and all the years.

mod canals;
mod season;
mod years;

pub(super) use canals::{legend as canal_legend, strips};
pub(super) use season::season;
pub(super) use years::years;

use chrono::Month;

use super::face::Face;
use super::model::{At, Ink, Piece};
use super::pen::{End, LABEL, Style, dashed, letters, line, straight};
use crate::picture::views::scene::YearShown;
use crate::words::Words;

/// Small type on charts.
pub(super) const TICK: Style = Style::new(Face::Regular, 6.8, Ink::Quiet);
/// Dashes of what was.
pub(super) const AS_IT_WAS: (f64, f64) = (2.6, 1.9);

/// A field with two axes.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Plot {
    pub left: f64,
    pub top: f64,
    pub wide: f64,
    pub high: f64,
    pub across: (f64, f64),
    pub up: (f64, f64),
}

impl Plot {
    pub fn x(&self, value: f64) -> f64 {
        let (from, to) = self.across;
        self.left + self.wide * (value - from) / (to - from)
    }

    pub fn y(&self, value: f64) -> f64 {
        let (from, to) = self.up;
        self.top + self.high * (1.0 - (value - from) / (to - from))
    }

    pub fn at(&self, x: f64, value: f64) -> At {
        At::new(self.x(x), self.y(value))
    }

    pub fn foot(&self) -> f64 {
        self.top + self.high
    }

    /// Daily values as unbroken runs, thinned to what can be seen.
    pub fn runs(&self, values: &[f64]) -> Vec<Vec<At>> {
        let mut runs: Vec<Vec<At>> = vec![Vec::new()];
        for (day, value) in values.iter().enumerate() {
            if value.is_finite() {
                if let Some(run) = runs.last_mut() {
                    run.push(self.at(day as f64 + 0.5, *value));
                }
            } else if runs.last().is_some_and(|run| !run.is_empty()) {
                runs.push(Vec::new());
            }
        }
        runs.retain(|run| !run.is_empty());
        runs.iter().map(|run| thinned(run, 0.12)).collect()
    }

    /// Daily values as areas down to the foot.
    pub fn areas(&self, values: &[f64]) -> Vec<Vec<At>> {
        let mut areas = self.runs(values);
        for area in &mut areas {
            if let (Some(first), Some(last)) = (area.first().copied(), area.last().copied()) {
                area.push(At::new(last.x, self.foot()));
                area.push(At::new(first.x, self.foot()));
            }
        }
        areas
    }
}

/// A line with fewer corners that nowhere strays further than `most` points (Douglas and Peucker 1973).
pub(super) fn thinned(run: &[At], most: f64) -> Vec<At> {
    let mut kept = vec![false; run.len()];
    if let [first, .., last] = kept.as_mut_slice() {
        (*first, *last) = (true, true);
    } else {
        return run.to_vec();
    }
    let mut open = vec![(0, run.len() - 1)];
    while let Some((from, to)) = open.pop() {
        let (a, b) = (run[from], run[to]);
        let span = libm::hypot(b.x - a.x, b.y - a.y);
        let off = |at: &At| {
            let cross = (b.x - a.x) * (a.y - at.y) - (a.x - at.x) * (b.y - a.y);
            if span > 0.0 { (cross / span).abs() } else { libm::hypot(at.x - a.x, at.y - a.y) }
        };
        let furthest = (from + 1..to).map(|index| (index, off(&run[index]))).max_by(|a, b| a.1.total_cmp(&b.1));
        if let Some((index, off)) = furthest
            && off > most
        {
            kept[index] = true;
            open.push((from, index));
            open.push((index, to));
        }
    }
    run.iter().zip(&kept).filter(|(_, kept)| **kept).map(|(at, _)| *at).collect()
}

/// The months of the year along the foot of a plot whose values are days: a tick at each first, the name between two.
pub(super) fn months(plot: &Plot, year: &YearShown<'_>, voices: &[&Words]) -> Vec<Piece> {
    let (from, to) = (plot.across.0 as usize, (plot.across.1 as usize).min(year.calendar.len()));
    let days = year.calendar.get(from..to).unwrap_or_default();
    let mut begins: Vec<(usize, u8)> = Vec::new();
    for (index, day) in days.iter().enumerate() {
        if index == 0 || day.month_day.day == 1 {
            begins.push((from + index, day.month_day.month));
        }
    }
    let mut pieces = Vec::new();
    let mut ticks = Vec::new();
    let y = plot.foot();
    let ends = begins.iter().skip(1).map(|(begin, _)| *begin).chain([to]);
    let spans: Vec<(f64, f64, Month)> = begins
        .iter()
        .zip(ends)
        .map(|((begin, month), end)| {
            (plot.x(*begin as f64), plot.x(end as f64), Month::try_from(*month).unwrap_or(Month::January))
        })
        .collect();
    let name = |month: Month| each(voices, |words| words.month_short(month)).join(" · ");
    // All months by their names, or all by their letters.
    let whole = spans.iter().filter(|(x, end, _)| end - x > plot.wide / 14.0);
    let fits = whole.into_iter().all(|(x, end, month)| TICK.width(&name(*month)) <= end - x - 2.0);
    for (x, end, month) in spans {
        ticks.push(vec![At::new(x, y), At::new(x, y + 3.0)]);
        let name = if fits { name(month) } else { each(voices, |words| words.month_letter(month)).join("·") };
        if TICK.width(&name) <= end - x - 2.0 {
            pieces.push(letters(&name, At::new((x + end) / 2.0, y + 9.0), End::Middle, TICK));
        }
    }
    ticks.push(vec![At::new(plot.x(to as f64), y), At::new(plot.x(to as f64), y + 3.0)]);
    pieces.insert(0, line(ticks, 0.5, Ink::Rule));
    pieces
}

/// The height that [`months`] takes below its plot.
pub(super) const MONTHS_PT: f64 = 12.0;

/// A text in each language, without those that say the same again; the gap that does not break is a plain one here.
pub(super) fn each(voices: &[&Words], say: impl Fn(&Words) -> String) -> Vec<String> {
    let mut said: Vec<String> = Vec::new();
    for words in voices {
        let text = say(words);
        if !said.contains(&text) {
            said.push(text);
        }
    }
    said
}

/// Draws a sample in a box: left, top, width, height.
type Sample = Box<dyn Fn(f64, f64, f64, f64) -> Vec<Piece>>;

/// Samples with their names, on one line or two.
#[derive(Default)]
pub(super) struct Legend {
    entries: Vec<(String, Sample)>,
}

impl Legend {
    /// Width of a sample.
    const SAMPLE: f64 = 18.0;
    const HIGH: f64 = 6.5;
    /// From one line to the next.
    const LINE: f64 = 11.0;

    /// Adds a sample and its name.
    pub fn entry(&mut self, name: &str, draw: impl Fn(f64, f64, f64, f64) -> Vec<Piece> + 'static) {
        self.entries.push((name.to_owned(), Box::new(draw)));
    }

    /// The two lines that most charts share.
    pub fn runs(&mut self, changed: bool, voices: &[&Words]) {
        let say = |id: &str| each(voices, |words| words.say(id, &[])).join(" · ");
        let now = if changed { "picture-with-changes" } else { "picture-as-it-was" };
        self.entry(&say(now), |x, y, wide, high| {
            let middle = y + high / 2.0;
            vec![straight(At::new(x, middle), At::new(x + wide, middle), 1.5, Ink::Water)]
        });
        if changed {
            self.entry(&say("picture-as-it-was"), |x, y, wide, high| {
                let middle = y + high / 2.0;
                vec![dashed(vec![vec![At::new(x, middle), At::new(x + wide, middle)]], 0.9, Ink::Black, AS_IT_WAS)]
            });
        }
    }

    /// Everything from `left` on within that width, and how high it is.
    pub fn lay_out(&self, left: f64, width: f64) -> (Vec<Piece>, f64) {
        let mut pieces = Vec::new();
        let (mut x, mut y) = (left, Self::LINE / 2.0);
        for (name, draw) in &self.entries {
            let own = Self::SAMPLE + 4.0 + TICK.width(name);
            if x > left && x + own > left + width {
                (x, y) = (left, y + Self::LINE);
            }
            pieces.extend(draw(x, y - Self::HIGH / 2.0, Self::SAMPLE, Self::HIGH));
            let at = At::new(x + Self::SAMPLE + 4.0, super::pen::centred(y, TICK));
            pieces.push(letters(name, at, End::Left, TICK));
            x += own + 12.0;
        }
        (pieces, y + Self::LINE / 2.0 + 2.0)
    }
}

/// Names and scale at the left of a plot, on two lines.
pub(super) fn side_words(names: &[String], scales: &[String], top: f64, room: f64) -> [Piece; 2] {
    let (name, scale) = (names.join(" · "), scales.join(" · "));
    let y = top + LABEL.size * 0.85;
    let below = y + TICK.line_pt();
    [
        letters(&name, At::new(0.0, y), End::Left, LABEL.fitting(&name, room, 4.5)),
        letters(&scale, At::new(0.0, below), End::Left, TICK.fitting(&scale, room, 4.5)),
    ]
}

/// Left of the plots, for names and scales: wider where two languages share it.
pub(super) fn side_pt(voices: &[&Words]) -> f64 {
    if voices.len() > 1 { 126.0 } else { 92.0 }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn thinning_keeps_the_shape() {
        let run: Vec<At> =
            (0..366).map(|day| At::new(f64::from(day), 40.0 * libm::sin(f64::from(day) / 30.0))).collect();
        let thin = thinned(&run, 0.12);
        assert!(thin.len() < run.len() / 3, "{}", thin.len());
        // Every corner left out lies within the tolerance of the piece over it.
        for at in &run {
            let index = thin.partition_point(|kept| kept.x < at.x).clamp(1, thin.len() - 1);
            let (a, b) = (thin[index - 1], thin[index]);
            let share = (at.x - a.x) / (b.x - a.x);
            assert!((a.y + (b.y - a.y) * share - at.y).abs() < 0.2, "{at:?}");
        }
    }

    #[test]
    fn a_gap_in_the_values_parts_the_line() {
        let plot = Plot { left: 0.0, top: 0.0, wide: 10.0, high: 10.0, across: (0.0, 5.0), up: (0.0, 1.0) };
        assert_eq!(plot.runs(&[0.0, 1.0, f64::NAN, 1.0, 0.0]).len(), 2);
        assert_eq!(plot.areas(&[]).len(), 0);
    }
}
