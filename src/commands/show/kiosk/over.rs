//! What lies over the page: the line of the stroll, the message of the day, the staff menu, the dark.

use embedded_graphics::geometry::Size;
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};
use embedded_graphics::primitives::Rectangle;

use super::KioskPlayer;
use super::staff_words::StaffWords;
use crate::board::{Frame, FrameSize, Instrument, PlacedText, PlacedTexts};
use crate::picture::views::scene::DialSetting;
use crate::picture::views::{staff, stroll};
use crate::picture::{Canvas, Paint};
use crate::session::kiosk::Over;
use crate::session::scene::settings;

/// Frames with something over them that are kept: those of a few screens at once.
const MOST_COVERED: usize = 4;

/// A frame with something over it.
#[derive(Debug)]
pub(super) struct Covered {
    size: FrameSize,
    pixels: Vec<Rgb565>,
    texts: Vec<PlacedText>,
}

impl KioskPlayer {
    /// The message of the day in the language on show.
    pub(super) fn message(&self) -> Option<&str> {
        self.messages.get(self.player.words().tag())
    }

    /// The player's frame, with what lies over it.
    pub(super) fn draw(&mut self, size: FrameSize, texts: bool) -> Frame<'_> {
        let over = self.kiosk.over();
        // Where no light can be turned down the picture itself gets darker.
        let veil = match self.kiosk.light_percent() {
            0 => 255,
            _ if self.light.is_there() => 0,
            percent => (100 - percent.min(100)) / 2 * 3,
        };
        if over == Over::Nothing && veil == 0 {
            self.covered.clear();
            return self.player.frame(size, texts);
        }
        let at = match self.covered.iter().position(|covered| covered.size == size) {
            Some(at) => at,
            None => {
                if self.covered.len() >= MOST_COVERED {
                    self.covered.remove(0);
                }
                self.covered.push(Covered { size, pixels: vec![Rgb565::BLACK; size.pixels()], texts: Vec::new() });
                self.covered.len() - 1
            }
        };
        let mut covered =
            std::mem::replace(&mut self.covered[at], Covered { size, pixels: Vec::new(), texts: Vec::new() });
        covered.texts.clear();
        if over == Over::Dark {
            covered.pixels.fill(Rgb565::BLACK);
        } else {
            let under = self.player.frame(size, texts);
            covered.pixels.copy_from_slice(under.pixels);
            covered.texts.extend_from_slice(under.texts);
            self.draw_over(over, &mut covered, texts, veil);
        }
        self.covered[at] = covered;
        let covered = &self.covered[at];
        Frame { size, pixels: &covered.pixels, texts: &covered.texts }
    }

    fn draw_over(&self, over: Over, covered: &mut Covered, texts: bool, veil: u8) {
        let (words, theme) = (self.player.words(), self.player.theme());
        let shown = self.player.shown();
        let mut placed = PlacedTexts::default();
        let size = covered.size;
        let Ok(mut canvas) = Canvas::new(&mut covered.pixels, size.width, size.height) else { return };
        if texts {
            canvas = canvas.with_witness(&mut placed);
        }
        let whole = canvas.frame();
        let hidden = match over {
            Over::Nothing | Over::Dark => Rectangle::zero(),
            Over::AnyoneThere => {
                stroll::draw(&mut canvas, &words.say("kiosk-anyone-there", &[]), None, theme, words);
                stroll::strip(whole.size)
            }
            Over::Says { message, dial } => {
                let dials: Vec<DialSetting> = settings(self.player.offer(), &shown.dials).to_vec();
                let turned =
                    dials.iter().find(|setting| Some(setting.dial) == dial).map(|setting| (setting, shown.system));
                stroll::draw(&mut canvas, &words.say(message, &[]), turned, theme, words);
                stroll::strip(whole.size)
            }
            Over::MessageOfDay => {
                stroll::draw_message(&mut canvas, self.message().unwrap_or_default(), theme, words);
                whole
            }
            Over::Staff(page) => {
                let told = StaffWords::of(page, self);
                staff::draw(&mut canvas, &told.card(), theme);
                whole
            }
        };
        if veil > 0 {
            canvas.paint(whole, Paint::Wash { colour: Rgb565::BLACK, share: veil });
        }
        covered.texts.retain(|text| text.ink.intersection(&hidden).size == Size::zero());
        covered.texts.append(&mut placed.0);
    }
}
