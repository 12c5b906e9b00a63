//! The frame of a view in one size, kept until something that can be seen changes.

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};
use embedded_graphics::primitives::Rectangle;

use crate::board::{Frame, FrameSize, PlacedText, PlacedTexts};
use crate::picture::views::grid::GridShown;
use crate::picture::views::{
    Scene, View as Page, about, canals, grid, help, ledger, many_years, season, setting_list, term, trust, valley,
};
use crate::picture::{Canvas, Theme};
use crate::session::help::key_lines;
use crate::session::{Card, Explained, Shade, View};
use crate::words::Words;

/// The views that can be drawn.
pub(super) const VIEWS: [View; 8] =
    [View::Valley, View::Season, View::Canals, View::Ledger, View::Years, View::Grid, View::Trust, View::About];

/// The page that draws a view.
pub(super) fn page(view: View) -> Page {
    Page::ALL[view as usize]
}

/// The language, and the second one where two are spoken.
type Speech<'w> = (&'w Words, Option<&'w Words>);

/// What is drawn.
#[derive(Clone, Copy, Debug)]
pub(super) struct Shows<'a> {
    /// The view.
    pub view: View,
    /// The card over it.
    pub card: Option<Card>,
    /// The map of two dials, which its own view needs.
    pub map: Option<&'a GridShown<'a>>,
}

/// A frame that was drawn.
#[derive(Debug)]
pub(super) struct Drawing {
    size: FrameSize,
    with_texts: bool,
    pixels: Vec<Rgb565>,
    texts: Vec<PlacedText>,
    /// How many sheets its view has.
    pub sheets: u8,
    /// Which state it shows.
    pub stamp: Option<u64>,
    /// Rows at the foot that the view leaves to a lesson.
    pub foot: u16,
}

impl Drawing {
    /// Room for a frame of that size.
    pub fn new(size: FrameSize, with_texts: bool) -> Self {
        let pixels = vec![Rgb565::BLACK; size.pixels()];
        Self { size, with_texts, pixels, texts: Vec::new(), sheets: 1, stamp: None, foot: 0 }
    }

    /// Nothing, which no screen asks for.
    pub fn none() -> Self {
        Self::new(FrameSize::new(0, 0), false)
    }

    /// Whether it is the frame that a screen asks for.
    pub fn is(&self, size: FrameSize, with_texts: bool) -> bool {
        self.size == size && self.with_texts == with_texts
    }

    /// Draws a view of the scene, or the map of two dials, and the card over it.
    pub fn draw(&mut self, page: Shows<'_>, scene: &Scene<'_>, shade: Shade, speech: Speech<'_>) {
        let (words, _) = speech;
        let Shows { view, card, map } = page;
        let (mut texts, mut over) = (PlacedTexts::default(), PlacedTexts::default());
        let rows = self.size.height - self.foot;
        let pixels = &mut self.pixels[..usize::from(rows) * usize::from(self.size.width)];
        let Ok(mut canvas) = Canvas::new(pixels, self.size.width, rows) else { return };
        // Letters of the page must not be set over a card.
        let covered = card.is_some() || scene.hand.list.is_some();
        if self.with_texts && !covered {
            canvas = canvas.with_witness(&mut texts);
        }
        let theme = theme(shade);
        match (view, map) {
            (View::Grid, Some(map)) => grid::draw(&mut canvas, scene, map, theme, words),
            (View::Season, _) => season::draw(&mut canvas, scene, theme, words),
            (View::Canals, _) => canals::draw(&mut canvas, scene, theme, words),
            (View::Ledger, _) => ledger::draw(&mut canvas, scene, theme, words),
            (View::Years, _) => many_years::draw(&mut canvas, scene, theme, words),
            (View::Trust, _) => trust::draw(&mut canvas, scene, theme, words),
            (View::About, _) => about::draw(&mut canvas, scene, theme, words),
            _ => valley::draw(&mut canvas, scene, theme, words),
        }
        let sheets = match view {
            View::About => about::sheet_count(&canvas, scene, words),
            View::Trust => trust::sheet_count(&canvas, scene, words),
            _ => 1,
        };
        if let Some(card) = card {
            if self.with_texts {
                canvas = canvas.with_witness(&mut over);
            }
            draw_card(&mut canvas, view, card, scene, theme, speech);
        } else if let Some(list) = scene.hand.list {
            if self.with_texts {
                canvas = canvas.with_witness(&mut over);
            }
            setting_list::draw(&mut canvas, &list, scene.hand.note, theme, words);
        }
        self.texts = if covered { over.0 } else { texts.0 };
        self.sheets = u8::try_from(sheets).unwrap_or(u8::MAX);
    }

    /// Draws over the whole frame, in place of what was there.
    pub fn draw_over(&mut self, draw: impl FnOnce(&mut Canvas<'_>, Size)) {
        let mut texts = PlacedTexts::default();
        let screen = Size::new(self.size.width.into(), self.size.height.into());
        let Ok(canvas) = Canvas::new(&mut self.pixels, self.size.width, self.size.height) else { return };
        draw(&mut canvas.with_witness(&mut texts), screen);
        self.texts = if self.with_texts { texts.0 } else { Vec::new() };
    }

    /// Draws into the rows that the view left free, on a canvas of their own.
    pub fn draw_foot(&mut self, draw: impl FnOnce(&mut Canvas<'_>, Size)) {
        let mut texts = PlacedTexts::default();
        let screen = Size::new(self.size.width.into(), self.size.height.into());
        let above = self.size.height - self.foot;
        let from = usize::from(above) * usize::from(self.size.width);
        let Ok(canvas) = Canvas::new(&mut self.pixels[from..], self.size.width, self.foot) else { return };
        draw(&mut canvas.with_witness(&mut texts), screen);
        if self.with_texts {
            let down = Point::new(0, above.into());
            let moved = |text: PlacedText| PlacedText {
                ink: Rectangle::new(text.ink.top_left + down, text.ink.size),
                given: text.given.map(|given| Rectangle::new(given.top_left + down, given.size)),
                ..text
            };
            self.texts.extend(texts.0.into_iter().map(moved));
        }
    }

    /// What a screen gets.
    pub fn frame(&self) -> Frame<'_> {
        Frame { size: self.size, pixels: &self.pixels, texts: &self.texts }
    }
}

fn draw_card(canvas: &mut Canvas<'_>, view: View, card: Card, scene: &Scene<'_>, theme: &Theme, speech: Speech<'_>) {
    let terms = term::terms(page(view));
    let (explained, index) = match card {
        Card::Help { page } => return help::draw(canvas, page.into(), &key_lines(), theme, speech),
        Card::Explain(Explained::Term(index)) => {
            let Some(id) = terms.get(usize::from(index)) else { return };
            (term::Explained::Term(id), index.into())
        }
        Card::Explain(Explained::Dial(dial)) => {
            let Some(index) = scene.dials.iter().position(|setting| setting.dial == dial) else { return };
            (term::Explained::Dial(&scene.dials[index]), terms.len() + index)
        }
    };
    term::draw(canvas, explained, (index, terms.len() + scene.dials.len()), scene.units, theme, speech);
}

/// The colours of a set.
pub(super) fn theme(shade: Shade) -> &'static Theme {
    match shade {
        Shade::Light => &Theme::LIGHT,
        Shade::Dark => &Theme::DARK,
        Shade::Sunlight => &Theme::SUNLIGHT,
    }
}
