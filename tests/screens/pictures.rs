//! Pictures in a folder, and what `show` says of screens that are not there.

use std::path::Path;
use std::process::{Command, Output, Stdio};

fn show(arguments: &[&str], folder: &Path) -> Output {
    Command::new(env!("CARGO_BIN_EXE_deshielo"))
        .arg("show")
        .args(arguments)
        .current_dir(folder)
        .env_remove("DISPLAY")
        .env_remove("WAYLAND_DISPLAY")
        .env("LANG", "C")
        .stdin(Stdio::null())
        .output()
        .unwrap()
}

fn names(folder: &Path) -> Vec<String> {
    let mut names: Vec<String> =
        std::fs::read_dir(folder).unwrap().map(|entry| entry.unwrap().file_name().into_string().unwrap()).collect();
    names.sort();
    names
}

#[test]
fn every_view_is_written_in_each_language() {
    let folder = tempfile::tempdir().unwrap();
    let output = show(&["--screen", "pictures", "--into", "out", "--size", "320x240"], folder.path());
    let said = String::from_utf8(output.stderr).unwrap();
    assert!(output.status.success(), "{said}");
    let names = names(&folder.path().join("out"));
    // Seven views in two languages, and the further sheets of about.
    assert!(names.len() > 14 && said.contains(&names.len().to_string()), "{names:?} {said}");
    let sheets = |language| names.iter().filter(|name| name.starts_with("about-") && name.contains(language)).count();
    assert!(sheets("en-US") >= 3 && sheets("es-US") >= 3, "{names:?}");
    assert!(names.contains(&"valley-en-US-320x240.png".to_owned()), "{names:?}");
    assert!(names.contains(&"canals-es-US-320x240.png".to_owned()), "{names:?}");
    for view in ["ledger", "years", "trust", "about"] {
        assert!(names.contains(&format!("{view}-en-US-320x240.png")), "{view}: {names:?}");
    }
    for name in names {
        let file = std::io::BufReader::new(std::fs::File::open(folder.path().join("out").join(&name)).unwrap());
        let info = png::Decoder::new(file).read_info().unwrap();
        assert_eq!((info.info().width, info.info().height), (320, 240), "{name}");
    }
}

#[test]
fn without_desktop_and_terminal_there_are_pictures_and_a_summary() {
    let folder = tempfile::tempdir().unwrap();
    let output = show(&["--lang", "es"], folder.path());
    let (told, said) = (String::from_utf8(output.stdout).unwrap(), String::from_utf8(output.stderr).unwrap());
    assert!(output.status.success(), "{said}");
    assert!(said.contains("Pantalla: imágenes."), "{said}");
    assert!(told.contains("Tresnubes"), "{told}");
    assert!(names(&folder.path().join("deshielo-pictures")).iter().all(|name| name.contains("-es-")));
}

#[test]
fn screens_that_this_build_cannot_use_are_refused_in_words() {
    let folder = tempfile::tempdir().unwrap();
    for name in ["panel", "framebuffer", "terminal", "window"] {
        let output = show(&["--screen", name], folder.path());
        let said = String::from_utf8(output.stderr).unwrap();
        assert_eq!(output.status.code(), Some(1), "{name}: {said}");
        assert!(said.starts_with("This screen cannot be used here:"), "{name}: {said}");
    }
    for wrong in [["--screen", "windw"], ["--size", "321x240"], ["--theme", "pink"], ["--units", "cubits"]] {
        assert_eq!(show(&wrong, folder.path()).status.code(), Some(2), "{wrong:?}");
    }
    assert!(names(folder.path()).is_empty());
}

#[test]
fn a_folder_that_cannot_be_made_is_told() {
    let folder = tempfile::tempdir().unwrap();
    std::fs::write(folder.path().join("taken"), "").unwrap();
    let output = show(&["--screen", "pictures", "--into", "taken"], folder.path());
    assert_eq!(output.status.code(), Some(1));
    assert!(String::from_utf8(output.stderr).unwrap().contains("taken"));
}
