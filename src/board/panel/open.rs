//! The panel of a board file on this machine's own bus and pins.

use std::fmt::Display;
use std::path::Path;

use linux_embedded_hal::gpio_cdev::{Chip, LineRequestFlags};
use linux_embedded_hal::spidev::{SpiModeFlags, SpidevOptions};
use linux_embedded_hal::{CdevPin, Delay, SpidevDevice};

use super::glass::start;
use super::lamp::PinLamp;
use crate::board::file::{Backlight, PanelPart, Pin};
use crate::board::light::{DeviceLamp, Lamp, NoLamp};
use crate::board::reviving::Surface;

/// Where the kernel keeps its backlights.
const BACKLIGHTS: &str = "/sys/class/backlight";
/// Who holds a line, for whoever lists them.
const HOLDER: &str = "deshielo";

/// Opens the panel of a board file; pins are lines of `gpio_chip`.
///
/// # Errors
/// What the system says, with the device that it says it of.
pub fn open(part: &PanelPart, gpio_chip: &str) -> Result<Box<dyn Surface>, String> {
    let device = part.at.device();
    let of_device = |error: &dyn Display| format!("{device}: {error}");
    let mut bus = SpidevDevice::open(&device).map_err(|error| of_device(error.inner()))?;
    let options =
        SpidevOptions::new().bits_per_word(8).max_speed_hz(part.speed_hz).mode(SpiModeFlags::SPI_MODE_0).build();
    bus.0.configure(&options).map_err(|error| of_device(&error))?;
    let data_command = output(gpio_chip, part.data_command_pin, true)?;
    let reset = part.reset_pin.map(|pin| output(gpio_chip, pin, true)).transpose()?;
    let lamp: Box<dyn Lamp> = match &part.backlight {
        None => Box::new(NoLamp),
        Some(Backlight::Device(name)) => Box::new(DeviceLamp::new(Path::new(BACKLIGHTS).join(name))),
        // Dark until there is something to see.
        Some(Backlight::Pin { pin, active_low }) => {
            Box::new(PinLamp::new(output(gpio_chip, *pin, *active_low)?, *active_low))
        }
    };
    start(part, bus, data_command, reset, Delay, lamp)
}

/// A line as an output that begins high or low.
fn output(gpio_chip: &str, pin: Pin, high: bool) -> Result<CdevPin, String> {
    let said = |error: &dyn Display| format!("{gpio_chip}, {}: {error}", pin.0);
    let mut chip = Chip::new(gpio_chip).map_err(|error| said(&error))?;
    let line = chip.get_line(pin.0.into()).map_err(|error| said(&error))?;
    let handle = line.request(LineRequestFlags::OUTPUT, high.into(), HOLDER).map_err(|error| said(&error))?;
    CdevPin::new(handle).map_err(|error| said(&error))
}
