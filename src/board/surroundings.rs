//! What screens there are around the program, without opening any.
//!
//! On Linux a desktop counts as there when its socket on this machine takes a connection. A `DISPLAY` that names a
//! host, as a forwarded login sets it, would go over the network and does not count.

use std::io::IsTerminal;

use super::choose::ScreenKind;
use super::terminal::Ability;

/// Whether a window can be had.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum WindowChance {
    /// Yes.
    Ready,
    /// There is no desktop, or it does not answer.
    NoDesktop,
    /// The desktop is on another machine.
    Elsewhere,
    /// This build has no window.
    NotBuilt,
    /// It was tried, and failed.
    Failed,
}

/// Whether a terminal can be had.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum TerminalChance {
    /// Yes.
    Ready,
    /// It cannot place letters or show colours.
    Plain,
    /// Input or output is not a terminal.
    Missing,
}

/// The screens around.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Surroundings {
    /// Screens that a board file names, the presenter's first.
    pub board_file: Vec<ScreenKind>,
    /// Whether a window can be had.
    pub window: WindowChance,
    /// Whether a terminal can be had.
    pub terminal: TerminalChance,
}

impl Surroundings {
    /// Looks around, with the screens of a board file if there is one.
    pub fn look(board_file: Vec<ScreenKind>) -> Self {
        let window = if cfg!(feature = "window") { desktop() } else { WindowChance::NotBuilt };
        Self { board_file, window, terminal: terminal() }
    }
}

fn terminal() -> TerminalChance {
    if !std::io::stdin().is_terminal() || !std::io::stdout().is_terminal() {
        return TerminalChance::Missing;
    }
    match Ability::of_environment(|name| std::env::var(name).ok()) {
        Some(_) => TerminalChance::Ready,
        None => TerminalChance::Plain,
    }
}

#[cfg(not(all(unix, not(target_os = "macos"))))]
fn desktop() -> WindowChance {
    WindowChance::Ready
}

#[cfg(all(unix, not(target_os = "macos")))]
fn desktop() -> WindowChance {
    let set = |name: &str| std::env::var(name).ok().filter(|value| !value.is_empty());
    if set("WAYLAND_SOCKET").is_some() || wayland_answers(set("WAYLAND_DISPLAY"), set("XDG_RUNTIME_DIR")) {
        return WindowChance::Ready;
    }
    match set("DISPLAY").map(|display| local_x11(&display)) {
        None => WindowChance::NoDesktop,
        Some(None) => WindowChance::Elsewhere,
        Some(Some(number)) if x11_answers(&number) => WindowChance::Ready,
        Some(Some(_)) => WindowChance::NoDesktop,
    }
}

#[cfg(all(unix, not(target_os = "macos")))]
fn wayland_answers(display: Option<String>, folder: Option<String>) -> bool {
    let (Some(display), folder) = (display, folder.unwrap_or_default()) else { return false };
    // An absolute name replaces the folder.
    let path = std::path::Path::new(&folder).join(display);
    path.is_absolute() && std::os::unix::net::UnixStream::connect(path).is_ok()
}

/// The number of a display on this machine: `:1` or `unix:1.0` give 1, a host gives nothing.
#[cfg(all(unix, not(target_os = "macos")))]
fn local_x11(display: &str) -> Option<String> {
    let number = display.strip_prefix("unix:").or_else(|| display.strip_prefix(':'))?;
    let number = number.split('.').next()?;
    (!number.is_empty() && number.bytes().all(|byte| byte.is_ascii_digit())).then(|| number.to_owned())
}

#[cfg(all(unix, not(target_os = "macos")))]
fn x11_answers(number: &str) -> bool {
    let path = format!("/tmp/.X11-unix/X{number}");
    std::os::unix::net::UnixStream::connect(path).is_ok()
}

#[cfg(all(test, unix, not(target_os = "macos")))]
mod tests {
    use super::*;

    #[test]
    fn only_displays_of_this_machine_count() {
        assert_eq!(local_x11(":0").as_deref(), Some("0"));
        assert_eq!(local_x11("unix:12.0").as_deref(), Some("12"));
        for elsewhere in ["localhost:10.0", "room:0", "10.0.0.7:0", "", ":", ":x", "tcp/room:0"] {
            assert_eq!(local_x11(elsewhere), None, "{elsewhere}");
        }
    }

    #[test]
    fn a_socket_that_nobody_serves_is_no_desktop() {
        let folder = tempfile::tempdir().unwrap();
        let text = folder.path().to_str().unwrap().to_owned();
        assert!(!wayland_answers(Some("wayland-0".into()), Some(text.clone())));
        assert!(!wayland_answers(Some("wayland-0".into()), None));
        let _served = std::os::unix::net::UnixListener::bind(folder.path().join("wayland-0")).unwrap();
        assert!(wayland_answers(Some("wayland-0".into()), Some(text)));
    }
}
