//! Small displays on the SPI bus.
//!
//! [`start`] takes any bus and pins, so that a test can put an independent decoder of the commands in their place;
//! [`open`] takes those of this machine. A frame is drawn in memory elsewhere; here only the boxes that changed are sent,
//! each with eleven bytes of address.
//!
//! Never tried on hardware. What is held by tests is every byte on the wire.

mod glass;
mod lamp;
mod open;
mod wire;

pub use glass::start;
pub use lamp::PinLamp;
pub use open::open;
pub use wire::LONGEST_WRITE;
