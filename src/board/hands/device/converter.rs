//! Converters with potentiometers on them: ADS1115 on I²C and MCP3008 on SPI.

use std::fmt::Debug;
use std::time::{Duration, Instant};

use embedded_hal::delay::DelayNs;
use embedded_hal::i2c::I2c;
use embedded_hal::spi::SpiDevice;
use linux_embedded_hal::spidev::{SpiModeFlags, SpidevOptions};
use linux_embedded_hal::{Delay, I2cdev, SpidevDevice};

use super::{Ended, Teller};
use crate::board::file::{ConverterChip, ConverterPart};
use crate::board::hands::potentiometer::Potentiometer;
use crate::board::hands::{HandEvent, HandState, Reading, Stuck, What};

/// Volts at the right end of a potentiometer.
const SUPPLY_V: f64 = 3.3;
/// A potentiometer that rests for so long is read less often, so that a sleeping board sleeps.
const RESTS_AFTER: Duration = Duration::from_secs(60);
const RESTING: Duration = Duration::from_millis(500);
/// A raw move of this share of the supply means that somebody is there.
const STIRS: f64 = 0.01;

/// Something that reads inputs as shares of the supply.
pub trait ReadsShare {
    /// Reads an input, counted from 0: the share of the supply there, 0 to 1.
    ///
    /// # Errors
    /// What the bus says.
    fn read_share(&mut self, input: u8) -> Result<f64, String>;
}

/// The ADS1115: four inputs, 16 bits.
#[derive(Debug)]
pub struct Ads1115<B, D> {
    bus: B,
    delay: D,
    address: u8,
}

impl<B, D> Ads1115<B, D> {
    /// The chip at that address of a bus.
    pub const fn new(bus: B, delay: D, address: u8) -> Self {
        Self { bus, delay, address }
    }
}

/// Registers and bits (Texas Instruments, ADS111x data sheet SBAS444, tables of the registers, from memory): start one
/// conversion, one input against ground, ±4.096 V, one at a time, 860 a second, no comparator.
const CONVERSION: u8 = 0;
const CONFIGURATION: u8 = 1;
const ONE_INPUT: u16 = 0x8000 | 0x4000 | 0x0200 | 0x0100 | 0x00e0 | 0x0003;
const INPUT_SHIFT: u32 = 12;
const ADS1115_FULL_V: f64 = 4.096;
const ADS1115_FULL_COUNT: f64 = 32768.0;
/// One at 860 a second takes 1.16 ms, and a tenth more at most.
const CONVERSION_US: u32 = 1400;

impl<B: I2c, D: DelayNs> ReadsShare for Ads1115<B, D> {
    fn read_share(&mut self, input: u8) -> Result<f64, String> {
        let [high, low] = (ONE_INPUT | u16::from(input & 3) << INPUT_SHIFT).to_be_bytes();
        self.bus.write(self.address, &[CONFIGURATION, high, low]).map_err(said)?;
        self.delay.delay_us(CONVERSION_US);
        let mut count = [0; 2];
        self.bus.write_read(self.address, &[CONVERSION], &mut count).map_err(said)?;
        let volts = f64::from(i16::from_be_bytes(count)) * ADS1115_FULL_V / ADS1115_FULL_COUNT;
        Ok(volts / SUPPLY_V)
    }
}

/// The MCP3008: eight inputs, 10 bits, measured against its own supply.
#[derive(Debug)]
pub struct Mcp3008<S>(S);

impl<S> Mcp3008<S> {
    /// The chip on a bus.
    pub const fn new(bus: S) -> Self {
        Self(bus)
    }
}

/// A start bit, then one input against ground (Microchip, MCP3004/3008 data sheet DS21295, figure 6-1, from memory).
const START: u8 = 0x01;
const SINGLE: u8 = 0x08;
const MCP3008_FULL_COUNT: f64 = 1023.0;

impl<S: SpiDevice> ReadsShare for Mcp3008<S> {
    fn read_share(&mut self, input: u8) -> Result<f64, String> {
        let mut bytes = [START, (SINGLE | (input & 7)) << 4, 0];
        self.0.transfer_in_place(&mut bytes).map_err(said)?;
        let count = u16::from(bytes[1] & 3) << 8 | u16::from(bytes[2]);
        Ok(f64::from(count) / MCP3008_FULL_COUNT)
    }
}

fn said(error: impl Debug) -> String {
    format!("{error:?}")
}

fn open(chip: ConverterChip) -> Result<Box<dyn ReadsShare>, String> {
    match chip {
        ConverterChip::Ads1115 { bus, address } => {
            let device = format!("/dev/i2c-{bus}");
            let bus = I2cdev::new(&device).map_err(|error| format!("{device}: {error}"))?;
            Ok(Box::new(Ads1115::new(bus, Delay, address)))
        }
        ConverterChip::Mcp3008 { at, speed_hz } => {
            let device = at.device();
            let mut bus = SpidevDevice::open(&device).map_err(|error| format!("{device}: {}", error.inner()))?;
            let options =
                SpidevOptions::new().bits_per_word(8).max_speed_hz(speed_hz).mode(SpiModeFlags::SPI_MODE_0).build();
            bus.0.configure(&options).map_err(|error| format!("{device}: {error}"))?;
            Ok(Box::new(Mcp3008::new(bus)))
        }
    }
}

pub(super) fn serve(part: &ConverterPart, teller: &Teller) {
    let inputs: Vec<u8> = part.inputs.iter().map(|input| input.input).collect();
    // Kept while the chip is away: a knob that was turned meanwhile is where its dial shall be.
    let mut knobs: Vec<Potentiometer> = part.inputs.iter().map(|input| Potentiometer::new(*input)).collect();
    let began = Instant::now();
    teller.keep_serving(&inputs, || while_there(part, &mut knobs, began, teller).err().unwrap_or(Ended::Unheard));
}

fn while_there(
    part: &ConverterPart,
    knobs: &mut [Potentiometer],
    began: Instant,
    teller: &Teller,
) -> Result<(), Ended> {
    let mut chip = open(part.chip).map_err(Ended::Lost)?;
    let pace = Duration::from_secs(1) / u32::from(part.reads_per_s.max(1));
    let mut shares: Vec<Option<f64>> = vec![None; knobs.len()];
    let mut stirred = Instant::now();
    loop {
        for ((knob, input), before) in knobs.iter_mut().zip(&part.inputs).zip(&mut shares) {
            let share = chip.read_share(input.input).map_err(Ended::Lost)?;
            if before.is_none() {
                teller.try_tell(input.input, What::Is(HandState::There))?;
            }
            if before.is_none_or(|before| (share - before).abs() >= STIRS) {
                (*before, stirred) = (Some(share), Instant::now());
                teller.try_tell(input.input, What::Reads(Reading::Share(share)))?;
            }
            let read = knob.read(began.elapsed(), share);
            if let Some(loose) = read.loose {
                let state = if loose { HandState::Stuck(Stuck::Loose) } else { HandState::There };
                teller.try_tell(input.input, What::Is(state))?;
            }
            if let Some(share) = read.moved {
                teller.try_tell(input.input, What::Did(HandEvent::SetDial { dial: input.dial, share }))?;
            }
        }
        std::thread::sleep(if stirred.elapsed() > RESTS_AFTER { pace.max(RESTING) } else { pace });
    }
}
