//! Drawing on a page: lines, areas, hatching and letters as pieces.

use super::face::{CAPITAL_EM, Face};
use super::model::{At, Ink, Letters, Line, Mark, Piece};

/// Which end of a text stands at a place.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum End {
    Left,
    Middle,
    Right,
}

/// Face, size and ink of letters.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Style {
    pub face: Face,
    pub size: f64,
    pub ink: Ink,
}

impl Style {
    pub const fn new(face: Face, size: f64, ink: Ink) -> Self {
        Self { face, size, ink }
    }

    /// From one baseline to the next.
    pub fn line_pt(&self) -> f64 {
        self.size * 1.36
    }

    /// From the top of a line to its baseline.
    pub fn rise_pt(&self) -> f64 {
        self.size * 1.02
    }

    pub fn width(&self, text: &str) -> f64 {
        self.face.width(text, self.size)
    }

    /// The same, smaller where the text would be wider than `width`, but not smaller than `least` points.
    pub fn fitting(mut self, text: &str, width: f64, least: f64) -> Self {
        let own = self.width(text);
        if own > width && own > 0.0 {
            self.size = (self.size * width / own).max(least);
        }
        self
    }
}

pub(super) const BODY: Style = Style::new(Face::Regular, 8.6, Ink::Black);
pub(super) const STRONG: Style = Style::new(Face::Bold, 8.6, Ink::Black);
pub(super) const NOTE: Style = Style::new(Face::Regular, 7.2, Ink::Quiet);
pub(super) const LABEL: Style = Style::new(Face::Bold, 7.6, Ink::Black);

/// Letters with one end at a place of the baseline.
pub(super) fn letters(text: &str, at: At, end: End, style: Style) -> Piece {
    let width = style.width(text.trim_end());
    let x = match end {
        End::Left => at.x,
        End::Middle => at.x - width / 2.0,
        End::Right => at.x - width,
    };
    Piece::Letters(Letters {
        at: At::new(x, at.y),
        text: text.to_owned(),
        face: style.face,
        size: style.size,
        ink: style.ink,
    })
}

/// The baseline at which capitals stand with their middle on `y`.
pub(super) fn centred(y: f64, style: Style) -> f64 {
    y + style.size * CAPITAL_EM / 2.0
}

pub(super) fn line(runs: Vec<Vec<At>>, width: f64, ink: Ink) -> Piece {
    Piece::Mark(Mark { runs, closed: false, fill: None, line: Some(Line { width, ink, dash: None }) })
}

pub(super) fn dashed(runs: Vec<Vec<At>>, width: f64, ink: Ink, dash: (f64, f64)) -> Piece {
    Piece::Mark(Mark { runs, closed: false, fill: None, line: Some(Line { width, ink, dash: Some(dash) }) })
}

/// Areas without an edge.
pub(super) fn area(runs: Vec<Vec<At>>, ink: Ink) -> Piece {
    Piece::Mark(Mark { runs, closed: true, fill: Some(ink), line: None })
}

/// Areas with an edge.
pub(super) fn edged(runs: Vec<Vec<At>>, fill: Option<Ink>, width: f64, ink: Ink) -> Piece {
    Piece::Mark(Mark { runs, closed: true, fill, line: Some(Line { width, ink, dash: None }) })
}

/// A level or upright line.
pub(super) fn straight(from: At, to: At, width: f64, ink: Ink) -> Piece {
    line(vec![vec![from, to]], width, ink)
}

/// The corners of a box.
pub(super) fn corners(x: f64, y: f64, wide: f64, high: f64) -> Vec<At> {
    vec![At::new(x, y), At::new(x + wide, y), At::new(x + wide, y + high), At::new(x, y + high)]
}

/// The corners of a disc.
pub(super) fn round(middle: At, radius: f64) -> Vec<At> {
    const CORNERS: usize = 20;
    (0..CORNERS)
        .map(|corner| {
            let turn = core::f64::consts::TAU * corner as f64 / CORNERS as f64;
            At::new(middle.x + radius * libm::cos(turn), middle.y + radius * libm::sin(turn))
        })
        .collect()
}

/// Slanting lines within areas, `gap` points apart.
pub(super) fn hatch(areas: &[Vec<At>], gap: f64, width: f64, ink: Ink) -> Piece {
    let mut runs = Vec::new();
    for corners in areas {
        // Along x + y = level, so that neighbouring areas share their lines.
        let level = |at: &At| at.x + at.y;
        let (low, high) = corners
            .iter()
            .map(level)
            .fold((f64::INFINITY, f64::NEG_INFINITY), |(low, high), level| (low.min(level), high.max(level)));
        if !(low.is_finite() && high.is_finite() && gap > 0.0) {
            continue;
        }
        let first = libm::ceil(low / gap) as i64;
        let last = libm::floor(high / gap) as i64;
        for step in first..=last {
            let at_level = step as f64 * gap;
            let mut crossings: Vec<f64> = Vec::new();
            for (index, from) in corners.iter().enumerate() {
                let to = &corners[(index + 1) % corners.len()];
                let (a, b) = (level(from), level(to));
                if (a <= at_level) != (b <= at_level) {
                    crossings.push(from.x + (to.x - from.x) * (at_level - a) / (b - a));
                }
            }
            crossings.sort_by(f64::total_cmp);
            for pair in crossings.chunks_exact(2) {
                if pair[1] - pair[0] > 0.05 {
                    runs.push(vec![At::new(pair[0], at_level - pair[0]), At::new(pair[1], at_level - pair[1])]);
                }
            }
        }
    }
    line(runs, width, ink)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn hatching_stays_within_its_area() {
        let Piece::Mark(mark) = hatch(&[corners(10.0, 20.0, 30.0, 8.0)], 3.0, 0.5, Ink::Lack) else { panic!() };
        assert!(mark.runs.len() > 8, "{}", mark.runs.len());
        for at in mark.runs.iter().flatten() {
            assert!((9.999..=40.001).contains(&at.x) && (19.999..=28.001).contains(&at.y), "{at:?}");
        }
    }

    #[test]
    fn a_text_shrinks_to_its_room_and_no_further() {
        let style = BODY.fitting("Share of the water asked for", 40.0, 6.0);
        assert_eq!(style.size, 6.0);
        let style = BODY.fitting("Share", 20.0, 2.0);
        assert!((style.width("Share") - 20.0).abs() < 1e-9);
    }
}
