//! The few things that keeping asks of a file system, so that a test can fail or cut at any of them.

use std::io;

/// A folder of a few small files, each known by its name.
pub trait FileLayer {
    /// The bytes of a file; `None` where there is none. At most `most` bytes and one more are read.
    ///
    /// # Errors
    /// What the system says.
    fn read(&self, name: &str, most: usize) -> io::Result<Option<Vec<u8>>>;

    /// Makes a file, or empties the one of that name, and writes the bytes. They need not be on the card yet.
    ///
    /// # Errors
    /// What the system says; any part of the bytes may have been written.
    fn write(&mut self, name: &str, bytes: &[u8]) -> io::Result<()>;

    /// Brings the bytes of a file to the card.
    ///
    /// # Errors
    /// What the system says; nothing is known of the file then.
    fn sync(&mut self, name: &str) -> io::Result<()>;

    /// Gives a file another name, in place of any file of that name. It need not be on the card yet.
    ///
    /// # Errors
    /// What the system says.
    fn rename(&mut self, from: &str, to: &str) -> io::Result<()>;

    /// Brings all names to the card.
    ///
    /// # Errors
    /// What the system says.
    fn sync_names(&mut self) -> io::Result<()>;

    /// Removes a file; one that is not there is no error.
    ///
    /// # Errors
    /// What the system says.
    fn remove(&mut self, name: &str) -> io::Result<()>;
}
