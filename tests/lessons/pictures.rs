//! The pictures of lessons: nothing overlaps or is cut off on any page, golden pictures of every kind of page, and a
//! checksum for each page of each lesson as the real program draws it.

use std::collections::BTreeMap;
use std::fmt::Write;
use std::fs;
use std::path::{Path, PathBuf};
use std::process::Command;

use deshielo::lesson::{Phase, lessons};
use deshielo::picture::Theme;
use deshielo::picture::views::lesson::{LessonScene, Saying, draw, draw_strip, strip_px};
use deshielo::session::lesson::{Choice, Part, ShelfEntry};
use deshielo::words::{KNOWN_TAGS, Words};
use embedded_graphics::geometry::Size;

use super::goldens::{check, paint};
use super::room::{Room, course};
use super::scenes::{Land, PAGES, Play, draw as draw_view, steep_valley};

const SIZES: [(u16, u16); 7] = [(240, 240), (240, 320), (320, 240), (480, 320), (800, 480), (1280, 720), (1920, 1080)];

/// Walks through a lesson, every group guessing elsewhere, and calls `page` on every page.
fn walk(name: &str, groups: u8, mut page: impl FnMut(&Room)) {
    let mut room = Room::new(course(name));
    room.led.ask_groups(groups);
    page(&room);
    room.press();
    let mut turn = 0;
    for _ in 0..400 {
        page(&room);
        if room.led.part() == Part::Over {
            return;
        }
        if room.led.progress().map(|progress| progress.phase()) == Some(Phase::Guess) && room.led.choices().is_empty() {
            turn = (turn + 7) % 29;
            room.turn(turn - 14);
            page(&room);
        }
        room.press();
    }
    panic!("{name} has no end");
}

fn faults(scene: &LessonScene, what: &str, sizes: &[(u16, u16)]) -> Vec<String> {
    let mut found = Vec::new();
    for &(wide, high) in sizes {
        let (_, strict) = paint(wide, high, |canvas| draw(canvas, scene, &Theme::LIGHT));
        found.extend(strict.faults().iter().map(|fault| format!("{what} at {wide}x{high}: {fault}")));
    }
    found
}

fn told(found: &[String]) -> String {
    format!("{} faults\n{}", found.len(), found[..found.len().min(40)].join("\n"))
}

#[test]
fn no_page_of_any_lesson_has_text_over_text_or_text_cut_off() {
    let (english, spanish) = (Words::new("en-US").0, Words::new("es-US").0);
    let chile = Words::new("es-CL").0;
    let mut found = Vec::new();
    for (name, _) in lessons() {
        let mut seen: Vec<LessonScene> = Vec::new();
        walk(name, 4, |room| {
            for (words, second) in [(&english, None), (&spanish, None), (&chile, None), (&english, Some(&spanish))] {
                let scene = room.scene(words, second);
                if !seen.contains(&scene) {
                    found.extend(faults(&scene, &format!("{name} {} {:?}", words.tag(), scene.step), &SIZES));
                    seen.push(scene);
                }
                for (wide, high) in SIZES {
                    let screen = Size::new(wide.into(), high.into());
                    let voices = deshielo::session::lesson::Voices { words, second, system: words.system() };
                    let Some((saying, step, hint)) = room.led.strip(voices) else { continue };
                    let tall = strip_px(screen, second.is_some()) as u16;
                    let beside = (step.as_str(), hint.as_str());
                    let (_, strict) =
                        paint(wide, tall, |canvas| draw_strip(canvas, screen, &saying, beside, &Theme::LIGHT));
                    let what = format!("{name} {} strip {wide}x{high}", words.tag());
                    found.extend(strict.faults().iter().map(|fault| format!("{what}: {fault}")));
                }
            }
        });
    }
    for words in [&english, &spanish, &chile] {
        assert_eq!(words.take_errors(), []);
    }
    assert!(found.is_empty(), "{}", told(&found));
}

