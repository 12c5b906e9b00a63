//! Ctrl-C ends the search, not the program: the best so far is kept. Pressed again, it ends the program.

use std::sync::Arc;
use std::sync::atomic::AtomicBool;

/// A flag that is set by the first interrupt. Where the system cannot do that, Ctrl-C ends the program as ever.
#[cfg(unix)]
pub(super) fn on_interrupt() -> Arc<AtomicBool> {
    use signal_hook::consts::{SIGINT, SIGTERM};
    use signal_hook::flag::{register, register_conditional_shutdown};
    /// What a shell makes of a program that an interrupt ended.
    const INTERRUPTED: i32 = 130;

    let stop = Arc::new(AtomicBool::new(false));
    for signal in [SIGINT, SIGTERM] {
        // In this order: only the second signal finds the flag set.
        let _ = register_conditional_shutdown(signal, INTERRUPTED, Arc::clone(&stop));
        let _ = register(signal, Arc::clone(&stop));
    }
    stop
}

/// Likewise.
#[cfg(not(unix))]
pub(super) fn on_interrupt() -> Arc<AtomicBool> {
    Arc::new(AtomicBool::new(false))
}
