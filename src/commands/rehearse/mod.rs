//! `rehearse`: plays a lesson or a script of events without hands and writes what the room would see, page by page.

mod contact;
mod folder;
mod script;
mod walk;

use std::path::PathBuf;

use clap::ArgMatches;

use super::failure::Failure;
use super::output::reason;
use super::places;
use super::settings::read_text;
use super::show::{LessonText, Player, groups};
use super::speech::Speech;
use super::usage::{mistake, unknown_choice};
use crate::board::pictures::{file_name, write as write_picture};
use crate::board::{FrameSize, Instrument, LAYOUTS};
use crate::session::{Command, Event, Shade};
use crate::words::Words;
use contact::Contact;
use folder::{Folder, Refused};
use script::{Act, BadLine};

/// How large pictures are when nobody says.
const SIZE: FrameSize = FrameSize::new(800, 480);
/// Most pictures of a rehearsal in one language.
const MOST_PICTURES: usize = 999;

/// What was asked for.
struct Request {
    place: PathBuf,
    lesson: Option<LessonText>,
    acts: Option<Vec<Act>>,
    into: PathBuf,
    size: FrameSize,
    groups: Option<u8>,
    one_language: bool,
}

/// Plays and writes.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let request = read(matches, words)?;
    let folder = Folder::begin(&request.into).map_err(|error| refused(error, &request, words))?;
    let mut count = 0;
    // One player tells which languages there are; each language begins anew.
    let languages = player(speech, &request, 0)?.languages();
    let languages = languages.iter().take(if request.one_language { 1 } else { languages.len() });
    for (voice, language) in languages.enumerate() {
        let mut player = player(speech, &request, voice)?;
        let mut album = Album {
            request: &request,
            folder: &folder,
            language,
            words,
            count: 0,
            contact: Contact::new(request.size),
        };
        match &request.acts {
            Some(acts) => play(&mut player, acts, &mut album)?,
            None => walk::walk(&mut player, Player::step, Player::led, |player: &mut Player, name: &str| {
                album.picture(player, name)
            })?,
        }
        count += album.finish()?;
    }
    folder.finish().map_err(|error| refused(error, &request, words))?;
    let path = request.into.display().to_string();
    let line = words.say("show-pictures-written", &[("n", (count as u32).into()), ("path", path.into())]);
    super::tell_standard_error(&[line]);
    Ok(())
}

fn player(speech: &Speech, request: &Request, voice: usize) -> Result<Player, Failure> {
    let opened = places::open_fitted(&request.place, speech)?;
    let mut player = Player::new(opened, speech, Shade::Light, None)?;
    if let Some(groups) = request.groups {
        player.ask_groups(groups);
    }
    for _ in 0..voice {
        player.step(Event::Command(Command::NextVoice));
    }
    if let Some(lesson) = &request.lesson {
        player.lead(lesson, speech)?;
    }
    Ok(player)
}

fn play(player: &mut Player, acts: &[Act], album: &mut Album<'_>) -> Result<(), Failure> {
    let every = !acts.iter().any(|act| matches!(act, Act::Picture(_)));
    if every {
        album.picture(player, "start")?;
    }
    for act in acts {
        match act {
            Act::Picture(name) => album.picture(player, name)?,
            Act::Event(event, name) => {
                player.step(*event);
                if every {
                    album.picture(player, name)?;
                }
            }
        }
    }
    Ok(())
}

/// The pictures of one language.
struct Album<'a> {
    request: &'a Request,
    folder: &'a Folder,
    language: &'a str,
    words: &'a Words,
    count: usize,
    contact: Contact,
}

impl Album<'_> {
    fn picture(&mut self, player: &mut Player, name: &str) -> Result<(), Failure> {
        if self.count >= MOST_PICTURES {
            return Err(Failure::input(
                self.words.say("rehearse-too-many", &[("most", (MOST_PICTURES as u32).into())]),
            ));
        }
        self.count += 1;
        let size = self.request.size;
        player.settle();
        let frame = player.frame(size, false);
        let name = format!("{:03}-{}", self.count, name.replace(|c: char| !c.is_ascii_alphanumeric() && c != '_', "-"));
        self.contact.add(&name, frame.pixels);
        let name = file_name(&name, self.language, size);
        let written = write_picture(self.folder.path(), &name, size, frame.pixels);
        written.map(|_| ()).map_err(|error| refused(error.into(), self.request, self.words))
    }

    /// Writes the contact sheet; gives the number of files.
    fn finish(self) -> Result<usize, Failure> {
        let Some((size, pixels)) = self.contact.draw() else { return Ok(self.count) };
        let name = file_name("contact", self.language, self.request.size);
        let written = write_picture(self.folder.path(), &name, size, &pixels);
        written.map_err(|error| refused(error.into(), self.request, self.words))?;
        Ok(self.count + 1)
    }
}

fn read(matches: &ArgMatches, words: &Words) -> Result<Request, Failure> {
    let path = |name: &str| matches.get_one::<PathBuf>(name).cloned();
    let refuse = |line: String| mistake(&line, Some("rehearse"), words);
    let lesson = path("lesson").map(|name| LessonText::find(&name, words)).transpose()?;
    let acts = path("steps").map(|file| read_script(&file, words)).transpose()?;
    if lesson.is_none() && acts.is_none() {
        return Err(refuse(words.say("rehearse-what", &[])));
    }
    let Some(into) = path("into") else { return Err(refuse(words.say("rehearse-into", &[]))) };
    let size = match matches.get_one::<String>("size") {
        None => SIZE,
        Some(text) => text.parse().map_err(|_| {
            let sizes = LAYOUTS.map(|size| size.to_string());
            let sizes: Vec<&str> = sizes.iter().map(String::as_str).collect();
            refuse(unknown_choice("--size", text, &sizes, words))
        })?,
    };
    Ok(Request {
        place: path("place").unwrap_or_else(|| places::USUAL.into()),
        lesson,
        acts,
        into,
        size,
        groups: groups(matches, "rehearse", words)?,
        one_language: matches.get_one::<String>("lang").is_some(),
    })
}

fn read_script(file: &std::path::Path, words: &Words) -> Result<Vec<Act>, Failure> {
    let text = read_text(file, words)?.text;
    script::read(&text).map_err(|BadLine { line, message, text }| {
        let place = format!("{}:{line}", file.display());
        let why = words.say(message, &[("text", text.into())]);
        Failure::Input(vec![format!("{place}: {why}"), words.say("rehearse-lines", &[])])
    })
}

fn refused(error: Refused, request: &Request, words: &Words) -> Failure {
    let path = ("path", request.into.display().to_string().into());
    Failure::input(match error {
        Refused::NotOurs(file) => words.say("rehearse-not-ours", &[path, ("file", file.display().to_string().into())]),
        Refused::System(error) => {
            words.say("show-folder-unwritable", &[path, ("reason", reason(&error, words).into())])
        }
    })
}