#[test]
fn crowded_and_odd_pages_hold_too() {
    let mut found = Vec::new();
    for tag in KNOWN_TAGS {
        let words = Words::new(tag).0;
        // Twelve groups that all say nearly the same, and twelve far apart.
        for spread in [0, 3] {
            let mut room = Room::new(course("earlier_water"));
            room.led.ask_groups(12);
            found.extend(faults(&room.scene(&words, None), &format!("{tag} twelve"), &SIZES));
            room.press();
            room.until_guess();
            for group in 0..12 {
                room.turn((group - 6) * spread);
                room.press();
                found.extend(faults(&room.scene(&words, None), &format!("{tag} twelve guess"), &SIZES));
            }
            room.press();
            found.extend(faults(&room.scene(&words, None), &format!("{tag} twelve reveal"), &SIZES));
        }
        // Every choice, the word that is typed, and the notes.
        let mut room = Room::new(course("who_is_cut_first"));
        room.led.ask_groups(2);
        room.press();
        room.until_guess();
        room.hold();
        for _ in 0..room.led.choices().len() {
            found.extend(faults(&room.scene(&words, None), &format!("{tag} {:?}", room.led.choice()), &SIZES));
            room.turn(1);
        }
        while room.led.choice() != Some(Choice::Word) {
            room.turn(1);
        }
        room.press();
        for letter in ['v', 'a', 'a', 'g', 'o', 'm', 'i', 'k'] {
            room.step(deshielo::session::Event::Key(deshielo::session::keys::Key::Char(letter)));
            found.extend(faults(&room.scene(&words, None), &format!("{tag} word {letter}"), &SIZES));
        }
        room.hold();
        room.hold();
        found.extend(faults(&room.scene(&words, None), &format!("{tag} cleared"), &SIZES));
        // The list, each entry open.
        let entries: Vec<ShelfEntry> = lessons().iter().map(|(name, _)| entry(name)).collect();
        let mut list = deshielo::session::lesson::Led::new(entries);
        let state = deshielo::session::State::new(&super::room::offer());
        let mut state = state;
        let show = deshielo::session::Command::Show(deshielo::session::View::Lesson);
        state.step(deshielo::session::Event::Command(show), &super::room::offer());
        for _ in 0..8 {
            let voices = deshielo::session::lesson::Voices { words: &words, second: None, system: words.system() };
            found.extend(faults(&list.scene(voices), &format!("{tag} list"), &SIZES));
            list.take(deshielo::session::Event::Command(deshielo::session::Command::Turn(1)), &state);
        }
        assert_eq!(words.take_errors(), [], "{tag}");
    }
    assert!(found.is_empty(), "{}", told(&found));
}

fn entry(name: &str) -> ShelfEntry {
    let course = course(name);
    let lesson = course.lesson;
    ShelfEntry { key: name.to_owned(), name: lesson.name, text: lesson.text, minutes: lesson.minutes }
}

#[test]
fn views_over_the_strip_lose_nothing() {
    let mut found = Vec::new();
    for (tag, two) in [("en-US", false), ("es-US", false), ("es-CL", false), ("en-US", true)] {
        let (words, second) = (Words::new(tag).0, Words::new("es-US").0);
        let play = Play { units: words.system(), second: two.then_some(&second), ..Play::warm() };
        Land::new(steep_valley(), 4, 5).show(play, |scene| {
            for (wide, high) in SIZES {
                let high = high - strip_px(Size::new(wide.into(), high.into()), two) as u16;
                for view in PAGES {
                    let (_, strict) = paint(wide, high, |canvas| draw_view(view, canvas, scene, &Theme::LIGHT, &words));
                    let at = format!("{} in {tag} at {wide}x{high}", view.key());
                    found.extend(strict.faults().iter().map(|fault| format!("{at}: {fault}")));
                }
            }
        });
    }
    assert!(found.is_empty(), "{}", told(&found));
}

#[test]
fn no_size_makes_a_page_panic() {
    let words = Words::new("es-US").0;
    let mut pages = Vec::new();
    walk("who_is_cut_first", 5, |room| pages.push(room.scene(&words, None)));
    for scene in pages {
        for (wide, high) in [(0, 0), (1, 1), (7, 300), (300, 7), (64, 48), (120, 900), (4000, 20), (333, 251)] {
            paint(wide, high, |canvas| draw(canvas, &scene, &Theme::DARK));
            let saying = Saying { first: "Una frase".into(), second: None };
            let screen = Size::new(wide.into(), high.into());
            paint(wide, high, |canvas| draw_strip(canvas, screen, &saying, ("Paso", "Oprima"), &Theme::DARK));
        }
    }
}

