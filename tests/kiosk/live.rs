//! The real program as a kiosk on a terminal: back to where it was after the power goes, its staff menu, its watchdog, and
//! that no network socket is ever opened.

use std::fs;
use std::io::Write;
use std::os::unix::net::UnixDatagram;
use std::path::Path;
use std::process::{Command, Output, Stdio};
use std::time::{Duration, Instant};

use rustix::process::Signal;

use super::pseudo_terminal::PseudoTerminal;

/// The real program.
const DESHIELO: &str = env!("CARGO_BIN_EXE_deshielo");
/// Long, since the machine may be busy.
const PATIENCE: Duration = Duration::from_secs(60);

/// Starts the kiosk in a terminal, keeping in that folder; `None` where the tools for it are missing.
fn start(with: &[&str], folder: &Path, variables: &[(&str, &str)]) -> Option<PseudoTerminal> {
    let keep = folder.to_str().unwrap();
    let mut line: Vec<&str> = with.to_vec();
    line.extend([DESHIELO, "show", "--kiosk", "--screen", "terminal", "--keep", keep]);
    let terminal = PseudoTerminal::start(line[0], &line[1..], variables, 110, 34);
    if terminal.is_none() {
        println!("skipped: no setsid here");
    }
    terminal
}

fn run(arguments: &[&str], input: &str) -> Output {
    let mut child = Command::new(DESHIELO)
        .args(arguments)
        .env("LANG", "C")
        .stdin(Stdio::piped())
        .stdout(Stdio::piped())
        .stderr(Stdio::piped())
        .spawn()
        .unwrap();
    child.stdin.take().unwrap().write_all(input.as_bytes()).unwrap();
    child.wait_with_output().unwrap()
}

/// Waits until a file holds all those texts.
fn wait_for_file(path: &Path, texts: &[&str]) -> String {
    let end = Instant::now() + PATIENCE;
    loop {
        let text = fs::read_to_string(path).unwrap_or_default();
        if texts.iter().all(|wanted| text.contains(wanted)) {
            return text;
        }
        assert!(Instant::now() < end, "{path:?} never held {texts:?}: {text}");
        std::thread::sleep(Duration::from_millis(50));
    }
}

#[test]
fn it_goes_back_to_where_it_was_and_lets_only_the_staff_in() {
    let folder = tempfile::tempdir().unwrap();
    let keep = folder.path().to_str().unwrap();
    for wrong in ["12", "12a4", ""] {
        assert_eq!(run(&["show", "--set-pin", "--keep", keep], wrong).status.code(), Some(1), "{wrong}");
    }
    assert!(run(&["show", "--set-pin", "--keep", keep], "4711\n").status.success());

    // At the first start it strolls at once; a key takes over and shows what it stands for.
    let Some(mut terminal) = start(&[], folder.path(), &[]) else { return };
    terminal.wait_for("Turn the knob");
    terminal.press("2");
    terminal.wait_until(|screen| !screen.contents().contains("Turn the knob"));
    terminal.press("l");
    wait_for_file(&folder.path().join("settings"), &["\"view\":\"season\"", "\"language\":\"es"]);
    terminal.settle();
    let seen = terminal.contents();
    // The power goes.
    terminal.signal(Signal::KILL);
    drop(terminal);

    let begun = Instant::now();
    let Some(mut terminal) = start(&[], folder.path(), &[]) else { return };
    let heading = seen.lines().find(|line| line.trim().len() > 20).unwrap().trim().to_owned();
    terminal.wait_for(&heading);
    println!("back where it was in {} ms", begun.elapsed().as_millis());

    terminal.press("\x1b[F\x1b[F\x1b[F");
    terminal.wait_for("Personal: clave");
    terminal.press("0815\r");
    terminal.wait_for("Esa no era la clave");
    terminal.press("4711\r");
    terminal.wait_for("Para el personal");
    terminal.press(&"\x1b[A".repeat(12));
    terminal.wait_for("Cerrar el programa");
    terminal.press("\r");
    assert_eq!(terminal.end().0, Some(0));

    let csv = run(&["tally", "--keep", keep, "--form", "csv"], "");
    let csv = String::from_utf8(csv.stdout).unwrap();
    for row in [",visits,,", ",view,season,", ",language,es,"] {
        assert!(csv.contains(row), "{row}: {csv}");
    }
    let table = String::from_utf8(run(&["tally", "--keep", keep, "--lang", "es"], "").stdout).unwrap();
    assert!(table.contains("Visitas") && table.contains("Nada dice quién estuvo"), "{table}");
}

