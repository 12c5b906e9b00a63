//! A desktop of its own for a test: a display without a monitor, and hands for it.

use std::io::{BufRead, BufReader};
use std::path::Path;
use std::process::{Child, Command, Stdio};

/// A virtual display; ends with its owner.
pub struct Desktop {
    server: Child,
    /// Its name, as in `:7`.
    pub display: String,
}

impl Desktop {
    /// `None` where the display, the hands or the camera are not installed.
    pub fn start(width: u32, height: u32) -> Option<Self> {
        let there =
            |tool: &str| Command::new(tool).arg("-version").stdout(Stdio::null()).stderr(Stdio::null()).status();
        if there("xdotool").is_err() || there("import").is_err() {
            return None;
        }
        let screen = format!("{width}x{height}x24");
        let mut server = Command::new("Xvfb")
            .args(["-displayfd", "1", "-nolisten", "tcp", "-screen", "0", &screen])
            .stdout(Stdio::piped())
            .stderr(Stdio::null())
            .spawn()
            .ok()?;
        let mut number = String::new();
        BufReader::new(server.stdout.take()?).read_line(&mut number).ok()?;
        Some(Self { server, display: format!(":{}", number.trim()) })
    }

    /// Lets the hands do something.
    pub fn hands(&self, arguments: &[&str]) -> String {
        let output = Command::new("xdotool").args(arguments).env("DISPLAY", &self.display).output().unwrap();
        String::from_utf8(output.stdout).unwrap()
    }

    /// What is on the whole display: width, height, and red, green, blue of each pixel.
    pub fn look(&self, file: &Path) -> (u32, u32, Vec<u8>) {
        let target = format!("png24:{}", file.display());
        let done = Command::new("import")
            .args(["-window", "root", "-depth", "8", &target])
            .env("DISPLAY", &self.display)
            .status();
        assert!(done.unwrap().success());
        let mut reader = png::Decoder::new(BufReader::new(std::fs::File::open(file).unwrap())).read_info().unwrap();
        let mut bytes = vec![0; reader.output_buffer_size().unwrap()];
        let info = reader.next_frame(&mut bytes).unwrap();
        bytes.truncate(info.buffer_size());
        (info.width, info.height, bytes)
    }
}

impl Drop for Desktop {
    fn drop(&mut self) {
        let _ = self.server.kill();
        let _ = self.server.wait();
    }
}
