//! A framebuffer device: a file whose bytes are on the monitor.
//!
//! Its size, depth and row length are read from the folder that the kernel keeps of it (`/sys/class/graphics/fb0`), so that
//! no system call beyond reading and writing files is needed.

use std::fs::{self, File, OpenOptions};
use std::io::{self, Seek, SeekFrom, Write};
use std::path::{Path, PathBuf};

use embedded_graphics::primitives::Rectangle;

use super::raster::{Memory, PixelForm, Raster};
use crate::board::file::MonitorPart;
use crate::board::light::Light;
use crate::board::placing::Placing;
use crate::board::reviving::Surface;
use crate::board::screen::Frame;
use crate::board::size::FrameSize;

/// An open framebuffer device.
#[derive(Debug)]
pub struct Framebuffer {
    memory: FileMemory,
    raster: Raster,
    about: PathBuf,
}

#[derive(Debug)]
struct FileMemory(File);

impl Memory for FileMemory {
    fn write(&mut self, at: u64, bytes: &[u8]) -> io::Result<()> {
        self.0.seek(SeekFrom::Start(at))?;
        self.0.write_all(bytes)
    }
}

impl Framebuffer {
    /// Opens `device` with the shape that the files in `about` tell, and makes it black.
    ///
    /// # Errors
    /// What the system says; `InvalidData` where the files make no sense, `Unsupported` where a pixel has neither 16 nor
    /// 32 bits or no picture goes onto the glass.
    pub fn open(device: &Path, about: &Path, part: &MonitorPart) -> io::Result<Self> {
        let raster = shape(about, part)?;
        let mut memory = FileMemory(OpenOptions::new().read(true).write(true).open(device)?);
        raster.clear(&mut memory)?;
        Ok(Self { memory, raster, about: about.to_owned() })
    }

    /// How pictures lie in it.
    pub fn raster(&self) -> &Raster {
        &self.raster
    }
}

impl Surface for Framebuffer {
    fn size(&self) -> FrameSize {
        self.raster.placing.frame
    }

    fn show(&mut self, frame: &Frame<'_>, changed: &[Rectangle]) -> Result<(), String> {
        self.raster.draw(frame.pixels, changed, &mut self.memory).map_err(|error| error.to_string())
    }

    fn light(&mut self, light: Light) -> Result<(), String> {
        // Some drivers cannot be blanked; the picture stays on then, and that is no reason to give it up.
        let _ = fs::write(self.about.join("blank"), if light == Light::Off { "4" } else { "0" });
        Ok(())
    }

    fn check(&mut self) -> Result<(), String> {
        let now = shape_of(&self.about).map_err(|error| error.to_string())?;
        let same = (now.width, now.height, now.stride, now.form.bytes())
            == (self.raster.placing.width, self.raster.placing.height, self.raster.stride, self.raster.form.bytes());
        if same { Ok(()) } else { Err(format!("{}x{}", now.width, now.height)) }
    }
}

struct Shape {
    width: u32,
    height: u32,
    stride: u64,
    start: u64,
    form: PixelForm,
}

fn shape(about: &Path, part: &MonitorPart) -> io::Result<Raster> {
    let Shape { width, height, stride, start, form } = shape_of(about)?;
    let placing = Placing::new(width, height, part.turned).ok_or(io::ErrorKind::Unsupported)?;
    Ok(Raster { placing, form, blue_first: part.blue_first, stride, start })
}

fn shape_of(about: &Path) -> io::Result<Shape> {
    let wrong = || io::Error::from(io::ErrorKind::InvalidData);
    let read = |name: &str| fs::read_to_string(about.join(name));
    let pair = |text: &str, between: char| -> Option<(u32, u32)> {
        let (one, other) = text.trim().split_once(between)?;
        Some((one.parse().ok()?, other.parse().ok()?))
    };
    let (virtual_width, virtual_height) = pair(&read("virtual_size")?, ',').ok_or_else(wrong)?;
    // The memory may be larger than the glass; then the mode tells the glass.
    let mode = read("mode").ok().and_then(|mode| of_mode(&mode));
    let (width, height) = mode
        .filter(|(width, height)| *width <= virtual_width && *height <= virtual_height)
        .unwrap_or((virtual_width, virtual_height));
    let form = match read("bits_per_pixel")?.trim() {
        "16" => PixelForm::Bits16,
        "32" => PixelForm::Bits32,
        _ => return Err(io::ErrorKind::Unsupported.into()),
    };
    let stride: u64 = read("stride")?.trim().parse().map_err(|_| wrong())?;
    if stride < u64::from(virtual_width) * form.bytes() as u64 {
        return Err(wrong());
    }
    let (pan_x, pan_y) = read("pan").ok().and_then(|pan| pair(&pan, ',')).unwrap_or((0, 0));
    if pan_x.saturating_add(width) > virtual_width || pan_y.saturating_add(height) > virtual_height {
        return Err(wrong());
    }
    let start = u64::from(pan_y) * stride + u64::from(pan_x) * form.bytes() as u64;
    Ok(Shape { width, height, stride, start, form })
}

/// Width and height of a mode as the kernel writes it: `U:1280x720p-60`.
fn of_mode(text: &str) -> Option<(u32, u32)> {
    let (_, size) = text.lines().next()?.trim().split_once(':')?;
    let (width, rest) = size.split_once('x')?;
    let end = rest.find(|letter: char| !letter.is_ascii_digit()).unwrap_or(rest.len());
    Some((width.parse().ok()?, rest[..end].parse().ok()?))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn modes_of_the_kernel_are_read() {
        assert_eq!(of_mode("U:1280x720p-60\n"), Some((1280, 720)));
        assert_eq!(of_mode("D:800x480i-0"), Some((800, 480)));
        for wrong in ["", "1280x720", "U:x720", "U:1280", "U:1280xp"] {
            assert_eq!(of_mode(wrong), None, "{wrong}");
        }
    }
}
