//! The window on a display of its own, driven by real key events.

use std::process::{Child, Command, Stdio};
use std::time::{Duration, Instant};

use crate::desktop::Desktop;

/// Long, since the machine may be busy; waiting ends when what is waited for is there.
const PATIENCE: Duration = Duration::from_secs(60);

struct Program(Child);

impl Drop for Program {
    fn drop(&mut self) {
        let _ = self.0.kill();
        let _ = self.0.wait();
    }
}

fn wait_until(what: &str, mut is_so: impl FnMut() -> bool) {
    let end = Instant::now() + PATIENCE;
    while !is_so() {
        assert!(Instant::now() < end, "never came: {what}");
        std::thread::sleep(Duration::from_millis(100));
    }
}

#[test]
fn real_keys_turn_the_dial_and_end_it() {
    if !cfg!(feature = "window") {
        return println!("skipped: built without a window");
    }
    let Some(desktop) = Desktop::start(1024, 768) else {
        return println!("skipped: no Xvfb, xdotool or import here");
    };
    let folder = tempfile::tempdir().unwrap();
    let file = folder.path().join("seen.png");
    let program = Command::new(env!("CARGO_BIN_EXE_deshielo"))
        .args(["show", "--lang", "en", "--size", "320x240"])
        .env("DISPLAY", &desktop.display)
        .env_remove("WAYLAND_DISPLAY")
        .stdin(Stdio::null())
        .stderr(Stdio::piped())
        .spawn()
        .unwrap();
    let mut program = Program(program);
    let mut window = String::new();
    wait_until("the window", || {
        window = desktop.hands(&["search", "--onlyvisible", "--name", "Tresnubes"]).trim().to_owned();
        !window.is_empty()
    });
    desktop.hands(&["windowfocus", "--sync", &window]);
    let mut before = Vec::new();
    wait_until("a picture", || {
        before = desktop.look(&file).2;
        before.chunks(3).any(|pixel| pixel != [0, 0, 0])
    });
    std::thread::sleep(Duration::from_millis(500));
    // 320 × 240 goes twice into nine tenths of 1024 × 768, in whole multiples: every second pixel repeats the one before.
    let (width, _, before) = desktop.look(&file);
    let row = &before[(100 * width as usize) * 3..(100 * width as usize + 640) * 3];
    assert!(row.chunks(6).all(|pair| pair[..3] == pair[3..]), "not enlarged in whole pixels");
    desktop.hands(&["key", "Up"]);
    wait_until("another picture after a key", || desktop.look(&file).2 != before);
    // The note that all is as it was goes with the next event.
    desktop.hands(&["key", "r", "key", "Home"]);
    wait_until("the first picture after a reset", || desktop.look(&file).2 == before);
    // A finger along the dial, in pixels of the window.
    desktop.hands(&["mousemove", "--window", &window, "60", "420", "mousedown", "1"]);
    for x in ["120", "240", "400"] {
        desktop.hands(&["mousemove", "--window", &window, x, "420"]);
    }
    desktop.hands(&["mouseup", "1"]);
    wait_until("another picture after a drag", || desktop.look(&file).2 != before);
    desktop.hands(&["key", "r", "key", "Home"]);
    wait_until("the first picture after another reset", || desktop.look(&file).2 == before);
    // A tap of a few milliseconds is not lost, and the wheel turns as the key does.
    desktop.hands(&["mousemove", "100", "100", "click", "4"]);
    wait_until("another picture after the wheel", || desktop.look(&file).2 != before);
    desktop.hands(&["key", "ctrl+q"]);
    wait_until("the end", || program.0.try_wait().unwrap().is_some());
    assert!(program.0.try_wait().unwrap().unwrap().success());
    let mut said = String::new();
    std::io::Read::read_to_string(&mut program.0.stderr.take().unwrap(), &mut said).unwrap();
    assert!(said.contains("Screen: window."), "{said}");
}
