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
    let views: Vec<View> = VIEWS.into_iter().filter(|view| player.offers(*view)).collect();
    let mut count = 0_u32;
    player.wait_for_doubts();
    for language in &languages {
        for view in views.iter().copied() {
            player.step(Event::Command(Command::Show(view)));
            player.settle();
            // How many sheets there are shows when the first is drawn.
            player.frame(size, false);
            let sheets = player.sheets(size);
            for sheet in 0..sheets {
                let key = page(view).key();
                let what = if sheet == 0 { key.to_owned() } else { format!("{key}-{}", sheet + 1) };
                let name = file_name(&what, language, size);
                let frame = player.frame(size, false);
                write_picture(folder, &name, size, frame.pixels).map_err(|error| {
                    let arguments =
                        [("path", folder.display().to_string().into()), ("reason", reason(&error, words).into())];
                    Failure::Input(vec![words.say("show-folder-unwritable", &arguments)])
                })?;
                count += 1;
                if sheet + 1 < sheets {
                    player.step(Event::Command(Command::StepView(1)));
                }
            }
        }
        player.step(Event::Command(Command::NextVoice));
    }
    let path = folder.display().to_string();
    tell_standard_error(&[words.say("show-pictures-written", &[("n", count.into()), ("path", path.into())])]);
    Ok(())
}
