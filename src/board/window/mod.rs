//! Windows on a desktop: screens that are hands as well.
//!
//! A desktop wants its windows served by the main thread, so a [`Desk`] drives the stage itself; other hands post to it.
//! It sleeps between events. A window shows the largest layout that goes into it, or the one that was asked for, in
//! whole multiples. F11 fills the screen; the wheel is the encoder and the other mouse buttons are its button.

mod fit;
mod keys;
mod pane;

use std::fmt;
use std::rc::Rc;
use std::sync::Mutex;
use std::time::Instant;

use softbuffer::Context;
use winit::application::ApplicationHandler;
use winit::dpi::{PhysicalPosition, PhysicalSize};
use winit::event::{ElementState, KeyEvent, MouseButton, StartCause, Touch, WindowEvent};
use winit::event_loop::{ActiveEventLoop, ControlFlow, EventLoop, OwnedDisplayHandle};
use winit::keyboard::{Key as WinitKey, ModifiersState, NamedKey};
use winit::window::{Fullscreen, Window, WindowId};

pub use fit::Fit;
use keys::Wheel;
use pane::Pane;

use super::choose::ScreenKind;
use super::hands::{HandEvent, PointerPhase, Post, press};
use super::screen::{Instrument, ScreenError};
use super::size::{FrameSize, LAYOUTS};
use super::stage::Stage;

/// A connection to the desktop of this machine.
#[derive(Debug)]
pub struct Desk {
    events: EventLoop<HandEvent>,
}

impl Desk {
    /// Connects to the desktop. Can be done once in a process, from its main thread.
    ///
    /// # Errors
    /// [`ScreenError`] where there is none.
    pub fn open() -> Result<Self, ScreenError> {
        let events = EventLoop::with_user_event().build().map_err(failed)?;
        Ok(Self { events })
    }

    /// Where other hands post.
    pub fn post(&self) -> Post {
        let proxy = Mutex::new(self.events.create_proxy());
        Post::new(move |event| proxy.lock().is_ok_and(|proxy| proxy.send_event(event).is_ok()))
    }

    /// Opens a window for each of `sizes`, with the layout asked for or the one that fits, and plays until the instrument is done or
    /// somebody closes it.
    ///
    /// # Errors
    /// The first screen that fails ends it.
    pub fn run<I: Instrument>(self, stage: Stage<I>, sizes: &[Option<FrameSize>]) -> Result<(), ScreenError> {
        let context = Context::new(self.events.owned_display_handle()).map_err(failed)?;
        let mut play = Play { stage, context, asked: sizes.to_vec(), seats: Vec::new(), stale: true, outcome: Ok(()) };
        self.events.run_app(&mut play).map_err(failed)?;
        play.outcome
    }
}

/// The stage while windows are open.
struct Play<I> {
    stage: Stage<I>,
    context: Context<OwnedDisplayHandle>,
    asked: Vec<Option<FrameSize>>,
    seats: Vec<Seat>,
    /// Something happened since the last refresh.
    stale: bool,
    outcome: Result<(), ScreenError>,
}

/// What one window knows of the hands on it.
struct Seat {
    window: Rc<Window>,
    asked: Option<FrameSize>,
    /// Its number on the stage.
    outlet: usize,
    held: ModifiersState,
    wheel: Wheel,
    at: PhysicalPosition<f64>,
    /// The left button is down.
    pointer: bool,
    /// Since when another button is down.
    button: Option<Instant>,
    /// The finger that counts; others are ignored until it is lifted.
    finger: Option<u64>,
}

impl<I: Instrument> Play<I> {
    fn open(&mut self, desktop: &ActiveEventLoop, asked: Option<FrameSize>) -> Result<(), ScreenError> {
        let monitor = desktop.primary_monitor().or_else(|| desktop.available_monitors().next());
        let scale = monitor.as_ref().map_or(1.0, |monitor| monitor.scale_factor());
        let screen = monitor.map(|monitor| (monitor.size().width, monitor.size().height));
        let (width, height) = fit::first_size(screen.filter(|size| size.0 > 0 && size.1 > 0), scale, asked);
        let least = asked.unwrap_or(LAYOUTS[0]);
        let attributes = Window::default_attributes()
            .with_title(self.stage.instrument().caption().title)
            .with_inner_size(PhysicalSize::new(width, height))
            .with_min_inner_size(PhysicalSize::new(least.width, least.height));
        let window = Rc::new(desktop.create_window(attributes).map_err(failed)?);
        let pane = Pane::new(&self.context, Rc::clone(&window), asked)?;
        let outlet = self.stage.add(Box::new(pane));
        self.seats.push(Seat {
            window,
            asked,
            outlet,
            held: ModifiersState::empty(),
            wheel: Wheel::default(),
            at: PhysicalPosition::new(0.0, 0.0),
            pointer: false,
            button: None,
            finger: None,
        });
        Ok(())
    }

