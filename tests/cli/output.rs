//! Files are whole or not there at all; a reader that goes away is no error.

use super::support::{Bench, place, run, told};

#[test]
fn an_answer_goes_to_a_file_as_it_would_to_the_screen() {
    let bench = Bench::new();
    let place = place();
    let screen = bench.run(&["tell", &place, "--form", "json"]).out;
    let file = bench.run(&["tell", &place, "--form", "json", "--out", "answer.json"]);
    assert_eq!((file.code, file.out.as_str(), file.err.as_str()), (0, "", ""));
    assert_eq!(std::fs::read_to_string(bench.path("answer.json")).unwrap(), screen);
    assert_eq!(bench.names(), ["answer.json"]);
}

#[test]
fn a_folder_is_no_target() {
    let bench = Bench::new();
    std::fs::create_dir(bench.path("there")).unwrap();
    let told = bench.run(&["tell", "--out", "there"]);
    assert_eq!((told.code, told.err.contains("there is a folder")), (1, true), "{}", told.err);
    let told = bench.run(&["tell", "--out", "no/such/folder/a.json", "--lang", "es"]);
    assert_eq!(told.code, 1);
    assert!(told.err.contains("No se escribió nada") && told.err.contains("no está"), "{}", told.err);
    assert_eq!(bench.names(), ["there"]);
}

#[cfg(target_os = "linux")]
#[test]
fn a_full_disk_is_told_and_nothing_is_half_written() {
    let bench = Bench::new();
    let full = std::fs::OpenOptions::new().write(true).open("/dev/full").unwrap();
    let output = bench.command().args(["tell", "--lang", "en"]).stdout(full).output().unwrap();
    let run = told(output);
    assert_eq!(run.code, 1);
    assert!(run.err.contains("cannot be written") && run.err.contains("no room left"), "{}", run.err);

    // A limit on the size of files stands in for a full disk; the shell keeps its signal away.
    std::fs::write(bench.path("answer.json"), "before").unwrap();
    let mut shell = std::process::Command::new("sh");
    let line = "trap '' XFSZ; ulimit -f 8; exec \"$0\" tell --form json --out answer.json --lang en";
    shell.current_dir(bench.path("")).args(["-c", line, env!("CARGO_BIN_EXE_deshielo")]);
    let run = told(shell.output().unwrap());
    assert_eq!(run.code, 1, "{}", run.err);
    assert!(run.err.contains("no room left") && run.err.contains("Nothing was written"), "{}", run.err);
    assert_eq!(std::fs::read_to_string(bench.path("answer.json")).unwrap(), "before");
    assert_eq!(bench.names(), ["answer.json"]);
}

#[cfg(unix)]
#[test]
fn a_reader_that_has_seen_enough_is_no_error() {
    use std::io::Read;
    let bench = Bench::new();
    let mut child = bench
        .command()
        .args(["tell", "--daily", "--form", "csv"])
        .stdout(std::process::Stdio::piped())
        .stderr(std::process::Stdio::piped())
        .spawn()
        .unwrap();
    let mut first = [0; 4];
    child.stdout.take().unwrap().read_exact(&mut first).unwrap();
    assert_eq!(&first, b"run,");
    let run = told(child.wait_with_output().unwrap());
    assert_eq!((run.code, run.err.as_str()), (0, ""));
}

#[cfg(target_os = "linux")]
#[test]
fn a_device_is_written_to_and_not_replaced() {
    let told = run(&["tell", &place(), "--out", "/dev/null"]);
    assert_eq!((told.code, told.err.as_str()), (0, ""));
    assert!(!std::fs::metadata("/dev/null").unwrap().is_file());
}

#[test]
fn nothing_is_told_but_the_answer_where_nobody_watches() {
    let told = run(&["weather", "--years", "2"]);
    assert_eq!((told.code, told.err.as_str()), (0, ""), "no progress bar without a terminal");
}

#[test]
fn without_a_word_the_demo_is_told_and_where_help_is() {
    // Nobody sits at a terminal here, so that pictures are written as well; tests/screens looks at those.
    let told = run(&[]);
    assert_eq!(told.code, 0, "{}", told.err);
    assert!(told.err.starts_with("Screen: pictures."), "{}", told.err);
    assert!(told.out.starts_with("Tresnubes") && told.out.contains("deshielo --help"));
    assert!(told.out.contains("not a forecast"));
}
