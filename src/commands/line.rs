//! The command line itself, built at run time so that every word of its help is in the reader's language.

use clap::builder::{PathBufValueParser, StringValueParser, Styles};
use clap::{Arg, ArgAction, ColorChoice, Command};

use crate::words::Words;

/// Columns that help is written for.
const HELP_WIDTH: usize = 80;

/// The whole command line.
pub(super) fn command(words: &Words) -> Command {
    let say = |id: &str| words.say(id, &[]);
    let template = format!(
        "{{about}}\n\n{}: deshielo {}\n\n{}:\n{{subcommands}}\n\n{}:\n{{options}}\n\n{}\n",
        say("help-usage"),
        say("help-usage-commands"),
        say("help-commands"),
        say("help-options"),
        say("help-more"),
    );
    let command = plain(Command::new("deshielo"), words)
        .version(env!("CARGO_PKG_VERSION"))
        .about(say("help-about"))
        .help_template(template)
        .disable_help_subcommand(true)
        .subcommand(show(words))
        .subcommand(tell(words))
        .subcommand(map(words))
        .subcommand(super::place::line::command(words))
        .subcommand(check(words))
        .subcommand(fit(words))
        .subcommand(trust(words))
        .subcommand(rehearse(words));
    #[cfg(feature = "pdf")]
    let command = command.subcommand(handout(words));
    command
        .subcommand(data(words))
        .subcommand(weather(words))
        .subcommand(tally(words))
        .subcommand(wiring(words))
        .subcommand(bundle(words))
        .arg(Arg::new("version").long("version").short('V').action(ArgAction::Version).help(say("help-version")))
        .args(common(words))
}

fn show(words: &Words) -> Command {
    let place = path("place", "value-place", "help-place", words).required(false);
    subcommand("show", "help-usage-show", words)
        .arg(place.help(with_usual("help-place", "demo", words)))
        .arg(text("screen", "value-screen", "help-screen", words).action(ArgAction::Append))
        .arg(text("size", "value-size", "help-size", words))
        .arg(path_option("into", "value-folder", "help-show-into", words))
        .arg(path_option("board", "value-file", "help-board", words))
        .arg(path_option("lesson", "value-lesson", "help-lesson", words))
        .arg(text("groups", "value-number", "help-groups", words))
        .arg(text("units", "value-units", "help-units", words))
        .arg(text("theme", "value-theme", "help-theme", words).help(with_usual("help-theme", "light", words)))
        .arg(flag("kiosk", "help-kiosk", words))
        .arg(path_option("keep", "value-folder", "help-keep", words))
        .arg(flag("set-pin", "help-set-pin", words))
        .args(common(words))
}

fn tell(words: &Words) -> Command {
    let say = |id: &str| words.say(id, &[]);
    subcommand("tell", "help-usage-tell", words)
        .arg(path("place", "value-place", "help-place", words).required(false).help(with_usual(
            "help-place",
            "demo",
            words,
        )))
        .arg(text("set", "value-set", "help-set", words).action(ArgAction::Append).allow_hyphen_values(true))
        .arg(path_option("setting", "value-setting", "help-setting", words))
        .arg(text("years", "value-years", "help-years", words))
        .arg(flag("daily", "help-daily", words))
        .arg(flag("crops", "help-crops", words))
        .arg(flag("columns", "help-columns", words))
        .arg(text("form", "value-form", "help-form", words).help(with_usual("help-form", "table", words)))
        .arg(text("units", "value-units", "help-units", words))
        .arg(path_option("out", "value-file", "help-out", words))
        .args(common(words))
        .after_help(say("help-tell-more"))
}

fn check(words: &Words) -> Command {
    subcommand("check", "help-usage-check", words)
        .arg(path("paths", "value-path", "help-paths", words).required(true).num_args(1..).action(ArgAction::Append))
        .arg(text("form", "value-form", "help-check-form", words).help(with_usual("help-check-form", "table", words)))
        .args(common(words))
}

fn map(words: &Words) -> Command {
    let say = |id: &str| words.say(id, &[]);
    let place = path("place", "value-place", "help-place", words).required(false);
    subcommand("map", "help-usage-map", words)
        .arg(place.help(with_usual("help-place", "demo", words)))
        .arg(text("over", "value-over", "help-over", words).action(ArgAction::Append))
        .arg(text("sign", "value-sign", "help-sign", words).help(with_usual("help-sign", "supply_ratio", words)))
        .arg(text("canal", "value-canal", "help-canal", words))
        .arg(text("set", "value-set", "help-map-set", words).action(ArgAction::Append).allow_hyphen_values(true))
        .arg(text("years", "value-years", "help-years", words))
        .arg(text("form", "value-form", "help-map-form", words).help(with_usual("help-map-form", "csv", words)))
        .arg(text("part", "value-part", "help-part", words))
        .arg(path_option("merge", "value-file", "help-merge", words).action(ArgAction::Append).num_args(1..))
        .arg(text("size", "value-size", "help-size", words).help(with_usual("help-size", "800x480", words)))
        .arg(text("units", "value-units", "help-units", words))
        .arg(path_option("out", "value-file", "help-out", words))
        .args(common(words))
        .after_help(say("help-map-more"))
}

