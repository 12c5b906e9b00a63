//! A witness for tests that finds text over text, text cut off, text shortened and letters that the face lacks.

use embedded_graphics::primitives::Rectangle;

use super::canvas::{TextMark, Witness, edges, overlap};

/// One piece of text that was seen.
#[derive(Debug, Clone, PartialEq)]
pub struct Seen {
    /// The text.
    pub text: String,
    /// The box around its ink.
    pub ink: Rectangle,
}

/// Collects every piece of text of a frame and every fault among them.
///
/// ```
/// use deshielo::picture::{Align, Canvas, Face, strict::Strict};
/// use embedded_graphics::{geometry::Point, pixelcolor::{Rgb565, RgbColor}};
/// use deshielo::picture::lettering::draw;
///
/// let mut pixels = [Rgb565::WHITE; 80 * 20];
/// let mut strict = Strict::default();
/// let mut canvas = Canvas::new(&mut pixels, 80, 20).unwrap().with_witness(&mut strict);
/// draw(&mut canvas, "hm³", Point::new(70, 15), Face::regular(13), Rgb565::BLACK, Align::LEFT);
/// assert_eq!(strict.faults().len(), 1);
/// ```
#[derive(Debug, Default)]
pub struct Strict {
    seen: Vec<Seen>,
    faults: Vec<String>,
}

impl Strict {
    /// What was seen, in the order of drawing.
    pub fn seen(&self) -> &[Seen] {
        &self.seen
    }

    /// What is wrong, one sentence each.
    pub fn faults(&self) -> &[String] {
        &self.faults
    }

    /// Fails the test with all faults, if there are any.
    ///
    /// # Panics
    /// Where there are faults: this is what it is for.
    #[track_caller]
    pub fn assert_clean(&self, what: &str) {
        assert!(self.faults.is_empty(), "{what}:\n{}", self.faults.join("\n"));
    }
}

impl Witness for Strict {
    fn text(&mut self, mark: TextMark<'_>) {
        let TextMark { text, ink, given, clip, missing, shortened } = mark;
        let at = format!("{text:?} at {}, {}", ink.top_left.x, ink.top_left.y);
        if missing > 0 {
            self.faults.push(format!("{at} has {missing} characters that the face lacks"));
        }
        if shortened {
            self.faults.push(format!("{at} was shortened"));
        }
        if !holds(clip, ink) {
            self.faults.push(format!("{at} is cut off: its ink {ink:?} reaches out of {clip:?}"));
        }
        if given.is_some_and(|given| !holds(given, ink)) {
            self.faults.push(format!("{at} reaches out of its box {given:?}: its ink is {ink:?}"));
        }
        let over = self.seen.iter().filter(|seen| edges(overlap(seen.ink, ink)).is_some());
        self.faults.extend(over.map(|seen| format!("{at} lies over {:?}", seen.text)));
        self.seen.push(Seen { text: text.to_owned(), ink });
    }
}

fn holds(outer: Rectangle, inner: Rectangle) -> bool {
    edges(inner).is_none() || overlap(outer, inner) == inner
}
