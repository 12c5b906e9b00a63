//! Memory that a kernel would show: every byte of it, with odd row lengths, both depths, turned every way.

use std::fs;
use std::io;

use deshielo::board::file::{MonitorPart, Turned};
use deshielo::board::monitor::framebuffer::Framebuffer;
use deshielo::board::monitor::raster::{Memory, PixelForm, Raster};
use deshielo::board::placing::Placing;
use deshielo::board::reviving::Surface;
use deshielo::board::{Frame, FrameSize, Light};
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

use crate::frames::{Dice, Drawn, turned};

/// Byte that nobody may touch.
const UNTOUCHED: u8 = 0xa5;
const CHANGES: usize = 700;

struct Card(Vec<u8>);

impl Memory for Card {
    fn write(&mut self, at: u64, bytes: &[u8]) -> io::Result<()> {
        let at = at as usize;
        self.0.get_mut(at..at + bytes.len()).ok_or(io::ErrorKind::WriteZero)?.copy_from_slice(bytes);
        Ok(())
    }
}

/// The colour at a place of the memory, read the way a monitor would.
fn colour(bytes: &[u8], form: PixelForm, blue_first: bool) -> Rgb565 {
    let [red, green, blue] = match form {
        PixelForm::Bits16 => {
            let word = u16::from(bytes[1]) << 8 | u16::from(bytes[0]);
            [(word >> 11) as u8, (word >> 5 & 63) as u8, (word & 31) as u8]
        }
        PixelForm::Bits32 => {
            assert_eq!(bytes[3], 0);
            let eight = [bytes[2], bytes[1], bytes[0]];
            // White must be white: the low bits repeat the high ones.
            assert_eq!([eight[0] & 7, eight[1] & 3, eight[2] & 7], [eight[0] >> 5, eight[1] >> 6, eight[2] >> 5]);
            [eight[0] >> 3, eight[1] >> 2, eight[2] >> 3]
        }
    };
    if blue_first { Rgb565::new(blue, green, red) } else { Rgb565::new(red, green, blue) }
}

fn assert_shows(bytes: &[u8], raster: &Raster, drawn: &Drawn) {
    let Placing { width, height, turned: way, scale, left, top, .. } = raster.placing;
    let (pixel, start) = (raster.form.bytes(), raster.start as usize);
    let mut inside = vec![false; bytes.len()];
    let (across, down) = way.picture(width as u16, height as u16);
    for y in 0..u32::from(down) {
        for x in 0..u32::from(across) {
            let (column, row) = turned(x, y, way.degrees(), width, height);
            let at = start + row as usize * raster.stride as usize + column as usize * pixel;
            inside[at..at + pixel].fill(true);
            let of = |at: u32, before: u32, length: u16| {
                at.checked_sub(before).map(|at| at / scale).filter(|at| *at < u32::from(length))
            };
            let place = of(x, left, drawn.size.width).zip(of(y, top, drawn.size.height));
            let want = place.map_or(Rgb565::BLACK, |(x, y)| drawn.at(x, y));
            assert_eq!(colour(&bytes[at..at + pixel], raster.form, raster.blue_first), want, "{raster:?}: ({x}, {y})");
        }
    }
    for (at, byte) in bytes.iter().enumerate().filter(|(at, _)| !inside[*at]) {
        assert_eq!(*byte, UNTOUCHED, "{raster:?}: byte {at} lies outside of the glass");
    }
}

#[test]
fn every_byte_is_right_with_odd_rows_both_depths_and_turned_every_way() {
    let mut seed = 1;
    for (width, height) in [(320, 240), (337, 251), (490, 481), (643, 485)] {
        for turned in Turned::ALL {
            for form in [PixelForm::Bits16, PixelForm::Bits32] {
                seed += 1;
                let placing = Placing::new(width, height, turned).unwrap();
                let (odd, start) = (u64::from(seed % 7) * 6 + 2, u64::from(seed % 3) * 5);
                let stride = u64::from(width) * form.bytes() as u64 + odd;
                let raster = Raster { placing, form, blue_first: seed % 2 == 0, stride, start };
                let mut card = Card(vec![UNTOUCHED; (start + stride * u64::from(height)) as usize]);
                raster.clear(&mut card).unwrap();
                let mut drawn = Drawn::black(placing.frame);
                let mut dice = Dice::new(seed);
                for _ in 0..CHANGES {
                    let boxes = drawn.scribble(&mut dice);
                    raster.draw(&drawn.pixels, &boxes, &mut card).unwrap();
                }
                assert_shows(&card.0, &raster, &drawn);
            }
        }
    }
}

