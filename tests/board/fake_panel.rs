//! A panel made of memory, which understands the commands of the chips' data sheets and shows what a person would see.
//!
//! Written from the commands as MIPI DCS 1.02 and the ILI9341 data sheet describe them (from memory), and from nothing in
//! the program: column and row address, memory write, pixel format, address mode, sleep, inversion, on and off.

use std::cell::RefCell;
use std::convert::Infallible;
use std::fmt;
use std::io;
use std::rc::Rc;

use deshielo::board::Light;
use deshielo::board::light::Lamp;
use embedded_hal::delay::DelayNs;
use embedded_hal::digital::{self, OutputPin};
use embedded_hal::spi::{self, Operation, SpiDevice};

/// How the glass of a fake panel is made.
#[derive(Clone, Copy, Debug)]
pub struct Make {
    /// Columns and rows of the chip's memory.
    pub memory: (usize, usize),
    /// Columns and rows that the glass shows, and the first of each.
    pub glass: (usize, usize),
    pub offset: (usize, usize),
    /// The glass has blue where the chip sends red, runs from right to left, or shows what is not inverted inverted.
    pub blue_first: bool,
    pub mirrored: bool,
    pub inverted: bool,
    /// Whether there are 16-bit shift registers before the chip.
    pub wide: bool,
    /// Pixel formats that the chip takes on this wire: the low three bits of COLMOD.
    pub formats: &'static [u8],
}

/// The chip behind the glass.
pub struct Chip {
    make: Make,
    memory: Vec<[u8; 3]>,
    columns: (usize, usize),
    rows: (usize, usize),
    at: (usize, usize),
    address_mode: u8,
    format: u8,
    inverting: bool,
    pub sleeping: bool,
    pub on: bool,
    pub lit: Light,
    command: u8,
    arguments: Vec<u8>,
    data: bool,
    reset_low: bool,
    /// Bytes on the wire, and writes.
    pub bytes: u64,
    pub writes: u64,
    pub longest: usize,
    /// The write after so many more fails.
    pub fails_after: Option<u64>,
    /// Every address mode that was set.
    pub modes: Vec<u8>,
}

pub type Shared = Rc<RefCell<Chip>>;

#[derive(Clone, Copy, Debug)]
pub struct Unplugged;

impl fmt::Display for Unplugged {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str("unplugged")
    }
}

impl spi::Error for Unplugged {
    fn kind(&self) -> spi::ErrorKind {
        spi::ErrorKind::Other
    }
}

impl Chip {
    /// A chip that has just got its power: noise in its memory, asleep, dark.
    pub fn new(make: Make) -> Shared {
        let mut noise = 0x9e37_u32;
        let memory = (0..make.memory.0 * make.memory.1).map(|_| {
            noise = noise.wrapping_mul(1_664_525).wrapping_add(1_013_904_223);
            [noise >> 8, noise >> 16, noise >> 24].map(|byte| byte as u8 & 0xfc)
        });
        let memory = memory.collect();
        let mut chip = Self {
            make,
            memory,
            columns: (0, 0),
            rows: (0, 0),
            at: (0, 0),
            address_mode: 0,
            format: 0,
            inverting: false,
            sleeping: true,
            on: false,
            lit: Light::Off,
            command: 0,
            arguments: Vec::new(),
            data: false,
            reset_low: false,
            bytes: 0,
            writes: 0,
            longest: 0,
            fails_after: None,
            modes: Vec::new(),
        };
        chip.reset();
        Rc::new(RefCell::new(chip))
    }

    fn reset(&mut self) {
        self.columns = (0, self.make.memory.0 - 1);
        self.rows = (0, self.make.memory.1 - 1);
        (self.at, self.address_mode, self.format) = ((0, 0), 0, 6);
        (self.inverting, self.sleeping, self.on, self.command) = (false, true, false, 0);
    }

    /// Red, green and blue, each of 6 bits at the top of a byte, as a person sees them at a column and row of the glass.
    pub fn seen(&self, column: usize, row: usize) -> [u8; 3] {
        let Make { memory, glass, offset, .. } = self.make;
        assert!(column < glass.0 && row < glass.1);
        let along = if self.make.mirrored { memory.0 - 1 - (column + offset.0) } else { column + offset.0 };
        let [red, green, blue] = self.memory[(row + offset.1) * memory.0 + along];
        let swapped = (self.address_mode & 0x08 != 0) != self.make.blue_first;
        let colours = if swapped { [blue, green, red] } else { [red, green, blue] };
        if self.inverting != self.make.inverted { colours.map(|colour| !colour & 0xfc) } else { colours }
    }

    fn take(&mut self, bytes: &[u8]) {
        let words: Vec<u8> = match (self.make.wide, self.data && self.command == 0x2c) {
            // The registers hand 16 bits over at once; a command looks at the lower eight.
            (true, false) => bytes
                .chunks(2)
                .map(|pair| match pair {
                    [0, byte] => *byte,
                    other => panic!("{other:?} is no command with an empty byte before it"),
                })
                .collect(),
            _ => bytes.to_vec(),
        };
        if self.data {
            words.into_iter().for_each(|byte| self.argument(byte));
            return;
        }
        for command in words {
            self.start(command);
        }
    }

