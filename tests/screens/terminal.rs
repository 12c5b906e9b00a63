//! The terminal: what is seen, what the keys do, and that it is given back as it was.

use rustix::process::Signal;

use crate::counter::AS_COUNTER;
use crate::pseudo_terminal::PseudoTerminal;

/// The real program.
const DESHIELO: &str = env!("CARGO_BIN_EXE_deshielo");

fn counter(columns: u16, rows: u16) -> Option<PseudoTerminal> {
    let program = std::env::current_exe().unwrap();
    let arguments = ["counter::counter_on_a_terminal", "--exact", "--nocapture", "--test-threads=1"];
    started(PseudoTerminal::start(program.to_str().unwrap(), &arguments, &[(AS_COUNTER, "1")], columns, rows))
}

fn started(terminal: Option<PseudoTerminal>) -> Option<PseudoTerminal> {
    if terminal.is_none() {
        println!("skipped: no setsid here");
    }
    terminal
}

#[test]
fn keys_count_and_only_what_changed_is_written() {
    let Some(mut terminal) = counter(80, 24) else { return };
    terminal.wait_for("count 0 in 320x240");
    terminal.wait_for("up: more");
    assert!(terminal.is_raw());
    terminal.settle();
    let before = terminal.written;
    terminal.press("\x1b[A");
    terminal.wait_for("count 1 in 320x240");
    terminal.settle();
    // One digit and the first cell of the bar.
    let bytes = terminal.written - before;
    assert!((1..200).contains(&bytes), "{bytes} bytes for one digit");
    terminal.press("x");
    let (code, contents) = terminal.end();
    assert_eq!(code, Some(0));
    assert!(contents.contains("ended in good order"), "{contents}");
}

#[test]
fn a_larger_terminal_gets_a_larger_layout_and_a_tiny_one_a_word() {
    let Some(mut terminal) = counter(80, 24) else { return };
    terminal.wait_for("count 0 in 320x240");
    terminal.resize(140, 42);
    terminal.wait_for("count 0 in 800x480");
    terminal.resize(30, 10);
    terminal.wait_for("too small");
    terminal.resize(90, 24);
    terminal.wait_for("count 0 in 320x240");
    terminal.press("\x03");
    assert_eq!(terminal.end().0, Some(0));
}

#[test]
fn a_mouse_wheel_turns() {
    let Some(mut terminal) = counter(80, 24) else { return };
    terminal.wait_for("count 0");
    terminal.press("\x1b[<64;10;10M\x1b[<64;10;10M\x1b[<65;10;10M\x1b[<64;10;10M");
    terminal.wait_for("count 2");
    terminal.press("x");
    assert_eq!(terminal.end().0, Some(0));
}

#[test]
fn a_panic_gives_the_terminal_back_and_can_be_read() {
    let Some(mut terminal) = counter(80, 24) else { return };
    terminal.wait_for("count 0");
    terminal.press("p");
    let (code, contents) = terminal.end();
    assert_eq!(code, Some(101));
    assert!(contents.contains("the counter was told to panic"), "{contents}");
}

#[test]
fn signals_end_it_in_good_order() {
    for signal in [Signal::TERM, Signal::INT, Signal::HUP, Signal::QUIT] {
        let Some(mut terminal) = counter(80, 24) else { return };
        terminal.wait_for("count 0");
        terminal.signal(signal);
        let (code, contents) = terminal.end();
        assert_eq!(code, Some(0), "{signal:?}");
        assert!(contents.contains("ended in good order"), "{signal:?} {contents}");
    }
}

#[test]
fn the_demo_is_played_over_a_login() {
    let arguments = ["show", "--lang", "en"];
    let Some(mut terminal) = started(PseudoTerminal::start(DESHIELO, &arguments, &[], 80, 24)) else { return };
    terminal.wait_until(|screen| screen.alternate_screen() && screen.contents().contains("Tresnubes"));
    terminal.settle();
    let before = terminal.contents();
    terminal.press("\x1b[A\x1b[A\x1b[A\x1b[A");
    // Four steps of half a degree, told in the place's units.
    terminal.wait_until(|screen| screen.contents() != before && screen.contents().contains("3.6 °F"));
    terminal.press("l");
    terminal.wait_for("Calentamiento");
    terminal.wait_for("Ctrl+C fin");
    terminal.resize(140, 42);
    terminal.wait_until(|screen| screen.contents().lines().any(|line| line.chars().count() > 100));
    terminal.press("\x03");
    let (code, contents) = terminal.end();
    assert_eq!(code, Some(0));
    // What was chosen, and why, can be read again afterwards.
    assert!(contents.contains("Screen: terminal."), "{contents}");
    assert!(contents.contains("no desktop"), "{contents}");
}
