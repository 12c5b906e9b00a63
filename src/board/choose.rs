//! Which screen to show on when nobody named one, and why.

use std::str::FromStr;

use super::surroundings::{Surroundings, TerminalChance, WindowChance};

/// Whether this build can show on panels and framebuffers.
pub const BOARD_BUILT: bool = cfg!(all(feature = "board", target_os = "linux"));

/// A kind of screen, by the name that people give it.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum ScreenKind {
    /// A small display wired to the board.
    Panel,
    /// A monitor without a desktop.
    Framebuffer,
    /// A window on a desktop.
    Window,
    /// Coloured letters in a terminal.
    Terminal,
    /// Files in a folder.
    Pictures,
}

impl ScreenKind {
    /// All of them, the best first.
    pub const ALL: [Self; 5] = [Self::Panel, Self::Framebuffer, Self::Window, Self::Terminal, Self::Pictures];

    /// The name on the command line.
    pub const fn name(self) -> &'static str {
        match self {
            Self::Panel => "panel",
            Self::Framebuffer => "framebuffer",
            Self::Window => "window",
            Self::Terminal => "terminal",
            Self::Pictures => "pictures",
        }
    }
}

/// The text names no kind of screen.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct NotAScreen;

impl FromStr for ScreenKind {
    type Err = NotAScreen;

    fn from_str(text: &str) -> Result<Self, NotAScreen> {
        Self::ALL.into_iter().find(|kind| kind.name() == text).ok_or(NotAScreen)
    }
}

/// The screen that was chosen, and why.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Choice {
    /// The screen.
    pub kind: ScreenKind,
    /// Why.
    pub why: Why,
}

/// Why a screen was chosen, or cannot be had.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Why {
    /// The board file names it.
    BoardFile,
    /// There is a desktop.
    Desktop,
    /// There is a terminal but no desktop.
    NoDesktop,
    /// The desktop is on another machine, which would need the network.
    DesktopElsewhere,
    /// This build has no window.
    WindowNotBuilt,
    /// The window could not be opened.
    WindowFailed,
    /// Nobody sits at a terminal.
    NoTerminal,
    /// The terminal cannot place letters or show colours.
    PlainTerminal,
    /// This build knows nothing of panels and framebuffers.
    BoardNotBuilt,
    /// Nobody said how the panel is wired.
    NoBoardFile,
}

impl Why {
    /// The message that says so.
    pub const fn message(self) -> &'static str {
        match self {
            Self::BoardFile => "show-why-board-file",
            Self::Desktop => "show-why-desktop",
            Self::NoDesktop => "show-why-no-desktop",
            Self::DesktopElsewhere => "show-why-desktop-elsewhere",
            Self::WindowNotBuilt => "show-why-window-not-built",
            Self::WindowFailed => "show-why-window-failed",
            Self::NoTerminal => "show-why-no-terminal",
            Self::PlainTerminal => "show-why-plain-terminal",
            Self::BoardNotBuilt => "show-why-board-not-built",
            Self::NoBoardFile => "show-why-no-board-file",
        }
    }
}

/// The best screen at hand: what the board file names, else a window, else the terminal, else pictures.
pub fn choose(around: &Surroundings) -> Choice {
    if let Some(&kind) = around.board_file.first() {
        // Whether it can be had or not: nobody looks for a window on a board.
        return Choice { kind, why: Why::BoardFile };
    }
    let no_window = match around.window {
        WindowChance::Ready => return Choice { kind: ScreenKind::Window, why: Why::Desktop },
        WindowChance::NoDesktop => Why::NoDesktop,
        WindowChance::Elsewhere => Why::DesktopElsewhere,
        WindowChance::NotBuilt => Why::WindowNotBuilt,
        WindowChance::Failed => Why::WindowFailed,
    };
    match around.terminal {
        TerminalChance::Ready => Choice { kind: ScreenKind::Terminal, why: no_window },
        TerminalChance::Plain => Choice { kind: ScreenKind::Pictures, why: Why::PlainTerminal },
        TerminalChance::Missing => Choice { kind: ScreenKind::Pictures, why: Why::NoTerminal },
    }
}

/// Whether a screen that was asked for can be had here.
///
/// # Errors
/// Why not.
pub fn can_show(kind: ScreenKind, around: &Surroundings) -> Result<(), Why> {
    match kind {
        ScreenKind::Panel | ScreenKind::Framebuffer if !BOARD_BUILT => Err(Why::BoardNotBuilt),
        ScreenKind::Panel if !around.board_file.contains(&kind) => Err(Why::NoBoardFile),
        ScreenKind::Panel | ScreenKind::Framebuffer => Ok(()),
        ScreenKind::Window => match around.window {
            WindowChance::Ready => Ok(()),
            WindowChance::NoDesktop => Err(Why::NoDesktop),
            WindowChance::Elsewhere => Err(Why::DesktopElsewhere),
            WindowChance::NotBuilt => Err(Why::WindowNotBuilt),
            WindowChance::Failed => Err(Why::WindowFailed),
        },
        ScreenKind::Terminal => match around.terminal {
            TerminalChance::Ready => Ok(()),
            TerminalChance::Plain => Err(Why::PlainTerminal),
            TerminalChance::Missing => Err(Why::NoTerminal),
        },
        ScreenKind::Pictures => Ok(()),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn around(window: WindowChance, terminal: TerminalChance) -> Surroundings {
        Surroundings { board_file: Vec::new(), window, terminal }
    }

    #[test]
    fn the_best_screen_at_hand_is_taken_and_could_have_been_asked_for() {
        use {TerminalChance as T, WindowChance as W};
        let windows = [W::Ready, W::NoDesktop, W::Elsewhere, W::NotBuilt, W::Failed];
        for window in windows {
            for terminal in [T::Ready, T::Plain, T::Missing] {
                let around = around(window, terminal);
                let choice = choose(&around);
                let asked_for = [ScreenKind::Panel, ScreenKind::Framebuffer];
                let mut kinds = ScreenKind::ALL.into_iter().filter(|kind| !asked_for.contains(kind));
                let best = kinds.find(|&kind| can_show(kind, &around).is_ok());
                assert_eq!(Some(choice.kind), best, "{around:?}");
            }
        }
        assert_eq!(choose(&around(W::Elsewhere, T::Ready)).why, Why::DesktopElsewhere);
        assert_eq!(choose(&around(W::NotBuilt, T::Missing)).why, Why::NoTerminal);
    }

    #[test]
    fn a_board_file_comes_first() {
        let mut around = around(WindowChance::Ready, TerminalChance::Ready);
        around.board_file = vec![ScreenKind::Panel, ScreenKind::Framebuffer];
        assert_eq!(choose(&around), Choice { kind: ScreenKind::Panel, why: Why::BoardFile });
        assert_eq!(can_show(ScreenKind::Panel, &around).is_ok(), BOARD_BUILT);
        around.board_file.clear();
        let without = if BOARD_BUILT { Why::NoBoardFile } else { Why::BoardNotBuilt };
        assert_eq!(can_show(ScreenKind::Panel, &around), Err(without));
    }

    #[test]
    fn names_read_back() {
        for kind in ScreenKind::ALL {
            assert_eq!(kind.name().parse(), Ok(kind));
        }
        assert_eq!("Window".parse::<ScreenKind>(), Err(NotAScreen));
    }
}
