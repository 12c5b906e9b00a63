//! The wire to a panel: commands and pixels as bytes, in pieces that the kernel takes.

use embedded_hal::digital::OutputPin;
use embedded_hal::spi::SpiDevice;
use mipidsi::interface::{Interface, InterfaceKind};

/// The longest write, bytes: the kernel's SPI device refuses more unless told otherwise (Linux, drivers/spi/spidev.c,
/// `bufsiz`).
pub const LONGEST_WRITE: usize = 4096;

/// What failed on the wire.
#[derive(Debug)]
pub enum WireError<S, P> {
    /// The bus.
    Bus(S),
    /// The pin that tells commands from data.
    Pin(P),
}

/// A bus and the pin that tells commands (low) from data (high).
#[derive(Debug)]
pub(super) struct Line<S, P> {
    bus: S,
    data_command: P,
    buffer: Vec<u8>,
}

type Done<S, P> =
    Result<(), WireError<<S as embedded_hal::spi::ErrorType>::Error, <P as embedded_hal::digital::ErrorType>::Error>>;

impl<S: SpiDevice, P: OutputPin> Line<S, P> {
    pub fn new(bus: S, data_command: P) -> Self {
        Self { bus, data_command, buffer: Vec::with_capacity(LONGEST_WRITE) }
    }

    fn command(&mut self, command: &[u8], arguments: &[u8]) -> Done<S, P> {
        self.data_command.set_low().map_err(WireError::Pin)?;
        self.bus.write(command).map_err(WireError::Bus)?;
        self.data_command.set_high().map_err(WireError::Pin)?;
        if arguments.is_empty() { Ok(()) } else { self.bus.write(arguments).map_err(WireError::Bus) }
    }

    fn pixels<const N: usize>(&mut self, pixels: impl IntoIterator<Item = [u8; N]>) -> Done<S, P> {
        let full = LONGEST_WRITE - LONGEST_WRITE % N.max(1);
        self.buffer.clear();
        for pixel in pixels {
            self.buffer.extend_from_slice(&pixel);
            if self.buffer.len() >= full {
                self.bus.write(&self.buffer).map_err(WireError::Bus)?;
                self.buffer.clear();
            }
        }
        if self.buffer.is_empty() { Ok(()) } else { self.bus.write(&self.buffer).map_err(WireError::Bus) }
    }
}

/// A wire that moves 8 bits at a time.
#[derive(Debug)]
pub(super) struct Wire8<S, P>(pub Line<S, P>);

impl<S: SpiDevice, P: OutputPin> Interface for Wire8<S, P> {
    type Word = u8;
    type Error = WireError<S::Error, P::Error>;
    const KIND: InterfaceKind = InterfaceKind::Serial4Line;

    fn send_command(&mut self, command: u8, arguments: &[u8]) -> Result<(), Self::Error> {
        self.0.command(&[command], arguments)
    }

    fn send_pixels<const N: usize>(&mut self, pixels: impl IntoIterator<Item = [u8; N]>) -> Result<(), Self::Error> {
        self.0.pixels(pixels)
    }

    fn send_repeated_pixel<const N: usize>(&mut self, pixel: [u8; N], count: u32) -> Result<(), Self::Error> {
        self.0.pixels((0..count).map(|_| pixel))
    }
}

/// A wire that ends in shift registers and moves 16 bits at a time: commands and their arguments have an empty byte
/// before them, and the chip sees a bus of 16 lines.
#[derive(Debug)]
pub(super) struct Wire16<S, P>(pub Line<S, P>);

impl<S: SpiDevice, P: OutputPin> Interface for Wire16<S, P> {
    type Word = u16;
    type Error = WireError<S::Error, P::Error>;
    const KIND: InterfaceKind = InterfaceKind::Parallel16Bit;

    fn send_command(&mut self, command: u8, arguments: &[u8]) -> Result<(), Self::Error> {
        let wide: Vec<u8> = arguments.iter().flat_map(|&argument| [0, argument]).collect();
        self.0.command(&[0, command], &wide)
    }

    fn send_pixels<const N: usize>(&mut self, pixels: impl IntoIterator<Item = [u16; N]>) -> Result<(), Self::Error> {
        self.0.pixels(pixels.into_iter().flatten().map(u16::to_be_bytes))
    }

    fn send_repeated_pixel<const N: usize>(&mut self, pixel: [u16; N], count: u32) -> Result<(), Self::Error> {
        self.send_pixels((0..count).map(|_| pixel))
    }
}
