//! Breaking text into lines at its blanks, and drawing paragraphs.

use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::super::canvas::{Canvas, TextMark, hull};
use super::{Across, Drawn, Face, draw_line, width_px};

/// The lines of a text within a width; see [`lines`].
#[derive(Debug, Clone)]
pub struct Lines<'t> {
    rest: Option<&'t str>,
    face: Face,
    width_px: u32,
}

/// Breaks `text` into lines of at most `width_px` pixels at its spaces and line feeds; no-break and thin spaces hold
/// together. A word that is wider than a line by itself stays whole and is a line that is too wide.
pub fn lines(text: &str, face: Face, width_px: u32) -> Lines<'_> {
    Lines { rest: Some(text), face, width_px }
}

impl<'t> Iterator for Lines<'t> {
    type Item = &'t str;

    fn next(&mut self) -> Option<&'t str> {
        let rest = self.rest?;
        let (row, after) = match rest.split_once('\n') {
            Some((row, after)) => (row, Some(after)),
            None => (rest, None),
        };
        let mut fits = None;
        for (at, _) in row.match_indices(' ').chain([(row.len(), "")]) {
            let line = row[..at].trim_end_matches(' ');
            if fits.is_some() && width_px(line, self.face) > self.width_px {
                break;
            }
            if !line.is_empty() || at == row.len() {
                fits = Some(at);
            }
        }
        let end = fits.unwrap_or(row.len());
        self.rest = if row[end..].trim_start_matches(' ').is_empty() {
            after
        } else {
            Some(rest[end..].trim_start_matches(' '))
        };
        Some(row[..end].trim_end_matches(' '))
    }
}

/// Height in pixels that [`paragraph`] needs for all of `text`.
pub fn paragraph_height(text: &str, face: Face, width_px: u32) -> u32 {
    let count = lines(text, face, width_px).count() as u32;
    height_of(count, face)
}

fn height_of(count: u32, face: Face) -> u32 {
    if count == 0 { 0 } else { (count - 1) * face.line_px() as u32 + (face.ascent_px() + face.descent_px()) as u32 }
}

/// Draws `text` wrapped inside `area` from its top. Where it does not all fit, the last line that does ends in an
/// ellipsis and the answer says so; `ink` and `missing` are those of all lines.
pub fn paragraph(
    canvas: &mut Canvas<'_>,
    text: &str,
    area: Rectangle,
    face: Face,
    colour: Rgb565,
    across: Across,
) -> Drawn {
    let clip = canvas.clip();
    let beyond_first = area.size.height.checked_sub(height_of(1, face));
    let room = beyond_first.map_or(0, |beyond| 1 + beyond / face.line_px() as u32);
    let mut whole =
        Drawn { ink: Rectangle::zero(), advance_px: 0, missing: 0, shortened: room == 0 && !text.is_empty() };
    if whole.shortened {
        let ink = whole.ink;
        canvas.tell(TextMark { text, ink, given: Some(area), clip, missing: 0, shortened: true });
    }
    let mut rows = lines(text, face, area.size.width).take(room as usize + 1).peekable();
    let mut baseline = area.top_left.y.saturating_add(face.ascent_px());
    for _ in 0..room {
        let Some(line) = rows.next() else { break };
        let last = baseline.saturating_add(face.line_px());
        let more = rows.peek().is_some() && height_beyond(last, area, face);
        let drawn = draw_line(canvas, line, area, baseline, face, colour, across, more);
        whole.ink = hull(whole.ink, drawn.ink);
        whole.advance_px = whole.advance_px.max(drawn.advance_px);
        whole.missing += drawn.missing;
        whole.shortened |= drawn.shortened;
        baseline = last;
    }
    whole
}

/// Whether a line on `baseline` would reach out of `area` below.
fn height_beyond(baseline: i32, area: Rectangle, face: Face) -> bool {
    let bottom = area.top_left.y.saturating_add_unsigned(area.size.height);
    baseline.saturating_add(face.descent_px()) > bottom
}

#[cfg(test)]
mod tests {
    use super::*;
    use heapless::Vec;

    fn broken(text: &str, width_px: u32) -> Vec<&str, 16> {
        lines(text, Face::regular(13), width_px).collect()
    }

    #[test]
    fn lines_break_at_blanks_and_keep_the_words() {
        let text = "La última agua llega 18 días antes";
        let found = broken(text, 120);
        assert!(found.len() > 1);
        assert!(found.iter().all(|line| width_px(line, Face::regular(13)) <= 120));
        assert!(found.iter().flat_map(|line| line.split(' ')).eq(text.split(' ')));
    }

    #[test]
    fn a_number_keeps_its_unit() {
        assert_eq!(broken("are 12\u{a0}hm³ left", 55), ["are", "12\u{a0}hm³", "left"]);
    }

    #[test]
    fn line_feeds_blanks_and_long_words() {
        assert_eq!(broken("a\n\nb", 50), ["a", "", "b"]);
        assert_eq!(broken("  a   b  ", 50), ["  a   b"]);
        assert_eq!(broken("", 50), [""]);
        assert_eq!(broken("x Mississippimississippi x", 40), ["x", "Mississippimississippi", "x"]);
    }
}
