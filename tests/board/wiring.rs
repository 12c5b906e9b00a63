//! The command `wiring`: its table for every example, the test card in both languages, and nothing that is cut off.

use std::path::{Path, PathBuf};
use std::process::{Command, Output, Stdio};

use deshielo::board::file::{WireEnd, WireTo, WiredPart, read_board};
use deshielo::picture::Theme;
use deshielo::picture::views::staff::{self, Body, StaffCard};
use deshielo::picture::views::test_card::{HandRow, HandsCard, Mark, draw_colours, draw_hands};
use deshielo::words::{KNOWN_TAGS, Words};

use crate::goldens::{check, paint};

const SIZES: [(u16, u16); 7] = [(240, 240), (240, 320), (320, 240), (480, 320), (800, 480), (1280, 720), (1920, 1080)];
const SILENT: [&str; 6] = [
    "silent-screen",
    "silent-input-device",
    "silent-touchscreen",
    "silent-encoder",
    "silent-button",
    "silent-converter",
];

fn row(name: String, value: String, mark: Mark, level: Option<f64>) -> HandRow {
    HandRow { name, value, mark, level }
}

/// Hands in every state.
fn rows(words: &Words) -> Vec<HandRow> {
    let say = |id: &str| words.say(id, &[]);
    let knob = |dial: &str, input: u32| {
        words.say("hand-knob", &[("dial", words.say(dial, &[]).into()), ("input", input.into())])
    };
    let share = |percent: u32| words.say("hand-share", &[("percent", percent.to_string().into())]);
    let contacts = [("a", say("hand-open").into()), ("b", say("hand-closed").into())];
    vec![
        row(
            words.say("hand-encoder", &[("a", 5.into()), ("b", 6.into())]),
            words.say("hand-contacts", &contacts),
            Mark::Silent,
            None,
        ),
        row(words.say("hand-shaft-button", &[("pin", 13.into())]), say("hand-held"), Mark::Heard, None),
        row(words.say("hand-button", &[("pin", 23.into())]), say("hand-stuck-button"), Mark::Wrong, None),
        row(knob("dial-warming.short", 0), share(47), Mark::Fresh, Some(0.47)),
        row(knob("dial-winter-precipitation.short", 1), say("hand-stuck-loose"), Mark::Wrong, Some(0.9)),
        row(knob("dial-canal-lining.short", 3), share(0), Mark::Silent, Some(0.0)),
        row(
            words.say("hand-touchscreen", &[("name", "ADS7846 Touchscreen".into())]),
            say("hand-lost"),
            Mark::Wrong,
            None,
        ),
    ]
}

#[test]
fn the_card_looks_as_it_did() {
    for (tag, wide, high) in
        [("en-US", 320, 240), ("es-CL", 320, 240), ("en-US", 800, 480), ("es-CL", 240, 240), ("es-CL", 480, 320)]
    {
        let (words, _) = Words::new(tag);
        let name = |what: &str| format!("wiring-{what}-{tag}-{wide}x{high}");
        check(&name("colours"), wide, high, |canvas| draw_colours(canvas, &words));
        let (rows, advice) = (rows(&words), words.say("wiring-stuck", &[]));
        let card = HandsCard { rows: &rows, at: 3, advice: &advice };
        check(&name("hands"), wide, high, |canvas| draw_hands(canvas, &card, &Theme::LIGHT, &words));
        let (title, text) = (words.say("silent-converter.title", &[]), words.say("silent-converter", &[]));
        let foot = words.say("wiring-foot", &[]);
        let card = StaffCard { title: &title, body: Body::Text(&text), foot: &foot };
        check(&name("silent"), wide, high, |canvas| staff::draw(canvas, &card, &Theme::LIGHT));
    }
}

#[test]
fn nothing_is_cut_off_in_any_language_at_any_size() {
    let mut faults = Vec::new();
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        let rows = rows(&words);
        let foot = words.say("wiring-foot", &[]);
        for (wide, high) in SIZES {
            let mut note = |what: &str, strict: &deshielo::picture::strict::Strict| {
                faults.extend(strict.faults().iter().map(|fault| format!("{what} {tag} {wide}x{high}: {fault}")));
            };
            note("colours", &paint(wide, high, |canvas| draw_colours(canvas, &words)).1);
            for id in ["silent-encoder.brief", "silent-button.brief", "wiring-stuck", "wiring-touch-each"] {
                let advice = words.say(id, &[]);
                let card = HandsCard { rows: &rows, at: 6, advice: &advice };
                note(id, &paint(wide, high, |canvas| draw_hands(canvas, &card, &Theme::LIGHT, &words)).1);
            }
            for id in SILENT {
                let (title, text) = (words.say(&format!("{id}.title"), &[]), words.say(id, &[]));
                let card = StaffCard { title: &title, body: Body::Text(&text), foot: &foot };
                note(id, &paint(wide, high, |canvas| staff::draw(canvas, &card, &Theme::LIGHT)).1);
            }
        }
        assert_eq!(words.take_errors(), [], "{tag}");
    }
    assert!(faults.is_empty(), "{}", faults.join("\n"));
}