fn rehearse(words: &Words) -> Command {
    let place = path("place", "value-place", "help-place", words).required(false);
    subcommand("rehearse", "help-usage-rehearse", words)
        .arg(place.help(with_usual("help-place", "demo", words)))
        .arg(path_option("lesson", "value-lesson", "help-lesson", words))
        .arg(path_option("steps", "value-file", "help-steps", words))
        .arg(path_option("into", "value-folder", "help-rehearse-into", words))
        .arg(text("size", "value-size", "help-size", words).help(with_usual("help-size", "800x480", words)))
        .arg(text("groups", "value-number", "help-groups", words).help(with_usual("help-groups", "4", words)))
        .args(common(words))
        .after_help(words.say("help-rehearse-more", &[]))
}

fn data(words: &Words) -> Command {
    let place = path("place", "value-place", "help-place", words).required(false);
    subcommand("data", "help-usage-data", words)
        .arg(place.help(with_usual("help-place", "demo", words)))
        .arg(text("set", "value-set", "help-set", words).action(ArgAction::Append).allow_hyphen_values(true))
        .arg(path_option("setting", "value-setting", "help-setting", words))
        .arg(text("years", "value-years", "help-years", words))
        .arg(text("form", "value-form", "help-data-form", words).help(with_usual("help-data-form", "csv", words)))
        .arg(path_option("out", "value-file", "help-data-out", words))
        .arg(path_option("into", "value-folder", "help-data-into", words))
        .args(common(words))
}

#[cfg(feature = "pdf")]
fn handout(words: &Words) -> Command {
    let place = path("place", "value-place", "help-place", words).required(false);
    subcommand("handout", "help-usage-handout", words)
        .arg(place.help(with_usual("help-place", "demo", words)))
        .arg(text("set", "value-set", "help-set", words).action(ArgAction::Append).allow_hyphen_values(true))
        .arg(path_option("setting", "value-setting", "help-setting", words))
        .arg(text("years", "value-years", "help-years", words))
        .arg(path_option("lesson", "value-lesson", "help-handout-lesson", words))
        .arg(text("sheet", "value-sheet", "help-handout-sheet", words).help(with_usual(
            "help-handout-sheet",
            "work",
            words,
        )))
        .arg(text("paper", "value-paper", "help-handout-paper", words))
        .arg(text("units", "value-units", "help-units", words))
        .arg(path_option("out", "value-file", "help-handout-out", words))
        .args(common(words))
        .after_help(words.say("help-handout-more", &[]))
}

fn weather(words: &Words) -> Command {
    subcommand("weather", "help-usage-weather", words)
        .arg(path("place", "value-place", "help-weather-place", words).required(false))
        .arg(path_option("recipe", "value-recipe", "help-recipe", words))
        .arg(text("years", "value-number", "help-length", words).help(with_usual("help-length", "40", words)))
        .arg(text("from", "value-year", "help-from", words))
        .arg(text("seed", "value-number", "help-seed", words).help(with_usual("help-seed", "1", words)))
        .arg(path_option("out", "value-file", "help-out", words))
        .arg(path_option("recipe-out", "value-file", "help-recipe-out", words))
        .args(common(words))
}

fn tally(words: &Words) -> Command {
    subcommand("tally", "help-usage-tally", words)
        .arg(text("from", "value-date", "help-tally-from", words))
        .arg(text("to", "value-date", "help-tally-to", words))
        .arg(text("form", "value-form", "help-tally-form", words).help(with_usual("help-tally-form", "table", words)))
        .arg(path_option("keep", "value-folder", "help-keep", words))
        .arg(path_option("out", "value-file", "help-out", words))
        .args(common(words))
}

fn fit(words: &Words) -> Command {
    let place = path("place", "value-place", "help-place", words).required(false);
    let number =
        |name, help: &str, usual: &str| text(name, "value-number", help, words).help(with_usual(help, usual, words));
    subcommand("fit", "help-usage-fit", words)
        .arg(place.help(with_usual("help-place", "demo", words)))
        .arg(text("objective", "value-objective", "help-objective", words).help(with_usual(
            "help-objective",
            "kge",
            words,
        )))
        .arg(text("correction", "value-correction", "help-correction", words).help(with_usual(
            "help-correction",
            "factor",
            words,
        )))
        .arg(number("seed", "help-fit-seed", "1"))
        .arg(number("starts", "help-starts", &crate::fit::Settings::default().starts.to_string()))
        .arg(number("runs", "help-runs", &crate::fit::Settings::default().runs_per_start.to_string()))
        .arg(number("warm-up", "help-warm-up", "1"))
        .arg(text("years", "value-years", "help-fit-years", words))
        .arg(number("sets", "help-sets", &crate::fit::Settings::default().sets.to_string()))
        .arg(flag("no-test", "help-no-test", words))
        .arg(path_option("out", "value-file", "help-fit-out", words))
        .arg(path_option("into", "value-folder", "help-fit-into", words))
        .args(common(words))
        .after_help(words.say("help-fit-more", &[]))
}

