//! What is known of the chips that a board file may name.
//!
//! Memory sizes and colour depths on the serial bus are those of the makers' data sheets (Sitronix ST7789V, ILI Technology
//! ILI9341, ILI9486, ILI9488), from memory. Which colour order the glass usually has, whether it is inverted and how fast
//! the bus may be are common practice, no source; a board file may say otherwise.

/// A chip that drives a small display.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum PanelChip {
    /// 240 × 320, 16 bits.
    St7789,
    /// 240 × 320, 16 bits.
    Ili9341,
    /// 320 × 480, 18 bits, or 16 behind shift registers.
    Ili9486,
    /// 320 × 480, 18 bits.
    Ili9488,
}

impl PanelChip {
    /// All of them.
    pub const ALL: [Self; 4] = [Self::St7789, Self::Ili9341, Self::Ili9486, Self::Ili9488];

    /// The name in a board file: its part number in small letters.
    pub const fn name(self) -> &'static str {
        match self {
            Self::St7789 => "st7789",
            Self::Ili9341 => "ili9341",
            Self::Ili9486 => "ili9486",
            Self::Ili9488 => "ili9488",
        }
    }

    /// Columns and rows of its memory, pixels.
    pub const fn memory_px(self) -> (u16, u16) {
        match self {
            Self::St7789 | Self::Ili9341 => (240, 320),
            Self::Ili9486 | Self::Ili9488 => (320, 480),
        }
    }

    /// Whether its glass usually has blue first.
    pub(super) const fn usually_blue_first(self) -> bool {
        !matches!(self, Self::St7789)
    }

    /// Whether its columns usually run from right to left on the glass.
    pub(super) const fn usually_mirrored(self) -> bool {
        !matches!(self, Self::St7789)
    }

    /// Whether its glass usually needs inverting.
    pub(super) const fn usually_inverted(self) -> bool {
        matches!(self, Self::St7789)
    }

    /// A clock that short wires usually bear, MHz.
    pub(super) const fn usual_speed_mhz(self) -> f64 {
        match self {
            Self::St7789 | Self::Ili9341 => 32.0,
            Self::Ili9486 => 16.0,
            Self::Ili9488 => 20.0,
        }
    }
}

/// The family of the board's processor, which decides what its pins are.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum Processor {
    /// BCM2835 and its successors to BCM2711 on a 40-pin header.
    Bcm2835,
    /// Any other; the file itself says which pins are taken.
    #[default]
    Other,
}

/// A pin of a bus.
pub(super) type BusPin = (u16, &'static str);

impl Processor {
    /// The highest pin that a wire can be put on.
    pub(super) const fn last_pin(self) -> u16 {
        match self {
            Self::Bcm2835 => 27,
            Self::Other => 511,
        }
    }

    /// Clock and data pins of an SPI bus (Broadcom, BCM2835 ARM Peripherals, 2012, table 6-31, from memory).
    pub(super) const fn spi_pins(self, bus: u8) -> &'static [BusPin] {
        match (self, bus) {
            (Self::Bcm2835, 0) => &[(9, "MISO"), (10, "MOSI"), (11, "SCLK")],
            (Self::Bcm2835, 1) => &[(19, "MISO"), (20, "MOSI"), (21, "SCLK")],
            _ => &[],
        }
    }

    /// The usual pin of a chip-select line (same source).
    pub(super) const fn chip_select_pin(self, bus: u8, line: u8) -> Option<u16> {
        match (self, bus, line) {
            (Self::Bcm2835, 0, 0) => Some(8),
            (Self::Bcm2835, 0, 1) => Some(7),
            (Self::Bcm2835, 1, 0) => Some(18),
            (Self::Bcm2835, 1, 1) => Some(17),
            (Self::Bcm2835, 1, 2) => Some(16),
            _ => None,
        }
    }

    /// Pins of an I²C bus (same source).
    pub(super) const fn i2c_pins(self, bus: u8) -> &'static [BusPin] {
        match (self, bus) {
            (Self::Bcm2835, 0) => &[(0, "SDA"), (1, "SCL")],
            (Self::Bcm2835, 1) => &[(2, "SDA"), (3, "SCL")],
            _ => &[],
        }
    }
}
