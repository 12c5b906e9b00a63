//! `wiring`: the wires of a board file as a table, then a test card and every hand live on the board's own screen.

mod desk;
mod table;

use std::path::{Path, PathBuf};

use clap::ArgMatches;

use super::failure::Failure;
use super::output::{deliver, reason};
use super::show::{Request, play_instrument, read_board_file};
use super::speech::Speech;
use super::tell_standard_error;
use super::usage::{mistake, unknown_choice};
use crate::board::file::{BoardFile, ScreenPart};
use crate::board::pictures::{file_name, write};
use crate::board::placing::Placing;
use crate::board::{FrameSize, Instrument, LAYOUTS, Post, ScreenKind};
use crate::words::Words;
use desk::{Desk, Page};

/// The languages of the test card where none was asked for.
const LANGUAGES: [&str; 2] = ["en", "es"];
/// Where pictures go when nobody says.
const FOLDER: &str = "deshielo-pictures";
/// How large they are where no screen says.
const SIZE: FrameSize = FrameSize::new(800, 480);

/// Prints the table and shows the card.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let file = matches.get_one::<PathBuf>("board");
    let board = file.map(|file| read_board_file(file, words)).transpose()?;
    let asked = screens(matches, words)?;
    let size = size(matches, words)?;
    if let Some(board) = &board {
        deliver(table::whole(board, words).as_bytes(), None, words)?;
    }
    let has_language = matches.get_one::<String>("lang").is_some();
    let mut tags = vec![words.tag().to_owned()];
    if !has_language {
        let other = LANGUAGES.into_iter().find(|language| *language != words.language());
        tags.extend(other.map(str::to_owned));
    }
    let voices: Vec<Words> = tags.iter().map(|tag| speech.in_language(tag)).collect();
    if asked.contains(&ScreenKind::Pictures) {
        let size = size.or_else(|| board.as_ref().and_then(size_of)).unwrap_or(SIZE);
        let into = matches.get_one::<PathBuf>("into").map_or(Path::new(FOLDER), PathBuf::as_path);
        write_pictures(board.as_ref(), voices, size, into, words)?;
    }
    let mut screens: Vec<ScreenKind> = asked.into_iter().filter(|kind| *kind != ScreenKind::Pictures).collect();
    if matches.get_one::<String>("screen").is_none() {
        screens = board.as_ref().map(BoardFile::screen_kinds).unwrap_or_default();
        if screens.is_empty() {
            return Err(mistake(&words.say("wiring-nothing", &[]), Some("wiring"), words));
        }
    }
    if screens.is_empty() {
        return Ok(());
    }
    let of_board = matches.get_one::<String>("screen").is_none();
    let voices: Vec<Words> = tags.iter().map(|tag| speech.in_language(tag)).collect();
    let shown = show(board, &screens, size, voices, speech);
    match shown {
        // Whoever plans the wires on another computer has got what was wanted: the table.
        Err(Failure::Input(lines)) if of_board => {
            tell_standard_error(&lines);
            tell_standard_error(&[words.say("wiring-only-table", &[])]);
            Ok(())
        }
        shown => shown,
    }
}

fn show(
    board: Option<BoardFile>,
    screens: &[ScreenKind],
    size: Option<FrameSize>,
    voices: Vec<Words>,
    speech: &Speech,
) -> Result<(), Failure> {
    let (desk, listener) = Desk::new(board.clone(), voices);
    let start_hands = |post: &Post| listener.start(board.as_ref(), post);
    let request = Request { board: board.clone(), size, ..Request::default() };
    play_instrument(desk, screens, speech, &request, &start_hands)
}

fn screens(matches: &ArgMatches, words: &Words) -> Result<Vec<ScreenKind>, Failure> {
    let known = ScreenKind::ALL.map(ScreenKind::name);
    let parse = |name: &String| {
        name.parse().map_err(|_| mistake(&unknown_choice("--screen", name, &known, words), Some("wiring"), words))
    };
    matches.get_many::<String>("screen").into_iter().flatten().map(parse).collect()
}

fn size(matches: &ArgMatches, words: &Words) -> Result<Option<FrameSize>, Failure> {
    let Some(text) = matches.get_one::<String>("size") else { return Ok(None) };
    let known = LAYOUTS.map(|size| size.to_string());
    let known: Vec<&str> = known.iter().map(String::as_str).collect();
    let unknown = |_| mistake(&unknown_choice("--size", text, &known, words), Some("wiring"), words);
    text.parse().map(Some).map_err(unknown)
}

/// The frame of the first screen of a board, as far as its file says.
fn size_of(board: &BoardFile) -> Option<FrameSize> {
    let ((width, height), turned) = match board.screens.first()? {
        ScreenPart::Panel(panel) => ((panel.width_px, panel.height_px), panel.turned),
        ScreenPart::Monitor(monitor) => (monitor.mode_px?, monitor.turned),
    };
    Placing::new(width.into(), height.into(), turned).map(|placing| placing.frame)
}

fn write_pictures(
    board: Option<&BoardFile>,
    voices: Vec<Words>,
    size: FrameSize,
    into: &Path,
    words: &Words,
) -> Result<(), Failure> {
    let mut count = 0_u32;
    for voice in voices {
        let tag = voice.tag().to_owned();
        let (mut desk, _listener) = Desk::new(board.cloned(), vec![voice]);
        for page in desk.pages() {
            desk.turn_to(page);
            let key = match page {
                Page::Colours => "wiring-colours".to_owned(),
                Page::Hands => "wiring-hands".to_owned(),
                Page::Silent(index) => format!("wiring-silent-{}", index + 1),
            };
            let frame = desk.frame(size, false);
            write(into, &file_name(&key, &tag, size), size, frame.pixels).map_err(|error| {
                let arguments = [("path", into.display().to_string().into()), ("reason", reason(&error, words).into())];
                Failure::input(words.say("show-folder-unwritable", &arguments))
            })?;
            count += 1;
        }
    }
    let path = into.display().to_string();
    tell_standard_error(&[words.say("show-pictures-written", &[("n", count.into()), ("path", path.into())])]);
    Ok(())
}
