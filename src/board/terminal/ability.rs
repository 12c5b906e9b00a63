//! What a terminal can show, as far as its environment tells.

/// How many colours there are.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum ColourDepth {
    /// Any colour of 8 bits a channel.
    True,
    /// The 256 of the fixed cube and greys.
    Indexed256,
    /// The 16 of the oldest colour terminals.
    Sixteen,
}

/// Into how many parts of one colour each a cell can be divided.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Grain {
    /// Two, one over the other.
    Half,
    /// Two by two.
    Quadrant,
    /// Two across, three down; needs letters that many terminals lack.
    Sextant,
}

impl Grain {
    /// Parts across and down.
    pub const fn parts(self) -> (usize, usize) {
        match self {
            Self::Half => (1, 2),
            Self::Quadrant => (2, 2),
            Self::Sextant => (2, 3),
        }
    }

    /// The letter whose ink covers the parts of `mask`: bit 0 left top, bit 1 right of it, and so on in rows.
    pub fn symbol(self, mask: u8) -> char {
        const HALVES: [char; 4] = [' ', '▀', '▄', '█'];
        const QUADRANTS: [char; 16] = [' ', '▘', '▝', '▀', '▖', '▌', '▞', '▛', '▗', '▚', '▐', '▜', '▄', '▙', '▟', '█'];
        match self {
            Self::Half => HALVES[usize::from(mask & 3)],
            Self::Quadrant => QUADRANTS[usize::from(mask & 15)],
            Self::Sextant => sextant(mask & 63),
        }
    }
}

/// Unicode 13 "Symbols for Legacy Computing": 1FB00 onwards in order of the mask, without the four that were there before.
fn sextant(mask: u8) -> char {
    let skipped = 1 + u32::from(mask > 21) + u32::from(mask > 42);
    match mask {
        0 => ' ',
        21 => '▌',
        42 => '▐',
        63 => '█',
        _ => char::from_u32(0x1FB00 + u32::from(mask) - skipped).unwrap_or(' '),
    }
}

/// Colours and grain of a terminal.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Ability {
    /// How many colours.
    pub depth: ColourDepth,
    /// How fine.
    pub grain: Grain,
}

/// The variable by which a person can ask for another grain: `half`, `quadrant` or `sextant`.
pub const GRAIN_VARIABLE: &str = "DESHIELO_CELLS";

impl Ability {
    /// Reads `TERM`, `COLORTERM` and [`GRAIN_VARIABLE`]. `None` for a terminal that cannot place letters or has no
    /// colours.
    pub fn of_environment(get: impl Fn(&str) -> Option<String>) -> Option<Self> {
        let term = get("TERM").unwrap_or_default();
        let colours = get("COLORTERM").unwrap_or_default().to_ascii_lowercase();
        // A console of Windows sets no TERM and shows every colour.
        if !cfg!(windows) && (term.is_empty() || term == "dumb" || term.starts_with("vt")) {
            return None;
        }
        // The console of a machine without a desktop has letters for halves only, whatever else is said of it.
        let console = term == "linux";
        let depth = if colours.contains("truecolor") || colours.contains("24bit") || term.ends_with("-direct") {
            ColourDepth::True
        } else if term.contains("256color") {
            ColourDepth::Indexed256
        } else if cfg!(windows) && term.is_empty() {
            ColourDepth::True
        } else {
            ColourDepth::Sixteen
        };
        let grain = match get(GRAIN_VARIABLE).as_deref() {
            Some("half") => Grain::Half,
            Some("quadrant") => Grain::Quadrant,
            Some("sextant") => Grain::Sextant,
            _ if console => Grain::Half,
            _ => Grain::Quadrant,
        };
        Some(Self { depth, grain })
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn of(pairs: &[(&str, &str)]) -> Option<Ability> {
        let get = |name: &str| pairs.iter().find(|(key, _)| *key == name).map(|(_, value)| (*value).to_owned());
        Ability::of_environment(get)
    }

    #[test]
    #[cfg(not(windows))]
    fn colours_degrade_with_what_the_environment_tells() {
        let depth = |pairs: &[(&str, &str)]| of(pairs).map(|ability| ability.depth);
        assert_eq!(depth(&[("TERM", "xterm"), ("COLORTERM", "truecolor")]), Some(ColourDepth::True));
        assert_eq!(depth(&[("TERM", "screen-256color")]), Some(ColourDepth::Indexed256));
        assert_eq!(depth(&[("TERM", "linux")]), Some(ColourDepth::Sixteen));
        assert_eq!(of(&[("TERM", "dumb"), ("COLORTERM", "truecolor")]), None);
        assert_eq!(of(&[("TERM", "vt100")]), None);
        assert_eq!(of(&[]), None);
    }

    #[test]
    #[cfg(not(windows))]
    fn the_grain_can_be_asked_for() {
        let grain = |pairs: &[(&str, &str)]| of(pairs).map(|ability| ability.grain);
        assert_eq!(grain(&[("TERM", "linux")]), Some(Grain::Half));
        assert_eq!(grain(&[("TERM", "xterm")]), Some(Grain::Quadrant));
        assert_eq!(grain(&[("TERM", "xterm"), (GRAIN_VARIABLE, "sextant")]), Some(Grain::Sextant));
    }

    #[test]
    fn every_mask_has_its_own_letter() {
        for grain in [Grain::Half, Grain::Quadrant, Grain::Sextant] {
            let (across, down) = grain.parts();
            let masks = 1_u8 << (across * down);
            let letters: std::collections::BTreeSet<char> = (0..masks).map(|mask| grain.symbol(mask)).collect();
            assert_eq!(letters.len(), usize::from(masks), "{grain:?}");
        }
        // Unicode names: 1FB00 is sextant-1, 1FB3B is sextant-23456, 1FB14 is sextant-235 (mask 22, the first past 21).
        assert_eq!((sextant(1), sextant(62), sextant(22)), ('\u{1FB00}', '\u{1FB3B}', '\u{1FB14}'));
    }
}
