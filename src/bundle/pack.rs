//! From contents to the bytes of a bundle; the same contents are always the same bytes.

use std::io::{Cursor, Write};

use zip::write::SimpleFileOptions;
use zip::{CompressionMethod, DateTime, System, ZipWriter};

use super::sums::{Entries, Entry, sum_of, write};
use super::{Contents, Fault, MOST_FILE_BYTES, SUMS};

/// How hard to compress, from 1 to 9: bundles are made once and carried often.
const LEVEL: i64 = 9;

impl Contents {
    /// The bytes of the bundle.
    ///
    /// # Errors
    /// [`Fault::TooLarge`] where they are more than a bundle may have, [`Fault::NoPlace`] where no place is in it.
    pub fn pack(&self) -> Result<Vec<u8>, Fault> {
        if !self.has_place() {
            return Err(Fault::NoPlace);
        }
        let entries: Entries = self
            .members()
            .map(|(name, bytes)| (name.clone(), Entry { length: bytes.len() as u64, sum: sum_of(bytes) }))
            .collect();
        let sums = write(&entries);
        let mut archive = ZipWriter::new(Cursor::new(Vec::new()));
        // No clock, no owner and no system of this computer goes in.
        let options = SimpleFileOptions::default()
            .compression_method(CompressionMethod::Deflated)
            .compression_level(Some(LEVEL))
            .last_modified_time(DateTime::default())
            .system(System::Unix)
            .unix_permissions(0o644);
        let all = std::iter::once((SUMS, sums.as_bytes()));
        for (name, bytes) in all.chain(self.members().map(|(name, bytes)| (name.as_str(), bytes))) {
            let written = archive.start_file(name, options);
            written.map_err(|_| Fault::TooLarge(name.to_owned()))?;
            archive.write_all(bytes).map_err(|_| Fault::TooLarge(name.to_owned()))?;
        }
        let bytes = archive.finish().map_err(|_| Fault::TooLarge(SUMS.to_owned()))?.into_inner();
        if bytes.len() as u64 > MOST_FILE_BYTES { Err(Fault::TooLarge(SUMS.to_owned())) } else { Ok(bytes) }
    }
}
