//! The unattended instrument: what it keeps, how it strolls, sleeps and counts, and a month of it.
#![allow(unsafe_code, reason = "an allocator cannot be written without")]

#[path = "../support/goldens.rs"]
mod goldens;
#[path = "../session/host.rs"]
#[allow(dead_code, reason = "each test takes what it needs")]
mod host;
#[cfg(target_os = "linux")]
#[path = "../screens/pseudo_terminal.rs"]
#[allow(dead_code, reason = "each test takes what it needs")]
mod pseudo_terminal;
#[path = "../support/scenes.rs"]
mod scenes;
#[path = "../support/valleys.rs"]
mod valleys;

mod cuts;
mod disk;
mod kept;
#[cfg(target_os = "linux")]
mod live;
mod month;
mod pictures;
mod rules;

use std::alloc::{GlobalAlloc, Layout, System};
use std::cell::Cell;

use host::{everything, random_event, years};

thread_local! {
    // Of this thread alone: the test harness allocates beside us.
    static HELD_BYTES: Cell<isize> = const { Cell::new(0) };
}

struct Counting;

// SAFETY: everything is passed on to the system's allocator unchanged; counting allocates nothing.
unsafe impl GlobalAlloc for Counting {
    unsafe fn alloc(&self, layout: Layout) -> *mut u8 {
        // A thread that is ending has no counter any more.
        let _ = HELD_BYTES.try_with(|held| held.set(held.get() + layout.size() as isize));
        // SAFETY: the caller's promises are passed on.
        unsafe { System.alloc(layout) }
    }

    unsafe fn dealloc(&self, pointer: *mut u8, layout: Layout) {
        let _ = HELD_BYTES.try_with(|held| held.set(held.get() - layout.size() as isize));
        // SAFETY: the caller's promises are passed on.
        unsafe { System.dealloc(pointer, layout) }
    }
}

#[global_allocator]
static COUNTING: Counting = Counting;

/// Bytes that this thread holds.
pub fn held_bytes() -> isize {
    HELD_BYTES.with(Cell::get)
}
