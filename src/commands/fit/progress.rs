//! How far the search has come: share done, best so far, time left; on a terminal only.

use std::sync::Mutex;
use std::time::{Duration, Instant};

use crate::commands::spinner::Spinner;
use crate::fit::Progress;
use crate::words::Words;

/// An eye reads no faster.
const BETWEEN: Duration = Duration::from_millis(250);
/// Before this much has been run, a guess at the time left is worth nothing.
const LEAST_SHARE: f64 = 0.01;

/// The line that moves.
pub(super) struct Line {
    spinner: Spinner,
    started: Instant,
    told: Mutex<Option<Instant>>,
}

impl Line {
    /// Starts the clock.
    pub fn start(words: &Words) -> Self {
        let spinner = Spinner::start(words.say("progress-fit-start", &[]));
        Self { spinner, started: Instant::now(), told: Mutex::new(None) }
    }

    /// Tells where the search stands, not too often.
    pub fn tell(&self, progress: Progress, words: &Words) {
        if !self.spinner.is_seen() {
            return;
        }
        let Ok(mut told) = self.told.try_lock() else { return };
        if told.is_some_and(|before| before.elapsed() < BETWEEN) {
            return;
        }
        *told = Some(Instant::now());
        let share = progress.runs as f64 / progress.of.max(1) as f64;
        let best = match progress.best_score {
            score if score.is_finite() => words.number(score, 3),
            _ => words.style().missing.clone(),
        };
        let left = match share {
            share if share < LEAST_SHARE => words.style().missing.clone(),
            share => clock(self.started.elapsed().as_secs_f64() * (1.0 - share) / share),
        };
        let arguments =
            [("percent", words.percent(100.0 * share, 0).into()), ("best", best.into()), ("left", left.into())];
        self.spinner.say(words.say("progress-fit", &arguments));
    }
}

/// Minutes and seconds, the same in every language.
fn clock(seconds: f64) -> String {
    let seconds = seconds as u64;
    format!("{}:{:02}", seconds / 60, seconds % 60)
}

#[cfg(test)]
mod tests {
    #[test]
    fn time_left_is_minutes_and_seconds() {
        assert_eq!(
            (super::clock(5.9), super::clock(61.0), super::clock(7260.0)),
            ("0:05".into(), "1:01".into(), "121:00".into())
        );
    }
}
