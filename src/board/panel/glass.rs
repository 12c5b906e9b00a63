//! A started panel: frames in, boxes of pixels out.

use std::fmt::Debug;

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::{Rgb565, Rgb666, RgbColor};
use embedded_graphics::primitives::Rectangle;
use embedded_hal::delay::DelayNs;
use embedded_hal::digital::OutputPin;
use embedded_hal::spi::SpiDevice;
use mipidsi::interface::{Interface, InterfacePixelFormat};
use mipidsi::models::{ILI9341Rgb565, ILI9486Rgb565, ILI9486Rgb666, ILI9488Rgb666, Model, ST7789};
use mipidsi::options::{ColorInversion, ColorOrder, Orientation, Rotation};
use mipidsi::{Builder, Display};

use super::wire::{Line, Wire8, Wire16};
use crate::board::file::{PanelChip, PanelPart, Turned, WordBits};
use crate::board::light::{Lamp, Light};
use crate::board::placing::Placing;
use crate::board::reviving::Surface;
use crate::board::screen::Frame;
use crate::board::size::FrameSize;

/// Starts the panel on a bus, makes it black and lights it.
///
/// # Errors
/// What bus, pins or backlight say, or that no picture goes onto it.
pub fn start<S, P, R, D>(
    part: &PanelPart,
    bus: S,
    data_command: P,
    reset: Option<R>,
    delay: D,
    lamp: Box<dyn Lamp>,
) -> Result<Box<dyn Surface>, String>
where
    S: SpiDevice + 'static,
    P: OutputPin + 'static,
    R: OutputPin + 'static,
    D: DelayNs + 'static,
{
    let line = Line::new(bus, data_command);
    let means = Means { part, reset, delay, lamp };
    match (part.chip, part.word_bits) {
        (PanelChip::St7789, _) => means.start(ST7789, Wire8(line)),
        (PanelChip::Ili9341, _) => means.start(ILI9341Rgb565, Wire8(line)),
        (PanelChip::Ili9486, WordBits::Eight) => means.start(ILI9486Rgb666, Wire8(line)),
        (PanelChip::Ili9486, WordBits::Sixteen) => means.start(ILI9486Rgb565, Wire16(line)),
        (PanelChip::Ili9488, _) => means.start(ILI9488Rgb666, Wire8(line)),
    }
}

/// All that is needed besides the model and its wire.
struct Means<'a, R, D> {
    part: &'a PanelPart,
    reset: Option<R>,
    delay: D,
    lamp: Box<dyn Lamp>,
}

impl<R: OutputPin + 'static, D: DelayNs + 'static> Means<'_, R, D> {
    fn start<M, W>(self, model: M, wire: W) -> Result<Box<dyn Surface>, String>
    where
        M: Model + 'static,
        W: Interface + 'static,
        M::ColorFormat: InterfacePixelFormat<W::Word> + OfFrame,
    {
        let Self { part, reset, mut delay, lamp } = self;
        let placing = Placing::new(part.width_px.into(), part.height_px.into(), part.turned);
        let placing = placing.ok_or_else(|| FrameSize::new(part.width_px, part.height_px).to_string())?;
        let rotation = match part.turned {
            Turned::By0 => Rotation::Deg0,
            Turned::By90 => Rotation::Deg90,
            Turned::By180 => Rotation::Deg180,
            Turned::By270 => Rotation::Deg270,
        };
        // Flipped before it is turned: it is the columns of the chip that run the other way, not those of the picture.
        let upright = if part.mirrored { Orientation::new().flip_horizontal() } else { Orientation::new() };
        let orientation = upright.rotate(rotation);
        let builder = Builder::new(model, wire)
            .display_size(part.width_px, part.height_px)
            .display_offset(part.offset_x_px, part.offset_y_px)
            .orientation(orientation)
            .color_order(if part.blue_first { ColorOrder::Bgr } else { ColorOrder::Rgb })
            .invert_colors(if part.inverted { ColorInversion::Inverted } else { ColorInversion::Normal });
        match reset {
            Some(pin) => {
                let display = builder.reset_pin(pin).init(&mut delay).map_err(said)?;
                Glass { display, delay, lamp, placing }.lit()
            }
            None => {
                let display = builder.init(&mut delay).map_err(said)?;
                Glass { display, delay, lamp, placing }.lit()
            }
        }
    }
}

