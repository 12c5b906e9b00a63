//! Whether the board gets enough power, where the kernel tells.
//!
//! Two places are read: the undervoltage alarm of any voltage sensor (`class/hwmon/*/in0_lcrit_alarm`), and the throttling
//! flags that the firmware of some boards gives (`devices/platform/soc/*/get_throttled`): bit 0 too little voltage now,
//! bit 16 at some time since the start.

use std::fs;
use std::path::{Path, PathBuf};

/// What the kernel says of the supply.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub struct Supply {
    /// Too little voltage now; `None` where nothing is told.
    pub is_low: Option<bool>,
    /// Too little voltage at some time since the start.
    pub was_low: bool,
}

/// Reads the supply of the board under a root of its own, `/sys` on a real board.
#[derive(Clone, Debug)]
pub struct PowerWatch {
    root: PathBuf,
    supply: Supply,
}

impl PowerWatch {
    /// Watches under that root.
    pub fn new(root: &Path) -> Self {
        Self { root: root.to_owned(), supply: Supply::default() }
    }

    /// Reads again; gives what is known now where that has changed.
    pub fn look(&mut self) -> Option<Supply> {
        let before = self.supply;
        let alarms =
            entries(&self.root.join("class/hwmon")).filter_map(|sensor| number(&sensor.join("in0_lcrit_alarm"), 10));
        let flags = entries(&self.root.join("devices/platform/soc"))
            .filter_map(|device| number(&device.join("get_throttled"), 16));
        let (mut is_low, mut was_low) = (None, before.was_low);
        for (now, since_start) in
            alarms.map(|alarm| (alarm != 0, false)).chain(flags.map(|flags| (flags & 1 != 0, flags >> 16 & 1 != 0)))
        {
            is_low = Some(is_low == Some(true) || now);
            was_low |= now || since_start;
        }
        self.supply = Supply { is_low, was_low };
        (self.supply != before).then_some(self.supply)
    }

    /// What was known at the last look.
    pub fn supply(&self) -> Supply {
        self.supply
    }
}

fn entries(folder: &Path) -> impl Iterator<Item = PathBuf> + use<> {
    // A board has a handful of sensors; a folder without end must not hold the picture up.
    let found = fs::read_dir(folder).into_iter().flatten().take(64);
    found.filter_map(|entry| entry.ok().map(|entry| entry.path()))
}

fn number(path: &Path, radix: u32) -> Option<u32> {
    let text = fs::read_to_string(path).ok()?;
    let text = text.trim();
    u32::from_str_radix(text.strip_prefix("0x").unwrap_or(text), radix).ok()
}

#[cfg(test)]
mod tests {
    use super::*;

    fn write(root: &Path, name: &str, text: &str) {
        let path = root.join(name);
        fs::create_dir_all(path.parent().unwrap()).unwrap();
        fs::write(path, text).unwrap();
    }

    #[test]
    fn an_alarm_is_seen_and_remembered() {
        let root = tempfile::tempdir().unwrap();
        let mut watch = PowerWatch::new(root.path());
        assert_eq!(watch.look(), None);
        assert_eq!(watch.supply().is_low, None, "nothing is told");
        write(root.path(), "class/hwmon/hwmon0/temp1_input", "48000\n");
        write(root.path(), "class/hwmon/hwmon1/in0_lcrit_alarm", "0\n");
        assert_eq!(watch.look(), Some(Supply { is_low: Some(false), was_low: false }));
        write(root.path(), "class/hwmon/hwmon1/in0_lcrit_alarm", "1\n");
        assert_eq!(watch.look(), Some(Supply { is_low: Some(true), was_low: true }));
        assert_eq!(watch.look(), None);
        write(root.path(), "class/hwmon/hwmon1/in0_lcrit_alarm", "0\n");
        assert_eq!(watch.look(), Some(Supply { is_low: Some(false), was_low: true }));
    }

    #[test]
    fn flags_of_the_firmware_are_read_and_nonsense_is_not() {
        let root = tempfile::tempdir().unwrap();
        let mut watch = PowerWatch::new(root.path());
        for (text, expected) in [
            ("zero", Supply::default()),
            ("0", Supply { is_low: Some(false), was_low: false }),
            ("50000", Supply { is_low: Some(false), was_low: true }),
            ("0x50005", Supply { is_low: Some(true), was_low: true }),
        ] {
            write(root.path(), "devices/platform/soc/soc:firmware/get_throttled", text);
            watch.look();
            assert_eq!(watch.supply(), expected, "{text}");
        }
    }
}
