//! The clock of this machine, and whether anything stands behind it.

use std::path::{Path, PathBuf};
use std::time::{Duration, Instant, SystemTime, UNIX_EPOCH};

use chrono::{DateTime, Local, NaiveDate, Timelike};

use crate::session::kiosk::clock::Wall;

/// A battery clock does not come and go, a time signal may.
const LOOK_AGAIN: Duration = Duration::from_secs(60);

/// Reads the clock.
#[derive(Debug)]
pub(super) struct WallClock {
    root: PathBuf,
    looked: Option<(Instant, bool)>,
}

impl WallClock {
    /// The clock of the machine whose files are under `root`.
    pub fn new(root: &Path) -> Self {
        Self { root: root.to_owned(), looked: None }
    }

    /// What it says now.
    pub fn read(&mut self) -> Option<Wall> {
        let now = SystemTime::now();
        let unix_s = match now.duration_since(UNIX_EPOCH) {
            Ok(since) => i64::try_from(since.as_secs()).ok()?,
            Err(before) => -i64::try_from(before.duration().as_secs()).ok()?,
        };
        let local: DateTime<Local> = DateTime::from_timestamp(unix_s, 0)?.into();
        let day = local.date_naive().signed_duration_since(NaiveDate::default()).num_days();
        let minute = local.hour() * 60 + local.minute();
        let (local_day, local_minute) = (i32::try_from(day).ok()?, u16::try_from(minute).ok()?);
        Some(Wall { unix_s, local_day, local_minute, has_source: self.has_source() })
    }

    fn has_source(&mut self) -> bool {
        if let Some((_, known)) = self.looked.filter(|(at, _)| at.elapsed() < LOOK_AGAIN) {
            return known;
        }
        // Elsewhere than on Linux boards a battery clock is taken for granted.
        let known = !cfg!(target_os = "linux")
            || ["sys/class/rtc/rtc0", "run/systemd/timesync/synchronized"]
                .iter()
                .any(|path| self.root.join(path).exists());
        self.looked = Some((Instant::now(), known));
        known
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_battery_clock_or_a_signal_is_seen() {
        let root = tempfile::tempdir().unwrap();
        let has_source = || WallClock::new(root.path()).read().unwrap().has_source;
        assert_eq!(has_source(), !cfg!(target_os = "linux"));
        std::fs::create_dir_all(root.path().join("run/systemd/timesync")).unwrap();
        std::fs::write(root.path().join("run/systemd/timesync/synchronized"), "").unwrap();
        assert!(has_source());
        let wall = WallClock::new(root.path()).read().unwrap();
        // Local time is less than a day and a bit from UTC.
        assert!((i64::from(wall.local_day) * 86_400 - wall.unix_s).abs() < 2 * 86_400 && wall.local_minute < 1440);
    }
}
