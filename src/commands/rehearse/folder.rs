//! A folder of pictures that is whole or not there at all.

use std::fs;
use std::io;
use std::path::{Path, PathBuf};

/// Pictures on their way: a folder beside the wanted one that takes its name when all are in.
pub(super) struct Folder {
    wanted: PathBuf,
    making: tempfile::TempDir,
}

/// Why a folder cannot be written.
#[derive(Debug)]
pub(super) enum Refused {
    /// It holds something that no rehearsal has made; this is one such file.
    NotOurs(PathBuf),
    /// The system says.
    System(io::Error),
}

impl From<io::Error> for Refused {
    fn from(error: io::Error) -> Self {
        Refused::System(error)
    }
}

impl Folder {
    /// Begins. An earlier rehearsal in that folder is replaced at the end; anything else is left alone.
    pub fn begin(wanted: &Path) -> Result<Self, Refused> {
        refuse_strangers(wanted)?;
        let parent = match wanted.parent() {
            Some(parent) if !parent.as_os_str().is_empty() => parent.to_owned(),
            _ => PathBuf::from("."),
        };
        fs::create_dir_all(&parent)?;
        let making = tempfile::Builder::new().prefix(".deshielo-").tempdir_in(&parent)?;
        Ok(Self { wanted: wanted.to_owned(), making })
    }

    /// Where the pictures go until then.
    pub fn path(&self) -> &Path {
        self.making.path()
    }

    /// Gives the folder its name.
    pub fn finish(self) -> Result<(), Refused> {
        let Self { wanted, making } = self;
        #[cfg(unix)]
        {
            use std::os::unix::fs::PermissionsExt;
            // A temporary folder is closed to everybody else; pictures of a lesson are to be looked at.
            fs::set_permissions(making.path(), fs::Permissions::from_mode(0o755))?;
        }
        refuse_strangers(&wanted)?;
        let mut earlier = None;
        if wanted.exists() {
            let parent = making.path().parent().unwrap_or(Path::new("."));
            let aside = tempfile::Builder::new().prefix(".deshielo-").tempdir_in(parent)?;
            fs::rename(&wanted, aside.path().join("earlier"))?;
            earlier = Some(aside);
        }
        match fs::rename(making.path(), &wanted) {
            Ok(()) => {
                // It has another name now and is no longer ours to take away.
                let _ = making.keep();
                Ok(())
            }
            Err(error) => {
                if let Some(aside) = earlier {
                    fs::rename(aside.path().join("earlier"), &wanted)?;
                }
                Err(error.into())
            }
        }
    }
}

/// Refuses a folder in which there is anything but pictures of an earlier rehearsal.
fn refuse_strangers(wanted: &Path) -> Result<(), Refused> {
    let entries = match fs::read_dir(wanted) {
        Ok(entries) => entries,
        Err(error) if error.kind() == io::ErrorKind::NotFound => return Ok(()),
        Err(error) => return Err(error.into()),
    };
    for entry in entries {
        let entry = entry?;
        let name = entry.file_name();
        let ours = name.to_str().is_some_and(is_ours);
        if !ours || !entry.file_type()?.is_file() {
            return Err(Refused::NotOurs(entry.path()));
        }
    }
    Ok(())
}

/// Whether a rehearsal names its files so: three figures first, or the contact sheet.
fn is_ours(name: &str) -> bool {
    let numbered = name.len() > 4 && name.bytes().take(3).all(|byte| byte.is_ascii_digit()) && &name[3..4] == "-";
    (numbered || name.starts_with("contact-")) && name.ends_with(".png")
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_folder_comes_whole_and_replaces_only_a_rehearsal() {
        let root = tempfile::tempdir().unwrap();
        let wanted = root.path().join("deep/pictures");
        let folder = Folder::begin(&wanted).unwrap();
        fs::write(folder.path().join("001-start-en-320x240.png"), "one").unwrap();
        assert!(!wanted.exists());
        folder.finish().unwrap();
        let again = Folder::begin(&wanted).unwrap();
        fs::write(again.path().join("contact-en-320x240.png"), "two").unwrap();
        again.finish().unwrap();
        let names: Vec<_> = fs::read_dir(&wanted).unwrap().map(|entry| entry.unwrap().file_name()).collect();
        assert_eq!(names, ["contact-en-320x240.png"]);
        // Nothing is left beside it, not of a rehearsal given up either.
        drop(Folder::begin(&wanted).unwrap());
        assert_eq!(fs::read_dir(root.path().join("deep")).unwrap().count(), 1);
    }

    #[test]
    fn what_is_not_ours_stays() {
        let root = tempfile::tempdir().unwrap();
        fs::write(root.path().join("letter.txt"), "dear").unwrap();
        assert!(matches!(Folder::begin(root.path()), Err(Refused::NotOurs(path)) if path.ends_with("letter.txt")));
        assert!(!is_ours("ñab-.png") && !is_ours("12é-a.png") && is_ours("123-a.png"));
    }
}
