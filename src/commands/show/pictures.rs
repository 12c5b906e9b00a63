//! Every view as a picture, in each language.

use std::path::Path;

use super::drawing::{VIEWS, page};
use super::player::Player;
use super::request::Request;
use crate::board::pictures::{file_name, write as write_picture};
use crate::board::{FrameSize, Instrument};
use crate::commands::failure::Failure;
use crate::commands::output::reason;
use crate::commands::tell_standard_error;
use crate::session::{Command, Event, View};
use crate::words::Words;

/// Where pictures go when nobody says.
const FOLDER: &str = "deshielo-pictures";
/// How large they are when nobody says.
const SIZE: FrameSize = FrameSize::new(800, 480);

/// Writes the pictures and says where.
pub(super) fn write(player: &mut Player, request: &Request, words: &Words) -> Result<(), Failure> {
    let folder = request.into.as_deref().unwrap_or(Path::new(FOLDER));
    let size = request.size.unwrap_or(SIZE);
    let mut languages = player.languages();
    if request.one_language {
        languages.truncate(1);
    }
    let mut count = 0_u32;
    player.wait_for_doubts();
    for language in &languages {
        for view in VIEWS {
            player.step(Event::Command(Command::Show(view)));
            let mut sheet = 1;
            loop {
                let key = page(view).key();
                let key = if sheet == 1 { key.to_owned() } else { format!("{key}-{sheet}") };
                let frame = player.frame(size, false);
                write_picture(folder, &file_name(&key, language, size), size, frame.pixels).map_err(|error| {
                    let arguments =
                        [("path", folder.display().to_string().into()), ("reason", reason(&error, words).into())];
                    Failure::Input(vec![words.say("show-folder-unwritable", &arguments)])
                })?;
                count += 1;
                // What a place was found good for is told whole; the sheets of the other pages are the screen's.
                if view != View::Trust || sheet >= player.trust_sheets() {
                    break;
                }
                sheet += 1;
                player.step(Event::Command(Command::StepView(1)));
            }
        }
        player.step(Event::Command(Command::NextVoice));
    }
    let path = folder.display().to_string();
    tell_standard_error(&[words.say("show-pictures-written", &[("n", count.into()), ("path", path.into())])]);
    Ok(())
}
