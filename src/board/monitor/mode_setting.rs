//! A monitor through the kernel's mode-setting interface: the mode is set, and a plain buffer is shown.

use std::fs::{File, OpenOptions};
use std::io;
use std::os::fd::{AsFd, BorrowedFd};

use drm::Device;
use drm::buffer::{Buffer, DrmFourcc};
use drm::control::dumbbuffer::DumbBuffer;
use drm::control::{ClipRect, Device as ControlDevice, Mode as CardMode, ModeTypeFlags, connector, crtc, framebuffer};
use embedded_graphics::primitives::Rectangle;

use super::modes::{Mode, choose};
use super::raster::{Memory, PixelForm, Raster};
use crate::board::file::MonitorPart;
use crate::board::light::Light;
use crate::board::placing::Placing;
use crate::board::reviving::Surface;
use crate::board::screen::Frame;
use crate::board::size::FrameSize;

/// So many cards are looked at.
const MOST_CARDS: u8 = 8;
/// Boxes that the kernel takes in one call.
const MOST_CLIPS: usize = 256;
/// Values of the connector's property "DPMS" (Linux kernel, include/uapi/drm/drm_mode.h).
const POWER_ON: u64 = 0;
const POWER_OFF: u64 = 3;

#[derive(Debug)]
struct Card(File);

impl AsFd for Card {
    fn as_fd(&self) -> BorrowedFd<'_> {
        self.0.as_fd()
    }
}

impl Device for Card {}
impl ControlDevice for Card {}

/// A picture on a monitor.
#[derive(Debug)]
pub(super) struct Shown {
    card: Card,
    connector: connector::Handle,
    /// Gone only while it is dropped.
    buffer: Option<DumbBuffer>,
    handle: framebuffer::Handle,
    raster: Raster,
}

impl Shown {
    /// Sets the mode of the first monitor that fits, on the first card that has one.
    ///
    /// # Errors
    /// What the system says of the last card that was tried.
    pub fn open(part: &MonitorPart) -> Result<Self, String> {
        let mut reason = String::from("/dev/dri");
        for number in 0..MOST_CARDS {
            let path = format!("/dev/dri/card{number}");
            match OpenOptions::new().read(true).write(true).open(&path) {
                Ok(file) => match Self::on(Card(file), part) {
                    Ok(shown) => return Ok(shown),
                    Err(error) => reason = format!("{path}: {error}"),
                },
                Err(error) if error.kind() == io::ErrorKind::NotFound => {}
                Err(error) => reason = format!("{path}: {error}"),
            }
        }
        Err(reason)
    }

    fn on(card: Card, part: &MonitorPart) -> io::Result<Self> {
        let resources = card.resource_handles()?;
        for &handle in resources.connectors() {
            let Ok(info) = card.get_connector(handle, true) else { continue };
            let name = format!("{}-{}", info.interface().as_str(), info.interface_id());
            let named = part.connector.as_ref().is_none_or(|wanted| *wanted == name);
            if !named || info.state() != connector::State::Connected {
                continue;
            }
            let Some(mode) = mode_for(&info, part) else { continue };
            if let Some(crtc) = controller(&card, &resources, &info) {
                return Self::show_on(card, handle, crtc, mode, part);
            }
        }
        Err(io::ErrorKind::NotFound.into())
    }

    fn show_on(
        card: Card,
        connector: connector::Handle,
        crtc: crtc::Handle,
        mode: CardMode,
        part: &MonitorPart,
    ) -> io::Result<Self> {
        let (width, height) = (u32::from(mode.size().0), u32::from(mode.size().1));
        let placing = Placing::new(width, height, part.turned).ok_or(io::ErrorKind::Unsupported)?;
        let (buffer, handle, form) = buffer(&card, (width, height))?;
        let raster = Raster { placing, form, blue_first: false, stride: buffer.pitch().into(), start: 0 };
        let mut shown = Self { card, connector, buffer: Some(buffer), handle, raster };
        shown.write(|raster, memory| raster.clear(memory))?;
        shown.card.set_crtc(crtc, Some(handle), (0, 0), &[connector], Some(mode))?;
        Ok(shown)
    }

    /// Lets `draw` write into the buffer.
    fn write(&mut self, draw: impl FnOnce(&Raster, &mut Mapped<'_>) -> io::Result<()>) -> io::Result<()> {
        let Some(buffer) = self.buffer.as_mut() else { return Ok(()) };
        let mut mapping = self.card.map_dumb_buffer(buffer)?;
        draw(&self.raster, &mut Mapped(mapping.as_mut()))
    }

    /// Tells drivers that copy what changed; those that show the memory itself do not know the call.
    fn flush(&self, changed: &[Rectangle]) {
        let edge = |value: u32| u16::try_from(value).unwrap_or(u16::MAX);
        let boxes = changed.iter().filter_map(|area| self.raster.placing.clip(area));
        let clips: Vec<ClipRect> = boxes
            .map(|area| self.raster.placing.on_glass(&area))
            .map(|(left, top, right, bottom)| ClipRect::new(edge(left), edge(top), edge(right), edge(bottom)))
            .take(MOST_CLIPS)
            .collect();
        if !clips.is_empty() {
            let _ = self.card.dirty_framebuffer(self.handle, &clips);
        }
    }
}

impl Surface for Shown {
    fn size(&self) -> FrameSize {
        self.raster.placing.frame
    }