#[test]
fn the_tally_is_told_only_for_days_that_make_sense() {
    let folder = tempfile::tempdir().unwrap();
    let keep = folder.path().to_str().unwrap();
    let empty = run(&["tally", "--keep", keep], "");
    assert!(empty.status.success());
    assert_eq!(String::from_utf8(empty.stdout).unwrap(), "Nothing was counted.\n");
    for wrong in [&["--from", "2026-13-01"][..], &["--from", "2026-02-02", "--to", "2026-02-01"], &["--form", "json"]] {
        let output = run(&[&["tally", "--keep", keep], wrong].concat(), "");
        assert_eq!(output.status.code(), Some(2), "{wrong:?}");
    }
    assert_eq!(run(&["tally", "--keep", "/nowhere/at/all"], "").status.code(), Some(1));
    assert_eq!(fs::read_dir(folder.path()).unwrap().count(), 0, "looking writes nothing");
}

#[test]
fn the_service_manager_hears_of_frames_and_nobody_hears_of_it_over_a_network() {
    let folder = tempfile::tempdir().unwrap();
    let (trace, notify) = (folder.path().join("trace"), folder.path().join("notify"));
    let manager = UnixDatagram::bind(&notify).unwrap();
    manager.set_read_timeout(Some(PATIENCE)).unwrap();
    let variables = [("NOTIFY_SOCKET", notify.to_str().unwrap()), ("WATCHDOG_USEC", "1500000")];
    let tracer = ["strace", "-f", "-qq", "-e", "trace=network", "-o", trace.to_str().unwrap()];
    let has_tracer =
        Command::new("strace").arg("-V").stdout(Stdio::null()).status().is_ok_and(|status| status.success());
    if !has_tracer {
        println!("skipped: no strace here, the sockets are not looked at");
    }
    let with = if has_tracer { &tracer[..] } else { &[] };
    let Some(mut terminal) = start(with, &folder.path().join("keep"), &variables) else { return };
    terminal.wait_for("Turn the knob");
    let hear = || {
        let mut bytes = [0; 64];
        let count = manager.recv(&mut bytes).unwrap();
        String::from_utf8_lossy(&bytes[..count]).into_owned()
    };
    assert_eq!(hear(), "READY=1\nWATCHDOG=1");
    // Nobody touches anything, and it is fed all the same.
    let begun = Instant::now();
    (0..4).for_each(|_| assert_eq!(hear(), "WATCHDOG=1"));
    println!("fed four times in {} ms of 1500 allowed between two", begun.elapsed().as_millis());
    // Through every view, a language, a reset.
    for keys in ["\t", "\t", "\t", "\t", "l", "h", "\x1b", "\x1b[A", "r", " "] {
        terminal.press(keys);
    }
    terminal.settle();
    // A real manager listens all the time; here the queue of the socket must not be full.
    manager.set_nonblocking(true).unwrap();
    let mut bytes = [0; 64];
    while manager.recv(&mut bytes).is_ok() {}
    manager.set_nonblocking(false).unwrap();
    terminal.press("\x03");
    assert_eq!(terminal.end().0, Some(0));
    let mut last = String::new();
    while last != "STOPPING=1" {
        last = hear();
    }
    if has_tracer {
        let trace = fs::read_to_string(&trace).unwrap();
        let sockets: Vec<&str> = trace.lines().filter(|line| line.contains("socket(")).collect();
        assert!(!trace.contains("AF_INET"), "{trace}");
        assert!(sockets.len() == 1 && sockets[0].contains("AF_UNIX"), "{sockets:?}");
        println!("sockets: {sockets:?}");
    }
}