    fn end(&mut self, desktop: &ActiveEventLoop, outcome: Result<(), ScreenError>) {
        if self.outcome.is_ok() {
            self.outcome = outcome;
        }
        desktop.exit();
    }

    fn hand(&mut self, event: HandEvent) {
        self.stage.hand(event);
        self.stale = true;
    }
}

impl<I: Instrument> ApplicationHandler<HandEvent> for Play<I> {
    fn resumed(&mut self, desktop: &ActiveEventLoop) {
        for asked in std::mem::take(&mut self.asked) {
            if let Err(error) = self.open(desktop, asked) {
                return self.end(desktop, Err(error));
            }
        }
    }

    fn new_events(&mut self, _: &ActiveEventLoop, cause: StartCause) {
        if matches!(cause, StartCause::ResumeTimeReached { .. }) {
            self.stage.tick();
            self.stale = true;
        }
    }

    fn user_event(&mut self, _: &ActiveEventLoop, event: HandEvent) {
        self.hand(event);
    }

    fn window_event(&mut self, _: &ActiveEventLoop, id: WindowId, event: WindowEvent) {
        let Some(seat) = self.seats.iter_mut().find(|seat| seat.window.id() == id) else { return };
        if event == WindowEvent::RedrawRequested {
            self.stage.spoil(seat.outlet);
            self.stale = true;
        } else if let Some(event) = seat.take(event) {
            self.hand(event);
        }
    }

    fn about_to_wait(&mut self, desktop: &ActiveEventLoop) {
        if std::mem::take(&mut self.stale)
            && let Err(error) = self.stage.refresh()
        {
            return self.end(desktop, Err(error));
        }
        if self.stage.done() {
            return self.end(desktop, Ok(()));
        }
        desktop.set_control_flow(self.stage.next_tick().map_or(ControlFlow::Wait, ControlFlow::WaitUntil));
    }
}

impl Seat {
    fn take(&mut self, event: WindowEvent) -> Option<HandEvent> {
        match event {
            WindowEvent::CloseRequested | WindowEvent::Destroyed => Some(HandEvent::Close),
            WindowEvent::Resized(_) | WindowEvent::ScaleFactorChanged { .. } => Some(HandEvent::Resize),
            WindowEvent::ModifiersChanged(held) => {
                self.held = held.state();
                None
            }
            WindowEvent::KeyboardInput { event, is_synthetic: false, .. } => self.key(&event),
            WindowEvent::MouseWheel { delta, .. } => self.wheel.turn(delta),
            WindowEvent::CursorMoved { position, .. } => {
                self.at = position;
                self.pointer.then(|| self.pointer(PointerPhase::Move))
            }
            WindowEvent::MouseInput { state, button, .. } => self.mouse(state, button),
            WindowEvent::Touch(touch) => self.touch(touch),
            _ => None,
        }
    }

    fn key(&mut self, event: &KeyEvent) -> Option<HandEvent> {
        if event.state != ElementState::Pressed {
            return None;
        }
        if event.logical_key == WinitKey::Named(NamedKey::F11) {
            let fill = self.window.fullscreen().is_none().then_some(Fullscreen::Borderless(None));
            self.window.set_fullscreen(fill);
            return None;
        }
        keys::of_key(&event.logical_key, self.held)
    }

    fn mouse(&mut self, state: ElementState, button: MouseButton) -> Option<HandEvent> {
        match (button, state) {
            (MouseButton::Left, ElementState::Pressed) => {
                self.pointer = true;
                Some(self.pointer(PointerPhase::Down))
            }
            (MouseButton::Left, ElementState::Released) => {
                std::mem::take(&mut self.pointer).then(|| self.pointer(PointerPhase::Up))
            }
            (_, ElementState::Pressed) => {
                self.button = Some(Instant::now());
                None
            }
            (_, ElementState::Released) => self.button.take().map(|since| press(since.elapsed())),
        }
    }

    fn touch(&mut self, touch: Touch) -> Option<HandEvent> {
        let phase = keys::of_touch(touch.phase);
        match phase {
            PointerPhase::Down if self.finger.is_none() => self.finger = Some(touch.id),
            _ if self.finger != Some(touch.id) => return None,
            PointerPhase::Up => self.finger = None,
            _ => {}
        }
        self.at = touch.location;
        Some(self.pointer(phase))
    }

    fn pointer(&self, phase: PointerPhase) -> HandEvent {
        let fit = pane::fit(&self.window, self.asked);
        let (x, y) = fit.pixel(self.at.x, self.at.y);
        HandEvent::Pointer { phase, x, y, on: fit.frame }
    }
}

fn failed(error: impl fmt::Display) -> ScreenError {
    ScreenError::new(ScreenKind::Window, error)
}
