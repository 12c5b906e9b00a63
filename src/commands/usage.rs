//! What the parser of the command line has to say, in our words.

use std::ffi::OsString;

use clap::Command;
use clap::error::{ContextKind, ContextValue, ErrorKind};

use super::failure::Failure;
use super::output::deliver;
use crate::words::{Words, nearest};

/// Help and version go to standard output; anything else is a mistake in the command line.
pub(super) fn answer(
    error: &clap::Error,
    command: &Command,
    arguments: &[OsString],
    words: &Words,
) -> Result<(), Failure> {
    match error.kind() {
        ErrorKind::DisplayHelp | ErrorKind::DisplayVersion => {
            deliver(error.render().to_string().as_bytes(), None, words)
        }
        _ => {
            // The parser does not say which subcommand it was in: it is the first argument that names one.
            let subcommand = arguments.iter().skip(1).find_map(|argument| command.find_subcommand(argument));
            let line = say(error, command, subcommand.unwrap_or(command), words);
            Err(mistake(&line, subcommand.map(Command::get_name), words))
        }
    }
}

/// A mistake in the command line, with where help is to be had.
pub(super) fn mistake(line: &str, subcommand: Option<&str>, words: &Words) -> Failure {
    let help = subcommand.map_or("deshielo --help".to_owned(), |name| format!("deshielo {name} --help"));
    let help = words.say("error-see-help", &[("command", help.into())]);
    Failure::Usage(vec![line.to_owned(), help])
}

fn say(error: &clap::Error, command: &Command, inside: &Command, words: &Words) -> String {
    let invalid = context(error, ContextKind::InvalidArg);
    let option = || ("option", invalid.as_str().into());
    match error.kind() {
        ErrorKind::InvalidSubcommand => {
            let asked = context(error, ContextKind::InvalidSubcommand);
            let among = if inside.has_subcommands() { inside } else { command };
            let known: Vec<&str> = among.get_subcommands().map(Command::get_name).collect();
            let ids = ["error-command-unknown", "error-command-unknown-nearest"];
            unknown(ids, "command", &asked, nearest(&asked, known), words)
        }
        ErrorKind::UnknownArgument if invalid.starts_with('-') => {
            let known = options_of(inside);
            let asked = invalid.trim_start_matches('-');
            let near =
                nearest(asked, known.iter().map(String::as_str)).map(|name| format!("--{}", name.replace('_', "-")));
            unknown(
                ["error-option-unknown", "error-option-unknown-nearest"],
                "option",
                &invalid,
                near.as_deref(),
                words,
            )
        }
        ErrorKind::UnknownArgument | ErrorKind::TooManyValues => {
            words.say("error-argument-extra", &[("text", invalid.as_str().into())])
        }
        ErrorKind::InvalidValue | ErrorKind::TooFewValues | ErrorKind::WrongNumberOfValues | ErrorKind::NoEquals => {
            words.say("error-option-no-value", &[("option", name_of(&invalid).into())])
        }
        ErrorKind::ArgumentConflict => words.say("error-option-twice", &[("option", name_of(&invalid).into())]),
        ErrorKind::MissingRequiredArgument => {
            let name = invalid.trim_matches(|letter: char| !letter.is_alphanumeric());
            words.say("error-argument-missing", &[("name", name.into())])
        }
        ErrorKind::InvalidUtf8 => words.say("error-not-unicode-here", &[]),
        _ => words.say("error-option-unknown", &[option()]),
    }
}

fn unknown(ids: [&str; 2], name: &'static str, asked: &str, near: Option<&str>, words: &Words) -> String {
    match near {
        Some(near) => words.say(ids[1], &[(name, asked.into()), ("nearest", near.into())]),
        None => words.say(ids[0], &[(name, asked.into())]),
    }
}

/// A value that is not among the choices of an option.
pub(super) fn unknown_choice(option: &str, value: &str, choices: &[&str], words: &Words) -> String {
    let (option, shown) = (("option", option.into()), ("value", value.into()));
    match nearest(value, choices.iter().copied()) {
        Some(near) => words.say("error-choice-unknown-nearest", &[option, shown, ("nearest", near.into())]),
        None => words.say("error-choice-unknown", &[option, shown, ("choices", choices.join(", ").into())]),
    }
}

/// The option without the value that the parser writes behind it.
fn name_of(shown: &str) -> String {
    shown.split_whitespace().next().unwrap_or(shown).to_owned()
}

fn context(error: &clap::Error, kind: ContextKind) -> String {
    match error.get(kind) {
        Some(ContextValue::String(text)) => text.clone(),
        Some(ContextValue::Strings(texts)) => texts.join(", "),
        _ => String::new(),
    }
}

fn options_of(inside: &Command) -> Vec<String> {
    inside.get_arguments().filter_map(|arg| arg.get_long()).map(|name| name.replace('-', "_")).collect()
}
