//! What a screen shows and what an instrument gives it.

use std::fmt;
use std::time::Duration;

use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::choose::ScreenKind;
use super::hands::HandEvent;
use super::light::Light;
use super::size::FrameSize;
use crate::picture::{TextMark, Witness};

/// A piece of text as it stands on a frame, for screens that show letters better than pixels.
#[derive(Clone, Debug, PartialEq)]
pub struct PlacedText {
    /// The text.
    pub text: String,
    /// The box around its ink, in pixels.
    pub ink: Rectangle,
    /// The box that it was set in, where one was given.
    pub given: Option<Rectangle>,
}

/// Collects every text of a frame while it is drawn.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct PlacedTexts(pub Vec<PlacedText>);

impl Witness for PlacedTexts {
    fn text(&mut self, mark: TextMark<'_>) {
        if !mark.clip.intersection(&mark.ink).is_zero_sized() {
            self.0.push(PlacedText { text: mark.text.to_owned(), ink: mark.ink, given: mark.given });
        }
    }
}

/// One finished picture.
#[derive(Clone, Copy, Debug)]
pub struct Frame<'a> {
    /// Its size.
    pub size: FrameSize,
    /// Its pixels, row after row from the top; exactly as many as the size says.
    pub pixels: &'a [Rgb565],
    /// Its texts; empty unless they were asked for.
    pub texts: &'a [PlacedText],
}

/// What is said around the picture, in the language of the moment.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub struct Caption<'a> {
    /// Heads a window.
    pub title: &'a str,
    /// The most needed keys in one line, for a screen without a frame of its own.
    pub hint: &'a str,
    /// Said in place of the picture on a screen that is too small for it.
    pub too_small: &'a str,
}

/// What the hands play and the screens show.
pub trait Instrument {
    /// Takes one event.
    fn event(&mut self, event: HandEvent);

    /// The picture in that size, with its texts where `texts`. What did not change since the last call need not be drawn
    /// again.
    fn frame(&mut self, size: FrameSize, texts: bool) -> Frame<'_>;

    /// How often [`HandEvent::Time`] is wanted while nobody touches anything; `None` while nothing moves.
    fn wants_tick(&self) -> Option<Duration>;

    /// Whether it has ended of itself.
    fn done(&self) -> bool;

    /// What is said around the picture.
    fn caption(&self) -> Caption<'_>;

    /// How bright the screens shall be.
    fn light(&self) -> Light {
        Light::Full
    }
}

/// Something that shows frames.
pub trait Screen {
    /// What it is.
    fn kind(&self) -> ScreenKind;

    /// The frame that it would show at present.
    fn size(&self) -> FrameSize;

    /// Whether it wants the texts beside the pixels.
    fn wants_texts(&self) -> bool {
        false
    }

    /// Shows a frame of [`Screen::size`]. All pixels that differ from the frame before lie in `changed`.
    ///
    /// # Errors
    /// [`ScreenError`] where the screen is gone.
    fn present(&mut self, frame: &Frame<'_>, changed: &[Rectangle]) -> Result<(), ScreenError>;

    /// Takes another caption.
    ///
    /// # Errors
    /// [`ScreenError`] where the screen is gone.
    fn caption(&mut self, caption: &Caption<'_>) -> Result<(), ScreenError> {
        let _ = caption;
        Ok(())
    }

    /// Takes another brightness, where it can have one. `true` where it has lost what it showed.
    fn light(&mut self, light: Light) -> bool {
        let _ = light;
        false
    }

    /// How often [`Screen::tend`] wants to be called; `None` for screens that look after themselves.
    fn wants_tending(&self) -> Option<Duration> {
        None
    }

    /// Looks whether it is still there, or there again. `true` where it has lost what it showed.
    fn tend(&mut self) -> bool {
        false
    }
}

/// A screen that could not be opened, or stopped working.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct ScreenError {
    /// Which.
    pub screen: ScreenKind,
    /// What the system says, in its own words.
    pub reason: String,
}

impl ScreenError {
    /// The failure of `screen`, told by whatever failed.
    pub fn new(screen: ScreenKind, reason: impl fmt::Display) -> Self {
        Self { screen, reason: reason.to_string() }
    }
}

impl fmt::Display for ScreenError {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(f, "{}: {}", self.screen.name(), self.reason)
    }
}

impl std::error::Error for ScreenError {}
