//! A folder of the real file system.

use std::fs::{self, File};
use std::io::{self, ErrorKind, Read, Write};
use std::path::{Path, PathBuf};

use super::layer::FileLayer;

/// A folder on a disk or card. It is made with the first write.
#[derive(Clone, Debug)]
pub struct Folder {
    path: PathBuf,
}

impl Folder {
    /// The folder at `path`; nothing is touched yet.
    pub fn new(path: PathBuf) -> Self {
        Self { path }
    }

    /// Where it is.
    pub fn path(&self) -> &Path {
        &self.path
    }
}

impl FileLayer for Folder {
    fn read(&self, name: &str, most: usize) -> io::Result<Option<Vec<u8>>> {
        let file = match File::open(self.path.join(name)) {
            Ok(file) => file,
            Err(error) if error.kind() == ErrorKind::NotFound => return Ok(None),
            Err(error) => return Err(error),
        };
        let mut bytes = Vec::new();
        file.take(most as u64 + 1).read_to_end(&mut bytes)?;
        Ok(Some(bytes))
    }

    fn write(&mut self, name: &str, bytes: &[u8]) -> io::Result<()> {
        fs::create_dir_all(&self.path)?;
        let mut options = fs::OpenOptions::new();
        options.write(true).create(true).truncate(true);
        #[cfg(unix)]
        {
            use std::os::unix::fs::OpenOptionsExt;
            // Nobody else has to read it.
            options.mode(0o600);
        }
        options.open(self.path.join(name))?.write_all(bytes)
    }

    fn sync(&mut self, name: &str) -> io::Result<()> {
        File::options().write(true).open(self.path.join(name))?.sync_all()
    }

    fn rename(&mut self, from: &str, to: &str) -> io::Result<()> {
        fs::rename(self.path.join(from), self.path.join(to))
    }

    fn sync_names(&mut self) -> io::Result<()> {
        // Only where folders can be opened as files is there anything to do.
        if cfg!(unix) { File::open(&self.path)?.sync_all() } else { Ok(()) }
    }

    fn remove(&mut self, name: &str) -> io::Result<()> {
        match fs::remove_file(self.path.join(name)) {
            Err(error) if error.kind() == ErrorKind::NotFound => Ok(()),
            outcome => outcome,
        }
    }
}
