//! How bright a screen is, and the backlights that make it so.

use std::fs;
use std::io;
use std::path::PathBuf;

/// How bright a screen is.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Light {
    /// As bright as it can be.
    #[default]
    Full,
    /// As dim as it can be and still be read in the dark; full where the backlight is on or off only.
    Dim,
    /// Dark.
    Off,
}

/// What lights a screen.
pub trait Lamp {
    /// Makes it so bright.
    ///
    /// # Errors
    /// What the system says.
    fn shine(&mut self, light: Light) -> io::Result<()>;
}

/// A screen without a backlight of its own, or one that nobody can reach.
#[derive(Clone, Copy, Debug)]
pub struct NoLamp;

impl Lamp for NoLamp {
    fn shine(&mut self, _: Light) -> io::Result<()> {
        Ok(())
    }
}

/// A backlight of the system: a folder below `/sys/class/backlight`.
#[derive(Clone, Debug)]
pub struct DeviceLamp {
    folder: PathBuf,
}

/// Share of full brightness that is dim; common practice, no source.
const DIM_PERCENT: u64 = 12;

impl DeviceLamp {
    /// The backlight with this folder.
    pub fn new(folder: impl Into<PathBuf>) -> Self {
        Self { folder: folder.into() }
    }
}

impl Lamp for DeviceLamp {
    fn shine(&mut self, light: Light) -> io::Result<()> {
        let text = fs::read_to_string(self.folder.join("max_brightness"))?;
        let most: u64 = text.trim().parse().map_err(|_| io::Error::from(io::ErrorKind::InvalidData))?;
        let level = match light {
            Light::Full => most,
            // A light with few steps is never put out by being dimmed.
            Light::Dim => (most.saturating_mul(DIM_PERCENT) / 100).max(1).min(most),
            Light::Off => 0,
        };
        fs::write(self.folder.join("brightness"), level.to_string())
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_backlight_of_the_system_is_dimmed_and_never_out_by_dimming() {
        let folder = tempfile::tempdir().unwrap();
        let file = |name: &str| folder.path().join(name);
        let mut lamp = DeviceLamp::new(folder.path());
        assert!(lamp.shine(Light::Full).is_err());
        for (most, dim) in [("255\n", "30"), ("1\n", "1"), ("0", "0")] {
            fs::write(file("max_brightness"), most).unwrap();
            for (light, level) in [(Light::Full, most.trim()), (Light::Dim, dim), (Light::Off, "0")] {
                lamp.shine(light).unwrap();
                assert_eq!(fs::read_to_string(file("brightness")).unwrap(), level);
            }
        }
        fs::write(file("max_brightness"), "bright").unwrap();
        assert!(lamp.shine(Light::Full).is_err());
    }
}
