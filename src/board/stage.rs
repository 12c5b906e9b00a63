//! One instrument and every screen that shows it.

use std::time::Instant;

use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::Rgb565;
use embedded_graphics::primitives::Rectangle;

use super::hands::HandEvent;
use super::light::Light;
use super::screen::{Caption, Instrument, Screen, ScreenError};
use super::size::FrameSize;
use crate::picture::changes::changes;

/// An instrument with its screens and its sense of time.
pub struct Stage<I> {
    instrument: I,
    outlets: Vec<Outlet>,
    closed: bool,
    told: Instant,
    ticked: Instant,
}

struct Outlet {
    screen: Box<dyn Screen>,
    shown: Vec<Rgb565>,
    size: FrameSize,
    /// What the screen shows cannot be relied on.
    spoilt: bool,
    /// Title, hint and notice as the screen has them.
    said: [String; 3],
    light: Light,
    /// When it was last tended.
    tended: Instant,
}

impl<I: Instrument> Stage<I> {
    /// A stage without screens; time begins now.
    pub fn new(instrument: I) -> Self {
        let now = Instant::now();
        Self { instrument, outlets: Vec::new(), closed: false, told: now, ticked: now }
    }

    /// Adds a screen and gives its number, for [`Stage::spoil`].
    pub fn add(&mut self, screen: Box<dyn Screen>) -> usize {
        let size = screen.size();
        let said = Default::default();
        let (shown, light, tended) = (Vec::new(), Light::Full, Instant::now());
        self.outlets.push(Outlet { screen, shown, size, spoilt: true, said, light, tended });
        self.outlets.len() - 1
    }

    /// The instrument.
    pub fn instrument(&self) -> &I {
        &self.instrument
    }

    /// Passes on an event, after the time that went by.
    pub fn hand(&mut self, event: HandEvent) {
        self.tell_time(Instant::now());
        self.instrument.event(event);
        match event {
            HandEvent::Close => self.closed = true,
            HandEvent::Resize => self.outlets.iter_mut().for_each(|outlet| outlet.spoilt = true),
            _ => {}
        }
    }

    /// Passes on the time that went by, and tends the screens that are due.
    pub fn tick(&mut self) {
        let now = Instant::now();
        self.outlets.iter_mut().filter(|outlet| outlet.due().is_some_and(|due| due <= now)).for_each(|outlet| {
            outlet.tended = now;
            outlet.spoilt |= outlet.screen.tend();
        });
        self.ticked = now;
        self.tell_time(now);
    }

    /// When [`Stage::tick`] should be called next, or `None` while nothing moves and no screen wants tending.
    pub fn next_tick(&self) -> Option<Instant> {
        let moves = self.instrument.wants_tick().and_then(|period| self.ticked.checked_add(period));
        let tending = self.outlets.iter().filter_map(Outlet::due).min();
        moves.into_iter().chain(tending).min()
    }

    /// Whether it is over.
    pub fn done(&self) -> bool {
        self.closed || self.instrument.done()
    }

    /// Screen number `index` has lost what it showed; the next refresh shows it whole.
    pub fn spoil(&mut self, index: usize) {
        if let Some(outlet) = self.outlets.get_mut(index) {
            outlet.spoilt = true;
        }
    }

    /// Brings every screen up to date; does nothing to those on which nothing changed.
    ///
    /// # Errors
    /// The first screen that fails.
    pub fn refresh(&mut self) -> Result<(), ScreenError> {
        for outlet in &mut self.outlets {
            outlet.tell(&self.instrument.caption())?;
            outlet.shine(self.instrument.light());
            outlet.refresh(&mut self.instrument)?;
        }
        Ok(())
    }

    fn tell_time(&mut self, now: Instant) {
        let gone_by = now.saturating_duration_since(self.told);
        self.told = now;
        self.instrument.event(HandEvent::Time(gone_by));
    }
}

impl Outlet {
    fn refresh(&mut self, instrument: &mut impl Instrument) -> Result<(), ScreenError> {
        let size = self.screen.size();
        let frame = instrument.frame(size, self.screen.wants_texts());
        if frame.size != size || frame.pixels.len() != size.pixels() {
            let reason = format!("a frame of {} pixels for {size}", frame.pixels.len());
            return Err(ScreenError::new(self.screen.kind(), reason));
        }
        if self.spoilt || self.size != size {
            let whole = Rectangle::new(Point::zero(), Size::new(size.width.into(), size.height.into()));
            self.screen.present(&frame, &[whole])?;
        } else {
            let changed = changes(&self.shown, frame.pixels, size.width);
            if changed.is_empty() {
                return Ok(());
            }
            self.screen.present(&frame, &changed)?;
        }
        self.spoilt = false;
        self.size = size;
        self.shown.clear();
        self.shown.extend_from_slice(frame.pixels);
        Ok(())
    }

    /// When the screen wants to be tended next.
    fn due(&self) -> Option<Instant> {
        self.tended.checked_add(self.screen.wants_tending()?)
    }

    fn shine(&mut self, light: Light) {
        if self.light != light {
            self.light = light;
            self.spoilt |= self.screen.light(light);
        }
    }

    fn tell(&mut self, caption: &Caption<'_>) -> Result<(), ScreenError> {
        let now = [caption.title, caption.hint, caption.too_small];
        if self.said != now {
            self.screen.caption(caption)?;
            self.said = now.map(str::to_owned);
        }
        Ok(())
    }
}
