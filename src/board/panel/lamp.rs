//! A backlight on a pin.

use std::io;

use embedded_hal::digital::OutputPin;

use crate::board::light::{Lamp, Light};

/// A backlight on a pin: on or off.
#[derive(Debug)]
pub struct PinLamp<P> {
    pin: P,
    active_low: bool,
}

impl<P: OutputPin> PinLamp<P> {
    /// The backlight on `pin`, which is on while the pin is high, or low where `active_low`.
    pub fn new(pin: P, active_low: bool) -> Self {
        Self { pin, active_low }
    }
}

impl<P: OutputPin> Lamp for PinLamp<P> {
    fn shine(&mut self, light: Light) -> io::Result<()> {
        let high = (light != Light::Off) != self.active_low;
        self.pin.set_state(high.into()).map_err(|error| io::Error::other(format!("{error:?}")))
    }
}
