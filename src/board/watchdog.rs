//! Tells the service manager that the picture lives, so that a frozen one is started anew.
//!
//! The protocol of `systemd` (man page sd_notify(3)): lines of text as one datagram to the local socket that
//! `NOTIFY_SOCKET` names. It is the only socket of the instrument, and a local (`AF_UNIX`) one. [`Watchdog::feed`] belongs
//! into the loop that draws: a thread that lived on beside a frozen picture would tell a lie.

use std::time::{Duration, Instant};

/// The wire to the service manager; without one everything does nothing.
#[derive(Debug, Default)]
pub struct Watchdog {
    #[cfg(unix)]
    socket: Option<std::os::unix::net::UnixDatagram>,
    interval: Option<Duration>,
    fed: Option<Instant>,
    is_ready: bool,
}

impl Watchdog {
    /// Looks for the service manager in the variables that `read` gives.
    pub fn of_environment(read: impl Fn(&str) -> Option<String>) -> Self {
        let mut dog = Self::default();
        #[cfg(unix)]
        {
            dog.socket = read("NOTIFY_SOCKET").and_then(|name| connect(&name).ok());
            // Meant for another process where the number is not ours.
            let for_us = read("WATCHDOG_PID").is_none_or(|pid| pid.parse() == Ok(std::process::id()));
            let micros = read("WATCHDOG_USEC").and_then(|text| text.parse().ok()).filter(|micros| *micros > 0);
            if dog.socket.is_some() && for_us {
                // A third of the time, so that one late feeding is no death.
                dog.interval = micros.map(|micros: u64| Duration::from_micros(micros / 3));
            }
        }
        #[cfg(not(unix))]
        let _ = read;
        dog
    }

    /// The longest time that may go by between two calls of [`Watchdog::feed`]; `None` where nobody watches.
    pub fn interval(&self) -> Option<Duration> {
        self.interval
    }

    /// A frame was drawn: says so where it is time, and that the service is ready the first time.
    pub fn feed(&mut self) {
        if !std::mem::replace(&mut self.is_ready, true) {
            self.notify("READY=1\nWATCHDOG=1");
            self.fed = Some(Instant::now());
            return;
        }
        let Some(interval) = self.interval else { return };
        // Frames come faster than the manager wants to hear of them.
        if self.fed.is_none_or(|fed| fed.elapsed() >= interval / 2) {
            self.notify("WATCHDOG=1");
            self.fed = Some(Instant::now());
        }
    }

    /// The program ends on purpose.
    pub fn stopping(&self) {
        self.notify("STOPPING=1");
    }

    fn notify(&self, text: &str) {
        #[cfg(unix)]
        if let Some(socket) = &self.socket {
            // A manager that does not listen any more starts us anew, which is what it is for.
            let _ = socket.send(text.as_bytes());
        }
        #[cfg(not(unix))]
        let _ = text;
    }
}

#[cfg(unix)]
fn connect(name: &str) -> std::io::Result<std::os::unix::net::UnixDatagram> {
    let socket = std::os::unix::net::UnixDatagram::unbound()?;
    // A manager that is stuck must not freeze the picture.
    socket.set_nonblocking(true)?;
    #[cfg(target_os = "linux")]
    if let Some(abstract_name) = name.strip_prefix('@') {
        use std::os::linux::net::SocketAddrExt;
        let address = std::os::unix::net::SocketAddr::from_abstract_name(abstract_name)?;
        socket.connect_addr(&address)?;
        return Ok(socket);
    }
    socket.connect(name)?;
    Ok(socket)
}

#[cfg(all(test, unix))]
mod tests {
    use super::*;
    use std::os::unix::net::UnixDatagram;

    fn heard(socket: &UnixDatagram) -> Option<String> {
        let mut bytes = [0; 64];
        let count = socket.recv(&mut bytes).ok()?;
        Some(String::from_utf8_lossy(&bytes[..count]).into_owned())
    }

    #[test]
    fn the_manager_hears_of_the_first_frame_and_then_now_and_then() {
        let folder = tempfile::tempdir().unwrap();
        let path = folder.path().join("notify");
        let manager = UnixDatagram::bind(&path).unwrap();
        manager.set_nonblocking(true).unwrap();
        let read = |name: &str| match name {
            "NOTIFY_SOCKET" => Some(path.to_str().unwrap().to_owned()),
            "WATCHDOG_USEC" => Some("60000".to_owned()),
            _ => None,
        };
        let mut dog = Watchdog::of_environment(read);
        assert_eq!(dog.interval(), Some(Duration::from_millis(20)));
        dog.feed();
        assert_eq!(heard(&manager).as_deref(), Some("READY=1\nWATCHDOG=1"));
        dog.feed();
        assert_eq!(heard(&manager), None, "too soon");
        std::thread::sleep(Duration::from_millis(12));
        dog.feed();
        assert_eq!(heard(&manager).as_deref(), Some("WATCHDOG=1"));
        dog.stopping();
        assert_eq!(heard(&manager).as_deref(), Some("STOPPING=1"));
        let other = Watchdog::of_environment(|name| if name == "WATCHDOG_PID" { Some("1".into()) } else { read(name) });
        assert_eq!(other.interval(), None, "another process is watched");
    }

    #[test]
    fn without_a_manager_nothing_happens() {
        let mut dog = Watchdog::of_environment(|name| (name == "NOTIFY_SOCKET").then(|| "/nowhere/at/all".into()));
        dog.feed();
        dog.feed();
        dog.stopping();
        assert_eq!(dog.interval(), None);
    }
}
