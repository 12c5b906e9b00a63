//! All kept files of one instrument together, and what has to be said of them.

use std::io::ErrorKind;

use serde::Serialize;

use super::layer::FileLayer;
use super::seal::Damage;
use super::settings::{Messages, Settings};
use super::slot::{Opened, Slot};
use super::tally::Tally;
use crate::session::lesson::Kept as Guesses;

/// What is kept.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Kept {
    /// Settings and where it was.
    Settings,
    /// Guesses of a lesson.
    Guesses,
    /// The tally.
    Tally,
}

impl Kept {
    /// All of it.
    pub const ALL: [Kept; 3] = [Kept::Settings, Kept::Guesses, Kept::Tally];

    /// The name of its file, which is also the end of the message that names it.
    pub const fn name(self) -> &'static str {
        match self {
            Kept::Settings => "settings",
            Kept::Guesses => "guesses",
            Kept::Tally => "tally",
        }
    }
}

/// Something cannot be kept at present.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Trouble {
    /// What.
    pub kept: Kept,
    /// What the system says.
    pub reason: ErrorKind,
}

/// Something that has to be said once.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Note {
    /// A file was damaged and is set aside.
    Damaged {
        /// Which.
        kept: Kept,
        /// What is wrong with it.
        damage: Damage,
        /// Whether there was nothing else good, so that it starts afresh.
        afresh: bool,
    },
    /// A file cannot be read.
    Unreadable(Trouble),
    /// From now on something cannot be kept.
    CannotKeep(Trouble),
    /// It can be kept again.
    KeepsAgain(Kept),
}

/// The kept files.
#[derive(Clone, Debug)]
pub struct Keep<L> {
    layer: L,
    slots: [Slot; 3],
    troubles: [Option<ErrorKind>; 3],
    /// What was found wrong at the start.
    notes: Vec<Note>,
}

impl<L: FileLayer> Keep<L> {
    /// The files in that layer, not looked at yet.
    pub fn new(layer: L) -> Self {
        let slots = Kept::ALL.map(|kept| Slot::new(kept.name()));
        Self { layer, slots, troubles: [None; 3], notes: Vec::new() }
    }

    /// The settings that were kept, or the usual ones.
    pub fn settings(&mut self) -> Settings {
        self.open(Kept::Settings).unwrap_or_default()
    }

    /// The guesses that were kept.
    pub fn guesses(&mut self) -> Option<Guesses> {
        self.open::<Option<Guesses>>(Kept::Guesses).flatten()
    }

    /// The tally that was kept, or an empty one.
    pub fn tally(&mut self) -> Tally {
        self.open::<Tally>(Kept::Tally).unwrap_or_default().tidied()
    }

    /// The tally without touching any file, for another process than the one that counts.
    pub fn look_at_tally(&mut self) -> (Tally, Vec<Note>) {
        let tally = self.read::<Tally>(Kept::Tally, |slot, layer| slot.look(&*layer));
        (tally.unwrap_or_default().tidied(), self.take_notes())
    }

    /// The message of the day from the file that the staff writes, `message.toml`, and how many lines of it are no good.
    pub fn messages(&self) -> (Messages, usize) {
        const MOST_BYTES: usize = 16 * 1024;
        match self.layer.read("message.toml", MOST_BYTES) {
            Ok(Some(bytes)) if bytes.len() <= MOST_BYTES => match std::str::from_utf8(&bytes) {
                Ok(text) => Messages::read(text),
                Err(_) => (Messages::default(), 1),
            },
            Ok(None) => (Messages::default(), 0),
            _ => (Messages::default(), 1),
        }
    }

    /// Keeps the settings; something to say where that goes wrong for the first time, or well again.
    pub fn keep_settings(&mut self, settings: &Settings) -> Option<Note> {
        self.save(Kept::Settings, settings)
    }

    /// Keeps the guesses, or that there are none.
    pub fn keep_guesses(&mut self, guesses: Option<&Guesses>) -> Option<Note> {
        self.save(Kept::Guesses, &guesses)
    }

    /// Keeps the tally.
    pub fn keep_tally(&mut self, tally: &Tally) -> Option<Note> {
        self.save(Kept::Tally, tally)
    }

    /// What was found wrong since the last call.
    pub fn take_notes(&mut self) -> Vec<Note> {
        std::mem::take(&mut self.notes)
    }

    /// What cannot be kept at present.
    pub fn troubles(&self) -> impl Iterator<Item = Trouble> + '_ {
        let reason = |kept: Kept| self.troubles[kept as usize].map(|reason| Trouble { kept, reason });
        Kept::ALL.into_iter().filter_map(reason)
    }

    /// The layer.
    pub fn layer(&self) -> &L {
        &self.layer
    }

    fn open<T: serde::de::DeserializeOwned>(&mut self, kept: Kept) -> Option<T> {
        self.read(kept, Slot::open)
    }

    fn read<T>(&mut self, kept: Kept, read: impl FnOnce(&mut Slot, &mut L) -> Opened<T>) -> Option<T> {
        let opened = read(&mut self.slots[kept as usize], &mut self.layer);
        if let Some(damage) = opened.damage {
            self.notes.push(Note::Damaged { kept, damage, afresh: opened.value.is_none() });
        }
        if let Some(reason) = opened.unreadable {
            self.notes.push(Note::Unreadable(Trouble { kept, reason }));
        }
        opened.value
    }

    fn save<T: Serialize>(&mut self, kept: Kept, value: &T) -> Option<Note> {
        let now = match self.slots[kept as usize].save(value, &mut self.layer) {
            // What is on the card already says nothing of the card.
            Ok(false) => return None,
            Ok(true) => None,
            Err(error) => Some(error.kind()),
        };
        let before = std::mem::replace(&mut self.troubles[kept as usize], now);
        match (before, now) {
            (None, Some(reason)) => Some(Note::CannotKeep(Trouble { kept, reason })),
            (Some(_), None) => Some(Note::KeepsAgain(kept)),
            _ => None,
        }
    }
}
