//! The command line of `place`.

use clap::{Arg, Command};

use crate::commands::line::{common, flag, path, path_option, plain, text};
use crate::words::Words;

/// `place` with its three parts.
pub(in crate::commands) fn command(words: &Words) -> Command {
    let say = |id: &str| words.say(id, &[]);
    let template = format!(
        "{{about}}\n\n{}: deshielo place {}\n\n{}:\n{{subcommands}}\n\n{}:\n{{options}}\n\n{}\n",
        say("help-usage"),
        say("help-usage-commands"),
        say("help-commands"),
        say("help-options"),
        say("help-place-more"),
    );
    plain(Command::new("place"), words)
        .about(say("help-place-command"))
        .help_template(template)
        .disable_help_subcommand(true)
        .subcommand(new(words))
        .subcommand(peek(words))
        .subcommand(add(words))
        .args(common(words))
}

fn new(words: &Words) -> Command {
    let records = [
        ("weather", "help-new-weather"),
        ("gauge", "help-new-gauge"),
        ("snow", "help-new-snow"),
        ("storage", "help-new-storage"),
    ];
    part("new", "help-place-new", "help-usage-new", words)
        .arg(path("dir", "value-folder", "help-new-dir", words).required(true))
        .arg(text("name", "value-text", "help-new-name", words))
        .arg(text("name-es", "value-text", "help-new-name-es", words))
        .arg(text("region", "value-lang", "help-new-region", words))
        .arg(text("latitude", "value-number", "help-new-latitude", words))
        .arg(text("station", "value-height", "help-new-station", words))
        .arg(text("sharing", "value-rule", "help-new-sharing", words))
        .args(records.map(|(name, help)| path_option(name, "value-file", help, words)))
        .arg(text("measures", "value-measures", "help-measures", words))
        .args(heights(words))
        .arg(path_option("grid", "value-file", "help-new-grid", words))
        .arg(flag("ask", "help-new-ask", words))
        .arg(flag("replace", "help-replace", words))
        .args(common(words))
}

fn peek(words: &Words) -> Command {
    part("peek", "help-place-peek", "help-usage-peek", words)
        .arg(path("file", "value-file", "help-peek-file", words).required(true))
        .args(heights(words))
        .arg(text("form", "value-form", "help-peek-form", words))
        .args(common(words))
}

fn add(words: &Words) -> Command {
    part("add", "help-place-add", "help-usage-add", words)
        .arg(path("place", "value-place", "help-add-place", words).required(true))
        .arg(path("file", "value-file", "help-add-file", words).required(true))
        .arg(text("as", "value-record", "help-add-as", words))
        .arg(text("canal", "value-key", "help-add-canal", words))
        .arg(text("measures", "value-measures", "help-measures", words))
        .arg(text("column", "value-text", "help-add-column", words))
        .arg(text("unit", "value-unit", "help-add-unit", words))
        .arg(flag("replace", "help-replace", words))
        .args(common(words))
}

/// What goes with a grid of heights.
fn heights(words: &Words) -> [Arg; 4] {
    [
        path_option("outline", "value-file", "help-outline", words),
        text("coordinates", "value-coordinates", "help-coordinates", words),
        text("height-unit", "value-unit", "help-height-unit", words),
        text("bands", "value-number", "help-bands", words),
    ]
}

fn part(name: &'static str, about: &str, usage: &str, words: &Words) -> Command {
    let say = |id: &str| words.say(id, &[]);
    let template = format!(
        "{{about}}\n\n{}: deshielo place {name} {}\n\n{}:\n{{positionals}}\n\n{}:\n{{options}}\n",
        say("help-usage"),
        say(usage),
        say("help-arguments"),
        say("help-options"),
    );
    plain(Command::new(name), words).about(say(about)).help_template(template)
}
