//! The bundles of an unattended board: the one in use, the one before, and the way back.

use std::fs;
use std::path::{Path, PathBuf};

use serde::{Deserialize, Serialize};

use super::{EXTENSION, Fault, unpack};
use crate::keep::{Folder, Slot};

/// A new bundle may fail to start so often before the one before is back.
const MOST_TRIES: u8 = 2;
/// What the folder of every bundle begins with.
const PREFIX: &str = "bundle-";
/// What a folder begins with that was being unpacked when the power went.
const UNFINISHED: &str = ".deshielo-";
/// More files than this on a stick help nobody to choose.
const MOST_ON_A_STICK: usize = 50;

/// What is kept between starts: numbers of folders.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Serialize, Deserialize)]
struct State {
    in_use: Option<u64>,
    before: Option<u64>,
    /// How often the one in use was started since it was taken; `None` once it has started well.
    tries: Option<u8>,
}

/// Where the bundles of a board are.
#[derive(Debug)]
pub struct Shelf {
    folder: PathBuf,
    layer: Folder,
    slot: Slot,
    state: State,
}

/// What a start begins with.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum Began {
    /// No bundle was ever taken, or the first one did not start: what the command line says.
    Without,
    /// The folder of the bundle in use.
    With(
        /// The folder.
        PathBuf,
    ),
    /// The newest did not start: the folder of the one before, where there was one.
    WentBack(
        /// The folder.
        Option<PathBuf>,
    ),
}

impl Shelf {
    /// The shelf in a folder, with what was kept of it. A power cut at any time leaves the old state or the new one.
    pub fn open(folder: PathBuf) -> Self {
        let mut layer = Folder::new(folder.clone());
        let mut slot = Slot::new("shelf");
        let state = slot.open(&mut layer).value.unwrap_or_default();
        Self { folder, layer, slot, state }
    }

    /// Takes a bundle, from a stick perhaps. It is in use from the next start on, and on trial until [`Shelf::started_well`].
    ///
    /// # Errors
    /// What is wrong with the bundle, or what the system says; the one in use stays in use.
    pub fn take(&mut self, file: &Path) -> Result<(), Fault> {
        self.sweep();
        let number = self.numbers().max().unwrap_or(0) + 1;
        unpack(file, &self.path(number))?;
        // One on trial was never seen to start, and is nothing to go back to.
        let before = if self.state.tries.is_none() { self.state.in_use } else { self.state.before };
        let kept = self.keep(State { in_use: Some(number), before, tries: Some(0) });
        self.sweep();
        kept
    }

    /// To be called first at every start: counts it where the bundle is on trial, and goes back where it failed too often.
    ///
    /// # Errors
    /// The card cannot be written, so that the start could not be counted; the bundle in use is the same as before.
    pub fn begin(&mut self) -> Result<Began, Fault> {
        let State { in_use, before, tries } = self.state;
        let Some(number) = in_use else { return Ok(Began::Without) };
        let is_there = self.path(number).join("place").join("place.toml").is_file();
        match tries {
            None if is_there => Ok(Began::With(self.path(number))),
            Some(tries) if is_there && tries < MOST_TRIES => {
                self.keep(State { tries: Some(tries + 1), ..self.state })?;
                Ok(Began::With(self.path(number)))
            }
            _ => {
                self.keep(State { in_use: before, before: None, tries: None })?;
                self.sweep();
                Ok(Began::WentBack(before.map(|number| self.path(number))))
            }
        }
    }

    /// The instrument has shown its first picture, and was alive a while later.
    ///
    /// # Errors
    /// The card cannot be written; the bundle stays on trial.
    pub fn started_well(&mut self) -> Result<(), Fault> {
        self.keep(State { tries: None, ..self.state })
    }

    /// Goes back to the bundle before, for a person who asks for it. `Ok(false)`: there is none.
    ///
    /// # Errors
    /// The card cannot be written.
    pub fn go_back(&mut self) -> Result<bool, Fault> {
        if self.state.before.is_none() {
            return Ok(false);
        }
        self.keep(State { in_use: self.state.before, before: self.state.in_use, tries: None })?;
        Ok(true)
    }

    /// The folder of the bundle in use.
    pub fn in_use(&self) -> Option<PathBuf> {
        self.state.in_use.map(|number| self.path(number))
    }

    /// The folder of the one before.
    pub fn before(&self) -> Option<PathBuf> {
        self.state.before.map(|number| self.path(number))
    }

    fn path(&self, number: u64) -> PathBuf {
        self.folder.join(format!("{PREFIX}{number}"))
    }

    fn keep(&mut self, state: State) -> Result<(), Fault> {
        self.slot.save(&state, &mut self.layer).map_err(Fault::system(&self.folder))?;
        self.state = state;
        Ok(())
    }

    fn names(&self) -> impl Iterator<Item = String> + use<> {
        let entries = fs::read_dir(&self.folder).into_iter().flatten().flatten();
        entries.filter_map(|entry| entry.file_name().into_string().ok())
    }

    fn numbers(&self) -> impl Iterator<Item = u64> + use<> {
        self.names().filter_map(|name| name.strip_prefix(PREFIX)?.parse().ok())
    }

    /// Clears away what is neither in use nor before. What cannot be removed only takes room.
    fn sweep(&self) {
        let named = [self.state.in_use, self.state.before];
        for number in self.numbers().filter(|number| !named.contains(&Some(*number))) {
            let _ = fs::remove_dir_all(self.path(number));
        }
        for name in self.names().filter(|name| name.starts_with(UNFINISHED)) {
            let _ = fs::remove_dir_all(self.folder.join(name));
        }
    }
}

/// What may be bundles at the top of a stick, by name; whether they are is known when one is opened.
pub fn bundles_on(stick: &Path) -> Vec<PathBuf> {
    let entries = fs::read_dir(stick).into_iter().flatten().flatten();
    let is_one = |path: &PathBuf| {
        let hidden = path.file_name().is_none_or(|name| name.to_string_lossy().starts_with('.'));
        let extension = path.extension().is_some_and(|extension| extension.eq_ignore_ascii_case(EXTENSION));
        !hidden && extension && path.is_file()
    };
    let mut found: Vec<PathBuf> = entries.map(|entry| entry.path()).filter(is_one).collect();
    found.sort();
    found.truncate(MOST_ON_A_STICK);
    found
}