#[test]
fn a_memory_that_is_too_short_is_told_and_a_wrong_frame_is_refused() {
    let placing = Placing::new(320, 240, Turned::By0).unwrap();
    let raster = Raster { placing, form: PixelForm::Bits16, blue_first: false, stride: 640, start: 0 };
    let drawn = Drawn::black(placing.frame);
    let mut card = Card(vec![0; 640 * 239]);
    assert!(raster.clear(&mut card).is_err());
    assert!(raster.draw(&drawn.pixels, &[drawn.whole()], &mut card).is_err());
    assert!(raster.draw(&drawn.pixels[1..], &[], &mut card).is_err());
}

/// A folder as the kernel keeps one of a framebuffer, and a file in place of the device.
struct FakeDevice(tempfile::TempDir);

impl FakeDevice {
    fn new(size: &str, mode: Option<&str>, bits: &str, stride: u64, pan: Option<&str>, bytes: usize) -> Self {
        let device = Self(tempfile::tempdir().unwrap());
        device.put("virtual_size", size);
        device.put("bits_per_pixel", bits);
        device.put("stride", &stride.to_string());
        mode.into_iter().for_each(|mode| device.put("mode", mode));
        pan.into_iter().for_each(|pan| device.put("pan", pan));
        fs::write(device.0.path().join("fb0"), vec![UNTOUCHED; bytes]).unwrap();
        device
    }

    fn put(&self, name: &str, text: &str) {
        fs::write(self.0.path().join(name), format!("{text}\n")).unwrap();
    }

    fn open(&self, part: &MonitorPart) -> io::Result<Framebuffer> {
        Framebuffer::open(&self.0.path().join("fb0"), self.0.path(), part)
    }

    fn bytes(&self) -> Vec<u8> {
        fs::read(self.0.path().join("fb0")).unwrap()
    }
}

#[test]
fn a_framebuffer_device_gets_every_byte() {
    for (bits, pixel) in [("16", 2), ("32", 4)] {
        for turned in Turned::ALL {
            // Twice as high as the glass, and shown from row 251 on.
            let stride = 337 * pixel + 10;
            let bytes = (stride * 502) as usize;
            let device = FakeDevice::new("337,502", Some("U:337x251p-60"), bits, stride, Some("0,251"), bytes);
            let part = MonitorPart { turned, ..MonitorPart::default() };
            let mut screen = device.open(&part).unwrap();
            let raster = *screen.raster();
            assert_eq!((raster.placing.width, raster.placing.height, raster.start), (337, 251, stride * 251));
            let mut drawn = Drawn::black(screen.size());
            let mut dice = Dice::new(stride as u32);
            for _ in 0..60 {
                let boxes = drawn.scribble(&mut dice);
                screen.show(&Frame { size: drawn.size, pixels: &drawn.pixels, texts: &[] }, &boxes).unwrap();
            }
            assert_shows(&device.bytes(), &raster, &drawn);
        }
    }
}

#[test]
fn a_framebuffer_is_blanked_and_its_change_of_shape_noticed() {
    let device = FakeDevice::new("800,480", None, "32", 3200, None, 3200 * 480);
    let mut screen = device.open(&MonitorPart::default()).unwrap();
    assert_eq!(screen.size(), FrameSize::new(800, 480));
    screen.light(Light::Off).unwrap();
    assert_eq!(fs::read_to_string(device.0.path().join("blank")).unwrap(), "4");
    screen.light(Light::Full).unwrap();
    assert_eq!(fs::read_to_string(device.0.path().join("blank")).unwrap(), "0");
    assert_eq!(screen.check(), Ok(()));
    device.put("virtual_size", "640,480");
    assert!(screen.check().is_err());
    fs::remove_file(device.0.path().join("stride")).unwrap();
    assert!(screen.check().is_err());
}

#[test]
fn a_framebuffer_that_makes_no_sense_is_refused() {
    let open = |size, mode, bits, stride, pan| {
        FakeDevice::new(size, mode, bits, stride, pan, 100)
            .open(&MonitorPart::default())
            .err()
            .map(|error| error.kind())
    };
    assert_eq!(open("800,480", None, "24", 2400, None), Some(io::ErrorKind::Unsupported));
    assert_eq!(open("800", None, "16", 1600, None), Some(io::ErrorKind::InvalidData));
    assert_eq!(open("800,480", None, "32", 1600, None), Some(io::ErrorKind::InvalidData));
    assert_eq!(open("800,480", None, "16", 1600, Some("0,1")), Some(io::ErrorKind::InvalidData));
    assert_eq!(open("128,64", None, "16", 256, None), Some(io::ErrorKind::Unsupported));
    assert_eq!(open("4294967295,4294967295", None, "32", 1, None), Some(io::ErrorKind::InvalidData));
    let missing = Framebuffer::open("/nowhere/fb0".as_ref(), "/nowhere".as_ref(), &MonitorPart::default());
    assert_eq!(missing.err().map(|error| error.kind()), Some(io::ErrorKind::NotFound));
}
