//! The screens of a board file, in `show`.

use std::cell::Cell;
use std::path::{Path, PathBuf};
use std::rc::Rc;

use crate::board::file::{BoardFile, MonitorPart, ScreenPart, read_board};
use crate::board::reviving::{Notice, Opener, Reviving, Told};
use crate::board::{FrameSize, LAYOUTS, Screen, ScreenError, ScreenKind};
use crate::commands::failure::Failure;
use crate::commands::settings::{SettingText, read_text};
use crate::commands::snippets::{Texts, report};
use crate::commands::{built_in, tell_standard_error};
use crate::words::{KNOWN_TAGS, Words};

/// The frame of a monitor that was never there.
const MONITOR: FrameSize = LAYOUTS[5];

/// Reads the board file; mistakes refuse it, and all of them are told.
pub(in crate::commands) fn read(path: &Path, words: &Words) -> Result<BoardFile, Failure> {
    let SettingText { file, text } = read_text(path, words)?;
    let outcome = read_board(&file, &text, &KNOWN_TAGS);
    let shown = [(file.to_string_lossy().into_owned(), text)];
    outcome.board.ok_or_else(|| Failure::input(report(&outcome.problems, &mut Texts::given(&shown), words)))
}

/// The place that a board starts with: one built in, or a folder as seen from that of the board file.
pub(super) fn place(board: &BoardFile, file: &Path) -> Option<PathBuf> {
    let place = board.start.place.as_deref()?;
    if built_in::place(place).is_some() {
        return Some(place.into());
    }
    Some(file.parent().unwrap_or(Path::new("")).join(place))
}

/// The monitor that is looked for where no board file says which.
pub(super) fn any_monitor() -> ScreenPart {
    ScreenPart::Monitor(MonitorPart::default())
}

/// Opens `parts`. A screen that is not there is waited for, unless none of them is.
///
/// # Errors
/// Why the first of them is not there, where none is.
pub(super) fn open<'a>(
    parts: impl IntoIterator<Item = &'a ScreenPart>,
    gpio_chip: &str,
    words: &Words,
) -> Result<Vec<Box<dyn Screen>>, ScreenError> {
    let mut screens: Vec<Box<dyn Screen>> = Vec::new();
    let (mut any, mut lost) = (false, Vec::new());
    let begun = Rc::new(Cell::new(false));
    for part in parts {
        let (kind, size) = match part {
            ScreenPart::Panel(panel) => {
                let (width, height) = panel.turned.picture(panel.width_px, panel.height_px);
                (ScreenKind::Panel, FrameSize::largest_within(width.into(), height.into()))
            }
            ScreenPart::Monitor(monitor) => {
                let mode = monitor.mode_px.map(|(width, height)| monitor.turned.picture(width, height));
                let layout = mode.and_then(|(width, height)| FrameSize::largest_within(width.into(), height.into()));
                (ScreenKind::Framebuffer, layout)
            }
        };
        let mut opener = opener(part.clone(), gpio_chip.to_owned());
        // Tried once by itself, so that the reason is at hand where nothing works.
        let tried = opener();
        if let Err(reason) = &tried {
            lost.push(ScreenError::new(kind, reason));
        }
        let mut tried = Some(tried);
        let open: Opener = Box::new(move || tried.take().unwrap_or_else(&mut opener));
        let (mut tell, speaks) = (told(kind, words), Rc::clone(&begun));
        let told: Told = Box::new(move |notice| {
            if speaks.get() {
                tell(notice);
            }
        });
        let screen = Reviving::new(kind, size.unwrap_or(MONITOR), open, told);
        any |= screen.is_there();
        screens.push(Box::new(screen));
    }
    if !any && !lost.is_empty() {
        return Err(lost.swap_remove(0));
    }
    begun.set(true);
    lost.into_iter().for_each(|error| told(error.screen, words)(Notice::Lost(error)));
    Ok(screens)
}

#[cfg(all(feature = "board", target_os = "linux"))]
fn opener(part: ScreenPart, gpio_chip: String) -> Opener {
    Box::new(move || match &part {
        ScreenPart::Panel(panel) => crate::board::panel::open(panel, &gpio_chip),
        ScreenPart::Monitor(monitor) => crate::board::monitor::open(monitor),
    })
}

#[cfg(not(all(feature = "board", target_os = "linux")))]
fn opener(_: ScreenPart, _: String) -> Opener {
    Box::new(|| Err(crate::board::choose::Why::BoardNotBuilt.message().to_owned()))
}

/// Says on standard error, which a service keeps, what happens to a screen.
fn told(kind: ScreenKind, words: &Words) -> Told {
    let name = words.say(super::screen_message(kind), &[]);
    let lost = words.say("board-screen-lost", &[("screen", name.as_str().into())]);
    let back = words.say("board-screen-back", &[("screen", name.as_str().into())]);
    Box::new(move |notice| {
        let line = match notice {
            Notice::Lost(error) => format!("{lost} {}", error.reason),
            Notice::Back(_) => back.clone(),
        };
        tell_standard_error(&[line]);
    })
}
