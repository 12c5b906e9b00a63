//! What the command line asks `show` for.

use std::path::PathBuf;

use clap::ArgMatches;

use super::board;
use crate::board::file::BoardFile;
use crate::board::{FrameSize, LAYOUTS, ScreenKind};
use crate::commands::failure::Failure;
use crate::commands::places;
use crate::commands::usage::{mistake, unknown_choice};
use crate::lesson::MOST_GROUPS;
use crate::session::Shade;
use crate::words::{System, Words};

/// The options, checked.
#[derive(Debug)]
pub(in crate::commands) struct Request {
    /// The place.
    pub place: PathBuf,
    /// The board whose screens are used.
    pub board: Option<BoardFile>,
    /// Screens that were named; none leaves the choice to the program.
    pub screens: Vec<ScreenKind>,
    /// The layout, where one was asked for.
    pub size: Option<FrameSize>,
    /// Where pictures go.
    pub into: Option<PathBuf>,
    /// Whether a language was asked for, so that pictures are made in that one only.
    pub one_language: bool,
    /// Units, where they were asked for.
    pub units: Option<System>,
    /// Colours to begin with.
    pub shade: Shade,
    /// Whether nobody watches over it.
    pub kiosk: bool,
    /// Where what is kept is kept, where a folder was named.
    pub keep: Option<PathBuf>,
    /// Only the PIN of the staff menu is set.
    pub set_pin: bool,
    /// The lesson to lead.
    pub lesson: Option<PathBuf>,
    /// How many groups guess, where it was said.
    pub groups: Option<u8>,
}

impl Default for Request {
    fn default() -> Self {
        Self {
            place: places::USUAL.into(),
            board: None,
            screens: Vec::new(),
            size: None,
            into: None,
            one_language: false,
            units: None,
            shade: Shade::Light,
            kiosk: false,
            keep: None,
            set_pin: false,
            lesson: None,
            groups: None,
        }
    }
}

impl Request {
    /// Reads the options.
    pub fn read(matches: &ArgMatches, words: &Words) -> Result<Self, Failure> {
        let text = |name: &str| matches.get_one::<String>(name).map(String::as_str);
        let path = |name: &str| matches.get_one::<PathBuf>(name).cloned();
        let refuse = |line: String| mistake(&line, Some("show"), words);
        let mut screens = Vec::new();
        for name in matches.get_many::<String>("screen").into_iter().flatten() {
            let known = ScreenKind::ALL.map(ScreenKind::name);
            let unknown = |_| refuse(unknown_choice("--screen", name, &known, words));
            screens.push(name.parse().map_err(unknown)?);
        }
        let sizes = LAYOUTS.map(|size| size.to_string());
        let sizes: Vec<&str> = sizes.iter().map(String::as_str).collect();
        let size = match text("size") {
            None => None,
            Some(text) => Some(text.parse().map_err(|_| refuse(unknown_choice("--size", text, &sizes, words)))?),
        };
        let units = match text("units") {
            None => None,
            Some("metric") => Some(System::Metric),
            Some("us") => Some(System::Us),
            Some(other) => return Err(refuse(unknown_choice("--units", other, &["metric", "us"], words))),
        };
        let shade = match text("theme") {
            None | Some("light") => Shade::Light,
            Some("dark") => Shade::Dark,
            Some("sunlight") => Shade::Sunlight,
            Some(other) => {
                return Err(refuse(unknown_choice("--theme", other, &["light", "dark", "sunlight"], words)));
            }
        };
        let board_file = path("board");
        let board = board_file.as_deref().map(|file| board::read(file, words)).transpose()?;
        let board_place = || board::place(board.as_ref()?, board_file.as_deref()?);
        Ok(Self {
            place: path("place").or_else(board_place).unwrap_or_else(|| places::USUAL.into()),
            board,
            screens,
            size,
            into: path("into"),
            one_language: text("lang").is_some(),
            units,
            shade,
            kiosk: matches.get_flag("kiosk"),
            keep: path("keep"),
            set_pin: matches.get_flag("set-pin"),
            lesson: path("lesson"),
            groups: groups(matches, "show", words)?,
        })
    }
}

/// How many groups guess; `None` where it was not said.
pub(in crate::commands) fn groups(matches: &ArgMatches, command: &str, words: &Words) -> Result<Option<u8>, Failure> {
    let Some(text) = matches.get_one::<String>("groups") else { return Ok(None) };
    match text.parse() {
        Ok(groups) if (1..=MOST_GROUPS).contains(&usize::from(groups)) => Ok(Some(groups)),
        _ => {
            let arguments =
                [("option", "--groups".into()), ("low", 1_u32.into()), ("high", (MOST_GROUPS as u32).into())];
            Err(mistake(&words.say("error-option-number", &arguments), Some(command), words))
        }
    }
}
