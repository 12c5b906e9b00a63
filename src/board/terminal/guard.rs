//! Takes the terminal over, and gives it back as it was however the program ends.
//!
//! It is given back when the guard is dropped, when any thread panics (before the message is printed, so that it can be
//! read), and when the system asks the program to end. Only `SIGKILL` and a power cut get past that.

use std::io::{self, Write};
use std::sync::Once;
use std::sync::atomic::{AtomicBool, Ordering};

use crossterm::cursor::{Hide, Show};
use crossterm::execute;
use crossterm::terminal::{
    DisableLineWrap, EnableLineWrap, EnterAlternateScreen, LeaveAlternateScreen, disable_raw_mode, enable_raw_mode,
};

use crate::board::hands::Post;

/// Whether the terminal is ours at present. One process has one terminal.
static OURS: AtomicBool = AtomicBool::new(false);

/// Clicks, drags and the wheel, told with plain numbers; not every move of the mouse, which would never let it sleep.
#[cfg(unix)]
const MOUSE_ON: &str = "\x1b[?1000h\x1b[?1002h\x1b[?1006h";
#[cfg(unix)]
const MOUSE_OFF: &str = "\x1b[?1006l\x1b[?1002l\x1b[?1000l";
/// Letters as they were, and an empty screen for terminals that have no second one to leave.
const CLEAN: &str = "\x1b[0m\x1b[2J\x1b[H";

/// The terminal is ours as long as this lives.
#[derive(Debug)]
pub struct Guard(());

impl Guard {
    /// Takes the terminal over: keys come one by one and unseen, a second screen, no cursor.
    ///
    /// # Errors
    /// Where there is no terminal, or somebody else in this process has it.
    pub fn enter() -> io::Result<Self> {
        if OURS.swap(true, Ordering::SeqCst) {
            return Err(io::ErrorKind::ResourceBusy.into());
        }
        static HOOK: Once = Once::new();
        HOOK.call_once(|| {
            let before = std::panic::take_hook();
            std::panic::set_hook(Box::new(move |panic| {
                restore();
                before(panic);
            }));
        });
        // From here on whatever fails drops the guard, which gives back what was taken.
        let guard = Self(());
        enable_raw_mode()?;
        execute!(io::stdout(), EnterAlternateScreen, DisableLineWrap, Hide)?;
        mouse(true)?;
        Ok(guard)
    }

    /// Whether the terminal is still ours; a panic in another thread gives it back early.
    pub fn holds(&self) -> bool {
        OURS.load(Ordering::SeqCst)
    }
}

impl Drop for Guard {
    fn drop(&mut self) {
        restore();
    }
}

/// Gives the terminal back if it is ours. Goes on where the terminal is gone: there is nobody left to tell.
fn restore() {
    if OURS.swap(false, Ordering::SeqCst) {
        let _ = mouse(false);
        let _ = io::stdout().write_all(CLEAN.as_bytes());
        let _ = execute!(io::stdout(), Show, EnableLineWrap, LeaveAlternateScreen);
        let _ = disable_raw_mode();
    }
}

#[cfg(unix)]
fn mouse(on: bool) -> io::Result<()> {
    let mut out = io::stdout();
    out.write_all(if on { MOUSE_ON } else { MOUSE_OFF }.as_bytes())?;
    out.flush()
}

#[cfg(not(unix))]
fn mouse(on: bool) -> io::Result<()> {
    use crossterm::event::{DisableMouseCapture, EnableMouseCapture};
    if on { execute!(io::stdout(), EnableMouseCapture) } else { execute!(io::stdout(), DisableMouseCapture) }
}

/// Ends the program in good order when the system asks for it (`SIGINT`, `SIGTERM`, `SIGHUP`, `SIGQUIT`): posts
/// [`HandEvent::Close`](crate::board::HandEvent::Close), and where that is not heeded in time gives the terminal back
/// and exits.
///
/// # Errors
/// Where the system refuses.
#[cfg(unix)]
pub fn heed_signals(post: Post) -> io::Result<()> {
    use signal_hook::consts::{SIGHUP, SIGINT, SIGQUIT, SIGTERM};
    /// Time to finish what is being computed and shown.
    const GRACE: std::time::Duration = std::time::Duration::from_secs(2);
    /// What shells add to the number of a signal.
    const BY_SIGNAL: i32 = 128;
    let mut signals = signal_hook::iterator::Signals::new([SIGHUP, SIGINT, SIGQUIT, SIGTERM])?;
    std::thread::Builder::new().name("signals".into()).spawn(move || {
        if let Some(signal) = signals.forever().next() {
            post.send(crate::board::HandEvent::Close);
            std::thread::sleep(GRACE);
            restore();
            std::process::exit(BY_SIGNAL + signal);
        }
    })?;
    Ok(())
}

/// Windows closes a console program in its own way; Ctrl+C comes in as a key.
///
/// # Errors
/// None.
#[cfg(not(unix))]
pub fn heed_signals(_post: Post) -> io::Result<()> {
    Ok(())
}
