//! Monitors without a desktop: pixels written into memory that the kernel shows.
//!
//! [`modes`], [`raster`] and [`framebuffer`] are plain files and arithmetic and are built everywhere; the mode-setting
//! interface of the kernel needs the feature `board` and Linux.
//!
//! Never tried on hardware: here there is neither a monitor nor a framebuffer device. What is held by tests is every byte
//! that would be in their memory.

pub mod framebuffer;
#[cfg(all(feature = "board", target_os = "linux"))]
mod mode_setting;
pub mod modes;
pub mod raster;

#[cfg(all(feature = "board", target_os = "linux"))]
pub use opening::open;

#[cfg(all(feature = "board", target_os = "linux"))]
mod opening {
    use std::path::Path;

    use super::framebuffer::Framebuffer;
    use super::mode_setting::Shown;
    use crate::board::file::{MonitorPart, MonitorWay};
    use crate::board::reviving::Surface;

    /// Opens the monitor of a board file.
    ///
    /// # Errors
    /// What the system says; where both ways were tried, of the better one.
    pub fn open(part: &MonitorPart) -> Result<Box<dyn Surface>, String> {
        let plain = || -> Result<Box<dyn Surface>, String> {
            let (device, about) = (Path::new("/dev/fb0"), Path::new("/sys/class/graphics/fb0"));
            Ok(Box::new(Framebuffer::open(device, about, part).map_err(|error| error.to_string())?))
        };
        if part.way == MonitorWay::Framebuffer {
            return plain();
        }
        match Shown::open(part) {
            Ok(shown) => Ok(Box::new(shown)),
            Err(reason) if part.way == MonitorWay::Either => plain().map_err(|_| reason),
            Err(reason) => Err(reason),
        }
    }
}