    fn start(&mut self, command: u8) {
        let expected = match self.command {
            0x2a | 0x2b => 4,
            0x36 | 0x3a | 0xb4 => 1,
            0xb6 => 3,
            _ => 0,
        };
        if self.command != 0x2c {
            assert_eq!(self.arguments.len(), expected, "arguments of {:#04x}", self.command);
        } else {
            assert!(self.arguments.is_empty(), "half a pixel was sent");
        }
        self.arguments.clear();
        self.command = command;
        match command {
            0x01 => self.reset(),
            0x10 => self.sleeping = true,
            0x11 => self.sleeping = false,
            0x13 => {}
            0x20 => self.inverting = false,
            0x21 => self.inverting = true,
            0x28 => self.on = false,
            0x29 => self.on = true,
            0x2c => self.at = (self.columns.0, self.rows.0),
            0x2a | 0x2b | 0x36 | 0x3a | 0xb4 | 0xb6 => {}
            other => panic!("the chip knows no command {other:#04x}"),
        }
    }

    fn argument(&mut self, byte: u8) {
        self.arguments.push(byte);
        let word = |at: usize| usize::from(self.arguments[at]) << 8 | usize::from(self.arguments[at + 1]);
        match (self.command, self.arguments.len()) {
            (0x2a, 4) => self.columns = (word(0), word(2)),
            (0x2b, 4) => self.rows = (word(0), word(2)),
            (0x36, 1) => {
                self.address_mode = byte;
                self.modes.push(byte);
            }
            (0x3a, 1) => {
                assert!(self.make.formats.contains(&(byte & 7)), "pixel format {byte:#04x} on this wire");
                self.format = byte & 7;
            }
            (0x2c, 2) if self.format == 5 => {
                let word = word(0) as u16;
                // The chip fills six bits from five with the highest.
                let six = |five: u16| ((five << 1 | five >> 4) << 2) as u8;
                self.pixel([six(word >> 11), ((word >> 5 & 0x3f) << 2) as u8, six(word & 0x1f)]);
            }
            (0x2c, 3) if self.format == 6 => {
                let pixel = [self.arguments[0], self.arguments[1], self.arguments[2]].map(|byte| byte & 0xfc);
                self.pixel(pixel);
            }
            _ => {}
        }
    }

    fn pixel(&mut self, colours: [u8; 3]) {
        self.arguments.clear();
        let (width, height) = self.make.memory;
        let exchange = self.address_mode & 0x20 != 0;
        let (most_column, most_row) = if exchange { (height, width) } else { (width, height) };
        let (column, row) = self.at;
        assert!(self.columns.0 <= self.columns.1 && self.columns.1 < most_column, "columns {:?}", self.columns);
        assert!(self.rows.0 <= self.rows.1 && self.rows.1 < most_row, "rows {:?}", self.rows);
        assert!(row <= self.rows.1, "more pixels than the window holds");
        let (x, y) = if exchange { (row, column) } else { (column, row) };
        let x = if self.address_mode & 0x40 != 0 { width - 1 - x } else { x };
        let y = if self.address_mode & 0x80 != 0 { height - 1 - y } else { y };
        self.memory[y * width + x] = colours;
        self.at = if column < self.columns.1 { (column + 1, row) } else { (self.columns.0, row + 1) };
    }
}

/// The chip's side of the bus.
pub struct Bus(pub Shared);

impl spi::ErrorType for Bus {
    type Error = Unplugged;
}

impl SpiDevice for Bus {
    fn transaction(&mut self, operations: &mut [Operation<'_, u8>]) -> Result<(), Unplugged> {
        let mut chip = self.0.borrow_mut();
        for operation in operations {
            let Operation::Write(bytes) = operation else { panic!("only writes are expected") };
            if let Some(left) = chip.fails_after.as_mut() {
                if *left == 0 {
                    return Err(Unplugged);
                }
                *left -= 1;
            }
            assert!(!bytes.is_empty(), "an empty write costs a system call and moves nothing");
            chip.bytes += bytes.len() as u64;
            chip.writes += 1;
            chip.longest = chip.longest.max(bytes.len());
            chip.take(bytes);
        }
        Ok(())
    }
}

/// A pin of the chip.
pub enum Pin {
    DataCommand(Shared),
    Reset(Shared),
}

impl digital::ErrorType for Pin {
    type Error = Infallible;
}

impl OutputPin for Pin {
    fn set_low(&mut self) -> Result<(), Infallible> {
        match self {
            Pin::DataCommand(chip) => chip.borrow_mut().data = false,
            Pin::Reset(chip) => chip.borrow_mut().reset_low = true,
        }
        Ok(())
    }

    fn set_high(&mut self) -> Result<(), Infallible> {
        match self {
            Pin::DataCommand(chip) => chip.borrow_mut().data = true,
            Pin::Reset(chip) => {
                let mut chip = chip.borrow_mut();
                if std::mem::take(&mut chip.reset_low) {
                    chip.reset();
                }
            }
        }
        Ok(())
    }
}

/// Nothing waits in a test.
pub struct NoDelay;

impl DelayNs for NoDelay {
    fn delay_ns(&mut self, _: u32) {}
}

/// The backlight of the chip.
pub struct FakeLamp(pub Shared);

impl Lamp for FakeLamp {
    fn shine(&mut self, light: Light) -> io::Result<()> {
        self.0.borrow_mut().lit = light;
        Ok(())
    }
}
