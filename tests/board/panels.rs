//! Every panel, turned every way, against a chip that reads the wire by itself.

use deshielo::board::file::{PanelChip, PanelPart, Pin as PinNumber, SpiAddress, Turned, WordBits};
use deshielo::board::panel::{LONGEST_WRITE, start};
use deshielo::board::reviving::Surface;
use deshielo::board::{Frame, FrameSize, Light};
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

use crate::fake_panel::{Bus, Chip, FakeLamp, Make, NoDelay, Pin, Shared};
use crate::frames::{Dice, Drawn, turned};

/// So many random changes for each panel and rotation.
const CHANGES: usize = 1_200;

/// A panel as a board file has it, wired to glass that is as the file says.
#[derive(Clone, Copy)]
pub struct Kind {
    pub chip: PanelChip,
    pub glass: (u16, u16),
    pub offset: (u16, u16),
    pub flags: [bool; 3],
    pub word_bits: WordBits,
}

const fn kind(chip: PanelChip, glass: (u16, u16), flags: [bool; 3]) -> Kind {
    Kind { chip, glass, offset: (0, 0), flags, word_bits: WordBits::Eight }
}

/// Mirrored, blue first, inverted: as usual for each chip, and once the other way round.
const KINDS: [Kind; 7] = [
    kind(PanelChip::St7789, (240, 240), [false, false, true]),
    kind(PanelChip::St7789, (240, 320), [true, true, false]),
    Kind { offset: (0, 40), ..kind(PanelChip::St7789, (240, 260), [true, false, true]) },
    kind(PanelChip::Ili9341, (240, 320), [true, true, false]),
    kind(PanelChip::Ili9486, (320, 480), [true, true, false]),
    Kind { word_bits: WordBits::Sixteen, ..kind(PanelChip::Ili9486, (320, 480), [true, true, false]) },
    kind(PanelChip::Ili9488, (320, 480), [true, true, true]),
];

/// The panel that dial turns are counted on, lying when it is turned by 90.
pub const LYING_320X240: Kind = KINDS[3];

impl Kind {
    pub fn part(self, turned: Turned) -> PanelPart {
        let [mirrored, blue_first, inverted] = self.flags;
        PanelPart {
            chip: self.chip,
            width_px: self.glass.0,
            height_px: self.glass.1,
            offset_x_px: self.offset.0,
            offset_y_px: self.offset.1,
            turned,
            mirrored,
            blue_first,
            inverted,
            word_bits: self.word_bits,
            at: SpiAddress { bus: 0, chip_select: 0 },
            speed_hz: 32_000_000,
            data_command_pin: PinNumber(25),
            reset_pin: None,
            backlight: None,
        }
    }

    fn make(self) -> Make {
        let [mirrored, blue_first, inverted] = self.flags;
        let memory = match self.chip {
            PanelChip::St7789 | PanelChip::Ili9341 => (240, 320),
            PanelChip::Ili9486 | PanelChip::Ili9488 => (320, 480),
        };
        let wide = self.word_bits == WordBits::Sixteen;
        let formats: &[u8] = match self.chip {
            PanelChip::Ili9486 | PanelChip::Ili9488 if !wide => &[6],
            _ => &[5],
        };
        let [glass, offset] = [self.glass, self.offset].map(|(x, y)| (usize::from(x), usize::from(y)));
        Make { memory, glass, offset, blue_first, mirrored, inverted, wide, formats }
    }

    pub fn start(self, turned: Turned, with_reset: bool) -> (Shared, Box<dyn Surface>) {
        let chip = Chip::new(self.make());
        let surface = self.start_on(&chip, turned, with_reset).unwrap();
        (chip, surface)
    }

    pub fn start_on(self, chip: &Shared, turned: Turned, with_reset: bool) -> Result<Box<dyn Surface>, String> {
        let [bus, data_command, reset, lamp] = [(); 4].map(|()| chip.clone());
        let reset = with_reset.then_some(Pin::Reset(reset));
        let lamp = Box::new(FakeLamp(lamp));
        start(&self.part(turned), Bus(bus), Pin::DataCommand(data_command), reset, NoDelay, lamp)
    }

    /// Holds every pixel of the glass against the frame, which is centred on it.
    fn assert_shows(self, chip: &Shared, drawn: &Drawn, degrees: u16, when: &str) {
        let chip = chip.borrow();
        let (width, height) = (u32::from(self.glass.0), u32::from(self.glass.1));
        let (across, down) = if degrees.is_multiple_of(180) { (width, height) } else { (height, width) };
        let (wide, high) = (u32::from(drawn.size.width), u32::from(drawn.size.height));
        let (left, top) = ((across - wide) / 2, (down - high) / 2);
        for y in 0..down {
            for x in 0..across {
                let inside = (left..left + wide).contains(&x) && (top..top + high).contains(&y);
                let want = if inside { drawn.at(x - left, y - top) } else { Rgb565::BLACK };
                let (column, row) = turned(x, y, degrees, width, height);
                let [red, green, blue] = chip.seen(column as usize, row as usize);
                let got = Rgb565::new(red >> 3, green >> 2, blue >> 3);
                assert_eq!(got, want, "{:?} by {degrees}, {when}: ({x}, {y})", self.chip);
            }
        }
    }
}