    fn show(&mut self, frame: &Frame<'_>, changed: &[Rectangle]) -> Result<(), String> {
        self.write(|raster, memory| raster.draw(frame.pixels, changed, memory)).map_err(|error| error.to_string())?;
        self.flush(changed);
        Ok(())
    }

    fn light(&mut self, light: Light) -> Result<(), String> {
        // A monitor that cannot be put out stays on, and that is no reason to give it up.
        let Ok(properties) = self.card.get_properties(self.connector) else { return Ok(()) };
        for (&property, _) in properties.iter() {
            let named = self.card.get_property(property).is_ok_and(|info| info.name().to_bytes() == b"DPMS");
            if named {
                let value = if light == Light::Off { POWER_OFF } else { POWER_ON };
                let _ = self.card.set_property(self.connector, property, value);
            }
        }
        Ok(())
    }

    fn check(&mut self) -> Result<(), String> {
        let info = self.card.get_connector(self.connector, false).map_err(|error| error.to_string())?;
        match info.state() {
            connector::State::Disconnected => Err(io::Error::from(io::ErrorKind::NotConnected).to_string()),
            _ => Ok(()),
        }
    }
}

impl Drop for Shown {
    fn drop(&mut self) {
        let _ = self.card.destroy_framebuffer(self.handle);
        if let Some(buffer) = self.buffer.take() {
            let _ = self.card.destroy_dumb_buffer(buffer);
        }
    }
}

/// The mode to use of a monitor.
fn mode_for(info: &connector::Info, part: &MonitorPart) -> Option<CardMode> {
    let modes: Vec<Mode> = info
        .modes()
        .iter()
        .map(|mode| Mode {
            width: mode.size().0,
            height: mode.size().1,
            refresh_hz: mode.vrefresh(),
            preferred: mode.mode_type().contains(ModeTypeFlags::PREFERRED),
        })
        .collect();
    let index = choose(&modes, part.mode_px, part.turned)?;
    info.modes().get(index).copied()
}

/// What can drive a monitor: what does already, else the first that could.
fn controller(card: &Card, resources: &drm::control::ResourceHandles, info: &connector::Info) -> Option<crtc::Handle> {
    let encoders = info.current_encoder().into_iter().chain(info.encoders().iter().copied());
    let encoders: Vec<_> = encoders.filter_map(|encoder| card.get_encoder(encoder).ok()).collect();
    let now = encoders.iter().find_map(|encoder| encoder.crtc());
    now.or_else(|| {
        encoders.iter().find_map(|encoder| resources.filter_crtcs(encoder.possible_crtcs()).first().copied())
    })
}

/// A buffer that the card can show: 32 bits where it takes them, else 16.
fn buffer(card: &Card, size: (u32, u32)) -> io::Result<(DumbBuffer, framebuffer::Handle, PixelForm)> {
    let ways = [(DrmFourcc::Xrgb8888, 24, 32, PixelForm::Bits32), (DrmFourcc::Rgb565, 16, 16, PixelForm::Bits16)];
    let mut reason = io::Error::from(io::ErrorKind::Unsupported);
    for (format, depth, bits, form) in ways {
        let buffer = match card.create_dumb_buffer(size, format, bits) {
            Ok(buffer) => buffer,
            Err(error) => {
                reason = error;
                continue;
            }
        };
        match card.add_framebuffer(&buffer, depth, bits) {
            Ok(handle) => return Ok((buffer, handle, form)),
            Err(error) => {
                let _ = card.destroy_dumb_buffer(buffer);
                reason = error;
            }
        }
    }
    Err(reason)
}

/// Memory of the card.
struct Mapped<'a>(&'a mut [u8]);

impl Memory for Mapped<'_> {
    fn write(&mut self, at: u64, bytes: &[u8]) -> io::Result<()> {
        let start = usize::try_from(at).map_err(|_| io::ErrorKind::InvalidInput)?;
        let end = start.checked_add(bytes.len()).ok_or(io::ErrorKind::InvalidInput)?;
        self.0.get_mut(start..end).ok_or(io::ErrorKind::WriteZero)?.copy_from_slice(bytes);
        Ok(())
    }
}
