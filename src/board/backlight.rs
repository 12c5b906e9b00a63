//! The light behind the screen, where the kernel lets it be set (`class/backlight/*/brightness`).

use std::fs;
use std::path::{Path, PathBuf};

/// The lights of the board.
#[derive(Clone, Debug)]
pub struct Backlight {
    lights: Vec<Light>,
    percent: Option<u8>,
}

#[derive(Clone, Debug)]
struct Light {
    folder: PathBuf,
    most: u32,
}

impl Backlight {
    /// Finds the lights under a root, `/sys` on a real board.
    pub fn find(root: &Path) -> Self {
        let entries = fs::read_dir(root.join("class/backlight")).into_iter().flatten().take(16);
        let light = |folder: PathBuf| {
            let most = fs::read_to_string(folder.join("max_brightness")).ok()?.trim().parse().ok()?;
            Some(Light { folder, most })
        };
        Self { lights: entries.filter_map(|entry| light(entry.ok()?.path())).collect(), percent: None }
    }

    /// Whether there is any that could be set.
    pub fn is_there(&self) -> bool {
        !self.lights.is_empty()
    }

    /// Sets all lights; 0 is off. Only a change is written. A light that cannot be set is given up, so that the picture
    /// itself can be darkened instead.
    pub fn set(&mut self, percent: u8) {
        if self.percent == Some(percent) {
            return;
        }
        self.percent = Some(percent);
        self.lights.retain(|light| {
            let value = u64::from(light.most) * u64::from(percent.min(100)) / 100;
            // A light that is on stays on, however few steps it has.
            let value = if percent > 0 { value.max(1) } else { value };
            fs::write(light.folder.join("brightness"), value.to_string()).is_ok()
        });
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn lights_are_set_in_their_own_steps_and_broken_ones_given_up() {
        let root = tempfile::tempdir().unwrap();
        let folder = |name: &str| root.path().join("class/backlight").join(name);
        for (name, most) in [("fine", "255\n"), ("coarse", "1\n"), ("odd", "bright\n")] {
            fs::create_dir_all(folder(name)).unwrap();
            fs::write(folder(name).join("max_brightness"), most).unwrap();
        }
        let mut backlight = Backlight::find(root.path());
        let read = |name: &str| fs::read_to_string(folder(name).join("brightness")).unwrap();
        for (percent, fine, coarse) in [(100, "255", "1"), (20, "51", "1"), (0, "0", "0")] {
            backlight.set(percent);
            assert_eq!((read("fine").as_str(), read("coarse").as_str()), (fine, coarse));
        }
        fs::remove_dir_all(folder("fine")).unwrap();
        fs::remove_dir_all(folder("coarse")).unwrap();
        backlight.set(50);
        assert!(!backlight.is_there());
    }
}
