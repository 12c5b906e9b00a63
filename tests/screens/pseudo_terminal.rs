//! A program in a terminal of its own, and what a person would see of it.

use std::fs::{File, OpenOptions};
use std::io::{Read, Write};
use std::os::fd::OwnedFd;
use std::process::{Child, Command, Stdio};
use std::sync::mpsc::{self, Receiver, RecvTimeoutError};
use std::time::{Duration, Instant};

use rustix::process::{Pid, Signal, kill_process};
use rustix::pty::{OpenptFlags, grantpt, openpt, ptsname, unlockpt};
use rustix::termios::{LocalModes, Termios, Winsize, tcgetattr, tcsetwinsize};

/// Long, since the machine may be busy; waiting ends when what is waited for is there.
const PATIENCE: Duration = Duration::from_secs(60);

pub struct PseudoTerminal {
    master: File,
    slave: File,
    child: Child,
    output: Receiver<Vec<u8>>,
    screen: vt100::Parser,
    before: Termios,
    /// Bytes that the program has written so far.
    pub written: usize,
}

impl PseudoTerminal {
    /// Starts `program` on a terminal of that size; `None` where the tool that gives it the terminal is missing.
    pub fn start(
        program: &str,
        arguments: &[&str],
        variables: &[(&str, &str)],
        columns: u16,
        rows: u16,
    ) -> Option<Self> {
        let master = openpt(OpenptFlags::RDWR | OpenptFlags::NOCTTY).unwrap();
        grantpt(&master).unwrap();
        unlockpt(&master).unwrap();
        let name = ptsname(&master, Vec::new()).unwrap().into_string().unwrap();
        let slave = OpenOptions::new().read(true).write(true).open(name).unwrap();
        tcsetwinsize(&slave, size(columns, rows)).unwrap();
        let before = tcgetattr(&slave).unwrap();
        let end = || Stdio::from(OwnedFd::from(slave.try_clone().unwrap()));
        let child = Command::new("setsid")
            .arg("--ctty")
            .arg(program)
            .args(arguments)
            .env("TERM", "xterm-256color")
            .env("COLORTERM", "truecolor")
            .env("LANG", "en_US.UTF-8")
            .env("RUST_BACKTRACE", "0")
            .env_remove("DISPLAY")
            .env_remove("WAYLAND_DISPLAY")
            .envs(variables.iter().copied())
            .stdin(end())
            .stdout(end())
            .stderr(end())
            .spawn()
            .ok()?;
        let master = File::from(master);
        let mut reader = master.try_clone().unwrap();
        let (sender, output) = mpsc::channel();
        std::thread::spawn(move || {
            let mut buffer = [0; 4096];
            while let Ok(count) = reader.read(&mut buffer) {
                if count == 0 || sender.send(buffer[..count].to_vec()).is_err() {
                    return;
                }
            }
        });
        let screen = vt100::Parser::new(rows, columns, 0);
        Some(Self { master, slave, child, output, screen, before, written: 0 })
    }

    /// Waits until the screen looks as wanted.
    pub fn wait_until(&mut self, wanted: impl Fn(&vt100::Screen) -> bool) {
        let end = Instant::now() + PATIENCE;
        while !wanted(self.screen.screen()) {
            let left = end.saturating_duration_since(Instant::now());
            assert!(!left.is_zero(), "never came:\n{}", self.screen.screen().contents());
            self.take(left.min(Duration::from_millis(200)));
        }
    }

    /// Waits until the screen holds that text.
    pub fn wait_for(&mut self, text: &str) {
        self.wait_until(|screen| screen.contents().contains(text));
    }

    /// Takes what comes until nothing came for a while.
    pub fn settle(&mut self) {
        while self.take(Duration::from_millis(300)) {}
    }

    fn take(&mut self, patience: Duration) -> bool {
        match self.output.recv_timeout(patience) {
            Ok(bytes) => {
                self.written += bytes.len();
                self.screen.process(&bytes);
                true
            }
            Err(RecvTimeoutError::Timeout) => false,
            Err(RecvTimeoutError::Disconnected) => {
                std::thread::sleep(patience);
                false
            }
        }
    }

    pub fn contents(&self) -> String {
        self.screen.screen().contents()
    }

    pub fn press(&mut self, keys: &str) {
        self.master.write_all(keys.as_bytes()).unwrap();
    }

    pub fn resize(&mut self, columns: u16, rows: u16) {
        self.screen.screen_mut().set_size(rows, columns);
        tcsetwinsize(&self.slave, size(columns, rows)).unwrap();
    }

    pub fn signal(&self, signal: Signal) {
        kill_process(Pid::from_child(&self.child), signal).unwrap();
    }

    /// Keys come one by one and unseen.
    pub fn is_raw(&self) -> bool {
        !tcgetattr(&self.slave).unwrap().local_modes.intersects(LocalModes::ICANON | LocalModes::ECHO)
    }

    /// Waits for the end, and checks that the terminal is as it was. Gives back the exit code, `None` after a signal.
    pub fn end(mut self) -> (Option<i32>, String) {
        let end = Instant::now() + PATIENCE;
        let status = loop {
            self.take(Duration::from_millis(50));
            match self.child.try_wait().unwrap() {
                Some(status) => break status,
                None => assert!(Instant::now() < end, "does not end"),
            }
        };
        self.settle();
        let screen = self.screen.screen();
        assert!(!screen.alternate_screen(), "the second screen is still there");
        assert!(!screen.hide_cursor(), "the cursor is still hidden");
        assert_eq!(screen.mouse_protocol_mode(), vt100::MouseProtocolMode::None);
        let now = tcgetattr(&self.slave).unwrap();
        assert_eq!(now.local_modes, self.before.local_modes);
        assert_eq!(now.input_modes, self.before.input_modes);
        assert_eq!(now.output_modes, self.before.output_modes);
        (status.code(), screen.contents())
    }
}

impl Drop for PseudoTerminal {
    fn drop(&mut self) {
        let _ = self.child.kill();
        let _ = self.child.wait();
    }
}

fn size(columns: u16, rows: u16) -> Winsize {
    Winsize { ws_row: rows, ws_col: columns, ws_xpixel: 0, ws_ypixel: 0 }
}
