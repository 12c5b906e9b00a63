//! The guesses of a lesson that is under way.

use serde::{Deserialize, Serialize};

use crate::lesson::Progress;

/// Where a lesson is, with its guesses.
#[derive(Clone, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct Guesses {
    /// The lesson's file or key, so that guesses of another one are not taken up.
    pub lesson: String,
    /// Its steps and guesses; [`Progress::resume`] says whether they still fit the lesson.
    pub progress: Progress,
}
