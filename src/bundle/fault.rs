//! Why a bundle was not made or not opened, as data.

use std::io;
use std::path::{Path, PathBuf};

/// What is wrong. Names are shown as they were found.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum Fault {
    /// The system says no.
    System {
        /// Where.
        path: PathBuf,
        /// What it says.
        reason: io::ErrorKind,
    },
    /// The file is no bundle, or one that was damaged or tampered with as an archive.
    NotABundle,
    /// A newer program made it, in this format.
    Newer(u32),
    /// A member's name could lead out of the folder, or is none that a bundle has.
    Name(String),
    /// Two members have the same name on some computers.
    Twice(String),
    /// A member is a link, a folder or a device, or a folder to be packed has one.
    NotAFile(String),
    /// There are more members than [`super::MOST_MEMBERS`].
    TooMany,
    /// A member, or all of them, or the file is too large.
    TooLarge(String),
    /// A member is not what the list of sums says.
    Sum(String),
    /// A member that the list of sums has is missing.
    Missing(String),
    /// A member is not in the list of sums.
    Unlisted(String),
    /// The folder to open it into is there and not empty.
    Occupied(PathBuf),
    /// There is no place in it.
    NoPlace,
}

impl Fault {
    /// What the system said of a path.
    pub(super) fn system(path: &Path) -> impl Fn(io::Error) -> Fault + '_ {
        move |error| Fault::System { path: path.to_owned(), reason: error.kind() }
    }

    /// The message that tells it.
    pub fn message(&self) -> &'static str {
        match self {
            Fault::System { .. } => "bundle-system",
            Fault::NotABundle => "bundle-not-one",
            Fault::Newer(_) => "bundle-newer",
            Fault::Name(_) => "bundle-name",
            Fault::Twice(_) => "bundle-twice",
            Fault::NotAFile(_) => "bundle-not-a-file",
            Fault::TooMany => "bundle-too-many",
            Fault::TooLarge(_) => "bundle-too-large",
            Fault::Sum(_) => "bundle-sum",
            Fault::Missing(_) => "bundle-missing",
            Fault::Unlisted(_) => "bundle-unlisted",
            Fault::Occupied(_) => "bundle-occupied",
            Fault::NoPlace => "bundle-no-place",
        }
    }

    /// What the message is about: a member or a path; empty where it is about the whole.
    pub fn about(&self) -> String {
        match self {
            Fault::System { path, .. } | Fault::Occupied(path) => path.display().to_string(),
            Fault::Newer(format) => format.to_string(),
            // Whoever made the name may have put anything into it; a screen gets no control characters.
            Fault::Name(name)
            | Fault::Twice(name)
            | Fault::NotAFile(name)
            | Fault::TooLarge(name)
            | Fault::Sum(name)
            | Fault::Missing(name)
            | Fault::Unlisted(name) => name.chars().take(80).flat_map(char::escape_debug).collect(),
            Fault::NotABundle | Fault::TooMany | Fault::NoPlace => String::new(),
        }
    }
}
