//! In which order the cells of a grid are run: coarse first, and cells under one weather together.

use crate::water::dials::{Dials, Stage};

use super::Question;

/// How many passes there are, from every fourth value of a side to every value.
pub(super) const PASSES: u8 = 3;

/// The slopes that some cells share.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Weather {
    /// Dials of one of the cells; those of the weather are the same in all.
    pub dials: Dials,
    /// The cells, coarse first.
    pub cells: Vec<usize>,
    /// The pass in which the first of them is due.
    pub pass: u8,
}

/// In which pass a cell is due: the sketch of every fourth value of both sides, then of every second, then the rest.
pub(super) fn pass_of(column: usize, row: usize) -> u8 {
    let of_side = |at: usize| match at % 4 {
        0 => 0,
        2 => 1,
        _ => 2,
    };
    of_side(column).max(of_side(row))
}

/// The weathers of `cells`, in the order of their first cell.
pub(super) fn weathers(question: &Question<'_>, cells: std::ops::Range<usize>) -> Vec<Weather> {
    let [across, up] = question.axes();
    let columns = across.values().len();
    let is_weather = |dial: crate::water::dials::Dial| dial.first_stage() == Stage::Basin;
    let mut found: Vec<Vec<usize>> = Vec::new();
    for cell in cells {
        let (column, row) = (cell % columns, cell / columns);
        let weather = match (is_weather(across.dial()), is_weather(up.dial())) {
            (true, true) => found.len(),
            (true, false) => column,
            (false, true) => row,
            (false, false) => 0,
        };
        if found.len() <= weather {
            found.resize_with(weather + 1, Vec::new);
        }
        found[weather].push(cell);
    }
    let pass = |cell: &usize| pass_of(cell % columns, cell / columns);
    found
        .into_iter()
        .filter_map(|mut cells| {
            cells.sort_by_key(pass);
            let first = cells.first()?;
            Some(Weather { dials: question.dials_of(*first), pass: pass(first), cells })
        })
        .collect()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_sketch_comes_before_the_rest() {
        let count = |pass| (0..9).flat_map(|r| (0..13).map(move |c| pass_of(c, r))).filter(|p| *p == pass).count();
        assert_eq!((0..PASSES).map(count).collect::<Vec<_>>(), [12, 23, 82]);
    }
}
