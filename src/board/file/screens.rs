//! The screens of a board: plain data, as a board file has them.

use super::chips::PanelChip;
use super::pins::Pin;
use crate::board::choose::ScreenKind;

/// One screen.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum ScreenPart {
    /// A small display on the SPI bus.
    Panel(PanelPart),
    /// A monitor, or a display that the system treats as one.
    Monitor(MonitorPart),
}

impl ScreenPart {
    /// What it is.
    pub const fn kind(&self) -> ScreenKind {
        match self {
            Self::Panel(_) => ScreenKind::Panel,
            Self::Monitor(_) => ScreenKind::Framebuffer,
        }
    }
}

/// How far a picture is turned on its glass, clockwise.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Turned {
    /// Upright.
    #[default]
    By0,
    /// A quarter turn.
    By90,
    /// Upside down.
    By180,
    /// Three quarter turns.
    By270,
}

impl Turned {
    /// All four.
    pub const ALL: [Self; 4] = [Self::By0, Self::By90, Self::By180, Self::By270];

    /// Degrees clockwise.
    pub const fn degrees(self) -> u16 {
        match self {
            Self::By0 => 0,
            Self::By90 => 90,
            Self::By180 => 180,
            Self::By270 => 270,
        }
    }

    /// Whether width and height change places.
    pub const fn swaps(self) -> bool {
        matches!(self, Self::By90 | Self::By270)
    }

    /// Width and height of the turned picture that fills glass of `width` × `height`.
    pub const fn picture(self, width: u16, height: u16) -> (u16, u16) {
        if self.swaps() { (height, width) } else { (width, height) }
    }
}

/// A small display on the SPI bus.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct PanelPart {
    /// The chip that drives its glass.
    pub chip: PanelChip,
    /// Columns of the glass in pixels, before it is turned.
    pub width_px: u16,
    /// Rows of the glass in pixels, before it is turned.
    pub height_px: u16,
    /// Columns of the chip's memory left of the glass.
    pub offset_x_px: u16,
    /// Rows of the chip's memory above the glass.
    pub offset_y_px: u16,
    /// How far the picture is turned.
    pub turned: Turned,
    /// Whether the chip's columns run from right to left on the glass.
    pub mirrored: bool,
    /// Whether the glass has blue where the chip expects red.
    pub blue_first: bool,
    /// Whether the glass shows colours the wrong way round unless told to invert.
    pub inverted: bool,
    /// Bits that the wire moves at a time: 8, or 16 where the bus ends in shift registers.
    pub word_bits: WordBits,
    /// Where it hangs.
    pub at: SpiAddress,
    /// Clock of the bus, Hz.
    pub speed_hz: u32,
    /// The pin that tells commands (low) from data (high).
    pub data_command_pin: Pin,
    /// The pin that resets the chip while low.
    pub reset_pin: Option<Pin>,
    /// What lights it.
    pub backlight: Option<Backlight>,
}

/// Bits that a wire moves at a time.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum WordBits {
    /// A chip on the bus itself.
    #[default]
    Eight,
    /// A chip with a 16-bit side, behind shift registers; commands have an empty byte before them.
    Sixteen,
}

/// What lights a panel.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum Backlight {
    /// A pin: on or off, never dim.
    Pin {
        /// The pin.
        pin: Pin,
        /// Whether low is on.
        active_low: bool,
    },
    /// A device of the system, by its name below `/sys/class/backlight`; it can be dim.
    Device(String),
}

/// A bus of the board with the place on it.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct SpiAddress {
    /// Number of the bus: 0 is `spi0`.
    pub bus: u8,
    /// Which chip-select line.
    pub chip_select: u8,
}

impl SpiAddress {
    /// The file that stands for it: `/dev/spidev0.1`.
    pub fn device(self) -> String {
        format!("/dev/spidev{}.{}", self.bus, self.chip_select)
    }
}

/// A monitor.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct MonitorPart {
    /// The socket that it is plugged into, as the system names it (`HDMI-A-1`); any where none is named.
    pub connector: Option<String>,
    /// Pixels of the mode wanted; the best for the picture where none is named.
    pub mode_px: Option<(u16, u16)>,
    /// How far the picture is turned.
    pub turned: Turned,
    /// Whether blue comes first in the words of a plain framebuffer.
    pub blue_first: bool,
    /// How it is reached.
    pub way: MonitorWay,
}

/// How a monitor is reached.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum MonitorWay {
    /// Through the mode-setting interface of the kernel, else through a framebuffer device.
    #[default]
    Either,
    /// Through the mode-setting interface only.
    ModeSetting,
    /// Through a framebuffer device only.
    Framebuffer,
}