/// The pages of which a golden picture is kept: one of every kind.
#[test]
fn every_kind_of_page_in_both_languages() {
    for tag in ["en-US", "es-US"] {
        let words = Words::new(tag).0;
        let mut pages: BTreeMap<&str, LessonScene> = BTreeMap::new();
        walk("earlier_water", 5, |room| {
            let scene = room.scene(&words, None);
            let far = room.led.progress().is_some_and(|progress| progress.step() >= 5);
            let kind = match (room.led.part(), room.led.progress().map(|progress| progress.phase())) {
                (Part::Start, _) => "start",
                (Part::Over, _) => "over",
                (_, Some(Phase::Prompt)) => "prompt",
                (_, Some(Phase::Guess)) if room.led.choices().is_empty() => "guess",
                (_, Some(Phase::Guess)) => "all-in",
                (_, Some(Phase::Reveal)) => "reveal",
                _ => "talk",
            };
            if far || kind == "start" {
                pages.entry(kind).or_insert(scene);
            }
        });
        assert_eq!(pages.len(), 7);
        for (kind, scene) in &pages {
            for (wide, high) in [(320, 240), (800, 480)] {
                let name = format!("lesson-{kind}-{tag}-{wide}x{high}");
                check(&name, wide, high, |canvas| draw(canvas, scene, &Theme::LIGHT));
            }
        }
        if tag == "es-US" {
            for (wide, high) in [(240, 240), (240, 320), (480, 320), (1280, 720), (1920, 1080)] {
                let name = format!("lesson-reveal-{tag}-{wide}x{high}");
                check(&name, wide, high, |canvas| draw(canvas, &pages["reveal"], &Theme::LIGHT));
            }
            check("lesson-guess-dark-320x240", 320, 240, |canvas| draw(canvas, &pages["guess"], &Theme::DARK));
            check("lesson-reveal-sunlight-320x240", 320, 240, |canvas| {
                draw(canvas, &pages["reveal"], &Theme::SUNLIGHT)
            });
        }
    }
}

/// FNV-1a with 64 bits (Fowler, Noll and Vo; offset and prime from memory): enough to notice that a picture changed.
fn checksum(bytes: &[u8]) -> u64 {
    bytes.iter().fold(0xcbf2_9ce4_8422_2325, |sum, byte| (sum ^ u64::from(*byte)).wrapping_mul(0x0100_0000_01b3))
}

fn pixels(path: &Path) -> Vec<u8> {
    let file = std::io::BufReader::new(fs::File::open(path).unwrap());
    let mut reader = png::Decoder::new(file).read_info().unwrap();
    let mut data = vec![0; reader.output_buffer_size().unwrap()];
    reader.next_frame(&mut data).unwrap();
    data
}

/// Every page of every lesson as `rehearse` writes it, in both languages and two sizes, held by its checksum.
#[test]
fn every_page_of_every_lesson_is_the_picture_that_was_looked_at() {
    let folder = tempfile::tempdir().unwrap();
    let mut list = String::new();
    for (name, _) in lessons() {
        for size in ["320x240", "800x480"] {
            let into = folder.path().join(format!("{name}-{size}"));
            let output = Command::new(env!("CARGO_BIN_EXE_deshielo"))
                .args(["rehearse", "--lesson", name, "--size", size, "--into"])
                .arg(&into)
                .output()
                .unwrap();
            assert!(output.status.success(), "{}", String::from_utf8_lossy(&output.stderr));
            let mut files: Vec<PathBuf> = fs::read_dir(&into).unwrap().map(|entry| entry.unwrap().path()).collect();
            files.sort();
            for file in files {
                let file_name = file.file_name().unwrap().to_str().unwrap();
                writeln!(list, "{name} {file_name} {:016x}", checksum(&pixels(&file))).unwrap();
            }
        }
    }
    let golden = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/lessons/pictures.txt");
    if std::env::var_os("DESHIELO_WRITE_GOLDEN").is_some_and(|value| value == "1") {
        fs::write(&golden, &list).unwrap();
    }
    let kept = fs::read_to_string(&golden).unwrap_or_default();
    let changed: Vec<&str> = list.lines().filter(|line| !kept.lines().any(|kept| kept == *line)).collect();
    assert!(
        changed.is_empty(),
        "{} pictures changed; rehearse, look, and write anew:\n{}",
        changed.len(),
        changed[..changed.len().min(30)].join("\n")
    );
    assert_eq!(list.lines().count(), kept.lines().count());
}
