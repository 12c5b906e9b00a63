//! What goes into a bundle, gathered from folders and files.

use std::collections::BTreeMap;
use std::fs::{self, File};
use std::io::Read;
use std::path::Path;

use super::{Fault, MOST_BYTES, MOST_MEMBER_BYTES, MOST_MEMBERS, MemberName, SUMS};

/// Members by their names, each whole in memory.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct Contents {
    members: BTreeMap<MemberName, Vec<u8>>,
    bytes: u64,
}

impl Contents {
    /// Nothing yet.
    pub fn new() -> Self {
        Self::default()
    }

    /// Adds one member.
    ///
    /// # Errors
    /// Its name is none, it is there already, or it is too much.
    pub fn add(&mut self, name: &str, bytes: Vec<u8>) -> Result<(), Fault> {
        let member = MemberName::new(name)?;
        if self.members.keys().any(|known| known.folded() == member.folded()) {
            return Err(Fault::Twice(name.to_owned()));
        }
        if bytes.len() as u64 > MOST_MEMBER_BYTES {
            return Err(Fault::TooLarge(name.to_owned()));
        }
        self.bytes += bytes.len() as u64;
        if self.bytes > MOST_BYTES {
            return Err(Fault::TooLarge(SUMS.to_owned()));
        }
        if self.members.len() >= MOST_MEMBERS {
            return Err(Fault::TooMany);
        }
        self.members.insert(member, bytes);
        Ok(())
    }

    /// Adds a file under a name of its own.
    ///
    /// # Errors
    /// As [`Contents::add`], or it cannot be read.
    pub fn add_file(&mut self, name: &str, path: &Path) -> Result<(), Fault> {
        let system = Fault::system(path);
        let file = File::open(path).map_err(&system)?;
        let mut bytes = Vec::new();
        file.take(MOST_MEMBER_BYTES + 1).read_to_end(&mut bytes).map_err(&system)?;
        self.add(name, bytes)
    }

    /// Adds every file of a folder and of the folders in it; hidden ones stay out, and so do those that do not end in
    /// `ending`.
    ///
    /// # Errors
    /// As [`Contents::add_file`]; [`Fault::NotAFile`] where it has a link or a device, since what that would lead to may
    /// be anything.
    pub fn add_folder(&mut self, prefix: &str, folder: &Path, ending: &str) -> Result<(), Fault> {
        let system = Fault::system(folder);
        for entry in fs::read_dir(folder).map_err(&system)? {
            let entry = entry.map_err(&system)?;
            let kind = entry.file_type().map_err(&system)?;
            let file_name = entry.file_name();
            let Some(step) = file_name.to_str() else {
                return Err(Fault::Name(file_name.to_string_lossy().into_owned()));
            };
            let name = format!("{prefix}/{step}");
            if step.starts_with('.') {
                continue;
            } else if kind.is_file() {
                if step.ends_with(ending) {
                    self.add_file(&name, &entry.path())?;
                }
            } else if kind.is_dir() {
                // No member is this deep, so a folder that never ends is refused here.
                MemberName::new(&format!("{name}/x.toml.ftl"))?;
                self.add_folder(&name, &entry.path(), ending)?;
            } else {
                return Err(Fault::NotAFile(name));
            }
        }
        Ok(())
    }

    /// Every member, in the order of their names.
    pub fn members(&self) -> impl ExactSizeIterator<Item = (&MemberName, &[u8])> {
        self.members.iter().map(|(name, bytes)| (name, bytes.as_slice()))
    }

    /// Whether there is a place in it.
    pub fn has_place(&self) -> bool {
        self.members.keys().any(|name| name.as_str() == "place/place.toml")
    }
}
