//! Screens driven as people drive them: a terminal in a pseudo-terminal, a window on a display of its own, and pictures
//! in a folder. What needs tools that are not here prints "skipped".
#![cfg(unix)]

mod counter;
mod desktop;
mod pictures;
mod pseudo_terminal;
mod stage;
mod terminal;
mod window;