#[test]
fn every_panel_shows_every_pixel_turned_every_way() {
    for (number, kind) in KINDS.into_iter().enumerate() {
        for way in Turned::ALL {
            let with_reset = number % 2 == 0;
            let (chip, mut surface) = kind.start(way, with_reset);
            {
                let chip = chip.borrow();
                assert!(!chip.sleeping && chip.on && chip.lit == Light::Full);
            }
            let mut drawn = Drawn::black(surface.size());
            kind.assert_shows(&chip, &drawn, way.degrees(), "started");
            let mut dice = Dice::new(7 + number as u32 * 4 + u32::from(way.degrees()));
            for change in 0..CHANGES {
                let boxes = drawn.scribble(&mut dice);
                surface.show(&Frame { size: drawn.size, pixels: &drawn.pixels, texts: &[] }, &boxes).unwrap();
                if change % 300 == 0 {
                    kind.assert_shows(&chip, &drawn, way.degrees(), "between");
                }
            }
            kind.assert_shows(&chip, &drawn, way.degrees(), "at the end");
            assert!(chip.borrow().longest <= LONGEST_WRITE);
        }
    }
}

#[test]
fn white_is_white_and_black_is_black_in_18_bits() {
    let kind = KINDS[4];
    let (chip, mut surface) = kind.start(Turned::By90, true);
    let mut drawn = Drawn::black(surface.size());
    assert_eq!(chip.borrow().seen(0, 0), [0, 0, 0]);
    drawn.pixels.fill(Rgb565::WHITE);
    let whole = [drawn.whole()];
    surface.show(&Frame { size: drawn.size, pixels: &drawn.pixels, texts: &[] }, &whole).unwrap();
    assert_eq!(chip.borrow().seen(319, 479), [0xfc, 0xfc, 0xfc]);
}

#[test]
fn an_ili9341_is_turned_as_the_kernel_turns_it() {
    // Linux kernel, drivers/gpu/drm/tiny/ili9341.c: MX, MV, MY, and MV with MY and MX, each with BGR.
    let modes = Turned::ALL.map(|way| KINDS[3].start(way, true).0.borrow().modes.clone());
    assert_eq!(modes, [vec![0x48], vec![0x28], vec![0x88], vec![0xe8]]);
}

#[test]
fn a_box_costs_eleven_bytes_and_its_pixels() {
    for (kind, pixel) in [(KINDS[0], 2), (KINDS[4], 3)] {
        let (chip, mut surface) = kind.start(Turned::By0, true);
        let drawn = Drawn::black(surface.size());
        let before = chip.borrow().bytes;
        let area = embedded_graphics::primitives::Rectangle::new((3, 5).into(), (17, 4).into());
        let frame = Frame { size: drawn.size, pixels: &drawn.pixels, texts: &[] };
        surface.show(&frame, &[area]).unwrap();
        assert_eq!(chip.borrow().bytes - before, 11 + 17 * 4 * pixel);
        surface.show(&frame, &[]).unwrap();
        assert_eq!(chip.borrow().bytes - before, 11 + 17 * 4 * pixel);
    }
}

#[test]
fn a_panel_sleeps_dark_and_wakes_with_its_picture() {
    let kind = KINDS[3];
    let (chip, mut surface) = kind.start(Turned::By270, true);
    let mut drawn = Drawn::black(surface.size());
    let boxes = drawn.scribble(&mut Dice::new(3));
    for light in [Light::Off, Light::Off, Light::Dim] {
        surface.light(light).unwrap();
        let chip = chip.borrow();
        assert_eq!((chip.sleeping, chip.lit), (light == Light::Off, light));
    }
    surface.show(&Frame { size: drawn.size, pixels: &drawn.pixels, texts: &[] }, &boxes).unwrap();
    kind.assert_shows(&chip, &drawn, 270, "awake");
    assert!(surface.starts_anew_after_dark());
}

#[test]
fn a_bus_that_fails_is_told_at_every_write() {
    let kind = KINDS[3];
    let writes = kind.start(Turned::By0, true).0.borrow().writes;
    for fails_after in 0..writes {
        let chip = Chip::new(kind.make());
        chip.borrow_mut().fails_after = Some(fails_after);
        let failed = kind.start_on(&chip, Turned::By0, true);
        assert!(failed.err().is_some_and(|reason| reason.contains("Unplugged")), "after {fails_after} of {writes}");
    }
}

#[test]
fn a_frame_of_another_size_and_glass_without_room_are_refused() {
    let (_, mut surface) = KINDS[3].start(Turned::By0, true);
    let drawn = Drawn::black(FrameSize::new(320, 240));
    assert!(surface.show(&Frame { size: drawn.size, pixels: &drawn.pixels, texts: &[] }, &[drawn.whole()]).is_err());
    let narrow = kind(PanelChip::St7789, (170, 320), [false; 3]);
    assert!(narrow.start_on(&Chip::new(narrow.make()), Turned::By0, true).is_err());
    // The memory of the chip ends before the glass does.
    let beyond = Kind { offset: (0, 90), ..kind(PanelChip::St7789, (240, 240), [false; 3]) };
    assert!(beyond.start_on(&Chip::new(KINDS[0].make()), Turned::By0, true).is_err());
}