struct Glass<W, M, R, D>
where
    W: Interface,
    M: Model,
    M::ColorFormat: InterfacePixelFormat<W::Word>,
    R: OutputPin,
{
    display: Display<W, M, R>,
    delay: D,
    lamp: Box<dyn Lamp>,
    placing: Placing,
}

impl<W, M, R, D> Glass<W, M, R, D>
where
    W: Interface + 'static,
    M: Model + 'static,
    M::ColorFormat: InterfacePixelFormat<W::Word> + OfFrame,
    R: OutputPin + 'static,
    D: DelayNs + 'static,
{
    /// Black and lit: at first the memory of the chip holds noise, and nobody needs to see it.
    fn lit(mut self) -> Result<Box<dyn Surface>, String> {
        let (width, height) = self.placing.turned.picture(self.placing.width as u16, self.placing.height as u16);
        let whole = Rectangle::new(Point::zero(), Size::new(width.into(), height.into()));
        let black = std::iter::repeat_n(Rgb565::BLACK, usize::from(width) * usize::from(height));
        self.send(&whole, black)?;
        self.lamp.shine(Light::Full).map_err(said)?;
        Ok(Box::new(self))
    }

    /// Sends the pixels of a box of the turned glass.
    fn send(&mut self, area: &Rectangle, pixels: impl Iterator<Item = Rgb565>) -> Result<(), String> {
        let (left, top) = (area.top_left.x as u16, area.top_left.y as u16);
        let (right, bottom) = (left + area.size.width as u16 - 1, top + area.size.height as u16 - 1);
        self.display.set_pixels(left, top, right, bottom, pixels.map(M::ColorFormat::of_frame)).map_err(said)
    }
}

impl<W, M, R, D> Surface for Glass<W, M, R, D>
where
    W: Interface + 'static,
    M: Model + 'static,
    M::ColorFormat: InterfacePixelFormat<W::Word> + OfFrame,
    R: OutputPin + 'static,
    D: DelayNs + 'static,
{
    fn size(&self) -> FrameSize {
        self.placing.frame
    }

    fn show(&mut self, frame: &Frame<'_>, changed: &[Rectangle]) -> Result<(), String> {
        if frame.size != self.placing.frame || frame.pixels.len() != frame.size.pixels() {
            return Err(frame.size.to_string());
        }
        let row = usize::from(frame.size.width);
        let placing = self.placing;
        let before = Point::new(placing.left as i32, placing.top as i32);
        for area in changed.iter().filter_map(|area| placing.clip(area)) {
            let (left, top) = (area.top_left.x as usize, area.top_left.y as usize);
            let (width, height) = (area.size.width as usize, area.size.height as usize);
            let rows = frame.pixels.chunks_exact(row).skip(top).take(height);
            let pixels = rows.flat_map(|row| row.iter().skip(left).take(width).copied());
            self.send(&Rectangle::new(area.top_left + before, area.size), pixels)?;
        }
        Ok(())
    }

    fn light(&mut self, light: Light) -> Result<(), String> {
        let sleeps = self.display.is_sleeping();
        if light == Light::Off {
            self.lamp.shine(light).map_err(said)?;
            return if sleeps { Ok(()) } else { self.display.sleep(&mut self.delay).map_err(said) };
        }
        if sleeps {
            self.display.wake(&mut self.delay).map_err(said)?;
        }
        self.lamp.shine(light).map_err(said)
    }

    fn starts_anew_after_dark(&self) -> bool {
        true
    }
}

/// A colour of a panel, made from one of a frame.
trait OfFrame {
    fn of_frame(colour: Rgb565) -> Self;
}

impl OfFrame for Rgb565 {
    fn of_frame(colour: Rgb565) -> Self {
        colour
    }
}

impl OfFrame for Rgb666 {
    /// The highest bit fills the lowest, so that black stays black and white white.
    fn of_frame(colour: Rgb565) -> Self {
        let six = |five: u8| five << 1 | five >> 4;
        Self::new(six(colour.r()), colour.g(), six(colour.b()))
    }
}

fn said(error: impl Debug) -> String {
    format!("{error:?}")
}
