//! Where the files of a place are: a folder, or texts built into the program.

use std::fs;
use std::path::{Component, Path, PathBuf};

use super::problem::{Location, Problem};

/// Largest `place.toml` that is read, in bytes; a thousand times a long one.
const MOST_PLACE_BYTES: u64 = 4 << 20;
/// Largest record that is read, in bytes; two centuries of days need some 10 MB.
const MOST_RECORD_BYTES: u64 = 64 << 20;

/// Where the files of a place come from.
#[derive(Clone, Copy, Debug)]
pub enum Source<'a> {
    /// A folder with `place.toml` in it.
    Folder(&'a Path),
    /// File names, as `place.toml` says them, with their texts.
    Embedded(&'a [(&'a str, &'a str)]),
}

impl Source<'_> {
    /// How the user would name this file of the place.
    pub(super) fn shown(&self, name: &str) -> PathBuf {
        match self {
            Source::Folder(folder) => folder.join(name),
            Source::Embedded(_) => PathBuf::from(name),
        }
    }

    /// The text of `place.toml`.
    pub(super) fn place_text(&self) -> Result<String, Problem> {
        let whole = Location::whole_file(self.shown("place.toml"));
        let bytes = self.bytes("place.toml", MOST_PLACE_BYTES, &whole)?;
        text(bytes, self.shown("place.toml"))
    }

    /// The bytes of a file that the place names; `at` is where it names it.
    pub(super) fn record(&self, name: &str, at: &Location) -> Result<Vec<u8>, Problem> {
        let inside = !name.is_empty()
            && !name.contains('\\')
            && Path::new(name).components().all(|part| matches!(part, Component::Normal(_)));
        if !inside {
            // A place is carried about as one folder; what lies outside would be left behind.
            return Err(Problem::error(at.clone(), "problem-file-outside").with("file", name));
        }
        self.bytes(name, MOST_RECORD_BYTES, at)
    }

    /// The text of a small table that the place names.
    pub(super) fn table_text(&self, name: &str, at: &Location) -> Result<String, Problem> {
        let bytes = self.record(name, at)?;
        text(bytes, self.shown(name))
    }

    fn bytes(&self, name: &str, most: u64, at: &Location) -> Result<Vec<u8>, Problem> {
        let missing = |problem: &'static str| Problem::error(at.clone(), problem).with("file", name);
        match self {
            Source::Embedded(files) => files
                .iter()
                .find(|(file, _)| *file == name)
                .map(|(_, text)| text.as_bytes().to_vec())
                .ok_or_else(|| missing("problem-file-missing")),
            Source::Folder(folder) => {
                let path = folder.join(name);
                let about = fs::metadata(&path).map_err(|error| {
                    let is_missing = error.kind() == std::io::ErrorKind::NotFound;
                    missing(if is_missing { "problem-file-missing" } else { "problem-file-unreadable" })
                })?;
                if !about.is_file() {
                    return Err(missing("problem-file-no-file"));
                }
                if about.len() > most {
                    let megabytes = (most >> 20) as usize;
                    return Err(missing("problem-file-large").with("most", megabytes));
                }
                fs::read(&path).map_err(|_| missing("problem-file-unreadable"))
            }
        }
    }
}

/// Bytes as text; a byte-order mark at the start is passed over.
pub(super) fn text(bytes: Vec<u8>, shown: PathBuf) -> Result<String, Problem> {
    if is_two_byte_text(&bytes) {
        return Err(Problem::error(Location::whole_file(shown), "problem-utf16"));
    }
    let text = String::from_utf8(bytes).map_err(|error| {
        let good = error.utf8_error().valid_up_to();
        let before = String::from_utf8_lossy(&error.as_bytes()[..good]);
        Problem::error(Location::of_span(shown, &before, good..good), "problem-not-utf8")
    })?;
    Ok(text.strip_prefix('\u{feff}').map(str::to_owned).unwrap_or(text))
}

/// Whether text is stored with two bytes a letter: by its mark, or by a zero beside every letter of plain English.
pub(super) fn is_two_byte_text(bytes: &[u8]) -> bool {
    let marked = bytes.starts_with(b"\xFF\xFE") || bytes.starts_with(b"\xFE\xFF");
    let start = &bytes[..bytes.len().min(256)];
    let zeros = |first: usize| start.iter().skip(first).step_by(2).filter(|byte| **byte == 0).count();
    marked || (start.len() >= 8 && zeros(0).abs_diff(zeros(1)) * 2 > start.len() / 2)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_place_keeps_to_its_folder() {
        let source = Source::Embedded(&[("a.csv", "x")]);
        let at = Location::whole_file("place.toml");
        assert_eq!(source.record("a.csv", &at), Ok(b"x".to_vec()));
        for name in ["", "/etc/hosts", "../a.csv", "b/../../a.csv", "..\\a.csv"] {
            assert_eq!(source.record(name, &at).unwrap_err().message, "problem-file-outside", "{name}");
        }
        assert_eq!(source.record("b.csv", &at).unwrap_err().message, "problem-file-missing");
    }

    #[test]
    fn a_folder_is_no_file_and_a_loop_is_not_missing() {
        let folder = std::env::temp_dir().join(format!("deshielo-source-{}", std::process::id()));
        fs::create_dir_all(folder.join("days.csv")).unwrap();
        let (source, at) = (Source::Folder(&folder), Location::whole_file("place.toml"));
        assert_eq!(source.record("days.csv", &at).unwrap_err().message, "problem-file-no-file");
        #[cfg(unix)]
        {
            std::os::unix::fs::symlink("loop.csv", folder.join("loop.csv")).unwrap();
            assert_eq!(source.record("loop.csv", &at).unwrap_err().message, "problem-file-unreadable");
        }
        fs::remove_dir_all(&folder).unwrap();
    }

    #[test]
    fn a_stray_byte_is_shown_where_it_is() {
        let problem = text(b"a = 1\nb = \"\xf1\"".to_vec(), "place.toml".into()).unwrap_err();
        assert_eq!((problem.at.line, problem.at.column), (2, 6));
        assert_eq!(text("\u{feff}a".into(), "x".into()).unwrap(), "a");
        for utf16 in [&b"\xff\xfe[\0p\0"[..], b"\xfe\xff\0[\0p", b"[\0p\0l\0a\0c\0e\0]\0"] {
            assert_eq!(text(utf16.to_vec(), "x".into()).unwrap_err().message, "problem-utf16");
        }
    }
}
