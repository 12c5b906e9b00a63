//! Which of a monitor's modes is used.

use crate::board::file::Turned;
use crate::board::placing::Placing;

/// One mode of a monitor.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Mode {
    /// Columns.
    pub width: u16,
    /// Rows.
    pub height: u16,
    /// Pictures a second.
    pub refresh_hz: u32,
    /// Whether the monitor likes it best.
    pub preferred: bool,
}

/// The place in `modes` of the one to use: the size that was asked for, else the one that the monitor likes best, else the
/// one that a picture fills best; of equals the one nearest to 60 pictures a second. `None` where no picture goes into any.
pub fn choose(modes: &[Mode], wanted: Option<(u16, u16)>, turned: Turned) -> Option<usize> {
    let filled = |mode: &Mode| {
        let placing = Placing::new(mode.width.into(), mode.height.into(), turned)?;
        Some(placing.frame.pixels() as u64 * u64::from(placing.scale).pow(2))
    };
    let rank = |mode: &Mode| {
        let filled = filled(mode)?;
        let asked = wanted == Some((mode.width, mode.height));
        Some((asked, mode.preferred, filled, std::cmp::Reverse(mode.refresh_hz.abs_diff(60))))
    };
    let ranked = modes.iter().enumerate().filter_map(|(index, mode)| Some((rank(mode)?, std::cmp::Reverse(index))));
    ranked.max().map(|(_, std::cmp::Reverse(index))| index)
}

#[cfg(test)]
mod tests {
    use super::*;

    const fn mode(width: u16, height: u16, refresh_hz: u32, preferred: bool) -> Mode {
        Mode { width, height, refresh_hz, preferred }
    }

    #[test]
    fn the_size_asked_for_comes_first_then_the_monitors_own() {
        let modes = [mode(1920, 1080, 60, true), mode(1280, 720, 50, false), mode(1280, 720, 60, false)];
        assert_eq!(choose(&modes, Some((1280, 720)), Turned::By0), Some(2));
        assert_eq!(choose(&modes, None, Turned::By0), Some(0));
        assert_eq!(choose(&modes, Some((1024, 768)), Turned::By0), Some(0));
        assert_eq!(choose(&modes[1..], None, Turned::By0), Some(1));
        assert_eq!(choose(&[], None, Turned::By0), None);
        assert_eq!(choose(&[mode(160, 120, 60, true)], None, Turned::By0), None);
        // The monitor's own mode is of no use where no picture goes into it.
        assert_eq!(choose(&[mode(160, 120, 60, true), mode(800, 480, 60, false)], None, Turned::By270), Some(1));
    }
}
