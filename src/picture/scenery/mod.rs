//! Pieces of a landscape: mountain, reservoir, river and fields, drawn from plain values without words.

mod field;
mod lake;
mod mountain;
mod stream;

pub use field::{FieldLook, draw_field, draw_town};
pub use lake::{Lake, draw_lake};
pub use mountain::{Mountain, MountainSnow};
pub use stream::{draw_channel, draw_stream};
