//! Bundles made, opened, attacked and put on trial.

mod attacks;
mod command;
mod making;
mod shelf;
mod support;
