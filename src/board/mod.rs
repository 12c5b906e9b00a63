//! The world outside: screens and hands. Knows pixels and events, not water.
//!
//! A [`Screen`] shows finished frames, a hand sends [`HandEvent`]s, and an [`Instrument`] is what stands between them: it
//! takes events and gives frames of whatever size a screen asks for. A [`Stage`] holds one instrument and all the screens
//! that show it, so that the presenter's small screen and the room's large one are the same session. It is driven either
//! by [`run`] from a channel of events, or by a `window::Desk` where a window has to own the main thread.
//!
//! Nothing happens while nothing happens: between events everything sleeps, and time is only counted in ticks while the
//! instrument says that something moves. Only what changed since the last frame is shown again.
//!
//! No network socket is ever opened. The [`watchdog`] speaks to the service manager over a local (`AF_UNIX`) one. The window speaks to the display of this machine, over a local (`AF_UNIX`) socket on
//! Linux; a display on another machine is refused (see [`surroundings`]).
//!
//! Tried on Linux under X11. The window should also work under Wayland, on Windows and on macOS: never tried there.

pub mod backlight;
pub mod choose;
pub mod file;
pub mod hands;
pub mod light;
pub mod monitor;
#[cfg(all(feature = "board", target_os = "linux"))]
pub mod panel;
pub mod pictures;
pub mod placing;
pub mod power;
pub mod reviving;
mod run;
pub mod screen;
pub mod size;
mod stage;
pub mod surroundings;
pub mod terminal;
pub mod watchdog;
#[cfg(feature = "window")]
pub mod window;

pub use choose::{Choice, ScreenKind};
pub use hands::{HandEvent, Key, PointerPhase, Post};
pub use light::Light;
pub use run::run;
pub use screen::{Caption, Frame, Instrument, PlacedText, PlacedTexts, Screen, ScreenError};
pub use size::{FrameSize, LAYOUTS};
pub use stage::Stage;
