//! Where settings, guesses and the tally are kept.

use std::path::{Path, PathBuf};

/// The folder that was named, else the one that the service manager gives, else the usual one of the user; `None` where
/// there is none.
pub(super) fn keep_folder(named: Option<&Path>) -> Option<PathBuf> {
    named
        .map(Path::to_owned)
        .or_else(|| usual(|name| std::env::var_os(name).filter(|value| !value.is_empty()).map(PathBuf::from)))
}

fn usual(read: impl Fn(&str) -> Option<PathBuf>) -> Option<PathBuf> {
    // The manager may give several folders, one after the other.
    let given =
        read("STATE_DIRECTORY").map(|all| PathBuf::from(all.to_string_lossy().split(':').next().unwrap_or_default()));
    given
        .or_else(|| read("XDG_STATE_HOME").map(|state| state.join("deshielo")))
        .or_else(|| read("HOME").map(|home| home.join(".local/state/deshielo")))
        .or_else(|| read("LOCALAPPDATA").map(|data| data.join("deshielo")))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_service_manager_goes_before_the_home() {
        let with = |known: &[(&str, &str)]| {
            usual(|name| known.iter().find(|(known, _)| *known == name).map(|(_, value)| PathBuf::from(value)))
        };
        let home = ("HOME", "/home/ana");
        assert_eq!(with(&[]), None);
        assert_eq!(with(&[home]), Some("/home/ana/.local/state/deshielo".into()));
        assert_eq!(with(&[home, ("XDG_STATE_HOME", "/state")]), Some("/state/deshielo".into()));
        let given = ("STATE_DIRECTORY", "/var/lib/deshielo:/var/lib/other");
        assert_eq!(with(&[home, given]), Some("/var/lib/deshielo".into()));
    }
}
