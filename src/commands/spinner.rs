//! A sign of life for long work; on a terminal only.

use std::io::IsTerminal;
use std::time::Duration;

use indicatif::{ProgressBar, ProgressDrawTarget, ProgressStyle};

/// Shorter work than this passes before an eye has found the line.
const TICK: Duration = Duration::from_millis(120);

/// A line on standard error that moves while work is under way, and goes when it is dropped.
pub(super) struct Spinner(Option<ProgressBar>);

impl Spinner {
    /// Starts with what is being done; where standard error is no terminal, nothing is ever shown.
    pub fn start(doing: String) -> Self {
        if !std::io::stderr().is_terminal() {
            return Spinner(None);
        }
        let bar = ProgressBar::with_draw_target(None, ProgressDrawTarget::stderr());
        if let Ok(style) = ProgressStyle::with_template("{spinner} {msg}") {
            bar.set_style(style);
        }
        bar.set_message(doing);
        bar.enable_steady_tick(TICK);
        Spinner(Some(bar))
    }
}

impl Spinner {
    /// Says something else.
    pub fn say(&self, doing: String) {
        if let Some(bar) = &self.0 {
            bar.set_message(doing);
        }
    }

    /// Whether anybody sees it.
    pub fn is_seen(&self) -> bool {
        self.0.is_some()
    }
}

impl Drop for Spinner {
    fn drop(&mut self) {
        if let Some(bar) = &self.0 {
            bar.finish_and_clear();
        }
    }
}
