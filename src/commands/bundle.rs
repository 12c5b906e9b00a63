//! `bundle`: one checked file to carry a place to another computer, and back out of it.

use std::path::{Path, PathBuf};

use clap::ArgMatches;

use super::check::{built_in_lesson, check_one};
use super::failure::Failure;
use super::output::{check_target, deliver, reason};
use super::places::{Named, USUAL};
use super::speech::Speech;
use super::tell_standard_error;
use super::usage::mistake;
use crate::bundle::{Contents, Fault, unpack};
use crate::words::Words;

/// Makes a bundle, or opens one.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let path = |name: &str| matches.get_one::<PathBuf>(name).map(PathBuf::as_path);
    let wrong = |id: &str| Err(mistake(&words.say(id, &[]), Some("bundle"), words));
    let makes = ["place", "lesson", "board", "out"].iter().any(|name| matches.contains_id(name));
    match (path("open"), path("into"), path("out")) {
        (Some(_), _, _) if makes => wrong("bundle-open-or-make"),
        (Some(file), Some(into), _) => open(file, into, words),
        (Some(_), None, _) => wrong("bundle-needs-into"),
        (None, Some(_), _) => wrong("bundle-into-only-open"),
        (None, None, None) => wrong("bundle-needs-out"),
        (None, None, Some(out)) => make(speech, matches, out),
    }
}

fn open(file: &Path, into: &Path, words: &Words) -> Result<(), Failure> {
    let members = unpack(file, into).map_err(|fault| refused(&fault, file, words))?;
    let arguments = [("n", members.len().into()), ("path", into.display().to_string().into())];
    tell_standard_error(&[words.say("bundle-opened", &arguments)]);
    Ok(())
}

fn make(speech: &Speech, matches: &ArgMatches, out: &Path) -> Result<(), Failure> {
    let words = &speech.words;
    let path = |name: &str| matches.get_one::<PathBuf>(name).map(PathBuf::as_path);
    check_target(Some(out), words)?;
    let place = path("place").unwrap_or(Path::new(USUAL));
    let lessons: Vec<&Path> = matches.get_many("lesson").into_iter().flatten().map(PathBuf::as_path).collect();
    let board = path("board");
    // Nothing is carried that would not start where it arrives.
    let all = std::iter::once(place).chain(lessons.iter().copied()).chain(board);
    let mistakes: Vec<String> = all
        .map(|part| check_one(part, Some(place), speech))
        .filter(super::check::Checked::is_wrong)
        .map(|mut checked| checked.say(words))
        .collect();
    if !mistakes.is_empty() {
        return Err(Failure::Input(mistakes));
    }
    let mut contents = Contents::new();
    let gathered = gather(&mut contents, speech, place, &lessons, board, path("locales"))?;
    let bytes = gathered.and_then(|()| contents.pack()).map_err(|fault| refused(&fault, out, words))?;
    deliver(&bytes, Some(out), words)?;
    let arguments = [("n", contents.members().len().into()), ("path", out.display().to_string().into())];
    tell_standard_error(&[words.say("bundle-made", &arguments)]);
    Ok(())
}

/// Everything that goes in; a part that is not there at all is told by whoever looks for it.
fn gather(
    contents: &mut Contents,
    speech: &Speech,
    place: &Path,
    lessons: &[&Path],
    board: Option<&Path>,
    locales: Option<&Path>,
) -> Result<Result<(), Fault>, Failure> {
    let mut parts = match Named::find(place, speech)? {
        Named::Folder(folder) => contents.add_folder("place", &folder, ""),
        Named::BuiltIn(place) => place
            .files
            .iter()
            .try_for_each(|(name, text)| contents.add(&format!("place/{name}"), text.as_bytes().to_vec())),
    };
    for lesson in lessons {
        let built_in = lesson.to_str().filter(|_| !lesson.exists()).and_then(built_in_lesson);
        parts = parts.and_then(|()| match built_in {
            Some(lesson) => contents.add(&format!("lessons/{}", lesson.file.display()), lesson.text.into_bytes()),
            None => {
                let name = lesson.file_name().unwrap_or_default().to_string_lossy();
                contents.add_file(&format!("lessons/{name}"), lesson)
            }
        });
    }
    if let Some(board) = board {
        parts = parts.and_then(|()| contents.add_file("board.toml", board));
    }
    if let Some(folder) = locales {
        parts = parts.and_then(|()| contents.add_folder("locales", folder, ".ftl"));
    }
    Ok(parts)
}

/// A fault in words: what is wrong, with which bundle.
fn refused(fault: &Fault, file: &Path, words: &Words) -> Failure {
    let because = match fault {
        Fault::System { reason: kind, .. } => reason(&(*kind).into(), words),
        _ => String::new(),
    };
    let about = fault.about();
    let arguments = [("about", about.into()), ("path", file.display().to_string().into()), ("reason", because.into())];
    Failure::input(words.say(fault.message(), &arguments))
}
