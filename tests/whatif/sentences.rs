//! The sentence of the map is true of its numbers.

use deshielo::picture::views::grid::{Cell, GridAnswer, GridShown, Level, Needed, SideShown};
use deshielo::signs::Reading;
use deshielo::water::dials::{Dial, Dials};

const WARMING: [f64; 4] = [0.0, 1.0, 2.0, 3.0];
const WINTER: [f64; 3] = [-10.0, 0.0, 10.0];

/// A map of which every column has the same cells, from the bottom up.
fn answer(key: &str, gate: Option<usize>, column: [f64; 3], dials: Dials) -> GridAnswer {
    let cells: Vec<Cell> = column.iter().flat_map(|value| [Cell::Value(*value); 4]).collect();
    GridAnswer::of(&grid(key, gate, &cells, dials))
}

fn grid<'a>(key: &str, gate: Option<usize>, cells: &'a [Cell], dials: Dials) -> GridShown<'a> {
    GridShown {
        reading: Reading::from_key(key, gate).unwrap(),
        gate_name: gate.map(|_| "Molino"),
        years: 4,
        across: SideShown { dial: Dial::Warming, values: &WARMING },
        up: SideShown { dial: Dial::WinterPrecipitation, values: &WINTER },
        cells,
        as_it_was: Some(20.0),
        enough_share: 0.9,
        dials,
    }
}

fn needed(answer: &GridAnswer) -> Option<(f64, Needed)> {
    match answer {
        GridAnswer::Needs { across, up, .. } => Some((across.1, *up)),
        _ => None,
    }
}

#[test]
fn what_is_needed_is_the_first_value_that_keeps_the_level() {
    let winter = Dial::WinterPrecipitation;
    let ratio = |column| needed(&answer("supply_ratio", None, column, Dials::REST.with(Dial::Warming, 2.0)));
    assert_eq!(ratio([0.7, 0.8999, 0.95]), Some((2.0, Needed::From(winter, 10.0))));
    assert_eq!(ratio([0.7, 0.9, 0.95]), Some((2.0, Needed::From(winter, 0.0))));
    assert_eq!(ratio([0.95, 0.9, 0.7]), Some((2.0, Needed::To(winter, 0.0))));
    assert_eq!(ratio([0.95, 0.9, 0.91]), Some((2.0, Needed::Any)));
    assert_eq!(ratio([0.5, 0.6, 0.61]), Some((2.0, Needed::None)));
    assert_eq!(ratio([0.95, 0.5, 0.95]), None, "to and fro has no one answer");
    // A third of the way from rest to the far end where nothing is turned.
    let at_rest = answer("supply_ratio", None, [0.7, 0.8, 0.95], Dials::REST);
    assert_eq!(needed(&at_rest), Some((1.0, Needed::From(winter, 10.0))));
}

#[test]
fn less_is_better_for_days_without_water_and_what_was_is_the_level() {
    let cut = answer("days_cut", Some(0), [30.0, 20.0, 10.0], Dials::REST);
    assert_eq!(needed(&cut), Some((1.0, Needed::From(Dial::WinterPrecipitation, 0.0))));
    let full = answer("days_full", Some(0), [30.0, 20.0, 10.0], Dials::REST);
    assert_eq!(needed(&full), Some((1.0, Needed::To(Dial::WinterPrecipitation, 0.0))));
    let cells = [Cell::Value(1.0)];
    assert_eq!(grid("days_full", Some(0), &cells, Dials::REST).level(), Some(Level::AsItWas(20.0)));
    assert_eq!(grid("supply_ratio", Some(0), &cells, Dials::REST).level(), Some(Level::Enough(0.9)));
}

#[test]
fn without_better_or_worse_the_range_is_told_and_without_numbers_that() {
    let snow = answer("peak_swe_mm", None, [100.0, 200.0, 300.0], Dials::REST);
    assert_eq!(snow, GridAnswer::Range(Reading::from_key("peak_swe_mm", None).unwrap(), 100.0, 300.0));
    assert!(matches!(answer("supply_ratio", None, [0.5; 3], Dials::REST), GridAnswer::Same(_, share) if share == 0.5));
    let nothing = [Cell::Nothing; 12];
    assert!(matches!(GridAnswer::of(&grid("fill_date", None, &nothing, Dials::REST)), GridAnswer::Nothing(_)));
    let mut waiting = [Cell::Value(0.5); 12];
    waiting[7] = Cell::Waiting;
    let answer = GridAnswer::of(&grid("supply_ratio", None, &waiting, Dials::REST));
    assert_eq!(answer, GridAnswer::Working { done: 11, all: 12 });
}
