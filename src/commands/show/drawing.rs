//! The frame of a view in one size, kept until something that can be seen changes.

use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

use crate::board::{Frame, FrameSize, PlacedText, PlacedTexts};
use crate::picture::views::{Scene, canals, season, valley};
use crate::picture::{Canvas, Theme};
use crate::session::{Shade, View};
use crate::words::Words;

/// The views that can be drawn.
pub(super) const VIEWS: [View; 3] = [View::Valley, View::Season, View::Canals];

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

    /// Draws a view of the scene.
    pub fn draw(&mut self, view: View, scene: &Scene<'_>, shade: Shade, words: &Words) {
        let mut texts = PlacedTexts::default();
        let Ok(mut canvas) = Canvas::new(&mut self.pixels, self.size.width, self.size.height) else { return };
        if self.with_texts {
            canvas = canvas.with_witness(&mut texts);
        }
        let theme = theme(shade);
        match view {
            View::Season => season::draw(&mut canvas, scene, theme, words),
            View::Canals => canals::draw(&mut canvas, scene, theme, words),
            _ => valley::draw(&mut canvas, scene, theme, words),
        }
        self.texts = texts.0;
    }

    /// What a screen gets.
    pub fn frame(&self) -> Frame<'_> {
        Frame { size: self.size, pixels: &self.pixels, texts: &self.texts }
    }
}

fn theme(shade: Shade) -> &'static Theme {
    match shade {
        Shade::Light => &Theme::LIGHT,
        Shade::Dark => &Theme::DARK,
        Shade::Sunlight => &Theme::SUNLIGHT,
    }
}
