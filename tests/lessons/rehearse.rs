//! `deshielo rehearse` and `deshielo show --lesson` as a person would call them.

use std::fs;
use std::path::Path;
use std::process::Command;

fn run(arguments: &[&str], folder: &Path) -> (i32, String) {
    let mut command = Command::new(env!("CARGO_BIN_EXE_deshielo"));
    let output = command.args(arguments).current_dir(folder).output().unwrap();
    assert!(output.stdout.is_empty());
    (output.status.code().unwrap(), String::from_utf8(output.stderr).unwrap())
}

fn names(folder: &Path) -> Vec<String> {
    let mut names: Vec<String> =
        fs::read_dir(folder).unwrap().map(|entry| entry.unwrap().file_name().into_string().unwrap()).collect();
    names.sort();
    names
}

#[test]
fn a_script_is_played_line_by_line_and_pictures_are_numbered() {
    let folder = tempfile::tempdir().unwrap();
    let script =
        "# two turns of the first dial\nturn 2\npicture warm\nkey Tab\nwait 100\ndial warming -1\npicture cooler\n";
    fs::write(folder.path().join("a.txt"), script).unwrap();
    let (code, told) =
        run(&["rehearse", "--steps", "a.txt", "--into", "out", "--size", "320x240", "--lang", "en"], folder.path());
    assert_eq!((code, told.as_str()), (0, "3 pictures are in out.\n"));
    let wanted = ["001-warm-en-US-320x240.png", "002-cooler-en-US-320x240.png", "contact-en-US-320x240.png"];
    assert_eq!(names(&folder.path().join("out")), wanted);
    // Without a word of pictures there is one at the start and one after every event; the folder is replaced whole.
    fs::write(folder.path().join("a.txt"), "turn 2\npress\n").unwrap();
    let (code, _) =
        run(&["rehearse", "--steps", "a.txt", "--into", "out", "--size", "240x240", "--lang", "es"], folder.path());
    assert_eq!(code, 0);
    let wanted = [
        "001-start-es-US-240x240.png",
        "002-turn-2-es-US-240x240.png",
        "003-press-es-US-240x240.png",
        "contact-es-US-240x240.png",
    ];
    assert_eq!(names(&folder.path().join("out")), wanted);
    assert_eq!(names(folder.path()), ["a.txt", "out"]);
}

#[test]
fn mistakes_are_told_at_the_line_and_nothing_is_written() {
    let folder = tempfile::tempdir().unwrap();
    fs::write(folder.path().join("a.txt"), "press\ntwist 3\n").unwrap();
    let (code, told) = run(&["rehearse", "--steps", "a.txt", "--into", "out", "--lang", "en"], folder.path());
    assert_eq!(code, 1);
    assert!(told.starts_with("a.txt:2: “twist 3” is no event.\n"), "{told}");
    for (arguments, code, said) in [
        (&["rehearse", "--into", "out"][..], 2, "--lesson or --steps"),
        (&["rehearse", "--lesson", "line_the_canal"], 2, "--into FOLDER"),
        (&["rehearse", "--lesson", "line_the_cana", "--into", "out"], 1, "Did you mean “line_the_canal”?"),
        (&["rehearse", "--lesson", "mine.toml", "--into", "out"], 1, "There is no file mine.toml"),
        (&["rehearse", "--lesson", "line_the_canal", "--into", "out", "--groups", "13"], 2, "from 1 to 12"),
        (&["rehearse", "piedranieve", "--lesson", "dry_year_full_reservoir", "--into", "out"], 1, "starting_storage"),
        (&["show", "--screen", "pictures", "--lesson", "nothing_like_it", "--into", "out"], 1, "There is no lesson"),
    ] {
        let (came, told) = run(&[arguments, &["--lang", "en"]].concat(), folder.path());
        assert!(came == code && told.contains(said), "{arguments:?}: {came} {told}");
    }
    assert_eq!(names(folder.path()), ["a.txt"]);
    fs::create_dir(folder.path().join("out")).unwrap();
    fs::write(folder.path().join("out/notes.txt"), "mine").unwrap();
    let (code, told) = run(&["rehearse", "--lesson", "line_the_canal", "--into", "out", "--lang", "en"], folder.path());
    assert!(code == 1 && told.contains("notes.txt"), "{told}");
    assert_eq!(names(&folder.path().join("out")), ["notes.txt"]);
}

#[test]
fn a_script_can_play_a_lesson() {
    let folder = tempfile::tempdir().unwrap();
    // One group: read, look, what may be said, the next prompt, a guess, the result.
    let script = "press\npress\npress\npress\npress\npicture prompt\npress\nturn -3\npress\npress\npicture result\n";
    fs::write(folder.path().join("a.txt"), script).unwrap();
    let (code, told) = run(
        &[
            "rehearse",
            "--lesson",
            "earlier_water",
            "--steps",
            "a.txt",
            "--into",
            "out",
            "--groups",
            "1",
            "--size",
            "320x240",
            "--lang",
            "en",
        ],
        folder.path(),
    );
    assert_eq!((code, told.as_str()), (0, "3 pictures are in out.\n"));
}
