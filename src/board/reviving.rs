//! A screen that may be unplugged, fail or not be there yet, and comes back.
//!
//! The instrument plays on whatever happens to a screen: what cannot be shown is not shown, somebody is told once, and
//! every few seconds it is tried again. When the screen is back it gets a whole frame.

use std::time::{Duration, Instant};

use embedded_graphics::primitives::Rectangle;

use super::choose::ScreenKind;
use super::light::Light;
use super::screen::{Frame, Screen, ScreenError};
use super::size::FrameSize;

/// How often a screen that is there is looked after, and one that is lost is tried first.
pub const EVERY: Duration = Duration::from_secs(2);
/// The longest time between two tries; each waits twice as long as the one before.
pub const LONGEST_WAIT: Duration = Duration::from_secs(16);

/// Something that shows frames as long as it works.
pub trait Surface {
    /// The frame that goes onto it.
    fn size(&self) -> FrameSize;

    /// Shows what lies in `changed`, boxes that may reach beyond the frame.
    ///
    /// # Errors
    /// What the system says; the surface is then given up.
    fn show(&mut self, frame: &Frame<'_>, changed: &[Rectangle]) -> Result<(), String>;

    /// Takes another brightness.
    ///
    /// # Errors
    /// What the system says; the surface is then given up.
    fn light(&mut self, light: Light) -> Result<(), String>;

    /// Whether it is still there, for those that can be unplugged without a write failing.
    ///
    /// # Errors
    /// Why not; the surface is then given up.
    fn check(&mut self) -> Result<(), String> {
        Ok(())
    }

    /// Whether a fresh start after a night does it good: a panel cannot say that it lost its settings.
    fn starts_anew_after_dark(&self) -> bool {
        false
    }
}

/// What happened to a screen, for the log.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum Notice {
    /// It is gone, or was never there; it is tried again.
    Lost(ScreenError),
    /// It is there again.
    Back(ScreenKind),
}

/// What opens a surface; called again whenever it was lost.
pub type Opener = Box<dyn FnMut() -> Result<Box<dyn Surface>, String>>;

/// Who is told of what happens to a screen.
pub type Told = Box<dyn FnMut(Notice)>;

/// A screen that comes back.
pub struct Reviving {
    kind: ScreenKind,
    open: Opener,
    told: Told,
    clock: Box<dyn Fn() -> Instant>,
    surface: Option<Box<dyn Surface>>,
    /// The frame of the surface, or of the one before it.
    size: FrameSize,
    light: Light,
    wait: Duration,
    next_try: Instant,
}

impl Reviving {
    /// A screen that `open` opens, tried at once. `size` is the frame while it was never there.
    pub fn new(kind: ScreenKind, size: FrameSize, open: Opener, told: Told) -> Self {
        Self::with_clock(kind, size, open, told, Box::new(Instant::now))
    }

    /// The same with another clock.
    pub fn with_clock(
        kind: ScreenKind,
        size: FrameSize,
        open: Opener,
        told: Told,
        clock: Box<dyn Fn() -> Instant>,
    ) -> Self {
        let next_try = clock();
        let mut screen =
            Self { kind, open, told, clock, surface: None, size, light: Light::Full, wait: EVERY, next_try };
        if let Err(reason) = screen.try_open() {
            screen.lose(reason);
        }
        screen
    }

    /// Whether it is there.
    pub fn is_there(&self) -> bool {
        self.surface.is_some()
    }

    fn try_open(&mut self) -> Result<(), String> {
        // Before the old one is gone the system may refuse a new one.
        self.surface = None;
        let mut surface = (self.open)()?;
        if self.light != Light::Full {
            surface.light(self.light)?;
        }
        self.size = surface.size();
        self.wait = EVERY;
        self.surface = Some(surface);
        Ok(())
    }

    fn lose(&mut self, reason: String) {
        self.surface = None;
        self.wait = EVERY;
        self.put_off();
        (self.told)(Notice::Lost(ScreenError::new(self.kind, reason)));
    }

    fn put_off(&mut self) {
        let now = (self.clock)();
        self.next_try = now.checked_add(self.wait).unwrap_or(now);
    }

    /// Does something with the surface, if it is there; gives it up where that fails.
    fn with(&mut self, what: impl FnOnce(&mut dyn Surface) -> Result<(), String>) {
        if let Some(surface) = self.surface.as_mut()
            && let Err(reason) = what(surface.as_mut())
        {
            self.lose(reason);
        }
    }
}

impl Screen for Reviving {
    fn kind(&self) -> ScreenKind {
        self.kind
    }

    fn size(&self) -> FrameSize {
        self.size
    }

    fn present(&mut self, frame: &Frame<'_>, changed: &[Rectangle]) -> Result<(), ScreenError> {
        self.with(|surface| surface.show(frame, changed));
        Ok(())
    }

    fn light(&mut self, light: Light) -> bool {
        let wakes = self.light == Light::Off && light != Light::Off;
        self.light = light;
        if wakes && self.surface.as_ref().is_some_and(|surface| surface.starts_anew_after_dark()) {
            if let Err(reason) = self.try_open() {
                self.lose(reason);
            }
            return true;
        }
        self.with(|surface| surface.light(light));
        false
    }

    fn wants_tending(&self) -> Option<Duration> {
        Some(EVERY)
    }

    fn tend(&mut self) -> bool {
        if self.surface.is_some() {
            self.with(|surface| surface.check());
            return false;
        }
        if (self.clock)() < self.next_try {
            return false;
        }
        match self.try_open() {
            Ok(()) => {
                (self.told)(Notice::Back(self.kind));
                true
            }
            Err(_) => {
                self.wait = (self.wait * 2).min(LONGEST_WAIT);
                self.put_off();
                false
            }
        }
    }
}
