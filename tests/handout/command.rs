//! Running the program in a folder of its own, and reading what it wrote.

use std::path::PathBuf;
use std::process::Command;

/// A fresh folder.
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

    /// Runs the program; its exit code, standard output and standard error.
    pub fn run(&self, line: &str) -> (i32, String, String) {
        let mut command = Command::new(env!("CARGO_BIN_EXE_deshielo"));
        for name in ["LC_ALL", "LC_MESSAGES", "LANG"] {
            command.env_remove(name);
        }
        let told = command.current_dir(self.folder.path()).args(line.split(' ')).output().unwrap();
        let text = |bytes: Vec<u8>| String::from_utf8(bytes).unwrap();
        (told.status.code().unwrap(), text(told.stdout), text(told.stderr))
    }

    /// Runs the program, which must succeed, and gives the file.
    pub fn write(&self, line: &str, name: &str) -> Vec<u8> {
        let (code, _, err) = self.run(line);
        assert_eq!(code, 0, "{line}: {err}");
        std::fs::read(self.path(name)).unwrap()
    }

    pub fn write_text(&self, line: &str, name: &str) -> String {
        String::from_utf8(self.write(line, name)).unwrap()
    }
}

/// Everything that is written in a drawing, with one blank between two words.
pub fn said_in(svg: &str) -> String {
    let mut said = String::new();
    for part in svg.split("<text ").skip(1) {
        let text = part.split_once('>').unwrap().1.split_once("</text>").unwrap().0;
        let text = text.replace("&lt;", "<").replace("&gt;", ">").replace("&quot;", "\"").replace("&amp;", "&");
        said.push_str(&text.replace(['\u{a0}', '\u{202f}', '\u{2009}'], " "));
        said.push(' ');
    }
    said.split_whitespace().collect::<Vec<_>>().join(" ")
}

/// How many pages a PDF has.
pub fn pages_of(pdf: &[u8]) -> usize {
    let text = String::from_utf8_lossy(pdf);
    let pages = text.matches("/Type /Page").count() - text.matches("/Type /Pages").count();
    assert!(pages > 0);
    pages
}
