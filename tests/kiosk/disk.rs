//! A disk in memory that forgets what was not brought to it, and fails or loses its power at any operation.
//!
//! It is as unkind as a card may be: of names changed since the last sync any part may survive, also one half of a
//! rename; of bytes not synced there may be all, a part, none, those from before, or zeros.

use std::collections::{BTreeMap, BTreeSet};
use std::io::{self, ErrorKind};

use deshielo::keep::FileLayer;

/// What a power cut may leave: every name with its bytes.
pub type Left = BTreeMap<String, Vec<u8>>;

#[derive(Clone, Debug)]
struct Inode {
    synced: Vec<u8>,
    now: Vec<u8>,
}

#[derive(Clone, Debug)]
enum NameChange {
    Set(String, usize),
    Gone(String),
}

/// What happens at an operation.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Fate {
    /// The power goes while it is under way.
    Cut,
    /// It fails and does nothing.
    Fails(ErrorKind),
    /// It does its work, but not to the card, and says that it failed.
    FailsHalf(ErrorKind),
}

#[derive(Clone, Debug, Default)]
pub struct Disk {
    inodes: Vec<Inode>,
    names: BTreeMap<String, usize>,
    synced_names: BTreeMap<String, usize>,
    changes: Vec<NameChange>,
    operations: usize,
    fate: Option<(usize, Fate)>,
    pub is_dead: bool,
    /// Every operation that writes fails so.
    pub always: Option<ErrorKind>,
}

impl Disk {
    /// A disk that starts with these files.
    pub fn with(left: &Left) -> Self {
        let mut disk = Self::default();
        for (name, bytes) in left {
            disk.names.insert(name.clone(), disk.inodes.len());
            disk.inodes.push(Inode { synced: bytes.clone(), now: bytes.clone() });
        }
        disk.synced_names = disk.names.clone();
        disk
    }

    /// Lets operation number `at`, counted from now, meet its fate.
    pub fn doom(&mut self, at: usize, fate: Fate) {
        (self.operations, self.fate) = (0, Some((at, fate)));
    }

    /// Operations since then.
    pub fn operations(&self) -> usize {
        self.operations
    }

    /// Everything that may be left where the power goes now.
    pub fn leavings(&self) -> BTreeSet<Left> {
        let mut all = BTreeSet::new();
        for kept in 0_u32..1 << self.changes.len() {
            let mut names = self.synced_names.clone();
            for (index, change) in self.changes.iter().enumerate() {
                if kept >> index & 1 == 1 {
                    match change {
                        NameChange::Set(name, inode) => drop(names.insert(name.clone(), *inode)),
                        NameChange::Gone(name) => drop(names.remove(name)),
                    }
                }
            }
            let mut partly = vec![Left::new()];
            for (name, inode) in &names {
                let Inode { synced, now } = &self.inodes[*inode];
                let mut choices = vec![synced.clone()];
                if synced != now {
                    choices.extend([now.clone(), now[..now.len() / 2].to_vec(), Vec::new(), vec![0; now.len()]]);
                }
                partly = partly
                    .into_iter()
                    .flat_map(|left| {
                        choices.iter().map(move |bytes| {
                            let mut left = left.clone();
                            left.insert(name.clone(), bytes.clone());
                            left
                        })
                    })
                    .collect();
            }
            all.extend(partly);
        }
        all
    }

    /// Counts an operation; `Ok(false)`: do the work, then say that it failed or die.
    fn begin(&mut self) -> io::Result<Option<ErrorKind>> {
        if self.is_dead {
            return Err(ErrorKind::BrokenPipe.into());
        }
        if let Some(kind) = self.always {
            return Err(kind.into());
        }
        let at = self.operations;
        self.operations += 1;
        match self.fate {
            Some((doomed, fate)) if doomed == at => match fate {
                Fate::Cut => {
                    self.is_dead = true;
                    Ok(Some(ErrorKind::BrokenPipe))
                }
                Fate::Fails(kind) => Err(kind.into()),
                Fate::FailsHalf(kind) => Ok(Some(kind)),
            },
            _ => Ok(None),
        }
    }

    fn change(&mut self, change: NameChange) {
        match &change {
            NameChange::Set(name, inode) => drop(self.names.insert(name.clone(), *inode)),
            NameChange::Gone(name) => drop(self.names.remove(name)),
        }
        self.changes.push(change);
    }
}

fn told(failed: Option<ErrorKind>) -> io::Result<()> {
    failed.map_or(Ok(()), |kind| Err(kind.into()))
}

impl FileLayer for Disk {
    fn read(&self, name: &str, most: usize) -> io::Result<Option<Vec<u8>>> {
        let bytes = self.names.get(name).map(|inode| self.inodes[*inode].now.clone());
        Ok(bytes.map(|mut bytes| {
            bytes.truncate(most + 1);
            bytes
        }))
    }

    fn write(&mut self, name: &str, bytes: &[u8]) -> io::Result<()> {
        let failed = self.begin()?;
        // A write that fails half has written half.
        let written =
            if matches!(failed, Some(kind) if kind != ErrorKind::BrokenPipe) { bytes.len() / 2 } else { bytes.len() };
        let inode = match self.names.get(name) {
            Some(inode) => *inode,
            None => {
                self.inodes.push(Inode { synced: Vec::new(), now: Vec::new() });
                self.change(NameChange::Set(name.to_owned(), self.inodes.len() - 1));
                self.inodes.len() - 1
            }
        };
        self.inodes[inode].now = bytes[..written].to_vec();
        told(failed)
    }

    fn sync(&mut self, name: &str) -> io::Result<()> {
        let failed = self.begin()?;
        let inode = *self.names.get(name).ok_or(ErrorKind::NotFound)?;
        if failed.is_none() {
            self.inodes[inode].synced = self.inodes[inode].now.clone();
        }
        told(failed)
    }

    fn rename(&mut self, from: &str, to: &str) -> io::Result<()> {
        let failed = self.begin()?;
        let inode = *self.names.get(from).ok_or(ErrorKind::NotFound)?;
        self.change(NameChange::Gone(from.to_owned()));
        self.change(NameChange::Set(to.to_owned(), inode));
        told(failed)
    }

    fn sync_names(&mut self) -> io::Result<()> {
        let failed = self.begin()?;
        if failed.is_none() {
            self.synced_names = self.names.clone();
            self.changes.clear();
        }
        told(failed)
    }

    fn remove(&mut self, name: &str) -> io::Result<()> {
        let failed = self.begin()?;
        if self.names.contains_key(name) {
            self.change(NameChange::Gone(name.to_owned()));
        }
        told(failed)
    }
}
