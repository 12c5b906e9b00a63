//! Files that a preparer brings: read right, or refused with the reason, whatever their bytes are.

mod adding;
mod broken;
mod command;
mod exchange;
mod heights;
mod peeking;
mod support;
