//! The what-if grid: every cell is a run of its own to the bit, in any order, in any number of parts; and its page.

mod cells;
mod page;
mod sentences;
#[path = "../support"]
mod support {
    pub mod goldens;
    pub mod scenes;
    pub mod valleys;
}
