//! A board file in, checked values out: which screens and hands a board has, when it rests, and how it starts.
//!
//! `cross/boards/` has examples, and a page that says what each key is for. Every mistake is told at its line, all of them at once, as
//! with a place. Nothing here touches hardware, so that `deshielo check` reads a board file on any computer.

mod chips;
mod hands;
mod hours;
mod pins;
mod read_hands;
mod read_screens;
mod screens;
mod units;
mod wires;

use std::path::Path;

use crate::board::choose::ScreenKind;
use crate::place::Text;
use crate::place::problem::{Location, Problem, Severity};
use crate::place::section::Section;
use crate::place::text::need_names;
use crate::place::tree::Sheet;

pub use chips::{PanelChip, Processor};
pub use hands::{
    ButtonDoes, ButtonPart, ConverterChip, ConverterPart, DialInput, EncoderPart, HandPart, InputDevicePart, Pull,
    TouchCalibration, TouchscreenPart, Turns,
};
pub use hours::{Idle, Night, NightLight, TimeOfDay};
pub use pins::Pin;
pub use screens::{Backlight, MonitorPart, MonitorWay, PanelPart, ScreenPart, SpiAddress, Turned, WordBits};
pub use wires::{WireEnd, WireTo, WiredPart, Wiring};

/// The GPIO chip where a file names none.
const USUAL_GPIO_CHIP: &str = "/dev/gpiochip0";

/// A board file that has been read and checked.
#[derive(Clone, Debug, PartialEq)]
pub struct BoardFile {
    /// What the board is, for people: its processor and the parts on it.
    pub name: Option<Text>,
    /// The family of its processor.
    pub processor: Processor,
    /// The device whose lines the pins are: `/dev/gpiochip0`.
    pub gpio_chip: String,
    /// Pins that something else uses.
    pub reserved_pins: Vec<Pin>,
    /// Screens, the presenter's first; at least one.
    pub screens: Vec<ScreenPart>,
    /// Hands in the order of the file.
    pub hands: Vec<HandPart>,
    /// When it counts as left alone.
    pub idle: Idle,
    /// When it is dark; never where the file does not say.
    pub night: Option<Night>,
    /// Language and place to begin with.
    pub start: Start,
}

/// How a board starts.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct Start {
    /// Tag of the language: `es-CL`; what the system says where none is named.
    pub language: Option<String>,
    /// A place built in, or a folder; as seen from the folder of the board file where it is no whole path.
    pub place: Option<String>,
}

/// A board file, unless it has errors, with everything that was found.
#[derive(Clone, Debug, PartialEq)]
pub struct BoardOutcome {
    /// The board; only without errors.
    pub board: Option<BoardFile>,
    /// Errors and warnings in the order of the file.
    pub problems: Vec<Problem>,
}

impl BoardFile {
    /// The kinds of its screens, the presenter's first.
    pub fn screen_kinds(&self) -> Vec<ScreenKind> {
        self.screens.iter().map(ScreenPart::kind).collect()
    }
}

/// Whether a text is a board file and nothing else that `check` knows: only board files have screens.
pub fn is_board_file(text: &str) -> bool {
    let opens = |line: &str| ["[board]", "[[screen]]", "[[hand]]"].iter().any(|table| line.trim().starts_with(table));
    text.lines().any(opens)
}

/// Reads the board file in `text`, the content of `file`; `languages` are the tags that the program speaks.
pub fn read_board(file: &Path, text: &str, languages: &[&'static str]) -> BoardOutcome {
    let (sheet, table) = Sheet::parse(file, text);
    // The root is judged when it ends, before the problems are taken out.
    let board = whole(&Section::root(&sheet, &table), languages);
    let mut problems = sheet.problems.take();
    problems.sort_by(|a, b| a.at.cmp(&b.at));
    let fine = problems.iter().all(|problem| problem.severity < Severity::Error);
    BoardOutcome { board: board.filter(|_| fine), problems }
}

fn whole(root: &Section<'_>, languages: &[&'static str]) -> Option<BoardFile> {
    let about = root.section("board");
    let name = about.peek("name").is_some().then(|| need_names(&about, "name"));
    let processors = [("bcm2835", Processor::Bcm2835), ("other", Processor::Other)];
    let processor = about.choice("processor", &processors).map_or_else(Processor::default, |(processor, _)| processor);
    let uses = pins::Uses::new(processor);
    let gpio_chip = device(&about, "gpio_chip").unwrap_or_else(|| USUAL_GPIO_CHIP.to_owned());
    let reserved_pins = uses.reserve(&about, "reserved_pins");
    let sections = root.sections("screen");
    if sections.is_empty() && root.peek("screen").is_none() && !root.sheet.is_broken() {
        root.sheet.tell(Problem::error(root.at.clone(), "problem-board-no-screen"));
    }
    let screens: Vec<Option<ScreenPart>> = sections.iter().map(|part| read_screens::screen(part, &uses)).collect();
    if let Some(at) = second_monitor(&sections, &screens) {
        root.sheet.tell(Problem::error(at, "problem-board-two-monitors"));
    }
    let hands = read_hands::hands(&root.sections("hand"), screens.len(), &uses);
    let idle = hours::idle(&root.section("idle"));
    let night = hours::night(&root.section("night"));
    let start = start(&root.section("start"), languages);
    let screens = screens.into_iter().collect::<Option<Vec<ScreenPart>>>()?;
    Some(BoardFile { name, processor, gpio_chip, reserved_pins, screens, hands: hands?, idle, night, start })
}

/// Where a second monitor stands: one program sets the mode of one monitor of a card.
fn second_monitor(sections: &[Section<'_>], screens: &[Option<ScreenPart>]) -> Option<Location> {
    let monitors = sections.iter().zip(screens).filter(|(_, part)| matches!(part, Some(ScreenPart::Monitor(_))));
    monitors.skip(1).map(|(section, _)| section.at.clone()).next()
}

fn start(section: &Section<'_>, languages: &[&'static str]) -> Start {
    let known: Vec<(&'static str, &'static str)> = languages.iter().map(|tag| (*tag, *tag)).collect();
    let language = section.choice("language", &known).map(|(tag, _)| tag.to_owned());
    let place = section.text("place").map(|(place, _)| place.trim().to_owned());
    Start { language, place }
}

/// The file of a device: a whole path below `/dev`.
fn device(section: &Section<'_>, key: &'static str) -> Option<String> {
    let (path, at) = section.text(key)?;
    let plain =
        path.strip_prefix("/dev/").is_some_and(|rest| !rest.is_empty() && !rest.split('/').any(|part| part == ".."));
    if !plain {
        section.sheet.tell(Problem::error(at, "problem-board-device").with("key", key).with("value", path));
    }
    plain.then(|| path.to_owned())
}