fn examples() -> Vec<PathBuf> {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR")).join("cross/boards");
    let files = std::fs::read_dir(folder).unwrap().map(|entry| entry.unwrap().path());
    files.filter(|path| path.extension().is_some_and(|extension| extension == "toml")).collect()
}

fn wiring(arguments: &[&str], folder: &Path) -> Output {
    Command::new(env!("CARGO_BIN_EXE_deshielo"))
        .arg("wiring")
        .args(arguments)
        .current_dir(folder)
        .env("LANG", "C")
        .env_remove("DISPLAY")
        .env_remove("WAYLAND_DISPLAY")
        .stdin(Stdio::null())
        .output()
        .unwrap()
}

#[test]
fn every_example_has_a_table_and_pictures_in_both_languages() {
    for file in examples() {
        let text = std::fs::read_to_string(&file).unwrap();
        let board = read_board(&file, &text, &KNOWN_TAGS).board.unwrap();
        for tag in ["en", "es"] {
            let folder = tempfile::tempdir().unwrap();
            let arguments = [file.to_str().unwrap(), "--lang", tag, "--screen", "pictures", "--into", "out"];
            let output = wiring(&arguments, folder.path());
            let said = String::from_utf8(output.stderr).unwrap();
            assert!(output.status.success(), "{said}");
            let table = String::from_utf8(output.stdout).unwrap();
            let electrician = if tag == "en" { "licensed electrician" } else { "electricista autorizado" };
            let squeezed = table.split_whitespace().collect::<Vec<_>>().join(" ");
            assert!(squeezed.contains(electrician) && !table.contains('{'), "{table}");
            for wiring in board.wiring() {
                for (_, to) in wiring.wires {
                    if let WireTo::Pin(pin, _) = to {
                        assert!(table.contains(&format!("GPIO {}", pin.0)), "{pin:?} {table}");
                    }
                }
            }
            let pictures = std::fs::read_dir(folder.path().join("out")).unwrap().count();
            assert!(pictures >= 4 && said.contains(&pictures.to_string()), "{pictures} {said}");
        }
    }
}

#[test]
fn a_computer_without_the_board_still_prints_the_table() {
    let file = Path::new(env!("CARGO_MANIFEST_DIR")).join("cross/boards/st7789-240x240.toml");
    if Path::new("/dev/spidev0.0").exists() {
        println!("skipped: this may be such a board");
        return;
    }
    let folder = tempfile::tempdir().unwrap();
    let output = wiring(&[file.to_str().unwrap(), "--lang", "en"], folder.path());
    let said = String::from_utf8(output.stderr).unwrap();
    assert!(output.status.success() && said.contains("only the table was printed"), "{said}");
    assert!(String::from_utf8(output.stdout).unwrap().contains("backlight (BL, LED)"));
    let output = wiring(&[], folder.path());
    assert_eq!(output.status.code(), Some(2));
}

#[test]
fn wires_go_where_the_file_says() {
    let file = Path::new(env!("CARGO_MANIFEST_DIR")).join("cross/boards/hdmi-1280x720-dials.toml");
    let board = read_board(&file, &std::fs::read_to_string(&file).unwrap(), &KNOWN_TAGS).board.unwrap();
    let wiring = board.wiring();
    let of = |hand| &wiring.iter().find(|wiring| wiring.part == WiredPart::Hand(hand)).unwrap().wires;
    let to = |hand, end| of(hand).iter().find(|(other, _)| *other == end).map(|(_, to)| to.clone());
    // The second converter answers at 0x49: its address pin goes to its supply.
    assert_eq!(to(0, WireEnd::AddressChoice), Some(WireTo::Ground));
    assert_eq!(to(1, WireEnd::AddressChoice), Some(WireTo::Supply));
    let place = |to: Option<WireTo>| match to {
        Some(WireTo::Pin(pin, place)) => (pin.0, place),
        other => panic!("{other:?}"),
    };
    assert_eq!(place(to(0, WireEnd::SerialData)), (2, Some(3)));
    assert_eq!(place(to(0, WireEnd::SerialClock)), (3, Some(5)));
    assert_eq!(place(to(2, WireEnd::Contact)), (23, Some(16)));
    assert_eq!(to(2, WireEnd::Common), Some(WireTo::Ground));
    assert_eq!(of(4).len(), 0, "a keyboard is plugged in");
}
