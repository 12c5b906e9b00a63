//! Writes manual pages in both languages and what shells complete, from the command line itself: `make_manual FOLDER`.

use std::error::Error;
use std::fs::{self, File};
use std::path::{Path, PathBuf};

use clap_complete::Shell;
use deshielo::commands::command_line;

/// Languages with the folder of their pages; English ones lie at the root.
const LANGUAGES: [(&str, &str); 2] = [("en", "man/man1"), ("es", "man/es/man1")];

fn main() -> Result<(), Box<dyn Error>> {
    let into = std::env::args_os().nth(1).map(PathBuf::from).ok_or("make_manual FOLDER")?;
    for (language, folder) in LANGUAGES {
        pages(language, &into.join(folder))?;
    }
    completions(&into.join("completions"))
}

/// One page for the program and one for each subcommand.
fn pages(language: &str, folder: &Path) -> Result<(), Box<dyn Error>> {
    fs::create_dir_all(folder)?;
    // No date: the same source gives the same bytes.
    clap_mangen::generate_to(command_line(language), folder)?;
    Ok(())
}

/// What a shell offers; words of help in it are English, since a shell has them without asking for a language.
fn completions(folder: &Path) -> Result<(), Box<dyn Error>> {
    fs::create_dir_all(folder)?;
    for (shell, name) in [(Shell::Bash, "deshielo"), (Shell::Zsh, "_deshielo"), (Shell::Fish, "deshielo.fish")] {
        let mut file = File::create(folder.join(name))?;
        clap_complete::generate(shell, &mut command_line("en"), "deshielo", &mut file);
    }
    Ok(())
}
