//! Why a command did not do what it was asked to, already in words.

/// What ended a command.
#[derive(Clone, Debug, PartialEq, Eq)]
pub(super) enum Failure {
    /// The command line is wrong; exit code 2.
    Usage(
        /// What to tell, line by line.
        Vec<String>,
    ),
    /// The input, or the place to write to, is wrong; exit code 1.
    Input(
        /// What to tell, line by line.
        Vec<String>,
    ),
    /// Whoever read the answer has seen enough (`… | head -1`); exit code 0.
    ReaderGone,
}

impl Failure {
    /// Wrong input, told in one line.
    pub fn input(line: String) -> Self {
        Failure::Input(vec![line])
    }
}
