//! The frame of a view in one size, kept until something that can be seen changes.

use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

use crate::board::{Frame, FrameSize, PlacedText, PlacedTexts};
use crate::picture::views::{
    Scene, View as Page, about, canals, help, ledger, many_years, season, term, trust, valley,
};
use crate::picture::{Canvas, Theme};
use crate::session::help::key_lines;
use crate::session::{Card, Explained, Shade, View};
use crate::words::Words;

/// The views that can be drawn.
pub(super) const VIEWS: [View; 7] =
    [View::Valley, View::Season, View::Canals, View::Ledger, View::Years, View::Trust, View::About];

/// The page that draws a view.
pub(super) fn page(view: View) -> Page {
    Page::ALL[view as usize]
}

/// A frame that was drawn.
#[derive(Debug)]
pub(super) struct Drawing {
    size: FrameSize,
    with_texts: bool,
    pixels: Vec<Rgb565>,
    texts: Vec<PlacedText>,
    /// Which state it shows.
    pub stamp: Option<u64>,
}

impl Drawing {
    /// Room for a frame of that size.
    pub fn new(size: FrameSize, with_texts: bool) -> Self {
        let pixels = vec![Rgb565::BLACK; size.pixels()];
        Self { size, with_texts, pixels, texts: Vec::new(), stamp: None }
    }

    /// Whether it is the frame that a screen asks for.
    pub fn is(&self, size: FrameSize, with_texts: bool) -> bool {
        self.size == size && self.with_texts == with_texts
    }

    /// Draws a view of the scene and the card over it; gives how many sheets the view has in this size.
    pub fn draw(&mut self, view: View, card: Option<Card>, scene: &Scene<'_>, shade: Shade, words: &Words) -> u8 {
        let (mut texts, mut over) = (PlacedTexts::default(), PlacedTexts::default());
        let Ok(mut canvas) = Canvas::new(&mut self.pixels, self.size.width, self.size.height) else { return 1 };
        // Letters of the page must not be set over a card.
        if self.with_texts && card.is_none() {
            canvas = canvas.with_witness(&mut texts);
        }
        let theme = theme(shade);
        match view {
            View::Season => season::draw(&mut canvas, scene, theme, words),
            View::Canals => canals::draw(&mut canvas, scene, theme, words),
            View::Ledger => ledger::draw(&mut canvas, scene, theme, words),
            View::Years => many_years::draw(&mut canvas, scene, theme, words),
            View::Trust => trust::draw(&mut canvas, scene, theme, words),
            View::About => about::draw(&mut canvas, scene, theme, words),
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
            draw_card(&mut canvas, view, card, scene, theme, words);
        }
        self.texts = if card.is_some() { over.0 } else { texts.0 };
        u8::try_from(sheets).unwrap_or(u8::MAX)
    }

    /// What a screen gets.
    pub fn frame(&self) -> Frame<'_> {
        Frame { size: self.size, pixels: &self.pixels, texts: &self.texts }
    }
}

fn draw_card(canvas: &mut Canvas<'_>, view: View, card: Card, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    let terms = term::terms(page(view));
    let (explained, index) = match card {
        Card::Help { page } => return help::draw(canvas, page.into(), &key_lines(), theme, words),
        Card::Explain(Explained::Term(index)) => {
            let Some(id) = terms.get(usize::from(index)) else { return };
            (term::Explained::Term(id), index.into())
        }
        Card::Explain(Explained::Dial(dial)) => {
            let Some(index) = scene.dials.iter().position(|setting| setting.dial == dial) else { return };
            (term::Explained::Dial(&scene.dials[index]), terms.len() + index)
        }
    };
    term::draw(canvas, explained, (index, terms.len() + scene.dials.len()), scene.units, theme, words);
}

fn theme(shade: Shade) -> &'static Theme {
    match shade {
        Shade::Light => &Theme::LIGHT,
        Shade::Dark => &Theme::DARK,
        Shade::Sunlight => &Theme::SUNLIGHT,
    }
}