fn trust(words: &Words) -> Command {
    let place = path("place", "value-place", "help-place", words).required(false);
    subcommand("trust", "help-usage-trust", words)
        .arg(place.help(with_usual("help-place", "demo", words)))
        .arg(text("form", "value-form", "help-trust-form", words).help(with_usual("help-trust-form", "table", words)))
        .arg(text("units", "value-units", "help-units", words))
        .arg(path_option("out", "value-file", "help-out", words))
        .args(common(words))
}

fn wiring(words: &Words) -> Command {
    subcommand("wiring", "help-usage-wiring", words)
        .arg(path("board", "value-file", "help-wiring-board", words).required(false))
        .arg(text("screen", "value-screen", "help-screen", words).action(ArgAction::Append))
        .arg(text("size", "value-size", "help-size", words))
        .arg(path_option("into", "value-folder", "help-show-into", words))
        .args(common(words))
        .after_help(words.say("help-wiring-more", &[]))
}

fn bundle(words: &Words) -> Command {
    let place = path("place", "value-place", "help-place", words).required(false);
    subcommand("bundle", "help-usage-bundle", words)
        .arg(place.help(with_usual("help-place", "demo", words)))
        .arg(path_option("lesson", "value-lesson", "help-bundle-lesson", words).action(ArgAction::Append))
        .arg(path_option("board", "value-file", "help-bundle-board", words))
        .arg(path_option("out", "value-file", "help-bundle-out", words))
        .arg(path_option("open", "value-file", "help-bundle-open", words))
        .arg(path_option("into", "value-folder", "help-bundle-into", words))
        .args(common(words))
        .after_help(words.say("help-bundle-more", &[]))
}

/// A subcommand with our headings in place of the parser's English ones.
fn subcommand(name: &'static str, usage_id: &str, words: &Words) -> Command {
    let say = |id: &str| words.say(id, &[]);
    let about = say(&format!("help-{name}"));
    let template = format!(
        "{{about}}\n\n{}: deshielo {name} {}\n\n{}:\n{{positionals}}\n\n{}:\n{{options}}{{after-help}}\n",
        say("help-usage"),
        say(usage_id),
        say("help-arguments"),
        say("help-options"),
    );
    plain(Command::new(name), words).about(about).help_template(template)
}

pub(super) fn plain(command: Command, words: &Words) -> Command {
    command
        .color(ColorChoice::Never)
        .styles(Styles::plain())
        .term_width(HELP_WIDTH)
        .disable_help_flag(true)
        .disable_version_flag(true)
        .arg(Arg::new("help").long("help").short('h').action(ArgAction::Help).help(words.say("help-help", &[])))
}

/// What every command takes.
pub(super) fn common(words: &Words) -> [Arg; 2] {
    [text("lang", "value-lang", "help-lang", words), path_option("locales", "value-folder", "help-locales", words)]
}

fn with_usual(help_id: &str, usual: &str, words: &Words) -> String {
    let default = words.say("help-default", &[("value", usual.into())]);
    format!("{} [{default}]", words.say(help_id, &[]))
}

pub(super) fn text(name: &'static str, value_id: &str, help_id: &str, words: &Words) -> Arg {
    let arg = Arg::new(name).long(name).value_name(words.say(value_id, &[])).help(words.say(help_id, &[]));
    arg.value_parser(StringValueParser::new()).action(ArgAction::Set).allow_negative_numbers(true)
}

pub(super) fn path(name: &'static str, value_id: &str, help_id: &str, words: &Words) -> Arg {
    let arg = Arg::new(name).value_name(words.say(value_id, &[])).help(words.say(help_id, &[]));
    arg.value_parser(PathBufValueParser::new())
}

pub(super) fn path_option(name: &'static str, value_id: &str, help_id: &str, words: &Words) -> Arg {
    path(name, value_id, help_id, words).long(name).action(ArgAction::Set)
}

pub(super) fn flag(name: &'static str, help_id: &str, words: &Words) -> Arg {
    Arg::new(name).long(name).action(ArgAction::SetTrue).help(words.say(help_id, &[]))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_command_line_is_sound_in_every_language() {
        for tag in crate::words::KNOWN_TAGS {
            let (words, _) = Words::new(tag);
            command(&words).debug_assert();
            assert_eq!(words.take_errors(), [], "{tag}");
        }
    }
}
