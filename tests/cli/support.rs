//! Running the program.

use std::path::{Path, PathBuf};
use std::process::{Command, Output};

/// A fresh folder in which the program runs.
pub struct Bench {
    folder: tempfile::TempDir,
}

/// What a run gave.
pub struct Run {
    /// Exit code.
    pub code: i32,
    /// Standard output.
    pub out: String,
    /// Standard error.
    pub err: String,
}

impl Bench {
    /// An empty folder.
    pub fn new() -> Self {
        Self { folder: tempfile::tempdir().unwrap() }
    }

    /// Where it is.
    pub fn path(&self, name: &str) -> PathBuf {
        self.folder.path().join(name)
    }

    /// Names of what is in it, sorted.
    pub fn names(&self) -> Vec<String> {
        let entries = std::fs::read_dir(self.folder.path()).unwrap();
        let mut names: Vec<String> = entries.map(|entry| entry.unwrap().file_name().into_string().unwrap()).collect();
        names.sort();
        names
    }

    /// The program, with no language from outside.
    pub fn command(&self) -> Command {
        let mut command = Command::new(env!("CARGO_BIN_EXE_deshielo"));
        command.current_dir(self.folder.path());
        for name in ["LC_ALL", "LC_MESSAGES", "LANG"] {
            command.env_remove(name);
        }
        command
    }

    /// Runs the program.
    pub fn run(&self, arguments: &[&str]) -> Run {
        told(self.command().args(arguments).output().unwrap())
    }

    /// Copies a test place into the folder under `name`.
    pub fn with_place(self, name: &str) -> Self {
        let target = self.path(name);
        std::fs::create_dir(&target).unwrap();
        for file in ["place.toml", "rights.csv", "weather.csv", "gauge.csv", "snow.csv"] {
            std::fs::copy(place_folder().join(file), target.join(file)).unwrap();
        }
        self
    }
}

/// What a finished program gave.
pub fn told(output: Output) -> Run {
    let text = |bytes: Vec<u8>| String::from_utf8(bytes).expect("the program writes UTF-8");
    Run { code: output.status.code().expect("not killed"), out: text(output.stdout), err: text(output.stderr) }
}

/// Runs the program in a fresh folder.
pub fn run(arguments: &[&str]) -> Run {
    Bench::new().run(arguments)
}

/// The small place of the tests.
pub fn place_folder() -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/places/good")
}

/// The same, as an argument.
pub fn place() -> String {
    place_folder().to_str().unwrap().to_owned()
}
