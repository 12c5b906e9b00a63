//! Bundles to work with, good ones and crafted ones.

use std::fs;
use std::io::{Cursor, Write};
use std::path::{Path, PathBuf};

use deshielo::bundle::Contents;
use sha2::{Digest, Sha256};
use zip::write::SimpleFileOptions;
use zip::{CompressionMethod, ZipWriter};

pub const PLACE: &str = "place/place.toml";

/// A small bundle; `mark` makes it differ from another.
pub fn contents(mark: &str) -> Contents {
    let mut contents = Contents::new();
    contents.add(PLACE, format!("# {mark}\n").into_bytes()).unwrap();
    contents.add("place/weather.csv", b"date,tmin_c\n".repeat(500)).unwrap();
    contents.add("lessons/snow.toml", b"[[step]]\n".to_vec()).unwrap();
    contents.add("locales/qu/terms.ftl", "agua = yaku\n".into()).unwrap();
    contents.add("board.toml", b"[board]\n".to_vec()).unwrap();
    contents
}

/// The list of sums as whoever attacks would write it.
pub fn sums(members: &[(&str, &[u8])]) -> String {
    let mut text = "deshielo-bundle 1\n".to_owned();
    for (name, bytes) in members {
        let sum: String = Sha256::digest(bytes).iter().map(|byte| format!("{byte:02x}")).collect();
        text.push_str(&format!("{sum} {} {name}\n", bytes.len()));
    }
    text
}

/// An archive with a list of sums and any members, as the crate for archives writes it without asking.
pub fn archive(sums: &str, members: &[(&str, &[u8])]) -> Vec<u8> {
    archive_with(sums, |zip, options| {
        for (name, bytes) in members {
            zip.start_file(*name, options).unwrap();
            zip.write_all(bytes).unwrap();
        }
    })
}

pub fn archive_with(sums: &str, add: impl FnOnce(&mut ZipWriter<Cursor<Vec<u8>>>, SimpleFileOptions)) -> Vec<u8> {
    let mut zip = ZipWriter::new(Cursor::new(Vec::new()));
    let options = SimpleFileOptions::default().compression_method(CompressionMethod::Deflated);
    zip.start_file("SUMS", options).unwrap();
    zip.write_all(sums.as_bytes()).unwrap();
    add(&mut zip, options);
    zip.finish().unwrap().into_inner()
}

/// A folder to open things in.
pub struct Desk {
    folder: tempfile::TempDir,
}

impl Desk {
    pub fn new() -> Self {
        Self { folder: tempfile::tempdir().unwrap() }
    }

    pub fn path(&self, name: &str) -> PathBuf {
        self.folder.path().join(name)
    }

    pub fn put(&self, name: &str, bytes: &[u8]) -> PathBuf {
        let path = self.path(name);
        fs::write(&path, bytes).unwrap();
        path
    }

    pub fn names(&self) -> Vec<String> {
        names(self.folder.path())
    }
}

pub fn names(folder: &Path) -> Vec<String> {
    let entries = fs::read_dir(folder).unwrap();
    let mut names: Vec<String> = entries.map(|entry| entry.unwrap().file_name().into_string().unwrap()).collect();
    names.sort();
    names
}
